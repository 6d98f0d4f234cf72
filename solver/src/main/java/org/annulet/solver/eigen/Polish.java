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
  private static final int LARGEST_CORRECTIONS = 4;
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

    boolean converged() {
      return largestError() <= bound;
    }

    double largestError() {
      double largest = 0;
      for (double e : errors) {
        largest = Math.max(largest, e);
      }
      return largest;
    }
  }

  Polish(PreparedOperator prepared, double target) {
    this.prepared = prepared;
    this.target = target;
  }

  Polished run(Complex[] start, ComplexMatrix basis) {
    Polished now = null;
    Polished best = null;
    for (int k = 1; k <= LARGEST_STEPS; k++) {
      Complex mean = mean(now == null ? start : now.values());
      if (!Double.isFinite(mean.abs())) {
        break;
      }
      OperatorAt beside = prepared.at(mean.add(beside(k).multiply(mean.abs())));
      ComplexMatrix x = prepared.derivativeTimes(mean, now == null ? basis : now.vectors());
      beside.solve(x);
      now = project(x, mean, start.length, k);
      if (now == null) {
        break;
      }
      now = correct(now, beside, k);
      double gain = best == null ? 0 : now.largestError() / best.largestError();
      best = best == null || gain < 1 ? now : best;
      if (best.converged() || gain > 0.5 && k > 5) {
        break;
      }
    }
    return best != null ? best : judge(start, basis, 0);
  }

  /**
   * Residual inverse iteration (Neumaier 1985): p ← p − L(σ)⁻¹ L(s) p on the factor at hand, as
   * long as that pays. Each step wins the factor |s − σ| over the distance to the next root, and
   * takes the rounding of the large solution of plain inverse iteration out of the vector.
   */
  private Polished correct(Polished start, OperatorAt beside, int factorisations) {
    Polished best = start;
    for (int i = 0; i < LARGEST_CORRECTIONS && !best.converged(); i++) {
      ComplexMatrix p = best.vectors().copy();
      ComplexMatrix r = new ComplexMatrix(p.rows(), p.columns());
      for (int j = 0; j < p.columns(); j++) {
        ComplexMatrix own = prepared.times(best.values()[j], p.columnsFrom(j, 1));
        System.arraycopy(own.re()[0], 0, r.re()[j], 0, p.rows());
        System.arraycopy(own.im()[0], 0, r.im()[j], 0, p.rows());
      }
      beside.solve(r);
      p.add(Complex.ONE.negate(), r);
      Polished next = project(p, mean(best.values()), p.columns(), factorisations);
      if (next == null || !(next.largestError() < 0.5 * best.largestError())) {
        break;
      }
      best = next;
    }
    return best;
  }

  /** Roots and vectors of the operator projected onto a block; null if the block lost a column. */
  private Polished project(ComplexMatrix block, Complex mean, int roots, int factorisations) {
    ComplexMatrix q = OrthonormalColumns.of(block, 1e-12);
    if (q == null || q.columns() < roots) {
      return null;
    }
    ProjectedOperator small = ProjectedOperator.onComplex(prepared, q);
    Complex[] s = new Complex[roots];
    ComplexMatrix p = q.times(solveNear(small, mean, s));
    return judge(s, p, factorisations);
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

  private static Complex mean(Complex[] s) {
    Complex sum = Complex.ZERO;
    for (Complex x : s) {
      sum = sum.add(x);
    }
    return sum.divide(s.length);
  }
}
