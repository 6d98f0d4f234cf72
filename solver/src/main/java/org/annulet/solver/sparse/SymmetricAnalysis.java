package org.annulet.solver.sparse;

/**
 * What a factorisation needs to know of a {@link SymmetricPattern} once, before any values:
 * ordering, elimination tree, shape of the factor. Immutable and thread-safe: several
 * factorisations may run on one analysis at the same time.
 */
public interface SymmetricAnalysis {
  /** The pattern analysed. */
  SymmetricPattern pattern();

  /** Entries of L with its diagonal. */
  long factorEntries();

  /**
   * Bytes a complex factor and its work space will take; half of it for a real one.
   *
   * @return an upper bound in bytes
   */
  long complexFactorBytes();

  /**
   * A = L D Lᵀ for a real symmetric matrix.
   *
   * @param values lower triangle on the pattern, kept by reference for refinement and residuals: do
   *     not modify while in use
   * @throws ArithmeticException if a pivot is exactly zero or not finite
   */
  RealFactor factorReal(double[] values);

  /**
   * A = L D Lᵀ (transposed, not conjugated) for a complex symmetric matrix.
   *
   * @param re real part of the lower triangle, kept by reference
   * @param im imaginary part of the lower triangle, kept by reference
   * @throws ArithmeticException if a pivot is exactly zero or not finite
   */
  ComplexFactor factorComplex(double[] re, double[] im);
}
