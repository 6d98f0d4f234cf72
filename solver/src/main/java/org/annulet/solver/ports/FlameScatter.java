package org.annulet.solver.ports;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import org.annulet.solver.dense.ComplexMatrix;
import org.annulet.solver.eigen.OperatorAt;
import org.annulet.solver.eigen.PreparedOperator;
import org.annulet.solver.modes.Window;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.operator.LowRankTerm;
import org.annulet.solver.operator.SparseVector;
import org.annulet.solver.rational.BarycentricFit;
import org.apache.commons.math3.complex.Complex;

/**
 * A ring whose burners are alike but for the response of one flame, condensed onto the N burners.
 *
 * <pre>
 *   L = L₀ + Σ_j (ρ_j(s) − 1) u_j φ(s) v_jᵀ       ρ_j response of burner j over the common one
 *   det L = det L₀ · det(1 + diag(ρ_j − 1) H),   H_jk = 1/N Σ_q h_q cos(2πq(j − k)/N)
 *   h_q(s) = φ(s) vᵀ L_q(s)⁻¹ u                   on the cell of Bloch number q, −N/2 &lt; q ≤ N/2
 * </pre>
 *
 * <p>Exact for any strength of the scatter. The h_q are sampled on the cells' full operators over a
 * region and fitted by rational functions; the error of the fit at points of its own is measured.
 * Immutable and thread-safe.
 */
public final class FlameScatter {
  private static final double WANTED = 1e-10;
  private static final int MOST_SUPPORT = 48;
  private static final int ACROSS = 7;
  private static final int UP = 26;
  private static final int CHECKS = 12;
  private static final int STEPS = 60;

  /** A root further from its pole than this share of the way to another is followed in steps. */
  private static final double NEAR = 0.3;

  private static final int PATH = 16;

  private final int burners;
  private final Window region;
  private final List<PortPole> poles;
  private final List<Cell> cells;
  private final BarycentricFit[] transfer;
  private final double error;

  /**
   * A Bloch cell with its modes.
   *
   * @param number q, from 0 to N/2
   * @param copies 2 where it stands for −q too
   * @param operator of the cell, all burners alike
   * @param modes its eigenvalues in the region and round it
   */
  public record Cell(int number, int copies, PreparedOperator operator, List<Complex> modes) {}

  /** The response of a burner over the common one, and its derivative. */
  public interface Ratio {
    /** At s: {ρ, ρ′}. */
    Complex[] at(Complex s);
  }

  private FlameScatter(
      int burners,
      Window region,
      List<PortPole> poles,
      List<Cell> cells,
      BarycentricFit[] transfer,
      double error) {
    this.burners = burners;
    this.region = region;
    this.poles = List.copyOf(poles);
    this.cells = List.copyOf(cells);
    this.transfer = transfer;
    this.error = error;
  }

  /**
   * Condenses.
   *
   * @param cells one for each Bloch number
   * @param term name of the flame's term in the cells' operators
   * @param burners N
   * @param region where roots will be wanted
   * @throws IllegalArgumentException if a cell has no such term, or it answers pointwise
   */
  public static FlameScatter of(List<Cell> cells, String term, int burners, Window region) {
    List<Complex> points = new ArrayList<>();
    double low = 2 * Math.PI * region.lowestFrequency();
    double high = 2 * Math.PI * region.highestFrequency();
    for (int i = 0; i < ACROSS; i++) {
      for (int k = 0; k < UP; k++) {
        double x = -Math.cos(Math.PI * i / (ACROSS - 1));
        double y = -Math.cos(Math.PI * (k + (i % 2 == 0 ? 0.3 : 0.7)) / UP);
        points.add(
            new Complex(
                0.5 * (region.lowestGrowth() + region.highestGrowth())
                    + 0.5 * x * (region.highestGrowth() - region.lowestGrowth()),
                0.5 * (low + high) + 0.5 * y * (high - low)));
      }
    }
    List<Complex> checks = new ArrayList<>();
    for (int k = 0; k < CHECKS; k++) {
      double v = (k + 1) * 0.6180339887498949;
      v -= Math.floor(v);
      checks.add(
          new Complex(
              region.lowestGrowth() + v * (region.highestGrowth() - region.lowestGrowth()),
              low + (k + 0.5) / CHECKS * (high - low)));
    }
    BarycentricFit[] transfer = new BarycentricFit[cells.size()];
    double[] errors = new double[cells.size()];
    IntStream.range(0, cells.size())
        .parallel()
        .forEach(
            c -> {
              LowRankTerm flame = term(cells.get(c).operator(), term);
              transfer[c] =
                  BarycentricFit.of(
                      points, sample(cells.get(c).operator(), flame, points), WANTED, MOST_SUPPORT);
              List<Complex> truth = sample(cells.get(c).operator(), flame, checks);
              double[] out = new double[4];
              for (int k = 0; k < checks.size(); k++) {
                transfer[c].at(checks.get(k).getReal(), checks.get(k).getImaginary(), out);
                double miss = new Complex(out[0], out[1]).subtract(truth.get(k)).abs();
                errors[c] = Math.max(errors[c], miss / (1 + truth.get(k).abs()));
              }
            });
    double worst = 0;
    List<PortPole> poles = new ArrayList<>();
    for (int c = 0; c < cells.size(); c++) {
      worst = Math.max(worst, errors[c]);
      for (Complex s : cells.get(c).modes()) {
        poles.add(new PortPole(s, cells.get(c).copies()));
      }
    }
    return new FlameScatter(burners, region, poles, cells, transfer, worst);
  }

