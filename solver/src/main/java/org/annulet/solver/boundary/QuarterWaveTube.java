package org.annulet.solver.boundary;

import java.util.ArrayList;
import java.util.List;
import org.annulet.solver.operator.AnalyticFunction;
import org.apache.commons.math3.complex.Complex;

/**
 * A tube closed at its far end, z = r + coth(sℓ/c).
 *
 * @param density ρ of the gas in the tube in kg/m³
 * @param soundSpeed c of the gas in the tube in m/s
 * @param mouth area, effective length and resistance
 */
public record QuarterWaveTube(double density, double soundSpeed, Mouth mouth) implements Damper {
  /** Checks the gas. */
  public QuarterWaveTube {
    if (!(density > 0 && soundSpeed > 0)) {
      throw new IllegalArgumentException(
          "gas of a tube must have positive density and sound speed, got "
              + density
              + " kg/m³ and "
              + soundSpeed
              + " m/s");
    }
  }

  /**
   * Size of a tube.
   *
   * @param area in m²
   * @param effectiveLength ℓ in m, with its outer end correction
   * @param resistance r at the mouth, specific, not negative and not 1
   */
  public record Mouth(double area, double effectiveLength, double resistance) {
    /** Checks the numbers. */
    public Mouth {
      if (!(area > 0 && effectiveLength > 0 && resistance >= 0) || resistance == 1) {
        throw new IllegalArgumentException(
            "tube must have positive area and length, resistance not negative and not 1; got "
                + area
                + " m², "
                + effectiveLength
                + " m, "
                + resistance);
      }
    }
  }

  @Override
  public double mouthArea() {
    return mouth.area();
  }

  @Override
  public AnalyticFunction flow() {
    return new Flow(
        mouth.area() / (density * soundSpeed),
        mouth.effectiveLength() / soundSpeed,
        mouth.resistance());
  }

  /** factor · s/(r + coth(s time)). */
  private record Flow(double factor, double time, double r) implements AnalyticFunction {
    /** tanh, by the exponential that decays. */
    private static Complex tanh(Complex x) {
      if (x.getReal() < 0) {
        return tanh(x.negate()).negate();
      }
      Complex e = x.multiply(-2).exp();
      return Complex.ONE.subtract(e).divide(Complex.ONE.add(e));
    }

    @Override
    public Complex value(Complex s) {
      Complex t = tanh(s.multiply(time));
      return s.multiply(t).divide(t.multiply(r).add(1)).multiply(factor);
    }

    @Override
    public Complex derivative(Complex s) {
      Complex t = tanh(s.multiply(time));
      Complex d = t.multiply(r).add(1);
      Complex slope = Complex.ONE.subtract(t.multiply(t)).multiply(time);
      return t.divide(d).add(s.multiply(slope).divide(d.multiply(d))).multiply(factor);
    }

    @Override
    public List<Complex> poles(Complex lower, Complex upper) {
      // r tanh x = −1: e^{2x} = (r − 1)/(r + 1)
      double re = 0.5 * Math.log(Math.abs((r - 1) / (r + 1)));
      double first = r < 1 ? 0.5 : 0;
      List<Complex> inside = new ArrayList<>();
      if (lower.getReal() * time <= re && re <= upper.getReal() * time) {
        long from = (long) Math.ceil(lower.getImaginary() * time / Math.PI - first);
        long to = (long) Math.floor(upper.getImaginary() * time / Math.PI - first);
        for (long k = from; k <= to; k++) {
          inside.add(new Complex(re, (k + first) * Math.PI).divide(time));
        }
      }
      return inside;
    }

    @Override
    public double longestDelay() {
      return 2 * time;
    }
  }
}
