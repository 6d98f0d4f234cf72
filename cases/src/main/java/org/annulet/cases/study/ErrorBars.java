package org.annulet.cases.study;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.annulet.solver.modes.MeshError;
import org.annulet.solver.modes.Mode;

/**
 * Error bars of the modes of one operator from the modes of the same operator on two coarser nested
 * meshes.
 *
 * <p>Modes of different meshes are matched one to one by eigenvalue and field: the spectrum of a
 * coarse mesh is shifted by more than the distance of its neighbours, so the nearest eigenvalue
 * alone may belong to another shape. A mode whose partner is missing on a coarser mesh has no error
 * bar.
 */
final class ErrorBars {
  /** A partner further away than this part of |s| is no partner. */
  private static final double REACH = 0.3;

  /**
   * A partner whose field overlaps less than this is no partner; members of a pair may stand at 45°
   * to each other.
   */
  private static final double LIKENESS = 0.6;

  private ErrorBars() {}

  /**
   * The modes of one mesh.
   *
   * @param modes eigenvalues
   * @param samples field of each mode at places common to all meshes, shape [modes][2][places],
   *     real and imaginary part
   */
  record Level(List<Mode> modes, List<double[][]> samples) {}

  /**
   * One error bar for each of the finest modes, in their order; empty where no partner was found.
   *
   * @param coarse modes on triangles of four times the size
   * @param middle modes on triangles of twice the size
   * @param fine modes on the finest mesh
   */
  static List<Optional<MeshError>> of(Level coarse, Level middle, Level fine) {
    int[] toMiddle = match(fine, middle);
    int[] toCoarse = match(middle, coarse);
    List<Optional<MeshError>> bars = new ArrayList<>();
    for (int i = 0; i < fine.modes.size(); i++) {
      int j = toMiddle[i];
      if (j < 0 || toCoarse[j] < 0) {
        bars.add(Optional.empty());
        continue;
      }
      Mode a = coarse.modes.get(toCoarse[j]);
      Mode b = middle.modes.get(j);
      Mode c = fine.modes.get(i);
      bars.add(
          Optional.of(
              MeshError.of(
                  new double[] {a.growthRate(), b.growthRate(), c.growthRate()},
                  new double[] {a.frequency(), b.frequency(), c.frequency()})));
    }
    return bars;
  }

  /**
   * For each of the finest modes the index of its partner among the coarse ones; −1 without one.
   */
  static int[] partners(Level coarse, Level middle, Level fine) {
    int[] toMiddle = match(fine, middle);
    int[] toCoarse = match(middle, coarse);
    return Arrays.stream(toMiddle).map(j -> j < 0 ? -1 : toCoarse[j]).toArray();
  }

  private static int[] match(Level from, Level to) {
    record Couple(int from, int to, double distance) {}
    List<Couple> couples = new ArrayList<>();
    for (int i = 0; i < from.modes.size(); i++) {
      Mode a = from.modes.get(i);
      double size = Math.hypot(a.growthRate(), 2 * Math.PI * a.frequency());
      for (int j = 0; j < to.modes.size(); j++) {
        double apart = distance(a, to.modes.get(j)) / size;
        double like = overlap(from.samples.get(i), to.samples.get(j));
        if (apart < REACH && like > LIKENESS) {
          couples.add(new Couple(i, j, apart + (1 - like)));
        }
      }
    }
    couples.sort(
        Comparator.comparingDouble(Couple::distance)
            .thenComparingInt(Couple::from)
            .thenComparingInt(Couple::to));
    int[] partner = new int[from.modes.size()];
    Arrays.fill(partner, -1);
    boolean[] taken = new boolean[to.modes.size()];
    for (Couple c : couples) {
      if (partner[c.from] < 0 && !taken[c.to]) {
        partner[c.from] = c.to;
        taken[c.to] = true;
      }
    }
    return partner;
  }

  private static double distance(Mode a, Mode b) {
    return Math.hypot(
        a.growthRate() - b.growthRate(), 2 * Math.PI * (a.frequency() - b.frequency()));
  }

  /** |⟨a, b⟩| / (‖a‖ ‖b‖) over the common places. */
  private static double overlap(double[][] a, double[][] b) {
    double re = 0;
    double im = 0;
    double aa = 0;
    double bb = 0;
    for (int k = 0; k < a[0].length; k++) {
      re += a[0][k] * b[0][k] + a[1][k] * b[1][k];
      im += a[0][k] * b[1][k] - a[1][k] * b[0][k];
      aa += a[0][k] * a[0][k] + a[1][k] * a[1][k];
      bb += b[0][k] * b[0][k] + b[1][k] * b[1][k];
    }
    return aa > 0 && bb > 0 ? Math.hypot(re, im) / Math.sqrt(aa * bb) : 0;
  }
}
