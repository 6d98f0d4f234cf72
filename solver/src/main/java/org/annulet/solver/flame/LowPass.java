package org.annulet.solver.flame;

import java.util.List;
import org.apache.commons.math3.complex.Complex;

/**
 * A delayed response through a first-order low-pass: F = n e^{−sτ}/(1 + s/ω_c).
 *
 * @param gain n at low frequency
 * @param delay τ in s, not negative
 * @param cutoff ω_c/2π in Hz, positive
 */
public record LowPass(double gain, double delay, double cutoff) implements Response {
  /** Checks the numbers. */
  public LowPass {
    if (!Double.isFinite(gain) || !(delay >= 0 && cutoff > 0)) {
      throw new IllegalArgumentException(
          "gain must be finite, delay not negative, cut-off positive; got "
              + gain
              + ", "
              + delay
              + " s, "
              + cutoff
              + " Hz");
    }
  }

  private double corner() {
    return 2 * Math.PI * cutoff;
  }

  @Override
  public Complex value(Complex s) {
    return s.multiply(-delay).exp().multiply(gain).divide(s.divide(corner()).add(1));
  }

  @Override
  public Complex derivative(Complex s) {
    return value(s).multiply(s.add(corner()).reciprocal().add(delay)).negate();
  }

  @Override
  public List<Complex> poles(Complex lower, Complex upper) {
    boolean inside =
        lower.getReal() <= -corner()
            && -corner() <= upper.getReal()
            && lower.getImaginary() <= 0
            && 0 <= upper.getImaginary();
    return inside ? List.of(new Complex(-corner())) : List.of();
  }

  @Override
  public double longestDelay() {
    return delay + 1 / corner();
  }
}
