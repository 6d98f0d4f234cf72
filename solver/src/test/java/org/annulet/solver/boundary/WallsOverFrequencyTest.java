package org.annulet.solver.boundary;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import java.util.function.UnaryOperator;
import java.util.stream.Stream;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.rational.RectangleZeros;
import org.annulet.solver.rational.Table;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

/** Liner, radiating end and fitted tables: rows C3 to C6, F5 and F6; passivity; derivatives. */
class WallsOverFrequencyTest {
  private static final EdgeGas GAS = new EdgeGas(2, 800, 1.3);

  static Stream<ReactingWall> walls() {
    PerforatedLiner.Plate plate = new PerforatedLiner.Plate(1e-3, 10e-3, 1e-3);
    return Stream.of(
        new PerforatedLiner(plate, 20, Double.POSITIVE_INFINITY),
        new PerforatedLiner(plate, 8, 0.04),
        RadiatingEnd.flanged(0.05),
        RadiatingEnd.unflanged(0.05),
        FittedWall.ofImpedance(resonant(), 1e-6));
  }

  /** z = 0.3 + (l/c)(s + w²/s), as in row C12. */
  private static Complex resonantZ(Complex s) {
    double w = 2 * Math.PI * 180;
    return s.add(s.reciprocal().multiply(w * w)).multiply(0.02 / 340).add(0.3);
  }

  private static Table resonant() {
    double[] f = new double[80];
    Complex[] z = new Complex[f.length];
    for (int k = 0; k < f.length; k++) {
      f[k] = 20 + 8 * k;
      z[k] = resonantZ(new Complex(0, 2 * Math.PI * f[k]));
    }
    return new Table(f, z);
  }

  /** Rows F5, Howe's conductivity: Γ and Δ at St. */
  @ParameterizedTest
  @CsvSource({
    "0.01, 0.00003394, 0.00785535",
    "0.1, 0.00388773, 0.07900758",
    "0.5, 0.12550595, 0.37812443",
    "1, 0.43224205, 0.55126060",
    "2, 0.80499046, 0.44662142",
    "5, 0.96964620, 0.19767262",
    "20, 0.99812382, 0.04996479"
  })
  void conductivityOfAHoleWithFlow(double strouhal, double gamma, double delta) {
    Complex k = RayleighConductivity.at(strouhal);
    assertThat(k.getReal()).isCloseTo(gamma, within(1e-8));
    assertThat(k.getImaginary()).isCloseTo(delta, within(1e-8));
    Complex fitted = RayleighConductivity.rational().value(new Complex(0, strouhal));
    assertThat(fitted.subtract(k).abs()).isLessThan(2e-4);
  }

  /** Rows F6: a = 1 mm, pitch 10 mm, U = 20 m/s, c = 800 m/s, no thickness, open behind: Re z. */
  @ParameterizedTest
  @CsvSource({"250, 1.582", "500, 1.566"})
  void homogenisedLiner(double f, double resistance) {
    PerforatedLiner liner =
        new PerforatedLiner(
            new PerforatedLiner.Plate(1e-3, 10e-3, 0), 20, Double.POSITIVE_INFINITY);
    Complex z = liner.admittance(GAS).value(new Complex(0, 2 * Math.PI * f)).reciprocal();
    assertThat(z.getReal()).isCloseTo(resistance, within(2e-3 * resistance));
  }

  /** Rows C3, C4 and C6 at low ka: end corrections, and radiation (ka)²/4 and (ka)²/2. */
  @Test
  void radiatingEnds_haveTheirCorrectionAndRadiation() {
    double ka = 0.02;
    Complex s = new Complex(0, ka * 800 / 0.05);
    Complex free = RadiatingEnd.unflanged(0.05).admittance(GAS).value(s).reciprocal();
    Complex flanged = RadiatingEnd.flanged(0.05).admittance(GAS).value(s).reciprocal();
    assertThat(free.getImaginary() / ka).isBetween(0.6122, 0.6133);
    assertThat(free.getReal()).isCloseTo(ka * ka / 4, within(2e-3 * ka * ka));
    assertThat(flanged.getImaginary() / ka).isBetween(0.8212, 0.8218);
    assertThat(flanged.getReal()).isCloseTo(ka * ka / 2, within(2e-3 * ka * ka));
  }

