package org.annulet.post.meaning;

import java.util.List;
import java.util.Optional;

/**
 * One row of the results: the mode, its label, what drives and damps it, and what would move it.
 *
 * @param view mode and field
 * @param label its label
 * @param budget growth budget, where it was made
 * @param sensitivities to the inputs of the case, the strongest effect on the growth rate first;
 *     empty where they were not computed
 * @param points sensitivities to the points of the outline, in the same order; empty without one
 * @param maps where a damper acts and where the flames drive, where they were made
 */
public record ModeEntry(
    ModeView view,
    ModeLabel label,
    Optional<GrowthBudget> budget,
    List<ParameterSensitivity> sensitivities,
    List<PointSensitivity> points,
    Optional<ModeMaps> maps) {
  /** Copies the lists. */
  public ModeEntry {
    sensitivities = List.copyOf(sensitivities);
    points = List.copyOf(points);
  }

  /** Without sensitivities and maps. */
  public ModeEntry(ModeView view, ModeLabel label, Optional<GrowthBudget> budget) {
    this(view, label, budget, List.of(), List.of(), Optional.empty());
  }

  /** The same with maps. */
  public ModeEntry with(ModeMaps made) {
    return new ModeEntry(view, label, budget, sensitivities, points, Optional.of(made));
  }

  /** The same with sensitivities. */
  public ModeEntry with(List<ParameterSensitivity> all) {
    return new ModeEntry(view, label, budget, all, points, maps);
  }

  /** The same with sensitivities to the points of the outline. */
  public ModeEntry withPoints(List<PointSensitivity> all) {
    return new ModeEntry(view, label, budget, sensitivities, all, maps);
  }

  /** Rounding of a growth rate per |s|: sums over the mesh in double precision keep about this. */
  private static final double ROUNDING = 1e-9;

  /**
   * How the growth rate stands against zero: undecided within its error bar, and in any case within
   * what the backward error (of the order of |δs/s|) and rounding leave open, so that an undamped
   * passive mode never counts as growing.
   */
  public Stability stability() {
    double growth = view.mode().growthRate();
    double bar = Double.isNaN(view.growthError()) ? 0 : view.growthError();
    double algebra =
        Math.sqrt(view.squaredRate()) * Math.max(ROUNDING, view.mode().backwardError());
    bar = Math.max(bar, algebra);
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
