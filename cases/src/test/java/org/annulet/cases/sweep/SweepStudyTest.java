package org.annulet.cases.sweep;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.annulet.cases.points.Slice;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.CaseReader;
import org.annulet.cases.study.Progress;
import org.apache.commons.math3.analysis.UnivariateFunction;
import org.apache.commons.math3.analysis.solvers.BrentSolver;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * Sweeps of a duct of one gas, closed at x = 0 and open at x = 1 m, with a flame sheet at a = 0.3
 * m. With û jumping by the factor 1 + Θ, Θ = (γ−1)Q̄/(γp̄Aū) · n e^{−sτ}, its eigenvalues obey
 *
 * <pre>cos ka cos kb = (1 + Θ) sin ka sin kb,    k = −is/c,  b = 1 m − a</pre>
 *
 * <p>(derived here from p̂ = cos kx, p̂ = B sin k(1 m − x)). On Re s = 0 its imaginary part asks
 * for sin ωτ = 0: growth changes sign at τ = jπ/ω, ω from the equation with Θ = ±Θ₀.
 */
class SweepStudyTest {
  private static final double C = 400;
  private static final double A = 0.3;
  private static final double B = 0.7;

  static final String DUCT =
      """
      annulet: 1
      title: duct with a flame that is delayed
      geometry:
        kind: plane
        depth: 100 mm
        mesh_size: 20 mm
        points: {a: [0, 0, mm], b: [300, 0, mm], c: [1000, 0, mm], d: [1000, 20, mm], e: [300, 20, mm], f: [0, 20, mm]}
        edges:
          cold: {line: [e, f, a, b]}
          sheet: {line: [b, e]}
          below: {line: [b, c]}
          outlet: {line: [c, d]}
          above: {line: [d, e]}
        zones:
          up: {boundary: [cold, sheet]}
          down: {boundary: [below, outlet, above, sheet]}
      gas:
        mean_pressure: 1 bar
        zones:
          up: {sound_speed: 400 m/s, density: 0.875 kg/m3}
          down: {as: up}
      walls: {outlet: open}
      flames:
        main:
          heat_release: 700 W
          place: {sheet: sheet}
          reference: {edge: sheet, flow_from: up}
          reference_velocity: 1 m/s
          response: {gain: 0.1, delay: 1 ms}
      window: {frequency: [30 Hz, 450 Hz], growth_rate: [-150, 150, 1/s]}
      studies:
        sweep:
          along: {points: %d, set: {flames.main.response.delay: [1 ms, 6 ms]}}
      """;

  @TempDir private Path folder;
  private Path file;

  @BeforeEach
  void write() throws Exception {
    file = folder.resolve("case.yaml");
    Files.writeString(file, String.format(DUCT, 26));
  }

  private CaseFile duct() {
    return CaseReader.read(file).orThrow();
  }

  private SweepStudy.Answer run() throws Exception {
    SweepStudy study = new SweepStudy(duct(), "test", Progress.SILENT);
    study.compute(folder.resolve("out"), Slice.WHOLE);
    return study.finish(study.collect(folder.resolve("out"))).answer();
  }

  /** Θ₀ of the case: (γ−1)/(γp̄) · Q̄/(A ū) · n with γ = ρc²/p̄ = 1.4, A = 0.1 m · 0.02 m. */
  private static double theta() {
    double gamma = 0.875 * C * C / 1e5;
    return (gamma - 1) / (gamma * 1e5) * 700 / (0.1 * 0.02 * 1) * 0.1;
  }

  /**
   * ω of the mode that begins at the passive ω₀ = (j − ½)πc/L, on Re s = 0 with e^{−iωτ} = sign.
   */
  private static double omega(int mode, int sign) {
    UnivariateFunction f =
        w ->
            Math.cos(w * A / C) * Math.cos(w * B / C)
                - (1 + sign * theta()) * Math.sin(w * A / C) * Math.sin(w * B / C);
    double passive = (mode - 0.5) * Math.PI * C;
    return new BrentSolver(1e-10).solve(200, f, passive - 150, passive + 150);
  }

