package org.annulet.solver.assembly;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;
import org.annulet.mesher.mesh.Mesh;
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
  private final Metric metric;
  private final Medium medium;
  private final CutMesh nodes;
  private final Map<String, Wall> walls;
  private final Map<FaceOf, Wall> faces;
  private final List<Flame> flames;
  private final List<PortTerms.PlacedDamper> dampers;
  private final List<PortTerms.PlacedTwoPort> twoPorts;

  /** A face of a zone. */
  record FaceOf(int zone, Face face) {}

  Setup(Metric metric, Medium medium, Parts parts) {
    this.metric = metric;
    this.medium = medium;
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
    this.nodes = new CutMesh(metric.mesh(), cuts);
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
    walls.forEach(
        (edge, wall) -> {
          if (wall instanceof OpenEnd) {
            mark(edge, out);
          }
        });
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
    return new Matrices(
        assembler,
        assembler.stiffness(),
        assembler.crossStiffness(),
        assembler.mass(),
        parts,
        terms);
  }

  private List<WallPart> parts(Assembler assembler) {
    List<WallPart> parts = new ArrayList<>();
    walls.forEach(
        (name, wall) -> {
          if (wall instanceof ReactingWall reacting) {
            EdgeSegments edge = EdgeSegments.ofBoundary(nodes, metric, name);
            parts.add(new WallPart.OnEdge(edge, timesS(reacting.admittance(assembler.gas(edge)))));
          }
        });
    faces.forEach(
        (at, wall) -> {
          if (wall instanceof ReactingWall reacting) {
            parts.add(
                new WallPart.OnFace(
                    at.zone(), at.face(), timesS(reacting.admittance(assembler.gas(at.zone())))));
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
   * @param stiffness without order
   * @param cross stiffness to be multiplied by m² or k²
   */
  record Matrices(
      Assembler assembler,
      double[] stiffness,
      double[] cross,
      double[] mass,
      List<WallPart> parts,
      List<SparseTerm> walls) {}

  /** The operator at an azimuthal order (0 where there is none) and its m² or k². */
  AcousticOperator operator(Matrices m, int order, double crossFactor) {
    double[] stiffness = m.stiffness().clone();
    if (crossFactor != 0) {
      for (int q = 0; q < stiffness.length; q++) {
        stiffness[q] += crossFactor * m.cross()[q];
      }
    }
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
        m.mass(),
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
