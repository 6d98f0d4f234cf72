package org.annulet.mesher.triangulate;

import java.util.List;
import java.util.Random;
import org.annulet.mesher.geometry.Outline;
import org.annulet.mesher.geometry.Zone;

/**
 * Seeded random outlines: a star-shaped wall of lines and flat arcs, spikes included, round a hole
 * or an island that is a zone, turned, scaled and moved.
 */
final class RandomOutlines {
  private RandomOutlines() {}

  static Outline of(long seed) {
    Random r = new Random(seed);
    int n = 6 + r.nextInt(15);
    double scale = Math.pow(10, -3 + 4 * r.nextDouble());
    double x0 = scale * 10 * (r.nextDouble() - 0.5);
    double y0 = scale * 10 * (r.nextDouble() - 0.5);
    double turn = 7 * r.nextDouble();
    double[] x = new double[n];
    double[] y = new double[n];
    Outline.Builder b = Outline.builder();
    for (int i = 0; i < n; i++) {
      double a = turn + 2 * Math.PI * (i + 0.8 * r.nextDouble()) / n;
      double radius = scale * (0.4 + (r.nextInt(4) == 0 ? 2 : 0.6) * r.nextDouble());
      x[i] = x0 + radius * Math.cos(a);
      y[i] = y0 + radius * Math.sin(a);
      b.point("p" + i, x[i], y[i]);
    }
    String[] wall = new String[n];
    for (int i = 0; i < n; i++) {
      int k = (i + 1) % n;
      wall[i] = "wall" + i;
      if (r.nextInt(3) == 0) {
        double rise = 0.05 * (r.nextDouble() - 0.5);
        b.point(
            "m" + i,
            0.5 * (x[i] + x[k]) - rise * (y[k] - y[i]),
            0.5 * (y[i] + y[k]) + rise * (x[k] - x[i]));
        b.arc(wall[i], "p" + i, "m" + i, "p" + k);
      } else {
        b.line(wall[i], "p" + i, "p" + k);
      }
    }
    int kind = r.nextInt(3);
    if (kind == 0) {
      return b.zone("gas", wall).build();
    }
    double small = scale * (0.01 + 0.1 * r.nextDouble());
    b.point("e", x0 + small, y0).point("n", x0, y0 + small).point("w", x0 - small, y0);
    b.point("s", x0, y0 - small).arc("upper", "e", "n", "w").arc("lower", "w", "s", "e");
    if (kind == 2) {
      b.zone("island", "lower", "upper");
    }
    return b.zone(new Zone("gas", List.of(wall), List.of(List.of("upper", "lower")))).build();
  }

  static double scale(Outline o) {
    double[] box = o.box();
    return Math.max(box[2] - box[0], box[3] - box[1]);
  }
}
