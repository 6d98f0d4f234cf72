package org.annulet.solver.eigen;

import java.util.ArrayList;
import java.util.Collections;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Set;
import org.annulet.solver.dense.ComplexEigen;
import org.annulet.solver.dense.ComplexLu;
import org.annulet.solver.dense.ComplexMatrix;
import org.annulet.solver.modes.Window;
import org.annulet.solver.operator.AcousticOperator;
import org.apache.commons.math3.complex.Complex;

/**
 * Operators that differ in some of their inputs, on one real basis for all: passive modes and
 * responses at some of them, and the modes themselves at training points wherever the basis so far
 * leaves a larger backward error than is wanted. Roots are sought and counted on its first, coarse
 * part, which at every training point must give as many as the whole, and refined on the whole. A
 * point costs small dense algebra; the backward error of each of its modes is measured on its full
 * operator, and a mode beyond the bound is polished there. Immutable once trained and thread-safe;
 * a point's answer does not depend on other points.
 */
public final class ReducedFamily {
  private static final int RESPONSES = 3;
  private static final int CONTOUR_POINTS = 20;

  /** Members closer than this share of |s| are an exact pair. */
  private static final double EXACT = 1e-10;

  /**
   * Share of a column that must be new for the coarse part of the basis, where roots are counted.
   */
  private static final double COARSE = 1e-3;

  private static final double FINE = 1e-7;

  /** Coarse and fine roots differ by less, over |s|, or all is done on the fine basis. */
  private static final double ALIKE = 1e-3;

  /** Share of a mode that is rounding. */
  private static final double NOTHING_NEW = 1e-12;

  /** Backward error of a mode that is polished, over the bound. */
  private static final double POLISHED = 0.01;

  /** Backward error left at training points, over the bound: between them it is larger. */
  private static final double TRAINED = 0.2;

  private static final double MARGIN = 1.4 * ContourChoice.LARGEST_MARGIN;

  private final List<AcousticOperator> training;
  private final Window window;
  private final Rectangle region;
  private final double bound;
  private final List<List<SmallNewton.Root>> known = new ArrayList<>();
  private RealProjections projections;
  private int coarse;
  private int expected;

  /**
   * One eigenvalue.
   *
   * @param s in 1/s
   * @param re real part of the vector of unknowns of the full operator
   * @param im imaginary part
   * @param backwardError ‖L(s)p‖₂/‖K p‖₂ on the full operator
   * @param polished whether it had to be polished there
   */
  public record Root(Complex s, double[] re, double[] im, double backwardError, boolean polished) {}

  /**
   * All eigenvalues of an operator in and around the window.
   *
   * @param roots by frequency
   * @param counted whether the argument principle on the basis confirms their number
   */
  public record Answer(List<Root> roots, boolean counted) {}

  private ReducedFamily(List<AcousticOperator> training, Window window, double bound) {
    this.training = List.copyOf(training);
    this.window = window;
    this.bound = bound;
    Rectangle wanted = Rectangle.of(window);
    this.region =
        wanted.grown(MARGIN * wanted.width(), MARGIN * wanted.height(), 0.4 * wanted.bottom());
  }

  /**
   * Trains a basis.
   *
   * @param training operators spread over the inputs' ranges, in the order in which they are
   *     visited; equal arrays are best the same object
   * @param spanning how many of the first training operators bring passive modes and responses of
   *     their own, at least 1
   * @param window where modes are wanted
   * @param bound backward error up to which the basis is good enough
   */
  public static ReducedFamily trainedOn(
      List<AcousticOperator> training, int spanning, Window window, double bound) {
    ReducedFamily family = new ReducedFamily(training, window, bound);
    family.train(spanning);
    return family;
  }

