package org.annulet.solver.boundary;

import org.annulet.solver.operator.AnalyticFunction;

/**
 * A damper seen from its mouth: it answers with one volume flow to the mean pressure over a patch
 * of the wall.
 */
public sealed interface Damper permits ResonatorChain, QuarterWaveTube {
  /**
   * s · Y(s), Y the volume flow into the mouth over the pressure at it, in m³/(s·Pa).
   *
   * @return in m³/(s²·Pa)
   */
  AnalyticFunction flow();

  /** Area of the mouth in m². */
  double mouthArea();
}
