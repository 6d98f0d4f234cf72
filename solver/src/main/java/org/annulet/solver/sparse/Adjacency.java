package org.annulet.solver.sparse;

/**
 * The graph of a symmetric pattern: for every unknown its neighbours, without itself.
 *
 * @param start first neighbour of each unknown, shape [n + 1]
 * @param neighbour of each unknown, not sorted
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

  /** The unknowns in breadth-first order: neighbours come to lie near each other in memory. */
  int[] breadthFirst() {
    int n = size();
    int[] walk = new int[n];
    boolean[] seen = new boolean[n];
    int end = 0;
    int seed = 0;
    for (int q = 0; q < n; q++) {
      if (q == end) {
        while (seen[seed]) {
          seed++;
        }
        seen[seed] = true;
        walk[end++] = seed;
      }
      int v = walk[q];
      for (int p = start[v]; p < start[v + 1]; p++) {
        int w = neighbour[p];
        if (!seen[w]) {
          seen[w] = true;
          walk[end++] = w;
        }
      }
    }
    return walk;
  }

  /**
   * The same graph in other numbers.
   *
   * @param order the unknown that becomes number k, shape [n]
   */
  Adjacency renumbered(int[] order) {
    int n = size();
    int[] place = EliminationTree.inverse(order);
    int[] begin = new int[n + 1];
    int[] other = new int[neighbour.length];
    int m = 0;
    for (int k = 0; k < n; k++) {
      int v = order[k];
      for (int p = start[v]; p < start[v + 1]; p++) {
        other[m++] = place[neighbour[p]];
      }
      begin[k + 1] = m;
    }
    return new Adjacency(begin, other);
  }

  int size() {
    return start.length - 1;
  }

  int degree(int i) {
    return start[i + 1] - start[i];
  }
}
