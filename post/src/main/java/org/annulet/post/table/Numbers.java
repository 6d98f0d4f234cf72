package org.annulet.post.table;

import java.util.Locale;

/** How numbers are shown to people. */
public final class Numbers {
  private Numbers() {}

  /** A value with its error bar, the value to the digit the bar allows. */
  public static String withError(double value, double error) {
    if (Double.isNaN(error)) {
      return fixed(value, 2) + " ± not estimated";
    }
    int digits = digits(error);
    return fixed(value, digits) + " ± " + fixed(error, digits);
  }

  /** The same in a sentence, with its unit. */
  public static String withError(double value, double error, String unit) {
    return Double.isNaN(error)
        ? fixed(value, 2) + " " + unit + " (error not estimated)"
        : withError(value, error) + " " + unit;
  }

  /** Decimals that show an error bar to two figures, between 0 and 6. */
  private static int digits(double error) {
    if (!(error > 0)) {
      return 6;
    }
    return (int) Math.min(6, Math.max(0, 1 - Math.floor(Math.log10(error))));
  }

  /** A number with a fixed count of decimals; what rounds to zero has no sign. */
  public static String fixed(double value, int decimals) {
    String text = String.format(Locale.ROOT, "%." + decimals + "f", value);
    return text.matches("-0\\.?0*") ? text.substring(1) : text;
  }

  /** A rate with its sign, one decimal, two below ten and three figures below one. */
  public static String signed(double value) {
    double size = Math.abs(value);
    if (size < 5e-5) {
      return "0";
    }
    int decimals = size >= 10 ? 1 : size >= 1 ? 2 : size >= 0.01 ? 3 : 4;
    String text = fixed(value, decimals);
    return value > 0 && !text.matches("0\\.?0*") ? "+" + text : text;
  }
}
