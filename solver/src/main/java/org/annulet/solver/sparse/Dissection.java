package org.annulet.solver.sparse;

import java.util.Arrays;

/**
 * Nested dissection: a part is split in two by a set of unknowns with no edge across, the separator
 * is eliminated last, and both sides are split again (George 1973).
 *
 * <p>Along each of several directions all unknowns are ranked and every place of the cut between
 * {@link #EDGE} and 1 − EDGE of the part is tried at once: unknown v belongs to the separator of
 * cut p when its rank is below p and a neighbour's is not. The smallest separator over directions
 * and places wins, so a cut passes through a narrow place where there is one. Geometry only ranks;
 * what separates is decided on the graph, hence seams, ducts and coinciding unknowns need no care.
 * Ranks of breadth-first walks serve where there are no coordinates, or where these mislead.
 *
 * <p>Cost: about n log n times the number of directions. Small parts go to {@link LeafOrdering}.
 */
final class Dissection {
  /** Parts up to this size are ordered by minimum degree. */
  private static final int LEAF = 80;

  /** The smaller side keeps at least this share. */
  private static final double EDGE = 0.3;

  /** A lopsided cut must be smaller by this share times (difference of sides)² to be taken. */
  private static final double LOPSIDED = 0.5;

  /** Beyond this many times √n a geometric separator is doubted and walks are tried too. */
  private static final double DOUBTFUL = 1.8;

  /** Directions along which a part is shorter than this share of its length are not tried. */
  private static final double SHORT = 0.6;

  /** Directions whose cosine with the long axis exceeds this are taken for the same. */
  private static final double ALONG = 0.98;

  private static final double[][] DIRECTIONS = {{1, 0}, {0, 1}, {0.6, 0.8}, {0.8, -0.6}};

  private final Adjacency graph;
  private final double[][] at;
  private final int[] order;
  private final int[] owner;
  private final int[] rank;
  private final int[] first;
  private final int[] second;
  private final int[] change;
  private final double[] value;
  private int[] bins = new int[1024];
  private int[] current;
  private int[] best;
  private int bestPlace;
  private double bestCost;
  private int owners = 1;
  private final LeafOrdering leaf;
  private final SeparatorCover cover;

  private Dissection(Adjacency graph, double[][] at) {
    int n = graph.size();
    this.graph = graph;
    this.at = at;
    order = new int[n];
    owner = new int[n];
    rank = new int[n];
    first = new int[n];
    second = new int[n];
    change = new int[n + 2];
    value = new double[n];
    current = new int[n];
    best = new int[n];
    leaf = new LeafOrdering(graph);
    cover = new SeparatorCover(graph);
    for (int i = 0; i < n; i++) {
      order[i] = i;
    }
  }

  /**
   * The unknowns in the order of elimination.
   *
   * @param at a place for each unknown, shape [2][n], or null
   */
  static int[] order(Adjacency graph, double[][] at) {
    Dissection dissection = new Dissection(graph, at);
    dissection.split(0, graph.size(), 0);
    return dissection.order;
  }

  private void split(int from, int to, int id) {
    int n = to - from;
    if (n <= LEAF) {
      leaf.arrange(order, from, to);
      return;
    }
    bestCost = Double.POSITIVE_INFINITY;
    if (at != null) {
      for (double[] direction : directions(from, to)) {
        for (int q = from; q < to; q++) {
          int v = order[q];
          value[q - from] = direction[0] * at[0][v] + direction[1] * at[1][v];
        }
        if (sort(from, n)) {
          tryCuts(n, id);
        }
      }
    }
    if (bestCost > DOUBTFUL * Math.sqrt(n)) {
      tryWalks(from, n, id);
    }
    int[] size = cover.separate(best, bestPlace, n, owner, id, rank, order, from);
    int left = size[0];
    int right = size[1];
    if (Math.max(left, right) > 0.95 * n) {
      return; // a part so dense that nothing separates it is eliminated as it stands
    }
    int leftId = owners++;
    int rightId = owners++;
    for (int q = from; q < from + left; q++) {
      owner[order[q]] = leftId;
    }
    for (int q = from + left; q < from + left + right; q++) {
      owner[order[q]] = rightId;
    }
    for (int q = from + left + right; q < to; q++) {
      owner[order[q]] = -1;
    }
    split(from, from + left, leftId);
    split(from + left, from + left + right, rightId);
  }

