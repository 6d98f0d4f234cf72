package org.annulet.mesher.triangulate;

import java.util.ArrayList;
import java.util.List;
import org.annulet.mesher.geometry.CurvePiece;
import org.annulet.mesher.geometry.Edge;
import org.annulet.mesher.geometry.Outline;

/**
 * The corners of an outline: at each point, the sectors between the edges that meet there, which of
 * them the gas fills, and how wide they are.
 */
final class Corners {
  /** Below this gas angle in degrees a corner needs concentric shells. */
  private static final double SHARP = 60;

  /** Above this gas angle in degrees a corner is re-entrant and the field singular there. */
  private static final double REENTRANT = 190;

  /** One edge piece leaving a point. */
  private record Ray(int piece, double angle, int leftZone, double length) {}

  final boolean[] sharp;
  final boolean[] reentrant;

  /** Length in m of the shortest piece at each point; infinite if none ends there. */
  final double[] shortest;

  private final List<List<Ray>> rays = new ArrayList<>();

  Corners(Outline outline) {
    int n = outline.points().size();
    sharp = new boolean[n];
    reentrant = new boolean[n];
    shortest = new double[n];
    for (int i = 0; i < n; i++) {
      rays.add(new ArrayList<>(2));
      shortest[i] = Double.POSITIVE_INFINITY;
    }
    double[] lengths = lengths(outline);
    int piece = 0;
    for (Edge e : outline.edges()) {
      for (int k = 0; k < e.pieces().size(); k++, piece++) {
        for (int p : new int[] {e.points().get(k), e.points().get(k + 1)}) {
          shortest[p] = Math.min(shortest[p], lengths[piece]);
        }
      }
    }
    piece = 0;
    for (int i = 0; i < outline.edges().size(); i++) {
      Edge e = outline.edges().get(i);
      for (int k = 0; k < e.pieces().size(); k++, piece++) {
        CurvePiece c = e.pieces().get(k);
        int a = e.points().get(k);
        int b = e.points().get(k + 1);
        // The direction at a hundredth of the shortest piece: tangent arcs are apart there.
        double ta = 0.01 * shortest[a] / lengths[piece];
        double tb = 1 - 0.01 * shortest[b] / lengths[piece];
        rays.get(a)
            .add(
                new Ray(
                    piece,
                    Math.atan2(c.y(ta) - c.y(0), c.x(ta) - c.x(0)),
                    outline.leftZone(i),
                    lengths[piece]));
        rays.get(b)
            .add(
                new Ray(
                    piece,
                    Math.atan2(c.y(tb) - c.y(1), c.x(tb) - c.x(1)),
                    outline.rightZone(i),
                    lengths[piece]));
      }
    }
    for (int p = 0; p < n; p++) {
      classify(p);
    }
  }

  static double[] lengths(Outline outline) {
    return outline.edges().stream()
        .flatMap(e -> e.pieces().stream())
        .mapToDouble(c -> c.length(0, 1))
        .toArray();
  }

  private void classify(int p) {
    List<Ray> r = rays.get(p);
    r.sort(
        (u, v) ->
            u.angle != v.angle
                ? Double.compare(u.angle, v.angle)
                : Integer.compare(u.piece, v.piece));
    int n = r.size();
    if (n < 2) {
      return;
    }
    double[] width = new double[n];
    int wall = -1;
    for (int i = 0; i < n; i++) {
      double w = r.get((i + 1) % n).angle - r.get(i).angle;
      width[i] = Math.toDegrees(i + 1 == n ? w + 2 * Math.PI : w);
      if (r.get(i).leftZone < 0) {
        wall = i;
      } else if (width[i] < SHARP) {
        sharp[p] = true;
      }
    }
    if (wall < 0) {
      return;
    }
    double gas = 0;
    for (int i = 1; i <= n; i++) {
      int k = (wall + i) % n;
      gas = r.get(k).leftZone < 0 ? 0 : gas + width[k];
      reentrant[p] |= gas > REENTRANT;
    }
  }
}
