/**
 * Flames: how much heat they release, where, what they listen to and how they answer.
 *
 * <pre>
 *   q̂(x) = Q̂ h(x),  ∫ w h = 1
 *   velocity:  Q̂/Q̄ = F(s) û_ref/ū_ref,   s û = −⟨n·∇p̂/ρ⟩     (mean over the reference)
 *   pressure:  Q̂/Q̄ = F(s) ⟨p̂⟩/p̄
 * </pre>
 *
 * <p>Q̄ mean heat release in W; ū_ref mean velocity at the reference in m/s; F dimensionless; n–τ:
 * F = n e^{−sτ} with the interaction index n and the delay τ in s (Crocco and Cheng 1956, from
 * memory). The density enters through the gas at the reference itself. What a flame does not know
 * here: mean flow, entropy waves, saturation.
 */
package org.annulet.solver.flame;
