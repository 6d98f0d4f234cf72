package org.annulet.solver.medium;

/** A temperature that depends on x alone, linear between given positions; immutable. */
public final class AxialProfile implements TemperatureField {
  private final Axis axis;
  private final double[] kelvin;

  /**
   * A profile along x.
   *
   * @param x positions in m, strictly ascending, at least two; copied
   * @param kelvin temperature at each in K; copied
   */
  public AxialProfile(double[] x, double[] kelvin) {
    this.axis = new Axis("x of a temperature profile", x);
    if (kelvin.length != x.length) {
      throw new IllegalArgumentException(
          "a profile needs as many temperatures as positions, got "
              + kelvin.length
              + " and "
              + x.length);
    }
    for (int k = 0; k < x.length; k++) {
      TemperatureField.requireTemperature(kelvin[k], "at x = " + NasaSpecies.text(x[k]) + " m");
    }
    this.kelvin = kelvin.clone();
  }

  @Override
  public double temperature(double x, double y) {
    return axis.interpolate(kelvin, x);
  }

  @Override
  public double distanceOutside(double x, double y) {
    return axis.outside(x);
  }
}
