package org.annulet.solver.rational;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import org.apache.commons.math3.complex.Complex;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.EigenDecomposition;
import org.apache.commons.math3.linear.RealMatrix;
import org.apache.commons.math3.linear.RealVector;
import org.apache.commons.math3.linear.SingularValueDecomposition;

/**
 * A stable real-rational function through a table.
 *
 * @param function the fit
 * @param error largest |fit − table| over the largest |table|
 */
public record VectorFit(PoleResidue function, double error) {
  private static final int ROUNDS = 12; // poles settle within a handful
  private static final double LIMIT_WEIGHT = 1e3; // of the value at zero against one row

  /**
   * The fit of lowest order that meets a tolerance, or the best one there is.
   *
   * @param table to be fitted
   * @param tolerance of {@link #error()}
   * @param largestOrder most poles allowed, at least 0; the table's length bounds it too
   */
  public static VectorFit of(Table table, double tolerance, int largestOrder) {
    return of(table, tolerance, largestOrder, OptionalDouble.empty());
  }

  /**
   * The same with a known value at zero frequency, which the fit takes to about 1e-6 of the largest
   * |table|.
   *
   * @param limit f(0); empty where only the table counts
   */
  public static VectorFit of(
      Table table, double tolerance, int largestOrder, OptionalDouble limit) {
    VectorFit best = null;
    int most = Math.min(largestOrder, (2 * table.frequency().length - 1) / 2);
    for (int order = 0; order <= most; order += order < 2 ? 1 : 2) {
      VectorFit fit = ofOrder(table, order, limit);
      if (best == null || fit.error < best.error) {
        best = fit;
      }
      if (best.error <= tolerance) {
        break;
      }
    }
    return best;
  }

  private static VectorFit ofOrder(Table table, int order, OptionalDouble limit) {
    int n = table.frequency().length; // s is measured in the top of the table
    Complex[] s = new Complex[n];
    for (int k = 0; k < n; k++) {
      s[k] = new Complex(0, table.frequency()[k] / table.highestFrequency());
    }
    Complex[] poles = start(order);
    PoleResidue best = null;
    double bestError = Double.POSITIVE_INFINITY;
    for (int round = 0; round < (order == 0 ? 1 : ROUNDS); round++) {
      PoleResidue f = residues(table, s, poles, limit);
      double error = 0;
      for (int k = 0; k < n; k++) {
        Complex at = new Complex(0, 2 * Math.PI * table.frequency()[k]);
        error = Math.max(error, f.value(at).subtract(table.value()[k]).abs());
      }
      error /= Math.max(table.largest(), Double.MIN_NORMAL);
      if (error < bestError) {
        best = f;
        bestError = error;
      }
      if (order > 0) {
        poles = relocated(table, s, poles);
      }
    }
    return new VectorFit(best, bestError);
  }

  /** Lightly damped pairs over the band; one real pole if the order is odd. Pairs adjacent. */
  private static Complex[] start(int order) {
    Complex[] poles = new Complex[order];
    int pairs = order / 2;
    for (int k = 0; k < pairs; k++) {
      double w = (k + 0.5) / pairs;
      poles[2 * k] = new Complex(-0.1 * w, w);
      poles[2 * k + 1] = poles[2 * k].conjugate();
    }
    if (order % 2 == 1) {
      poles[order - 1] = new Complex(-0.5);
    }
    return poles;
  }

  /** Value of real basis function k at s: two of them for a pair. */
  private static Complex basis(Complex[] poles, int k, Complex s) {
    Complex p = poles[k];
    Complex one = s.subtract(p).reciprocal();
    if (p.getImaginary() == 0) {
      return one;
    }
    if (p.getImaginary() > 0) {
      return one.add(s.subtract(p.conjugate()).reciprocal());
    }
    // the lower one of a pair: i/(s − p̄) − i/(s − p)
    Complex up = s.subtract(p.conjugate()).reciprocal();
    return up.subtract(one).multiply(Complex.I);
  }

  private static double[] leastSquares(double[][] rows, double[] right) {
    RealMatrix a = new Array2DRowRealMatrix(rows, false);
    int n = a.getColumnDimension();
    double[] scale = new double[n];
    for (int c = 0; c < n; c++) {
      scale[c] = a.getColumnVector(c).getNorm();
      if (scale[c] == 0) {
        scale[c] = 1;
      }
      a.setColumnVector(c, a.getColumnVector(c).mapDivide(scale[c]));
    }
    RealVector x =
        new SingularValueDecomposition(a).getSolver().solve(new ArrayRealVector(right, false));
    double[] out = x.toArray();
    for (int c = 0; c < n; c++) {
      out[c] /= scale[c];
    }
    return out;
  }

