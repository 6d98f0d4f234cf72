package org.annulet.cases.read;

/**
 * Values a number may take; NaN, which stands for a fault already reported, is within every range.
 *
 * @param low smallest
 * @param high largest
 * @param ends whether the ends belong to it
 * @param words in words
 */
record Range(double low, double high, Ends ends, String words) {
  enum Ends {
    BOTH,
    NONE,
    HIGH
  }

  static final Range ANY =
      new Range(Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY, Ends.BOTH, "any number");
  static final Range POSITIVE = new Range(0, Double.POSITIVE_INFINITY, Ends.HIGH, "above zero");
  static final Range NOT_NEGATIVE =
      new Range(0, Double.POSITIVE_INFINITY, Ends.BOTH, "zero or above");
  static final Range SHARE = new Range(0, 1, Ends.HIGH, "above 0, at most 1");
  static final Range PART = new Range(0, 1, Ends.BOTH, "from 0 to 1");
  static final Range GAMMA = new Range(1, 1.7, Ends.NONE, "between 1 and 1.7");
  static final Range MACH = new Range(0, 1, Ends.NONE, "between 0 and 1");

  boolean excludes(double x) {
    return switch (ends) {
      case BOTH -> x < low || x > high;
      case NONE -> x <= low || x >= high;
      case HIGH -> x <= low || x > high;
    };
  }
}
