package org.annulet.solver.derivative;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.annulet.solver.dense.ComplexEigen;
import org.annulet.solver.dense.ComplexLu;
import org.annulet.solver.dense.ComplexMatrix;
import org.annulet.solver.eigen.OperatorAt;
import org.annulet.solver.eigen.PreparedOperator;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.operator.LowRankTerm;
import org.apache.commons.math3.complex.Complex;

/**
 * Right and left vectors of one mode, or of the members of one eigenvalue, and with them the
 * derivatives of the eigenvalue. Costs one factorisation, and one solve a parameter for second
 * derivatives. Immutable; {@link #slopes} may be called from several threads.
 *
 * <pre>
 *   ModeDerivative d = ModeDerivative.of(prepared, mode);
 *   Slope gain = d.slopes(ChangeOfTerm.strength(flame)).get(0);
 * </pre>
 */
public final class ModeDerivative {
  /** How far beside the eigenvalue the operator is factorised, relative. */
  private static final double BESIDE = 1e-8;

  /** Slopes of a pair closer than this share of their size count as one. */
  private static final double SAME = 1e-7;

  private final PreparedOperator prepared;
  private final Complex s;
  private final OperatorAt beside;
  private final ComplexMatrix right;
  private final ComplexMatrix left;
  private final ComplexMatrix norm; // QᵀL′P

  private ModeDerivative(PreparedOperator prepared, Complex s, ComplexMatrix right) {
    this.prepared = prepared;
    this.s = s;
    this.right = right;
    beside = prepared.at(s.add(new Complex(0.6, 0.8).multiply(BESIDE * s.abs())));
    PreparedOperator turned =
        new PreparedOperator(transposed(prepared.operator()), prepared.analysis());
    ComplexMatrix q = turned.derivativeTimes(s, right);
    beside.solveTransposed(q);
    scale(q);
    for (int k = 0; k < 2; k++) { // residual inverse iteration: each wins |σ − s| over the gap
      ComplexMatrix r = turned.times(s, q);
      beside.solveTransposed(r);
      q.add(Complex.ONE.negate(), r);
    }
    scale(q);
    left = q;
    norm = transposeTimes(left, prepared.derivativeTimes(s, right));
  }

  /**
   * Of a simple mode.
   *
   * @throws IllegalArgumentException if the vector does not belong to the operator
   */
  public static ModeDerivative of(PreparedOperator prepared, Mode mode) {
    return of(prepared, List.of(mode));
  }

  /**
   * Of all members of one eigenvalue: two for an exact pair.
   *
   * @param members modes with one eigenvalue and independent vectors
   * @throws IllegalArgumentException if a vector does not belong to the operator
   */
  public static ModeDerivative of(PreparedOperator prepared, List<Mode> members) {
    Complex sum = Complex.ZERO;
    double[][] re = new double[members.size()][];
    double[][] im = new double[members.size()][];
    for (int j = 0; j < re.length; j++) {
      Mode mode = members.get(j);
      if (mode.re().length != prepared.size()) {
        throw new IllegalArgumentException(
            "the mode has "
                + mode.re().length
                + " unknowns, the operator "
                + prepared.size()
                + "; give the vector of unknowns, not of nodes");
      }
      re[j] = mode.re().clone();
      im[j] = mode.im().clone();
      sum = sum.add(new Complex(mode.growthRate(), 2 * Math.PI * mode.frequency()));
    }
    return new ModeDerivative(prepared, sum.divide(re.length), ComplexMatrix.onColumns(re, im));
  }

  /** The operator, analysed. */
  public PreparedOperator prepared() {
    return prepared;
  }

  /** The eigenvalue in 1/s. */
  public Complex eigenvalue() {
    return s;
  }

  /** The right vectors P, shape n × members; not to be modified. */
  public ComplexMatrix right() {
    return right;
  }

  /** The left vectors Q, qᵀL(s) = 0, shape n × members; not to be modified. */
  public ComplexMatrix left() {
    return left;
  }

  /** QᵀL′(s)P, shape members × members; not to be modified. */
  public ComplexMatrix normalisation() {
    return norm;
  }

  /**
   * ‖qᵀL(s)‖₂/‖qᵀL′(s)‖₂ over |s|, the largest of the left vectors: by about how much, relative,
   * the eigenvalue of the left vector misses s.
   */
  public double leftError() {
    PreparedOperator turned =
        new PreparedOperator(transposed(prepared.operator()), prepared.analysis());
    ComplexMatrix r = turned.times(s, left);
    ComplexMatrix d = turned.derivativeTimes(s, left);
    double largest = 0;
    for (int j = 0; j < left.columns(); j++) {
      largest = Math.max(largest, r.columnNorm(j) / d.columnNorm(j) / s.abs());
    }
    return largest;
  }

