package org.annulet.solver.assembly;

import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.operator.LowRankTerm;
import org.annulet.solver.operator.SparseTerm;
import org.annulet.solver.operator.SparseVector;
import org.apache.commons.math3.complex.Complex;

/**
 * The eigenvalue nearest to a start value by nonlinear inverse iteration on the dense matrix: x =
 * L(s)⁻¹ L'(s) p, s ← s − (pᵀp)/(pᵀx). For small test problems; independent of the solver's own
 * search.
 */
final class NearRoot {
  final Complex s;
  final double[] re;
  final double[] im;

  private NearRoot(Complex s, double[] re, double[] im) {
    this.s = s;
    this.re = re;
    this.im = im;
  }

  double frequency() {
    return s.getImaginary() / (2 * Math.PI);
  }

  double growth() {
    return s.getReal();
  }

  static NearRoot of(AcousticOperator op, double frequency, double growth) {
    int n = op.size();
    Complex s = new Complex(growth, 2 * Math.PI * frequency);
    double[] pr = new double[n];
    double[] pi = new double[n];
    for (int i = 0; i < n; i++) {
      pr[i] = 1 + Math.sin(1.0 + 3.7 * i); // no symmetry
      pi[i] = Math.cos(2.0 + 1.3 * i);
    }
    for (int k = 0; k < 60; k++) {
      double[][] rhs = product(op, s, true, pr, pi);
      double[][] a = dense(op, s, false);
      solve(a, n, rhs);
      Complex pp = dot(pr, pi, pr, pi);
      Complex px = dot(pr, pi, rhs[0], rhs[1]);
      double norm = 0;
      for (int i = 0; i < n; i++) {
        norm = Math.max(norm, Math.hypot(rhs[0][i], rhs[1][i]));
      }
      for (int i = 0; i < n; i++) {
        pr[i] = rhs[0][i] / norm;
        pi[i] = rhs[1][i] / norm;
      }
      Complex step = pp.divide(px);
      if (k >= 4) { // first let the vector settle at the start value
        s = s.subtract(step);
        if (step.abs() < 1e-11 * s.abs()) {
          return new NearRoot(s, pr, pi);
        }
      }
    }
    throw new AssertionError("no root found from " + frequency + " Hz; last " + s);
  }

  private static Complex dot(double[] ar, double[] ai, double[] br, double[] bi) {
    double re = 0;
    double im = 0;
    for (int i = 0; i < ar.length; i++) {
      re += ar[i] * br[i] + ai[i] * bi[i]; // conj(a) b
      im += ar[i] * bi[i] - ai[i] * br[i];
    }
    return new Complex(re, im);
  }

  static double[][] product(
      AcousticOperator op, Complex s, boolean derivative, double[] xr, double[] xi) {
    int n = op.size();
    double[][] a = dense(op, s, derivative);
    double[][] y = new double[2][n];
    for (int i = 0; i < n; i++) {
      for (int k = 0; k < n; k++) {
        double ar = a[i][2 * k];
        double ai = a[i][2 * k + 1];
        y[0][i] += ar * xr[k] - ai * xi[k];
        y[1][i] += ar * xi[k] + ai * xr[k];
      }
    }
    return y;
  }

  /** L(s) or L'(s) as rows of interleaved re, im. */
  static double[][] dense(AcousticOperator op, Complex s, boolean derivative) {
    int n = op.size();
    double[][] a = new double[n][2 * n];
    addSparse(op, a, op.stiffness(), derivative ? Complex.ZERO : Complex.ONE);
    addSparse(op, a, op.mass(), derivative ? s.multiply(2) : s.multiply(s));
    for (SparseTerm term : op.sparseTerms()) {
      addSparse(op, a, term.values(), at(term.coefficient(), s, derivative));
    }
    for (LowRankTerm term : op.lowRankTerms()) {
      for (int i = 0; i < term.left().size(); i++) {
        for (int k = 0; k < term.right().size(); k++) {
          AnalyticFunction f = term.coefficient()[i][k];
          if (f == null) {
            continue;
          }
          Complex c = at(f, s, derivative);
          SparseVector u = term.left().get(i);
          SparseVector v = term.right().get(k);
          for (int p = 0; p < u.index().length; p++) {
            for (int q = 0; q < v.index().length; q++) {
              double w = u.value()[p] * v.value()[q];
              a[u.index()[p]][2 * v.index()[q]] += w * c.getReal();
              a[u.index()[p]][2 * v.index()[q] + 1] += w * c.getImaginary();
            }
          }
        }
      }
    }
    return a;
  }

