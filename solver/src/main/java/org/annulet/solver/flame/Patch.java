package org.annulet.solver.flame;

/**
 * Part of a zone between two lines x = const; on a ring one such part per burner, symmetric to the
 * burner's centre line. It need not follow mesh lines.
 *
 * @param zone name of the zone
 * @param fromX lower bound of x in m, may be −∞
 * @param toX upper bound of x in m, may be +∞
 * @param width arc on the zone's own mean radius in m that a burner's part spans on a ring; ∞ for
 *     all of the burner's sector, as must be elsewhere
 */
public record Patch(String zone, double fromX, double toX, double width) {
  /** Checks the bounds. */
  public Patch {
    if (!(fromX < toX)) {
      throw new IllegalArgumentException(
          "patch in zone '" + zone + "' must have from < to, got " + fromX + " and " + toX + " m");
    }
    if (!(width > 0)) {
      throw new IllegalArgumentException(
          "patch in zone '" + zone + "' must have a positive width, got " + width + " m");
    }
  }

  /** The whole of a zone. */
  public static Patch whole(String zone) {
    return between(zone, Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);
  }

  /**
   * The part of a zone with fromX ≤ x ≤ toX.
   *
   * @param fromX in m
   * @param toX in m
   */
  public static Patch between(String zone, double fromX, double toX) {
    return new Patch(zone, fromX, toX, Double.POSITIVE_INFINITY);
  }
}
