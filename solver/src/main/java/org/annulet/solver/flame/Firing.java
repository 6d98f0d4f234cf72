package org.annulet.solver.flame;

/**
 * How hard a flame burns and how it answers.
 *
 * @param heatRelease Q̄ in W of all burners of the flame together, as if all were fired like this
 *     one: a burner of a ring takes the N-th part
 * @param response F(s)
 */
public record Firing(double heatRelease, Response response) {
  /** Checks that the heat release is finite and not negative. */
  public Firing {
    if (!(heatRelease >= 0) || Double.isInfinite(heatRelease)) {
      throw new IllegalArgumentException(
          "heat release must be finite and not negative, got " + heatRelease + " W");
    }
  }
}
