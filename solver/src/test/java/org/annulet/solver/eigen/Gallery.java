package org.annulet.solver.eigen;

import java.util.ArrayList;
import java.util.List;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.operator.LowRankTerm;
import org.annulet.solver.operator.SparseTerm;
import org.annulet.solver.operator.SparseVector;
import org.annulet.solver.sparse.PatternBuilder;
import org.annulet.solver.sparse.SymmetricPattern;
import org.apache.commons.math3.complex.Complex;

/**
 * One-dimensional linear-element problems with roots known in closed form: ducts with a flame sheet
 * and an end impedance, rings with point flames or dampers. Divided by γp̄, so K = ∫ c² φ′φ′ and M
 * = ∫ φφ.
 */
final class Gallery {
  private Gallery() {}

  /** gain · s^power · e^{−sτ}. */
  record Delay(double gain, int power, double tau) implements AnalyticFunction {
    @Override
    public Complex value(Complex s) {
      return power(s, power).multiply(s.multiply(-tau).exp()).multiply(gain);
    }

    @Override
    public Complex derivative(Complex s) {
      Complex slope = power(s, power - 1).multiply(power).subtract(power(s, power).multiply(tau));
      return slope.multiply(s.multiply(-tau).exp()).multiply(gain);
    }

    @Override
    public double longestDelay() {
      return tau;
    }

    private static Complex power(Complex s, int k) {
      Complex x = Complex.ONE;
      for (int i = 0; i < k; i++) {
        x = x.multiply(s);
      }
      return k < 0 ? Complex.ZERO : x;
    }
  }

  /** s/z with z = r + (l/c)(s + ω₀²/s): a resonant wall; its poles are the zeros of s·z. */
  record Resonant(double r, double lOverC, double omega0) implements AnalyticFunction {
    @Override
    public Complex value(Complex s) {
      return s.multiply(s).divide(denominator(s));
    }

    @Override
    public Complex derivative(Complex s) {
      Complex d = denominator(s);
      Complex slope = s.multiply(2 * lOverC).add(r);
      return s.multiply(2).multiply(d).subtract(s.multiply(s).multiply(slope)).divide(d).divide(d);
    }

    @Override
    public List<Complex> poles(Complex lower, Complex upper) {
      Complex root = new Complex(r * r - 4 * lOverC * lOverC * omega0 * omega0).sqrt();
      List<Complex> poles = new ArrayList<>();
      for (Complex p :
          List.of(
              root.subtract(r).divide(2 * lOverC), root.negate().subtract(r).divide(2 * lOverC))) {
        if (lower.getReal() <= p.getReal()
            && p.getReal() <= upper.getReal()
            && lower.getImaginary() <= p.getImaginary()
            && p.getImaginary() <= upper.getImaginary()) {
          poles.add(p);
        }
      }
      return poles;
    }

    private Complex denominator(Complex s) {
      return s.multiply(s).add(omega0 * omega0).multiply(lOverC).add(s.multiply(r));
    }
  }

  /** A constant impedance, z̄ below the real axis: s/z. */
  record Constant(Complex z) implements AnalyticFunction {
    @Override
    public Complex value(Complex s) {
      return s.divide(s.getImaginary() < 0 ? z.conjugate() : z);
    }

    @Override
    public Complex derivative(Complex s) {
      return (s.getImaginary() < 0 ? z.conjugate() : z).reciprocal();
    }
  }

  /** What is at a duct's ends. */
  enum End {
    OPEN,
    CLOSED
  }

