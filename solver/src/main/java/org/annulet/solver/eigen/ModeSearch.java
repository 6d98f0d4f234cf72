package org.annulet.solver.eigen;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.function.UnaryOperator;
import org.annulet.solver.dense.ComplexMatrix;
import org.annulet.solver.modes.ModeSet;
import org.annulet.solver.modes.Window;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.operator.LowRankTerm;
import org.annulet.solver.operator.SparseTerm;
import org.apache.commons.math3.complex.Complex;

/**
 * All modes of an operator in a window, with the certificate that none is missing.
 *
 * <p>Search on a real reduced basis, polish on the full operator, count on the full operator along
 * a contour just outside the window; search on with more tiles and a larger basis while the numbers
 * differ. Never throws for want of convergence: what could not be settled is said in the verdicts,
 * in {@link ModeSet#complete()} and in the notes.
 */
public final class ModeSearch {
  private static final int WHOLE_SPACE = 60;

  /** Passive modes are taken up to this multiple of the window's upper frequency. */
  private static final double BEYOND = 1.5;

  private static final int MOST_PASSIVE = 80;

  private final PreparedOperator prepared;
  private final Window window;
  private final Rectangle wanted;
  private final SearchSettings settings;
  private final Spoilers spoilers;
  private final List<String> notes = new ArrayList<>();

  /** Ways to damage the search on purpose, so that tests can see the certificate fail. */
  record Spoilers(UnaryOperator<double[][]> basis, UnaryOperator<List<Polish.Polished>> modes) {
    static Spoilers none() {
      return new Spoilers(q -> q, m -> m);
    }
  }

  /** Finds all modes in the window. */
  public static ModeSet find(AcousticOperator operator, Window window, SearchSettings settings) {
    return find(new PreparedOperator(operator), window, settings);
  }

  /** The same on an operator analysed earlier. */
  public static ModeSet find(PreparedOperator prepared, Window window, SearchSettings settings) {
    return new ModeSearch(prepared, window, settings, Spoilers.none()).run();
  }

  ModeSearch(PreparedOperator prepared, Window window, SearchSettings settings, Spoilers spoilers) {
    this.prepared = prepared;
    this.window = window;
    this.wanted = Rectangle.of(window);
    this.settings = settings;
    this.spoilers = spoilers;
  }

  ModeSet run() {
    double w = wanted.width();
    double h = wanted.height();
    double most = ContourChoice.LARGEST_MARGIN;
    Rectangle region = wanted.grown(1.4 * most * w, 1.4 * most * h, 0.4 * wanted.bottom());
    Rectangle reach = wanted.grown(1.2 * most * w, 1.2 * most * h, 0.45 * wanted.bottom());
    List<Complex> poles = CoefficientPoles.in(prepared, region.grown(w, h, region.bottom() / 2));
    PassiveModes.Spectrum passive = passiveModes();
    ReducedBasis basis = startBasis(passive);
    Rectangle contour = null;
    RootCount.Result count = null;
    ModeList modes = null;
    List<Polish.Polished> found = List.of();
    for (int round = 1; round <= settings.rounds(); round++) {
      if (prepared.size() > WHOLE_SPACE) {
        basis.addResponses(passive, shifts(passive, region.top(), 3 + 3 * round));
        found.forEach(p -> addVectors(p, basis));
      }
      double[][] q = spoilers.basis().apply(basis.columns());
      SmallSearch.Outcome outcome =
          new SmallSearch(ProjectedOperator.onReal(prepared, q), region, poles, step(region))
              .run(expected(passive, region), round);
      found = spoilers.modes().apply(polish(outcome, q, reach));
      List<Complex> known = roots(found, outcome, reach);
      if (count == null || !count.certain()) {
        contour = ContourChoice.around(wanted, avoid(known, poles, passive));
        count = count(contour, known, poles);
      }
      modes = ModeList.of(window, contour, found);
      if (count.certain()
          && modes.converged()
          && modes.inside() == eigenvalues(count, contour, poles)) {
        break;
      }
    }
    return answer(contour, count, poles, modes);
  }

  private ReducedBasis startBasis(PassiveModes.Spectrum passive) {
    if (prepared.size() <= WHOLE_SPACE) {
      return ReducedBasis.everything(prepared);
    }
    ReducedBasis basis = new ReducedBasis(prepared);
    // Never empty, also where no passive mode is near and nothing responds: constant pressure.
    double[] ones = new double[prepared.size()];
    Arrays.fill(ones, 1);
    basis.add(ones);
    for (double[] v : passive.vectors()) {
      basis.add(v);
    }
    return basis;
  }

  private static void addVectors(Polish.Polished p, ReducedBasis basis) {
    for (int j = 0; j < p.values().length; j++) {
      basis.add(p.vectors().re()[j]);
      basis.add(p.vectors().im()[j]);
    }
  }

