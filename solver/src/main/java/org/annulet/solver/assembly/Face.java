package org.annulet.solver.assembly;

/** One of the two walls of a ring's zone, over the unrolled plane. */
public enum Face {
  /** At the mean radius less half the gap. */
  INNER(-0.5),
  /** At the mean radius plus half the gap. */
  OUTER(0.5);

  private final double shift;

  Face(double shift) {
    this.shift = shift;
  }

  double radius(Ring.Annulus zone) {
    return zone.meanRadius() + shift * zone.gap();
  }
}
