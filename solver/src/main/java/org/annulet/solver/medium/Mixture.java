package org.annulet.solver.medium;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * A mixture of ideal gases of frozen composition; immutable.
 *
 * <p>Mole fractions X_i, molar mass M = Σ X_i M_i, R = R_u/M, cp from the species' polynomials, γ =
 * cp/(cp − R_u) per mole, c² = γRT. The sound speed is the frozen one: at the frequencies of a
 * chamber composition does not follow the pressure.
 */
public final class Mixture implements Gas {
  private final NasaSpecies[] species;
  private final double[] fraction;
  private final double molarMass;
  private final double lowest;
  private final double highest;

  private Mixture(List<NasaSpecies> species, double[] fraction) {
    this.species = species.toArray(NasaSpecies[]::new);
    this.fraction = fraction;
    double mass = 0;
    double low = 0;
    double high = Double.POSITIVE_INFINITY;
    for (int i = 0; i < fraction.length; i++) {
      mass += fraction[i] * this.species[i].molarMass();
      low = Math.max(low, this.species[i].lowestTemperature());
      high = Math.min(high, this.species[i].highestTemperature());
    }
    this.molarMass = mass;
    this.lowest = low;
    this.highest = high;
  }

  /**
   * A mixture of the shipped species.
   *
   * @param moles amount of each species by name, in any common unit; scaled to sum 1, species of
   *     amount 0 left out
   * @throws IllegalArgumentException on an unknown species, a negative amount, or nothing at all
   */
  public static Mixture ofMoles(Map<String, Double> moles) {
    return ofMoles(ThermoTable.nasa7(), moles);
  }

  /**
   * A mixture of the species of a table.
   *
   * @param table where the species are looked up
   * @param moles amount of each species by name, in any common unit
   * @throws IllegalArgumentException on an unknown species, a negative amount, or nothing at all
   */
  public static Mixture ofMoles(ThermoTable table, Map<String, Double> moles) {
    List<NasaSpecies> kept = new ArrayList<>();
    List<Double> amounts = new ArrayList<>();
    double sum = 0;
    for (String name : moles.keySet().stream().sorted().toList()) {
      double amount = moles.get(name);
      NasaSpecies found = table.species(name);
      if (!(amount >= 0) || Double.isInfinite(amount)) {
        throw new IllegalArgumentException(
            "amount of " + name + " must be zero or positive, got " + amount);
      }
      if (amount > 0) {
        kept.add(found);
        amounts.add(amount);
        sum += amount;
      }
    }
    if (kept.isEmpty()) {
      throw new IllegalArgumentException("a mixture needs at least one species of positive amount");
    }
    double[] fraction = new double[kept.size()];
    for (int i = 0; i < fraction.length; i++) {
      fraction[i] = amounts.get(i) / sum;
    }
    return new Mixture(kept, fraction);
  }

  /** Mole fractions by species name, sorted by name, sum 1. */
  public Map<String, Double> moleFractions() {
    Map<String, Double> fractions = new LinkedHashMap<>();
    for (int i = 0; i < species.length; i++) {
      fractions.put(species[i].name(), fraction[i]);
    }
    return fractions;
  }

  /** Mole fraction of one species; 0 when the mixture has none of it. */
  public double moleFraction(String name) {
    return moleFractions().getOrDefault(name, 0.0);
  }

  /** Molar mass in kg/mol. */
  public double molarMass() {
    return molarMass;
  }

  /** Specific gas constant R in J/(kg K). */
  public double gasConstant() {
    return NasaSpecies.GAS_CONSTANT / molarMass;
  }

  /**
   * Heat capacity at constant pressure in J/(kg K).
   *
   * @param temperature in K
   * @throws IllegalArgumentException outside the range of the gas data
   */
  public double heatCapacity(double temperature) {
    return NasaSpecies.FIT_GAS_CONSTANT * heatCapacityOverR(temperature) / molarMass;
  }

  /**
   * Enthalpy in J/kg, with the enthalpies of formation at 298.15 K.
   *
   * @param temperature in K
   * @throws IllegalArgumentException outside the range of the gas data
   */
  public double enthalpy(double temperature) {
    return NasaSpecies.FIT_GAS_CONSTANT * enthalpyOverR(temperature) / molarMass;
  }

  /**
   * Ratio of heat capacities.
   *
   * @param temperature in K
   * @throws IllegalArgumentException outside the range of the gas data
   */
  public double gamma(double temperature) {
    double cp = heatCapacityOverR(temperature);
    return cp / (cp - 1);
  }

  @Override
  public double gamma(double temperature, double meanPressure) {
    return gamma(temperature);
  }

  @Override
  public double soundSpeed(double temperature, double meanPressure) {
    return Math.sqrt(gamma(temperature) * gasConstant() * temperature);
  }

  @Override
  public double lowestTemperature() {
    return lowest;
  }

  @Override
  public double highestTemperature() {
    return highest;
  }

  /** cp/R_u of one mole. */
  double heatCapacityOverR(double temperature) {
    double sum = 0;
    for (int i = 0; i < species.length; i++) {
      sum += fraction[i] * species[i].heatCapacityOverR(temperature);
    }
    return sum;
  }

  /** h/R_u of one mole, in K. */
  double enthalpyOverR(double temperature) {
    double sum = 0;
    for (int i = 0; i < species.length; i++) {
      sum += fraction[i] * species[i].enthalpyOverR(temperature);
    }
    return sum;
  }

  @Override
  public String toString() {
    return "Mixture" + moleFractions();
  }
}
