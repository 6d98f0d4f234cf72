package org.annulet.solver.sparse;

import java.util.Arrays;

/** Real L D Lᵀ row by row. */
final class UpLookingRealFactor extends RefinedRealFactor {
  private final int[] order;
  private final int[] start;
  private final int[] row;
  private final double[] lower;
  private final double[] pivot;
  private final double growth;

  UpLookingRealFactor(UpLookingAnalysis analysis, double[] values) {
    super(analysis.pattern(), values);
    PermutedRows rows = analysis.rows();
    int n = rows.size();
    order = rows.order();
    start = analysis.columnStart();
    row = new int[start[n]];
    lower = new double[start[n]];
    pivot = new double[n];
    int[] next = start.clone();
    int[] mark = new int[n];
    Arrays.fill(mark, -1);
    int[] stack = new int[n];
    double[] y = new double[n];
    double largest = 1;
    for (int k = 0; k < n; k++) {
      int top = analysis.reach(k, mark, stack);
      for (int q = rows.start()[k]; q < rows.start()[k + 1]; q++) {
        y[rows.column()[q]] = values[rows.source()[q]];
      }
      double d = values[rows.diagonal()[k]];
      for (int t = top; t < n; t++) {
        int i = stack[t];
        double yi = y[i];
        y[i] = 0;
        for (int p = start[i]; p < next[i]; p++) {
          y[row[p]] -= lower[p] * yi;
        }
        double l = yi / pivot[i];
        d -= l * yi;
        row[next[i]] = k;
        lower[next[i]++] = l;
        largest = Math.max(largest, Math.abs(l));
      }
      if (d == 0 || !Double.isFinite(d)) {
        throw badPivot(order[k], Math.abs(d));
      }
      pivot[k] = d;
    }
    growth = largest;
  }

  @Override
  void solveOnce(double[][] b) {
    int n = order.length;
    double[] x = new double[n];
    for (double[] column : b) {
      for (int k = 0; k < n; k++) {
        x[k] = column[order[k]];
      }
      for (int k = 0; k < n; k++) {
        for (int p = start[k]; p < start[k + 1]; p++) {
          x[row[p]] -= lower[p] * x[k];
        }
      }
      for (int k = n - 1; k >= 0; k--) {
        double sum = x[k] / pivot[k];
        for (int p = start[k]; p < start[k + 1]; p++) {
          sum -= lower[p] * x[row[p]];
        }
        x[k] = sum;
        column[order[k]] = sum;
      }
    }
  }

  @Override
  public int negativePivots() {
    return negative(pivot);
  }

  @Override
  public LogDeterminant logDeterminant() {
    return logDeterminant(pivot);
  }

  @Override
  public double pivotGrowth() {
    return growth;
  }
}
