package org.annulet.solver.rational;

import java.util.function.UnaryOperator;
import org.apache.commons.math3.complex.Complex;

/**
 * Complex values over frequency, at s = 2πi f. Arrays are copied in and not to be modified.
 *
 * @param frequency in Hz, ascending, not negative
 * @param value one per frequency
 */
public record Table(double[] frequency, Complex[] value) {
  /** Checks lengths, order and finiteness and copies the arrays. */
  public Table {
    if (frequency.length != value.length || frequency.length < 2) {
      throw new IllegalArgumentException(
          "a table needs as many values as frequencies, at least 2; got "
              + frequency.length
              + " and "
              + value.length);
    }
    for (int k = 0; k < frequency.length; k++) {
      boolean ascending = k == 0 ? frequency[0] >= 0 : frequency[k] > frequency[k - 1];
      if (!ascending || !Double.isFinite(frequency[k])) {
        throw new IllegalArgumentException(
            "frequencies of a table must ascend from 0 Hz or above; row "
                + (k + 1)
                + " has "
                + frequency[k]
                + " Hz");
      }
      if (value[k].isNaN() || value[k].isInfinite()) {
        throw new IllegalArgumentException(
            "value at " + frequency[k] + " Hz is not finite: " + value[k]);
      }
    }
    frequency = frequency.clone();
    value = value.clone();
  }

  /**
   * A table of magnitude and phase.
   *
   * @param frequency in Hz
   * @param magnitude one per frequency
   * @param phase in rad, one per frequency
   */
  public static Table ofMagnitudeAndPhase(double[] frequency, double[] magnitude, double[] phase) {
    Complex[] value = new Complex[frequency.length];
    for (int k = 0; k < value.length; k++) {
      value[k] = new Complex(magnitude[k] * Math.cos(phase[k]), magnitude[k] * Math.sin(phase[k]));
    }
    return new Table(frequency, value);
  }

  /** The table with each value replaced. */
  public Table map(UnaryOperator<Complex> f) {
    Complex[] out = new Complex[value.length];
    for (int k = 0; k < out.length; k++) {
      out[k] = f.apply(value[k]);
    }
    return new Table(frequency, out);
  }

  /** The table times e^{sτ} at s = 2πi f: what is left when a delay is taken out. */
  public Table withoutDelay(double delay) {
    Complex[] out = new Complex[value.length];
    for (int k = 0; k < out.length; k++) {
      double turn = 2 * Math.PI * frequency[k] * delay;
      out[k] = value[k].multiply(new Complex(Math.cos(turn), Math.sin(turn)));
    }
    return new Table(frequency, out);
  }

  /** Largest modulus. */
  public double largest() {
    double m = 0;
    for (Complex v : value) {
      m = Math.max(m, v.abs());
    }
    return m;
  }

  /** Highest frequency in Hz. */
  public double highestFrequency() {
    return frequency[frequency.length - 1];
  }
}
