package org.annulet.solver.operator;

import java.util.ArrayList;
import java.util.List;
import org.apache.commons.math3.complex.Complex;

/** The elementary coefficients of the operator and their products. */
public final class Analytic {
  private Analytic() {}

  /** The real constant {@code value}. */
  public static AnalyticFunction constant(double value) {
    return new Power(value, 0);
  }

  /**
   * A complex constant: {@code value} in the upper half plane and on the real axis, its conjugate
   * below.
   */
  public static AnalyticFunction constant(Complex value) {
    return value.getImaginary() == 0 ? constant(value.getReal()) : new HalfPlaneConstant(value);
  }

  /**
   * {@code factor} · s^{@code exponent}.
   *
   * @param exponent 0 or greater
   */
  public static AnalyticFunction power(double factor, int exponent) {
    if (exponent < 0) {
      throw new IllegalArgumentException("exponent must not be negative, got " + exponent);
    }
    return new Power(factor, exponent);
  }

  /** The product a(s) · b(s). */
  public static AnalyticFunction product(AnalyticFunction a, AnalyticFunction b) {
    return new Product(a, b);
  }

  private record Power(double factor, int exponent) implements AnalyticFunction {
    @Override
    public Complex value(Complex s) {
      Complex v = new Complex(factor);
      for (int k = 0; k < exponent; k++) {
        v = v.multiply(s);
      }
      return v;
    }

    @Override
    public Complex derivative(Complex s) {
      return exponent == 0 ? Complex.ZERO : new Power(factor * exponent, exponent - 1).value(s);
    }
  }

  private record HalfPlaneConstant(Complex upper) implements AnalyticFunction {
    @Override
    public Complex value(Complex s) {
      return s.getImaginary() >= 0 ? upper : upper.conjugate();
    }

    @Override
    public Complex derivative(Complex s) {
      return Complex.ZERO;
    }
  }

  private record Product(AnalyticFunction a, AnalyticFunction b) implements AnalyticFunction {
    @Override
    public Complex value(Complex s) {
      return a.value(s).multiply(b.value(s));
    }

    @Override
    public Complex derivative(Complex s) {
      return a.derivative(s).multiply(b.value(s)).add(a.value(s).multiply(b.derivative(s)));
    }

    @Override
    public List<Complex> poles(Complex lower, Complex upper) {
      List<Complex> all = new ArrayList<>(a.poles(lower, upper));
      all.addAll(b.poles(lower, upper));
      return all;
    }

    @Override
    public double longestDelay() {
      return a.longestDelay() + b.longestDelay();
    }
  }
}
