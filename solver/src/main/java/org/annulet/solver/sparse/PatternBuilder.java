package org.annulet.solver.sparse;

import java.util.Arrays;

/**
 * Collects where a symmetric matrix may be non-zero, from element connectivity or single pairs, in
 * any order and as often as it comes. Not thread-safe.
 *
 * <pre>
 *   SymmetricPattern pattern = new PatternBuilder(n).element(0, 1, 2).pair(4, 7).build();
 *   int[] entry = PatternBuilder.entries(pattern, 0, 1, 2); // where element (0, 1, 2) adds to
 * </pre>
 */
public final class PatternBuilder {
  private final int size;
  private int[] rows = new int[64];
  private int[] columns = new int[64];
  private int count;

  /**
   * An empty pattern; the diagonal is always present.
   *
   * @param size number of unknowns
   */
  public PatternBuilder(int size) {
    if (size < 0) {
      throw new IllegalArgumentException("number of unknowns is negative: " + size);
    }
    this.size = size;
  }

  /**
   * All pairs of these unknowns, as a finite element couples its nodes.
   *
   * @throws IndexOutOfBoundsException if an unknown is not in [0, size)
   */
  public PatternBuilder element(int... unknowns) {
    for (int a = 0; a < unknowns.length; a++) {
      for (int b = 0; b < a; b++) {
        pair(unknowns[a], unknowns[b]);
      }
    }
    return this;
  }

  /**
   * The entries (i, j) and (j, i).
   *
   * @throws IndexOutOfBoundsException if an unknown is not in [0, size)
   */
  public PatternBuilder pair(int i, int j) {
    if (i < 0 || j < 0 || i >= size || j >= size) {
      throw new IndexOutOfBoundsException(
          "entry (" + i + ", " + j + ") lies outside a matrix of " + size + " unknowns");
    }
    if (i == j) {
      return this;
    }
    if (count == rows.length) {
      rows = Arrays.copyOf(rows, 2 * count);
      columns = Arrays.copyOf(columns, 2 * count);
    }
    rows[count] = Math.max(i, j);
    columns[count++] = Math.min(i, j);
    return this;
  }

  /** The pattern of all that was added. */
  public SymmetricPattern build() {
    int[] start = new int[size + 1];
    for (int q = 0; q < count; q++) {
      start[rows[q] + 1]++;
    }
    for (int i = 0; i < size; i++) {
      start[i + 1] += start[i];
    }
    int[] next = start.clone();
    int[] bucket = new int[count];
    for (int q = 0; q < count; q++) {
      bucket[next[rows[q]]++] = columns[q];
    }
    int[] rowStart = new int[size + 1];
    int[] column = new int[count + size];
    int m = 0;
    for (int i = 0; i < size; i++) {
      Arrays.sort(bucket, start[i], start[i + 1]);
      int previous = -1;
      for (int q = start[i]; q < start[i + 1]; q++) {
        if (bucket[q] != previous) {
          previous = bucket[q];
          column[m++] = previous;
        }
      }
      column[m++] = i;
      rowStart[i + 1] = m;
    }
    return new SymmetricPattern(rowStart, Arrays.copyOf(column, m));
  }

  /**
   * Where the matrix of one element goes: the entries of its lower triangle row by row, (0,0),
   * (1,0), (1,1), (2,0), … To be found once per mesh and kept: values are then refilled without any
   * search.
   *
   * @return new array, shape [k (k + 1) / 2] for k unknowns; −1 where the pattern has no entry
   */
  public static int[] entries(SymmetricPattern pattern, int... unknowns) {
    int[] entry = new int[unknowns.length * (unknowns.length + 1) / 2];
    int m = 0;
    for (int a = 0; a < unknowns.length; a++) {
      for (int b = 0; b <= a; b++) {
        entry[m++] = pattern.entry(unknowns[a], unknowns[b]);
      }
    }
    return entry;
  }
}
