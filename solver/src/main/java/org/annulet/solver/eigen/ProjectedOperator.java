package org.annulet.solver.eigen;

import java.util.List;
import org.annulet.solver.dense.ComplexMatrix;
import org.annulet.solver.operator.SparseTerm;
import org.apache.commons.math3.complex.Complex;

/** Qᴴ L(s) Q for a tall basis Q: the same coefficients on small dense matrices. */
final class ProjectedOperator implements MatrixFunction {
  private final ComplexMatrix stiffness;
  private final ComplexMatrix mass;
  private final List<SparseTerm> terms;
  private final ComplexMatrix[] walls;
  private final LowRank lowRank;
  private final ComplexMatrix left; // QᴴU
  private final ComplexMatrix right; // VᵀQ

  /**
   * Projects onto real columns.
   *
   * @param q shape [columns][n], not modified
   */
  static ProjectedOperator onReal(PreparedOperator prepared, double[][] q) {
    return new ProjectedOperator(
        prepared, ComplexMatrix.onColumns(q, new double[q.length][q[0].length]), new RealForms());
  }

  /** Projects onto complex columns. */
  static ProjectedOperator onComplex(PreparedOperator prepared, ComplexMatrix q) {
    return new ProjectedOperator(prepared, q, new ComplexForms());
  }

  private ProjectedOperator(PreparedOperator prepared, ComplexMatrix q, Forms forms) {
    int n = prepared.size();
    var pattern = prepared.operator().pattern();
    stiffness =
        forms.of(
            q,
            (x, y) -> pattern.addProduct(prepared.operator().stiffness(), x, 1, y),
            new double[2][n]);
    mass =
        forms.of(
            q, (x, y) -> pattern.addProduct(prepared.operator().mass(), x, 1, y), new double[2][n]);
    terms = prepared.operator().sparseTerms();
    walls = new ComplexMatrix[terms.size()];
    for (int i = 0; i < walls.length; i++) {
      WallMatrix wall = prepared.walls().get(i);
      walls[i] = forms.of(q, (x, y) -> wall.addProduct(1, x, y), new double[2][n]);
    }
    lowRank = prepared.lowRank();
    if (lowRank.isEmpty()) {
      left = right = null;
    } else {
      right = LowRank.transposeTimes(lowRank.right(), q);
      ComplexMatrix utq = LowRank.transposeTimes(lowRank.left(), q); // UᵀQ; QᴴU is its adjoint
      left = new ComplexMatrix(q.columns(), utq.rows());
      for (int i = 0; i < utq.rows(); i++) {
        for (int j = 0; j < utq.columns(); j++) {
          left.set(j, i, utq.get(i, j).conjugate());
        }
      }
    }
  }

  @Override
  public int size() {
    return stiffness.rows();
  }

  @Override
  public ComplexMatrix value(Complex s) {
    ComplexMatrix l = stiffness.copy();
    l.add(s.multiply(s), mass);
    for (int i = 0; i < walls.length; i++) {
      l.add(terms.get(i).coefficient().value(s), walls[i]);
    }
    if (left != null) {
      l.add(Complex.ONE, left.times(lowRank.coefficient(s).times(right)));
    }
    return l;
  }

  @Override
  public ComplexMatrix derivative(Complex s) {
    ComplexMatrix l = new ComplexMatrix(size(), size());
    l.add(s.multiply(2), mass);
    for (int i = 0; i < walls.length; i++) {
      l.add(terms.get(i).coefficient().derivative(s), walls[i]);
    }
    if (left != null) {
      l.add(Complex.ONE, left.times(lowRank.coefficientDerivative(s).times(right)));
    }
    return l;
  }

  /** y += A x for a real symmetric matrix. */
  private interface Product {
    void add(double[] x, double[] y);
  }

  private interface Forms {
    /** Qᴴ A Q; {@code work} is scratch. */
    ComplexMatrix of(ComplexMatrix q, Product a, double[][] work);
  }

  private static final class RealForms implements Forms {
    @Override
    public ComplexMatrix of(ComplexMatrix q, Product a, double[][] work) {
      int r = q.columns();
      ComplexMatrix form = new ComplexMatrix(r, r);
      double[] y = work[0];
      for (int j = 0; j < r; j++) {
        java.util.Arrays.fill(y, 0);
        a.add(q.re()[j], y);
        for (int i = 0; i <= j; i++) {
          double sum = 0;
          double[] x = q.re()[i];
          for (int k = 0; k < y.length; k++) {
            sum += x[k] * y[k];
          }
          form.re()[j][i] = form.re()[i][j] = sum;
        }
      }
      return form;
    }
  }

  private static final class ComplexForms implements Forms {
    @Override
    public ComplexMatrix of(ComplexMatrix q, Product a, double[][] work) {
      ComplexMatrix y = new ComplexMatrix(q.rows(), q.columns());
      for (int j = 0; j < q.columns(); j++) {
        a.add(q.re()[j], y.re()[j]);
        a.add(q.im()[j], y.im()[j]);
      }
      return q.adjointTimes(y);
    }
  }
}
