package org.annulet.cases.study;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.TreeMap;
import java.util.stream.IntStream;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.Flame;
import org.annulet.cases.read.Geometry;
import org.annulet.cases.read.TwoPort;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.boundary.ReactingWall;
import org.annulet.solver.network.DuctChain;
import org.annulet.solver.network.DuctEnd;
import org.annulet.solver.network.Heard;
import org.annulet.solver.network.Piece;
import org.annulet.solver.network.SideWall;
import org.annulet.solver.operator.AnalyticFunction;

/**
 * A case as a chain of ducts, one behind the other along x: lengths and areas of the zones, mean
 * gas (in slices where it changes), walls at both ends and along the ducts, losses and flames at
 * the inner edges. What has no place in it is listed.
 */
public final class ChainOfCase {
  private static final int SLICES = 10;
  private static final int SHEETS = 12;
  private static final int MOST_ORDERS = 30;

  private final CaseFile c;
  private final CaseProblem problem;
  private final ChainLinks links;
  private final ChainGas gases;
  private final List<String> leftOut = new ArrayList<>();
  private final List<TreeMap<Double, Integer>> stations = new ArrayList<>();

  /**
   * The chain.
   *
   * @param plain without near fields
   * @param withNearField the same with the inertia of the gas near each step of the area as a long
   *     wave feels it; empty where no step has one in the plane of the mesh
   * @param start x of its upstream end in m
   * @param orders azimuthal orders it stands for, increasing
   * @param leftOut what the case has and the chain has not, in words
   */
  public record Chain(
      DuctChain plain,
      Optional<DuctChain> withNearField,
      double start,
      List<Integer> orders,
      List<String> leftOut) {}

  /**
   * A chain, or why there is none.
   *
   * @param chain the chain
   * @param whyNot in words; empty when there is one
   */
  public record Outcome(Optional<Chain> chain, String whyNot) {}

  private ChainOfCase(CaseFile c, CaseProblem problem, ChainLinks links) {
    this.c = c;
    this.problem = problem;
    this.links = links;
    this.gases = new ChainGas(c, problem, links);
  }

  /** The chain of a case, or why it cannot be one. */
  public static Outcome of(CaseFile caseFile, CaseProblem problem) {
    try {
      ChainLinks links = ChainLinks.of(caseFile);
      ChainOfCase plain = new ChainOfCase(caseFile, problem, links);
      DuctChain chain = plain.build(false);
      ChainOfCase near = new ChainOfCase(caseFile, problem, links);
      DuctChain with = near.build(true);
      boolean steps = with.pieces().size() > chain.pieces().size();
      return new Outcome(
          Optional.of(
              new Chain(
                  chain,
                  steps ? Optional.of(with) : Optional.empty(),
                  links.links().get(0).start(),
                  plain.orders(),
                  plain.leftOut(steps))),
          "");
    } catch (ChainLinks.NoChain e) {
      return new Outcome(Optional.empty(), e.getMessage());
    }
  }

  private List<Integer> orders() {
    if (c.geometry() instanceof Geometry.Plane) {
      return List.of(0);
    }
    if (c.geometry() instanceof Geometry.Section) {
      boolean axis = links.links().stream().anyMatch(l -> l.low() <= 0);
      return axis ? List.of(0) : c.azimuthalOrders();
    }
    Geometry.Ring ring = (Geometry.Ring) c.geometry();
    boolean ducts = links.links().stream().anyMatch(l -> Double.isInfinite(l.radius()));
    int top = (ring.burnerCount() - 1) / 2;
    if (!ducts) {
      top = 0;
      for (int z = 0; z < links.links().size(); z++) {
        double cutOn =
            gases.mean(z, Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY).soundSpeed()
                / (2 * Math.PI * links.links().get(z).radius());
        top = Math.max(top, (int) Math.ceil(1.2 * c.window().highestFrequency() / cutOn));
      }
    }
    return IntStream.rangeClosed(0, Math.min(top, MOST_ORDERS)).boxed().toList();
  }

