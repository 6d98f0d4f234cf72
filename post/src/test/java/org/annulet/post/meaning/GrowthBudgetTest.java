package org.annulet.post.meaning;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.operator.LowRankTerm;
import org.annulet.solver.operator.SparseTerm;
import org.annulet.solver.operator.SparseVector;
import org.annulet.solver.sparse.SymmetricPattern;
import org.apache.commons.math3.complex.Complex;
import org.apache.commons.math3.complex.ComplexField;
import org.apache.commons.math3.linear.Array2DRowFieldMatrix;
import org.apache.commons.math3.linear.ArrayFieldVector;
import org.apache.commons.math3.linear.FieldLUDecomposition;
import org.junit.jupiter.api.Test;

/**
 * A duct (or closed ring) of linear line elements with ρ = c = 1, a resistive wall, an n–τ flame
 * and a reactive port. The modes come from a bordered Newton iteration on dense matrices of a
 * general library (Apache Commons Math), not from our solver.
 */
class GrowthBudgetTest {
  private static final int N = 24;

  /** factor · s^power · e^{−sτ}. */
  private record Law(double factor, int power, double delay) implements AnalyticFunction {
    @Override
    public Complex value(Complex s) {
      return s.pow(power).multiply(s.multiply(-delay).exp()).multiply(factor);
    }

    @Override
    public Complex derivative(Complex s) {
      return value(s).multiply(new Complex(power).divide(s).subtract(delay));
    }
  }

  /** Strength of wall, flame, port. */
  private static AcousticOperator duct(double wall, double flame, double port) {
    double h = 1.0 / (N - 1);
    int[] start = new int[N + 1];
    int[] column = new int[2 * N - 1];
    for (int i = 0, q = 0; i < N; i++) {
      if (i > 0) {
        column[q++] = i - 1;
      }
      column[q++] = i;
      start[i + 1] = q;
    }
    double[] k = new double[column.length];
    double[] m = new double[column.length];
    for (int e = 0; e + 1 < N; e++) {
      int d0 = start[e + 1] - 1;
      int d1 = start[e + 2] - 1;
      k[d0] += 1 / h;
      k[d1] += 1 / h;
      k[d1 - 1] -= 1 / h;
      m[d0] += h / 3;
      m[d1] += h / 3;
      m[d1 - 1] += h / 6;
    }
    double[] end = new double[column.length];
    end[column.length - 1] = 1;
    SparseVector source = new SparseVector(new int[] {9, 10, 11}, new double[] {0.25, 0.5, 0.25});
    SparseVector reference = new SparseVector(new int[] {6, 7}, new double[] {-1 / h, 1 / h});
    SparseVector mouth = new SparseVector(new int[] {0}, new double[] {1});
    return new AcousticOperator(
        new SymmetricPattern(start, column),
        k,
        m,
        List.of(new SparseTerm("wall", end, new Law(wall, 1, 0))),
        List.of(
            new LowRankTerm(
                "flame",
                List.of(source),
                List.of(reference),
                new AnalyticFunction[][] {{new Law(flame, 0, 0.4)}}),
            new LowRankTerm(
                "port",
                List.of(mouth, source),
                List.of(mouth, source),
                new AnalyticFunction[][] {
                  {new Law(port, 2, 0), null}, {null, new Law(port, 1, 0)}
                })),
        new double[2][N]);
  }

  private static Complex[][] dense(AcousticOperator o, Complex s, boolean slope) {
    Complex[][] a = new Complex[o.size()][o.size()];
    for (Complex[] row : a) {
      Arrays.fill(row, Complex.ZERO);
    }
    for (int i = 0; i < o.size(); i++) {
      for (int j = 0; j < o.size(); j++) {
        int q = o.pattern().entry(i, j);
        if (q >= 0) {
          a[i][j] =
              slope
                  ? s.multiply(2 * o.mass()[q])
                  : s.multiply(s).multiply(o.mass()[q]).add(o.stiffness()[q]);
          for (SparseTerm t : o.sparseTerms()) {
            Complex c = slope ? t.coefficient().derivative(s) : t.coefficient().value(s);
            a[i][j] = a[i][j].add(c.multiply(t.values()[q]));
          }
        }
      }
    }
    for (LowRankTerm t : o.lowRankTerms()) {
      for (int k = 0; k < t.left().size(); k++) {
        for (int l = 0; l < t.right().size(); l++) {
          AnalyticFunction f = t.coefficient()[k][l];
          if (f != null) {
            Complex c = slope ? f.derivative(s) : f.value(s);
            SparseVector u = t.left().get(k);
            SparseVector v = t.right().get(l);
            for (int x = 0; x < u.index().length; x++) {
              for (int y = 0; y < v.index().length; y++) {
                int i = u.index()[x];
                int j = v.index()[y];
                a[i][j] = a[i][j].add(c.multiply(u.value()[x] * v.value()[y]));
              }
            }
          }
        }
      }
    }
    return a;
  }

