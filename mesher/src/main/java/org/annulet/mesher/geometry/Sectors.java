package org.annulet.mesher.geometry;

/** Area swept by an edge. */
final class Sectors {
  private Sectors() {}

  /**
   * ½ ∫ (x dy − y dx) along an edge plus nothing for its ends, measured from a given origin so that
   * the sum over a closed loop keeps its digits; with a common shift correction it is exact for any
   * origin: the part {@code ½ (ox Δy − oy Δx)} is added back.
   */
  static double moment(Edge edge, Point origin) {
    double ox = origin.x();
    double oy = origin.y();
    double sum = 0;
    for (CurvePiece c : edge.pieces()) {
      double x0 = c.x(0);
      double y0 = c.y(0);
      double x1 = c.x(1);
      double y1 = c.y(1);
      sum += 0.5 * ((x0 - ox) * (y1 - oy) - (x1 - ox) * (y0 - oy)) + bulge(c);
      sum += 0.5 * (ox * (y1 - y0) - oy * (x1 - x0));
    }
    return sum;
  }

  /** Area in m² between a piece and its chord, positive if the piece bulges to the right. */
  static double bulge(CurvePiece c) {
    if (c instanceof ArcPiece a) {
      return 0.5 * a.radius() * a.radius() * (a.sweep() - Math.sin(a.sweep()));
    }
    if (c instanceof CubicPiece q) {
      double[] a = q.cx();
      double[] b = q.cy();
      // ½ ∫ (x y' − y x') dt relative to C(0), minus the chord's triangle (which is 0 from C(0)).
      double sum = 0;
      for (int i = 1; i <= 3; i++) {
        for (int k = 1; k <= 3; k++) {
          sum += 0.5 * (a[i] * b[k] - b[i] * a[k]) * k / (i + k);
        }
      }
      return sum;
    }
    return 0;
  }
}
