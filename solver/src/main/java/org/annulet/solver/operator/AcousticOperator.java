package org.annulet.solver.operator;

import java.util.List;
import org.annulet.solver.sparse.SymmetricPattern;

/**
 * The discrete operator L(s) = K + s² M + Σ a_i(s) A_i + Σ U_j Φ_j(s) V_jᵀ of one problem: one
 * azimuthal order of a section, one Bloch number of a ring, a whole ring, a plane. All matrices are
 * real, all but the low-rank terms symmetric; only the scalar coefficients depend on s.
 *
 * <p>p'(x,t) = Re(p̂ e^{st}), s = σ + iω; growth rate Re s in 1/s, positive grows; frequency Im
 * s/2π in Hz.
 *
 * @param pattern where K, M and the A_i may be non-zero
 * @param stiffness K, on the pattern, in m³ · kg⁻¹ · m (weight over density times gradients
 *     squared); positive semidefinite
 * @param mass M, on the pattern, in m³/Pa; positive definite
 * @param sparseTerms walls
 * @param lowRankTerms flames, ports, two-ports
 * @param coordinates of each unknown, for the ordering of the factorisation, shape [2][n], m
 */
public record AcousticOperator(
    SymmetricPattern pattern,
    double[] stiffness,
    double[] mass,
    List<SparseTerm> sparseTerms,
    List<LowRankTerm> lowRankTerms,
    double[][] coordinates) {
  /** Number of unknowns. */
  public int size() {
    return pattern.size();
  }
}
