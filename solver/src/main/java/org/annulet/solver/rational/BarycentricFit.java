package org.annulet.solver.rational;

import java.util.ArrayList;
import java.util.List;
import org.annulet.solver.dense.ComplexMatrix;
import org.annulet.solver.dense.ComplexSvd;
import org.apache.commons.math3.complex.Complex;

/**
 * A rational function through some of its samples, in barycentric form, chosen greedily where the
 * rest is missed most (the AAA method: Nakatsukasa, Sète and Trefethen 2018, SIAM J. Sci. Comput.
 * 40, A1494; from memory):
 *
 * <pre>
 *   r(s) = Σ_j w_j f_j/(s − z_j) / Σ_j w_j/(s − z_j)
 *   r′(s) = Σ_j w_j (r − f_j)/(s − z_j)² / Σ_j w_j/(s − z_j)        (Schneider and Werner 1986)
 * </pre>
 *
 * <p>Immutable and thread-safe.
 */
public final class BarycentricFit {
  /** Support points added between two fits. */
  private static final int AT_ONCE = 3;

  private final double[][] at;
  private final double[][] value;
  private final double[][] weight;
  private final double error;

  private BarycentricFit(
      List<Integer> support,
      List<Complex> points,
      List<Complex> values,
      Complex[] w,
      double error) {
    int n = support.size();
    at = new double[2][n];
    value = new double[2][n];
    weight = new double[2][n];
    for (int j = 0; j < n; j++) {
      put(at, j, points.get(support.get(j)));
      put(value, j, values.get(support.get(j)));
      put(weight, j, w[j]);
    }
    this.error = error;
  }

  private static void put(double[][] to, int j, Complex c) {
    to[0][j] = c.getReal();
    to[1][j] = c.getImaginary();
  }

  /**
   * Fits samples.
   *
   * @param points all different
   * @param values of the function there, finite
   * @param wanted largest |error| over the largest |value| at the points
   * @param most support points, at most half of the points
   */
  public static BarycentricFit of(
      List<Complex> points, List<Complex> values, double wanted, int most) {
    double largest = values.stream().mapToDouble(Complex::abs).max().orElse(0);
    List<Integer> support = new ArrayList<>();
    BarycentricFit best = null;
    double[] miss = values.stream().mapToDouble(v -> v.subtract(mean(values)).abs()).toArray();
    while (support.size() + AT_ONCE <= Math.min(most, points.size() / 2)) {
      for (int k = 0; k < AT_ONCE; k++) {
        int worst = worst(miss);
        support.add(worst);
        miss[worst] = -1;
      }
      Complex[] w = weights(support, points, values);
      BarycentricFit now = new BarycentricFit(support, points, values, w, 0);
      double error = 0;
      double[] out = new double[4];
      for (int i = 0; i < miss.length; i++) {
        if (support.contains(i)) {
          miss[i] = -1;
          continue;
        }
        Complex s = points.get(i);
        now.at(s.getReal(), s.getImaginary(), out);
        miss[i] = new Complex(out[0], out[1]).subtract(values.get(i)).abs();
        error = Math.max(error, miss[i]);
      }
      if (best == null || error / largest < best.error) {
        best = new BarycentricFit(support, points, values, w, error / largest);
      }
      if (!(best.error > wanted)) {
        break;
      }
    }
    return best;
  }

  private static Complex mean(List<Complex> values) {
    return values.stream().reduce(Complex.ZERO, Complex::add).divide(values.size());
  }

  private static int worst(double[] miss) {
    int worst = 0;
    for (int i = 1; i < miss.length; i++) {
      worst = miss[i] > miss[worst] ? i : worst;
    }
    return worst;
  }

  /** The right singular vector of the smallest singular value of the Loewner matrix. */
  private static Complex[] weights(
      List<Integer> support, List<Complex> points, List<Complex> values) {
    int n = support.size();
    List<Integer> rest = new ArrayList<>();
    for (int i = 0; i < points.size(); i++) {
      if (!support.contains(i)) {
        rest.add(i);
      }
    }
    ComplexMatrix a = new ComplexMatrix(rest.size(), n);
    for (int j = 0; j < n; j++) {
      for (int i = 0; i < rest.size(); i++) {
        Complex f = values.get(rest.get(i)).subtract(values.get(support.get(j)));
        Complex z = points.get(rest.get(i)).subtract(points.get(support.get(j)));
        a.set(i, j, f.divide(z));
      }
    }
    ComplexMatrix v = new ComplexSvd(a).right();
    Complex[] w = new Complex[n];
    for (int j = 0; j < n; j++) {
      w[j] = v.get(j, n - 1);
    }
    return w;
  }

  /** Largest error at the fitted points, over the largest value. */
  public double error() {
    return error;
  }

  /**
   * Evaluates.
   *
   * @param out overwritten: Re r, Im r, Re r′, Im r′; at a support point r only, with r′ NaN
   */
  public void at(double sr, double si, double[] out) {
    double nr = 0;
    double ni = 0;
    double dr = 0;
    double di = 0;
    int n = at[0].length;
    for (int j = 0; j < n; j++) {
      double zr = sr - at[0][j];
      double zi = si - at[1][j];
      double norm = zr * zr + zi * zi;
      if (norm == 0) {
        out[0] = value[0][j];
        out[1] = value[1][j];
        out[2] = Double.NaN;
        out[3] = Double.NaN;
        return;
      }
      double cr = (weight[0][j] * zr + weight[1][j] * zi) / norm;
      double ci = (weight[1][j] * zr - weight[0][j] * zi) / norm;
      dr += cr;
      di += ci;
      nr += cr * value[0][j] - ci * value[1][j];
      ni += cr * value[1][j] + ci * value[0][j];
    }
    double d2 = dr * dr + di * di;
    double rr = (nr * dr + ni * di) / d2;
    double ri = (ni * dr - nr * di) / d2;
    double pr = 0;
    double pi = 0;
    for (int j = 0; j < n; j++) {
      double zr = sr - at[0][j];
      double zi = si - at[1][j];
      double norm = zr * zr + zi * zi;
      double cr = (weight[0][j] * zr + weight[1][j] * zi) / norm;
      double ci = (weight[1][j] * zr - weight[0][j] * zi) / norm;
      double er = (cr * zr + ci * zi) / norm;
      double ei = (ci * zr - cr * zi) / norm;
      double fr = rr - value[0][j];
      double fi = ri - value[1][j];
      pr += er * fr - ei * fi;
      pi += er * fi + ei * fr;
    }
    out[0] = rr;
    out[1] = ri;
    out[2] = (pr * dr + pi * di) / d2;
    out[3] = (pi * dr - pr * di) / d2;
  }
}
