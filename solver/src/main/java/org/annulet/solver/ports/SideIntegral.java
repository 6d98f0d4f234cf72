package org.annulet.solver.ports;

import java.util.List;
import org.apache.commons.math3.complex.Complex;

/** The share of one straight side in a root count, with the known roots divided out. */
final class SideIntegral {
  private static final double[] GAUSS = {
    -0.9602898564975363, -0.7966664774136267, -0.5255324099163290, -0.1834346424956498,
    0.1834346424956498, 0.5255324099163290, 0.7966664774136267, 0.9602898564975363
  };
  private static final double[] GAUSS_WEIGHT = {
    0.1012285362903763, 0.2223810344533745, 0.3137066458778873, 0.3626837833783620,
    0.3626837833783620, 0.3137066458778873, 0.2223810344533745, 0.1012285362903763
  };

  private SideIntegral() {}

  /** g′/g at a point. */
  @FunctionalInterface
  interface Rate {
    void at(double sr, double si, double[] out);
  }

  /** Im ∫ (g′/g − Σ 1/(s − root)) ds along a straight side. */
  static double of(Rate g, List<Complex> roots, double[] ends, int panels) {
    double dr = (ends[2] - ends[0]) / panels;
    double di = (ends[3] - ends[1]) / panels;
    double[] rate = new double[2];
    double sum = 0;
    for (int p = 0; p < panels; p++) {
      for (int q = 0; q < GAUSS.length; q++) {
        double t = p + 0.5 + 0.5 * GAUSS[q];
        double sr = ends[0] + t * dr;
        double si = ends[1] + t * di;
        g.at(sr, si, rate);
        for (Complex root : roots) {
          subtractPole(rate, sr - root.getReal(), si - root.getImaginary());
        }
        sum += 0.5 * GAUSS_WEIGHT[q] * (rate[0] * di + rate[1] * dr);
      }
    }
    return sum;
  }

  /** Takes 1/(dr + i di) off a rate. */
  static void subtractPole(double[] rate, double dr, double di) {
    double norm = dr * dr + di * di;
    if (norm > 0) {
      rate[0] -= dr / norm;
      rate[1] += di / norm;
    }
  }
}
