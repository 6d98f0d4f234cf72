package org.annulet.cases.units;

/**
 * Powers of the base units of a quantity; radians and cycles count as base units.
 *
 * @param metre power of m
 * @param kilogram power of kg
 * @param second power of s
 * @param kelvin power of K
 * @param mole power of mol
 * @param radian power of rad
 * @param cycle power of one full cycle
 */
record Dimension(int metre, int kilogram, int second, int kelvin, int mole, int radian, int cycle) {
  static final Dimension NONE = new Dimension(0, 0, 0, 0, 0, 0, 0);

  /** This dimension times {@code other} to the power {@code n}. */
  Dimension times(Dimension other, int n) {
    return new Dimension(
        metre + n * other.metre,
        kilogram + n * other.kilogram,
        second + n * other.second,
        kelvin + n * other.kelvin,
        mole + n * other.mole,
        radian + n * other.radian,
        cycle + n * other.cycle);
  }
}
