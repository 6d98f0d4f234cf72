package org.annulet.solver.boundary;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.stream.Stream;
import org.annulet.solver.operator.AnalyticFunction;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** REFERENCE_VALUES rows F1 to F4 and F7; derivatives against central differences. */
class DamperTest {
  private static final double RHO = 2;
  private static final double C = 800;
  private static final double A = Math.PI * 0.005 * 0.005;

  private static ResonatorChain resonator(double length, double r) {
    return new ResonatorChain(RHO, C, List.of(new ResonatorChain.Stage(A, length, r, 50e-6)));
  }

  /** Mouth impedance over ρc. */
  private static Complex z(Damper damper, Complex s) {
    return s.divide(damper.flow().value(s)).multiply(damper.mouthArea() / (RHO * C));
  }

  /** Rows F1.0 to F1.3. */
  @ParameterizedTest
  @CsvSource({"0, 0, 1128.37917", "0.85, 0, 1024.74117", "0.85, 0.85, 945.25205"})
  void helmholtzFrequency(double outer, double inner, double expected) {
    double l = 0.02 + (outer + inner) * 0.005;
    assertThat(resonator(l, 0).firstStageFrequency()).isCloseTo(expected, within(1e-7 * expected));
  }

  @Test
  void helmholtzFrequency_withInteriorCorrection() {
    double l = 0.02 + (EndCorrection.PISTON + EndCorrection.intoVolume(0.25)) * 0.005;
    assertThat(l).isCloseTo(0.02716197, within(1e-7 * l));
    assertThat(resonator(l, 0).firstStageFrequency()).isCloseTo(968.25423, within(1e-4));
  }

  /** Rows F2. */
  @ParameterizedTest
  @CsvSource({"150, -1.299758, 0.963516", "500, -0.288081, 0.911753"})
  void resonatorImpedance(double f, double im, double reflection) {
    Complex z = z(resonator(0.0285, 0.05), new Complex(0, 2 * Math.PI * f));
    assertThat(z.getReal()).isCloseTo(0.05, within(1e-9));
    assertThat(z.getImaginary()).isCloseTo(im, within(1e-6));
    assertThat(z.subtract(1).divide(z.add(1)).abs()).isCloseTo(reflection, within(1e-6));
  }

  /** Rows F4: −cot(kl). */
  @ParameterizedTest
  @CsvSource({"500, -0.66817864", "700, -0.19891237", "900, 0.19891237"})
  void quarterWaveImpedance(double f, double im) {
    Damper tube = new QuarterWaveTube(RHO, C, new QuarterWaveTube.Mouth(A, 0.25, 0));
    Complex z = z(tube, new Complex(0, 2 * Math.PI * f));
    assertThat(z.getReal()).isCloseTo(0, within(1e-12));
    assertThat(z.getImaginary()).isCloseTo(im, within(1e-7));
  }

  /** Row F3: c/4l and three times as much, the poles of the flow without resistance. */
  @Test
  void quarterWavePoles() {
    AnalyticFunction flow =
        new QuarterWaveTube(RHO, C, new QuarterWaveTube.Mouth(A, 0.25, 0)).flow();
    List<Complex> poles =
        flow.poles(new Complex(-1, 2 * Math.PI * 10), new Complex(1, 2 * Math.PI * 2500));
    assertThat(poles).hasSize(2);
    assertThat(poles.get(0).getImaginary() / (2 * Math.PI)).isCloseTo(800, within(1e-8 * 800));
    assertThat(poles.get(1).getImaginary() / (2 * Math.PI)).isCloseTo(2400, within(1e-8 * 2400));
  }

  /** Rows F7. */
  @ParameterizedTest
  @CsvSource({"1.4, 0.1, 0.02, 0.96078431", "1.25, 0.2, 0.025, 0.95121951"})
  void chokedNozzle(double gamma, double mach, double admittance, double reflection) {
    double y =
        new ChokedNozzle(mach)
            .admittance(new EdgeGas(1, 1, gamma))
            .value(new Complex(0, 1000))
            .getReal();
    assertThat(y).isCloseTo(admittance, within(1e-12));
    assertThat((1 - y) / (1 + y)).isCloseTo(reflection, within(1e-8));
  }

  /** Two stages: the inner resonator hangs on the first volume; at its pole the value is large. */
  @Test
  void chain_hasTwoResonances_whereItSaysSo() {
    ResonatorChain chain =
        new ResonatorChain(
            RHO,
            C,
            List.of(
                new ResonatorChain.Stage(A, 0.03, 0.02, 40e-6),
                new ResonatorChain.Stage(0.5 * A, 0.03, 0.05, 60e-6)));
    List<Complex> poles =
        chain.flow().poles(new Complex(-2000, 100), new Complex(0, 2 * Math.PI * 3000));
    assertThat(poles).hasSize(2);
    for (Complex p : poles) {
      double near = chain.flow().value(p.multiply(1 + 1e-9)).abs();
      assertThat(near).isGreaterThan(1e6 * chain.flow().value(p.multiply(1.5)).abs());
      assertThat(p.getReal()).isNegative();
    }
  }

  static Stream<AnalyticFunction> functions() {
    return Stream.of(
        resonator(0.0285, 0.05).flow(),
        new QuarterWaveTube(RHO, C, new QuarterWaveTube.Mouth(A, 0.25, 0.1)).flow(),
        new QuarterWaveTube(RHO, C, new QuarterWaveTube.Mouth(A, 0.25, 2.5)).flow(),
        new FlowLoss(1.2, 50, 0.01)
            .mobility(new EdgeGas(2, 500, 1.4), new EdgeGas(1, 800, 1.3))[0][1]);
  }

  @ParameterizedTest
  @org.junit.jupiter.params.provider.MethodSource("functions")
  void derivative_isThatOfTheValue_andConjugationHolds(AnalyticFunction f) {
    for (Complex s : List.of(new Complex(-120, 3000), new Complex(40, 9000))) {
      Complex h = new Complex(1e-4 * s.abs());
      Complex difference = f.value(s.add(h)).subtract(f.value(s.subtract(h))).divide(h.multiply(2));
      assertThat(f.derivative(s).subtract(difference).abs())
          .isLessThan(1e-5 * difference.abs()); // h² of the difference
      assertThat(f.value(s.conjugate()).subtract(f.value(s).conjugate()).abs())
          .isLessThan(1e-13 * f.value(s).abs());
    }
  }

  /** Re Y ≥ 0 on the imaginary axis: a damper never drives. */
  @ParameterizedTest
  @org.junit.jupiter.params.provider.MethodSource("functions")
  void dampersTakeEnergyOut(AnalyticFunction f) {
    double sign = Math.signum(f.value(Complex.ONE).getReal()); // −1: cross term of a two-port
    for (int k = 1; k < 400; k++) {
      Complex s = new Complex(0, 50.0 * k);
      assertThat(sign * f.value(s).divide(s).getReal()).isGreaterThan(-1e-15);
    }
  }
}
