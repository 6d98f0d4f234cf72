package org.annulet.mesher.geometry;

/**
 * A straight line.
 *
 * @param x0 start in m
 * @param y0 start in m
 * @param x1 end in m
 * @param y1 end in m
 */
record StraightPiece(double x0, double y0, double x1, double y1) implements CurvePiece {
  @Override
  public double x(double t) {
    return t == 1 ? x1 : x0 + t * (x1 - x0);
  }

  @Override
  public double y(double t) {
    return t == 1 ? y1 : y0 + t * (y1 - y0);
  }

  @Override
  public double speed(double t) {
    return Math.hypot(x1 - x0, y1 - y0);
  }

  @Override
  public double curvature(double t) {
    return 0;
  }

  @Override
  public double deviation(double t0, double t1) {
    return 0;
  }

  @Override
  public boolean isStraight() {
    return true;
  }
}
