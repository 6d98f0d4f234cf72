/**
 * The gas at rest: what fills each triangle.
 *
 * <pre>
 *   ρ c² = γ p̄,   p̄ uniform (no mean flow, low Mach number)
 * </pre>
 *
 * <p>ρ density in kg/m³, c sound speed in m/s, p̄ mean pressure in Pa, γ ratio of specific heats.
 */
package org.annulet.solver.medium;
