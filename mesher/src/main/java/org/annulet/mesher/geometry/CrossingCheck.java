package org.annulet.mesher.geometry;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.annulet.mesher.geometry.GeometryFault.Fault;
import org.annulet.mesher.geometry.GeometryFault.Kind;

/**
 * Finds edges that cross or touch away from a common point. Pieces are cut into spans that turn
 * little, spans are sorted into the cells of a grid, and each pair in a cell is halved until chords
 * and their deviations are apart, or until the spans are as small as the tolerance.
 */
final class CrossingCheck {
  /** Two edges closer than this, in parts of the outline's size, are taken to touch. */
  private static final double TOUCH = 1e-9;

  private static final int MOST_FAULTS = 20;

  private record Span(int edge, int piece, double t0, double t1, CurvePiece curve) {}

  private final List<Edge> edges;
  private final List<Point> points;
  private final List<Fault> faults;
  private final List<Span> spans = new ArrayList<>();
  private final double[] box;
  private final double size;
  private final int before;

  CrossingCheck(List<Edge> edges, List<Point> points, List<Fault> faults) {
    this.edges = edges;
    this.points = points;
    this.faults = faults;
    this.before = faults.size();
    box = OutlineCheck.box(edges);
    size = Math.max(box[2] - box[0], box[3] - box[1]);
  }

  void run() {
    for (int e = 0; e < edges.size(); e++) {
      List<CurvePiece> pieces = edges.get(e).pieces();
      for (int p = 0; p < pieces.size(); p++) {
        CurvePiece c = pieces.get(p);
        int n = c.isStraight() ? 1 : 16;
        for (int i = 0; i < n; i++) {
          spans.add(new Span(e, p, i / (double) n, (i + 1) / (double) n, c));
        }
      }
    }
    int cells = (int) Math.max(1, Math.min(512, Math.sqrt(spans.size()) * 2));
    Map<Integer, List<Integer>> grid = new HashMap<>();
    for (int s = 0; s < spans.size(); s++) {
      spread(s, cells, grid);
    }
    Set<Long> seen = new HashSet<>();
    for (List<Integer> cell : grid.values()) {
      for (int i = 0; i < cell.size(); i++) {
        for (int k = 0; k < i; k++) {
          int a = Math.min(cell.get(i), cell.get(k));
          int b = Math.max(cell.get(i), cell.get(k));
          if (apart(spans.get(a), spans.get(b)) || !seen.add(((long) a << 32) | b)) {
            continue;
          }
          pair(spans.get(a), spans.get(b));
          if (faults.size() - before >= MOST_FAULTS) {
            return;
          }
        }
      }
    }
  }

  /** Enters a span in every grid cell its chord passes, widened by its deviation. */
  private void spread(int s, int cells, Map<Integer, List<Integer>> grid) {
    Span p = spans.get(s);
    double d = p.curve.deviation(p.t0, p.t1) + TOUCH * size;
    double xa = p.curve.x(p.t0);
    double ya = p.curve.y(p.t0);
    double xb = p.curve.x(p.t1);
    double yb = p.curve.y(p.t1);
    double w = size / cells;
    int i0 = (int) Math.floor((Math.min(xa, xb) - d - box[0]) / w);
    int i1 = (int) Math.floor((Math.max(xa, xb) + d - box[0]) / w);
    for (int i = i0; i <= i1; i++) {
      // The part of the chord over column i gives the rows it passes.
      double cl = box[0] + i * w - d;
      double cr = box[0] + (i + 1) * w + d;
      double lo = Math.min(ya, yb);
      double hi = Math.max(ya, yb);
      if (xa != xb) {
        double slope = (yb - ya) / (xb - xa);
        double y1 = ya + slope * (Math.max(cl, Math.min(xa, xb)) - xa);
        double y2 = ya + slope * (Math.min(cr, Math.max(xa, xb)) - xa);
        lo = Math.max(lo, Math.min(y1, y2));
        hi = Math.min(hi, Math.max(y1, y2));
      }
      int k0 = (int) Math.floor((lo - d - box[1]) / w);
      int k1 = (int) Math.floor((hi + d - box[1]) / w);
      for (int k = k0; k <= k1; k++) {
        grid.computeIfAbsent(i * 4099 + k, q -> new ArrayList<>()).add(s);
      }
    }
  }

  private static boolean apart(Span a, Span b) {
    return a.edge == b.edge && a.piece == b.piece && a.t0 == b.t0;
  }

  private void pair(Span a, Span b) {
    if (a.edge == b.edge && a.piece == b.piece) {
      // Neighbouring spans of one smooth piece: they share an end and turn by less than a right
      // angle, unless the piece has a cusp; only spans further apart can meet.
      if (Math.abs(a.t0 - b.t0) <= 1.5 * (a.t1 - a.t0)) {
        return;
      }
    }
    double[] hit = new double[2];
    Kind kind = meet(a, b, shared(a, b), hit, 0);
    if (kind == null) {
      return;
    }
    String what =
        a.edge == b.edge
            ? "edge '" + edges.get(a.edge).name() + "' " + word(kind) + " itself"
            : "edges '"
                + edges.get(a.edge).name()
                + "' and '"
                + edges.get(b.edge).name()
                + "' "
                + (kind == Kind.CROSSING ? "cross" : "touch");
    for (Fault f : faults) {
      if (f.what().equals(what) && Math.hypot(f.x() - hit[0], f.y() - hit[1]) < 1e-6 * size) {
        return;
      }
    }
    faults.add(
        new Fault(
            kind, what, hit[0], hit[1], "move one of them, or end both at a common point there"));
  }

