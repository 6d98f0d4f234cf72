package org.annulet.post.vtk;

import java.util.Arrays;
import java.util.HashMap;
import java.util.Map;
import java.util.function.IntFunction;
import org.annulet.mesher.mesh.Mesh;

/**
 * A triangulated surface in space on which the fields of a mesh are shown: each point knows the
 * node it stands for and the angle by which it was turned about the axis. Axis of turning: x.
 * Immutable.
 */
public final class Surface {
  private final double[] points;
  private final int[] triangles;
  private final int[] node;
  private final int[] source;
  private final double[] turn;
  private final boolean swept;

  private Surface(Collector c) {
    this(c, false);
  }

  private Surface(Collector c, boolean swept) {
    this.swept = swept;
    points = Arrays.copyOf(c.points, 3 * c.pointCount);
    node = Arrays.copyOf(c.node, c.pointCount);
    turn = Arrays.copyOf(c.turn, c.pointCount);
    triangles = Arrays.copyOf(c.triangles, 3 * c.triangleCount);
    source = Arrays.copyOf(c.source, c.triangleCount);
  }

  /**
   * The mesh in its own plane, z = 0. On a closed mesh the triangles across the seam are drawn on
   * one side of it, with copies of the nodes beyond.
   */
  public static Surface flat(Mesh mesh) {
    Collector c = new Collector(mesh);
    for (int t = 0; t < mesh.triangleCount(); t++) {
      int[] p = new int[3];
      for (int k = 0; k < 3; k++) {
        int v = mesh.corner(t, k);
        double y = mesh.cornerY(t, k);
        double x = mesh.x(v);
        long lap = mesh.period() > 0 ? Math.round((y - mesh.y(v)) / mesh.period()) : 0;
        p[k] = c.point(v, lap, 0, () -> new double[] {x, y, 0});
      }
      c.triangle(p, t);
    }
    return new Surface(c);
  }

  /**
   * A ring laid round the axis: each zone on a cylinder of its radius. Where zones of different
   * radius meet, the nodes of the joint are copied.
   *
   * @param mesh closed mesh
   * @param zoneRadius radius of each zone in m, in the order of {@link Mesh#zoneNames()}
   */
  public static Surface wrapped(Mesh mesh, double[] zoneRadius) {
    if (!(mesh.period() > 0)) {
      throw new IllegalArgumentException("only a closed mesh can be laid round the axis");
    }
    if (zoneRadius.length != mesh.zoneNames().size()) {
      throw new IllegalArgumentException(
          "expected a radius for each zone of " + mesh.zoneNames() + ", got " + zoneRadius.length);
    }
    Collector c = new Collector(mesh);
    for (int t = 0; t < mesh.triangleCount(); t++) {
      double radius = zoneRadius[mesh.zone(t)];
      int[] p = new int[3];
      for (int k = 0; k < 3; k++) {
        int v = mesh.corner(t, k);
        double angle = 2 * Math.PI * mesh.y(v) / mesh.period();
        p[k] =
            c.point(
                v,
                Double.doubleToLongBits(radius),
                0,
                () -> new double[] {mesh.x(v), radius * Math.cos(angle), radius * Math.sin(angle)});
      }
      c.triangle(p, t);
    }
    return new Surface(c);
  }

  /**
   * A section swept round the axis: its boundary as a surface of revolution over the given arc,
   * closed by the section itself at both ends when the arc is not full. The field turns with
   * e^{imθ}.
   *
   * @param mesh section, y the radius
   * @param arc angle swept in rad, in (0, 2π]
   * @param steps facets over the arc, at least 3
   */
  public static Surface swept(Mesh mesh, double arc, int steps) {
    if (!(arc > 0 && arc <= 2 * Math.PI + 1e-12) || steps < 3) {
      throw new IllegalArgumentException(
          "an arc in (0, 2π] and at least 3 steps are needed, got " + arc + " rad and " + steps);
    }
    boolean full = arc > 2 * Math.PI - 1e-9;
    Collector c = new Collector(mesh);
    for (int e = 0; e < mesh.segmentCount(); e++) {
      if (mesh.segmentRight(e) != -1) {
        continue;
      }
      int a = mesh.segmentStart(e);
      int b = mesh.segmentEnd(e);
      int t = mesh.segmentLeft(e);
      for (int k = 0; k < steps; k++) {
        int next = full ? (k + 1) % steps : k + 1;
        int a0 = turned(c, mesh, a, new Step(k, arc / steps));
        int b0 = turned(c, mesh, b, new Step(k, arc / steps));
        int a1 = turned(c, mesh, a, new Step(next, arc / steps));
        int b1 = turned(c, mesh, b, new Step(next, arc / steps));
        if (b0 != b1) {
          c.triangle(new int[] {a0, b0, b1}, t);
        }
        if (a0 != a1) {
          c.triangle(new int[] {a0, b1, a1}, t);
        }
      }
    }
    if (!full) {
      for (int t = 0; t < mesh.triangleCount(); t++) {
        for (int end : new int[] {0, steps}) {
          int[] p = new int[3];
          for (int k = 0; k < 3; k++) {
            p[k] = turned(c, mesh, mesh.corner(t, k), new Step(end, arc / steps));
          }
          c.triangle(p, t);
        }
      }
    }
    return new Surface(c, true);
  }

