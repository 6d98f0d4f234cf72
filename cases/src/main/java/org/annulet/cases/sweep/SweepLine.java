package org.annulet.cases.sweep;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.function.DoubleFunction;
import org.annulet.cases.points.ModeLinks;
import org.annulet.cases.study.PointMode;
import org.annulet.cases.study.PointModes;
import org.annulet.solver.modes.Window;

/**
 * The tracks of a line of points, where their growth rates change sign and where they come close.
 */
final class SweepLine {
  /** Growth rate in 1/s that counts as zero at an edge. */
  private static final double NOUGHT = 1e-4;

  private static final double FINEST = 1e-9;
  private static final int MOST_STEPS = 40;

  /** Modes of one operator nearer than this share of |s| are said to be close. */
  private static final double CLOSE = 0.02;

  private final Window window;
  private final double[] at;
  private final List<PointModes> points;
  private final DoubleFunction<PointModes> between;
  private final List<Track> tracks = new ArrayList<>();
  private final List<Meeting> meetings = new ArrayList<>();
  private boolean clear = true;

  /**
   * A stretch in which a mode grows.
   *
   * @param from share of the axis
   * @param to share of the axis
   * @param opens what is at its beginning
   * @param closes what is at its end
   * @param peak largest growth rate at the points in it in 1/s
   * @param peakAt share of the axis
   * @param peakFrequency in Hz
   */
  record Stretch(
      Track track,
      double from,
      double to,
      End opens,
      End closes,
      double peak,
      double peakAt,
      double peakFrequency) {}

  /** What ends a stretch of growth. */
  enum End {
    /** The growth rate passes through zero, solved to 1e-4 1/s. */
    ZERO,
    /** The sweep ends. */
    SWEEP,
    /** The mode enters or leaves the window between two points. */
    WINDOW
  }

  /**
   * Two modes of one operator that come close: their labels may exchange there.
   *
   * @param at share of the axis
   * @param distance |Δs| in 1/s
   * @param likeness of their fields there
   */
  record Meeting(Track first, Track second, double at, double distance, double likeness) {}

  /**
   * Joins the modes of points.
   *
   * @param at shares of the axis, ascending
   * @param between solves any place of the line
   */
  SweepLine(
      Window window, double[] at, List<PointModes> points, DoubleFunction<PointModes> between) {
    this.window = window;
    this.at = at;
    this.points = points;
    this.between = between;
    join();
    meet();
  }

  List<Track> tracks() {
    return tracks;
  }

  List<Meeting> meetings() {
    return meetings;
  }

  /** Whether every step could be joined without a rival. */
  boolean clear() {
    return clear;
  }

  private void join() {
    Map<Integer, Track> here = new TreeMap<>();
    for (int i = 0; i < points.get(0).modes().size(); i++) {
      here.put(i, begin(0, i));
    }
    for (int k = 1; k < at.length; k++) {
      ModeLinks.Linked linked =
          ModeLinks.follow(
              new ModeLinks.Place(at[k - 1], points.get(k - 1)),
              new ModeLinks.Place(at[k], points.get(k)),
              between);
      clear &= linked.clear();
      Map<Integer, Track> next = new TreeMap<>();
      for (Map.Entry<Integer, Track> e : here.entrySet()) {
        int j = linked.to()[e.getKey()];
        if (j >= 0) {
          e.getValue().add(points.get(k).modes().get(j));
          next.put(j, e.getValue());
        }
      }
      for (int j = 0; j < points.get(k).modes().size(); j++) {
        if (!next.containsKey(j)) {
          next.put(j, begin(k, j));
        }
      }
      here = next;
    }
    tracks.removeIf(t -> !everInside(t));
    tracks.sort(Comparator.comparingInt(Track::first).thenComparing(t -> t.any().frequency()));
    List<Track> numbered = new ArrayList<>();
    for (Track t : tracks) {
      Track copy = new Track(numbered.size() + 1, t.first(), t.at(t.first()));
      for (int k = t.first() + 1; k <= t.last(); k++) {
        copy.add(t.at(k));
      }
      numbered.add(copy);
    }
    tracks.clear();
    tracks.addAll(numbered);
  }

  private Track begin(int point, int mode) {
    Track t = new Track(0, point, points.get(point).modes().get(mode));
    tracks.add(t);
    return t;
  }

  private boolean everInside(Track t) {
    for (int k = t.first(); k <= t.last(); k++) {
      if (inside(t.at(k))) {
        return true;
      }
    }
    return false;
  }

  private boolean inside(PointMode m) {
    return window.contains(m.growthRate(), m.frequency());
  }

  private void meet() {
    for (int a = 0; a < tracks.size(); a++) {
      for (int b = a + 1; b < tracks.size(); b++) {
        if (tracks.get(a).part().equals(tracks.get(b).part())) {
          meet(tracks.get(a), tracks.get(b));
        }
      }
    }
  }

