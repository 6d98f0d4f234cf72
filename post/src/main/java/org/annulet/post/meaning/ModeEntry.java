package org.annulet.post.meaning;

import java.util.Optional;

/**
 * One row of the results: the mode, its label, and what drives and damps it.
 *
 * @param view mode and field
 * @param label its label
 * @param budget growth budget, where it was made
 */
public record ModeEntry(ModeView view, ModeLabel label, Optional<GrowthBudget> budget) {
  /** How the growth rate stands against zero and its error bar. */
  public Stability stability() {
    double growth = view.mode().growthRate();
    double bar = Double.isNaN(view.growthError()) ? 0 : view.growthError();
    return Math.abs(growth) <= bar
        ? Stability.UNDECIDED
        : growth > 0 ? Stability.GROWS : Stability.DECAYS;
  }

  /** How a growth rate stands against zero. */
  public enum Stability {
    /** Positive beyond its error bar. */
    GROWS,
    /** Negative beyond its error bar. */
    DECAYS,
    /** Zero lies inside the error bar. */
    UNDECIDED
  }
}
