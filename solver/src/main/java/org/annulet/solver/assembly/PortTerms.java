package org.annulet.solver.assembly;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.boundary.Damper;
import org.annulet.solver.boundary.EdgeGas;
import org.annulet.solver.boundary.TwoPort;
import org.annulet.solver.flame.Side;
import org.annulet.solver.operator.Analytic;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.operator.LowRankTerm;
import org.annulet.solver.operator.SparseVector;

/** Dampers and two-ports as terms of rank one and two on patch means. */
final class PortTerms {
  private static final double[] GAUSS = {-Math.sqrt(0.6), 0, Math.sqrt(0.6)};
  private static final double[] GAUSS_WEIGHT = {5.0 / 18, 8.0 / 18, 5.0 / 18};

  private final Assembler assembler;
  private final Sectors sectors;
  private final int order;

  PortTerms(Assembler assembler, int order) {
    this.assembler = assembler;
    this.order = order;
    this.sectors = Sectors.of(assembler.mesh(), assembler.metric().geometry());
  }

  /** A damper where it sits. */
  record PlacedDamper(String name, Damper damper, DamperPlace place) {}

  /**
   * A two-port and its two sides.
   *
   * @param edge1 on side 1
   * @param upstream side 1 of an inner edge; null for a boundary edge
   * @param edge2 on side 2; the same name for an inner edge
   */
  record PlacedTwoPort(String edge1, Side upstream, String edge2, TwoPort port) {}

  LowRankTerm of(PlacedDamper placed) {
    boolean onRing = assembler.metric().geometry() instanceof Ring;
    boolean centred = placed.place() instanceof DamperPlace.OnFace f && f.angle() == 0;
    if (onRing && assembler.mesh().period() == 0 && !centred) {
      throw new IllegalArgumentException(
          "damper '"
              + placed.name()
              + "' is not at the burner, where every cell can have one; take the whole ring");
    }
    double count = 1;
    if (placed.place() instanceof DamperPlace.OnEdge edge) {
      if (edge.count() > 1 && !(assembler.metric().geometry() instanceof Section)) {
        throw new IllegalArgumentException(
            "damper '" + placed.name() + "': several at once are for a section only");
      }
      if (assembler.metric().geometry() instanceof Section
          && 2 * order >= edge.count()
          && order > 0) {
        throw new IllegalArgumentException(
            "damper '"
                + placed.name()
                + "': "
                + edge.count()
                + " round the section cannot be one term at order "
                + order
                + "; more than "
                + 2 * order
                + " are needed");
      }
      count = edge.count();
    }
    SparseVector b = assembler.once(placed.place(), () -> mouth(placed));
    AnalyticFunction flow = Analytic.product(Analytic.constant(count), placed.damper().flow());
    return new LowRankTerm(
        "damper " + placed.name(), List.of(b), List.of(b), new AnalyticFunction[][] {{flow}});
  }

  private SparseVector mouth(PlacedDamper placed) {
    Map<Integer, Double> mean =
        placed.place() instanceof DamperPlace.OnEdge edge
            ? meanOnEdge(edge)
            : meanOnFace((DamperPlace.OnFace) placed.place());
    if (mean.isEmpty()) {
      throw new IllegalArgumentException(
          "damper '" + placed.name() + "' lies nowhere on " + placed.place());
    }
    return assembler.evenVector(mean);
  }

  private Map<Integer, Double> meanOnEdge(DamperPlace.OnEdge place) {
    Mesh mesh = assembler.mesh();
    Map<Integer, Double> nodal = new TreeMap<>();
    EdgeSegments edge =
        EdgeSegments.ofBoundary(assembler.nodes(), assembler.metric(), place.edge());
    double nearest = Double.POSITIVE_INFINITY;
    double[] centre = new double[2];
    for (EdgeSegments.Segment s : edge.segments()) {
      double[] q = ends(s, place.y());
      double dx = q[2] - q[0];
      double dy = q[3] - q[1];
      double t = ((place.x() - q[0]) * dx + (place.y() - q[1]) * dy) / (dx * dx + dy * dy);
      t = Math.max(0, Math.min(1, t));
      double distance = Math.hypot(place.x() - q[0] - t * dx, place.y() - q[1] - t * dy);
      if (distance < nearest) {
        nearest = distance;
        centre = new double[] {q[0] + t * dx, q[1] + t * dy};
      }
    }
    double total = 0;
    for (EdgeSegments.Segment s : edge.segments()) {
      double[] q = ends(s, centre[1]);
      double scale = assembler.metric().arcScale(s.triangle());
      double dx = q[2] - q[0];
      double dy = scale * (q[3] - q[1]);
      double length = Math.hypot(dx, dy);
      double ex = centre[0] - q[0];
      double ey = scale * (centre[1] - q[1]);
      double along = (ex * dx + ey * dy) / length;
      double off2 = ex * ex + ey * ey - along * along;
      double reach2 = place.width() * place.width() / 4 - off2;
      if (reach2 <= 0) {
        continue;
      }
      double from = Math.max(0, (along - Math.sqrt(reach2)) / length);
      double to = Math.min(1, (along + Math.sqrt(reach2)) / length);
      for (int g = 0; from < to && g < 3; g++) {
        double t = 0.5 * (from + to) + 0.5 * (to - from) * GAUSS[g];
        double w =
            GAUSS_WEIGHT[g]
                * (to - from)
                * length
                * assembler.metric().length(s.triangle(), q[1] + t * (q[3] - q[1]));
        nodal.merge(s.first(), w * (1 - t), Double::sum);
        nodal.merge(s.last(), w * t, Double::sum);
        total += w;
      }
    }
    double area = total;
    nodal.replaceAll((v, w) -> w / area);
    return nodal;
  }

