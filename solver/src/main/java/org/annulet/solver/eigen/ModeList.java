package org.annulet.solver.eigen;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import org.annulet.solver.dense.ComplexMatrix;
import org.annulet.solver.dense.OrthonormalColumns;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.modes.Window;
import org.apache.commons.math3.complex.Complex;

/** Polished clusters as modes, sorted into window and margin, without repetitions. */
final class ModeList {
  /** Modes closer than this share of |s| are said to have the same eigenvalue. */
  private static final double SAME = 1e-7;

  /** A mode this close to the window's edge, as a share of |s|, is on it. */
  private static final double ON_EDGE = 1e-8;

  private final List<Mode> modes = new ArrayList<>();
  private final List<Mode> outside = new ArrayList<>();
  private final List<String> notes = new ArrayList<>();
  private boolean converged = true;

  private ModeList() {}

  private record Single(
      Complex s, ComplexMatrix vector, double error, int steps, boolean converged, double bound) {}

  static ModeList of(Window window, Rectangle contour, List<Polish.Polished> found) {
    List<Single> all = new ArrayList<>();
    double loosest = 0;
    for (Polish.Polished p : found) {
      for (int j = 0; j < p.values().length; j++) {
        Single m =
            new Single(
                p.values()[j],
                p.vectors().columnsFrom(j, 1),
                p.errors()[j],
                p.factorisations(),
                p.converged(j),
                p.bound());
        if (contour.contains(m.s()) && !repeats(all, m)) {
          all.add(m);
        }
      }
    }
    all.sort(
        Comparator.<Single>comparingDouble(m -> m.s().getImaginary())
            .thenComparing(m -> m.s().getReal()));
    ModeList list = new ModeList();
    double tightest = Double.POSITIVE_INFINITY;
    Rectangle wanted = Rectangle.of(window);
    for (Single m : all) {
      loosest = Math.max(loosest, m.bound());
      tightest = Math.min(tightest, m.bound());
      boolean edge = wanted.distanceToEdge(m.s()) <= ON_EDGE * m.s().abs();
      Mode mode = mode(m, multiplicity(all, m), edge);
      (edge || wanted.contains(m.s()) ? list.modes : list.outside).add(mode);
      list.converged &= m.converged();
    }
    if (loosest > tightest) {
      list.notes.add(
          String.format(
              java.util.Locale.ROOT,
              "rounding on this mesh keeps some backward errors above the bound asked for; up to"
                  + " %.1e was accepted",
              loosest));
    }
    return list;
  }

  /** In the window, or on its edge, by frequency. */
  List<Mode> modes() {
    return List.copyOf(modes);
  }

  /** Between window and contour. */
  List<Mode> outside() {
    return List.copyOf(outside);
  }

  /** Number inside the contour. */
  int inside() {
    return modes.size() + outside.size();
  }

  boolean converged() {
    return converged;
  }

  List<String> notes() {
    return notes;
  }

  /** Whether a mode is one already listed: same eigenvalue, and no new direction. */
  private static boolean repeats(List<Single> listed, Single m) {
    List<Single> same = listed.stream().filter(o -> near(o, m)).toList();
    if (same.isEmpty()) {
      return false;
    }
    int n = m.vector().rows();
    ComplexMatrix a = new ComplexMatrix(n, same.size() + 1);
    for (int j = 0; j <= same.size(); j++) {
      ComplexMatrix v = j < same.size() ? same.get(j).vector() : m.vector();
      System.arraycopy(v.re()[0], 0, a.re()[j], 0, n);
      System.arraycopy(v.im()[0], 0, a.im()[j], 0, n);
    }
    return OrthonormalColumns.of(a, 1e-5).columns() <= same.size();
  }

  private static int multiplicity(List<Single> all, Single m) {
    return (int) all.stream().filter(o -> near(o, m)).count();
  }

  private static boolean near(Single a, Single b) {
    return a.s().subtract(b.s()).abs() <= SAME * a.s().abs();
  }

  private static Mode mode(Single m, int multiplicity, boolean edge) {
    double[] re = m.vector().re()[0];
    double[] im = m.vector().im()[0];
    int peak = 0;
    for (int i = 0; i < re.length; i++) {
      // a strict margin keeps the choice of the peak free of rounding where several are equal
      if (Math.hypot(re[i], im[i]) > (1 + 1e-9) * Math.hypot(re[peak], im[peak])) {
        peak = i;
      }
    }
    Complex scale = new Complex(re[peak], im[peak]).reciprocal();
    double[] x = new double[re.length];
    double[] y = new double[re.length];
    for (int i = 0; i < re.length; i++) {
      x[i] = scale.getReal() * re[i] - scale.getImaginary() * im[i];
      y[i] = scale.getReal() * im[i] + scale.getImaginary() * re[i];
    }
    x[peak] = 1;
    y[peak] = 0;
    Mode.Verdict verdict =
        !m.converged()
            ? Mode.Verdict.STALLED
            : edge ? Mode.Verdict.ON_THE_EDGE : Mode.Verdict.CONVERGED;
    return new Mode(
        m.s().getReal(),
        m.s().getImaginary() / (2 * Math.PI),
        x,
        y,
        multiplicity,
        m.error(),
        m.steps(),
        verdict);
  }
}
