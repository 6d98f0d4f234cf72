package org.annulet.solver.sparse;

/** What every real factor does around its triangular solves: one step of iterative refinement. */
abstract class RefinedRealFactor implements RealFactor {
  private final SymmetricPattern pattern;
  private final double[] values;

  RefinedRealFactor(SymmetricPattern pattern, double[] values) {
    this.pattern = pattern;
    this.values = values;
  }

  /** Solves L D Lᵀ x = b, the columns of b overwritten by x. */
  abstract void solveOnce(double[][] b);

  @Override
  public final void solveUnrefined(double[]... b) {
    check(b);
    solveOnce(b);
  }

  private void check(double[][] b) {
    for (int c = 0; c < b.length; c++) {
      if (b[c].length != pattern.size()) {
        throw new IllegalArgumentException(
            "right-hand side "
                + c
                + " has "
                + b[c].length
                + " entries, the matrix "
                + pattern.size()
                + " rows");
      }
    }
  }

  @Override
  public final double solve(double[]... b) {
    check(b);
    int n = pattern.size();
    double[][] rest = new double[b.length][];
    double[] scale = new double[b.length];
    double[] before = new double[b.length];
    double[][] x = new double[b.length][];
    for (int c = 0; c < b.length; c++) {
      rest[c] = b[c].clone();
      scale[c] = norm(b[c]);
      x[c] = b[c].clone();
    }
    solveOnce(x);
    for (int c = 0; c < b.length; c++) {
      pattern.addProduct(values, x[c], -1, rest[c]);
      before[c] = norm(rest[c]);
    }
    solveOnce(rest);
    double worst = 0;
    for (int c = 0; c < b.length; c++) {
      double[] correction = rest[c];
      double[] residual = b[c].clone();
      for (int i = 0; i < n; i++) {
        correction[i] += x[c][i];
      }
      pattern.addProduct(values, correction, -1, residual);
      double after = norm(residual);
      boolean better = after <= before[c];
      System.arraycopy(better ? correction : x[c], 0, b[c], 0, n);
      if (scale[c] != 0) {
        worst = Math.max(worst, (better ? after : before[c]) / scale[c]);
      }
    }
    return worst;
  }

  private static double norm(double[] x) {
    double sum = 0;
    for (double v : x) {
      sum += v * v;
    }
    return Math.sqrt(sum);
  }

  static LogDeterminant logDeterminant(double[] pivots) {
    double log = 0;
    int negative = 0;
    for (double d : pivots) {
      log += Math.log(Math.abs(d));
      negative += d < 0 ? 1 : 0;
    }
    return new LogDeterminant(log, negative % 2 == 0 ? 0 : Math.PI);
  }

  static int negative(double[] pivots) {
    int count = 0;
    for (double d : pivots) {
      count += d < 0 ? 1 : 0;
    }
    return count;
  }

  static ArithmeticException badPivot(int unknown, double modulus) {
    return new ArithmeticException(
        "pivot of unknown "
            + unknown
            + (modulus == 0 ? " is zero" : " is not finite")
            + ": the matrix, or a leading block of it, is singular or holds a value that is no"
            + " number; move the shift a little, or check the values");
  }
}
