package org.annulet.cases.units;

/** What a number of the case file measures, hence which units it may carry. */
public enum QuantityKind {
  /** Plain number; may be written in %. */
  FRACTION("plain number", "", "0.5 or 50 %"),
  /** Length in m. */
  LENGTH("length", "m", "12 mm"),
  /** Area in m². */
  AREA("area", "m2", "21.2 cm2"),
  /** Volume in m³. */
  VOLUME("volume", "m3", "0.5 l"),
  /** Angle in rad. */
  ANGLE("angle", "rad", "15 °"),
  /** Time in s. */
  TIME("time", "s", "2.1 ms"),
  /** Cycles per second in Hz. */
  FREQUENCY("frequency", "Hz", "650 Hz"),
  /** Growth rate in 1/s. */
  GROWTH_RATE("growth rate", "1/s", "150 1/s"),
  /** Wavenumber in 1/m. */
  WAVENUMBER("wavenumber", "1/m", "4.5 1/m"),
  /** Absolute temperature in K. */
  TEMPERATURE("temperature", "K", "650 K or 377 °C"),
  /** Absolute pressure in Pa. */
  PRESSURE("pressure", "Pa", "12 bar"),
  /** Speed in m/s. */
  SPEED("speed", "m/s", "57 m/s"),
  /** Density in kg/m³. */
  DENSITY("density", "kg/m3", "2.4 kg/m3"),
  /** Specific gas constant in J/(kg K). */
  GAS_CONSTANT("specific gas constant", "J/(kg K)", "287 J/(kg K)"),
  /** Heat release rate in W. */
  POWER("power", "W", "15.5 MW"),
  /** Mass flow in kg/s. */
  MASS_FLOW("mass flow", "kg/s", "18 kg/s"),
  /** Heating value in J/kg. */
  SPECIFIC_ENERGY("specific energy", "J/kg", "50 MJ/kg");

  private final String words;
  private final String siUnit;
  private final String example;

  QuantityKind(String words, String siUnit, String example) {
    this.words = words;
    this.siUnit = siUnit;
    this.example = example;
  }

  /** Name in words. */
  public String words() {
    return words;
  }

  /** Unit of the SI value; empty for a plain number. */
  public String siUnit() {
    return siUnit;
  }

  /** A value as it may be written. */
  public String example() {
    return example;
  }

  Dimension dimension() {
    return siUnit.isEmpty() ? Dimension.NONE : UnitExpression.parse(siUnit).dimension();
  }

  /** The kind with this dimension in words, or the dimension's lack of one. */
  static String describe(Dimension dimension) {
    for (QuantityKind kind : values()) {
      if (kind.dimension().equals(dimension)) {
        return (kind == ANGLE || kind == AREA ? "an " : "a ") + kind.words;
      }
    }
    return "something else";
  }
}
