package org.annulet.solver.medium;

/**
 * A stated heat release beside mass flow of fuel × lower heating value.
 *
 * @param stated in W
 * @param fromFuel mass flow × lower heating value, in W
 */
public record HeatReleaseCheck(double stated, double fromFuel) {
  /**
   * Compares the two.
   *
   * @param stated heat release in W
   * @param massFlow of fuel in kg/s, positive
   * @param fuel the blend
   */
  public static HeatReleaseCheck of(double stated, double massFlow, FuelBlend fuel) {
    if (!(massFlow > 0) || Double.isInfinite(massFlow)) {
      throw new IllegalArgumentException(
          "mass flow of fuel must be positive, got " + massFlow + " kg/s");
    }
    return new HeatReleaseCheck(stated, fuel.heatRelease(massFlow));
  }

  /** (stated − from fuel) / from fuel. */
  public double relativeDifference() {
    return (stated - fromFuel) / fromFuel;
  }
}
