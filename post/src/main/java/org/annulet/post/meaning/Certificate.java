package org.annulet.post.meaning;

import java.util.List;
import org.annulet.solver.modes.ModeSet;

/**
 * The certificate of one operator: on a section each azimuthal order has its own.
 *
 * @param operatorName problem, for the reader ("order 1")
 * @param order azimuthal order; null where the operator has none
 * @param count eigenvalues inside the contour by the argument principle; −1 when two counts
 *     disagreed
 * @param found modes found inside the contour, in the window and outside it
 * @param complete whether nothing is missing and everything converged
 * @param notes plain sentences of the search
 */
public record Certificate(
    String operatorName,
    Integer order,
    int count,
    int found,
    boolean complete,
    List<String> notes) {
  /** The certificate of a set of modes. */
  public static Certificate of(String operatorName, Integer order, ModeSet set) {
    return new Certificate(
        operatorName,
        order,
        set.countByArgumentPrinciple(),
        set.modes().size() + set.outside().size(),
        set.complete(),
        List.copyOf(set.notes()));
  }

  /** The certificate as a plain sentence. */
  public String sentence() {
    String who = operatorName.isEmpty() ? "" : operatorName + ": ";
    if (complete) {
      return who
          + "complete: the argument principle counts "
          + count
          + " and "
          + found
          + (found == 1 ? " was found." : " were found.");
    }
    return count < 0
        ? who + "NOT certified: two counts by the argument principle disagree; " + found + " found."
        : who
            + "NOT certified: the argument principle counts "
            + count
            + ", "
            + found
            + (count == found ? " were found, not all of them converged." : " found.");
  }
}
