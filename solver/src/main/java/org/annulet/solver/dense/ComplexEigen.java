package org.annulet.solver.dense;

import org.apache.commons.math3.complex.Complex;

/**
 * Eigenvalues and right eigenvectors of a general complex matrix: Householder reduction to
 * Hessenberg form, single-shift QR to Schur form T, back substitution on T.
 *
 * <p>About 25n³ complex operations. Backward stable: the eigenvalues are those of a matrix within a
 * few rounding errors of A in norm; a defective eigenvalue of order k is therefore good to the k-th
 * root of rounding only.
 */
public final class ComplexEigen {
  private static final double EPS = 0x1p-52;
  private final int n;
  private final double[][] tr; // [row][column], Hessenberg, then triangular
  private final double[][] ti;
  private final double[][] zr; // Z transposed: [column][row]
  private final double[][] zi;

  /**
   * Decomposes a matrix.
   *
   * @param a square, not modified
   * @throws IllegalArgumentException if an entry is not finite
   * @throws ArithmeticException if QR does not converge, which no finite matrix is known to provoke
   */
  public ComplexEigen(ComplexMatrix a) {
    n = a.rows();
    tr = new double[n][n];
    ti = new double[n][n];
    zr = new double[n][n];
    zi = new double[n][n];
    for (int j = 0; j < n; j++) {
      zr[j][j] = 1;
      for (int i = 0; i < n; i++) {
        tr[i][j] = a.re()[j][i];
        ti[i][j] = a.im()[j][i];
        if (!Double.isFinite(tr[i][j]) || !Double.isFinite(ti[i][j])) {
          throw new IllegalArgumentException("entry (" + i + ", " + j + ") is not finite");
        }
      }
    }
    toHessenberg();
    toTriangle();
  }

  /** The eigenvalues, shape [n], in the order QR delivered them. */
  public Complex[] values() {
    Complex[] w = new Complex[n];
    for (int i = 0; i < n; i++) {
      w[i] = new Complex(tr[i][i], ti[i][i]);
    }
    return w;
  }

  /** Right eigenvectors as columns, of Euclidean length 1, in the order of {@link #values()}. */
  public ComplexMatrix vectors() {
    ComplexMatrix v = new ComplexMatrix(n, n);
    double norm = 0;
    for (int i = 0; i < n; i++) {
      for (int j = i; j < n; j++) {
        norm = Math.max(norm, Math.hypot(tr[i][j], ti[i][j]));
      }
    }
    double least = Math.max(norm * EPS, Double.MIN_NORMAL);
    for (int k = 0; k < n; k++) {
      double[] yr = new double[n];
      double[] yi = new double[n];
      yr[k] = 1;
      for (int i = k - 1; i >= 0; i--) {
        double sr = 0;
        double si = 0;
        for (int j = i + 1; j <= k; j++) {
          sr -= tr[i][j] * yr[j] - ti[i][j] * yi[j];
          si -= tr[i][j] * yi[j] + ti[i][j] * yr[j];
        }
        double dr = tr[i][i] - tr[k][k];
        double di = ti[i][i] - ti[k][k];
        if (Math.hypot(dr, di) < least) {
          dr = least;
          di = 0;
        }
        double d = dr * dr + di * di;
        yr[i] = (sr * dr + si * di) / d;
        yi[i] = (si * dr - sr * di) / d;
      }
      for (int j = 0; j <= k; j++) {
        ComplexMatrix.axpy(yr[j], yi[j], zr[j], zi[j], v.re()[k], v.im()[k], 0);
      }
      v.scaleColumn(k, 1 / v.columnNorm(k));
    }
    return v;
  }

