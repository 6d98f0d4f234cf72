package org.annulet.cases.read;

import java.math.BigDecimal;
import java.math.MathContext;

/** Numbers in messages: at most six digits, no exponent, no trailing zeros. */
final class Shown {
  private static final MathContext SIX = new MathContext(6);

  private Shown() {}

  static String number(double x) {
    if (!Double.isFinite(x)) {
      return String.valueOf(x);
    }
    BigDecimal rounded = new BigDecimal(x).round(SIX);
    return rounded.signum() == 0 ? "0" : rounded.stripTrailingZeros().toPlainString();
  }

  /** A length in mm. */
  static String millimetres(double metres) {
    return number(1000 * metres) + " mm";
  }
}
