package org.annulet.solver.modes;

/**
 * What the mesh still costs an eigenvalue, from its values on three nested meshes whose triangle
 * sides halve (Richardson).
 *
 * <p>With s(h) = s + C h^p the observed order is p = log₂(|s(2h) − s(4h)| / |s(h) − s(2h)|) and the
 * error of the finest value is |s(h) − s(2h)| / (2^p − 1). Smooth fields give p = 2, re-entrant
 * corners bring it down towards 1. The order is not trusted outside [{@value #LOWEST_ORDER},
 * {@value #HIGHEST_ORDER}], and the estimate is stretched by {@value #SAFETY}.
 *
 * @param growthRate error bar of the growth rate in 1/s, not negative
 * @param frequency error bar of the frequency in Hz, not negative
 * @param observedOrder p as observed, before any limit; NaN when the differences are at rounding
 *     level
 */
public record MeshError(double growthRate, double frequency, double observedOrder) {
  /** Orders below it are taken for it; a corner with an unfavourable jump of weight has 1.06. */
  public static final double LOWEST_ORDER = 1;

  /** Orders above it are taken for it: linear triangles have no more than 2. */
  public static final double HIGHEST_ORDER = 2;

  /** Stretches the estimate, since the observed order is itself an estimate. */
  public static final double SAFETY = 1.5;

  /** Part of the error of s that each of its two components is given at least. */
  private static final double SHARE = 0.25;

  /** Relative difference at which rounding of the eigenvalues takes over. */
  private static final double ROUNDING = 1e-10;

  /**
   * The estimate for the finest mesh.
   *
   * @param growth growth rate on the coarse, middle and fine mesh in 1/s, shape [3]
   * @param hertz frequency on the coarse, middle and fine mesh in Hz, shape [3]
   */
  public static MeshError of(double[] growth, double[] hertz) {
    double turn = 2 * Math.PI;
    double first = Math.hypot(growth[1] - growth[0], turn * (hertz[1] - hertz[0]));
    double second = Math.hypot(growth[2] - growth[1], turn * (hertz[2] - hertz[1]));
    double rounding = ROUNDING * Math.hypot(growth[2], turn * hertz[2]);
    double order = second > rounding ? Math.log(first / second) / Math.log(2) : Double.NaN;
    double trusted =
        Double.isNaN(order)
            ? HIGHEST_ORDER
            : Math.max(LOWEST_ORDER, Math.min(HIGHEST_ORDER, order));
    double factor = SAFETY / (Math.pow(2, trusted) - 1);
    double floor = SHARE * second;
    return new MeshError(
        factor * Math.max(floor, Math.abs(growth[2] - growth[1])),
        factor * Math.max(floor / turn, Math.abs(hertz[2] - hertz[1])),
        order);
  }
}
