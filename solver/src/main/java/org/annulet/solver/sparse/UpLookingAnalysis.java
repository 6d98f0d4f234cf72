package org.annulet.solver.sparse;

/**
 * The plain way: band ordering, elimination tree, and L row by row (up-looking; Davis, Direct
 * Methods for Sparse Linear Systems, 2006, section 4.8). For small problems, and the yardstick of
 * the fast one.
 */
public final class UpLookingAnalysis implements SymmetricAnalysis {
  private final SymmetricPattern pattern;
  private final PermutedRows rows;
  private final long[] columnStart;

  /** Analyses the pattern; connected or not. */
  public UpLookingAnalysis(SymmetricPattern pattern) {
    this.pattern = pattern;
    this.rows = PermutedRows.of(pattern, BandOrdering.order(Adjacency.of(pattern)));
    int n = pattern.size();
    int[] seen = new int[n];
    columnStart = new long[n + 1];
    for (int k = 0; k < n; k++) {
      seen[k] = k;
      for (int q = rows.start()[k]; q < rows.start()[k + 1]; q++) {
        for (int i = rows.column()[q]; seen[i] != k; i = rows.parent()[i]) {
          seen[i] = k;
          columnStart[i + 1]++;
        }
      }
    }
    for (int k = 0; k < n; k++) {
      columnStart[k + 1] += columnStart[k];
    }
  }

  @Override
  public SymmetricPattern pattern() {
    return pattern;
  }

  @Override
  public long factorEntries() {
    return columnStart[pattern.size()] + pattern.size();
  }

  @Override
  public long complexFactorBytes() {
    return 20L * factorEntries() + 64L * pattern.size();
  }

  @Override
  public RealFactor factorReal(double[] values) {
    return new UpLookingRealFactor(this, values);
  }

  @Override
  public ComplexFactor factorComplex(double[] re, double[] im) {
    return new UpLookingComplexFactor(this, re, im);
  }

  PermutedRows rows() {
    return rows;
  }

  /** First entry of each column of L below the diagonal, shape [n + 1]. */
  int[] columnStart() {
    int n = pattern.size();
    if (columnStart[n] > Integer.MAX_VALUE - 8) {
      throw new IllegalStateException(
          "factor of " + columnStart[n] + " entries is too large for the plain method");
    }
    int[] start = new int[n + 1];
    for (int k = 0; k <= n; k++) {
      start[k] = (int) columnStart[k];
    }
    return start;
  }

  /**
   * The columns where row k of L is not zero, each before those its elimination reaches.
   *
   * @param mark last row each column was seen in, shape [n], starts below zero
   * @param stack the columns, filled from {@code return value} to its end, shape [n]
   */
  int reach(int k, int[] mark, int[] stack) {
    int top = stack.length;
    mark[k] = k;
    for (int q = rows.start()[k]; q < rows.start()[k + 1]; q++) {
      int length = 0;
      for (int i = rows.column()[q]; mark[i] != k; i = rows.parent()[i]) {
        mark[i] = k;
        stack[length++] = i;
      }
      while (length > 0) {
        stack[--top] = stack[--length];
      }
    }
    return top;
  }
}
