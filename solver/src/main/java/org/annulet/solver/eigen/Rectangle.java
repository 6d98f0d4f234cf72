package org.annulet.solver.eigen;

import org.annulet.solver.modes.Window;
import org.apache.commons.math3.complex.Complex;

/** A rectangle of the s-plane: growth rates and angular frequencies in 1/s. */
record Rectangle(double left, double right, double bottom, double top) {
  static Rectangle of(Window w) {
    return new Rectangle(
        w.lowestGrowth(),
        w.highestGrowth(),
        2 * Math.PI * w.lowestFrequency(),
        2 * Math.PI * w.highestFrequency());
  }

  Window toWindow() {
    return new Window(bottom / (2 * Math.PI), top / (2 * Math.PI), left, right);
  }

  boolean contains(Complex s) {
    return left <= s.getReal()
        && s.getReal() <= right
        && bottom <= s.getImaginary()
        && s.getImaginary() <= top;
  }

  double width() {
    return right - left;
  }

  double height() {
    return top - bottom;
  }

  double distanceToEdge(Complex s) {
    double dx = Math.min(Math.abs(s.getReal() - left), Math.abs(s.getReal() - right));
    double dy = Math.min(Math.abs(s.getImaginary() - bottom), Math.abs(s.getImaginary() - top));
    double outX = Math.max(0, Math.max(left - s.getReal(), s.getReal() - right));
    double outY = Math.max(0, Math.max(bottom - s.getImaginary(), s.getImaginary() - top));
    return outX > 0 || outY > 0 ? Math.hypot(outX, outY) : Math.min(dx, dy);
  }

  Complex lower() {
    return new Complex(left, bottom);
  }

  Complex upper() {
    return new Complex(right, top);
  }

  Complex centre() {
    return new Complex((left + right) / 2, (bottom + top) / 2);
  }

  /** Larger by the given lengths on each side; the lower edge keeps above {@code floor}. */
  Rectangle grown(double growth, double omega, double floor) {
    return new Rectangle(
        left - growth, right + growth, Math.max(floor, bottom - omega), top + omega);
  }

  /** The tile in column i of nx and row j of ny. */
  Rectangle tile(int i, int nx, int j, int ny) {
    return new Rectangle(
        left + width() * i / nx,
        left + width() * (i + 1) / nx,
        bottom + height() * j / ny,
        bottom + height() * (j + 1) / ny);
  }
}
