package org.annulet.mesher.geometry;

/**
 * One interval of a cubic spline: each coordinate is a + b t + c t² + d t³.
 *
 * @param cx four coefficients of x in m
 * @param cy four coefficients of y in m
 * @param ends exact coordinates of start and end in m: x0, y0, x1, y1
 */
record CubicPiece(double[] cx, double[] cy, double[] ends) implements CurvePiece {

  /**
   * The spline through the given points, twice continuously differentiable in the chord-length
   * parameter. An open curve starts and ends with the slope of the parabola through its first and
   * last three points (de Boor, A Practical Guide to Splines, ch. IV); a closed one is periodic.
   *
   * @param x first coordinates in m, at least three; closed if the last equals the first
   * @param y second coordinates in m
   * @return one piece per interval
   */
  static CubicPiece[] through(double[] x, double[] y) {
    int n = x.length - 1;
    double[] h = new double[n];
    for (int i = 0; i < n; i++) {
      h[i] = Math.hypot(x[i + 1] - x[i], y[i + 1] - y[i]);
    }
    boolean closed = x[0] == x[n] && y[0] == y[n];
    double[] mx = slopes(x, h, closed);
    double[] my = slopes(y, h, closed);
    CubicPiece[] pieces = new CubicPiece[n];
    for (int i = 0; i < n; i++) {
      pieces[i] =
          new CubicPiece(
              hermite(x[i], x[i + 1], mx[i] * h[i], mx[i + 1] * h[i]),
              hermite(y[i], y[i + 1], my[i] * h[i], my[i + 1] * h[i]),
              new double[] {x[i], y[i], x[i + 1], y[i + 1]});
    }
    return pieces;
  }

  private static double[] hermite(double p, double q, double m, double n) {
    return new double[] {p, m, 3 * (q - p) - 2 * m - n, 2 * (p - q) + m + n};
  }

  /** Slopes at the knots: λ m_{i-1} + 2 m_i + μ m_{i+1} = 3 (λ δ_{i-1} + μ δ_i). */
  private static double[] slopes(double[] p, double[] h, boolean closed) {
    int n = h.length;
    double[] delta = new double[n];
    for (int i = 0; i < n; i++) {
      delta[i] = (p[i + 1] - p[i]) / h[i];
    }
    double[] m = new double[n + 1];
    if (!closed) {
      m[0] = delta[0] + (delta[0] - delta[1]) * h[0] / (h[0] + h[1]);
      m[n] = delta[n - 1] + (delta[n - 1] - delta[n - 2]) * h[n - 1] / (h[n - 1] + h[n - 2]);
    }
    // Diagonally dominant with ratio 1/2: each Gauss–Seidel sweep gains a factor of at least two.
    int first = closed ? 0 : 1;
    for (int sweep = 0; sweep < 120; sweep++) {
      double change = 0;
      double size = 0;
      for (int i = first; i < n; i++) {
        int k = i == 0 ? n - 1 : i - 1;
        double lambda = h[i] / (h[k] + h[i]);
        double before = i == 0 ? m[n - 1] : m[i - 1];
        double value =
            1.5 * (lambda * delta[k] + (1 - lambda) * delta[i])
                - 0.5 * (lambda * before + (1 - lambda) * m[i + 1]);
        change = Math.max(change, Math.abs(value - m[i]));
        size = Math.max(size, Math.abs(value));
        m[i] = value;
        if (i == 0) {
          m[n] = value;
        }
      }
      if (change <= 1e-16 * size) {
        break;
      }
    }
    return m;
  }

  private static double value(double[] c, double t) {
    return c[0] + t * (c[1] + t * (c[2] + t * c[3]));
  }

  private static double slope(double[] c, double t) {
    return c[1] + t * (2 * c[2] + t * 3 * c[3]);
  }

  private static double bend(double[] c, double t) {
    return 2 * c[2] + 6 * t * c[3];
  }

  @Override
  public double x(double t) {
    return t == 0 ? ends[0] : t == 1 ? ends[2] : value(cx, t);
  }

  @Override
  public double y(double t) {
    return t == 0 ? ends[1] : t == 1 ? ends[3] : value(cy, t);
  }

  @Override
  public double speed(double t) {
    return Math.hypot(slope(cx, t), slope(cy, t));
  }

  @Override
  public double curvature(double t) {
    double s = speed(t);
    double cross = slope(cx, t) * bend(cy, t) - slope(cy, t) * bend(cx, t);
    return s == 0 ? 0 : Math.abs(cross) / (s * s * s);
  }

  @Override
  public double deviation(double t0, double t1) {
    double d = t1 - t0;
    double a = Math.hypot(bend(cx, t0), bend(cy, t0));
    double b = Math.hypot(bend(cx, t1), bend(cy, t1));
    return 0.125 * d * d * Math.max(a, b);
  }
}
