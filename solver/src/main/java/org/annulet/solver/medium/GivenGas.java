package org.annulet.solver.medium;

/**
 * A gas whose sound speed and density are given outright, whatever the temperature; γ = ρc²/p̄
 * follows from the mean pressure.
 *
 * @param soundSpeed c in m/s, positive
 * @param density ρ in kg/m³, positive
 */
public record GivenGas(double soundSpeed, double density) implements Gas {
  /** Checks both values. */
  public GivenGas {
    if (!(soundSpeed > 0) || Double.isInfinite(soundSpeed)) {
      throw new IllegalArgumentException(
          "sound speed must be positive, got " + soundSpeed + " m/s");
    }
    if (!(density > 0) || Double.isInfinite(density)) {
      throw new IllegalArgumentException("density must be positive, got " + density + " kg/m³");
    }
  }

  @Override
  public double gamma(double temperature, double meanPressure) {
    double gamma = density * soundSpeed * soundSpeed / meanPressure;
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
