package org.annulet.cases.book;

/**
 * A law of the models (a gas, a resonator, a nozzle) evaluated beside a published or closed-form
 * value; no mesh is involved.
 *
 * @param row of the collection of reference values
 * @param quantity with its unit
 * @param ours as the program evaluates it
 * @param theirs the known value
 * @param tolerance by which the two may differ, in the unit of the quantity
 * @param source where the known value and the tolerance come from
 */
public record LawCheck(
    String row, String quantity, double ours, double theirs, double tolerance, String source) {
  /** Whether the difference is within the tolerance. */
  public boolean passes() {
    return Math.abs(ours - theirs) <= tolerance;
  }
}
