package org.annulet.cases.uncertainty;

import java.util.List;
import java.util.Optional;
import org.apache.commons.math3.complex.Complex;

/** Turns departures into modes. */
interface Engine {
  /**
   * A mode of the case as it stands.
   *
   * @param s in 1/s
   * @param what it is, in words
   * @param modes of the chamber that share its fate: 2 where both members of a pair move together
   */
  record Nominal(Complex s, String what, int modes) {}

  /** Uncertain values by name, in the order of the departures. */
  List<Group> groups();

  /**
   * Departures that belong together: one input, or one property of all burners.
   *
   * @param name for tables
   * @param first position among the departures
   * @param count how many
   */
  record Group(String name, int first, int count) {}

  /** The modes followed. */
  List<Nominal> nominal();

  /** The modes at departures, in widths. */
  Sample at(double... x);

  /** Growth rates foretold to first order, in the order of {@link #nominal()}. */
  double[] first(double... x);

  /** The same to second order; empty where there is no such theory. */
  Optional<double[]> second(double... x);

  /**
   * The largest |Δs|/|s| between what {@link #at} gives and the full operators at some departures.
   */
  double difference(double... x);

  /** How points are solved, in one sentence. */
  String method();
}