  /** Bordered Newton; with {@code left} the transposed problem. */
  private static Mode solve(AcousticOperator o, Complex start, double[] shape, boolean left) {
    int n = o.size();
    Complex s = start;
    Complex[] p = new Complex[n];
    for (int i = 0; i < n; i++) {
      p[i] = new Complex(shape[i]);
    }
    for (int round = 0; round < 40; round++) {
      Complex[][] a = dense(o, s, false);
      Complex[][] d = dense(o, s, true);
      Complex[][] big = new Complex[n + 1][n + 1];
      Complex[] right = new Complex[n + 1];
      Arrays.fill(right, Complex.ZERO);
      Complex norm = new Complex(-1);
      for (int i = 0; i < n; i++) {
        big[i][n] = Complex.ZERO;
        for (int j = 0; j < n; j++) {
          big[i][j] = left ? a[j][i] : a[i][j];
          right[i] = right[i].subtract(big[i][j].multiply(p[j]));
          big[i][n] = big[i][n].add((left ? d[j][i] : d[i][j]).multiply(p[j]));
        }
        big[n][i] = new Complex(shape[i]);
        norm = norm.add(p[i].multiply(shape[i]));
      }
      big[n][n] = Complex.ZERO;
      right[n] = norm.negate();
      ArrayFieldVector<Complex> x =
          (ArrayFieldVector<Complex>)
              new FieldLUDecomposition<>(
                      new Array2DRowFieldMatrix<>(ComplexField.getInstance(), big))
                  .getSolver()
                  .solve(new ArrayFieldVector<>(ComplexField.getInstance(), right));
      for (int i = 0; i < n; i++) {
        p[i] = p[i].add(x.getEntry(i));
      }
      s = s.add(x.getEntry(n));
      if (x.getEntry(n).abs() < 1e-14 * s.abs() && round > 3) {
        break;
      }
    }
    double[] re = new double[n];
    double[] im = new double[n];
    for (int i = 0; i < n; i++) {
      re[i] = p[i].getReal();
      im[i] = p[i].getImaginary();
    }
    return new Mode(
        s.getReal(), s.getImaginary() / (2 * Math.PI), re, im, 1, 0, 0, Mode.Verdict.CONVERGED);
  }

  private static double[] cosine(int halfWaves) {
    double[] c = new double[N];
    double sum = 0;
    for (int i = 0; i < N; i++) {
      c[i] = Math.cos(Math.PI * halfWaves * i / (N - 1.0));
      sum += c[i] * c[i];
    }
    for (int i = 0; i < N; i++) {
      c[i] /= Math.sqrt(sum);
    }
    return c;
  }

  private static Mode mode(AcousticOperator o, boolean left) {
    return solve(o, new Complex(0.01, Math.PI), cosine(1), left);
  }

  @Test
  void shares_addUpToTheGrowthRateOfAStronglyActiveMode() {
    for (double flame : new double[] {-0.3, 0.8}) {
      AcousticOperator o = duct(0.15, flame, 0.05);
      Mode mode = mode(o, false);
      assertThat(Math.abs(mode.growthRate())).isGreaterThan(0.02);
      GrowthBudget budget = GrowthBudget.of(o, mode);
      assertThat(budget.items())
          .extracting(GrowthBudget.Item::name)
          .containsExactlyInAnyOrder("wall", "flame", "port");
      // 1e-8: what the design asks for; the iteration leaves about 1e-13
      assertThat(Math.abs(budget.remainder())).isLessThan(1e-8 * Math.abs(mode.growthRate()));
    }
  }

  @Test
  void eachShare_isTheChangeItsItemMakesOnItsOwnWhenItIsWeak() {
    // growth of the passive duct is 0, so a weak item alone must give its share; error O(strength)
    double e = 1e-5;
    AcousticOperator all = duct(e, e, e);
    GrowthBudget budget = GrowthBudget.of(all, mode(all, false));
    AcousticOperator[] alone = {duct(e, 0, 0), duct(0, e, 0), duct(0, 0, e)};
    Mode passive = mode(duct(0, 0, 0), false);
    String[] name = {"wall", "flame", "port"};
    for (int j = 0; j < 3; j++) {
      Mode one = mode(alone[j], false);
      String which = name[j];
      GrowthBudget.Item item =
          budget.items().stream().filter(i -> i.name().equals(which)).findFirst().orElseThrow();
      assertThat(item.growthShare())
          .as(which)
          .isCloseTo(one.growthRate(), within(1e-3 * Math.abs(one.growthRate())));
      assertThat(item.frequencyShift())
          .as(which)
          .isCloseTo(one.frequency() - passive.frequency(), within(2e-3 * e));
    }
  }

