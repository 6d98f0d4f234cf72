package org.annulet.cases.units;

import java.math.BigDecimal;
import java.math.MathContext;

/**
 * A unit: its SI value is {@code value · factor + offset}.
 *
 * @param factor SI units in one of this unit
 * @param offset zero of this unit in SI units; not 0 only for °C
 * @param dimension powers of the base units
 */
record Unit(BigDecimal factor, BigDecimal offset, Dimension dimension) {
  static final Unit ONE = new Unit(BigDecimal.ONE, BigDecimal.ZERO, Dimension.NONE);

  static Unit of(String factor, Dimension dimension) {
    return new Unit(new BigDecimal(factor), BigDecimal.ZERO, dimension);
  }

  /** This unit times {@code other} to the power {@code n}, 0 &lt; |n| &lt; 10. */
  Unit times(Unit other, int n) {
    BigDecimal power = other.factor.pow(Math.abs(n), MathContext.DECIMAL128);
    BigDecimal product =
        n > 0
            ? factor.multiply(power, MathContext.DECIMAL128)
            : factor.divide(power, MathContext.DECIMAL128);
    return new Unit(product, BigDecimal.ZERO, dimension.times(other.dimension, n));
  }

  double toSi(BigDecimal value) {
    return value.multiply(factor, MathContext.DECIMAL128).add(offset).doubleValue();
  }
}
