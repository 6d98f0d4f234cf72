package org.annulet.solver.sparse;

/** What every complex factor does around its triangular solves: one step of refinement. */
abstract class RefinedComplexFactor implements ComplexFactor {
  private final SymmetricPattern pattern;
  private final double[] valuesRe;
  private final double[] valuesIm;

  RefinedComplexFactor(SymmetricPattern pattern, double[] valuesRe, double[] valuesIm) {
    this.pattern = pattern;
    this.valuesRe = valuesRe;
    this.valuesIm = valuesIm;
  }

  /** Solves L D Lᵀ x = b, the columns of b overwritten by x. */
  abstract void solveOnce(double[][] re, double[][] im);

  @Override
  public final void solveUnrefined(double[][] re, double[][] im) {
    check(re, im);
    solveOnce(re, im);
  }

  private void check(double[][] re, double[][] im) {
    int n = pattern.size();
    if (im.length != re.length) {
      throw new IllegalArgumentException(
          "right-hand sides have " + re.length + " real and " + im.length + " imaginary columns");
    }
    for (int c = 0; c < re.length; c++) {
      if (re[c].length != n || im[c].length != n) {
        throw new IllegalArgumentException(
            "right-hand side "
                + c
                + " has "
                + re[c].length
                + " real and "
                + im[c].length
                + " imaginary entries, the matrix "
                + n
                + " rows");
      }
    }
  }

  @Override
  public final double solve(double[][] re, double[][] im) {
    check(re, im);
    int n = pattern.size();
    int columns = re.length;
    double[][] restRe = new double[columns][];
    double[][] restIm = new double[columns][];
    double[][] xRe = new double[columns][];
    double[][] xIm = new double[columns][];
    for (int c = 0; c < columns; c++) {
      restRe[c] = re[c].clone();
      restIm[c] = im[c].clone();
      xRe[c] = re[c].clone();
      xIm[c] = im[c].clone();
    }
    solveOnce(xRe, xIm);
    double[] before = new double[columns];
    for (int c = 0; c < columns; c++) {
      subtractProduct(xRe[c], xIm[c], restRe[c], restIm[c]);
      before[c] = norm(restRe[c], restIm[c]);
    }
    solveOnce(restRe, restIm);
    double worst = 0;
    for (int c = 0; c < columns; c++) {
      double scale = norm(re[c], im[c]);
      double[] residualRe = re[c].clone();
      double[] residualIm = im[c].clone();
      for (int i = 0; i < n; i++) {
        restRe[c][i] += xRe[c][i];
        restIm[c][i] += xIm[c][i];
      }
      subtractProduct(restRe[c], restIm[c], residualRe, residualIm);
      double after = norm(residualRe, residualIm);
      boolean better = after <= before[c];
      System.arraycopy(better ? restRe[c] : xRe[c], 0, re[c], 0, n);
      System.arraycopy(better ? restIm[c] : xIm[c], 0, im[c], 0, n);
      if (scale != 0) {
        worst = Math.max(worst, (better ? after : before[c]) / scale);
      }
    }
    return worst;
  }

  /** y −= A x in one pass over the matrix. */
  private void subtractProduct(double[] xRe, double[] xIm, double[] yRe, double[] yIm) {
    for (int i = 0; i < xRe.length; i++) {
      int last = pattern.rowStart(i + 1) - 1;
      double pRe = xRe[i];
      double pIm = xIm[i];
      double sumRe = valuesRe[last] * pRe - valuesIm[last] * pIm;
      double sumIm = valuesRe[last] * pIm + valuesIm[last] * pRe;
      for (int q = pattern.rowStart(i); q < last; q++) {
        int j = pattern.column(q);
        double a = valuesRe[q];
        double b = valuesIm[q];
        sumRe += a * xRe[j] - b * xIm[j];
        sumIm += a * xIm[j] + b * xRe[j];
        yRe[j] -= a * pRe - b * pIm;
        yIm[j] -= a * pIm + b * pRe;
      }
      yRe[i] -= sumRe;
      yIm[i] -= sumIm;
    }
  }

  private static double norm(double[] re, double[] im) {
    double sum = 0;
    for (int i = 0; i < re.length; i++) {
      sum += re[i] * re[i] + im[i] * im[i];
    }
    return Math.sqrt(sum);
  }

  /** The determinant from its pivots; the phases are summed one by one, each in (−π, π]. */
  static LogDeterminant logDeterminant(double[] re, double[] im) {
    double log = 0;
    double phase = 0;
    for (int k = 0; k < re.length; k++) {
      log += Math.log(Math.hypot(re[k], im[k]));
      phase += Math.atan2(im[k], re[k]);
    }
    return new LogDeterminant(log, 0).times(new LogDeterminant(0, phase));
  }
}
