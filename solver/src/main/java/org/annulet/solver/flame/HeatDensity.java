package org.annulet.solver.flame;

/**
 * How the heat release of a flame is spread over its patch, up to a factor. Implementations are
 * immutable and equal when they describe the same spread.
 */
public interface HeatDensity {
  /**
   * Heat release per volume at a place, not negative, in any unit.
   *
   * @param x first coordinate of the mesh in m
   * @param y second coordinate of the mesh in m (radius on a section, arc at R₀ on a ring)
   */
  double at(double x, double y);
}
