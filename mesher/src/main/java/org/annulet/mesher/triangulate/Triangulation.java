package org.annulet.mesher.triangulate;

import java.util.Arrays;

/**
 * A constrained Delaunay triangulation in flat arrays.
 *
 * <p>Half-edge e belongs to triangle e / 4 and is its side number e mod 4 (0, 1, 2; slot 3 is
 * unused). It runs from node {@code start[e]} to {@code start[next(e)]} with the triangle on its
 * left; {@code twin[e]} is the same side seen from the neighbour, −1 on the hull; {@code seg[e]} is
 * the segment lying on it, −1 for none.
 *
 * <p>A node is inserted by Bowyer and Watson's cavity: the triangles whose circle holds it, found
 * by a depth-first search that does not pass segments, are replaced by its star. The search changes
 * nothing until {@link #commit}, so a place can be tried and dropped.
 */
final class Triangulation {
  /** Mark of a side that will become a segment and must not be flipped. */
  static final int PENDING = Integer.MAX_VALUE;

  double[] x = new double[1024];
  double[] y = new double[1024];

  /** Some half-edge leaving each node. */
  int[] out = new int[1024];

  int nodeCount;
  int[] start = new int[4096];
  int[] twin = new int[4096];
  int[] seg = new int[4096];
  int[] zone = new int[1024];
  int triangleCount;
  final Segments segments;

  /** Cavity of the last search: boundary half-edges, anticlockwise. */
  int[] rim = new int[64];

  int rimCount;
  private int[] cavity = new int[64];
  private int cavityCount;
  private int[] stack = new int[64];
  private int[] mark = new int[1024];
  private int stamp;

  /** Triangles changed by the last commit and its flips. */
  int[] changed = new int[64];

  int changedCount;

  /** Segment that stopped the last walk. */
  int blocker;

  Triangulation(Segments segments) {
    this.segments = segments;
  }

  static int next(int e) {
    return (e & 3) == 2 ? e - 2 : e + 1;
  }

  static int prev(int e) {
    return (e & 3) == 0 ? e + 2 : e - 1;
  }

  /** Starts with two triangles over a square. */
  void frame(double cx, double cy, double half) {
    int a = addNode(cx - half, cy - half);
    int b = addNode(cx + half, cy - half);
    int c = addNode(cx + half, cy + half);
    int d = addNode(cx - half, cy + half);
    int t = addTriangle();
    int u = addTriangle();
    set(t, a, b, c);
    set(u, c, d, a);
    for (int k = 0; k < 3; k++) {
      link(4 * t + k, -1, -1);
      link(4 * u + k, -1, -1);
    }
    link(4 * t + 2, 4 * u + 2, -1);
  }

  private void set(int t, int a, int b, int c) {
    start[4 * t] = a;
    start[4 * t + 1] = b;
    start[4 * t + 2] = c;
    out[a] = 4 * t;
    out[b] = 4 * t + 1;
    out[c] = 4 * t + 2;
  }

  int addNode(double px, double py) {
    if (nodeCount == x.length) {
      int n = 2 * nodeCount;
      x = Arrays.copyOf(x, n);
      y = Arrays.copyOf(y, n);
      out = Arrays.copyOf(out, n);
    }
    x[nodeCount] = px;
    y[nodeCount] = py;
    return nodeCount++;
  }

  private int addTriangle() {
    if (triangleCount == zone.length) {
      int n = 2 * triangleCount;
      start = Arrays.copyOf(start, 4 * n);
      twin = Arrays.copyOf(twin, 4 * n);
      seg = Arrays.copyOf(seg, 4 * n);
      zone = Arrays.copyOf(zone, n);
      mark = Arrays.copyOf(mark, n);
    }
    zone[triangleCount] = Integer.MIN_VALUE;
    return triangleCount++;
  }

  void link(int e, int f, int s) {
    twin[e] = f;
    seg[e] = s;
    if (f >= 0) {
      twin[f] = e;
      seg[f] = s;
    }
    if (s >= 0 && s != PENDING) {
      segments.half[s] = e;
    }
  }

  int orient(int a, int b, double px, double py) {
    return Predicates.orient(x[a], y[a], x[b], y[b], px, py);
  }

  boolean inCircle(int t, double px, double py) {
    int a = start[4 * t];
    int b = start[4 * t + 1];
    int c = start[4 * t + 2];
    return Predicates.inCircle(x[a], y[a], x[b], y[b], x[c], y[c], px, py);
  }

  /**
   * Walks from triangle {@code t} to the one that holds a place.
   *
   * @return the triangle, or −1 if only a segment, noted in {@link #blocker}, leads on
   */
  int walk(int t, double px, double py, boolean pastSegments) {
    int from = -1;
    for (int step = 0; step < 3 * triangleCount + 10; step++) {
      int exit = -1;
      int wall = -1;
      // Starting side alternates, so that a walk in a triangulation that is not Delaunay across its
      // segments cannot circle for ever.
      for (int i = 0; i < 3; i++) {
        int e = 4 * t + (i + step) % 3;
        if (e == from) {
          continue;
        }
        if (orient(start[e], start[next(e)], px, py) < 0) {
          if (twin[e] < 0 || (!pastSegments && seg[e] >= 0)) {
            wall = e;
          } else {
            exit = e;
            break;
          }
        }
      }
      if (exit < 0) {
        if (wall < 0) {
          return t;
        }
        blocker = seg[wall];
        return -1;
      }
      from = twin[exit];
      t = from >> 2;
    }
    blocker = -1;
    return -1;
  }

