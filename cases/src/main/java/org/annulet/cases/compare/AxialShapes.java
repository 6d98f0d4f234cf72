package org.annulet.cases.compare;

import org.annulet.cases.read.ModeTable;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.meaning.Chamber;
import org.annulet.post.meaning.GeometryKind;
import org.annulet.post.meaning.ModeEntry;

/**
 * Shapes of modes along x: the mean of p̂ across the chamber, on a ring of p̂ e^{∓imθ} round it, m
 * the mode's order; of a standing wave both signs give the same shape. Where a bent chamber passes
 * one x twice, the mean goes over both passages.
 */
final class AxialShapes {
  private static final int PLACES = 240;

  private final Chamber chamber;
  private final double[] x = new double[PLACES + 1];

  AxialShapes(Chamber chamber) {
    this.chamber = chamber;
    Mesh mesh = chamber.mesh();
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    for (int v = 0; v < mesh.nodeCount(); v++) {
      low = Math.min(low, mesh.x(v));
      high = Math.max(high, mesh.x(v));
    }
    // Off the lines of nodes, where triangles of two zones meet.
    double margin = 1e-7 * (high - low);
    for (int k = 0; k <= PLACES; k++) {
      x[k] = low + margin + (high - low - 2 * margin) * k / PLACES;
    }
  }

  /** The shape of a mode; null on a plane across the axis. */
  ModeTable.Shape of(ModeEntry entry) {
    if (chamber.kind() == GeometryKind.CROSS_SECTION) {
      return null;
    }
    Integer order = entry.label().azimuthalOrder();
    boolean ring = chamber.mesh().period() > 0 && order != null;
    double wave = ring ? 2 * Math.PI * order / chamber.mesh().period() : 0;
    double[][] forth = projected(entry, wave);
    double[][] back = wave == 0 ? forth : projected(entry, -wave);
    double[][] best = size(back) > size(forth) ? back : forth;
    return new ModeTable.Shape(x, best[0], best[1]);
  }

  private static double size(double[][] p) {
    double sum = 0;
    for (int k = 0; k < p[0].length; k++) {
      sum += p[0][k] * p[0][k] + p[1][k] * p[1][k];
    }
    return sum;
  }

  /** Means of p̂ e^{−i wave y} over the chords of the triangles at each x, shape [2][places]. */
  private double[][] projected(ModeEntry entry, double wave) {
    Mesh mesh = chamber.mesh();
    double[][] p = new double[2][x.length];
    double[] length = new double[x.length];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      double low = Math.min(mesh.cornerX(t, 0), Math.min(mesh.cornerX(t, 1), mesh.cornerX(t, 2)));
      double high = Math.max(mesh.cornerX(t, 0), Math.max(mesh.cornerX(t, 1), mesh.cornerX(t, 2)));
      double step = x[1] - x[0];
      int first = Math.max(0, (int) Math.ceil((low - x[0]) / step));
      int last = Math.min(x.length - 1, (int) Math.floor((high - x[0]) / step));
      for (int k = first; k <= last; k++) {
        chord(entry, t, k, wave, p, length);
      }
    }
    for (int k = 0; k < x.length; k++) {
      for (double[] part : p) {
        part[k] = length[k] > 0 ? part[k] / length[k] : 0;
      }
    }
    return p;
  }

  private void chord(ModeEntry entry, int t, int k, double wave, double[][] p, double[] length) {
    Mesh mesh = chamber.mesh();
    double[] y = new double[2];
    double[] re = new double[2];
    double[] im = new double[2];
    int n = 0;
    for (int e = 0; e < 3 && n < 2; e++) {
      int f = (e + 1) % 3;
      double xa = mesh.cornerX(t, e);
      double xb = mesh.cornerX(t, f);
      if ((xa - x[k]) * (xb - x[k]) < 0) {
        double s = (x[k] - xa) / (xb - xa);
        int a = mesh.corner(t, e);
        int b = mesh.corner(t, f);
        y[n] = (1 - s) * mesh.cornerY(t, e) + s * mesh.cornerY(t, f);
        re[n] = (1 - s) * entry.view().re()[a] + s * entry.view().re()[b];
        im[n] = (1 - s) * entry.view().im()[a] + s * entry.view().im()[b];
        n++;
      }
    }
    if (n < 2) {
      return;
    }
    double weight = Math.abs(y[1] - y[0]);
    if (chamber.kind() == GeometryKind.SECTION) {
      weight *= Math.abs(0.5 * (y[0] + y[1]));
    }
    double phase = -wave * 0.5 * (y[0] + y[1]);
    double a = 0.5 * (re[0] + re[1]);
    double b = 0.5 * (im[0] + im[1]);
    p[0][k] += weight * (a * Math.cos(phase) - b * Math.sin(phase));
    p[1][k] += weight * (a * Math.sin(phase) + b * Math.cos(phase));
    length[k] += weight;
  }
}
