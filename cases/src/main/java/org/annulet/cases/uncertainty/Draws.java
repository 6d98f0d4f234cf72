package org.annulet.cases.uncertainty;

import java.util.List;
import java.util.SplittableRandom;
import org.annulet.cases.read.Uncertainty;
import org.apache.commons.math3.distribution.NormalDistribution;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.CholeskyDecomposition;
import org.apache.commons.math3.linear.MatrixUtils;
import org.apache.commons.math3.linear.NonPositiveDefiniteMatrixException;
import org.apache.commons.math3.linear.RealMatrix;

/**
 * Departures of uncertain values, over their widths: each sample has a random stream of its own, so
 * that it does not matter who computes it. Immutable and thread-safe.
 */
final class Draws {
  private static final NormalDistribution NORMAL = new NormalDistribution(null, 0, 1);

  private final long seed;
  private final List<Uncertainty.Shape> shapes;
  private final RealMatrix factor;

  /**
   * Draws.
   *
   * @param shapes one for each value
   * @param correlations of the normal scores
   * @throws IllegalArgumentException if the correlations contradict each other
   */
  Draws(long seed, List<Uncertainty.Shape> shapes, List<Uncertainty.Correlation> correlations) {
    this.seed = seed;
    this.shapes = List.copyOf(shapes);
    RealMatrix c = MatrixUtils.createRealIdentityMatrix(shapes.size());
    for (Uncertainty.Correlation k : correlations) {
      c.setEntry(k.first(), k.second(), k.coefficient());
      c.setEntry(k.second(), k.first(), k.coefficient());
    }
    try {
      factor =
          correlations.isEmpty()
              ? null
              : new CholeskyDecomposition(new Array2DRowRealMatrix(c.getData()), 1e-12, 1e-10)
                  .getL();
    } catch (NonPositiveDefiniteMatrixException e) {
      throw new IllegalArgumentException("the correlations contradict each other", e);
    }
  }

  /** Departures of sample i, in widths, shape [values]. */
  double[] sample(int i) {
    SplittableRandom random = new SplittableRandom(mixed(mixed(seed) + i));
    double[] score = new double[shapes.size()];
    for (int k = 0; k < score.length; k++) {
      score[k] = NORMAL.inverseCumulativeProbability(random.nextDouble(0x1p-53, 1));
    }
    double[] z = factor == null ? score : factor.operate(score);
    double[] x = new double[z.length];
    for (int k = 0; k < z.length; k++) {
      x[k] = departure(shapes.get(k), z[k]);
    }
    return x;
  }

  /**
   * A number scattered over all 64 bits (finalizer of MurmurHash3, Appleby; constants from memory):
   * without it streams of neighbouring seeds are one stream shifted by a draw, since the
   * generator's own step is constant.
   */
  private static long mixed(long number) {
    long z = number + 0x9E3779B97F4A7C15L;
    z = (z ^ z >>> 33) * 0xFF51AFD7ED558CCDL;
    z = (z ^ z >>> 33) * 0xC4CEB9FE1A85EC53L;
    return z ^ z >>> 33;
  }

  private static double departure(Uncertainty.Shape shape, double score) {
    if (shape == Uncertainty.Shape.NORMAL) {
      return score;
    }
    double u = NORMAL.cumulativeProbability(score);
    if (shape == Uncertainty.Shape.UNIFORM) {
      return 2 * u - 1;
    }
    return u < 0.5 ? Math.sqrt(2 * u) - 1 : 1 - Math.sqrt(2 * (1 - u));
  }

  /** Standard deviation of a departure, in widths. */
  static double deviation(Uncertainty.Shape shape) {
    return switch (shape) {
      case NORMAL -> 1;
      case UNIFORM -> 1 / Math.sqrt(3);
      case TRIANGULAR -> 1 / Math.sqrt(6);
    };
  }

  /** How far values are followed by the training of a reduced model, in widths. */
  static double reach(Uncertainty.Shape shape) {
    return shape == Uncertainty.Shape.NORMAL ? 2 : 1;
  }
}
