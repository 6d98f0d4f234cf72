package org.annulet.solver.flame;

import java.util.List;
import java.util.OptionalDouble;
import org.annulet.solver.rational.PoleResidue;
import org.annulet.solver.rational.Table;
import org.annulet.solver.rational.VectorFit;
import org.apache.commons.math3.complex.Complex;

/**
 * A measured response: a delay times a stable rational function, F = e^{−sτ} R(s), fitted to a
 * table.
 *
 * @param delay τ in s taken out before the fit
 * @param rational R
 * @param fitError largest |F − table| over the largest |table|
 * @param highestFrequency where the table ends, in Hz; beyond it F is extrapolated
 */
public record FittedResponse(
    double delay, PoleResidue rational, double fitError, double highestFrequency)
    implements Response {
  private static final int STEPS = 8; // parts of the mean delay tried
  private static final int LARGEST_ORDER = 16;

  /**
   * Fits a table. Of the mean delay of its phase several parts are tried: with all of it taken out
   * nothing causal may be left, with none the order is needlessly high.
   *
   * @param table F over frequency
   * @param tolerance wanted of the fit error
   * @param limit F(0): 1 for a premixed flame, 0 for a technically premixed one whose air supply is
   *     stiff (common practice, no source); empty to leave it to the table
   */
  public static FittedResponse of(Table table, double tolerance, OptionalDouble limit) {
    double mean = Math.max(0, meanDelay(table));
    FittedResponse best = null;
    for (int k = STEPS; k >= 0; k--) {
      double delay = mean * k / STEPS;
      VectorFit fit = VectorFit.of(table.withoutDelay(delay), tolerance, LARGEST_ORDER, limit);
      if (best == null || rank(fit, tolerance) < rank(best, tolerance)) {
        best = new FittedResponse(delay, fit.function(), fit.error(), table.highestFrequency());
      }
    }
    return best;
  }

  /** Orders first by whether the tolerance is met, then by order, else by error. */
  private static double rank(VectorFit fit, double tolerance) {
    return fit.error() <= tolerance ? fit.function().poleList().size() : 1e6 + fit.error();
  }

  private static double rank(FittedResponse r, double tolerance) {
    return r.fitError <= tolerance ? r.rational.poleList().size() : 1e6 + r.fitError;
  }

  /** Slope of the unwrapped phase, weighted with the squared gain, in s. */
  private static double meanDelay(Table table) {
    double[] f = table.frequency();
    double phase = table.value()[0].getArgument();
    double last = phase;
    double[] sum = new double[5];
    for (int k = 0; k < f.length; k++) {
      double here = table.value()[k].getArgument();
      phase += Math.IEEEremainder(here - last, 2 * Math.PI);
      last = here;
      double w = Math.pow(table.value()[k].abs(), 2);
      double omega = 2 * Math.PI * f[k];
      sum[0] += w;
      sum[1] += w * omega;
      sum[2] += w * omega * omega;
      sum[3] += w * phase;
      sum[4] += w * omega * phase;
    }
    double det = sum[0] * sum[2] - sum[1] * sum[1];
    return det == 0 ? 0 : -(sum[0] * sum[4] - sum[1] * sum[3]) / det;
  }

  @Override
  public Complex value(Complex s) {
    return s.multiply(-delay).exp().multiply(rational.value(s));
  }

  @Override
  public Complex derivative(Complex s) {
    Complex e = s.multiply(-delay).exp();
    return e.multiply(rational.derivative(s).subtract(rational.value(s).multiply(delay)));
  }

  @Override
  public List<Complex> poles(Complex lower, Complex upper) {
    return rational.poles(lower, upper);
  }

  @Override
  public double longestDelay() {
    // a pole turns the phase by π within |Re p|: a group delay of at most 2/|Re p| each
    double sum = delay;
    for (Complex p : rational.poleList()) {
      sum += Math.min(2 / Math.abs(p.getReal()), 1 / Math.max(1, p.abs()) * 20);
    }
    return sum;
  }
}
