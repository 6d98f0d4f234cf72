package org.annulet.post.meaning;

import java.util.function.Function;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.operator.LowRankTerm;
import org.annulet.solver.operator.SparseTerm;
import org.annulet.solver.operator.SparseVector;
import org.apache.commons.math3.complex.Complex;

/** Bilinear forms xᵀ T y (no conjugate) of the parts of an operator. */
final class Forms {
  private final AcousticOperator operator;

  Forms(AcousticOperator operator) {
    this.operator = operator;
  }

  /** A complex vector, split; shape [n] each. */
  record Vec(double[] re, double[] im) {
    Vec conjugate() {
      double[] minus = new double[im.length];
      for (int i = 0; i < minus.length; i++) {
        minus[i] = -im[i];
      }
      return new Vec(re, minus);
    }
  }

  /** xᵀ A y for a real symmetric matrix on the operator's pattern. */
  Complex symmetric(double[] values, Vec x, Vec y) {
    Vec ay = product(values, y);
    return dot(x, ay);
  }

  Vec product(double[] values, Vec y) {
    double[] re = new double[operator.size()];
    double[] im = new double[operator.size()];
    operator.pattern().addProduct(values, y.re, 1, re);
    operator.pattern().addProduct(values, y.im, 1, im);
    return new Vec(re, im);
  }

  /** xᵀ A y · f(a), f the value or the derivative of the coefficient. */
  Complex sparse(SparseTerm term, Function<AnalyticFunction, Complex> f, Vec x, Vec y) {
    return symmetric(term.values(), x, y).multiply(f.apply(term.coefficient()));
  }

  /** xᵀ U f(Φ) Vᵀ y. */
  Complex lowRank(LowRankTerm term, Function<AnalyticFunction, Complex> f, Vec x, Vec y) {
    Complex sum = Complex.ZERO;
    for (int k = 0; k < term.left().size(); k++) {
      sum = sum.add(dot(term.left().get(k), x).multiply(row(term, k, f, y)));
    }
    return sum;
  }

  /** Row k of f(Φ) Vᵀ y. */
  static Complex row(LowRankTerm term, int k, Function<AnalyticFunction, Complex> f, Vec y) {
    Complex sum = Complex.ZERO;
    for (int l = 0; l < term.right().size(); l++) {
      AnalyticFunction phi = term.coefficient()[k][l];
      if (phi != null) {
        sum = sum.add(f.apply(phi).multiply(dot(term.right().get(l), y)));
      }
    }
    return sum;
  }

  static Complex dot(SparseVector a, Vec x) {
    return new Complex(a.dot(x.re), a.dot(x.im));
  }

  static Complex dot(Vec x, Vec y) {
    double re = 0;
    double im = 0;
    for (int i = 0; i < x.re.length; i++) {
      re += x.re[i] * y.re[i] - x.im[i] * y.im[i];
      im += x.re[i] * y.im[i] + x.im[i] * y.re[i];
    }
    return new Complex(re, im);
  }
}
