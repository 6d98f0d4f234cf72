package org.annulet.solver.sparse;

/**
 * A determinant as logarithm of its modulus and its phase, since the number itself over- or
 * underflows.
 *
 * @param logModulus natural logarithm of |det|
 * @param phase arg det in radians, reduced to (−π, π]
 */
public record LogDeterminant(double logModulus, double phase) {
  /** The product of two determinants. */
  public LogDeterminant times(LogDeterminant other) {
    double p = phase + other.phase;
    double reduced = p - 2 * Math.PI * Math.ceil((p - Math.PI) / (2 * Math.PI));
    // Rounding may leave the last digit of π too much.
    return new LogDeterminant(
        logModulus + other.logModulus, Math.max(-Math.PI, Math.min(Math.PI, reduced)));
  }
}
