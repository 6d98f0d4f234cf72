package org.annulet.solver.boundary;

import java.util.List;
import org.annulet.solver.operator.Analytic;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.rational.Table;
import org.annulet.solver.rational.VectorFit;
import org.apache.commons.math3.complex.Complex;

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
  private static final int LARGEST_ORDER = 12;

  /**
   * From a measured transfer matrix, (p̂₂/ρc, û₂) = T (p̂₁/ρc, û₁) with ρc of side 1 and both
   * velocities from side 1 to side 2, by a stable fit of each entry of the mobility.
   *
   * @param t entries T₁₁, T₁₂, T₂₁, T₂₂ over the same frequencies; T₁₂ nowhere zero
   * @param tolerance wanted of each fit, over its largest value
   */
  public static MeasuredTwoPort ofTransferMatrix(List<Table> t, double tolerance) {
    int n = t.get(0).frequency().length;
    Complex[][] g = new Complex[4][n];
    for (int k = 0; k < n; k++) {
      Complex t11 = t.get(0).value()[k];
      Complex t12 = t.get(1).value()[k];
      Complex t22 = t.get(3).value()[k];
      if (t12.abs() < 1e-9) {
        throw new IllegalArgumentException(
            "T12 vanishes at " + t.get(0).frequency()[k] + " Hz: nothing lies between the sides");
      }
      g[0][k] = t11.divide(t12).negate();
      g[1][k] = t12.reciprocal();
      g[2][k] = t.get(2).value()[k].subtract(t22.multiply(t11).divide(t12)).negate();
      g[3][k] = t22.divide(t12).negate();
    }
    AnalyticFunction[] fit = new AnalyticFunction[4];
    for (int e = 0; e < 4; e++) {
      fit[e] =
          VectorFit.of(new Table(t.get(0).frequency(), g[e]), tolerance, LARGEST_ORDER).function();
    }
    return new MeasuredTwoPort(fit[0], fit[1], fit[2], fit[3]);
  }

  /**
   * Least eigenvalue of (G + Gᴴ)/2 on the imaginary axis up to a frequency, in parts of its
   * largest; negative where the port feeds energy into the gas.
   *
   * @param highest in Hz
   */
  public double passivity(double highest) {
    double least = Double.POSITIVE_INFINITY;
    for (int k = 1; k <= 400; k++) {
      Complex s = new Complex(0, 2 * Math.PI * highest * k / 400);
      double a = g11.value(s).getReal();
      double d = g22.value(s).getReal();
      Complex b = g12.value(s).add(g21.value(s).conjugate()).divide(2);
      double middle = 0.5 * (a + d);
      double spread = Math.hypot(0.5 * (a - d), b.abs());
      least = Math.min(least, (middle - spread) / Math.max(1e-300, middle + spread));
    }
    return least;
  }

  @Override
  public AnalyticFunction[][] mobility(EdgeGas first, EdgeGas second) {
    AnalyticFunction s = Analytic.power(1 / first.characteristicImpedance(), 1);
    return new AnalyticFunction[][] {
      {Analytic.product(s, g11), Analytic.product(s, g12)},
      {Analytic.product(s, g21), Analytic.product(s, g22)}
    };
  }
}
