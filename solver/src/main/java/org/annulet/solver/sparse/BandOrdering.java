package org.annulet.solver.sparse;

/**
 * Reverse Cuthill–McKee ordering: breadth first from an unknown at the rim of each connected part,
 * neighbours of small degree first, the whole reversed (Cuthill and McKee 1969; George 1971). Keeps
 * the factor within a band; linear in the number of entries.
 */
final class BandOrdering {
  private BandOrdering() {}

  /** The unknowns in the order of elimination, shape [n]. */
  static int[] order(Adjacency graph) {
    int n = graph.size();
    int[] order = new int[n];
    boolean[] done = new boolean[n];
    int[] level = new int[n];
    int count = 0;
    for (int seed = 0; seed < n; seed++) {
      if (done[seed]) {
        continue;
      }
      int root = seed;
      int depth = -1;
      // The last of a breadth-first walk lies at the rim; a few walks suffice.
      for (int walk = 0; walk < 4; walk++) {
        int end = walk(graph, root, done, order, count, level);
        int last = order[end - 1];
        int reached = level[last];
        for (int q = count; q < end; q++) {
          done[order[q]] = false;
        }
        if (reached <= depth) {
          break;
        }
        depth = reached;
        root = last;
      }
      count = walk(graph, root, done, order, count, level);
    }
    for (int i = 0, j = n - 1; i < j; i++, j--) {
      int swap = order[i];
      order[i] = order[j];
      order[j] = swap;
    }
    return order;
  }

  private static int walk(
      Adjacency graph, int root, boolean[] done, int[] order, int from, int[] level) {
    int end = from;
    order[end++] = root;
    done[root] = true;
    level[root] = 0;
    for (int q = from; q < end; q++) {
      int i = order[q];
      int first = end;
      for (int p = graph.start()[i]; p < graph.start()[i + 1]; p++) {
        int j = graph.neighbour()[p];
        if (!done[j]) {
          done[j] = true;
          level[j] = level[i] + 1;
          int at = end++;
          while (at > first && graph.degree(order[at - 1]) > graph.degree(j)) {
            order[at] = order[at - 1];
            at--;
          }
          order[at] = j;
        }
      }
    }
    return end;
  }
}
