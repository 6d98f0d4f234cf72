package org.annulet.solver.assembly;

import org.annulet.mesher.mesh.Mesh;

/**
 * Which burner an arc coordinate belongs to.
 *
 * @param count number of burners in the mesh: N on a whole ring, 1 on anything else
 * @param pitch arc of one burner cell at R₀ in m; 0 where there is one burner
 */
record Sectors(int count, double pitch) {
  static Sectors of(Mesh mesh, Geometry geometry) {
    return geometry instanceof Ring ring && mesh.period() > 0
        ? new Sectors(ring.burnerCount(), ring.pitch())
        : new Sectors(1, 0);
  }

  /** Burner counted from 1. */
  int burnerAt(double y) {
    return count == 1 ? 1 : 1 + Math.floorMod((int) Math.rint(y / pitch), count);
  }

  /** Arc of burner {@code burner} in m. */
  double centre(int burner) {
    return (burner - 1) * pitch;
  }
}
