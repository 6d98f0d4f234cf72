package org.annulet.solver.rational;

import java.util.ArrayList;
import java.util.List;
import org.annulet.solver.operator.AnalyticFunction;
import org.apache.commons.math3.complex.Complex;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.EigenDecomposition;

/**
 * d + Σ r_k/(s − p_k), real on the real axis; immutable.
 *
 * @param constant d
 * @param poleList poles in 1/s; of a conjugate pair both are listed
 * @param residues r_k, in the order of the poles
 */
public record PoleResidue(double constant, List<Complex> poleList, List<Complex> residues)
    implements AnalyticFunction {
  /** Copies the lists. */
  public PoleResidue {
    if (poleList.size() != residues.size()) {
      throw new IllegalArgumentException(
          poleList.size() + " poles but " + residues.size() + " residues");
    }
    poleList = List.copyOf(poleList);
    residues = List.copyOf(residues);
  }

  @Override
  public Complex value(Complex s) {
    Complex sum = new Complex(constant);
    for (int k = 0; k < poleList.size(); k++) {
      sum = sum.add(residues.get(k).divide(s.subtract(poleList.get(k))));
    }
    return sum;
  }

  @Override
  public Complex derivative(Complex s) {
    Complex sum = Complex.ZERO;
    for (int k = 0; k < poleList.size(); k++) {
      Complex d = s.subtract(poleList.get(k));
      sum = sum.subtract(residues.get(k).divide(d.multiply(d)));
    }
    return sum;
  }

  /**
   * The zeros of this function plus a number: eigenvalues of A − b cᵀ/(d + number), with A the
   * poles as a real matrix.
   *
   * @param number not −d
   */
  public List<Complex> zerosOfSum(double number) {
    int n = poleList.size();
    if (n == 0) {
      return List.of();
    }
    double[][] a = new double[n][n];
    double[] b = new double[n];
    double[] c = new double[n];
    for (int k = 0; k < n; k++) {
      Complex p = poleList.get(k);
      a[k][k] = p.getReal();
      if (p.getImaginary() == 0) {
        b[k] = 1;
        c[k] = residues.get(k).getReal();
      } else {
        // r/(s − p) and its conjugate: states of the real and imaginary part
        a[k][k + 1] = p.getImaginary();
        a[k + 1][k] = -p.getImaginary();
        a[k + 1][k + 1] = p.getReal();
        b[k] = 2;
        c[k] = residues.get(k).getReal();
        c[k + 1] = residues.get(k).getImaginary();
        k++;
      }
    }
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        a[i][j] -= b[i] * c[j] / (constant + number);
      }
    }
    EigenDecomposition e = new EigenDecomposition(new Array2DRowRealMatrix(a, false));
    List<Complex> zeros = new ArrayList<>();
    for (int k = 0; k < n; k++) {
      zeros.add(new Complex(e.getRealEigenvalue(k), e.getImagEigenvalue(k)));
    }
    return List.copyOf(zeros);
  }

  /** Those points that lie in the closed rectangle. */
  public static List<Complex> within(List<Complex> points, Complex lower, Complex upper) {
    return PolynomialRatio.inside(points, lower, upper);
  }

  @Override
  public List<Complex> poles(Complex lower, Complex upper) {
    return PolynomialRatio.inside(poleList, lower, upper);
  }
}
