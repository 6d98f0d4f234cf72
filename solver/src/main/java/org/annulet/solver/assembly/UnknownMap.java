package org.annulet.solver.assembly;

import org.annulet.mesher.mesh.Mesh;

/**
 * The value at a node as a multiple of one unknown: p(v) = factor[v] · x[unknown[v]]; unknown −1
 * where p = 0.
 *
 * @param unknown shape [nodes after cutting]
 * @param factor shape [nodes after cutting]
 */
record UnknownMap(int[] unknown, double[] factor) {
  /** The value at node v of the field with these unknowns. */
  double value(int v, double[] x) {
    return unknown[v] < 0 ? 0 : factor[v] * x[unknown[v]];
  }

  /** Positions of n unknowns: those of the nodes they belong to, shape [2][n]. */
  static double[][] coordinates(CutMesh nodes, int n, UnknownMap... copies) {
    Mesh mesh = nodes.mesh();
    double[][] xy = new double[2][n];
    for (UnknownMap copy : copies) {
      for (int v = 0; v < nodes.nodeCount(); v++) {
        if (copy.unknown[v] >= 0) {
          xy[0][copy.unknown[v]] = mesh.x(nodes.origin(v));
          xy[1][copy.unknown[v]] = mesh.y(nodes.origin(v));
        }
      }
    }
    return xy;
  }
}
