package org.annulet.solver.assembly;

/**
 * Where the mouth of a damper is: a patch of given width, which need not follow mesh lines. The
 * patch is centred at a point and as wide as √(mouth area) or as stated.
 */
public sealed interface DamperPlace {
  /**
   * On a boundary edge, about the point nearest to (x, y).
   *
   * @param edge name of the edge
   * @param x of the centre in m
   * @param y of the centre in m (radius on a section, arc at R₀ on a ring)
   * @param width along the edge in m, positive
   * @param count number of identical dampers round a section, more than twice the order; 1
   *     elsewhere
   */
  record OnEdge(String edge, double x, double y, double width, int count) implements DamperPlace {
    /** Checks width and count. */
    public OnEdge {
      requirePositive(width);
      if (count < 1) {
        throw new IllegalArgumentException("number of dampers must be positive, got " + count);
      }
    }
  }

  /**
   * On a face of a ring's zone: a square of side {@code width} on the face.
   *
   * @param zone name of the zone
   * @param face inner or outer
   * @param x of the centre in m
   * @param angle of the centre in rad
   * @param width in m, positive
   */
  record OnFace(String zone, Face face, double x, double angle, double width)
      implements DamperPlace {
    /** Checks the width. */
    public OnFace {
      requirePositive(width);
    }
  }

  private static void requirePositive(double width) {
    if (!(width > 0) || Double.isInfinite(width)) {
      throw new IllegalArgumentException(
          "width of a damper's mouth must be positive and finite, got " + width + " m");
    }
  }
}
