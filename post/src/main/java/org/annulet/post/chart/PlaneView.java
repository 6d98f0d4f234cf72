package org.annulet.post.chart;

import org.annulet.post.meaning.GeometryKind;

/**
 * How the plane of the mesh is laid on the screen: x to the right and y up; a ring lies on its
 * side, the arc to the right and x (downstream) down, since it is longer round than along.
 */
public enum PlaneView {
  /** x right, y up. */
  UPRIGHT,
  /** y right, x down. */
  ROLLED;

  /** The view that suits a kind of geometry. */
  public static PlaneView of(GeometryKind kind) {
    return kind == GeometryKind.RING ? ROLLED : UPRIGHT;
  }

  /** Coordinate to the right, in m. */
  public double right(double x, double y) {
    return this == ROLLED ? y : x;
  }

  /** Coordinate down, in m. */
  public double down(double x, double y) {
    return this == ROLLED ? x : -y;
  }
}
