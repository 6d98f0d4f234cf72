package org.annulet.solver.eigen;

import java.util.List;
import java.util.function.ToDoubleFunction;
import org.apache.commons.math3.complex.Complex;

/**
 * The contour of the count: the window, each edge moved outward just as far as it takes to keep
 * clear of roots of L, roots of its sparse part and poles, but by no more than 5 % of the window.
 */
final class ContourChoice {
  /** An edge this close to a point, as a share of the window's size, is moved. */
  private static final double CLEARANCE = 0.01;

  private static final int TRIALS = 20;

  /** Largest margin on each side, as a share of the window's width or height. */
  static final double LARGEST_MARGIN = 0.05;

  private ContourChoice() {}

  static Rectangle around(Rectangle window, List<Complex> avoid) {
    double w = window.width();
    double h = window.height();
    Rectangle reach = window.grown(LARGEST_MARGIN * w, LARGEST_MARGIN * h, 0);
    List<Complex> near =
        avoid.stream().filter(s -> reach.grown(0.02 * w, 0.02 * h, 0).contains(s)).toList();
    double floor = Math.min(LARGEST_MARGIN * h, 0.5 * window.bottom());
    return new Rectangle(
        window.left() - margin(near, s -> window.left() - s.getReal(), w, LARGEST_MARGIN * w),
        window.right() + margin(near, s -> s.getReal() - window.right(), w, LARGEST_MARGIN * w),
        window.bottom() - margin(near, s -> window.bottom() - s.getImaginary(), h, floor),
        window.top() + margin(near, s -> s.getImaginary() - window.top(), h, LARGEST_MARGIN * h));
  }

  /** How far outward to move an edge; {@code outward} says how far a point lies beyond it. */
  private static double margin(
      List<Complex> points, ToDoubleFunction<Complex> outward, double size, double largest) {
    double best = 0;
    double bestGap = gap(points, outward, 0);
    if (bestGap >= CLEARANCE * size) {
      return 0;
    }
    for (int k = 1; k <= TRIALS; k++) {
      double m = largest * k / TRIALS;
      double g = gap(points, outward, m);
      if (g > bestGap) {
        bestGap = g;
        best = m;
      }
      if (g >= CLEARANCE * size) {
        return m;
      }
    }
    return best;
  }

  private static double gap(
      List<Complex> points, ToDoubleFunction<Complex> outward, double margin) {
    double least = Double.POSITIVE_INFINITY;
    for (Complex s : points) {
      least = Math.min(least, Math.abs(outward.applyAsDouble(s) - margin));
    }
    return least;
  }
}
