package org.annulet.solver.medium;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;

/**
 * Complete, lean to stoichiometric combustion of a blend with an oxidiser; immutable.
 *
 * <p>Carbon leaves as CO2, hydrogen as H2O, nitrogen (of ammonia too) as N2, the rest of the oxygen
 * as O2. Dissociation and NO are left out: {@link Dissociation} says what that costs. Oxidiser: dry
 * or humid air, or the lean products of a stage before, anything of O2, N2, Ar, CO2 and H2O.
 */
public final class Combustion {
  private static final List<String> OXIDISER_SPECIES = List.of("O2", "N2", "Ar", "CO2", "H2O");

  private final FuelBlend fuel;
  private final Mixture oxidiser;
  private final double equivalenceRatio;
  private final double oxidiserMoles;
  private final Map<String, Double> unburntMoles;
  private final Map<String, Double> burntMoles;

  /**
   * A blend burning with an oxidiser.
   *
   * @param fuel the blend
   * @param oxidiser with oxygen and nothing that burns
   * @param equivalenceRatio φ: fuel over the fuel that would use up all oxygen; above 0, at most 1
   * @throws IllegalArgumentException if φ is outside, or the oxidiser is none
   */
  public Combustion(FuelBlend fuel, Mixture oxidiser, double equivalenceRatio) {
    if (!(equivalenceRatio > 0 && equivalenceRatio <= 1)) {
      throw new IllegalArgumentException(
          "equivalence ratio must lie above 0 and at most at 1, got "
              + equivalenceRatio
              + "; the products of a rich flame are not those of complete combustion: give R and γ");
    }
    for (String name : oxidiser.moleFractions().keySet()) {
      if (!OXIDISER_SPECIES.contains(name)) {
        throw new IllegalArgumentException(
            "an oxidiser may hold " + OXIDISER_SPECIES + ", this one holds " + name);
      }
    }
    double oxygen = oxidiser.moleFraction("O2");
    if (!(oxygen > 0)) {
      throw new IllegalArgumentException("the oxidiser holds no O2: " + oxidiser);
    }
    this.fuel = fuel;
    this.oxidiser = oxidiser;
    this.equivalenceRatio = equivalenceRatio;
    this.oxidiserMoles = fuel.oxygenDemand() / (equivalenceRatio * oxygen);
    this.unburntMoles = new LinkedHashMap<>();
    this.burntMoles = new LinkedHashMap<>();
    fuel.asMixture().moleFractions().forEach((s, x) -> unburntMoles.merge(s, x, Double::sum));
    oxidiser
        .moleFractions()
        .forEach(
            (s, x) -> {
              unburntMoles.merge(s, oxidiserMoles * x, Double::sum);
              burntMoles.merge(s, oxidiserMoles * x, Double::sum);
            });
    burntMoles.merge("CO2", fuel.atoms("C"), Double::sum);
    burntMoles.merge("H2O", fuel.atoms("H") / 2, Double::sum);
    burntMoles.merge("N2", fuel.atoms("N") / 2, Double::sum);
    // At φ = 1 nothing is left; the clamp removes the rounding of the subtraction.
    burntMoles.put("O2", Math.max(0, oxidiserMoles * oxygen * (1 - equivalenceRatio)));
  }

  /**
   * The equivalence ratio of two mass flows.
   *
   * @param fuel the blend
   * @param oxidiser with oxygen
   * @param fuelOxidiserRatio mass flow of fuel over mass flow of oxidiser
   */
  public static double equivalenceRatio(
      FuelBlend fuel, Mixture oxidiser, double fuelOxidiserRatio) {
    return fuelOxidiserRatio
        * (oxidiser.molarMass() / fuel.molarMass())
        * fuel.oxygenDemand()
        / oxidiser.moleFraction("O2");
  }

  /** φ. */
  public double equivalenceRatio() {
    return equivalenceRatio;
  }

  /** Mass of fuel over mass of oxidiser. */
  public double fuelOxidiserRatio() {
    return fuel.molarMass() / (oxidiserMoles * oxidiser.molarMass());
  }

  /** Fuel and oxidiser, mixed and not burnt. */
  public Mixture unburnt() {
    return Mixture.ofMoles(fuel.table(), unburntMoles);
  }

  /** The products of complete combustion. */
  public Mixture products() {
    return Mixture.ofMoles(fuel.table(), burntMoles);
  }

  /**
   * The mixture when a share of every kilogram has burnt.
   *
   * @param progress 0 unburnt, 1 burnt
   */
  public Mixture partlyBurnt(double progress) {
    if (!(progress >= 0 && progress <= 1)) {
      throw new IllegalArgumentException("progress must lie from 0 to 1, got " + progress);
    }
    Map<String, Double> moles = new LinkedHashMap<>();
    unburntMoles.forEach((s, n) -> moles.merge(s, (1 - progress) * n, Double::sum));
    burntMoles.forEach((s, n) -> moles.merge(s, progress * n, Double::sum));
    return Mixture.ofMoles(fuel.table(), moles);
  }

  /**
   * Adiabatic flame temperature in K of complete combustion at constant pressure: the enthalpy of
   * the inflows equals that of the products.
   *
   * @param fuelTemperature in K; kerosene counted as vapour at that temperature
   * @param oxidiserTemperature in K
   * @throws IllegalArgumentException if an inlet temperature is outside the gas data
   */
  public double adiabaticFlameTemperature(double fuelTemperature, double oxidiserTemperature) {
    return adiabaticTemperature(1, fuelTemperature, oxidiserTemperature);
  }

  /**
   * Temperature in K of the mixture when a share of every kilogram has burnt without loss of heat;
   * 0 is the temperature after mixing.
   *
   * @param progress 0 unburnt, 1 burnt
   * @param fuelTemperature in K
   * @param oxidiserTemperature in K
   */
  public double adiabaticTemperature(
      double progress, double fuelTemperature, double oxidiserTemperature) {
    return temperatureOf(
        partlyBurnt(progress), inletEnthalpy(fuelTemperature, oxidiserTemperature));
  }

  /** Enthalpy of the inflows in J per kg of fuel and oxidiser together. */
  double inletEnthalpy(double fuelTemperature, double oxidiserTemperature) {
    double ratio = fuelOxidiserRatio();
    return (ratio * fuel.asMixture().enthalpy(fuelTemperature)
            + oxidiser.enthalpy(oxidiserTemperature))
        / (1 + ratio);
  }

  /** The temperature at which a mixture has this enthalpy in J/kg; bisection, h rises with T. */
  static double temperatureOf(Mixture mixture, double enthalpy) {
    double low = mixture.lowestTemperature();
    double high = mixture.highestTemperature();
    if (!(mixture.enthalpy(low) <= enthalpy && enthalpy <= mixture.enthalpy(high))) {
      throw new IllegalArgumentException(
          String.format(
              Locale.ROOT,
              "the flame temperature lies outside the gas data, %.6g to %.6g K; check the inlet"
                  + " temperatures",
              low,
              high));
    }
    while (high - low > 1e-10 * high) {
      double middle = 0.5 * (low + high);
      if (mixture.enthalpy(middle) < enthalpy) {
        low = middle;
      } else {
        high = middle;
      }
    }
    return 0.5 * (low + high);
  }
}
