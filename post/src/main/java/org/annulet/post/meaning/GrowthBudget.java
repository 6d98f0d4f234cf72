package org.annulet.post.meaning;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.function.Function;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.operator.LowRankTerm;
import org.annulet.solver.operator.SparseTerm;
import org.apache.commons.math3.complex.Complex;

/**
 * What drives and what damps a mode: its growth rate as a sum over the walls, flames, ports and
 * two-ports of the operator.
 *
 * <pre>
 *   σ = Σ_j σ_j,   σ_j = − Re( pᴴT_j p / s ) / G,   G = pᴴM p + pᴴK p/|s|²
 * </pre>
 *
 * <p>Exact for a solution of L(s)p = 0, whatever its growth rate; a remainder shows how far the
 * given mode is from one. For a pair with basis P the share is −½ Re tr((PᴴGP)⁻¹ PᴴT_jP/s): it does
 * not depend on the basis, which is open.
 *
 * <p>The frequency shift −Im(pᴴT_j p/s)/(2πG) is of first order only: it is the change of frequency
 * the item makes on a passive mode of this shape.
 *
 * @param items shares, by size, largest first
 * @param growthRate Re s of the mode (mean over a pair) in 1/s
 * @param remainder growth rate less the sum of the shares, in 1/s
 */
public record GrowthBudget(List<Item> items, double growthRate, double remainder) {
  /** Shares below this, in 1/s, count as nothing. */
  private static final double NOTHING = 1e-9;

  /**
   * The share of one item.
   *
   * @param name of the operator's term
   * @param growthShare in 1/s, positive drives
   * @param frequencyShift in Hz, of first order
   */
  public record Item(String name, double growthShare, double frequencyShift) {}

  /** Budget of one mode. */
  public static GrowthBudget of(AcousticOperator operator, Mode mode) {
    return of(operator, List.of(mode));
  }

  /**
   * Budget of a pair, the mean over its two members.
   *
   * @param first one member
   * @param second the other, not parallel to the first
   */
  public static GrowthBudget ofPair(AcousticOperator operator, Mode first, Mode second) {
    return of(operator, List.of(first, second));
  }

  private static GrowthBudget of(AcousticOperator operator, List<Mode> basis) {
    Projection projection = new Projection(operator, basis);
    List<Item> items = new ArrayList<>();
    for (SparseTerm term : operator.sparseTerms()) {
      items.add(projection.item(term.name(), (f, x, y) -> projection.forms.sparse(term, f, x, y)));
    }
    for (LowRankTerm term : operator.lowRankTerms()) {
      items.add(projection.item(term.name(), (f, x, y) -> projection.forms.lowRank(term, f, x, y)));
    }
    double growth = basis.stream().mapToDouble(Mode::growthRate).average().orElse(0);
    double sum = items.stream().mapToDouble(Item::growthShare).sum();
    items.sort(Comparator.comparingDouble((Item i) -> -Math.abs(i.growthShare())));
    return new GrowthBudget(List.copyOf(items), growth, growth - sum);
  }

  /** Items with positive share, largest first. */
  public List<Item> drivers() {
    return items.stream().filter(i -> i.growthShare() > NOTHING).toList();
  }

  /** Items with negative share, strongest first. */
  public List<Item> dampers() {
    return items.stream().filter(i -> i.growthShare() < -NOTHING).toList();
  }

  /**
   * Where on the unknowns a term drives: the share of each unknown in 1/s, adding up to the term's
   * share. Divided by the node's area it is the local Rayleigh index, for a flame Re(p̂* q̂ …) over
   * one cycle and per stored energy.
   *
   * @return new array, shape [n]
   */
  public static double[] map(AcousticOperator operator, Mode mode, LowRankTerm term) {
    Complex s = rate(mode);
    Projection projection = new Projection(operator, List.of(mode));
    Forms.Vec p = projection.basis.get(0);
    double[] share = new double[operator.size()];
    for (int k = 0; k < term.left().size(); k++) {
      Complex drive =
          Forms.row(term, k, f -> f.value(s), p)
              .divide(s)
              .divide(-projection.energy[0][0].getReal());
      int[] index = term.left().get(k).index();
      double[] value = term.left().get(k).value();
      for (int q = 0; q < index.length; q++) {
        int i = index[q];
        share[i] += value[q] * (p.re()[i] * drive.getReal() + p.im()[i] * drive.getImaginary());
      }
    }
    return share;
  }

