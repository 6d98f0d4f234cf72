package org.annulet.solver.medium;

/**
 * Temperatures at points of space, as a flow computation or a probe gives them: x along the axis of
 * the chamber, y and z across it. Arrays are kept by reference and must not be modified.
 *
 * @param x in m, shape [n]
 * @param y in m, shape [n]
 * @param z in m, shape [n]; zero for plane data
 * @param temperature in K, shape [n], positive
 */
public record PointCloud(double[] x, double[] y, double[] z, double[] temperature) {
  /** Checks shapes and values. */
  public PointCloud {
    int n = x.length;
    if (n == 0 || y.length != n || z.length != n || temperature.length != n) {
      throw new IllegalArgumentException(
          "a point cloud needs as many x, y, z and temperatures, at least one; got "
              + n
              + ", "
              + y.length
              + ", "
              + z.length
              + ", "
              + temperature.length);
    }
    for (int i = 0; i < n; i++) {
      if (!Double.isFinite(x[i]) || !Double.isFinite(y[i]) || !Double.isFinite(z[i])) {
        throw new IllegalArgumentException("point " + (i + 1) + " of the cloud is not finite");
      }
      TemperatureField.requireTemperature(temperature[i], "at point " + (i + 1) + " of the cloud");
    }
  }

  /** Number of points. */
  public int size() {
    return x.length;
  }
}
