package org.annulet.mesher.triangulate;

import java.util.Locale;
import org.annulet.mesher.mesh.Mesh;

/**
 * One mesh of the annular chamber of the gallery, for timing a whole process from outside; {@code
 * mesher/benchmark/compare.sh} runs it beside a mesh generator of Debian.
 */
public final class MeshingBenchmark {
  private MeshingBenchmark() {}

  /**
   * Meshes and prints the numbers of nodes and triangles and the least angle.
   *
   * @param args {@code uniform} or {@code graded}; the size in m
   */
  public static void main(String[] args) {
    double h = Double.parseDouble(args[1]);
    Sizing sizing =
        args[0].equals("graded")
            // From h at the flame to 8 h at 0.2 m from it, as the other program's threshold field.
            ? Sizing.builder(8 * h).edge("flame", h).growth(35 * h).cornerShare(1).build()
            : Sizing.builder(h).cornerShare(1).build();
    Mesh m = OutlineMesher.mesh(Chambers.annularChamber(), sizing);
    double least = 180;
    for (int t = 0; t < m.triangleCount(); t++) {
      least = Math.min(least, GalleryTest.leastAngle(m, t));
    }
    System.out.printf(
        Locale.ROOT,
        "%d nodes, %d triangles, least angle %.2f°%n",
        m.nodeCount(),
        m.triangleCount(),
        least);
  }
}
