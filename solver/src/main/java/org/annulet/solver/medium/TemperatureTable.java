package org.annulet.solver.medium;

import java.util.Arrays;

/**
 * A temperature on a rectangular grid of (x, y), bilinear between its points; immutable. On a
 * section y is the radius, on a ring the arc R₀θ, where the table may repeat.
 */
public final class TemperatureTable implements TemperatureField {
  private final Axis xs;
  private final Axis ys;
  private final double[][] kelvin;
  private final double period;

  private TemperatureTable(double[] x, double[] y, double[][] kelvin, double period) {
    this.xs = new Axis("x of a temperature table", x);
    this.ys = new Axis("r or arc of a temperature table", y);
    this.period = period;
    if (kelvin.length != x.length) {
      throw new IllegalArgumentException(
          "the table needs one row for each of " + x.length + " x, got " + kelvin.length);
    }
    this.kelvin = new double[x.length][];
    for (int i = 0; i < x.length; i++) {
      if (kelvin[i].length != y.length) {
        throw new IllegalArgumentException(
            "row "
                + (i + 1)
                + " of the table needs "
                + y.length
                + " values, got "
                + kelvin[i].length);
      }
      for (int j = 0; j < y.length; j++) {
        TemperatureField.requireTemperature(
            kelvin[i][j], "at (" + NasaSpecies.text(x[i]) + ", " + NasaSpecies.text(y[j]) + ") m");
      }
      this.kelvin[i] = kelvin[i].clone();
    }
  }

  /**
   * A table in (x, r) on a section, or (x, y) on a plane.
   *
   * @param x in m, strictly ascending
   * @param r in m, strictly ascending
   * @param kelvin in K, shape [x][r]; copied
   */
  public static TemperatureTable onSection(double[] x, double[] r, double[][] kelvin) {
    return new TemperatureTable(x, r, kelvin, 0);
  }

  /**
   * A table in (x, arc) on a ring that repeats round it: once for a whole ring, N times when it
   * holds one of N sectors. Between the last arc and the first of the next repeat it is linear too.
   *
   * @param x in m, strictly ascending
   * @param arc R₀θ in m, strictly ascending, spanning less than a period
   * @param kelvin in K, shape [x][arc]; copied
   * @param period arc after which the table repeats in m, 2πR₀ or 2πR₀/N
   */
  public static TemperatureTable onRing(
      double[] x, double[] arc, double[][] kelvin, double period) {
    double span = arc.length == 0 ? 0 : arc[arc.length - 1] - arc[0];
    if (!(period >= span) || Double.isInfinite(period) || !(period > 0)) {
      throw new IllegalArgumentException(
          "the table spans "
              + NasaSpecies.text(span)
              + " m of arc and cannot repeat every "
              + NasaSpecies.text(period)
              + " m");
    }
    if (span == period) {
      return new TemperatureTable(x, arc, kelvin, period);
    }
    double[] closed = Arrays.copyOf(arc, arc.length + 1);
    closed[arc.length] = arc[0] + period;
    double[][] rows = new double[kelvin.length][];
    for (int i = 0; i < rows.length; i++) {
      rows[i] = Arrays.copyOf(kelvin[i], kelvin[i].length + 1);
      rows[i][kelvin[i].length] = kelvin[i][0];
    }
    return new TemperatureTable(x, closed, rows, period);
  }

  @Override
  public double temperature(double x, double y) {
    double q = wrapped(y);
    int i = xs.interval(x);
    int j = ys.interval(q);
    double u = xs.share(i, x);
    double v = ys.share(j, q);
    return (1 - u) * ((1 - v) * kelvin[i][j] + v * kelvin[i][j + 1])
        + u * ((1 - v) * kelvin[i + 1][j] + v * kelvin[i + 1][j + 1]);
  }

  @Override
  public double distanceOutside(double x, double y) {
    return Math.hypot(xs.outside(x), ys.outside(wrapped(y)));
  }

  private double wrapped(double y) {
    return period == 0 ? y : y - period * Math.floor((y - ys.first()) / period);
  }
}
