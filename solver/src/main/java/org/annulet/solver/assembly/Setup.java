package org.annulet.solver.assembly;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;
import java.util.function.Supplier;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.boundary.EdgeGas;
import org.annulet.solver.boundary.OpenEnd;
import org.annulet.solver.boundary.ReactingWall;
import org.annulet.solver.boundary.Wall;
import org.annulet.solver.flame.Flame;
import org.annulet.solver.flame.Side;
import org.annulet.solver.medium.Medium;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.Analytic;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.operator.LowRankTerm;
import org.annulet.solver.operator.SparseTerm;

/** All that was said about a problem, on a mesh; common to its orders and Bloch numbers. */
final class Setup {
  private final AssemblyMemory memory;
  private final Metric metric;
  private final Medium medium;
  private final CutMesh nodes;
  private final NodesKey key;
  private final Map<String, Wall> walls;
  private final Map<FaceOf, Wall> faces;
  private final List<Flame> flames;
  private final List<PortTerms.PlacedDamper> dampers;
  private final List<PortTerms.PlacedTwoPort> twoPorts;

  /** A face of a zone. */
  record FaceOf(int zone, Face face) {}

  /** What decides which nodes carry which unknowns. */
  private record NodesKey(Set<String> cuts, Set<String> open) {}

  private record AxisKey(NodesKey nodes, Axis axis) {}

  private record CellKey(NodesKey nodes, int number) {}

  private record EdgeKey(String edge, String what) {}

  Setup(AssemblyMemory memory, Parts parts) {
    this.memory = memory;
    this.metric = memory.metric();
    this.medium = memory.medium();
    this.walls = parts.walls();
    this.faces = parts.faces();
    this.flames = parts.flames();
    this.dampers = parts.dampers();
    this.twoPorts = parts.twoPorts();
    Set<String> cuts = new TreeSet<>();
    for (PortTerms.PlacedTwoPort p : twoPorts) {
      if (p.upstream() != null) {
        cuts.add(p.edge1());
      }
    }
    Set<String> open = new TreeSet<>();
    walls.forEach((edge, wall) -> addIfOpen(edge, wall, open));
    this.key = new NodesKey(cuts, open);
    this.nodes = memory.once(cuts, () -> new CutMesh(metric.mesh(), cuts));
  }

  private static void addIfOpen(String edge, Wall wall, Set<String> open) {
    if (wall instanceof OpenEnd) {
      open.add(edge);
    }
  }

  /** Everything that is put into the gas and onto its walls. */
  record Parts(
      Map<String, Wall> walls,
      Map<FaceOf, Wall> faces,
      List<Flame> flames,
      List<PortTerms.PlacedDamper> dampers,
      List<PortTerms.PlacedTwoPort> twoPorts) {}

  Mesh mesh() {
    return metric.mesh();
  }

  CutMesh nodes() {
    return nodes;
  }

  Metric metric() {
    return metric;
  }

  /** Whether p̂ = 0 is imposed at each node; on the axis too if asked for. */
  boolean[] eliminated(Axis axis) {
    boolean[] out = new boolean[nodes.nodeCount()];
    key.open().forEach(edge -> mark(edge, out));
    if (axis == Axis.NO_PRESSURE) {
      for (int v = 0; v < out.length; v++) {
        out[v] |= metric.onAxis(nodes.origin(v));
      }
    }
    return out;
  }

  void mark(String edge, boolean[] out) {
    for (EdgeSegments.Segment s : EdgeSegments.ofBoundary(nodes, metric, edge).segments()) {
      out[s.first()] = true;
      out[s.last()] = true;
    }
  }

  /** What holds on the axis of a section. */
  enum Axis {
    /** Nothing: order 0, or no section. */
    FREE,
    /** p̂ = 0: orders from 1. */
    NO_PRESSURE
  }

  Assembler assembler(Axis axis) {
    return memory.once(new AxisKey(key, axis), () -> newAssembler(axis));
  }

