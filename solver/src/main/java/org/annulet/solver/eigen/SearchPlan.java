package org.annulet.solver.eigen;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.annulet.solver.modes.Window;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.operator.LowRankTerm;
import org.annulet.solver.operator.SparseTerm;

/** What passive modes, delays and window say of how far, how fine and where to search. */
final class SearchPlan {
  /** Passive modes are taken up to this multiple of the window's upper frequency. */
  private static final double BEYOND = 1.5;

  private static final int MOST_PASSIVE = 80;
  private static final int MOST_EXPECTED = 300;

  private final PreparedOperator prepared;
  private final PassiveModes.Spectrum passive;
  private final int contourPoints;
  private final List<String> notes = new ArrayList<>();

  SearchPlan(PreparedOperator prepared, Window window, SearchSettings settings) {
    this.prepared = prepared;
    this.contourPoints = settings.contourPoints();
    double top = window.highestFrequency();
    PassiveModes.ShiftInvert shifted = new PassiveModes.ShiftInvert(prepared);
    double beyond = BEYOND;
    double omega = 2 * Math.PI * top;
    while (beyond > 1.1 && shifted.countBelow(beyond * beyond * omega * omega) > MOST_PASSIVE) {
      beyond -= 0.1;
    }
    passive = PassiveModes.below(prepared, beyond * top);
    if (!passive.complete()) {
      notes.add(
          "passive modes: inertia gives "
              + passive.expected()
              + " below "
              + Math.round(beyond * top)
              + " Hz, found "
              + passive.omegaSquared().length);
    }
  }

  /** Passive modes to beyond the window, the uniform one included. */
  PassiveModes.Spectrum passive() {
    return passive;
  }

  List<String> notes() {
    return notes;
  }

  /** A basis of the passive modes and of responses at so many frequencies below {@code top}. */
  ReducedBasis basis(double top, int responses) {
    return filled(new ReducedBasis(prepared), top, responses);
  }

  /** The same, smaller: without what is new by less than a share {@code drop} of its length. */
  ReducedBasis basis(double top, int responses, double drop) {
    return filled(new ReducedBasis(prepared, drop), top, responses);
  }

  private ReducedBasis filled(ReducedBasis basis, double top, int responses) {
    for (double[] v : passive.vectors()) {
      basis.add(v);
    }
    basis.addResponses(passive, shifts(top, responses));
    if (basis.columns().length == 0) {
      // No passive mode is near and nothing responds: constant pressure, so that there is a basis.
      double[] ones = new double[prepared.size()];
      Arrays.fill(ones, 1);
      basis.add(ones);
    }
    return basis;
  }

  /** Angular frequencies for responses: spread over 0 … top, each in a gap of the passive ones. */
  double[] shifts(double top, int number) {
    double[] shifts = new double[number];
    for (int k = 0; k < number; k++) {
      double ideal = top * 0.5 * (1.04 - Math.cos(Math.PI * (k + 0.5) / number));
      double best = ideal;
      double bestGap = -1;
      for (int t = -4; t <= 4; t++) {
        double trial = ideal + t * 0.1 * top / number;
        double gap = Double.POSITIVE_INFINITY;
        for (double l : passive.omegaSquared()) {
          gap = Math.min(gap, Math.abs(trial - Math.sqrt(Math.max(0, l))));
        }
        if (trial > 0 && gap > 1.2 * bestGap) {
          best = trial;
          bestGap = gap;
        }
      }
      shifts[k] = best;
    }
    return shifts;
  }

  /** About how many roots a rectangle holds: one for each passive mode and each turn of a flame. */
  int expected(Rectangle region) {
    double number = 1;
    for (double l : passive.omegaSquared()) {
      number += l > 0 && Math.sqrt(l) > region.bottom() && Math.sqrt(l) < region.top() ? 1 : 0;
    }
    for (LowRankTerm term : prepared.operator().lowRankTerms()) {
      number += delay(term) * region.height() / (2 * Math.PI);
    }
    return (int) Math.min(number, MOST_EXPECTED);
  }

  /** Largest distance of contour points in 1/s: one radian of the longest delay. */
  double step(Rectangle r) {
    return step(prepared.operator(), r, contourPoints);
  }

  static double step(AcousticOperator operator, Rectangle r, int contourPoints) {
    double delay = 0;
    for (LowRankTerm term : operator.lowRankTerms()) {
      delay = Math.max(delay, delay(term));
    }
    for (SparseTerm term : operator.sparseTerms()) {
      delay = Math.max(delay, term.coefficient().longestDelay());
    }
    double longest = Math.max(r.width(), r.height());
    return Math.min(longest / contourPoints, delay > 0 ? 1 / delay : longest);
  }

  private static double delay(LowRankTerm term) {
    double delay = 0;
    for (AnalyticFunction[] row : term.coefficient()) {
      for (AnalyticFunction entry : row) {
        delay = Math.max(delay, entry == null ? 0 : entry.longestDelay());
      }
    }
    return delay;
  }
}
