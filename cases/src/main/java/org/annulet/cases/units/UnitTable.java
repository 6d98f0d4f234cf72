package org.annulet.cases.units;

import java.math.BigDecimal;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** The unit symbols that are read, and advice for common ones that are not. */
final class UnitTable {
  private static final Dimension LENGTH = new Dimension(1, 0, 0, 0, 0, 0, 0);
  private static final Dimension MASS = new Dimension(0, 1, 0, 0, 0, 0, 0);
  private static final Dimension TIME = new Dimension(0, 0, 1, 0, 0, 0, 0);
  private static final Dimension TEMPERATURE = new Dimension(0, 0, 0, 1, 0, 0, 0);
  private static final Dimension AMOUNT = new Dimension(0, 0, 0, 0, 1, 0, 0);
  private static final Dimension ANGLE = new Dimension(0, 0, 0, 0, 0, 1, 0);
  private static final Dimension FREQUENCY = new Dimension(0, 0, -1, 0, 0, 0, 1);
  private static final Dimension FORCE = new Dimension(1, 1, -2, 0, 0, 0, 0);
  private static final Dimension PRESSURE = new Dimension(-1, 1, -2, 0, 0, 0, 0);
  private static final Dimension ENERGY = new Dimension(2, 1, -2, 0, 0, 0, 0);
  private static final Dimension POWER = new Dimension(2, 1, -3, 0, 0, 0, 0);
  private static final Dimension VOLUME = new Dimension(3, 0, 0, 0, 0, 0, 0);

  /** π/180 to more digits than a double holds. */
  private static final String DEGREE = "0.017453292519943295769236907684886";

  static final String CELSIUS = "°C";

  static final Map<String, Unit> UNITS = units();

  private UnitTable() {}

  private static Map<String, Unit> units() {
    Map<String, Unit> u = new LinkedHashMap<>();
    u.put("m", Unit.of("1", LENGTH));
    u.put("mm", Unit.of("1e-3", LENGTH));
    u.put("cm", Unit.of("1e-2", LENGTH));
    u.put("km", Unit.of("1e3", LENGTH));
    u.put("µm", Unit.of("1e-6", LENGTH));
    u.put("l", Unit.of("1e-3", VOLUME));
    u.put("L", Unit.of("1e-3", VOLUME));
    u.put("kg", Unit.of("1", MASS));
    u.put("g", Unit.of("1e-3", MASS));
    u.put("mg", Unit.of("1e-6", MASS));
    u.put("s", Unit.of("1", TIME));
    u.put("ms", Unit.of("1e-3", TIME));
    u.put("µs", Unit.of("1e-6", TIME));
    u.put("K", Unit.of("1", TEMPERATURE));
    u.put(CELSIUS, new Unit(BigDecimal.ONE, new BigDecimal("273.15"), TEMPERATURE));
    u.put("mol", Unit.of("1", AMOUNT));
    u.put("mmol", Unit.of("1e-3", AMOUNT));
    u.put("kmol", Unit.of("1e3", AMOUNT));
    u.put("rad", Unit.of("1", ANGLE));
    u.put("°", Unit.of(DEGREE, ANGLE));
    u.put("deg", Unit.of(DEGREE, ANGLE));
    u.put("Hz", Unit.of("1", FREQUENCY));
    u.put("kHz", Unit.of("1e3", FREQUENCY));
    u.put("MHz", Unit.of("1e6", FREQUENCY));
    u.put("N", Unit.of("1", FORCE));
    u.put("kN", Unit.of("1e3", FORCE));
    u.put("Pa", Unit.of("1", PRESSURE));
    u.put("hPa", Unit.of("1e2", PRESSURE));
    u.put("kPa", Unit.of("1e3", PRESSURE));
    u.put("MPa", Unit.of("1e6", PRESSURE));
    u.put("mbar", Unit.of("1e2", PRESSURE));
    u.put("bar", Unit.of("1e5", PRESSURE));
    u.put("atm", Unit.of("101325", PRESSURE));
    u.put("J", Unit.of("1", ENERGY));
    u.put("kJ", Unit.of("1e3", ENERGY));
    u.put("MJ", Unit.of("1e6", ENERGY));
    u.put("W", Unit.of("1", POWER));
    u.put("kW", Unit.of("1e3", POWER));
    u.put("MW", Unit.of("1e6", POWER));
    u.put("GW", Unit.of("1e9", POWER));
    u.put("%", Unit.of("1e-2", Dimension.NONE));
    return Map.copyOf(u);
  }

