package org.annulet.solver.sparse;

import java.util.Arrays;

/**
 * Runs one real multifrontal factorisation: assembles each front, eliminates its columns, keeps
 * their part of L and leaves the rest to the parent.
 *
 * <p>A front is an array of separate columns, since the compiler vectorises a loop over several
 * arrays only when all are indexed by the same bare variable.
 */
final class RealFront {
  /** Columns eliminated before the rest of the front is updated: they stay in the fast cache. */
  private static final int PANEL = 32;

  final double[][] lower;
  final double[] pivot;
  double growth = 1;
  private final FrontTree tree;
  private final double[][] front;
  private final double[] stack;
  private int top;

  RealFront(FrontTree tree) {
    this.tree = tree;
    pivot = new double[tree.order.length];
    lower = new double[tree.pieceLength.length][];
    for (int p = 0; p < lower.length; p++) {
      lower[p] = new double[tree.pieceLength[p]];
    }
    front = new double[tree.largestFront][tree.largestFront];
    stack = new double[(int) tree.stackEntries];
  }

  void factorise(double[] values) {
    for (int f = 0; f < tree.fronts; f++) {
      int k = tree.columns(f);
      int height = k + tree.below(f);
      for (int j = 0; j < height; j++) {
        Arrays.fill(front[j], j, height, 0);
      }
      for (int j = 0; j < k; j++) {
        double[] x = front[j];
        int column = tree.firstColumn[f] + j;
        for (int e = tree.entryStart[column]; e < tree.entryStart[column + 1]; e++) {
          x[tree.entryRow[e]] += values[tree.entrySource[e]];
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

  /** Adds the update matrix of a child, the last on the stack. */
  private void add(int child) {
    int u = tree.below(child);
    int base = tree.rowStart[child];
    top -= u * (u + 1) / 2;
    int[] above = tree.above;
    int at = top;
    for (int c = base; c < base + u; c++) {
      double[] x = front[above[c]];
      for (int r = c; r < base + u; r++) {
        x[above[r]] += stack[at++];
      }
    }
  }

  private void eliminate(int column, int from, int to, int height) {
    for (int j = from; j < to; j++) {
      update(column, j, from, j, height);
      double[] x = front[j];
      double d = x[j];
      if (d == 0 || !Double.isFinite(d)) {
        throw RefinedRealFactor.badPivot(tree.order[column + j], Math.abs(d));
      }
      pivot[column + j] = d;
      double inverse = 1 / d;
      for (int i = j + 1; i < height; i++) {
        x[i] *= inverse;
      }
    }
  }

  /** Subtracts from column j what eliminating the columns from … to − 1 leaves there. */
  private void update(int column, int j, int from, int to, int height) {
    double[] x = front[j];
    int p = from;
    for (; p + 4 <= to; p += 4) {
      double[] a = front[p];
      double[] b = front[p + 1];
      double[] c = front[p + 2];
      double[] d = front[p + 3];
      four(
          x,
          a,
          b,
          c,
          d,
          -a[j] * pivot[column + p],
          -b[j] * pivot[column + p + 1],
          -c[j] * pivot[column + p + 2],
          -d[j] * pivot[column + p + 3],
          j,
          height);
    }
    if (p + 2 <= to) {
      double[] a = front[p];
      double[] b = front[p + 1];
      two(x, a, b, -a[j] * pivot[column + p], -b[j] * pivot[column + p + 1], j, height);
      p += 2;
    }
    if (p < to) {
      double[] a = front[p];
      one(x, a, -a[j] * pivot[column + p], j, height);
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

  private static void one(double[] x, double[] a, double p, int from, int to) {
    for (int i = from; i < to; i++) {
      x[i] += a[i] * p;
    }
  }

  /** Stores the eliminated columns and puts the rest on the stack. */
  private void keep(int f, int k, int height) {
    double[] store = lower[tree.piece[f]];
    int triangle = tree.offset[f];
    int block = triangle + k * (k - 1) / 2;
    double largest = growth;
    for (int j = 0; j < k; j++) {
      double[] x = front[j];
      System.arraycopy(x, j + 1, store, triangle, k - j - 1);
      triangle += k - j - 1;
      System.arraycopy(x, k, store, block, height - k);
      block += height - k;
      for (int i = j + 1; i < height; i++) {
        double l = Math.abs(x[i]);
        if (l > largest) {
          largest = l;
        }
      }
    }
    growth = largest;
    for (int j = k; j < height; j++) {
      System.arraycopy(front[j], j, stack, top, height - j);
      top += height - j;
    }
  }
}
