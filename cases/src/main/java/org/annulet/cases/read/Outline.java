package org.annulet.cases.read;

import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Points, named curves between them, and zones bounded by the curves. All maps keep the order of
 * the file.
 *
 * @param points by name
 * @param edges by name
 * @param zones by name
 */
public record Outline(Map<String, Point> points, Map<String, Edge> edges, Map<String, Zone> zones) {
  /**
   * A point of the plane.
   *
   * @param x first coordinate in m
   * @param y second coordinate in m
   */
  public record Point(double x, double y) {}

  /** How an edge runs through its points. */
  public enum Shape {
    /** Straight from point to point. */
    LINE,
    /** Circular arc from the first through the second to the third point. */
    ARC,
    /** Smooth curve through all points. */
    CURVE
  }

  /**
   * A named edge.
   *
   * @param name of the edge
   * @param shape how it runs
   * @param points names of points; two or more, three for an arc; first equals last on a closed one
   */
  public record Edge(String name, Shape shape, List<String> points) {
    /** Whether it ends where it begins. */
    public boolean closed() {
      return points.get(0).equals(points.get(points.size() - 1));
    }
  }

  /**
   * A zone.
   *
   * @param name of the zone
   * @param boundary names of edges that form its outer loop, in order; an edge may run backwards
   * @param holes loops of the same kind within
   * @param separateDucts present when the zone stands for identical tubes
   */
  public record Zone(
      String name,
      List<String> boundary,
      List<List<String>> holes,
      Optional<Geometry.SeparateDucts> separateDucts) {
    /** Whether the edge belongs to the outer loop or a hole. */
    public boolean touches(String edge) {
      return boundary.contains(edge) || holes.stream().anyMatch(h -> h.contains(edge));
    }
  }

  /** Names of the zones on either side of an edge: one on the boundary, two on an inner edge. */
  public List<String> zonesAt(String edge) {
    return zones.values().stream().filter(z -> z.touches(edge)).map(Zone::name).toList();
  }
}
