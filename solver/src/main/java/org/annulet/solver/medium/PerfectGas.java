package org.annulet.solver.medium;

/**
 * A gas with given specific gas constant and ratio of heat capacities: c = √(γRT).
 *
 * @param gasConstant R in J/(kg K), positive
 * @param gamma ratio of heat capacities, above 1 and at most 5/3 (a gas of single atoms)
 */
public record PerfectGas(double gasConstant, double gamma) implements Gas {
  /** Largest ratio of heat capacities of an ideal gas, 5/3, with room for rounding in input. */
  static final double LARGEST_RATIO = 1.7;

  /** Checks both values. */
  public PerfectGas {
    if (!(gasConstant > 0) || Double.isInfinite(gasConstant)) {
      throw new IllegalArgumentException(
          "gas constant must be positive, got " + gasConstant + " J/(kg K); air has 287");
    }
    checkRatio(gamma, "");
  }

  static void checkRatio(double gamma, String why) {
    if (!(gamma > 1 && gamma <= LARGEST_RATIO)) {
      throw new IllegalArgumentException(
          "ratio of heat capacities must lie above 1 and at most at "
              + LARGEST_RATIO
              + ", got "
              + gamma
              + why);
    }
  }

  @Override
  public double gamma(double temperature, double meanPressure) {
    return gamma;
  }

  @Override
  public double soundSpeed(double temperature, double meanPressure) {
    if (!(temperature > 0)) {
      throw new IllegalArgumentException("temperature must be positive, got " + temperature + " K");
    }
    return Math.sqrt(gamma * gasConstant * temperature);
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