  private static Complex at(AnalyticFunction f, Complex s, boolean derivative) {
    return derivative ? f.derivative(s) : f.value(s);
  }

  private static void addSparse(AcousticOperator op, double[][] a, double[] values, Complex c) {
    for (int i = 0; i < op.size(); i++) {
      for (int q = op.pattern().rowStart(i); q < op.pattern().rowStart(i + 1); q++) {
        int k = op.pattern().column(q);
        a[i][2 * k] += values[q] * c.getReal();
        a[i][2 * k + 1] += values[q] * c.getImaginary();
        if (k != i) {
          a[k][2 * i] += values[q] * c.getReal();
          a[k][2 * i + 1] += values[q] * c.getImaginary();
        }
      }
    }
  }

  /**
   * Roots less poles inside a rectangle, by the winding of the determinant over a fine contour.
   *
   * @param box lowest and highest frequency in Hz, lowest and highest growth rate in 1/s
   */
  static long winding(AcousticOperator op, double[] box) {
    double[][] corner = {
      {box[2], box[0]}, {box[3], box[0]}, {box[3], box[1]}, {box[2], box[1]}, {box[2], box[0]}
    };
    double turns = 0;
    double last = Double.NaN;
    int steps = 60;
    for (int side = 0; side < 4; side++) {
      for (int k = 0; k <= steps; k++) {
        double t = (double) k / steps;
        double growth = corner[side][0] + t * (corner[side + 1][0] - corner[side][0]);
        double f = corner[side][1] + t * (corner[side + 1][1] - corner[side][1]);
        double phase = phase(op, new Complex(growth, 2 * Math.PI * f));
        if (!Double.isNaN(last)) {
          turns += Math.IEEEremainder(phase - last, 2 * Math.PI);
        }
        last = phase;
      }
    }
    return Math.round(turns / (2 * Math.PI));
  }

  /** arg det L(s). */
  private static double phase(AcousticOperator op, Complex s) {
    int n = op.size();
    double[][] a = dense(op, s, false);
    double[][] none = new double[2][n];
    int swaps = solve(a, n, none);
    double phase = swaps % 2 == 0 ? 0 : Math.PI;
    for (int i = 0; i < n; i++) {
      phase += Math.atan2(a[i][2 * i + 1], a[i][2 * i]);
    }
    return phase;
  }

  /** Gauss with partial pivoting; overwrites a, and b with the solution; returns the row swaps. */
  private static int solve(double[][] a, int n, double[][] b) {
    int swaps = 0;
    for (int c = 0; c < n; c++) {
      int best = c;
      for (int r = c + 1; r < n; r++) {
        if (Math.hypot(a[r][2 * c], a[r][2 * c + 1])
            > Math.hypot(a[best][2 * c], a[best][2 * c + 1])) {
          best = r;
        }
      }
      swaps += best == c ? 0 : 1;
      double[] row = a[best];
      a[best] = a[c];
      a[c] = row;
      for (double[] part : b) {
        double x = part[best];
        part[best] = part[c];
        part[c] = x;
      }
      double pr = row[2 * c];
      double pi = row[2 * c + 1];
      double m = pr * pr + pi * pi;
      for (int r = c + 1; r < n; r++) {
        double[] other = a[r];
        double fr = (other[2 * c] * pr + other[2 * c + 1] * pi) / m;
        double fi = (other[2 * c + 1] * pr - other[2 * c] * pi) / m;
        if (fr == 0 && fi == 0) {
          continue;
        }
        for (int k = 2 * c; k < 2 * n; k += 2) {
          other[k] -= fr * row[k] - fi * row[k + 1];
          other[k + 1] -= fr * row[k + 1] + fi * row[k];
        }
        b[0][r] -= fr * b[0][c] - fi * b[1][c];
        b[1][r] -= fr * b[1][c] + fi * b[0][c];
      }
    }
    for (int r = n - 1; r >= 0; r--) {
      double xr = b[0][r];
      double xi = b[1][r];
      for (int k = r + 1; k < n; k++) {
        xr -= a[r][2 * k] * b[0][k] - a[r][2 * k + 1] * b[1][k];
        xi -= a[r][2 * k] * b[1][k] + a[r][2 * k + 1] * b[0][k];
      }
      double pr = a[r][2 * r];
      double pi = a[r][2 * r + 1];
      double m = pr * pr + pi * pi;
      b[0][r] = (xr * pr + xi * pi) / m;
      b[1][r] = (xi * pr - xr * pi) / m;
    }
    return swaps;
  }
}
