package org.annulet.solver.medium;

/**
 * A temperature given at scattered points of the mesh's plane; immutable.
 *
 * <p>Interpolated by a local weighted linear fit that passes through the data ({@code LocalFit}) on
 * a k-d tree. Chosen over a triangulation of the points because cell-centred results of flow
 * computations, with stretched cells, coincident points and gaps, need no repair first.
 */
public final class ScatteredTemperature implements TemperatureField {
  /** Neighbour whose distance is the local spacing of the data; a hole is twice as wide. */
  private static final int SPACING_NEIGHBOUR = 8;

  private final LocalFit fit;
  private final ConvexHull hull;
  private final double period;

  private ScatteredTemperature(double[] x, double[] y, double[] kelvin, double period) {
    this.fit = new LocalFit(new double[][] {x, y}, kelvin);
    this.hull = new ConvexHull(x, y);
    this.period = period;
  }

  /**
   * Points on a section or a plane.
   *
   * @param x in m, shape [n]; copied
   * @param y in m (radius on a section), shape [n]; copied
   * @param kelvin in K, shape [n]; copied
   */
  public static ScatteredTemperature onSection(double[] x, double[] y, double[] kelvin) {
    new PointCloud(x, y, new double[x.length], kelvin);
    return new ScatteredTemperature(x.clone(), y.clone(), kelvin.clone(), 0);
  }

  /**
   * Points on a ring, repeated round it.
   *
   * @param x in m, shape [n]; copied
   * @param arc R₀θ in m, shape [n]; copied
   * @param kelvin in K, shape [n]; copied
   * @param period arc after which the points repeat in m: 2πR₀, or 2πR₀/N for one of N sectors
   */
  public static ScatteredTemperature onRing(
      double[] x, double[] arc, double[] kelvin, double period) {
    new PointCloud(x, arc, new double[x.length], kelvin);
    if (!(period > 0) || Double.isInfinite(period)) {
      throw new IllegalArgumentException("period must be positive, got " + period + " m");
    }
    int n = x.length;
    double[] xs = new double[3 * n];
    double[] ys = new double[3 * n];
    double[] ts = new double[3 * n];
    for (int i = 0; i < n; i++) {
      double base = arc[i] - period * Math.floor(arc[i] / period);
      for (int c = 0; c < 3; c++) {
        xs[c * n + i] = x[i];
        ys[c * n + i] = base + (c - 1) * period;
        ts[c * n + i] = kelvin[i];
      }
    }
    return new ScatteredTemperature(xs, ys, ts, period);
  }

  @Override
  public double temperature(double x, double y) {
    return fit.at(x, wrapped(y));
  }

  /**
   * Distance from the convex hull of the points in m; inside it, in a hole of the data, how much
   * farther the nearest point lies than twice the local spacing.
   */
  @Override
  public double distanceOutside(double x, double y) {
    double[] q = {x, wrapped(y)};
    double outside = hull.distance(q[0], q[1]);
    if (outside > 0) {
      return outside;
    }
    int[] index = new int[SPACING_NEIGHBOUR + 1];
    double[] squared = new double[index.length];
    fit.tree().nearest(q, index, squared);
    double distance = Math.sqrt(squared[0]);
    int nearest = index[0];
    double[] p = {fit.tree().coordinate(0, nearest), fit.tree().coordinate(1, nearest)};
    int n = fit.tree().nearest(p, index, squared);
    return Math.max(0, distance - 2 * Math.sqrt(squared[n - 1]));
  }

  private double wrapped(double y) {
    return period == 0 ? y : y - period * Math.floor(y / period);
  }
}
