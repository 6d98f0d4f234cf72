package org.annulet.solver.eigen;

import java.util.Arrays;
import java.util.stream.IntStream;
import org.annulet.solver.operator.SparseTerm;
import org.annulet.solver.sparse.SymmetricPattern;

/** The non-zero entries of one wall's matrix A, a small part of the operator's pattern. */
final class WallMatrix {
  private final int[] row;
  private final int[] column;
  private final double[] value;

  WallMatrix(SymmetricPattern pattern, SparseTerm term) {
    int count = 0;
    for (double v : term.values()) {
      count += v != 0 ? 1 : 0;
    }
    row = new int[count];
    column = new int[count];
    value = new double[count];
    int next = 0;
    for (int i = 0; i < pattern.size(); i++) {
      for (int q = pattern.rowStart(i); q < pattern.rowStart(i + 1); q++) {
        if (term.values()[q] != 0) {
          row[next] = i;
          column[next] = pattern.column(q);
          value[next++] = term.values()[q];
        }
      }
    }
  }

  /** y += a · A x. */
  void addProduct(double a, double[] x, double[] y) {
    for (int q = 0; q < row.length; q++) {
      int i = row[q];
      int j = column[q];
      y[i] += a * value[q] * x[j];
      if (i != j) {
        y[j] += a * value[q] * x[i];
      }
    }
  }

  /** xᵀ A y. */
  double form(double[] x, double[] y) {
    double sum = 0;
    for (int q = 0; q < row.length; q++) {
      int i = row[q];
      int j = column[q];
      sum += value[q] * (i == j ? x[i] * y[i] : x[i] * y[j] + x[j] * y[i]);
    }
    return sum;
  }

  /** The rank of A: of its dense restriction to the unknowns it touches. */
  int rank() {
    int[] support =
        IntStream.concat(Arrays.stream(row), Arrays.stream(column)).distinct().sorted().toArray();
    int n = support.length;
    double[][] a = new double[n][n];
    for (int q = 0; q < row.length; q++) {
      int i = Arrays.binarySearch(support, row[q]);
      int j = Arrays.binarySearch(support, column[q]);
      a[i][j] = a[j][i] = value[q];
    }
    double largest = 0;
    for (int i = 0; i < n; i++) {
      largest = Math.max(largest, Math.abs(a[i][i]));
    }
    return eliminate(a, 1e-10 * largest);
  }

  private static int eliminate(double[][] a, double floor) {
    int n = a.length;
    int rank = 0;
    for (int c = 0; c < n; c++) {
      int best = rank;
      for (int i = rank; i < n; i++) {
        if (Math.abs(a[i][c]) > Math.abs(a[best][c])) {
          best = i;
        }
      }
      if (rank == n || !(Math.abs(a[best][c]) > floor)) {
        continue;
      }
      double[] t = a[best];
      a[best] = a[rank];
      a[rank] = t;
      for (int i = rank + 1; i < n; i++) {
        double m = a[i][c] / a[rank][c];
        if (m != 0) {
          for (int j = c; j < n; j++) {
            a[i][j] -= m * a[rank][j];
          }
        }
      }
      rank++;
    }
    return rank;
  }
}
