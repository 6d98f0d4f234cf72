package org.annulet.solver.sparse;

import java.util.Arrays;

/**
 * Which columns of L are eliminated together in one dense front.
 *
 * <p>Columns of the same structure form a front; a front is then merged into its parent where that
 * costs few zeros (relaxed amalgamation, Ashcraft and Grimes 1989). Small fronts are merged freely,
 * since the overhead of a front outweighs its arithmetic; large ones hardly.
 *
 * @param order the unknown eliminated k-th, each front's columns side by side, fronts in postorder
 * @param firstColumn of each front, shape [fronts + 1]
 * @param parent of each front, above it; −1 at a root
 */
record FrontPartition(int[] order, int[] firstColumn, int[] parent) {
  /** Largest number of columns of a merged front, and the share of zeros it may then have. */
  private static final int[] COLUMNS = {4, 16, 48, Integer.MAX_VALUE};

  private static final double[] ZEROS = {0.6, 0.25, 0.08, 0.03};

  static FrontPartition of(EliminationTree tree) {
    int n = tree.order().length;
    int[] front = new int[n];
    int fronts = 0;
    for (int k = 0; k < n; k++) {
      boolean continues =
          k > 0 && tree.parent()[k - 1] == k && tree.count()[k - 1] == tree.count()[k] + 1;
      front[k] = continues ? fronts - 1 : fronts++;
    }
    int[] columns = new int[fronts];
    int[] below = new int[fronts];
    int[] up = new int[fronts];
    int[] head = new int[fronts];
    int[] tail = new int[fronts];
    for (int k = n - 1; k >= 0; k--) {
      int f = front[k];
      if (columns[f]++ == 0) {
        tail[f] = k;
        below[f] = tree.count()[k] - 1;
        up[f] = tree.parent()[k] < 0 ? -1 : front[tree.parent()[k]];
      }
      head[f] = k;
    }
    int[] next = new int[n];
    for (int k = 0; k < n; k++) {
      next[k] = k + 1 < n && front[k + 1] == front[k] ? k + 1 : -1;
    }
    boolean[] merged = merge(columns, below, up, head, tail, next);
    return number(tree.order(), merged, up, head, next);
  }

  private static boolean[] merge(
      int[] columns, int[] below, int[] up, int[] head, int[] tail, int[] next) {
    int fronts = columns.length;
    boolean[] merged = new boolean[fronts];
    long[] entries = new long[fronts];
    int[] child = new int[fronts];
    int[] sibling = new int[fronts];
    Arrays.fill(child, -1);
    for (int f = 0; f < fronts; f++) {
      entries[f] = trapezoid(columns[f], below[f]);
    }
    for (int p = 0; p < fronts; p++) {
      // The children are final now. The one that fits best is merged first.
      while (true) {
        int best = -1;
        double least = Double.POSITIVE_INFINITY;
        for (int c = child[p]; c >= 0; c = sibling[c]) {
          if (!merged[c]) {
            int k = columns[p] + columns[c];
            long all = trapezoid(k, below[p]);
            double zeros = (double) (all - entries[p] - entries[c]) / all;
            int level = 0;
            while (k > COLUMNS[level]) {
              level++;
            }
            if (zeros <= ZEROS[level] && zeros < least) {
              least = zeros;
              best = c;
            }
          }
        }
        if (best < 0) {
          break;
        }
        merged[best] = true;
        columns[p] += columns[best];
        entries[p] += entries[best];
        next[tail[best]] = head[p];
        head[p] = head[best];
      }
      if (up[p] >= 0) {
        sibling[p] = child[up[p]];
        child[up[p]] = p;
      }
    }
    return merged;
  }

  private static long trapezoid(int columns, int below) {
    return (long) columns * (columns + 1) / 2 + (long) columns * below;
  }

  private static FrontPartition number(
      int[] order, boolean[] merged, int[] up, int[] head, int[] next) {
    int fronts = merged.length;
    int[] top = new int[fronts];
    int count = 0;
    for (int f = fronts - 1; f >= 0; f--) {
      top[f] = merged[f] ? top[up[f]] : f;
      count += merged[f] ? 0 : 1;
    }
    int[] live = new int[count];
    int[] index = new int[fronts];
    int m = 0;
    for (int f = 0; f < fronts; f++) {
      if (!merged[f]) {
        index[f] = m;
        live[m++] = f;
      }
    }
    int[] parent = new int[count];
    for (int a = 0; a < count; a++) {
      int u = up[live[a]];
      parent[a] = u < 0 ? -1 : index[top[u]];
    }
    int[] post = EliminationTree.postorder(parent);
    int[] place = EliminationTree.inverse(post);
    int[] newParent = new int[count];
    int[] firstColumn = new int[count + 1];
    int[] newOrder = new int[order.length];
    int column = 0;
    for (int a = 0; a < count; a++) {
      newParent[a] = parent[post[a]] < 0 ? -1 : place[parent[post[a]]];
      for (int k = head[live[post[a]]]; k >= 0; k = next[k]) {
        newOrder[column++] = order[k];
      }
      firstColumn[a + 1] = column;
    }
    return new FrontPartition(newOrder, firstColumn, newParent);
  }
}
