package org.annulet.solver.medium;

/**
 * A k-d tree of points in two or three dimensions: the nearest k in O(k log n) (Bentley 1975).
 * Immutable; queries may run side by side.
 */
final class PointTree {
  private static final int LEAF = 8;
  private final double[][] p;
  private final int[] order;
  private final byte[] axes;

  /**
   * @param p coordinates, shape [dimension][n]; kept, not modified
   */
  PointTree(double[][] p) {
    this.p = p;
    this.order = new int[p[0].length];
    this.axes = new byte[order.length];
    for (int i = 0; i < order.length; i++) {
      order[i] = i;
    }
    build(0, order.length);
  }

  int size() {
    return order.length;
  }

  double coordinate(int axis, int point) {
    return p[axis][point];
  }

  /**
   * The nearest points, nearest first.
   *
   * @param q query, shape [dimension]
   * @param index filled with point numbers; its length is the number wanted
   * @param squared filled with squared distances
   * @return how many were found: the length of index or the number of points, whichever is less
   */
  int nearest(double[] q, int[] index, double[] squared) {
    return search(q, 0, order.length, index, squared, 0);
  }

  private int search(double[] q, int from, int to, int[] index, double[] squared, int found) {
    int n = found;
    if (to - from <= LEAF) {
      for (int s = from; s < to; s++) {
        n = offer(q, order[s], index, squared, n);
      }
      return n;
    }
    int middle = (from + to) >>> 1;
    int axis = axes[middle];
    double gap = q[axis] - p[axis][order[middle]];
    n = offer(q, order[middle], index, squared, n);
    if (gap <= 0) {
      n = search(q, from, middle, index, squared, n);
    } else {
      n = search(q, middle + 1, to, index, squared, n);
    }
    if (n < index.length || gap * gap < squared[n - 1]) {
      if (gap <= 0) {
        n = search(q, middle + 1, to, index, squared, n);
      } else {
        n = search(q, from, middle, index, squared, n);
      }
    }
    return n;
  }

  private int offer(double[] q, int point, int[] index, double[] squared, int found) {
    double d = 0;
    for (int a = 0; a < q.length; a++) {
      double e = q[a] - p[a][point];
      d += e * e;
    }
    int n = found;
    if (n == index.length) {
      if (!(d < squared[n - 1])) {
        return n;
      }
      n--;
    }
    int s = n;
    while (s > 0 && squared[s - 1] > d) {
      squared[s] = squared[s - 1];
      index[s] = index[s - 1];
      s--;
    }
    squared[s] = d;
    index[s] = point;
    return n + 1;
  }

  private void build(int from, int to) {
    if (to - from <= LEAF) {
      return;
    }
    int axis = 0;
    double width = -1;
    for (int a = 0; a < p.length; a++) {
      double low = Double.POSITIVE_INFINITY;
      double high = Double.NEGATIVE_INFINITY;
      for (int s = from; s < to; s++) {
        low = Math.min(low, p[a][order[s]]);
        high = Math.max(high, p[a][order[s]]);
      }
      if (high - low > width) {
        width = high - low;
        axis = a;
      }
    }
    int middle = (from + to) >>> 1;
    axes[middle] = (byte) axis;
    select(p[axis], from, to - 1, middle);
    build(from, middle);
    build(middle + 1, to);
  }

  private void select(double[] key, int first, int last, int wanted) {
    int from = first;
    int to = last;
    while (from < to) {
      double pivot = key[order[(from + to) >>> 1]];
      int i = from;
      int j = to;
      while (i <= j) {
        while (key[order[i]] < pivot) {
          i++;
        }
        while (key[order[j]] > pivot) {
          j--;
        }
        if (i <= j) {
          int swap = order[i];
          order[i++] = order[j];
          order[j--] = swap;
        }
      }
      if (wanted <= j) {
        to = j;
      } else if (wanted >= i) {
        from = i;
      } else {
        return;
      }
    }
  }
}
