package org.annulet.solver.boundary;

import org.annulet.solver.operator.Analytic;
import org.annulet.solver.operator.AnalyticFunction;
import org.apache.commons.math3.complex.Complex;

/**
 * A constant specific admittance y = ρc û·n/p̂.
 *
 * @param value y in the upper half plane, dimensionless; its conjugate holds below
 */
public record Admittance(Complex value) implements ReactingWall {
  /** Checks that the admittance is finite. */
  public Admittance {
    if (value.isNaN() || value.isInfinite()) {
      throw new IllegalArgumentException(
          "specific admittance must be finite, got " + value + "; for y = ∞ use an open end");
    }
  }

  @Override
  public AnalyticFunction admittance(EdgeGas gas) {
    return Analytic.constant(value);
  }
}
