package org.annulet.solver.assembly;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.TreeSet;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.flame.Firing;
import org.annulet.solver.flame.Flame;
import org.annulet.solver.flame.Patch;
import org.annulet.solver.flame.Place;
import org.annulet.solver.flame.Reference;
import org.annulet.solver.flame.Side;
import org.annulet.solver.medium.Medium;
import org.annulet.solver.operator.Analytic;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.operator.LowRankTerm;
import org.annulet.solver.operator.SparseVector;

/** Flames as terms of low rank: what is heated, what is listened to, and the response between. */
final class FlameTerms {
  private final Assembler assembler;
  private final List<WallPart> walls;
  private final Map<String, Side> cuts;
  private final double crossFactor;
  private final Sectors sectors;
  private final Functionals functionals;

  /**
   * @param walls of the whole problem
   * @param cuts upstream side of each inner edge across which the pressure jumps
   * @param crossFactor m² or k²
   */
  FlameTerms(
      Assembler assembler, List<WallPart> walls, Map<String, Side> cuts, double crossFactor) {
    this.assembler = assembler;
    this.walls = walls;
    this.cuts = cuts;
    this.crossFactor = crossFactor;
    this.sectors = Sectors.of(assembler.mesh(), assembler.metric().geometry());
    this.functionals = new Functionals(assembler, sectors);
  }

  /** One term for each burner of the mesh. */
  List<LowRankTerm> of(Flame flame) {
    if (flame.place() instanceof Place.PointwiseSheet sheet) {
      return List.of(pointwise(flame, sheet));
    }
    checkStaging(flame);
    List<LowRankTerm> terms = new ArrayList<>();
    for (int burner = 1; burner <= sectors.count(); burner++) {
      Firing firing = flame.firing(burner);
      double heat = firing.heatRelease() / burnersSharing();
      List<FluxRows.Row> heard = reference(flame.reference(), burner, heat);
      AnalyticFunction[][] phi = new AnalyticFunction[1][heard.size()];
      List<SparseVector> right = new ArrayList<>();
      for (int q = 0; q < heard.size(); q++) {
        right.add(heard.get(q).vector());
        phi[0][q] = Analytic.product(heard.get(q).coefficient(), firing.response());
      }
      String name = "flame " + flame.name() + (sectors.count() > 1 ? " burner " + burner : "");
      terms.add(new LowRankTerm(name, List.of(heated(flame.place(), burner)), right, phi));
    }
    return terms;
  }

  private void checkStaging(Flame flame) {
    for (int burner : flame.staging().keySet()) {
      if (burner > sectors.count()) {
        throw new IllegalArgumentException(
            sectors.count() > 1
                ? "flame '"
                    + flame.name()
                    + "': there is no burner "
                    + burner
                    + ", the ring has "
                    + sectors.count()
                : "flame '"
                    + flame.name()
                    + "': exceptions for single burners need the whole ring; this mesh has one"
                    + " burner or is a section");
      }
    }
  }

  /** Over how many burners the heat release of a flame is divided for one term. */
  private double burnersSharing() {
    return assembler.metric().geometry() instanceof Ring ring ? ring.burnerCount() : 1;
  }

  private record PlaceKey(Place place, int burner) {}

  private record MeanKey(Patch patch, String edge, int burner) {}

  private record SlopeKey(Patch patch, double x, double y, int burner) {}

  private SparseVector heated(Place place, int burner) {
    return assembler.once(new PlaceKey(place, burner), () -> newHeated(place, burner));
  }

  private SparseVector newHeated(Place place, int burner) {
    if (place instanceof Place.Spread spread) {
      return functionals.heat(spread.patch(), burner);
    }
    if (place instanceof Place.Weighted weighted) {
      return functionals.heat(weighted, burner);
    }
    Place.Sheet sheet = (Place.Sheet) place;
    return functionals.heat(ofBurner(sheet.edge(), burner));
  }

  private EdgeSegments ofBurner(String edge, int burner) {
    CutMesh nodes = assembler.nodes();
    Metric metric = assembler.metric();
    Side upstream = cuts.get(edge); // behind a two-port the heat goes to the gas downstream of it
    EdgeSegments all =
        upstream == null
            ? EdgeSegments.passage(nodes, metric, edge)
            : EdgeSegments.of(nodes, metric, edge, upstream).opposite(nodes, metric);
    return ofBurner(all, burner);
  }

  private EdgeSegments ofBurner(EdgeSegments all, int burner) {
    EdgeSegments own = all.ofBurner(assembler.mesh(), sectors, burner);
    if (own.segments().isEmpty()) {
      throw new IllegalArgumentException(
          "edge '" + all.edge() + "' has no segment at burner " + burner);
    }
    return own;
  }

