/**
 * The shape of the gas before it is meshed: named points, edges that are true curves, zones bounded
 * by loops of edges; and the ring of N burner cells given by its zones' radii, gaps and lengths.
 *
 * <p>An edge is a chain of {@link org.annulet.mesher.geometry.CurvePiece pieces} C(t), 0 ≤ t ≤ 1,
 * each a straight line, a circular arc or a cubic. Two pieces are told apart by recursive halving:
 * a piece deviates from its chord by at most a bound δ ≤ max|C″| / 8 (chord interpolation error;
 * for an arc of angle φ and radius R exactly R (1 − cos φ/2)), so two pieces are disjoint where the
 * distance of their chords exceeds δ₁ + δ₂. The area of a zone is ½ ∮ (x dy − y dx) over its loops.
 *
 * <p>All lengths in metres. Nothing here knows sizes, nodes or triangles.
 */
package org.annulet.mesher.geometry;