  private RootCount.Result count(Rectangle contour, List<Complex> known, List<Complex> poles) {
    return RootCount.inside(
        contour,
        RootCount.determinant(prepared),
        new RootCount.Known(known, poles),
        new RootCount.Fineness(step(contour), settings.largestContour()));
  }

  /** Zeros, from zeros minus poles. */
  private static int eigenvalues(RootCount.Result count, Rectangle contour, List<Complex> poles) {
    return count.value() + (int) poles.stream().filter(contour::contains).count();
  }

  private List<Complex> avoid(
      List<Complex> known, List<Complex> poles, PassiveModes.Spectrum passive) {
    List<Complex> avoid = new ArrayList<>(known);
    avoid.addAll(poles);
    for (double l : passive.omegaSquared()) {
      avoid.add(new Complex(0, Math.sqrt(Math.max(0, l))));
    }
    return avoid;
  }

  private ModeSet answer(
      Rectangle contour, RootCount.Result count, List<Complex> poles, ModeList modes) {
    int expected = count.certain() ? eigenvalues(count, contour, poles) : -1;
    boolean complete = expected == modes.inside() && modes.converged();
    if (!count.certain()) {
      notes.add("the root count did not settle: two counts of different fineness disagree");
    } else if (expected != modes.inside()) {
      notes.add(
          "the argument principle gives "
              + expected
              + " modes inside the contour, the search found "
              + modes.inside());
    }
    if (!modes.converged()) {
      notes.add("some modes did not reach the backward error asked for");
    }
    long polesInside = poles.stream().filter(contour::contains).count();
    if (polesInside > 0) {
      notes.add(
          "poles of walls or flames inside the contour, counted with their rank: " + polesInside);
    }
    if (!contour.equals(wanted)) {
      notes.add(
          "the contour was moved outward from the window: a mode, a passive mode or a pole lies"
              + " close to its edge");
    }
    notes.addAll(modes.notes());
    return new ModeSet(
        window,
        contour.toWindow(),
        modes.modes(),
        modes.outside(),
        expected,
        complete,
        List.copyOf(notes));
  }

  private PassiveModes.Spectrum passiveModes() {
    double top = window.highestFrequency();
    PassiveModes.ShiftInvert shifted = new PassiveModes.ShiftInvert(prepared);
    double beyond = BEYOND;
    double omega = 2 * Math.PI * top;
    while (beyond > 1.1 && shifted.countBelow(beyond * beyond * omega * omega) > MOST_PASSIVE) {
      beyond -= 0.1;
    }
    PassiveModes.Spectrum passive = PassiveModes.below(prepared, beyond * top);
    if (!passive.complete()) {
      notes.add(
          "passive modes: inertia gives "
              + passive.expected()
              + " below "
              + Math.round(beyond * top)
              + " Hz, found "
              + passive.omegaSquared().length);
    }
    return passive;
  }

  /** Angular frequencies for the responses: spread over 0 … top, each in a gap of the passive. */
  private static double[] shifts(PassiveModes.Spectrum passive, double top, int number) {
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

  private int expected(PassiveModes.Spectrum passive, Rectangle region) {
    double number = 1;
    for (double l : passive.omegaSquared()) {
      number += l > 0 && Math.sqrt(l) > region.bottom() && Math.sqrt(l) < region.top() ? 1 : 0;
    }
    for (LowRankTerm term : prepared.operator().lowRankTerms()) {
      number += delay(term) * region.height() / (2 * Math.PI);
    }
    return (int) Math.min(number, 300);
  }

  private double step(Rectangle r) {
    double delay = 0;
    for (LowRankTerm term : prepared.operator().lowRankTerms()) {
      delay = Math.max(delay, delay(term));
    }
    for (SparseTerm term : prepared.operator().sparseTerms()) {
      delay = Math.max(delay, term.coefficient().longestDelay());
    }
    double longest = Math.max(r.width(), r.height());
    return Math.min(longest / settings.contourPoints(), delay > 0 ? 1 / delay : longest);
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

  private List<Polish.Polished> polish(SmallSearch.Outcome outcome, double[][] q, Rectangle reach) {
    ComplexMatrix basis = ComplexMatrix.onColumns(q, new double[q.length][prepared.size()]);
    Polish polish = new Polish(prepared, settings.backwardError());
    return outcome.clusters().parallelStream()
        .filter(c -> reach.contains(c.centre()))
        .map(c -> polish.run(c.values(), basis.times(c.basis())))
        .toList();
  }

  /** All roots known: the polished ones and, beyond their reach, those of the small problem. */
  private static List<Complex> roots(
      List<Polish.Polished> polished, SmallSearch.Outcome outcome, Rectangle reach) {
    List<Complex> roots = new ArrayList<>();
    polished.forEach(p -> roots.addAll(List.of(p.values())));
    outcome.clusters().stream()
        .filter(c -> !reach.contains(c.centre()))
        .forEach(c -> roots.addAll(List.of(c.values())));
    return roots;
  }
}