  private List<String> leftOut(boolean steps) {
    List<String> all = new ArrayList<>();
    if (steps) {
      all.add(
          "the near field at steps of the area, which lengthens narrow ducts (estimated below)");
    }
    all.addAll(leftOut);
    links.leftOut().forEach(all::add);
    c.dampers().forEach(d -> all.add("damper " + d.name() + " (" + d.places().size() + " places)"));
    if (c.geometry() instanceof Geometry.Ring ring) {
      if (c.flames().stream().anyMatch(f -> !f.staging().isEmpty())) {
        all.add("staging: the mean of the burners is taken, pairs do not split");
      }
      if (!c.gas().even()) {
        all.add("changes of the temperature round the ring");
      }
      if (links.links().stream().anyMatch(l -> Double.isInfinite(l.radius()))) {
        all.add(
            "orders from "
                + (ring.burnerCount() + 1) / 2
                + " on, and the coupling of orders m and m ± "
                + ring.burnerCount()
                + " by the separate burners");
      }
    }
    if (c.geometry() instanceof Geometry.Section) {
      double widest =
          links.links().stream()
              .filter(l -> Double.isFinite(l.radius()))
              .mapToDouble(l -> Math.pow((l.high() - l.low()) / l.radius(), 2) / 24)
              .max()
              .orElse(0);
      all.add(
          String.format(
              Locale.ROOT,
              "waves across the gap, and its curvature: waves round run at its mean radius, which"
                  + " moves azimuthal modes by up to about %.2g %%",
              100 * widest));
      if (links.links().stream().anyMatch(l -> l.low() <= 0)
          && c.azimuthalOrders().stream().anyMatch(m -> m > 0)) {
        all.add("azimuthal orders above 0, for a zone reaches the axis");
      }
    } else if (c.geometry() instanceof Geometry.Plane) {
      all.add("waves across the ducts");
    }
    return List.copyOf(all);
  }

  private DuctChain build(boolean nearField) throws ChainLinks.NoChain {
    List<Piece> pieces = new ArrayList<>();
    List<ChainLinks.Link> all = links.links();
    for (int z = 0; z < all.size(); z++) {
      stations.add(new TreeMap<>());
      ducts(z, pieces);
      if (z + 1 < all.size()) {
        String joint = links.joints().get(z);
        if (nearField) {
          new ChainStep(c, all.get(z), all.get(z + 1))
              .inertia(gases.whole(z), gases.whole(z + 1))
              .ifPresent(pieces::add);
        }
        Optional<TwoPort> port =
            c.twoPorts().stream().filter(p -> p.edge().equals(joint)).findFirst();
        if (port.isPresent()) {
          pieces.add(coupling(port.get(), z));
        }
        for (Flame f : c.flames()) {
          if (f.place() instanceof Flame.Sheet s && s.edge().equals(joint)) {
            double mean = 0.5 * (gases.expansion(z) + gases.expansion(z + 1));
            sheets(f, mean, 1, pieces);
          }
        }
      }
    }
    return new DuctChain(end(0, links.upstream()), pieces, end(all.size() - 1, links.downstream()));
  }

  private DuctEnd end(int z, String edge) {
    return new DuctEnd(
        CaseWalls.solverWall(c, c.wall(edge)), gases.whole(z), links.links().get(z).area());
  }

