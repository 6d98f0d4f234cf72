package org.annulet.mesher.triangulate;

import java.util.Arrays;
import java.util.Locale;
import org.annulet.mesher.geometry.CurvePiece;

/**
 * Delaunay refinement of a constrained triangulation until every gas triangle keeps its size and,
 * away from sharp corners, the least angle. The method is that of the package documentation.
 *
 * <p>Each node costs a short walk and a cavity of bounded size, so N nodes cost O(N) after the
 * first triangulation's O(n log n).
 */
final class Refiner {
  /** Least angle in degrees. */
  static final double LEAST_ANGLE = 28;

  private static final double SIN2 = Math.pow(Math.sin(Math.toRadians(LEAST_ANGLE)), 2);

  private final Triangulation mesh;
  private final Segments segments;
  private final SizeRules rules;

  /** Size at each node in m. */
  private double[] size;

  /** Piece each node was cut from: −1 inside, −2 a point of the outline. */
  private int[] pieceOf;

  private final boolean[] sharp;

  /** How far in m from a sharp corner its thin triangles are let be. */
  private final double[] reach;

  private int[] segmentStack = new int[256];
  private int segmentCount;
  private boolean[] forced = new boolean[256];
  private final TriangleQueue queue = new TriangleQueue();
  private int[] hits = new int[16];
  private final Placement place;
  private final Flips flips;

  Refiner(Triangulation mesh, BoundaryNodes nodes, SizeRules rules) {
    this.mesh = mesh;
    this.place = new Placement(mesh);
    this.flips = new Flips(mesh);
    this.segments = mesh.segments;
    this.rules = rules;
    this.sharp = nodes.sharp;
    reach = new double[sharp.length];
    for (int p = 0; p < reach.length; p++) {
      reach[p] = sharp[p] ? 2.1 * nodes.shell(p) : 0;
    }
    size = new double[Math.max(4096, 2 * mesh.nodeCount)];
    pieceOf = new int[size.length];
    Arrays.fill(pieceOf, -1);
    System.arraycopy(nodes.size, 0, size, 4, nodes.count);
    for (int s = 0; s < segments.count; s++) {
      segments.from[s] += 4;
      segments.to[s] += 4;
      pieceOf[segments.from[s]] = segments.piece[s];
      pieceOf[segments.to[s]] = segments.piece[s];
    }
    Arrays.fill(pieceOf, 4, 4 + sharp.length, -2);
  }

  void run() {
    gradeSizes();
    for (int s = 0; s < segments.count; s++) {
      checkSegment(s);
    }
    drainSegments();
    for (int t = 0; t < mesh.triangleCount; t++) {
      enqueue(t);
    }
    while (!queue.isEmpty()) {
      treat(queue.poll());
      drainSegments();
    }
  }

  /** Lowers node sizes until no side of a gas triangle sees a growth above the allowed. */
  private void gradeSizes() {
    boolean more = true;
    for (int round = 0; more && round < 1000; round++) {
      more = false;
      for (int t = 0; t < mesh.triangleCount; t++) {
        if (mesh.zone[t] < 0) {
          continue;
        }
        for (int e = 4 * t; e < 4 * t + 3; e++) {
          int a = mesh.start[e];
          int b = mesh.start[Triangulation.next(e)];
          double step = rules.growth() * Math.sqrt(square(a, b));
          if (size[b] > size[a] + step) {
            size[b] = size[a] + step;
            more = true;
          }
        }
      }
    }
  }

  private double square(int a, int b) {
    double dx = mesh.x[b] - mesh.x[a];
    double dy = mesh.y[b] - mesh.y[a];
    return dx * dx + dy * dy;
  }

  private void enqueue(int t) {
    if (mesh.zone[t] >= 0) {
      queue.add(t);
    }
  }

  // Segments

  private boolean inCircleOver(int s, double px, double py) {
    int a = segments.from[s];
    int b = segments.to[s];
    return (mesh.x[a] - px) * (mesh.x[b] - px) + (mesh.y[a] - py) * (mesh.y[b] - py) < 0;
  }

  private boolean encroached(int s) {
    int e = segments.half[s];
    int f = mesh.twin[e];
    int c = mesh.start[Triangulation.prev(e)];
    int d = mesh.start[Triangulation.prev(f)];
    return mesh.zone[e >> 2] >= 0 && inCircleOver(s, mesh.x[c], mesh.y[c])
        || mesh.zone[f >> 2] >= 0 && inCircleOver(s, mesh.x[d], mesh.y[d]);
  }

