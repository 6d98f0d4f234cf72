package org.annulet.solver.boundary;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.annulet.solver.operator.AnalyticFunction;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Parts of the laws of walls and ports, each against its own closed form. */
class WallLawsTest {
  private static final EdgeGas GAS = new EdgeGas(1.2, 340, 1.4);

  /** Δp = ζ ρū²/2, the definition of the loss coefficient. */
  @Test
  void lossCoefficient_isThePressureDropOverTheDynamicPressure() {
    FlowLoss loss = FlowLoss.ofPressureDrop(1.5 * 0.5 * 3 * 40 * 40, 3, 40, 0.02);
    assertThat(loss.lossCoefficient()).isCloseTo(1.5, within(1e-15));
    assertThat(loss.meanVelocity()).isEqualTo(40);
    assertThat(loss.effectiveLength()).isEqualTo(0.02);
  }

  /** Û = A (p̂₁ − p̂₂)/(ρζū + sρℓ): a loss alone and an inertia alone. */
  @Test
  void flowLoss_isResistanceAndInertiaInSeries() {
    Complex s = new Complex(-30, 900);
    Complex mobility = new FlowLoss(1.5, 40, 0.02).mobility(GAS, GAS)[0][0].value(s);
    Complex own = s.divide(s.multiply(1.2 * 0.02).add(1.2 * 1.5 * 40));
    assertThat(mobility.subtract(own).abs() / own.abs()).isLessThan(1e-13);
  }

  /** Flow into the mouth has its poles where r tanh(sl/c) = −1, with a resistance off the axis. */
  @ParameterizedTest
  @CsvSource({"0, 4", "0.05, 4", "0.6, 4", "1.8, 4"})
  void quarterWaveTube_itsPolesAreWhereItsFlowIsInfinite(double r, int expected) {
    double length = 0.25;
    double c = 800;
    AnalyticFunction flow =
        new QuarterWaveTube(0.5, c, new QuarterWaveTube.Mouth(3e-4, length, r)).flow();
    // four poles up to 2πf = 4πc/l·(1 − 1/8): 800, 2400 … Hz for r < 1, 1600, 3200 … for r > 1
    Complex lower = new Complex(-20_000, 100);
    Complex upper = new Complex(10, 2 * Math.PI * (r < 1 ? 6300 : 7000));
    List<Complex> poles = flow.poles(lower, upper);
    assertThat(poles).hasSize(expected);
    for (Complex p : poles) {
      Complex x = p.multiply(length / c);
      Complex zero = x.sinh().multiply(r).add(x.cosh());
      assertThat(zero.abs()).isLessThan(1e-12);
      double near = flow.value(p.add(new Complex(1e-3, 0))).abs();
      double away = flow.value(p.add(new Complex(100, 300))).abs();
      assertThat(near).isGreaterThan(1e4 * away); // a simple pole: 316 / 1e-3
    }
  }

  /** The slope of the flow against a central difference. */
  @ParameterizedTest
  @CsvSource({"0", "0.05", "1.8"})
  void quarterWaveTube_derivativeIsThatOfTheValue(double r) {
    AnalyticFunction flow =
        new QuarterWaveTube(0.5, 800, new QuarterWaveTube.Mouth(3e-4, 0.25, r)).flow();
    Complex s = new Complex(-80, 2 * Math.PI * 450);
    double h = 1e-2;
    Complex slope = flow.value(s.add(h)).subtract(flow.value(s.subtract(h))).divide(2 * h);
    assertThat(flow.derivative(s).subtract(slope).abs()).isLessThan(1e-7 * slope.abs());
  }

  /** The parts of a liner's impedance in series: the plate's mass and the cavity's cot. */
  @Test
  void liner_plateAndCavityAreInSeries() {
    Complex s = new Complex(-40, 2 * Math.PI * 600);
    double a = 1e-3;
    double d = 10e-3;
    Complex thin = impedance(new PerforatedLiner.Plate(a, d, 0), Double.POSITIVE_INFINITY, s);
    Complex thick = impedance(new PerforatedLiner.Plate(a, d, 2e-3), Double.POSITIVE_INFINITY, s);
    Complex backed = impedance(new PerforatedLiner.Plate(a, d, 0), 0.04, s);
    Complex mass = s.multiply(d * d / 340 * 2e-3 / (Math.PI * a * a));
    assertThat(thick.subtract(thin).subtract(mass).abs()).isLessThan(1e-12 * mass.abs());
    Complex x = s.multiply(0.04 / 340);
    Complex cavity = x.cosh().divide(x.sinh());
    assertThat(backed.subtract(thin).subtract(cavity).abs()).isLessThan(1e-12 * backed.abs());
    assertThat(new PerforatedLiner.Plate(a, d, 0).porosity()).isCloseTo(0.0314159, within(1e-7));
  }

  private static Complex impedance(PerforatedLiner.Plate plate, double depth, Complex s) {
    return new PerforatedLiner(plate, 20, depth).admittance(GAS).value(s).reciprocal();
  }
}