  /** Symbols met in practice that are not read, and what to write. */
  static final Map<String, String> ADVICE =
      Map.ofEntries(
          Map.entry("in", "write mm (1 in = 25.4 mm)"),
          Map.entry("inch", "write mm (1 in = 25.4 mm)"),
          Map.entry("ft", "write m (1 ft = 0.3048 m)"),
          Map.entry("um", "write µm, or mm with a decimal"),
          Map.entry("us", "write µs, or ms with a decimal"),
          Map.entry("psi", "write bar, absolute (1 psi = 0.0689476 bar)"),
          Map.entry("psia", "write bar, absolute (1 psi = 0.0689476 bar)"),
          Map.entry("psig", "add the ambient pressure and write bar, absolute"),
          Map.entry("bara", "write bar: every pressure is absolute"),
          Map.entry("barg", "add the ambient pressure and write bar: every pressure is absolute"),
          Map.entry("C", "write °C or K"),
          Map.entry("degC", "write °C or K"),
          Map.entry("Celsius", "write °C or K"),
          Map.entry("°F", "write K: K = (°F + 459.67) / 1.8"),
          Map.entry("F", "write K: K = (°F + 459.67) / 1.8"),
          Map.entry("°K", "write K"),
          Map.entry("Kelvin", "write K"),
          Map.entry("kelvin", "write K"),
          Map.entry("º", "write ° or deg (this is the ordinal sign)"),
          Map.entry("ºC", "write °C or K (this is the ordinal sign)"),
          Map.entry("sec", "write s"),
          Map.entry("msec", "write ms"),
          Map.entry("degree", "write deg or °"),
          Map.entry("degrees", "write deg or °"),
          Map.entry("meter", "write m"),
          Map.entry("metre", "write m"),
          Map.entry("rpm", "divide by 60 and write Hz"),
          Map.entry("h", "write s"),
          Map.entry("min", "write s"),
          Map.entry("kcal", "write kJ (1 kcal = 4.184 kJ)"),
          Map.entry("BTU", "write kJ (1 BTU = 1.05506 kJ)"));

  /** Symbols of the wrong case or one letter away, nearest first; empty when there is none. */
  static List<String> near(String symbol) {
    List<String> sameLetters =
        UNITS.keySet().stream().filter(symbol::equalsIgnoreCase).sorted().toList();
    if (!sameLetters.isEmpty()) {
      return sameLetters;
    }
    return UNITS.keySet().stream()
        .filter(u -> u.length() > 1 && u.length() == symbol.length() && oneLetterOff(u, symbol))
        .sorted()
        .toList();
  }

  private static boolean oneLetterOff(String a, String b) {
    int different = 0;
    for (int i = 0; i < a.length(); i++) {
      different += a.charAt(i) == b.charAt(i) ? 0 : 1;
    }
    return different == 1;
  }

  /** Two known symbols that were written without a space between them, or null. */
  static String split(String symbol) {
    for (int i = symbol.length() - 1; i > 0; i--) {
      String a = symbol.substring(0, i);
      String b = symbol.substring(i);
      if (UNITS.containsKey(a) && UNITS.containsKey(b) && !a.equals(CELSIUS) && !b.equals("%")) {
        return a + " " + b;
      }
    }
    return null;
  }
}
