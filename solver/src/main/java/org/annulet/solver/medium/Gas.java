package org.annulet.solver.medium;

/**
 * What the gas of a zone is: from temperature and mean pressure to γ, sound speed and density, with
 * ρc² = γp̄. Implementations are immutable.
 */
public sealed interface Gas permits Mixture, PerfectGas, UniformGas {
  /**
   * Ratio of heat capacities.
   *
   * @param temperature in K
   * @param meanPressure p̄ in Pa
   * @throws IllegalArgumentException outside the range of the gas data
   */
  double gamma(double temperature, double meanPressure);

  /**
   * Sound speed in m/s, composition frozen.
   *
   * @param temperature in K
   * @param meanPressure p̄ in Pa
   * @throws IllegalArgumentException outside the range of the gas data
   */
  double soundSpeed(double temperature, double meanPressure);

  /**
   * Density in kg/m³: γp̄/c².
   *
   * @param temperature in K
   * @param meanPressure p̄ in Pa
   * @throws IllegalArgumentException outside the range of the gas data
   */
  default double density(double temperature, double meanPressure) {
    double c = soundSpeed(temperature, meanPressure);
    return gamma(temperature, meanPressure) * meanPressure / (c * c);
  }

  /** Lowest temperature the gas data hold for, in K. */
  double lowestTemperature();

  /** Highest temperature the gas data hold for, in K. */
  double highestTemperature();
}