  /**
   * Finds the cavity of a place in triangle {@code t}; false if it cannot be starred from there.
   */
  boolean cavityFrom(int t, double px, double py) {
    begin();
    take(t);
    push3(4 * t + 2, 4 * t + 1, 4 * t);
    return search(3, px, py);
  }

  /** Finds the cavity of a place near half-edge {@code e}, whose segment no longer counts. */
  boolean cavityAcross(int e, double px, double py) {
    begin();
    int f = twin[e];
    take(e >> 2);
    take(f >> 2);
    push3(prev(f), next(f), prev(e));
    stack[3] = next(e);
    return search(4, px, py);
  }

  private void begin() {
    stamp++;
    cavityCount = 0;
    rimCount = 0;
  }

  private void push3(int a, int b, int c) {
    stack[0] = a;
    stack[1] = b;
    stack[2] = c;
  }

  private void take(int t) {
    mark[t] = stamp;
    if (cavityCount == cavity.length) {
      cavity = Arrays.copyOf(cavity, 2 * cavityCount);
    }
    cavity[cavityCount++] = t;
  }

  private boolean search(int depth, double px, double py) {
    while (depth > 0) {
      int e = stack[--depth];
      int f = twin[e];
      if (f >= 0 && seg[e] < 0) {
        int t = f >> 2;
        if (mark[t] == stamp) {
          return false;
        }
        if (inCircle(t, px, py)) {
          take(t);
          if (depth + 2 > stack.length) {
            stack = Arrays.copyOf(stack, 2 * stack.length);
          }
          stack[depth++] = prev(f);
          stack[depth++] = next(f);
          continue;
        }
      }
      if (rimCount == rim.length) {
        rim = Arrays.copyOf(rim, 2 * rimCount);
      }
      rim[rimCount++] = e;
    }
    for (int i = 0; i < rimCount; i++) {
      if (orient(start[rim[i]], start[next(rim[i])], px, py) <= 0) {
        return false;
      }
    }
    return true;
  }

  /**
   * Replaces the cavity by the star of a new node; rim sides before number {@code firstRight} get
   * zone {@code left}, the others zone {@code right}.
   *
   * @return the new node
   */
  int commit(double px, double py, int firstRight, int left, int right) {
    int p = addNode(px, py);
    star(p, firstRight, left, right);
    return p;
  }

  /** As {@link #commit}, with a node that has its coordinates but no triangles yet. */
  void star(int p, int firstRight, int left, int right) {
    int n = rimCount;
    // Gather before overwriting: ends, twins and segments of the rim.
    if (changed.length < 4 * n) {
      changed = new int[8 * n];
    }
    int[] g = gather(n);
    int firstTriangle = -1;
    int last = -1;
    changedCount = 0;
    for (int i = 0; i < n; i++) {
      int t = i < cavityCount ? cavity[i] : addTriangle();
      int a = g[4 * i];
      int b = g[4 * i + 1];
      start[4 * t] = a;
      start[4 * t + 1] = b;
      start[4 * t + 2] = p;
      out[a] = 4 * t;
      link(4 * t, g[4 * i + 2], g[4 * i + 3]);
      zone[t] = i < firstRight ? left : right;
      if (i == 0) {
        firstTriangle = t;
      } else {
        link(4 * last + 1, 4 * t + 2, -1);
      }
      last = t;
      changed[changedCount++] = t;
    }
    link(4 * last + 1, 4 * firstTriangle + 2, -1);
    out[p] = 4 * firstTriangle + 2;
  }

  private int[] gathered = new int[256];

  private int[] gather(int n) {
    if (gathered.length < 4 * n) {
      gathered = new int[8 * n];
    }
    for (int i = 0; i < n; i++) {
      int e = rim[i];
      gathered[4 * i] = start[e];
      gathered[4 * i + 1] = start[next(e)];
      gathered[4 * i + 2] = twin[e];
      gathered[4 * i + 3] = seg[e];
    }
    return gathered;
  }

  /** Half-edge from a to b, or −1. */
  int find(int a, int b) {
    int e0 = out[a];
    int e = e0;
    do {
      if (start[next(e)] == b) {
        return e;
      }
      e = twin[prev(e)];
    } while (e >= 0 && e != e0);
    if (e < 0) {
      // A hull node: turn the other way.
      e = e0;
      while (twin[e] >= 0) {
        e = next(twin[e]);
        if (start[next(e)] == b) {
          return e;
        }
      }
    }
    return -1;
  }

  /** Puts a triangle on the list of the changed. */
  void note(int t) {
    if (changedCount == changed.length) {
      changed = Arrays.copyOf(changed, 2 * changedCount);
    }
    changed[changedCount++] = t;
  }
}
