package org.annulet.cases.book;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.OptionalDouble;
import org.annulet.post.chart.ConvergenceChart;
import org.annulet.post.chart.Svg;
import org.annulet.post.files.WholeFile;
import org.annulet.post.meaning.Results;
import org.annulet.post.table.Numbers;

/** The solved book as text for the terminal, as CSV and as a page in Markdown with a chart. */
public final class BookFiles {
  private static final String PAGE = "validation.md";
  private static final String TABLE = "validation.csv";
  private static final String CHART = "convergence.svg";

  private BookFiles() {}

  /** Writes {@value #PAGE}, {@value #TABLE} and {@value #CHART}. */
  public static void write(Path folder, Solved book) throws IOException {
    WholeFile.write(folder.resolve(PAGE), page(book));
    WholeFile.write(folder.resolve(TABLE), csv(book));
    WholeFile.write(folder.resolve(CHART), Svg.standalone(chart(book)));
  }

  /** Every value in a line, and a plain sentence at the end. */
  public static String terminal(Solved book) {
    StringBuilder b = new StringBuilder();
    for (int k = 0; k < book.chambers().size(); k++) {
      SolvedChamber c = book.chambers().get(k);
      b.append("── ").append(c.results().caseName()).append(" (").append(c.name()).append(")\n");
      c.comparisons().forEach(v -> b.append(line(v)).append('\n'));
      b.append("  ").append(verdict(c, book.convergence().get(k))).append('\n');
      sources(c).forEach(s -> b.append("  source: ").append(s).append('\n'));
      b.append('\n');
    }
    b.append("── Laws of gas, dampers and nozzle\n");
    for (LawCheck law : book.laws()) {
      b.append(
          String.format(
              Locale.ROOT,
              "  %-4s %-8s %s: ours %.8g, theirs %.8g, allowed ±%.2g (%s)%n",
              word(law.passes()),
              law.row(),
              law.quantity(),
              law.ours(),
              law.theirs(),
              law.tolerance(),
              law.source()));
    }
    return b.append('\n').append(sentence(book)).append('\n').toString();
  }

  /** How many values are met. */
  public static String sentence(Solved book) {
    return String.format(
        Locale.ROOT,
        "%d of %d known values are met, the modes within the error bars the program itself gives;"
            + " %d of %d chambers are certified with no mode missing or too many.",
        book.passCount(),
        book.valueCount(),
        book.chambers().stream().filter(SolvedChamber::passes).count(),
        book.chambers().size());
  }

  private static String line(Comparison v) {
    KnownValue k = v.known();
    String order = k.order().isPresent() ? " m=" + k.order().getAsInt() : "";
    if (v.ours().isEmpty()) {
      return String.format(
          Locale.ROOT,
          "  FAIL %-8s%s theirs %.5f Hz %+.4f 1/s: not found",
          k.row(),
          order,
          k.frequency(),
          k.growthRate());
    }
    return String.format(
        Locale.ROOT,
        "  %-4s %-8s%s theirs %.5f Hz %+.4f 1/s, ours %s Hz %s 1/s, difference %+.2g Hz %+.2g 1/s",
        word(v.passes()),
        k.row(),
        order,
        k.frequency(),
        k.growthRate(),
        frequency(v),
        growth(v),
        v.frequencyDifference(),
        v.growthDifference());
  }

  private static String verdict(SolvedChamber c, Convergence convergence) {
    return String.format(
        Locale.ROOT,
        "%s, %d triangles at the finest, observed order of convergence %s%s",
        c.results().complete() ? "certified complete" : "NOT certified",
        convergence.triangles()[convergence.triangles().length - 1],
        order(convergence.observedOrder()),
        c.unknown().isEmpty()
            ? ""
            : "; " + c.unknown().size() + " modes that the book does not know");
  }

  private static List<String> sources(SolvedChamber c) {
    return c.comparisons().stream().map(v -> v.known().source()).distinct().toList();
  }

