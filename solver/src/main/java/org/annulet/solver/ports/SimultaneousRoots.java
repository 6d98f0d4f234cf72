package org.annulet.solver.ports;

import java.util.ArrayList;
import java.util.List;
import org.annulet.solver.modes.Window;
import org.apache.commons.math3.complex.Complex;

/**
 * Zeros of an analytic function g, all at once from its logarithmic derivative: Newton's method
 * with the other approximations divided out (Ehrlich 1967, Commun. ACM 10, 107; Aberth 1973, Math.
 * Comp. 27, 339; both from memory).
 */
final class SimultaneousRoots {
  /** A step below this share of |s| ends the iteration of a root. */
  private static final double SETTLED = 1e-11;

  /** Step aside from a pole of H, relative; its square is what it costs. */
  private static final double ASIDE = 1e-7;

  private final SideIntegral.Rate logDerivative;
  private final List<PortPole> poles;
  private final Window region;

  /**
   * Of a function.
   *
   * @param logDerivative g′/g
   * @param poles places at which g may be 0/0
   * @param region where roots are wanted; those that stray far from it are given up
   */
  SimultaneousRoots(SideIntegral.Rate logDerivative, List<PortPole> poles, Window region) {
    this.logDerivative = logDerivative;
    this.poles = poles;
    this.region = region;
  }

  /**
   * Iterates.
   *
   * @param start approximations, all different
   * @param settled set where a root was found, shape as {@code start}
   * @return where each got to; NaN where it was lost
   */
  List<Complex> run(List<Complex> start, int steps, boolean[] settled) {
    int n = start.size();
    double[] zr = new double[n];
    double[] zi = new double[n];
    for (int k = 0; k < n; k++) {
      zr[k] = start.get(k).getReal();
      zi[k] = start.get(k).getImaginary();
    }
    boolean[] lost = new boolean[n];
    double[] rate = new double[2];
    for (int it = 0; it < steps; it++) {
      boolean moving = false;
      for (int k = 0; k < n; k++) {
        if (settled[k] || lost[k]) {
          continue;
        }
        moving = true;
        double size = Math.hypot(zr[k], zi[k]);
        // On a mode the dampers do not see g is 0/0: the step is taken from a place beside it.
        double aside = onPole(zr[k], zi[k], size) ? ASIDE * size : 0;
        double fromR = zr[k] + 0.6 * aside;
        double fromI = zi[k] + 0.8 * aside;
        logDerivative.at(fromR, fromI, rate);
        double plain = 1 / Math.hypot(rate[0], rate[1]); // Newton's own step: small at roots only
        for (int j = 0; j < n; j++) {
          if (j != k && !lost[j]) {
            SideIntegral.subtractPole(rate, fromR - zr[j], fromI - zi[j]);
          }
        }
        double norm = rate[0] * rate[0] + rate[1] * rate[1];
        double dr = rate[0] / norm;
        double di = -rate[1] / norm;
        if (Double.isNaN(norm) || Double.isInfinite(norm)) {
          settled[k] = !Double.isNaN(norm);
          lost[k] = !settled[k];
          continue;
        }
        double cut = Math.min(1, 0.1 * size / Math.hypot(dr, di));
        fromR -= cut * dr;
        fromI -= cut * di;
        double length = Math.hypot(fromR - zr[k], fromI - zi[k]);
        zr[k] = fromR;
        zi[k] = fromI;
        settled[k] = length < (aside > 0 ? 10 : 1) * SETTLED * size && plain < 10 * ASIDE * size;
        lost[k] = far(zr[k], zi[k]);
      }
      if (!moving) {
        break;
      }
    }
    List<Complex> out = new ArrayList<>();
    for (int k = 0; k < n; k++) {
      out.add(lost[k] ? Complex.NaN : new Complex(zr[k], zi[k]));
    }
    return out;
  }

  private boolean onPole(double re, double im, double size) {
    for (PortPole pole : poles) {
      if (Math.hypot(re - pole.s().getReal(), im - pole.s().getImaginary()) < 0.1 * ASIDE * size) {
        return true;
      }
    }
    return false;
  }

  private boolean far(double re, double im) {
    Window r = region;
    double width = r.highestGrowth() - r.lowestGrowth();
    double omega = im / (2 * Math.PI);
    return re < r.lowestGrowth() - width
        || re > r.highestGrowth() + width
        || omega < 0.3 * r.lowestFrequency()
        || omega > 1.6 * r.highestFrequency();
  }
}
