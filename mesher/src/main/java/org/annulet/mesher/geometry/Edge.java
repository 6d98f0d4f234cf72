package org.annulet.mesher.geometry;

import java.util.List;

/**
 * A named edge of an outline: a chain of smooth pieces; immutable.
 *
 * @param name its name, unique in the outline
 * @param points indices into {@link Outline#points()} of the points it runs through, one more than
 *     pieces
 * @param pieces the true curve between consecutive points
 */
public record Edge(String name, List<Integer> points, List<CurvePiece> pieces) {
  /** Copies the lists. */
  public Edge {
    points = List.copyOf(points);
    pieces = List.copyOf(pieces);
  }

  /** Index of the first point. */
  public int first() {
    return points.get(0);
  }

  /** Index of the last point. */
  public int last() {
    return points.get(points.size() - 1);
  }

  /** Length in m. */
  public double length() {
    return pieces.stream().mapToDouble(p -> p.length(0, 1)).sum();
  }

  /**
   * The point of the true curve closest to a given place.
   *
   * @param x place in m
   * @param y place in m
   * @return new array x, y in m
   */
  public double[] closest(double x, double y) {
    double best = Double.POSITIVE_INFINITY;
    double[] at = new double[2];
    for (CurvePiece c : pieces) {
      double t = c.closest(x, y);
      double d = Math.hypot(c.x(t) - x, c.y(t) - y);
      if (d < best) {
        best = d;
        at[0] = c.x(t);
        at[1] = c.y(t);
      }
    }
    return at;
  }
}
