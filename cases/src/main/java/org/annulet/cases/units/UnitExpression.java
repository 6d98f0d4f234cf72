package org.annulet.cases.units;

import java.util.ArrayList;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Reads a unit: symbols with powers, at most one line of division. */
final class UnitExpression {
  private static final Pattern FACTOR =
      Pattern.compile("([\\p{L}°µ%]+)(?:\\^?([+-]?[0-9]+)|([⁻⁺]?[⁰¹²³⁴⁵⁶⁷⁸⁹]+))?");
  private static final String SUPERSCRIPTS = "⁰¹²³⁴⁵⁶⁷⁸⁹";

  private UnitExpression() {}

  /**
   * The unit written in {@code text}.
   *
   * @throws UnitFault if it has no reading or more than one
   */
  static Unit parse(String text) {
    String unit = text.strip().replace('μ', 'µ'); // Greek mu to the micro sign
    if (unit.equals(UnitTable.CELSIUS)) {
      return UnitTable.UNITS.get(UnitTable.CELSIUS);
    }
    int line = unit.indexOf('/');
    if (line < 0) {
      return product(unit, unit, 1, Unit.ONE);
    }
    String above = unit.substring(0, line).strip();
    String below = unit.substring(line + 1).strip();
    if (below.indexOf('/') >= 0) {
      throw new UnitFault(
          "unit '" + unit + "' divides twice, which has two readings",
          "write '" + above + "/(" + below.replace('/', ' ') + ")', or what else is meant");
    }
    if (above.isEmpty()) {
      throw new UnitFault(
          "unit '" + unit + "' has nothing above the line", "write '1/" + below + "'");
    }
    Unit result = above.equals("1") ? Unit.ONE : product(above, unit, 1, Unit.ONE);
    if (below.startsWith("(") && below.endsWith(")")) {
      below = below.substring(1, below.length() - 1).strip();
    } else if (factors(below).size() > 1) {
      throw new UnitFault(
          "unit '" + unit + "' has two readings",
          "write '" + above + "/(" + below + ")', or what else is meant");
    }
    return product(below, unit, -1, result);
  }

  private static List<String> factors(String text) {
    List<String> factors = new ArrayList<>();
    for (String factor : text.split("[\\s\\u00a0\\u202f·*]+")) {
      if (!factor.isEmpty()) {
        factors.add(factor);
      }
    }
    return factors;
  }

  private static Unit product(String text, String whole, int sign, Unit start) {
    Unit result = start;
    List<String> factors = factors(text);
    if (factors.isEmpty()) {
      throw new UnitFault("unit '" + whole + "' is incomplete", "write it out, as in J/(kg K)");
    }
    for (String factor : factors) {
      Matcher m = FACTOR.matcher(factor);
      if (!m.matches()) {
        throw new UnitFault(
            "'" + factor + "' in unit '" + whole + "' is not a unit symbol with a power",
            "write products with spaces and powers as digits, as in kg m-3 or J/(kg K)");
      }
      int power = power(m, whole);
      result = result.times(symbol(m.group(1), whole), sign * power);
    }
    return result;
  }

  private static int power(Matcher m, String whole) {
    String digits = m.group(2);
    if (m.group(3) != null) {
      StringBuilder plain = new StringBuilder();
      for (char c : m.group(3).toCharArray()) {
        int digit = SUPERSCRIPTS.indexOf(c);
        plain.append(digit >= 0 ? (char) ('0' + digit) : c == '⁻' ? '-' : '+');
      }
      digits = plain.toString();
    }
    if (digits == null) {
      return 1;
    }
    if (digits.length() > 2
        || Math.abs(Integer.parseInt(digits)) > 9
        || Integer.parseInt(digits) == 0) {
      throw new UnitFault(
          "unit '" + whole + "' has the power " + digits, "powers run from -9 to 9, without 0");
    }
    return Integer.parseInt(digits);
  }

  private static Unit symbol(String symbol, String whole) {
    Unit unit = UnitTable.UNITS.get(symbol);
    if (unit != null && !symbol.equals(UnitTable.CELSIUS)) {
      return unit;
    }
    String what =
        symbol.equals(whole)
            ? "unknown unit '" + symbol + "'"
            : "unknown unit '" + symbol + "' in '" + whole + "'";
    if (unit != null) {
      throw new UnitFault("°C inside the unit '" + whole + "'", "write K in products of units");
    }
    String advice = UnitTable.ADVICE.get(symbol);
    if (advice == null) {
      List<String> near = UnitTable.near(symbol);
      String split = UnitTable.split(symbol);
      if (near.size() > 0 && near.get(0).equalsIgnoreCase(symbol)) {
        advice = "write '" + String.join("' or '", near) + "': upper and lower case matter";
      } else if (split != null) {
        advice = "write '" + split + "', with a space";
      } else if (!near.isEmpty()) {
        advice = "write '" + String.join("' or '", near) + "'?";
      } else {
        advice =
            "known units: "
                + String.join(", ", UnitTable.UNITS.keySet().stream().sorted().toList());
      }
    }
    throw new UnitFault(what, advice);
  }
}
