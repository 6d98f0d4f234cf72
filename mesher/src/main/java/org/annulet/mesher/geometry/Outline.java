package org.annulet.mesher.geometry;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * A checked outline of the gas in a plane: named points, named edges (true curves), named zones;
 * immutable.
 *
 * <p>An edge used by one zone is a boundary edge; used by two it is the inner edge that joins them.
 * What {@link Builder#build} returns has no crossing, touching, open, doubly used or zero-length
 * edges and no zones that overlap or leak. Coordinates in metres.
 *
 * <pre>{@code
 * Outline tube = Outline.builder()
 *     .point("a", 0, 0).point("b", 1, 0).point("c", 1, 0.1).point("d", 0, 0.1)
 *     .line("floor", "a", "b").line("outlet", "b", "c").line("roof", "c", "d").line("inlet", "d", "a")
 *     .zone("tube", "floor", "outlet", "roof", "inlet")
 *     .build();
 * }</pre>
 */
public final class Outline {
  private final List<Point> points;
  private final List<Edge> edges;
  private final List<Zone> zones;
  private final Map<String, Integer> edgeIndex = new LinkedHashMap<>();
  private final int[] leftZone;
  private final int[] rightZone;

  Outline(List<Point> points, List<Edge> edges, List<Zone> zones, int[] leftZone, int[] rightZone) {
    this.points = List.copyOf(points);
    this.edges = List.copyOf(edges);
    this.zones = List.copyOf(zones);
    this.leftZone = leftZone.clone();
    this.rightZone = rightZone.clone();
    for (Edge e : edges) {
      edgeIndex.put(e.name(), edgeIndex.size());
    }
  }

  /** A new, empty builder. */
  public static Builder builder() {
    return new Builder();
  }

  /** The points that some edge uses or that were named, in the order they were given. */
  public List<Point> points() {
    return points;
  }

  /** The edges, in the order they were given. */
  public List<Edge> edges() {
    return edges;
  }

  /** The zones, in the order they were given. */
  public List<Zone> zones() {
    return zones;
  }

  /** Index into {@link #zones()} of the zone on the left hand of edge {@code e}; −1 for none. */
  public int leftZone(int e) {
    return leftZone[e];
  }

  /** Index into {@link #zones()} of the zone on the right hand of edge {@code e}; −1 for none. */
  public int rightZone(int e) {
    return rightZone[e];
  }

  /**
   * The edge of a given name.
   *
   * @throws IllegalArgumentException if there is none; lists those present
   */
  public Edge edge(String name) {
    Integer e = edgeIndex.get(name);
    if (e == null) {
      throw new IllegalArgumentException(
          "no edge '"
              + name
              + "' in the outline; edges are "
              + String.join(", ", edgeIndex.keySet()));
    }
    return edges.get(e);
  }

  /** True area in m² of zone number {@code z}: ½ ∮ (x dy − y dx) along its curves. */
  public double area(int z) {
    double sum = 0;
    for (int e = 0; e < edges.size(); e++) {
      if (leftZone[e] == z) {
        sum += Sectors.moment(edges.get(e), points.get(edges.get(e).first()));
      }
      if (rightZone[e] == z) {
        sum -= Sectors.moment(edges.get(e), points.get(edges.get(e).first()));
      }
    }
    return sum;
  }

  /** Smallest box around the outline: least x, least y, greatest x, greatest y in m; new array. */
  public double[] box() {
    return OutlineCheck.box(edges);
  }

  /** Collects points, edges and zones; all faults come together from {@link #build}. */
  public static final class Builder {
    final List<Point> points = new ArrayList<>();
    final List<RawEdge> edges = new ArrayList<>();
    final List<Zone> zones = new ArrayList<>();

    private Builder() {}

    /** How an edge runs through its points. */
    enum Run {
      LINE,
      ARC,
      CURVE
    }

    /** An edge as it was given. */
    record RawEdge(String name, Run run, List<String> through) {}

    /**
     * A named point.
     *
     * @param x in m
     * @param y in m
     */
    public Builder point(String name, double x, double y) {
      points.add(new Point(name, x, y));
      return this;
    }

    /** An edge of straight lines through two or more points; closed if the last is the first. */
    public Builder line(String name, String... through) {
      edges.add(new RawEdge(name, Run.LINE, List.of(through)));
      return this;
    }

    /** An edge along the circular arc from {@code start} through {@code via} to {@code end}. */
    public Builder arc(String name, String start, String via, String end) {
      edges.add(new RawEdge(name, Run.ARC, List.of(start, via, end)));
      return this;
    }

    /**
     * A smooth curve (cubic spline) through three or more points; closed if the last is the first.
     */
    public Builder curve(String name, String... through) {
      edges.add(new RawEdge(name, Run.CURVE, List.of(through)));
      return this;
    }

    /** A zone inside one closed loop of edges, in order; each edge may run either way. */
    public Builder zone(String name, String... boundary) {
      zones.add(new Zone(name, List.of(boundary), List.of()));
      return this;
    }

    /** A zone with holes; a hole that another zone fills makes the loop's edges inner edges. */
    public Builder zone(Zone zone) {
      zones.add(zone);
      return this;
    }

    /**
     * The checked outline.
     *
     * @throws GeometryFault with every fault found
     */
    public Outline build() {
      return new OutlineCheck(this).outline();
    }
  }
}
