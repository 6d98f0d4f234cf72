/**
 * What a mode means: labels read off the field, shares of energy, the growth budget.
 *
 * <p>p'(x,t) = Re(p̂(x) e^{st}), s = σ + iω; growth rate σ = Re s in 1/s, positive grows; frequency
 * Im s/2π in Hz. On a section the field turns with e^{imθ}; a field e^{imθ} with m &gt; 0 runs
 * towards smaller θ, since its phase is mθ + ωt.
 *
 * <pre>
 *   c_m(strip) = ∫ p̂ e^{−imθ} dA / ∫ dA,      E_m = Σ_strips |c_m|² ∫ dA
 *   σ = − Σ_j Re( pᴴT_j p / s ) / G,          G = pᴴM p + pᴴK p / |s|²
 * </pre>
 *
 * <p>T_j is a term of the operator (wall, flame, port, two-port). The second line follows from
 * pᴴL(s)p = 0 divided by s: K and M being real symmetric, the real part is σG + Σ Re(pᴴT_j p/s) =
 * 0.
 */
package org.annulet.post.meaning;
