package org.annulet.solver.medium;

import java.util.List;

/**
 * A temperature along the gas path: a polyline from upstream to downstream; each point takes the
 * value at the arc length of the nearest point of the path. For bent and reverse-flow chambers.
 * Immutable.
 */
public final class PathProfile implements TemperatureField {
  private final double[] px;
  private final double[] py;
  private final double[] arc;
  private final Axis axis;
  private final double[] kelvin;

  /**
   * A profile along a path.
   *
   * @param pathX x of the path's corners in m, at least two; copied
   * @param pathY y of the path's corners in m; copied
   * @param arcLength positions along the path from its first corner in m, strictly ascending;
   *     copied
   * @param kelvin temperature at each position in K; copied
   */
  public PathProfile(double[] pathX, double[] pathY, double[] arcLength, double[] kelvin) {
    if (pathX.length != pathY.length || pathX.length < 2) {
      throw new IllegalArgumentException(
          "a gas path needs at least two corners with x and y, got "
              + pathX.length
              + " x and "
              + pathY.length
              + " y");
    }
    if (kelvin.length != arcLength.length) {
      throw new IllegalArgumentException(
          "a profile needs as many temperatures as positions, got "
              + kelvin.length
              + " and "
              + arcLength.length);
    }
    this.px = pathX.clone();
    this.py = pathY.clone();
    this.arc = new double[px.length];
    for (int k = 1; k < px.length; k++) {
      double length = Math.hypot(px[k] - px[k - 1], py[k] - py[k - 1]);
      if (!(length > 0) || Double.isInfinite(length)) {
        throw new IllegalArgumentException(
            "corners " + k + " and " + (k + 1) + " of the gas path coincide or are not finite");
      }
      arc[k] = arc[k - 1] + length;
    }
    this.axis = new Axis("arc length of a temperature profile", arcLength);
    for (int k = 0; k < kelvin.length; k++) {
      TemperatureField.requireTemperature(
          kelvin[k], "at arc length " + NasaSpecies.text(arcLength[k]) + " m");
    }
    this.kelvin = kelvin.clone();
  }

  /** Length of the path in m. */
  public double length() {
    return arc[arc.length - 1];
  }

  @Override
  public double temperature(double x, double y) {
    return axis.interpolate(kelvin, nearestArc(x, y));
  }

  @Override
  public double distanceOutside(double x, double y) {
    return axis.outside(nearestArc(x, y));
  }

  /**
   * Distance along a path of the point of it nearest to a place.
   *
   * @param pathX x of the corners in m
   * @param pathY y of the corners in m
   * @param x of the place in m
   * @param y of the place in m
   * @return in m from the first corner
   */
  public static double distanceAlong(List<Double> pathX, List<Double> pathY, double x, double y) {
    double best = Double.POSITIVE_INFINITY;
    double before = 0;
    double s = 0;
    for (int k = 1; k < pathX.size(); k++) {
      double x0 = pathX.get(k - 1);
      double y0 = pathY.get(k - 1);
      double dx = pathX.get(k) - x0;
      double dy = pathY.get(k) - y0;
      double length = Math.hypot(dx, dy);
      double u = ((x - x0) * dx + (y - y0) * dy) / (length * length);
      u = Math.max(0, Math.min(1, u));
      double d = Math.hypot(x - x0 - u * dx, y - y0 - u * dy);
      if (d < best) {
        best = d;
        s = before + u * length;
      }
      before += length;
    }
    return s;
  }

  private double nearestArc(double x, double y) {
    double best = Double.POSITIVE_INFINITY;
    double s = 0;
    for (int k = 1; k < px.length; k++) {
      double dx = px[k] - px[k - 1];
      double dy = py[k] - py[k - 1];
      double length = arc[k] - arc[k - 1];
      double u = ((x - px[k - 1]) * dx + (y - py[k - 1]) * dy) / (length * length);
      u = Math.max(0, Math.min(1, u));
      double d = Math.hypot(x - px[k - 1] - u * dx, y - py[k - 1] - u * dy);
      if (d < best) {
        best = d;
        s = arc[k - 1] + u * length;
      }
    }
    return s;
  }
}
