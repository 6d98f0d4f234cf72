package org.annulet.solver.medium;

/**
 * One temperature everywhere.
 *
 * @param kelvin in K, positive
 */
public record UniformTemperature(double kelvin) implements TemperatureField {
  /** Checks the value. */
  public UniformTemperature {
    TemperatureField.requireTemperature(kelvin, "everywhere");
  }

  @Override
  public double temperature(double x, double y) {
    return kelvin;
  }

  @Override
  public double distanceOutside(double x, double y) {
    return 0;
  }
}
