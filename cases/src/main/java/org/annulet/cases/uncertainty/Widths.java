package org.annulet.cases.uncertainty;

import org.annulet.cases.read.CaseSource;
import org.annulet.cases.read.Uncertainty;
import org.annulet.cases.units.Quantity;
import org.annulet.cases.units.QuantityKind;
import org.annulet.cases.units.UnitFault;

/** Widths of spreads in SI. */
final class Widths {
  private Widths() {}

  /**
   * A width about a value of the case.
   *
   * @throws IllegalArgumentException if it cannot be one
   */
  static double of(Uncertainty.Spread spread, CaseSource.Value value) {
    return of(spread, value.si(), value.kind());
  }

  static double of(Uncertainty.Spread spread, double value, QuantityKind kind) {
    String text = spread.width();
    double width;
    try {
      width =
          text.endsWith("%")
              ? Math.abs(value) * Quantity.parse(text, QuantityKind.FRACTION).si()
              : Quantity.parse(text, kind).si();
    } catch (UnitFault f) {
      throw new IllegalArgumentException(f.what(), f);
    }
    if (text.contains("°C") || text.contains("°F")) {
      throw new IllegalArgumentException("a width of temperature is a difference: write it in K");
    }
    if (!(width > 0)) {
      throw new IllegalArgumentException("the width '" + text + "' is not above zero");
    }
    return width;
  }
}
