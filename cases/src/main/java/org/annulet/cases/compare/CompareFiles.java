package org.annulet.cases.compare;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.annulet.cases.compare.CompareStudy.Answer;
import org.annulet.cases.compare.CompareStudy.Compared;
import org.annulet.cases.compare.CompareStudy.Side;
import org.annulet.cases.read.ModeTable;
import org.annulet.cases.study.ChainOfCase;
import org.annulet.post.files.WholeFile;
import org.annulet.post.report.StudyPage;
import org.annulet.post.table.JsonWriter;
import org.annulet.post.table.Numbers;
import org.annulet.post.table.Summary;

/**
 * Writes a {@link CompareStudy}: {@code compare.csv}, {@code compare.json}, {@code compare.html}.
 */
public final class CompareFiles {
  private static final List<String> HEAD =
      List.of(
          "no.",
          "m",
          "frequency [Hz]",
          "growth rate [1/s]",
          "row",
          "theirs [Hz]",
          "theirs [1/s]",
          "shape",
          "verdict");

  private CompareFiles() {}

  /**
   * Writes all files.
   *
   * @param folder made if absent; files of an earlier run are replaced
   * @param version of the program
   * @throws IOException if the folder cannot be written
   */
  public static void write(Path folder, CompareStudy.Result result, String version)
      throws IOException {
    Answer answer = result.answer();
    Files.createDirectories(folder);
    WholeFile.write(folder.resolve("compare.csv"), csv(answer));
    WholeFile.write(folder.resolve("compare.json"), json(answer, result.certified()));
    WholeFile.write(folder.resolve("compare.html"), page(answer, result.certified(), version));
  }

  /** Tables and sentences for a terminal. */
  public static String terminal(CompareStudy.Result result) {
    Answer answer = result.answer();
    StringBuilder b = new StringBuilder();
    for (Compared c : answer.compared()) {
      b.append("── ").append(CompareSentences.title(c)).append('\n');
      List<List<String>> rows = new ArrayList<>();
      c.lines().forEach(l -> rows.add(cells(l)));
      table(b, HEAD, rows);
      for (Line l : c.lines()) {
        l.levers()
            .forEach(v -> b.append("mode ").append(number(l)).append(", ").append(v).append('\n'));
      }
      b.append('\n');
    }
    CompareSentences.all(answer).forEach(s -> b.append(s).append('\n'));
    answer.chain().chain().ifPresent(c -> b.append(CompareSentences.leftOut(c)).append('\n'));
    b.append("Differences are theirs less ours. Sign: growth rate above zero grows. ")
        .append(Summary.CAUTIONS.get(0));
    return b.toString();
  }

  private static void table(StringBuilder b, List<String> head, List<List<String>> rows) {
    int[] width = new int[head.size()];
    for (int k = 0; k < width.length; k++) {
      width[k] = head.get(k).length();
      for (List<String> row : rows) {
        width[k] = Math.max(width[k], row.get(k).length());
      }
    }
    List<List<String>> all = new ArrayList<>(List.of(head));
    all.addAll(rows);
    for (List<String> row : all) {
      StringBuilder line = new StringBuilder();
      for (int k = 0; k < width.length; k++) {
        String pad = " ".repeat(width[k] - row.get(k).length());
        boolean last = k + 1 == width.length;
        line.append(k == 0 ? "" : "  ").append(last ? "" : pad).append(row.get(k));
      }
      b.append(line.toString().stripTrailing()).append('\n');
    }
  }

  private static String number(Line l) {
    int own = l.match().ours().map(OurMode::number).orElse(0);
    int other = l.match().second().map(OurMode::number).orElse(own);
    return own == 0
        ? "–"
        : other == own ? Integer.toString(own) : Math.min(own, other) + "+" + Math.max(own, other);
  }

