package org.annulet.cases.read;

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
 */
public record TwoPort(
    String edge,
    String flowFrom,
    OptionalDouble lossCoefficient,
    OptionalDouble pressureDrop,
    double velocity,
    double effectiveLength) {}
