package org.annulet.solver.boundary;

import java.util.List;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.rational.PoleResidue;
import org.annulet.solver.rational.RectangleZeros;
import org.apache.commons.math3.complex.Complex;

/**
 * A plate with round holes on a square pitch through which cooling gas flows, before a cavity with
 * a rigid back:
 *
 * <pre>
 *   z = (s d²/c) [ 1/(2aκ) + t/(πa²) ] + coth(sD/c),   κ at σ = sa/U
 * </pre>
 *
 * <p>with κ the conductivity of a hole with bias flow (Howe 1979), t the thickness, D the depth;
 * without a back the last term is left out and p̂ = 0 behind the plate. Where z has zeros near the
 * window, infinitely many modes gather: {@link AnalyticFunction#poles} of the admittance are those
 * points.
 *
 * @param plate holes and pitch
 * @param biasVelocity U of the shear layers in the holes in m/s, positive
 * @param depth D of the cavity in m; ∞ for constant pressure behind the plate
 */
public record PerforatedLiner(Plate plate, double biasVelocity, double depth)
    implements ReactingWall {
  /** Checks the numbers. */
  public PerforatedLiner {
    if (!(biasVelocity > 0 && depth > 0)) {
      throw new IllegalArgumentException(
          "bias velocity and depth must be positive, got "
              + biasVelocity
              + " m/s and "
              + depth
              + " m");
    }
  }

  /**
   * A perforated plate.
   *
   * @param radius a of a hole in m
   * @param pitch d from hole to hole in m
   * @param thickness t in m
   */
  public record Plate(double radius, double pitch, double thickness) {
    /** Checks that holes fit into their pitch. */
    public Plate {
      if (!(radius > 0 && pitch > 2 * radius && thickness >= 0)) {
        throw new IllegalArgumentException(
            "holes must have a size and fit into their pitch, thickness not negative; got radius "
                + radius
                + " m, pitch "
                + pitch
                + " m, thickness "
                + thickness
                + " m");
      }
    }

    /** Open area over area. */
    public double porosity() {
      return Math.PI * radius * radius / (pitch * pitch);
    }
  }

  @Override
  public AnalyticFunction admittance(EdgeGas gas) {
    return new Function(this, gas.soundSpeed(), RayleighConductivity.rational());
  }

  /** y = 1/z. */
  private record Function(PerforatedLiner liner, double c, PoleResidue kappa)
      implements AnalyticFunction {
    private double strouhalPerRate() {
      return liner.plate.radius / liner.biasVelocity;
    }

    private Complex z(Complex s) {
      Plate p = liner.plate;
      double area = p.pitch * p.pitch / c;
      Complex sigma = s.multiply(strouhalPerRate());
      Complex hole = kappa.value(sigma).multiply(2 * p.radius).reciprocal();
      double neck = p.thickness / (Math.PI * p.radius * p.radius);
      Complex z = s.multiply(area).multiply(hole.add(neck));
      return Double.isInfinite(liner.depth) ? z : z.add(coth(s.multiply(liner.depth / c)));
    }

    private static Complex coth(Complex x) {
      if (x.getReal() < 0) {
        return coth(x.negate()).negate();
      }
      Complex e = x.multiply(-2).exp();
      return Complex.ONE.add(e).divide(Complex.ONE.subtract(e));
    }

    @Override
    public Complex value(Complex s) {
      return z(s).reciprocal();
    }

    @Override
    public Complex derivative(Complex s) {
      double h = 1e-5 * Math.max(1, s.abs());
      Complex slope = z(s.add(h)).subtract(z(s.subtract(h))).divide(2 * h);
      Complex y = value(s);
      return slope.multiply(y).multiply(y).negate();
    }

    @Override
    public List<Complex> poles(Complex lower, Complex upper) {
      return RectangleZeros.of(this::numerator, lower, upper);
    }

    /** z times what takes its poles away: κ and sinh. */
    private Complex numerator(Complex s) {
      Complex k = kappa.value(s.multiply(strouhalPerRate()));
      for (Complex p : kappa.poleList()) {
        k = k.multiply(s.multiply(strouhalPerRate()).subtract(p).divide(p.abs()));
      }
      Complex all = z(s).multiply(k);
      if (!Double.isInfinite(liner.depth)) {
        all = all.multiply(s.multiply(liner.depth / c).sinh());
      }
      return all;
    }

    @Override
    public double longestDelay() {
      return Double.isInfinite(liner.depth) ? 0 : 2 * liner.depth / c;
    }
  }
}
