package org.annulet.solver.boundary;

import java.util.OptionalDouble;
import org.annulet.solver.rational.PoleResidue;
import org.annulet.solver.rational.Table;
import org.annulet.solver.rational.VectorFit;
import org.apache.commons.math3.complex.Complex;

/**
 * Conductivity of a round hole through which gas flows, over its diameter: κ = K/(2a) = Γ + iΔ at
 * the Strouhal number St = ωa/U (Howe 1979, Proc. R. Soc. A 366, 205; formula from memory, its
 * limits Δ → πSt/4 and Γ → 1 checked):
 *
 * <pre>
 *   Γ − iΔ = 1 + [ (π/2) I₁ e^{−St} − i K₁ sinh St ] / ( St [ (π/2) I₁ e^{−St} + i K₁ cosh St ] )
 * </pre>
 *
 * <p>Off the imaginary axis, as a function of σ = sa/U, it is a stable real-rational function
 * fitted to that up to St = {@value #TOP}; above, κ → 1 by itself.
 */
final class RayleighConductivity {
  private static final double TOP = 30;
  private static final int ROWS = 240;
  private static final int ORDER = 14;

  private RayleighConductivity() {}

  /** κ at St on the imaginary axis, exp(iωt). */
  static Complex at(double strouhal) {
    if (strouhal == 0) {
      return Complex.ZERO;
    }
    double i1 = scaledI1(strouhal); // times e^{−St}
    double k1 = k1(strouhal);
    Complex up = new Complex(Math.PI / 2 * i1, -k1 * Math.sinh(strouhal));
    Complex down = new Complex(Math.PI / 2 * i1, k1 * Math.cosh(strouhal)).multiply(strouhal);
    return up.divide(down).add(1).conjugate();
  }

  /** Holds the fit, which is made once. */
  private static final class Fitted {
    static final PoleResidue KAPPA = fit();
  }

  /** κ(σ), σ in place of s. */
  static PoleResidue rational() {
    return Fitted.KAPPA;
  }

  private static PoleResidue fit() {
    double[] f = new double[ROWS];
    Complex[] v = new Complex[ROWS];
    for (int k = 0; k < ROWS; k++) {
      double x = (double) k / (ROWS - 1);
      double strouhal = TOP * x * x * x; // close together where κ begins
      f[k] = strouhal / (2 * Math.PI);
      v[k] = at(strouhal);
    }
    return VectorFit.of(new Table(f, v), 1e-7, ORDER, OptionalDouble.of(0)).function();
  }

  /** e^{−x} I₁(x) = (1/π) ∫₀^π e^{x(cos t − 1)} cos t dt; the trapezium rule converges fast. */
  private static double scaledI1(double x) {
    int n = 200;
    double sum = 0;
    for (int k = 0; k <= n; k++) {
      double t = Math.PI * k / n;
      double w = k == 0 || k == n ? 0.5 : 1;
      sum += w * Math.exp(x * (Math.cos(t) - 1)) * Math.cos(t);
    }
    return sum / n;
  }

  /** K₁(x) = ∫₀^∞ e^{−x cosh t} cosh t dt. */
  private static double k1(double x) {
    double end = Math.log(2 * (745 / x + 1));
    int n = 4000;
    double h = end / n;
    double sum = 0.5 * Math.exp(-x);
    for (int k = 1; k <= n; k++) {
      double c = Math.cosh(k * h);
      sum += Math.exp(-x * c) * c;
    }
    return h * sum;
  }
}
