package org.annulet.solver.boundary;

import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.rational.PolynomialRatio;

/**
 * Pressure loss and inertia of a burner or swirler: p̂₁ − p̂₂ = (ζρū + sρℓ) û, û the same on both
 * sides; the linear part of Δp = ζρu²/2, with ρ of side 1.
 *
 * @param lossCoefficient ζ, not negative
 * @param meanVelocity ū in m/s that ζ refers to, not negative
 * @param effectiveLength ℓ in m, not negative
 */
public record FlowLoss(double lossCoefficient, double meanVelocity, double effectiveLength)
    implements TwoPort {
  /** Checks the numbers. */
  public FlowLoss {
    if (!(lossCoefficient >= 0 && meanVelocity >= 0 && effectiveLength >= 0)) {
      throw new IllegalArgumentException(
          "loss coefficient, velocity and length must not be negative, got "
              + lossCoefficient
              + ", "
              + meanVelocity
              + " m/s, "
              + effectiveLength
              + " m");
    }
    if (lossCoefficient * meanVelocity + effectiveLength == 0) {
      throw new IllegalArgumentException(
          "a two-port without loss and length joins nothing: leave it away");
    }
  }

  /**
   * The loss that goes with a mean pressure drop: ζ = 2Δp/(ρū²).
   *
   * @param pressureDrop Δp in Pa
   * @param density ρ in kg/m³
   * @param meanVelocity ū in m/s
   * @param effectiveLength ℓ in m
   */
  public static FlowLoss ofPressureDrop(
      double pressureDrop, double density, double meanVelocity, double effectiveLength) {
    double zeta = 2 * pressureDrop / (density * meanVelocity * meanVelocity);
    return new FlowLoss(zeta, meanVelocity, effectiveLength);
  }

  @Override
  public AnalyticFunction[][] mobility(EdgeGas first, EdgeGas second) {
    double[] z = {
      first.density() * lossCoefficient * meanVelocity, first.density() * effectiveLength
    };
    AnalyticFunction plus = new PolynomialRatio(new double[] {0, 1}, z);
    AnalyticFunction minus = new PolynomialRatio(new double[] {0, -1}, z);
    return new AnalyticFunction[][] {{plus, minus}, {minus, plus}};
  }
}
