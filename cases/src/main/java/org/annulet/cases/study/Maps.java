package org.annulet.cases.study;

import java.util.Comparator;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.annulet.post.meaning.Chamber;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.ModeMaps;
import org.annulet.post.meaning.Place;
import org.annulet.solver.assembly.AssembledProblem;
import org.annulet.solver.assembly.NodalField;
import org.annulet.solver.dense.ComplexLu;
import org.annulet.solver.dense.ComplexMatrix;
import org.annulet.solver.derivative.ChangeOfTerm;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.LowRankTerm;
import org.apache.commons.math3.complex.Complex;

/** Damper map and drive map of every mode, from its left and right vector. */
final class Maps {
  private final CaseProblem problem;
  private final Chamber chamber;
  private final Optional<MirrorImage> mirror;

  /** Cells of the chamber behind the operator's one: N for a Bloch cell, else 1. */
  private final int cells;

  Maps(CaseProblem problem, Chamber chamber) {
    this.problem = problem;
    this.chamber = chamber;
    boolean bloch = problem.shape().cells().isPresent() && problem.parts().size() > 1;
    cells = bloch ? problem.shape().cells().get().count() : 1;
    mirror = bloch ? problem.shape().cells().map(MirrorImage::new) : Optional.empty();
  }

  /** The maps of all modes. */
  Map<Mode, ModeMaps> of(List<DerivedModes> groups) {
    Map<Mode, ModeMaps> maps = new IdentityHashMap<>();
    for (DerivedModes g : groups) {
      double[] damper = damper(g);
      for (int j = 0; j < g.members().size(); j++) {
        maps.put(g.members().get(j), new ModeMaps(damper, drive(g, j)));
      }
    }
    return maps;
  }

  /** Where a damper acts most on the least stable mode; empty where none acts. */
  static Optional<String> sentence(Chamber chamber, List<ModeEntry> modes) {
    return modes.stream()
        .filter(e -> e.maps().isPresent())
        .max(Comparator.comparingDouble(e -> e.view().mode().growthRate()))
        .flatMap(
            e -> {
              double[] map = e.maps().orElseThrow().damper();
              int best = ModeMaps.best(map);
              return best < 0 || map[best] >= 0
                  ? Optional.empty()
                  : Optional.of(
                      String.format(
                          Locale.ROOT,
                          "A small tuned damper (Z = ρc) acts most on mode %d, the least stable, at"
                              + " %s: %.2g 1/s per cm² in first order.",
                          modes.indexOf(e) + 1,
                          Place.words(chamber, best, map),
                          1e-4 * map[best]));
            });
  }

  private AssembledProblem assembled(DerivedModes g) {
    return problem.parts().get(g.part()).assembled();
  }

  /** Mean over the members of an eigenvalue: −s tr(Λ⁻¹ l pᵀ) y/(ρc) at each node. */
  private double[] damper(DerivedModes g) {
    int n = g.members().size();
    ComplexMatrix left = g.derivative().left();
    ComplexMatrix right = g.derivative().right();
    ComplexMatrix inverse = ComplexMatrix.identity(n);
    new ComplexLu(g.derivative().normalisation().copy()).solve(inverse);
    double[][] product = new double[2][chamber.mesh().nodeCount()];
    for (int i = 0; i < n; i++) {
      // The field of the left vector is that of the transposed operator: it turns the other way.
      NodalField l = conjugate(assembled(g).expand(left.re()[i], negative(left.im()[i])));
      for (int j = 0; j < n; j++) {
        NodalField p = assembled(g).expand(right.re()[j], right.im()[j]);
        Complex w = inverse.get(j, i).divide((double) n * cells);
        for (int v = 0; v < product[0].length; v++) {
          double re = l.re()[v] * p.re()[v] - l.im()[v] * p.im()[v];
          double im = l.re()[v] * p.im()[v] + l.im()[v] * p.re()[v];
          product[0][v] += w.getReal() * re - w.getImaginary() * im;
          product[1][v] += w.getReal() * im + w.getImaginary() * re;
        }
      }
    }
    double[] map = ModeMaps.damper(chamber, g.derivative().eigenvalue(), product);
    return mirror.isPresent() && problem.parts().get(g.part()).copies() == 2
        ? mean(map, mirror.get().of(map))
        : map;
  }

  private double[] drive(DerivedModes g, int member) {
    AssembledProblem assembled = assembled(g);
    AcousticOperator operator = assembled.operator();
    Complex s = g.derivative().eigenvalue();
    ComplexMatrix p = g.derivative().right().columnsFrom(member, 1);
    ComplexMatrix load = new ComplexMatrix(p.rows(), 1);
    for (LowRankTerm term : operator.lowRankTerms()) {
      if (term.name().startsWith("flame ")) {
        load.add(Complex.ONE, ChangeOfTerm.strength(term).first(s, p));
      }
    }
    double energy = energy(operator, s, p);
    for (int i = 0; i < operator.size(); i++) {
      // ∫φ_i²/(γp̄) is half of ∫φ_i/(γp̄) on linear triangles
      double lumped = 2 * operator.mass()[operator.pattern().entry(i, i)];
      load.re()[0][i] /= lumped;
      load.im()[0][i] /= lumped;
    }
    NodalField q = assembled.expand(load.re()[0], load.im()[0]);
    NodalField f = assembled.expand(p.re()[0], p.im()[0]);
    double[] share = new double[q.re().length];
    for (int v = 0; v < share.length; v++) {
      Complex work =
          new Complex(
              f.re()[v] * q.re()[v] + f.im()[v] * q.im()[v],
              f.re()[v] * q.im()[v] - f.im()[v] * q.re()[v]);
      share[v] = -work.divide(s).getReal() / (energy * cells);
    }
    return ModeMaps.drive(chamber, share);
  }

  /** pᴴMp + pᴴKp/|s|². */
  private static double energy(AcousticOperator operator, Complex s, ComplexMatrix p) {
    double sum = 0;
    double rate = s.abs() * s.abs();
    for (double[] x : new double[][] {p.re()[0], p.im()[0]}) {
      double[] y = new double[x.length];
      operator.pattern().addProduct(operator.mass(), x, 1, y);
      operator.pattern().addProduct(operator.stiffness(), x, 1 / rate, y);
      for (int i = 0; i < x.length; i++) {
        sum += x[i] * y[i];
      }
    }
    return sum;
  }

  private static NodalField conjugate(NodalField f) {
    return new NodalField(f.re(), negative(f.im()));
  }

  private static double[] negative(double[] x) {
    double[] y = new double[x.length];
    for (int i = 0; i < x.length; i++) {
      y[i] = -x[i];
    }
    return y;
  }

  private static double[] mean(double[] a, double[] b) {
    double[] out = new double[a.length];
    for (int i = 0; i < out.length; i++) {
      out[i] = 0.5 * (a[i] + b[i]);
    }
    return out;
  }
}
