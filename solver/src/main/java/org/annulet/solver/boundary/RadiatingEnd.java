package org.annulet.solver.boundary;

import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.rational.PolynomialRatio;

/**
 * An end that radiates into the open: a mass, which is the end correction δa, beside a resistance,
 * y = 1/(δσ) + β/δ², σ = sa/c. At low frequency z = ikaδ + β(ka)² with β = 1/4 without and 1/2 with
 * a flange (Levine and Schwinger 1948, Phys. Rev. 73, 383; Rayleigh), and the wall is passive at
 * every frequency.
 *
 * @param radius a of the opening in m
 * @param correction δ, end correction over radius
 * @param radiation β
 */
public record RadiatingEnd(double radius, double correction, double radiation)
    implements ReactingWall {
  /** Checks the numbers. */
  public RadiatingEnd {
    if (!(radius > 0 && correction > 0 && radiation >= 0)) {
      throw new IllegalArgumentException(
          "radius and end correction must be positive, radiation not negative; got "
              + radius
              + " m, "
              + correction
              + ", "
              + radiation);
    }
  }

  /**
   * The end of a pipe that stands free.
   *
   * @param radius in m
   */
  public static RadiatingEnd unflanged(double radius) {
    return new RadiatingEnd(radius, EndCorrection.UNFLANGED, 0.25);
  }

  /**
   * An opening in a wide wall.
   *
   * @param radius in m
   */
  public static RadiatingEnd flanged(double radius) {
    return new RadiatingEnd(radius, EndCorrection.FLANGED, 0.5);
  }

  @Override
  public AnalyticFunction admittance(EdgeGas gas) {
    double mass = correction * radius / gas.soundSpeed();
    double leak = radiation / (correction * correction);
    return new PolynomialRatio(new double[] {1, leak * mass}, new double[] {0, mass});
  }
}
