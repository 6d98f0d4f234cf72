/**
 * Derivatives of eigenvalues with respect to anything the operator depends on.
 *
 * <pre>
 *   L(s,θ) p = 0,  qᵀL(s,θ) = 0:     ds/dθ = − qᵀL_θ p / qᵀL_s p
 *   d²s/dθ² = − [ qᵀ(L_θθ + 2ṡ L_θs + ṡ² L_ss) p + 2 qᵀ(L_θ + ṡ L_s) ṗ ] / qᵀL_s p,
 *             L ṗ = − (L_θ + ṡ L_s) p
 *   pair:  (QᵀL_θP) y = − ṡ (QᵀL_sP) y     the two slopes, and the members that take them
 * </pre>
 *
 * <p>s in 1/s; θ in any unit; subscripts are partial derivatives. The transposes are not
 * conjugated: the sparse part of L is symmetric, and of a low-rank term U Φ Vᵀ the transpose is V
 * Φᵀ Uᵀ. Left vectors come from inverse iteration with Lᵀ on one factorisation a mode, corrected
 * once by their residual.
 *
 * <p>First order: Kato, Perturbation Theory for Linear Operators, chapter II (from memory);
 * nonlinear in s by implicit differentiation.
 *
 * <p>Left out: derivatives in a space that changes (an edge that opens or closes, another mesh).
 */
package org.annulet.solver.derivative;
