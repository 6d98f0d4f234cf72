package org.annulet.solver.boundary;

import java.util.List;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.rational.PolynomialRatio;

/**
 * Necks and volumes in series, each neck a mass with a resistance, each volume a spring; one pair
 * is a Helmholtz resonator, z = r + (ℓ/c)(s + ω₀²/s) with ω₀² = c² A/(V ℓ).
 *
 * <p>Compact: neck and volume short against the wavelength.
 *
 * @param density ρ of the gas in the damper in kg/m³
 * @param soundSpeed c of the gas in the damper in m/s
 * @param stages from the mouth inwards, at least one
 */
public record ResonatorChain(double density, double soundSpeed, List<Stage> stages)
    implements Damper {
  /** Checks the gas and copies the stages. */
  public ResonatorChain {
    if (!(density > 0 && soundSpeed > 0)) {
      throw new IllegalArgumentException(
          "gas of a damper must have positive density and sound speed, got "
              + density
              + " kg/m³ and "
              + soundSpeed
              + " m/s");
    }
    if (stages.isEmpty()) {
      throw new IllegalArgumentException("a damper needs at least one neck with a volume");
    }
    stages = List.copyOf(stages);
  }

  /**
   * A neck and the volume behind it.
   *
   * @param area A of the neck in m²
   * @param effectiveLength ℓ of the neck in m with those end corrections that the model owns: the
   *     inner one, and of the outer one the part that the mesh does not carry
   * @param resistance r, specific, over the ρc of the damper's gas, not negative
   * @param volume V in m³
   */
  public record Stage(double area, double effectiveLength, double resistance, double volume) {
    /** Checks the numbers. */
    public Stage {
      if (!(area > 0 && effectiveLength > 0 && volume > 0 && resistance >= 0)) {
        throw new IllegalArgumentException(
            "neck and volume must be positive, resistance not negative; got area "
                + area
                + " m², effective length "
                + effectiveLength
                + " m, volume "
                + volume
                + " m³, resistance "
                + resistance);
      }
    }
  }

  @Override
  public double mouthArea() {
    return stages.get(0).area();
  }

  @Override
  public AnalyticFunction flow() {
    double[] n = {0}; // Y of what lies behind = n/d; behind the last volume a hard wall
    double[] d = {1};
    for (int k = stages.size() - 1; k >= 0; k--) {
      Stage stage = stages.get(k);
      double spring = stage.volume() / (density * soundSpeed * soundSpeed);
      double[] neck = {
        density * soundSpeed * stage.resistance() / stage.area(),
        density * stage.effectiveLength() / stage.area()
      };
      double[] behind =
          PolynomialRatio.sum(PolynomialRatio.product(new double[] {0, spring}, d), n);
      d = PolynomialRatio.sum(PolynomialRatio.product(neck, behind), d);
      n = behind;
    }
    return new PolynomialRatio(PolynomialRatio.product(new double[] {0, 1}, n), d);
  }

  /** Undamped resonance of a single stage, √(A/(Vℓ)) c/2π, in Hz. */
  public double firstStageFrequency() {
    Stage s = stages.get(0);
    return soundSpeed / (2 * Math.PI) * Math.sqrt(s.area() / (s.volume() * s.effectiveLength()));
  }
}
