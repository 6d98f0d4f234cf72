package org.annulet.solver.ports;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.annulet.solver.dense.ComplexLu;
import org.annulet.solver.dense.ComplexMatrix;
import org.annulet.solver.eigen.OperatorAt;
import org.annulet.solver.eigen.PreparedOperator;
import org.annulet.solver.modes.Window;
import org.annulet.solver.operator.SparseVector;
import org.apache.commons.math3.complex.Complex;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.RealMatrix;
import org.apache.commons.math3.linear.SingularValueDecomposition;

/**
 * Finds H(s) of a chamber: residues by block inverse iteration at its modes, the smooth part by
 * least squares on full solves round a region, and a check by full solves inside it.
 */
public final class PortSampling {
  /** Polynomials are added until the check is met or the samples run out. */
  private static final double WANTED = 1e-6;

  private static final double UNSEEN = 1e-10;

  private static final int[] DEGREES = {20, 32};

  private final PreparedOperator operator;
  private final PreparedOperator turned;
  private final List<SparseVector> ports;
  private final Window region;
  private final Complex centre;
  private final double halfHeight;

  private PortSampling(PreparedOperator operator, List<SparseVector> ports, Window region) {
    this.operator = operator;
    this.turned = Eigenspace.transposed(operator);
    this.ports = List.copyOf(ports);
    this.region = region;
    this.centre =
        new Complex(
            0.5 * (region.lowestGrowth() + region.highestGrowth()),
            Math.PI * (region.lowestFrequency() + region.highestFrequency()));
    this.halfHeight = Math.PI * (region.highestFrequency() - region.lowestFrequency());
  }

  /**
   * The transfer between ports.
   *
   * @param operator the chamber without dampers
   * @param ports b of each port, over the operator's unknowns
   * @param poles all its modes in the region, and further ones around it: the wider, the smoother
   *     the rest
   * @param region where H is wanted
   */
  public static PortTransfer of(
      PreparedOperator operator, List<SparseVector> ports, List<PortPole> poles, Window region) {
    return new PortSampling(operator, ports, region).run(poles);
  }

  /** A pole with its residue matrix {re, im}, row by row. */
  private record Residue(Complex s, int multiplicity, double[] re, double[] im) {}

  private PortTransfer run(List<PortPole> poles) {
    List<Residue> residues = poles.parallelStream().map(this::residue).toList();
    List<Residue> all = new ArrayList<>(residues);
    double low = 2 * Math.PI * region.lowestFrequency();
    for (Residue r : residues) { // mirror images near the region would spoil the fit
      if (low + r.s.getImaginary() < 0.8 * halfHeight) {
        double[] minus = Arrays.stream(r.im).map(x -> -x).toArray();
        all.add(new Residue(r.s.conjugate(), 0, r.re, minus));
      }
    }
    int p2 = ports.size() * ports.size();
    double[][] at = new double[2][all.size()];
    double[][][] matrices = new double[2][all.size()][];
    for (int t = 0; t < all.size(); t++) {
      at[0][t] = all.get(t).s.getReal();
      at[1][t] = all.get(t).s.getImaginary();
      matrices[0][t] = all.get(t).re;
      matrices[1][t] = all.get(t).im;
    }
    PortTransfer.Terms terms = new PortTransfer.Terms(at, matrices);
    List<PortPole> corrected =
        residues.stream().map(r -> new PortPole(r.s, r.multiplicity)).toList();
    List<Complex> inside = inside();
    List<double[][]> truth = sample(inside);
    PortTransfer best = null;
    for (int degree : DEGREES) {
      List<Complex> round = round(degree);
      PortTransfer.Fit none =
          new PortTransfer.Fit(centre, halfHeight, new double[0], new double[2][0][p2]);
      PortTransfer bare =
          new PortTransfer(ports.size(), region, corrected, terms, none, Double.NaN);
      PortTransfer.Fit fit = fit(degree, round, sample(round), bare);
      PortTransfer tried =
          new PortTransfer(ports.size(), region, corrected, terms, fit, Double.NaN);
      double error = error(tried, inside, truth);
      tried = new PortTransfer(ports.size(), region, corrected, terms, fit, error);
      if (best == null || error < best.error()) {
        best = tried;
      }
      if (best.error() < WANTED) {
        break;
      }
    }
    return best;
  }

