package org.annulet.solver.derivative;

import java.util.List;
import java.util.function.Function;
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

  /** One parameter that changes several terms at once, each as stated. */
  static OperatorChange together(List<? extends OperatorChange> parts) {
    return new Together(List.copyOf(parts));
  }

  /**
   * Changes that go together.
   *
   * @param parts of different terms of the operator
   */
  record Together(List<OperatorChange> parts) implements OperatorChange {
    @Override
    public ComplexMatrix first(Complex s, ComplexMatrix x) {
      return sum(x, c -> c.first(s, x));
    }

    @Override
    public ComplexMatrix second(Complex s, ComplexMatrix x) {
      return sum(x, c -> c.second(s, x));
    }

    @Override
    public ComplexMatrix mixed(Complex s, ComplexMatrix x) {
      return sum(x, c -> c.mixed(s, x));
    }

    private ComplexMatrix sum(ComplexMatrix x, Function<OperatorChange, ComplexMatrix> f) {
      ComplexMatrix y = new ComplexMatrix(x.rows(), x.columns());
      parts.forEach(c -> y.add(Complex.ONE, f.apply(c)));
      return y;
    }
  }
}
