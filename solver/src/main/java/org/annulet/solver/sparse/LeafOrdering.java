package org.annulet.solver.sparse;

import java.util.Arrays;

/**
 * Minimum degree ordering of a small part of a graph, with the neighbours outside it counted in the
 * degrees (constrained minimum degree; Tinney and Walker 1967, Liu 1989). Exact degrees on bit
 * sets: n² words, so for a few hundred unknowns at most. Not thread-safe.
 */
final class LeafOrdering {
  private final Adjacency graph;
  private final int[] local;
  private int[] outside = new int[64];
  private long[][] bits = new long[0][];

  LeafOrdering(Adjacency graph) {
    this.graph = graph;
    this.local = new int[graph.size()];
    Arrays.fill(local, -1);
  }

  /**
   * Puts order[from..to) into the order of elimination; all other unknowns are eliminated later.
   */
  void arrange(int[] order, int from, int to) {
    int n = to - from;
    if (n <= 2) {
      return;
    }
    int[] part = Arrays.copyOfRange(order, from, to);
    for (int a = 0; a < n; a++) {
      local[part[a]] = a;
    }
    int all = n;
    for (int v : part) {
      for (int q = graph.start()[v]; q < graph.start()[v + 1]; q++) {
        int w = graph.neighbour()[q];
        if (local[w] < 0) {
          if (all - n == outside.length) {
            outside = Arrays.copyOf(outside, 2 * outside.length);
          }
          outside[all - n] = w;
          local[w] = all++;
        }
      }
    }
    int words = (all + 63) >>> 6;
    connect(part, words);
    int[] degree = new int[n];
    for (int a = 0; a < n; a++) {
      degree[a] = count(bits[a], words);
    }
    for (int step = 0; step < n; step++) {
      int best = -1;
      for (int a = 0; a < n; a++) {
        if (degree[a] >= 0 && (best < 0 || degree[a] < degree[best])) {
          best = a;
        }
      }
      order[from + step] = part[best];
      degree[best] = -1;
      eliminate(best, words, degree);
    }
    for (int v : part) {
      local[v] = -1;
    }
    for (int a = n; a < all; a++) {
      local[outside[a - n]] = -1;
    }
  }

  private void connect(int[] part, int words) {
    if (bits.length < part.length || bits[0].length < words) {
      bits = new long[Math.max(bits.length, part.length)][2 * words];
    }
    for (int a = 0; a < part.length; a++) {
      long[] row = bits[a];
      Arrays.fill(row, 0, words, 0);
      for (int q = graph.start()[part[a]]; q < graph.start()[part[a] + 1]; q++) {
        int b = local[graph.neighbour()[q]];
        row[b >>> 6] |= 1L << b;
      }
    }
  }

  private void eliminate(int gone, int words, int[] degree) {
    long[] row = bits[gone];
    for (int word = 0; word < words; word++) {
      for (long rest = row[word]; rest != 0; rest &= rest - 1) {
        int b = (word << 6) + Long.numberOfTrailingZeros(rest);
        if (b >= degree.length) {
          return;
        }
        if (degree[b] < 0) {
          continue;
        }
        long[] other = bits[b];
        for (int w = 0; w < words; w++) {
          other[w] |= row[w];
        }
        other[b >>> 6] &= ~(1L << b);
        other[gone >>> 6] &= ~(1L << gone);
        degree[b] = count(other, words);
      }
    }
  }

  private static int count(long[] row, int words) {
    int count = 0;
    for (int w = 0; w < words; w++) {
      count += Long.bitCount(row[w]);
    }
    return count;
  }
}