  /** Rows g with their coefficients, so that Q̂ = −(heat · F) Σ coefficient · gᵀp / s. */
  private List<FluxRows.Row> reference(Reference reference, int burner, double heat) {
    if (reference instanceof Reference.PatchVelocity v) {
      SparseVector g =
          assembler.once(
              new SlopeKey(v.patch(), v.directionX(), v.directionY(), burner),
              () -> functionals.gradient(v, burner));
      return List.of(new FluxRows.Row(g, Analytic.constant(heat / v.meanVelocity())));
    }
    if (reference instanceof Reference.EdgeFlux v) {
      FluxRows flux = FluxRows.of(assembler, v, crossFactor);
      FluxRows.Part part = flux.part(v, burner, () -> ofBurner(flux.edge(), burner));
      double factor = heat / (v.meanVelocity() * assembler.cellArea(part.area()));
      return part.rows(walls).stream()
          .map(
              row ->
                  new FluxRows.Row(
                      row.vector(), Analytic.product(Analytic.constant(factor), row.coefficient())))
          .toList();
    }
    SparseVector mean =
        reference instanceof Reference.PatchPressure p
            ? assembler.once(
                new MeanKey(p.patch(), "", burner), () -> functionals.mean(p.patch(), burner))
            : onEdge(((Reference.EdgePressure) reference).edge(), burner);
    double factor = -heat / assembler.medium().meanPressure();
    return List.of(new FluxRows.Row(mean, Analytic.power(factor, 1)));
  }

  private SparseVector onEdge(String edge, int burner) {
    return assembler.once(
        new MeanKey(null, edge, burner), () -> functionals.mean(ofBurner(edge, burner)));
  }

  private LowRankTerm pointwise(Flame flame, Place.PointwiseSheet sheet) {
    if (!(flame.reference() instanceof Reference.EdgeFlux edge)
        || !edge.edge().equals(sheet.edge())
        || assembler.metric().geometry() instanceof Ring) {
      throw new IllegalArgumentException(
          "flame '"
              + flame.name()
              + "': a sheet that answers pointwise needs a section (or plane) and the flux through"
              + " its own edge '"
              + sheet.edge()
              + "' as reference");
    }
    checkStaging(flame);
    if (cuts.containsKey(sheet.edge())) {
      throw new IllegalArgumentException(
          "flame '"
              + flame.name()
              + "': a two-port on edge '"
              + sheet.edge()
              + "' knows the mean velocity only, so the sheet cannot answer pointwise");
    }
    FluxRows flux = FluxRows.of(assembler, edge, crossFactor);
    EdgeSegments side = flux.edge();
    double factor = flame.firing().heatRelease() / (side.area() * edge.meanVelocity());
    Map<Integer, Double> strength = functionals.expansion(side);
    List<SparseVector> left = new ArrayList<>();
    List<SparseVector> right = new ArrayList<>();
    List<List<FluxRows.Row>> all = new ArrayList<>();
    for (int v : new TreeSet<>(strength.keySet())) {
      int u = assembler.even().unknown()[v];
      if (u >= 0) {
        left.add(new SparseVector(new int[] {u}, new double[] {factor * strength.get(v)}));
        all.add(flux.at(u, walls));
      }
    }
    int columns = all.stream().mapToInt(List::size).sum();
    AnalyticFunction[][] phi = new AnalyticFunction[left.size()][columns];
    int column = 0;
    for (int k = 0; k < left.size(); k++) {
      for (FluxRows.Row row : all.get(k)) {
        right.add(row.vector());
        phi[k][column++] = Analytic.product(row.coefficient(), flame.firing().response());
      }
    }
    return new LowRankTerm("flame " + flame.name(), left, right, phi);
  }

  /** Means, heat loads and gradients over patches and edges. */
  private record Functionals(Assembler assembler, Sectors sectors) {
    private Mesh mesh() {
      return assembler.mesh();
    }

    /** (γ − 1)/(γp̄) of triangle t. */
    private double expansion(int t) {
      Medium gas = assembler.medium();
      return (gas.gamma(t) - 1) / gas.bulkModulus(t);
    }

    private double expansion(EdgeSegments.Segment s) {
      return s.opposite() < 0
          ? expansion(s.triangle())
          : 0.5 * (expansion(s.triangle()) + expansion(s.opposite()));
    }

    SparseVector heat(Patch patch, int burner) {
      return over(patch, burner, this::expansion);
    }

