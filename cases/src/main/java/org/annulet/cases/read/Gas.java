package org.annulet.cases.read;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.annulet.solver.medium.TemperatureField;

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

  /**
   * Air, as dry or as humid as it is drawn in.
   *
   * @param humidity of the ambient; empty for dry air
   */
  public record Air(Optional<Humidity> humidity) implements Mixture {
    /** Dry air. */
    public Air() {
      this(Optional.empty());
    }
  }

  /**
   * Humidity of the ambient; the water stays with the air when it is compressed.
   *
   * @param relative from 0 to 1
   * @param temperature in K
   * @param pressure in Pa
   */
  public record Humidity(double relative, double temperature, double pressure) {}

  /**
   * Products of complete combustion of a fuel blend with air, or of a part of it.
   *
   * @param fuel parts by volume of each fuel, adding up to 1; keys of {@link #FUELS}
   * @param equivalenceRatio above 0, at most 1
   * @param progress share of every kilogram that has burnt, from 0 to 1
   * @param air it burns with
   */
  public record BurntFuel(
      Map<String, Double> fuel, double equivalenceRatio, double progress, Air air)
      implements Mixture {
    /** Names of the fuels that may be blended. */
    public static final List<String> FUELS =
        List.of(
            "hydrogen", "methane", "ethane", "propane", "ammonia", "carbon_monoxide", "kerosene");

    /** Wholly burnt with dry air. */
    public BurntFuel(Map<String, Double> fuel, double equivalenceRatio) {
      this(fuel, equivalenceRatio, 1, new Air());
    }
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
   * The adiabatic temperature of the mixture, complete combustion without loss of heat.
   *
   * @param airTemperature of the air before it meets the fuel, in K
   * @param fuelTemperature in K
   */
  public record Adiabatic(double airTemperature, double fuelTemperature) implements Temperature {}

  /**
   * Along the gas path, a line with corners: every point takes the value at the nearest point of
   * the path.
   *
   * @param x of the corners in m
   * @param y of the corners in m; radius on a section
   * @param distance stations along the path in m, increasing
   * @param kelvin temperatures in K, one per station
   */
  public record AlongPath(
      List<Double> x, List<Double> y, List<Double> distance, List<Double> kelvin)
      implements Temperature {}

  /**
   * A field from a file, already in the plane of the mesh.
   *
   * @param file name of the file
   * @param field in the coordinates of the mesh
   * @param round whether it is the same at every angle of a ring
   * @param meanSpread where a three-dimensional result was averaged, mean relative difference of
   *     the sound speed between waves along and across the averaged direction; else 0
   */
  public record FromFile(String file, TemperatureField field, Round round, double meanSpread)
      implements Temperature {}

  /** Whether a field is the same at every angle. */
  public enum Round {
    /** It is. */
    EVEN,
    /** It changes with the angle. */
    UNEVEN
  }

  /** Whether the gas is the same at every burner of a ring. */
  public boolean even() {
    return zones.values().stream()
        .noneMatch(z -> temperature(z) instanceof FromFile f && f.round() == Round.UNEVEN);
  }

  /** The temperature of a zone; null where sound speed and density are given. */
  public static Temperature temperature(ZoneGas zone) {
    if (zone instanceof Perfect g) {
      return g.temperature();
    }
    return zone instanceof Mixed m ? m.temperature() : null;
  }
}
