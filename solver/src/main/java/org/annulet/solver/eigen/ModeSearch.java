package org.annulet.solver.eigen;

import java.util.ArrayList;
import java.util.List;
import java.util.function.UnaryOperator;
import org.annulet.solver.dense.ComplexMatrix;
import org.annulet.solver.modes.ModeSet;
import org.annulet.solver.modes.Window;
import org.annulet.solver.operator.AcousticOperator;
import org.apache.commons.math3.complex.Complex;

/**
 * All modes of an operator in a window, with the certificate that none is missing.
 *
 * <p>Search on a real reduced basis, polish on the full operator, count along a contour just
 * outside the window ({@link Certifier} says on what); search on with more tiles and a larger basis
 * while the numbers differ. Never throws for want of convergence: what could not be settled is said
 * in the verdicts, in {@link ModeSet#complete()} and in the notes.
 */
public final class ModeSearch {
  /** Problems so small that nothing is gained by reducing. */
  private static final int WHOLE_SPACE = 60;

  /** Frequencies of the first basis: enough for starts, which the polishing then makes exact. */
  private static final int FIRST_RESPONSES = 2;

  private final PreparedOperator prepared;
  private final Window window;
  private final Rectangle wanted;
  private final SearchSettings settings;
  private final Spoilers spoilers;
  private final int fullCount;
  private final List<String> notes = new ArrayList<>();

  /** Ways to damage the search on purpose, so that tests can see the certificate fail. */
  record Spoilers(
      UnaryOperator<double[][]> basis,
      UnaryOperator<List<Polish.Polished>> modes,
      UnaryOperator<double[][]> countingBasis) {
    static Spoilers none() {
      return new Spoilers(q -> q, m -> m, q -> q);
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
    this(prepared, window, settings, spoilers, Certifier.SMALL);
  }

  ModeSearch(
      PreparedOperator prepared,
      Window window,
      SearchSettings settings,
      Spoilers spoilers,
      int fullCount) {
    this.prepared = prepared;
    this.window = window;
    this.wanted = Rectangle.of(window);
    this.settings = settings;
    this.spoilers = spoilers;
    this.fullCount = fullCount;
  }

  ModeSet run() {
    double w = wanted.width();
    double h = wanted.height();
    double most = ContourChoice.LARGEST_MARGIN;
    Rectangle region = wanted.grown(1.4 * most * w, 1.4 * most * h, 0.4 * wanted.bottom());
    Rectangle reach = wanted.grown(1.2 * most * w, 1.2 * most * h, 0.45 * wanted.bottom());
    List<Complex> poles = CoefficientPoles.in(prepared, region.grown(w, h, region.bottom() / 2));
    SearchPlan plan = new SearchPlan(prepared, window, settings);
    notes.addAll(plan.notes());
    Certifier certifier =
        new Certifier(prepared, plan, settings, fullCount, spoilers.countingBasis());
    PassiveModes.Spectrum passive = plan.passive();
    ReducedBasis basis =
        prepared.size() <= WHOLE_SPACE
            ? ReducedBasis.everything(prepared)
            : plan.basis(region.top(), FIRST_RESPONSES);
    Rectangle contour = null;
    RootCount.Result count = null;
    ModeList modes = null;
    List<Polish.Polished> found = List.of();
    for (int round = 1; round <= settings.rounds(); round++) {
      if (round > 1 && prepared.size() > WHOLE_SPACE) {
        basis.addResponses(passive, plan.shifts(region.top(), 3 * round));
        found.forEach(p -> addVectors(p, basis));
      }
      double[][] q = spoilers.basis().apply(basis.columns());
      SmallSearch.Outcome outcome =
          new SmallSearch(ProjectedOperator.onReal(prepared, q), region, poles, plan.step(region))
              .run(plan.expected(region), round);
      found = spoilers.modes().apply(polish(outcome, q, reach));
      List<Complex> known = roots(found, outcome, reach);
      if (count == null || !count.certain()) {
        contour = ContourChoice.around(wanted, avoid(known, poles, passive));
        count = certifier.count(contour, known, poles);
      }
      modes = ModeList.of(window, contour, found);
      if (count.certain()
          && modes.converged()
          && modes.inside() == eigenvalues(count, contour, poles)) {
        break;
      }
    }
    notes.addAll(certifier.notes());
    return answer(contour, count, poles, modes);
  }

  private static void addVectors(Polish.Polished p, ReducedBasis basis) {
    for (int j = 0; j < p.values().length; j++) {
      basis.add(p.vectors().re()[j]);
      basis.add(p.vectors().im()[j]);
    }
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
