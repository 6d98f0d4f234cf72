/**
 * From mesh, gas, walls and flames to the discrete operator.
 *
 * <pre>
 *   K = ∫ w/ρ (∇φ_i·∇φ_k + (m²/r² + k²) φ_i φ_k)       M = ∫ w/(γp̄) φ_i φ_k
 *   wall:   s y(s) · ∮ w/(ρc) φ_i φ_k
 *   flame:  Φ(s) f gᵀ,  f_i = ∫ w (γ−1)/(γp̄) h φ_i,  ∫ w h = 1
 *           velocity: g = ⟨n·∇φ/ρ⟩, Φ = Q̄/ū · F(s);  pressure: g = ⟨φ⟩, Φ = −s Q̄/p̄ · F(s)
 * </pre>
 *
 * <p>Linear triangles. The weight w: section 2πr (in separate ducts times their open share, and
 * without m²/r²); ring: gap height; cross-section: 1 m; plane: depth. On a ring R₀ is the radius of
 * the unrolled arc and R_z the mean radius of a zone: lengths along the arc are R_z/R₀ times those
 * of the mesh, so the arc stiffness carries R₀/R_z, axial stiffness, mass, heat release and walls
 * R_z/R₀; faces count with r_face/R₀ and without the gap height. Integrals with 1/r are taken with
 * the seven-point rule of degree five (Radon 1948, from memory), all of whose points lie off the
 * axis; on the axis p̂ = 0 for m ≥ 1. Everything else is exact for gas that is constant on a
 * triangle.
 *
 * <p><em>A sheet's velocity</em> comes from the consistent flux of its upstream side: with v = 1 on
 * the sheet, −s A ⟨û·n⟩ = vᵀ (K_up + s² M_up + s C_up) p, second order in the mesh size. Ports that
 * touch a sheet from upstream are not seen by it.
 *
 * <p><em>Bloch number q of a ring</em> of N cells, α = 2π/N: on the half cell the field is e + i o,
 * on its mirror image e − i o; o = 0 on the mirror line, and on the seam e = cos(qα/2) b, o =
 * sin(qα/2) b with one unknown b. In e, o, b the cell's matrices are real symmetric; a flame that
 * is mirror-symmetric touches only e and b.
 */
package org.annulet.solver.assembly;
