package org.annulet.solver.eigen;

import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.LowRankTerm;
import org.annulet.solver.operator.SparseTerm;
import org.annulet.solver.operator.SparseVector;
import org.annulet.solver.sparse.SymmetricPattern;

/**
 * Operators projected onto real columns, Qᵀ L(s) Q. Arrays that many operators hold (those of the
 * training points) are projected once. Thread-safe.
 */
final class RealProjections {
  private final double[][] q;
  private final Map<double[], double[][]> matrices = new IdentityHashMap<>();
  private final Map<SparseVector, double[]> vectors = new IdentityHashMap<>();

  /**
   * On a basis.
   *
   * @param q shape [columns][n], not to be modified
   * @param known operators whose arrays are worth remembering
   */
  RealProjections(double[][] q, List<AcousticOperator> known) {
    this.q = q;
    for (AcousticOperator op : known) {
      remember(op.pattern(), op.stiffness());
      remember(op.pattern(), op.mass());
      for (SparseTerm term : op.sparseTerms()) {
        remember(op.pattern(), term.values());
      }
      for (LowRankTerm term : op.lowRankTerms()) {
        term.left().forEach(v -> vectors.computeIfAbsent(v, this::product));
        term.right().forEach(v -> vectors.computeIfAbsent(v, this::product));
      }
    }
  }

  private void remember(SymmetricPattern pattern, double[] values) {
    matrices.computeIfAbsent(values, a -> form(pattern, a));
  }

  /** Qᵀ A Q, shape [columns][columns]; not to be modified. */
  double[][] of(SymmetricPattern pattern, double[] values) {
    double[][] before = matrices.get(values);
    return before != null ? before : form(pattern, values);
  }

  /** Qᵀ v, shape [columns]; not to be modified. */
  double[] of(SparseVector v) {
    double[] before = vectors.get(v);
    return before != null ? before : product(v);
  }

  int size() {
    return q.length;
  }

  private double[] product(SparseVector v) {
    double[] x = new double[q.length];
    for (int j = 0; j < x.length; j++) {
      x[j] = v.dot(q[j]);
    }
    return x;
  }

  private double[][] form(SymmetricPattern pattern, double[] values) {
    int r = q.length;
    double[][] out = new double[r][r];
    double[] y = new double[pattern.size()];
    for (int j = 0; j < r; j++) {
      java.util.Arrays.fill(y, 0);
      pattern.addProduct(values, q[j], 1, y);
      for (int i = 0; i <= j; i++) {
        double sum = 0;
        double[] x = q[i];
        for (int k = 0; k < y.length; k++) {
          sum += x[k] * y[k];
        }
        out[i][j] = out[j][i] = sum;
      }
    }
    return out;
  }

  /** Q x, {re, im}. */
  double[][] expand(double[] re, double[] im) {
    int n = q[0].length;
    double[][] out = new double[2][n];
    for (int j = 0; j < q.length; j++) {
      double a = re[j];
      double b = im[j];
      double[] x = q[j];
      for (int i = 0; i < n; i++) {
        out[0][i] += a * x[i];
        out[1][i] += b * x[i];
      }
    }
    return out;
  }
}
