package org.annulet.cases.study;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.Damper;
import org.annulet.post.chart.Svg;
import org.annulet.post.files.WholeFile;
import org.annulet.post.report.StudyPage;
import org.annulet.post.table.JsonWriter;
import org.apache.commons.math3.complex.Complex;

/**
 * Writes the answer of a {@link DamperStudy}: {@code dampers.json}, {@code dampers.csv} for the
 * workshop, {@code dampers.svg} and the page {@code dampers.html}.
 */
public final class DamperFiles {
  private DamperFiles() {}

  /**
   * Writes all files.
   *
   * @param folder made if absent; files of an earlier run are replaced
   * @param version of the program
   * @throws IOException if the folder cannot be written
   */
  public static void write(Path folder, DamperStudy.Result result, String version)
      throws IOException {
    DamperStudy.Answer answer = result.answer();
    Files.createDirectories(folder);
    WholeFile.write(folder.resolve("dampers.json"), json(answer));
    WholeFile.write(folder.resolve("dampers.csv"), csv(answer));
    WholeFile.write(
        folder.resolve("dampers.svg"),
        Svg.standalone(DamperPlacing.picture(answer, answer.pattern())));
    WholeFile.write(folder.resolve("dampers.html"), page(answer, version));
  }

  /** The answer in sentences and the table of positions, for a terminal. */
  public static String terminal(DamperStudy.Result result) {
    DamperStudy.Answer answer = result.answer();
    StringBuilder b = new StringBuilder();
    new DamperSentences(answer).all().forEach(s -> b.append(s).append('\n'));
    b.append('\n');
    List<String> heads = List.of("no", "design", "face", "x mm", "angle °", "burner");
    b.append(String.format(Locale.ROOT, "%4s  %-16s  %-22s  %9s  %8s  %6s%n", heads.toArray()));
    for (DamperPlacing.Row r : DamperPlacing.rows(answer, answer.pattern())) {
      b.append(
          String.format(
              Locale.ROOT,
              "%4d  %-16s  %-22s  %9.1f  %8.2f  %6d%n",
              r.number(),
              r.design(),
              r.face(),
              1000 * r.x(),
              Math.toDegrees(r.angle()),
              r.burner()));
    }
    return b.toString().stripTrailing();
  }

  private static String csv(DamperStudy.Answer answer) {
    StringBuilder b =
        new StringBuilder(
            "number,design,face,x [mm],angle [deg],nearest burner,angle from it [deg],"
                + "arc on the face from burner 1 [mm]\n");
    for (DamperPlacing.Row r : DamperPlacing.rows(answer, answer.pattern())) {
      b.append(
          String.format(
              Locale.ROOT,
              "%d,%s,%s,%.2f,%.3f,%d,%.3f,%.2f%n",
              r.number(),
              r.design(),
              r.face(),
              1000 * r.x(),
              Math.toDegrees(r.angle()),
              r.burner(),
              Math.toDegrees(r.offset()),
              1000 * r.arc()));
    }
    return b.toString();
  }

  private static String json(DamperStudy.Answer answer) {
    CaseFile c = answer.ports().caseFile();
    DamperRanking.Outcome o = answer.outcome();
    JsonWriter w = new JsonWriter();
    w.object().text("case", c.title()).object("window");
    w.numbers(
            "frequency_hz",
            answer.ports().window().lowestFrequency(),
            answer.ports().window().highestFrequency())
        .numbers(
            "growth_rate_per_s",
            answer.ports().window().lowestGrowth(),
            answer.ports().window().highestGrowth())
        .endObject()
        .truth("certified", answer.certified())
        .number("worst_growth_rate_without_per_s", answer.undamped())
        .number("worst_growth_rate_per_s", o.best().get(0).worst())
        .number("worst_growth_rate_full_operator_per_s", answer.check().worst())
        .number("largest_difference_to_full_operator_per_s", answer.check().difference())
        .number("largest_backward_error", answer.check().residual())
        .number("transfer_error", answer.ports().transfer().error())
        .object("search")
        .text("patterns", o.all().toString())
        .number("looked_at", o.distinct())
        .number("dropped_on_proof", o.dropped())
        .number("count_not_certain", o.unsure())
        .truth("every_distinct_pattern", o.everyOne())
        .endObject();
    positions(w, "positions", answer, o.best().get(0).pattern());
    w.array("ranking");
    for (DamperRanking.Ranked r : o.best()) {
      w.object().number("worst_growth_rate_per_s", r.worst()).truth("counted", r.complete());
      positions(w, "positions", answer, r.pattern());
      w.endObject();
    }
    w.endArray();
    if (o.even() != null) {
      w.object("even_spacing").number("worst_growth_rate_per_s", o.even().worst());
      positions(w, "positions", answer, o.even().pattern());
      w.endObject();
    }
    w.array("modes");
    answer
        .check()
        .modes()
        .forEach(
            m ->
                w.object()
                    .number("frequency_hz", m.s().getImaginary() / (2 * Math.PI))
                    .number("growth_rate_per_s", m.s().getReal())
                    .number("backward_error", m.backwardError())
                    .endObject());
    w.endArray();
    fates(w, answer);
    tuning(w, answer);
    return w.endObject() + "\n";
  }

