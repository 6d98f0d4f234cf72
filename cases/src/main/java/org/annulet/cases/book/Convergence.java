package org.annulet.cases.book;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.OptionalDouble;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.study.CaseProblem;
import org.annulet.cases.study.ChamberShape;
import org.annulet.solver.eigen.ModeSearch;
import org.annulet.solver.eigen.SearchSettings;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.modes.Window;

/**
 * True errors of a chamber on nested meshes, each with half the triangle sides of the one before.
 *
 * @param chamber name
 * @param triangles number of triangles of each mesh, shape [meshes]
 * @param errors relative error |Δs|/|s| of each known value on each mesh, shape [values][meshes];
 *     NaN where a mesh is too coarse to show the mode
 */
public record Convergence(String chamber, int[] triangles, double[][] errors) {
  private static final int MESHES = 4;

  /** Sides of the finest triangles over those the case asks for. */
  private static final double SCALE = 0.5;

  /** A relative error below this is rounding of the known value; no order is read from it. */
  private static final double ROUNDING = 2e-7;

  static Convergence of(String chamber, CaseFile caseFile, List<KnownValue> known) {
    double[][] errors = new double[known.size()][MESHES];
    int[] triangles = new int[MESHES];
    List<ChamberShape> ladder = ChamberShape.ladder(caseFile, MESHES, SCALE);
    for (int level = 0; level < MESHES; level++) {
      ChamberShape shape = ladder.get(level);
      triangles[level] = shape.mesh().triangleCount();
      List<Found> modes = modes(CaseProblem.on(caseFile, shape), wider(caseFile.window()));
      for (int k = 0; k < known.size(); k++) {
        errors[k][level] = take(modes, known.get(k));
      }
    }
    return new Convergence(chamber, triangles, errors);
  }

  /** The largest error on each mesh, shape [meshes]. */
  public double[] worst() {
    double[] worst = new double[triangles.length];
    for (int level = 0; level < worst.length; level++) {
      for (double[] value : errors) {
        worst[level] = Math.max(worst[level], value[level]);
      }
    }
    return worst;
  }

  /**
   * The observed order p, error ~ h^p, between the two finest meshes: median over the values whose
   * error is not rounding; empty when there are none.
   */
  public OptionalDouble observedOrder() {
    int last = triangles.length - 1;
    double[] orders =
        Arrays.stream(errors)
            .filter(e -> e[last] > ROUNDING && e[last - 1] > 0)
            .mapToDouble(e -> Math.log(e[last - 1] / e[last]) / Math.log(2))
            .sorted()
            .toArray();
    return orders.length == 0
        ? OptionalDouble.empty()
        : OptionalDouble.of(orders[orders.length / 2]);
  }

  private record Found(Integer order, Mode mode) {
    double distance(KnownValue value) {
      return Math.hypot(
          mode.growthRate() - value.growthRate(),
          2 * Math.PI * (mode.frequency() - value.frequency()));
    }
  }

  private static List<Found> modes(CaseProblem problem, Window window) {
    List<Found> modes = new ArrayList<>();
    for (CaseProblem.Part part : problem.parts()) {
      for (Mode mode :
          ModeSearch.find(part.assembled().operator(), window, SearchSettings.standard()).modes()) {
        modes.add(new Found(part.order(), mode));
        if (part.copies() == 2 && part.order() == null) {
          modes.add(new Found(null, mode));
        }
      }
    }
    return modes;
  }

  /** The error of the nearest mode, which is then taken. */
  private static double take(List<Found> modes, KnownValue value) {
    return modes.stream()
        .filter(m -> value.order().isEmpty() || m.order == value.order().getAsInt())
        .min(Comparator.comparingDouble(m -> m.distance(value)))
        .map(
            m -> {
              modes.remove(m);
              return m.distance(value)
                  / Math.hypot(value.growthRate(), 2 * Math.PI * value.frequency());
            })
        .orElse(Double.NaN);
  }

  /** A coarse mesh moves modes over the window's edge, upwards above all. */
  private static Window wider(Window w) {
    return new Window(
        0.95 * w.lowestFrequency(),
        1.1 * w.highestFrequency(),
        w.lowestGrowth(),
        w.highestGrowth());
  }
}
