package org.annulet.solver.eigen;

import java.util.ArrayList;
import java.util.List;
import java.util.function.BiFunction;
import org.annulet.solver.dense.ComplexMatrix;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.operator.LowRankTerm;
import org.annulet.solver.operator.SparseVector;
import org.apache.commons.math3.complex.Complex;

/** All low-rank terms side by side: U Φ(s) Vᵀ with Φ block diagonal. */
final class LowRank {
  private final List<LowRankTerm> terms;
  private final List<SparseVector> left = new ArrayList<>();
  private final List<SparseVector> right = new ArrayList<>();

  LowRank(List<LowRankTerm> terms) {
    this.terms = List.copyOf(terms);
    for (LowRankTerm term : terms) {
      left.addAll(term.left());
      right.addAll(term.right());
    }
  }

  /** Columns of U. */
  List<SparseVector> left() {
    return left;
  }

  /** Columns of V. */
  List<SparseVector> right() {
    return right;
  }

  boolean isEmpty() {
    return left.isEmpty() || right.isEmpty();
  }

  /** Φ(s), shape left × right. */
  ComplexMatrix coefficient(Complex s) {
    return fill(s, AnalyticFunction::value);
  }

  /** Φ′(s). */
  ComplexMatrix coefficientDerivative(Complex s) {
    return fill(s, AnalyticFunction::derivative);
  }

  private ComplexMatrix fill(Complex s, BiFunction<AnalyticFunction, Complex, Complex> f) {
    ComplexMatrix phi = new ComplexMatrix(left.size(), right.size());
    int row = 0;
    int column = 0;
    for (LowRankTerm term : terms) {
      for (int i = 0; i < term.left().size(); i++) {
        for (int j = 0; j < term.right().size(); j++) {
          AnalyticFunction entry = term.coefficient()[i][j];
          if (entry != null) {
            phi.set(row + i, column + j, f.apply(entry, s));
          }
        }
      }
      row += term.left().size();
      column += term.right().size();
    }
    return phi;
  }

  /** The columns as dense vectors, shape [columns][n]. */
  static double[][] dense(List<SparseVector> columns, int n) {
    double[][] x = new double[columns.size()][n];
    for (int j = 0; j < x.length; j++) {
      columns.get(j).addTo(x[j], 1);
    }
    return x;
  }

  /** columnsᵀ x. */
  static ComplexMatrix transposeTimes(List<SparseVector> columns, ComplexMatrix x) {
    ComplexMatrix y = new ComplexMatrix(columns.size(), x.columns());
    for (int j = 0; j < x.columns(); j++) {
      for (int i = 0; i < columns.size(); i++) {
        y.re()[j][i] = columns.get(i).dot(x.re()[j]);
        y.im()[j][i] = columns.get(i).dot(x.im()[j]);
      }
    }
    return y;
  }

  /** x += columns · y. */
  static void addProduct(List<SparseVector> columns, ComplexMatrix y, ComplexMatrix x) {
    for (int j = 0; j < x.columns(); j++) {
      for (int i = 0; i < columns.size(); i++) {
        columns.get(i).addTo(x.re()[j], y.re()[j][i]);
        columns.get(i).addTo(x.im()[j], y.im()[j][i]);
      }
    }
  }
}