  private static void positions(
      JsonWriter w, String key, DamperStudy.Answer answer, int[] pattern) {
    w.array(key);
    for (DamperPlacing.Row r : DamperPlacing.rows(answer, pattern)) {
      w.object()
          .text("design", r.design())
          .text("face", r.face())
          .number("x_m", r.x())
          .number("angle_deg", Math.toDegrees(r.angle()))
          .number("nearest_burner", (long) r.burner())
          .endObject();
    }
    w.endArray();
  }

  private static void fates(JsonWriter w, DamperStudy.Answer answer) {
    w.array("splitting");
    for (DamperStudy.Fate f : answer.fates()) {
      w.object()
          .number("frequency_without_hz", f.s().getImaginary() / (2 * Math.PI))
          .number("growth_rate_without_per_s", f.s().getReal())
          .numberOrNull("azimuthal_order", f.order() < 0 ? null : f.order())
          .number("pattern_factor", f.factorBest())
          .number("pattern_factor_even_spacing", f.factorEven());
      members(w, "members", f.best());
      members(w, "members_even_spacing", f.even());
      w.endObject();
    }
    w.endArray();
  }

  private static void members(JsonWriter w, String key, Complex[] members) {
    w.array(key);
    for (Complex s : members) {
      w.object()
          .number("frequency_hz", s.getImaginary() / (2 * Math.PI))
          .number("growth_rate_per_s", s.getReal())
          .endObject();
    }
    w.endArray();
  }

  private static void tuning(JsonWriter w, DamperStudy.Answer answer) {
    w.array("tuning");
    for (DamperTuning.OfDesign d : answer.tuning()) {
      w.object()
          .text("design", d.name())
          .number("frequency_hz", d.frequency().given())
          .number("best_frequency_hz", d.frequency().best())
          .number("worst_growth_rate_at_best_frequency_per_s", d.frequency().worst())
          .number("resistance", d.resistance().given())
          .number("best_resistance", d.resistance().best())
          .number("worst_growth_rate_at_best_resistance_per_s", d.resistance().worst())
          .endObject();
    }
    DamperTuning.Robustness r = answer.robustness();
    w.endArray()
        .object("robustness")
        .number("tuned_5_percent_low_per_s", r.tooLow())
        .number("tuned_5_percent_high_per_s", r.tooHigh())
        .array("one_shut");
    for (DamperPlacing.Row row : DamperPlacing.rows(answer, answer.pattern())) {
      w.object()
          .number("number", (long) row.number())
          .number("worst_growth_rate_per_s", r.failed()[row.position()])
          .endObject();
    }
    w.endArray().endObject();
  }

  private static String page(DamperStudy.Answer answer, String version) {
    StudyPage page = new StudyPage("Places of dampers", answer.ports().caseFile().title(), version);
    if (answer.certified()) {
      page.certified("best pattern confirmed on the full operator");
    } else {
      page.notCertified("NOT certified");
    }
    page.answer(new DamperSentences(answer).all());
    page.part("Best pattern")
        .figure(
            DamperPlacing.picture(answer, answer.pattern()),
            "Dampers by their number in the table; small circles are free positions. Burner 1 on"
                + " top, angles clockwise, upstream positions inside.");
    List<List<String>> rows = new ArrayList<>();
    double[] failed = answer.robustness().failed();
    for (DamperPlacing.Row r : DamperPlacing.rows(answer, answer.pattern())) {
      rows.add(
          List.of(
              Integer.toString(r.number()),
              r.design(),
              r.face(),
              Words.fixed(1000 * r.x(), 1),
              Words.fixed(Math.toDegrees(r.angle()), 2),
              Integer.toString(r.burner()),
              Words.fixed(1000 * r.arc(), 1),
              Words.growth(failed[r.position()])));
    }
    page.table(
        List.of(
            "no",
            "design",
            "face",
            "x in mm",
            "angle in °",
            "nearest burner",
            "arc on the face in mm",
            "worst growth in 1/s if this one is shut"),
        rows);
    ranking(page, answer);
    splitting(page, answer);
    method(page, answer);
    return page.html();
  }