  /**
   * First derivatives only, without a solve: one for each member, by real part, largest first.
   *
   * @return ds/dθ in 1/s per unit of θ
   */
  public List<Complex> firstOrder(OperatorChange change) {
    return split(change).stream().map(m -> m.slope).toList();
  }

  /**
   * First and second derivatives: one for each member, by real part of the first, largest first.
   */
  public List<Slope> slopes(OperatorChange change) {
    List<Slope> slopes = new ArrayList<>();
    for (Member m : split(change)) {
      slopes.add(new Slope(m.slope, second(change, m)));
    }
    return slopes;
  }

  /** A member of the eigenspace as one parameter picks it: qᵀL′p = 1. */
  private record Member(Complex slope, ComplexMatrix p, ComplexMatrix q) {}

  private List<Member> split(OperatorChange change) {
    ComplexMatrix b = transposeTimes(left, change.first(s, right));
    int n = b.rows();
    new ComplexLu(norm.copy()).solve(b); // N⁻¹ QᵀL_θP: its eigenvalues are −ṡ
    ComplexMatrix y = directions(b);
    ComplexMatrix z = y.copy();
    // Columns of Z: ZᵀN Y = 1, so Zᵀ = (N Y)⁻¹.
    ComplexMatrix inverse = ComplexMatrix.identity(n);
    new ComplexLu(norm.times(y)).solve(inverse);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        z.set(j, i, inverse.get(i, j));
      }
    }
    ComplexMatrix own = ComplexMatrix.identity(n);
    new ComplexLu(y.copy()).solve(own);
    ComplexMatrix diagonal = own.times(b).times(y);
    List<Member> members = new ArrayList<>();
    for (int j = 0; j < n; j++) {
      members.add(
          new Member(
              diagonal.get(j, j).negate(),
              right.times(y.columnsFrom(j, 1)),
              left.times(z.columnsFrom(j, 1))));
    }
    members.sort((c, d) -> Double.compare(d.slope.getReal(), c.slope.getReal()));
    return members;
  }

  /** Eigenvectors of B, or the basis as it is where B is a multiple of one. */
  private static ComplexMatrix directions(ComplexMatrix b) {
    int n = b.rows();
    Complex mean = Complex.ZERO;
    for (int i = 0; i < n; i++) {
      mean = mean.add(b.get(i, i).divide(n));
    }
    double size = 0;
    double apart = 0;
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        size = Math.max(size, b.get(i, j).abs());
        apart = Math.max(apart, (i == j ? b.get(i, j).subtract(mean) : b.get(i, j)).abs());
      }
    }
    return n == 1 || apart <= SAME * size
        ? ComplexMatrix.identity(n)
        : new ComplexEigen(b).vectors();
  }

  private Complex second(OperatorChange change, Member m) {
    ComplexMatrix drive = change.first(s, m.p);
    drive.add(m.slope, prepared.derivativeTimes(s, m.p));
    ComplexMatrix motion = drive.copy();
    beside.solve(motion); // −ṗ, up to a multiple of the eigenvectors, which drops out below
    ComplexMatrix pushed = change.first(s, motion);
    pushed.add(m.slope, prepared.derivativeTimes(s, motion));
    ComplexMatrix bent = change.second(s, m.p);
    bent.add(m.slope.multiply(2), change.mixed(s, m.p));
    bent.add(m.slope.multiply(m.slope), secondInS(m.p));
    bent.add(new Complex(-2), pushed);
    return transposeTimes(m.q, bent).get(0, 0).negate();
  }

  /** L″(s) x by a central difference of L′, exact to about 1e-9. */
  private ComplexMatrix secondInS(ComplexMatrix x) {
    double h = 1e-5 * s.abs();
    ComplexMatrix d = prepared.derivativeTimes(s.add(h), x);
    d.add(Complex.ONE.negate(), prepared.derivativeTimes(s.subtract(h), x));
    ComplexMatrix out = new ComplexMatrix(x.rows(), x.columns());
    out.add(new Complex(0.5 / h), d);
    return out;
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

  private static void scale(ComplexMatrix q) {
    for (int j = 0; j < q.columns(); j++) {
      q.scaleColumn(j, 1 / q.columnNorm(j));
    }
  }

  /** xᵀy, not conjugated. */
  private static ComplexMatrix transposeTimes(ComplexMatrix x, ComplexMatrix y) {
    double[][] minus = new double[x.columns()][];
    for (int j = 0; j < minus.length; j++) {
      minus[j] = Arrays.stream(x.im()[j]).map(v -> -v).toArray();
    }
    return ComplexMatrix.onColumns(x.re(), minus).adjointTimes(y);
  }
}