  private static PoleResidue residues(
      Table table, Complex[] s, Complex[] poles, OptionalDouble limit) {
    double unit = 2 * Math.PI * table.highestFrequency();
    int n = s.length;
    int m = poles.length;
    double[][] rows = new double[2 * n + (limit.isPresent() ? 1 : 0)][m + 1];
    double[] right = new double[rows.length];
    for (int k = 0; k < n; k++) {
      for (int c = 0; c < m; c++) {
        Complex b = basis(poles, c, s[k]);
        rows[2 * k][c] = b.getReal();
        rows[2 * k + 1][c] = b.getImaginary();
      }
      rows[2 * k][m] = 1;
      right[2 * k] = table.value()[k].getReal();
      right[2 * k + 1] = table.value()[k].getImaginary();
    }
    if (limit.isPresent()) {
      for (int c = 0; c < m; c++) {
        rows[2 * n][c] = LIMIT_WEIGHT * basis(poles, c, Complex.ZERO).getReal();
      }
      rows[2 * n][m] = LIMIT_WEIGHT;
      right[2 * n] = LIMIT_WEIGHT * limit.getAsDouble();
    }
    double[] x = leastSquares(rows, right);
    List<Complex> p = new ArrayList<>();
    List<Complex> r = new ArrayList<>();
    for (int c = 0; c < m; c++) {
      if (poles[c].getImaginary() == 0) {
        p.add(poles[c].multiply(unit));
        r.add(new Complex(x[c] * unit));
      } else {
        Complex residue = new Complex(x[c], x[c + 1]).multiply(unit);
        p.add(poles[c].multiply(unit));
        p.add(poles[c].conjugate().multiply(unit));
        r.add(residue);
        r.add(residue.conjugate());
        c++;
      }
    }
    return new PoleResidue(x[m], p, r);
  }

  /** Zeros of the fitted weight function become the next poles, mirrored if unstable. */
  private static Complex[] relocated(Table table, Complex[] s, Complex[] poles) {
    int n = s.length;
    int m = poles.length;
    double[][] rows = new double[2 * n][2 * m + 1];
    double[] right = new double[2 * n];
    for (int k = 0; k < n; k++) {
      Complex f = table.value()[k];
      for (int c = 0; c < m; c++) {
        Complex b = basis(poles, c, s[k]);
        Complex fb = b.multiply(f).negate();
        rows[2 * k][c] = b.getReal();
        rows[2 * k + 1][c] = b.getImaginary();
        rows[2 * k][m + 1 + c] = fb.getReal();
        rows[2 * k + 1][m + 1 + c] = fb.getImaginary();
      }
      rows[2 * k][m] = 1;
      right[2 * k] = f.getReal();
      right[2 * k + 1] = f.getImaginary();
    }
    double[] x = leastSquares(rows, right);
    double[][] h = new double[m][m];
    for (int c = 0; c < m; c++) {
      Complex p = poles[c];
      boolean pair = p.getImaginary() > 0;
      h[c][c] = p.getReal();
      if (pair) {
        h[c][c + 1] = p.getImaginary();
        h[c + 1][c] = -p.getImaginary();
        h[c + 1][c + 1] = p.getReal();
      }
      for (int k = 0; k < m; k++) {
        h[c][k] -= (pair ? 2 : 1) * x[m + 1 + k];
      }
      c += pair ? 1 : 0;
    }
    EigenDecomposition e = new EigenDecomposition(new Array2DRowRealMatrix(h, false));
    return ordered(e.getRealEigenvalues(), e.getImagEigenvalues());
  }

  private static Complex[] ordered(double[] re, double[] im) {
    List<Complex> out = new ArrayList<>();
    for (int k = 0; k < re.length; k++) {
      double damped = -Math.max(Math.abs(re[k]), 1e-6); // never on the axis itself
      if (Math.abs(im[k]) < 1e-12) {
        out.add(new Complex(damped));
      } else if (im[k] > 0) {
        out.add(new Complex(damped, im[k]));
        out.add(new Complex(damped, -im[k]));
      }
    }
    return out.toArray(new Complex[0]);
  }
}
