package org.annulet.solver.eigen;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.annulet.solver.sparse.RealFactor;

/**
 * A real basis for the field in the window: passive modes to beyond its upper edge, and the
 * responses (K − ω²M)⁻¹ f to every flame and port load and to the walls' loads A_i φ of the passive
 * modes, at frequencies placed between the passive ones. It knows no coefficient: gains and delays
 * may change and it still serves. M-orthonormal; what depends on earlier columns is dropped.
 */
final class ReducedBasis {
  private static final double DROP = 1e-7;
  private final PreparedOperator prepared;
  private final double drop;
  private final List<double[]> q = new ArrayList<>();
  private final List<double[]> mq = new ArrayList<>();

  ReducedBasis(PreparedOperator prepared) {
    this(prepared, DROP);
  }

  /** One that drops what is new by less than a share of its length. */
  ReducedBasis(PreparedOperator prepared, double drop) {
    this.prepared = prepared;
    this.drop = drop;
  }

  /** The columns, shape [columns][n]. */
  double[][] columns() {
    return q.toArray(double[][]::new);
  }

  int size() {
    return q.size();
  }

  /** All of the space: for problems so small that nothing is gained by reducing. */
  static ReducedBasis everything(PreparedOperator prepared) {
    ReducedBasis basis = new ReducedBasis(prepared);
    for (double[] v : DensePencil.solve(prepared.operator()).vectors()) {
      basis.add(v);
    }
    return basis;
  }

  /** Adds responses at the given angular frequencies in 1/s. */
  void addResponses(PassiveModes.Spectrum passive, double[] omegas) {
    PassiveModes.ShiftInvert shifted = new PassiveModes.ShiftInvert(prepared);
    List<double[]> loads = loads(passive);
    if (loads.isEmpty()) {
      return;
    }
    for (double omega : omegas) {
      RealFactor factor = shifted.factorNear(omega * omega, omega * omega * 0.1);
      double[][] x = loads.stream().map(double[]::clone).toArray(double[][]::new);
      factor.solve(x);
      for (double[] column : x) {
        add(column);
      }
    }
  }

  /** Flame and port loads, and the walls' loads on the passive modes, orthonormalised. */
  private List<double[]> loads(PassiveModes.Spectrum passive) {
    List<double[]> loads = new ArrayList<>();
    loads.addAll(Arrays.asList(LowRank.dense(prepared.lowRank().left(), prepared.size())));
    for (WallMatrix wall : prepared.walls()) {
      List<double[]> own = new ArrayList<>();
      for (double[] v : passive.vectors()) {
        double[] load = new double[prepared.size()];
        wall.addProduct(1, v, load);
        addOrthonormal(own, load, 1e-4);
      }
      if (own.isEmpty()) {
        double[] uniform = new double[prepared.size()];
        Arrays.fill(uniform, 1);
        double[] load = new double[prepared.size()];
        wall.addProduct(1, uniform, load);
        own.add(load);
      }
      loads.addAll(own);
    }
    return loads;
  }

  /** Adds what is new in x, M-orthonormalised. */
  boolean add(double[] x) {
    return add(x, drop);
  }

  /**
   * The same with a stated share of x below which nothing is new. A field that is nearly held
   * leaves a rough remainder, which weighs little but much in the backward error.
   */
  boolean add(double[] x, double smallest) {
    double[] y = x.clone();
    double before = massNorm(y);
    if (!(before > 0) || Double.isInfinite(before)) {
      return false;
    }
    scale(y, 1 / before);
    for (int pass = 0; pass < 2; pass++) {
      for (int k = 0; k < q.size(); k++) {
        axpy(-dot(mq.get(k), y), q.get(k), y);
      }
    }
    double after = massNorm(y);
    if (!(after > smallest)) {
      return false;
    }
    scale(y, 1 / after);
    q.add(y);
    mq.add(massTimes(y));
    return true;
  }

  private static void addOrthonormal(List<double[]> basis, double[] x, double drop) {
    double before = Math.sqrt(dot(x, x));
    for (int pass = 0; pass < 2; pass++) {
      for (double[] b : basis) {
        axpy(-dot(b, x), b, x);
      }
    }
    double after = Math.sqrt(dot(x, x));
    if (after > drop * before && after > 0) {
      scale(x, 1 / after);
      basis.add(x);
    }
  }

  private double[] massTimes(double[] x) {
    double[] y = new double[x.length];
    prepared.operator().pattern().addProduct(prepared.operator().mass(), x, 1, y);
    return y;
  }

  private double massNorm(double[] x) {
    return Math.sqrt(dot(x, massTimes(x)));
  }

  private static double dot(double[] a, double[] b) {
    double sum = 0;
    for (int i = 0; i < a.length; i++) {
      sum += a[i] * b[i];
    }
    return sum;
  }

  private static void axpy(double a, double[] x, double[] y) {
    for (int i = 0; i < y.length; i++) {
      y[i] += a * x[i];
    }
  }

  private static void scale(double[] x, double a) {
    for (int i = 0; i < x.length; i++) {
      x[i] *= a;
    }
  }
}
