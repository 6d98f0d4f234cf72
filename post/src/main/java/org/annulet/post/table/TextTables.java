package org.annulet.post.table;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.annulet.post.meaning.Certificate;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.Results;
import org.annulet.solver.modes.Mode;

/** The table of modes for the terminal and as Markdown. */
public final class TextTables {
  private static final List<String> HEAD =
      List.of("no.", "m", "frequency [Hz]", "growth rate [1/s]", "", "mode", "verdict");

  private TextTables() {}

  /** For the terminal, ending with plain sentences. */
  public static String terminal(Results results) {
    List<List<String>> rows = rows(results);
    int[] width = new int[HEAD.size()];
    for (int k = 0; k < width.length; k++) {
      width[k] = HEAD.get(k).length();
      for (List<String> row : rows) {
        width[k] = Math.max(width[k], row.get(k).length());
      }
    }
    StringBuilder b = new StringBuilder();
    line(b, HEAD, width);
    for (int k = 0; k < width.length; k++) {
      b.append(k == 0 ? "" : "  ").append("─".repeat(width[k]));
    }
    b.append('\n');
    rows.forEach(row -> line(b, row, width));
    b.append('\n');
    Summary.sentences(results).forEach(s -> b.append(s).append('\n'));
    results.certificates().forEach(c -> b.append(c.sentence()).append('\n'));
    results.notes().forEach(s -> b.append("note: ").append(s).append('\n'));
    b.append("Sign: growth rate above zero grows. ").append(Summary.CAUTIONS.get(0)).append('\n');
    return b.toString();
  }

  /** As Markdown, with the certificates, notes and cautions. */
  public static String markdown(Results results) {
    StringBuilder b = new StringBuilder();
    b.append("# Modes of ").append(plain(results.caseName())).append("\n\n");
    Summary.sentences(results).forEach(s -> b.append(plain(s)).append("\n\n"));
    b.append("Window: ")
        .append(results.window().lowestFrequency())
        .append(" to ")
        .append(results.window().highestFrequency())
        .append(" Hz, ")
        .append(results.window().lowestGrowth())
        .append(" to ")
        .append(results.window().highestGrowth())
        .append(" 1/s. ")
        .append(Results.SIGN_CONVENTION)
        .append(".\n\n|");
    HEAD.forEach(h -> b.append(' ').append(h).append(" |"));
    b.append("\n|").append(" --- |".repeat(HEAD.size())).append('\n');
    for (List<String> row : rows(results)) {
      b.append('|');
      row.forEach(c -> b.append(' ').append(plain(c)).append(" |"));
      b.append('\n');
    }
    b.append("\n## Certificate\n\n");
    for (Certificate c : results.certificates()) {
      b.append("- ").append(plain(c.sentence())).append('\n');
      c.notes().forEach(n -> b.append("  - ").append(plain(n)).append('\n'));
    }
    results.notes().forEach(n -> b.append("- ").append(plain(n)).append('\n'));
    b.append("\n## Cautions\n\n");
    Summary.CAUTIONS.forEach(c -> b.append("- ").append(c).append('\n'));
    b.append("\nMade by annulet ").append(plain(results.programVersion())).append(".\n");
    return b.toString();
  }

  private static List<List<String>> rows(Results results) {
    List<List<String>> rows = new ArrayList<>();
    for (int i = 0; i < results.modes().size(); i++) {
      ModeEntry e = results.modes().get(i);
      Mode mode = e.view().mode();
      rows.add(
          List.of(
              Integer.toString(i + 1),
              e.label().azimuthalOrder() == null ? "–" : e.label().azimuthalOrder().toString(),
              Numbers.withError(mode.frequency(), e.view().frequencyError()),
              Numbers.withError(mode.growthRate(), e.view().growthError()),
              switch (e.stability()) {
                case GROWS -> "GROWS";
                case DECAYS -> "decays";
                case UNDECIDED -> "undecided";
              },
              e.label().text(),
              mode.verdict().name().toLowerCase(Locale.ROOT).replace('_', ' ')));
    }
    return rows;
  }

  private static void line(StringBuilder b, List<String> cells, int[] width) {
    StringBuilder row = new StringBuilder();
    for (int k = 0; k < width.length; k++) {
      String pad = " ".repeat(width[k] - cells.get(k).length());
      boolean right = k < 4;
      row.append(k == 0 ? "" : "  ")
          .append(right ? pad : "")
          .append(cells.get(k))
          .append(right ? "" : pad);
    }
    b.append(row.toString().stripTrailing()).append('\n');
  }

  /** Text that Markdown shows as it is. */
  private static String plain(String text) {
    return text.replaceAll("([\\\\`*_{}\\[\\]<>|#])", "\\\\$1").replace('\n', ' ');
  }
}
