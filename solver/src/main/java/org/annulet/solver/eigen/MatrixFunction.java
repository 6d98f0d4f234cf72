package org.annulet.solver.eigen;

import org.annulet.solver.dense.ComplexMatrix;
import org.apache.commons.math3.complex.Complex;

/** A small square matrix that depends on s; thread-safe. */
interface MatrixFunction {
  int size();

  /** A new matrix with the value at s. */
  ComplexMatrix value(Complex s);

  /** A new matrix with the derivative at s. */
  ComplexMatrix derivative(Complex s);
}