  private static void ranking(StudyPage page, DamperStudy.Answer answer) {
    page.part("Next best, and even spacing");
    List<List<String>> rows = new ArrayList<>();
    int place = 0;
    for (DamperRanking.Ranked r : answer.outcome().best()) {
      rows.add(List.of(++place + ".", Words.growth(r.worst()), angles(answer, r.pattern())));
    }
    if (answer.outcome().even() != null) {
      DamperRanking.Ranked e = answer.outcome().even();
      rows.add(List.of("even", Words.growth(e.worst()), angles(answer, e.pattern())));
    }
    page.table(List.of("place", "worst growth in 1/s", "design at angle in ° (x in mm)"), rows);
  }

  private static String angles(DamperStudy.Answer answer, int[] pattern) {
    StringBuilder b = new StringBuilder();
    for (DamperPlacing.Row r : DamperPlacing.rows(answer, pattern)) {
      b.append(b.isEmpty() ? "" : ", ")
          .append(r.design())
          .append(' ')
          .append(Words.fixed(Math.toDegrees(r.angle()), 1))
          .append(" (")
          .append(Words.fixed(1000 * r.x(), 0))
          .append(')');
    }
    return b.toString();
  }

  private static void splitting(StudyPage page, DamperStudy.Answer answer) {
    page.part("What becomes of each mode")
        .paragraph(
            "Followed from the chamber without these dampers while their strength grows to the"
                + " true one. The pattern factor |Σ e^{2imθ}|/K tells how strongly a pattern splits"
                + " a pair of order m to first order: at 0 both members are damped alike, at 1 one"
                + " of them is not damped at all. Modes that belong to the dampers themselves are"
                + " not in this table.");
    List<List<String>> rows = new ArrayList<>();
    for (DamperStudy.Fate f : answer.fates()) {
      rows.add(
          List.of(
              Words.hertz(f.s()),
              Words.growth(f.s().getReal()),
              f.order() < 0 ? "–" : Integer.toString(f.order()),
              factor(f.factorBest()),
              shown(f.best()),
              factor(f.factorEven()),
              shown(f.even())));
    }
    page.table(
        List.of(
            "Hz without",
            "growth without in 1/s",
            "order",
            "pattern factor",
            "best pattern: 1/s at Hz",
            "factor, even",
            "even spacing: 1/s at Hz"),
        rows);
  }

  private static String factor(double value) {
    return Double.isNaN(value) ? "–" : Words.fixed(value, 3);
  }

  private static String shown(Complex[] members) {
    StringBuilder b = new StringBuilder();
    Arrays.stream(members)
        .filter(s -> !s.isNaN())
        .forEach(
            s ->
                b.append(b.isEmpty() ? "" : "; ")
                    .append(Words.growth(s.getReal()))
                    .append(" at ")
                    .append(Words.hertz(s)));
    return b.isEmpty() ? "–" : b.toString();
  }

  private static void method(StudyPage page, DamperStudy.Answer answer) {
    page.part("How it was found")
        .paragraph(answer.ports().method())
        .paragraph(
            "The chamber was condensed onto its "
                + answer.ports().transfer().portCount()
                + " ports by its modes and by full solves round the window; at points inside it the"
                + " condensed chamber differs from full solves by "
                + String.format(Locale.ROOT, "%.1e", answer.ports().transfer().error())
                + " at most. No step takes the dampers to be weak.")
        .paragraph(
            "Mesh of "
                + answer.ports().shape().mesh().nodeCount()
                + " nodes, finer at the positions. Error bars of the mesh are not part of this"
                + " study: put the dampers into the case and run the modes for them.");
    page.paragraph("For the case file:");
    for (Damper d : answer.ports().with(answer.pattern()).dampers()) {
      page.paragraph(d.name() + ": at " + places(d));
    }
  }

  private static String places(Damper damper) {
    StringBuilder b = new StringBuilder();
    damper.places().stream()
        .filter(p -> p instanceof Damper.OnFace)
        .map(p -> (Damper.OnFace) p)
        .forEach(
            f ->
                b.append(b.isEmpty() ? "" : "; ")
                    .append("{face: ")
                    .append(f.face())
                    .append(", x: ")
                    .append(Words.fixed(1000 * f.x(), 2))
                    .append(" mm, angles: [")
                    .append(Words.fixed(Math.toDegrees(f.angle()), 3))
                    .append(" °]}"));
    return b.toString();
  }
}