  /** The cells of a line under {@link #HEAD}. */
  private static List<String> cells(Line l) {
    int order =
        l.match()
            .ours()
            .map(OurMode::order)
            .orElseGet(() -> l.match().theirs().map(ModeTable.Row::order).orElse(-1));
    return List.of(
        number(l),
        order < 0 ? "–" : Integer.toString(order),
        l.match().ours().map(o -> Numbers.withError(o.frequency(), o.frequencyError())).orElse("–"),
        l.match().ours().map(o -> Numbers.withError(o.growthRate(), o.growthError())).orElse("–"),
        l.match().row() == 0 ? "–" : Integer.toString(l.match().row()),
        l.match().theirs().map(t -> stated(t.frequency(), t.frequencyTolerance())).orElse("–"),
        l.match()
            .theirs()
            .map(t -> t.hasGrowth() ? stated(t.growthRate(), t.growthTolerance()) : "–")
            .orElse("–"),
        Double.isNaN(l.match().correlation()) ? "–" : Numbers.fixed(l.match().correlation(), 3),
        l.words());
  }

  private static String stated(double value, double tolerance) {
    return tolerance > 0 ? Numbers.withError(value, tolerance) : Numbers.fixed(value, 3);
  }

  private static String csv(Answer answer) {
    StringBuilder b =
        new StringBuilder(
            "table,source,verdict,mode,second_mode,azimuthal_order,frequency_hz,frequency_error_hz,"
                + "growth_rate_per_s,growth_rate_error_per_s,row,their_azimuthal_order,"
                + "their_frequency_hz,their_frequency_tolerance_hz,their_growth_rate_per_s,"
                + "their_growth_tolerance_per_s,frequency_difference_hz,growth_difference_per_s,"
                + "frequency_difference_bars,growth_difference_bars,shape_correlation,"
                + "near_field_hz,near_field_per_s,words\n");
    for (Compared c : answer.compared()) {
      for (Line l : c.lines()) {
        List<String> row = new ArrayList<>();
        row.add(c.name());
        row.add(c.side().words());
        row.add(verdict(l));
        row.add(l.match().ours().map(o -> Integer.toString(o.number())).orElse(""));
        row.add(l.match().second().map(o -> Integer.toString(o.number())).orElse(""));
        row.add(l.match().ours().map(o -> whole(o.order())).orElse(""));
        row.add(l.match().ours().map(o -> plain(o.frequency())).orElse(""));
        row.add(l.match().ours().map(o -> plain(o.frequencyError())).orElse(""));
        row.add(l.match().ours().map(o -> plain(o.growthRate())).orElse(""));
        row.add(l.match().ours().map(o -> plain(o.growthError())).orElse(""));
        row.add(l.match().row() == 0 ? "" : Integer.toString(l.match().row()));
        row.add(l.match().theirs().map(t -> whole(t.order())).orElse(""));
        row.add(l.match().theirs().map(t -> plain(t.frequency())).orElse(""));
        row.add(l.match().theirs().map(t -> plain(t.frequencyTolerance())).orElse(""));
        row.add(l.match().theirs().map(t -> plain(t.growthRate())).orElse(""));
        row.add(l.match().theirs().map(t -> plain(t.growthTolerance())).orElse(""));
        row.add(plain(l.frequencyDifference()));
        row.add(plain(l.growthDifference()));
        row.add(plain(l.frequencyBars()));
        row.add(plain(l.growthBars()));
        row.add(plain(l.match().correlation()));
        row.add(l.nearField().map(d -> plain(d[0])).orElse(""));
        row.add(l.nearField().map(d -> plain(d[1])).orElse(""));
        List<String> words = new ArrayList<>(List.of(l.words()));
        words.addAll(l.levers());
        row.add(quoted(String.join("; ", words)));
        b.append(String.join(",", row)).append('\n');
      }
    }
    return b.toString();
  }

  private static String verdict(Line l) {
    return l.verdict().name().toLowerCase(Locale.ROOT).replace('_', ' ');
  }

  private static String whole(int n) {
    return n < 0 ? "" : Integer.toString(n);
  }

  private static String plain(double v) {
    return Double.isFinite(v) ? Double.toString(v) : "";
  }

  private static String quoted(String text) {
    return '"' + text.replace("\"", "\"\"") + '"';
  }

