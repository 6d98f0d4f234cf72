/**
 * A chamber as its ports see it, and its modes with dampers on some of them.
 *
 * <pre>
 *   L(s) = L₀(s) + Σ_k a_k(s) b_k b_kᵀ            a_k = s Y_k, b_k mean over the mouth of port k
 *   H(s) = Bᵀ L₀(s)⁻¹ B = Σ_i B ᵀX_i N_i⁻¹ Q_iᵀB / (s − s_i) + smooth,    N_i = Q_iᵀ L₀′(s_i) X_i
 *   det L(s) = det L₀(s) · det(1 + diag(a) H(s))
 * </pre>
 *
 * <p>s_i the modes of the chamber without dampers (each as often as it occurs), X_i and Q_i their
 * right and left vectors. The condensation is exact at any strength of the dampers; what is
 * approximated is the smooth part alone, by a polynomial fitted to full solves on the edge of a
 * region and checked by full solves inside it. A mode that a set of ports does not see (a member of
 * a pair with its nodes at every damper) stays an eigenvalue: the zeros of det L are counted, not
 * those of the small determinant.
 *
 * <p>s = σ + iω in 1/s, p' = Re(p̂ e^{st}); H in s² Pa/m³, a in m³/(s² Pa). Not here: where dampers
 * should sit.
 */
package org.annulet.solver.ports;
