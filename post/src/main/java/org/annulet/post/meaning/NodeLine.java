package org.annulet.post.meaning;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.annulet.mesher.mesh.Mesh;

/**
 * Nodes of the mesh along a line, in the order one walks along it: from its upstream end, the one
 * with the smaller x, or with the smaller y where both lie at the same x. An edge in several pieces
 * is walked piece by piece.
 *
 * @param name of the line
 * @param stops the nodes in order
 */
public record NodeLine(String name, List<Stop> stops) {
  /**
   * One node.
   *
   * @param node of the mesh
   * @param piece of the line, counted from 1
   * @param distance true length walked from the beginning of the piece in m
   */
  public record Stop(int node, int piece, double distance) {}

  /** Copies the list. */
  public NodeLine {
    stops = List.copyOf(stops);
  }

  /**
   * The nodes of a named edge.
   *
   * @throws IllegalArgumentException if the mesh has no such edge
   */
  public static NodeLine ofEdge(Chamber chamber, String edge) {
    Mesh mesh = chamber.mesh();
    int index = mesh.edgeNames().indexOf(edge);
    Map<Integer, List<Integer>> segmentsAt = new HashMap<>();
    for (int e = 0; e < mesh.segmentCount(); e++) {
      if (mesh.segmentEdge(e) == index) {
        segmentsAt.computeIfAbsent(mesh.segmentStart(e), v -> new ArrayList<>()).add(e);
        segmentsAt.computeIfAbsent(mesh.segmentEnd(e), v -> new ArrayList<>()).add(e);
      }
    }
    if (segmentsAt.isEmpty()) {
      throw new IllegalArgumentException(
          "the mesh has no edge '" + edge + "'; edges are " + mesh.edgeNames());
    }
    Comparator<Integer> upstream =
        Comparator.<Integer>comparingDouble(mesh::x).thenComparingDouble(mesh::y);
    List<Integer> starts = new ArrayList<>(segmentsAt.keySet());
    // Ends before inner nodes, so that a loop alone begins at its uppermost stream node.
    starts.sort(
        Comparator.<Integer>comparingInt(v -> segmentsAt.get(v).size() == 1 ? 0 : 1)
            .thenComparing(upstream));
    List<List<Stop>> pieces = new ArrayList<>();
    Set<Integer> walked = new HashSet<>();
    for (int start : starts) {
      List<Stop> piece = walk(chamber, start, segmentsAt, walked);
      if (piece.size() > 1) {
        pieces.add(piece);
      }
    }
    pieces.sort(Comparator.comparing(p -> p.get(0).node(), upstream));
    List<Stop> stops = new ArrayList<>();
    for (int k = 0; k < pieces.size(); k++) {
      for (Stop s : pieces.get(k)) {
        stops.add(new Stop(s.node(), k + 1, s.distance()));
      }
    }
    return new NodeLine(edge, stops);
  }

  private static List<Stop> walk(
      Chamber chamber, int start, Map<Integer, List<Integer>> segmentsAt, Set<Integer> walked) {
    Mesh mesh = chamber.mesh();
    List<Stop> piece = new ArrayList<>();
    piece.add(new Stop(start, 1, 0));
    int at = start;
    double distance = 0;
    boolean more = true;
    while (more) {
      more = false;
      for (int e : segmentsAt.get(at)) {
        if (walked.add(e)) {
          at = mesh.segmentStart(e) == at ? mesh.segmentEnd(e) : mesh.segmentStart(e);
          distance += length(chamber, e);
          more = at != start;
          if (more) {
            piece.add(new Stop(at, 1, distance));
          }
          break;
        }
      }
    }
    return piece;
  }

  private static double length(Chamber chamber, int e) {
    Mesh mesh = chamber.mesh();
    double dx = mesh.x(mesh.segmentEnd(e)) - mesh.x(mesh.segmentStart(e));
    double flat = mesh.segmentLength(e);
    double scale = chamber.arcScale(mesh.zone(mesh.segmentLeft(e)));
    return Math.sqrt(dx * dx + scale * scale * Math.max(0, flat * flat - dx * dx));
  }

  /**
   * The centre line of burner 1 of a ring, y = 0, along x; empty where no nodes lie there, as on
   * other kinds.
   */
  public static Optional<NodeLine> alongFirstBurner(Chamber chamber) {
    Mesh mesh = chamber.mesh();
    if (chamber.kind() != GeometryKind.RING) {
      return Optional.empty();
    }
    double tolerance = 1e-9 * mesh.period();
    List<Integer> nodes = new ArrayList<>();
    for (int v = 0; v < mesh.nodeCount(); v++) {
      if (Math.abs(Math.IEEEremainder(mesh.y(v), mesh.period())) < tolerance) {
        nodes.add(v);
      }
    }
    nodes.sort(Comparator.comparingDouble(mesh::x));
    List<Stop> stops = new ArrayList<>();
    for (int v : nodes) {
      stops.add(new Stop(v, 1, mesh.x(v) - mesh.x(nodes.get(0))));
    }
    return stops.size() < 2
        ? Optional.empty()
        : Optional.of(new NodeLine("centre_of_burner_1", stops));
  }

  /**
   * The lines written where a case names none: every wall; on a ring the centre line of burner 1
   * and the walls at its two ends.
   */
  public static List<NodeLine> usual(Chamber chamber) {
    Mesh mesh = chamber.mesh();
    List<NodeLine> lines = new ArrayList<>();
    alongFirstBurner(chamber).ifPresent(lines::add);
    double first = Double.POSITIVE_INFINITY;
    double last = Double.NEGATIVE_INFINITY;
    for (int v = 0; v < mesh.nodeCount(); v++) {
      first = Math.min(first, mesh.x(v));
      last = Math.max(last, mesh.x(v));
    }
    double tolerance = 1e-9 * (last - first);
    Set<Integer> seen = new HashSet<>();
    for (int e = 0; e < mesh.segmentCount(); e++) {
      double x = mesh.x(mesh.segmentStart(e));
      boolean end = x - first < tolerance || last - x < tolerance;
      if (mesh.segmentRight(e) < 0
          && (chamber.kind() != GeometryKind.RING || end)
          && seen.add(mesh.segmentEdge(e))) {
        lines.add(ofEdge(chamber, mesh.edgeNames().get(mesh.segmentEdge(e))));
      }
    }
    return lines;
  }
}
