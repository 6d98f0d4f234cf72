package org.annulet.solver.assembly;

import java.util.Map;

/**
 * Half-plane (x, r) of an axisymmetric chamber: y of the mesh is the radius; the field varies as
 * e^{imθ}.
 *
 * @param order azimuthal order m, not negative (m and −m are alike)
 * @param ducts zones that are N separate tubes, by name; copied
 */
public record Section(int order, Map<String, Ducts> ducts) implements Geometry {
  /** Checks the order and copies the ducts. */
  public Section {
    if (order < 0) {
      throw new IllegalArgumentException("azimuthal order must not be negative, got " + order);
    }
    ducts = Map.copyOf(ducts);
  }

  /** A section without separate ducts. */
  public Section(int order) {
    this(order, Map.of());
  }

  /** The same section at another order. */
  public Section withOrder(int m) {
    return new Section(m, ducts);
  }

  /**
   * Identical tubes side by side round the axis: weight 2πr times the open share, no m²/r² term.
   * One term per order stands for all of them, for 2|m| &lt; count.
   *
   * @param count number of tubes N, positive
   * @param openShare part of the circle's area that the tubes take, in (0, 1]
   */
  public record Ducts(int count, double openShare) {
    /** Checks number and share. */
    public Ducts {
      if (count < 1) {
        throw new IllegalArgumentException("number of ducts must be positive, got " + count);
      }
      if (!(openShare > 0 && openShare <= 1)) {
        throw new IllegalArgumentException("open share must lie in (0, 1], got " + openShare);
      }
    }
  }
}
