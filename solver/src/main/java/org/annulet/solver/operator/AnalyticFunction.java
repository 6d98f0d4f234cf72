package org.annulet.solver.operator;

import java.util.List;
import org.apache.commons.math3.complex.Complex;

/**
 * A scalar coefficient of the operator as a function of s, meromorphic and real on the real axis:
 * f(s̄) is the conjugate of f(s).
 *
 * <p>s in 1/s; the unit of the value is that of the coefficient. Implementations are immutable.
 */
public interface AnalyticFunction {
  /** The value at s. */
  Complex value(Complex s);

  /** The derivative with respect to s. */
  Complex derivative(Complex s);

  /**
   * The poles in a closed rectangle of the s-plane, each as often as its order.
   *
   * @param lower corner with the smallest growth rate and angular frequency, in 1/s
   * @param upper corner with the largest growth rate and angular frequency, in 1/s
   */
  default List<Complex> poles(Complex lower, Complex upper) {
    return List.of();
  }

  /**
   * The longest delay in the function, in s: its phase turns by at most about ω times this. It sets
   * how fine a contour must be sampled.
   */
  default double longestDelay() {
    return 0;
  }
}
