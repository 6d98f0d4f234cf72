package org.annulet.solver.operator;

import java.util.List;

/**
 * A term U Φ(s) Vᵀ of the operator, of small rank: a flame, port or two-port, kept out of the
 * sparse factorisation.
 *
 * @param name what it is, for the growth budget ("flame burner 3")
 * @param left columns of U, k of them
 * @param right columns of V, l of them
 * @param coefficient Φ(s), shape [k][l]; a null entry is zero
 */
public record LowRankTerm(
    String name,
    List<SparseVector> left,
    List<SparseVector> right,
    AnalyticFunction[][] coefficient) {}