  private boolean tooLong(int s) {
    double h = 0.5 * (size[segments.from[s]] + size[segments.to[s]]);
    return square(segments.from[s], segments.to[s]) > 1.0001 * h * h;
  }

  private void checkSegment(int s) {
    if (encroached(s) || tooLong(s)) {
      pushSegment(s);
    }
  }

  private void pushSegment(int s) {
    if (s >= forced.length) {
      forced = Arrays.copyOf(forced, 2 * s);
    }
    if (forced[s]) {
      return;
    }
    if (segmentCount == segmentStack.length) {
      segmentStack = Arrays.copyOf(segmentStack, 2 * segmentCount);
    }
    forced[s] = true;
    segmentStack[segmentCount++] = s;
  }

  private void drainSegments() {
    while (segmentCount > 0) {
      int s = segmentStack[--segmentCount];
      forced[s] = false;
      split(s);
    }
  }

  private double splitParameter(int s) {
    int a = segments.from[s];
    int b = segments.to[s];
    CurvePiece c = segments.curve(s);
    double length = Math.sqrt(square(a, b));
    boolean sharpA = isSharp(a);
    if (!sharpA && !isSharp(b)) {
      return 0.5 * (segments.t0[s] + segments.t1[s]);
    }
    // A power of two between a third and two thirds of the length: the same on every edge here.
    double r = Math.scalb(1.0, Math.getExponent(length * (2.0 / 3)));
    double t = BoundaryNodes.atDistance(c, sharpA ? 0 : 1, r);
    boolean within = t > segments.t0[s] && t < segments.t1[s];
    return within ? t : 0.5 * (segments.t0[s] + segments.t1[s]);
  }

  private boolean isSharp(int node) {
    return node < 4 + sharp.length && sharp[node - 4];
  }

  private void split(int s) {
    int a = segments.from[s];
    int b = segments.to[s];
    CurvePiece c = segments.curve(s);
    double t = splitParameter(s);
    double px = c.x(t);
    double py = c.y(t);
    boolean apart = (px != mesh.x[a] || py != mesh.y[a]) && (px != mesh.x[b] || py != mesh.y[b]);
    int e = segments.half[s];
    if (mesh.start[e] != a) {
      e = mesh.twin[e];
    }
    int f = mesh.twin[e];
    int left = mesh.zone[e >> 2];
    int right = mesh.zone[f >> 2];
    mesh.seg[e] = -1;
    mesh.seg[f] = -1;
    if (!apart || !mesh.cavityAcross(e, px, py)) {
      mesh.seg[e] = s;
      mesh.seg[f] = s;
      throw rules.indivisible(segments.edgeOf[segments.piece[s]], px, py);
    }
    int firstRight = 0;
    while (mesh.start[mesh.rim[firstRight]] != a) {
      firstRight++;
    }
    capNodes(px, py);
    int p = mesh.commit(px, py, firstRight, left, right);
    double h = rules.alongEdge(segments.edgeOf[segments.piece[s]]);
    h = Math.min(h, size[a] + rules.growth() * Math.sqrt(square(a, p)));
    h = Math.min(h, size[b] + rules.growth() * Math.sqrt(square(b, p)));
    note(p, rules.at(px, py, h), segments.piece[s]);
    int s2 = segments.add(p, b, segments.piece[s], t, segments.t1[s]);
    segments.to[s] = p;
    segments.t1[s] = t;
    e = mesh.find(a, p);
    mesh.link(e, mesh.twin[e], s);
    e = mesh.find(p, b);
    mesh.link(e, mesh.twin[e], s2);
    int n = mesh.changedCount;
    int[] sides = new int[2 * n];
    for (int i = 0; i < n; i++) {
      sides[2 * i] = 4 * mesh.changed[i];
      sides[2 * i + 1] = 4 * mesh.changed[i] + 1;
    }
    flips.legalise(sides, 2 * n);
    afterChange(true);
  }

  private void afterChange(boolean checkSegments) {
    for (int i = 0; i < mesh.changedCount; i++) {
      int t = mesh.changed[i];
      enqueue(t);
      if (checkSegments) {
        for (int e = 4 * t; e < 4 * t + 3; e++) {
          if (mesh.seg[e] >= 0) {
            checkSegment(mesh.seg[e]);
          }
        }
      }
    }
  }

  private void note(int p, double h, int piece) {
    if (p >= size.length) {
      size = Arrays.copyOf(size, 2 * size.length);
      pieceOf = Arrays.copyOf(pieceOf, size.length);
    }
    size[p] = h;
    pieceOf[p] = piece;
  }

