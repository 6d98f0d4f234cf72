package org.annulet.mesher.mesh;

import java.util.ArrayDeque;
import java.util.Arrays;
import java.util.BitSet;

/**
 * Splits the marked sides of a mesh in the middle and each triangle by the pattern its marked sides
 * ask for. The patterns of the two refinements differ only where all three sides are marked.
 */
final class SideSplit {
  /** What becomes of a triangle with three marked sides. */
  enum Pattern {
    /** Four triangles similar to the old one. */
    SIMILAR,
    /** Two bisections, the longest side first. */
    BISECTED
  }

  private final Mesh mesh;
  private final MeshSides sides;
  private final BitSet marked;
  private final Pattern pattern;
  private final int[] midNode;
  private final double[] midXy;
  private int[] children = new int[48];
  private int[] parents = new int[16];
  private int childCount;

  private SideSplit(Mesh mesh, MeshSides sides, BitSet marked, Pattern pattern) {
    this.mesh = mesh;
    this.sides = sides;
    this.marked = marked;
    this.pattern = pattern;
    this.midNode = new int[sides.count()];
    this.midXy = new double[2 * sides.count()];
  }

  static Refinement split(Mesh mesh, MeshSides sides, BitSet marked, SplitRule rule) {
    return new SideSplit(mesh, sides, marked, rule.pattern()).run(rule.curves());
  }

  /** How to split and where the new nodes go. */
  record SplitRule(Pattern pattern, EdgeCurves curves) {}

  private Refinement run(EdgeCurves curves) {
    int nodes = mesh.nodeCount();
    int newCount = marked.cardinality();
    int[] nodeParents = new int[2 * (nodes + newCount)];
    for (int v = 0; v < nodes; v++) {
      nodeParents[2 * v] = v;
      nodeParents[2 * v + 1] = v;
    }
    BitSet curved = new BitSet();
    int next = nodes;
    Arrays.fill(midNode, -1);
    for (int s = marked.nextSetBit(0); s >= 0; s = marked.nextSetBit(s + 1)) {
      midNode[s] = next;
      nodeParents[2 * next] = sides.lowNode(s);
      nodeParents[2 * next + 1] = sides.highNode(s);
      next++;
      if (place(s, curves)) {
        curved.set(s);
      }
    }
    for (int t = 0; t < mesh.triangleCount(); t++) {
      splitTriangle(t);
    }
    int straightened = straighten(curved);
    return new Refinement(build(), Arrays.copyOf(parents, childCount), nodeParents, straightened);
  }

  /** Places the middle of side {@code s}; true if a curve moved it off the chord. */
  private boolean place(int s, EdgeCurves curves) {
    int a = sides.lowNode(s);
    int b = sides.highNode(s);
    double ya = mesh.y(a);
    double yb = near(mesh.y(b), ya);
    double x = 0.5 * (mesh.x(a) + mesh.x(b));
    double y = 0.5 * (ya + yb);
    midXy[2 * s] = x;
    midXy[2 * s + 1] = y;
    int e = sides.segment(s);
    if (e < 0) {
      return false;
    }
    String edge = mesh.edgeNames().get(mesh.segmentEdge(e));
    double[] p = curves.midpoint(edge, new double[] {mesh.x(a), ya}, new double[] {mesh.x(b), yb});
    double chord = Math.hypot(mesh.x(b) - mesh.x(a), yb - ya);
    double move = p.length == 2 ? Math.hypot(p[0] - x, p[1] - y) : Double.NaN;
    if (!(move <= chord)) {
      throw new IllegalArgumentException(
          "the curve of edge '"
              + edge
              + "' puts the middle of the segment at ("
              + x
              + ", "
              + y
              + ") m to "
              + Arrays.toString(p)
              + ", further off than the segment is long");
    }
    midXy[2 * s] = p[0];
    midXy[2 * s + 1] = p[1];
    return move > 0;
  }

  private void splitTriangle(int t) {
    int[] v = {mesh.corner(t, 0), mesh.corner(t, 1), mesh.corner(t, 2)};
    int[] m = {midNode[sides.side(t, 0)], midNode[sides.side(t, 1)], midNode[sides.side(t, 2)]};
    if (pattern == Pattern.SIMILAR) {
      child(t, v[0], m[0], m[2]);
      child(t, m[0], v[1], m[1]);
      child(t, m[2], m[1], v[2]);
      child(t, m[0], m[1], m[2]);
      return;
    }
    int k = Bisection.longestSide(mesh, sides, t);
    if (m[k] < 0) {
      child(t, v[0], v[1], v[2]);
      return;
    }
    int a = v[k];
    int b = v[(k + 1) % 3];
    int c = v[(k + 2) % 3];
    bisectChild(t, new int[] {c, a, m[k]}, m[(k + 2) % 3]);
    bisectChild(t, new int[] {b, c, m[k]}, m[(k + 1) % 3]);
  }

