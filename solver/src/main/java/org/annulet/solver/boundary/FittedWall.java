package org.annulet.solver.boundary;

import java.util.List;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.rational.PoleResidue;
import org.annulet.solver.rational.Table;
import org.annulet.solver.rational.VectorFit;
import org.apache.commons.math3.complex.Complex;

/**
 * A wall known from a table over frequency. What is fitted is its reflection coefficient R = (z −
 * 1)/(z + 1), which stays within the unit circle for a passive wall, by a stable real-rational
 * function; y = (1 − R)/(1 + R).
 *
 * @param reflection R(s)
 * @param fitError largest |R − table|
 * @param largestReflection largest |R| on the imaginary axis up to ten times the table's end; above
 *     1 the fitted wall feeds energy into the gas
 * @param frequencyOfLargest where that is, in Hz
 * @param highestFrequency where the table ends, in Hz; beyond it R is extrapolated
 */
public record FittedWall(
    PoleResidue reflection,
    double fitError,
    double largestReflection,
    double frequencyOfLargest,
    double highestFrequency)
    implements ReactingWall {
  private static final int LARGEST_ORDER = 16;
  private static final int SAMPLES = 4000;

  /** Distance that 1 + R(∞) keeps from zero, where y would have no bound. */
  private static final double LEAST = 1e-6;

  /**
   * Fits a table of reflection coefficients.
   *
   * @param table R over frequency
   * @param tolerance wanted of the fit error
   */
  public static FittedWall ofReflection(Table table, double tolerance) {
    VectorFit fit =
        VectorFit.of(table, tolerance / Math.max(1e-300, table.largest()), LARGEST_ORDER);
    PoleResidue r = fit.function();
    if (Math.abs(1 + r.constant()) < LEAST) {
      r = new PoleResidue(-1 + LEAST, r.poleList(), r.residues());
    }
    double worst = 0;
    double at = 0;
    double top = table.highestFrequency();
    for (int k = 0; k <= SAMPLES; k++) {
      double f =
          k <= SAMPLES / 2 ? 2.0 * k / SAMPLES * top : top * Math.pow(10, 2.0 * k / SAMPLES - 1);
      double size = r.value(new Complex(0, 2 * Math.PI * f)).abs();
      if (size > worst) {
        worst = size;
        at = f;
      }
    }
    return new FittedWall(r, fit.error() * table.largest(), worst, at, top);
  }

  /**
   * Fits a table of specific impedances Z/(ρc).
   *
   * @param table z over frequency
   * @param tolerance wanted of the error in R
   */
  public static FittedWall ofImpedance(Table table, double tolerance) {
    return ofReflection(table.map(z -> z.subtract(1).divide(z.add(1))), tolerance);
  }

  /**
   * Fits a table of specific admittances ρc/Z.
   *
   * @param table y over frequency
   * @param tolerance wanted of the error in R
   */
  public static FittedWall ofAdmittance(Table table, double tolerance) {
    return ofReflection(table.map(y -> Complex.ONE.subtract(y).divide(y.add(1))), tolerance);
  }

  /** Whether the fitted wall takes energy out at every frequency looked at. */
  public boolean passive() {
    return largestReflection <= 1 + 1e-9;
  }

  @Override
  public AnalyticFunction admittance(EdgeGas gas) {
    return new Function(reflection, reflection.zerosOfSum(1));
  }

  /** y of s, with its poles. */
  private record Function(PoleResidue r, List<Complex> poles) implements AnalyticFunction {
    @Override
    public Complex value(Complex s) {
      Complex v = r.value(s);
      return Complex.ONE.subtract(v).divide(v.add(1));
    }

    @Override
    public Complex derivative(Complex s) {
      Complex d = r.value(s).add(1);
      return r.derivative(s).multiply(-2).divide(d.multiply(d));
    }

    @Override
    public List<Complex> poles(Complex lower, Complex upper) {
      return PoleResidue.within(poles, lower, upper);
    }
  }
}
