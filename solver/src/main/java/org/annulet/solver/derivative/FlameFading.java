package org.annulet.solver.derivative;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Predicate;
import org.annulet.solver.dense.ComplexMatrix;
import org.annulet.solver.eigen.OperatorAt;
import org.annulet.solver.eigen.PreparedOperator;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.operator.LowRankTerm;
import org.apache.commons.math3.complex.Complex;

/**
 * Where a mode comes from when the flames fade out: L_ε(s) = passive part + ε · flames is followed
 * from ε = 1 to 0 on the full operator, in λ = ln ε, by predictor and Newton corrector with a step
 * that the corrector sets.
 *
 * <pre>
 *   acoustic:    s → s₀, a root of the passive part;      ds/dλ = O(ε)
 *   flame-born:  e^{−sτ} ~ 1/ε, so Re s → −∞ like λ/τ;   ds/dλ → 1/τ
 * </pre>
 *
 * <p>Where two branches meet at an ε near the real axis (an exceptional point) they exchange what
 * they are, and which of them leads where is decided by next to nothing. When the step shows such a
 * place the way is walked twice more, with the flame's phase turned by ±{@value #DETOUR} rad in
 * between; if the ways end differently, the origin is ambiguous and said to be.
 *
 * <p>The origin is a property of the path, not of the mode alone: another way of fading (a longer
 * delay) may tell otherwise. Immutable and thread-safe. A trace costs some tens of factorisations:
 * use a coarse mesh.
 */
public final class FlameFading {
  /** What becomes of a mode without flames. */
  public enum Origin {
    /** It becomes a mode of the passive chamber. */
    ACOUSTIC,
    /** It leaves with ever stronger damping. */
    INTRINSIC,
    /** It passes a place where branches exchange, or could not be followed. */
    AMBIGUOUS
  }

  /**
   * The answer.
   *
   * @param origin what becomes of the mode
   * @param passive the root it ends at in 1/s, for acoustic modes only
   */
  public record Trace(Origin origin, Optional<Complex> passive) {}

  private static final double DETOUR = 0.2;

  /** ln ε at the end: ε = 1e-4. */
  private static final double LAST = -9.2;

  private static final double FIRST_STEP = 0.1;
  private static final double LARGEST_STEP = 0.6;
  private static final double SMALLEST_STEP = 1e-3;

  /** A step below this, forced by the corrector, shows that another branch is near. */
  private static final double NEAR = 0.04;

  /** |ds/dλ|/|s| below it: at rest on a passive root. */
  private static final double AT_REST = 1e-3;

  private static final int LARGEST_CORRECTIONS = 6;

  private final PreparedOperator prepared;
  private final Predicate<LowRankTerm> flames;

  /**
   * A fading of some terms.
   *
   * @param prepared operator with its flames at full strength
   * @param flames which of its low-rank terms are flames
   */
  public FlameFading(PreparedOperator prepared, Predicate<LowRankTerm> flames) {
    this.prepared = prepared;
    this.flames = flames;
  }

  /** Whether there is anything that can fade. */
  public boolean hasFlames() {
    return prepared.operator().lowRankTerms().stream().anyMatch(flames);
  }

  /**
   * Follows one mode of the operator.
   *
   * @throws IllegalArgumentException if the vector does not belong to the operator
   */
  public Trace trace(Mode mode) {
    if (mode.re().length != prepared.size()) {
      throw new IllegalArgumentException(
          "the mode has "
              + mode.re().length
              + " unknowns, the operator "
              + prepared.size()
              + "; trace modes of the same mesh");
    }
    Walk straight = walk(mode, 0);
    if (straight.end == null || !straight.near) {
      return straight.trace();
    }
    Walk above = walk(mode, DETOUR);
    Walk below = walk(mode, -DETOUR);
    return sameEnd(straight, above) && sameEnd(straight, below)
        ? straight.trace()
        : new Trace(Origin.AMBIGUOUS, Optional.empty());
  }

  private static boolean sameEnd(Walk a, Walk b) {
    Trace x = a.trace();
    Trace y = b.trace();
    return x.origin() == y.origin()
        && (x.passive().isEmpty()
            || x.passive().get().subtract(y.passive().get()).abs()
                < 1e-6 * x.passive().get().abs());
  }

  /** A point on a branch. */
  private record Point(Complex s, ComplexMatrix p, Complex slope) {}

  /** Where a way ended; end is null when it was lost. */
  private record Walk(Point end, boolean near, Optional<Complex> passive) {
    Trace trace() {
      if (end == null) {
        return new Trace(Origin.AMBIGUOUS, Optional.empty());
      }
      if (passive.isPresent()) {
        return new Trace(Origin.ACOUSTIC, passive);
      }
      boolean leaves = end.slope.getReal() > 10 * AT_REST * end.s.abs();
      return new Trace(leaves ? Origin.INTRINSIC : Origin.AMBIGUOUS, Optional.empty());
    }
  }

