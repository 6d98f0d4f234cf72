package org.annulet.solver.medium;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.annulet.mesher.mesh.Mesh;

/**
 * The gas at rest on a mesh: density and sound speed of each triangle and the mean pressure, which
 * is uniform. Immutable; arrays are copied in and answered by index.
 *
 * <p>The ratio of specific heats is not free: γ = ρc²/p̄.
 */
public final class Medium {
  private final double meanPressure;
  private final double[] density;
  private final double[] soundSpeed;

  private Medium(double meanPressure, double[] density, double[] soundSpeed) {
    this.meanPressure = meanPressure;
    this.density = density;
    this.soundSpeed = soundSpeed;
  }

  /**
   * A gas given triangle by triangle.
   *
   * @param meanPressure p̄ in Pa, positive
   * @param density ρ in kg/m³, shape [triangles], copied
   * @param soundSpeed c in m/s, shape [triangles], copied
   * @throws IllegalArgumentException if a value is not positive and finite, or γ = ρc²/p̄ of a
   *     triangle does not lie in (1, 1.7]
   */
  public static Medium of(double meanPressure, double[] density, double[] soundSpeed) {
    requirePositive("mean pressure", meanPressure, "Pa");
    if (density.length != soundSpeed.length) {
      throw new IllegalArgumentException(
          "density has " + density.length + " values, sound speed " + soundSpeed.length);
    }
    for (int t = 0; t < density.length; t++) {
      requirePositive("density of triangle " + t, density[t], "kg/m³");
      requirePositive("sound speed of triangle " + t, soundSpeed[t], "m/s");
      requireGamma("triangle " + t, density[t] * soundSpeed[t] * soundSpeed[t] / meanPressure);
    }
    return new Medium(meanPressure, density.clone(), soundSpeed.clone());
  }

  /**
   * A gas uniform in each zone.
   *
   * @param mesh whose zones are filled
   * @param meanPressure p̄ in Pa, positive
   * @param zones gas by zone name; every zone of the mesh must be there
   * @throws IllegalArgumentException if a zone has no gas, a name is no zone of the mesh, or γ =
   *     ρc²/p̄ of a zone does not lie in (1, 1.7]
   */
  public static Medium zonewise(Mesh mesh, double meanPressure, Map<String, UniformGas> zones) {
    requirePositive("mean pressure", meanPressure, "Pa");
    for (String name : zones.keySet()) {
      if (!mesh.zoneNames().contains(name)) {
        throw new IllegalArgumentException(
            "gas for zone '" + name + "', which the mesh has not; zones are " + mesh.zoneNames());
      }
    }
    List<UniformGas> byIndex = new ArrayList<>();
    for (String name : mesh.zoneNames()) {
      UniformGas gas = zones.get(name);
      if (gas == null) {
        throw new IllegalArgumentException("zone '" + name + "' has no gas; give it one");
      }
      requireGamma("zone '" + name + "'", gas.bulkModulus() / meanPressure);
      byIndex.add(gas);
    }
    double[] density = new double[mesh.triangleCount()];
    double[] soundSpeed = new double[mesh.triangleCount()];
    for (int t = 0; t < density.length; t++) {
      UniformGas gas = byIndex.get(mesh.zone(t));
      density[t] = gas.density();
      soundSpeed[t] = gas.soundSpeed();
    }
    return new Medium(meanPressure, density, soundSpeed);
  }

  /** Number of triangles. */
  public int triangleCount() {
    return density.length;
  }

  /** Mean pressure p̄ in Pa. */
  public double meanPressure() {
    return meanPressure;
  }

  /** Density ρ of triangle {@code t} in kg/m³. */
  public double density(int t) {
    return density[t];
  }

  /** Sound speed c of triangle {@code t} in m/s. */
  public double soundSpeed(int t) {
    return soundSpeed[t];
  }

  /** Bulk modulus ρc² = γp̄ of triangle {@code t} in Pa. */
  public double bulkModulus(int t) {
    return density[t] * soundSpeed[t] * soundSpeed[t];
  }

  /** Ratio of specific heats γ = ρc²/p̄ of triangle {@code t}. */
  public double gamma(int t) {
    return bulkModulus(t) / meanPressure;
  }

  static void requirePositive(String what, double value, String unit) {
    if (!(value > 0) || Double.isInfinite(value)) {
      throw new IllegalArgumentException(
          what + " must be positive and finite, got " + value + " " + unit);
    }
  }

  private static void requireGamma(String where, double gamma) {
    if (!(gamma > 1 && gamma <= 1.7)) {
      throw new IllegalArgumentException(
          "in "
              + where
              + " density, sound speed and mean pressure give γ = ρc²/p̄ = "
              + gamma
              + "; it must lie in (1, 1.7]: check the three values");
    }
  }
}
