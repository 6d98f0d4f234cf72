package org.annulet.solver.rational;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.annulet.solver.operator.AnalyticFunction;
import org.apache.commons.math3.analysis.solvers.LaguerreSolver;
import org.apache.commons.math3.complex.Complex;

/** A quotient of two real polynomials in s; immutable. */
public final class PolynomialRatio implements AnalyticFunction {
  private final double[] numerator;
  private final double[] denominator;
  private final List<Complex> poles;

  /**
   * The quotient; the arrays are copied.
   *
   * @param numerator coefficients, lowest power first
   * @param denominator coefficients, lowest power first
   * @throws IllegalArgumentException if a coefficient is not finite or the denominator is zero
   */
  public PolynomialRatio(double[] numerator, double[] denominator) {
    this.numerator = trimmed(numerator);
    this.denominator = trimmed(denominator);
    if (this.denominator.length == 1 && this.denominator[0] == 0) {
      throw new IllegalArgumentException("denominator is zero");
    }
    this.poles = roots(this.denominator);
  }

  private static double[] trimmed(double[] p) {
    int n = p.length;
    for (double x : p) {
      if (!Double.isFinite(x)) {
        throw new IllegalArgumentException("coefficient is not finite: " + Arrays.toString(p));
      }
    }
    while (n > 1 && p[n - 1] == 0) {
      n--;
    }
    return Arrays.copyOf(p, n);
  }

  /** Roots with s scaled to the geometric mean of their moduli, for the sake of the solver. */
  private static List<Complex> roots(double[] p) {
    int zeros = 0;
    while (zeros < p.length - 1 && p[zeros] == 0) {
      zeros++;
    }
    double[] q = Arrays.copyOfRange(p, zeros, p.length);
    List<Complex> roots = new ArrayList<>();
    for (int k = 0; k < zeros; k++) {
      roots.add(Complex.ZERO);
    }
    int n = q.length - 1;
    if (n == 0) {
      return roots;
    }
    double scale = Math.pow(Math.abs(q[0] / q[n]), 1.0 / n);
    double[] scaled = new double[n + 1];
    for (int k = 0; k <= n; k++) {
      scaled[k] = q[k] / q[n] * Math.pow(scale, k - n);
    }
    for (Complex z : new LaguerreSolver(1e-14).solveAllComplex(scaled, 0.1)) {
      roots.add(z.multiply(scale));
    }
    return roots;
  }

  private static Complex horner(double[] p, Complex s) {
    Complex sum = new Complex(p[p.length - 1]);
    for (int k = p.length - 2; k >= 0; k--) {
      sum = sum.multiply(s).add(p[k]);
    }
    return sum;
  }

  private static double[] slope(double[] p) {
    double[] d = new double[Math.max(1, p.length - 1)];
    for (int k = 1; k < p.length; k++) {
      d[k - 1] = k * p[k];
    }
    return d;
  }

  @Override
  public Complex value(Complex s) {
    return horner(numerator, s).divide(horner(denominator, s));
  }

  @Override
  public Complex derivative(Complex s) {
    Complex d = horner(denominator, s);
    Complex f = horner(numerator, s).divide(d);
    return horner(slope(numerator), s)
        .subtract(f.multiply(horner(slope(denominator), s)))
        .divide(d);
  }

  @Override
  public List<Complex> poles(Complex lower, Complex upper) {
    return inside(poles, lower, upper);
  }

  /** All poles. */
  public List<Complex> poles() {
    return List.copyOf(poles);
  }

  /** Those points that lie in the closed rectangle. */
  static List<Complex> inside(List<Complex> points, Complex lower, Complex upper) {
    return points.stream()
        .filter(
            p ->
                lower.getReal() <= p.getReal()
                    && p.getReal() <= upper.getReal()
                    && lower.getImaginary() <= p.getImaginary()
                    && p.getImaginary() <= upper.getImaginary())
        .toList();
  }

  /** The product of two polynomials, lowest power first. */
  public static double[] product(double[] a, double[] b) {
    double[] c = new double[a.length + b.length - 1];
    for (int i = 0; i < a.length; i++) {
      for (int k = 0; k < b.length; k++) {
        c[i + k] += a[i] * b[k];
      }
    }
    return c;
  }

  /** The sum of two polynomials, lowest power first. */
  public static double[] sum(double[] a, double[] b) {
    double[] c = Arrays.copyOf(a, Math.max(a.length, b.length));
    for (int k = 0; k < b.length; k++) {
      c[k] += b[k];
    }
    return c;
  }
}
