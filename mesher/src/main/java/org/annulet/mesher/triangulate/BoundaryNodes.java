package org.annulet.mesher.triangulate;

import java.util.Arrays;
import org.annulet.mesher.geometry.CurvePiece;
import org.annulet.mesher.geometry.Edge;
import org.annulet.mesher.geometry.Outline;
import org.annulet.mesher.geometry.Point;

/**
 * Cuts the outline's edges into segments after the sizes along them: on each piece the number of
 * segments is ∫ ds/h rounded up, and the nodes sit at equal shares of that integral. At a sharp
 * corner the first node of each piece is at the same distance 2ᵏ from the corner.
 */
final class BoundaryNodes {
  private final Outline outline;
  private final SizeRules rules;
  private final Corners corners;
  private final double[] pointSize;

  /** Node coordinates in m and sizes; the first nodes are the outline's points. */
  double[] x;

  double[] y;
  double[] size;

  /** Point of the outline each of the first nodes is, and whether it is a sharp corner. */
  boolean[] sharp;

  int count;
  final Segments segments;

  BoundaryNodes(Outline outline, SizeRules rules) {
    this.outline = outline;
    this.rules = rules;
    corners = new Corners(outline);
    int n = outline.points().size();
    x = new double[2 * n + 64];
    y = new double[2 * n + 64];
    size = new double[2 * n + 64];
    pointSize = new double[n];
    int pieces = outline.edges().stream().mapToInt(e -> e.pieces().size()).sum();
    CurvePiece[] curves = new CurvePiece[pieces];
    int[] edgeOf = new int[pieces];
    int[] left = new int[outline.edges().size()];
    int[] right = new int[left.length];
    int k = 0;
    for (int e = 0; e < left.length; e++) {
      left[e] = outline.leftZone(e);
      right[e] = outline.rightZone(e);
      for (CurvePiece c : outline.edges().get(e).pieces()) {
        curves[k] = c;
        edgeOf[k++] = e;
      }
    }
    segments = new Segments(curves, edgeOf, left, right);
  }

  void cut() {
    sizePoints();
    sharp = corners.sharp.clone();
    for (Point p : outline.points()) {
      size[count] = pointSize[count];
      add(p.x(), p.y(), pointSize[count]);
    }
    int piece = 0;
    for (int e = 0; e < outline.edges().size(); e++) {
      Edge edge = outline.edges().get(e);
      for (int k = 0; k < edge.pieces().size(); k++, piece++) {
        segments.firstPoint[piece] = edge.points().get(k);
        segments.lastPoint[piece] = edge.points().get(k + 1);
        cutPiece(e, piece, edge.points().get(k), edge.points().get(k + 1));
      }
    }
  }

  private int add(double px, double py, double h) {
    if (count == x.length) {
      x = Arrays.copyOf(x, 2 * count);
      y = Arrays.copyOf(y, 2 * count);
      size = Arrays.copyOf(size, 2 * count);
    }
    x[count] = px;
    y[count] = py;
    size[count] = h;
    return count++;
  }

  /** Smallest size that applies at each point, then graded along the edges. */
  private void sizePoints() {
    Arrays.fill(pointSize, rules.largest());
    int edges = outline.edges().size();
    for (int e = 0; e < edges; e++) {
      for (int p : outline.edges().get(e).points()) {
        double h = rules.alongEdge(e);
        h = rules.at(outline.points().get(p).x(), outline.points().get(p).y(), h);
        pointSize[p] = Math.min(pointSize[p], h);
      }
    }
    for (int p = 0; p < pointSize.length; p++) {
      if (corners.reentrant[p]) {
        pointSize[p] *= rules.cornerShare();
      }
    }
    double[] lengths = Corners.lengths(outline);
    boolean more = true;
    for (int round = 0; more && round < 100; round++) {
      more = false;
      int piece = 0;
      for (Edge e : outline.edges()) {
        for (int k = 0; k < e.pieces().size(); k++, piece++) {
          int a = e.points().get(k);
          int b = e.points().get(k + 1);
          double step = rules.growth() * lengths[piece];
          if (pointSize[b] > pointSize[a] + step) {
            pointSize[b] = pointSize[a] + step;
            more = true;
          }
          if (pointSize[a] > pointSize[b] + step) {
            pointSize[a] = pointSize[b] + step;
            more = true;
          }
        }
      }
    }
  }

  /** Radius in m of the first shell round a sharp point: a power of two. */
  double shell(int p) {
    double r = Math.min(pointSize[p], corners.shortest[p] / 3);
    return Math.scalb(1.0, Math.getExponent(r));
  }

