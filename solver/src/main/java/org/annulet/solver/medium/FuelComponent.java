package org.annulet.solver.medium;

import java.util.Arrays;
import java.util.Comparator;
import java.util.stream.Collectors;

/** What a fuel blend may be made of: the fuels, and what dilutes them. */
public enum FuelComponent {
  /** H2. */
  HYDROGEN("hydrogen", "H2"),
  /** CH4. */
  METHANE("methane", "CH4"),
  /** C2H6. */
  ETHANE("ethane", "C2H6"),
  /** C3H8. */
  PROPANE("propane", "C3H8"),
  /** NH3; its nitrogen leaves as N2. */
  AMMONIA("ammonia", "NH3"),
  /** CO. */
  CARBON_MONOXIDE("carbon monoxide", "CO"),
  /** Jet-A as the surrogate C12H23, vaporised. */
  KEROSENE("kerosene", "Jet-A(g)"),
  /** N2, a diluent. */
  NITROGEN("nitrogen", "N2"),
  /** CO2, a diluent. */
  CARBON_DIOXIDE("carbon dioxide", "CO2"),
  /** H2O as vapour, a diluent. */
  STEAM("steam", "H2O");

  private final String tradeName;
  private final String species;

  FuelComponent(String tradeName, String species) {
    this.tradeName = tradeName;
    this.species = species;
  }

  /** Its name in words, such as "carbon monoxide". */
  public String tradeName() {
    return tradeName;
  }

  /** Its name in the gas data, such as "CO". */
  public String species() {
    return species;
  }

  /**
   * The component of that name: in words ("carbon monoxide", underscores allowed) or by formula
   * ("CO").
   *
   * @throws IllegalArgumentException if there is none, with the names there are
   */
  public static FuelComponent named(String name) {
    String plain = name.trim().replace('_', ' ');
    return Arrays.stream(values())
        .filter(f -> f.tradeName.equalsIgnoreCase(plain) || f.species.equals(plain))
        .findFirst()
        .orElseThrow(
            () ->
                new IllegalArgumentException(
                    "no fuel component '"
                        + name
                        + "'; known are "
                        + Arrays.stream(values())
                            .sorted(Comparator.comparing(FuelComponent::tradeName))
                            .map(f -> f.tradeName)
                            .collect(Collectors.joining(", "))));
  }
}
