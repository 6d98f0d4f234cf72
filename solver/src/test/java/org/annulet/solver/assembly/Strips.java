package org.annulet.solver.assembly;

import java.util.function.DoubleUnaryOperator;
import org.annulet.mesher.mesh.Mesh;

/**
 * Structured strips along x for tests: zones "0", "1", … one behind the other; edges "inlet",
 * "outlet", "lower", "upper", joints "joint1", "joint2", …
 */
final class Strips {
  private Strips() {}

  /**
   * A strip with cells cut into two triangles by diagonals of alternating direction.
   *
   * @param ends x of the ends of the zones, first the inlet
   * @param cells along x in each zone
   * @param y lower and upper bound
   * @param rows cells across
   */
  static Mesh flat(double[] ends, int[] cells, double[] y, int rows) {
    return build(Mesh.builder(), ends, cells, y, rows, false);
  }

  /** A strip closed on itself in y, with period y[1] − y[0]. */
  static Mesh closed(double[] ends, int[] cells, double period, int rows) {
    return build(Mesh.periodicBuilder(period), ends, cells, new double[] {0, period}, rows, true);
  }

  private static Mesh build(
      Mesh.Builder b, double[] ends, int[] cells, double[] y, int rows, boolean closed) {
    int columns = 0;
    for (int c : cells) {
      columns += c;
    }
    int nodeRows = closed ? rows : rows + 1;
    int[][] node = new int[columns + 1][rows + 1];
    int i = 0;
    for (int zone = 0; zone < cells.length; zone++) {
      for (int k = zone == 0 ? 0 : 1; k <= cells[zone]; k++) {
        double x = ends[zone] + (ends[zone + 1] - ends[zone]) * k / cells[zone];
        for (int j = 0; j < nodeRows; j++) {
          node[i][j] = b.node(x, y[0] + (y[1] - y[0]) * j / rows);
        }
        if (closed) {
          node[i][rows] = node[i][0];
        }
        i++;
      }
    }
    i = 0;
    for (int zone = 0; zone < cells.length; zone++) {
      for (int k = 0; k < cells[zone]; k++, i++) {
        for (int j = 0; j < rows; j++) {
          int a = node[i][j];
          int c = node[i + 1][j + 1];
          int d = node[i][j + 1];
          int e = node[i + 1][j];
          String name = Integer.toString(zone);
          if (closed || (i + j) % 2 == 0) {
            b.triangle(a, e, c, name);
            b.triangle(a, c, d, name);
          } else {
            b.triangle(a, e, d, name);
            b.triangle(e, c, d, name);
          }
        }
        if (!closed) {
          b.segment(node[i][0], node[i + 1][0], "lower");
          b.segment(node[i][rows], node[i + 1][rows], "upper");
        }
      }
      if (zone + 1 < cells.length) {
        for (int j = 0; j < rows; j++) {
          b.segment(node[i][j], node[i][j + 1], "joint" + (zone + 1));
        }
      }
    }
    for (int j = 0; j < rows; j++) {
      b.segment(node[0][j], node[0][j + 1], "inlet");
      b.segment(node[columns][j], node[columns][j + 1], "outlet");
    }
    return b.build();
  }

  /** The same mesh with other coordinates: x' = fx(x), y' = fy(y); not for closed meshes. */
  static Mesh mapped(Mesh m, DoubleUnaryOperator fx, DoubleUnaryOperator fy) {
    Mesh.Builder b = Mesh.builder();
    for (int v = 0; v < m.nodeCount(); v++) {
      b.node(fx.applyAsDouble(m.x(v)), fy.applyAsDouble(m.y(v)));
    }
    return copy(m, b);
  }

  /** The strip bent round: y becomes the radius, x the angle in rad. */
  static Mesh bent(Mesh m) {
    Mesh.Builder b = Mesh.builder();
    for (int v = 0; v < m.nodeCount(); v++) {
      b.node(m.y(v) * Math.cos(m.x(v)), m.y(v) * Math.sin(m.x(v)));
    }
    return copy(m, b);
  }

  private static Mesh copy(Mesh m, Mesh.Builder b) {
    for (int t = 0; t < m.triangleCount(); t++) {
      b.triangle(m.corner(t, 0), m.corner(t, 1), m.corner(t, 2), m.zoneNames().get(m.zone(t)));
    }
    for (int e = 0; e < m.segmentCount(); e++) {
      b.segment(m.segmentStart(e), m.segmentEnd(e), m.edgeNames().get(m.segmentEdge(e)));
    }
    return b.build();
  }
}
