/**
 * What the walls do to the gas, through their specific admittance y(s) = ρc û·n/p̂, n out of the
 * gas.
 *
 * <pre>
 *   wall term of the operator:  s y(s) · ∮ w/(ρc) φ_i φ_k
 *   z = 1/y = Z/(ρc),   reflection coefficient R = (z − 1)/(z + 1)
 * </pre>
 *
 * <p>y and z are dimensionless; a wall with Re y ≥ 0 on the imaginary axis takes energy out. s = σ
 * + iω in 1/s, p' = Re(p̂ e^{st}).
 */
package org.annulet.solver.boundary;