  /** Step k of a sweep, each of the given angle in rad. */
  private record Step(int k, double angle) {}

  private static int turned(Collector c, Mesh mesh, int v, Step step) {
    double r = mesh.y(v);
    double angle = r == 0 ? 0 : step.k() * step.angle();
    return c.point(
        v,
        r == 0 ? 0 : step.k(),
        angle,
        () -> new double[] {mesh.x(v), r * Math.cos(angle), r * Math.sin(angle)});
  }

  /**
   * The mesh with its nodes put where the caller says.
   *
   * @param place coordinates (x, y, z) in m of each node
   */
  public static Surface placed(Mesh mesh, IntFunction<double[]> place) {
    Collector c = new Collector(mesh);
    for (int t = 0; t < mesh.triangleCount(); t++) {
      int[] p = new int[3];
      for (int k = 0; k < 3; k++) {
        int v = mesh.corner(t, k);
        p[k] = c.point(v, 0, 0, () -> place.apply(v));
      }
      c.triangle(p, t);
    }
    return new Surface(c);
  }

  /** Number of points. */
  public int pointCount() {
    return node.length;
  }

  /** Number of triangles. */
  public int triangleCount() {
    return source.length;
  }

  /** Coordinate {@code axis} (0, 1, 2) of point {@code p} in m. */
  public double coordinate(int p, int axis) {
    return points[3 * p + axis];
  }

  /** Point at corner {@code k} of triangle {@code t}. */
  public int corner(int t, int k) {
    return triangles[3 * t + k];
  }

  /** Node of the mesh that point {@code p} stands for. */
  public int node(int p) {
    return node[p];
  }

  /** Triangle of the mesh that triangle {@code t} stands for or borders. */
  public int sourceTriangle(int t) {
    return source[t];
  }

  /** Angle in rad by which point {@code p} was turned about the axis (for e^{imθ}). */
  public double turn(int p) {
    return turn[p];
  }

  /** Whether the surface is a section swept round, so that the field turns with e^{imθ}. */
  boolean isSwept() {
    return swept;
  }

  /** Angle of the middle of triangle {@code t} about the axis, in rad. */
  double angle(int t) {
    double y = 0;
    double z = 0;
    for (int k = 0; k < 3; k++) {
      y += coordinate(corner(t, k), 1);
      z += coordinate(corner(t, k), 2);
    }
    return Math.atan2(z, y);
  }

  double[] points() {
    return points;
  }

  /** Points of the triangles, shape [triangles × 3]; not to be modified. */
  public int[] triangles() {
    return triangles;
  }

  private interface Place {
    double[] get();
  }

  private static final class Collector {
    private double[] points;
    private int[] node;
    private double[] turn;
    private int pointCount;
    private int[] triangles;
    private int[] source;
    private int triangleCount;
    private final Map<Long, Map<Integer, Integer>> known = new HashMap<>();

    Collector(Mesh mesh) {
      points = new double[3 * mesh.nodeCount() + 3];
      node = new int[mesh.nodeCount() + 1];
      turn = new double[mesh.nodeCount() + 1];
      triangles = new int[3 * mesh.triangleCount() + 3];
      source = new int[mesh.triangleCount() + 1];
    }

    int point(int v, long copy, double angle, Place place) {
      return known
          .computeIfAbsent(copy, q -> new HashMap<>())
          .computeIfAbsent(
              v,
              q -> {
                if (pointCount == node.length) {
                  points = Arrays.copyOf(points, 2 * points.length);
                  node = Arrays.copyOf(node, 2 * node.length);
                  turn = Arrays.copyOf(turn, 2 * turn.length);
                }
                System.arraycopy(place.get(), 0, points, 3 * pointCount, 3);
                node[pointCount] = v;
                turn[pointCount] = angle;
                return pointCount++;
              });
    }

    void triangle(int[] p, int t) {
      if (triangleCount == source.length) {
        triangles = Arrays.copyOf(triangles, 2 * triangles.length);
        source = Arrays.copyOf(source, 2 * source.length);
      }
      System.arraycopy(p, 0, triangles, 3 * triangleCount, 3);
      source[triangleCount++] = t;
    }
  }
}
