package org.annulet.mesher.geometry;

import org.locationtech.jts.algorithm.CGAlgorithmsDD;

/** Two straight chords, each as x0, y0, x1, y1 in m. */
final class Chords {
  private Chords() {}

  /** Whether the chords cross properly: each has its ends strictly on both sides of the other. */
  static boolean cross(double[] p, double[] q) {
    return side(p, q[0], q[1]) * side(p, q[2], q[3]) < 0
        && side(q, p[0], p[1]) * side(q, p[2], p[3]) < 0;
  }

  private static int side(double[] p, double x, double y) {
    return CGAlgorithmsDD.orientationIndex(p[0], p[1], p[2], p[3], x, y);
  }

  /** Distance in m. */
  static double distance(double[] p, double[] q) {
    if (cross(p, q)) {
      return 0;
    }
    return Math.min(
        Math.min(toPoint(p, q[0], q[1]), toPoint(p, q[2], q[3])),
        Math.min(toPoint(q, p[0], p[1]), toPoint(q, p[2], p[3])));
  }

  /** Writes the end that lies closest to the other chord. */
  static void closest(double[] p, double[] q, double[] at) {
    double best = Double.POSITIVE_INFINITY;
    for (int i = 0; i < 4; i += 2) {
      double d = toPoint(p, q[i], q[i + 1]);
      if (d < best) {
        best = d;
        at[0] = q[i];
        at[1] = q[i + 1];
      }
      d = toPoint(q, p[i], p[i + 1]);
      if (d < best) {
        best = d;
        at[0] = p[i];
        at[1] = p[i + 1];
      }
    }
  }

  /** Writes the crossing of two chords that cross. */
  static void intersection(double[] p, double[] q, double[] at) {
    double ux = p[2] - p[0];
    double uy = p[3] - p[1];
    double vx = q[2] - q[0];
    double vy = q[3] - q[1];
    double t = ((q[0] - p[0]) * vy - (q[1] - p[1]) * vx) / (ux * vy - uy * vx);
    at[0] = p[0] + t * ux;
    at[1] = p[1] + t * uy;
  }

  private static double toPoint(double[] p, double x, double y) {
    double ux = p[2] - p[0];
    double uy = p[3] - p[1];
    double l2 = ux * ux + uy * uy;
    double t = l2 == 0 ? 0 : ((x - p[0]) * ux + (y - p[1]) * uy) / l2;
    t = Math.max(0, Math.min(1, t));
    return Math.hypot(p[0] + t * ux - x, p[1] + t * uy - y);
  }
}
