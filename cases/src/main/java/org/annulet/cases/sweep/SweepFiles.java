package org.annulet.cases.sweep;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.Sweep;
import org.annulet.cases.study.PointMode;
import org.annulet.post.chart.Svg;
import org.annulet.post.files.WholeFile;
import org.annulet.post.table.JsonWriter;
import org.annulet.post.table.Numbers;
import org.annulet.solver.modes.Window;

/**
 * Writes a {@link SweepStudy}: {@code sweep.csv} with every mode of every point, {@code
 * sweep-edges.csv} with the solved edges, {@code sweep.json}, {@code sweep.svg} and the page {@code
 * sweep.html}.
 */
public final class SweepFiles {
  private SweepFiles() {}

  /**
   * Writes all files.
   *
   * @param folder made if absent; files of an earlier run are replaced
   * @param version of the program
   * @throws IOException if the folder cannot be written
   */
  public static void write(Path folder, SweepStudy.Result result, String version)
      throws IOException {
    SweepStudy.Answer answer = result.answer();
    Files.createDirectories(folder);
    WholeFile.write(folder.resolve("sweep.csv"), csv(answer));
    WholeFile.write(folder.resolve("sweep-edges.csv"), edges(answer));
    WholeFile.write(folder.resolve("sweep.json"), json(answer));
    WholeFile.write(folder.resolve("sweep.svg"), Svg.standalone(SweepPage.picture(answer)));
    WholeFile.write(folder.resolve("sweep.html"), SweepPage.html(answer, version));
  }

  /** The answer in sentences and the stretches of growth, for a terminal. */
  public static String terminal(SweepStudy.Result result) {
    SweepStudy.Answer answer = result.answer();
    StringBuilder b = new StringBuilder();
    new SweepSentences(answer).all().forEach(s -> b.append(s).append('\n'));
    if (!answer.stretches().isEmpty()) {
      b.append('\n')
          .append("Growing, over ")
          .append(answer.grid().sweep().along().name())
          .append(":\n");
      List<Object> heads = List.of("mode", "from", "to", "peak 1/s", "at", "Hz", "of");
      b.append(
          String.format(Locale.ROOT, "%4s  %12s  %12s  %9s  %10s  %8s  %s%n", heads.toArray()));
      for (List<String> r : rows(answer)) {
        b.append(String.format(Locale.ROOT, "%4s  %12s  %12s  %9s  %10s  %8s  %s%n", r.toArray()));
      }
    }
    return b.toString().stripTrailing();
  }

  static List<List<String>> rows(SweepStudy.Answer answer) {
    Sweep.Axis axis = answer.grid().sweep().along();
    List<List<String>> rows = new ArrayList<>();
    for (SweepLine.Stretch s : answer.stretches()) {
      rows.add(
          List.of(
              Integer.toString(s.track().number()),
              end(axis, s.from(), s.opens()),
              end(axis, s.to(), s.closes()),
              Numbers.signed(s.peak()),
              SweepSentences.number(axis.shown(s.peakAt())),
              Numbers.fixed(s.peakFrequency(), 1),
              SweepSentences.described(s.track())));
    }
    return rows;
  }

  /** A solved edge as a number, an open one marked. */
  private static String end(Sweep.Axis axis, double share, SweepLine.End kind) {
    String n = SweepSentences.number(axis.shown(share));
    return switch (kind) {
      case ZERO -> n;
      case SWEEP -> n + " (end)";
      case WINDOW -> n + " (window)";
    };
  }

  private static String csv(SweepStudy.Answer answer) {
    Sweep sweep = answer.grid().sweep();
    StringBuilder b = new StringBuilder("point,");
    b.append(quoted(sweep.along().name())).append(',');
    sweep.across().ifPresent(a -> b.append(quoted(a.name())).append(','));
    for (Sweep.Axis a : axes(sweep)) {
      a.inputs().keySet().forEach(k -> b.append(quoted(k)).append(','));
    }
    b.append(
        (answer.line() == null ? "" : "mode,")
            + "operator,modes of the chamber,frequency [Hz],growth rate [1/s],inside window,"
            + "backward error,point complete\n");
    Window w = answer.grid().caseFile().window();
    for (int p = 0; p < answer.points().size(); p++) {
      double[] share = answer.grid().shares(p);
      StringBuilder head = new StringBuilder().append(p + 1).append(',');
      head.append(SweepSentences.number(sweep.along().shown(share[0]))).append(',');
      sweep
          .across()
          .ifPresent(a -> head.append(SweepSentences.number(a.shown(share[1]))).append(','));
      int k = 0;
      for (Sweep.Axis a : axes(sweep)) {
        double s = share[k++];
        a.at(s).values().forEach(v -> head.append(quoted(v)).append(','));
      }
      for (PointMode m : answer.points().get(p).modes()) {
        b.append(head);
        if (answer.line() != null) {
          b.append(number(answer, p, m)).append(',');
        }
        b.append(quoted(m.part()))
            .append(',')
            .append(m.copies())
            .append(
                String.format(
                    Locale.ROOT,
                    ",%.6f,%.6f,%s,%.1e,%s%n",
                    m.frequency(),
                    m.growthRate(),
                    w.contains(m.growthRate(), m.frequency()) ? "yes" : "no",
                    m.backwardError(),
                    answer.points().get(p).complete() ? "yes" : "no"));
      }
    }
    return b.toString();
  }

