package org.annulet.post.table;

import java.util.Comparator;
import java.util.List;
import java.util.Map;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.Results;

/** Variants of one case, one line each: its least stable mode and whether it is certified. */
public final class VariantTable {
  private VariantTable() {}

  /**
   * For the terminal.
   *
   * @param byVariant results by name of the variant, in the order to be listed
   */
  public static String terminal(Map<String, Results> byVariant) {
    int width = byVariant.keySet().stream().mapToInt(String::length).max().orElse(0);
    StringBuilder b = new StringBuilder("Least stable mode of each variant\n");
    byVariant.forEach(
        (name, results) ->
            b.append("  ")
                .append(name)
                .append(" ".repeat(width - name.length() + 2))
                .append(line(results))
                .append('\n'));
    return b.toString();
  }

  private static String line(Results results) {
    List<ModeEntry> modes = results.modes();
    String certified = results.complete() ? "" : "  NOT certified complete";
    return modes.stream()
            .max(Comparator.comparingDouble(e -> e.view().mode().growthRate()))
            .map(VariantTable::mode)
            .orElse("no mode in the window")
        + certified;
  }

  private static String mode(ModeEntry e) {
    String verdict =
        switch (e.stability()) {
          case GROWS -> "GROWS ";
          case DECAYS -> "decays";
          case UNDECIDED -> "open  ";
        };
    return verdict
        + "  "
        + Numbers.withError(e.view().mode().growthRate(), e.view().growthError())
        + " 1/s at "
        + Numbers.withError(e.view().mode().frequency(), e.view().frequencyError())
        + " Hz, "
        + e.label().text();
  }
}
