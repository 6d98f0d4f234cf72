package org.annulet.solver.assembly;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.boundary.Impedance;
import org.annulet.solver.boundary.OpenEnd;
import org.annulet.solver.boundary.Wall;
import org.annulet.solver.derivative.FlameFading;
import org.annulet.solver.derivative.FlameFading.Origin;
import org.annulet.solver.eigen.PreparedOperator;
import org.annulet.solver.flame.Flame;
import org.annulet.solver.flame.Place;
import org.annulet.solver.flame.Reference;
import org.annulet.solver.flame.Side;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.operator.AcousticOperator;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Acoustic and flame-born modes of the ducts of rows D: c = 347 then 850 m/s, b = 0.3 m, L = 1 m.
 */
class FlameFadingTest {
  private static AcousticOperator duct(double jump, double tau, Wall inlet, Wall outlet) {
    Mesh mesh =
        Strips.flat(new double[] {0, 0.3, 1}, new int[] {12, 28}, new double[] {0, 0.01}, 1);
    ProblemBuilder b = new ProblemBuilder(mesh, new Plane(0.05), Gases.of(mesh, 347, 850));
    if (inlet != null) {
      b.wall("inlet", inlet);
    }
    return b.wall("outlet", outlet)
        .flame(
            new Flame(
                "main",
                new Place.Sheet("joint1"),
                new Reference.EdgeFlux("joint1", new Side.InZone("0"), 10),
                Gases.firing(jump, tau, 0.01 * 0.05 * 10)))
        .build()
        .operator();
  }

  private static FlameFading.Trace trace(AcousticOperator op, double f, double growth) {
    NearRoot r = NearRoot.of(op, f, growth);
    assertThat(r.frequency()).isCloseTo(f, within(0.02 * f));
    Mode mode = new Mode(r.growth(), r.frequency(), r.re, r.im, 1, 0, 1, Mode.Verdict.CONVERGED);
    return fading(op).trace(mode);
  }

  private static FlameFading fading(AcousticOperator op) {
    return new FlameFading(new PreparedOperator(op), t -> t.name().startsWith("flame "));
  }

  /**
   * Row D2 and D2.passive (188.93368 and 403.63855 Hz): two of the four roots go to passive modes,
   * checked by following the dispersion relation in the same way, see {@link #exact}.
   */
  @ParameterizedTest
  @CsvSource({
    "117.76789, -695.5768, 0",
    "202.19168, 83.4808, 188.93368",
    "408.20228, 92.9935, 403.63855",
    "528.38460, -829.1369, 0"
  })
  void closedOpenDuct_tellsAcousticFromFlameBorn(double f, double growth, double passive) {
    FlameFading.Trace trace = trace(duct(0.5, 3e-3, null, new OpenEnd()), f, growth);
    assertThat(trace.origin()).isEqualTo(passive > 0 ? Origin.ACOUSTIC : Origin.INTRINSIC);
    if (passive > 0) {
      Complex end = trace.passive().orElseThrow();
      assertThat(end.getImaginary() / (2 * Math.PI)).isCloseTo(passive, within(1e-3 * passive));
      assertThat(end.getReal()).isCloseTo(0, within(1e-6));
    }
    assertThat(exact(0.5, 3e-3, f, growth) < 0.01).isEqualTo(passive > 0);
  }

  /** Rows D6: between ends that do not reflect there is no acoustic mode at all. */
  @ParameterizedTest
  @CsvSource({"166.66667", "500"})
  void endsWithoutReflection_haveFlameBornModesOnly(double f) {
    Wall still = new Impedance(new Complex(1));
    FlameFading.Trace trace = trace(duct(5, 3e-3, still, still), f, 123.7297);
    assertThat(trace.origin()).isEqualTo(Origin.INTRINSIC);
  }

  /** c₂ cosh cosh + (1 + N e^{−sτ}) c₁ sinh sinh, closed inlet, open outlet. */
  private static Complex relation(Complex s, Complex jump, double tau) {
    Complex a = s.multiply(0.3 / 347);
    Complex b = s.multiply(0.7 / 850);
    Complex flame = s.multiply(-tau).exp().multiply(jump).add(1);
    return a.cosh()
        .multiply(b.cosh())
        .multiply(850)
        .add(flame.multiply(a.sinh()).multiply(b.sinh()).multiply(347));
  }

  private static Complex newton(Complex start, Complex jump, double tau) {
    Complex s = start;
    for (int k = 0; k < 40; k++) {
      Complex h = s.multiply(1e-6);
      Complex slope =
          relation(s.add(h), jump, tau)
              .subtract(relation(s.subtract(h), jump, tau))
              .divide(h.multiply(2));
      s = s.subtract(relation(s, jump, tau).divide(slope));
    }
    return s;
  }

