package org.annulet.cases.points;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.function.DoubleFunction;
import org.annulet.cases.study.PointMode;
import org.annulet.cases.study.PointModes;

/** Which mode of one point becomes which of the next. */
public final class ModeLinks {
  /** |Δs|/|s| that weighs as much as fields without likeness. */
  private static final double REACH = 0.05;

  /** Pairs that cost more are no pairs. */
  private static final double MOST = 1.5;

  /** A second choice must cost this much more, and this many times as much. */
  private static final double APART = 0.1;

  private static final double TIMES = 2;
  private static final int DEEPEST = 6;

  private ModeLinks() {}

  /**
   * Where the modes go.
   *
   * @param to position in the second place of each mode of the first; −1 where it ends
   * @param clear whether every step of the way was without a rival
   */
  public record Linked(int[] to, boolean clear) {}

  private record Pair(int i, int j, double cost) {}

  /**
   * Follows from one place to another.
   *
   * @param between solves a place between the two
   */
  public static Linked follow(Place from, Place to, DoubleFunction<PointModes> between) {
    return follow(from, to, between, DEEPEST);
  }

  /**
   * Modes at a place of a way.
   *
   * @param at how far along the way
   * @param modes there
   */
  public record Place(double at, PointModes modes) {}

  private static Linked follow(
      Place from, Place to, DoubleFunction<PointModes> between, int deeper) {
    Linked direct = direct(from.modes().modes(), to.modes().modes());
    if (direct.clear || deeper == 0) {
      return direct;
    }
    double middle = 0.5 * (from.at() + to.at());
    Place half = new Place(middle, between.apply(middle));
    Linked first = follow(from, half, between, deeper - 1);
    Linked second = follow(half, to, between, deeper - 1);
    int[] map = new int[first.to.length];
    for (int i = 0; i < map.length; i++) {
      map[i] = first.to[i] < 0 ? -1 : second.to[first.to[i]];
    }
    return new Linked(map, first.clear && second.clear);
  }

  /** What it costs to join two modes: 0 for the same one. */
  public static double cost(PointMode a, PointMode b) {
    return a.s().subtract(b.s()).abs() / (REACH * a.s().abs()) + 1 - a.likeness(b);
  }

  private static Linked direct(List<PointMode> a, List<PointMode> b) {
    List<Pair> pairs = new ArrayList<>();
    for (int i = 0; i < a.size(); i++) {
      for (int j = 0; j < b.size(); j++) {
        if (a.get(i).part().equals(b.get(j).part())) {
          pairs.add(new Pair(i, j, cost(a.get(i), b.get(j))));
        }
      }
    }
    pairs.sort(
        Comparator.comparingDouble(Pair::cost).thenComparing(Pair::i).thenComparing(Pair::j));
    int[] to = new int[a.size()];
    int[] back = new int[b.size()];
    Arrays.fill(to, -1);
    Arrays.fill(back, -1);
    for (Pair p : pairs) {
      if (p.cost < MOST && to[p.i] < 0 && back[p.j] < 0) {
        to[p.i] = p.j;
        back[p.j] = p.i;
      }
    }
    return new Linked(to, clear(pairs, to, back));
  }

  /** Whether no pair has a rival that is nearly as good. */
  private static boolean clear(List<Pair> pairs, int[] to, int[] back) {
    double[] own = new double[to.length];
    double[] other = new double[back.length];
    for (Pair p : pairs) {
      if (to[p.i] == p.j) {
        own[p.i] = p.cost;
        other[p.j] = p.cost;
      }
    }
    for (Pair p : pairs) {
      if (to[p.i] == p.j) {
        continue;
      }
      boolean rivalOfFirst = to[p.i] >= 0 && p.cost < Math.max(TIMES * own[p.i], own[p.i] + APART);
      boolean rivalOfSecond =
          back[p.j] >= 0 && p.cost < Math.max(TIMES * other[p.j], other[p.j] + APART);
      boolean left = to[p.i] < 0 && back[p.j] < 0 && p.cost < TIMES * MOST;
      if (rivalOfFirst || rivalOfSecond || left) {
        return false;
      }
    }
    return true;
  }
}
