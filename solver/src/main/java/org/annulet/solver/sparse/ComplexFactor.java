package org.annulet.solver.sparse;

/** The factor of a complex symmetric matrix; thread-safe. */
public interface ComplexFactor {
  /**
   * Solves A x = b for several right-hand sides, with one step of iterative refinement.
   *
   * @param re real parts of the right-hand sides, overwritten by the solutions, shape [columns][n]
   * @param im imaginary parts of the right-hand sides, overwritten by the solutions, shape
   *     [columns][n]
   * @return largest relative residual ‖b − A x‖₂/‖b‖₂ of the columns after refinement
   */
  double solve(double[][] re, double[][] im);

  /**
   * Solves A x = b without refinement and without a residual: half the cost of {@link #solve}, for
   * an iteration that checks its own result.
   *
   * @param re real parts of the right-hand sides, overwritten, shape [columns][n]
   * @param im imaginary parts of the right-hand sides, overwritten, shape [columns][n]
   */
  void solveUnrefined(double[][] re, double[][] im);

  /** The determinant of A. */
  LogDeterminant logDeterminant();

  /**
   * Largest |entry of L|: the pivot growth, large where the matrix is close to singular in a
   * leading block.
   */
  double pivotGrowth();
}
