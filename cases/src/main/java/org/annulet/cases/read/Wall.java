package org.annulet.cases.read;

/** What a named edge or a face of a ring does to the gas. Edges without one are rigid. */
public sealed interface Wall {
  /** Whether it takes energy out of the gas or feeds it. */
  default boolean takesEnergy() {
    return !(this instanceof Rigid || this instanceof Open);
  }

  /** No flow through it. */
  record Rigid() implements Wall {}

  /** Pressure held: p̂ = 0. */
  record Open() implements Wall {}

  /**
   * Specific impedance Z/(ρc), the same at every frequency; conjugate in the lower half plane.
   *
   * @param re real part
   * @param im imaginary part for Im s &gt; 0
   */
  record Impedance(double re, double im) implements Wall {}

  /**
   * Specific admittance ρc/Z, the same at every frequency; conjugate in the lower half plane.
   *
   * @param re real part
   * @param im imaginary part for Im s &gt; 0
   */
  record Admittance(double re, double im) implements Wall {}

  /**
   * Compact choked nozzle: y = (γ − 1)/2 · M, a plane-wave result (Marble and Candel 1977).
   *
   * @param mach Mach number M of the mean flow just before the nozzle
   */
  record ChokedNozzle(double mach) implements Wall {}

  /** What a table over frequency gives. */
  enum Quantity {
    /** Z/(ρc). */
    IMPEDANCE,
    /** ρc/Z. */
    ADMITTANCE,
    /** (z − 1)/(z + 1). */
    REFLECTION
  }

  /**
   * Known over frequency.
   *
   * @param quantity what the table gives
   * @param table its values at s = 2πi f
   */
  record Tabulated(Quantity quantity, FrequencyTable table) implements Wall {}

  /**
   * A plate with round holes and bias flow before a cavity with a rigid back.
   *
   * @param holeBore diameter of a hole in m
   * @param pitch square, from hole to hole, in m
   * @param thickness in m
   * @param biasVelocity in the holes in m/s
   * @param cavityDepth in m; ∞ for constant pressure behind the plate
   */
  record Perforated(
      double holeBore, double pitch, double thickness, double biasVelocity, double cavityDepth)
      implements Wall {}

  /** What surrounds an opening. */
  enum Rim {
    /** A wide wall. */
    FLANGED,
    /** Nothing. */
    UNFLANGED
  }

  /**
   * An opening that radiates.
   *
   * @param radius in m
   * @param rim what surrounds it
   */
  record RadiatingEnd(double radius, Rim rim) implements Wall {}
}