  private static LowRankTerm term(PreparedOperator operator, String name) {
    return operator.operator().lowRankTerms().stream()
        .filter(t -> t.name().equals(name) && t.left().size() == 1)
        .findFirst()
        .orElseThrow(
            () -> new IllegalArgumentException("no term '" + name + "' that answers as one"));
  }

  private static List<Complex> sample(
      PreparedOperator operator, LowRankTerm flame, List<Complex> points) {
    List<Complex> out = new ArrayList<>();
    for (Complex s : points) {
      OperatorAt at = operator.at(s);
      ComplexMatrix x = new ComplexMatrix(operator.size(), 1);
      flame.left().get(0).addTo(x.re()[0], 1);
      at.solve(x);
      Complex h = Complex.ZERO;
      for (int k = 0; k < flame.right().size(); k++) {
        AnalyticFunction phi = flame.coefficient()[0][k];
        if (phi != null) {
          SparseVector g = flame.right().get(k);
          Complex v = new Complex(g.dot(x.re()[0]), g.dot(x.im()[0]));
          h = h.add(phi.value(s).multiply(v));
        }
      }
      out.add(h);
    }
    return out;
  }

  /** The eigenvalues without scatter, in the order of the cells and of their modes. */
  public List<PortPole> poles() {
    return poles;
  }

  /** Largest error of the h_q at points of the check, over 1 + |h_q|. */
  public double error() {
    return error;
  }

  /** The cell of a pole and its Bloch number. */
  public int number(int pole) {
    int p = 0;
    for (Cell c : cells) {
      p += c.modes().size();
      if (pole < p) {
        return c.number();
      }
    }
    throw new IllegalArgumentException("there is no pole " + pole);
  }

  /** ds/dρ of an eigenvalue, ρ the same at all burners. */
  public Complex slope(int pole) {
    int q = number(pole);
    int c = 0;
    while (cells.get(c).number() != q) {
      c++;
    }
    Complex s = poles.get(pole).s();
    Complex residue = Complex.ZERO;
    double[] out = new double[4];
    for (int k = 0; k < 8; k++) {
      double turn = Math.PI * (k + 0.5) / 4;
      Complex d = new Complex(Math.cos(turn), Math.sin(turn)).multiply(1e-4 * s.abs());
      transfer[c].at(s.getReal() + d.getReal(), s.getImaginary() + d.getImaginary(), out);
      residue = residue.add(d.multiply(new Complex(out[0], out[1])));
    }
    return residue.divide(-8);
  }

