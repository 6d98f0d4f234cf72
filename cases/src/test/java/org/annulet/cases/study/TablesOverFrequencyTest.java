package org.annulet.cases.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import org.annulet.cases.read.CaseReader;
import org.annulet.cases.read.Problem;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.solver.modes.Mode;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** A table made from a law is as good as the law. */
class TablesOverFrequencyTest {
  private static final String DUCT =
      """
      annulet: 1
      title: duct with a flame
      geometry:
        kind: plane
        depth: 10 mm
        mesh_size: 25 mm
        points: {a: [0 m, 0 m], b: [0.3 m, 0 m], c: [1 m, 0 m], d: [1 m, 50 mm], e: [0.3 m, 50 mm], f: [0 m, 50 mm]}
        edges:
          near: {line: [f, a]}
          cold_floor: {line: [a, b]}
          sheet: {line: [b, e]}
          cold_roof: {line: [e, f]}
          hot_floor: {line: [b, c]}
          far: {line: [c, d]}
          hot_roof: {line: [d, e]}
        zones:
          cold: {boundary: [near, cold_floor, sheet, cold_roof]}
          hot: {boundary: [hot_floor, far, hot_roof, sheet]}
      gas:
        mean_pressure: 1 bar
        zones:
          cold: {sound_speed: 347 m/s, density: 1.16270 kg/m3}
          hot: {sound_speed: 850 m/s, density: 0.193772 kg/m3}
      walls: {far: WALL}
      flames:
        sheet:
          heat_release: 875 W
          place: {sheet: sheet}
          reference: {edge: sheet, flow_from: cold}
          reference_velocity: 10 m/s
          response: RESPONSE
      window: {frequency: [20 Hz, 700 Hz], growth_rate: [-700 1/s, 400 1/s]}
      """;

  @TempDir private Path folder;

  private List<Mode> modes(String wall, String response) throws Exception {
    Path file =
        Files.writeString(
            folder.resolve("case.yaml"), DUCT.replace("WALL", wall).replace("RESPONSE", response));
    var results =
        new ModesStudy(CaseReader.read(file).orThrow(), Progress.SILENT)
            .modesOnly()
            .run("test")
            .results();
    assertThat(results.complete()).isTrue();
    return results.modes().stream().map(ModeEntry::view).map(v -> v.mode()).toList();
  }

  private List<Problem> problems(String table) throws Exception {
    Files.writeString(folder.resolve("flame.csv"), table);
    Path file =
        Files.writeString(
            folder.resolve("case.yaml"),
            DUCT.replace("WALL", "open").replace("RESPONSE", "{table: flame.csv}"));
    return CaseReader.read(file).problems();
  }

  private static void same(List<Mode> a, List<Mode> b, double relative) {
    assertThat(a).hasSameSizeAs(b);
    for (int k = 0; k < a.size(); k++) {
      double room = relative * b.get(k).frequency();
      assertThat(a.get(k).frequency()).isCloseTo(b.get(k).frequency(), within(room));
      assertThat(a.get(k).growthRate()).isCloseTo(b.get(k).growthRate(), within(6 * room));
    }
  }

  @Test
  void measuredGainAndPhase_giveTheModesOfTheLawTheyCameFrom() throws Exception {
    StringBuilder table = new StringBuilder("# made up\nfrequency [Hz], gain [1], phase [°]\n");
    for (int f = 0; f <= 800; f += 20) {
      double cut = f / 300.0;
      table.append(
          String.format(
              Locale.ROOT,
              "%d, %.8f, %.6f%n",
              f,
              1 / Math.hypot(1, cut),
              Math.IEEEremainder(-360.0 * f * 3e-3 - Math.toDegrees(Math.atan(cut)), 360)));
    }
    Files.writeString(folder.resolve("flame.csv"), table.toString());
    same(
        modes("open", "{table: flame.csv, low_frequency_limit: premixed}"),
        modes("open", "{gain: 1, delay: 3 ms, cutoff: 300 Hz}"),
        2e-3);
  }

  @Test
  void spreadOfNoWidth_andSumOfHalves_areThePlainDelay() throws Exception {
    List<Mode> plain = modes("open", "{gain: 0.5, delay: 3 ms}");
    same(modes("open", "{gain: 0.5, delay: 3 ms, delay_deviation: 0 ms}"), plain, 1e-9);
    same(modes("open", "{sum: [{gain: 0.2, delay: 3 ms}, {gain: 0.3, delay: 3 ms}]}"), plain, 1e-9);
  }

  @ParameterizedTest
  @CsvSource({
    "impedance_table, 'real [1], imaginary [1]', '1.5, 0'",
    "admittance_table, 'magnitude [1], phase [rad]', '0.66666666667, 0'",
    "reflection_table, 'real [%], imaginary [%]', '20, 0'"
  })
  void tableOfAConstant_isTheConstant(String key, String columns, String values) throws Exception {
    StringBuilder table = new StringBuilder("frequency [kHz], " + columns + "\n");
    for (int f = 0; f < 10; f++) {
      table.append(String.format(Locale.ROOT, "%.1f, %s%n", 0.1 * f, values));
    }
    Files.writeString(folder.resolve("wall.csv"), table.toString());
    same(
        modes("{" + key + ": wall.csv}", "{gain: 0.5, delay: 3 ms}"),
        modes("{impedance: 1.5}", "{gain: 0.5, delay: 3 ms}"),
        1e-7);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      textBlock =
          """
          frequency, gain [1], phase [°]~100, 1, 0 | line 1: column 'frequency' states no unit
          frequency [Hz]; gain [1]; phase [°]~1;1;1 | separated by semicolons
          frequency [mm], gain [1], phase [°]~1, 1, 1 | line 1: column 'frequency'
          frequency [Hz], gain [1]~1, 1~2, 1~3, 1 | no column 'imaginary'
          frequency [Hz], gain [1], phase [°]~1, 1, 0~3, 1, 0~2, 1, 0 | frequencies must ascend
          frequency [Hz], gain [1], phase [°]~1, 1, 0~2, x, 0 | line 3: column 'gain'
          frequency [Hz], gain [1], phase [°]~1, 1, 0~2, 1 | line 3: 2 values under 3 columns
          frequency [Hz], gain [1], phase [°]~1, nan, 0 | line 2: column 'gain'
          frequency [Hz], gain [1], phase [°] | has no rows below its head
          # nothing | is empty
          """)
  void faultsOfATable_sayWhereTheyAre(String table, String said) throws Exception {
    assertThat(problems(table.replace("~", "\n")))
        .anySatisfy(
            p -> {
              assertThat(p.toString()).contains(said).contains("case.yaml:").contains("mend: ");
            });
  }
}
