package org.annulet.solver.sparse;

import java.util.Arrays;

/**
 * Runs one complex symmetric multifrontal factorisation; see {@link RealFront}. Real and imaginary
 * parts lie apart, and a loop touches five arrays at most: with more, the compiler gives up.
 */
final class ComplexFront {
  private static final int PANEL = 32;

  final double[][] lowerRe;
  final double[][] lowerIm;
  final double[] pivotRe;
  final double[] pivotIm;
  double growthSquared = 1;
  private final FrontTree tree;
  private final double[][] frontRe;
  private final double[][] frontIm;
  private final double[] stackRe;
  private final double[] stackIm;
  private int top;

  ComplexFront(FrontTree tree) {
    this.tree = tree;
    pivotRe = new double[tree.order.length];
    pivotIm = new double[tree.order.length];
    int pieces = tree.pieceLength.length;
    lowerRe = new double[pieces][];
    lowerIm = new double[pieces][];
    for (int p = 0; p < pieces; p++) {
      lowerRe[p] = new double[tree.pieceLength[p]];
      lowerIm[p] = new double[tree.pieceLength[p]];
    }
    frontRe = new double[tree.largestFront][tree.largestFront];
    frontIm = new double[tree.largestFront][tree.largestFront];
    stackRe = new double[(int) tree.stackEntries];
    stackIm = new double[(int) tree.stackEntries];
  }

  void factorise(double[] re, double[] im) {
    for (int f = 0; f < tree.fronts; f++) {
      int k = tree.columns(f);
      int height = k + tree.below(f);
      for (int j = 0; j < height; j++) {
        Arrays.fill(frontRe[j], j, height, 0);
        Arrays.fill(frontIm[j], j, height, 0);
      }
      for (int j = 0; j < k; j++) {
        double[] xRe = frontRe[j];
        double[] xIm = frontIm[j];
        int column = tree.firstColumn[f] + j;
        for (int e = tree.entryStart[column]; e < tree.entryStart[column + 1]; e++) {
          xRe[tree.entryRow[e]] += re[tree.entrySource[e]];
          xIm[tree.entryRow[e]] += im[tree.entrySource[e]];
        }
      }
      for (int c = tree.childStart[f + 1] - 1; c >= tree.childStart[f]; c--) {
        add(tree.child[c]);
      }
      for (int from = 0; from < k; from += PANEL) {
        int to = Math.min(k, from + PANEL);
        eliminate(tree.firstColumn[f], from, to, height);
        for (int j = to; j < height; j++) {
          update(tree.firstColumn[f], j, from, to, height);
        }
      }
      keep(f, k, height);
    }
  }

  private void add(int child) {
    int u = tree.below(child);
    int base = tree.rowStart[child];
    top -= u * (u + 1) / 2;
    int[] above = tree.above;
    int at = top;
    for (int c = base; c < base + u; c++) {
      double[] xRe = frontRe[above[c]];
      double[] xIm = frontIm[above[c]];
      for (int r = c; r < base + u; r++) {
        int i = above[r];
        xRe[i] += stackRe[at];
        xIm[i] += stackIm[at++];
      }
    }
  }

  private void eliminate(int column, int from, int to, int height) {
    for (int j = from; j < to; j++) {
      update(column, j, from, j, height);
      double[] xRe = frontRe[j];
      double[] xIm = frontIm[j];
      double dRe = xRe[j];
      double dIm = xIm[j];
      double modulus = Math.hypot(dRe, dIm);
      if (modulus == 0 || !Double.isFinite(modulus)) {
        throw RefinedRealFactor.badPivot(tree.order[column + j], modulus);
      }
      pivotRe[column + j] = dRe;
      pivotIm[column + j] = dIm;
      scale(xRe, xIm, dRe / modulus / modulus, -dIm / modulus / modulus, j + 1, height);
    }
  }

  private static void scale(double[] xRe, double[] xIm, double p, double q, int from, int to) {
    for (int i = from; i < to; i++) {
      double re = xRe[i] * p - xIm[i] * q;
      xIm[i] = xRe[i] * q + xIm[i] * p;
      xRe[i] = re;
    }
  }

  private void update(int column, int j, int from, int to, int height) {
    double[] xRe = frontRe[j];
    double[] xIm = frontIm[j];
    int p = from;
    for (; p + 2 <= to; p += 2) {
      double[] aRe = frontRe[p];
      double[] aIm = frontIm[p];
      double[] bRe = frontRe[p + 1];
      double[] bIm = frontIm[p + 1];
      double dRe = -pivotRe[column + p];
      double dIm = -pivotIm[column + p];
      double eRe = -pivotRe[column + p + 1];
      double eIm = -pivotIm[column + p + 1];
      double pRe = aRe[j] * dRe - aIm[j] * dIm;
      double pIm = aRe[j] * dIm + aIm[j] * dRe;
      double qRe = bRe[j] * eRe - bIm[j] * eIm;
      double qIm = bRe[j] * eIm + bIm[j] * eRe;
      four(xRe, aRe, aIm, bRe, bIm, pRe, -pIm, qRe, -qIm, j, height);
      four(xIm, aRe, aIm, bRe, bIm, pIm, pRe, qIm, qRe, j, height);
    }
    if (p < to) {
      double[] aRe = frontRe[p];
      double[] aIm = frontIm[p];
      double dRe = -pivotRe[column + p];
      double dIm = -pivotIm[column + p];
      double pRe = aRe[j] * dRe - aIm[j] * dIm;
      double pIm = aRe[j] * dIm + aIm[j] * dRe;
      two(xRe, aRe, aIm, pRe, -pIm, j, height);
      two(xIm, aRe, aIm, pIm, pRe, j, height);
    }
  }

  private static void four(
      double[] x,
      double[] a,
      double[] b,
      double[] c,
      double[] d,
      double p,
      double q,
      double r,
      double s,
      int from,
      int to) {
    for (int i = from; i < to; i++) {
      x[i] += a[i] * p + b[i] * q + c[i] * r + d[i] * s;
    }
  }

  private static void two(
      double[] x, double[] a, double[] b, double p, double q, int from, int to) {
    for (int i = from; i < to; i++) {
      x[i] += a[i] * p + b[i] * q;
    }
  }

  private void keep(int f, int k, int height) {
    double[] storeRe = lowerRe[tree.piece[f]];
    double[] storeIm = lowerIm[tree.piece[f]];
    int triangle = tree.offset[f];
    int block = triangle + k * (k - 1) / 2;
    int u = height - k;
    double largest = growthSquared;
    for (int j = 0; j < k; j++) {
      double[] xRe = frontRe[j];
      double[] xIm = frontIm[j];
      System.arraycopy(xRe, j + 1, storeRe, triangle, k - j - 1);
      System.arraycopy(xIm, j + 1, storeIm, triangle, k - j - 1);
      triangle += k - j - 1;
      System.arraycopy(xRe, k, storeRe, block, u);
      System.arraycopy(xIm, k, storeIm, block, u);
      block += u;
      for (int i = j + 1; i < height; i++) {
        double l = xRe[i] * xRe[i] + xIm[i] * xIm[i];
        if (l > largest) {
          largest = l;
        }
      }
    }
    growthSquared = largest;
    for (int j = k; j < height; j++) {
      System.arraycopy(frontRe[j], j, stackRe, top, height - j);
      System.arraycopy(frontIm[j], j, stackIm, top, height - j);
      top += height - j;
    }
  }
}
