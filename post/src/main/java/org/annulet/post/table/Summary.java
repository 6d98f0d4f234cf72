package org.annulet.post.table;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.annulet.post.meaning.GrowthBudget;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.ModeEntry.Stability;
import org.annulet.post.meaning.ParameterSensitivity;
import org.annulet.post.meaning.Results;

/** The answer in plain sentences: how many modes, which grow, what drives and damps the worst. */
public final class Summary {
  /** The caution every result carries. */
  public static final List<String> CAUTIONS =
      List.of(
          "A computed growth rate does not clear an engine to run.",
          "Zero mean flow, linear acoustics and a given flame response are assumed.",
          "Stability is shown by test under the responsible engineer, the maker's limits and local"
              + " codes.");

  /** Inputs named in the sentence on sensitivities. */
  private static final int NAMED = 3;

  private Summary() {}

  /** The sentences. */
  public static List<String> sentences(Results results) {
    List<String> out = new ArrayList<>();
    int n = results.modes().size();
    List<ModeEntry> grow =
        results.modes().stream().filter(e -> e.stability() == Stability.GROWS).toList();
    long open = results.modes().stream().filter(e -> e.stability() == Stability.UNDECIDED).count();
    out.add(
        count(n, "mode")
            + " in the window, "
            + (results.complete() ? "certified complete" : "NOT certified complete")
            + "; "
            + (grow.isEmpty() ? "none grows" : count(grow.size(), "mode") + " grow" + s(grow))
            + (open > 0 ? ", " + open + " undecided (zero lies inside the error)" : "")
            + ".");
    Optional<ModeEntry> worst =
        results.modes().stream().max(Comparator.comparingDouble(e -> e.view().mode().growthRate()));
    worst.ifPresent(e -> out.add(worst(results.modes().indexOf(e) + 1, e)));
    return out;
  }

  private static String s(List<ModeEntry> grow) {
    return grow.size() == 1 ? "s" : "";
  }

  private static String worst(int number, ModeEntry e) {
    String head =
        "Least stable is mode "
            + number
            + ", "
            + Numbers.withError(e.view().mode().frequency(), e.view().frequencyError(), "Hz")
            + " ("
            + e.label().text()
            + "), growth rate "
            + Numbers.withError(e.view().mode().growthRate(), e.view().growthError(), "1/s");
    if (e.budget().isEmpty()) {
      return head + "." + perPercent(e);
    }
    GrowthBudget budget = e.budget().get();
    return head
        + "; driven by "
        + named(budget.drivers())
        + ", damped by "
        + named(budget.dampers())
        + "."
        + perPercent(e);
  }

  /** What one percent more of the strongest inputs does; empty where that was not computed. */
  private static String perPercent(ModeEntry e) {
    List<ParameterSensitivity> top =
        e.sensitivities().stream()
            .filter(p -> p.growthPerPercent() != 0 && !isGasProperty(p.key()))
            .limit(NAMED)
            .toList();
    if (top.isEmpty()) {
      return "";
    }
    StringBuilder b = new StringBuilder(" Its growth rate moves per percent more of ");
    for (int k = 0; k < top.size(); k++) {
      ParameterSensitivity p = top.get(k);
      b.append(k == 0 ? "" : k + 1 == top.size() ? " and of " : ", of ")
          .append(p.key())
          .append(" by ")
          .append(Numbers.signed(p.growthPerPercent()))
          .append(k == 0 ? " 1/s" : "");
    }
    return b.append('.').toString();
  }

  /** γ and R follow from the mixture: nobody turns them alone, so they are no lever to name. */
  private static boolean isGasProperty(String key) {
    return key.endsWith(".gamma") || key.endsWith(".gas_constant");
  }

  private static String named(List<GrowthBudget.Item> items) {
    if (items.isEmpty()) {
      return "nothing";
    }
    GrowthBudget.Item first = items.get(0);
    String text = first.name() + " (" + Numbers.signed(first.growthShare()) + " 1/s)";
    if (items.size() == 1) {
      return text;
    }
    double rest = items.stream().skip(1).mapToDouble(GrowthBudget.Item::growthShare).sum();
    return text + " and " + (items.size() - 1) + " more (" + Numbers.signed(rest) + " 1/s)";
  }

  private static String count(int n, String noun) {
    return n + " " + noun + (n == 1 ? "" : "s");
  }
}
