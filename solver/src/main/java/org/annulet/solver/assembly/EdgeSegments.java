package org.annulet.solver.assembly;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.flame.Side;

/**
 * The segments of a named edge, seen from one of its sides.
 *
 * @param edge its name
 * @param segments in the order of the mesh
 */
record EdgeSegments(String edge, List<Segment> segments) {

  /**
   * One segment on one side.
   *
   * @param number in the mesh
   * @param triangle on this side
   * @param opposite triangle on the other side, −1 on the boundary
   * @param first node after cutting
   * @param last node after cutting
   * @param load ∫ w φ over the segment for its two nodes, shape [2]
   * @param product ∫ w φφ over the segment, (0,0), (1,0), (1,1), shape [3]
   */
  record Segment(
      int number,
      int triangle,
      int opposite,
      int first,
      int last,
      double[] load,
      double[] product) {
    @Override
    public double[] product() {
      return product.clone();
    }

    double measure() {
      return load[0] + load[1];
    }
  }

  /** The side in the gas of a boundary edge, or the left-hand side of an inner one. */
  static EdgeSegments ofBoundary(CutMesh nodes, Metric metric, String edge) {
    return collect(nodes, metric, edge, e -> nodes.mesh().segmentLeft(e));
  }

  /**
   * The edge as the gas passes through it: where the weight of the geometry jumps, as at the end of
   * a duct, the side with the smaller one.
   */
  static EdgeSegments passage(CutMesh nodes, Metric metric, String edge) {
    Mesh mesh = nodes.mesh();
    return collect(
        nodes,
        metric,
        edge,
        e -> {
          int left = mesh.segmentLeft(e);
          int right = mesh.segmentRight(e);
          if (right < 0) {
            return left;
          }
          return middle(mesh, metric, left, e) <= middle(mesh, metric, right, e) ? left : right;
        });
  }

  private static double middle(Mesh mesh, Metric metric, int t, int e) {
    double y = cornerY(mesh, t, mesh.segmentStart(e)) + cornerY(mesh, t, mesh.segmentEnd(e));
    return metric.length(t, y / 2);
  }

  /** The same inner edge from its other side. */
  EdgeSegments opposite(CutMesh nodes, Metric metric) {
    java.util.Map<Integer, Integer> other = new java.util.HashMap<>();
    for (Segment s : segments) {
      other.put(s.number(), s.opposite());
    }
    return collect(nodes, metric, edge, other::get);
  }

  /** The named side of an inner edge. */
  static EdgeSegments of(CutMesh nodes, Metric metric, String edge, Side side) {
    Mesh mesh = nodes.mesh();
    if (side instanceof Side.InZone in) {
      int zone = Names.zone(mesh, in.zone(), "side of edge '" + edge + "'");
      return collect(
          nodes,
          metric,
          edge,
          e -> {
            int left = mesh.segmentLeft(e);
            int right = inner(mesh, e, edge);
            boolean isLeft = mesh.zone(left) == zone;
            if (isLeft == (mesh.zone(right) == zone)) {
              throw new IllegalArgumentException(
                  "edge '"
                      + edge
                      + "' has "
                      + (isLeft ? "both sides" : "no side")
                      + " in zone '"
                      + in.zone()
                      + "': name the side by the direction of flow or by another zone");
            }
            return isLeft ? left : right;
          });
    }
    Side.Upstream flow = (Side.Upstream) side;
    return collect(
        nodes,
        metric,
        edge,
        e -> {
          int left = mesh.segmentLeft(e);
          int right = inner(mesh, e, edge);
          double dx = mesh.x(mesh.segmentEnd(e)) - mesh.x(mesh.segmentStart(e));
          double dy = cornerY(mesh, left, mesh.segmentEnd(e));
          dy -= cornerY(mesh, left, mesh.segmentStart(e));
          return flow.x() * dy - flow.y() * dx >= 0 ? left : right; // right-hand normal (dy, −dx)
        });
  }

