package org.annulet.cases.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.function.ToDoubleFunction;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.CaseReader;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.ParameterSensitivity;
import org.annulet.post.meaning.Results;
import org.annulet.post.table.SensitivitiesCsv;
import org.annulet.post.table.Summary;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * The table of sensitivities of a duct, closed at one end and open at the other, with a temperature
 * jump and an n–τ flame at the jump: against its dispersion relation and against runs with changed
 * input.
 *
 * <pre>
 *   c₂ cosh(sb/c₁) cosh(sl/c₂) + (1 + N e^{−sτ}) c₁ sinh(sb/c₁) sinh(sl/c₂) = 0
 *   N = n (γ−1) Q̄ / (γ p̄ A ū)      (same γ on both sides; derived for this test)
 * </pre>
 */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class SensitivitiesTest {
  private static final String CASE =
      """
      annulet: 1
      title: Duct with a flame
      geometry:
        kind: plane
        depth: 50 mm
        mesh_size: 15 mm
        points_in: mm
        points: {a: [0, 0], b: [300, 0], c: [1000, 0], d: [1000, 40], e: [300, 40], f: [0, 40]}
        edges:
          low1: {line: [a, b]}
          low2: {line: [b, c]}
          outlet: {line: [c, d]}
          up2: {line: [d, e]}
          up1: {line: [e, f]}
          inlet: {line: [f, a]}
          sheet: {line: [b, e]}
        zones:
          cold: {boundary: [low1, sheet, up1, inlet]}
          hot: {boundary: [low2, outlet, up2, sheet]}
      gas:
        mean_pressure: 2 bar
        zones:
          cold: {temperature: 27 °C, gamma: 1.4, gas_constant: 287 J/(kg K)}
          hot: {temperature: {profile: {x: [300, 1000, mm], temperature: [1700, 1700, K]}}, gamma: 1.4, gas_constant: 287 J/(kg K)}
      walls: {outlet: open}
      flames:
        main:
          heat_release: 9 kW
          place: {sheet: sheet}
          reference: {edge: sheet, flow_from: cold}
          reference_velocity: 8 m/s
          response: {gain: 0.9, delay: 3 ms}
      window: {frequency: [60 Hz, 300 Hz], growth_rate: [-400 1/s, 400 1/s]}
      outputs: {field_files: none}
      """;

  private CaseFile caseFile;
  private Results results;

  @BeforeAll
  void solve(@TempDir Path folder) throws IOException {
    Path file = folder.resolve("case.yaml");
    Files.writeString(file, CASE);
    caseFile = CaseReader.read(file).caseFile().orElseThrow();
    results = run(caseFile);
  }

  private static Results run(CaseFile c) {
    return new ModesStudy(c, Progress.SILENT).run("test").results();
  }

  /** Everything the dispersion relation depends on. */
  private record Input(
      double cold,
      double hot,
      double pressure,
      double heat,
      double velocity,
      double n,
      double tau) {
    static Input with(String key, double x) {
      ToDoubleFunction<String> f = k -> k.equals(key) ? x : 1;
      return new Input(
          300.15 * f.applyAsDouble("gas.zones.cold.temperature"),
          1700 * f.applyAsDouble("hot"),
          2e5 * f.applyAsDouble("gas.mean_pressure"),
          9e3 * f.applyAsDouble("flames.main.heat_release"),
          8 * f.applyAsDouble("flames.main.reference_velocity"),
          0.9 * f.applyAsDouble("flames.main.response.gain"),
          3e-3 * f.applyAsDouble("flames.main.response.delay"));
    }

    Complex value(Complex s) {
      double c1 = Math.sqrt(1.4 * 287 * cold);
      double c2 = Math.sqrt(1.4 * 287 * hot);
      double strength = n * 0.4 * heat / (1.4 * pressure * 0.04 * 0.05 * velocity);
      Complex a = s.multiply(0.3 / c1);
      Complex b = s.multiply(0.7 / c2);
      Complex flame = s.multiply(-tau).exp().multiply(strength).add(1);
      return a.cosh()
          .multiply(b.cosh())
          .multiply(c2)
          .add(flame.multiply(a.sinh()).multiply(b.sinh()).multiply(c1));
    }

    Complex root(Complex start) {
      Complex s = start;
      for (int k = 0; k < 30; k++) {
        Complex h = s.multiply(1e-6);
        Complex slope = value(s.add(h)).subtract(value(s.subtract(h))).divide(h.multiply(2));
        s = s.subtract(value(s).divide(slope));
      }
      return s;
    }
  }

  private static Complex s(ModeEntry e) {
    return new Complex(e.view().mode().growthRate(), 2 * Math.PI * e.view().mode().frequency());
  }

  private static ParameterSensitivity row(ModeEntry e, String key) {
    return e.sensitivities().stream().filter(p -> p.key().equals(key)).findFirst().orElseThrow();
  }

  /** 2 %: what the mesh of 15 mm leaves; the numbers themselves are exact for their mesh. */
  @ParameterizedTest
  @CsvSource({
    "gas.zones.cold.temperature",
    "gas.mean_pressure",
    "flames.main.heat_release",
    "flames.main.reference_velocity",
    "flames.main.response.gain",
    "flames.main.response.delay"
  })
  void table_isTheDerivativeOfTheDispersionRelation(String key) {
    assertThat(results.modes()).isNotEmpty();
    for (ModeEntry e : results.modes()) {
      Complex here = Input.with("", 1).root(s(e));
      assertThat(here.subtract(s(e)).abs()).isLessThan(0.01 * here.abs());
      double h = 1e-4;
      Complex up = Input.with(key, 1 + h).root(here);
      Complex down = Input.with(key, 1 - h).root(here);
      Complex perPercent = up.subtract(down).divide(200 * h);
      ParameterSensitivity row = row(e, key);
      double bound = 0.02 * perPercent.abs();
      assertThat(row.growthPerPercent()).isCloseTo(perPercent.getReal(), within(bound));
      assertThat(2 * Math.PI * row.frequencyPerPercent())
          .isCloseTo(perPercent.getImaginary(), within(bound));
    }
  }

  /** A run with the input raised and lowered by 0.5 %: error of the difference 1e-4 or so. */
  @ParameterizedTest
  @CsvSource({
    "flames.main.response.delay, 3.015 ms, 2.985 ms",
    "gas.mean_pressure, 2.01 bar, 1.99 bar"
  })
  void table_isTheDifferenceOfTwoRuns(String key, String larger, String smaller) {
    Results up = run(caseFile.with(Map.of(key, larger)).caseFile().orElseThrow());
    Results down = run(caseFile.with(Map.of(key, smaller)).caseFile().orElseThrow());
    for (int i = 0; i < results.modes().size(); i++) {
      Complex perPercent = s(up.modes().get(i)).subtract(s(down.modes().get(i)));
      ParameterSensitivity row = row(results.modes().get(i), key);
      Complex got = new Complex(row.growthPerPercent(), 2 * Math.PI * row.frequencyPerPercent());
      assertThat(got.subtract(perPercent).abs()).isLessThan(1e-3 * perPercent.abs());
    }
  }

  /** At the stated range the second order is a tenth of the first. */
  @Test
  void linearRange_isWhereTheDispersionRelationLeavesTheStraightLineByATenth() {
    ModeEntry e = results.modes().get(0);
    ParameterSensitivity row = row(e, "flames.main.response.delay");
    Complex here = Input.with("", 1).root(s(e));
    double x = row.linearRange() / 100;
    Complex up = Input.with(row.key(), 1 + x).root(here);
    Complex down = Input.with(row.key(), 1 - x).root(here);
    double bend = up.add(down).subtract(here.multiply(2)).divide(2).abs();
    double straight = up.subtract(down).divide(2).abs();
    assertThat(bend / straight).isCloseTo(0.1, within(0.01)); // third order and mesh
  }

  /** Stations of a profile share one unit; both together are the temperature of the zone. */
  @Test
  void stationsOfAProfile_areVariedOneByOne_andAddUp() {
    ModeEntry e = results.modes().get(0);
    double sum = 0;
    for (int k = 1; k <= 2; k++) {
      sum += row(e, "gas.zones.hot.temperature.profile.temperature." + k).growthPerPercent();
    }
    Complex here = Input.with("", 1).root(s(e));
    Complex up = Input.with("hot", 1 + 1e-4).root(here);
    Complex down = Input.with("hot", 1 - 1e-4).root(here);
    double expected = up.subtract(down).divide(2e-2).getReal();
    assertThat(sum).isCloseTo(expected, within(0.02 * Math.abs(expected)));
  }

  /**
   * A table that holds 0.9 e^{−sτ} over frequency: later by one percent of a cycle is a delay
   * longer by 1/(100 f), whose effect the n–τ flame's row tells. 3 %: the fit of the table, and the
   * modes are not quite the same.
   */
  @Test
  void measuredResponse_movesWithItsDelay(@TempDir Path folder) throws IOException {
    StringBuilder table = new StringBuilder("frequency [Hz],gain [1],phase [°]\n");
    for (int k = 1; k <= 40; k++) {
      table.append(10 * k).append(",0.9,").append(-360 * 10 * k * 3e-3).append('\n');
    }
    Files.writeString(folder.resolve("flame.csv"), table);
    Files.writeString(
        folder.resolve("case.yaml"),
        CASE.replace(
            "{gain: 0.9, delay: 3 ms}", "{table: flame.csv, low_frequency_limit: as_measured}"));
    Results measured = run(CaseReader.read(folder).caseFile().orElseThrow());
    ModeEntry e = results.modes().get(0);
    ParameterSensitivity known = row(e, "flames.main.response.delay");
    double f = e.view().mode().frequency();
    double share = 1 / (f * 3e-3); // one percent of a cycle in percent of the delay
    ParameterSensitivity got = row(measured.modes().get(0), "flames.main.response");
    double bound =
        0.03 * share * Math.hypot(known.growthPerPercent(), 6.28 * known.frequencyPerPercent());
    assertThat(got.growthPerPercent()).isCloseTo(share * known.growthPerPercent(), within(bound));
    assertThat(got.frequencyPerPercent())
        .isCloseTo(share * known.frequencyPerPercent(), within(bound / 6.28));
    assertThat(got.linearRange())
        .isCloseTo(known.linearRange() / share, within(0.1 * got.linearRange()));
  }

  /** An equivalence ratio of 1 is the richest allowed, so there is no larger one beside it. */
  @Test
  void valueAtTheEndOfItsRange_isLeftOutAndSaidToBe(@TempDir Path folder) throws IOException {
    Path file = folder.resolve("case.yaml");
    String profile = CASE.substring(CASE.indexOf("{temperature: {profile"), CASE.indexOf("walls:"));
    Files.writeString(
        file,
        CASE.replace(
            profile, "{temperature: 1700 K, mixture: {fuel: hydrogen, equivalence_ratio: 1}}\n"));
    Results edge = run(CaseReader.read(file).caseFile().orElseThrow());
    assertThat(edge.notes())
        .anyMatch(n -> n.contains("leave out") && n.contains("equivalence_ratio"));
    assertThat(row(edge.modes().get(0), "gas.zones.hot.temperature").growthPerPercent())
        .isNotZero();
  }

  @Test
  void rows_areRankedAndWritten() {
    for (ModeEntry e : results.modes()) {
      assertThat(e.sensitivities())
          .isSortedAccordingTo(Comparator.comparingDouble(p -> -Math.abs(p.growthPerPercent())));
    }
    List<String> lines = SensitivitiesCsv.text(results).lines().toList();
    int rows = results.modes().stream().mapToInt(e -> e.sensitivities().size()).sum();
    assertThat(lines).hasSize(rows + 1);
    assertThat(Summary.sentences(results).get(1)).contains("per percent more of ");
  }
}
