package org.annulet.solver.medium;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.Map;

/**
 * One ideal-gas species with its NASA 7-coefficient polynomials; immutable.
 *
 * <pre>
 *   cp/R   = a1 + a2 T + a3 T² + a4 T³ + a5 T⁴
 *   h/(RT) = a1 + a2 T/2 + a3 T²/3 + a4 T³/4 + a5 T⁴/5 + a6/T
 *   s/R    = a1 ln T + a2 T + a3 T²/2 + a4 T³/3 + a5 T⁴/4 + a7
 * </pre>
 *
 * <p>Source: McBride, Gordon and Reno 1993, NASA TM-4513. The polynomials are fits of cp/R with
 * {@link #FIT_GAS_CONSTANT}, so that is the constant which turns them into J/(mol K); ratios such
 * as γ and the sound speed need no constant or today's {@link #GAS_CONSTANT}. The enthalpy contains
 * the enthalpy of formation at 298.15 K; the entropy holds at 1 bar.
 */
public final class NasaSpecies {
  /** The gas constant the report fitted with, J/(mol K). */
  public static final double FIT_GAS_CONSTANT = 8.314510;

  /** The gas constant of the SI since 2019, J/(mol K), exact. */
  public static final double GAS_CONSTANT = 8.31446261815324;

  private final String name;
  private final Map<String, Integer> atoms;
  private final double molarMass;
  private final double[] bounds;
  private final double[][] coefficients;

  /**
   * @param bounds ascending temperatures in K between which one polynomial holds, shape [r + 1]
   * @param coefficients a1 to a7 of each range, shape [r][7]
   */
  NasaSpecies(String name, Map<String, Integer> atoms, double[] bounds, double[][] coefficients) {
    this.name = name;
    this.atoms = Map.copyOf(atoms);
    this.molarMass = AtomicMass.of(atoms);
    this.bounds = bounds;
    this.coefficients = coefficients;
  }

  /** Name in the table, such as "CO2". */
  public String name() {
    return name;
  }

  /** Number of atoms of an element ("C") in one molecule. */
  public int atoms(String element) {
    return atoms.getOrDefault(element, 0);
  }

  /** Molar mass in kg/mol. */
  public double molarMass() {
    return molarMass;
  }

  /** Lowest temperature of the polynomials in K. */
  public double lowestTemperature() {
    return bounds[0];
  }

  /** Highest temperature of the polynomials in K. */
  public double highestTemperature() {
    return bounds[bounds.length - 1];
  }

  /**
   * Heat capacity at constant pressure in J/(mol K).
   *
   * @param temperature in K
   * @throws IllegalArgumentException outside the range of the polynomials
   */
  public double heatCapacity(double temperature) {
    return FIT_GAS_CONSTANT * heatCapacityOverR(temperature);
  }

  /**
   * Enthalpy in J/mol, with the enthalpy of formation at 298.15 K.
   *
   * @param temperature in K
   * @throws IllegalArgumentException outside the range of the polynomials
   */
  public double enthalpy(double temperature) {
    return FIT_GAS_CONSTANT * enthalpyOverR(temperature);
  }

  /**
   * Entropy at 1 bar in J/(mol K).
   *
   * @param temperature in K
   * @throws IllegalArgumentException outside the range of the polynomials
   */
  public double entropy(double temperature) {
    double[] a = range(temperature);
    double t = temperature;
    return FIT_GAS_CONSTANT
        * (a[0] * Math.log(t) + t * (a[1] + t * (a[2] / 2 + t * (a[3] / 3 + t * a[4] / 4))) + a[6]);
  }

  /** cp/R at a temperature in K. */
  double heatCapacityOverR(double t) {
    double[] a = range(t);
    return a[0] + t * (a[1] + t * (a[2] + t * (a[3] + t * a[4])));
  }

  /** h/R in K at a temperature in K. */
  double enthalpyOverR(double t) {
    double[] a = range(t);
    return t * (a[0] + t * (a[1] / 2 + t * (a[2] / 3 + t * (a[3] / 4 + t * a[4] / 5)))) + a[5];
  }

  private double[] range(double t) {
    if (!(t >= bounds[0] && t <= bounds[bounds.length - 1])) {
      throw new IllegalArgumentException(
          name
              + " at "
              + text(t)
              + " K: the gas data of this species hold from "
              + text(bounds[0])
              + " to "
              + text(bounds[bounds.length - 1])
              + " K; give R and γ, or c and ρ, where the gas is outside");
    }
    int r = 0;
    while (r < coefficients.length - 1 && t > bounds[r + 1]) {
      r++;
    }
    return coefficients[r];
  }

  /** A number to six digits without trailing zeros, for messages. */
  static String text(double value) {
    return Double.isFinite(value)
        ? new BigDecimal(value, new MathContext(6)).stripTrailingZeros().toPlainString()
        : Double.toString(value);
  }
}
