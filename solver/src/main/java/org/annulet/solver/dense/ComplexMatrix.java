package org.annulet.solver.dense;

import org.apache.commons.math3.complex.Complex;

/**
 * A dense complex matrix, mutable, stored by columns with real and imaginary parts apart. The
 * arrays handed out are the storage itself.
 */
public final class ComplexMatrix {
  private final int rows;
  private final double[][] re;
  private final double[][] im;

  /** A zero matrix. */
  public ComplexMatrix(int rows, int columns) {
    this(rows, new double[columns][rows], new double[columns][rows]);
  }

  private ComplexMatrix(int rows, double[][] re, double[][] im) {
    this.rows = rows;
    this.re = re;
    this.im = im;
  }

  /**
   * A matrix on the arrays given, which are kept by reference.
   *
   * @param re real parts, shape [columns][rows], at least one column
   * @param im imaginary parts, same shape
   */
  public static ComplexMatrix onColumns(double[][] re, double[][] im) {
    return new ComplexMatrix(re[0].length, re, im);
  }

  /** The unit matrix. */
  public static ComplexMatrix identity(int n) {
    ComplexMatrix a = new ComplexMatrix(n, n);
    for (int i = 0; i < n; i++) {
      a.re[i][i] = 1;
    }
    return a;
  }

  /** Number of rows. */
  public int rows() {
    return rows;
  }

  /** Number of columns. */
  public int columns() {
    return re.length;
  }

  /** The real parts, shape [columns][rows]; the storage itself. */
  public double[][] re() {
    return re;
  }

  /** The imaginary parts, shape [columns][rows]; the storage itself. */
  public double[][] im() {
    return im;
  }

  /** Entry in row i and column j. */
  public Complex get(int i, int j) {
    return new Complex(re[j][i], im[j][i]);
  }

  /** Sets the entry in row i and column j. */
  public void set(int i, int j, Complex value) {
    re[j][i] = value.getReal();
    im[j][i] = value.getImaginary();
  }

  /** A deep copy. */
  public ComplexMatrix copy() {
    return columnsFrom(0, columns());
  }

  /** A copy of {@code count} columns starting at {@code first}. */
  public ComplexMatrix columnsFrom(int first, int count) {
    ComplexMatrix b = new ComplexMatrix(rows, count);
    for (int j = 0; j < count; j++) {
      System.arraycopy(re[first + j], 0, b.re[j], 0, rows);
      System.arraycopy(im[first + j], 0, b.im[j], 0, rows);
    }
    return b;
  }

  /** this += a · other. */
  public void add(Complex a, ComplexMatrix other) {
    for (int j = 0; j < re.length; j++) {
      axpy(a.getReal(), a.getImaginary(), other.re[j], other.im[j], re[j], im[j], 0);
    }
  }

  /** The product this · b. */
  public ComplexMatrix times(ComplexMatrix b) {
    if (b.rows != columns()) {
      throw new IllegalArgumentException(
          "cannot multiply " + rows + "×" + columns() + " by " + b.rows + "×" + b.columns());
    }
    ComplexMatrix c = new ComplexMatrix(rows, b.columns());
    for (int j = 0; j < b.columns(); j++) {
      for (int k = 0; k < re.length; k++) {
        axpy(b.re[j][k], b.im[j][k], re[k], im[k], c.re[j], c.im[j], 0);
      }
    }
    return c;
  }

  /** The product thisᴴ · b. */
  public ComplexMatrix adjointTimes(ComplexMatrix b) {
    ComplexMatrix c = new ComplexMatrix(columns(), b.columns());
    for (int j = 0; j < b.columns(); j++) {
      for (int i = 0; i < columns(); i++) {
        double sr = 0;
        double si = 0;
        double[] ar = re[i];
        double[] ai = im[i];
        double[] br = b.re[j];
        double[] bi = b.im[j];
        for (int k = 0; k < rows; k++) {
          sr += ar[k] * br[k] + ai[k] * bi[k];
          si += ar[k] * bi[k] - ai[k] * br[k];
        }
        c.re[j][i] = sr;
        c.im[j][i] = si;
      }
    }
    return c;
  }

  /** Euclidean norm of column j. */
  public double columnNorm(int j) {
    double sum = 0;
    for (int i = 0; i < rows; i++) {
      sum += re[j][i] * re[j][i] + im[j][i] * im[j][i];
    }
    return Math.sqrt(sum);
  }

  /** Multiplies column j by a real factor. */
  public void scaleColumn(int j, double factor) {
    for (int i = 0; i < rows; i++) {
      re[j][i] *= factor;
      im[j][i] *= factor;
    }
  }

  /** y += (ar + i·ai) x from row {@code first} on. */
  static void axpy(
      double ar, double ai, double[] xr, double[] xi, double[] yr, double[] yi, int first) {
    for (int i = first; i < yr.length; i++) {
      yr[i] += ar * xr[i] - ai * xi[i];
      yi[i] += ar * xi[i] + ai * xr[i];
    }
  }
}