  /** The ducts of one zone, cut where gas, flames and references want it. */
  private void ducts(int z, List<Piece> pieces) throws ChainLinks.NoChain {
    ChainLinks.Link link = links.links().get(z);
    double from = link.start();
    double to = from + link.length();
    TreeMap<Double, List<Flame>> cuts = new TreeMap<>();
    cuts.put(from, new ArrayList<>());
    cuts.put(to, new ArrayList<>());
    if (!gases.even(z)) {
      for (int k = 1; k < SLICES; k++) {
        cuts.put(from + link.length() * k / SLICES, new ArrayList<>());
      }
    }
    for (Flame f : c.flames()) {
      if (f.reference() instanceof Flame.Patch p && p.zone().equals(link.zone())) {
        cuts.computeIfAbsent(clip(p.from(), from, to), x -> new ArrayList<>());
        cuts.computeIfAbsent(clip(p.to(), from, to), x -> new ArrayList<>());
      }
      if (f.reference() instanceof Flame.PatchPressure p && p.zone().equals(link.zone())) {
        cuts.computeIfAbsent(
            0.5 * (clip(p.from(), from, to) + clip(p.to(), from, to)), x -> new ArrayList<>());
      }
      for (double x : flamePlaces(f, z)) {
        cuts.computeIfAbsent(x, y -> new ArrayList<>()).add(f);
      }
    }
    double before = from;
    for (var cut : cuts.entrySet()) {
      double x = cut.getKey();
      if (x > before) {
        List<SideWall> walls = new ArrayList<>();
        link.walls()
            .forEach(
                (name, perimeter) ->
                    walls.add(
                        new SideWall(
                            (ReactingWall) CaseWalls.solverWall(c, c.wall(name)), perimeter)));
        pieces.add(
            new Piece.Duct(
                x - before, link.area(), link.radius(), gases.mean(z, before, x), walls));
      }
      stations.get(z).put(x, pieces.size());
      for (Flame f : cut.getValue()) {
        sheets(f, gases.expansion(z), 1.0 / flamePlaces(f, z).size(), pieces);
      }
      before = x;
    }
  }

  private static double clip(double x, double low, double high) {
    return Math.max(low, Math.min(high, x));
  }

  /** Where a spread flame is put in this zone. */
  private List<Double> flamePlaces(Flame f, int z) {
    ChainLinks.Link link = links.links().get(z);
    double from = link.start();
    double to = from + link.length();
    if (f.place() instanceof Flame.Spread s && s.zone().equals(link.zone())) {
      double a = clip(s.from(), from, to);
      double b = clip(s.to(), from, to);
      return IntStream.range(0, SHEETS).mapToObj(k -> a + (b - a) * (k + 0.5) / SHEETS).toList();
    }
    if (f.place() instanceof Flame.Brush brush && brush.zone().equals(link.zone())) {
      Mesh mesh = problem.shape().mesh();
      double sum = 0;
      double moment = 0;
      for (int t = 0; t < mesh.triangleCount(); t++) {
        if (mesh.zoneNames().get(mesh.zone(t)).equals(link.zone())) {
          double x = ChainGas.centre(mesh, t);
          double y = (mesh.cornerY(t, 0) + mesh.cornerY(t, 1) + mesh.cornerY(t, 2)) / 3;
          double w = mesh.area(t) * brush.density().at(x, y);
          sum += w;
          moment += w * x;
        }
      }
      String note = "the spread of flame " + f.name() + ", which is a sheet at its centre";
      if (!leftOut.contains(note)) {
        leftOut.add(note);
      }
      return sum > 0 ? List.of(moment / sum) : List.of();
    }
    return List.of();
  }

  /** The sheets of a flame at one place: one for each kind of burner. */
  private void sheets(Flame f, double expansion, double share, List<Piece> pieces)
      throws ChainLinks.NoChain {
    Heard heard = heard(f, pieces.size());
    boolean pressure = heard instanceof Heard.Pressure;
    double mean = pressure ? c.gas().meanPressure() : f.referenceVelocity();
    int burners =
        c.geometry() instanceof Geometry.Ring ring && !f.staging().isEmpty()
            ? ring.burnerCount()
            : 1;
    double sign =
        f.reference() instanceof Flame.Patch p && p.directionX() < 0
                || f.reference() instanceof Flame.EdgeFlux e && !flowsOn(e)
            ? -1
            : 1;
    java.util.Map<Flame.Response, Double> kinds = new java.util.LinkedHashMap<>();
    for (int b = 1; b <= burners; b++) {
      kinds.merge(f.responseAt(b), f.heatShareAt(b) / burners, Double::sum);
    }
    kinds.forEach(
        (response, part) -> {
          AnalyticFunction solved = CaseFlames.response(response);
          double strength = sign * expansion * f.heatRelease() * share * part / mean;
          pieces.add(new Piece.Sheet(heard, strength, solved));
        });
  }

