package org.annulet.solver.assembly;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import java.util.function.Supplier;
import org.annulet.solver.flame.Reference;
import org.annulet.solver.flame.Side;
import org.annulet.solver.operator.Analytic;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.operator.SparseVector;

/**
 * Consistent flux out of one side of an inner edge: vᵀ (K_up + s² M_up + s C_up), where v is 1 on
 * the part of the edge in question and 0 at all other nodes. Equal to ∫ w/ρ n·∇p̂ over that part, n
 * out of that side, to second order in the mesh size.
 */
final class FluxRows {
  private final Assembler assembler;
  private final EdgeSegments edge;
  private final Set<Integer> triangles;
  private final double crossFactor;
  private final Map<Integer, Integer> segmentsAtNode = new HashMap<>();

  private record Key(String edge, Side upstream, double crossFactor) {}

  private record PartKey(String edge, Side upstream, double crossFactor, int burner) {}

  private record WallKey(Part part, String place) {}

  /**
   * @param edge seen from the side the flux comes out of
   * @param crossFactor m² or k²
   */
  private FluxRows(Assembler assembler, EdgeSegments edge, double crossFactor) {
    this.assembler = assembler;
    this.edge = edge;
    this.triangles = new LinkedHashSet<>(edge.touching(assembler.mesh()));
    this.crossFactor = crossFactor;
    for (EdgeSegments.Segment s : edge.segments()) {
      segmentsAtNode.merge(s.first(), 1, Integer::sum);
      segmentsAtNode.merge(s.last(), 1, Integer::sum);
    }
  }

  /** Out of the named side of an edge. */
  static FluxRows of(Assembler assembler, Reference.EdgeFlux side, double crossFactor) {
    return assembler.once(
        new Key(side.edge(), side.upstream(), crossFactor),
        () ->
            new FluxRows(
                assembler,
                EdgeSegments.of(
                    assembler.nodes(), assembler.metric(), side.edge(), side.upstream()),
                crossFactor));
  }

  /** A vector and the power of s, or wall coefficient, that goes with it. */
  record Row(SparseVector vector, AnalyticFunction coefficient) {}

  /** The whole edge, seen from the side the flux comes out of. */
  EdgeSegments edge() {
    return edge;
  }

  /**
   * The part of the edge at one burner. A node shared by two parts counts half in each.
   *
   * @param own the segments of that burner
   */
  Part part(Reference.EdgeFlux side, int burner, Supplier<EdgeSegments> own) {
    return assembler.once(
        new PartKey(side.edge(), side.upstream(), crossFactor, burner),
        () -> {
          EdgeSegments part = own.get();
          Map<Integer, Double> nodal = new TreeMap<>();
          for (EdgeSegments.Segment s : part.segments()) {
            nodal.merge(s.first(), 1.0 / segmentsAtNode.get(s.first()), Double::sum);
            nodal.merge(s.last(), 1.0 / segmentsAtNode.get(s.last()), Double::sum);
          }
          return new Part(part.area(), unknowns(assembler.evenVector(nodal)));
        });
  }

  /** The flux that goes with a single unknown on the edge. */
  List<Row> at(int unknown, List<WallPart> walls) {
    return new Part(Double.NaN, Map.of(unknown, 1.0)).rows(walls);
  }

  /** A part of the edge with its rows. */
  final class Part {
    private final double area;
    private final Map<Integer, Double> v;
    private final SparseVector stiffness;
    private final SparseVector mass;

    private Part(double area, Map<Integer, Double> v) {
      this.area = area;
      this.v = v;
      Map<Integer, Double> k = new TreeMap<>();
      Map<Integer, Double> m = new TreeMap<>();
      double[] local = new double[6];
      double[] cross = new double[6];
      CutMesh nodes = assembler.nodes();
      for (int t : triangles) {
        int[] at = {nodes.corner(t, 0), nodes.corner(t, 1), nodes.corner(t, 2)};
        assembler.element().stiffness(t, local);
        if (crossFactor != 0) {
          assembler.element().crossStiffness(t, cross);
          for (int q = 0; q < 6; q++) {
            local[q] += crossFactor * cross[q];
          }
        }
        assembler.addRow(local, at, v, k);
        assembler.element().mass(t, local);
        assembler.addRow(local, at, v, m);
      }
      stiffness = Assembler.vector(k);
      mass = Assembler.vector(m);
    }

    /** ∫ w over the part, in m². */
    double area() {
      return area;
    }

    /**
     * The flux through the part.
     *
     * @param walls of the whole problem
     */
    List<Row> rows(List<WallPart> walls) {
      List<Row> rows = new ArrayList<>();
      rows.add(new Row(stiffness, Analytic.constant(1)));
      rows.add(new Row(mass, Analytic.power(1, 2)));
      for (WallPart wall : walls) {
        SparseVector damping =
            assembler.once(
                new WallKey(this, wall.place()),
                () -> {
                  Map<Integer, Double> row = new TreeMap<>();
                  wall.addRow(assembler, triangles, v, row);
                  return Assembler.vector(row);
                });
        if (damping.index().length > 0) {
          rows.add(new Row(damping, wall.coefficient()));
        }
      }
      return rows;
    }
  }

  private static Map<Integer, Double> unknowns(SparseVector v) {
    Map<Integer, Double> map = new TreeMap<>();
    for (int q = 0; q < v.index().length; q++) {
      map.put(v.index()[q], v.value()[q]);
    }
    return map;
  }
}
