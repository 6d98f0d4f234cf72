package org.annulet.solver.boundary;

import org.annulet.solver.operator.Analytic;
import org.annulet.solver.operator.AnalyticFunction;

/**
 * A perforated plate with flow between two gas volumes, as one port on the mean pressures of its
 * two sides: p̂₁ − p̂₂ = z(s) (ρc)₁ û, z as that of {@link PerforatedLiner} without a back.
 *
 * @param plate holes and pitch
 * @param biasVelocity U in the holes in m/s, positive
 */
public record PerforatedScreen(PerforatedLiner.Plate plate, double biasVelocity)
    implements TwoPort {
  @Override
  public AnalyticFunction[][] mobility(EdgeGas first, EdgeGas second) {
    AnalyticFunction y =
        new PerforatedLiner(plate, biasVelocity, Double.POSITIVE_INFINITY).admittance(first);
    AnalyticFunction plus =
        Analytic.product(Analytic.power(1 / first.characteristicImpedance(), 1), y);
    AnalyticFunction minus = Analytic.product(Analytic.constant(-1), plus);
    return new AnalyticFunction[][] {{plus, minus}, {minus, plus}};
  }
}
