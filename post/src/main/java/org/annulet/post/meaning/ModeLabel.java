package org.annulet.post.meaning;

/**
 * What a mode is called and why.
 *
 * @param azimuthalOrder |m|; null where the geometry has none (a plane)
 * @param orderShare share of that order in the field's azimuthal content, 1 where it is given
 * @param zone zone with the largest share of energy
 * @param zoneShare that share
 * @param energy shares of all zones
 * @param axialNodes nodes along the axis within that zone
 * @param overallAxialNodes nodes along the axis over all zones
 * @param radialNodes nodes across the axis within that zone
 * @param bulk whether the pressure of that zone moves as one (Helmholtz-like)
 * @param pairing whether the mode belongs to a pair
 * @param partner index of the other member of the pair in the list of modes, −1 without
 * @param pattern how it lies on the ring ("stands, nodal lines at 12° + k·60°"); empty where open
 *     or without meaning
 * @param origin acoustic or flame-born, where it was traced
 * @param text the label in words
 */
public record ModeLabel(
    Integer azimuthalOrder,
    double orderShare,
    String zone,
    double zoneShare,
    EnergyShares energy,
    int axialNodes,
    int overallAxialNodes,
    int radialNodes,
    boolean bulk,
    Pairing pairing,
    int partner,
    String pattern,
    Origin origin,
    String text) {

  /** Whether a mode belongs to an azimuthal pair. */
  public enum Pairing {
    /** By itself. */
    SINGLE,
    /** One of two modes with one eigenvalue; their orientation on the ring is open. */
    EXACT,
    /** One of two modes of the same shape, turned, whose eigenvalues have moved apart. */
    SPLIT
  }

  /** Where a mode comes from when the flames fade out. */
  public enum Origin {
    /** Not traced. */
    NOT_TRACED,
    /** It becomes a passive mode. */
    ACOUSTIC,
    /** It leaves with ever stronger damping: born by the flame's delay. */
    INTRINSIC,
    /** It passes close to another mode on the way and the two may have exchanged parts. */
    AMBIGUOUS
  }

  /** The same with its origin. */
  public ModeLabel withOrigin(Origin newOrigin) {
    String words =
        switch (newOrigin) {
          case INTRINSIC -> text + ", flame-born (intrinsic)";
          case AMBIGUOUS -> text + ", acoustic or flame-born (branches close)";
          default -> text;
        };
    return new ModeLabel(
        azimuthalOrder,
        orderShare,
        zone,
        zoneShare,
        energy,
        axialNodes,
        overallAxialNodes,
        radialNodes,
        bulk,
        pairing,
        partner,
        pattern,
        newOrigin,
        words);
  }
}