  /** Ends x₁, y₁, x₂, y₂ of a segment, on a ring with the arc nearest to y. */
  private double[] ends(EdgeSegments.Segment s, double y) {
    Mesh mesh = assembler.mesh();
    int a = mesh.segmentStart(s.number());
    int b = mesh.segmentEnd(s.number());
    double ya = EdgeSegments.cornerY(mesh, s.triangle(), a);
    double yb = EdgeSegments.cornerY(mesh, s.triangle(), b);
    double period = mesh.period();
    double shift = period == 0 ? 0 : period * Math.rint((0.5 * (ya + yb) - y) / period);
    return new double[] {mesh.x(a), ya - shift, mesh.x(b), yb - shift};
  }

  private Map<Integer, Double> meanOnFace(DamperPlace.OnFace place) {
    if (!(assembler.metric().geometry() instanceof Ring ring)) {
      throw new IllegalArgumentException("only the zones of a ring have faces");
    }
    Ring.Annulus zone = ring.zones().get(place.zone());
    if (zone == null) {
      throw new IllegalArgumentException("the ring has no zone '" + place.zone() + "'");
    }
    double half = place.width() / 2;
    double arcHalf = half * ring.unrolledRadius() / place.face().radius(zone);
    double arc = place.angle() * ring.unrolledRadius();
    Map<Integer, Double> nodal = new TreeMap<>();
    double[] total = new double[1];
    new PatchQuadrature(assembler.metric(), sectors)
        .visit(
            place.zone(),
            new double[] {place.x() - half, place.x() + half, arc, arcHalf},
            (t, x, shape, weight) -> {
              total[0] += weight;
              for (int k = 0; k < 3; k++) {
                nodal.merge(assembler.nodes().corner(t, k), weight * shape[k], Double::sum);
              }
            });
    nodal.replaceAll((v, w) -> w / total[0]);
    return nodal;
  }

  /** What a two-port joins, without what it does. */
  private record Sides(EdgeGas gas1, EdgeGas gas2, List<Mouths> burners) {}

  /** Area in m² and means over the two mouths at one burner. */
  private record Mouths(double area, SparseVector mean1, SparseVector mean2) {}

  private record SidesKey(String edge1, Side upstream, String edge2) {}

  private Sides sides(PlacedTwoPort placed) {
    CutMesh nodes = assembler.nodes();
    Metric metric = assembler.metric();
    EdgeSegments first;
    EdgeSegments second;
    if (placed.upstream() == null) {
      first = EdgeSegments.ofBoundary(nodes, metric, placed.edge1());
      second = EdgeSegments.ofBoundary(nodes, metric, placed.edge2());
    } else {
      first = EdgeSegments.of(nodes, metric, placed.edge1(), placed.upstream());
      second = first.opposite(nodes, metric);
    }
    List<Mouths> mouths = new ArrayList<>();
    for (int burner = 1; burner <= sectors.count(); burner++) {
      EdgeSegments own1 = first.ofBurner(assembler.mesh(), sectors, burner);
      EdgeSegments own2 = second.ofBurner(assembler.mesh(), sectors, burner);
      double area = assembler.cellArea(Math.min(own1.area(), own2.area()));
      mouths.add(new Mouths(area, mean(own1), mean(own2)));
    }
    return new Sides(assembler.gas(first), assembler.gas(second), mouths);
  }

  /** One term for each burner of the mesh. */
  List<LowRankTerm> of(PlacedTwoPort placed) {
    Sides sides =
        assembler.once(
            new SidesKey(placed.edge1(), placed.upstream(), placed.edge2()), () -> sides(placed));
    String what =
        placed.edge1().equals(placed.edge2())
            ? placed.edge1()
            : placed.edge1() + " to " + placed.edge2();
    AnalyticFunction[][] mobility = placed.port().mobility(sides.gas1, sides.gas2);
    List<LowRankTerm> terms = new ArrayList<>();
    for (int burner = 1; burner <= sectors.count(); burner++) {
      Mouths mouths = sides.burners.get(burner - 1);
      AnalyticFunction[][] phi = new AnalyticFunction[2][2];
      for (int i = 0; i < 2; i++) {
        for (int k = 0; k < 2; k++) {
          phi[i][k] = Analytic.product(Analytic.constant(mouths.area), mobility[i][k]);
        }
      }
      List<SparseVector> b = List.of(mouths.mean1, mouths.mean2);
      String name = "two-port " + what + (sectors.count() > 1 ? " burner " + burner : "");
      terms.add(new LowRankTerm(name, b, b, phi));
    }
    return terms;
  }

  private SparseVector mean(EdgeSegments edge) {
    if (edge.segments().isEmpty()) {
      throw new IllegalArgumentException(
          "two-port on edge '" + edge.edge() + "': a burner has no segment of it");
    }
    double area = edge.area();
    Map<Integer, Double> nodal = new TreeMap<>();
    for (EdgeSegments.Segment s : edge.segments()) {
      nodal.merge(s.first(), s.load()[0] / area, Double::sum);
      nodal.merge(s.last(), s.load()[1] / area, Double::sum);
    }
    return assembler.evenVector(nodal);
  }
}
