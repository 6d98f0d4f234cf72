package org.annulet.solver.sparse;

/** The way in: analyses a pattern with the method that suits it. */
public final class SparseSolver {
  private SparseSolver() {}

  /**
   * Orders the unknowns and finds the shape of the factor.
   *
   * @param pattern where the matrices may be non-zero
   * @param coordinates a place for each unknown, which guides the ordering and never the result;
   *     several unknowns may share one; shape [2][n], or null where there are none; not kept
   * @throws IllegalArgumentException if the coordinates do not fit the pattern
   */
  public static SymmetricAnalysis analyse(SymmetricPattern pattern, double[][] coordinates) {
    if (coordinates != null
        && (coordinates.length != 2
            || coordinates[0].length != pattern.size()
            || coordinates[1].length != pattern.size())) {
      throw new IllegalArgumentException(
          "coordinates must have the shape [2]["
              + pattern.size()
              + "], one place for each unknown; or be null");
    }
    return new MultifrontalAnalysis(pattern, coordinates);
  }
}