  private static int inner(Mesh mesh, int e, String edge) {
    if (mesh.segmentRight(e) < 0) {
      throw new IllegalArgumentException(
          "edge '" + edge + "' lies on the boundary, where an inner edge is needed");
    }
    return mesh.segmentRight(e);
  }

  @FunctionalInterface
  private interface Choice {
    int triangle(int segment);
  }

  private static EdgeSegments collect(CutMesh nodes, Metric metric, String edge, Choice choice) {
    Mesh mesh = nodes.mesh();
    int index = Names.edge(mesh, edge);
    List<Segment> list = new ArrayList<>();
    for (int e = 0; e < mesh.segmentCount(); e++) {
      if (mesh.segmentEdge(e) != index) {
        continue;
      }
      int t = choice.triangle(e);
      int a = mesh.segmentStart(e);
      int b = mesh.segmentEnd(e);
      double w0 = metric.length(t, cornerY(mesh, t, a));
      double w1 = metric.length(t, cornerY(mesh, t, b));
      double length = metric.segmentLength(e, t);
      double[] load = {length * (w0 / 3 + w1 / 6), length * (w0 / 6 + w1 / 3)};
      double[] product = {
        length * (w0 / 4 + w1 / 12), length * (w0 + w1) / 12, length * (w0 / 12 + w1 / 4)
      };
      int opposite = mesh.segmentLeft(e) == t ? mesh.segmentRight(e) : mesh.segmentLeft(e);
      list.add(new Segment(e, t, opposite, nodes.nodeOn(t, a), nodes.nodeOn(t, b), load, product));
    }
    return new EdgeSegments(edge, list);
  }

  static double cornerY(Mesh mesh, int t, int v) {
    for (int k = 0; k < 3; k++) {
      if (mesh.corner(t, k) == v) {
        return mesh.cornerY(t, k);
      }
    }
    throw new IllegalStateException("node " + v + " is no corner of triangle " + t);
  }

  /** ∫ w over the edge: its area in m². */
  double area() {
    double sum = 0;
    for (Segment s : segments) {
      sum += s.measure();
    }
    return sum;
  }

  /** Those segments whose middle belongs to burner {@code burner} of a ring. */
  EdgeSegments ofBurner(Mesh mesh, Sectors sectors, int burner) {
    List<Segment> own = new ArrayList<>();
    for (Segment s : segments) {
      int t = s.triangle();
      double y =
          0.5
              * (cornerY(mesh, t, mesh.segmentStart(s.number()))
                  + cornerY(mesh, t, mesh.segmentEnd(s.number())));
      if (sectors.burnerAt(y) == burner) {
        own.add(s);
      }
    }
    return new EdgeSegments(edge, own);
  }

  /**
   * The triangles of this side that touch the edge: round each of its nodes, up to the edge itself
   * or the boundary.
   *
   * @throws IllegalArgumentException if one can walk round an end of the edge to its other side
   */
  List<Integer> touching(Mesh mesh) {
    CutMesh alone = new CutMesh(mesh, Set.of(edge));
    Set<Integer> own = new HashSet<>();
    Set<Integer> other = new HashSet<>();
    for (Segment s : segments) {
      for (int v : new int[] {mesh.segmentStart(s.number()), mesh.segmentEnd(s.number())}) {
        own.add(alone.nodeOn(s.triangle(), v));
        if (s.opposite() >= 0) {
          other.add(alone.nodeOn(s.opposite(), v));
        }
      }
    }
    for (int v : own) {
      if (other.contains(v)) {
        int o = alone.origin(v);
        throw new IllegalArgumentException(
            "edge '"
                + edge
                + "' ends inside the gas at ("
                + mesh.x(o)
                + ", "
                + mesh.y(o)
                + ") m, so it has no two sides there; lead it to a wall");
      }
    }
    List<Integer> triangles = new ArrayList<>();
    for (int t = 0; t < mesh.triangleCount(); t++) {
      if (own.contains(alone.corner(t, 0))
          || own.contains(alone.corner(t, 1))
          || own.contains(alone.corner(t, 2))) {
        triangles.add(t);
      }
    }
    return triangles;
  }
}
