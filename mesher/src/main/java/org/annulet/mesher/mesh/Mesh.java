package org.annulet.mesher.mesh;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/**
 * A conforming triangle mesh with named zones and named edges; immutable.
 *
 * <p>Nodes have plane coordinates (x, y) in metres. What y means is the business of whoever builds
 * the operator: the radius on a section, the unrolled arc on a ring. A ring is closed: a mesh with
 * a {@link #period()} identifies y with y + period, nodes of the seam are stored once, and {@link
 * #cornerY} unwraps the triangles that cross it.
 *
 * <p>A <em>named edge</em> is a set of straight segments. A segment runs from {@link #segmentStart}
 * to {@link #segmentEnd} with the triangle {@link #segmentLeft} on its left hand; on the boundary
 * the gas is on the left, so the outward normal points right, and {@link #segmentRight} is −1.
 * Inner named edges (a flame sheet, the joint of two zones) have a triangle on both sides. Every
 * boundary segment has a name.
 */
public final class Mesh {
  private final double[] xy;
  private final int[] corners;
  private final int[] zones;
  private final int[] segments;
  private final List<String> zoneNames;
  private final List<String> edgeNames;
  private final double period;

  private Mesh(Builder b, int[] segments) {
    this.xy = Arrays.copyOf(b.xy, 2 * b.nodeCount);
    this.corners = Arrays.copyOf(b.corners, 3 * b.triangleCount);
    this.zones = Arrays.copyOf(b.zones, b.triangleCount);
    this.segments = segments;
    this.zoneNames = List.copyOf(b.zoneNames);
    this.edgeNames = List.copyOf(b.edgeNames);
    this.period = b.period;
  }

  /** Number of nodes. */
  public int nodeCount() {
    return xy.length / 2;
  }

  /** Number of triangles. */
  public int triangleCount() {
    return zones.length;
  }

  /** Number of segments of all named edges together. */
  public int segmentCount() {
    return segments.length / 5;
  }

  /** First coordinate of node {@code v} in m. */
  public double x(int v) {
    return xy[2 * v];
  }

  /** Second coordinate of node {@code v} in m (in [0, period) on a ring). */
  public double y(int v) {
    return xy[2 * v + 1];
  }

  /** Node at corner {@code k} (0, 1, 2; anticlockwise) of triangle {@code t}. */
  public int corner(int t, int k) {
    return corners[3 * t + k];
  }

  /** First coordinate of corner {@code k} of triangle {@code t} in m. */
  public double cornerX(int t, int k) {
    return xy[2 * corners[3 * t + k]];
  }

  /**
   * Second coordinate of corner {@code k} of triangle {@code t} in m, unwrapped: within half a
   * period of corner 0.
   */
  public double cornerY(int t, int k) {
    double y = xy[2 * corners[3 * t + k] + 1];
    return period == 0 ? y : unwrap(y, xy[2 * corners[3 * t] + 1]);
  }

  /** Area of triangle {@code t} in m², positive. */
  public double area(int t) {
    double x0 = cornerX(t, 0);
    double y0 = cornerY(t, 0);
    return 0.5
        * ((cornerX(t, 1) - x0) * (cornerY(t, 2) - y0)
            - (cornerX(t, 2) - x0) * (cornerY(t, 1) - y0));
  }

  /** Index of the zone of triangle {@code t} into {@link #zoneNames()}. */
  public int zone(int t) {
    return zones[t];
  }

  /** Names of the zones. */
  public List<String> zoneNames() {
    return zoneNames;
  }

  /** Names of the edges. */
  public List<String> edgeNames() {
    return edgeNames;
  }

  /** Index of the name of segment {@code e} into {@link #edgeNames()}. */
  public int segmentEdge(int e) {
    return segments[5 * e];
  }

  /** First node of segment {@code e}. */
  public int segmentStart(int e) {
    return segments[5 * e + 1];
  }

  /** Last node of segment {@code e}. */
  public int segmentEnd(int e) {
    return segments[5 * e + 2];
  }

