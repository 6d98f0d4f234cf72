package org.annulet.solver.eigen;

import org.annulet.solver.dense.ComplexLu;
import org.annulet.solver.dense.ComplexMatrix;
import org.annulet.solver.sparse.ComplexFactor;
import org.annulet.solver.sparse.LogDeterminant;
import org.apache.commons.math3.complex.Complex;

/**
 * L(s) = A + U Φ Vᵀ at one s: the sparse part factorised once, the low-rank terms by the Woodbury
 * identity.
 *
 * <pre>
 *   W = A⁻¹U,  S = 1 + Φ VᵀW,   L⁻¹b = x − W S⁻¹ Φ Vᵀx  with x = A⁻¹b,   det L = det A · det S
 *   L⁻ᵀb = x − Y T⁻¹ Φᵀ Uᵀx  with Y = A⁻¹V, T = 1 + Φᵀ UᵀY
 * </pre>
 *
 * <p>Not thread-safe while the first transposed solve or rate is under way; otherwise immutable.
 */
public final class OperatorAt {
  private static final double LARGEST_GROWTH = 100;

  private final PreparedOperator prepared;
  private final Complex s;
  private final ComplexFactor factor;
  private final ComplexMatrix phi;
  private final ComplexMatrix w; // A⁻¹U, null without low-rank terms
  private final ComplexMatrix g; // VᵀA⁻¹U
  private final ComplexLu small;
  private ComplexMatrix y; // A⁻¹V, on demand

  OperatorAt(PreparedOperator prepared, Complex s) {
    this.prepared = prepared;
    this.s = s;
    double[][] values = prepared.sparseValues(s);
    factor = prepared.analysis().factorComplex(values[0], values[1]);
    LowRank lowRank = prepared.lowRank();
    if (lowRank.isEmpty()) {
      phi = w = g = null;
      small = null;
    } else {
      phi = lowRank.coefficient(s);
      w = realColumns(LowRank.dense(lowRank.left(), prepared.size()));
      solveSparse(w);
      g = LowRank.transposeTimes(lowRank.right(), w);
      small = new ComplexLu(onePlus(phi.times(g)));
    }
  }

  /** Where. */
  public Complex s() {
    return s;
  }

  /** The pivot growth of the sparse factor. */
  public double pivotGrowth() {
    return factor.pivotGrowth();
  }

  /**
   * Solves L(s) x = b.
   *
   * @param b right-hand sides, overwritten by the solutions, shape n × columns
   */
  public void solve(ComplexMatrix b) {
    solveSparse(b);
    if (w != null) {
      ComplexMatrix z = phi.times(LowRank.transposeTimes(prepared.lowRank().right(), b));
      small.solve(z);
      b.add(Complex.ONE.negate(), w.times(z));
    }
  }

  /**
   * Solves L(s)ᵀ x = b (transposed, not conjugated), for left vectors.
   *
   * @param b right-hand sides, overwritten by the solutions, shape n × columns
   */
  public void solveTransposed(ComplexMatrix b) {
    solveSparse(b);
    if (w != null) {
      ComplexMatrix phiT = transpose(phi);
      ComplexMatrix z = phiT.times(LowRank.transposeTimes(prepared.lowRank().left(), b));
      // T = 1 + Φᵀ Uᵀ A⁻¹ V = 1 + Φᵀ Gᵀ
      new ComplexLu(onePlus(phiT.times(transpose(g)))).solve(z);
      b.add(Complex.ONE.negate(), responsesToRight().times(z));
    }
  }

  /** The determinant of L(s). */
  public LogDeterminant logDeterminant() {
    LogDeterminant d = factor.logDeterminant();
    return w == null ? d : d.times(small.logDeterminant());
  }

  /** The determinant of the sparse part alone. */
  public LogDeterminant sparseLogDeterminant() {
    return factor.logDeterminant();
  }

  /**
   * d/ds log det(1 + Φ VᵀA⁻¹U) = tr S⁻¹(Φ′G + ΦG′) with G′ = −(A⁻¹V)ᵀ A′ A⁻¹U: exact; zero without
   * low-rank terms.
   */
  public Complex smallRate() {
    if (w == null) {
      return Complex.ZERO;
    }
    ComplexMatrix loads = prepared.sparseDerivativeTimes(s, w);
    ComplexMatrix right = responsesToRight();
    ComplexMatrix slope = new ComplexMatrix(right.columns(), w.columns());
    for (int j = 0; j < w.columns(); j++) {
      for (int i = 0; i < right.columns(); i++) {
        slope.set(i, j, product(right, i, loads, j).negate());
      }
    }
    ComplexMatrix change = prepared.lowRank().coefficientDerivative(s).times(g);
    change.add(Complex.ONE, phi.times(slope));
    small.solve(change);
    Complex trace = Complex.ZERO;
    for (int i = 0; i < change.rows(); i++) {
      trace = trace.add(change.get(i, i));
    }
    return trace;
  }

  /**
   * A⁻¹b. Refined only where the pivots grew: elsewhere the plain solve has about the backward
   * error of the refined one, and whoever uses it checks the residual of the full operator.
   */
  private void solveSparse(ComplexMatrix b) {
    if (factor.pivotGrowth() < LARGEST_GROWTH) {
      factor.solveUnrefined(b.re(), b.im());
    } else {
      factor.solve(b.re(), b.im());
    }
  }

  private ComplexMatrix responsesToRight() {
    if (y == null) {
      ComplexMatrix v = realColumns(LowRank.dense(prepared.lowRank().right(), prepared.size()));
      solveSparse(v);
      y = v;
    }
    return y;
  }

  private static ComplexMatrix realColumns(double[][] columns) {
    return ComplexMatrix.onColumns(columns, new double[columns.length][columns[0].length]);
  }

  private static ComplexMatrix onePlus(ComplexMatrix a) {
    for (int i = 0; i < a.rows(); i++) {
      a.re()[i][i] += 1;
    }
    return a;
  }

  private static ComplexMatrix transpose(ComplexMatrix a) {
    ComplexMatrix t = new ComplexMatrix(a.columns(), a.rows());
    for (int i = 0; i < a.rows(); i++) {
      for (int j = 0; j < a.columns(); j++) {
        t.set(j, i, a.get(i, j));
      }
    }
    return t;
  }

  /** a_iᵀ b_j, not conjugated. */
  private static Complex product(ComplexMatrix a, int i, ComplexMatrix b, int j) {
    double re = 0;
    double im = 0;
    for (int k = 0; k < a.rows(); k++) {
      re += a.re()[i][k] * b.re()[j][k] - a.im()[i][k] * b.im()[j][k];
      im += a.re()[i][k] * b.im()[j][k] + a.im()[i][k] * b.re()[j][k];
    }
    return new Complex(re, im);
  }
}
