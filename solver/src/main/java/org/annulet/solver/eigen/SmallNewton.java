package org.annulet.solver.eigen;

import java.util.ArrayList;
import java.util.List;
import org.annulet.solver.dense.ComplexEigen;
import org.annulet.solver.dense.ComplexLu;
import org.annulet.solver.dense.ComplexMatrix;
import org.annulet.solver.dense.OrthonormalColumns;
import org.apache.commons.math3.complex.Complex;

/** Root finding near a point on a small dense problem. */
final class SmallNewton {
  private static final int LARGEST_STEPS = 25;

  private SmallNewton() {}

  /**
   * Newton's method on (L(s)v, vᴴv − 1) = 0: one factorisation a step, quadratic at a simple root,
   * and at a semi-simple multiple one the root still converges while the vector keeps to the one
   * the start pointed at.
   *
   * @return the root and its vector of unit length, or null if the iteration does not settle
   */
  static Root refined(MatrixFunction f, Complex start, ComplexMatrix vector) {
    ComplexMatrix v = vector.copy();
    Complex s = refineInPlace(f, start, v);
    return s == null ? null : new Root(s, v);
  }

  /** A root and its vector, shape size × 1. */
  record Root(Complex s, ComplexMatrix vector) {}

  /** The same without the vector. */
  static Complex refine(MatrixFunction f, Complex start, ComplexMatrix vector) {
    return refineInPlace(f, start, vector.copy());
  }

  private static Complex refineInPlace(MatrixFunction f, Complex start, ComplexMatrix v) {
    Complex s = start;
    v.scaleColumn(0, 1 / v.columnNorm(0));
    for (int k = 0; k < LARGEST_STEPS; k++) {
      ComplexLu lu = new ComplexLu(f.value(s));
      ComplexMatrix x = f.derivative(s).times(v);
      lu.solve(x);
      double norm = x.columnNorm(0);
      if (!(norm > 0) || Double.isInfinite(norm)) {
        return lu.isSingular() ? s : null;
      }
      Complex step = v.adjointTimes(x).get(0, 0).reciprocal();
      x.scaleColumn(0, 1 / norm);
      System.arraycopy(x.re()[0], 0, v.re()[0], 0, v.rows());
      System.arraycopy(x.im()[0], 0, v.im()[0], 0, v.rows());
      s = s.subtract(step);
      if (!(step.abs() < 10 * start.abs())) {
        return null;
      }
      if (step.abs() <= 1e-11 * s.abs() && 1 / norm <= 1e-8 * s.abs()) {
        return s;
      }
    }
    return null;
  }

  /**
   * All roots within {@code radius} of a point, with their multiplicity, by block inverse iteration
   * on L(σ)⁻¹L′(σ) from a σ beside it: its largest eigenvalues are −1/(s − σ).
   *
   * @param block an upper bound of their number
   */
  static RootCluster cluster(MatrixFunction f, Complex centre, double radius, int block) {
    Complex sigma = centre.add(new Complex(0.6 * radius, 0.8 * radius));
    ComplexLu lu = new ComplexLu(f.value(sigma));
    ComplexMatrix slope = f.derivative(sigma);
    int width = Math.min(block, f.size());
    ComplexMatrix x = ContourIntegral.probe(f.size(), width);
    for (int k = 0; k < 4; k++) {
      x = OrthonormalColumns.of(apply(lu, slope, x), 0);
    }
    ComplexEigen eigen = new ComplexEigen(x.adjointTimes(apply(lu, slope, x)));
    ComplexMatrix vectors = x.times(eigen.vectors());
    List<Complex> values = new ArrayList<>();
    ComplexMatrix chosen = new ComplexMatrix(f.size(), width);
    for (int j = 0; j < width; j++) {
      Complex s = sigma.subtract(eigen.values()[j].reciprocal());
      if (s.subtract(centre).abs() <= radius) {
        System.arraycopy(vectors.re()[j], 0, chosen.re()[values.size()], 0, f.size());
        System.arraycopy(vectors.im()[j], 0, chosen.im()[values.size()], 0, f.size());
        values.add(s);
      }
    }
    if (values.isEmpty()) {
      return null;
    }
    ComplexMatrix basis = OrthonormalColumns.of(chosen.columnsFrom(0, values.size()), 0);
    return new RootCluster(values.toArray(Complex[]::new), basis);
  }

  private static ComplexMatrix apply(ComplexLu lu, ComplexMatrix slope, ComplexMatrix x) {
    ComplexMatrix y = slope.times(x);
    lu.solve(y);
    return y;
  }
}
