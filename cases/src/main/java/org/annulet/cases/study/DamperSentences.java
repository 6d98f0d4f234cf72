package org.annulet.cases.study;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.TreeSet;
import java.util.stream.Collectors;

/** What a damper study found, in sentences. */
final class DamperSentences {
  private final DamperStudy.Answer answer;

  DamperSentences(DamperStudy.Answer answer) {
    this.answer = answer;
  }

  List<String> all() {
    List<String> out = new ArrayList<>();
    double best = answer.outcome().best().get(0).worst();
    out.add(
        "Without these dampers the fastest-growing mode from "
            + Words.fixed(answer.search().lowestFrequency(), 0)
            + " to "
            + Words.fixed(answer.search().highestFrequency(), 0)
            + " Hz has "
            + Words.growth(answer.undamped())
            + " 1/s; with the best pattern "
            + worst(best)
            + ".");
    if (best > 0) {
      out.add("The best pattern does not quieten the chamber: a mode still grows.");
    }
    even(best, out);
    out.add(search());
    tuning(best, out);
    robustness(best, out);
    out.add(check());
    return out;
  }

  private String worst(double growth) {
    return Double.isInfinite(growth)
        ? "no mode of the window is left, so every one decays faster than "
            + Words.fixed(answer.ports().window().lowestGrowth(), 0)
            + " 1/s"
        : Words.growth(growth) + " 1/s";
  }

  private void even(double best, List<String> out) {
    DamperRanking.Ranked even = answer.outcome().even();
    if (even == null) {
      return;
    }
    double loss = even.worst() - best;
    if (loss < 1e-3) {
      out.add("The best evenly spaced pattern is as good.");
    } else {
      out.add(
          "The best evenly spaced pattern leaves "
              + worst(even.worst())
              + ", worse by "
              + Words.fixed(loss, loss < 1 ? 3 : 1)
              + " 1/s.");
    }
    TreeSet<Integer> split =
        answer.fates().stream()
            .filter(f -> f.even().length == 2 && f.factorEven() > 0.99)
            .map(DamperStudy.Fate::order)
            .collect(Collectors.toCollection(TreeSet::new));
    if (!split.isEmpty()) {
      out.add(
          "Even spacing puts all dampers where one member of the pairs of order "
              + split.stream().map(String::valueOf).collect(Collectors.joining(", "))
              + " has its nodes: that member stays as it was. K equal dampers split order m exactly"
              + " when K divides 2m on a ring uniform in angle; with burners orders that differ by"
              + " their number count as one.");
    }
  }

  private String search() {
    DamperRanking.Outcome o = answer.outcome();
    if (!o.everyOne()) {
      return "There are "
          + o.all()
          + " patterns, too many to look at all: exchange searches from several seeded starts"
          + " looked at "
          + o.distinct()
          + ". No single change of place improves the pattern shown; that none at all does is not"
          + " proven.";
    }
    return "All "
        + o.all()
        + " patterns are covered: "
        + o.distinct()
        + " after leaving out turned and mirrored ones, each at the dampers' true strength"
        + (o.dropped() > 0
            ? "; "
                + o.dropped()
                + " were dropped as soon as one of their modes was seen to be worse than the tenth"
                + " best"
            : "")
        + ".";
  }

  private void tuning(double best, List<String> out) {
    for (DamperTuning.OfDesign d : answer.tuning()) {
      boolean better = d.frequency().worst() < best - 0.01 || d.resistance().worst() < best - 0.01;
      out.add(
          "Design "
              + d.name()
              + (better
                  ? " would do better: tuned to "
                      + Words.fixed(d.frequency().best(), 1)
                      + " Hz instead of "
                      + Words.fixed(d.frequency().given(), 1)
                      + " Hz it leaves "
                      + worst(d.frequency().worst())
                      + ", with a resistance of "
                      + Words.fixed(d.resistance().best(), 3)
                      + " instead of "
                      + Words.fixed(d.resistance().given(), 3)
                      + " it leaves "
                      + worst(d.resistance().worst())
                      + ", in this pattern, one change at a time."
                  : " is at its best in tuning and resistance for this pattern."));
    }
  }

  private void robustness(double best, List<String> out) {
    DamperTuning.Robustness r = answer.robustness();
    double failed =
        Arrays.stream(r.failed()).filter(x -> !Double.isNaN(x)).max().orElse(Double.NaN);
    out.add(
        "All dampers tuned 5 % too low leave "
            + worst(r.tooLow())
            + ", 5 % too high "
            + worst(r.tooHigh())
            + "; with one of them shut, in the worst case "
            + worst(failed)
            + ".");
  }

  private String check() {
    DamperStudy.Check c = answer.check();
    return answer.certified()
        ? "The best pattern was solved again on the full operator: "
            + c.modes().size()
            + " modes, largest difference "
            + String.format(java.util.Locale.ROOT, "%.1e", c.difference())
            + " 1/s, largest backward error "
            + String.format(java.util.Locale.ROOT, "%.0e", c.residual())
            + "; the argument principle confirms that none is missing."
        : "NOT CERTIFIED: "
            + reasons().stream().collect(Collectors.joining("; "))
            + ". Take the answer as a hint only.";
  }

  private List<String> reasons() {
    List<String> why = new ArrayList<>();
    if (!answer.ports().complete()) {
      why.add("the modes without dampers could not be certified");
    }
    if (answer.ports().transfer().error() >= DamperStudy.WORST_TRANSFER) {
      why.add("the condensation onto the ports is not exact enough");
    }
    if (answer.outcome().unsure() > 0 || !answer.check().counted()) {
      why.add("the count did not confirm the modes of every pattern");
    }
    if (why.isEmpty()) {
      why.add("the full operator does not confirm the modes found on the ports");
    }
    return why;
  }
}
