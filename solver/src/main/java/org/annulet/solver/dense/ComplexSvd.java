package org.annulet.solver.dense;

import java.util.Arrays;

/**
 * Thin singular value decomposition A = U Σ Wᴴ by one-sided Jacobi rotations: plane rotations of
 * the columns until all are orthogonal. Slow (about ten sweeps of n² rotations) and accurate even
 * for the small singular values.
 */
public final class ComplexSvd {
  private final ComplexMatrix u;
  private final ComplexMatrix w;
  private final double[] values;

  /**
   * Decomposes a matrix with at least as many rows as columns.
   *
   * @param a not modified, shape m × n, m ≥ n
   */
  public ComplexSvd(ComplexMatrix a) {
    int n = a.columns();
    if (a.rows() < n) {
      throw new IllegalArgumentException(
          "more columns than rows: " + a.rows() + "×" + n + "; decompose the adjoint");
    }
    ComplexMatrix b = a.copy();
    ComplexMatrix v = ComplexMatrix.identity(n);
    boolean turned = true;
    for (int sweep = 0; turned && sweep < 40; sweep++) {
      turned = false;
      for (int p = 0; p < n; p++) {
        for (int q = p + 1; q < n; q++) {
          turned |= rotate(b, v, p, q);
        }
      }
    }
    Integer[] order = new Integer[n];
    double[] norm = new double[n];
    for (int j = 0; j < n; j++) {
      order[j] = j;
      norm[j] = b.columnNorm(j);
    }
    Arrays.sort(order, (i, j) -> Double.compare(norm[j], norm[i]));
    u = new ComplexMatrix(a.rows(), n);
    w = new ComplexMatrix(n, n);
    values = new double[n];
    for (int j = 0; j < n; j++) {
      int from = order[j];
      values[j] = norm[from];
      double scale = norm[from] > 0 ? 1 / norm[from] : 0;
      ComplexMatrix.axpy(scale, 0, b.re()[from], b.im()[from], u.re()[j], u.im()[j], 0);
      ComplexMatrix.axpy(1, 0, v.re()[from], v.im()[from], w.re()[j], w.im()[j], 0);
    }
  }

  /** Singular values, descending, shape [n]. */
  public double[] values() {
    return values.clone();
  }

  /** Left singular vectors, m × n; the column of a zero singular value is zero. */
  public ComplexMatrix left() {
    return u;
  }

  /** Right singular vectors W, n × n. */
  public ComplexMatrix right() {
    return w;
  }

  /** Number of singular values above {@code tolerance} times the largest. */
  public int rank(double tolerance) {
    int rank = 0;
    while (rank < values.length && values[rank] > tolerance * values[0]) {
      rank++;
    }
    return rank;
  }

  private static boolean rotate(ComplexMatrix b, ComplexMatrix v, int p, int q) {
    double[] pr = b.re()[p];
    double[] pi = b.im()[p];
    double[] qr = b.re()[q];
    double[] qi = b.im()[q];
    double alpha = 0;
    double beta = 0;
    double gr = 0;
    double gi = 0;
    for (int i = 0; i < pr.length; i++) {
      alpha += pr[i] * pr[i] + pi[i] * pi[i];
      beta += qr[i] * qr[i] + qi[i] * qi[i];
      gr += pr[i] * qr[i] + pi[i] * qi[i];
      gi += pr[i] * qi[i] - pi[i] * qr[i];
    }
    double g = Math.hypot(gr, gi);
    if (!(g > 1e-15 * Math.sqrt(alpha) * Math.sqrt(beta)) || g < Double.MIN_NORMAL) {
      return false;
    }
    double zeta = (beta - alpha) / (2 * g);
    double t = Math.copySign(1, zeta) / (Math.abs(zeta) + Math.hypot(1, zeta));
    double c = 1 / Math.hypot(1, t);
    double er = c * t * gr / g;
    double ei = c * t * gi / g;
    turn(pr, pi, qr, qi, c, er, ei);
    turn(v.re()[p], v.im()[p], v.re()[q], v.im()[q], c, er, ei);
    return true;
  }

  /** p ← c p − ē q, q ← e p + c q. */
  private static void turn(
      double[] pr, double[] pi, double[] qr, double[] qi, double c, double er, double ei) {
    for (int i = 0; i < pr.length; i++) {
      double x = pr[i];
      double y = pi[i];
      double r = qr[i];
      double s = qi[i];
      pr[i] = c * x - (er * r + ei * s);
      pi[i] = c * y - (er * s - ei * r);
      qr[i] = c * r + (er * x - ei * y);
      qi[i] = c * s + (er * y + ei * x);
    }
  }
}
