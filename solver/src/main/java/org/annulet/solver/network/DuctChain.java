package org.annulet.solver.network;

import java.util.ArrayList;
import java.util.List;
import org.annulet.solver.boundary.OpenEnd;
import org.annulet.solver.boundary.ReactingWall;
import org.annulet.solver.modes.Window;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.rational.RectangleZeros;
import org.apache.commons.math3.complex.Complex;

/** The chain of ducts of the package's equations, and its eigenvalues. Immutable. */
public final class DuctChain {
  /** Turn of the determinant's phase by which a tile of the window is high, in rad. */
  private static final double TILE = 4;

  private final DuctEnd upstream;
  private final List<Piece> pieces;
  private final DuctEnd downstream;

  /**
   * A chain.
   *
   * @param pieces from upstream to downstream, at least one duct among them
   */
  public DuctChain(DuctEnd upstream, List<Piece> pieces, DuctEnd downstream) {
    this.upstream = upstream;
    this.pieces = List.copyOf(pieces);
    this.downstream = downstream;
  }

  /** The pieces from upstream to downstream. */
  public List<Piece> pieces() {
    return pieces;
  }

  /**
   * Eigenvalues of one order.
   *
   * @param s in the window, by frequency, each with the corrections of Newton's method down to
   *     rounding
   * @param counted by the argument principle round the whole window
   */
  public record Roots(List<Complex> s, int counted) {
    /** Whether as many were found as counted. */
    public boolean complete() {
      return counted == s.size();
    }
  }

  /** All eigenvalues of azimuthal order {@code order} in a window. */
  public Roots roots(Window window, int order) {
    Complex low = new Complex(window.lowestGrowth(), 2 * Math.PI * window.lowestFrequency());
    Complex high = new Complex(window.highestGrowth(), 2 * Math.PI * window.highestFrequency());
    List<Complex> poles = new ArrayList<>();
    coefficients().forEach(c -> poles.addAll(c.poles(low, high)));
    double delay = longestDelay();
    int tiles =
        Math.max(1, (int) Math.ceil((high.getImaginary() - low.getImaginary()) * delay / TILE));
    double step = (high.getImaginary() - low.getImaginary()) / tiles;
    List<Complex> found = new ArrayList<>();
    for (int k = 0; k < tiles; k++) {
      // Not quite even, so that no tile's edge meets a root of a simple chain.
      double bottom = low.getImaginary() + (k == 0 ? 0 : (k + 0.0173) * step);
      double top = k + 1 == tiles ? high.getImaginary() : low.getImaginary() + (k + 1.0173) * step;
      found.addAll(
          RectangleZeros.of(
              s -> cleared(s, order, poles),
              new Complex(low.getReal(), bottom),
              new Complex(high.getReal(), top)));
    }
    found.sort((a, b) -> Double.compare(a.getImaginary(), b.getImaginary()));
    return new Roots(List.copyOf(found), count(low, high, order, poles));
  }

  /** The determinant times (s − s_k) for every pole, scaled by the size of the window. */
  private Complex cleared(Complex s, int order, List<Complex> poles) {
    Complex d = determinant(s, order);
    for (Complex p : poles) {
      d = d.multiply(s.subtract(p).divide(p.abs()));
    }
    return d;
  }

  /** Winding of the determinant round the window, sampled at a fixed fine step. */
  private int count(Complex low, Complex high, int order, List<Complex> poles) {
    Complex[] corner = {
      low,
      new Complex(high.getReal(), low.getImaginary()),
      high,
      new Complex(low.getReal(), high.getImaginary())
    };
    double turn = 0;
    for (int k = 0; k < 4; k++) {
      Complex a = corner[k];
      Complex b = corner[(k + 1) % 4];
      int n = 400 + (int) (20 * b.subtract(a).abs() * longestDelay());
      Complex before = cleared(a, order, poles);
      for (int i = 1; i <= n; i++) {
        Complex next = cleared(a.add(b.subtract(a).multiply(i / (double) n)), order, poles);
        turn += next.divide(before).getArgument();
        before = next;
      }
    }
    return (int) Math.rint(turn / (2 * Math.PI));
  }

  /** Travel time through the chain there and back, and the longest delay of its coefficients. */
  private double longestDelay() {
    double travel = 0;
    for (Piece p : pieces) {
      if (p instanceof Piece.Duct d) {
        travel += 2 * d.length() / d.gas().soundSpeed();
      }
    }
    for (AnalyticFunction c : coefficients()) {
      travel += c.longestDelay();
    }
    return travel;
  }

  private List<AnalyticFunction> coefficients() {
    List<AnalyticFunction> all = new ArrayList<>();
    for (DuctEnd end : List.of(upstream, downstream)) {
      if (end.wall() instanceof ReactingWall w) {
        all.add(w.admittance(end.gas()));
      }
    }
    for (Piece p : pieces) {
      if (p instanceof Piece.Duct d) {
        d.walls().forEach(w -> all.add(w.wall().admittance(d.gas())));
      } else if (p instanceof Piece.Coupling c) {
        all.add(c.port().mobility(c.first(), c.second())[0][0]);
      } else if (p instanceof Piece.Sheet f) {
        all.add(f.response());
      }
    }
    return all;
  }