  private static String json(Answer answer, boolean certified) {
    JsonWriter w = new JsonWriter();
    w.object()
        .text("case", answer.modes().results().caseName())
        .truth("certified", certified)
        .array("comparisons");
    for (Compared c : answer.compared()) {
      w.object()
          .text("table", c.name())
          .text("source", c.side().words())
          .text("about", c.about())
          .array("lines");
      for (Line l : c.lines()) {
        w.object().text("verdict", verdict(l)).text("words", l.words());
        l.match()
            .ours()
            .ifPresent(
                o ->
                    w.number("mode", (long) o.number())
                        .text("label", o.label())
                        .numberOrNull("azimuthal_order", o.order() < 0 ? null : o.order())
                        .number("frequency_hz", o.frequency())
                        .number("frequency_error_hz", o.frequencyError())
                        .number("growth_rate_per_s", o.growthRate())
                        .number("growth_rate_error_per_s", o.growthError()));
        l.match().second().ifPresent(o -> w.number("second_mode", (long) o.number()));
        l.match()
            .theirs()
            .ifPresent(
                t ->
                    w.number("row", (long) l.match().row())
                        .number("their_frequency_hz", t.frequency())
                        .number("their_frequency_tolerance_hz", t.frequencyTolerance())
                        .number("their_growth_rate_per_s", t.growthRate())
                        .number("their_growth_tolerance_per_s", t.growthTolerance())
                        .numberOrNull("their_azimuthal_order", t.order() < 0 ? null : t.order()));
        if (l.match().both()) {
          w.number("frequency_difference_hz", l.frequencyDifference())
              .number("growth_difference_per_s", l.growthDifference())
              .number("frequency_difference_bars", l.frequencyBars())
              .number("growth_difference_bars", l.growthBars())
              .number("shape_correlation", l.match().correlation());
        }
        l.nearField().ifPresent(d -> w.numbers("near_field_hz_and_per_s", d));
        if (!l.levers().isEmpty()) {
          w.text("would_close_it", String.join("; ", l.levers()));
        }
        w.endObject();
      }
      w.endArray().endObject();
    }
    w.endArray();
    if (answer.chain().chain().isPresent()) {
      w.text("chain_leaves_out", String.join("; ", answer.chain().chain().get().leftOut()));
    } else {
      w.text("no_chain_because", answer.chain().whyNot());
    }
    return w.endObject() + "\n";
  }

  private static String page(Answer answer, boolean certified, String version) {
    StudyPage page =
        new StudyPage("Comparison of modes", answer.modes().results().caseName(), version);
    if (certified) {
      page.certified("our modes are certified complete");
    } else {
      page.notCertified("NOT certified");
    }
    page.answer(CompareSentences.all(answer));
    for (Compared c : answer.compared()) {
      page.part(CompareSentences.title(c));
      if (!c.about().isEmpty()) {
        page.paragraph(c.about());
      }
      boolean near = c.lines().stream().anyMatch(l -> l.nearField().isPresent());
      page.figure(
          ComparisonChart.svg(c.lines()),
          "Growth rate over frequency: dots are ours, rings theirs, lines join what was matched.");
      List<String> head = new ArrayList<>(HEAD);
      if (near) {
        head.add("near fields would move theirs by");
      }
      List<List<String>> rows = new ArrayList<>();
      for (Line l : c.lines()) {
        List<String> row = new ArrayList<>(cells(l));
        if (near) {
          row.add(CompareSentences.near(l));
        }
        rows.add(row);
      }
      page.table(head, rows);
      for (Line l : c.lines()) {
        l.levers().forEach(v -> page.paragraph("Mode " + number(l) + ", " + v + "."));
      }
      if (c.side() == Side.CHAIN) {
        ChainOfCase.Chain chain = answer.chain().chain().orElseThrow();
        page.paragraph(CompareSentences.leftOut(chain));
        ChainWords.of(chain).forEach(page::paragraph);
      }
    }
    page.part("How they were matched")
        .paragraph(
            "One to one, with the least sum over all rows of the distance in s and, where shapes are"
                + " given, of what their correlation (modal assurance criterion) lacks to 1."
                + " Different azimuthal orders never match. A match is ambiguous where the best"
                + " assignment without it is nearly as good. An azimuthal pair may stand as one row"
                + " there. Bars are our estimate of the mesh error and their tolerance together;"
                + " they do not hold what both models leave out.");
    return page.html();
  }
}
