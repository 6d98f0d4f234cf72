package org.annulet.solver.ports;

import java.util.List;
import org.annulet.solver.dense.ComplexMatrix;
import org.annulet.solver.modes.Window;
import org.apache.commons.math3.complex.Complex;

/**
 * H(s) between the ports of a chamber: poles with their residues and a smooth part. Immutable and
 * thread-safe; made by {@link PortSampling}.
 */
public final class PortTransfer {
  private final int ports;
  private final Window region;
  private final List<PortPole> poles;
  private final Terms terms;
  private final Fit fit;
  private final double error;

  /**
   * Pole terms, of the poles and then of some mirror images below the real axis.
   *
   * @param at {re, im} of each
   * @param residue {re, im} of each, shape [2][terms][ports²], row by row
   */
  record Terms(double[][] at, double[][][] residue) {}

  /**
   * Chebyshev polynomials in (s − centre)/(i · halfHeight), then 1/(s − source).
   *
   * @param coefficient {re, im}, shape [2][functions][ports²]
   */
  record Fit(Complex centre, double halfHeight, double[] sources, double[][][] coefficient) {}

  PortTransfer(int ports, Window region, List<PortPole> poles, Terms terms, Fit fit, double error) {
    this.ports = ports;
    this.region = region;
    this.poles = List.copyOf(poles);
    this.terms = terms;
    this.fit = fit;
    this.error = error;
  }

  /** Number of ports. */
  public int portCount() {
    return ports;
  }

  /** Where H is known to {@link #error}. */
  public Window region() {
    return region;
  }

  /** The modes without dampers, corrected to the operator whose ports these are. */
  public List<PortPole> poles() {
    return poles;
  }

  /** Largest ‖H − full solve‖/‖H‖ (largest entries) at the points of the check. */
  public double error() {
    return error;
  }

  /** H at s for some ports, by row and column in their order. */
  public ComplexMatrix at(Complex s, int... some) {
    int k = some.length;
    double[][] h = new double[4][k * k];
    select(some).at(s.getReal(), s.getImaginary(), h);
    ComplexMatrix out = new ComplexMatrix(k, k);
    for (int i = 0; i < k; i++) {
      for (int j = 0; j < k; j++) {
        out.set(i, j, new Complex(h[0][i * k + j], h[1][i * k + j]));
      }
    }
    return out;
  }

  /** The same for fast evaluation at many points. */
  Selection select(int... some) {
    return new Selection(some);
  }

  /** H and H′ between some of the ports. */
  final class Selection {
    private final int size;
    private final double[][] resRe;
    private final double[][] resIm;
    private final double[][] coefRe;
    private final double[][] coefIm;

    private Selection(int[] some) {
      size = some.length * some.length;
      resRe = picked(terms.residue()[0], some);
      resIm = picked(terms.residue()[1], some);
      coefRe = picked(fit.coefficient()[0], some);
      coefIm = picked(fit.coefficient()[1], some);
    }

    private double[][] picked(double[][] all, int[] some) {
      double[][] out = new double[all.length][size];
      for (int t = 0; t < all.length; t++) {
        int q = 0;
        for (int i : some) {
          for (int j : some) {
            out[t][q++] = all[t][i * ports + j];
          }
        }
      }
      return out;
    }

    /**
     * Evaluates.
     *
     * @param h overwritten: Re H, Im H, Re H′, Im H′, row by row
     */
    void at(double sr, double si, double[][] h) {
      for (double[] part : h) {
        java.util.Arrays.fill(part, 0, size, 0);
      }
      for (int t = 0; t < resRe.length; t++) {
        double dr = sr - terms.at()[0][t];
        double di = si - terms.at()[1][t];
        double norm = dr * dr + di * di;
        double ir = dr / norm;
        double ii = -di / norm;
        add(h, resRe[t], resIm[t], new double[] {ir, ii, -(ir * ir - ii * ii), -2 * ir * ii});
      }
      polynomials(sr, si, h);
    }

    private void polynomials(double sr, double si, double[][] h) {
      int n = coefRe.length - fit.sources().length;
      double zr = (si - fit.centre().getImaginary()) / fit.halfHeight();
      double zi = -(sr - fit.centre().getReal()) / fit.halfHeight();
      double[] before = {0, 0, 0, 0};
      double[] now = {1, 0, 0, 0}; // T and dT/dz
      double[] next = new double[4];
      double[] f = new double[4];
      for (int k = 0; k < n; k++) {
        f[0] = now[0];
        f[1] = now[1];
        f[2] = now[3] / fit.halfHeight(); // dz/ds = 1/(i·halfHeight)
        f[3] = -now[2] / fit.halfHeight();
        add(h, coefRe[k], coefIm[k], f);
        double twice = k == 0 ? 1 : 2;
        next[0] = twice * (zr * now[0] - zi * now[1]) - before[0];
        next[1] = twice * (zr * now[1] + zi * now[0]) - before[1];
        next[2] = twice * (now[0] + zr * now[2] - zi * now[3]) - before[2];
        next[3] = twice * (now[1] + zr * now[3] + zi * now[2]) - before[3];
        double[] free = before;
        before = now;
        now = next;
        next = free;
      }
      for (int k = 0; k < fit.sources().length; k++) {
        double dr = sr - fit.sources()[k];
        double norm = dr * dr + si * si;
        double ir = dr / norm;
        double ii = -si / norm;
        f[0] = ir;
        f[1] = ii;
        f[2] = -(ir * ir - ii * ii);
        f[3] = -2 * ir * ii;
        add(h, coefRe[n + k], coefIm[n + k], f);
      }
    }

    private void add(double[][] h, double[] re, double[] im, double[] f) {
      for (int q = 0; q < size; q++) {
        h[0][q] += re[q] * f[0] - im[q] * f[1];
        h[1][q] += re[q] * f[1] + im[q] * f[0];
        h[2][q] += re[q] * f[2] - im[q] * f[3];
        h[3][q] += re[q] * f[3] + im[q] * f[2];
      }
    }
  }
}
