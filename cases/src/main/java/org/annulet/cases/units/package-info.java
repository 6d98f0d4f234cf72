/**
 * Quantities as people write them, {@code 12 mm} or {@code 287 J/(kg K)}, to SI numbers.
 *
 * <p>A quantity is a decimal number, any spaces, and a unit. A unit is a product of unit symbols,
 * separated by spaces, {@code ·} or {@code *}, over at most one {@code /}; more than one symbol
 * below the line needs brackets. Powers are written {@code m2}, {@code m^2} or {@code m²}. Case
 * matters: {@code mW} is no {@code MW}. Nothing is guessed: what has two readings is refused, with
 * the reading to write instead.
 *
 * <p>Three choices beyond the SI brochure (BIPM, 9th edition, 2019) make silent errors visible:
 * cycles and radians count as dimensions, so {@code Hz} (a frequency) and {@code 1/s} (a growth
 * rate) cannot be mixed up, nor an angle with a plain number; {@code °C} is accepted only alone,
 * for a temperature, and shifts the zero by 273.15 K; pressures are absolute.
 *
 * <p>Conversion is done in decimal arithmetic and rounded once, so {@code 0.1 mm} is the double
 * nearest to 1e-4.
 */
package org.annulet.cases.units;
