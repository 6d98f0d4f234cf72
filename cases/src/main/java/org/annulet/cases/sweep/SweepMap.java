package org.annulet.cases.sweep;

import java.util.ArrayList;
import java.util.List;
import java.util.function.BiFunction;
import org.annulet.cases.study.PointMode;
import org.annulet.cases.study.PointModes;
import org.annulet.solver.modes.Window;

/** Where on a map the chamber is quiet: the largest growth rate of each point and its zero line. */
final class SweepMap {
  private static final double NOUGHT = 1e-4;
  private static final double FINEST = 1e-7;
  private static final int MOST_STEPS = 25;

  private final Window window;
  private final SweepGrid grid;
  private final BiFunction<Double, Double, PointModes> solve;
  private final double[] worst;
  private final int[] growing;
  private final List<Piece> boundary = new ArrayList<>();

  /**
   * A straight piece of the boundary between quiet and loud, within one cell of the grid.
   *
   * @param from shares of the axes, solved
   * @param to shares of the axes, solved
   */
  record Piece(double[] from, double[] to) {}

  SweepMap(
      Window window,
      SweepGrid grid,
      List<PointModes> points,
      BiFunction<Double, Double, PointModes> solve) {
    this.window = window;
    this.grid = grid;
    this.solve = solve;
    worst = new double[points.size()];
    growing = new int[points.size()];
    for (int i = 0; i < worst.length; i++) {
      worst[i] = worst(points.get(i));
      growing[i] =
          points.get(i).modes().stream()
              .filter(m -> m.growthRate() > 0 && inside(m))
              .mapToInt(PointMode::copies)
              .sum();
    }
    bound();
  }

  /** Largest growth rate in the window in 1/s at each point; the window's lowest without modes. */
  double[] worst() {
    return worst;
  }

  /** Modes that grow at each point. */
  int[] growing() {
    return growing;
  }

  List<Piece> boundary() {
    return boundary;
  }

  private boolean inside(PointMode m) {
    return window.contains(m.growthRate(), m.frequency());
  }

  private double worst(PointModes modes) {
    return modes.modes().stream()
        .filter(this::inside)
        .mapToDouble(PointMode::growthRate)
        .max()
        .orElse(window.lowestGrowth());
  }

  /** Marching squares on solved crossings; each side of a cell is solved once. */
  private void bound() {
    int nx = grid.along();
    int ny = grid.across();
    double[][] rows = new double[nx * ny][]; // crossing between (i, j) and (i + 1, j)
    double[][] columns = new double[nx * ny][]; // between (i, j) and (i, j + 1)
    List<Integer> sides = new ArrayList<>();
    for (int k = 0; k < 2 * nx * ny; k++) {
      sides.add(k);
    }
    sides.parallelStream()
        .forEach(
            k -> {
              int p = k / 2;
              boolean row = k % 2 == 0;
              if (row && p % nx < nx - 1) {
                rows[p] = crossing(p, p + 1);
              } else if (!row && p / nx < ny - 1) {
                columns[p] = crossing(p, p + nx);
              }
            });
    for (int j = 0; j + 1 < ny; j++) {
      for (int i = 0; i + 1 < nx; i++) {
        int p = j * nx + i;
        List<double[]> cut = new ArrayList<>();
        for (double[] c : new double[][] {rows[p], columns[p + 1], rows[p + nx], columns[p]}) {
          if (c != null) {
            cut.add(c);
          }
        }
        for (int q = 0; q + 1 < cut.size(); q += 2) {
          boundary.add(new Piece(cut.get(q), cut.get(q + 1)));
        }
      }
    }
  }

  private double[] crossing(int a, int b) {
    if (worst[a] > 0 == worst[b] > 0) {
      return null;
    }
    double[] from = grid.shares(a);
    double[] to = grid.shares(b);
    double lo = 0;
    double hi = 1;
    double fLo = worst[a];
    double fHi = worst[b];
    int side = 0;
    double[] at = from;
    for (int k = 0; k < MOST_STEPS && hi - lo > FINEST; k++) {
      double t = (lo * fHi - hi * fLo) / (fHi - fLo);
      at =
          new double[] {
            from[0] + t * (to[0] - from[0]), from[1] + t * (to[1] - from[1]),
          };
      double f = worst(solve.apply(at[0], at[1]));
      if (Math.abs(f) < NOUGHT) {
        break;
      }
      if (f > 0 == fHi > 0) {
        hi = t;
        fHi = f;
        fLo = side == 1 ? fLo / 2 : fLo;
        side = 1;
      } else {
        lo = t;
        fLo = f;
        fHi = side == -1 ? fHi / 2 : fHi;
        side = -1;
      }
    }
    return at;
  }
}
