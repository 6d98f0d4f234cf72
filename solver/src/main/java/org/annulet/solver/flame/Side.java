package org.annulet.solver.flame;

/** Which of the two sides of an inner edge is meant. */
public sealed interface Side {
  /**
   * The side that lies in a zone.
   *
   * @param zone name of the zone
   */
  record InZone(String zone) implements Side {}

  /**
   * The side the gas comes from when it flows in a direction.
   *
   * @param x first component of the direction, need not be normalised
   * @param y second component of the direction
   */
  record Upstream(double x, double y) implements Side {
    /** Checks that there is a direction. */
    public Upstream {
      if (!(Math.hypot(x, y) > 0)) {
        throw new IllegalArgumentException("direction of flow has no length");
      }
    }
  }
}
