package org.annulet.solver.sparse;

import java.util.Arrays;

/**
 * The fewest unknowns that touch every edge across a cut: minimum vertex cover of the bipartite
 * graph of the cut edges, from a maximum matching (Kőnig 1931). Not thread-safe.
 */
final class SeparatorCover {
  private final Adjacency graph;
  private final int[] mate;
  private final int[] visited;
  private final int[] cursor;
  private int[] path = new int[64];
  private int stamp;

  SeparatorCover(Adjacency graph) {
    this.graph = graph;
    mate = new int[graph.size()];
    visited = new int[graph.size()];
    cursor = new int[graph.size()];
    Arrays.fill(mate, -1);
  }

  /**
   * Writes left side, right side and separator, one after the other, to {@code order[from…]}.
   *
   * @param ranked the part along the direction of the cut
   * @param place the first of {@code ranked} on the right side
   * @param n size of the part
   * @param owner which part each unknown belongs to
   * @param id this part
   * @param rank inverse of {@code ranked}; overwritten
   * @return sizes of left side and right side
   */
  int[] separate(
      int[] ranked, int place, int n, int[] owner, int id, int[] rank, int[] order, int from) {
    for (int q = 0; q < n; q++) {
      rank[ranked[q]] = q < place ? 0 : 1;
    }
    int[] rim = new int[place];
    int rimSize = 0;
    for (int q = 0; q < place; q++) {
      if (crosses(ranked[q], owner, id, rank)) {
        rim[rimSize++] = ranked[q];
      }
    }
    for (int r = 0; r < rimSize; r++) {
      stamp++;
      augment(rim[r], owner, id, rank);
    }
    // Kőnig: reachable by alternating paths from unmatched left vertices.
    stamp++;
    for (int r = 0; r < rimSize; r++) {
      if (mate[rim[r]] < 0 && visited[rim[r]] != stamp) {
        reach(rim[r], owner, id, rank);
      }
    }
    int left = from;
    for (int q = 0; q < place; q++) {
      int v = ranked[q];
      boolean separates = mate[v] >= 0 && visited[v] != stamp;
      if (!separates) {
        order[left++] = v;
      }
    }
    int right = left;
    for (int q = place; q < n; q++) {
      int v = ranked[q];
      if (!(mate[v] >= 0 && visited[v] == stamp)) {
        order[right++] = v;
      }
    }
    int end = right;
    for (int r = 0; r < rimSize; r++) {
      int v = rim[r];
      if (mate[v] >= 0) {
        order[end++] = visited[v] != stamp ? v : mate[v];
      }
    }
    for (int r = 0; r < rimSize; r++) {
      if (mate[rim[r]] >= 0) {
        mate[mate[rim[r]]] = -1;
        mate[rim[r]] = -1;
      }
    }
    return new int[] {left - from, right - left};
  }

  private boolean crosses(int v, int[] owner, int id, int[] side) {
    for (int p = graph.start()[v]; p < graph.start()[v + 1]; p++) {
      int w = graph.neighbour()[p];
      if (owner[w] == id && side[w] == 1) {
        return true;
      }
    }
    return false;
  }

  /** Depth-first search for an augmenting path from an unmatched left vertex. */
  private void augment(int root, int[] owner, int id, int[] side) {
    int depth = 0;
    push(0, root);
    while (depth >= 0) {
      int v = path[depth];
      if (cursor[v] == graph.start()[v + 1]) {
        depth--;
        continue;
      }
      int w = graph.neighbour()[cursor[v]++];
      if (owner[w] != id || side[w] != 1 || visited[w] == stamp) {
        continue;
      }
      visited[w] = stamp;
      if (mate[w] < 0) {
        // Flip the path: each left vertex takes the right vertex it reached last.
        int free = w;
        for (int d = depth; d >= 0; d--) {
          int u = path[d];
          int old = mate[u];
          mate[u] = free;
          mate[free] = u;
          free = old;
        }
        return;
      }
      push(++depth, mate[w]);
    }
  }

  private void reach(int root, int[] owner, int id, int[] side) {
    int depth = 0;
    push(0, root);
    visited[root] = stamp;
    while (depth >= 0) {
      int v = path[depth];
      if (cursor[v] == graph.start()[v + 1]) {
        depth--;
        continue;
      }
      int w = graph.neighbour()[cursor[v]++];
      if (owner[w] == id && side[w] == 1 && visited[w] != stamp) {
        visited[w] = stamp;
        visited[mate[w]] = stamp;
        push(++depth, mate[w]);
      }
    }
  }

  private void push(int depth, int v) {
    if (depth == path.length) {
      path = Arrays.copyOf(path, 2 * depth);
    }
    path[depth] = v;
    cursor[v] = graph.start()[v];
  }
}
