package org.annulet.solver.sparse;

import java.util.Arrays;

/** Triangular solves with a complex multifrontal factor; see {@link RealSweeps}. Immutable. */
final class ComplexSweeps {
  private static final int BLOCK = 8;

  private final FrontTree tree;
  private final double[][] lowerRe;
  private final double[][] lowerIm;
  private final double[] pivotRe;
  private final double[] pivotIm;

  ComplexSweeps(FrontTree tree, ComplexFront front) {
    this.tree = tree;
    this.lowerRe = front.lowerRe;
    this.lowerIm = front.lowerIm;
    this.pivotRe = front.pivotRe;
    this.pivotIm = front.pivotIm;
  }

  void solve(double[][] re, double[][] im) {
    int n = tree.order.length;
    for (int from = 0; from < re.length; from += BLOCK) {
      int columns = Math.min(BLOCK, re.length - from);
      double[][] xRe = new double[columns][n];
      double[][] xIm = new double[columns][n];
      for (int c = 0; c < columns; c++) {
        for (int k = 0; k < n; k++) {
          xRe[c][k] = re[from + c][tree.order[k]];
          xIm[c][k] = im[from + c][tree.order[k]];
        }
      }
      double[][] tRe = new double[columns][tree.largestBelow];
      double[][] tIm = new double[columns][tree.largestBelow];
      double[][] copy = new double[4][tree.largestBelow];
      for (int f = 0; f < tree.fronts; f++) {
        forward(f, xRe, xIm, tRe, tIm, copy);
      }
      for (int f = tree.fronts - 1; f >= 0; f--) {
        backward(f, xRe, xIm, tRe, tIm);
      }
      for (int c = 0; c < columns; c++) {
        for (int k = 0; k < n; k++) {
          re[from + c][tree.order[k]] = xRe[c][k];
          im[from + c][tree.order[k]] = xIm[c][k];
        }
      }
    }
  }

  private void forward(
      int f, double[][] xRe, double[][] xIm, double[][] tRe, double[][] tIm, double[][] copy) {
    double[] lRe = lowerRe[tree.piece[f]];
    double[] lIm = lowerIm[tree.piece[f]];
    int at = tree.offset[f];
    int begin = tree.firstColumn[f];
    int end = tree.firstColumn[f + 1];
    for (int p = begin; p < end; p++) {
      for (int c = 0; c < xRe.length; c++) {
        double[] a = xRe[c];
        double[] b = xIm[c];
        double sRe = a[p];
        double sIm = b[p];
        int q = at - p - 1;
        for (int i = p + 1; i < end; i++) {
          a[i] -= lRe[q + i] * sRe - lIm[q + i] * sIm;
          b[i] -= lRe[q + i] * sIm + lIm[q + i] * sRe;
        }
      }
      at += end - p - 1;
    }
    int u = tree.below(f);
    if (u == 0) {
      return;
    }
    for (int c = 0; c < xRe.length; c++) {
      Arrays.fill(tRe[c], 0, u, 0);
      Arrays.fill(tIm[c], 0, u, 0);
    }
    int p = begin;
    for (; p + 2 <= end; p += 2) {
      System.arraycopy(lRe, at, copy[0], 0, u);
      System.arraycopy(lIm, at, copy[1], 0, u);
      System.arraycopy(lRe, at + u, copy[2], 0, u);
      System.arraycopy(lIm, at + u, copy[3], 0, u);
      for (int c = 0; c < xRe.length; c++) {
        double aRe = xRe[c][p];
        double aIm = xIm[c][p];
        double bRe = xRe[c][p + 1];
        double bIm = xIm[c][p + 1];
        four(tRe[c], copy, aRe, -aIm, bRe, -bIm, u);
        four(tIm[c], copy, aIm, aRe, bIm, bRe, u);
      }
      at += 2 * u;
    }
    if (p < end) {
      for (int c = 0; c < xRe.length; c++) {
        double sRe = xRe[c][p];
        double sIm = xIm[c][p];
        for (int i = 0; i < u; i++) {
          tRe[c][i] += lRe[at + i] * sRe - lIm[at + i] * sIm;
          tIm[c][i] += lRe[at + i] * sIm + lIm[at + i] * sRe;
        }
      }
    }
    int base = tree.rowStart[f];
    for (int c = 0; c < xRe.length; c++) {
      for (int i = 0; i < u; i++) {
        int r = tree.row[base + i];
        xRe[c][r] -= tRe[c][i];
        xIm[c][r] -= tIm[c][i];
      }
    }
  }

  private static void four(
      double[] t, double[][] copy, double p, double q, double r, double s, int u) {
    double[] a = copy[0];
    double[] b = copy[1];
    double[] c = copy[2];
    double[] d = copy[3];
    for (int i = 0; i < u; i++) {
      t[i] += a[i] * p + b[i] * q + c[i] * r + d[i] * s;
    }
  }

  private void backward(int f, double[][] xRe, double[][] xIm, double[][] tRe, double[][] tIm) {
    double[] lRe = lowerRe[tree.piece[f]];
    double[] lIm = lowerIm[tree.piece[f]];
    int begin = tree.firstColumn[f];
    int end = tree.firstColumn[f + 1];
    int k = end - begin;
    int u = tree.below(f);
    int base = tree.rowStart[f];
    int block = tree.offset[f] + k * (k - 1) / 2;
    for (int c = 0; c < xRe.length; c++) {
      double[] a = xRe[c];
      double[] b = xIm[c];
      double[] tr = tRe[c];
      double[] ti = tIm[c];
      for (int i = 0; i < u; i++) {
        tr[i] = a[tree.row[base + i]];
        ti[i] = b[tree.row[base + i]];
      }
      for (int p = begin; p < end; p++) {
        double modulus = pivotRe[p] * pivotRe[p] + pivotIm[p] * pivotIm[p];
        double re = (a[p] * pivotRe[p] + b[p] * pivotIm[p]) / modulus;
        b[p] = (b[p] * pivotRe[p] - a[p] * pivotIm[p]) / modulus;
        a[p] = re;
      }
    }
    int at = block;
    for (int p = begin; p < end; p++) {
      for (int c = 0; c < xRe.length; c++) {
        dot(tRe[c], tIm[c], lRe, lIm, at, u, xRe[c], xIm[c], p);
      }
      at += u;
    }
    for (int c = 0; c < xRe.length; c++) {
      double[] a = xRe[c];
      double[] b = xIm[c];
      at = block;
      for (int p = end - 1; p >= begin; p--) {
        at -= end - p - 1;
        double re = a[p];
        double im = b[p];
        int q = at - p - 1;
        for (int i = p + 1; i < end; i++) {
          re -= lRe[q + i] * a[i] - lIm[q + i] * b[i];
          im -= lRe[q + i] * b[i] + lIm[q + i] * a[i];
        }
        a[p] = re;
        b[p] = im;
      }
    }
  }

  private static void dot(
      double[] tRe,
      double[] tIm,
      double[] lRe,
      double[] lIm,
      int at,
      int u,
      double[] xRe,
      double[] xIm,
      int p) {
    double rr = 0;
    double ii = 0;
    double ri = 0;
    double ir = 0;
    for (int i = 0; i < u; i++) {
      double a = lRe[at + i];
      double b = lIm[at + i];
      rr += a * tRe[i];
      ii += b * tIm[i];
      ri += a * tIm[i];
      ir += b * tRe[i];
    }
    xRe[p] -= rr - ii;
    xIm[p] -= ri + ir;
  }
}
