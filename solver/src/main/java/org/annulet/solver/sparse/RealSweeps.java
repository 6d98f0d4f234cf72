package org.annulet.solver.sparse;

import java.util.Arrays;

/**
 * Triangular solves with a real multifrontal factor, for blocks of right-hand sides: each front is
 * read once per block, since reading the factor is what a solve costs. Immutable.
 */
final class RealSweeps {
  /** Right-hand sides of one block. */
  private static final int BLOCK = 8;

  private final FrontTree tree;
  private final double[][] lower;
  private final double[] pivot;

  RealSweeps(FrontTree tree, RealFront front) {
    this.tree = tree;
    this.lower = front.lower;
    this.pivot = front.pivot;
  }

  /** L D Lᵀ x = b, the columns of b overwritten. */
  void solve(double[][] b) {
    int n = tree.order.length;
    for (int from = 0; from < b.length; from += BLOCK) {
      int columns = Math.min(BLOCK, b.length - from);
      double[][] x = new double[columns][n];
      for (int c = 0; c < columns; c++) {
        for (int k = 0; k < n; k++) {
          x[c][k] = b[from + c][tree.order[k]];
        }
      }
      double[][] t = new double[columns][tree.largestBelow];
      double[][] copy = new double[4][columns > 1 ? tree.largestBelow : 0];
      for (int f = 0; f < tree.fronts; f++) {
        forward(f, x, t, copy);
      }
      for (int f = tree.fronts - 1; f >= 0; f--) {
        backward(f, x, t);
      }
      for (int c = 0; c < columns; c++) {
        for (int k = 0; k < n; k++) {
          b[from + c][tree.order[k]] = x[c][k];
        }
      }
    }
  }

  private void forward(int f, double[][] x, double[][] t, double[][] copy) {
    double[] l = lower[tree.piece[f]];
    int at = tree.offset[f];
    int begin = tree.firstColumn[f];
    int end = tree.firstColumn[f + 1];
    for (int p = begin; p < end; p++) {
      for (double[] xc : x) {
        double s = xc[p];
        int q = at - p - 1;
        for (int i = p + 1; i < end; i++) {
          xc[i] -= l[q + i] * s;
        }
      }
      at += end - p - 1;
    }
    int u = tree.below(f);
    if (u == 0) {
      return;
    }
    for (double[] tc : t) {
      Arrays.fill(tc, 0, u, 0);
    }
    int p = begin;
    for (; p + 4 <= end; p += 4) {
      if (x.length == 1) {
        add(t[0], l, at, u, x[0], p);
      } else {
        for (int q = 0; q < 4; q++) {
          System.arraycopy(l, at + q * u, copy[q], 0, u);
        }
        for (int c = 0; c < x.length; c++) {
          addCopied(t[c], copy, u, x[c], p);
        }
      }
      at += 4 * u;
    }
    for (; p < end; p++) {
      for (int c = 0; c < x.length; c++) {
        double[] tc = t[c];
        double s = x[c][p];
        for (int i = 0; i < u; i++) {
          tc[i] += l[at + i] * s;
        }
      }
      at += u;
    }
    int base = tree.rowStart[f];
    for (int c = 0; c < x.length; c++) {
      double[] tc = t[c];
      double[] xc = x[c];
      for (int i = 0; i < u; i++) {
        xc[tree.row[base + i]] -= tc[i];
      }
    }
  }

  private static void add(double[] t, double[] l, int at, int u, double[] x, int p) {
    double s0 = x[p];
    double s1 = x[p + 1];
    double s2 = x[p + 2];
    double s3 = x[p + 3];
    int b = at + u;
    int c = b + u;
    int d = c + u;
    for (int i = 0; i < u; i++) {
      t[i] += l[at + i] * s0 + l[b + i] * s1 + l[c + i] * s2 + l[d + i] * s3;
    }
  }

  private static void addCopied(double[] t, double[][] copy, int u, double[] x, int p) {
    double[] a = copy[0];
    double[] b = copy[1];
    double[] c = copy[2];
    double[] d = copy[3];
    double s0 = x[p];
    double s1 = x[p + 1];
    double s2 = x[p + 2];
    double s3 = x[p + 3];
    for (int i = 0; i < u; i++) {
      t[i] += a[i] * s0 + b[i] * s1 + c[i] * s2 + d[i] * s3;
    }
  }

  private void backward(int f, double[][] x, double[][] t) {
    double[] l = lower[tree.piece[f]];
    int begin = tree.firstColumn[f];
    int end = tree.firstColumn[f + 1];
    int k = end - begin;
    int u = tree.below(f);
    int base = tree.rowStart[f];
    int block = tree.offset[f] + k * (k - 1) / 2;
    for (int c = 0; c < x.length; c++) {
      double[] xc = x[c];
      double[] tc = t[c];
      for (int i = 0; i < u; i++) {
        tc[i] = xc[tree.row[base + i]];
      }
      for (int p = begin; p < end; p++) {
        xc[p] /= pivot[p];
      }
    }
    int at = block;
    int p = begin;
    for (; p + 4 <= end; p += 4) {
      int c = 0;
      for (; c + 2 <= x.length; c += 2) {
        dot(t[c], t[c + 1], l, at, u, x[c], x[c + 1], p);
        dot(t[c], t[c + 1], l, at + 2 * u, u, x[c], x[c + 1], p + 2);
      }
      if (c < x.length) {
        dot(t[c], l, at, u, x[c], p);
      }
      at += 4 * u;
    }
    for (; p < end; p++) {
      for (int c = 0; c < x.length; c++) {
        double[] tc = t[c];
        double sum = 0;
        for (int i = 0; i < u; i++) {
          sum += l[at + i] * tc[i];
        }
        x[c][p] -= sum;
      }
      at += u;
    }
    for (double[] xc : x) {
      at = block;
      for (p = end - 1; p >= begin; p--) {
        at -= end - p - 1;
        double sum = xc[p];
        int q = at - p - 1;
        for (int i = p + 1; i < end; i++) {
          sum -= l[q + i] * xc[i];
        }
        xc[p] = sum;
      }
    }
  }

  /** Two columns of L with two right-hand sides: four independent sums hide the adder's delay. */
  private static void dot(
      double[] t, double[] v, double[] l, int at, int u, double[] x, double[] y, int p) {
    double s0 = 0;
    double s1 = 0;
    double r0 = 0;
    double r1 = 0;
    int b = at + u;
    for (int i = 0; i < u; i++) {
      double l0 = l[at + i];
      double l1 = l[b + i];
      s0 += l0 * t[i];
      s1 += l1 * t[i];
      r0 += l0 * v[i];
      r1 += l1 * v[i];
    }
    x[p] -= s0;
    x[p + 1] -= s1;
    y[p] -= r0;
    y[p + 1] -= r1;
  }

  private static void dot(double[] t, double[] l, int at, int u, double[] x, int p) {
    double s0 = 0;
    double s1 = 0;
    double s2 = 0;
    double s3 = 0;
    int b = at + u;
    int c = b + u;
    int d = c + u;
    for (int i = 0; i < u; i++) {
      double v = t[i];
      s0 += l[at + i] * v;
      s1 += l[b + i] * v;
      s2 += l[c + i] * v;
      s3 += l[d + i] * v;
    }
    x[p] -= s0;
    x[p + 1] -= s1;
    x[p + 2] -= s2;
    x[p + 3] -= s3;
  }
}
