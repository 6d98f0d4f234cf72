package org.annulet.solver.ports;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.annulet.solver.dense.ComplexLu;
import org.annulet.solver.dense.ComplexMatrix;
import org.annulet.solver.dense.OrthonormalColumns;
import org.annulet.solver.eigen.OperatorAt;
import org.annulet.solver.eigen.PreparedOperator;
import org.annulet.solver.modes.Window;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.operator.LowRankTerm;
import org.annulet.solver.operator.SparseVector;
import org.apache.commons.math3.complex.Complex;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.QRDecomposition;
import org.apache.commons.math3.linear.RealMatrix;

/**
 * Finds H(s) of a chamber: residues by block inverse iteration at its modes, the smooth part by
 * least squares on full solves round a region, and a check by full solves inside it.
 */
public final class PortSampling {
  private static final double BESIDE = 1e-8;
  private static final int ITERATIONS = 4;

  /** Polynomials are added until the check is met or the samples run out. */
  private static final double WANTED = 1e-8;

  private static final int[] DEGREES = {12, 20, 30};

  private final PreparedOperator operator;
  private final PreparedOperator turned;
  private final List<SparseVector> ports;
  private final Window region;
  private final Complex centre;
  private final double halfHeight;

  private PortSampling(PreparedOperator operator, List<SparseVector> ports, Window region) {
    this.operator = operator;
    this.turned = new PreparedOperator(transposed(operator.operator()), operator.analysis());
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
      PortTransfer.Fit none = new PortTransfer.Fit(centre, halfHeight, new double[2][2][p2]);
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
    int m = pole.multiplicity();
    int n = operator.size();
    Complex s = pole.s();
    OperatorAt near = operator.at(s.add(new Complex(0.6, 0.8).multiply(BESIDE * s.abs())));
    ComplexMatrix x = start(n, m, 1);
    ComplexMatrix q = start(n, m, 2);
    for (int k = 0; k < ITERATIONS; k++) {
      x = operator.derivativeTimes(s, x);
      near.solve(x);
      x = OrthonormalColumns.of(x, 0);
      q = turned.derivativeTimes(s, q);
      near.solveTransposed(q);
      q = OrthonormalColumns.of(q, 0);
    }
    ComplexMatrix norm = transposeTimes(q, operator.derivativeTimes(s, x));
    ComplexMatrix miss = transposeTimes(q, operator.times(s, x));
    new ComplexLu(norm.copy()).solve(miss);
    Complex shift = Complex.ZERO;
    for (int j = 0; j < m; j++) {
      shift = shift.subtract(miss.get(j, j).divide(m));
    }
    ComplexMatrix left = portsTimes(q); // BᵀQ, ports × m
    ComplexMatrix right = portsTimes(x);
    ComplexMatrix scaled = new ComplexMatrix(m, ports.size());
    for (int i = 0; i < m; i++) {
      for (int j = 0; j < ports.size(); j++) {
        scaled.set(i, j, left.get(j, i));
      }
    }
    new ComplexLu(norm).solve(scaled);
    ComplexMatrix residue = right.times(scaled);
    return new Residue(s.add(shift), m, rows(residue, 0), rows(residue, 1));
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

  /** Fixed columns without symmetry, so that every mode has a share in them. */
  private static ComplexMatrix start(int n, int columns, int kind) {
    ComplexMatrix x = new ComplexMatrix(n, columns);
    for (int j = 0; j < columns; j++) {
      for (int i = 0; i < n; i++) {
        double turn = (i + 1) * (0.6180339887498949 + 0.1 * j + 0.37 * kind);
        x.re()[j][i] = turn - Math.floor(turn) - 0.5;
        x.im()[j][i] = 1.7 * turn - Math.floor(1.7 * turn) - 0.5;
      }
    }
    return x;
  }

  private static ComplexMatrix transposeTimes(ComplexMatrix x, ComplexMatrix y) {
    ComplexMatrix conjugate = x.copy();
    for (double[] column : conjugate.im()) {
      for (int i = 0; i < column.length; i++) {
        column[i] = -column[i];
      }
    }
    return conjugate.adjointTimes(y);
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
    int across = 4;
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
    int functions = degree + 3;
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
    RealMatrix x = new QRDecomposition(a).getSolver().solve(rhs);
    double[][][] coefficient = new double[2][functions][p2];
    for (int j = 0; j < functions; j++) {
      for (int q = 0; q < p2; q++) {
        coefficient[0][j][q] = scale[j] * x.getEntry(j, q);
        coefficient[1][j][q] = scale[functions + j] * x.getEntry(functions + j, q);
      }
    }
    return new PortTransfer.Fit(centre, halfHeight, coefficient);
  }

  private Complex[] functions(Complex s, int degree) {
    Complex[] f = new Complex[degree + 3];
    Complex z = s.subtract(centre).divide(new Complex(0, halfHeight));
    f[0] = Complex.ONE;
    f[1] = z;
    for (int k = 2; k <= degree; k++) {
      f[k] = z.multiply(2).multiply(f[k - 1]).subtract(f[k - 2]);
    }
    f[degree + 1] = s.reciprocal();
    f[degree + 2] = s.multiply(s).reciprocal();
    return f;
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

  /** Lᵀ: the low-rank terms with their sides exchanged. */
  private static AcousticOperator transposed(AcousticOperator operator) {
    List<LowRankTerm> terms = new ArrayList<>();
    for (LowRankTerm term : operator.lowRankTerms()) {
      AnalyticFunction[][] phi = new AnalyticFunction[term.right().size()][term.left().size()];
      for (int i = 0; i < term.left().size(); i++) {
        for (int j = 0; j < term.right().size(); j++) {
          phi[j][i] = term.coefficient()[i][j];
        }
      }
      terms.add(new LowRankTerm(term.name(), term.right(), term.left(), phi));
    }
    return new AcousticOperator(
        operator.pattern(),
        operator.stiffness(),
        operator.mass(),
        operator.sparseTerms(),
        terms,
        operator.coordinates());
  }
}
