package org.annulet.solver.medium;

/**
 * The annular gap of a ring's zone, over which a three-dimensional field is averaged.
 *
 * @param innerRadius in m, at least 0
 * @param outerRadius in m, above the inner
 * @param unrolledRadius R₀ of the mesh's arc coordinate y = R₀θ in m
 * @param sectorCount 1 when the data go all the way round, N when they hold one of N like sectors
 */
public record RingShell(
    double innerRadius, double outerRadius, double unrolledRadius, int sectorCount) {
  /** Checks the order of the radii. */
  public RingShell {
    if (!(innerRadius >= 0 && outerRadius > innerRadius && unrolledRadius > 0)
        || Double.isInfinite(outerRadius)
        || Double.isInfinite(unrolledRadius)) {
      throw new IllegalArgumentException(
          "radii must satisfy 0 ≤ inner < outer and R₀ > 0, got "
              + innerRadius
              + ", "
              + outerRadius
              + " and "
              + unrolledRadius
              + " m");
    }
    if (sectorCount < 1) {
      throw new IllegalArgumentException("sector count must be at least 1, got " + sectorCount);
    }
  }

  /** Arc of one sector in m: 2πR₀/N. */
  public double period() {
    return 2 * Math.PI * unrolledRadius / sectorCount;
  }
}
