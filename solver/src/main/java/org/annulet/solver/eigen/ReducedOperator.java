package org.annulet.solver.eigen;

import java.util.ArrayList;
import java.util.List;
import java.util.function.BiFunction;
import org.annulet.solver.dense.ComplexMatrix;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.operator.LowRankTerm;
import org.annulet.solver.operator.SparseTerm;
import org.annulet.solver.operator.SparseVector;
import org.apache.commons.math3.complex.Complex;

/**
 * Qᵀ L(s) Q on the first real columns: real matrices with the coefficients of the full operator.
 */
final class ReducedOperator implements MatrixFunction {
  private final int columns;
  private final double[][] stiffness;
  private final double[][] mass;
  private final List<SparseTerm> terms;
  private final double[][][] walls;
  private final List<Block> blocks = new ArrayList<>();

  /** A term of low rank: left, right shape [vectors][size]. */
  private record Block(double[][] left, double[][] right, AnalyticFunction[][] coefficient) {}

  /**
   * Projects.
   *
   * @param columns how many of the basis are used, from the first
   */
  ReducedOperator(AcousticOperator op, RealProjections projections, int columns) {
    this.columns = columns;
    stiffness = projections.of(op.pattern(), op.stiffness());
    mass = projections.of(op.pattern(), op.mass());
    terms = op.sparseTerms();
    walls = new double[terms.size()][][];
    for (int i = 0; i < walls.length; i++) {
      walls[i] = projections.of(op.pattern(), terms.get(i).values());
    }
    for (LowRankTerm term : op.lowRankTerms()) {
      blocks.add(
          new Block(
              vectors(term.left(), projections),
              vectors(term.right(), projections),
              term.coefficient()));
    }
  }

  private static double[][] vectors(List<SparseVector> v, RealProjections projections) {
    return v.stream().map(projections::of).toArray(double[][]::new);
  }

  @Override
  public int size() {
    return columns;
  }

  @Override
  public ComplexMatrix value(Complex s) {
    ComplexMatrix l = new ComplexMatrix(size(), size());
    add(l, stiffness, 1, 0);
    Complex s2 = s.multiply(s);
    add(l, mass, s2.getReal(), s2.getImaginary());
    fill(l, s, AnalyticFunction::value);
    return l;
  }

  @Override
  public ComplexMatrix derivative(Complex s) {
    ComplexMatrix l = new ComplexMatrix(size(), size());
    add(l, mass, 2 * s.getReal(), 2 * s.getImaginary());
    fill(l, s, AnalyticFunction::derivative);
    return l;
  }

  private void fill(ComplexMatrix l, Complex s, BiFunction<AnalyticFunction, Complex, Complex> f) {
    for (int i = 0; i < walls.length; i++) {
      Complex a = f.apply(terms.get(i).coefficient(), s);
      add(l, walls[i], a.getReal(), a.getImaginary());
    }
    int n = size();
    double[] rowRe = new double[n];
    double[] rowIm = new double[n];
    for (Block block : blocks) {
      for (int i = 0; i < block.left.length; i++) {
        java.util.Arrays.fill(rowRe, 0);
        java.util.Arrays.fill(rowIm, 0);
        for (int k = 0; k < block.right.length; k++) {
          AnalyticFunction entry = block.coefficient[i][k];
          if (entry != null) {
            Complex phi = f.apply(entry, s);
            axpy(phi.getReal(), block.right[k], rowRe);
            axpy(phi.getImaginary(), block.right[k], rowIm);
          }
        }
        double[] u = block.left[i];
        for (int j = 0; j < n; j++) {
          axpy(rowRe[j], u, l.re()[j]);
          axpy(rowIm[j], u, l.im()[j]);
        }
      }
    }
  }

  private static void add(ComplexMatrix l, double[][] a, double re, double im) {
    for (int j = 0; j < l.columns(); j++) {
      if (re != 0) {
        axpy(re, a[j], l.re()[j]);
      }
      if (im != 0) {
        axpy(im, a[j], l.im()[j]);
      }
    }
  }

  private static void axpy(double a, double[] x, double[] y) {
    for (int i = 0; i < y.length; i++) {
      y[i] += a * x[i];
    }
  }
}
