package org.annulet.solver.boundary;

import org.annulet.solver.operator.Analytic;
import org.annulet.solver.operator.AnalyticFunction;

/**
 * A 2 × 2 matrix over frequency: specific mobility, (û₁, û₂) = G (p̂₁, p̂₂)/(ρc)₁, both velocities
 * into the port, each entry a function fitted to the table.
 *
 * @param g11 of p̂₁ on û₁
 * @param g12 of p̂₂ on û₁
 * @param g21 of p̂₁ on û₂
 * @param g22 of p̂₂ on û₂
 */
public record MeasuredTwoPort(
    AnalyticFunction g11, AnalyticFunction g12, AnalyticFunction g21, AnalyticFunction g22)
    implements TwoPort {
  @Override
  public AnalyticFunction[][] mobility(EdgeGas first, EdgeGas second) {
    AnalyticFunction s = Analytic.power(1 / first.characteristicImpedance(), 1);
    return new AnalyticFunction[][] {
      {Analytic.product(s, g11), Analytic.product(s, g12)},
      {Analytic.product(s, g21), Analytic.product(s, g22)}
    };
  }
}