  /** Triangle on the left hand of segment {@code e}. */
  public int segmentLeft(int e) {
    return segments[5 * e + 3];
  }

  /** Triangle on the right hand of segment {@code e}; −1 on the boundary. */
  public int segmentRight(int e) {
    return segments[5 * e + 4];
  }

  /** Length of segment {@code e} in m. */
  public double segmentLength(int e) {
    int a = segmentStart(e);
    int b = segmentEnd(e);
    double dy = y(b) - y(a);
    return Math.hypot(x(b) - x(a), period == 0 ? dy : unwrap(dy, 0));
  }

  /** Length after which y repeats, in m; 0 when the mesh is not closed on itself. */
  public double period() {
    return period;
  }

  private double unwrap(double y, double near) {
    return y - period * Math.rint((y - near) / period);
  }

  /** A new builder of a mesh that is not closed on itself. */
  public static Builder builder() {
    return new Builder(0);
  }

  /**
   * A new builder of a mesh in which y and y + period are the same place.
   *
   * @param period in m, positive
   */
  public static Builder periodicBuilder(double period) {
    if (!(period > 0) || Double.isInfinite(period)) {
      throw new IllegalArgumentException(
          "period must be positive and finite, got " + period + " m");
    }
    return new Builder(period);
  }

  /** Collects nodes, triangles and named segments; not thread-safe. */
  public static final class Builder {
    private final double period;
    private double[] xy = new double[64];
    private int nodeCount;
    private int[] corners = new int[96];
    private int[] zones = new int[32];
    private int triangleCount;
    private int[] named = new int[48];
    private int namedCount;

    /**
     * Sides (3 · triangle + number), by lower node, and where each node's begin; while building.
     */
    private int[] sides;

    private int[] bySide;
    private final List<String> zoneNames = new ArrayList<>();
    private final List<String> edgeNames = new ArrayList<>();
    private final Map<String, Integer> zoneIndex = new HashMap<>();
    private final Map<String, Integer> edgeIndex = new HashMap<>();

    private Builder(double period) {
      this.period = period;
    }

    /**
     * Adds a node.
     *
     * @param x in m
     * @param y in m
     * @return its index, counted from 0
     */
    public int node(double x, double y) {
      if (2 * nodeCount == xy.length) {
        xy = Arrays.copyOf(xy, 2 * xy.length);
      }
      xy[2 * nodeCount] = x;
      xy[2 * nodeCount + 1] = y;
      return nodeCount++;
    }

    /**
     * Adds a triangle; its corners may come in either sense, they are stored anticlockwise.
     *
     * @return its index, counted from 0
     */
    public int triangle(int a, int b, int c, String zone) {
      if (triangleCount == zones.length) {
        zones = Arrays.copyOf(zones, 2 * zones.length);
        corners = Arrays.copyOf(corners, 2 * corners.length);
      }
      double ya = xy[2 * a + 1];
      double yb = near(xy[2 * b + 1], ya);
      double yc = near(xy[2 * c + 1], ya);
      double twice = (xy[2 * b] - xy[2 * a]) * (yc - ya) - (xy[2 * c] - xy[2 * a]) * (yb - ya);
      if (!(Math.abs(twice) > 0)) {
        throw new IllegalArgumentException(
            "triangle " + a + ", " + b + ", " + c + " of zone '" + zone + "' encloses no area");
      }
      corners[3 * triangleCount] = a;
      corners[3 * triangleCount + 1] = twice > 0 ? b : c;
      corners[3 * triangleCount + 2] = twice > 0 ? c : b;
      zones[triangleCount] = index(zone, zoneNames, zoneIndex);
      return triangleCount++;
    }