  @Test
  void edgesOfEveryStretch_areThoseOfTheDispersionRelation() throws Exception {
    SweepStudy.Answer answer = run();

    assertThat(answer.certified()).isTrue();
    List<Double> expected = new ArrayList<>();
    for (int mode = 1; mode <= 2; mode++) {
      for (int j = 1; j < 40; j++) {
        double tau = j * Math.PI / omega(mode, j % 2 == 0 ? 1 : -1);
        if (tau > 1e-3 && tau < 6e-3) {
          expected.add(tau);
        }
      }
    }
    List<Double> found = new ArrayList<>();
    for (SweepLine.Stretch s : answer.stretches()) {
      if (s.opens() == SweepLine.End.ZERO) {
        found.add(1e-3 * answer.grid().sweep().along().shown(s.from()));
      }
      if (s.closes() == SweepLine.End.ZERO) {
        found.add(1e-3 * answer.grid().sweep().along().shown(s.to()));
      }
    }
    double[] a = expected.stream().mapToDouble(x -> x).sorted().toArray();
    double[] b = found.stream().mapToDouble(x -> x).sorted().toArray();
    assertThat(b).hasSameSizeAs(a).hasSizeGreaterThan(3);
    for (int i = 0; i < a.length; i++) {
      // (kh)²/24 of the second mode is 4e-4
      assertThat(b[i]).isCloseTo(a[i], within(1e-3 * a[i]));
    }
  }

  @Test
  void tracks_keepToTheirModes() throws Exception {
    SweepStudy.Answer answer = run();

    assertThat(answer.line().tracks()).hasSize(2);
    assertThat(answer.line().clear()).isTrue();
    for (Track t : answer.line().tracks()) {
      assertThat(t.first()).isZero();
      assertThat(t.last()).isEqualTo(25);
      for (int k = 1; k <= 25; k++) {
        assertThat(t.at(k).frequency())
            .isCloseTo((2 * t.number() - 1) * C / 4, within(0.1 * C / 4));
      }
    }
  }

  @Test
  void partsPutTogether_areTheWholeByteForByte_alsoAfterACut() throws Exception {
    Path whole = folder.resolve("whole");
    Path parts = folder.resolve("parts");
    SweepStudy one = new SweepStudy(duct(), "test", Progress.SILENT);
    one.compute(whole, Slice.WHOLE);
    SweepFiles.write(whole, one.finish(one.collect(whole)), "test");
    for (int i = 3; i >= 1; i--) {
      new SweepStudy(duct(), "test", Progress.SILENT).compute(parts, new Slice(i, 3));
    }
    Path second = parts.resolve("sweep.part-2-of-3.points");
    byte[] bytes = Files.readAllBytes(second);
    Files.write(second, Arrays.copyOf(bytes, bytes.length - 300)); // the last line is cut

    SweepStudy merging = new SweepStudy(duct(), "test", Progress.SILENT);
    assertThat(merging.collect(parts).missing()).containsExactly("2/3");
    new SweepStudy(duct(), "test", Progress.SILENT).compute(parts, new Slice(2, 3));
    assertThat(merging.collect(parts).missing()).isEmpty();
    SweepFiles.write(parts, merging.finish(merging.collect(parts)), "test");

    for (String name :
        List.of("sweep.csv", "sweep-edges.csv", "sweep.json", "sweep.svg", "sweep.html")) {
      assertThat(parts.resolve(name)).hasSameBinaryContentAs(whole.resolve(name));
    }
  }

