package org.annulet.solver.rational;

import java.util.ArrayList;
import java.util.List;
import java.util.function.UnaryOperator;
import org.apache.commons.math3.complex.Complex;

/**
 * All zeros of a scalar analytic function in a rectangle: counted by the argument principle, the
 * rectangle halved until each part holds one, then found by Newton's method.
 */
public final class RectangleZeros {
  private static final int DEEPEST = 40;
  private static final double LARGEST_TURN = 0.8; // rad between samples of the contour

  private final UnaryOperator<Complex> f;
  private final double size;
  private final List<Complex> zeros = new ArrayList<>();

  private RectangleZeros(UnaryOperator<Complex> f, double size) {
    this.f = f;
    this.size = size;
  }

  /**
   * The zeros.
   *
   * @param f without poles in the rectangle
   * @param lower corner with the smallest real and imaginary part
   * @param upper the opposite corner
   */
  public static List<Complex> of(UnaryOperator<Complex> f, Complex lower, Complex upper) {
    RectangleZeros z = new RectangleZeros(f, upper.subtract(lower).abs());
    z.search(lower, upper, 0);
    return List.copyOf(z.zeros);
  }

  private void search(Complex low, Complex high, int depth) {
    int count = count(low, high);
    if (count <= 0) {
      return;
    }
    if (count == 1 || depth == DEEPEST) {
      Complex z = newton(low.add(high).multiply(0.5));
      if (inside(z, low, high)) {
        for (int k = 0; k < count; k++) {
          zeros.add(z);
        }
        return;
      }
      if (depth == DEEPEST) {
        return;
      }
    }
    // Off the middle, where symmetric problems like to have their zeros.
    double part = 0.5137;
    boolean wide = high.getReal() - low.getReal() > high.getImaginary() - low.getImaginary();
    if (wide) {
      double x = low.getReal() + part * (high.getReal() - low.getReal());
      search(low, new Complex(x, high.getImaginary()), depth + 1);
      search(new Complex(x, low.getImaginary()), high, depth + 1);
    } else {
      double y = low.getImaginary() + part * (high.getImaginary() - low.getImaginary());
      search(low, new Complex(high.getReal(), y), depth + 1);
      search(new Complex(low.getReal(), y), high, depth + 1);
    }
  }

  private int count(Complex low, Complex high) {
    Complex[] corner = {
      low,
      new Complex(high.getReal(), low.getImaginary()),
      high,
      new Complex(low.getReal(), high.getImaginary())
    };
    double turn = 0;
    for (int k = 0; k < 4; k++) {
      Complex a = corner[k];
      Complex b = corner[(k + 1) % 4];
      turn += turn(a, f.apply(a), b, f.apply(b), 0);
    }
    return (int) Math.round(turn / (2 * Math.PI));
  }

  /** Turn of the phase along a side, halved until it is plain. */
  private double turn(Complex a, Complex fa, Complex b, Complex fb, int depth) {
    Complex m = a.add(b).multiply(0.5);
    Complex fm = f.apply(m);
    double first = fm.divide(fa).getArgument();
    double second = fb.divide(fm).getArgument();
    if (depth > 3 && Math.abs(first) < LARGEST_TURN && Math.abs(second) < LARGEST_TURN
        || depth == DEEPEST) {
      return first + second;
    }
    return turn(a, fa, m, fm, depth + 1) + turn(m, fm, b, fb, depth + 1);
  }

  private Complex newton(Complex start) {
    Complex z = start;
    for (int k = 0; k < 60; k++) {
      double h = 1e-6 * size;
      Complex slope = f.apply(z.add(h)).subtract(f.apply(z.subtract(h))).divide(2 * h);
      Complex step = f.apply(z).divide(slope);
      if (step.isNaN()) {
        return z;
      }
      z = z.subtract(step);
      if (step.abs() < 1e-13 * size) {
        break;
      }
    }
    return z;
  }

  private static boolean inside(Complex z, Complex low, Complex high) {
    return z.getReal() >= low.getReal()
        && z.getReal() <= high.getReal()
        && z.getImaginary() >= low.getImaginary()
        && z.getImaginary() <= high.getImaginary();
  }
}