  private Walk walk(Mode mode, double detour) {
    ComplexMatrix p =
        ComplexMatrix.onColumns(
            new double[][] {mode.re().clone()}, new double[][] {mode.im().clone()});
    p.scaleColumn(0, 1 / p.columnNorm(0));
    Complex s = new Complex(mode.growthRate(), 2 * Math.PI * mode.frequency());
    Point now = correct(at(0, detour), s, p);
    if (now == null) {
      return new Walk(null, true, Optional.empty());
    }
    double lambda = 0;
    double step = FIRST_STEP;
    boolean near = false;
    while (lambda > LAST) {
      if (now.slope.abs() < AT_REST * now.s.abs()) {
        Point rest = correct(faded(Complex.ZERO), now.s, now.p);
        if (rest != null && rest.s.subtract(now.s).abs() < 4 * AT_REST * now.s.abs()) {
          return new Walk(rest, near, Optional.of(rest.s));
        }
      }
      double next = Math.max(LAST, lambda - step);
      Complex move = now.slope.multiply(next - lambda);
      Point then = correct(at(next, detour), now.s.add(move), now.p);
      boolean kept =
          then != null
              && then.s.subtract(now.s).subtract(move).abs()
                  < 0.35 * move.abs() + 1e-4 * now.s.abs()
              && overlap(now.p, then.p) > 0.9;
      if (!kept) {
        step /= 2;
        near |= step < NEAR;
        if (step < SMALLEST_STEP) {
          return new Walk(null, true, Optional.empty());
        }
        continue;
      }
      now = then;
      lambda = next;
      step = Math.min(LARGEST_STEP, 1.5 * step);
    }
    return new Walk(now, near, Optional.empty());
  }

  /** The operator at ln ε = λ, with the flame's phase turned on the way. */
  private PreparedOperator at(double lambda, double detour) {
    double turn = detour * Math.sin(Math.PI * Math.min(1, lambda / LAST));
    return faded(new Complex(0, turn).exp().multiply(Math.exp(lambda)));
  }

  private PreparedOperator faded(Complex strength) {
    AcousticOperator o = prepared.operator();
    List<LowRankTerm> terms = new ArrayList<>();
    for (LowRankTerm term : o.lowRankTerms()) {
      terms.add(flames.test(term) ? scaled(term, strength) : term);
    }
    return new PreparedOperator(
        new AcousticOperator(
            o.pattern(), o.stiffness(), o.mass(), o.sparseTerms(), terms, o.coordinates()),
        prepared.analysis());
  }

  private static LowRankTerm scaled(LowRankTerm term, Complex strength) {
    AnalyticFunction[][] phi = new AnalyticFunction[term.coefficient().length][];
    for (int i = 0; i < phi.length; i++) {
      phi[i] = term.coefficient()[i].clone();
      for (int j = 0; j < phi[i].length; j++) {
        phi[i][j] = phi[i][j] == null ? null : new Scaled(phi[i][j], strength);
      }
    }
    return new LowRankTerm(term.name(), term.left(), term.right(), phi);
  }

  /** A coefficient times ε; with a complex ε only the upper half plane is meant. */
  private record Scaled(AnalyticFunction f, Complex strength) implements AnalyticFunction {
    @Override
    public Complex value(Complex s) {
      return f.value(s).multiply(strength);
    }

    @Override
    public Complex derivative(Complex s) {
      return f.derivative(s).multiply(strength);
    }
  }

  /**
   * Newton from a prediction: p ← L(s)⁻¹L′(s)p, s ← s − (pᴴp_old)/(pᴴp_new); then the slope ds/dλ
   * from left and right vector. Null where it does not settle.
   */
  private Point correct(PreparedOperator operator, Complex start, ComplexMatrix from) {
    Complex s = start;
    ComplexMatrix p = from.copy();
    for (int k = 0; k < LARGEST_CORRECTIONS; k++) {
      OperatorAt at;
      try {
        at = operator.at(s);
      } catch (ArithmeticException singular) {
        s = s.multiply(1 + 1e-9);
        at = operator.at(s);
      }
      ComplexMatrix x = operator.derivativeTimes(s, p);
      ComplexMatrix load = x.copy();
      at.solve(x);
      double norm = x.columnNorm(0);
      if (!(norm > 0) || Double.isInfinite(norm)) {
        return null;
      }
      Complex step = from.adjointTimes(p).get(0, 0).divide(from.adjointTimes(x).get(0, 0));
      x.scaleColumn(0, 1 / norm);
      p = x;
      s = s.subtract(step);
      if (!(s.abs() > 0) || step.abs() > 0.5 * start.abs()) {
        return null;
      }
      if (step.abs() < 1e-7 * s.abs() && k > 0) {
        at.solveTransposed(load); // a left vector: the next root is far beyond |step|
        Complex slope = form(load, flamePart(operator, s, p)).negate();
        return new Point(s, p, slope.divide(form(load, operator.derivativeTimes(s, p))));
      }
    }
    return null;
  }

  private ComplexMatrix flamePart(PreparedOperator operator, Complex s, ComplexMatrix p) {
    ComplexMatrix y = new ComplexMatrix(p.rows(), p.columns());
    for (LowRankTerm term : operator.operator().lowRankTerms()) {
      if (flames.test(term)) {
        y.add(Complex.ONE, ChangeOfTerm.strength(term).first(s, p));
      }
    }
    return y;
  }

  /** qᵀy, not conjugated, of the first columns. */
  private static Complex form(ComplexMatrix q, ComplexMatrix y) {
    double re = 0;
    double im = 0;
    for (int i = 0; i < q.rows(); i++) {
      re += q.re()[0][i] * y.re()[0][i] - q.im()[0][i] * y.im()[0][i];
      im += q.re()[0][i] * y.im()[0][i] + q.im()[0][i] * y.re()[0][i];
    }
    return new Complex(re, im);
  }

  private static double overlap(ComplexMatrix a, ComplexMatrix b) {
    return a.adjointTimes(b).get(0, 0).abs() / (a.columnNorm(0) * b.columnNorm(0));
  }
}