  /** Whether the flow through a reference edge runs downstream along the chain. */
  private boolean flowsOn(Flame.EdgeFlux e) {
    int joint = links.joints().indexOf(e.edge());
    return joint < 0 || links.links().get(joint).zone().equals(e.flowFrom());
  }

  private Heard heard(Flame f, int now) throws ChainLinks.NoChain {
    Flame.Reference r = f.reference();
    String late =
        "flame " + f.name() + " answers to a place downstream of it, which a chain cannot follow";
    if (r instanceof Flame.EdgeFlux e) {
      int joint = links.joints().indexOf(e.edge());
      if (joint < 0 || joint >= stations.size() || stations.get(joint).isEmpty()) {
        throw new ChainLinks.NoChain(late);
      }
      double area = links.links().get(joint).area();
      if (!flowsOn(e) || Double.isInfinite(links.links().get(joint + 1).radius())) {
        area = Math.min(area, links.links().get(joint + 1).area());
      }
      return new Heard.Velocity(stations.get(joint).lastEntry().getValue(), area);
    }
    if (r instanceof Flame.EdgePressure e) {
      int joint = links.joints().indexOf(e.edge());
      if (joint < 0 || joint >= stations.size() || stations.get(joint).isEmpty()) {
        throw new ChainLinks.NoChain(late);
      }
      return new Heard.Pressure(stations.get(joint).lastEntry().getValue());
    }
    String zone = r instanceof Flame.Patch p ? p.zone() : ((Flame.PatchPressure) r).zone();
    int z = links.links().stream().map(ChainLinks.Link::zone).toList().indexOf(zone);
    if (z >= stations.size()) {
      throw new ChainLinks.NoChain(late);
    }
    double low = links.links().get(z).start();
    double high = low + links.links().get(z).length();
    TreeMap<Double, Integer> at = stations.get(z);
    if (r instanceof Flame.PatchPressure p) {
      Integer station = at.get(0.5 * (clip(p.from(), low, high) + clip(p.to(), low, high)));
      if (station == null || station > now) {
        throw new ChainLinks.NoChain(late);
      }
      return new Heard.Pressure(station);
    }
    Flame.Patch p = (Flame.Patch) r;
    double from = clip(p.from(), low, high);
    double to = clip(p.to(), low, high);
    if (Math.abs(p.directionX()) < 0.999 * Math.hypot(p.directionX(), p.directionY())) {
      throw new ChainLinks.NoChain("flame " + f.name() + " answers to a velocity across the duct");
    }
    if (!at.containsKey(from) || !at.containsKey(to) || !gases.even(z)) {
      throw new ChainLinks.NoChain(
          gases.even(z) ? late : "the gas changes over the reference patch of flame " + f.name());
    }
    return new Heard.MeanVelocity(at.get(from), at.get(to), gases.whole(z).density() * (to - from));
  }

  private Piece coupling(TwoPort port, int z) throws ChainLinks.NoChain {
    ChainLinks.Link a = links.links().get(z);
    ChainLinks.Link b = links.links().get(z + 1);
    if (!port.flowFrom().equals(a.zone())) {
      throw new ChainLinks.NoChain(
          "the two-port " + port.edge() + " is flown through against the chain");
    }
    return new Piece.Coupling(
        CaseTwoPorts.solved(port, problem.shape().mesh(), problem.medium()),
        gases.whole(z),
        gases.whole(z + 1),
        Math.min(a.area(), b.area()));
  }
}
