package org.annulet.solver.eigen;

import org.annulet.solver.dense.ComplexEigen;
import org.annulet.solver.dense.ComplexLu;
import org.annulet.solver.dense.ComplexMatrix;
import org.annulet.solver.dense.OrthonormalColumns;
import org.apache.commons.math3.complex.Complex;

/**
 * Brings a cluster of roots to the stated backward error on the full operator: block inverse
 * iteration with a Newton step on the small problem projected onto the block.
 *
 * <pre>
 *   X = orth( L(σ)⁻¹ L′(σ) P ),   σ beside the cluster's mean
 *   Xᴴ L(s) X y = 0  solved near σ,   p = X y
 * </pre>
 *
 * <p>One factorisation a step; the block keeps exact pairs together. Where the members cannot be
 * told apart (distance below 1e-11 |s|), the mean is returned with an orthonormal basis.
 */
final class Polish {
  private static final int LARGEST_STEPS = 8;
  private static final double SAME = 1e-11;
  private final PreparedOperator prepared;
  private final double target;

  /**
   * A polished cluster; not converged where an error exceeds the bound.
   *
   * @param bound the backward error asked for, or where that is out of reach of rounding, four
   *     times what rounding alone leaves
   */
  record Polished(
      Complex[] values, ComplexMatrix vectors, double[] errors, double bound, int factorisations) {
    boolean converged(int j) {
      return errors[j] <= bound;
    }
  }

  Polish(PreparedOperator prepared, double target) {
    this.prepared = prepared;
    this.target = target;
  }

  Polished run(Complex[] start, ComplexMatrix basis) {
    Complex[] s = start;
    ComplexMatrix p = basis;
    Polished best = null;
    for (int k = 1; k <= LARGEST_STEPS; k++) {
      Complex mean = mean(s);
      if (!Double.isFinite(mean.abs())) {
        break;
      }
      ComplexMatrix x = prepared.derivativeTimes(mean, p);
      prepared.at(mean.add(beside(k).multiply(mean.abs()))).solve(x);
      ComplexMatrix q = OrthonormalColumns.of(x, 1e-12);
      if (q == null || q.columns() < s.length) {
        break;
      }
      ProjectedOperator small = ProjectedOperator.onComplex(prepared, q);
      s = new Complex[s.length];
      p = q.times(solveNear(small, mean, s));
      Polished now = judge(s, p, k);
      boolean better = best == null || largest(now.errors()) < largest(best.errors());
      boolean done = largest(now.errors()) <= now.bound();
      double gain = best == null ? 0 : largest(now.errors()) / largest(best.errors());
      best = better ? now : best;
      if (done || gain > 0.5 && k > 5) {
        break;
      }
    }
    return best != null ? best : judge(start, basis, 0);
  }

  /**
   * How far beside the mean to factorise in step k, relative. Close at first; further away and in
   * another direction if that did not do, since a factor without pivoting can lose digits at a
   * root.
   */
  private static Complex beside(int k) {
    double angle = 0.9 + 1.3 * (k - 1);
    double distance = Math.min(1e-8 * Math.pow(10, k - 1), 1e-5);
    return new Complex(Math.cos(angle), Math.sin(angle)).multiply(distance);
  }

  /** Roots of the small problem near σ into {@code s}; returns its vectors as columns. */
  private static ComplexMatrix solveNear(ProjectedOperator small, Complex sigma, Complex[] s) {
    ComplexMatrix value = small.value(sigma);
    new ComplexLu(small.derivative(sigma)).solve(value); // L′⁻¹L: its eigenvalues are σ − s
    ComplexEigen eigen = new ComplexEigen(value);
    ComplexMatrix y = eigen.vectors();
    for (int j = 0; j < s.length; j++) {
      s[j] = sigma.subtract(eigen.values()[j]);
    }
    Complex mean = mean(s);
    double spread = 0;
    for (Complex root : s) {
      spread = Math.max(spread, root.subtract(mean).abs());
    }
    if (spread <= SAME * mean.abs()) {
      java.util.Arrays.fill(s, mean);
      return ComplexMatrix.identity(s.length);
    }
    for (int j = 0; j < s.length; j++) {
      Complex refined = SmallNewton.refine(small, s[j], y.columnsFrom(j, 1));
      if (refined != null && refined.subtract(s[j]).abs() <= spread) {
        s[j] = refined;
      }
    }
    return y;
  }

  private Polished judge(Complex[] s, ComplexMatrix p, int factorisations) {
    double[] errors = new double[s.length];
    double floor = 0;
    for (int j = 0; j < s.length; j++) {
      errors[j] = prepared.backwardErrors(s[j], p.columnsFrom(j, 1))[0];
      if (Double.isNaN(errors[j])) {
        errors[j] = Double.POSITIVE_INFINITY;
      }
      floor = Math.max(floor, prepared.roundingFloor(s[j], p, j));
    }
    return new Polished(s, p, errors, Math.max(target, 4 * floor), factorisations);
  }

  private static double largest(double[] x) {
    double m = 0;
    for (double v : x) {
      m = Math.max(m, v);
    }
    return m;
  }

  private static Complex mean(Complex[] s) {
    Complex sum = Complex.ZERO;
    for (Complex x : s) {
      sum = sum.add(x);
    }
    return sum.divide(s.length);
  }
}
