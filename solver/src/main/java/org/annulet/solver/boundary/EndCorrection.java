package org.annulet.solver.boundary;

/** Length a neck or pipe seems longer by at an end, over its radius; low-frequency limits. */
public final class EndCorrection {
  /** Unflanged: Levine and Schwinger 1948, Phys. Rev. 73, 383; their integral evaluated. */
  public static final double UNFLANGED = 0.612701;

  /** Infinite flange: Norris and Sheng 1989, J. Sound Vib. 135, 85 (from memory). */
  public static final double FLANGED = 0.8217;

  /** Rigid piston in a flange, 8/(3π): an upper bound (Rayleigh). */
  public static final double PISTON = 8 / (3 * Math.PI);

  private EndCorrection() {}

  /**
   * Into a wider pipe or volume: 8/(3π) (1 − 1.25 ξ) (Ingard 1953, J. Acoust. Soc. Am. 25, 1037;
   * from memory).
   *
   * @param diameterRatio ξ, neck over volume, in [0, 0.4)
   */
  public static double intoVolume(double diameterRatio) {
    if (!(diameterRatio >= 0 && diameterRatio < 0.4)) {
      throw new IllegalArgumentException(
          "the interior end correction holds for a diameter ratio in [0, 0.4), got "
              + diameterRatio);
    }
    return PISTON * (1 - 1.25 * diameterRatio);
  }
}