  /** A straight duct of 1 m: sound speeds up- and downstream of the flame at b. */
  record Duct(End left, End right, double c1, double c2, double b) {
    /** With a flame sheet of interaction index N (times temperature ratio − 1) and delay tau. */
    AcousticOperator withFlame(int elements, double gain, double tau, AnalyticFunction outlet) {
      double h = 1.0 / elements;
      int first = left == End.OPEN ? 1 : 0;
      int last = right == End.OPEN ? elements - 1 : elements;
      int n = last - first + 1;
      SymmetricPattern pattern = chain(n, false);
      double[] k = new double[pattern.entryCount()];
      double[] m = new double[pattern.entryCount()];
      int flame = (int) Math.round(b * elements);
      for (int e = 0; e < elements; e++) {
        double c = e < flame ? c1 : c2;
        addElement(pattern, e - first, e + 1 - first, n, c * c / h, h, k, m);
      }
      List<SparseTerm> walls = new ArrayList<>();
      if (outlet != null) {
        double[] a = new double[pattern.entryCount()];
        a[pattern.entry(n - 1, n - 1)] = c2;
        walls.add(new SparseTerm("wall outlet", a, outlet));
      }
      List<LowRankTerm> flames = new ArrayList<>();
      if (gain != 0) {
        // consistent flux of the upstream side: c₁² p′(b⁻) = Σ over the element before b of
        // (K_e + s² M_e) in the row of b; second order in h
        int at = flame - first;
        int[] index = {at - 1, at};
        SparseVector stiff = new SparseVector(index, new double[] {-c1 * c1 / h, c1 * c1 / h});
        SparseVector inert = new SparseVector(index, new double[] {h / 6, h / 3});
        AnalyticFunction[][] phi = {{new Delay(gain, 0, tau), new Delay(gain, 2, tau)}};
        flames.add(
            new LowRankTerm(
                "flame",
                List.of(new SparseVector(new int[] {at}, new double[] {1})),
                List.of(stiff, inert),
                phi));
      }
      return new AcousticOperator(pattern, k, m, walls, flames, line(n));
    }
  }

  /**
   * A ring of mean radius 0.5 m at c = 800 m/s with point admittances at given nodes.
   *
   * @param g ρcG/S at equally spaced points: damper negative, shape [points]
   * @param tau delay, s
   */
  static AcousticOperator ring(int elements, double[] g, double tau) {
    double c = 800;
    double h = Math.PI / elements;
    SymmetricPattern pattern = chain(elements, true);
    double[] k = new double[pattern.entryCount()];
    double[] m = new double[pattern.entryCount()];
    for (int e = 0; e < elements; e++) {
      addElement(pattern, e, (e + 1) % elements, elements, c * c / h, h, k, m);
    }
    List<LowRankTerm> points = new ArrayList<>();
    for (int j = 0; j < g.length; j++) {
      SparseVector at = new SparseVector(new int[] {j * elements / g.length}, new double[] {1});
      AnalyticFunction[][] phi = {{new Delay(-c * g[j], 1, tau)}};
      points.add(new LowRankTerm("point " + j, List.of(at), List.of(at), phi));
    }
    double[][] place = new double[2][elements];
    for (int i = 0; i < elements; i++) {
      place[0][i] = 0.5 * Math.cos(2 * Math.PI * i / elements);
      place[1][i] = 0.5 * Math.sin(2 * Math.PI * i / elements);
    }
    return new AcousticOperator(pattern, k, m, List.of(), points, place);
  }

  private static SymmetricPattern chain(int n, boolean closed) {
    PatternBuilder builder = new PatternBuilder(n);
    for (int i = 0; i + 1 < n; i++) {
      builder.element(i, i + 1);
    }
    if (closed) {
      builder.element(0, n - 1);
    }
    return builder.build();
  }

  private static void addElement(
      SymmetricPattern pattern,
      int i,
      int j,
      int n,
      double stiffness,
      double h,
      double[] k,
      double[] m) {
    boolean hasI = 0 <= i && i < n;
    boolean hasJ = 0 <= j && j < n;
    if (hasI) {
      k[pattern.entry(i, i)] += stiffness;
      m[pattern.entry(i, i)] += h / 3;
    }
    if (hasJ) {
      k[pattern.entry(j, j)] += stiffness;
      m[pattern.entry(j, j)] += h / 3;
    }
    if (hasI && hasJ) {
      k[pattern.entry(i, j)] -= stiffness;
      m[pattern.entry(i, j)] += h / 6;
    }
  }

  private static double[][] line(int n) {
    double[][] xy = new double[2][n];
    for (int i = 0; i < n; i++) {
      xy[0][i] = (double) i / n;
    }
    return xy;
  }
}
