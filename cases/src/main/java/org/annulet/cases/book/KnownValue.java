package org.annulet.cases.book;

import java.util.OptionalInt;

/**
 * One mode known from outside.
 *
 * @param row of the collection of reference values
 * @param chamber name of the case file it belongs to
 * @param order azimuthal order; empty where the chamber has none
 * @param frequency in Hz
 * @param growthRate in 1/s
 * @param source where the value comes from
 */
public record KnownValue(
    String row,
    String chamber,
    OptionalInt order,
    double frequency,
    double growthRate,
    String source) {
  /** One line of {@code known_values.csv}: row, case, order, frequency, growth rate, source. */
  static KnownValue parse(String line) {
    String[] part = line.split(",", 6);
    if (part.length < 6) {
      throw new IllegalArgumentException("a known value has 6 columns, got: " + line);
    }
    return new KnownValue(
        part[0],
        part[1],
        part[2].isEmpty() ? OptionalInt.empty() : OptionalInt.of(Integer.parseInt(part[2])),
        Double.parseDouble(part[3]),
        Double.parseDouble(part[4]),
        part[5]);
  }
}