  private Assembler newAssembler(Axis axis) {
    boolean[] zero = eliminated(axis);
    int[] unknown = new int[zero.length];
    double[] factor = new double[zero.length];
    int n = 0;
    for (int v = 0; v < zero.length; v++) {
      unknown[v] = zero[v] ? -1 : n++;
      factor[v] = 1;
    }
    return new Assembler(nodes, metric, medium, n, new UnknownMap(unknown, factor));
  }

  /** A Bloch cell, made once. */
  <T> T cell(int number, Supplier<T> make) {
    return memory.once(new CellKey(key, number), make);
  }

  Assembler assembler(int size, UnknownMap even, UnknownMap odd) {
    return new Assembler(nodes, metric, medium, size, even, odd);
  }

  Assembler assembler(Assembler like, UnknownMap even, UnknownMap odd) {
    return new Assembler(nodes, metric, medium, like.pattern(), even, odd);
  }

  /** The matrices that all orders share. */
  Matrices matrices(Assembler assembler) {
    List<WallPart> parts = parts(assembler);
    List<SparseTerm> terms = parts.stream().map(p -> p.term(assembler)).toList();
    return new Matrices(assembler, parts, terms);
  }

  private List<WallPart> parts(Assembler assembler) {
    List<WallPart> parts = new ArrayList<>();
    walls.forEach(
        (name, wall) -> {
          if (wall instanceof ReactingWall reacting) {
            EdgeSegments edge =
                assembler.once(
                    new EdgeKey(name, "wall"), () -> EdgeSegments.ofBoundary(nodes, metric, name));
            EdgeGas gas = assembler.once(new EdgeKey(name, "gas"), () -> assembler.gas(edge));
            parts.add(new WallPart.OnEdge(edge, timesS(reacting.admittance(gas))));
          }
        });
    faces.forEach(
        (at, wall) -> {
          if (wall instanceof ReactingWall reacting) {
            EdgeGas gas =
                assembler.once(
                    new EdgeKey(metric.mesh().zoneNames().get(at.zone()), "gas of the zone"),
                    () -> assembler.gas(at.zone()));
            parts.add(new WallPart.OnFace(at.zone(), at.face(), timesS(reacting.admittance(gas))));
          }
        });
    return parts;
  }

  private static AnalyticFunction timesS(AnalyticFunction y) {
    return Analytic.product(Analytic.power(1, 1), y);
  }

  /**
   * Matrices on one pattern.
   *
   * @param parts walls where they are
   * @param walls the same as terms of the operator
   */
  record Matrices(Assembler assembler, List<WallPart> parts, List<SparseTerm> walls) {}

  /** The operator at an azimuthal order (0 where there is none) and its m² or k². */
  AcousticOperator operator(Matrices m, int order, double crossFactor) {
    double[] stiffness = m.assembler().stiffness(crossFactor);
    Map<String, Side> cuts = new TreeMap<>();
    for (PortTerms.PlacedTwoPort port : twoPorts) {
      if (port.upstream() != null) {
        cuts.put(port.edge1(), port.upstream());
      }
    }
    FlameTerms terms = new FlameTerms(m.assembler(), m.parts(), cuts, crossFactor);
    List<LowRankTerm> lowRank = new ArrayList<>();
    for (Flame flame : flames) {
      lowRank.addAll(terms.of(flame));
    }
    PortTerms ports = new PortTerms(m.assembler(), order);
    for (PortTerms.PlacedTwoPort port : twoPorts) {
      lowRank.addAll(ports.of(port));
    }
    for (PortTerms.PlacedDamper damper : dampers) {
      lowRank.add(ports.of(damper));
    }
    return new AcousticOperator(
        m.assembler().pattern(),
        stiffness,
        m.assembler().mass(),
        m.walls(),
        List.copyOf(lowRank),
        m.assembler().coordinates());
  }

  /** The field of a problem with one copy of the mesh. */
  NodalField expand(UnknownMap map, double[] re, double[] im) {
    double[] outRe = new double[mesh().nodeCount()];
    double[] outIm = new double[mesh().nodeCount()];
    for (int v = 0; v < outRe.length; v++) {
      outRe[v] = map.value(v, re);
      outIm[v] = map.value(v, im);
    }
    return new NodalField(outRe, outIm);
  }
}
