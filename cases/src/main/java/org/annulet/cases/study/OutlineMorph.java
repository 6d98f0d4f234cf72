package org.annulet.cases.study;

import java.util.Arrays;
import java.util.List;
import org.annulet.cases.read.DrawnShape;
import org.annulet.cases.read.Outline;
import org.annulet.mesher.geometry.CurvePiece;
import org.annulet.mesher.geometry.Edge;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.sparse.PatternBuilder;
import org.annulet.solver.sparse.RealFactor;
import org.annulet.solver.sparse.SparseSolver;
import org.annulet.solver.sparse.SymmetricPattern;

/**
 * The mesh of an outline moved to slightly other points: triangles and numbering stay, so that
 * operators on both meshes can be subtracted.
 *
 * <p>A node on an edge keeps its parameter t on its piece of the edge, whether straight, arc or
 * curve; inside, the displacement d is the harmonic extension, ∇²d = 0, of that of the edges. How
 * the inside moves changes the eigenvalue only as much as the mesh errs. Factorised once; then one
 * pair of solves for each moved outline. Thread-safe.
 */
final class OutlineMorph {
  private final ChamberShape shape;
  private final org.annulet.mesher.geometry.Outline from;
  private final Place[] places;
  private final double[] values;
  private final SymmetricPattern pattern;
  private final RealFactor factor;

  /** Where a node lies on the outline. */
  private record Place(String edge, int piece, double t) {}

  /**
   * A mesh and the outline it was made of.
   *
   * @throws org.annulet.mesher.geometry.GeometryFault if the outline is at fault
   */
  OutlineMorph(ChamberShape shape, Outline from) {
    this.shape = shape;
    this.from = DrawnShape.outline(from);
    Mesh mesh = shape.mesh();
    places = new Place[mesh.nodeCount()];
    for (int e = 0; e < mesh.segmentCount(); e++) {
      Edge edge = this.from.edge(mesh.edgeNames().get(mesh.segmentEdge(e)));
      place(edge, mesh.segmentStart(e));
      place(edge, mesh.segmentEnd(e));
    }
    PatternBuilder b = new PatternBuilder(mesh.nodeCount());
    for (int t = 0; t < mesh.triangleCount(); t++) {
      b.element(mesh.corner(t, 0), mesh.corner(t, 1), mesh.corner(t, 2));
    }
    pattern = b.build();
    values = laplacian(mesh);
    double[][] xy = new double[2][mesh.nodeCount()];
    Arrays.setAll(xy[0], mesh::x);
    Arrays.setAll(xy[1], mesh::y);
    factor = SparseSolver.analyse(pattern, xy).factorReal(held(values));
  }

  private void place(Edge edge, int node) {
    if (places[node] != null) {
      return;
    }
    Mesh mesh = shape.mesh();
    double nearest = Double.POSITIVE_INFINITY;
    for (int k = 0; k < edge.pieces().size(); k++) {
      CurvePiece c = edge.pieces().get(k);
      double t = c.closest(mesh.x(node), mesh.y(node));
      double d = Math.hypot(c.x(t) - mesh.x(node), c.y(t) - mesh.y(node));
      if (d < nearest) {
        nearest = d;
        places[node] = new Place(edge.name(), k, t);
      }
    }
  }

  /** ∫ ∇φ_i·∇φ_k in the plane, on the pattern. */
  private double[] laplacian(Mesh mesh) {
    double[] a = new double[pattern.entryCount()];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int i = 0; i < 3; i++) {
        for (int k = 0; k <= i; k++) {
          // side opposite corner i, and opposite k: ∇φ_i·∇φ_k = sides' product / 4A²
          double xi = mesh.cornerX(t, (i + 2) % 3) - mesh.cornerX(t, (i + 1) % 3);
          double yi = mesh.cornerY(t, (i + 2) % 3) - mesh.cornerY(t, (i + 1) % 3);
          double xk = mesh.cornerX(t, (k + 2) % 3) - mesh.cornerX(t, (k + 1) % 3);
          double yk = mesh.cornerY(t, (k + 2) % 3) - mesh.cornerY(t, (k + 1) % 3);
          a[pattern.entry(mesh.corner(t, i), mesh.corner(t, k))] +=
              (xi * xk + yi * yk) / (4 * mesh.area(t));
        }
      }
    }
    return a;
  }

  /** The same with the rows of nodes on edges replaced by the identity. */
  private double[] held(double[] all) {
    double[] a = all.clone();
    for (int i = 0; i < places.length; i++) {
      for (int q = pattern.rowStart(i); q < pattern.rowStart(i + 1); q++) {
        int j = pattern.column(q);
        if (places[i] != null || places[j] != null) {
          a[q] = i == j ? 1 : 0;
        }
      }
    }
    return a;
  }

  /**
   * The mesh with the points of another outline of the same edges and zones.
   *
   * @throws org.annulet.mesher.geometry.GeometryFault if that outline is at fault
   * @throws IllegalArgumentException if a triangle would lose its area
   */
  ChamberShape to(Outline moved) {
    List<Edge> old = from.edges();
    org.annulet.mesher.geometry.Outline other = DrawnShape.outline(moved);
    for (int e = 0; e < old.size(); e++) {
      if (old.get(e).pieces().size() != other.edge(old.get(e).name()).pieces().size()) {
        throw new IllegalArgumentException(
            "edge '" + old.get(e).name() + "' has other pieces than the mesh was made of");
      }
    }
    Mesh mesh = shape.mesh();
    double[] dx = new double[mesh.nodeCount()];
    double[] dy = new double[mesh.nodeCount()];
    for (int v = 0; v < places.length; v++) {
      Place p = places[v];
      if (p != null) {
        CurvePiece before = from.edge(p.edge).pieces().get(p.piece);
        CurvePiece after = other.edge(p.edge).pieces().get(p.piece);
        dx[v] = after.x(p.t) - before.x(p.t);
        dy[v] = after.y(p.t) - before.y(p.t);
      }
    }
    extend(dx);
    extend(dy);
    Mesh.Builder b = Mesh.builder();
    for (int v = 0; v < mesh.nodeCount(); v++) {
      b.node(mesh.x(v) + dx[v], mesh.y(v) + dy[v]);
    }
    for (int t = 0; t < mesh.triangleCount(); t++) {
      b.triangle(
          mesh.corner(t, 0),
          mesh.corner(t, 1),
          mesh.corner(t, 2),
          mesh.zoneNames().get(mesh.zone(t)));
    }
    for (int e = 0; e < mesh.segmentCount(); e++) {
      b.segment(
          mesh.segmentStart(e), mesh.segmentEnd(e), mesh.edgeNames().get(mesh.segmentEdge(e)));
    }
    return new ChamberShape(b.build(), shape.cells(), shape.geometry());
  }

  /** Fills in the inside; the values on edges stay. */
  private void extend(double[] d) {
    double[] right = new double[d.length];
    pattern.addProduct(values, d, -1, right);
    for (int v = 0; v < d.length; v++) {
      right[v] = places[v] != null ? 0 : right[v];
    }
    if (Arrays.stream(right).anyMatch(r -> r != 0)) {
      factor.solve(right);
    }
    for (int v = 0; v < d.length; v++) {
      d[v] = places[v] != null ? d[v] : right[v];
    }
  }
}
