package org.annulet.solver.eigen;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Objects;
import org.apache.commons.math3.complex.Complex;

/**
 * All roots of a small dense nonlinear problem in a rectangle: contour integrals on tiles, Newton
 * on every candidate, and a root count that must agree; tiles that disagree are divided.
 */
final class SmallSearch {
  /** Roots closer than this share of |s| are one cluster. */
  static final double CLUSTER = 1e-5;

  private static final int POINTS = 48;
  private static final int DEEPEST = 4;
  private final MatrixFunction f;
  private final Rectangle region;
  private final List<Complex> poles;
  private final double step;
  private final List<Complex> found = new ArrayList<>();

  /**
   * What was found.
   *
   * @param agreed whether the small problem's own count confirms it
   */
  record Outcome(List<RootCluster> clusters, boolean agreed) {
    List<Complex> roots() {
      return clusters.stream().flatMap(c -> List.of(c.values()).stream()).toList();
    }
  }

  /**
   * A search.
   *
   * @param poles of the determinant in and near the region, with multiplicity
   * @param step largest distance of contour points in 1/s
   */
  SmallSearch(MatrixFunction f, Rectangle region, List<Complex> poles, double step) {
    this.f = f;
    this.region = region;
    this.poles = poles;
    this.step = step;
  }

  /**
   * Newton from roots of a problem close by; the count says whether that found them all.
   *
   * @param starts roots with vectors
   */
  Outcome from(List<SmallNewton.Root> starts) {
    starts.parallelStream()
        .map(r -> SmallNewton.refine(f, r.s(), r.vector()))
        .filter(Objects::nonNull)
        .filter(region::contains)
        .toList()
        .forEach(found::add);
    return settle();
  }

  /** Searches, starting from so many tiles that each holds about ten of the roots expected. */
  Outcome run(int expected, int finer) {
    int ny = Math.max(1, (expected + 9) / 10) * finer;
    int nx = Math.max(1, (int) Math.round(region.width() / (2 * region.height() / ny))) * finer;
    List<Rectangle> tiles = new ArrayList<>();
    for (int j = 0; j < ny; j++) {
      for (int i = 0; i < nx; i++) {
        tiles.add(region.tile(i, nx, j, ny));
      }
    }
    tiles.forEach(this::searchTile);
    Outcome outcome = settle();
    for (int depth = 0; depth < DEEPEST && !outcome.agreed(); depth++) {
      List<Complex> known = outcome.roots();
      List<Rectangle> lacking =
          tiles.size() == 1 ? tiles : tiles.stream().filter(tile -> !agrees(tile, known)).toList();
      List<Rectangle> next = new ArrayList<>();
      for (Rectangle tile : lacking.isEmpty() ? tiles : lacking) {
        for (int q = 0; q < 4; q++) {
          next.add(tile.tile(q % 2, 2, q / 2, 2));
        }
      }
      next.forEach(this::searchTile);
      tiles = next;
      outcome = settle();
    }
    return outcome;
  }

  private void searchTile(Rectangle tile) {
    ContourIntegral.Resolvent resolvent = ContourIntegral.of(f);
    int columns = Math.min(f.size(), 24);
    ContourIntegral.Found raw = ContourIntegral.around(resolvent, tile, POINTS, columns);
    while (raw.full() && columns < f.size()) {
      columns = Math.min(f.size(), 2 * columns);
      raw = ContourIntegral.around(resolvent, tile, POINTS, columns);
    }
    double reach = 0.5 * Math.hypot(tile.width(), tile.height());
    raw.candidates().parallelStream()
        .filter(c -> tile.distanceToEdge(c.s()) < reach || tile.contains(c.s()))
        .map(c -> SmallNewton.refine(f, c.s(), c.vector()))
        .filter(Objects::nonNull)
        .filter(region::contains)
        .toList()
        .forEach(found::add);
  }

  /** Groups what was found into clusters and counts. */
  private Outcome settle() {
    List<Complex> sorted = new ArrayList<>(found);
    sorted.sort(Comparator.comparingDouble(Complex::getImaginary).thenComparing(Complex::getReal));
    List<Complex> centres = new ArrayList<>();
    for (Complex s : sorted) {
      if (centres.stream().noneMatch(c -> c.subtract(s).abs() < CLUSTER * s.abs())) {
        centres.add(s);
      }
    }
    List<RootCluster> clusters =
        centres.parallelStream()
            .map(s -> SmallNewton.cluster(f, s, 2 * CLUSTER * s.abs(), 4))
            .filter(Objects::nonNull)
            .toList();
    List<RootCluster> distinct = new ArrayList<>();
    for (RootCluster c : clusters) {
      if (distinct.stream()
          .noneMatch(d -> d.centre().subtract(c.centre()).abs() < 2 * CLUSTER * c.centre().abs())) {
        distinct.add(c);
      }
    }
    Outcome outcome = new Outcome(distinct, false);
    return new Outcome(distinct, agrees(region, outcome.roots()));
  }

  private boolean agrees(Rectangle r, List<Complex> roots) {
    RootCount.Result count =
        RootCount.inside(
            r,
            RootCount.determinant(f),
            new RootCount.Known(roots, poles),
            new RootCount.Fineness(step, 4000));
    long inside = roots.stream().filter(r::contains).count();
    long polesInside = poles.stream().filter(r::contains).count();
    return count.certain() && count.value() == inside - polesInside;
  }
}
