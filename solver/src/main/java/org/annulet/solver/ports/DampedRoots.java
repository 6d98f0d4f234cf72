package org.annulet.solver.ports;

import java.util.ArrayList;
import java.util.List;
import org.annulet.solver.modes.Window;
import org.annulet.solver.operator.AnalyticFunction;
import org.apache.commons.math3.complex.Complex;

/**
 * The eigenvalues of a chamber with dampers on some of its ports, at their true strength: the zeros
 * of g(s) = Π(s − s_i) · Π(s − π_k) · det(1 + diag(a) H), π_k the poles of the dampers. All are
 * found at once ({@link SimultaneousRoots}) and counted by the argument principle. Not thread-safe;
 * cheap to make.
 */
public final class DampedRoots {
  private static final int STEPS = 80;
  private static final int ROUNDS = 4;
  private final PortTransfer transfer;
  private final PortTransfer.Selection selection;
  private final AnalyticFunction[] flows;
  private final List<Complex> damperPoles = new ArrayList<>();
  private final Window window;
  private final double[][] h;
  private final double[] ar;
  private final double[] ai;
  private final double[] br;
  private final double[] bi;
  private final SimultaneousRoots iteration;
  private double strength = 1;

  /**
   * Dampers on ports.
   *
   * @param transfer H of the chamber
   * @param ports one for each damper, all different
   * @param flows a = s·Y of each damper, in m³/(s²·Pa)
   * @param window where the modes are wanted; within the region of the transfer, with a few per
   *     cent to spare
   */
  public DampedRoots(PortTransfer transfer, int[] ports, AnalyticFunction[] flows, Window window) {
    if (ports.length != flows.length) {
      throw new IllegalArgumentException(ports.length + " ports, but " + flows.length + " dampers");
    }
    this.transfer = transfer;
    this.selection = transfer.select(ports);
    this.flows = flows.clone();
    this.window = window;
    int k = ports.length;
    h = new double[4][k * k];
    ar = new double[k * k];
    ai = new double[k * k];
    br = new double[k * k];
    bi = new double[k * k];
    iteration = new SimultaneousRoots(this::rate, transfer.poles(), transfer.region());
    Window wide = transfer.region();
    for (AnalyticFunction f : flows) {
      damperPoles.addAll(
          f.poles(
              new Complex(3 * wide.lowestGrowth(), 0.5 * 2 * Math.PI * wide.lowestFrequency()),
              new Complex(
                  3 * Math.abs(wide.highestGrowth()),
                  1.3 * 2 * Math.PI * wide.highestFrequency())));
    }
  }

  /**
   * What was found.
   *
   * @param roots eigenvalues in the window, as often as they occur, by growth rate, largest first
   * @param missing how many more the argument principle asks for; 0 when the answer is complete
   */
  public record Found(List<Complex> roots, int missing) {
    /** Whether the count confirms the roots. */
    public boolean complete() {
      return missing == 0;
    }

    /** The largest growth rate in 1/s; negative infinity without roots. */
    public double worst() {
      return roots.isEmpty() ? Double.NEGATIVE_INFINITY : roots.get(0).getReal();
    }
  }

  /** All eigenvalues in the window. */
  public Found all() {
    List<Complex> points = startPoints();
    int missing = 0;
    for (int round = 0; round < ROUNDS; round++) {
      List<Complex> settled = iterate(points, STEPS);
      missing = missing(settled);
      points = settled;
      if (missing <= 0 || round == ROUNDS - 1) {
        break;
      }
      for (int k = 0; k < 2 * missing + 2; k++) {
        points.add(somewhere(101 * round + k));
      }
    }
    return new Found(inside(points), missing);
  }

  /**
   * Whether some eigenvalue in the window grows faster than a bound; found from the modes without
   * dampers that do. False proves nothing, true is proof.
   */
  public boolean someRootBeyond(double bound) {
    List<Complex> points = new ArrayList<>();
    for (PortPole pole : transfer.poles()) {
      if (pole.s().getReal() > bound && inFrequency(pole.s())) {
        for (int k = 0; k < pole.multiplicity() && points.size() < 6; k++) {
          points.add(beside(pole.s(), k));
        }
      }
    }
    for (Complex root : iterate(points, 14)) {
      if (root.getReal() > bound && inFrequency(root) && root.getReal() <= window.highestGrowth()) {
        return true;
      }
    }
    return false;
  }

  /**
   * The eigenvalues that the modes without dampers become as the dampers' strength grows from
   * nothing, in the order of {@link PortTransfer#poles()}; NaN where the way was lost.
   *
   * @return shape [poles][multiplicity]
   */
  public Complex[][] grownFromPoles() {
    List<Complex> points = startPoints();
    int steps = 12;
    for (int k = 1; k <= steps; k++) {
      strength = Math.pow((double) k / steps, 2);
      points = iteration.run(points, STEPS, new boolean[points.size()]);
    }
    strength = 1;
    boolean[] settled = new boolean[points.size()];
    points = iteration.run(points, STEPS, settled);
    Complex[][] out = new Complex[transfer.poles().size()][];
    int q = 0;
    for (int i = 0; i < out.length; i++) {
      out[i] = new Complex[transfer.poles().get(i).multiplicity()];
      for (int j = 0; j < out[i].length; j++, q++) {
        out[i][j] = settled[q] ? points.get(q) : Complex.NaN;
      }
    }
    return out;
  }

  private List<Complex> startPoints() {
    List<Complex> points = new ArrayList<>();
    for (PortPole pole : transfer.poles()) {
      for (int k = 0; k < pole.multiplicity(); k++) {
        points.add(beside(pole.s(), k));
      }
    }
    for (int k = 0; k < damperPoles.size(); k++) {
      points.add(beside(damperPoles.get(k), k + 1));
    }
    return points;
  }

