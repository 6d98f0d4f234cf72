package org.annulet.mesher.triangulate;

import java.util.Arrays;

/** Triangles to look at, first in, first out, each at most once at a time. */
final class TriangleQueue {
  private int[] ring = new int[4096];
  private int head;
  private int count;
  private boolean[] waiting = new boolean[4096];

  boolean isEmpty() {
    return count == 0;
  }

  void add(int t) {
    if (t >= waiting.length) {
      waiting = Arrays.copyOf(waiting, Math.max(2 * waiting.length, t + 1));
    }
    if (waiting[t]) {
      return;
    }
    if (count == ring.length) {
      int[] longer = new int[2 * count];
      for (int i = 0; i < count; i++) {
        longer[i] = ring[(head + i) & (count - 1)];
      }
      ring = longer;
      head = 0;
    }
    ring[(head + count) & (ring.length - 1)] = t;
    count++;
    waiting[t] = true;
  }

  int poll() {
    int t = ring[head];
    head = (head + 1) & (ring.length - 1);
    count--;
    waiting[t] = false;
    return t;
  }
}
