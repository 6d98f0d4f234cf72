package org.annulet.solver.medium;

import java.util.LinkedHashMap;
import java.util.Locale;
import java.util.Map;

/** Air, dry and humid, as a {@link Mixture}. */
public final class Air {
  /** Critical temperature of water, K (Wagner and Pruß 2002). */
  private static final double WATER_CRITICAL_TEMPERATURE = 647.096;

  /** Critical pressure of water, Pa (Wagner and Pruß 2002). */
  private static final double WATER_CRITICAL_PRESSURE = 22.064e6;

  /** Triple point of water, K: below it, ice. */
  private static final double WATER_TRIPLE_TEMPERATURE = 273.16;

  private Air() {}

  /** Dry air by moles: N2 78.084 %, O2 20.9476 %, Ar 0.9365 %, CO2 0.0319 %; M = 28.9651 g/mol. */
  public static Mixture dry() {
    return Mixture.ofMoles(dryMoles());
  }

  /** The combustion textbook's air, O2 + 3.76 N2. */
  public static Mixture oxygenNitrogen() {
    return Mixture.ofMoles(Map.of("O2", 1.0, "N2", 3.76));
  }

  /**
   * Humid air with a given mole fraction of water vapour.
   *
   * @param waterMoleFraction at least 0, below 1
   */
  public static Mixture humid(double waterMoleFraction) {
    if (!(waterMoleFraction >= 0 && waterMoleFraction < 1)) {
      throw new IllegalArgumentException(
          "mole fraction of water must be at least 0 and below 1, got " + waterMoleFraction);
    }
    Map<String, Double> moles = new LinkedHashMap<>();
    double total = dryMoles().values().stream().mapToDouble(d -> d).sum();
    dryMoles().forEach((s, x) -> moles.put(s, x / total * (1 - waterMoleFraction)));
    moles.put("H2O", waterMoleFraction);
    return Mixture.ofMoles(moles);
  }

  /**
   * Humid air as it is drawn in: the water content is that of the ambient state and stays with the
   * air when it is compressed.
   *
   * <p>x = φ p_s(T)/p; the enhancement of the vapour pressure by the air (0.5 % of x at 1 bar) is
   * left out.
   *
   * @param relativeHumidity φ, from 0 to 1
   * @param ambientTemperature T in K, from 273.16
   * @param ambientPressure p in Pa, not that of the chamber
   */
  public static Mixture humid(
      double relativeHumidity, double ambientTemperature, double ambientPressure) {
    if (!(relativeHumidity >= 0 && relativeHumidity <= 1)) {
      throw new IllegalArgumentException(
          "relative humidity must lie from 0 to 1, got " + relativeHumidity);
    }
    if (!(ambientPressure > 0)) {
      throw new IllegalArgumentException(
          "ambient pressure must be positive, got " + ambientPressure + " Pa");
    }
    double x = relativeHumidity * saturationPressure(ambientTemperature) / ambientPressure;
    if (!(x < 1)) {
      throw new IllegalArgumentException(
          String.format(
              Locale.ROOT,
              "relative humidity %.3g at %.5g K and %.5g Pa is more water than gas; the state meant"
                  + " is the ambient one",
              relativeHumidity,
              ambientTemperature,
              ambientPressure));
    }
    return humid(x);
  }

  /**
   * Vapour pressure of liquid water in Pa: Wagner and Pruß 2002, J. Phys. Chem. Ref. Data 31, 387,
   * equation 2.5.
   *
   * @param temperature in K, from 273.16 to 647.096
   */
  public static double saturationPressure(double temperature) {
    if (!(temperature >= WATER_TRIPLE_TEMPERATURE && temperature <= WATER_CRITICAL_TEMPERATURE)) {
      throw new IllegalArgumentException(
          "vapour pressure of water is known from 273.16 to 647.096 K, got "
              + temperature
              + " K; give the mole fraction of water instead");
    }
    double t = 1 - temperature / WATER_CRITICAL_TEMPERATURE;
    double root = Math.sqrt(t);
    double t3 = t * t * t;
    double sum =
        -7.85951783 * t
            + 1.84408259 * t * root
            - 11.7866497 * t3
            + 22.6807411 * t3 * root
            - 15.9618719 * t3 * t
            + 1.80122502 * t3 * t3 * t * root;
    return WATER_CRITICAL_PRESSURE * Math.exp(WATER_CRITICAL_TEMPERATURE / temperature * sum);
  }

  private static Map<String, Double> dryMoles() {
    return Map.of("N2", 78.084, "O2", 20.9476, "Ar", 0.9365, "CO2", 0.0319);
  }
}
