package org.annulet.post.meaning;

import java.util.Arrays;
import org.annulet.mesher.mesh.Mesh;

/**
 * Values of a linear field at the middles of the sixteen equal parts of every triangle, with the
 * volume of the part: what strips and bins are filled from.
 *
 * <p>Along: x, on a cross-section r. Across: the angle θ on a ring and a cross-section, else y.
 */
final class Samples {
  private static final int PARTS = 4;

  private Samples() {}

  /** Receives one sample; weight in m³. */
  interface Sink {
    void take(int triangle, double along, double across, double weight, double re, double im);
  }

  static void forEach(Chamber chamber, ModeView view, Sink sink) {
    Mesh mesh = chamber.mesh();
    double perAngle = mesh.period() > 0 ? 2 * Math.PI / mesh.period() : 1;
    boolean polar = chamber.kind() == GeometryKind.CROSS_SECTION;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      double w =
          mesh.area(t) * chamber.thickness(t) * chamber.arcScale(mesh.zone(t)) / (PARTS * PARTS);
      int a = mesh.corner(t, 0);
      int b = mesh.corner(t, 1);
      int c = mesh.corner(t, 2);
      for (int i = 0; i < PARTS; i++) {
        for (int j = 0; j < PARTS - i; j++) {
          for (int up = 0; up < (j < PARTS - 1 - i ? 2 : 1); up++) {
            double l1 = (i + (1 + up) / 3.0) / PARTS;
            double l2 = (j + (1 + up) / 3.0) / PARTS;
            double l0 = 1 - l1 - l2;
            double x = l0 * mesh.cornerX(t, 0) + l1 * mesh.cornerX(t, 1) + l2 * mesh.cornerX(t, 2);
            double y = l0 * mesh.cornerY(t, 0) + l1 * mesh.cornerY(t, 1) + l2 * mesh.cornerY(t, 2);
            double re = l0 * view.re()[a] + l1 * view.re()[b] + l2 * view.re()[c];
            double im = l0 * view.im()[a] + l1 * view.im()[b] + l2 * view.im()[c];
            if (polar) {
              sink.take(t, Math.hypot(x, y), Math.atan2(y, x), w, re, im);
            } else {
              sink.take(t, x, y * perAngle, w, re, im);
            }
          }
        }
      }
    }
  }

  /** θ of a corner on a ring or cross-section, in rad. */
  static double angle(Chamber chamber, int t, int k) {
    Mesh mesh = chamber.mesh();
    return chamber.kind() == GeometryKind.CROSS_SECTION
        ? Math.atan2(mesh.cornerY(t, k), mesh.cornerX(t, k))
        : mesh.cornerY(t, k) * 2 * Math.PI / mesh.period();
  }

  /** Smallest and largest coordinate along of each zone, shape [zones][2]. */
  static double[][] alongRange(Chamber chamber) {
    Mesh mesh = chamber.mesh();
    boolean polar = chamber.kind() == GeometryKind.CROSS_SECTION;
    double[][] range = new double[mesh.zoneNames().size()][];
    for (int z = 0; z < range.length; z++) {
      range[z] = new double[] {Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY};
    }
    for (int t = 0; t < mesh.triangleCount(); t++) {
      double[] r = range[mesh.zone(t)];
      for (int k = 0; k < 3; k++) {
        double x = mesh.cornerX(t, k);
        double v = polar ? Math.hypot(x, mesh.cornerY(t, k)) : x;
        r[0] = Math.min(r[0], v);
        r[1] = Math.max(r[1], v);
      }
    }
    return range;
  }

  /** Smallest and largest of all zones. */
  static double[] hull(double[][] ranges) {
    return new double[] {
      Arrays.stream(ranges).mapToDouble(r -> r[0]).min().orElse(0),
      Arrays.stream(ranges).mapToDouble(r -> r[1]).max().orElse(0)
    };
  }
}
