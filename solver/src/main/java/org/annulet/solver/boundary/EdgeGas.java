package org.annulet.solver.boundary;

/**
 * The gas at a wall, averaged over its area.
 *
 * @param density ρ in kg/m³
 * @param soundSpeed c in m/s
 * @param gamma ratio of specific heats
 */
public record EdgeGas(double density, double soundSpeed, double gamma) {
  /** Characteristic impedance ρc in Pa·s/m. */
  public double characteristicImpedance() {
    return density * soundSpeed;
  }
}
