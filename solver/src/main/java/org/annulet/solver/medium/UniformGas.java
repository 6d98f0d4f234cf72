package org.annulet.solver.medium;

/**
 * A gas of one density and one sound speed, given outright, whatever the temperature; γ = ρc²/p̄
 * follows from the mean pressure.
 *
 * @param density ρ in kg/m³, positive
 * @param soundSpeed c in m/s, positive
 */
public record UniformGas(double density, double soundSpeed) implements Gas {
  /** Checks that both are positive and finite. */
  public UniformGas {
    Medium.requirePositive("density", density, "kg/m³");
    Medium.requirePositive("sound speed", soundSpeed, "m/s");
  }

  /** Bulk modulus ρc² = γp̄ in Pa. */
  public double bulkModulus() {
    return density * soundSpeed * soundSpeed;
  }

  @Override
  public double gamma(double temperature, double meanPressure) {
    double gamma = bulkModulus() / meanPressure;
    PerfectGas.checkRatio(
        gamma,
        " = ρc²/p̄ from ρ = "
            + density
            + " kg/m³, c = "
            + soundSpeed
            + " m/s, p̄ = "
            + meanPressure
            + " Pa: one of the three does not fit the others");
    return gamma;
  }

  @Override
  public double soundSpeed(double temperature, double meanPressure) {
    return soundSpeed;
  }

  @Override
  public double density(double temperature, double meanPressure) {
    return density;
  }

  @Override
  public double lowestTemperature() {
    return 0;
  }

  @Override
  public double highestTemperature() {
    return Double.POSITIVE_INFINITY;
  }
}
