package org.annulet.solver.rational;

import java.util.List;
import org.annulet.solver.operator.AnalyticFunction;
import org.apache.commons.math3.complex.Complex;

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

  @Override
  public List<Complex> poles(Complex lower, Complex upper) {
    return PolynomialRatio.inside(poleList, lower, upper);
  }
}
