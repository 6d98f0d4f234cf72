package org.annulet.solver.assembly;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
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
  private final List<WallPart> walls;
  private final double crossFactor;
  private final Map<Integer, Integer> segmentsAtNode = new HashMap<>();

  /**
   * @param edge seen from the side the flux comes out of
   * @param walls of the whole problem
   * @param crossFactor m² or k²
   */
  FluxRows(Assembler assembler, EdgeSegments edge, List<WallPart> walls, double crossFactor) {
    this.assembler = assembler;
    this.edge = edge;
    this.triangles = new LinkedHashSet<>(edge.touching(assembler.mesh()));
    this.walls = walls;
    this.crossFactor = crossFactor;
    for (EdgeSegments.Segment s : edge.segments()) {
      segmentsAtNode.merge(s.first(), 1, Integer::sum);
      segmentsAtNode.merge(s.last(), 1, Integer::sum);
    }
  }

  /** A vector and the power of s, or wall coefficient, that goes with it. */
  record Row(SparseVector vector, AnalyticFunction coefficient) {}

  /**
   * The flux through a part of the edge. A node shared by two parts counts half in each.
   *
   * @param part some of the edge's segments
   */
  List<Row> through(EdgeSegments part) {
    Map<Integer, Double> nodal = new TreeMap<>();
    for (EdgeSegments.Segment s : part.segments()) {
      nodal.merge(s.first(), 1.0 / segmentsAtNode.get(s.first()), Double::sum);
      nodal.merge(s.last(), 1.0 / segmentsAtNode.get(s.last()), Double::sum);
    }
    return rows(unknowns(assembler.evenVector(nodal)));
  }

  /** The flux that goes with a single unknown on the edge. */
  List<Row> at(int unknown) {
    return rows(Map.of(unknown, 1.0));
  }

  private static Map<Integer, Double> unknowns(SparseVector v) {
    Map<Integer, Double> map = new TreeMap<>();
    for (int q = 0; q < v.index().length; q++) {
      map.put(v.index()[q], v.value()[q]);
    }
    return map;
  }

  private List<Row> rows(Map<Integer, Double> v) {
    Map<Integer, Double> stiffness = new TreeMap<>();
    Map<Integer, Double> mass = new TreeMap<>();
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
      assembler.addRow(local, at, v, stiffness);
      assembler.element().mass(t, local);
      assembler.addRow(local, at, v, mass);
    }
    List<Row> rows = new ArrayList<>();
    rows.add(new Row(Assembler.vector(stiffness), Analytic.constant(1)));
    rows.add(new Row(Assembler.vector(mass), Analytic.power(1, 2)));
    for (WallPart wall : walls) {
      Map<Integer, Double> damping = new TreeMap<>();
      wall.addRow(assembler, triangles, v, damping);
      if (!damping.isEmpty()) {
        rows.add(new Row(Assembler.vector(damping), wall.coefficient()));
      }
    }
    return rows;
  }
}
