package org.annulet.solver.flame;

import java.util.List;
import org.annulet.solver.medium.PathProfile;

/**
 * A flame brush: a normal distribution of the heat release along the gas path.
 *
 * @param pathX x of the corners of the path in m, at least two
 * @param pathY y of the corners in m
 * @param centre distance of the middle along the path in m
 * @param deviation σ in m, positive
 */
public record GaussianBrush(List<Double> pathX, List<Double> pathY, double centre, double deviation)
    implements HeatDensity {
  /** Checks the width and copies the path. */
  public GaussianBrush {
    if (!(deviation > 0)) {
      throw new IllegalArgumentException(
          "the deviation of a flame brush must be positive, got " + deviation + " m");
    }
    pathX = List.copyOf(pathX);
    pathY = List.copyOf(pathY);
  }

  /** Along x, whatever y is. */
  public static GaussianBrush alongAxis(double centre, double deviation) {
    return new GaussianBrush(List.of(), List.of(), centre, deviation);
  }

  @Override
  public double at(double x, double y) {
    double along = pathX.isEmpty() ? x : PathProfile.distanceAlong(pathX, pathY, x, y);
    double u = (along - centre) / deviation;
    return Math.exp(-0.5 * u * u);
  }
}
