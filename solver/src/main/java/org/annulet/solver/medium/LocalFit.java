package org.annulet.solver.medium;

/**
 * Interpolation of scattered values by a weighted linear fit to the nearest points.
 *
 * <p>Weights ((R − d)/(R d))² with R the distance of the first point left out (Franke and Nielson
 * 1980): infinite at a point, so the fit passes through the data, and zero at R, so it stays
 * continuous as neighbours change. A linear field comes back exactly. The answer is held between
 * the least and the largest value of the neighbours, so cold jets and films keep their peaks and
 * nothing overshoots; where the neighbours lie on a line the slope across it is taken as zero.
 */
final class LocalFit {
  /** Relative weight of the ridge: rounding of a linear field below 1e-8, slope 0 across a line. */
  private static final double RIDGE = 1e-10;

  private final PointTree tree;
  private final double[] value;
  private final int neighbours;

  LocalFit(double[][] points, double[] value) {
    this.tree = new PointTree(points);
    this.value = value;
    // A linear fit needs 3 points in the plane and 4 in space; three to four times as many.
    this.neighbours = points.length == 2 ? 10 : 14;
  }

  PointTree tree() {
    return tree;
  }

  double at(double... q) {
    int[] index = new int[neighbours + 1];
    double[] squared = new double[neighbours + 1];
    int n = tree.nearest(q, index, squared);
    if (squared[0] == 0 || n == 1) {
      return value[index[0]];
    }
    double radius = 1.001 * Math.sqrt(squared[n - 1]);
    double[] weight = new double[n];
    double[] centre = new double[q.length];
    double sum = 0;
    double mean = 0;
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    double nearest = Math.sqrt(squared[0]);
    for (int k = 0; k < n; k++) {
      double d = Math.sqrt(squared[k]);
      double w = (radius - d) / radius * nearest / d;
      weight[k] = w * w;
      sum += weight[k];
      mean += weight[k] * value[index[k]];
      low = Math.min(low, value[index[k]]);
      high = Math.max(high, value[index[k]]);
      for (int a = 0; a < q.length; a++) {
        centre[a] += weight[k] * tree.coordinate(a, index[k]);
      }
    }
    mean /= sum;
    double[][] m = new double[q.length][q.length + 1];
    for (int a = 0; a < q.length; a++) {
      centre[a] /= sum;
    }
    double trace = 0;
    for (int k = 0; k < n; k++) {
      for (int a = 0; a < q.length; a++) {
        double da = tree.coordinate(a, index[k]) - centre[a];
        for (int b = 0; b < q.length; b++) {
          m[a][b] += weight[k] * da * (tree.coordinate(b, index[k]) - centre[b]);
        }
        m[a][q.length] += weight[k] * da * (value[index[k]] - mean);
        trace += weight[k] * da * da;
      }
    }
    if (!(trace > 0)) {
      return mean;
    }
    for (int a = 0; a < q.length; a++) {
      m[a][a] += RIDGE * trace;
    }
    eliminate(m);
    double answer = mean;
    for (int a = 0; a < q.length; a++) {
      answer += m[a][q.length] * (q[a] - centre[a]);
    }
    return Math.max(low, Math.min(high, answer));
  }

  /** Gauss-Jordan on a positive definite system with its right side in the last column. */
  private static void eliminate(double[][] m) {
    int n = m.length;
    for (int k = 0; k < n; k++) {
      double pivot = m[k][k];
      for (int j = k; j <= n; j++) {
        m[k][j] /= pivot;
      }
      for (int i = 0; i < n; i++) {
        double factor = m[i][k];
        if (i != k && factor != 0) {
          for (int j = k; j <= n; j++) {
            m[i][j] -= factor * m[k][j];
          }
        }
      }
    }
  }
}
