package org.annulet.solver.eigen;

import java.util.ArrayList;
import java.util.List;
import org.annulet.solver.dense.ComplexMatrix;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.SparseTerm;
import org.annulet.solver.sparse.SparseSolver;
import org.annulet.solver.sparse.SymmetricAnalysis;
import org.annulet.solver.sparse.SymmetricPattern;
import org.apache.commons.math3.complex.Complex;

/** An operator with its pattern analysed once, ready to be factorised at any s. Thread-safe. */
public final class PreparedOperator {
  private final AcousticOperator operator;
  private SymmetricAnalysis analysis;
  private final LowRank lowRank;
  private final List<WallMatrix> walls = new ArrayList<>();

  /** Analyses the operator's pattern when it is first needed. */
  public PreparedOperator(AcousticOperator operator) {
    this(operator, null);
  }

  /**
   * On an analysis made earlier, of the same pattern.
   *
   * @param analysis null to have it made when it is first needed
   */
  public PreparedOperator(AcousticOperator operator, SymmetricAnalysis analysis) {
    this.operator = operator;
    this.analysis = analysis;
    this.lowRank = new LowRank(operator.lowRankTerms());
    for (SparseTerm term : operator.sparseTerms()) {
      walls.add(new WallMatrix(operator.pattern(), term));
    }
  }

  /** The operator itself. */
  public AcousticOperator operator() {
    return operator;
  }

  /**
   * The analysis of its pattern.
   *
   * @throws MemoryLimitException if a factor will not fit into memory
   */
  public synchronized SymmetricAnalysis analysis() {
    if (analysis == null) {
      SymmetricAnalysis made = SparseSolver.analyse(operator.pattern(), operator.coordinates());
      MemoryLimitException.check(made, Runtime.getRuntime().maxMemory());
      analysis = made;
    }
    return analysis;
  }

  /** Number of unknowns. */
  public int size() {
    return operator.size();
  }

  LowRank lowRank() {
    return lowRank;
  }

  List<WallMatrix> walls() {
    return walls;
  }

  /**
   * Factorises L(s).
   *
   * @throws ArithmeticException if the sparse part is exactly singular there
   */
  public OperatorAt at(Complex s) {
    return new OperatorAt(this, s);
  }

  /** Values of the sparse part A(s) = K + s² M + Σ a_i(s) A_i on the pattern: {re, im}. */
  double[][] sparseValues(Complex s) {
    double[] k = operator.stiffness();
    double[] m = operator.mass();
    Complex s2 = s.multiply(s);
    double sr = s2.getReal();
    double si = s2.getImaginary();
    double[] re = new double[k.length];
    double[] im = new double[k.length];
    for (int q = 0; q < k.length; q++) {
      re[q] = k[q] + sr * m[q];
      im[q] = si * m[q];
    }
    for (SparseTerm term : operator.sparseTerms()) {
      Complex a = term.coefficient().value(s);
      double ar = a.getReal();
      double ai = a.getImaginary();
      double[] v = term.values();
      for (int q = 0; q < v.length; q++) {
        re[q] += ar * v[q];
        im[q] += ai * v[q];
      }
    }
    return new double[][] {re, im};
  }

  /** K x for each column. */
  ComplexMatrix stiffnessTimes(ComplexMatrix x) {
    ComplexMatrix y = new ComplexMatrix(x.rows(), x.columns());
    addReal(operator.stiffness(), new Complex(1), x, y);
    return y;
  }

  /** L(s) x for each column. */
  public ComplexMatrix times(Complex s, ComplexMatrix x) {
    ComplexMatrix y = stiffnessTimes(x);
    addReal(operator.mass(), s.multiply(s), x, y);
    for (int i = 0; i < walls.size(); i++) {
      addWall(i, operator.sparseTerms().get(i).coefficient().value(s), x, y);
    }
    addLowRank(lowRank.coefficient(s), x, y);
    return y;
  }

