package org.annulet.solver.sparse;

import java.util.Arrays;

/** Complex symmetric L D Lᵀ row by row. */
final class UpLookingComplexFactor extends RefinedComplexFactor {
  private final int[] order;
  private final int[] start;
  private final int[] row;
  private final double[] lowerRe;
  private final double[] lowerIm;
  private final double[] pivotRe;
  private final double[] pivotIm;
  private final double growth;

  UpLookingComplexFactor(UpLookingAnalysis analysis, double[] re, double[] im) {
    super(analysis.pattern(), re, im);
    PermutedRows rows = analysis.rows();
    int n = rows.size();
    order = rows.order();
    start = analysis.columnStart();
    row = new int[start[n]];
    lowerRe = new double[start[n]];
    lowerIm = new double[start[n]];
    pivotRe = new double[n];
    pivotIm = new double[n];
    int[] next = start.clone();
    int[] mark = new int[n];
    Arrays.fill(mark, -1);
    int[] stack = new int[n];
    double[] yRe = new double[n];
    double[] yIm = new double[n];
    double largest = 1;
    for (int k = 0; k < n; k++) {
      int top = analysis.reach(k, mark, stack);
      for (int q = rows.start()[k]; q < rows.start()[k + 1]; q++) {
        yRe[rows.column()[q]] = re[rows.source()[q]];
        yIm[rows.column()[q]] = im[rows.source()[q]];
      }
      double dRe = re[rows.diagonal()[k]];
      double dIm = im[rows.diagonal()[k]];
      for (int t = top; t < n; t++) {
        int i = stack[t];
        double a = yRe[i];
        double b = yIm[i];
        yRe[i] = 0;
        yIm[i] = 0;
        for (int p = start[i]; p < next[i]; p++) {
          yRe[row[p]] -= lowerRe[p] * a - lowerIm[p] * b;
          yIm[row[p]] -= lowerRe[p] * b + lowerIm[p] * a;
        }
        double modulus = pivotRe[i] * pivotRe[i] + pivotIm[i] * pivotIm[i];
        double lRe = (a * pivotRe[i] + b * pivotIm[i]) / modulus;
        double lIm = (b * pivotRe[i] - a * pivotIm[i]) / modulus;
        dRe -= lRe * a - lIm * b;
        dIm -= lRe * b + lIm * a;
        row[next[i]] = k;
        lowerRe[next[i]] = lRe;
        lowerIm[next[i]++] = lIm;
        largest = Math.max(largest, Math.hypot(lRe, lIm));
      }
      double modulus = Math.hypot(dRe, dIm);
      if (modulus == 0 || !Double.isFinite(modulus)) {
        throw RefinedRealFactor.badPivot(order[k], modulus);
      }
      pivotRe[k] = dRe;
      pivotIm[k] = dIm;
    }
    growth = largest;
  }

  @Override
  void solveOnce(double[][] re, double[][] im) {
    int n = order.length;
    double[] xRe = new double[n];
    double[] xIm = new double[n];
    for (int c = 0; c < re.length; c++) {
      for (int k = 0; k < n; k++) {
        xRe[k] = re[c][order[k]];
        xIm[k] = im[c][order[k]];
      }
      for (int k = 0; k < n; k++) {
        for (int p = start[k]; p < start[k + 1]; p++) {
          xRe[row[p]] -= lowerRe[p] * xRe[k] - lowerIm[p] * xIm[k];
          xIm[row[p]] -= lowerRe[p] * xIm[k] + lowerIm[p] * xRe[k];
        }
      }
      for (int k = n - 1; k >= 0; k--) {
        double modulus = pivotRe[k] * pivotRe[k] + pivotIm[k] * pivotIm[k];
        double a = (xRe[k] * pivotRe[k] + xIm[k] * pivotIm[k]) / modulus;
        double b = (xIm[k] * pivotRe[k] - xRe[k] * pivotIm[k]) / modulus;
        for (int p = start[k]; p < start[k + 1]; p++) {
          a -= lowerRe[p] * xRe[row[p]] - lowerIm[p] * xIm[row[p]];
          b -= lowerRe[p] * xIm[row[p]] + lowerIm[p] * xRe[row[p]];
        }
        xRe[k] = a;
        xIm[k] = b;
        re[c][order[k]] = a;
        im[c][order[k]] = b;
      }
    }
  }

  @Override
  public LogDeterminant logDeterminant() {
    return logDeterminant(pivotRe, pivotIm);
  }

  @Override
  public double pivotGrowth() {
    return growth;
  }
}
