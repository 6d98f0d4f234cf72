package org.annulet.solver.ports;

import java.util.ArrayList;
import java.util.List;
import org.annulet.solver.dense.ComplexEigen;
import org.annulet.solver.dense.ComplexLu;
import org.annulet.solver.dense.ComplexMatrix;
import org.annulet.solver.dense.OrthonormalColumns;
import org.annulet.solver.eigen.OperatorAt;
import org.annulet.solver.eigen.PreparedOperator;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.operator.LowRankTerm;
import org.apache.commons.math3.complex.Complex;

/**
 * Right and left vectors that belong to an eigenvalue known closely, by block inverse iteration on
 * one factorisation.
 *
 * @param right X, shape n × multiplicity
 * @param left Q, QᵀL(s) = 0
 * @param norm QᵀL′(s)X
 * @param corrected the members' eigenvalues, better than the one given, in 1/s
 * @param backwardErrors ‖L p‖₂/‖K p‖₂ of each member
 */
record Eigenspace(
    ComplexMatrix right,
    ComplexMatrix left,
    ComplexMatrix norm,
    Complex[] corrected,
    double[] backwardErrors) {
  private static final double BESIDE = 1e-8;
  private static final int ITERATIONS = 4;

  /**
   * Iterates.
   *
   * @param turned the transposed operator
   */
  static Eigenspace of(PreparedOperator operator, PreparedOperator turned, PortPole pole) {
    int m = pole.multiplicity();
    int n = operator.size();
    Complex s = pole.s();
    OperatorAt near = operator.at(s.add(new Complex(0.6, 0.8).multiply(BESIDE * s.abs())));
    ComplexMatrix x = start(n, m, 1);
    ComplexMatrix q = start(n, m, 2);
    for (int k = 0; k < ITERATIONS; k++) {
      x = operator.derivativeTimes(s, x);
      near.solve(x);
      x = OrthonormalColumns.of(x, 0);
      q = turned.derivativeTimes(s, q);
      near.solveTransposed(q);
      q = OrthonormalColumns.of(q, 0);
    }
    ComplexMatrix norm = transposeTimes(q, operator.derivativeTimes(s, x));
    ComplexMatrix miss = transposeTimes(q, operator.times(s, x));
    new ComplexLu(norm.copy()).solve(miss);
    Complex[] corrected = new Complex[m];
    double[] errors = new double[m];
    ComplexMatrix members = x;
    if (m == 1) {
      corrected[0] = s.subtract(miss.get(0, 0));
    } else {
      ComplexEigen eigen = new ComplexEigen(miss);
      for (int j = 0; j < m; j++) {
        corrected[j] = s.subtract(eigen.values()[j]);
      }
      members = x.times(eigen.vectors());
    }
    for (int j = 0; j < m; j++) {
      errors[j] = operator.backwardErrors(corrected[j], members.columnsFrom(j, 1))[0];
    }
    return new Eigenspace(x, q, norm, corrected, errors);
  }

  /** Mean of the corrected eigenvalues. */
  Complex mean() {
    Complex sum = Complex.ZERO;
    for (Complex c : corrected) {
      sum = sum.add(c);
    }
    return sum.divide(corrected.length);
  }

  /** Fixed columns without symmetry, so that every mode has a share in them. */
  private static ComplexMatrix start(int n, int columns, int kind) {
    ComplexMatrix x = new ComplexMatrix(n, columns);
    for (int j = 0; j < columns; j++) {
      for (int i = 0; i < n; i++) {
        double turn = (i + 1) * (0.6180339887498949 + 0.1 * j + 0.37 * kind);
        x.re()[j][i] = turn - Math.floor(turn) - 0.5;
        x.im()[j][i] = 1.7 * turn - Math.floor(1.7 * turn) - 0.5;
      }
    }
    return x;
  }

  private static ComplexMatrix transposeTimes(ComplexMatrix x, ComplexMatrix y) {
    ComplexMatrix conjugate = x.copy();
    for (double[] column : conjugate.im()) {
      for (int i = 0; i < column.length; i++) {
        column[i] = -column[i];
      }
    }
    return conjugate.adjointTimes(y);
  }

  /** Lᵀ on the same analysis: the low-rank terms with their sides exchanged. */
  static PreparedOperator transposed(PreparedOperator prepared) {
    AcousticOperator operator = prepared.operator();
    List<LowRankTerm> terms = new ArrayList<>();
    for (LowRankTerm term : operator.lowRankTerms()) {
      AnalyticFunction[][] phi = new AnalyticFunction[term.right().size()][term.left().size()];
      for (int i = 0; i < term.left().size(); i++) {
        for (int j = 0; j < term.right().size(); j++) {
          phi[j][i] = term.coefficient()[i][j];
        }
      }
      terms.add(new LowRankTerm(term.name(), term.right(), term.left(), phi));
    }
    return new PreparedOperator(
        new AcousticOperator(
            operator.pattern(),
            operator.stiffness(),
            operator.mass(),
            operator.sparseTerms(),
            terms,
            operator.coordinates()),
        prepared.analysis());
  }
}
