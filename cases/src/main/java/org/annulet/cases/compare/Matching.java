package org.annulet.cases.compare;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.annulet.cases.read.ModeTable;

/** Matches our modes with the rows of a table, one to one; see the package's rule. */
final class Matching {
  /** Costs that differ by less cannot tell two assignments apart. */
  static final double NEARLY = 0.15;

  private static final double NO_MATCH = 1;
  private static final double FORBIDDEN = 1e6;

  private final List<OurMode> ours;
  private final List<ModeTable.Row> theirs;
  private final double within;

  private Matching(List<OurMode> ours, List<ModeTable.Row> theirs, double within) {
    this.ours = List.copyOf(ours);
    this.theirs = List.copyOf(theirs);
    this.within = within;
  }

  /**
   * The matches, by frequency; what only one side has stands among them. Our modes outside the
   * window appear only where they match.
   *
   * @param within largest |Δs|/|s| of a match
   */
  static List<Match> of(List<OurMode> ours, List<ModeTable.Row> theirs, double within) {
    return new Matching(ours, theirs, within).run();
  }

  private List<Match> run() {
    double[][] cost = costs();
    int[] column = Assignment.cheapest(cost);
    double best = Assignment.total(cost, column);
    OurMode[] partner = new OurMode[theirs.size()];
    OurMode[] second = new OurMode[theirs.size()];
    boolean[] used = new boolean[ours.size()];
    for (int i = 0; i < theirs.size(); i++) {
      if (column[i] < ours.size()) {
        partner[i] = ours.get(column[i]);
        used[column[i]] = true;
      }
    }
    List<Match> all = new ArrayList<>();
    for (int i = 0; i < theirs.size(); i++) {
      if (partner[i] == null) {
        all.add(
            new Match(
                Optional.empty(),
                Optional.empty(),
                Optional.of(theirs.get(i)),
                i + 1,
                Double.NaN,
                Optional.empty()));
        continue;
      }
      int other = other(partner[i]);
      if (other >= 0 && !used[other] && cost[i][other] <= NO_MATCH) {
        second[i] = ours.get(other);
        used[other] = true;
      }
      all.add(
          new Match(
              Optional.of(partner[i]),
              Optional.ofNullable(second[i]),
              Optional.of(theirs.get(i)),
              i + 1,
              correlation(partner[i], theirs.get(i)),
              rival(cost, i, column, best)));
    }
    for (int j = 0; j < ours.size(); j++) {
      if (!used[j] && ours.get(j).inside()) {
        all.add(
            new Match(
                Optional.of(ours.get(j)),
                Optional.empty(),
                Optional.empty(),
                0,
                Double.NaN,
                Optional.empty()));
      }
    }
    all.sort(
        Comparator.comparingDouble(
            (Match m) ->
                m.ours().map(OurMode::frequency).orElseGet(() -> m.theirs().get().frequency())));
    return List.copyOf(all);
  }

  /** Costs of our modes, then of no match for every row. */
  private double[][] costs() {
    double[][] cost = new double[theirs.size()][ours.size() + theirs.size()];
    for (int i = 0; i < cost.length; i++) {
      Arrays.fill(cost[i], FORBIDDEN);
      cost[i][ours.size() + i] = NO_MATCH;
      for (int j = 0; j < ours.size(); j++) {
        double c = cost(ours.get(j), theirs.get(i));
        cost[i][j] = c <= NO_MATCH ? c : FORBIDDEN;
      }
    }
    return cost;
  }

  private double cost(OurMode a, ModeTable.Row b) {
    if (a.order() >= 0 && b.order() >= 0 && a.order() != b.order()) {
      return FORBIDDEN;
    }
    double omega = 2 * Math.PI * a.frequency();
    double distance =
        Math.hypot(
            2 * Math.PI * (b.frequency() - a.frequency()),
            b.hasGrowth() ? b.growthRate() - a.growthRate() : 0);
    double c = distance / (within * Math.hypot(omega, a.growthRate()));
    double mac = correlation(a, b);
    return Double.isNaN(mac) ? c : Math.hypot(c, 2 * (1 - mac));
  }

  /** The modal assurance criterion at their places; NaN where a shape is missing. */
  static double correlation(OurMode a, ModeTable.Row b) {
    if (a.shape() == null || b.shape().isEmpty()) {
      return Double.NaN;
    }
    ModeTable.Shape theirs = b.shape().get();
    ModeTable.Shape ours = a.shape();
    double re = 0;
    double im = 0;
    double aa = 0;
    double bb = 0;
    int last = ours.x().length - 1;
    double slack = 1e-6 * (ours.x()[last] - ours.x()[0]);
    for (int k = 0; k < theirs.x().length; k++) {
      double x = theirs.x()[k];
      if (x < ours.x()[0] - slack || x > ours.x()[last] + slack) {
        continue; // no gas there
      }
      double ar = at(ours.x(), ours.re(), x);
      double ai = at(ours.x(), ours.im(), x);
      double br = theirs.re()[k];
      double bi = theirs.im()[k];
      re += ar * br + ai * bi;
      im += ar * bi - ai * br;
      aa += ar * ar + ai * ai;
      bb += br * br + bi * bi;
    }
    return aa > 0 && bb > 0 ? (re * re + im * im) / (aa * bb) : Double.NaN;
  }

  private static double at(double[] x, double[] y, double at) {
    int k = Arrays.binarySearch(x, at);
    if (k >= 0) {
      return y[k];
    }
    int i = Math.max(1, Math.min(x.length - 1, -k - 1));
    double t = Math.max(0, Math.min(1, (at - x[i - 1]) / (x[i] - x[i - 1])));
    return (1 - t) * y[i - 1] + t * y[i];
  }

  private int other(OurMode mode) {
    for (int j = 0; j < ours.size(); j++) {
      if (mode.partner() > 0 && ours.get(j).number() == mode.partner()) {
        return j;
      }
    }
    return -1;
  }

  /** What a row might be instead, where that costs little more in all. */
  private Optional<String> rival(double[][] cost, int row, int[] column, double best) {
    double[][] without = cost.clone();
    without[row] = cost[row].clone();
    without[row][column[row]] = FORBIDDEN;
    int other = other(ours.get(column[row]));
    if (other >= 0) {
      without[row][other] = FORBIDDEN;
    }
    int[] next = Assignment.cheapest(without);
    if (Assignment.total(without, next) - best >= NEARLY) {
      return Optional.empty();
    }
    return Optional.of(
        next[row] < ours.size()
            ? "mode " + ours.get(next[row]).number() + " is nearly as near"
            : "it is nearly too far for a match");
  }
}
