package org.annulet.cases.read;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * What lies between the two sides of an inner edge: pressure loss and inertia of a burner or
 * swirler.
 *
 * @param edge name of the inner edge
 * @param flowFrom name of the zone the mean flow comes from
 * @param lossCoefficient ζ, not negative; empty when the pressure drop is given instead, or neither
 * @param pressureDrop mean pressure drop in Pa; empty when the loss coefficient is given, or
 *     neither
 * @param velocity mean velocity the loss refers to in m/s; 0 without a loss
 * @param effectiveLength ℓ in m, not negative
 * @param special a perforated plate or a measured matrix in place of loss and length; empty for
 *     these
 */
public record TwoPort(
    String edge,
    String flowFrom,
    OptionalDouble lossCoefficient,
    OptionalDouble pressureDrop,
    double velocity,
    double effectiveLength,
    Optional<Special> special) {
  /** Loss and length. */
  public TwoPort(
      String edge,
      String flowFrom,
      OptionalDouble lossCoefficient,
      OptionalDouble pressureDrop,
      double velocity,
      double effectiveLength) {
    this(
        edge, flowFrom, lossCoefficient, pressureDrop, velocity, effectiveLength, Optional.empty());
  }

  /** What else may lie between two sides. */
  public sealed interface Special {}

  /**
   * A perforated plate with flow.
   *
   * @param plate holes, pitch and flow; without a cavity
   */
  public record Screen(Wall.Perforated plate) implements Special {}

  /**
   * A transfer matrix over frequency: (p̂₂/ρc, û₂) = T (p̂₁/ρc, û₁), ρc of side 1.
   *
   * @param entries T₁₁, T₁₂, T₂₁, T₂₂
   */
  public record Transfer(List<FrequencyTable> entries) implements Special {}
}
