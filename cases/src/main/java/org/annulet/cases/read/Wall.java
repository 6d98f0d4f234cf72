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
}
