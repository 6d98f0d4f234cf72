package org.annulet.solver.sparse;

/**
 * The graph of a symmetric pattern: for every unknown its neighbours, without itself.
 *
 * @param start first neighbour of each unknown, shape [n + 1]
 * @param neighbour ascending for each unknown
 */
record Adjacency(int[] start, int[] neighbour) {
  static Adjacency of(SymmetricPattern pattern) {
    int n = pattern.size();
    int[] start = new int[n + 1];
    for (int i = 0; i < n; i++) {
      int last = pattern.rowStart(i + 1) - 1;
      start[i + 1] += last - pattern.rowStart(i);
      for (int q = pattern.rowStart(i); q < last; q++) {
        start[pattern.column(q) + 1]++;
      }
    }
    for (int i = 0; i < n; i++) {
      start[i + 1] += start[i];
    }
    int[] neighbour = new int[start[n]];
    int[] next = start.clone();
    for (int i = 0; i < n; i++) {
      for (int q = pattern.rowStart(i); q < pattern.rowStart(i + 1) - 1; q++) {
        int j = pattern.column(q);
        neighbour[next[i]++] = j;
        neighbour[next[j]++] = i;
      }
    }
    return new Adjacency(start, neighbour);
  }

  int size() {
    return start.length - 1;
  }

  int degree(int i) {
    return start[i + 1] - start[i];
  }
}
