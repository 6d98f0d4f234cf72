package org.annulet.mesher.mesh;

import java.util.Arrays;
import java.util.List;
import java.util.function.BiPredicate;
import org.annulet.mesher.mesh.MeshCheck.Finding;
import org.annulet.mesher.mesh.MeshCheck.Law;
import org.annulet.mesher.mesh.MeshMeasures.Sum;
import org.locationtech.jts.algorithm.Orientation;
import org.locationtech.jts.geom.Coordinate;
import org.locationtech.jts.geom.Envelope;
import org.locationtech.jts.index.strtree.STRtree;

/**
 * The laws that need the boundary as a whole. Triangles of positive area whose angles add up to 2π
 * about every inner node, within a boundary that nowhere touches or crosses itself, tile their
 * domain once; so that is what is checked.
 */
final class BoundaryLaws {
  private static final double ROUNDING = 1e-10;

  private final Mesh mesh;
  private final List<Finding> findings;
  private final MeshSides sides;
  private final int[] boundary;

  BoundaryLaws(Mesh mesh, List<Finding> findings) {
    this.mesh = mesh;
    this.findings = findings;
    this.sides = MeshSides.of(mesh);
    int[] list = new int[mesh.segmentCount()];
    int count = 0;
    for (int e = 0; e < list.length; e++) {
      if (mesh.segmentRight(e) < 0) {
        list[count++] = e;
      }
    }
    this.boundary = Arrays.copyOf(list, count);
  }

  void check() {
    named();
    angleSums();
    contacts(BoundaryLaws::touch, "touch or cross");
    if (findings.stream().noneMatch(f -> f.law() == Law.NAMED_BOUNDARY)) {
      new BoundaryLoops(mesh, sides, findings).check();
    }
    divergence();
  }

  /** That the triangles cover their domain once; parts of the boundary may lie on one another. */
  void tiling() {
    angleSums();
    contacts(BoundaryLaws::cross, "cross");
  }

  private void named() {
    for (int s = 0; s < sides.count(); s++) {
      int e = sides.segment(s);
      if (sides.secondTriangle(s) < 0 && (e < 0 || mesh.segmentRight(e) >= 0)) {
        findings.add(at(Law.NAMED_BOUNDARY, "a boundary side has no name", sides.lowNode(s)));
      }
    }
    for (int e = 0; e < mesh.segmentCount(); e++) {
      if (!holds(mesh.segmentLeft(e), mesh.segmentStart(e), mesh.segmentEnd(e))
          || (mesh.segmentRight(e) >= 0
              && !holds(mesh.segmentRight(e), mesh.segmentEnd(e), mesh.segmentStart(e)))) {
        String what = "a segment of edge '" + edge(e) + "' has the gas on the wrong hand";
        findings.add(at(Law.NAMED_BOUNDARY, what, mesh.segmentStart(e)));
      }
    }
  }

  private boolean holds(int t, int a, int b) {
    for (int k = 0; k < 3; k++) {
      if (mesh.corner(t, k) == a && mesh.corner(t, (k + 1) % 3) == b) {
        return true;
      }
    }
    return false;
  }