  @Test
  void map_isQuietWhereTheDispersionRelationSaysSo() throws Exception {
    Files.writeString(
        file,
        String.format(DUCT, 9)
            + "    across: {points: 3, name: gain, set: {flames.main.response.gain: [0.05, 0.15]}}\n");

    SweepStudy.Answer answer = run();

    assertThat(answer.certified()).isTrue();
    assertThat(answer.map().boundary()).isNotEmpty();
    for (SweepMap.Piece p : answer.map().boundary()) {
      double tau = 1e-3 * answer.grid().sweep().along().shown(p.from()[0]);
      double nearest = Double.POSITIVE_INFINITY;
      for (int mode = 1; mode <= 2; mode++) {
        for (int j = 1; j < 40; j++) {
          double edge = j * Math.PI / ((mode - 0.5) * Math.PI * C);
          nearest = Math.min(nearest, Math.abs(tau - edge) / edge);
        }
      }
      // ω differs from the passive one by a share of Θ₀/π
      assertThat(nearest).isLessThan(theta());
    }
  }

  @Test
  void sweptLengthOfARing_movesTheHalfWaveAsOneOverIt() throws Exception {
    Files.writeString(
        file,
        """
        annulet: 1
        title: ring drawn out
        geometry:
          kind: ring
          burner_count: 6
          mesh_size: 40 mm
          mesh_size_at: {burners: 10 mm}
          zones:
            - {name: burners, shape: ducts, mean_radius: 300 mm, bore: 12 mm, length: 20 mm}
            - {name: chamber, shape: annulus, mean_radius: 300 mm, gap: 100 mm, length: 250 mm}
        gas:
          mean_pressure: 1 bar
          zones:
            burners: {sound_speed: 500 m/s, density: 0.5 kg/m3}
            chamber: {sound_speed: 500 m/s, density: 0.5 kg/m3}
        walls: {chamber.outer_face: {admittance: 0.01}}
        window: {frequency: [850 Hz, 1080 Hz], growth_rate: [-300, 300, 1/s]}
        studies:
          sweep:
            along: {points: 5, set: {geometry.zones.chamber.length: [240 mm, 280 mm]}}
        """);

    SweepStudy.Answer answer = run();

    assertThat(answer.certified()).isTrue();
    assertThat(answer.sizes()).isNotEmpty();
    Track halfWave =
        answer.line().tracks().stream()
            .filter(t -> t.part().equals("Bloch number 0"))
            .findFirst()
            .orElseThrow();
    for (int k = 0; k < 5; k++) {
      double length = 0.240 + 0.01 * k;
      // the necks of 12 mm add 2 % of the chamber's area
      assertThat(halfWave.at(k).frequency())
          .isCloseTo(500 / (2 * length), within(0.03 * 500 / (2 * length)));
    }
  }

  @Test
  void sweptNumberOfBurners_isMeshedAnewAtEveryPoint() throws Exception {
    Files.writeString(
        file,
        """
        annulet: 1
        title: rings of 5 to 7 burners
        geometry:
          kind: ring
          burner_count: 6
          mesh_size: 60 mm
          zones:
            - {name: burners, shape: ducts, mean_radius: 300 mm, bore: 60 mm, length: 60 mm}
            - {name: chamber, shape: annulus, mean_radius: 300 mm, gap: 100 mm, length: 250 mm}
        gas:
          mean_pressure: 1 bar
          zones:
            burners: {sound_speed: 500 m/s, density: 0.5 kg/m3}
            chamber: {sound_speed: 500 m/s, density: 0.5 kg/m3}
        walls: {chamber.downstream: {admittance: 0.05}}
        window: {frequency: [200 Hz, 300 Hz], growth_rate: [-300, 300, 1/s]}
        studies:
          sweep:
            along: {points: 3, set: {geometry.burner_count: [5, 7]}}
        """);

    SweepStudy.Answer answer = run();

    assertThat(answer.sizes()).isEmpty();
    assertThat(answer.certified()).isTrue();
    // the first azimuthal mode near c/(2πR) = 265 Hz, slower by the burners' gas
    assertThat(answer.points()).allMatch(p -> !p.modes().isEmpty());
  }
}
