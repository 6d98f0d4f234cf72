package org.annulet.mesher.triangulate;

import java.util.Arrays;
import java.util.function.UnaryOperator;
import org.annulet.mesher.geometry.Outline;
import org.annulet.mesher.mesh.Mesh;

/**
 * Meshes an outline.
 *
 * <p>Nodes on curved edges lie on the true curve. Same outline and sizing, same mesh to the last
 * bit. Thread-safe.
 */
public final class OutlineMesher {
  private OutlineMesher() {}

  /**
   * The mesh of an outline. Zones and edges keep their names.
   *
   * @param outline the outline
   * @param sizing how large the triangles may be
   * @return a conforming mesh whose angles are at least 28° away from corners below 60°
   * @throws org.annulet.mesher.geometry.GeometryFault if the sizing names an edge or zone the
   *     outline does not have
   * @throws MeshingLimitException if the node cap is reached
   */
  public static Mesh mesh(Outline outline, Sizing sizing) {
    return mesh(outline, sizing, UnaryOperator.identity());
  }

  /** As {@link #mesh(Outline, Sizing)}, with other names for the edges in sizing and mesh. */
  static Mesh mesh(Outline outline, Sizing sizing, UnaryOperator<String> edgeName) {
    SizeRules rules = new SizeRules(outline, sizing, edgeName);
    BoundaryNodes nodes = new BoundaryNodes(outline, rules);
    nodes.cut();
    Triangulation triangles = new FirstTriangulation(outline, nodes).build();
    new Refiner(triangles, nodes, rules).run();
    return collect(outline, triangles, edgeName);
  }

  private static Mesh collect(Outline outline, Triangulation m, UnaryOperator<String> edgeName) {
    Mesh.Builder b = Mesh.builder();
    int[] number = new int[m.nodeCount];
    Arrays.fill(number, -1);
    int[] order = SpatialOrder.alongCurve(m.x, m.y, m.nodeCount);
    boolean[] used = new boolean[m.nodeCount];
    for (int t = 0; t < m.triangleCount; t++) {
      if (m.zone[t] >= 0) {
        used[m.start[4 * t]] = true;
        used[m.start[4 * t + 1]] = true;
        used[m.start[4 * t + 2]] = true;
      }
    }
    for (int v : order) {
      if (used[v]) {
        number[v] = b.node(m.x[v], m.y[v]);
      }
    }
    for (int t = 0; t < m.triangleCount; t++) {
      if (m.zone[t] >= 0) {
        b.triangle(
            number[m.start[4 * t]],
            number[m.start[4 * t + 1]],
            number[m.start[4 * t + 2]],
            outline.zones().get(m.zone[t]).name());
      }
    }
    Segments s = m.segments;
    for (int i = 0; i < s.count; i++) {
      String name = edgeName.apply(outline.edges().get(s.edgeOf[s.piece[i]]).name());
      b.segment(number[s.from[i]], number[s.to[i]], name);
    }
    return b.build();
  }
}
