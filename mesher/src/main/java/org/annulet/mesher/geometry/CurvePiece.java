package org.annulet.mesher.geometry;

/**
 * One smooth piece of an edge between two of its points, C(t) for 0 ≤ t ≤ 1; immutable.
 *
 * <p>C(0) and C(1) are the coordinates of the two points to the last bit.
 */
public sealed interface CurvePiece permits StraightPiece, ArcPiece, CubicPiece {
  /** First coordinate in m at parameter {@code t}. */
  double x(double t);

  /** Second coordinate in m at parameter {@code t}. */
  double y(double t);

  /** |dC/dt| in m. */
  double speed(double t);

  /** Unsigned curvature in 1/m. */
  double curvature(double t);

  /**
   * Largest distance in m between the piece from {@code t0} to {@code t1} and its chord; a bound
   * from above, 0 for a straight piece.
   */
  double deviation(double t0, double t1);

  /** Parameter in [0, 1] of the point closest to the place (x, y) in m. */
  default double closest(double x, double y) {
    return ClosestPoint.parameter(this, x, y);
  }

  /** Whether the piece is a straight line. */
  default boolean isStraight() {
    return false;
  }

  /** Length in m of the part from {@code t0} to {@code t1}, by Gauss quadrature. */
  default double length(double t0, double t1) {
    double sum = 0;
    int panels = isStraight() ? 1 : 8;
    double h = (t1 - t0) / panels;
    for (int i = 0; i < panels; i++) {
      double m = t0 + (i + 0.5) * h;
      // Gauss–Legendre with three points: nodes ±√(3/5), weights 5/9, 8/9, 5/9.
      double d = 0.5 * h * 0.774596669241483377;
      sum += h / 18 * (5 * speed(m - d) + 8 * speed(m) + 5 * speed(m + d));
    }
    return Math.abs(sum);
  }
}
