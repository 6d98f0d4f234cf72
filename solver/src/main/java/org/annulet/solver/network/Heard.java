package org.annulet.solver.network;

/**
 * What a flame of the chain answers to; stations count the boundaries between pieces, 0 being the
 * upstream end. They must lie upstream of the flame or at it.
 */
public sealed interface Heard {
  /**
   * Velocity through a station.
   *
   * @param station number
   * @param area in m² the volume flow is divided by
   */
  record Velocity(int station, double area) implements Heard {}

  /**
   * Mean velocity between two stations of one duct.
   *
   * @param from number of the upstream station
   * @param to number of the downstream station
   * @param inertia ρ times the distance in kg/m²
   */
  record MeanVelocity(int from, int to, double inertia) implements Heard {}

  /**
   * Pressure at a station.
   *
   * @param station number
   */
  record Pressure(int station) implements Heard {}
}