  private static String csv(Solved book) {
    StringBuilder b =
        new StringBuilder(
            "row,chamber,azimuthal_order,frequency_known_hz,growth_rate_known_per_s,frequency_hz,"
                + "growth_rate_per_s,frequency_error_hz,growth_rate_error_per_s,pass,source\n");
    for (SolvedChamber c : book.chambers()) {
      for (Comparison v : c.comparisons()) {
        KnownValue k = v.known();
        List<String> cells = new ArrayList<>();
        cells.add(k.row());
        cells.add(k.chamber());
        cells.add(k.order().isPresent() ? Integer.toString(k.order().getAsInt()) : "");
        cells.add(Double.toString(k.frequency()));
        cells.add(Double.toString(k.growthRate()));
        cells.add(v.ours().map(o -> Double.toString(o.mode().frequency())).orElse(""));
        cells.add(v.ours().map(o -> Double.toString(o.mode().growthRate())).orElse(""));
        cells.add(v.ours().map(o -> Double.toString(o.frequencyError())).orElse(""));
        cells.add(v.ours().map(o -> Double.toString(o.growthError())).orElse(""));
        cells.add(Boolean.toString(v.passes()));
        cells.add('"' + k.source().replace("\"", "\"\"") + '"');
        b.append(String.join(",", cells)).append('\n');
      }
    }
    return b.toString();
  }

  private static String page(Solved book) {
    StringBuilder b = new StringBuilder();
    b.append("# Validation book\n\n")
        .append("Written by `annulet verify`; every number is computed anew on the machine it runs")
        .append(" on. ")
        .append(sentence(book))
        .append("\n\n")
        .append("Sign: ")
        .append(Results.SIGN_CONVENTION)
        .append(". The error bars are those the program gives for its own mesh, before it knows")
        .append(" the answer. Row names are those of the project's collection of reference")
        .append(" values.\n\n![Errors of all chambers over the number of triangles](")
        .append(CHART)
        .append(")\n\n## Chambers\n");
    for (int k = 0; k < book.chambers().size(); k++) {
      SolvedChamber c = book.chambers().get(k);
      b.append("\n### ").append(c.results().caseName()).append("\n\n");
      b.append("Case `")
          .append(c.name())
          .append("`: ")
          .append(verdict(c, book.convergence().get(k)));
      b.append(".\n\n| row | m | known [Hz] | known [1/s] | ours [Hz] | ours [1/s] | Δ [Hz] |");
      b.append(" Δ [1/s] | pass |\n").append("|---".repeat(9)).append("|\n");
      for (Comparison v : c.comparisons()) {
        KnownValue w = v.known();
        b.append(
            String.format(
                Locale.ROOT,
                "| %s | %s | %.5f | %.4f | %s | %s | %.2g | %.2g | %s |%n",
                w.row(),
                w.order().isPresent() ? w.order().getAsInt() : "",
                w.frequency(),
                w.growthRate(),
                frequency(v),
                growth(v),
                v.frequencyDifference(),
                v.growthDifference(),
                word(v.passes())));
      }
      sources(c).forEach(s -> b.append("\nSource: ").append(s).append(".\n"));
    }
    b.append("\n## Laws of gas, dampers and nozzle\n\n| row | quantity | known | ours | allowed |")
        .append(" pass | source |\n")
        .append("|---".repeat(7))
        .append("|\n");
    for (LawCheck law : book.laws()) {
      b.append(
          String.format(
              Locale.ROOT,
              "| %s | %s | %.8g | %.8g | ±%.2g | %s | %s |%n",
              law.row(),
              law.quantity().replace("|", "\\|"),
              law.theirs(),
              law.ours(),
              law.tolerance(),
              word(law.passes()),
              law.source()));
    }
    return b.append("\nMade by ").append(book.version()).append(".\n").toString();
  }

  private static String chart(Solved book) {
    return ConvergenceChart.svg(
        book.convergence().stream()
            .map(c -> new ConvergenceChart.Line(c.chamber(), c.triangles(), c.worst()))
            .toList(),
        760,
        460);
  }

  private static String frequency(Comparison v) {
    return v.ours()
        .map(o -> Numbers.withError(o.mode().frequency(), o.frequencyError()))
        .orElse("not found");
  }

  private static String growth(Comparison v) {
    return v.ours()
        .map(o -> Numbers.withError(o.mode().growthRate(), o.growthError()))
        .orElse("not found");
  }

  private static String order(OptionalDouble order) {
    return order.isPresent()
        ? String.format(Locale.ROOT, "%.2f", order.getAsDouble())
        : "not seen, errors are rounding";
  }

  private static String word(boolean pass) {
    return pass ? "ok" : "FAIL";
  }
}
