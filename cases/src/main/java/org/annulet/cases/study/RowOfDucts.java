package org.annulet.cases.study;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.Flame;
import org.annulet.cases.read.TwoPort;
import org.annulet.solver.boundary.EdgeGas;
import org.annulet.solver.boundary.ReactingWall;
import org.annulet.solver.boundary.Wall;
import org.annulet.solver.medium.Medium;
import org.annulet.solver.network.DuctChain;
import org.annulet.solver.network.DuctEnd;
import org.annulet.solver.network.Heard;
import org.annulet.solver.network.Piece;
import org.annulet.solver.network.SideWall;
import org.apache.commons.math3.complex.Complex;

/**
 * A case as a row of uniform ducts, one for each azimuthal order: the one-dimensional second
 * opinion, derived from the case and nothing else.
 */
public final class RowOfDucts {
  private final CaseFile caseFile;
  private final Medium medium;
  private final StraightZones zones;
  private final List<String> leftOut = new ArrayList<>();

  /**
   * A mode of the row.
   *
   * @param order azimuthal order; 0 on a plane
   * @param copies 2 for a pair
   * @param s in 1/s
   */
  public record RowMode(int order, int copies, Complex s) {}

  /**
   * The answer.
   *
   * @param modes in the window, by frequency; empty where there is no row
   * @param complete whether each order's count confirms them
   * @param reason why the case is no row of ducts; empty where it is one
   * @param leftOut what the row cannot carry, in words
   */
  public record Answer(
      List<RowMode> modes, boolean complete, String reason, List<String> leftOut) {}

  private RowOfDucts(CaseFile caseFile, CaseProblem problem, StraightZones zones) {
    this.caseFile = caseFile;
    this.medium = problem.medium();
    this.zones = zones;
  }

  /** The modes of a case's row in its window. */
  public static Answer of(CaseFile caseFile) {
    ChamberShape shape = ChamberShape.of(caseFile);
    CaseProblem problem = CaseProblem.on(caseFile, shape);
    StraightZones zones;
    try {
      zones = StraightZones.of(caseFile, shape.mesh(), shape.geometry());
      return new RowOfDucts(caseFile, problem, zones).run();
    } catch (IllegalArgumentException e) {
      return new Answer(List.of(), false, e.getMessage(), List.of());
    }
  }

  private Answer run() {
    List<RowMode> modes = new ArrayList<>();
    boolean complete = true;
    for (int order : zones.orders(caseFile)) {
      DuctChain.Roots roots = chain(order).roots(caseFile.window(), order);
      complete &= roots.complete();
      for (Complex s : roots.s()) {
        modes.add(new RowMode(order, zones.copies(order), s));
      }
    }
    modes.sort((a, b) -> Double.compare(a.s.getImaginary(), b.s.getImaginary()));
    leftOut.addAll(0, zones.leftOut());
    if (!caseFile.dampers().isEmpty()) {
      leftOut.add("dampers on walls and faces");
    }
    if (caseFile.flames().stream().anyMatch(f -> !f.staging().isEmpty())) {
      leftOut.add("exceptions for single burners: all burners follow the common rule");
    }
    return new Answer(modes, complete, "", leftOut.stream().distinct().toList());
  }

  /** Somewhere along the row at which a flame listens or burns, or a two-port sits. */
  private record Event(double at, Rank rank, int flame, TwoPort port) {}

  /** The order of events at one place. */
  private enum Rank {
    LISTEN,
    PORT,
    BURN
  }

  private DuctChain chain(int order) {
    List<List<Event>> inside = lists();
    List<List<Event>> joints = lists();
    for (int f = 0; f < caseFile.flames().size(); f++) {
      listen(f, inside, joints);
      burn(f, inside, joints);
    }
    for (TwoPort port : caseFile.twoPorts()) {
      joints.get(zones.joint(port.edge())).add(new Event(0, Rank.PORT, -1, port));
    }
    List<Piece> pieces = new ArrayList<>();
    Heard[] heard = new Heard[caseFile.flames().size()];
    for (int z = 0; z < zones.count(); z++) {
      double[] x = zones.range(z);
      double from = x[0];
      for (Event e : sorted(inside.get(z))) {
        if (e.at > from) {
          pieces.add(duct(z, order, e.at - from));
          from = e.at;
        }
        put(e, zones.area(z), expansion(z), heard, pieces);
      }
      pieces.add(duct(z, order, x[1] - from));
      for (Event e : sorted(joints.get(z))) {
        if (e.rank == Rank.PORT) {
          pieces.add(
              new Piece.Coupling(
                  CaseTwoPorts.solved(e.port, zones.mesh(), medium),
                  gas(z),
                  gas(z + 1),
                  zones.passage(z)));
        } else {
          double expansion = 0.5 * (expansion(z) + expansion(z + 1));
          put(e, zones.passage(z), expansion, heard, pieces);
        }
      }
    }
    return new DuctChain(
        end(0, zones.upstreamWall()), pieces, end(zones.count() - 1, zones.downstreamWall()));
  }

  private List<List<Event>> lists() {
    List<List<Event>> lists = new ArrayList<>();
    for (int z = 0; z < zones.count(); z++) {
      lists.add(new ArrayList<>());
    }
    return lists;
  }