  private Residue residue(PortPole pole) {
    Eigenspace space = Eigenspace.of(operator, turned, pole);
    int m = pole.multiplicity();
    ComplexMatrix left = portsTimes(space.left()); // BᵀQ, ports × m
    ComplexMatrix right = portsTimes(space.right());
    ComplexMatrix scaled = new ComplexMatrix(m, ports.size());
    for (int i = 0; i < m; i++) {
      for (int j = 0; j < ports.size(); j++) {
        scaled.set(i, j, left.get(j, i));
      }
    }
    new ComplexLu(space.norm().copy()).solve(scaled);
    ComplexMatrix residue = right.times(scaled);
    return new Residue(space.mean(), m, rows(residue, 0), rows(residue, 1));
  }

  private double[] rows(ComplexMatrix a, int part) {
    int k = ports.size();
    double[] out = new double[k * k];
    for (int i = 0; i < k; i++) {
      for (int j = 0; j < k; j++) {
        out[i * k + j] = part == 0 ? a.get(i, j).getReal() : a.get(i, j).getImaginary();
      }
    }
    return out;
  }

  private ComplexMatrix portsTimes(ComplexMatrix x) {
    ComplexMatrix y = new ComplexMatrix(ports.size(), x.columns());
    for (int j = 0; j < x.columns(); j++) {
      for (int i = 0; i < ports.size(); i++) {
        y.set(i, j, new Complex(ports.get(i).dot(x.re()[j]), ports.get(i).dot(x.im()[j])));
      }
    }
    return y;
  }

  /** Points on the edge of the region, dense towards its corners. */
  private List<Complex> round(int degree) {
    List<Complex> points = new ArrayList<>();
    double low = 2 * Math.PI * region.lowestFrequency();
    double high = 2 * Math.PI * region.highestFrequency();
    int n = degree + 6;
    for (int k = 0; k < n; k++) {
      double omega = 0.5 * (low + high) - 0.5 * (high - low) * Math.cos(Math.PI * (k + 0.5) / n);
      points.add(new Complex(region.lowestGrowth(), omega));
      points.add(new Complex(region.highestGrowth(), omega));
    }
    int across = 8;
    for (int k = 0; k < across; k++) {
      double sigma =
          centre.getReal()
              - 0.5
                  * (region.highestGrowth() - region.lowestGrowth())
                  * Math.cos(Math.PI * (k + 0.5) / across);
      points.add(new Complex(sigma, low));
      points.add(new Complex(sigma, high));
    }
    return points;
  }

  /** Points of the check, spread over the region. */
  private List<Complex> inside() {
    List<Complex> points = new ArrayList<>();
    for (int k = 0; k < 10; k++) {
      double u = (k + 0.5) / 10;
      double v = (k + 1) * 0.6180339887498949;
      v -= Math.floor(v);
      points.add(
          new Complex(
              region.lowestGrowth() + v * (region.highestGrowth() - region.lowestGrowth()),
              2
                  * Math.PI
                  * (region.lowestFrequency()
                      + u * (region.highestFrequency() - region.lowestFrequency()))));
    }
    return points;
  }

  /** H by full solves, {re, im} row by row. */
  private List<double[][]> sample(List<Complex> points) {
    return IntStream.range(0, points.size())
        .parallel()
        .mapToObj(
            k -> {
              OperatorAt at = operator.at(points.get(k));
              ComplexMatrix b = new ComplexMatrix(operator.size(), ports.size());
              for (int j = 0; j < ports.size(); j++) {
                ports.get(j).addTo(b.re()[j], 1);
              }
              at.solve(b);
              ComplexMatrix h = portsTimes(b);
              return new double[][] {rows(h, 0), rows(h, 1)};
            })
        .toList();
  }

