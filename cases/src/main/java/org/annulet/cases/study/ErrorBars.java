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
 * <p>Modes of different meshes are matched one to one, closest pairs first; a mode whose partner is
 * missing on a coarser mesh, or not clearly the nearest, has no error bar.
 */
final class ErrorBars {
  /** A partner further away than this part of |s| is no partner. */
  private static final double REACH = 0.2;

  private ErrorBars() {}

  /**
   * One error bar for each of the finest modes, in their order; empty where no partner was found.
   *
   * @param coarse modes on triangles of four times the size
   * @param middle modes on triangles of twice the size
   * @param fine modes on the finest mesh
   */
  static List<Optional<MeshError>> of(List<Mode> coarse, List<Mode> middle, List<Mode> fine) {
    int[] toMiddle = match(fine, middle);
    int[] toCoarse = match(middle, coarse);
    List<Optional<MeshError>> bars = new ArrayList<>();
    for (int i = 0; i < fine.size(); i++) {
      int j = toMiddle[i];
      if (j < 0 || toCoarse[j] < 0) {
        bars.add(Optional.empty());
        continue;
      }
      Mode a = coarse.get(toCoarse[j]);
      Mode b = middle.get(j);
      Mode c = fine.get(i);
      bars.add(
          Optional.of(
              MeshError.of(
                  new double[] {a.growthRate(), b.growthRate(), c.growthRate()},
                  new double[] {a.frequency(), b.frequency(), c.frequency()})));
    }
    return bars;
  }

  private static int[] match(List<Mode> from, List<Mode> to) {
    record Couple(int from, int to, double distance) {}
    List<Couple> couples = new ArrayList<>();
    for (int i = 0; i < from.size(); i++) {
      for (int j = 0; j < to.size(); j++) {
        double d = distance(from.get(i), to.get(j));
        if (d
            < REACH * Math.hypot(from.get(i).growthRate(), 2 * Math.PI * from.get(i).frequency())) {
          couples.add(new Couple(i, j, d));
        }
      }
    }
    couples.sort(
        Comparator.comparingDouble(Couple::distance)
            .thenComparingInt(Couple::from)
            .thenComparingInt(Couple::to));
    int[] partner = new int[from.size()];
    Arrays.fill(partner, -1);
    boolean[] taken = new boolean[to.size()];
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
}