  private void capNodes(double px, double py) {
    if (mesh.nodeCount - 4 >= rules.nodeCap()) {
      throw rules.tooMany(
          String.format(
              Locale.ROOT,
              "when node %d was placed at (%.6g, %.6g) m",
              mesh.nodeCount - 4,
              px,
              py));
    }
  }

  // Triangles

  private void treat(int t) {
    int i = mesh.start[4 * t];
    int j = mesh.start[4 * t + 1];
    int k = mesh.start[4 * t + 2];
    double ij = square(i, j);
    double jk = square(j, k);
    double ki = square(k, i);
    int shortest = ij <= jk ? (ij <= ki ? 0 : 2) : (jk <= ki ? 1 : 2);
    double least = Math.min(ij, Math.min(jk, ki));
    double most = Math.max(ij, Math.max(jk, ki));
    double middle = ij + jk + ki - least - most;
    double twice =
        (mesh.x[j] - mesh.x[i]) * (mesh.y[k] - mesh.y[i])
            - (mesh.x[k] - mesh.x[i]) * (mesh.y[j] - mesh.y[i]);
    double h = (size[i] + size[j] + size[k]) * (1.0 / 3);
    h = Math.min(h, rules.cap(mesh.zone[t]));
    boolean big = most > h * h;
    boolean thin = twice * twice < SIN2 * middle * most;
    if (!big && !thin) {
      return;
    }
    int e = 4 * t + shortest;
    if (!big && spared(e)) {
      return;
    }
    place.choose(e, least, twice, big ? h : 0, thin);
    double newX = place.x;
    double newY = place.y;
    int u = mesh.walk(t, newX, newY, false);
    if (u < 0) {
      if (mesh.blocker >= 0) {
        reject(t, mesh.blocker, least, big);
      }
      return;
    }
    if (!mesh.cavityFrom(u, newX, newY)) {
      return;
    }
    int n = 0;
    for (int r = 0; r < mesh.rimCount; r++) {
      int s = mesh.seg[mesh.rim[r]];
      if (s >= 0 && inCircleOver(s, newX, newY)) {
        if (n == hits.length) {
          hits = Arrays.copyOf(hits, 2 * n);
        }
        hits[n++] = s;
      }
    }
    if (n > 0) {
      for (int r = 0; r < n; r++) {
        reject(t, hits[r], least, big);
      }
      return;
    }
    capNodes(newX, newY);
    int z = mesh.zone[u];
    double hp = rules.at(newX, newY, rules.cap(z));
    for (int c = 4 * u; c < 4 * u + 3; c++) {
      int v = mesh.start[c];
      double d = Math.hypot(newX - mesh.x[v], newY - mesh.y[v]);
      hp = Math.min(hp, size[v] + rules.growth() * d);
    }
    int p = mesh.commit(newX, newY, mesh.rimCount, z, z);
    note(p, hp, -1);
    afterChange(false);
  }

  /** A node at the new place would lie in the circle over segment s: split that instead. */
  private void reject(int t, int s, double least, boolean big) {
    int p = segments.piece[s];
    boolean clustered = near(s, segments.firstPoint[p]) || near(s, segments.lastPoint[p]);
    double half2 = 0.25 * square(segments.from[s], segments.to[s]);
    if (!big && clustered && half2 < least) {
      return;
    }
    pushSegment(s);
    enqueue(t);
  }

  private boolean near(int s, int corner) {
    return sharp[corner] && square(segments.from[s], corner + 4) < square(reach[corner]);
  }

  private static double square(double v) {
    return v * v;
  }

  /** Whether a thin triangle with shortest side e is the doing of a sharp corner. */
  private boolean spared(int e) {
    int a = mesh.start[e];
    int b = mesh.start[Triangulation.next(e)];
    int c = mesh.start[Triangulation.prev(e)];
    if (isSharp(c)
        && mesh.seg[Triangulation.next(e)] >= 0
        && mesh.seg[Triangulation.prev(e)] >= 0) {
      return true;
    }
    int p = pieceOf[a];
    int q = pieceOf[b];
    if (p < 0 || q < 0 || p == q) {
      return false;
    }
    int corner = commonSharp(p, q);
    if (corner < 0) {
      return false;
    }
    double ra = square(a, corner + 4);
    double rb = square(b, corner + 4);
    return Math.abs(ra - rb) < 2e-3 * ra && ra < square(reach[corner]);
  }

  private int commonSharp(int p, int q) {
    for (int corner : new int[] {segments.firstPoint[p], segments.lastPoint[p]}) {
      if (sharp[corner] && (corner == segments.firstPoint[q] || corner == segments.lastPoint[q])) {
        return corner;
      }
    }
    return -1;
  }
}
