package org.annulet.solver.medium;

import java.util.Objects;

/**
 * What fills a zone: a gas and its temperature.
 *
 * @param gas composition, or its constants
 * @param temperature on the plane of the mesh
 */
public record ZoneGas(Gas gas, TemperatureField temperature) {
  /** Checks that both are there. */
  public ZoneGas {
    Objects.requireNonNull(gas, "gas");
    Objects.requireNonNull(temperature, "temperature");
  }
}
