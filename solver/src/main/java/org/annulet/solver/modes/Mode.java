package org.annulet.solver.modes;

/**
 * One eigenpair L(s) p = 0 of an operator. Arrays are owned by the mode and must not be modified.
 *
 * @param growthRate Re s in 1/s, positive grows
 * @param frequency Im s/2π in Hz
 * @param re real part of the vector of unknowns, scaled so that its largest entry has modulus 1 and
 *     is real
 * @param im imaginary part
 * @param multiplicity number of modes that share this eigenvalue within the accuracy of the answer
 *     (2 for an exact azimuthal pair on a whole ring; each member is a mode of its own)
 * @param backwardError ‖L(s)p‖₂/‖K p‖₂ on the full operator
 * @param iterations factorisations the polishing took
 * @param verdict what can be said of it
 */
public record Mode(
    double growthRate,
    double frequency,
    double[] re,
    double[] im,
    int multiplicity,
    double backwardError,
    int iterations,
    Verdict verdict) {
  /** What can be said of a computed mode. */
  public enum Verdict {
    /** Backward error at or below the stated bound. */
    CONVERGED,
    /** Converged, and so close to the window's edge that rounding decides on which side it lies. */
    ON_THE_EDGE,
    /** The iteration did not reach the stated backward error. */
    STALLED
  }
}
