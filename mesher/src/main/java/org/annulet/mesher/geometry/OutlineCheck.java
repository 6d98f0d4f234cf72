package org.annulet.mesher.geometry;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.annulet.mesher.geometry.GeometryFault.Fault;
import org.annulet.mesher.geometry.GeometryFault.Kind;

/** Turns what a builder collected into an outline, or into a list of faults. */
final class OutlineCheck {
  private final Outline.Builder raw;
  private final List<Fault> faults = new ArrayList<>();
  private final Map<String, Integer> pointIndex = new LinkedHashMap<>();
  private final Map<String, Integer> edgeIndex = new LinkedHashMap<>();
  private final List<Edge> edges = new ArrayList<>();

  OutlineCheck(Outline.Builder raw) {
    this.raw = raw;
  }

  Outline outline() {
    readPoints();
    readEdges();
    stopOnFaults();
    if (raw.zones.isEmpty()) {
      fault(Kind.USE, "the outline has no zones", "add a zone with a closed loop of edges");
    }
    ZoneLoops loops = new ZoneLoops(raw.zones, edges, edgeIndex, raw.points, faults);
    loops.resolve();
    new CrossingCheck(edges, raw.points, faults).run();
    stopOnFaults();
    loops.checkPlaces();
    stopOnFaults();
    return new Outline(raw.points, edges, raw.zones, loops.left(), loops.right());
  }

  private void stopOnFaults() {
    if (!faults.isEmpty()) {
      throw new GeometryFault(faults, edges.stream().map(OutlineCheck::line).toList());
    }
  }

  /** An edge as a chain of short chords. */
  private static GeometryFault.Line line(Edge edge) {
    int steps = 24;
    int n = edge.pieces().size();
    double[] x = new double[n * steps + 1];
    double[] y = new double[n * steps + 1];
    for (int i = 0; i <= n * steps; i++) {
      CurvePiece piece = edge.pieces().get(Math.min(i / steps, n - 1));
      double t = i == n * steps ? 1 : (i % steps) / (double) steps;
      x[i] = piece.x(t);
      y[i] = piece.y(t);
    }
    return new GeometryFault.Line(edge.name(), x, y);
  }

  private void fault(Kind kind, String what, String mend) {
    faults.add(new Fault(kind, what, Double.NaN, Double.NaN, mend));
  }

  private void readPoints() {
    Map<List<Double>, String> places = new HashMap<>();
    for (Point p : raw.points) {
      if (pointIndex.putIfAbsent(p.name(), pointIndex.size()) != null) {
        fault(Kind.NAME, "two points are named '" + p.name() + "'", "rename one of them");
        pointIndex.put(p.name() + "'", pointIndex.size());
      }
      if (!Double.isFinite(p.x()) || !Double.isFinite(p.y())) {
        fault(
            Kind.VALUE,
            "point '" + p.name() + "' has coordinates (" + p.x() + ", " + p.y() + ") m",
            "give finite coordinates");
        continue;
      }
      String other = places.putIfAbsent(List.of(p.x() + 0.0, p.y() + 0.0), p.name());
      if (other != null) {
        faults.add(
            new Fault(
                Kind.TOUCHING,
                "points '" + other + "' and '" + p.name() + "' are the same place",
                p.x(),
                p.y(),
                "use one name for both"));
      }
    }
  }

  private void readEdges() {
    for (Outline.Builder.RawEdge e : raw.edges) {
      if (edgeIndex.containsKey(e.name())) {
        fault(Kind.NAME, "two edges are named '" + e.name() + "'", "rename one of them");
        continue;
      }
      Edge edge = edge(e);
      if (edge != null) {
        edgeIndex.put(e.name(), edges.size());
        edges.add(edge);
      }
    }
  }

  private Edge edge(Outline.Builder.RawEdge e) {
    int needed = e.run() == Outline.Builder.Run.LINE ? 2 : 3;
    if (e.through().size() < needed) {
      fault(
          Kind.ZERO_LENGTH,
          "edge '" + e.name() + "' runs through " + e.through().size() + " points",
          "give at least " + needed);
      return null;
    }
    int n = e.through().size();
    int[] index = new int[n];
    double[] x = new double[n];
    double[] y = new double[n];
    for (int i = 0; i < n; i++) {
      Integer p = pointIndex.get(e.through().get(i));
      if (p == null) {
        fault(
            Kind.NAME,
            "edge '" + e.name() + "' runs through '" + e.through().get(i) + "', which is no point",
            "points are " + Nearest.list(e.through().get(i), pointIndex.keySet()));
        return null;
      }
      index[i] = p;
      x[i] = raw.points.get(p).x();
      y[i] = raw.points.get(p).y();
    }
    for (int i = 1; i < n; i++) {
      if (x[i] == x[i - 1] && y[i] == y[i - 1]) {
        faults.add(
            new Fault(
                Kind.ZERO_LENGTH,
                "edge '" + e.name() + "' has no length at '" + e.through().get(i) + "'",
                x[i],
                y[i],
                "leave one of the two equal points out"));
        return null;
      }
    }
    List<CurvePiece> pieces = new ArrayList<>();
    switch (e.run()) {
      case LINE -> {
        for (int i = 1; i < n; i++) {
          pieces.add(new StraightPiece(x[i - 1], y[i - 1], x[i], y[i]));
        }
      }
      case ARC -> {
        ArcPiece[] arc = index[0] == index[2] ? null : ArcPiece.through(x, y);
        if (arc == null) {
          faults.add(
              new Fault(
                  Kind.ZERO_LENGTH,
                  "the three points of arc '" + e.name() + "' lie in one line",
                  x[1],
                  y[1],
                  "move '"
                      + e.through().get(1)
                      + "' off the line, or make it a line; a full circle is"
                      + " two arcs"));
          return null;
        }
        pieces.addAll(List.of(arc));
      }
      case CURVE -> pieces.addAll(List.of(CubicPiece.through(x, y)));
    }
    return new Edge(e.name(), Arrays.stream(index).boxed().toList(), pieces);
  }

  static double[] box(List<Edge> edges) {
    double[] b = {
      Double.POSITIVE_INFINITY,
      Double.POSITIVE_INFINITY,
      Double.NEGATIVE_INFINITY,
      Double.NEGATIVE_INFINITY
    };
    for (Edge e : edges) {
      for (CurvePiece c : e.pieces()) {
        int n = c.isStraight() ? 1 : 32;
        for (int i = 0; i <= n; i++) {
          double t = i / (double) n;
          b[0] = Math.min(b[0], c.x(t));
          b[1] = Math.min(b[1], c.y(t));
          b[2] = Math.max(b[2], c.x(t));
          b[3] = Math.max(b[3], c.y(t));
        }
      }
    }
    return b;
  }
}
