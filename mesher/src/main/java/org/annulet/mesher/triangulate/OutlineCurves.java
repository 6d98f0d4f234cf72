package org.annulet.mesher.triangulate;

import java.util.HashMap;
import java.util.HashSet;
import java.util.Map;
import java.util.Set;
import org.annulet.mesher.geometry.CurvePiece;
import org.annulet.mesher.geometry.Edge;
import org.annulet.mesher.geometry.Outline;
import org.annulet.mesher.mesh.EdgeCurves;

/**
 * The true curves of an outline, for refinements that put new boundary nodes on them.
 *
 * <p>The middle of a segment is the point at the mean of its ends' parameters, on the piece of the
 * edge both ends lie on; straight pieces give the middle of the chord. Immutable.
 */
public final class OutlineCurves implements EdgeCurves {
  /** Largest distance of a segment's end from its curve, in parts of the segment's length. */
  private static final double ON_CURVE = 1e-6;

  private final Map<String, Edge> edges = new HashMap<>();

  private final Set<String> straight = new HashSet<>();

  /** The curves of an outline. */
  public OutlineCurves(Outline outline) {
    for (Edge e : outline.edges()) {
      edges.put(e.name(), e);
      if (e.pieces().stream().allMatch(CurvePiece::isStraight)) {
        straight.add(e.name());
      }
    }
  }

  /**
   * {@inheritDoc}
   *
   * @throws IllegalArgumentException if the outline has no such edge or the ends do not lie on it,
   *     where it is curved
   */
  @Override
  public double[] midpoint(String edge, double[] start, double[] end) {
    Edge e = edges.get(edge);
    if (e == null) {
      throw new IllegalArgumentException(
          "no edge '" + edge + "' in the outline; give the outline the mesh was made of");
    }
    if (straight.contains(edge)) {
      return STRAIGHT.midpoint(edge, start, end);
    }
    double length = Math.hypot(end[0] - start[0], end[1] - start[1]);
    CurvePiece best = null;
    double near = Double.POSITIVE_INFINITY;
    double[] at = new double[2];
    for (CurvePiece c : e.pieces()) {
      double t = c.closest(start[0], start[1]);
      double u = c.closest(end[0], end[1]);
      double d =
          Math.max(
              Math.hypot(c.x(t) - start[0], c.y(t) - start[1]),
              Math.hypot(c.x(u) - end[0], c.y(u) - end[1]));
      if (d < near) {
        near = d;
        best = c;
        at[0] = t;
        at[1] = u;
      }
    }
    if (best == null || !(near <= ON_CURVE * length)) {
      throw new IllegalArgumentException(
          "a segment from ("
              + start[0]
              + ", "
              + start[1]
              + ") m does not lie on edge '"
              + edge
              + "'; give the outline the mesh was made of");
    }
    if (best.isStraight()) {
      return STRAIGHT.midpoint(edge, start, end);
    }
    double tm = 0.5 * (at[0] + at[1]);
    return new double[] {best.x(tm), best.y(tm)};
  }
}