    /** As the even spread, every point weighted by the density of the heat release there. */
    SparseVector heat(Place.Weighted place, int burner) {
      Map<Integer, Double> nodal = new TreeMap<>();
      double[] total = new double[1];
      Mesh mesh = mesh();
      new PatchQuadrature(assembler.metric(), sectors)
          .visit(
              place.patch(),
              burner,
              (t, x, shape, weight) -> {
                double y =
                    shape[0] * mesh.cornerY(t, 0)
                        + shape[1] * mesh.cornerY(t, 1)
                        + shape[2] * mesh.cornerY(t, 2);
                double w = weight * place.density().at(x, y);
                total[0] += w;
                for (int k = 0; k < 3; k++) {
                  nodal.merge(
                      assembler.nodes().corner(t, k), w * expansion(t) * shape[k], Double::sum);
                }
              });
      return normalised(nodal, total[0], place.patch());
    }

    SparseVector mean(Patch patch, int burner) {
      return over(patch, burner, t -> 1);
    }

    private SparseVector over(
        Patch patch, int burner, java.util.function.IntToDoubleFunction factor) {
      Map<Integer, Double> nodal = new TreeMap<>();
      double[] total = new double[1];
      new PatchQuadrature(assembler.metric(), sectors)
          .visit(
              patch,
              burner,
              (t, x, shape, weight) -> {
                total[0] += weight;
                for (int k = 0; k < 3; k++) {
                  nodal.merge(
                      assembler.nodes().corner(t, k),
                      weight * factor.applyAsDouble(t) * shape[k],
                      Double::sum);
                }
              });
      return normalised(nodal, total[0], patch);
    }

    SparseVector gradient(Reference.PatchVelocity v, int burner) {
      double length = Math.hypot(v.directionX(), v.directionY());
      if (v.directionY() != 0
          && assembler.metric().geometry() instanceof Ring
          && sectors.count() == 1) {
        throw new IllegalArgumentException(
            "a half cell is mirrored about its burner, so the reference velocity must be axial");
      }
      Map<Integer, Double> nodal = new TreeMap<>();
      double[] total = new double[1];
      double[] gx = new double[3];
      double[] gy = new double[3];
      new PatchQuadrature(assembler.metric(), sectors)
          .visit(
              v.patch(),
              burner,
              (t, x, shape, weight) -> {
                total[0] += weight;
                assembler.element().gradients(t, gx, gy);
                for (int k = 0; k < 3; k++) {
                  double slope = (v.directionX() * gx[k] + v.directionY() * gy[k]) / length;
                  nodal.merge(
                      assembler.nodes().corner(t, k),
                      weight * slope / assembler.medium().density(t),
                      Double::sum);
                }
              });
      return normalised(nodal, total[0], v.patch());
    }

    private SparseVector normalised(Map<Integer, Double> nodal, double total, Patch patch) {
      if (!(total > 0)) {
        throw new IllegalArgumentException("patch " + patch + " covers no part of its zone");
      }
      nodal.replaceAll((v, x) -> x / total);
      return assembler.evenVector(nodal);
    }

    SparseVector heat(EdgeSegments edge) {
      return along(edge, this::expansion);
    }

    SparseVector mean(EdgeSegments edge) {
      return along(edge, s -> 1);
    }

    private SparseVector along(
        EdgeSegments edge, java.util.function.ToDoubleFunction<EdgeSegments.Segment> factor) {
      Map<Integer, Double> nodal = new TreeMap<>();
      double area = edge.area();
      for (EdgeSegments.Segment s : edge.segments()) {
        double f = factor.applyAsDouble(s) / area;
        nodal.merge(s.first(), f * s.load()[0], Double::sum);
        nodal.merge(s.last(), f * s.load()[1], Double::sum);
      }
      return assembler.evenVector(nodal);
    }

    /** Mean of (γ − 1)/(γp̄) of the segments at each node of an edge. */
    Map<Integer, Double> expansion(EdgeSegments edge) {
      Map<Integer, Double> sum = new TreeMap<>();
      Map<Integer, Double> weight = new TreeMap<>();
      for (EdgeSegments.Segment s : edge.segments()) {
        double f = expansion(s);
        sum.merge(s.first(), f * s.load()[0], Double::sum);
        sum.merge(s.last(), f * s.load()[1], Double::sum);
        weight.merge(s.first(), s.load()[0], Double::sum);
        weight.merge(s.last(), s.load()[1], Double::sum);
      }
      sum.replaceAll((v, x) -> x / weight.get(v));
      return sum;
    }
  }
}
