package org.annulet.solver.sparse;

import java.util.Arrays;
import java.util.Random;

/** A symmetric test matrix, with coordinates where it comes from a mesh. */
record TestMatrix(
    String name, SymmetricPattern pattern, double[] re, double[] im, double[][] coordinates) {

  @Override
  public String toString() {
    return name;
  }

  int size() {
    return pattern.size();
  }

  /** Random sparse matrix, about three entries a row, diagonal of both signs; disconnected. */
  static TestMatrix random(long seed, int n) {
    Random random = new Random(seed);
    PatternBuilder builder = new PatternBuilder(n);
    for (int q = 0; q < n; q++) {
      builder.pair(random.nextInt(n), random.nextInt(n));
    }
    SymmetricPattern pattern = builder.build();
    double[] re = new double[pattern.entryCount()];
    double[] im = new double[pattern.entryCount()];
    for (int q = 0; q < re.length; q++) {
      re[q] = random.nextGaussian();
      im[q] = random.nextGaussian();
    }
    return new TestMatrix("random " + seed, pattern, re, im, null);
  }

  /** Diagonal matrix: 1, −2, 3, −4, … with imaginary part one half. */
  static TestMatrix diagonal(int n) {
    SymmetricPattern pattern = new PatternBuilder(n).build();
    double[] re = new double[n];
    double[] im = new double[n];
    for (int i = 0; i < n; i++) {
      re[i] = i % 2 == 0 ? i + 1 : -i - 1;
      im[i] = 0.5;
    }
    return new TestMatrix("diagonal", pattern, re, im, null);
  }

  /**
   * Stiffness minus shift times lumped mass of linear triangles on the unit square, right-angled
   * (the five-point Laplacian); the imaginary part is {@code damping} times the mass.
   */
  static TestMatrix grid(int across, int up, double shift, double damping) {
    double[][] at = new double[2][across * up];
    PatternBuilder builder = new PatternBuilder(across * up);
    for (int j = 0; j < up; j++) {
      for (int i = 0; i < across; i++) {
        int a = j * across + i;
        at[0][a] = (double) i / (across - 1);
        at[1][a] = (double) j / (across - 1);
        if (i + 1 < across && j + 1 < up) {
          builder.element(a, a + 1, a + across);
          builder.element(a + 1, a + across, a + across + 1);
        }
      }
    }
    return laplacian("grid " + across + " x " + up, builder.build(), shift, damping, at);
  }

  /** The same on a strip closed to a ring: coordinates (x, arc) with a seam. */
  static TestMatrix ring(int wide, int round, double shift, double damping) {
    double[][] at = new double[2][wide * round];
    PatternBuilder builder = new PatternBuilder(wide * round);
    for (int j = 0; j < round; j++) {
      int next = (j + 1) % round;
      for (int i = 0; i < wide; i++) {
        at[0][j * wide + i] = i;
        at[1][j * wide + i] = j;
        if (i + 1 < wide) {
          builder.element(j * wide + i, j * wide + i + 1, next * wide + i);
          builder.element(j * wide + i + 1, next * wide + i, next * wide + i + 1);
        }
      }
    }
    return laplacian("ring " + wide + " x " + round, builder.build(), shift, damping, at);
  }

  private static TestMatrix laplacian(
      String name, SymmetricPattern pattern, double shift, double damping, double[][] at) {
    double[] re = new double[pattern.entryCount()];
    double[] im = new double[pattern.entryCount()];
    for (int i = 0; i < pattern.size(); i++) {
      int last = pattern.rowStart(i + 1) - 1;
      for (int q = pattern.rowStart(i); q < last; q++) {
        int j = pattern.column(q);
        // Slightly uneven weights: no symmetry of the square may hide a mix-up of unknowns.
        double k = 1 + 0.3 * Math.sin(i + 2.0 * j);
        re[q] -= k;
        re[last] += k;
        re[pattern.entry(j, j)] += k;
      }
      re[last] -= shift;
      im[last] += damping;
    }
    return new TestMatrix(name, pattern, re, im, at);
  }

  double[][] dense(double[] values) {
    double[][] a = new double[size()][size()];
    for (int i = 0; i < size(); i++) {
      for (int q = pattern.rowStart(i); q < pattern.rowStart(i + 1); q++) {
        a[i][pattern.column(q)] = values[q];
        a[pattern.column(q)][i] = values[q];
      }
    }
    return a;
  }

  static double[][] rightHandSides(long seed, int columns, int n) {
    Random random = new Random(seed);
    double[][] b = new double[columns][n];
    for (double[] column : b) {
      Arrays.setAll(column, i -> random.nextGaussian());
    }
    return b;
  }
}