  @Test
  void fittedTable_isTheWallItCameFrom_offTheAxisToo_withItsPoles() {
    FittedWall wall = FittedWall.ofImpedance(resonant(), 1e-8);
    assertThat(wall.fitError()).isLessThan(1e-6);
    assertThat(wall.passive()).isTrue();
    AnalyticFunction y = wall.admittance(GAS);
    for (Complex s : new Complex[] {new Complex(-150, 900), new Complex(60, 2500)}) {
      Complex exact = resonantZ(s).reciprocal();
      assertThat(y.value(s).subtract(exact).abs()).isLessThan(1e-4 * exact.abs());
    }
    // z = 0: l s² + r c s + l w² = 0
    double real = -0.3 * 340 / (2 * 0.02);
    double w = 2 * Math.PI * 180;
    assertThat(real * real).isGreaterThan(w * w); // overdamped here: two real poles
    double root = Math.sqrt(real * real - w * w);
    assertThat(y.poles(new Complex(-1e4, -10), new Complex(0, 10)))
        .hasSize(2)
        .anySatisfy(p -> assertThat(p.getReal()).isCloseTo(real + root, within(5e-3 * root)))
        .anySatisfy(p -> assertThat(p.getReal()).isCloseTo(real - root, within(5e-3 * root)));
  }

  @Test
  void tableThatReflectsMoreThanItGets_isCalledActive() {
    double[] f = {0, 100, 200, 300, 400};
    Complex[] r = new Complex[5];
    for (int k = 0; k < 5; k++) {
      r[k] = new Complex(k == 2 ? 1.2 : 0.7);
    }
    FittedWall wall = FittedWall.ofReflection(new Table(f, r), 1e-3);
    assertThat(wall.passive()).isFalse();
    assertThat(wall.frequencyOfLargest()).isBetween(150.0, 250.0);
  }

  /** On the imaginary axis every one of them takes energy out. */
  @ParameterizedTest
  @MethodSource("walls")
  void walls_arePassive(ReactingWall wall) {
    AnalyticFunction y = wall.admittance(GAS);
    for (double f = 1; f < 20_000; f *= 1.03) {
      assertThat(y.value(new Complex(0, 2 * Math.PI * f)).getReal())
          .as("%s at %s Hz", wall, f)
          .isGreaterThanOrEqualTo(-1e-9);
    }
  }

  @ParameterizedTest
  @MethodSource("walls")
  void derivative_isThatOfTheValue(ReactingWall wall) {
    AnalyticFunction y = wall.admittance(GAS);
    for (Complex s : new Complex[] {new Complex(80, 1700), new Complex(-120, 3100)}) {
      Complex h = new Complex(0.02, 0.03);
      Complex d = y.value(s.add(h)).subtract(y.value(s.subtract(h))).divide(h.multiply(2));
      assertThat(y.derivative(s).subtract(d).abs()).isLessThan(1e-6 * d.abs() + 1e-12);
    }
  }

  /** A liner before a cavity resonates: the poles of its admittance are zeros of z. */
  @Test
  void polesOfAResonantLiner_areWhereItsImpedanceVanishes() {
    ReactingWall wall = new PerforatedLiner(new PerforatedLiner.Plate(1e-3, 6e-3, 2e-3), 2, 0.05);
    AnalyticFunction y = wall.admittance(GAS);
    Complex low = new Complex(-3000, 200);
    Complex high = new Complex(200, 20_000);
    assertThat(y.poles(low, high)).isNotEmpty();
    for (Complex p : y.poles(low, high)) {
      assertThat(y.value(p.add(new Complex(1e-4, 0))).abs()).isGreaterThan(1e3);
      assertThat(p.getReal()).isNegative();
    }
  }

  @Test
  void zerosInARectangle_areAllFound() {
    Random random = new Random(5);
    for (int k = 0; k < 20; k++) {
      int n = 1 + random.nextInt(9);
      Complex[] z = new Complex[n];
      for (int i = 0; i < n; i++) {
        z[i] = new Complex(random.nextDouble() * 2 - 1, random.nextDouble() * 2 - 1);
      }
      UnaryOperator<Complex> f =
          s -> {
            Complex v = s.multiply(0.3).exp();
            for (Complex w : z) {
              v = v.multiply(s.subtract(w));
            }
            return v;
          };
      var found = RectangleZeros.of(f, new Complex(-1.1, -1.1), new Complex(1.1, 1.1));
      assertThat(found).hasSize(n);
      for (Complex w : z) {
        assertThat(found).anySatisfy(q -> assertThat(q.subtract(w).abs()).isLessThan(1e-6));
      }
      assertThat(RectangleZeros.of(f, new Complex(2, 2), new Complex(3, 3))).isEmpty();
    }
  }
}
