package org.annulet.mesher.geometry;

/** The point of a curve piece closest to a place: samples, then golden-section search. */
final class ClosestPoint {
  private ClosestPoint() {}

  private static final double GOLDEN = 0.6180339887498949;

  /** Parameter in [0, 1] of the closest point. */
  static double parameter(CurvePiece c, double x, double y) {
    if (c.isStraight()) {
      double dx = c.x(1) - c.x(0);
      double dy = c.y(1) - c.y(0);
      double t = ((x - c.x(0)) * dx + (y - c.y(0)) * dy) / (dx * dx + dy * dy);
      return Math.max(0, Math.min(1, t));
    }
    if (c instanceof ArcPiece a) {
      double turn = Math.atan2(y - a.centreY(), x - a.centreX()) - a.angle0();
      turn *= Math.signum(a.sweep());
      turn -= 2 * Math.PI * Math.floor(turn / (2 * Math.PI));
      double sweep = Math.abs(a.sweep());
      if (turn <= sweep) {
        return turn / sweep;
      }
      return turn - sweep < 2 * Math.PI - turn ? 1 : 0;
    }
    int samples = 32;
    int best = 0;
    for (int i = 1; i <= samples; i++) {
      if (square(c, i / (double) samples, x, y) < square(c, best / (double) samples, x, y)) {
        best = i;
      }
    }
    double lo = Math.max(0, (best - 1.0) / samples);
    double hi = Math.min(1, (best + 1.0) / samples);
    for (int i = 0; i < 60; i++) {
      double a = hi - GOLDEN * (hi - lo);
      double b = lo + GOLDEN * (hi - lo);
      if (square(c, a, x, y) < square(c, b, x, y)) {
        hi = b;
      } else {
        lo = a;
      }
    }
    return 0.5 * (lo + hi);
  }

  private static double square(CurvePiece c, double t, double x, double y) {
    double dx = c.x(t) - x;
    double dy = c.y(t) - y;
    return dx * dx + dy * dy;
  }
}
