package org.annulet.cases.compare;

import java.util.Optional;
import org.annulet.cases.read.ModeTable;

/**
 * A mode of ours, a row of theirs, or both.
 *
 * @param ours empty where only they have it
 * @param second other member of our pair, where the one row stands for both
 * @param theirs empty where only we have it
 * @param row number of the row in their table, from 1; 0 without one
 * @param correlation of the two shapes, 0 to 1; NaN where there is none
 * @param rival what else it might be, in words, where that is nearly as good
 */
record Match(
    Optional<OurMode> ours,
    Optional<OurMode> second,
    Optional<ModeTable.Row> theirs,
    int row,
    double correlation,
    Optional<String> rival) {
  /** Whether both sides have it. */
  boolean both() {
    return ours.isPresent() && theirs.isPresent();
  }
}
