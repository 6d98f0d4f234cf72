package org.annulet.cases.compare;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.annulet.cases.compare.CompareStudy.Answer;
import org.annulet.cases.compare.CompareStudy.Compared;
import org.annulet.cases.compare.CompareStudy.Side;
import org.annulet.cases.study.ChainOfCase;
import org.annulet.post.table.Numbers;

/** The answer in plain sentences. */
final class CompareSentences {
  private CompareSentences() {}

  static List<String> all(Answer answer) {
    List<String> out = new ArrayList<>();
    answer.compared().forEach(c -> out.add(summary(c)));
    if (answer.chain().chain().isEmpty()) {
      out.add("No chain of ducts was made of the case: " + answer.chain().whyNot() + ".");
    }
    out.addAll(CompareStudy.failures(answer));
    return out;
  }

  static String title(Compared c) {
    return c.side() == Side.CHAIN
        ? "One-dimensional chain of ducts made from the case"
        : (c.side() == Side.MEASURED ? "Measured: " : "Network model: ") + c.name();
  }

  private static String summary(Compared c) {
    int both = 0;
    int agree = 0;
    int signs = 0;
    double worst = 0;
    double growth = 0;
    for (Line l : c.lines()) {
      if (l.match().both()) {
        both++;
        agree += l.verdict() == Line.Verdict.AGREES ? 1 : 0;
        worst =
            Math.max(
                worst,
                Math.abs(l.frequencyDifference()) / l.match().ours().orElseThrow().frequency());
        growth =
            Double.isNaN(l.growthDifference())
                ? growth
                : Math.max(growth, Math.abs(l.growthDifference()));
        signs += l.words().contains("GROWS") ? 1 : 0;
      }
    }
    StringBuilder b = new StringBuilder(title(c)).append(": ");
    b.append(both).append(both == 1 ? " match" : " matches");
    if (both > 0) {
      b.append(", ")
          .append(agree)
          .append(" within the bars; frequencies differ by ")
          .append(String.format(Locale.ROOT, "%.2g", 100 * worst))
          .append(" % at most, growth rates by ")
          .append(Numbers.fixed(growth, growth < 10 ? 2 : 0))
          .append(" 1/s");
    }
    corrected(c).ifPresent(b::append);
    count(c, Line.Verdict.ONLY_HERE, " only here").ifPresent(b::append);
    count(c, Line.Verdict.ONLY_THERE, " only there").ifPresent(b::append);
    count(c, Line.Verdict.AMBIGUOUS, " ambiguous").ifPresent(b::append);
    if (signs > 0) {
      b.append("; ").append(signs).append(" on the other side of stability");
    }
    return b.append('.').toString();
  }

  /** What is left of the frequency differences when near fields are added to the chain. */
  private static Optional<String> corrected(Compared c) {
    double worst = -1;
    for (Line l : c.lines()) {
      if (l.match().both() && l.nearField().isPresent()) {
        double left = Math.abs(l.frequencyDifference() + l.nearField().get()[0]);
        worst = Math.max(worst, left / l.match().ours().orElseThrow().frequency());
      }
    }
    return worst < 0
        ? Optional.empty()
        : Optional.of(
            String.format(
                Locale.ROOT,
                " (frequencies by %.2g %% at most once the near field at its steps is added by estimate)",
                100 * worst));
  }

  private static Optional<String> count(Compared c, Line.Verdict verdict, String words) {
    long n = c.lines().stream().filter(l -> l.verdict() == verdict).count();
    return n == 0 ? Optional.empty() : Optional.of("; " + n + words);
  }

  /** What the chain leaves out, in a sentence. */
  static String leftOut(ChainOfCase.Chain chain) {
    return chain.leftOut().isEmpty()
        ? "Of this case the chain leaves nothing out."
        : "The chain leaves out: " + String.join("; ", chain.leftOut()) + ".";
  }

  /** What near fields account for; empty where that is not known. */
  static String near(Line line) {
    return line.nearField()
        .map(d -> Numbers.signed(d[0]) + " Hz, " + Numbers.signed(d[1]) + " 1/s")
        .orElse("");
  }
}
