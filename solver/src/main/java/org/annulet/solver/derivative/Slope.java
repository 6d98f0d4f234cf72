package org.annulet.solver.derivative;

import org.apache.commons.math3.complex.Complex;

/**
 * How an eigenvalue moves with one parameter θ.
 *
 * @param first ds/dθ in 1/s per unit of θ: real part growth rate, imaginary part angular frequency
 * @param second d²s/dθ² in 1/s per unit of θ squared; for a pair whose slopes are one, its diagonal
 *     in the basis at hand, whose mean alone has a meaning
 */
public record Slope(Complex first, Complex second) {
  /** Change of θ at which the second order reaches a tenth of the first: |δ| = 0.2 |ṡ|/|s̈|. */
  public double linearRange() {
    return 0.2 * first.abs() / second.abs();
  }
}
