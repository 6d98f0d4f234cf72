package org.annulet.solver.sparse;

/** The factor of a real symmetric matrix; thread-safe. */
public interface RealFactor {
  /**
   * Solves A x = b for several right-hand sides, with one step of iterative refinement.
   *
   * @param b right-hand sides, overwritten by the solutions, shape [columns][n]
   * @return largest relative residual ‖b − A x‖₂/‖b‖₂ of the columns after refinement
   */
  double solve(double[]... b);

  /**
   * Solves A x = b without refinement and without a residual: half the cost of {@link #solve}, for
   * an iteration that checks its own result.
   *
   * @param b right-hand sides, overwritten by the solutions, shape [columns][n]
   */
  void solveUnrefined(double[]... b);

  /**
   * Number of negative pivots: the number of negative eigenvalues of A (Sylvester's law of
   * inertia).
   */
  int negativePivots();

  /** The determinant of A. */
  LogDeterminant logDeterminant();

  /**
   * Largest |entry of L|: the pivot growth, large where the matrix is close to singular in a
   * leading block.
   */
  double pivotGrowth();
}
