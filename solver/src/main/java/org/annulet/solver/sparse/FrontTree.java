package org.annulet.solver.sparse;

import java.util.Arrays;

/**
 * The plan of a multifrontal factorisation (Duff and Reid 1983): for each front its columns, the
 * rows below them, where these lie in the parent's front, and where each matrix entry goes.
 * Immutable; shared by any number of factorisations.
 *
 * <p>A front with k columns and u rows below holds local rows 0 … k + u − 1. Its part of L is
 * stored as the strict lower triangle of its k columns, column by column, then the u × k block
 * below, column by column.
 */
final class FrontTree {
  /** Entries of one piece of the factor's storage; a larger front has a piece of its own. */
  private static final int PIECE = 1 << 20;

  final int[] order;
  final int fronts;
  final int[] firstColumn;

  /** Children of front f are {@code child[childStart[f]] …}, ascending. */
  final int[] childStart;

  final int[] child;

  /** Rows below the columns of front f: {@code row[rowStart[f]] …}, ascending. */
  final int[] rowStart;

  final int[] row;

  /** Local row in the parent's front, for each of {@link #row}. */
  final int[] above;

  /** Entries of column j of the matrix, diagonal and below: local row and index of the value. */
  final int[] entryStart;

  final int[] entryRow;
  final int[] entrySource;

  /** Where the part of L of each front is stored. */
  final int[] piece;

  final int[] offset;
  final int[] pieceLength;
  final int largestFront;
  final int largestBelow;

  /** Most entries of update matrices waiting at one time. */
  final long stackEntries;

  final long factorEntries;

  FrontTree(SymmetricPattern pattern, EliminationTree eliminationTree) {
    FrontPartition partition = FrontPartition.of(eliminationTree);
    order = partition.order();
    firstColumn = partition.firstColumn();
    fronts = partition.parent().length;
    int n = order.length;
    int[] parent = partition.parent();
    childStart = new int[fronts + 1];
    for (int f = 0; f < fronts; f++) {
      if (parent[f] >= 0) {
        childStart[parent[f] + 1]++;
      }
    }
    for (int f = 0; f < fronts; f++) {
      childStart[f + 1] += childStart[f];
    }
    child = new int[childStart[fronts]];
    int[] next = childStart.clone();
    for (int f = 0; f < fronts; f++) {
      if (parent[f] >= 0) {
        child[next[parent[f]]++] = f;
      }
    }

    int[] place = EliminationTree.inverse(order);
    entryStart = new int[n + 1];
    for (int i = 0; i < n; i++) {
      for (int q = pattern.rowStart(i); q < pattern.rowStart(i + 1); q++) {
        entryStart[Math.min(place[i], place[pattern.column(q)]) + 1]++;
      }
    }
    for (int j = 0; j < n; j++) {
      entryStart[j + 1] += entryStart[j];
    }
    entryRow = new int[entryStart[n]];
    entrySource = new int[entryStart[n]];
    next = entryStart.clone();
    for (int i = 0; i < n; i++) {
      for (int q = pattern.rowStart(i); q < pattern.rowStart(i + 1); q++) {
        int a = place[i];
        int b = place[pattern.column(q)];
        int at = next[Math.min(a, b)]++;
        entryRow[at] = Math.max(a, b);
        entrySource[at] = q;
      }
    }

    rowStart = new int[fronts + 1];
    int[] rows = new int[Math.max(16, 4 * n)];
    int[] seen = new int[n];
    Arrays.fill(seen, -1);
    for (int f = 0; f < fronts; f++) {
      int end = firstColumn[f + 1];
      int m = rowStart[f];
      if (m > rows.length - n) {
        rows = Arrays.copyOf(rows, (int) Math.min(Integer.MAX_VALUE - 8L, 2L * rows.length + n));
      }
      for (int e = entryStart[firstColumn[f]]; e < entryStart[end]; e++) {
        int r = entryRow[e];
        if (r >= end && seen[r] != f) {
          seen[r] = f;
          rows[m++] = r;
        }
      }
      for (int c = childStart[f]; c < childStart[f + 1]; c++) {
        for (int q = rowStart[child[c]]; q < rowStart[child[c] + 1]; q++) {
          int r = rows[q];
          if (r >= end && seen[r] != f) {
            seen[r] = f;
            rows[m++] = r;
          }
        }
      }
      Arrays.sort(rows, rowStart[f], m);
      rowStart[f + 1] = m;
    }
    row = Arrays.copyOf(rows, rowStart[fronts]);
    above = new int[row.length];
    locate();

    piece = new int[fronts];
    offset = new int[fronts];
    int[] lengths = new int[16];
    int pieces = 0;
    long entries = n;
    int widest = 0;
    int tallest = 0;
    for (int f = 0; f < fronts; f++) {
      long k = columns(f);
      long u = below(f);
      long length = k * (k - 1) / 2 + k * u;
      if (length > Integer.MAX_VALUE - 8) {
        throw new IllegalStateException(
            "one front of "
                + (k + u)
                + " rows is too large: the pattern is too dense to factorise");
      }
      if (pieces == 0 || lengths[pieces - 1] + length > Math.max(PIECE, length)) {
        if (pieces == lengths.length) {
          lengths = Arrays.copyOf(lengths, 2 * pieces);
        }
        pieces++;
      }
      piece[f] = pieces - 1;
      offset[f] = lengths[pieces - 1];
      lengths[pieces - 1] += (int) length;
      entries += length;
      widest = (int) Math.max(widest, k + u);
      tallest = (int) Math.max(tallest, u);
    }
    pieceLength = Arrays.copyOf(lengths, pieces);
    factorEntries = entries;
    largestFront = widest;
    largestBelow = tallest;
    stackEntries = stack();
  }

  int columns(int f) {
    return firstColumn[f + 1] - firstColumn[f];
  }

  int below(int f) {
    return rowStart[f + 1] - rowStart[f];
  }

  /** Turns global rows into local ones: of the entries, and of the rows in the parent's front. */
  private void locate() {
    int[] local = new int[order.length];
    for (int f = 0; f < fronts; f++) {
      int begin = firstColumn[f];
      int end = firstColumn[f + 1];
      for (int j = begin; j < end; j++) {
        local[j] = j - begin;
      }
      for (int q = rowStart[f]; q < rowStart[f + 1]; q++) {
        local[row[q]] = end - begin + q - rowStart[f];
      }
      for (int e = entryStart[begin]; e < entryStart[end]; e++) {
        entryRow[e] = local[entryRow[e]];
      }
      for (int c = childStart[f]; c < childStart[f + 1]; c++) {
        for (int q = rowStart[child[c]]; q < rowStart[child[c] + 1]; q++) {
          above[q] = local[row[q]];
        }
      }
    }
  }

  private long stack() {
    long now = 0;
    long most = 0;
    for (int f = 0; f < fronts; f++) {
      for (int c = childStart[f]; c < childStart[f + 1]; c++) {
        now -= triangle(below(child[c]));
      }
      now += triangle(below(f));
      most = Math.max(most, now);
    }
    if (most > Integer.MAX_VALUE - 8) {
      throw new IllegalStateException(
          "update matrices of " + most + " entries: the pattern is too dense to factorise");
    }
    return most;
  }

  private static long triangle(long u) {
    return u * (u + 1) / 2;
  }
}
