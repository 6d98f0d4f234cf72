package org.annulet.solver.flame;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.OptionalDouble;
import java.util.stream.Stream;
import org.annulet.solver.rational.Table;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

/** Rows G1, G2 and G4 of the reference values; derivatives against central differences. */
class ResponseTest {
  private static final Response SPREAD = new DelaySpread(1, 3e-3, 0.8e-3);

  static Stream<Response> responses() {
    return Stream.of(
        new NTau(0.7, 2e-3),
        SPREAD,
        new DelaySum(List.of(new NTau(1.2, 1.5e-3), new NTau(-0.4, 4e-3))),
        new LowPass(1.1, 2e-3, 180),
        FittedResponse.of(table(SPREAD, 51, 500), 1e-4, OptionalDouble.empty()));
  }

  /** Gain and unwrapped phase, rows G1. */
  @ParameterizedTest
  @CsvSource({
    "0, 1.00000000, 0",
    "50, 0.96891079, -0.942478",
    "100, 0.88132314, -1.884956",
    "200, 0.60331022, -3.769911",
    "300, 0.32078684, -5.654867"
  })
  void spreadOfDelays_onTheAxis(double f, double gain, double phase) {
    Complex v = SPREAD.value(new Complex(0, 2 * Math.PI * f));
    assertThat(v.abs()).isCloseTo(gain, within(1e-8));
    assertThat(Math.IEEEremainder(v.getArgument() - phase, 2 * Math.PI)).isCloseTo(0, within(1e-6));
  }

  /** Rows G2: the delay is taken at the complex s. */
  @ParameterizedTest
  @CsvSource({"100, 150, -0.52055265, -0.20458950", "-200, 250, 0.16735175, 0.82109294"})
  void spreadOfDelays_offTheAxis(double growth, double f, double re, double im) {
    Complex v = SPREAD.value(new Complex(growth, 2 * Math.PI * f));
    assertThat(v.getReal()).isCloseTo(re, within(1e-8));
    assertThat(v.getImaginary()).isCloseTo(im, within(1e-8));
  }

  /** Row G4 by our own fit: 51 samples, and the error off the axis still small. */
  @Test
  void fittedTable_holdsOffTheAxisToo() {
    FittedResponse fit = FittedResponse.of(table(SPREAD, 51, 500), 1e-6, OptionalDouble.empty());
    assertThat(fit.fitError()).isLessThan(1e-5);
    for (double growth : new double[] {-150, 0, 150}) {
      for (double f : new double[] {105, 205, 305}) {
        Complex s = new Complex(growth, 2 * Math.PI * f);
        assertThat(fit.value(s).subtract(SPREAD.value(s)).abs())
            .as("growth %s 1/s, %s Hz", growth, f)
            .isLessThan(1e-3);
      }
    }
    assertThat(fit.rational().poleList()).allMatch(p -> p.getReal() < 0);
  }

  /** The delay comes out of the phase, so that the order stays low. */
  @Test
  void pureDelay_isFoundAsOne() {
    FittedResponse fit =
        FittedResponse.of(table(new NTau(0.8, 2.5e-3), 40, 600), 1e-9, OptionalDouble.empty());
    assertThat(fit.delay()).isCloseTo(2.5e-3, within(1e-9));
    assertThat(fit.rational().poleList()).isEmpty();
    assertThat(fit.rational().constant()).isCloseTo(0.8, within(1e-9));
  }

  /** A table that begins at 60 Hz says nothing of zero frequency; the limit does. */
  @ParameterizedTest
  @CsvSource({"1", "0"})
  void limitAtZeroFrequency_isKept(double limit) {
    Response measured = new LowPass(0.93, 2e-3, 240);
    double[] f = new double[28];
    Complex[] v = new Complex[f.length];
    for (int k = 0; k < f.length; k++) {
      f[k] = 60 + 20 * k;
      v[k] = measured.value(new Complex(0, 2 * Math.PI * f[k]));
    }
    FittedResponse fit = FittedResponse.of(new Table(f, v), 0.01, OptionalDouble.of(limit));
    assertThat(fit.value(Complex.ZERO).getReal()).isCloseTo(limit, within(1e-4));
    assertThat(fit.fitError()).isLessThan(0.03);
  }

  @ParameterizedTest
  @MethodSource("responses")
  void derivative_isThatOfTheValue_andTheFunctionIsRealOnTheRealAxis(Response f) {
    for (Complex s : new Complex[] {new Complex(80, 700), new Complex(-120, 2100)}) {
      Complex h = new Complex(1e-3, 2e-3);
      Complex d = f.value(s.add(h)).subtract(f.value(s.subtract(h))).divide(h.multiply(2));
      assertThat(f.derivative(s).subtract(d).abs()).isLessThan(1e-7 * d.abs());
      assertThat(f.value(s.conjugate()).subtract(f.value(s).conjugate()).abs()).isLessThan(1e-12);
    }
  }

  @ParameterizedTest
  @MethodSource("responses")
  void phase_turnsByNoMoreThanTheLongestDelay(Response f) {
    double worst = 0;
    for (double hz = 10; hz < 450; hz += 5) {
      Complex s = new Complex(0, 2 * Math.PI * hz);
      worst = Math.max(worst, Math.abs(f.derivative(s).divide(f.value(s)).getReal()));
    }
    assertThat(worst).isLessThanOrEqualTo(f.longestDelay() * 1.0001);
  }

  private static Table table(Response f, int rows, double top) {
    double[] hz = new double[rows];
    Complex[] v = new Complex[rows];
    for (int k = 0; k < rows; k++) {
      hz[k] = top * k / (rows - 1);
      v[k] = f.value(new Complex(0, 2 * Math.PI * hz[k]));
    }
    return new Table(hz, v);
  }
}