  private void train(int spanning) {
    PreparedOperator first = new PreparedOperator(training.get(0));
    ReducedBasis basis = new ReducedBasis(first);
    List<double[][]> spans = new ArrayList<>();
    Set<double[]> seen = Collections.newSetFromMap(new IdentityHashMap<>());
    for (int i = 0; i < Math.min(spanning, training.size()); i++) {
      if (seen.add(training.get(i).stiffness())) {
        PreparedOperator here = i == 0 ? first : new PreparedOperator(training.get(i));
        SearchPlan plan = new SearchPlan(here, window, SearchSettings.standard());
        expected = Math.max(expected, plan.expected(region));
        addAll(basis, plan.basis(region.top(), RESPONSES, COARSE).columns(), COARSE);
        spans.add(plan.basis(region.top(), RESPONSES).columns());
      }
    }
    coarse = basis.size();
    spans.forEach(span -> addAll(basis, span, FINE));
    for (AcousticOperator point : training) {
      projections = new RealProjections(basis.columns(), List.of(point));
      PreparedOperator prepared = new PreparedOperator(point, first.analysis());
      for (Root root : solve(prepared, List.of(), TRAINED * bound).roots) {
        if (root.polished) {
          basis.add(root.re, NOTHING_NEW);
          basis.add(root.im, NOTHING_NEW);
        }
      }
    }
    projections = new RealProjections(basis.columns(), training);
    for (AcousticOperator point : training) {
      List<SmallNewton.Root> roots = small(point);
      known.add(roots);
      ReducedOperator fine = new ReducedOperator(point, projections, projections.size());
      SmallSearch.Outcome few = onCoarse(point, List.of(), fine);
      if (few == null || few.roots().size() != roots.size()) {
        coarse = projections.size();
      }
    }
  }

  private static void addAll(ReducedBasis basis, double[][] columns, double drop) {
    for (double[] v : columns) {
      basis.add(v, drop);
    }
  }

  /** Roots of a training point with their vectors on the basis. */
  private List<SmallNewton.Root> small(AcousticOperator point) {
    ReducedOperator f = new ReducedOperator(point, projections, projections.size());
    List<SmallNewton.Root> roots = new ArrayList<>();
    for (RootCluster c : search(point, f).run(expected, 1).clusters()) {
      for (int j = 0; j < c.values().length; j++) {
        roots.add(new SmallNewton.Root(c.values()[j], c.basis().columnsFrom(j, 1)));
      }
    }
    return roots;
  }

  private SmallSearch search(AcousticOperator point, ReducedOperator f) {
    Rectangle around = region.grown(region.width(), region.height(), region.bottom() / 2);
    return new SmallSearch(
        f,
        region,
        CoefficientPoles.in(new PreparedOperator(point, null), around),
        SearchPlan.step(point, region, CONTOUR_POINTS));
  }

  /** Number of columns of the basis. */
  public int size() {
    return projections.size();
  }

  /** Whether an operator can be solved on the basis. */
  public boolean holds(AcousticOperator operator) {
    return operator.size() == training.get(0).size();
  }

  /**
   * Solves an operator of the family.
   *
   * @param near positions in the training list of points close by, from whose roots to start
   */
  public Answer at(AcousticOperator operator, int... near) {
    List<SmallNewton.Root> starts = new ArrayList<>();
    for (int i : near) {
      starts.addAll(known.get(i));
    }
    return solve(new PreparedOperator(operator), starts, bound);
  }

  private Answer solve(PreparedOperator prepared, List<SmallNewton.Root> starts, double largest) {
    ReducedOperator fine =
        new ReducedOperator(prepared.operator(), projections, projections.size());
    SmallSearch.Outcome outcome = onCoarse(prepared.operator(), starts, fine);
    if (outcome == null) {
      outcome = search(prepared.operator(), fine).run(expected, 1);
    }
    List<Root> roots = new ArrayList<>();
    for (RootCluster c : outcome.clusters()) {
      roots.addAll(full(prepared, members(fine, c), largest));
    }
    roots.sort((a, b) -> Double.compare(a.s.getImaginary(), b.s.getImaginary()));
    return new Answer(roots, outcome.agreed());
  }

  /**
   * Searched and counted on the coarse part of the basis, the roots then refined on all of it; null
   * where the count does not agree or a root moves too far on the way.
   */
  private SmallSearch.Outcome onCoarse(
      AcousticOperator operator, List<SmallNewton.Root> starts, ReducedOperator fine) {
    ReducedOperator f = new ReducedOperator(operator, projections, coarse);
    SmallSearch search = search(operator, f);
    SmallSearch.Outcome outcome =
        starts.isEmpty()
            ? null
            : search.from(
                starts.stream()
                    .map(r -> new SmallNewton.Root(r.s(), rows(r.vector(), coarse)))
                    .toList());
    if (outcome == null || !outcome.agreed()) {
      outcome = search.run(expected, 1);
    }
    if (!outcome.agreed()) {
      return null;
    }
    List<RootCluster> refined = new ArrayList<>();
    for (RootCluster c : outcome.clusters()) {
      RootCluster better = refined(fine, c);
      if (better == null) {
        return null;
      }
      refined.add(better);
    }
    return new SmallSearch.Outcome(refined, true);
  }

