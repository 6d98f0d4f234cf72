package org.annulet.mesher.triangulate;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.annulet.mesher.geometry.Edge;
import org.annulet.mesher.geometry.GeometryFault;
import org.annulet.mesher.geometry.Outline;
import org.annulet.mesher.geometry.Zone;

/** A sizing resolved against an outline: sizes by index instead of by name. */
final class SizeRules {
  private final Sizing sizing;
  private final double[] edge;
  private final double[] zone;
  private final String[] edgeName;

  /**
   * Resolves names.
   *
   * @param name what an outline's edge is called in the sizing
   * @throws GeometryFault if a name of the sizing is not in the outline
   */
  SizeRules(Outline outline, Sizing sizing, java.util.function.UnaryOperator<String> name) {
    this.sizing = sizing;
    List<String> edgeNames = outline.edges().stream().map(Edge::name).map(name).distinct().toList();
    List<String> zoneNames = outline.zones().stream().map(Zone::name).toList();
    List<GeometryFault.Fault> faults = new ArrayList<>();
    unknown("edge", sizing.edges(), edgeNames, faults);
    unknown("zone", sizing.zones(), zoneNames, faults);
    if (!faults.isEmpty()) {
      throw new GeometryFault(faults);
    }
    zone = new double[zoneNames.size()];
    for (int z = 0; z < zone.length; z++) {
      zone[z] =
          Math.min(
              sizing.largestSide(),
              sizing.zones().getOrDefault(zoneNames.get(z), Double.POSITIVE_INFINITY));
    }
    edge = new double[outline.edges().size()];
    edgeName = new String[edge.length];
    for (int e = 0; e < edge.length; e++) {
      String n = name.apply(outline.edges().get(e).name());
      edgeName[e] = n;
      edge[e] =
          Math.min(
              sizing.edges().getOrDefault(n, Double.POSITIVE_INFINITY),
              Math.min(cap(outline.leftZone(e)), cap(outline.rightZone(e))));
    }
  }

  private static void unknown(
      String what,
      Map<String, Double> given,
      List<String> known,
      List<GeometryFault.Fault> faults) {
    for (String name : given.keySet()) {
      if (!known.contains(name)) {
        faults.add(
            new GeometryFault.Fault(
                GeometryFault.Kind.NAME,
                "a size is given for " + what + " '" + name + "', which is not in the outline",
                Double.NaN,
                Double.NaN,
                what + "s are " + String.join(", ", known)));
      }
    }
  }

  double largest() {
    return sizing.largestSide();
  }

  double growth() {
    return sizing.growth();
  }

  double cornerShare() {
    return sizing.cornerShare();
  }

  double turn() {
    return Math.toRadians(sizing.largestTurn());
  }

  int nodeCap() {
    return sizing.nodeCap();
  }

  /** Largest size in a zone; infinite outside (−1). */
  double cap(int z) {
    return z < 0 ? Double.POSITIVE_INFINITY : zone[z];
  }

  double alongEdge(int e) {
    return edge[e];
  }

  /** The smaller of h and what the caller's field wants at a place. */
  double at(double x, double y, double h) {
    if (sizing.field() == null) {
      return h;
    }
    double f = sizing.field().applyAsDouble(x, y);
    return f > 0 ? Math.min(f, h) : h;
  }

  MeshingLimitException tooMany(String where) {
    return new MeshingLimitException(
        String.format(
            Locale.ROOT,
            "the mesh needs more than %d nodes, %s%n    mend: give a larger size than %.4g m, or"
                + " raise the node cap",
            sizing.nodeCap(),
            where,
            sizing.largestSide()));
  }

  MeshingLimitException indivisible(int edgeNumber, double x, double y) {
    return new MeshingLimitException(
        String.format(
            Locale.ROOT,
            "edge '%s' cannot be divided any further at (%.12g, %.12g) m: neighbouring points are"
                + " as close as numbers can tell%n    mend: move the edges there apart or let them"
                + " end in one point, or give a larger size",
            edgeName[edgeNumber],
            x,
            y));
  }
}