  private static String word(Kind kind) {
    return kind == Kind.CROSSING ? "crosses" : "touches";
  }

  /** Coordinates of the points both pieces end at: none, x y, or x y x y. */
  private double[] shared(Span a, Span b) {
    int[] p = ends(a);
    int[] q = ends(b);
    List<Double> at = new ArrayList<>();
    for (int i : p) {
      if (i == q[0] || i == q[1]) {
        at.add(points.get(i).x());
        at.add(points.get(i).y());
      }
    }
    return at.stream().mapToDouble(Double::doubleValue).toArray();
  }

  private int[] ends(Span s) {
    List<Integer> at = edges.get(s.edge).points();
    return new int[] {at.get(s.piece), at.get(s.piece + 1)};
  }

  private Kind meet(Span a, Span b, double[] shared, double[] hit, int depth) {
    double da = a.curve.deviation(a.t0, a.t1);
    double db = b.curve.deviation(b.t0, b.t1);
    double[] p = chord(a);
    double[] q = chord(b);
    double margin = da + db + TOUCH * size;
    if (boxesApart(p, q, margin)) {
      return null;
    }
    double gap = Chords.distance(p, q);
    if (gap > margin) {
      return null;
    }
    double la = Math.hypot(p[2] - p[0], p[3] - p[1]);
    double lb = Math.hypot(q[2] - q[0], q[3] - q[1]);
    hit[0] = 0.25 * (p[0] + p[2] + q[0] + q[2]);
    hit[1] = 0.25 * (p[1] + p[3] + q[1] + q[3]);
    if (a.curve.isStraight() && b.curve.isStraight()) {
      return straight(p, q, shared, hit);
    }
    for (int i = 0; i < shared.length; i += 2) {
      double near = Math.hypot(hit[0] - shared[i], hit[1] - shared[i + 1]);
      // Near a common end the curves part again: quadratically if they are tangent there.
      if (near < 1e-4 * size && la + lb < 4e-4 * size) {
        return null;
      }
    }
    if (depth > 60 || Math.max(la, lb) < TOUCH * size) {
      return Chords.cross(p, q) ? Kind.CROSSING : Kind.TOUCHING;
    }
    boolean halveA = la >= lb;
    Span s = halveA ? a : b;
    double tm = 0.5 * (s.t0 + s.t1);
    Span one = new Span(s.edge, s.piece, s.t0, tm, s.curve);
    Span two = new Span(s.edge, s.piece, tm, s.t1, s.curve);
    Kind k = halveA ? meet(one, b, shared, hit, depth + 1) : meet(a, one, shared, hit, depth + 1);
    return k != null
        ? k
        : halveA ? meet(two, b, shared, hit, depth + 1) : meet(a, two, shared, hit, depth + 1);
  }

  private Kind straight(double[] p, double[] q, double[] shared, double[] hit) {
    if (shared.length >= 4) {
      hit[0] = 0.5 * (p[0] + p[2]);
      hit[1] = 0.5 * (p[1] + p[3]);
      return Kind.TOUCHING;
    }
    if (shared.length == 2) {
      // Two lines from one point touch only if they run in one direction.
      double[] u = away(p, shared);
      double[] v = away(q, shared);
      double cross = u[0] * v[1] - u[1] * v[0];
      double dot = u[0] * v[0] + u[1] * v[1];
      double l = Math.min(Math.hypot(u[0], u[1]), Math.hypot(v[0], v[1]));
      double longer = Math.max(Math.hypot(u[0], u[1]), Math.hypot(v[0], v[1]));
      if (dot > 0 && Math.abs(cross) / longer <= TOUCH * size * Math.min(1, l / size)) {
        hit[0] = shared[0] + (Math.hypot(u[0], u[1]) <= l ? u[0] : v[0]);
        hit[1] = shared[1] + (Math.hypot(u[0], u[1]) <= l ? u[1] : v[1]);
        return Kind.TOUCHING;
      }
      return null;
    }
    if (Chords.cross(p, q)) {
      Chords.intersection(p, q, hit);
      return Kind.CROSSING;
    }
    Chords.closest(p, q, hit);
    return Kind.TOUCHING;
  }

  private static double[] away(double[] p, double[] from) {
    boolean start = p[0] == from[0] && p[1] == from[1];
    return new double[] {(start ? p[2] : p[0]) - from[0], (start ? p[3] : p[1]) - from[1]};
  }

  private static double[] chord(Span s) {
    return new double[] {s.curve.x(s.t0), s.curve.y(s.t0), s.curve.x(s.t1), s.curve.y(s.t1)};
  }

  private static boolean boxesApart(double[] p, double[] q, double m) {
    return Math.max(p[0], p[2]) + m < Math.min(q[0], q[2])
        || Math.max(q[0], q[2]) + m < Math.min(p[0], p[2])
        || Math.max(p[1], p[3]) + m < Math.min(q[1], q[3])
        || Math.max(q[1], q[3]) + m < Math.min(p[1], p[3]);
  }
}