  private static List<Event> sorted(List<Event> events) {
    return events.stream()
        .sorted(Comparator.comparingDouble(Event::at).thenComparing(Event::rank))
        .toList();
  }

  /** A flame that listens at the station reached, or burns there. */
  private void put(Event e, double area, double expansion, Heard[] heard, List<Piece> pieces) {
    Flame flame = caseFile.flames().get(e.flame);
    if (e.rank == Rank.LISTEN) {
      heard[e.flame] =
          Double.isNaN(flame.referenceVelocity())
              ? new Heard.Pressure(pieces.size())
              : new Heard.Velocity(pieces.size(), area);
      return;
    }
    if (heard[e.flame] == null) {
      throw new IllegalArgumentException(
          "flame '" + flame.name() + "' listens downstream of where it burns");
    }
    double over =
        Double.isNaN(flame.referenceVelocity())
            ? caseFile.gas().meanPressure()
            : flame.referenceVelocity();
    pieces.add(
        new Piece.Sheet(
            heard[e.flame],
            expansion * flame.heatRelease() / over,
            CaseFlames.response(flame.response())));
  }

  private void listen(int number, List<List<Event>> inside, List<List<Event>> joints) {
    Flame flame = caseFile.flames().get(number);
    if (flame.reference() instanceof Flame.EdgeFlux edge) {
      joints.get(zones.joint(edge.edge())).add(new Event(0, Rank.LISTEN, number, null));
      return;
    }
    if (flame.reference() instanceof Flame.EdgePressure edge) {
      joints.get(zones.joint(edge.edge())).add(new Event(0, Rank.LISTEN, number, null));
      return;
    }
    boolean pressure = flame.reference() instanceof Flame.PatchPressure;
    String zone =
        pressure
            ? ((Flame.PatchPressure) flame.reference()).zone()
            : ((Flame.Patch) flame.reference()).zone();
    double from =
        pressure
            ? ((Flame.PatchPressure) flame.reference()).from()
            : ((Flame.Patch) flame.reference()).from();
    double to =
        pressure
            ? ((Flame.PatchPressure) flame.reference()).to()
            : ((Flame.Patch) flame.reference()).to();
    int z = zones.index(zone);
    inside.get(z).add(new Event(middle(z, from, to), Rank.LISTEN, number, null));
    leftOut.add("the extent of the reference patch of flame " + flame.name());
  }

  private void burn(int number, List<List<Event>> inside, List<List<Event>> joints) {
    Flame flame = caseFile.flames().get(number);
    if (flame.place() instanceof Flame.Sheet sheet) {
      joints.get(zones.joint(sheet.edge())).add(new Event(0, Rank.BURN, number, null));
      return;
    }
    boolean spread = flame.place() instanceof Flame.Spread;
    String zone =
        spread ? ((Flame.Spread) flame.place()).zone() : ((Flame.Brush) flame.place()).zone();
    int z = zones.index(zone);
    double at =
        spread
            ? middle(z, ((Flame.Spread) flame.place()).from(), ((Flame.Spread) flame.place()).to())
            : middle(z, Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);
    inside.get(z).add(new Event(at, Rank.BURN, number, null));
    leftOut.add("the extent of flame " + flame.name() + ": it burns in the middle of its place");
  }

  private double middle(int z, double from, double to) {
    double[] x = zones.range(z);
    return 0.5 * (Math.max(x[0], from) + Math.min(x[1], to));
  }

  private Piece.Duct duct(int z, int order, double length) {
    List<SideWall> walls = new ArrayList<>();
    zones
        .faces(z)
        .forEach(
            (name, perimeter) -> {
              if (CaseWalls.solverWall(caseFile, caseFile.wall(name)) instanceof ReactingWall w) {
                walls.add(new SideWall(w, perimeter));
              }
            });
    return new Piece.Duct(length, zones.area(z), zones.radius(z, order), gas(z), walls);
  }

  private DuctEnd end(int z, String name) {
    Wall wall = CaseWalls.solverWall(caseFile, caseFile.wall(name));
    return new DuctEnd(wall, gas(z), zones.area(z));
  }

  private double expansion(int z) {
    double gamma = gas(z).gamma();
    return (gamma - 1) / (gamma * caseFile.gas().meanPressure());
  }

  private final Map<Integer, EdgeGas> known = new LinkedHashMap<>();

  /** The gas of a zone, averaged over its area. */
  private EdgeGas gas(int z) {
    return known.computeIfAbsent(
        z,
        k -> {
          double[] sum = new double[4];
          double low = Double.POSITIVE_INFINITY;
          double high = 0;
          for (int t = 0; t < zones.mesh().triangleCount(); t++) {
            if (zones.mesh().zone(t) == zones.zone(z)) {
              double w = zones.mesh().area(t);
              sum[0] += w * medium.density(t);
              sum[1] += w * medium.soundSpeed(t);
              sum[2] += w * medium.gamma(t);
              sum[3] += w;
              low = Math.min(low, medium.soundSpeed(t));
              high = Math.max(high, medium.soundSpeed(t));
            }
          }
          if (high > 1.01 * low) {
            leftOut.add(
                "the temperature field inside zone " + zones.name(z) + ": its mean is taken");
          }
          return new EdgeGas(sum[0] / sum[3], sum[1] / sum[3], sum[2] / sum[3]);
        });
  }
}
