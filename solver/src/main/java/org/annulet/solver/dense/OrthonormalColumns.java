package org.annulet.solver.dense;

/**
 * An orthonormal basis of the column space by Gram–Schmidt, each column twice ("twice is enough",
 * Kahan and Parlett); columns that depend on earlier ones are left out.
 */
public final class OrthonormalColumns {
  private OrthonormalColumns() {}

  /**
   * Orthonormalises.
   *
   * @param a not modified
   * @param tolerance a column is dropped when what is new in it is below this share of its length
   * @return Q with Qᴴ Q = 1, shape rows × rank; null when no column is left
   */
  public static ComplexMatrix of(ComplexMatrix a, double tolerance) {
    ComplexMatrix q = a.copy();
    int rank = 0;
    for (int j = 0; j < a.columns(); j++) {
      double[] xr = a.re()[j].clone();
      double[] xi = a.im()[j].clone();
      double before = norm(xr, xi);
      if (!(before > 0) || Double.isInfinite(before)) {
        continue;
      }
      for (int pass = 0; pass < 2; pass++) {
        for (int k = 0; k < rank; k++) {
          removeComponent(q.re()[k], q.im()[k], xr, xi);
        }
      }
      double after = norm(xr, xi);
      if (after > tolerance * before) {
        for (int i = 0; i < xr.length; i++) {
          q.re()[rank][i] = xr[i] / after;
          q.im()[rank][i] = xi[i] / after;
        }
        rank++;
      }
    }
    return rank == 0 ? null : q.columnsFrom(0, rank);
  }

  private static void removeComponent(double[] qr, double[] qi, double[] xr, double[] xi) {
    double sr = 0;
    double si = 0;
    for (int i = 0; i < xr.length; i++) {
      sr += qr[i] * xr[i] + qi[i] * xi[i];
      si += qr[i] * xi[i] - qi[i] * xr[i];
    }
    ComplexMatrix.axpy(-sr, -si, qr, qi, xr, xi, 0);
  }

  private static double norm(double[] re, double[] im) {
    double sum = 0;
    for (int i = 0; i < re.length; i++) {
      sum += re[i] * re[i] + im[i] * im[i];
    }
    return Math.sqrt(sum);
  }
}
