package org.annulet.solver.operator;

/**
 * A term a(s) · A of the operator: a wall, seen by the sparse factorisation.
 *
 * @param name what it is, for the growth budget ("wall chamber.downstream")
 * @param values A, real symmetric, lower triangle on the operator's pattern; not to be modified
 * @param coefficient a(s); for a wall s · y(s)
 */
public record SparseTerm(String name, double[] values, AnalyticFunction coefficient) {}
