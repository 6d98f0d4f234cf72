package org.annulet.cases.units;

import java.math.BigDecimal;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * A number read from a case file or a table, in SI, with the text it was read from.
 *
 * @param si value in {@link QuantityKind#siUnit()}, finite
 * @param kind what it measures
 * @param source the text read
 */
public record Quantity(double si, QuantityKind kind, String source) {
  private static final int LONGEST = 120;
  private static final double LARGEST = 1e100;
  private static final Pattern NUMBER =
      Pattern.compile("[+-]?(?:[0-9]+\\.?[0-9]*|\\.[0-9]+)(?:[eE][+-]?[0-9]+)?");
  private static final Pattern NOT_FINITE =
      Pattern.compile("[+-]?\\.?(?:nan|inf|infinity|∞)\\b.*|[+-]?∞.*", Pattern.CASE_INSENSITIVE);
  private static final Pattern THOUSANDS = Pattern.compile(",[0-9]{3}(?![0-9]).*");

  /**
   * Reads a number with its unit, as in {@code 12 mm}.
   *
   * @param text what the user wrote
   * @param kind what is wanted
   * @throws UnitFault if the text is not one finite number with one unit of this kind
   */
  public static Quantity parse(String text, QuantityKind kind) {
    return parse(text, "", kind);
  }

  /**
   * Reads a number whose unit was stated once for a whole list or table.
   *
   * @param number a number without a unit
   * @param unit the unit stated for all of them
   * @param kind what is wanted
   * @throws UnitFault if the number is not a finite number, carries a unit of its own, or the unit
   *     is not one of this kind
   */
  public static Quantity parse(String number, String unit, QuantityKind kind) {
    String all = number.strip();
    if (all.length() > LONGEST) {
      throw new UnitFault(
          "a text of " + all.length() + " characters where " + wanted(kind) + " is wanted",
          example(kind));
    }
    Matcher m = NUMBER.matcher(all);
    if (!m.lookingAt()) {
      throw notANumber(all, kind);
    }
    String rest = strip(all.substring(m.end()));
    if (rest.startsWith(",")) {
      boolean thousands = THOUSANDS.matcher(rest).matches();
      throw new UnitFault(
          "'" + all + "' has a comma in the number",
          thousands
              ? "write '"
                  + all.replaceFirst(",", "")
                  + "' or '"
                  + all.replaceFirst(",", ".")
                  + "', whichever is meant"
              : "decimals are written with a point: '" + all.replaceFirst(",", ".") + "'");
    }
    if (!rest.isEmpty()
        && (Character.isDigit(rest.charAt(0)) || "_'.".indexOf(rest.charAt(0)) >= 0)
        && !rest.startsWith("1/")) {
      throw new UnitFault(
          "'" + all + "' is not one number", "write the digits without spaces or separators");
    }
    BigDecimal value = finite(m.group(), all);
    if (!unit.isBlank()) {
      if (!rest.isEmpty()) {
        throw new UnitFault(
            "'" + all + "' carries a unit although '" + unit.strip() + "' is stated for all values",
            "state the unit once or with every value, not both");
      }
      return new Quantity(
          convert(value, unit, all + " " + unit, kind), kind, all + " " + unit.strip());
    }
    return new Quantity(convert(value, rest, all, kind), kind, all);
  }

  /**
   * SI units in one unit of this kind, for a column of numbers.
   *
   * @throws UnitFault if it is not a unit of this kind
   */
  public static void requireUnit(String unit, QuantityKind kind) {
    convert(BigDecimal.ONE, strip(unit), unit, kind);
  }

  private static double convert(BigDecimal value, String unit, String all, QuantityKind kind) {
    if (unit.isEmpty()) {
      if (kind == QuantityKind.FRACTION) {
        return physical(value.doubleValue(), all);
      }
      throw new UnitFault(
          "'" + all + "' has no unit; " + wanted(kind) + " is wanted", example(kind));
    }
    Unit read = UnitExpression.parse(unit);
    if (!read.dimension().equals(kind.dimension())) {
      throw wrongKind(all, unit, read.dimension(), kind);
    }
    return physical(read.toSi(value), all);
  }

  /** No quantity of nature is so large or so small that its cube leaves the range of a double. */
  private static double physical(double si, String all) {
    double size = Math.abs(si);
    if (size > LARGEST || size > 0 && size < 1 / LARGEST) {
      throw new UnitFault(
          "'" + all + "' is too " + (size > 1 ? "large" : "small"),
          "check the exponent and the unit");
    }
    return si;
  }

  private static UnitFault wrongKind(
      String all, String unit, Dimension dimension, QuantityKind kind) {
    String what =
        "'" + all + "' is " + QuantityKind.describe(dimension) + "; " + wanted(kind) + " is wanted";
    boolean angular = dimension.radian() != 0 && dimension.second() == -1;
    if (kind == QuantityKind.FREQUENCY && angular) {
      return new UnitFault(what, "frequencies are in cycles per second: divide by 2π and write Hz");
    }
    if (kind == QuantityKind.FREQUENCY && dimension.equals(QuantityKind.GROWTH_RATE.dimension())) {
      return new UnitFault(what, "write Hz; 1/s is the unit of growth rates");
    }
    if (kind == QuantityKind.GROWTH_RATE && dimension.second() == -1) {
      return new UnitFault(what, "write 1/s; a growth rate is Re s in p' = Re(p̂ exp(st))");
    }
    if (kind == QuantityKind.TEMPERATURE && dimension.radian() == 1) {
      return new UnitFault(what, "write °C or K");
    }
    if (kind == QuantityKind.FRACTION) {
      return new UnitFault(what, "leave the unit '" + unit + "' out");
    }
    return new UnitFault(what, example(kind));
  }

  private static UnitFault notANumber(String all, QuantityKind kind) {
    if (all.isEmpty()) {
      return new UnitFault("no value; " + wanted(kind) + " is wanted", example(kind));
    }
    if (NOT_FINITE.matcher(all).matches()) {
      return new UnitFault("'" + all + "' is not a finite number", example(kind));
    }
    if (all.startsWith("−") || all.startsWith("–")) {
      return new UnitFault(
          "'" + all + "' begins with a dash that is not a minus sign",
          "write '-" + all.substring(1).strip() + "'");
    }
    return new UnitFault(
        "'" + all + "' does not begin with a number; " + wanted(kind) + " is wanted",
        example(kind));
  }

  private static BigDecimal finite(String number, String all) {
    double value = Double.parseDouble(number);
    boolean vanished = value == 0 && number.replaceFirst("[eE].*", "").matches(".*[1-9].*");
    if (Double.isInfinite(value) || vanished) {
      throw new UnitFault(
          "'" + all + "' is " + (vanished ? "too small" : "too large"), "check the exponent");
    }
    return value == 0 ? BigDecimal.ZERO : new BigDecimal(number);
  }

  private static String strip(String text) {
    return text.replaceAll("^[\\s\\u00a0\\u202f\\u2009]+|[\\s\\u00a0\\u202f\\u2009]+$", "");
  }

  private static String wanted(QuantityKind kind) {
    return QuantityKind.describe(kind.dimension());
  }

  private static String example(QuantityKind kind) {
    return "write for example '" + kind.example() + "'";
  }
}
