package org.annulet.solver.medium;

import java.util.Arrays;
import java.util.Comparator;

/** The convex hull of plane points (monotone chain, Andrew 1979) and the distance from it. */
final class ConvexHull {
  /** Share of the hull's extent within which a point counts as on it: rounding of coordinates. */
  private static final double ON_THE_HULL = 1e-9;

  private final double[][] corner;
  private final double rounding;

  ConvexHull(double[] x, double[] y) {
    Integer[] order = new Integer[x.length];
    Arrays.setAll(order, i -> i);
    Arrays.sort(
        order, Comparator.comparingDouble((Integer i) -> x[i]).thenComparingDouble(i -> y[i]));
    double[][] chain = new double[2 * x.length + 1][];
    int n = 0;
    for (int pass = 0; pass < 2; pass++) {
      int floor = n;
      for (int s = 0; s < order.length; s++) {
        int i = order[pass == 0 ? s : order.length - 1 - s];
        double[] p = {x[i], y[i]};
        while (n >= floor + 2 && cross(chain[n - 2], chain[n - 1], p) <= 0) {
          n--;
        }
        chain[n++] = p;
      }
      n--;
    }
    this.corner = Arrays.copyOf(chain, Math.max(1, n));
    double extent = 0;
    for (double[] c : corner) {
      extent = Math.max(extent, Math.hypot(c[0] - corner[0][0], c[1] - corner[0][1]));
    }
    this.rounding = ON_THE_HULL * extent;
  }

  /** Distance of a point from the hull in m, 0 inside. */
  double distance(double x, double y) {
    double[] q = {x, y};
    boolean inside = corner.length > 2;
    double best = Double.POSITIVE_INFINITY;
    for (int k = 0; k < corner.length; k++) {
      double[] a = corner[k];
      double[] b = corner[(k + 1) % corner.length];
      inside &= cross(a, b, q) >= 0;
      best = Math.min(best, toSegment(a, b, q));
    }
    return inside || best <= rounding ? 0 : best;
  }

  private static double toSegment(double[] a, double[] b, double[] q) {
    double dx = b[0] - a[0];
    double dy = b[1] - a[1];
    double length2 = dx * dx + dy * dy;
    double u = length2 == 0 ? 0 : ((q[0] - a[0]) * dx + (q[1] - a[1]) * dy) / length2;
    u = Math.max(0, Math.min(1, u));
    return Math.hypot(q[0] - a[0] - u * dx, q[1] - a[1] - u * dy);
  }

  private static double cross(double[] a, double[] b, double[] c) {
    return (b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0]);
  }
}
