package org.annulet.solver.eigen;

import java.util.ArrayList;
import java.util.List;
import org.annulet.solver.dense.ComplexMatrix;
import org.annulet.solver.dense.ComplexSvd;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.operator.LowRankTerm;
import org.annulet.solver.operator.SparseTerm;
import org.apache.commons.math3.complex.Complex;

/**
 * Poles of det L(s) that come from the coefficients: each pole of a(s) counts as often as the rank
 * of its matrix, times its order; each pole of Φ(s) as the rank of its residue.
 */
final class CoefficientPoles {
  private CoefficientPoles() {}

  /** All poles in a rectangle, each repeated as often as it counts. */
  static List<Complex> in(PreparedOperator prepared, Rectangle r) {
    AcousticOperator op = prepared.operator();
    List<Complex> poles = new ArrayList<>();
    for (int i = 0; i < op.sparseTerms().size(); i++) {
      SparseTerm term = op.sparseTerms().get(i);
      List<Complex> own = term.coefficient().poles(r.lower(), r.upper());
      int rank = own.isEmpty() ? 0 : prepared.walls().get(i).rank();
      for (Complex p : own) {
        for (int k = 0; k < rank; k++) {
          poles.add(p);
        }
      }
    }
    for (LowRankTerm term : op.lowRankTerms()) {
      addLowRank(term, r, poles);
    }
    return poles;
  }

  private static void addLowRank(LowRankTerm term, Rectangle r, List<Complex> poles) {
    List<Complex> distinct = new ArrayList<>();
    List<Integer> order = new ArrayList<>();
    for (AnalyticFunction[] row : term.coefficient()) {
      for (AnalyticFunction entry : row) {
        if (entry != null) {
          collect(entry.poles(r.lower(), r.upper()), distinct, order);
        }
      }
    }
    for (int i = 0; i < distinct.size(); i++) {
      int rank = order.get(i) == 1 ? residueRank(term, distinct.get(i), distinct) : 1;
      for (int k = 0; k < rank * order.get(i); k++) {
        poles.add(distinct.get(i));
      }
    }
  }

  /** Merges the poles of one entry into the distinct ones, keeping the highest order of each. */
  private static void collect(List<Complex> own, List<Complex> distinct, List<Integer> order) {
    for (Complex p : own) {
      int times = (int) own.stream().filter(q -> near(p, q)).count();
      int at = -1;
      for (int i = 0; i < distinct.size(); i++) {
        at = near(p, distinct.get(i)) ? i : at;
      }
      if (at < 0) {
        distinct.add(p);
        order.add(times);
      } else {
        order.set(at, Math.max(order.get(at), times));
      }
    }
  }

  private static int residueRank(LowRankTerm term, Complex pole, List<Complex> all) {
    int rows = term.left().size();
    int columns = term.right().size();
    if (rows == 1 || columns == 1) {
      return 1;
    }
    double radius = 1e-4 * pole.abs();
    for (Complex other : all) {
      if (!near(other, pole)) {
        radius = Math.min(radius, 0.3 * other.subtract(pole).abs());
      }
    }
    int big = Math.max(rows, columns);
    ComplexMatrix residue = new ComplexMatrix(big, big);
    int points = 8;
    for (int k = 0; k < points; k++) {
      double t = 2 * Math.PI * k / points;
      Complex z = new Complex(radius * Math.cos(t), radius * Math.sin(t));
      for (int i = 0; i < rows; i++) {
        for (int j = 0; j < columns; j++) {
          AnalyticFunction entry = term.coefficient()[i][j];
          if (entry != null) {
            Complex v = entry.value(pole.add(z)).multiply(z).divide(points);
            residue.set(i, j, residue.get(i, j).add(v));
          }
        }
      }
    }
    return new ComplexSvd(residue).rank(1e-6);
  }

  private static boolean near(Complex a, Complex b) {
    return a.subtract(b).abs() <= 1e-9 * (a.abs() + b.abs());
  }
}
