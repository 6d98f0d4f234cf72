package org.annulet.solver.medium;

/**
 * Mean values of one triangle such that the acoustic travel time through it is kept: the area means
 * of 1/c, of 1/γ and of T.
 *
 * <p>Rule of degree 3 with corners, side mid-points and centroid (weights 1/20, 2/15, 9/20), so a
 * film on a wall is seen from the wall's own nodes; the triangle is cut in four until the mean of
 * 1/c settles to {@link #TOLERANCE} of itself, at least once, at most {@link #DEEPEST} times.
 */
final class TravelTimeMean {
  /** Relative tolerance of the mean of 1/c; frequencies carry the same. */
  static final double TOLERANCE = 1e-6;

  /** Most halvings of a side: features of 1/32 of it are resolved. */
  static final int DEEPEST = 5;

  private final ZoneGas gas;
  private final double meanPressure;

  TravelTimeMean(ZoneGas gas, double meanPressure) {
    this.gas = gas;
    this.meanPressure = meanPressure;
  }

  /**
   * The means over a triangle.
   *
   * @param x of the corners in m
   * @param y of the corners in m
   * @return 1/mean(1/c) in m/s, 1/mean(1/γ), mean temperature in K
   */
  double[] over(double[] x, double[] y) {
    double[][] p = new double[6][];
    for (int k = 0; k < 3; k++) {
      p[k] = sample(x[k], y[k]);
    }
    double[] mean = refine(p, 0, rule(p));
    return new double[] {1 / mean[0], 1 / mean[1], mean[2]};
  }

  /** Fills the mid-points p[3] to p[5] (opposite corner 0, 1, 2) and applies the rule. */
  private double[] rule(double[][] p) {
    for (int k = 0; k < 3; k++) {
      double[] a = p[(k + 1) % 3];
      double[] b = p[(k + 2) % 3];
      p[3 + k] = sample(0.5 * (a[3] + b[3]), 0.5 * (a[4] + b[4]));
    }
    double[] c = sample((p[0][3] + p[1][3] + p[2][3]) / 3, (p[0][4] + p[1][4] + p[2][4]) / 3);
    double[] mean = new double[3];
    for (int q = 0; q < 3; q++) {
      mean[q] =
          (p[0][q] + p[1][q] + p[2][q]) / 20
              + (p[3][q] + p[4][q] + p[5][q]) * 2 / 15
              + c[q] * 9 / 20;
    }
    return mean;
  }

  private double[] refine(double[][] p, int depth, double[] coarse) {
    double[][][] child = new double[4][6][];
    for (int k = 0; k < 3; k++) {
      child[k][0] = p[k];
      child[k][1] = p[3 + (k + 2) % 3];
      child[k][2] = p[3 + (k + 1) % 3];
      child[3][k] = p[3 + k];
    }
    double[][] fine = new double[4][];
    double[] mean = new double[3];
    for (int k = 0; k < 4; k++) {
      fine[k] = rule(child[k]);
      for (int q = 0; q < 3; q++) {
        mean[q] += 0.25 * fine[k][q];
      }
    }
    // The share of the whole triangle's mean that this piece can still spoil.
    double share = Math.scalb(1.0, -2 * depth);
    if (depth + 1 >= DEEPEST || Math.abs(mean[0] - coarse[0]) * share <= TOLERANCE * mean[0]) {
      return mean;
    }
    double[] better = new double[3];
    for (int k = 0; k < 4; k++) {
      double[] m = refine(child[k], depth + 1, fine[k]);
      for (int q = 0; q < 3; q++) {
        better[q] += 0.25 * m[q];
      }
    }
    return better;
  }

  private double[] sample(double x, double y) {
    double t = gas.temperature().temperature(x, y);
    return new double[] {
      1 / gas.gas().soundSpeed(t, meanPressure), 1 / gas.gas().gamma(t, meanPressure), t, x, y
    };
  }
}
