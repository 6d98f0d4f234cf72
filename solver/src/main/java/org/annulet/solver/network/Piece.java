package org.annulet.solver.network;

import java.util.List;
import org.annulet.solver.boundary.EdgeGas;
import org.annulet.solver.boundary.TwoPort;
import org.annulet.solver.operator.AnalyticFunction;

/** A piece of the chain; between two pieces pressure and volume flow go on unchanged. */
public sealed interface Piece {
  /**
   * A uniform duct.
   *
   * @param length in m
   * @param area in m²
   * @param radius mean radius R of the annulus in m; ∞ where no wave runs round it
   * @param gas in it
   * @param walls reacting walls along it; others are rigid
   */
  record Duct(double length, double area, double radius, EdgeGas gas, List<SideWall> walls)
      implements Piece {
    /** Checks the sizes. */
    public Duct {
      if (!(length > 0 && area > 0 && radius > 0)) {
        throw new IllegalArgumentException(
            "length, area and radius of a duct must be positive, got "
                + length
                + " m, "
                + area
                + " m², "
                + radius
                + " m");
      }
      walls = List.copyOf(walls);
    }
  }

  /**
   * A loss or a measured matrix.
   *
   * @param port what joins the two sides
   * @param first gas upstream
   * @param second gas downstream
   * @param area in m² that its velocities refer to
   */
  record Coupling(TwoPort port, EdgeGas first, EdgeGas second, double area) implements Piece {}

  /**
   * Gas that moves as one, as in the near field of a step: p̂₁ − p̂₂ = (ρℓ/A) V̂.
   *
   * @param inertance ρℓ/A in kg/m⁴
   */
  record Inertia(double inertance) implements Piece {}

  /**
   * A thin flame.
   *
   * @param heard what it answers to
   * @param strength (γ−1)/(γp̄) Q̄ over mean velocity or pressure: m² for velocity, m³/(Pa s) for
   *     pressure
   * @param response F(s)
   */
  record Sheet(Heard heard, double strength, AnalyticFunction response) implements Piece {}
}
