package org.annulet.solver.medium;

import java.util.Arrays;

/** Strictly ascending positions with linear interpolation between them, held beyond the ends. */
final class Axis {
  private final double[] at;

  Axis(String what, double[] at) {
    if (at.length < 2) {
      throw new IllegalArgumentException(what + " needs at least two positions, got " + at.length);
    }
    for (int k = 0; k < at.length; k++) {
      if (!Double.isFinite(at[k]) || (k > 0 && !(at[k] > at[k - 1]))) {
        throw new IllegalArgumentException(
            what
                + " must be finite and strictly ascending, got "
                + NasaSpecies.text(at[k])
                + " m as value "
                + (k + 1));
      }
    }
    this.at = at.clone();
  }

  int size() {
    return at.length;
  }

  double first() {
    return at[0];
  }

  double last() {
    return at[at.length - 1];
  }

  /** Distance from the range, 0 inside. */
  double outside(double s) {
    return Math.max(0, Math.max(at[0] - s, s - last()));
  }

  /** Left index of the interval s lies in. */
  int interval(double s) {
    int k = Arrays.binarySearch(at, s);
    int left = k >= 0 ? k : -k - 2;
    return Math.max(0, Math.min(at.length - 2, left));
  }

  /** Share of the interval's right end, from 0 to 1. */
  double share(int left, double s) {
    return Math.max(0, Math.min(1, (s - at[left]) / (at[left + 1] - at[left])));
  }

  double interpolate(double[] values, double s) {
    int k = interval(s);
    double u = share(k, s);
    return (1 - u) * values[k] + u * values[k + 1];
  }
}
