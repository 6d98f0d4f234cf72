package org.annulet.solver.eigen;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import org.annulet.solver.dense.ComplexLu;
import org.annulet.solver.sparse.LogDeterminant;
import org.apache.commons.math3.complex.Complex;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.ArrayRealVector;
import org.apache.commons.math3.linear.QRDecomposition;
import org.apache.commons.math3.linear.SingularMatrixException;

/**
 * Counts the roots of a large operator on a small one and compares both at points of the contour.
 *
 * <pre>
 *   det L(s) = det L_c(s) · e^{P(s)} · (1 + d(s)),    P a real polynomial in s
 *   |d| &lt; 1 on the contour  ⇒  det L and det L_c have the same number of roots inside (Rouché)
 * </pre>
 *
 * <p>L_c is the operator projected onto a basis of its own, not that of the search: passive modes,
 * whose number inertia certifies, and responses at other frequencies. What L_c leaves out are modes
 * far above the window, so that the ratio of the determinants is smooth: log |ratio| at {@value
 * #POINTS} points is fitted by P (nine coefficients), and the phases, which the fit has not seen,
 * must agree with it. The comparison is sampled: it shows that the two agree at those points and
 * proves nothing between them. A root that L_c lacks or has too much turns the phase by 2π along
 * the contour and no P can follow. The departure d is asked to stay below a third of what the
 * theorem allows, and L_c to have no root in a band on both sides of the contour, so that none of
 * them can stand on the other side of it than its own of L. Otherwise there is no answer, and the
 * caller counts on the full operator.
 */
final class ReducedCount {
  /** Points of the contour at which L and L_c are compared. */
  static final int POINTS = 24;

  private static final int[] POWERS = {0, 1, 2, 3, 4, 5, 6, 8, 10};
  private static final double LARGEST_DEPARTURE = 1.0 / 3;

  /** Half width of the band without roots of L_c, as a share of the contour's sides. */
  private static final double BAND = 0.003;

  private final PreparedOperator prepared;
  private final ProjectedOperator small;

  /**
   * A count and how well it is founded.
   *
   * @param departure largest |d| measured on the contour; infinite where none was measured
   */
  record Result(RootCount.Result count, double departure) {
    boolean certain() {
      return count.certain() && departure <= LARGEST_DEPARTURE;
    }
  }

  /**
   * A count on the space spanned by a basis.
   *
   * @param basis M-orthonormal columns, shape [columns][n]
   */
  ReducedCount(PreparedOperator prepared, double[][] basis) {
    this.prepared = prepared;
    this.small = ProjectedOperator.onReal(prepared, basis);
  }

  /** Number of unknowns of L_c. */
  int size() {
    return small.size();
  }

  Result inside(Rectangle contour, RootCount.Known known, RootCount.Fineness fineness) {
    RootCount.Sampled f = RootCount.determinant(small);
    RootCount.Result count = RootCount.inside(contour, f, known, fineness);
    double dx = BAND * contour.width();
    double dy = Math.min(BAND * contour.height(), 0.5 * contour.bottom());
    if (!count.certain()
        || !same(count, contour.grown(dx, dy, 0), f, known, fineness)
        || !same(count, contour.grown(-dx, -dy, 0), f, known, fineness)) {
      return new Result(count, Double.POSITIVE_INFINITY);
    }
    return new Result(count, departure(contour));
  }

  /** Whether L_c has as many roots in a rectangle beside the contour. */
  private static boolean same(
      RootCount.Result count,
      Rectangle beside,
      RootCount.Sampled f,
      RootCount.Known known,
      RootCount.Fineness fineness) {
    RootCount.Result other = RootCount.inside(beside, f, known, fineness);
    return other.certain() && other.value() == count.value();
  }

  private double departure(Rectangle contour) {
    List<Complex> points = points(contour);
    LogDeterminant[] ratio =
        IntStream.range(0, points.size())
            .parallel()
            .mapToObj(i -> ratio(points.get(i)))
            .toArray(LogDeterminant[]::new);
    double unit = contour.upper().abs();
    double[] p = fit(points, ratio, unit);
    if (p == null) {
      return Double.POSITIVE_INFINITY;
    }
    // the ratio is real on the real axis, so its sign there is all that log |ratio| leaves open
    return Math.min(largest(points, ratio, unit, p, 0), largest(points, ratio, unit, p, Math.PI));
  }

  private LogDeterminant ratio(Complex s) {
    LogDeterminant full = prepared.at(s).logDeterminant();
    LogDeterminant reduced = new ComplexLu(small.value(s)).logDeterminant();
    return full.times(new LogDeterminant(-reduced.logModulus(), -reduced.phase()));
  }

  /** Coefficients of P from the moduli, by least squares. */
  private static double[] fit(List<Complex> points, LogDeterminant[] ratio, double unit) {
    double[][] a = new double[points.size()][POWERS.length];
    double[] b = new double[points.size()];
    for (int i = 0; i < b.length; i++) {
      b[i] = ratio[i].logModulus();
      for (int k = 0; k < POWERS.length; k++) {
        a[i][k] = power(points.get(i).divide(unit), POWERS[k]).getReal();
      }
    }
    try {
      return new QRDecomposition(new Array2DRowRealMatrix(a, false))
          .getSolver()
          .solve(new ArrayRealVector(b, false))
          .toArray();
    } catch (SingularMatrixException e) {
      return null;
    }
  }

  private static double largest(
      List<Complex> points, LogDeterminant[] ratio, double unit, double[] p, double turn) {
    double largest = 0;
    for (int i = 0; i < ratio.length; i++) {
      Complex value = new Complex(0, turn);
      for (int k = 0; k < p.length; k++) {
        value = value.add(power(points.get(i).divide(unit), POWERS[k]).multiply(p[k]));
      }
      Complex log = new Complex(ratio[i].logModulus(), ratio[i].phase()).subtract(value);
      double d = log.exp().subtract(1).abs();
      largest = Double.isNaN(d) ? Double.POSITIVE_INFINITY : Math.max(largest, d);
    }
    return largest;
  }

  private static Complex power(Complex s, int k) {
    Complex x = Complex.ONE;
    for (int i = 0; i < k; i++) {
      x = x.multiply(s);
    }
    return x;
  }

  /** Evenly spread along the contour. */
  private static List<Complex> points(Rectangle r) {
    Complex[] corner = {
      r.lower(), new Complex(r.right(), r.bottom()), r.upper(), new Complex(r.left(), r.top())
    };
    double around = 2 * (r.width() + r.height());
    List<Complex> points = new ArrayList<>();
    for (int i = 0; i < POINTS; i++) {
      double rest = around * (i + 0.5) / POINTS;
      int e = 0;
      while (rest > side(r, e)) {
        rest -= side(r, e++);
      }
      Complex a = corner[e];
      Complex b = corner[(e + 1) % 4];
      points.add(a.add(b.subtract(a).multiply(rest / side(r, e))));
    }
    return points;
  }

  private static double side(Rectangle r, int edge) {
    return edge % 2 == 0 ? r.width() : r.height();
  }
}
