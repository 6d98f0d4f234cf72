package org.annulet.solver.eigen;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.function.UnaryOperator;
import org.apache.commons.math3.complex.Complex;

/**
 * Counts the roots inside a contour: on the full operator where that is cheap, on a reduced one
 * checked against it where it is not, and on the full one again where that check fails.
 */
final class Certifier {
  /** Up to so many unknowns a few hundred factorisations cost less than the reduction. */
  static final int SMALL = 1000;

  private static final int[] RESPONSES = {3, 5};

  private final PreparedOperator prepared;
  private final SearchPlan plan;
  private final int largestContour;
  private final int small;
  private final UnaryOperator<double[][]> damage;
  private final List<String> notes = new ArrayList<>();

  /**
   * A certifier.
   *
   * @param small unknowns up to which the full operator is counted at once
   * @param damage done to the basis of the reduced count, by tests only
   */
  Certifier(
      PreparedOperator prepared,
      SearchPlan plan,
      SearchSettings settings,
      int small,
      UnaryOperator<double[][]> damage) {
    this.damage = damage;
    this.prepared = prepared;
    this.plan = plan;
    this.largestContour = settings.largestContour();
    this.small = small;
  }

  /** How the latest count was made. */
  List<String> notes() {
    return notes;
  }

  /**
   * Zeros minus poles.
   *
   * @param known roots of the full operator found so far; they speed the count up and do not change
   *     it
   */
  RootCount.Result count(Rectangle contour, List<Complex> known, List<Complex> poles) {
    notes.clear();
    RootCount.Known divided = new RootCount.Known(known, poles);
    RootCount.Fineness fineness = new RootCount.Fineness(plan.step(contour), largestContour);
    if (prepared.size() > small && plan.passive().complete()) {
      for (int responses : RESPONSES) {
        ReducedCount reduced =
            new ReducedCount(
                prepared, damage.apply(plan.basis(contour.top(), responses).columns()));
        ReducedCount.Result result = reduced.inside(contour, divided, fineness);
        if (result.certain()) {
          notes.add(
              String.format(
                  Locale.ROOT,
                  "counted on a reduced operator of %d unknowns, made of the passive modes, which the"
                      + " search uses too, and of responses at frequencies of its own; at %d points"
                      + " of the contour its determinant departs from the full operator's by at"
                      + " most %.1e of its size, where a third is tolerated; between those points"
                      + " nothing was compared",
                  reduced.size(),
                  ReducedCount.POINTS,
                  result.departure()));
          return result.count();
        }
      }
    }
    notes.add("counted on the full operator");
    return RootCount.inside(contour, RootCount.determinant(prepared), divided, fineness);
  }
}
