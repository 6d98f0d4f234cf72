package org.annulet.mesher.triangulate;

import java.util.Arrays;

/**
 * A biased randomised insertion order (Amenta, Choi and Rote, SoCG 2003) with a fixed hash in place
 * of chance: rounds that double in size, each sorted along Hilbert's curve.
 */
final class SpatialOrder {
  private SpatialOrder() {}

  /** Order of insertion of the first {@code n} places; new array. */
  static int[] of(double[] x, double[] y, int n) {
    int rounds = Math.max(1, 32 - Integer.numberOfLeadingZeros(n / 64 + 1));
    return sorted(x, y, n, rounds);
  }

  /** Order along Hilbert's curve alone: neighbours in the plane are near in the list; new array. */
  static int[] alongCurve(double[] x, double[] y, int n) {
    return sorted(x, y, n, 1);
  }

  private static int[] sorted(double[] x, double[] y, int n, int rounds) {
    double x0 = Double.POSITIVE_INFINITY;
    double y0 = Double.POSITIVE_INFINITY;
    double x1 = Double.NEGATIVE_INFINITY;
    double y1 = Double.NEGATIVE_INFINITY;
    for (int i = 0; i < n; i++) {
      x0 = Math.min(x0, x[i]);
      y0 = Math.min(y0, y[i]);
      x1 = Math.max(x1, x[i]);
      y1 = Math.max(y1, y[i]);
    }
    double w = Math.max(Math.max(x1 - x0, y1 - y0), Double.MIN_NORMAL);
    long[] keys = new long[n];
    for (int i = 0; i < n; i++) {
      int ix = (int) Math.min(8191, (x[i] - x0) / w * 8192);
      int iy = (int) Math.min(8191, (y[i] - y0) / w * 8192);
      // Round r of R holds about 2⁻⁽ᴿ⁻ʳ⁾ of all.
      int zeros = Integer.numberOfTrailingZeros(hash(i) | (1 << 30));
      int round = Math.max(0, rounds - 1 - zeros);
      keys[i] = ((long) round << 58) | ((long) hilbert(ix, iy) << 32) | i;
    }
    Arrays.sort(keys);
    int[] order = new int[n];
    for (int i = 0; i < n; i++) {
      order[i] = (int) keys[i];
    }
    return order;
  }

  private static int hash(int i) {
    int h = i * 0x9E3779B9;
    h ^= h >>> 15;
    h *= 0x85EBCA6B;
    h ^= h >>> 13;
    return h * 0xC2B2AE35 ^ h >>> 16;
  }

  /** Place of a cell of a 2¹³ × 2¹³ grid along Hilbert's curve, below 2²⁶. */
  static int hilbert(int px, int py) {
    int x = px;
    int y = py;
    int d = 0;
    for (int s = 4096; s > 0; s >>= 1) {
      int rx = (x & s) > 0 ? 1 : 0;
      int ry = (y & s) > 0 ? 1 : 0;
      d += s * s * ((3 * rx) ^ ry);
      if (ry == 0) {
        if (rx == 1) {
          x = 8191 - x;
          y = 8191 - y;
        }
        int swap = x;
        x = y;
        y = swap;
      }
    }
    return d;
  }
}
