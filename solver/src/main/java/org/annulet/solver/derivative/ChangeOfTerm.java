package org.annulet.solver.derivative;

import java.util.List;
import org.annulet.solver.dense.ComplexMatrix;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.operator.LowRankTerm;
import org.annulet.solver.operator.SparseTerm;
import org.annulet.solver.operator.SparseVector;
import org.annulet.solver.sparse.SymmetricPattern;
import org.apache.commons.math3.complex.Complex;

/**
 * A parameter of one term T of the operator whose derivative is known exactly: ∂T/∂θ = r(s) T.
 *
 * <pre>
 *   strength, T → (1 + ε)T:    r = 1,    ∂²T/∂ε² = 0
 *   delay, T ~ e^{−sτ}:        r = −s,   ∂²T/∂τ² = r² T
 * </pre>
 */
public final class ChangeOfTerm implements OperatorChange {
  private final Term term;
  private final Kind kind;

  private enum Kind {
    STRENGTH,
    DELAY
  }

  private ChangeOfTerm(Term term, Kind kind) {
    this.term = term;
    this.kind = kind;
  }

  /** θ = ε of T → (1 + ε)T, of a wall. */
  public static ChangeOfTerm strength(AcousticOperator operator, SparseTerm term) {
    return new ChangeOfTerm(new Wall(operator.pattern(), term), Kind.STRENGTH);
  }

  /** θ = ε of T → (1 + ε)T, of a flame, port or two-port. */
  public static ChangeOfTerm strength(LowRankTerm term) {
    return new ChangeOfTerm(new Rank(term), Kind.STRENGTH);
  }

  /** θ = τ in s of a flame whose response is proportional to e^{−sτ}. */
  public static ChangeOfTerm delay(LowRankTerm flame) {
    return new ChangeOfTerm(new Rank(flame), Kind.DELAY);
  }

  @Override
  public ComplexMatrix first(Complex s, ComplexMatrix x) {
    ComplexMatrix y = new ComplexMatrix(x.rows(), x.columns());
    y.add(kind == Kind.DELAY ? s.negate() : Complex.ONE, term.value(s, x));
    return y;
  }

  @Override
  public ComplexMatrix second(Complex s, ComplexMatrix x) {
    ComplexMatrix y = new ComplexMatrix(x.rows(), x.columns());
    if (kind == Kind.DELAY) {
      y.add(s.multiply(s), term.value(s, x));
    }
    return y;
  }

  @Override
  public ComplexMatrix mixed(Complex s, ComplexMatrix x) {
    ComplexMatrix slope = term.slope(s, x);
    if (kind == Kind.STRENGTH) {
      return slope;
    }
    ComplexMatrix y = new ComplexMatrix(x.rows(), x.columns());
    y.add(s.negate(), slope);
    y.add(Complex.ONE.negate(), term.value(s, x));
    return y;
  }

  private interface Term {
    ComplexMatrix value(Complex s, ComplexMatrix x);

    ComplexMatrix slope(Complex s, ComplexMatrix x);
  }

  private record Wall(SymmetricPattern pattern, SparseTerm term) implements Term {
    @Override
    public ComplexMatrix value(Complex s, ComplexMatrix x) {
      return times(term.coefficient().value(s), x);
    }

    @Override
    public ComplexMatrix slope(Complex s, ComplexMatrix x) {
      return times(term.coefficient().derivative(s), x);
    }

    private ComplexMatrix times(Complex a, ComplexMatrix x) {
      ComplexMatrix ax = new ComplexMatrix(x.rows(), x.columns());
      for (int j = 0; j < x.columns(); j++) {
        pattern.addProduct(term.values(), x.re()[j], 1, ax.re()[j]);
        pattern.addProduct(term.values(), x.im()[j], 1, ax.im()[j]);
      }
      ComplexMatrix y = new ComplexMatrix(x.rows(), x.columns());
      y.add(a, ax);
      return y;
    }
  }

  private record Rank(LowRankTerm term) implements Term {
    @Override
    public ComplexMatrix value(Complex s, ComplexMatrix x) {
      return times(x, (i, j) -> value(term.coefficient()[i][j], s));
    }

    @Override
    public ComplexMatrix slope(Complex s, ComplexMatrix x) {
      return times(x, (i, j) -> slope(term.coefficient()[i][j], s));
    }

    private static Complex value(AnalyticFunction f, Complex s) {
      return f == null ? Complex.ZERO : f.value(s);
    }

    private static Complex slope(AnalyticFunction f, Complex s) {
      return f == null ? Complex.ZERO : f.derivative(s);
    }

    private interface Entry {
      Complex at(int i, int j);
    }

    private ComplexMatrix times(ComplexMatrix x, Entry phi) {
      ComplexMatrix y = new ComplexMatrix(x.rows(), x.columns());
      List<SparseVector> right = term.right();
      for (int c = 0; c < x.columns(); c++) {
        for (int i = 0; i < term.left().size(); i++) {
          Complex sum = Complex.ZERO;
          for (int j = 0; j < right.size(); j++) {
            Complex heard = new Complex(right.get(j).dot(x.re()[c]), right.get(j).dot(x.im()[c]));
            sum = sum.add(phi.at(i, j).multiply(heard));
          }
          term.left().get(i).addTo(y.re()[c], sum.getReal());
          term.left().get(i).addTo(y.im()[c], sum.getImaginary());
        }
      }
      return y;
    }
  }
}
