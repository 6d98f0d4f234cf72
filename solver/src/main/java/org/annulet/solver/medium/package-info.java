/**
 * The gas at rest: what fills each triangle.
 *
 * <pre>
 *   ρ c² = γ p̄,   p̄ uniform (no mean flow, low Mach number)
 *   c² = γ R T,  R = R_u/M,  γ = cp/(cp − R),  cp(T) from NASA 7-coefficient polynomials
 *   of a triangle:  1/c = mean of 1/c over its area,  1/γ = mean of 1/γ,  ρ = γ p̄/c²
 * </pre>
 *
 * <p>ρ density in kg/m³, c sound speed in m/s (composition frozen), p̄ mean pressure in Pa, γ ratio
 * of specific heats, T temperature in K, R in J/(kg K), M molar mass in kg/mol.
 *
 * <p>Sources: McBride, Gordon and Reno 1993, NASA TM-4513 (gas data); Wagner and Pruß 2002, J.
 * Phys. Chem. Ref. Data 31, 387 (vapour pressure of water); Franke and Nielson 1980 (weights of the
 * scattered fit). Not here: rich flames, condensed water, real-gas effects, liquid fuel.
 */
package org.annulet.solver.medium;
