package org.annulet.solver.dense;

import org.annulet.solver.sparse.LogDeterminant;

/**
 * P A = L U with partial pivoting of a square complex matrix, for solves and the determinant.
 *
 * <p>Column by column, right-looking; about 8n³/3 real operations. An exactly zero pivot is
 * replaced by the smallest number the matrix can still feel, so that inverse iteration goes through
 * at an eigenvalue; {@link #isSingular()} tells.
 */
public final class ComplexLu {
  private final ComplexMatrix lu;
  private final int[] pivot;
  private final LogDeterminant determinant;
  private final boolean singular;

  /**
   * Factorises a matrix.
   *
   * @param a square; overwritten by the factors and kept
   */
  public ComplexLu(ComplexMatrix a) {
    if (a.rows() != a.columns()) {
      throw new IllegalArgumentException("not square: " + a.rows() + "×" + a.columns());
    }
    lu = a;
    int n = a.rows();
    pivot = new int[n];
    double[][] re = a.re();
    double[][] im = a.im();
    double largest = 0;
    for (int j = 0; j < n; j++) {
      for (int i = 0; i < n; i++) {
        largest = Math.max(largest, Math.abs(re[j][i]) + Math.abs(im[j][i]));
      }
    }
    double floor = largest > 0 ? largest * 1e-300 + Double.MIN_NORMAL : 1;
    double logModulus = 0;
    double phase = 0;
    boolean zeroPivot = false;
    for (int k = 0; k < n; k++) {
      int p = largestBelow(re[k], im[k], k);
      pivot[k] = p;
      if (p != k) {
        swapRows(re, im, k, p);
        phase += Math.PI;
      }
      double dr = re[k][k];
      double di = im[k][k];
      double d = Math.hypot(dr, di);
      if (!(d > floor)) {
        zeroPivot = true;
        dr = re[k][k] = Math.max(largest * 1e-18, Double.MIN_NORMAL);
        di = im[k][k] = 0;
        d = dr;
      }
      logModulus += Math.log(d);
      phase += Math.atan2(di, dr);
      double ir = dr / d / d;
      double ii = -di / d / d;
      for (int i = k + 1; i < n; i++) {
        double x = re[k][i];
        double y = im[k][i];
        re[k][i] = x * ir - y * ii;
        im[k][i] = x * ii + y * ir;
      }
      for (int j = k + 1; j < n; j++) {
        if (re[j][k] != 0 || im[j][k] != 0) {
          ComplexMatrix.axpy(-re[j][k], -im[j][k], re[k], im[k], re[j], im[j], k + 1);
        }
      }
    }
    singular = zeroPivot;
    determinant = new LogDeterminant(0, 0).times(new LogDeterminant(logModulus, phase));
  }

  /** Whether a pivot was exactly zero. */
  public boolean isSingular() {
    return singular;
  }

  /** The determinant of A. */
  public LogDeterminant logDeterminant() {
    return determinant;
  }

  /**
   * Solves A x = b.
   *
   * @param b right-hand sides, overwritten by the solutions
   */
  public void solve(ComplexMatrix b) {
    int n = lu.rows();
    double[][] re = lu.re();
    double[][] im = lu.im();
    for (int c = 0; c < b.columns(); c++) {
      double[] xr = b.re()[c];
      double[] xi = b.im()[c];
      for (int k = 0; k < n; k++) {
        swap(xr, k, pivot[k]);
        swap(xi, k, pivot[k]);
      }
      for (int k = 0; k < n; k++) {
        ComplexMatrix.axpy(-xr[k], -xi[k], re[k], im[k], xr, xi, k + 1);
      }
      for (int k = n - 1; k >= 0; k--) {
        double d = re[k][k] * re[k][k] + im[k][k] * im[k][k];
        double x = (xr[k] * re[k][k] + xi[k] * im[k][k]) / d;
        double y = (xi[k] * re[k][k] - xr[k] * im[k][k]) / d;
        xr[k] = x;
        xi[k] = y;
        double[] ur = re[k];
        double[] ui = im[k];
        for (int i = 0; i < k; i++) {
          xr[i] -= x * ur[i] - y * ui[i];
          xi[i] -= x * ui[i] + y * ur[i];
        }
      }
    }
  }

  private static int largestBelow(double[] re, double[] im, int k) {
    int best = k;
    double size = -1;
    for (int i = k; i < re.length; i++) {
      double s = re[i] * re[i] + im[i] * im[i];
      if (s > size) {
        size = s;
        best = i;
      }
    }
    return best;
  }

  private static void swapRows(double[][] re, double[][] im, int k, int p) {
    for (int j = 0; j < re.length; j++) {
      swap(re[j], k, p);
      swap(im[j], k, p);
    }
  }

  private static void swap(double[] x, int i, int j) {
    double t = x[i];
    x[i] = x[j];
    x[j] = t;
  }
}
