package org.annulet.cases.points;

/**
 * One of several equal parts of a study: every {@code of}-th point.
 *
 * @param number from 1
 * @param of parts in all
 */
public record Slice(int number, int of) {
  /** All points. */
  public static final Slice WHOLE = new Slice(1, 1);

  /** Checks the numbers. */
  public Slice {
    if (number < 1 || of < 1 || number > of) {
      throw new IllegalArgumentException("part " + number + "/" + of + " does not exist");
    }
  }

  /** Whether a point belongs to this part. */
  public boolean holds(int point) {
    return point % of == number - 1;
  }

  /** Whether this is all there is. */
  public boolean isWhole() {
    return of == 1;
  }
}
