package org.annulet.solver.medium;

import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.Map;

/**
 * A blend of fuels, and of diluents if any, by moles; immutable.
 *
 * <p>Complete combustion of a molecule C_a H_b N_c O_d takes a + b/4 − d/2 molecules of O2 and
 * gives a CO2, b/2 H2O and c/2 N2.
 */
public final class FuelBlend {
  /** Temperature of the heating value, K: the usual 25 °C. */
  public static final double HEATING_VALUE_TEMPERATURE = 298.15;

  private final ThermoTable table;
  private final Map<FuelComponent, Double> fraction;
  private final Mixture mixture;

  private FuelBlend(ThermoTable table, Map<FuelComponent, Double> fraction, Mixture mixture) {
    this.table = table;
    this.fraction = fraction;
    this.mixture = mixture;
  }

  /** A fuel of one component. */
  public static FuelBlend pure(FuelComponent component) {
    return ofMoles(Map.of(component, 1.0));
  }

  /**
   * A blend by amount of substance, which for gases is by volume.
   *
   * @param moles amounts in any common unit; scaled to sum 1
   * @throws IllegalArgumentException on a negative amount, or if nothing in the blend burns
   */
  public static FuelBlend ofMoles(Map<FuelComponent, Double> moles) {
    return ofMoles(ThermoTable.nasa7(), moles);
  }

  /**
   * A blend by amount of substance, with gas data of one's own; they serve its products too.
   *
   * @param table gas data of every component, of O2, CO2, H2O and N2
   * @param moles amounts in any common unit; scaled to sum 1
   * @throws IllegalArgumentException on a negative amount, or if nothing in the blend burns
   */
  public static FuelBlend ofMoles(ThermoTable table, Map<FuelComponent, Double> moles) {
    Map<String, Double> bySpecies = new LinkedHashMap<>();
    moles.forEach((f, x) -> bySpecies.put(f.species(), x));
    Mixture mixture = Mixture.ofMoles(table, bySpecies);
    Map<FuelComponent, Double> fraction = new EnumMap<>(FuelComponent.class);
    moles.keySet().stream()
        .filter(f -> mixture.moleFraction(f.species()) > 0)
        .forEach(f -> fraction.put(f, mixture.moleFraction(f.species())));
    FuelBlend blend = new FuelBlend(table, fraction, mixture);
    if (!(blend.oxygenDemand() > 0)) {
      throw new IllegalArgumentException("nothing in the fuel blend burns: " + moles);
    }
    return blend;
  }

  /**
   * A blend by mass.
   *
   * @param masses masses in any common unit; scaled
   * @throws IllegalArgumentException on a negative mass, or if nothing in the blend burns
   */
  public static FuelBlend ofMass(Map<FuelComponent, Double> masses) {
    Map<FuelComponent, Double> moles = new EnumMap<>(FuelComponent.class);
    masses.forEach(
        (f, m) -> moles.put(f, m / ThermoTable.nasa7().species(f.species()).molarMass()));
    return ofMoles(moles);
  }

  /** Mole fractions, sum 1, components of fraction 0 left out. */
  public Map<FuelComponent, Double> moleFractions() {
    return new EnumMap<>(fraction);
  }

  /** The blend as a gas, unburnt and without air. */
  public Mixture asMixture() {
    return mixture;
  }

  /** Molar mass in kg/mol. */
  public double molarMass() {
    return mixture.molarMass();
  }

  /** Molecules of O2 that one molecule of the blend takes. */
  public double oxygenDemand() {
    return atoms("C") + atoms("H") / 4 - atoms("O") / 2;
  }

  /**
   * Lower heating value in J per kg of the blend (diluents included): reactants and products at
   * 298.15 K, water as vapour; kerosene counted as vapour, 0.8 % above its value as a liquid.
   */
  public double lowerHeatingValue() {
    double t = HEATING_VALUE_TEMPERATURE;
    double perMole =
        molarMass() * mixture.enthalpy(t)
            + oxygenDemand() * table.species("O2").enthalpy(t)
            - atoms("C") * table.species("CO2").enthalpy(t)
            - atoms("H") / 2 * table.species("H2O").enthalpy(t)
            - atoms("N") / 2 * table.species("N2").enthalpy(t);
    return perMole / molarMass();
  }

  /**
   * Heat release in W of a mass flow of this blend that burns completely.
   *
   * @param massFlow of fuel, in kg/s
   */
  public double heatRelease(double massFlow) {
    return massFlow * lowerHeatingValue();
  }

  /** The gas data of the blend and its products. */
  ThermoTable table() {
    return table;
  }

  /** Atoms of an element per molecule of the blend. */
  double atoms(String element) {
    double sum = 0;
    for (Map.Entry<FuelComponent, Double> f : fraction.entrySet()) {
      sum += f.getValue() * table.species(f.getKey().species()).atoms(element);
    }
    return sum;
  }

  @Override
  public String toString() {
    return "FuelBlend" + fraction;
  }
}
