package org.annulet.post.meaning;

/** What the coordinates (x, y) of a mesh mean. */
public enum GeometryKind {
  /** Half-plane of an axisymmetric chamber: y is the radius, the field turns with e^{imθ}. */
  SECTION,
  /** Thin annuli unrolled: y is the arc at the reference radius period/2π. */
  RING,
  /** Plane across the axis: x and y are Cartesian, the axis at the origin. */
  CROSS_SECTION,
  /** A plane rig. */
  PLANE
}
