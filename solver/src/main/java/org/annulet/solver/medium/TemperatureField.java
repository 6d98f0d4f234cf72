package org.annulet.solver.medium;

/**
 * A temperature at every point of a plane mesh; immutable.
 *
 * <p>x and y are the mesh's own coordinates in m: on a section y is the radius, on a ring the
 * unrolled arc R₀θ. Outside its data every field answers with the nearest value it has, never with
 * an extrapolated slope, and says how far outside the point lies.
 */
public sealed interface TemperatureField
    permits UniformTemperature, AxialProfile, PathProfile, TemperatureTable, ScatteredTemperature {
  /**
   * The temperature in K.
   *
   * @param x in m
   * @param y in m
   */
  double temperature(double x, double y);

  /**
   * How far the point lies outside the data, in m; 0 inside.
   *
   * @param x in m
   * @param y in m
   */
  double distanceOutside(double x, double y);

  /** Checks one value of a field's data. */
  static void requireTemperature(double kelvin, String where) {
    if (!(kelvin > 0) || Double.isInfinite(kelvin)) {
      throw new IllegalArgumentException(
          "temperature must be positive and finite, got "
              + NasaSpecies.text(kelvin)
              + " K "
              + where
              + "; is it in kelvin?");
    }
  }
}
