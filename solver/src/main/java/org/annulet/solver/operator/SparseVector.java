package org.annulet.solver.operator;

/**
 * A real vector with few non-zero entries; immutable.
 *
 * <p>Arrays are kept by reference and must not be modified after construction.
 *
 * @param index positions, ascending
 * @param value entries, shape as {@code index}
 */
public record SparseVector(int[] index, double[] value) {
  /** Inner product with a dense vector. */
  public double dot(double[] x) {
    double sum = 0;
    for (int q = 0; q < index.length; q++) {
      sum += value[q] * x[index[q]];
    }
    return sum;
  }

  /** y += a · this. */
  public void addTo(double[] y, double a) {
    for (int q = 0; q < index.length; q++) {
      y[index[q]] += a * value[q];
    }
  }
}
