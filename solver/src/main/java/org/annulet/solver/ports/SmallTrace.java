package org.annulet.solver.ports;

/** tr A⁻¹B of small complex matrices on plain arrays. */
final class SmallTrace {
  private SmallTrace() {}

  /**
   * Eliminates in place with partial pivoting.
   *
   * @param m Re A, Im A, Re B, Im B, row by row; overwritten
   * @param out {re, im} of the trace; infinite where A is singular
   */
  static void of(int n, double[][] m, double[] out) {
    double[] ar = m[0];
    double[] ai = m[1];
    double[] br = m[2];
    double[] bi = m[3];
    for (int k = 0; k < n; k++) {
      int pivot = k;
      for (int i = k + 1; i < n; i++) {
        if (size(ar, ai, i * n + k) > size(ar, ai, pivot * n + k)) {
          pivot = i;
        }
      }
      double norm = size(ar, ai, pivot * n + k);
      if (norm == 0) {
        out[0] = Double.POSITIVE_INFINITY;
        out[1] = Double.POSITIVE_INFINITY;
        return;
      }
      swap(m, n, k, pivot);
      double ir = ar[k * n + k] / norm;
      double ii = -ai[k * n + k] / norm;
      for (int i = 0; i < n; i++) {
        if (i == k) {
          continue;
        }
        double fr = ar[i * n + k] * ir - ai[i * n + k] * ii;
        double fi = ar[i * n + k] * ii + ai[i * n + k] * ir;
        for (int j = k; j < n; j++) {
          ar[i * n + j] -= fr * ar[k * n + j] - fi * ai[k * n + j];
          ai[i * n + j] -= fr * ai[k * n + j] + fi * ar[k * n + j];
        }
        for (int j = 0; j < n; j++) {
          br[i * n + j] -= fr * br[k * n + j] - fi * bi[k * n + j];
          bi[i * n + j] -= fr * bi[k * n + j] + fi * br[k * n + j];
        }
      }
    }
    out[0] = 0;
    out[1] = 0;
    for (int k = 0; k < n; k++) {
      int q = k * n + k;
      double norm = size(ar, ai, q);
      out[0] += (br[q] * ar[q] + bi[q] * ai[q]) / norm;
      out[1] += (bi[q] * ar[q] - br[q] * ai[q]) / norm;
    }
  }

  private static double size(double[] re, double[] im, int q) {
    return re[q] * re[q] + im[q] * im[q];
  }

  private static void swap(double[][] m, int n, int a, int b) {
    if (a == b) {
      return;
    }
    for (double[] x : m) {
      for (int j = 0; j < n; j++) {
        double t = x[a * n + j];
        x[a * n + j] = x[b * n + j];
        x[b * n + j] = t;
      }
    }
  }
}
