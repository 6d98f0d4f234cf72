package org.annulet.solver.boundary;

import org.annulet.solver.operator.Analytic;
import org.annulet.solver.operator.AnalyticFunction;
import org.apache.commons.math3.complex.Complex;

/**
 * A constant specific impedance z = Z/(ρc) = p̂/(ρc û·n).
 *
 * @param value z in the upper half plane, dimensionless, not zero; its conjugate holds below
 */
public record Impedance(Complex value) implements ReactingWall {
  /** Checks that the impedance is finite and not zero. */
  public Impedance {
    if (!(value.abs() > 0) || value.isInfinite()) {
      throw new IllegalArgumentException(
          "specific impedance must be finite and not zero, got "
              + value
              + "; for z = 0 use an open end, for a hard wall a rigid one");
    }
  }

  @Override
  public AnalyticFunction admittance(EdgeGas gas) {
    return Analytic.constant(value.reciprocal());
  }
}
