/**
 * A chamber as a chain of ducts: plane and azimuthal duct waves, one scalar equation for each
 * order.
 *
 * <pre>
 *   p̂′ = −(ρ/A) V̂,   V̂′ = −(A/ρ) κ² p̂,   V̂ = s Û
 *   κ² = s²/c² + (m/R)² + s y(s) P/(c A)
 *   (p̂, V̂)(L) = [ cosh κL , −(ρ/A) sinh(κL)/κ ; −(A/ρ) κ sinh κL , cosh κL ] (p̂, V̂)(0)
 * </pre>
 *
 * <p>p̂ pressure in Pa, Û volume flow in m³/s, A area in m², ρ density in kg/m³, c sound speed in
 * m/s, R mean radius in m (no such term in separate ducts), m azimuthal order, y the specific
 * admittance of a wall along the duct on the perimeter P in m. With V̂ for Û every entry is an even
 * function of κ and free of poles at s = 0. On an annulus this is the wave e^{imθ ± i kₓ x} with
 * kₓ² = (ω/c)² − (m/R)² at s = iω.
 *
 * <p>Between ducts p̂ and V̂ go on unchanged (area step), or as a {@link
 * org.annulet.solver.boundary.TwoPort} says; a flame sheet adds s (γ−1)/(γp̄) q̂ to V̂. The state
 * starts at the upstream end as that end demands and meets the demand of the downstream end where s
 * is an eigenvalue. Two-ports are carried through multiplied by their transfer admittance, and the
 * determinant by (s − s_k) for every pole s_k of a coefficient, so that it has no poles in the
 * window. Its zeros are counted by the argument principle, tile by tile, and once more round the
 * whole window.
 *
 * <p>Sources: transfer matrices of ducts, Munjal, Acoustics of Ducts and Mufflers, ch. 2; duct
 * waves of a thin annulus, Stow and Dowling, ASME GT2001-0037; both from memory, the equations are
 * derived from the wave equation and checked against rows C1, C10, C13, D1 to D3, D5, D10 and E1 of
 * the reference values.
 *
 * <p>What it does not do: near fields at steps, waves across the duct, coupling of orders.
 */
package org.annulet.solver.network;
