package org.annulet.cases.study;

import java.util.Arrays;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.assembly.NodalField;

/**
 * A few nodes spread over a mesh, at which fields are compared from point to point of a study. On a
 * mesh that was drawn out they move with it; on a mesh made anew they are the nodes nearest to the
 * same share of the chamber's length and width.
 */
final class ShapePlaces {
  private static final int PLACES = 24;

  private final int[] node;
  private final double[][] share;

  private ShapePlaces(int[] node, double[][] share) {
    this.node = node;
    this.share = share;
  }

  /** Spread over a mesh: each as far as can be from those before. */
  static ShapePlaces on(Mesh mesh) {
    int n = mesh.nodeCount();
    int[] node = new int[Math.min(PLACES, n)];
    double[] nearest = new double[n];
    Arrays.fill(nearest, Double.POSITIVE_INFINITY);
    for (int k = 1; k < node.length; k++) {
      int last = node[k - 1];
      int farthest = 0;
      for (int v = 0; v < n; v++) {
        double d = Math.hypot(mesh.x(v) - mesh.x(last), mesh.y(v) - mesh.y(last));
        nearest[v] = Math.min(nearest[v], d);
        farthest = nearest[v] > nearest[farthest] * (1 + 1e-9) ? v : farthest;
      }
      node[k] = farthest;
    }
    double[] box = box(mesh);
    double[][] share = new double[node.length][2];
    for (int k = 0; k < node.length; k++) {
      share[k][0] = (mesh.x(node[k]) - box[0]) / (box[1] - box[0]);
      share[k][1] = (mesh.y(node[k]) - box[2]) / (box[3] - box[2]);
    }
    return new ShapePlaces(node, share);
  }

  /** The same places on a mesh of a chamber of other size. */
  ShapePlaces onto(Mesh other) {
    double[] box = box(other);
    int[] moved = new int[node.length];
    for (int k = 0; k < node.length; k++) {
      double x = box[0] + share[k][0] * (box[1] - box[0]);
      double y = box[2] + share[k][1] * (box[3] - box[2]);
      double best = Double.POSITIVE_INFINITY;
      for (int v = 0; v < other.nodeCount(); v++) {
        double d = Math.hypot(other.x(v) - x, other.y(v) - y);
        if (d < best) {
          best = d;
          moved[k] = v;
        }
      }
    }
    return new ShapePlaces(moved, share);
  }

  private static double[] box(Mesh mesh) {
    double[] box = {
      Double.POSITIVE_INFINITY,
      Double.NEGATIVE_INFINITY,
      Double.POSITIVE_INFINITY,
      Double.NEGATIVE_INFINITY
    };
    for (int v = 0; v < mesh.nodeCount(); v++) {
      box[0] = Math.min(box[0], mesh.x(v));
      box[1] = Math.max(box[1], mesh.x(v));
      box[2] = Math.min(box[2], mesh.y(v));
      box[3] = Math.max(box[3], mesh.y(v));
    }
    return box;
  }

  int count() {
    return node.length;
  }

  /** A field at the places, {re, im}, not scaled. */
  double[][] of(NodalField field) {
    double[][] out = new double[2][node.length];
    for (int k = 0; k < node.length; k++) {
      out[0][k] = field.re()[node[k]];
      out[1][k] = field.im()[node[k]];
    }
    return out;
  }

  /** Scales values at the places to unit length, in place. */
  static double[][] unit(double[][] at) {
    double sum = 0;
    for (int k = 0; k < at[0].length; k++) {
      sum += at[0][k] * at[0][k] + at[1][k] * at[1][k];
    }
    double scale = sum > 0 ? 1 / Math.sqrt(sum) : 0;
    for (double[] part : at) {
      for (int k = 0; k < part.length; k++) {
        part[k] *= scale;
      }
    }
    return at;
  }
}