  /** The long axis of the part, and those fixed directions along which it is not much shorter. */
  private double[][] directions(int from, int to) {
    double[] x = at[0];
    double[] y = at[1];
    double n = to - from;
    double x0 = x[order[from]];
    double y0 = y[order[from]];
    double mx = 0;
    double my = 0;
    double xx = 0;
    double xy = 0;
    double yy = 0;
    for (int q = from; q < to; q++) {
      double dx = x[order[q]] - x0;
      double dy = y[order[q]] - y0;
      mx += dx;
      my += dy;
      xx += dx * dx;
      xy += dx * dy;
      yy += dy * dy;
    }
    xx -= mx * mx / n;
    xy -= mx * my / n;
    yy -= my * my / n;
    double angle = 0.5 * Math.atan2(2 * xy, xx - yy);
    double[] axis = {Math.cos(angle), Math.sin(angle)};
    double longest = spread(axis, xx, xy, yy);
    double[][] all = new double[DIRECTIONS.length + 1][];
    int count = 0;
    all[count++] = axis;
    for (double[] d : DIRECTIONS) {
      boolean same = Math.abs(d[0] * axis[0] + d[1] * axis[1]) > ALONG;
      if (!same && spread(d, xx, xy, yy) > SHORT * SHORT * longest) {
        all[count++] = d;
      }
    }
    return Arrays.copyOf(all, count);
  }

  private static double spread(double[] d, double xx, double xy, double yy) {
    return d[0] * d[0] * xx + 2 * d[0] * d[1] * xy + d[1] * d[1] * yy;
  }

  /** Ranks the part by {@link #value} into {@link #current}; false if all are the same. */
  private boolean sort(int from, int n) {
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    for (int q = 0; q < n; q++) {
      low = Math.min(low, value[q]);
      high = Math.max(high, value[q]);
    }
    if (!(high > low)) {
      return false;
    }
    // Far finer than the spacing of the unknowns, far coarser than their number.
    int count = 256 + 64 * (int) Math.sqrt(n);
    if (bins.length < count + 1) {
      bins = new int[count + 1];
    }
    Arrays.fill(bins, 0, count + 1, 0);
    double scale = (count - 1) / (high - low);
    for (int q = 0; q < n; q++) {
      second[q] = (int) ((value[q] - low) * scale);
      bins[second[q] + 1]++;
    }
    for (int b = 0; b < count; b++) {
      bins[b + 1] += bins[b];
    }
    for (int q = 0; q < n; q++) {
      current[bins[second[q]]++] = order[from + q];
    }
    return true;
  }

  /** Tries every place of a cut through {@link #current} and keeps it if it is the best. */
  private void tryCuts(int n, int id) {
    for (int q = 0; q < n; q++) {
      rank[current[q]] = q;
    }
    int low = (int) (EDGE * n);
    int high = n - low;
    int[] start = graph.start();
    int[] neighbour = graph.neighbour();
    Arrays.fill(change, 0, n + 2, 0);
    for (int q = 0; q < high; q++) {
      int v = current[q];
      int last = q;
      for (int p = start[v]; p < start[v + 1]; p++) {
        int w = neighbour[p];
        if (owner[w] == id && rank[w] > last) {
          last = rank[w];
        }
      }
      if (last > q) {
        change[q + 1]++;
        change[last + 1]--;
      }
    }
    int size = 0;
    int place = -1;
    double cost = bestCost;
    for (int p = 0; p <= high; p++) {
      size += change[p];
      if (p >= low) {
        double skew = (2.0 * p - n) / n;
        double trial = size * (1 + LOPSIDED * skew * skew) + 0.01 * Math.abs(skew);
        if (trial < cost) {
          cost = trial;
          place = p;
        }
      }
    }
    if (place >= 0) {
      bestCost = cost;
      bestPlace = place;
      int[] swap = best;
      best = current;
      current = swap;
    }
  }

  /** Ranks by breadth-first walks: from one rim, from the other, and by their difference. */
  private void tryWalks(int from, int n, int id) {
    int far = walk(order[from], from, n, id, first);
    int other = walk(far, from, n, id, first);
    tryCuts(n, id);
    walk(other, from, n, id, second);
    tryCuts(n, id);
    for (int q = 0; q < n; q++) {
      int v = order[from + q];
      value[q] = first[v] - second[v] + 0.01 * first[v];
    }
    if (sort(from, n)) {
      tryCuts(n, id);
    }
  }

  /** Fills {@link #current} breadth first and the levels; returns the last of the first walk. */
  private int walk(int root, int from, int n, int id, int[] level) {
    for (int q = from; q < from + n; q++) {
      level[order[q]] = -1;
    }
    int end = 0;
    int far = root;
    int base = 0;
    int seed = from;
    int next = root;
    for (int q = 0; q < n; q++) {
      if (q == end) {
        while (next < 0) {
          int v = order[seed++];
          next = level[v] < 0 ? v : -1;
        }
        if (level[next] < 0) {
          level[next] = base;
          current[end++] = next;
        }
        next = -1;
      }
      int v = current[q];
      for (int p = graph.start()[v]; p < graph.start()[v + 1]; p++) {
        int w = graph.neighbour()[p];
        if (owner[w] == id && level[w] < 0) {
          level[w] = level[v] + 1;
          current[end++] = w;
        }
      }
      if (q + 1 == end) {
        far = base == 0 ? v : far;
        base = level[v] + 2;
      }
    }
    return far;
  }
}
