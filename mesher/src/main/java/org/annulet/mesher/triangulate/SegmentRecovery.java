package org.annulet.mesher.triangulate;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.List;

/**
 * Forces a side between two nodes into a triangulation by flipping the sides it crosses (Sloan,
 * Adv. Eng. Software 15, 1993).
 */
final class SegmentRecovery {
  /** Result when the straight line meets a node on its way. */
  static final int MEETS_NODE = -1;

  private final Triangulation mesh;
  private final Flips flips;

  SegmentRecovery(Triangulation mesh) {
    this.mesh = mesh;
    this.flips = new Flips(mesh);
  }

  /**
   * Forces side a–b.
   *
   * @return the half-edge from a to b; {@link #MEETS_NODE}; or −2 − s if segment s is in the way
   */
  int force(int a, int b) {
    ArrayDeque<int[]> crossed = new ArrayDeque<>();
    int stop = collect(a, b, crossed);
    if (stop != 0) {
      return stop;
    }
    List<int[]> fresh = new ArrayList<>();
    long cap = 50L * (crossed.size() + 10) * (crossed.size() + 10);
    while (!crossed.isEmpty()) {
      if (cap-- < 0) {
        return MEETS_NODE;
      }
      int[] side = crossed.poll();
      int e = mesh.find(side[0], side[1]);
      if (!flips.convex(e)) {
        crossed.add(side);
        continue;
      }
      int c = mesh.start[Triangulation.prev(e)];
      int d = mesh.start[Triangulation.prev(mesh.twin[e])];
      flips.flip(e);
      boolean touches = c == a || c == b || d == a || d == b;
      if (!touches && side(a, b, c) != side(a, b, d)) {
        crossed.add(new int[] {c, d});
      } else {
        fresh.add(new int[] {c, d});
      }
    }
    int e = mesh.find(a, b);
    if (e < 0) {
      return MEETS_NODE;
    }
    int[] sides = new int[fresh.size()];
    int n = 0;
    // The wanted side must not be flipped away again: it is marked.
    int f = mesh.twin[e];
    mesh.seg[e] = Triangulation.PENDING;
    mesh.seg[f] = Triangulation.PENDING;
    for (int[] side : fresh) {
      int g = mesh.find(side[0], side[1]);
      if (g >= 0) {
        sides[n++] = g;
      }
    }
    flips.legalise(sides, n);
    e = mesh.find(a, b);
    mesh.seg[e] = -1;
    mesh.seg[mesh.twin[e]] = -1;
    return e;
  }

  private int side(int a, int b, int c) {
    return mesh.orient(a, b, mesh.x[c], mesh.y[c]);
  }

  /** Sides crossed by a–b, in order; 0 if fine. */
  private int collect(int a, int b, ArrayDeque<int[]> crossed) {
    int e0 = mesh.out[a];
    int e = e0;
    while (true) {
      int p = mesh.start[Triangulation.next(e)];
      int q = mesh.start[Triangulation.prev(e)];
      int sp = side(a, b, p);
      int sq = side(a, b, q);
      if (sp == 0 && ahead(a, b, p) || sq == 0 && ahead(a, b, q)) {
        return MEETS_NODE;
      }
      if (sp < 0 && sq > 0) {
        break;
      }
      e = mesh.twin[Triangulation.prev(e)];
      if (e == e0 || e < 0) {
        return MEETS_NODE;
      }
    }
    e = Triangulation.next(e);
    while (true) {
      if (mesh.seg[e] >= 0) {
        return -2 - mesh.seg[e];
      }
      crossed.add(new int[] {mesh.start[e], mesh.start[Triangulation.next(e)]});
      int f = mesh.twin[e];
      int d = mesh.start[Triangulation.prev(f)];
      if (d == b) {
        return 0;
      }
      int s = side(a, b, d);
      if (s == 0) {
        return MEETS_NODE;
      }
      e = s > 0 ? Triangulation.next(f) : Triangulation.prev(f);
    }
  }

  private boolean ahead(int a, int b, int p) {
    double dx = mesh.x[b] - mesh.x[a];
    double dy = mesh.y[b] - mesh.y[a];
    return dx * (mesh.x[p] - mesh.x[a]) + dy * (mesh.y[p] - mesh.y[a]) > 0;
  }
}