  static List<Sweep.Axis> axes(Sweep sweep) {
    List<Sweep.Axis> axes = new ArrayList<>(List.of(sweep.along()));
    sweep.across().ifPresent(axes::add);
    return axes;
  }

  /** Number of the track a mode of a point belongs to; empty outside the window throughout. */
  private static String number(SweepStudy.Answer answer, int point, PointMode mode) {
    return answer.line().tracks().stream()
        .filter(t -> t.holds(point) && t.at(point) == mode)
        .map(t -> Integer.toString(t.number()))
        .findFirst()
        .orElse("");
  }

  private static String quoted(String text) {
    boolean formula =
        !text.isEmpty() && "=+-@".indexOf(text.charAt(0)) >= 0 && !text.matches("[-+]?[0-9.].*");
    String safe = formula ? "'" + text : text;
    return safe.matches("[^,\"\n]*") ? safe : "\"" + safe.replace("\"", "\"\"") + "\"";
  }

  private static String edges(SweepStudy.Answer answer) {
    Sweep sweep = answer.grid().sweep();
    StringBuilder b = new StringBuilder();
    if (answer.line() != null) {
      String name = sweep.along().name();
      b.append("mode,operator,modes of the chamber,")
          .append(quoted("grows from: " + name))
          .append(",begins by,")
          .append(quoted("grows to: " + name))
          .append(",ends by,peak growth rate [1/s],")
          .append(quoted("peak at: " + name))
          .append(",peak frequency [Hz]\n");
      for (SweepLine.Stretch s : answer.stretches()) {
        b.append(
            String.format(
                Locale.ROOT,
                "%d,%s,%d,%.8g,%s,%.8g,%s,%.4f,%.6g,%.4f%n",
                s.track().number(),
                quoted(s.track().part()),
                s.track().any().copies(),
                sweep.along().shown(s.from()),
                words(s.opens()),
                sweep.along().shown(s.to()),
                words(s.closes()),
                s.peak(),
                sweep.along().shown(s.peakAt()),
                s.peakFrequency()));
      }
      return b.toString();
    }
    Sweep.Axis across = sweep.across().orElseThrow();
    for (int end = 1; end <= 2; end++) {
      b.append(quoted(sweep.along().name() + ", end " + end))
          .append(',')
          .append(quoted(across.name() + ", end " + end))
          .append(end == 1 ? ',' : '\n');
    }
    for (SweepMap.Piece p : answer.map().boundary()) {
      b.append(
          String.format(
              Locale.ROOT,
              "%.8g,%.8g,%.8g,%.8g%n",
              sweep.along().shown(p.from()[0]),
              across.shown(p.from()[1]),
              sweep.along().shown(p.to()[0]),
              across.shown(p.to()[1])));
    }
    return b.toString();
  }

  private static String words(SweepLine.End end) {
    return switch (end) {
      case ZERO -> "growth rate zero";
      case SWEEP -> "end of the sweep";
      case WINDOW -> "edge of the window";
    };
  }

  private static String json(SweepStudy.Answer answer) {
    CaseFile c = answer.grid().caseFile();
    Sweep sweep = answer.grid().sweep();
    JsonWriter w = new JsonWriter();
    w.object().text("case", c.title()).truth("certified", answer.certified());
    w.number("points", (long) answer.points().size())
        .number("points_not_complete", answer.incomplete())
        .number("largest_backward_error", answer.worstBackwardError())
        .number("points_checked_in_full", (long) answer.check().points())
        .number("largest_relative_difference_to_full", answer.check().difference());
    w.array("axes");
    for (Sweep.Axis a : axes(sweep)) {
      w.object().text("name", a.name()).number("from", a.from()).number("to", a.to());
      w.number("points", (long) a.points()).endObject();
    }
    w.endArray();
    w.array("stretches_of_growth");
    for (SweepLine.Stretch s : answer.stretches()) {
      w.object()
          .number("mode", (long) s.track().number())
          .text("operator", s.track().part())
          .number("modes_of_the_chamber", (long) s.track().any().copies())
          .number("from", sweep.along().shown(s.from()))
          .text("begins_by", words(s.opens()))
          .number("to", sweep.along().shown(s.to()))
          .text("ends_by", words(s.closes()))
          .number("peak_growth_rate_per_s", s.peak())
          .number("peak_at", sweep.along().shown(s.peakAt()))
          .number("peak_frequency_hz", s.peakFrequency())
          .endObject();
    }
    w.endArray();
    if (answer.line() != null) {
      w.array("close_modes");
      for (SweepLine.Meeting m : answer.line().meetings()) {
        w.object()
            .numbers("modes", m.first().number(), m.second().number())
            .number("near", sweep.along().shown(m.at()))
            .number("distance_per_s", m.distance())
            .number("likeness", m.likeness())
            .endObject();
      }
      w.endArray();
    } else {
      w.array("largest_growth_rate_per_s");
      for (double[] row : rowsOf(answer)) {
        w.object().numbers("along", row).endObject();
      }
      w.endArray();
    }
    return w.endObject() + "\n";
  }

  static double[][] rowsOf(SweepStudy.Answer answer) {
    int nx = answer.grid().along();
    double[][] rows = new double[answer.grid().across()][nx];
    for (int p = 0; p < answer.points().size(); p++) {
      rows[p / nx][p % nx] = answer.map().worst()[p];
    }
    return rows;
  }
}
