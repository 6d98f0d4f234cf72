package org.annulet.cases.compare;

import java.util.Arrays;

/** The assignment of rows to columns with the least sum of costs: Hungarian method, O(n²m). */
final class Assignment {
  private Assignment() {}

  /**
   * The best assignment.
   *
   * @param cost shape [n][m] with n ≤ m, all finite
   * @return column of each row, all different
   */
  static int[] cheapest(double[][] cost) {
    int n = cost.length;
    int m = n == 0 ? 0 : cost[0].length;
    if (n > m) {
      throw new IllegalArgumentException(n + " rows for " + m + " columns");
    }
    double[] u = new double[n + 1];
    double[] v = new double[m + 1];
    int[] rowOf = new int[m + 1]; // 0 is free; rows and columns count from 1
    int[] way = new int[m + 1];
    for (int i = 1; i <= n; i++) {
      rowOf[0] = i;
      int column = 0;
      double[] least = new double[m + 1];
      Arrays.fill(least, Double.POSITIVE_INFINITY);
      boolean[] used = new boolean[m + 1];
      do {
        used[column] = true;
        int row = rowOf[column];
        int next = 0;
        double delta = Double.POSITIVE_INFINITY;
        for (int j = 1; j <= m; j++) {
          if (!used[j]) {
            double reduced = cost[row - 1][j - 1] - u[row] - v[j];
            if (reduced < least[j]) {
              least[j] = reduced;
              way[j] = column;
            }
            if (least[j] < delta) {
              delta = least[j];
              next = j;
            }
          }
        }
        for (int j = 0; j <= m; j++) {
          if (used[j]) {
            u[rowOf[j]] += delta;
            v[j] -= delta;
          } else {
            least[j] -= delta;
          }
        }
        column = next;
      } while (rowOf[column] != 0);
      do {
        int before = way[column];
        rowOf[column] = rowOf[before];
        column = before;
      } while (column != 0);
    }
    int[] out = new int[n];
    for (int j = 1; j <= m; j++) {
      if (rowOf[j] > 0) {
        out[rowOf[j] - 1] = j - 1;
      }
    }
    return out;
  }

  static double total(double[][] cost, int[] columns) {
    double sum = 0;
    for (int i = 0; i < columns.length; i++) {
      sum += cost[i][columns[i]];
    }
    return sum;
  }
}
