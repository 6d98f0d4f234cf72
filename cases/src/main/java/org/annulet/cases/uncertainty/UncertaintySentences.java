package org.annulet.cases.uncertainty;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import org.annulet.post.table.Numbers;

/** What the samples say, in sentences. */
final class UncertaintySentences {
  /** Shares that differ by more than this, beyond the sampling interval, are said to disagree. */
  private static final double DISAGREE = 0.02;

  /** What half a width must win, as a share of the samples, to be named. */
  private static final double WORTH = 0.005;

  private UncertaintySentences() {}

  static String percent(double share) {
    if (Double.isNaN(share)) {
      return "–";
    }
    boolean small = Math.min(share, 1 - share) > 1e-12 && Math.min(share, 1 - share) < 0.002;
    return Numbers.fixed(100 * share, small ? 3 : 1);
  }

  static List<String> of(UncertaintyStudy.Answer a) {
    List<String> out = new ArrayList<>();
    int n = a.samples().size();
    double loud = 1 - (double) a.quiet() / n;
    double[] interval = ModeStatistics.interval(n - a.quiet(), n);
    out.add(
        "Some mode grows in "
            + percent(loud)
            + " % of "
            + n
            + " samples (95 % interval "
            + percent(interval[0])
            + " to "
            + percent(interval[1])
            + " %).");
    ModeStatistics worst =
        a.modes().stream().max(Comparator.comparingDouble(ModeStatistics::grows)).orElse(null);
    if (worst != null && worst.grows() > 0) {
      out.add(
          "Likeliest to grow is the mode at "
              + Numbers.fixed(worst.nominal().s().getImaginary() / (2 * Math.PI), 1)
              + " Hz ("
              + worst.nominal().what()
              + "): "
              + percent(worst.grows())
              + " %; its growth rate is "
              + Numbers.signed(worst.growth()[0])
              + " ± "
              + Numbers.fixed(worst.growth()[1], 1)
              + " 1/s where the case as it stands has "
              + Numbers.signed(worst.nominal().s().getReal())
              + ".");
      matters(a, worst).forEach(out::add);
      double foretold = worst.second().orElse(worst.first());
      boolean outside =
          foretold < worst.interval()[0] - DISAGREE || foretold > worst.interval()[1] + DISAGREE;
      if (outside) {
        out.add(
            "Derivatives foretell "
                + percent(foretold)
                + " % for it and are NOT to be relied on here.");
      }
    }
    if (a.strangers() > 0) {
      out.add(
          "In "
              + a.strangers()
              + " samples a mode grows that lies outside the window in the case as it stands.");
    }
    int lost = a.modes().stream().mapToInt(m -> n - m.followed()).max().orElse(0);
    if (lost > 0) {
      out.add("The mode followed worst was lost in " + lost + " samples.");
    }
    out.add(
        (a.incomplete() == 0
                ? "The modes of every sample are confirmed; "
                : "In " + a.incomplete() + " samples the modes could NOT be confirmed; ")
            + a.checks()
            + String.format(
                Locale.ROOT,
                " samples solved again on the full operators differ by %.1e of |s| at most.",
                a.difference()));
    return out;
  }

  /** Which input matters most and what half its width would do. */
  private static List<String> matters(UncertaintyStudy.Answer a, ModeStatistics m) {
    List<Engine.Group> groups = a.engine().groups();
    int first = -1;
    int tighten = -1;
    for (int g = 0; g < groups.size(); g++) {
      if (!Double.isNaN(m.shares()[g]) && (first < 0 || m.shares()[g] > m.shares()[first])) {
        first = g;
      }
      if (tighten < 0 || m.tightened()[g] < m.tightened()[tighten]) {
        tighten = g;
      }
    }
    List<String> out = new ArrayList<>();
    if (first >= 0 && groups.size() > 1) {
      out.add(
          groups.get(first).name()
              + " makes "
              + percent(m.shares()[first])
              + " % of the variance of its growth rate (linear regression, which explains "
              + percent(m.explained())
              + " % in all).");
    }
    double foretold = m.second().orElse(m.first());
    if (tighten >= 0 && m.tightened()[tighten] < foretold - WORTH) {
      out.add(
          "By derivatives, half the width of "
              + groups.get(tighten).name()
              + " would bring its probability from "
              + percent(foretold)
              + " % to "
              + percent(m.tightened()[tighten])
              + " %.");
    } else if (m.nominal().s().getReal() > 0) {
      out.add("It grows in the case as it stands: no tolerance tightened makes it quieter.");
    }
    return out;
  }
}
