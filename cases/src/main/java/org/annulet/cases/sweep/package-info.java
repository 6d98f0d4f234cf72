/**
 * What becomes of every mode while inputs of a case vary along one axis or two.
 *
 * <p>Every grid point is solved by itself on a reduced model trained for the sweep ({@code
 * ReducedPoints}), its modes counted by the argument principle. Modes of neighbouring points are
 * then joined by continuity of s and of the field: c = |Δs| / (0.05 |s|) + 1 − |⟨p, p′⟩|, the
 * smallest first; where a second choice is nearly as good, the step is halved. Where a growth rate
 * changes its sign between two points, the place is solved by the Illinois form of the rule of
 * false position (Dowell and Jarratt 1971, BIT 11, 168; from memory), one solve a step.
 */
package org.annulet.cases.sweep;
