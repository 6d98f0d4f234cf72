package org.annulet.solver.ports;

import org.apache.commons.math3.complex.Complex;

/**
 * An eigenvalue of the chamber without dampers.
 *
 * @param s in 1/s
 * @param multiplicity independent modes that share it, at least 1
 */
public record PortPole(Complex s, int multiplicity) {
  /** Checks the multiplicity. */
  public PortPole {
    if (multiplicity < 1) {
      throw new IllegalArgumentException("multiplicity must be positive, got " + multiplicity);
    }
  }
}
