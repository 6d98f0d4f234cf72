package org.annulet.solver.assembly;

import java.util.Map;

/**
 * Thin annuli unrolled: x is the axis, y the arc at the radius R₀. A whole ring has a mesh with the
 * period 2πR₀, burner j (from 1) at y = (j − 1) · 2πR₀/N; a half cell has a mesh with 0 ≤ y ≤ πR₀/N
 * and its burner at y = 0.
 *
 * @param burnerCount N, positive
 * @param unrolledRadius R₀ in m, positive
 * @param zones mean radius and gap height by zone name; copied
 */
public record Ring(int burnerCount, double unrolledRadius, Map<String, Annulus> zones)
    implements Geometry {
  /** Checks number and radius and copies the zones. */
  public Ring {
    if (burnerCount < 1) {
      throw new IllegalArgumentException("number of burners must be positive, got " + burnerCount);
    }
    if (!(unrolledRadius > 0) || Double.isInfinite(unrolledRadius)) {
      throw new IllegalArgumentException(
          "unrolled radius must be positive and finite, got " + unrolledRadius + " m");
    }
    zones = Map.copyOf(zones);
  }

  /** Arc of one burner cell at R₀ in m. */
  public double pitch() {
    return 2 * Math.PI * unrolledRadius / burnerCount;
  }

  /**
   * A zone of a ring. A zone of separate ducts is described by the same two numbers: its arc in the
   * mesh times meanRadius/R₀ times the gap is the area of the duct.
   *
   * @param meanRadius R_z in m, positive
   * @param gap height in m, positive, at most 2 R_z
   */
  public record Annulus(double meanRadius, double gap) {
    /** Checks radius and gap. */
    public Annulus {
      if (!(meanRadius > 0) || Double.isInfinite(meanRadius)) {
        throw new IllegalArgumentException(
            "mean radius must be positive and finite, got " + meanRadius + " m");
      }
      if (!(gap > 0 && gap <= 2 * meanRadius)) {
        throw new IllegalArgumentException(
            "gap must be positive and at most twice the mean radius, got " + gap + " m");
      }
    }
  }
}