  private void angleSums() {
    boolean[] onBoundary = new boolean[mesh.nodeCount()];
    for (int e : boundary) {
      onBoundary[mesh.segmentStart(e)] = true;
      onBoundary[mesh.segmentEnd(e)] = true;
    }
    double[] sum = new double[mesh.nodeCount()];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        int p = (k + 1) % 3;
        int q = (k + 2) % 3;
        double ax = mesh.cornerX(t, p) - mesh.cornerX(t, k);
        double ay = mesh.cornerY(t, p) - mesh.cornerY(t, k);
        double bx = mesh.cornerX(t, q) - mesh.cornerX(t, k);
        double by = mesh.cornerY(t, q) - mesh.cornerY(t, k);
        sum[mesh.corner(t, k)] += Math.atan2(ax * by - ay * bx, ax * bx + ay * by);
      }
    }
    for (int v = 0; v < sum.length; v++) {
      if (sum[v] == 0) {
        findings.add(at(Law.CONFORMING, "node " + v + " belongs to no triangle", v));
      } else if (onBoundary[v]
          ? sum[v] > 2 * Math.PI + ROUNDING
          : Math.abs(sum[v] - 2 * Math.PI) > ROUNDING) {
        String what = "the angles about node " + v + " add up to " + Math.toDegrees(sum[v]) + "°";
        findings.add(at(Law.CONFORMING, what, v));
      }
    }
  }

  /** Boundary sides that meet in this way anywhere but in a common node. */
  private void contacts(BiPredicate<Coordinate[], Coordinate[]> meet, String word) {
    STRtree tree = new STRtree();
    for (int e : boundary) {
      tree.insert(box(ends(e, 0)), e);
    }
    double[] shifts = mesh.period() == 0 ? new double[] {0} : new double[] {0, -mesh.period()};
    for (double shift : shifts) {
      for (int e : boundary) {
        Coordinate[] p = ends(e, shift);
        for (Object hit : tree.query(box(p))) {
          int f = (Integer) hit;
          if ((f > e || shift != 0) && !haveCommonNode(e, f) && meet.test(p, ends(f, 0))) {
            String what = "sides of '" + edge(e) + "' and '" + edge(f) + "' " + word;
            findings.add(at(Law.CONFORMING, what, mesh.segmentStart(e)));
          }
        }
      }
    }
  }

  private boolean haveCommonNode(int e, int f) {
    int a = mesh.segmentStart(f);
    int b = mesh.segmentEnd(f);
    return mesh.segmentStart(e) == a
        || mesh.segmentStart(e) == b
        || mesh.segmentEnd(e) == a
        || mesh.segmentEnd(e) == b;
  }

  private static boolean touch(Coordinate[] p, Coordinate[] q) {
    if (!new Envelope(p[0], p[1]).intersects(new Envelope(q[0], q[1]))) {
      return false;
    }
    return Orientation.index(p[0], p[1], q[0]) * Orientation.index(p[0], p[1], q[1]) <= 0
        && Orientation.index(q[0], q[1], p[0]) * Orientation.index(q[0], q[1], p[1]) <= 0;
  }

  private static boolean cross(Coordinate[] p, Coordinate[] q) {
    return Orientation.index(p[0], p[1], q[0]) * Orientation.index(p[0], p[1], q[1]) < 0
        && Orientation.index(q[0], q[1], p[0]) * Orientation.index(q[0], q[1], p[1]) < 0;
  }

  private static Envelope box(Coordinate[] p) {
    return new Envelope(p[0], p[1]);
  }

  private Coordinate[] ends(int e, double shift) {
    int a = mesh.segmentStart(e);
    double y = mesh.y(a) + shift;
    return new Coordinate[] {
      new Coordinate(mesh.x(a), y), new Coordinate(mesh.x(mesh.segmentEnd(e)), y + rise(e))
    };
  }

  private double rise(int e) {
    double dy = mesh.y(mesh.segmentEnd(e)) - mesh.y(mesh.segmentStart(e));
    double period = mesh.period();
    return period == 0 ? dy : dy - period * Math.rint(dy / period);
  }

  /** ∮ x n_x ds = area, with n ds = (dy, −dx) to the right of each segment. */
  private void divergence() {
    Sum moment = new Sum();
    double size = 0;
    double x0 = mesh.x(mesh.corner(0, 0));
    for (int e : boundary) {
      double mean = 0.5 * (mesh.x(mesh.segmentStart(e)) + mesh.x(mesh.segmentEnd(e)));
      double term = (mean - x0) * rise(e);
      moment.add(term);
      size += Math.abs(term);
    }
    double area = MeshMeasures.area(mesh);
    if (!(Math.abs(moment.value() - area) <= ROUNDING * size)) {
      String what =
          "the boundary's normals return " + moment.value() + " m² where the area is " + area;
      findings.add(Finding.ofWhole(Law.OUTWARD_NORMALS, what));
    }
  }

  private Finding at(Law law, String what, int v) {
    return new Finding(law, what, mesh.x(v), mesh.y(v));
  }

  private String edge(int e) {
    return mesh.edgeNames().get(mesh.segmentEdge(e));
  }
}
