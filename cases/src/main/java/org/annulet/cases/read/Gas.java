package org.annulet.cases.read;

import java.nio.file.Path;
import java.util.List;
import java.util.Map;

/**
 * The gas.
 *
 * @param meanPressure p̄ in Pa
 * @param zones by zone name, in the order of the file; {@code as:} is already resolved
 */
public record Gas(double meanPressure, Map<String, ZoneGas> zones) {
  /** The gas of one zone. */
  public sealed interface ZoneGas {}

  /**
   * Temperature, ratio of specific heats and gas constant given: c² = γRT, ρ = p̄/(RT).
   *
   * @param temperature in K
   * @param gamma ratio of specific heats
   * @param gasConstant R in J/(kg K)
   */
  public record Perfect(Temperature temperature, double gamma, double gasConstant)
      implements ZoneGas {}

  /**
   * Sound speed and density given; γ = ρc²/p̄ follows.
   *
   * @param soundSpeed in m/s
   * @param density in kg/m³
   */
  public record Given(double soundSpeed, double density) implements ZoneGas {}

  /**
   * Temperature and composition given.
   *
   * @param temperature in K
   * @param mixture composition
   */
  public record Mixed(Temperature temperature, Mixture mixture) implements ZoneGas {}

  /** Composition. */
  public sealed interface Mixture {}

  /** Dry air. */
  public record Air() implements Mixture {}

  /**
   * Products of complete combustion of a fuel blend with air.
   *
   * @param fuel parts by volume of each fuel, adding up to 1; keys of {@link #FUELS}
   * @param equivalenceRatio above 0, at most 1
   */
  public record BurntFuel(Map<String, Double> fuel, double equivalenceRatio) implements Mixture {
    /** Names of the fuels that may be blended. */
    public static final List<String> FUELS =
        List.of(
            "hydrogen", "methane", "ethane", "propane", "ammonia", "carbon_monoxide", "kerosene");
  }

  /** Temperature over a zone, in K. */
  public sealed interface Temperature {}

  /**
   * The same everywhere.
   *
   * @param kelvin in K
   */
  public record Uniform(double kelvin) implements Temperature {}

  /**
   * Straight lines between stations along x, constant beyond the ends.
   *
   * @param x stations in m, increasing
   * @param kelvin temperatures in K, one per station
   */
  public record AlongAxis(List<Double> x, List<Double> kelvin) implements Temperature {}

  /**
   * Points of a file, mapped on the mesh.
   *
   * @param file CSV with units in the header, or VTU; existing
   */
  public record FromFile(Path file) implements Temperature {}
}