  private PortTransfer.Fit fit(
      int degree, List<Complex> points, List<double[][]> samples, PortTransfer bare) {
    int functions = degree + 1 + sources().length;
    int p2 = ports.size() * ports.size();
    int m = points.size();
    int[] everyPort = IntStream.range(0, ports.size()).toArray();
    PortTransfer.Selection poles = bare.select(everyPort);
    RealMatrix a = new Array2DRowRealMatrix(2 * m, 2 * functions);
    RealMatrix rhs = new Array2DRowRealMatrix(2 * m, p2);
    double[][] h = new double[4][p2];
    for (int k = 0; k < m; k++) {
      Complex s = points.get(k);
      Complex[] f = functions(s, degree);
      for (int j = 0; j < functions; j++) {
        a.setEntry(k, j, f[j].getReal());
        a.setEntry(k, functions + j, -f[j].getImaginary());
        a.setEntry(m + k, j, f[j].getImaginary());
        a.setEntry(m + k, functions + j, f[j].getReal());
      }
      poles.at(s.getReal(), s.getImaginary(), h);
      for (int q = 0; q < p2; q++) {
        rhs.setEntry(k, q, samples.get(k)[0][q] - h[0][q]);
        rhs.setEntry(m + k, q, samples.get(k)[1][q] - h[1][q]);
      }
    }
    double[] scale = new double[2 * functions];
    for (int j = 0; j < scale.length; j++) {
      scale[j] = 1 / a.getColumnVector(j).getNorm();
      a.setColumnVector(j, a.getColumnVector(j).mapMultiply(scale[j]));
    }
    RealMatrix x = solved(a, rhs);
    double[][][] coefficient = new double[2][functions][p2];
    for (int j = 0; j < functions; j++) {
      for (int q = 0; q < p2; q++) {
        coefficient[0][j][q] = scale[j] * x.getEntry(j, q);
        coefficient[1][j][q] = scale[functions + j] * x.getEntry(functions + j, q);
      }
    }
    return new PortTransfer.Fit(centre, halfHeight, sources(), coefficient);
  }

  /**
   * Least squares without the directions the samples hardly see: they would bring huge coefficients
   * that cancel, and with them rounding.
   */
  private static RealMatrix solved(RealMatrix a, RealMatrix rhs) {
    SingularValueDecomposition svd = new SingularValueDecomposition(a);
    double[] sigma = svd.getSingularValues();
    RealMatrix y = svd.getUT().multiply(rhs);
    for (int i = 0; i < y.getRowDimension(); i++) {
      double factor = i < sigma.length && sigma[i] > UNSEEN * sigma[0] ? 1 / sigma[i] : 0;
      for (int q = 0; q < y.getColumnDimension(); q++) {
        y.multiplyEntry(i, q, factor);
      }
    }
    return svd.getV().multiply(y);
  }

  private Complex[] functions(Complex s, int degree) {
    double[] sources = sources();
    Complex[] f = new Complex[degree + 1 + sources.length];
    Complex z = s.subtract(centre).divide(new Complex(0, halfHeight));
    f[0] = Complex.ONE;
    f[1] = z;
    for (int k = 2; k <= degree; k++) {
      f[k] = z.multiply(2).multiply(f[k - 1]).subtract(f[k - 2]);
    }
    for (int k = 0; k < sources.length; k++) {
      f[degree + 1 + k] = s.subtract(sources[k]).reciprocal();
    }
    return f;
  }

  /**
   * Poles on the real axis below the region: what is left there (pressure that leaks away without
   * swinging, and the double root s = 0 of a closed chamber) is drawn together into them.
   */
  private double[] sources() {
    double low = 2 * Math.PI * region.lowestFrequency();
    double[] at = {-4, -2.5, -1.6, -1, -0.6, -0.3, -0.1, 0, 0.1, 0.3, 0.6, 1, 1.6};
    return Arrays.stream(at).map(x -> x * low).toArray();
  }

  private double error(PortTransfer tried, List<Complex> points, List<double[][]> truth) {
    int[] everyPort = IntStream.range(0, ports.size()).toArray();
    PortTransfer.Selection selection = tried.select(everyPort);
    double[][] h = new double[4][ports.size() * ports.size()];
    double worst = 0;
    for (int k = 0; k < points.size(); k++) {
      selection.at(points.get(k).getReal(), points.get(k).getImaginary(), h);
      double largest = 0;
      double miss = 0;
      for (int q = 0; q < h[0].length; q++) {
        double re = truth.get(k)[0][q];
        double im = truth.get(k)[1][q];
        largest = Math.max(largest, Math.hypot(re, im));
        miss = Math.max(miss, Math.hypot(re - h[0][q], im - h[1][q]));
      }
      worst = Math.max(worst, miss / largest);
    }
    return worst;
  }
}
