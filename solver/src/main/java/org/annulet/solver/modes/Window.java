package org.annulet.solver.modes;

/**
 * The rectangle of the s-plane in which every mode is wanted.
 *
 * @param lowestFrequency in Hz, above zero
 * @param highestFrequency in Hz
 * @param lowestGrowth in 1/s
 * @param highestGrowth in 1/s
 */
public record Window(
    double lowestFrequency, double highestFrequency, double lowestGrowth, double highestGrowth) {
  /** Checks the order of the bounds. */
  public Window {
    if (!(0 < lowestFrequency && lowestFrequency < highestFrequency)
        || Double.isInfinite(highestFrequency)) {
      throw new IllegalArgumentException(
          "frequencies must satisfy 0 < lowest < highest, got "
              + lowestFrequency
              + " and "
              + highestFrequency
              + " Hz");
    }
    if (!(lowestGrowth < highestGrowth)
        || Double.isInfinite(lowestGrowth)
        || Double.isInfinite(highestGrowth)) {
      throw new IllegalArgumentException(
          "growth rates must satisfy lowest < highest, got "
              + lowestGrowth
              + " and "
              + highestGrowth
              + " 1/s");
    }
  }

  /** Whether s = σ + iω lies in the closed rectangle. */
  public boolean contains(double growth, double frequency) {
    return lowestGrowth <= growth
        && growth <= highestGrowth
        && lowestFrequency <= frequency
        && frequency <= highestFrequency;
  }
}
