package org.annulet.cases.study;

import org.apache.commons.math3.complex.Complex;

/**
 * One mode of a changed case. Arrays are owned by the mode and must not be modified.
 *
 * @param s growth rate and angular frequency in 1/s
 * @param part operator it belongs to, as in {@link CaseProblem.Part#name()}; modes of different
 *     parts never turn into each other
 * @param order azimuthal order of that operator; null where it has none of its own
 * @param copies modes of the chamber behind it: 2 for a pair
 * @param backwardError ‖L(s)p‖₂/‖K p‖₂ on the full operator
 * @param shapeRe real part of p̂ at the solver's {@link ShapePlaces}, of unit length together with
 *     the imaginary part; the phase is open
 * @param shapeIm imaginary part
 */
public record PointMode(
    Complex s,
    String part,
    Integer order,
    int copies,
    double backwardError,
    double[] shapeRe,
    double[] shapeIm) {
  /** Frequency in Hz. */
  public double frequency() {
    return s.getImaginary() / (2 * Math.PI);
  }

  /** Growth rate in 1/s, positive grows. */
  public double growthRate() {
    return s.getReal();
  }

  /** |⟨shape, other's shape⟩|: 1 for the same field, 0 for unlike ones. */
  public double likeness(PointMode other) {
    double re = 0;
    double im = 0;
    for (int i = 0; i < shapeRe.length; i++) {
      re += shapeRe[i] * other.shapeRe[i] + shapeIm[i] * other.shapeIm[i];
      im += shapeRe[i] * other.shapeIm[i] - shapeIm[i] * other.shapeRe[i];
    }
    return Math.hypot(re, im);
  }
}
