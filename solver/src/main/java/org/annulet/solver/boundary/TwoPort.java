package org.annulet.solver.boundary;

import org.annulet.solver.operator.AnalyticFunction;

/**
 * What joins two gas volumes at patch means: the velocities out of gas 1 and out of gas 2 into the
 * port as functions of the two mean pressures.
 */
public sealed interface TwoPort permits FlowLoss, MeasuredTwoPort, PerforatedScreen {
  /**
   * s · Y(s), where (û₁, û₂) = Y (p̂₁, p̂₂), both velocities into the port.
   *
   * @param first gas on side 1, the upstream one
   * @param second gas on side 2
   * @return in m/(s²·Pa), shape [2][2]
   */
  AnalyticFunction[][] mobility(EdgeGas first, EdgeGas second);
}
