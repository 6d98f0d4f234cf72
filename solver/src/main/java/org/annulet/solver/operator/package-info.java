/**
 * The discrete Helmholtz operator: linear triangles, weights of section, ring, cross-section and
 * plane, walls, flames and ports.
 *
 * <pre>
 *   ∇·(1/ρ ∇p̂) − s²/(γp̄) p̂ = − s (γ−1)/(γp̄) q̂,      s ρ û = −∇p̂
 *   L(s) p = [ K + s² M + Σ a_i(s) A_i ] p + Σ U_j Φ_j(s) V_jᵀ p = 0
 * </pre>
 */
package org.annulet.solver.operator;
