package org.annulet.solver.assembly;

import java.util.Map;
import java.util.Set;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.operator.SparseTerm;

/** A reacting wall where it is: along an edge or over a face. */
sealed interface WallPart {
  /** s · y(s). */
  AnalyticFunction coefficient();

  /** Where it is, in words. */
  String place();

  /** The wall as a term of the operator. */
  SparseTerm term(Assembler assembler);

  /** Adds vᵀ ∮ w/(ρc) φφ, restricted to some triangles, to a vector of unknowns. */
  void addRow(
      Assembler assembler, Set<Integer> triangles, Map<Integer, Double> v, Map<Integer, Double> to);

  /** Along an edge. */
  record OnEdge(EdgeSegments edge, AnalyticFunction coefficient) implements WallPart {
    @Override
    public String place() {
      return edge.edge();
    }

    @Override
    public SparseTerm term(Assembler assembler) {
      String name = "wall " + edge.edge();
      return new SparseTerm(name, assembler.once(name, () -> assembler.wall(edge)), coefficient);
    }

    @Override
    public void addRow(
        Assembler assembler,
        Set<Integer> triangles,
        Map<Integer, Double> v,
        Map<Integer, Double> to) {
      for (EdgeSegments.Segment s : edge.segments()) {
        if (triangles.contains(s.triangle())) {
          assembler.addRow(assembler.wallElement(s), new int[] {s.first(), s.last()}, v, to);
        }
      }
    }
  }

  /** Over a face of a zone of a ring. */
  record OnFace(int zone, Face face, AnalyticFunction coefficient) implements WallPart {
    @Override
    public String place() {
      return zone + " " + face;
    }

    @Override
    public SparseTerm term(Assembler assembler) {
      String name =
          "wall "
              + assembler.mesh().zoneNames().get(zone)
              + (face == Face.INNER ? ".inner_face" : ".outer_face");
      return new SparseTerm(
          name, assembler.once(name, () -> assembler.face(zone, face)), coefficient);
    }

    @Override
    public void addRow(
        Assembler assembler,
        Set<Integer> triangles,
        Map<Integer, Double> v,
        Map<Integer, Double> to) {
      Mesh mesh = assembler.mesh();
      double[] local = new double[6];
      for (int t : triangles) {
        if (mesh.zone(t) == zone) {
          assembler.element().face(t, face, local);
          CutMesh nodes = assembler.nodes();
          assembler.addRow(
              local, new int[] {nodes.corner(t, 0), nodes.corner(t, 1), nodes.corner(t, 2)}, v, to);
        }
      }
    }
  }
}