  /**
   * The function whose zeros are the eigenvalues; meromorphic, its scale is arbitrary.
   *
   * @param s in 1/s
   * @param order azimuthal order m
   */
  public Complex determinant(Complex s, int order) {
    Complex[][] states = states(s, order);
    Complex[] end = states[pieces.size()];
    if (downstream.wall() instanceof OpenEnd) {
      return end[0];
    }
    return end[1].subtract(flow(downstream, s).multiply(end[0]));
  }

  /** s Û/p̂ into an end. */
  private static Complex flow(DuctEnd end, Complex s) {
    return end.wall() instanceof ReactingWall w
        ? w.admittance(end.gas())
            .value(s)
            .multiply(s)
            .multiply(end.area() / end.gas().characteristicImpedance())
        : Complex.ZERO;
  }

  /** (p̂, V̂) at every station, from the upstream end on. */
  private Complex[][] states(Complex s, int order) {
    Complex[][] at = new Complex[pieces.size() + 1][];
    double scale = upstream.area() / upstream.gas().density(); // V̂ of a unit gradient
    at[0] =
        upstream.wall() instanceof OpenEnd
            ? new Complex[] {Complex.ZERO, new Complex(scale)}
            : new Complex[] {Complex.ONE, flow(upstream, s).negate()};
    for (int k = 0; k < pieces.size(); k++) {
      Piece piece = pieces.get(k);
      Complex p = at[k][0];
      Complex v = at[k][1];
      if (piece instanceof Piece.Duct d) {
        at[k + 1] = through(d, d.length(), order, s, at[k]);
      } else if (piece instanceof Piece.Inertia i) {
        at[k + 1] = new Complex[] {p.subtract(v.multiply(i.inertance())), v};
      } else if (piece instanceof Piece.Coupling c) {
        coupled(c, s, at, k);
      } else {
        Piece.Sheet f = (Piece.Sheet) piece;
        Complex more = heard(f.heard(), s, at).multiply(f.response().value(s));
        at[k + 1] = new Complex[] {p, v.add(more.multiply(f.strength()))};
      }
    }
    return at;
  }

  private static Complex heard(Heard heard, Complex s, Complex[][] at) {
    if (heard instanceof Heard.Velocity u) {
      return at[u.station()][1].divide(u.area());
    }
    if (heard instanceof Heard.MeanVelocity u) {
      return at[u.from()][0].subtract(at[u.to()][0]).divide(u.inertia());
    }
    return at[((Heard.Pressure) heard).station()][0].multiply(s);
  }

  private static Complex[] through(
      Piece.Duct d, double length, int order, Complex s, Complex[] from) {
    double c = d.gas().soundSpeed();
    Complex square = s.multiply(s).divide(c * c).add(Math.pow(order / d.radius(), 2));
    for (SideWall w : d.walls()) {
      square =
          square.add(
              w.wall()
                  .admittance(d.gas())
                  .value(s)
                  .multiply(s)
                  .multiply(w.perimeter() / (c * d.area())));
    }
    Complex kappa = square.sqrt();
    Complex angle = kappa.multiply(length);
    Complex ratio =
        angle.abs() < 1e-4
            ? angle.multiply(angle).divide(6).add(1).multiply(length)
            : angle.sinh().divide(kappa);
    double inertia = d.gas().density() / d.area();
    Complex cosh = angle.cosh();
    return new Complex[] {
      cosh.multiply(from[0]).subtract(ratio.multiply(inertia).multiply(from[1])),
      cosh.multiply(from[1]).subtract(ratio.multiply(square).divide(inertia).multiply(from[0]))
    };
  }

  /**
   * Fills the state behind a two-port. All states so far are multiplied by its transfer admittance
   * instead of dividing by it, which would bring poles.
   */
  private static void coupled(Piece.Coupling c, Complex s, Complex[][] at, int k) {
    AnalyticFunction[][] m = c.port().mobility(c.first(), c.second());
    Complex m11 = m[0][0].value(s).multiply(c.area());
    Complex m12 = m[0][1].value(s).multiply(c.area());
    Complex m21 = m[1][0].value(s).multiply(c.area());
    Complex m22 = m[1][1].value(s).multiply(c.area());
    // In the unit of a duct's V̂/p̂ the determinant keeps its size.
    Complex unit = new Complex(c.area() / c.first().density());
    Complex p = at[k][0];
    Complex v = at[k][1];
    Complex behind = v.subtract(m11.multiply(p));
    Complex flow = m21.multiply(p).multiply(m12).add(m22.multiply(behind)).negate();
    for (int i = 0; i <= k; i++) {
      at[i] =
          new Complex[] {at[i][0].multiply(m12).divide(unit), at[i][1].multiply(m12).divide(unit)};
    }
    at[k + 1] = new Complex[] {behind.divide(unit), flow.divide(unit)};
  }

  /**
   * The mode shape along the chain.
   *
   * @param s an eigenvalue
   * @param order azimuthal order
   * @param x distances from the upstream end in m
   * @return p̂ up to a factor, shape [x.length]
   */
  public Complex[] shape(Complex s, int order, double[] x) {
    Complex[][] at = states(s, order);
    Complex[] out = new Complex[x.length];
    for (int i = 0; i < x.length; i++) {
      double start = 0;
      out[i] = at[pieces.size()][0];
      for (int k = 0; k < pieces.size(); k++) {
        if (pieces.get(k) instanceof Piece.Duct d) {
          if (x[i] < start + d.length()) {
            out[i] = through(d, Math.max(0, x[i] - start), order, s, at[k])[0];
            break;
          }
          start += d.length();
        }
      }
    }
    return out;
  }
}
