package org.annulet.solver.flame;

import org.apache.commons.math3.complex.Complex;

/**
 * Gain and delay: F = n e^{−sτ}.
 *
 * @param gain interaction index n
 * @param delay τ in s, not negative
 */
public record NTau(double gain, double delay) implements Response {
  /** Checks that both are finite and the delay not negative. */
  public NTau {
    if (!Double.isFinite(gain)) {
      throw new IllegalArgumentException("gain must be finite, got " + gain);
    }
    if (!(delay >= 0) || Double.isInfinite(delay)) {
      throw new IllegalArgumentException(
          "delay must be finite and not negative, got " + delay + " s");
    }
  }

  @Override
  public Complex value(Complex s) {
    return s.multiply(-delay).exp().multiply(gain);
  }

  @Override
  public Complex derivative(Complex s) {
    return value(s).multiply(-delay);
  }

  @Override
  public double longestDelay() {
    return delay;
  }
}