  /** L′(s) x for each column. */
  public ComplexMatrix derivativeTimes(Complex s, ComplexMatrix x) {
    ComplexMatrix y = sparseDerivativeTimes(s, x);
    addLowRank(lowRank.coefficientDerivative(s), x, y);
    return y;
  }

  /** A′(s) x for each column. */
  ComplexMatrix sparseDerivativeTimes(Complex s, ComplexMatrix x) {
    ComplexMatrix y = new ComplexMatrix(x.rows(), x.columns());
    addReal(operator.mass(), s.multiply(2), x, y);
    for (int i = 0; i < walls.size(); i++) {
      addWall(i, operator.sparseTerms().get(i).coefficient().derivative(s), x, y);
    }
    return y;
  }

  /** ‖L(s) p‖₂/‖K p‖₂ of each column p. */
  public double[] backwardErrors(Complex s, ComplexMatrix p) {
    ComplexMatrix r = times(s, p);
    ComplexMatrix k = stiffnessTimes(p);
    double[] error = new double[p.columns()];
    for (int j = 0; j < error.length; j++) {
      error[j] = r.columnNorm(j) / k.columnNorm(j);
    }
    return error;
  }

  /**
   * What rounding alone leaves of the backward error of column j: half a unit in the last place of
   * every product, ‖ |K||p| + |s|²|M||p| ‖₂ / ‖K p‖₂.
   */
  double roundingFloor(Complex s, ComplexMatrix p, int j) {
    SymmetricPattern pattern = operator.pattern();
    int n = size();
    double[] modulus = new double[n];
    for (int i = 0; i < n; i++) {
      modulus[i] = Math.hypot(p.re()[j][i], p.im()[j][i]);
    }
    double s2 = s.getReal() * s.getReal() + s.getImaginary() * s.getImaginary();
    double[] weight = new double[pattern.entryCount()];
    for (int q = 0; q < weight.length; q++) {
      weight[q] = Math.abs(operator.stiffness()[q]) + s2 * Math.abs(operator.mass()[q]);
    }
    double[] sum = new double[n];
    pattern.addProduct(weight, modulus, 0x1p-53, sum);
    double norm = 0;
    for (double x : sum) {
      norm += x * x;
    }
    return Math.sqrt(norm) / stiffnessTimes(p.columnsFrom(j, 1)).columnNorm(0);
  }

  private void addReal(double[] values, Complex a, ComplexMatrix x, ComplexMatrix y) {
    SymmetricPattern pattern = operator.pattern();
    for (int j = 0; j < x.columns(); j++) {
      if (a.getReal() != 0) {
        pattern.addProduct(values, x.re()[j], a.getReal(), y.re()[j]);
        pattern.addProduct(values, x.im()[j], a.getReal(), y.im()[j]);
      }
      if (a.getImaginary() != 0) {
        pattern.addProduct(values, x.im()[j], -a.getImaginary(), y.re()[j]);
        pattern.addProduct(values, x.re()[j], a.getImaginary(), y.im()[j]);
      }
    }
  }

  private void addWall(int i, Complex a, ComplexMatrix x, ComplexMatrix y) {
    WallMatrix wall = walls.get(i);
    for (int j = 0; j < x.columns(); j++) {
      wall.addProduct(a.getReal(), x.re()[j], y.re()[j]);
      wall.addProduct(a.getReal(), x.im()[j], y.im()[j]);
      wall.addProduct(-a.getImaginary(), x.im()[j], y.re()[j]);
      wall.addProduct(a.getImaginary(), x.re()[j], y.im()[j]);
    }
  }

  private void addLowRank(ComplexMatrix phi, ComplexMatrix x, ComplexMatrix y) {
    if (!lowRank.isEmpty()) {
      ComplexMatrix inner = LowRank.transposeTimes(lowRank.right(), x);
      LowRank.addProduct(lowRank.left(), phi.times(inner), y);
    }
  }
}