  /** A child p, q, apex whose side p–q has the middle {@code mid}, or −1. */
  private void bisectChild(int t, int[] pqa, int mid) {
    if (mid < 0) {
      child(t, pqa[0], pqa[1], pqa[2]);
    } else {
      child(t, pqa[0], mid, pqa[2]);
      child(t, mid, pqa[1], pqa[2]);
    }
  }

  private void child(int t, int a, int b, int c) {
    if (childCount == parents.length) {
      parents = Arrays.copyOf(parents, 2 * parents.length);
      children = Arrays.copyOf(children, 3 * parents.length);
    }
    parents[childCount] = t;
    children[3 * childCount] = a;
    children[3 * childCount + 1] = b;
    children[3 * childCount + 2] = c;
    childCount++;
  }

  /** Puts nodes back on the chord where the curve turns a child over; each node at most once. */
  private int straighten(BitSet curved) {
    if (curved.isEmpty()) {
      return 0;
    }
    int nodes = mesh.nodeCount();
    int[] sideOfNode = new int[marked.cardinality()];
    for (int s = marked.nextSetBit(0); s >= 0; s = marked.nextSetBit(s + 1)) {
      sideOfNode[midNode[s] - nodes] = s;
    }
    int[] firstChild = new int[mesh.triangleCount() + 1];
    for (int c = 0; c < childCount; c++) {
      firstChild[parents[c] + 1] = c + 1;
    }
    int count = 0;
    ArrayDeque<Integer> open = new ArrayDeque<>();
    for (int t = 0; t < mesh.triangleCount(); t++) {
      open.add(t);
    }
    while (!open.isEmpty()) {
      int t = open.poll();
      for (int c = firstChild[t]; c < firstChild[t + 1]; c++) {
        if (childArea(c, sideOfNode) > 0) {
          continue;
        }
        for (int k = 0; k < 3; k++) {
          int v = children[3 * c + k];
          if (v >= nodes && curved.get(sideOfNode[v - nodes])) {
            int s = sideOfNode[v - nodes];
            curved.clear(s);
            place(s, EdgeCurves.STRAIGHT);
            count++;
            open.add(sides.firstTriangle(s));
            if (sides.secondTriangle(s) >= 0) {
              open.add(sides.secondTriangle(s));
            }
          }
        }
      }
    }
    return count;
  }

  private double childArea(int c, int[] sideOfNode) {
    double[] x = new double[3];
    double[] y = new double[3];
    for (int k = 0; k < 3; k++) {
      int v = children[3 * c + k];
      if (v < mesh.nodeCount()) {
        x[k] = mesh.x(v);
        y[k] = mesh.y(v);
      } else {
        int s = sideOfNode[v - mesh.nodeCount()];
        x[k] = midXy[2 * s];
        y[k] = midXy[2 * s + 1];
      }
      y[k] = near(y[k], y[0]);
    }
    return (x[1] - x[0]) * (y[2] - y[0]) - (x[2] - x[0]) * (y[1] - y[0]);
  }

  private Mesh build() {
    double period = mesh.period();
    Mesh.Builder builder = period == 0 ? Mesh.builder() : Mesh.periodicBuilder(period);
    for (int v = 0; v < mesh.nodeCount(); v++) {
      builder.node(mesh.x(v), mesh.y(v));
    }
    for (int s = marked.nextSetBit(0); s >= 0; s = marked.nextSetBit(s + 1)) {
      builder.node(midXy[2 * s], wrap(midXy[2 * s + 1]));
    }
    for (int c = 0; c < childCount; c++) {
      String zone = mesh.zoneNames().get(mesh.zone(parents[c]));
      builder.triangle(children[3 * c], children[3 * c + 1], children[3 * c + 2], zone);
    }
    int[] sideOfSegment = new int[mesh.segmentCount()];
    for (int s = 0; s < sides.count(); s++) {
      if (sides.segment(s) >= 0) {
        sideOfSegment[sides.segment(s)] = s;
      }
    }
    for (int e = 0; e < mesh.segmentCount(); e++) {
      String edge = mesh.edgeNames().get(mesh.segmentEdge(e));
      int mid = midNode[sideOfSegment[e]];
      if (mid < 0) {
        builder.segment(mesh.segmentStart(e), mesh.segmentEnd(e), edge);
      } else {
        builder.segment(mesh.segmentStart(e), mid, edge);
        builder.segment(mid, mesh.segmentEnd(e), edge);
      }
    }
    return builder.build();
  }

  private double near(double y, double ref) {
    double period = mesh.period();
    return period == 0 ? y : y - period * Math.rint((y - ref) / period);
  }

  private double wrap(double y) {
    double period = mesh.period();
    return period == 0 ? y : y - period * Math.floor(y / period);
  }
}