  /** The exact branch in 4000 equal steps of ln N; how far it still moves at the end, over |s|. */
  private static double exact(double jump, double tau, double f, double growth) {
    Complex s = newton(new Complex(growth, 2 * Math.PI * f), new Complex(jump), tau);
    Complex last = s;
    for (int k = 1; k <= 4000; k++) {
      last = s;
      s = newton(s, new Complex(jump * Math.exp(-7.0 * k / 4000)), tau);
    }
    return s.subtract(last).abs() * 4000 / 7 / s.abs();
  }

  /**
   * Two branches meet where the relation and its slope vanish together. Found by a scan of N and τ
   * and Newton on (s, N, τ); modes at 1.5 times that N pass the place on their way.
   */
  @Test
  void pastAnExceptionalPoint_theOriginIsCalledAmbiguous() {
    double[] place = exceptional();
    double jump = place[2];
    double tau = place[3];
    Complex meeting = new Complex(place[0], place[1]);
    Complex near = newton(meeting.multiply(1.001), new Complex(1.01 * jump), tau);
    Complex other = newton(meeting.multiply(0.999), new Complex(1.01 * jump), tau);
    List<Origin> origins = new ArrayList<>();
    for (Complex start : List.of(near, other)) {
      Complex s = start;
      for (int k = 1; k <= 400; k++) {
        s = newton(s, new Complex(jump * (1.01 + 0.49 * k / 400)), tau);
      }
      AcousticOperator op = duct(1.5 * jump, tau, null, new OpenEnd());
      origins.add(trace(op, s.getImaginary() / (2 * Math.PI), s.getReal()).origin());
    }
    assertThat(origins).contains(Origin.AMBIGUOUS);
  }

  /** {Re s, Im s, N, τ} with relation = slope = 0, by Newton from a coarse start. */
  private static double[] exceptional() {
    for (double tau = 1.5e-3; tau < 5e-3; tau += 1e-4) {
      for (double growth : new double[] {-400, -200, 0}) {
        double[] x = {growth, 2 * Math.PI * 300, 0.4, tau};
        for (int k = 0; k < 60; k++) {
          double[] f = residual(x);
          double[][] j = new double[4][5];
          for (int c = 0; c < 4; c++) {
            double h = 1e-6 * Math.max(Math.abs(x[c]), c < 2 ? 1 : 1e-6);
            double[] y = x.clone();
            y[c] += h;
            double[] g = residual(y);
            for (int r = 0; r < 4; r++) {
              j[r][c] = (g[r] - f[r]) / h;
            }
          }
          for (int r = 0; r < 4; r++) {
            j[r][4] = -f[r];
          }
          double[] d = solve(j);
          for (int c = 0; c < 4; c++) {
            x[c] += d[c];
          }
        }
        double[] f = residual(x);
        boolean found = Math.hypot(f[0], f[1]) < 1e-6 && Math.hypot(f[2], f[3]) < 1e-6;
        if (found
            && x[1] > 600
            && x[1] < 4000
            && x[2] > 0.05
            && x[2] < 3
            && x[3] > 5e-4
            && x[3] < 8e-3) {
          return x;
        }
      }
    }
    throw new AssertionError("no exceptional point found");
  }

  private static double[] residual(double[] x) {
    Complex s = new Complex(x[0], x[1]);
    Complex n = new Complex(x[2]);
    Complex h = s.multiply(1e-5);
    Complex v = relation(s, n, x[3]);
    Complex slope =
        relation(s.add(h), n, x[3]).subtract(relation(s.subtract(h), n, x[3])).divide(2e-5);
    return new double[] {v.getReal(), v.getImaginary(), slope.getReal(), slope.getImaginary()};
  }

  private static double[] solve(double[][] a) {
    for (int c = 0; c < 4; c++) {
      int best = c;
      for (int r = c; r < 4; r++) {
        best = Math.abs(a[r][c]) > Math.abs(a[best][c]) ? r : best;
      }
      double[] t = a[best];
      a[best] = a[c];
      a[c] = t;
      for (int r = 0; r < 4; r++) {
        if (r != c) {
          double m = a[r][c] / a[c][c];
          for (int k = c; k < 5; k++) {
            a[r][k] -= m * a[c][k];
          }
        }
      }
    }
    return new double[] {
      a[0][4] / a[0][0], a[1][4] / a[1][1], a[2][4] / a[2][2], a[3][4] / a[3][3]
    };
  }

  @Test
  void modeOfAnotherMesh_isRefused() {
    FlameFading fading = fading(duct(0.5, 3e-3, null, new OpenEnd()));
    assertThat(fading.hasFlames()).isTrue();
    Mode wrong = new Mode(0, 1, new double[3], new double[3], 1, 0, 0, Mode.Verdict.CONVERGED);
    assertThatThrownBy(() -> fading.trace(wrong))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("modes of the same mesh");
  }
}
