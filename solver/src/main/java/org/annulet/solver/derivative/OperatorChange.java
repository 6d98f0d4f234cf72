package org.annulet.solver.derivative;

import org.annulet.solver.dense.ComplexMatrix;
import org.apache.commons.math3.complex.Complex;

/**
 * How an operator depends on one parameter θ: its partial derivatives at the present θ, applied to
 * vectors. Implementations are immutable and thread-safe; arguments are not modified.
 */
public interface OperatorChange {
  /** ∂L/∂θ x for each column, in the unit of L over that of θ. */
  ComplexMatrix first(Complex s, ComplexMatrix x);

  /** ∂²L/∂θ² x for each column. */
  ComplexMatrix second(Complex s, ComplexMatrix x);

  /** ∂²L/∂θ∂s x for each column. */
  ComplexMatrix mixed(Complex s, ComplexMatrix x);
}
