package org.annulet.solver.eigen;

import no.uib.cipr.matrix.DenseMatrix;
import no.uib.cipr.matrix.NotConvergedException;
import no.uib.cipr.matrix.SymmDenseEVD;
import org.annulet.solver.dense.PureJavaNetlib;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.sparse.SymmetricPattern;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.CholeskyDecomposition;
import org.apache.commons.math3.linear.RealMatrix;

/** K p = λ M p of a small problem by dense algebra: M = C Cᵀ, then C⁻¹ K C⁻ᵀ. */
final class DensePencil {
  static {
    PureJavaNetlib.select();
  }

  private DensePencil() {}

  /** All eigenpairs, vectors with pᵀMp = 1. */
  static PassiveModes.Spectrum solve(AcousticOperator op) {
    int n = op.size();
    RealMatrix k = dense(op.pattern(), op.stiffness());
    RealMatrix c = new CholeskyDecomposition(dense(op.pattern(), op.mass()), 1e-8, 0).getL();
    RealMatrix half = forward(c, k);
    RealMatrix b = forward(c, half.transpose());
    try {
      SymmDenseEVD evd = SymmDenseEVD.factorize(new DenseMatrix(b.getData()));
      double[] lambda = evd.getEigenvalues();
      double[][] vectors = new double[n][n];
      for (int j = 0; j < n; j++) {
        for (int i = 0; i < n; i++) {
          vectors[j][i] = evd.getEigenvectors().get(i, j);
        }
        backward(c, vectors[j]);
      }
      return new PassiveModes.Spectrum(lambda, vectors, n);
    } catch (NotConvergedException e) {
      throw new ArithmeticException("dense symmetric QR did not converge: " + e.getReason());
    }
  }

  static RealMatrix dense(SymmetricPattern pattern, double[] values) {
    RealMatrix a = new Array2DRowRealMatrix(pattern.size(), pattern.size());
    for (int i = 0; i < pattern.size(); i++) {
      for (int q = pattern.rowStart(i); q < pattern.rowStart(i + 1); q++) {
        a.setEntry(i, pattern.column(q), values[q]);
        a.setEntry(pattern.column(q), i, values[q]);
      }
    }
    return a;
  }

  /** C⁻¹ B. */
  private static RealMatrix forward(RealMatrix c, RealMatrix b) {
    RealMatrix x = b.copy();
    int n = c.getRowDimension();
    for (int j = 0; j < n; j++) {
      for (int i = 0; i < n; i++) {
        double sum = x.getEntry(i, j);
        for (int k = 0; k < i; k++) {
          sum -= c.getEntry(i, k) * x.getEntry(k, j);
        }
        x.setEntry(i, j, sum / c.getEntry(i, i));
      }
    }
    return x;
  }

  /** x ← C⁻ᵀ x. */
  private static void backward(RealMatrix c, double[] x) {
    for (int i = x.length - 1; i >= 0; i--) {
      double sum = x[i];
      for (int k = i + 1; k < x.length; k++) {
        sum -= c.getEntry(k, i) * x[k];
      }
      x[i] = sum / c.getEntry(i, i);
    }
  }
}
