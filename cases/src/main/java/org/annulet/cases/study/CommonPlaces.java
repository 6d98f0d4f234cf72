package org.annulet.cases.study;

import java.util.HashMap;
import java.util.Map;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.assembly.NodalField;

/**
 * The nodes of a coarse mesh in meshes refined from it: where fields on different meshes can be
 * compared without interpolation.
 */
final class CommonPlaces {
  private final int[] node;

  /**
   * Finds the nodes of {@code coarse} in {@code fine}.
   *
   * @throws IllegalArgumentException if one is missing
   */
  CommonPlaces(Mesh coarse, Mesh fine) {
    double size = 0;
    for (int v = 0; v < coarse.nodeCount(); v++) {
      size = Math.max(size, Math.max(Math.abs(coarse.x(v)), Math.abs(coarse.y(v))));
    }
    double cell = 1e-9 * size;
    Map<Long, Integer> at = new HashMap<>(2 * fine.nodeCount());
    for (int v = 0; v < fine.nodeCount(); v++) {
      at.put(key(Math.rint(fine.x(v) / cell), Math.rint(fine.y(v) / cell)), v);
    }
    node = new int[coarse.nodeCount()];
    for (int v = 0; v < node.length; v++) {
      node[v] = near(at, Math.rint(coarse.x(v) / cell), Math.rint(coarse.y(v) / cell));
      if (node[v] < 0) {
        throw new IllegalArgumentException(
            "the node at (" + coarse.x(v) + ", " + coarse.y(v) + ") m is not in the finer mesh");
      }
    }
  }

  /** Rounding may have moved a coordinate into the next cell. */
  private static int near(Map<Long, Integer> at, double i, double j) {
    for (int di = -1; di <= 1; di++) {
      for (int dj = -1; dj <= 1; dj++) {
        Integer v = at.get(key(i + di, j + dj));
        if (v != null) {
          return v;
        }
      }
    }
    return -1;
  }

  private static long key(double i, double j) {
    return ((long) i << 32) ^ ((long) j & 0xffffffffL);
  }

  /** A field of the fine mesh at the common places, shape [2][places]. */
  double[][] of(NodalField field) {
    double[][] out = new double[2][node.length];
    for (int k = 0; k < node.length; k++) {
      out[0][k] = field.re()[node[k]];
      out[1][k] = field.im()[node[k]];
    }
    return out;
  }
}
