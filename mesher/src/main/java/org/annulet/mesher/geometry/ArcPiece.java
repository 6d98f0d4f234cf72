package org.annulet.mesher.geometry;

/**
 * A part of a circular arc.
 *
 * @param centreX centre in m
 * @param centreY centre in m
 * @param radius in m
 * @param angle0 polar angle of the start in rad
 * @param sweep angle run through in rad, positive anticlockwise
 * @param ends exact coordinates of start and end in m: x0, y0, x1, y1
 */
record ArcPiece(
    double centreX, double centreY, double radius, double angle0, double sweep, double[] ends)
    implements CurvePiece {

  /**
   * The two pieces of the arc from point 0 through point 1 to point 2.
   *
   * @param x three first coordinates in m
   * @param y three second coordinates in m
   * @return two pieces, or null if the points lie in one line
   */
  static ArcPiece[] through(double[] x, double[] y) {
    double bx = x[1] - x[0];
    double by = y[1] - y[0];
    double cx = x[2] - x[0];
    double cy = y[2] - y[0];
    double d = 2 * (bx * cy - by * cx);
    double b2 = bx * bx + by * by;
    double c2 = cx * cx + cy * cy;
    // A sagitta below 1e-9 of the chord is a straight line within the rounding of a drawing.
    if (!(Math.abs(d) > 1e-9 * (b2 + c2))) {
      return null;
    }
    double ux = (cy * b2 - by * c2) / d;
    double uy = (bx * c2 - cx * b2) / d;
    double mx = x[0] + ux;
    double my = y[0] + uy;
    double r = Math.hypot(ux, uy);
    double[] angle = new double[3];
    for (int i = 0; i < 3; i++) {
      angle[i] = Math.atan2(y[i] - my, x[i] - mx);
    }
    double sense = d > 0 ? 1 : -1;
    ArcPiece[] pieces = new ArcPiece[2];
    for (int i = 0; i < 2; i++) {
      double s = sense * (angle[i + 1] - angle[i]);
      s = s <= 0 ? s + 2 * Math.PI : s;
      pieces[i] =
          new ArcPiece(
              mx, my, r, angle[i], sense * s, new double[] {x[i], y[i], x[i + 1], y[i + 1]});
    }
    return pieces;
  }

  @Override
  public double x(double t) {
    return t == 0 ? ends[0] : t == 1 ? ends[2] : centreX + radius * Math.cos(angle0 + t * sweep);
  }

  @Override
  public double y(double t) {
    return t == 0 ? ends[1] : t == 1 ? ends[3] : centreY + radius * Math.sin(angle0 + t * sweep);
  }

  @Override
  public double speed(double t) {
    return radius * Math.abs(sweep);
  }

  @Override
  public double curvature(double t) {
    return 1 / radius;
  }

  @Override
  public double deviation(double t0, double t1) {
    double quarter = 0.25 * Math.abs(sweep * (t1 - t0));
    double s = Math.sin(Math.min(quarter, 0.5 * Math.PI));
    return 2 * radius * s * s;
  }
}