  private void toHessenberg() {
    double[] ur = new double[n];
    double[] ui = new double[n];
    for (int k = 0; k + 2 < n; k++) {
      double norm = 0;
      for (int i = k + 1; i < n; i++) {
        ur[i] = tr[i][k];
        ui[i] = ti[i][k];
        norm += ur[i] * ur[i] + ui[i] * ui[i];
      }
      norm = Math.sqrt(norm);
      double head = Math.hypot(ur[k + 1], ui[k + 1]);
      if (norm == 0 || norm == head) {
        continue;
      }
      double pr = head == 0 ? 1 : ur[k + 1] / head;
      double pi = head == 0 ? 0 : ui[k + 1] / head;
      ur[k + 1] += pr * norm;
      ui[k + 1] += pi * norm;
      double scale = 1 / (norm * (norm + head)); // 2/uᴴu
      for (int j = k; j < n; j++) { // T ← (I − scale u uᴴ) T
        double sr = 0;
        double si = 0;
        for (int i = k + 1; i < n; i++) {
          sr += ur[i] * tr[i][j] + ui[i] * ti[i][j];
          si += ur[i] * ti[i][j] - ui[i] * tr[i][j];
        }
        for (int i = k + 1; i < n; i++) {
          tr[i][j] -= scale * (ur[i] * sr - ui[i] * si);
          ti[i][j] -= scale * (ur[i] * si + ui[i] * sr);
        }
      }
      for (int i = 0; i < n; i++) { // T ← T (I − scale u uᴴ)
        double sr = 0;
        double si = 0;
        for (int j = k + 1; j < n; j++) {
          sr += tr[i][j] * ur[j] - ti[i][j] * ui[j];
          si += tr[i][j] * ui[j] + ti[i][j] * ur[j];
        }
        for (int j = k + 1; j < n; j++) {
          tr[i][j] -= scale * (sr * ur[j] + si * ui[j]);
          ti[i][j] -= scale * (si * ur[j] - sr * ui[j]);
        }
      }
      for (int i = 0; i < n; i++) { // Z ← Z (I − scale u uᴴ)
        double sr = 0;
        double si = 0;
        for (int j = k + 1; j < n; j++) {
          sr += zr[j][i] * ur[j] - zi[j][i] * ui[j];
          si += zr[j][i] * ui[j] + zi[j][i] * ur[j];
        }
        for (int j = k + 1; j < n; j++) {
          zr[j][i] -= scale * (sr * ur[j] + si * ui[j]);
          zi[j][i] -= scale * (si * ur[j] - sr * ui[j]);
        }
      }
      for (int i = k + 2; i < n; i++) {
        tr[i][k] = ti[i][k] = 0;
      }
    }
  }

  private void toTriangle() {
    int hi = n - 1;
    int steps = 0;
    while (hi > 0) {
      int lo = hi;
      while (lo > 0) {
        double size = l1(lo, lo) + l1(lo - 1, lo - 1);
        if (l1(lo, lo - 1) <= EPS * (size == 0 ? Double.MIN_NORMAL / EPS : size)) {
          tr[lo][lo - 1] = ti[lo][lo - 1] = 0;
          break;
        }
        lo--;
      }
      if (lo == hi) {
        hi--;
        steps = 0;
      } else {
        if (++steps > 60) {
          throw new ArithmeticException("QR did not converge on a matrix of size " + n);
        }
        qrStep(lo, hi, steps);
      }
    }
  }

  private double l1(int i, int j) {
    return Math.abs(tr[i][j]) + Math.abs(ti[i][j]);
  }

  private Complex shift(int hi, int steps) {
    if (steps % 12 == 11) { // a shift out of the ordinary breaks rare cycles
      return new Complex(tr[hi][hi] + l1(hi, hi - 1), ti[hi][hi]);
    }
    Complex a = new Complex(tr[hi - 1][hi - 1], ti[hi - 1][hi - 1]);
    Complex b = new Complex(tr[hi - 1][hi], ti[hi - 1][hi]);
    Complex c = new Complex(tr[hi][hi - 1], ti[hi][hi - 1]);
    Complex d = new Complex(tr[hi][hi], ti[hi][hi]);
    Complex half = a.subtract(d).multiply(0.5);
    Complex root = half.multiply(half).add(b.multiply(c)).sqrt();
    Complex plus = half.add(root);
    Complex minus = half.subtract(root);
    Complex far = plus.abs() > minus.abs() ? plus : minus;
    return far.abs() == 0 ? d : d.subtract(b.multiply(c).divide(far));
  }