  private static RootCluster refined(ReducedOperator fine, RootCluster c) {
    Complex centre = c.centre();
    int m = c.values().length;
    RootCluster better;
    if (m == 1) {
      SmallNewton.Root root = SmallNewton.refined(fine, centre, rows(c.basis(), fine.size()));
      better = root == null ? null : new RootCluster(new Complex[] {root.s()}, root.vector());
    } else {
      better = SmallNewton.cluster(fine, centre, ALIKE * centre.abs(), m);
    }
    return better == null
            || better.values().length != m
            || better.centre().subtract(centre).abs() > ALIKE * centre.abs()
        ? null
        : better;
  }

  /** The first rows of columns, or all of them with zeros below. */
  private static ComplexMatrix rows(ComplexMatrix x, int rows) {
    ComplexMatrix y = new ComplexMatrix(rows, x.columns());
    for (int j = 0; j < x.columns(); j++) {
      System.arraycopy(x.re()[j], 0, y.re()[j], 0, Math.min(rows, x.rows()));
      System.arraycopy(x.im()[j], 0, y.im()[j], 0, Math.min(rows, x.rows()));
    }
    return y;
  }

  /** The roots of a cluster told apart, each with its vector; an exact pair keeps its basis. */
  private static RootCluster members(ReducedOperator f, RootCluster c) {
    int m = c.values().length;
    if (m == 1) {
      SmallNewton.Root root = SmallNewton.refined(f, c.centre(), c.basis());
      return root == null ? c : new RootCluster(new Complex[] {root.s()}, root.vector());
    }
    Complex centre = c.centre();
    ComplexMatrix b = c.basis();
    ComplexMatrix value = b.adjointTimes(f.value(centre).times(b));
    new ComplexLu(b.adjointTimes(f.derivative(centre).times(b))).solve(value);
    ComplexEigen eigen = new ComplexEigen(value);
    double spread = 0;
    for (Complex e : eigen.values()) {
      spread = Math.max(spread, e.abs());
    }
    if (spread < EXACT * centre.abs()) {
      return c;
    }
    ComplexMatrix vectors = b.times(eigen.vectors());
    Complex[] values = new Complex[m];
    for (int j = 0; j < m; j++) {
      Complex start = centre.subtract(eigen.values()[j]);
      SmallNewton.Root root = SmallNewton.refined(f, start, vectors.columnsFrom(j, 1));
      boolean same = root != null && root.s().subtract(start).abs() < 0.3 * spread;
      values[j] = same ? root.s() : start;
      if (same) {
        vectors.re()[j] = root.vector().re()[0];
        vectors.im()[j] = root.vector().im()[0];
      }
    }
    return new RootCluster(values, vectors);
  }

  private List<Root> full(PreparedOperator prepared, RootCluster c, double largest) {
    List<Root> roots = new ArrayList<>();
    boolean good = true;
    for (int j = 0; j < c.values().length; j++) {
      double[][] p = projections.expand(c.basis().re()[j], c.basis().im()[j]);
      double error =
          prepared
              .backwardErrors(
                  c.values()[j],
                  ComplexMatrix.onColumns(new double[][] {p[0]}, new double[][] {p[1]}))[0];
      good &= error <= largest;
      roots.add(new Root(c.values()[j], p[0], p[1], error, false));
    }
    if (good) {
      return roots;
    }
    ComplexMatrix start = new ComplexMatrix(prepared.size(), roots.size());
    for (int j = 0; j < roots.size(); j++) {
      start.re()[j] = roots.get(j).re;
      start.im()[j] = roots.get(j).im;
    }
    Polish.Polished polished = new Polish(prepared, POLISHED * bound).run(c.values(), start);
    List<Root> better = new ArrayList<>();
    for (int j = 0; j < polished.values().length; j++) {
      better.add(
          new Root(
              polished.values()[j],
              polished.vectors().re()[j],
              polished.vectors().im()[j],
              polished.errors()[j],
              true));
    }
    return better;
  }
}
