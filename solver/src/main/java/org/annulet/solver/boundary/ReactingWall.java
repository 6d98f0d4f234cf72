package org.annulet.solver.boundary;

import org.annulet.solver.operator.AnalyticFunction;

/** A wall that answers at each point to the pressure there, with admittance y(s). */
public sealed interface ReactingWall extends Wall
    permits Impedance, Admittance, ChokedNozzle, FittedWall, PerforatedLiner, RadiatingEnd {
  /**
   * The specific admittance y(s) = ρc û·n/p̂, n out of the gas.
   *
   * @param gas at the wall
   * @return y as a function of s in 1/s; dimensionless
   */
  AnalyticFunction admittance(EdgeGas gas);
}
