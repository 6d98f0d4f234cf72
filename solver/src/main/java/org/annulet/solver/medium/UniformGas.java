package org.annulet.solver.medium;

/**
 * A gas of one density and one sound speed.
 *
 * @param density ρ in kg/m³, positive
 * @param soundSpeed c in m/s, positive
 */
public record UniformGas(double density, double soundSpeed) {
  /** Checks that both are positive and finite. */
  public UniformGas {
    Medium.requirePositive("density", density, "kg/m³");
    Medium.requirePositive("sound speed", soundSpeed, "m/s");
  }

  /** Bulk modulus ρc² = γp̄ in Pa. */
  public double bulkModulus() {
    return density * soundSpeed * soundSpeed;
  }
}