  /**
   * The eigenvalues with scatter.
   *
   * @param wanted where it matters which eigenvalue has become which: one from there that ends far
   *     from where it began is followed in steps
   * @param ratios ρ_j of each burner
   * @return in the order of {@link #poles()}, the members of each by growth rate, largest first;
   *     NaN where one was lost
   */
  public Complex[][] roots(Window wanted, List<Ratio> ratios) {
    if (ratios.size() != burners) {
      throw new IllegalArgumentException(ratios.size() + " ratios for " + burners + " burners");
    }
    Determinant determinant = new Determinant(ratios);
    SimultaneousRoots iteration = new SimultaneousRoots(determinant::rate, poles, region);
    List<Complex> start = startPoints();
    boolean[] settled = new boolean[start.size()];
    List<Complex> points = iteration.run(start, STEPS, settled);
    if (strayed(wanted, points, settled)) {
      points = start;
      for (int k = 1; k <= PATH; k++) {
        determinant.strength = (double) k / PATH;
        settled = new boolean[start.size()];
        points = iteration.run(points, STEPS, settled);
      }
    }
    Complex[][] out = new Complex[poles.size()][];
    int q = 0;
    for (int i = 0; i < out.length; i++) {
      out[i] = new Complex[poles.get(i).multiplicity()];
      for (int j = 0; j < out[i].length; j++, q++) {
        out[i][j] = settled[q] ? points.get(q) : Complex.NaN;
      }
      if (out[i].length == 2 && out[i][1].getReal() > out[i][0].getReal()) {
        Complex t = out[i][0];
        out[i][0] = out[i][1];
        out[i][1] = t;
      }
    }
    return out;
  }

  private List<Complex> startPoints() {
    List<Complex> points = new ArrayList<>();
    for (PortPole pole : poles) {
      for (int k = 0; k < pole.multiplicity(); k++) {
        double turn = 0.7 + Math.PI * k;
        points.add(
            pole.s()
                .add(new Complex(Math.cos(turn), Math.sin(turn)).multiply(1e-4 * pole.s().abs())));
      }
    }
    return points;
  }

  /**
   * Whether some root is lost or so far from where it began, compared with the other poles, that it
   * may belong to another.
   */
  private boolean strayed(Window wanted, List<Complex> points, boolean[] settled) {
    int q = 0;
    for (int i = 0; i < poles.size(); i++) {
      for (int k = 0; k < poles.get(i).multiplicity(); k++, q++) {
        if (!settled[q]) {
          return true;
        }
        Complex from = poles.get(i).s();
        boolean counts = wanted.contains(from.getReal(), from.getImaginary() / (2 * Math.PI));
        double own = points.get(q).subtract(from).abs();
        for (int j = 0; counts && j < poles.size(); j++) {
          double apart = poles.get(j).s().subtract(poles.get(i).s()).abs();
          if (j != i && own > NEAR * apart) {
            return true;
          }
        }
      }
    }
    return false;
  }

  /** g = Π(s − s_i) · det(1 + diag(ρ − 1) H) of one set of ratios; not thread-safe. */
  private final class Determinant {
    private final List<Ratio> ratios;
    private final double[][] m = new double[4][burners * burners];
    private final double[][] h = new double[4][burners]; // H by |j − k|
    private final double[] one = new double[4];
    private double strength = 1;

    Determinant(List<Ratio> ratios) {
      this.ratios = ratios;
    }

    void rate(double sr, double si, double[] out) {
      int n = burners;
      for (double[] part : h) {
        java.util.Arrays.fill(part, 0);
      }
      for (int c = 0; c < transfer.length; c++) {
        transfer[c].at(sr, si, one);
        for (int d = 0; d < n; d++) {
          double f =
              cells.get(c).copies() * Math.cos(2 * Math.PI * cells.get(c).number() * d / n) / n;
          for (int part = 0; part < 4; part++) {
            h[part][d] += f * one[part];
          }
        }
      }
      Complex s = new Complex(sr, si);
      for (int j = 0; j < n; j++) {
        Complex[] ratio = ratios.get(j).at(s);
        double ar = strength * (ratio[0].getReal() - 1);
        double ai = strength * ratio[0].getImaginary();
        double br = strength * ratio[1].getReal();
        double bi = strength * ratio[1].getImaginary();
        for (int k = 0; k < n; k++) {
          int q = j * n + k;
          int d = Math.abs(j - k);
          m[0][q] = ar * h[0][d] - ai * h[1][d] + (j == k ? 1 : 0);
          m[1][q] = ar * h[1][d] + ai * h[0][d];
          m[2][q] = ar * h[2][d] - ai * h[3][d] + br * h[0][d] - bi * h[1][d];
          m[3][q] = ar * h[3][d] + ai * h[2][d] + br * h[1][d] + bi * h[0][d];
        }
      }
      SmallTrace.of(n, m, out);
      for (PortPole pole : poles) {
        double dr = sr - pole.s().getReal();
        double di = si - pole.s().getImaginary();
        double norm = dr * dr + di * di;
        out[0] += pole.multiplicity() * dr / norm;
        out[1] -= pole.multiplicity() * di / norm;
      }
    }
  }
}