  /** One explicit step on rows and columns lo..hi: T − σ = QR, T ← RQ + σ, by plane rotations. */
  private void qrStep(int lo, int hi, int steps) {
    Complex sigma = shift(hi, steps);
    double[] cos = new double[n];
    double[] sinR = new double[n];
    double[] sinI = new double[n];
    for (int i = lo; i <= hi; i++) {
      tr[i][i] -= sigma.getReal();
      ti[i][i] -= sigma.getImaginary();
    }
    for (int k = lo; k < hi; k++) {
      double ar = tr[k][k];
      double ai = ti[k][k];
      double br = tr[k + 1][k];
      double bi = ti[k + 1][k];
      double a = Math.hypot(ar, ai);
      double r = Math.hypot(a, Math.hypot(br, bi));
      double c = r == 0 ? 1 : a / r;
      double er = a == 0 ? 1 : ar / a;
      double ei = a == 0 ? 0 : ai / a;
      double sr = r == 0 ? 0 : (er * br + ei * bi) / r; // s = e · conj(b) / r
      double si = r == 0 ? 0 : (ei * br - er * bi) / r;
      cos[k] = c;
      sinR[k] = sr;
      sinI[k] = si;
      rotateRows(k, c, sr, si);
      tr[k + 1][k] = ti[k + 1][k] = 0;
    }
    for (int k = lo; k < hi; k++) {
      int last = Math.min(k + 1, hi);
      for (int i = 0; i <= last; i++) {
        rotate(tr[i], ti[i], k, cos[k], sinR[k], sinI[k]);
      }
      double[] xr = zr[k];
      double[] xi = zi[k];
      double[] yr = zr[k + 1];
      double[] yi = zi[k + 1];
      for (int i = 0; i < n; i++) {
        double pr = xr[i];
        double pi = xi[i];
        xr[i] = cos[k] * pr + (sinR[k] * yr[i] + sinI[k] * yi[i]);
        xi[i] = cos[k] * pi + (sinR[k] * yi[i] - sinI[k] * yr[i]);
        double qr = yr[i];
        yr[i] = cos[k] * qr - (sinR[k] * pr - sinI[k] * pi);
        yi[i] = cos[k] * yi[i] - (sinR[k] * pi + sinI[k] * pr);
      }
    }
    for (int i = lo; i <= hi; i++) {
      tr[i][i] += sigma.getReal();
      ti[i][i] += sigma.getImaginary();
    }
  }

  /** Rows k, k+1 ← [c, s; −s̄, c] · rows. */
  private void rotateRows(int k, double c, double sr, double si) {
    double[] xr = tr[k];
    double[] xi = ti[k];
    double[] yr = tr[k + 1];
    double[] yi = ti[k + 1];
    for (int j = k; j < n; j++) {
      double pr = xr[j];
      double pi = xi[j];
      xr[j] = c * pr + (sr * yr[j] - si * yi[j]);
      xi[j] = c * pi + (sr * yi[j] + si * yr[j]);
      double qr = yr[j];
      yr[j] = c * qr - (sr * pr + si * pi);
      yi[j] = c * yi[j] - (sr * pi - si * pr);
    }
  }

  /** Columns k, k+1 of one row ← row · [c, −s; s̄, c]. */
  private static void rotate(double[] xr, double[] xi, int k, double c, double sr, double si) {
    double pr = xr[k];
    double pi = xi[k];
    double qr = xr[k + 1];
    double qi = xi[k + 1];
    xr[k] = c * pr + (sr * qr + si * qi);
    xi[k] = c * pi + (sr * qi - si * qr);
    xr[k + 1] = c * qr - (sr * pr - si * pi);
    xi[k + 1] = c * qi - (sr * pi + si * pr);
  }
}
