package org.annulet.cases.uncertainty;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.annulet.cases.read.Uncertainty;
import org.annulet.post.chart.ShareChart;
import org.annulet.post.chart.Svg;
import org.annulet.post.files.WholeFile;
import org.annulet.post.report.StudyPage;
import org.annulet.post.table.JsonWriter;
import org.annulet.post.table.Numbers;
import org.apache.commons.math3.complex.Complex;

/**
 * Writes an {@link UncertaintyStudy}: {@code uncertainty.csv} by mode, {@code
 * uncertainty-samples.csv}, {@code uncertainty.json}, {@code uncertainty.svg} and the page {@code
 * uncertainty.html}.
 */
public final class UncertaintyFiles {
  private UncertaintyFiles() {}

  /**
   * Writes all files.
   *
   * @param folder made if absent; files of an earlier run are replaced
   * @param version of the program
   * @throws IOException if the folder cannot be written
   */
  public static void write(Path folder, UncertaintyStudy.Result result, String version)
      throws IOException {
    UncertaintyStudy.Answer a = result.answer();
    Files.createDirectories(folder);
    WholeFile.write(folder.resolve("uncertainty.csv"), csv(a));
    WholeFile.write(folder.resolve("uncertainty-samples.csv"), samples(a));
    WholeFile.write(folder.resolve("uncertainty.json"), json(a));
    WholeFile.write(folder.resolve("uncertainty.svg"), Svg.standalone(chart(a)));
    WholeFile.write(folder.resolve("uncertainty.html"), page(a, version));
  }

  /** The answer in sentences and by mode, for a terminal. */
  public static String terminal(UncertaintyStudy.Result result) {
    UncertaintyStudy.Answer a = result.answer();
    StringBuilder b = new StringBuilder();
    UncertaintySentences.of(a).forEach(s -> b.append(s).append('\n'));
    b.append('\n');
    List<Object> heads =
        List.of(
            "Hz", "growth 1/s", "±", "grows %", "95 % interval", "1st order", "2nd order", "of");
    String format = "%9s  %10s  %8s  %8s  %15s  %9s  %9s  %s%n";
    b.append(String.format(Locale.ROOT, format, heads.toArray()));
    for (List<String> r : rows(a)) {
      b.append(String.format(Locale.ROOT, format, r.toArray()));
    }
    return b.toString().stripTrailing();
  }

  private static List<List<String>> rows(UncertaintyStudy.Answer a) {
    List<List<String>> rows = new ArrayList<>();
    for (ModeStatistics m : a.modes()) {
      rows.add(
          List.of(
              Numbers.fixed(m.nominal().s().getImaginary() / (2 * Math.PI), 1),
              Numbers.signed(m.growth()[0]),
              Numbers.fixed(m.growth()[1], 1),
              UncertaintySentences.percent(m.grows()),
              UncertaintySentences.percent(m.interval()[0])
                  + " – "
                  + UncertaintySentences.percent(m.interval()[1]),
              UncertaintySentences.percent(m.first()),
              m.second().map(UncertaintySentences::percent).orElse("–"),
              m.nominal().what()));
    }
    return rows;
  }

  private static String chart(UncertaintyStudy.Answer a) {
    List<ShareChart.Bar> bars = new ArrayList<>();
    for (ModeStatistics m : a.modes()) {
      bars.add(
          new ShareChart.Bar(
              Numbers.fixed(m.nominal().s().getImaginary() / (2 * Math.PI), 1)
                  + " Hz, "
                  + m.nominal().what(),
              m.grows(),
              m.interval()[0],
              m.interval()[1]));
    }
    return ShareChart.svg("probability that the mode grows [%]", bars, 900);
  }

  private static String csv(UncertaintyStudy.Answer a) {
    StringBuilder b =
        new StringBuilder(
            "mode,operator,modes together,nominal frequency [Hz],nominal growth rate [1/s],"
                + "samples followed,probability of growth,interval from,interval to,"
                + "growth mean [1/s],growth deviation [1/s],growth 5 % [1/s],growth 50 % [1/s],"
                + "growth 95 % [1/s],frequency mean [Hz],frequency deviation [Hz],"
                + "probability first order,probability second order,variance explained");
    for (Engine.Group g : a.engine().groups()) {
      b.append(",share of ").append(g.name());
    }
    for (Engine.Group g : a.engine().groups()) {
      b.append(",probability with half of ").append(g.name());
    }
    b.append('\n');
    int number = 0;
    for (ModeStatistics m : a.modes()) {
      b.append(++number).append(",\"").append(m.nominal().what()).append("\",");
      b.append(m.nominal().modes());
      values(b, m.nominal().s().getImaginary() / (2 * Math.PI), m.nominal().s().getReal());
      b.append(',').append(m.followed());
      values(b, m.grows(), m.interval()[0], m.interval()[1]);
      values(b, m.growth());
      values(b, m.frequency()[0], m.frequency()[1], m.first());
      values(b, m.second().orElse(Double.NaN), m.explained());
      values(b, m.shares());
      values(b, m.tightened());
      b.append('\n');
    }
    return b.toString();
  }

  private static void values(StringBuilder b, double... values) {
    for (double v : values) {
      b.append(',').append(Double.isNaN(v) ? "" : String.format(Locale.ROOT, "%.6g", v));
    }
  }