  private void meet(Track a, Track b) {
    int from = Math.max(a.first(), b.first());
    int to = Math.min(a.last(), b.last());
    int best = -1;
    double least = Double.POSITIVE_INFINITY;
    for (int k = from; k <= to; k++) {
      double d = a.at(k).s().subtract(b.at(k).s()).abs();
      if (d < least && inside(a.at(k))) {
        least = d;
        best = k;
      }
    }
    if (best >= 0 && least < CLOSE * a.at(best).s().abs()) {
      meetings.add(new Meeting(a, b, at[best], least, a.at(best).likeness(b.at(best))));
    }
  }

  /** A growth rate somewhere on a track. */
  private record Sample(double at, PointMode mode) {}

  /** Where a track grows, inside the window, edges solved. */
  List<Stretch> stretches(Track t) {
    List<Sample> samples = samples(t);
    List<Stretch> out = new ArrayList<>();
    double from = Double.NaN;
    End opens = End.SWEEP;
    Sample peak = null;
    for (int i = 0; i < samples.size(); i++) {
      Sample here = samples.get(i);
      boolean grows = grows(here);
      if (grows && Double.isNaN(from)) {
        from = here.at;
        opens = i == 0 && t.first() == 0 ? End.SWEEP : End.WINDOW;
        if (i > 0 && samples.get(i - 1).mode.growthRate() <= 0) {
          from = edge(samples.get(i - 1), here);
          opens = End.ZERO;
        }
        peak = here;
      }
      if (grows && here.mode.growthRate() > peak.mode.growthRate()) {
        peak = here;
      }
      boolean last = i == samples.size() - 1;
      if (!Double.isNaN(from) && (!grows || last)) {
        double to = here.at;
        End closes = t.last() == at.length - 1 ? End.SWEEP : End.WINDOW;
        if (!grows) {
          boolean zero = here.mode.growthRate() <= 0;
          to = zero ? edge(samples.get(i - 1), here) : samples.get(i - 1).at;
          closes = zero ? End.ZERO : End.WINDOW;
        }
        out.add(
            new Stretch(
                t,
                from,
                to,
                opens,
                closes,
                peak.mode.growthRate(),
                peak.at,
                peak.mode.frequency()));
        from = Double.NaN;
      }
    }
    return out;
  }

  private boolean grows(Sample s) {
    return s.mode.growthRate() > 0 && inside(s.mode);
  }

  /** The points, and between them peaks and dips that a parabola foretells on the other side. */
  private List<Sample> samples(Track t) {
    List<Sample> out = new ArrayList<>();
    for (int k = t.first(); k <= t.last(); k++) {
      out.add(new Sample(at[k], t.at(k)));
      if (k > t.first() && k < t.last()) {
        double before = t.at(k - 1).growthRate();
        double here = t.at(k).growthRate();
        double after = t.at(k + 1).growthRate();
        double bend = before - 2 * here + after;
        double shift = 0.5 * (before - after) / bend;
        double extreme = here - 0.125 * (before - after) * (before - after) / bend;
        boolean same = before > 0 == here > 0 && here > 0 == after > 0;
        if (same && Math.abs(shift) <= 0.5 && extreme > 0 != here > 0) {
          double place = at[k] + shift * (at[k + 1] - at[k]);
          Sample s = new Sample(place, at(place, t.at(k)));
          out.add(shift < 0 ? out.size() - 1 : out.size(), s);
        }
      }
    }
    return out;
  }

  /** The mode at a place that is most like one close by. */
  private PointMode at(double place, PointMode near) {
    return between.apply(place).modes().stream()
        .filter(m -> m.part().equals(near.part()))
        .min(Comparator.comparingDouble(m -> ModeLinks.cost(near, m)))
        .orElse(near);
  }

  private double edge(Sample a, Sample b) {
    double lo = a.at;
    double hi = b.at;
    double fLo = a.mode.growthRate();
    double fHi = b.mode.growthRate();
    PointMode near = Math.abs(fLo) < Math.abs(fHi) ? a.mode : b.mode;
    int side = 0;
    double x = lo;
    for (int k = 0; k < MOST_STEPS && hi - lo > FINEST; k++) {
      x = (lo * fHi - hi * fLo) / (fHi - fLo);
      near = at(x, near);
      double f = near.growthRate();
      if (Math.abs(f) < NOUGHT) {
        return x;
      }
      if (f > 0 == fHi > 0) {
        hi = x;
        fHi = f;
        fLo = side == 1 ? fLo / 2 : fLo;
        side = 1;
      } else {
        lo = x;
        fLo = f;
        fHi = side == -1 ? fHi / 2 : fHi;
        side = -1;
      }
    }
    return x;
  }
}
