package org.annulet.solver.assembly;

/**
 * A plane rig: x and y are lengths, the field does not vary over the depth.
 *
 * @param depth in m, positive
 */
public record Plane(double depth) implements Geometry {
  /** Checks the depth. */
  public Plane {
    if (!(depth > 0) || Double.isInfinite(depth)) {
      throw new IllegalArgumentException("depth must be positive and finite, got " + depth + " m");
    }
  }
}