    /**
     * Names the segment between two nodes, in either sense; both must be joined by a side of some
     * triangle.
     */
    public Builder segment(int a, int b, String edge) {
      if (3 * namedCount == named.length) {
        named = Arrays.copyOf(named, 2 * named.length);
      }
      named[3 * namedCount] = a;
      named[3 * namedCount + 1] = b;
      named[3 * namedCount + 2] = index(edge, edgeNames, edgeIndex);
      namedCount++;
      return this;
    }

    /**
     * The mesh.
     *
     * @throws IllegalStateException if a side belongs to more than two triangles, a named segment
     *     is no side of any triangle or is named twice, or a boundary side has no name
     */
    public Mesh build() {
      sortSides();
      int[] segments = new int[5 * namedCount];
      boolean[] taken = new boolean[sides.length];
      for (int e = 0; e < namedCount; e++) {
        int a = named[3 * e];
        int b = named[3 * e + 1];
        int forward = find(a, b);
        int backward = find(b, a);
        if (forward == -1 && backward == -1) {
          throw new IllegalStateException(
              "segment " + name(e, a, b) + " is no side of any triangle");
        }
        if (forward != -1 && taken[forward] || backward != -1 && taken[backward]) {
          throw new IllegalStateException("segment " + name(e, a, b) + " already has a name");
        }
        int left = -1;
        int right = -1;
        if (forward != -1) {
          taken[forward] = true;
          left = sides[forward] / 3;
        }
        if (backward != -1) {
          taken[backward] = true;
          right = sides[backward] / 3;
        }
        boolean turn = left == -1;
        segments[5 * e] = named[3 * e + 2];
        segments[5 * e + 1] = turn ? b : a;
        segments[5 * e + 2] = turn ? a : b;
        segments[5 * e + 3] = turn ? right : left;
        segments[5 * e + 4] = turn ? -1 : right;
      }
      for (int i = 0; i < sides.length; i++) {
        int a = start(sides[i]);
        if (!taken[i] && find(end(sides[i]), a) == -1) {
          throw new IllegalStateException(
              "a boundary side at (" + xy[2 * a] + ", " + xy[2 * a + 1] + ") m has no name");
        }
      }
      bySide = null;
      sides = null;
      return new Mesh(this, segments);
    }

    /** Sorts the sides of all triangles by their lower node; sees that none lies on another. */
    private void sortSides() {
      bySide = new int[nodeCount + 1];
      sides = new int[3 * triangleCount];
      for (int h = 0; h < sides.length; h++) {
        bySide[Math.min(start(h), end(h))]++;
      }
      int sum = 0;
      for (int v = 0; v <= nodeCount; v++) {
        sum += bySide[v];
        bySide[v] = sum;
      }
      for (int h = sides.length - 1; h >= 0; h--) {
        sides[--bySide[Math.min(start(h), end(h))]] = h;
      }
      for (int i = 0; i < sides.length; i++) {
        int a = start(sides[i]);
        int b = end(sides[i]);
        if (find(a, b) != i) {
          throw new IllegalStateException(
              "side " + a + "–" + b + " has two triangles on the same hand");
        }
      }
    }

    /** Place in {@link #sides} of the side that runs from a to b, or −1. */
    private int find(int a, int b) {
      int low = Math.min(a, b);
      if (low < 0 || low >= nodeCount) {
        return -1;
      }
      for (int i = bySide[low]; i < bySide[low + 1]; i++) {
        if (start(sides[i]) == a && end(sides[i]) == b) {
          return i;
        }
      }
      return -1;
    }

    private int start(int side) {
      return corners[side];
    }

    private int end(int side) {
      return corners[side % 3 == 2 ? side - 2 : side + 1];
    }

    private String name(int e, int a, int b) {
      return a + "–" + b + " of edge '" + edgeNames.get(named[3 * e + 2]) + "'";
    }

    private double near(double y, double ref) {
      return period == 0 ? y : y - period * Math.rint((y - ref) / period);
    }

    private static int index(String name, List<String> names, Map<String, Integer> index) {
      return index.computeIfAbsent(
          name,
          n -> {
            names.add(n);
            return names.size() - 1;
          });
    }
  }
}