  private static String samples(UncertaintyStudy.Answer a) {
    StringBuilder b = new StringBuilder("sample,confirmed,growing strangers");
    for (int k = 1; k <= a.modes().size(); k++) {
      b.append(",frequency of mode ").append(k).append(" [Hz],growth rate of mode ");
      b.append(k).append(" [1/s]");
    }
    b.append('\n');
    for (int i = 0; i < a.samples().size(); i++) {
      Sample s = a.samples().get(i);
      b.append(i + 1).append(s.complete() ? ",yes," : ",no,").append(s.strangers());
      for (Complex m : s.members()) {
        if (m.isNaN()) {
          b.append(",,");
        } else {
          b.append(
              String.format(
                  Locale.ROOT, ",%.4f,%.4f", m.getImaginary() / (2 * Math.PI), m.getReal()));
        }
      }
      b.append('\n');
    }
    return b.toString();
  }

  private static String json(UncertaintyStudy.Answer a) {
    JsonWriter w = new JsonWriter();
    double[] interval = ModeStatistics.interval(a.samples().size() - a.quiet(), a.samples().size());
    w.object()
        .text("case", a.caseFile().title())
        .truth("certified", a.certified())
        .number("samples", (long) a.samples().size())
        .number("seed", a.asked().seed())
        .number("samples_without_growth", (long) a.quiet())
        .numbers("interval_of_probability_that_some_mode_grows", interval[0], interval[1])
        .number("samples_not_confirmed", (long) a.incomplete())
        .number("samples_with_growing_strangers", (long) a.strangers())
        .number("largest_relative_difference_to_full", a.difference())
        .array("modes");
    for (ModeStatistics m : a.modes()) {
      w.object()
          .text("operator", m.nominal().what())
          .number("modes_together", (long) m.nominal().modes())
          .number("frequency_hz", m.nominal().s().getImaginary() / (2 * Math.PI))
          .number("growth_rate_per_s", m.nominal().s().getReal())
          .number("probability_of_growth", m.grows())
          .numbers("interval", m.interval()[0], m.interval()[1])
          .number("mean_growth_rate_per_s", m.growth()[0])
          .number("deviation_of_growth_rate_per_s", m.growth()[1])
          .number("probability_first_order", m.first())
          .number("probability_second_order", m.second().orElse(Double.NaN))
          .number("variance_explained", m.explained())
          .array("inputs");
      for (int g = 0; g < a.engine().groups().size(); g++) {
        w.object()
            .text("name", a.engine().groups().get(g).name())
            .number("share_of_variance", m.shares()[g])
            .number("probability_with_half_the_width", m.tightened()[g])
            .endObject();
      }
      w.endArray().endObject();
    }
    return w.endArray().endObject() + "\n";
  }

  private static String page(UncertaintyStudy.Answer a, String version) {
    StudyPage page = new StudyPage("Uncertainty", a.caseFile().title(), version);
    if (a.certified()) {
      page.certified("samples confirmed, checks in full agree");
    } else {
      page.notCertified("NOT certified");
    }
    page.answer(UncertaintySentences.of(a));
    page.part("Which modes grow, how likely")
        .figure(chart(a), "Shares of the samples, with their 95 % sampling intervals.")
        .table(
            List.of(
                "frequency in Hz",
                "mean growth in 1/s",
                "deviation in 1/s",
                "grows in %",
                "95 % interval",
                "first order, %",
                "second order, %",
                "of"),
            rows(a));
    page.part("What matters");
    List<String> heads = new ArrayList<>(List.of("frequency in Hz", "of", "explained in %"));
    for (Engine.Group g : a.engine().groups()) {
      heads.add("share of " + g.name() + " in %");
      heads.add("grows in % with half its width");
    }
    List<List<String>> rows = new ArrayList<>();
    for (ModeStatistics m : a.modes()) {
      List<String> row =
          new ArrayList<>(
              List.of(
                  Numbers.fixed(m.nominal().s().getImaginary() / (2 * Math.PI), 1),
                  m.nominal().what(),
                  UncertaintySentences.percent(m.explained())));
      for (int g = 0; g < a.engine().groups().size(); g++) {
        row.add(UncertaintySentences.percent(m.shares()[g]));
        row.add(UncertaintySentences.percent(m.tightened()[g]));
      }
      rows.add(row);
    }
    page.table(heads, rows)
        .paragraph(
            "Shares of the variance of the growth rate by linear regression on all inputs; with"
                + " correlated inputs they need not add up to what is explained. Probabilities with"
                + " half a width are foretold by derivatives.");
    page.part("What is uncertain");
    List<List<String>> inputs = new ArrayList<>();
    for (Uncertainty.Input i : a.asked().inputs()) {
      inputs.add(List.of(i.key(), shape(i.spread()), i.spread().width()));
    }
    a.asked()
        .scatter()
        .ifPresent(
            s -> {
              s.gain()
                  .ifPresent(
                      g ->
                          inputs.add(
                              List.of(
                                  "gain of flame " + s.flame() + " at every burner",
                                  shape(g),
                                  g.width())));
              s.delay()
                  .ifPresent(
                      g ->
                          inputs.add(
                              List.of(
                                  "delay of flame " + s.flame() + " at every burner",
                                  shape(g),
                                  g.width())));
            });
    page.table(List.of("input", "distribution", "width"), inputs)
        .paragraph(a.engine().method())
        .paragraph(
            "The spread says what the inputs leave open; error bars of the mesh come on top and"
                + " are given by the modes.");
    return page.html();
  }

  private static String shape(Uncertainty.Spread spread) {
    return switch (spread.shape()) {
      case NORMAL -> "normal, standard deviation";
      case UNIFORM -> "uniform, half width";
      case TRIANGULAR -> "triangular, half width";
    };
  }
}
