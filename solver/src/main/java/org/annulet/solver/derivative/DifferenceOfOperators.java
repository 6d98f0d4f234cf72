package org.annulet.solver.derivative;

import org.annulet.solver.dense.ComplexMatrix;
import org.annulet.solver.eigen.PreparedOperator;
import org.annulet.solver.operator.AcousticOperator;
import org.apache.commons.math3.complex.Complex;

/**
 * A parameter known through two operators, assembled on the same mesh with θ − h and θ + h.
 *
 * <pre>
 *   L_θ = (L₊ − L₋)/2h + O(h²),   L_θθ = (L₊ − 2L + L₋)/h² + O(h²)
 * </pre>
 *
 * <p>At fixed s the entries are smooth functions of θ, so nothing is solved anew and the error is
 * that of the difference alone: with h = 3e-5 of θ about 1e-9 for powers, and (ωτh)²/6 for a delay.
 */
public final class DifferenceOfOperators implements OperatorChange {
  private final PreparedOperator here;
  private final PreparedOperator minus;
  private final PreparedOperator plus;
  private final double step;

  /**
   * A change.
   *
   * @param here operator at θ, analysed
   * @param minus operator at θ − step on the same unknowns
   * @param plus operator at θ + step on the same unknowns
   * @param step h, in the unit of θ, not zero
   * @throws IllegalArgumentException if the operators have other unknowns
   */
  public DifferenceOfOperators(
      PreparedOperator here, AcousticOperator minus, AcousticOperator plus, double step) {
    if (!comparable(here.operator(), minus) || !comparable(here.operator(), plus)) {
      throw new IllegalArgumentException(
          "operators of "
              + minus.size()
              + ", "
              + here.size()
              + " and "
              + plus.size()
              + " unknowns cannot be compared; assemble them on one mesh, with the same open ends");
    }
    if (step == 0 || !Double.isFinite(step)) {
      throw new IllegalArgumentException("step must be finite and not zero, got " + step);
    }
    this.here = here;
    this.minus = new PreparedOperator(minus, here.analysis());
    this.plus = new PreparedOperator(plus, here.analysis());
    this.step = step;
  }

  /** Whether two operators have the same unknowns and couplings. */
  public static boolean comparable(AcousticOperator a, AcousticOperator b) {
    return a.size() == b.size() && a.pattern().entryCount() == b.pattern().entryCount();
  }

  @Override
  public ComplexMatrix first(Complex s, ComplexMatrix x) {
    return difference(plus.times(s, x), minus.times(s, x));
  }

  @Override
  public ComplexMatrix second(Complex s, ComplexMatrix x) {
    ComplexMatrix sum = plus.times(s, x);
    sum.add(Complex.ONE, minus.times(s, x));
    sum.add(new Complex(-2), here.times(s, x));
    ComplexMatrix out = new ComplexMatrix(sum.rows(), sum.columns());
    out.add(new Complex(1 / (step * step)), sum);
    return out;
  }

  @Override
  public ComplexMatrix mixed(Complex s, ComplexMatrix x) {
    return difference(plus.derivativeTimes(s, x), minus.derivativeTimes(s, x));
  }

  private ComplexMatrix difference(ComplexMatrix a, ComplexMatrix b) {
    a.add(Complex.ONE.negate(), b);
    ComplexMatrix out = new ComplexMatrix(a.rows(), a.columns());
    out.add(new Complex(0.5 / step), a);
    return out;
  }
}
