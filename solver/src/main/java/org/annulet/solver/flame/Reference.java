package org.annulet.solver.flame;

/** What a flame listens to. */
public sealed interface Reference {
  /**
   * The velocity in a direction, averaged over a patch.
   *
   * @param patch within one zone
   * @param directionX first component of n, need not be normalised
   * @param directionY second component of n (radial on a section, along the arc on a ring)
   * @param meanVelocity ū in m/s, positive
   */
  record PatchVelocity(Patch patch, double directionX, double directionY, double meanVelocity)
      implements Reference {
    /** Checks direction and mean velocity. */
    public PatchVelocity {
      requireVelocity(meanVelocity);
      if (!(Math.hypot(directionX, directionY) > 0)) {
        throw new IllegalArgumentException("direction of the reference velocity has no length");
      }
    }
  }

  /**
   * The velocity through an inner edge, out of its upstream side, averaged over the edge; from the
   * consistent flux of that side, which is of second order in the mesh size.
   *
   * @param edge name of the inner edge
   * @param upstream the side the gas comes from
   * @param meanVelocity ū in m/s, positive
   */
  record EdgeFlux(String edge, Side upstream, double meanVelocity) implements Reference {
    /** Checks the mean velocity. */
    public EdgeFlux {
      requireVelocity(meanVelocity);
    }
  }

  /**
   * The pressure, averaged over a patch.
   *
   * @param patch within one zone
   */
  record PatchPressure(Patch patch) implements Reference {}

  /**
   * The pressure, averaged over an edge.
   *
   * @param edge name of the edge, inner or on the boundary
   */
  record EdgePressure(String edge) implements Reference {}

  private static void requireVelocity(double meanVelocity) {
    if (!(meanVelocity > 0) || Double.isInfinite(meanVelocity)) {
      throw new IllegalArgumentException(
          "mean velocity at the reference must be positive and finite, got "
              + meanVelocity
              + " m/s");
    }
  }
}
