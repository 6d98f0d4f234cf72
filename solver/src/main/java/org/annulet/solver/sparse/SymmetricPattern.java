package org.annulet.solver.sparse;

import java.util.Arrays;

/**
 * Where a symmetric sparse matrix may be non-zero: the lower triangle, row by row, columns
 * ascending, diagonal always present. Immutable; the values of any number of matrices live in plain
 * arrays beside it, shape [{@link #entryCount()}].
 */
public final class SymmetricPattern {
  private final int[] rowStart;
  private final int[] column;

  /**
   * A pattern from its compressed rows; the arrays are copied.
   *
   * @param rowStart first entry of each row, shape [n + 1]
   * @param column columns of the entries, ascending in each row, the last of row i being i
   * @throws IllegalArgumentException if a row is not ascending or lacks its diagonal
   */
  public SymmetricPattern(int[] rowStart, int[] column) {
    this.rowStart = rowStart.clone();
    this.column = column.clone();
    for (int i = 0; i + 1 < rowStart.length; i++) {
      if (rowStart[i + 1] <= rowStart[i] || column[rowStart[i + 1] - 1] != i) {
        throw new IllegalArgumentException("row " + i + " lacks its diagonal as last entry");
      }
      for (int q = rowStart[i] + 1; q < rowStart[i + 1]; q++) {
        if (column[q] <= column[q - 1]) {
          throw new IllegalArgumentException("row " + i + " is not ascending");
        }
      }
    }
  }

  /** Number of rows. */
  public int size() {
    return rowStart.length - 1;
  }

  /** Number of stored entries (lower triangle with diagonal). */
  public int entryCount() {
    return column.length;
  }

  /** First entry of row {@code i}; {@code rowStart(size())} is the number of entries. */
  public int rowStart(int i) {
    return rowStart[i];
  }

  /** Column of entry {@code q}. */
  public int column(int q) {
    return column[q];
  }

  /**
   * Index of the entry at (i, j) in either triangle.
   *
   * @return the index, or −1 where the pattern has no entry
   */
  public int entry(int i, int j) {
    int row = Math.max(i, j);
    int q = Arrays.binarySearch(column, rowStart[row], rowStart[row + 1], Math.min(i, j));
    return q < 0 ? -1 : q;
  }

  /**
   * y += a · A x for the symmetric matrix with these values.
   *
   * @param values of the lower triangle, not modified
   * @param x not modified, shape [n]
   * @param a factor
   * @param y added to, shape [n], not the same array as x
   */
  public void addProduct(double[] values, double[] x, double a, double[] y) {
    for (int i = 0; i < rowStart.length - 1; i++) {
      int last = rowStart[i + 1] - 1;
      double xi = a * x[i];
      double sum = 0;
      for (int q = rowStart[i]; q < last; q++) {
        int j = column[q];
        sum += values[q] * x[j];
        y[j] += values[q] * xi;
      }
      y[i] += a * sum + values[last] * xi;
    }
  }
}
