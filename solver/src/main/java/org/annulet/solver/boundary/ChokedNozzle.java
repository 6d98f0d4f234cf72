package org.annulet.solver.boundary;

import org.annulet.solver.operator.Analytic;
import org.annulet.solver.operator.AnalyticFunction;

/**
 * A compact choked nozzle at the outlet, y = (γ − 1) M/2, for plane waves: û/ū = ((γ−1)/2) p̂/(γp̄)
 * without incoming entropy waves (Marble and Candel 1977, J. Sound Vib. 55, 225; from memory). For
 * azimuthal orders m ≠ 0 it is used as an approximation.
 *
 * @param mach Mach number M of the mean flow just upstream of the nozzle, in (0, 1)
 */
public record ChokedNozzle(double mach) implements ReactingWall {
  /** Checks the Mach number. */
  public ChokedNozzle {
    if (!(mach > 0 && mach < 1)) {
      throw new IllegalArgumentException(
          "Mach number upstream of a choked nozzle must lie in (0, 1), got " + mach);
    }
  }

  @Override
  public AnalyticFunction admittance(EdgeGas gas) {
    return Analytic.constant(0.5 * (gas.gamma() - 1) * mach);
  }
}
