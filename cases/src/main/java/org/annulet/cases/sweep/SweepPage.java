package org.annulet.cases.sweep;

import java.util.ArrayList;
import java.util.List;
import org.annulet.cases.read.Sweep;
import org.annulet.cases.study.PointMode;
import org.annulet.post.chart.LinesChart;
import org.annulet.post.chart.QuietMap;
import org.annulet.post.report.StudyPage;
import org.annulet.post.table.Numbers;
import org.annulet.solver.modes.Window;

/** The pictures and the page of a sweep. */
final class SweepPage {
  private static final double WIDE = 900;

  /** Growth rates below minus this many 1/s are not drawn unless the growing ones are as large. */
  private static final double DAMPED = 120;

  private SweepPage() {}

  private static LinesChart.Axis axis(Sweep.Axis a) {
    return new LinesChart.Axis(a.name(), a.from(), a.to());
  }

  static String picture(SweepStudy.Answer answer) {
    Sweep sweep = answer.grid().sweep();
    if (answer.line() == null) {
      List<double[]> pieces =
          answer.map().boundary().stream()
              .map(p -> new double[] {p.from()[0], p.from()[1], p.to()[0], p.to()[1]})
              .toList();
      return QuietMap.svg(
          axis(sweep.along()),
          axis(sweep.across().orElseThrow()),
          SweepFiles.rowsOf(answer),
          pieces,
          WIDE,
          560);
    }
    Window w = answer.grid().caseFile().window();
    double low = -20;
    double high = 20;
    for (Track t : answer.line().tracks()) {
      for (int k = t.first(); k <= t.last(); k++) {
        low = Math.min(low, t.at(k).growthRate());
        high = Math.max(high, t.at(k).growthRate());
      }
    }
    low = Math.max(low, -Math.max(6 * high, DAMPED));
    double room = 0.06 * (high - low);
    return LinesChart.growth(
        axis(sweep.along()),
        new LinesChart.Axis(
            "growth rate [1/s]",
            Math.max(w.lowestGrowth(), low - room),
            Math.min(w.highestGrowth(), high + room)),
        lines(answer, PointMode::growthRate),
        WIDE,
        460);
  }

  private static List<LinesChart.Line> lines(
      SweepStudy.Answer answer, java.util.function.ToDoubleFunction<PointMode> value) {
    Sweep.Axis axis = answer.grid().sweep().along();
    List<LinesChart.Line> lines = new ArrayList<>();
    for (Track t : answer.line().tracks()) {
      int n = t.last() - t.first() + 1;
      double[] x = new double[n];
      double[] y = new double[n];
      double[] growth = new double[n];
      for (int k = 0; k < n; k++) {
        PointMode m = t.at(t.first() + k);
        x[k] = axis.shown(answer.grid().shares(t.first() + k)[0]);
        y[k] = value.applyAsDouble(m);
        growth[k] = m.growthRate();
      }
      lines.add(new LinesChart.Line(Integer.toString(t.number()), x, y, growth));
    }
    return lines;
  }

  static String html(SweepStudy.Answer answer, String version) {
    Sweep sweep = answer.grid().sweep();
    StudyPage page = new StudyPage("Sweep", answer.grid().caseFile().title(), version);
    if (answer.certified()) {
      page.certified("every point counted, checks in full agree");
    } else {
      page.notCertified("NOT certified");
    }
    page.answer(new SweepSentences(answer).all());
    if (answer.line() == null) {
      page.part("Quiet and loud")
          .figure(
              picture(answer),
              "Largest growth rate of all modes in the window; hatched where some mode grows. The"
                  + " line is the boundary, solved on every side of the grid it crosses.");
    } else {
      Window w = answer.grid().caseFile().window();
      page.part("Growth rates")
          .figure(
              picture(answer),
              "Numbers name the modes; thick where a mode grows. Modes damped more strongly lie"
                  + " below the chart.")
          .figure(
              LinesChart.frequencies(
                  axis(sweep.along()),
                  new LinesChart.Axis("frequency [Hz]", w.lowestFrequency(), w.highestFrequency()),
                  lines(answer, PointMode::frequency),
                  WIDE,
                  400),
              "Frequencies of the same modes.");
      List<List<String>> names = new ArrayList<>();
      for (Track t : answer.line().tracks()) {
        PointMode first = t.at(t.first());
        PointMode last = t.at(t.last());
        names.add(
            List.of(
                Integer.toString(t.number()),
                SweepSentences.described(t),
                Numbers.fixed(first.frequency(), 1),
                Numbers.fixed(last.frequency(), 1),
                Numbers.signed(first.growthRate()),
                Numbers.signed(last.growthRate())));
      }
      page.table(
          List.of(
              "mode",
              "of",
              "Hz at its beginning",
              "Hz at its end",
              "growth in 1/s at its beginning",
              "growth in 1/s at its end"),
          names);
      page.part("Where modes grow");
      if (answer.stretches().isEmpty()) {
        page.paragraph("Nowhere.");
      } else {
        page.table(
            List.of(
                "mode", "from", "to", "peak growth in 1/s", "at", "frequency there in Hz", "of"),
            SweepFiles.rows(answer));
      }
    }
    page.part("What varies");
    List<List<String>> inputs = new ArrayList<>();
    for (Sweep.Axis a : SweepFiles.axes(sweep)) {
      a.inputs()
          .forEach(
              (key, knots) -> {
                StringBuilder values = new StringBuilder();
                for (int k = 0; k < knots.values().size(); k++) {
                  values
                      .append(k == 0 ? "" : ", ")
                      .append(knots.at(k / (knots.values().size() - 1.0)));
                }
                inputs.add(List.of(a.name(), key, values.toString()));
              });
    }
    page.table(List.of("axis", "input", "values, evenly spaced, straight between"), inputs)
        .paragraph(
            "Error bars of the mesh are not part of a sweep: run the modes for the points that"
                + " matter.");
    return page.html();
  }
}
