package org.annulet.solver.eigen;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.sparse.RealFactor;

/**
 * The modes of K p = ω² M p: rigid walls, no flame, no loss. Real, found by shift-invert Lanczos
 * and counted by Sylvester's law of inertia, so that a missed member of a degenerate pair is
 * noticed and sought again.
 */
public final class PassiveModes {
  private static final int LARGEST_DENSE = 120;
  private static final int ATTEMPTS = 4;

  private PassiveModes() {}

  /**
   * Passive modes in a range.
   *
   * @param omegaSquared eigenvalues, ascending, in 1/s²
   * @param vectors eigenvectors with pᵀMp = 1, shape [modes][n]
   * @param expected how many there are by inertia; larger than the number found only if the search
   *     failed
   */
  public record Spectrum(double[] omegaSquared, double[][] vectors, int expected) {
    /** Whether inertia confirms that none is missing. */
    public boolean complete() {
      return expected == omegaSquared.length;
    }

    /** Frequency of mode i in Hz; rounding below zero counts as zero. */
    public double frequency(int i) {
      return Math.sqrt(Math.max(0, omegaSquared[i])) / (2 * Math.PI);
    }
  }

  /** All passive modes below a frequency in Hz, the uniform one at 0 Hz included. */
  public static Spectrum below(AcousticOperator operator, double frequency) {
    return below(new PreparedOperator(operator), frequency);
  }

  /** The same on an operator analysed earlier. */
  public static Spectrum below(PreparedOperator prepared, double frequency) {
    if (!(frequency > 0)) {
      throw new IllegalArgumentException("frequency must be positive, got " + frequency + " Hz");
    }
    double bound = square(2 * Math.PI * frequency);
    // centred: what is wanted, 0 … bound, is just what lies nearer to bound/2 than bound/2
    return between(prepared, -bound * 1e-3, bound);
  }

  /** The passive modes between two frequencies in Hz. */
  public static Spectrum between(AcousticOperator operator, double lowest, double highest) {
    if (!(0 < lowest && lowest < highest)) {
      throw new IllegalArgumentException(
          "need 0 < lowest < highest, got " + lowest + " and " + highest + " Hz");
    }
    return between(
        new PreparedOperator(operator),
        square(2 * Math.PI * lowest),
        square(2 * Math.PI * highest));
  }

  private static Spectrum between(PreparedOperator prepared, double low, double high) {
    ShiftInvert shifted = new ShiftInvert(prepared);
    int expected = shifted.countBelow(high) - (low < 0 ? 0 : shifted.countBelow(low));
    if (expected == 0) {
      return new Spectrum(new double[0], new double[0][], 0);
    }
    if (prepared.size() <= LARGEST_DENSE) {
      return select(DensePencil.solve(prepared.operator()), low, high, expected);
    }
    RealFactor factor = shifted.factorNear(0.5 * (low + high), 0.5 * (high - low));
    Spectrum best = null;
    for (int attempt = 0; attempt < ATTEMPTS; attempt++) {
      int wanted = Math.min(expected + 3 * attempt, prepared.size() - 1);
      Spectrum found =
          select(
              Lanczos.nearest(prepared.operator(), factor, shifted.lastShift(), wanted, attempt),
              low,
              high,
              expected);
      if (best == null || found.omegaSquared().length > best.omegaSquared().length) {
        best = found;
      }
      if (best.complete()) {
        break;
      }
    }
    return best;
  }

  private static Spectrum select(Spectrum all, double low, double high, int expected) {
    List<Integer> keep = new ArrayList<>();
    for (int i = 0; i < all.omegaSquared().length; i++) {
      if (low < all.omegaSquared()[i] && all.omegaSquared()[i] < high) {
        keep.add(i);
      }
    }
    keep.sort((i, j) -> Double.compare(all.omegaSquared()[i], all.omegaSquared()[j]));
    return new Spectrum(
        keep.stream().mapToDouble(i -> all.omegaSquared()[i]).toArray(),
        keep.stream().map(i -> all.vectors()[i]).toArray(double[][]::new),
        expected);
  }

  private static double square(double x) {
    return x * x;
  }

  /** Real factors of K − λM. */
  static final class ShiftInvert {
    private final PreparedOperator prepared;
    private double lastShift;

    ShiftInvert(PreparedOperator prepared) {
      this.prepared = prepared;
    }

    double lastShift() {
      return lastShift;
    }

    RealFactor factor(double lambda) {
      double[] k = prepared.operator().stiffness();
      double[] m = prepared.operator().mass();
      double[] values = new double[k.length];
      Arrays.setAll(values, q -> k[q] - lambda * m[q]);
      lastShift = lambda;
      return prepared.analysis().factorReal(values);
    }

    /** Eigenvalues below λ. */
    int countBelow(double lambda) {
      return factorNear(lambda, lambda * 1e-6).negativePivots();
    }

    /** A factor at λ or, where that is an eigenvalue, a little beside it. */
    RealFactor factorNear(double lambda, double scale) {
      ArithmeticException last = null;
      for (int k = 0; k < 6; k++) {
        try {
          RealFactor f = factor(lambda + scale * 0.013 * k);
          if (f.pivotGrowth() < 1e9) {
            return f;
          }
        } catch (ArithmeticException e) {
          last = e;
        }
      }
      if (last != null) {
        throw last;
      }
      return factor(lambda);
    }
  }
}
