package org.annulet.solver.flame;

import org.annulet.solver.operator.AnalyticFunction;

/**
 * The answer of a flame, F(s): relative heat release over relative velocity (or pressure) at the
 * reference; dimensionless.
 */
public sealed interface Response extends AnalyticFunction
    permits NTau, DelaySum, DelaySpread, LowPass, FittedResponse {}
