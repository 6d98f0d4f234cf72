package org.annulet.solver.sparse;

import java.util.Arrays;

/**
 * Elimination tree of an ordering, renumbered so that every subtree is contiguous (postorder; Liu
 * 1990), with the number of entries in each column of L (Gilbert, Ng and Peyton 1994).
 *
 * @param order the unknown eliminated k-th: the ordering given, postordered
 * @param parent of each column, above it; −1 at a root
 * @param count entries of each column of L with the diagonal
 */
record EliminationTree(int[] order, int[] parent, int[] count) {

  static EliminationTree of(Adjacency graph, int[] ordering) {
    int n = graph.size();
    int[] place = inverse(ordering);
    int[] raw = parents(graph, ordering, place);
    int[] post = postorder(raw);
    int[] order = new int[n];
    int[] number = new int[n];
    for (int k = 0; k < n; k++) {
      order[k] = ordering[post[k]];
      number[post[k]] = k;
    }
    int[] parent = new int[n];
    for (int k = 0; k < n; k++) {
      int up = raw[post[k]];
      parent[k] = up < 0 ? -1 : number[up];
    }
    return new EliminationTree(order, parent, counts(graph, order, parent));
  }

  static int[] inverse(int[] order) {
    int[] place = new int[order.length];
    for (int k = 0; k < order.length; k++) {
      place[order[k]] = k;
    }
    return place;
  }

  private static int[] parents(Adjacency graph, int[] order, int[] place) {
    int n = order.length;
    int[] parent = new int[n];
    int[] ancestor = new int[n];
    for (int k = 0; k < n; k++) {
      parent[k] = -1;
      ancestor[k] = -1;
      int v = order[k];
      for (int q = graph.start()[v]; q < graph.start()[v + 1]; q++) {
        int i = place[graph.neighbour()[q]];
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

  /** The nodes of a forest, children before parents, children of smaller number first. */
  static int[] postorder(int[] parent) {
    int n = parent.length;
    int[] child = new int[n];
    int[] sibling = new int[n];
    Arrays.fill(child, -1);
    for (int k = n - 1; k >= 0; k--) {
      if (parent[k] >= 0) {
        sibling[k] = child[parent[k]];
        child[parent[k]] = k;
      }
    }
    int[] post = new int[n];
    int[] stack = new int[n];
    int count = 0;
    for (int root = 0; root < n; root++) {
      if (parent[root] >= 0) {
        continue;
      }
      int depth = 0;
      stack[0] = root;
      while (depth >= 0) {
        int k = stack[depth];
        int next = child[k];
        if (next >= 0) {
          child[k] = sibling[next];
          stack[++depth] = next;
        } else {
          post[count++] = k;
          depth--;
        }
      }
    }
    return post;
  }

  private static int[] counts(Adjacency graph, int[] order, int[] parent) {
    int n = order.length;
    int[] place = inverse(order);
    int[] first = new int[n];
    int[] count = new int[n];
    Arrays.fill(first, -1);
    for (int k = 0; k < n; k++) {
      count[k] = first[k] == -1 ? 1 : 0;
      for (int j = k; j != -1 && first[j] == -1; j = parent[j]) {
        first[j] = k;
      }
    }
    int[] ancestor = new int[n];
    int[] deepest = new int[n];
    int[] previous = new int[n];
    Arrays.fill(deepest, -1);
    Arrays.fill(previous, -1);
    for (int j = 0; j < n; j++) {
      ancestor[j] = j;
    }
    for (int j = 0; j < n; j++) {
      if (parent[j] >= 0) {
        count[parent[j]]--;
      }
      int v = order[j];
      for (int q = graph.start()[v]; q < graph.start()[v + 1]; q++) {
        int i = place[graph.neighbour()[q]];
        if (i <= j || first[j] <= deepest[i]) {
          continue; // not a leaf of the subtree of row i
        }
        deepest[i] = first[j];
        count[j]++;
        int last = previous[i];
        previous[i] = j;
        if (last >= 0) {
          count[common(last, ancestor)]--;
        }
      }
      if (parent[j] >= 0) {
        ancestor[j] = parent[j];
      }
    }
    for (int j = 0; j < n; j++) {
      if (parent[j] >= 0) {
        count[parent[j]] += count[j];
      }
    }
    return count;
  }

  private static int common(int leaf, int[] ancestor) {
    int root = leaf;
    while (root != ancestor[root]) {
      root = ancestor[root];
    }
    for (int k = leaf; k != root; ) {
      int up = ancestor[k];
      ancestor[k] = root;
      k = up;
    }
    return root;
  }
}