  private static Complex beside(Complex s, int k) {
    double turn = 0.7 + 2.399963 * k; // golden angle: no two starts alike
    return s.add(new Complex(Math.cos(turn), Math.sin(turn)).multiply((1 + k) * 2e-5 * s.abs()));
  }

  private Complex somewhere(int k) {
    double u = (k + 1) * 0.7548776662466927;
    double v = (k + 1) * 0.5698402909980532;
    u -= Math.floor(u);
    v -= Math.floor(v);
    return new Complex(
        window.lowestGrowth() + u * (window.highestGrowth() - window.lowestGrowth()),
        2
            * Math.PI
            * (window.lowestFrequency()
                + v * (window.highestFrequency() - window.lowestFrequency())));
  }

  /** Those points that settled. */
  private List<Complex> iterate(List<Complex> start, int steps) {
    boolean[] settled = new boolean[start.size()];
    List<Complex> points = iteration.run(start, steps, settled);
    List<Complex> kept = new ArrayList<>();
    for (int k = 0; k < settled.length; k++) {
      if (settled[k]) {
        kept.add(points.get(k));
      }
    }
    return kept;
  }

  private boolean inFrequency(Complex s) {
    double f = s.getImaginary() / (2 * Math.PI);
    return window.lowestFrequency() <= f && f <= window.highestFrequency();
  }

  private List<Complex> inside(List<Complex> points) {
    return points.stream()
        .filter(s -> window.contains(s.getReal(), s.getImaginary() / (2 * Math.PI)))
        .sorted((a, b) -> Double.compare(b.getReal(), a.getReal()))
        .toList();
  }

  /** g′/g. */
  private void rate(double sr, double si, double[] out) {
    selection.at(sr, si, h);
    int k = flows.length;
    Complex s = new Complex(sr, si);
    for (int i = 0; i < k; i++) {
      Complex f = flows[i].value(s).multiply(strength);
      Complex d = flows[i].derivative(s).multiply(strength);
      for (int j = 0; j < k; j++) {
        int q = i * k + j;
        ar[q] = f.getReal() * h[0][q] - f.getImaginary() * h[1][q] + (i == j ? 1 : 0);
        ai[q] = f.getReal() * h[1][q] + f.getImaginary() * h[0][q];
        br[q] =
            f.getReal() * h[2][q]
                - f.getImaginary() * h[3][q]
                + d.getReal() * h[0][q]
                - d.getImaginary() * h[1][q];
        bi[q] =
            f.getReal() * h[3][q]
                + f.getImaginary() * h[2][q]
                + d.getReal() * h[1][q]
                + d.getImaginary() * h[0][q];
      }
    }
    SmallTrace.of(k, new double[][] {ar, ai, br, bi}, out);
    for (PortPole pole : transfer.poles()) {
      double dr = sr - pole.s().getReal();
      double di = si - pole.s().getImaginary();
      double norm = dr * dr + di * di;
      out[0] += pole.multiplicity() * dr / norm;
      out[1] -= pole.multiplicity() * di / norm;
    }
    for (Complex pole : damperPoles) {
      double dr = sr - pole.getReal();
      double di = si - pole.getImaginary();
      double norm = dr * dr + di * di;
      out[0] += dr / norm;
      out[1] -= di / norm;
    }
  }

  /**
   * Zeros of g inside the window that are not among the roots; −1 when the count is not certain.
   */
  int missing(List<Complex> roots) {
    double[] edge = edges(roots);
    double before = Double.NaN;
    for (int panels = 2; panels <= 64; panels *= 2) {
      double now =
          SideIntegral.of(
                  this::rate, roots, new double[] {edge[0], edge[2], edge[1], edge[2]}, panels)
              + SideIntegral.of(
                  this::rate, roots, new double[] {edge[1], edge[2], edge[1], edge[3]}, 2 * panels)
              + SideIntegral.of(
                  this::rate, roots, new double[] {edge[1], edge[3], edge[0], edge[3]}, panels)
              + SideIntegral.of(
                  this::rate, roots, new double[] {edge[0], edge[3], edge[0], edge[2]}, 2 * panels);
      double count = now / (2 * Math.PI);
      if (Math.abs(count - before) < 0.02 && Math.abs(count - Math.rint(count)) < 0.02) {
        int missing = (int) Math.rint(count);
        return missing < 0 ? -1 : missing;
      }
      before = count;
    }
    return -1;
  }

  /** Edges just outside the window, away from the roots: left, right, bottom, top. */
  private double[] edges(List<Complex> roots) {
    double width = window.highestGrowth() - window.lowestGrowth();
    double height = 2 * Math.PI * (window.highestFrequency() - window.lowestFrequency());
    double[] edge = {
      window.lowestGrowth(),
      window.highestGrowth(),
      2 * Math.PI * window.lowestFrequency(),
      2 * Math.PI * window.highestFrequency()
    };
    double[] out = new double[4];
    for (int e = 0; e < 4; e++) {
      double reach = 0.02 * (e < 2 ? width : height) * (e % 2 == 0 ? -1 : 1);
      double best = -1;
      for (int t = 0; t <= 8; t++) {
        double tried = edge[e] + reach * t / 8;
        double gap = Double.POSITIVE_INFINITY;
        for (Complex z : roots) {
          gap = Math.min(gap, Math.abs((e < 2 ? z.getReal() : z.getImaginary()) - tried));
        }
        for (PortPole z : transfer.poles()) {
          gap = Math.min(gap, Math.abs((e < 2 ? z.s().getReal() : z.s().getImaginary()) - tried));
        }
        if (gap > 1.1 * best) {
          best = gap;
          out[e] = tried;
        }
      }
    }
    return out;
  }
}
