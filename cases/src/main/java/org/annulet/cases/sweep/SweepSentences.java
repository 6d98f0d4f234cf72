package org.annulet.cases.sweep;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import org.annulet.cases.read.Sweep;
import org.annulet.cases.study.PointMode;
import org.annulet.post.table.Numbers;

/** What a sweep has to say. */
final class SweepSentences {
  private final SweepStudy.Answer answer;
  private final Sweep.Axis along;

  SweepSentences(SweepStudy.Answer answer) {
    this.answer = answer;
    this.along = answer.grid().sweep().along();
  }

  List<String> all() {
    List<String> out = answer.grid().isMap() ? map() : line();
    out.addAll(trust());
    return out;
  }

  private List<String> line() {
    List<String> out = new ArrayList<>();
    int tracks = answer.line().tracks().size();
    if (answer.stretches().isEmpty()) {
      out.add(count(tracks, "mode") + " followed over " + along.name() + "; none grows anywhere.");
      return out;
    }
    out.add(
        count(tracks, "mode")
            + " followed over "
            + along.name()
            + " from "
            + number(along.from())
            + " to "
            + number(along.to())
            + "; "
            + loud()
            + ".");
    SweepLine.Stretch worst =
        answer.stretches().stream()
            .max(Comparator.comparingDouble(SweepLine.Stretch::peak))
            .orElseThrow();
    out.add(
        "The largest growth rate is "
            + Numbers.signed(worst.peak())
            + " 1/s, at "
            + number(along.shown(worst.peakAt()))
            + ": mode "
            + worst.track().number()
            + " ("
            + described(worst.track())
            + "), "
            + Numbers.fixed(worst.peakFrequency(), 1)
            + " Hz.");
    boolean quietFirst = quiet(0);
    boolean quietLast = quiet(1);
    if (quietFirst && quietLast) {
      out.add(
          "Both ends are quiet and something between them is not: tests at the ends would not show"
              + " it.");
    }
    if (!answer.line().meetings().isEmpty()) {
      for (SweepLine.Meeting m : answer.line().meetings()) {
        out.add(
            "Modes "
                + m.first().number()
                + " and "
                + m.second().number()
                + " of one operator come within "
                + Numbers.fixed(m.distance(), 1)
                + " 1/s of each other near "
                + number(along.shown(m.at()))
                + (m.likeness() > 0.9
                    ? ", and their fields grow alike: beyond it their numbers may be exchanged."
                    : ", with unlike fields."));
      }
    }
    return out;
  }

  private boolean quiet(int end) {
    return answer.stretches().stream().noneMatch(s -> end == 0 ? s.from() <= 0 : s.to() >= 1);
  }

  /** The union of all stretches in words. */
  private String loud() {
    List<double[]> union = union();
    StringBuilder b = new StringBuilder("some mode grows ");
    for (int i = 0; i < union.size(); i++) {
      b.append(i == 0 ? "from " : i == union.size() - 1 ? " and from " : ", from ")
          .append(number(along.shown(union.get(i)[0])))
          .append(" to ")
          .append(number(along.shown(union.get(i)[1])));
    }
    return b.toString();
  }

  /** Stretches of the chamber, from the stretches of its modes. */
  List<double[]> union() {
    List<double[]> union = new ArrayList<>();
    for (SweepLine.Stretch s : answer.stretches()) { // by their beginning
      double[] last = union.isEmpty() ? null : union.get(union.size() - 1);
      if (last != null && s.from() <= last[1]) {
        last[1] = Math.max(last[1], s.to());
      } else {
        union.add(new double[] {s.from(), s.to()});
      }
    }
    return union;
  }

  private List<String> map() {
    List<String> out = new ArrayList<>();
    double[] worst = answer.map().worst();
    int quiet = 0;
    int largest = 0;
    for (int i = 0; i < worst.length; i++) {
      quiet += worst[i] <= 0 ? 1 : 0;
      largest = worst[i] > worst[largest] ? i : largest;
    }
    Sweep.Axis across = answer.grid().sweep().across().orElseThrow();
    double[] at = answer.grid().shares(largest);
    out.add(
        quiet
            + " of "
            + worst.length
            + " points of the map are quiet. The largest growth rate is "
            + Numbers.signed(worst[largest])
            + " 1/s, at "
            + along.name()
            + " = "
            + number(along.shown(at[0]))
            + ", "
            + across.name()
            + " = "
            + number(across.shown(at[1]))
            + ".");
    return out;
  }

  private List<String> trust() {
    List<String> out = new ArrayList<>();
    int n = answer.points().size();
    long bad = answer.incomplete();
    String counted =
        bad == 0
            ? "At every one of the "
                + n
                + " points the argument principle counts as many modes as were found"
            : "At " + bad + " of " + n + " points the modes could NOT be confirmed by a count";
    if (answer.sizes().isEmpty()) {
      out.add(counted + "; every point was solved on the full operator.");
      return out;
    }
    out.add(
        counted
            + String.format(
                Locale.ROOT,
                " on a reduced model of %d to %d unknowns an operator; the largest backward error"
                    + " on the full operators is %.1e.",
                answer.sizes().stream().mapToInt(i -> i).min().orElse(0),
                answer.sizes().stream().mapToInt(i -> i).max().orElse(0),
                answer.worstBackwardError()));
    out.add(
        String.format(
            Locale.ROOT,
            "%d points solved again in full: %s, the largest difference is %.1e of |s|.",
            answer.check().points(),
            answer.check().sameNumber() ? "the same modes" : "NOT the same modes",
            answer.check().difference()));
    return out;
  }

  /** What kind of mode a track is, in words. */
  static String described(Track t) {
    PointMode m = t.any();
    String what = m.part().isEmpty() ? "whole chamber" : m.part();
    return what + (m.copies() > 1 ? ", pair" : "");
  }

  /** Six digits at most. */
  static String number(double v) {
    return new BigDecimal(v).round(new MathContext(5)).stripTrailingZeros().toPlainString();
  }

  private static String count(int n, String what) {
    return n + " " + what + (n == 1 ? "" : "s");
  }
}
