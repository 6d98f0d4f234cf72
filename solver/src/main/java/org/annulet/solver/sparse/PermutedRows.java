package org.annulet.solver.sparse;

/**
 * A pattern renumbered along the order of elimination: lower triangle by rows, without the
 * diagonal.
 *
 * @param order the unknown eliminated k-th, shape [n]
 * @param place inverse of {@code order}
 * @param start first entry of each row, shape [n + 1]
 * @param column columns of the entries, not sorted
 * @param source index of each entry in the values of the pattern
 * @param diagonal index of each diagonal entry in the values of the pattern
 * @param parent elimination tree (Liu 1990), −1 at a root
 */
record PermutedRows(
    int[] order,
    int[] place,
    int[] start,
    int[] column,
    int[] source,
    int[] diagonal,
    int[] parent) {

  static PermutedRows of(SymmetricPattern pattern, int[] order) {
    int n = pattern.size();
    int[] place = new int[n];
    for (int k = 0; k < n; k++) {
      place[order[k]] = k;
    }
    int[] start = new int[n + 1];
    int[] diagonal = new int[n];
    for (int i = 0; i < n; i++) {
      int last = pattern.rowStart(i + 1) - 1;
      diagonal[place[i]] = last;
      for (int q = pattern.rowStart(i); q < last; q++) {
        start[Math.max(place[i], place[pattern.column(q)]) + 1]++;
      }
    }
    for (int k = 0; k < n; k++) {
      start[k + 1] += start[k];
    }
    int[] next = start.clone();
    int[] column = new int[start[n]];
    int[] source = new int[start[n]];
    for (int i = 0; i < n; i++) {
      for (int q = pattern.rowStart(i); q < pattern.rowStart(i + 1) - 1; q++) {
        int a = place[i];
        int b = place[pattern.column(q)];
        int at = next[Math.max(a, b)]++;
        column[at] = Math.min(a, b);
        source[at] = q;
      }
    }
    return new PermutedRows(order, place, start, column, source, diagonal, tree(start, column));
  }

  private static int[] tree(int[] start, int[] column) {
    int n = start.length - 1;
    int[] parent = new int[n];
    int[] ancestor = new int[n];
    for (int k = 0; k < n; k++) {
      parent[k] = -1;
      ancestor[k] = -1;
      for (int q = start[k]; q < start[k + 1]; q++) {
        int i = column[q];
        while (i != -1 && i < k) {
          int up = ancestor[i];
          ancestor[i] = k;
          if (up == -1) {
            parent[i] = k;
          }
          i = up;
        }
      }
    }
    return parent;
  }

  int size() {
    return order.length;
  }
}
