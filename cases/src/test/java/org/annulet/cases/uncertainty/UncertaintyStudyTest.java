package org.annulet.cases.uncertainty;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.annulet.cases.points.Slice;
import org.annulet.cases.read.CaseFaultException;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.CaseReader;
import org.annulet.cases.read.Uncertainty.Correlation;
import org.annulet.cases.read.Uncertainty.Shape;
import org.annulet.cases.study.Progress;
import org.apache.commons.math3.complex.Complex;
import org.apache.commons.math3.distribution.NormalDistribution;
import org.apache.commons.math3.stat.StatUtils;
import org.apache.commons.math3.stat.correlation.PearsonsCorrelation;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * Probabilities of a duct in closed form. Closed at x = 0 with admittance y there, open at x = 1 m,
 * flame sheet at a = 0.3 m: with Θ = Θ₁ n e^{−sτ}
 *
 * <pre>(cosh κa + y sinh κa) cosh κb + (1 + Θ)(sinh κa + y cosh κa) sinh κb = 0,  κ = s/c</pre>
 *
 * <p>(derived here; without y it is the relation of the sweep's test). At y = 0 its roots lie on
 * the imaginary axis for n = 0, and whether a mode grows is the sign of the gain n.
 */
class UncertaintyStudyTest {
  private static final double C = 400;
  private static final double GAMMA = 0.875 * C * C / 1e5;

  private static final String DUCT =
      """
      annulet: 1
      title: duct with a flame that is not known well
      geometry:
        kind: plane
        depth: 100 mm
        mesh_size: 20 mm
        points: {a: [0, 0, mm], b: [300, 0, mm], c: [1000, 0, mm], d: [1000, 20, mm], e: [300, 20, mm], f: [0, 20, mm]}
        edges:
          roof: {line: [e, f]}
          inlet: {line: [f, a]}
          floor: {line: [a, b]}
          sheet: {line: [b, e]}
          below: {line: [b, c]}
          outlet: {line: [c, d]}
          above: {line: [d, e]}
        zones:
          up: {boundary: [roof, inlet, floor, sheet]}
          down: {boundary: [below, outlet, above, sheet]}
      gas:
        mean_pressure: 1 bar
        zones:
          up: {sound_speed: 400 m/s, density: 0.875 kg/m3}
          down: {as: up}
      walls: {outlet: open%s}
      flames:
        main:
          heat_release: 700 W
          place: {sheet: sheet}
          reference: {edge: sheet, flow_from: up}
          reference_velocity: 1 m/s
          response: {gain: 0.05, delay: %s}
      window: {frequency: [30 Hz, 180 Hz], growth_rate: [-150, 150, 1/s]}
      studies:
        uncertainty:
      %s
      """;

  @TempDir private Path folder;

  private CaseFile read(String walls, String delay, String study) throws Exception {
    Path file = folder.resolve("case.yaml");
    Files.writeString(file, String.format(DUCT, walls, delay, study.indent(4).stripTrailing()));
    return CaseReader.read(file).orThrow();
  }

  private UncertaintyStudy.Answer run(CaseFile caseFile) throws Exception {
    Path out = folder.resolve("out");
    UncertaintyStudy study = new UncertaintyStudy(caseFile, "test", Progress.SILENT);
    study.compute(out, Slice.WHOLE);
    return study.finish(out).answer();
  }

  @Test
  void lossLessDuct_growsAsOftenAsTheGainHasTheRightSign() throws Exception {
    UncertaintyStudy.Answer a =
        run(
            read(
                "",
                "2 ms",
                "  samples: 400\n  inputs: {flames.main.response.gain: {normal: 0.05}}"));

    assertThat(a.certified()).isTrue();
    assertThat(a.modes()).hasSize(1);
    ModeStatistics m = a.modes().get(0);
    // ωτ = 0.4π: the flame damps with a gain above zero or drives, whichever; n = 0.05 ± 0.05
    boolean drives = m.nominal().s().getReal() > 0;
    double p = new NormalDistribution(null, 0, 1).cumulativeProbability(drives ? 1 : -1);
    assertThat(m.grows()).isCloseTo(p, within(3.3 * Math.sqrt(p * (1 - p) / 400)));
    assertThat(m.interval()[0]).isLessThan(m.grows());
    assertThat(m.first()).isCloseTo(m.grows(), within(0.01));
    assertThat(m.second().orElseThrow()).isCloseTo(m.grows(), within(0.01));
    assertThat(m.shares()[0]).isCloseTo(1, within(0.01));
    assertThat(a.quiet()).isEqualTo(400 - (int) Math.round(m.grows() * 400));
  }

  /** The root of the relation above near a start, by Newton with a difference quotient. */
  private static Complex root(double n, double y, double tau) {
    Complex s = new Complex(0, Math.PI * C / 2);
    for (int k = 0; k < 60; k++) {
      Complex f = relation(s, n, y, tau);
      Complex d = relation(s.add(1e-3), n, y, tau).subtract(f).divide(1e-3);
      s = s.subtract(f.divide(d));
    }
    return s;
  }

  private static Complex relation(Complex s, double n, double y, double tau) {
    Complex a = s.multiply(0.3 / C);
    Complex b = s.multiply(0.7 / C);
    double theta = (GAMMA - 1) / (GAMMA * 1e5) * 700 / (0.1 * 0.02) * n;
    Complex flame = s.multiply(-tau).exp().multiply(theta).add(1);
    Complex left = a.cosh().add(a.sinh().multiply(y)).multiply(b.cosh());
    return left.add(flame.multiply(a.sinh().add(a.cosh().multiply(y))).multiply(b.sinh()));
  }

  @Test
  void sharesOfTheVariance_areThoseOfTheDispersionRelation() throws Exception {
    UncertaintyStudy.Answer a =
        run(
            read(
                ", inlet: {admittance: 0.02}",
                "2 ms",
                """
                  samples: 300
                  inputs:
                    flames.main.response.gain: {normal: 0.02}
                    walls.inlet.admittance: {uniform: 0.02}
                """));

    double dn = (root(0.051, 0.02, 2e-3).getReal() - root(0.049, 0.02, 2e-3).getReal()) / 2e-3;
    double dy = (root(0.05, 0.021, 2e-3).getReal() - root(0.05, 0.019, 2e-3).getReal()) / 2e-3;
    double gain = Math.pow(dn * 0.02, 2);
    double wall = Math.pow(dy * 0.02, 2) / 3; // variance of a uniform half width
    ModeStatistics m = a.modes().get(0);
    assertThat(m.nominal().s().getReal())
        .isCloseTo(root(0.05, 0.02, 2e-3).getReal(), within(0.05)); // mesh of 20 mm
    // variances of 300 samples scatter by 8 %
    assertThat(m.shares()[0]).isCloseTo(gain / (gain + wall), within(0.1));
    assertThat(m.shares()[1]).isCloseTo(wall / (gain + wall), within(0.1));
    assertThat(m.explained()).isGreaterThan(0.99);
    assertThat(m.growth()[1])
        .isCloseTo(Math.sqrt(gain + wall), within(0.1 * Math.sqrt(gain + wall)));
  }

  @Test
  void sharesOfCorrelatedInputs_addUpToWhatTheRegressionExplains() throws Exception {
    UncertaintyStudy.Answer a =
        run(
            read(
                ", inlet: {admittance: 0.02}",
                "2 ms",
                """
                  samples: 100
                  inputs:
                    flames.main.response.gain: {normal: 0.02}
                    walls.inlet.admittance: {uniform: 0.02}
                  correlated:
                    - {between: [flames.main.response.gain, walls.inlet.admittance], coefficient: 0.9}
                """));

    ModeStatistics m = a.modes().get(0);
    // an identity of least squares: Var of the fit is the sum of b_i Cov(x_i, fit)
    assertThat(m.shares()[0] + m.shares()[1]).isCloseTo(m.explained(), within(1e-9));
  }

  @Test
  void uncertaintyOutsideStudies_isToldWhereItStands() throws Exception {
    Path file = folder.resolve("case.yaml");
    String study = "  inputs: {flames.main.response.gain: {normal: 3 %}}".indent(4);
    Files.writeString(file, String.format(DUCT, "", "2 ms", study) + "uncertainty: {samples: 9}\n");
    assertThatThrownBy(() -> CaseReader.read(file).orThrow())
        .hasMessageContaining("'uncertainty' is a study and stands under 'studies'");
  }

  @Test
  void parts_areTheWholeByteForByte() throws Exception {
    CaseFile c =
        read("", "2 ms", "  samples: 30\n  inputs: {flames.main.response.delay: {normal: 5 %}}");
    Path whole = folder.resolve("whole");
    Path parts = folder.resolve("parts");
    UncertaintyStudy one = new UncertaintyStudy(c, "test", Progress.SILENT);
    one.compute(whole, Slice.WHOLE);
    UncertaintyFiles.write(whole, one.finish(whole), "test");
    for (int i = 1; i <= 2; i++) {
      new UncertaintyStudy(c, "test", Progress.SILENT).compute(parts, new Slice(i, 2));
    }
    UncertaintyStudy merged = new UncertaintyStudy(c, "test", Progress.SILENT);
    assertThat(merged.missing(parts).complete()).isTrue();
    UncertaintyFiles.write(parts, merged.finish(parts), "test");
    for (String name :
        List.of(
            "uncertainty.csv",
            "uncertainty-samples.csv",
            "uncertainty.json",
            "uncertainty.svg",
            "uncertainty.html")) {
      assertThat(parts.resolve(name)).hasSameBinaryContentAs(whole.resolve(name));
    }
  }

  @Test
  void scatterOfASmallRing_agreesWithTheWholeRing_andWithFirstOrder() throws Exception {
    Path file = folder.resolve("case.yaml");
    Files.writeString(
        file,
        """
        annulet: 1
        title: small ring with flames
        geometry:
          kind: ring
          burner_count: 6
          mesh_size: 80 mm
          mesh_size_at: {burners: 40 mm}
          zones:
            - {name: burners, shape: ducts,   mean_radius: 300 mm, bore: 60 mm, length: 100 mm}
            - {name: chamber, shape: annulus, mean_radius: 300 mm, gap: 110 mm, length: 250 mm}
        gas:
          mean_pressure: 10 bar
          zones:
            burners: {temperature: 650 K, gamma: 1.37, gas_constant: 287 J/(kg K)}
            chamber: {temperature: 1700 K, gamma: 1.29, gas_constant: 297 J/(kg K)}
        walls: {chamber.downstream: {admittance: 0.04}, burners.upstream: {impedance: 0.4}}
        flames:
          main:
            heat_release: 6 MW
            place: {sheet: burners.outlet}
            reference_velocity: 50 m/s
            response: {gain: 0.7, delay: 2.2 ms}
        window: {frequency: [250 Hz, 1000 Hz], growth_rate: [-500, 400, 1/s]}
        studies:
          uncertainty:
            samples: 200
            burner_scatter: {main: {gain: {uniform: 1 %}, delay: {triangular: 0.01 ms}}}
        """);

    UncertaintyStudy.Answer a = run(CaseReader.read(file).orThrow());

    assertThat(a.certified()).isTrue();
    assertThat(a.difference()).isLessThan(1e-9);
    assertThat(a.modes()).hasSizeGreaterThan(3);
    Draws draws = new Draws(1, java.util.Collections.nCopies(12, Shape.UNIFORM), List.of());
    for (int i = 0; i < 5; i++) {
      double[] x = draws.sample(i);
      double[] first = a.engine().first(x);
      Sample sample = a.engine().at(x);
      for (int k = 0; k < first.length; k++) {
        double moved = sample.members().get(k).getReal() - a.modes().get(k).nominal().s().getReal();
        double foretold = first[k] - a.modes().get(k).nominal().s().getReal();
        // one per cent of scatter: second order is a few per cent of first
        assertThat(foretold).isCloseTo(moved, within(0.1 * Math.abs(moved) + 0.1));
      }
    }
  }

  @Test
  void draws_haveTheMomentsOfTheirShapes_andTheCorrelationAsked() {
    Draws draws =
        new Draws(
            7,
            List.of(Shape.NORMAL, Shape.UNIFORM, Shape.TRIANGULAR, Shape.NORMAL),
            List.of(new Correlation(0, 3, -0.6)));
    int n = 20000;
    double[][] x = new double[4][n];
    for (int i = 0; i < n; i++) {
      double[] s = draws.sample(i);
      for (int k = 0; k < 4; k++) {
        x[k][i] = s[k];
      }
    }
    Shape[] shapes = {Shape.NORMAL, Shape.UNIFORM, Shape.TRIANGULAR};
    double[] deviation = {1, 1 / Math.sqrt(3), 1 / Math.sqrt(6)}; // handbook moments
    for (int k = 0; k < 3; k++) {
      assertThat(StatUtils.mean(x[k])).isCloseTo(0, within(0.03));
      assertThat(Math.sqrt(StatUtils.variance(x[k]))).isCloseTo(deviation[k], within(0.015));
      assertThat(Draws.deviation(shapes[k])).isCloseTo(deviation[k], within(1e-12));
    }
    PearsonsCorrelation correlation = new PearsonsCorrelation();
    assertThat(correlation.correlation(x[0], x[3])).isCloseTo(-0.6, within(0.02));
    assertThat(correlation.correlation(x[0], x[1])).isCloseTo(0, within(0.03));
    assertThat(draws.sample(17)).isEqualTo(draws.sample(17)).isNotEqualTo(draws.sample(18));
  }

  @Test
  void seedsThatFollowEachOther_shareNoDraws() {
    List<Shape> shapes = java.util.Collections.nCopies(3, Shape.NORMAL);
    java.util.Set<Double> seen = new java.util.HashSet<>();
    for (long seed = 0; seed < 4; seed++) {
      for (int i = 0; i < 500; i++) {
        for (double x : new Draws(seed, shapes, List.of()).sample(i)) {
          seen.add(x);
        }
      }
    }
    assertThat(seen).hasSize(4 * 500 * 3);
  }

  @Test
  void inputsThatAreNoNumbers_andContradictions_areFaultsOfTheCase() throws Exception {
    assertThatThrownBy(() -> run(read("", "2 ms", "  inputs: {walls.outlet: {normal: 3 %}}")))
        .isInstanceOf(CaseFaultException.class)
        .hasMessageContaining("the case gives no number at 'walls.outlet'");
    assertThatThrownBy(
            () -> run(read("", "2 ms", "  inputs: {flames.main.response.delay: {normal: 3 mm}}")))
        .isInstanceOf(CaseFaultException.class)
        .hasMessageContaining("studies.uncertainty.inputs.flames.main.response.delay");
  }
}
