package org.annulet.post.meaning;

import org.annulet.mesher.mesh.Mesh;

/**
 * Nodes of a mode along the axis and across it.
 *
 * <p>The field, turned to the phase in which most of it is real and freed of e^{imθ}, is averaged
 * over the cells of a grid laid over one zone; the best product u(along)·v(across) in the weighted
 * least-squares sense (alternating projections) is taken, and the sign changes of u and v are
 * counted. A swing below 5 % of the largest value counts as none. In a bent duct the axis is not
 * the way of the sound and the counts are those of its shadow on x and r.
 *
 * @param along nodes along the axis (along the radius on a cross-section)
 * @param across nodes across it (radial on a section, transverse on a plane, 0 elsewhere)
 */
record NodeCount(int along, int across) {
  private static final double DEAD_BAND = 0.05;
  private static final int ROUNDS = 60;

  /** Counts in zone {@code zone}, or over all zones for −1. */
  static NodeCount of(Chamber chamber, ModeView view, SignedOrder order, int zone) {
    Mesh mesh = chamber.mesh();
    double[][] ranges = Samples.alongRange(chamber);
    double[] x = zone < 0 ? Samples.hull(ranges) : ranges[zone];
    boolean turning =
        chamber.kind() == GeometryKind.RING || chamber.kind() == GeometryKind.CROSS_SECTION;
    double[] y = turning ? new double[] {0, 0} : acrossRange(mesh, zone);
    int triangles = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      triangles += zone < 0 || mesh.zone(t) == zone ? 1 : 0;
    }
    int nx = (int) Math.min(48, Math.max(6, turning ? triangles / 4 : 2 * Math.sqrt(triangles)));
    int ny = turning ? 1 : (int) Math.min(24, Math.max(4, Math.sqrt(triangles)));
    double[][][] cell = new double[nx][ny][3];
    double m = turning ? order.value() : 0;
    Samples.forEach(
        chamber,
        view,
        (t, along, across, w, re, im) -> {
          if (zone >= 0 && mesh.zone(t) != zone) {
            return;
          }
          double[] c = cell[bin(along, x, nx)][turning ? 0 : bin(across, y, ny)];
          double cos = turning ? Math.cos(m * across) : 1;
          double sin = turning ? Math.sin(m * across) : 0;
          c[0] += w;
          c[1] += w * (re * cos + im * sin);
          c[2] += w * (im * cos - re * sin);
        });
    return separate(cell);
  }

  private static NodeCount separate(double[][][] cell) {
    double sr = 0;
    double si = 0;
    for (double[][] row : cell) {
      for (double[] c : row) {
        if (c[0] > 0) {
          sr += (c[1] * c[1] - c[2] * c[2]) / c[0];
          si += 2 * c[1] * c[2] / c[0];
        }
      }
    }
    double turn = -0.5 * Math.atan2(si, sr);
    int nx = cell.length;
    int ny = cell[0].length;
    double[] u = new double[nx];
    double[] v = new double[ny];
    double best = -1;
    for (double[][] row : cell) {
      double e = 0;
      for (double[] c : row) {
        e += c[0] > 0 ? (c[1] * c[1] + c[2] * c[2]) / c[0] : 0;
      }
      if (e > best) {
        best = e;
        for (int j = 0; j < ny; j++) {
          v[j] = row[j][0] > 0 ? value(row[j], turn) : 0;
        }
      }
    }
    for (int round = 0; round < ROUNDS; round++) {
      for (int i = 0; i < nx; i++) {
        double top = 0;
        double bottom = 0;
        for (int j = 0; j < ny; j++) {
          double w = cell[i][j][0];
          top += w > 0 ? w * value(cell[i][j], turn) * v[j] : 0;
          bottom += w * v[j] * v[j];
        }
        u[i] = bottom > 0 ? top / bottom : 0;
      }
      for (int j = 0; j < ny; j++) {
        double top = 0;
        double bottom = 0;
        for (int i = 0; i < nx; i++) {
          double w = cell[i][j][0];
          top += w > 0 ? w * value(cell[i][j], turn) * u[i] : 0;
          bottom += w * u[i] * u[i];
        }
        v[j] = bottom > 0 ? top / bottom : 0;
      }
    }
    return new NodeCount(signChanges(u), signChanges(v));
  }

  private static double value(double[] c, double turn) {
    return (c[1] * Math.cos(turn) - c[2] * Math.sin(turn)) / c[0];
  }

  /** Sign changes of a sequence, entries within the dead band passed over. */
  static int signChanges(double[] f) {
    double largest = 0;
    for (double v : f) {
      largest = Math.max(largest, Math.abs(v));
    }
    int count = 0;
    double last = 0;
    for (double v : f) {
      if (Math.abs(v) > DEAD_BAND * largest) {
        count += last * v < 0 ? 1 : 0;
        last = v;
      }
    }
    return count;
  }

  private static int bin(double v, double[] range, int bins) {
    double width = range[1] - range[0];
    int b = width > 0 ? (int) ((v - range[0]) / width * bins) : 0;
    return Math.min(Math.max(b, 0), bins - 1);
  }

  private static double[] acrossRange(Mesh mesh, int zone) {
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3 && (zone < 0 || mesh.zone(t) == zone); k++) {
        low = Math.min(low, mesh.cornerY(t, k));
        high = Math.max(high, mesh.cornerY(t, k));
      }
    }
    return new double[] {low, high};
  }
}