  /** The same for a wall. */
  public static double[] map(AcousticOperator operator, Mode mode, SparseTerm term) {
    Complex s = rate(mode);
    Projection projection = new Projection(operator, List.of(mode));
    Forms.Vec p = projection.basis.get(0);
    Forms.Vec ap = projection.forms.product(term.values(), p);
    Complex a = term.coefficient().value(s).divide(s).divide(-projection.energy[0][0].getReal());
    double[] share = new double[operator.size()];
    for (int i = 0; i < share.length; i++) {
      double re = p.re()[i] * ap.re()[i] + p.im()[i] * ap.im()[i];
      double im = p.re()[i] * ap.im()[i] - p.im()[i] * ap.re()[i];
      share[i] = re * a.getReal() - im * a.getImaginary();
    }
    return share;
  }

  static Complex rate(Mode mode) {
    return new Complex(mode.growthRate(), 2 * Math.PI * mode.frequency());
  }

  /** xᵀ T y with the coefficient read through a function. */
  private interface Form {
    Complex apply(Function<AnalyticFunction, Complex> f, Forms.Vec x, Forms.Vec y);
  }

  /** One mode, or the plane spanned by a pair. */
  private static final class Projection {
    final Forms forms;
    final Complex s;
    final List<Forms.Vec> basis = new ArrayList<>();
    final List<Forms.Vec> conjugate = new ArrayList<>();
    final Complex[][] energy;

    Projection(AcousticOperator operator, List<Mode> modes) {
      forms = new Forms(operator);
      Complex sum = Complex.ZERO;
      for (Mode mode : modes) {
        if (mode.re().length != operator.size()) {
          throw new IllegalArgumentException(
              "the mode has "
                  + mode.re().length
                  + " unknowns, the operator "
                  + operator.size()
                  + "; give the vector of unknowns, not of nodes");
        }
        Forms.Vec v = new Forms.Vec(mode.re(), mode.im());
        basis.add(v);
        conjugate.add(v.conjugate());
        sum = sum.add(rate(mode));
      }
      s = sum.divide(modes.size());
      double square = s.getReal() * s.getReal() + s.getImaginary() * s.getImaginary();
      int n = modes.size();
      energy = new Complex[n][n];
      for (int i = 0; i < n; i++) {
        for (int j = 0; j < n; j++) {
          energy[i][j] =
              forms
                  .symmetric(operator.mass(), conjugate.get(i), basis.get(j))
                  .add(
                      forms
                          .symmetric(operator.stiffness(), conjugate.get(i), basis.get(j))
                          .divide(square));
        }
      }
    }

    Item item(String name, Form form) {
      int n = basis.size();
      Complex[][] t = new Complex[n][n];
      for (int i = 0; i < n; i++) {
        for (int j = 0; j < n; j++) {
          t[i][j] = form.apply(f -> f.value(s), conjugate.get(i), basis.get(j)).divide(s);
        }
      }
      Complex share;
      if (n == 1) {
        share = t[0][0].divide(energy[0][0]);
      } else {
        Complex det =
            energy[0][0].multiply(energy[1][1]).subtract(energy[0][1].multiply(energy[1][0]));
        share =
            energy[1][1]
                .multiply(t[0][0])
                .subtract(energy[0][1].multiply(t[1][0]))
                .subtract(energy[1][0].multiply(t[0][1]))
                .add(energy[0][0].multiply(t[1][1]))
                .divide(det)
                .divide(2);
      }
      return new Item(name, -share.getReal(), -share.getImaginary() / (2 * Math.PI));
    }
  }
}