  @Test
  void mapOfATerm_addsUpToItsShare() {
    AcousticOperator o = duct(0.15, 0.8, 0.05);
    Mode mode = mode(o, false);
    List<String> names = new ArrayList<>(List.of("flame", "port", "wall"));
    for (GrowthBudget.Item item : GrowthBudget.of(o, mode).items()) {
      double[] map =
          item.name().equals("wall")
              ? GrowthBudget.map(o, mode, o.sparseTerms().get(0))
              : GrowthBudget.map(
                  o, mode, o.lowRankTerms().get(item.name().equals("flame") ? 0 : 1));
      assertThat(Arrays.stream(map).sum()).isCloseTo(item.growthShare(), within(1e-12));
      names.remove(item.name());
    }
    assertThat(names).isEmpty();
  }

  @Test
  void pairBudget_doesNotDependOnTheBasis() {
    // two uncoupled equal ducts: every combination of their modes is a mode
    AcousticOperator one = duct(0.15, 0.8, 0.05);
    AcousticOperator two = twice(one);
    Mode m = mode(one, false);
    Mode a = combination(m, 1, 0);
    Mode b = combination(m, 0, 1);
    Mode c = combination(m, 0.9, 0.3);
    Mode d = combination(m, -0.2, 0.7);
    GrowthBudget straight = GrowthBudget.ofPair(two, a, b);
    GrowthBudget skew = GrowthBudget.ofPair(two, c, d);
    assertThat(straight.items()).hasSize(2);
    for (int i = 0; i < 2; i++) {
      // duct one's flame drives half the pair's sum
      double single =
          GrowthBudget.of(one, m).items().stream()
              .filter(x -> x.name().equals("flame"))
              .findFirst()
              .orElseThrow()
              .growthShare();
      assertThat(straight.items().get(i).growthShare()).isCloseTo(single / 2, within(1e-10));
      String name = straight.items().get(i).name();
      assertThat(
              skew.items().stream()
                  .filter(x -> x.name().equals(name))
                  .findFirst()
                  .orElseThrow()
                  .growthShare())
          .isCloseTo(single / 2, within(1e-10));
    }
  }

  private static AcousticOperator twice(AcousticOperator one) {
    int[] start = new int[2 * N + 1];
    int[] column = new int[2 * one.pattern().entryCount()];
    double[] k = new double[column.length];
    double[] m = new double[column.length];
    int half = one.pattern().entryCount();
    for (int i = 0; i < 2 * N; i++) {
      start[i + 1] = one.pattern().rowStart(i % N + 1) + (i < N ? 0 : half);
    }
    for (int q = 0; q < column.length; q++) {
      column[q] = one.pattern().column(q % half) + (q < half ? 0 : N);
      k[q] = one.stiffness()[q % half];
      m[q] = one.mass()[q % half];
    }
    List<LowRankTerm> flames = new ArrayList<>();
    for (int copy = 0; copy < 2; copy++) {
      int shift = copy * N;
      LowRankTerm f = one.lowRankTerms().get(0);
      flames.add(
          new LowRankTerm(
              "flame " + copy,
              shifted(f.left(), shift),
              shifted(f.right(), shift),
              f.coefficient()));
    }
    return new AcousticOperator(
        new SymmetricPattern(start, column), k, m, List.of(), flames, new double[2][2 * N]);
  }

  private static List<SparseVector> shifted(List<SparseVector> vectors, int shift) {
    return vectors.stream()
        .map(
            v ->
                new SparseVector(Arrays.stream(v.index()).map(i -> i + shift).toArray(), v.value()))
        .toList();
  }

  private static Mode combination(Mode m, double first, double second) {
    double[] re = new double[2 * N];
    double[] im = new double[2 * N];
    for (int i = 0; i < 2 * N; i++) {
      double f = i < N ? first : second;
      re[i] = f * m.re()[i % N];
      im[i] = f * m.im()[i % N];
    }
    return new Mode(m.growthRate(), m.frequency(), re, im, 2, 0, 0, Mode.Verdict.CONVERGED);
  }

  @Test
  void fieldOnNodesInsteadOfUnknowns_isRefused() {
    AcousticOperator o = duct(0, 0, 0);
    Mode wrong = new Mode(0, 1, new double[3], new double[3], 1, 0, 0, Mode.Verdict.CONVERGED);
    assertThatThrownBy(() -> GrowthBudget.of(o, wrong))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("give the vector of unknowns");
  }
}
