package org.annulet.solver.eigen;

import org.annulet.solver.dense.ComplexMatrix;
import org.apache.commons.math3.complex.Complex;

/**
 * Roots so close together that they are best handled as one: usually one root, two for an azimuthal
 * pair.
 *
 * @param values as many as the cluster has roots, with multiplicity
 * @param basis of the space their vectors span, orthonormal, shape size × roots
 */
record RootCluster(Complex[] values, ComplexMatrix basis) {
  Complex centre() {
    Complex sum = Complex.ZERO;
    for (Complex s : values) {
      sum = sum.add(s);
    }
    return sum.divide(values.length);
  }
}