  private void cutPiece(int e, int piece, int a, int b) {
    CurvePiece c = segments.curves[piece];
    double from = 0;
    double to = 1;
    int first = a;
    int last = b;
    if (corners.sharp[a]) {
      from = atDistance(c, 0, shell(a));
      first = add(c.x(from), c.y(from), along(c, e, from, a, b));
      segments.add(a, first, piece, 0, from);
    }
    if (corners.sharp[b]) {
      to = atDistance(c, 1, shell(b));
      last = add(c.x(to), c.y(to), along(c, e, to, a, b));
    }
    middle(c, e, piece, new double[] {from, to}, new int[] {first, last, a, b});
    if (corners.sharp[b]) {
      segments.add(last, b, piece, to, 1);
    }
  }

  /** Parameter at which a piece is at distance r from its end at t = {@code end}. */
  static double atDistance(CurvePiece c, double end, double r) {
    double lo = 0;
    double hi = Math.min(1, 2 * r / c.length(0, 1));
    double px = c.x(end);
    double py = c.y(end);
    for (int i = 0; i < 60; i++) {
      double mid = 0.5 * (lo + hi);
      double t = end == 0 ? mid : 1 - mid;
      if (Math.hypot(c.x(t) - px, c.y(t) - py) < r) {
        lo = mid;
      } else {
        hi = mid;
      }
    }
    return end == 0 ? hi : 1 - hi;
  }

  private double along(CurvePiece c, int e, double t, int a, int b) {
    double px = c.x(t);
    double py = c.y(t);
    double h = rules.alongEdge(e);
    h = Math.min(h, pointSize[a] + rules.growth() * Math.hypot(px - x[a], py - y[a]));
    h = Math.min(h, pointSize[b] + rules.growth() * Math.hypot(px - x[b], py - y[b]));
    return rules.at(px, py, h);
  }

  private double step(CurvePiece c, int e, double t, int[] ends) {
    double h = along(c, e, t, ends[2], ends[3]);
    double k = c.curvature(t);
    return k > 0 ? Math.min(h, rules.turn() / k) : h;
  }

  private void middle(CurvePiece c, int e, int piece, double[] span, int[] ends) {
    int capacity = 64;
    double[] ts = new double[capacity];
    double[] sums = new double[capacity];
    int n = 1;
    ts[0] = span[0];
    double t = span[0];
    while (t < span[1]) {
      double speed = Math.max(c.speed(t), 1e-300);
      double dt = 0.125 * step(c, e, t, ends) / speed;
      double left = span[1] - t;
      // The end values of h count double where the curve speeds up: halve the last two strides.
      dt = dt >= left ? left : Math.min(dt, 0.5 * left + 1e-12);
      if (left < 1e-9) {
        dt = left;
      }
      double tm = t + 0.5 * dt;
      double part = c.speed(tm) * dt / step(c, e, tm, ends);
      if (n == capacity) {
        capacity *= 2;
        ts = Arrays.copyOf(ts, capacity);
        sums = Arrays.copyOf(sums, capacity);
      }
      t = dt == left ? span[1] : t + dt;
      ts[n] = t;
      sums[n] = sums[n - 1] + part;
      n++;
      // Eight strides a cut: stop well before their arrays fill the memory.
      if (count + sums[n - 1] > rules.nodeCap() || n > 16 * (long) rules.nodeCap()) {
        throw rules.tooMany("along edge '" + outline.edges().get(e).name() + "'");
      }
    }
    int cuts = (int) Math.max(1, Math.ceil(sums[n - 1] * (1 - 1e-9)));
    if (count + (long) cuts > rules.nodeCap()) {
      throw rules.tooMany("along edge '" + outline.edges().get(e).name() + "'");
    }
    int before = ends[0];
    double tBefore = span[0];
    int k = 0;
    for (int i = 1; i < cuts; i++) {
      double wanted = sums[n - 1] * i / cuts;
      while (sums[k + 1] < wanted) {
        k++;
      }
      double share = (wanted - sums[k]) / (sums[k + 1] - sums[k]);
      double tc = ts[k] + share * (ts[k + 1] - ts[k]);
      int node = add(c.x(tc), c.y(tc), along(c, e, tc, ends[2], ends[3]));
      segments.add(before, node, piece, tBefore, tc);
      before = node;
      tBefore = tc;
    }
    segments.add(before, ends[1], piece, tBefore, span[1]);
  }

  /** Cuts segment {@code s} in two at the middle of its true curve, before triangles exist. */
  void halve(int s) {
    CurvePiece c = segments.curve(s);
    double tm = 0.5 * (segments.t0[s] + segments.t1[s]);
    int node = add(c.x(tm), c.y(tm), 0.5 * (size[segments.from[s]] + size[segments.to[s]]));
    int end = segments.to[s];
    segments.add(node, end, segments.piece[s], tm, segments.t1[s]);
    segments.to[s] = node;
    segments.t1[s] = tm;
  }
}
