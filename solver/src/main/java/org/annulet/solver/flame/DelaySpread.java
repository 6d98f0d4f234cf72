package org.annulet.solver.flame;

import org.apache.commons.math3.complex.Complex;

/**
 * Delays spread as a normal distribution: F = n e^{−sτ + s²σ²/2}.
 *
 * @param gain n
 * @param delay mean τ in s, not negative
 * @param deviation standard deviation σ of the delay in s, not negative
 */
public record DelaySpread(double gain, double delay, double deviation) implements Response {
  /** Checks the numbers. */
  public DelaySpread {
    if (!Double.isFinite(gain) || !(delay >= 0 && deviation >= 0)) {
      throw new IllegalArgumentException(
          "gain must be finite, delay and deviation not negative; got "
              + gain
              + ", "
              + delay
              + " s, "
              + deviation
              + " s");
    }
  }

  @Override
  public Complex value(Complex s) {
    return s.multiply(s.multiply(0.5 * deviation * deviation).subtract(delay)).exp().multiply(gain);
  }

  @Override
  public Complex derivative(Complex s) {
    return value(s).multiply(s.multiply(deviation * deviation).subtract(delay));
  }

  @Override
  public double longestDelay() {
    return delay + 3 * deviation; // three deviations: the tail that still counts
  }
}
