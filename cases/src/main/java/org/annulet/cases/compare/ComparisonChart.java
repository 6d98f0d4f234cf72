package org.annulet.cases.compare;

import java.util.List;
import java.util.Locale;
import org.annulet.cases.read.ModeTable;
import org.annulet.post.chart.Svg;

/** Both sides in the plane of frequency and growth rate. */
final class ComparisonChart {
  private static final double WIDE = 760;
  private static final double HIGH = 300;
  private static final double EDGE = 56;

  private ComparisonChart() {}

  static String svg(List<Line> lines) {
    double[] box = {1e300, -1e300, 0, 0};
    for (Line l : lines) {
      l.match().ours().ifPresent(o -> widen(box, o.frequency(), o.growthRate()));
      l.match().theirs().ifPresent(t -> widen(box, t.frequency(), growth(l, t)));
    }
    if (box[0] > box[1]) {
      box[0] = 0;
      box[1] = 1;
    }
    double df = 0.05 * Math.max(1, box[1] - box[0]);
    double dg = 0.08 * Math.max(1, box[3] - box[2]);
    box[0] -= df;
    box[1] += df;
    box[2] -= dg;
    box[3] += dg;
    StringBuilder b = new StringBuilder();
    b.append(
        String.format(
            Locale.ROOT,
            "<svg xmlns=\"http://www.w3.org/2000/svg\" viewBox=\"0 0 %.0f %.0f\" role=\"img\""
                + " aria-label=\"Growth rate over frequency of both sides\" font-size=\"12\" font-family=\"system-ui,sans-serif\""
                + " fill=\"currentColor\">",
            WIDE,
            HIGH));
    double fs = Svg.step(box[1] - box[0], 8);
    for (double f = Math.ceil(box[0] / fs) * fs; f <= box[1]; f += fs) {
      b.append(rule(x(box, f), 18, x(box, f), HIGH - 42));
      b.append(text(x(box, f), HIGH - 24, "middle", Svg.tick(f, fs)));
    }
    double gs = Svg.step(box[3] - box[2], 6);
    for (double g = Math.ceil(box[2] / gs) * gs; g <= box[3]; g += gs) {
      b.append(rule(EDGE, y(box, g), WIDE - 10, y(box, g)));
      b.append(text(EDGE - 6, y(box, g) + 4, "end", Svg.tick(g, gs)));
    }
    b.append(stroke(EDGE, y(box, 0), WIDE - 10, y(box, 0), "1"));
    b.append(text(WIDE / 2, HIGH - 4, "middle", "frequency in Hz"));
    b.append(text(EDGE - 40, 12, "start", "growth rate in 1/s"));
    for (Line l : lines) {
      l.match()
          .theirs()
          .ifPresent(
              t -> {
                double tx = x(box, t.frequency());
                double ty = y(box, growth(l, t));
                l.match()
                    .ours()
                    .ifPresent(
                        o ->
                            b.append(
                                stroke(
                                    tx, ty, x(box, o.frequency()), y(box, o.growthRate()), "1")));
                b.append(
                    circle(tx, ty, "fill=\"none\" stroke=\"currentColor\" stroke-width=\"1.5\""));
              });
      l.match()
          .ours()
          .ifPresent(o -> b.append(circle(x(box, o.frequency()), y(box, o.growthRate()), "")));
    }
    return b.append("</svg>").toString();
  }

  /** Their growth rate; ours, or zero, where it is not known. */
  private static double growth(Line l, ModeTable.Row t) {
    return t.hasGrowth() ? t.growthRate() : l.match().ours().map(OurMode::growthRate).orElse(0.0);
  }

  private static void widen(double[] box, double f, double g) {
    box[0] = Math.min(box[0], f);
    box[1] = Math.max(box[1], f);
    box[2] = Math.min(box[2], g);
    box[3] = Math.max(box[3], g);
  }

  private static double x(double[] box, double f) {
    return EDGE + (WIDE - EDGE - 10) * (f - box[0]) / (box[1] - box[0]);
  }

  private static double y(double[] box, double g) {
    return 18 + (HIGH - 60) * (box[3] - g) / (box[3] - box[2]);
  }

  private static String circle(double x, double y, String style) {
    return String.format(
        Locale.ROOT,
        "<circle cx=\"%.1f\" cy=\"%.1f\" r=\"%s\" %s/>",
        x,
        y,
        style.isEmpty() ? "3" : "6",
        style);
  }

  private static String rule(double x1, double y1, double x2, double y2) {
    return String.format(
        Locale.ROOT,
        "<line x1=\"%.1f\" y1=\"%.1f\" x2=\"%.1f\" y2=\"%.1f\" stroke=\"var(--rule,#ddd)\"/>",
        x1,
        y1,
        x2,
        y2);
  }

  private static String stroke(double x1, double y1, double x2, double y2, String width) {
    return String.format(
        Locale.ROOT,
        "<line x1=\"%.1f\" y1=\"%.1f\" x2=\"%.1f\" y2=\"%.1f\" stroke=\"currentColor\""
            + " stroke-width=\"%s\"/>",
        x1,
        y1,
        x2,
        y2,
        width);
  }

  private static String text(double x, double y, String anchor, String words) {
    return String.format(
        Locale.ROOT,
        "<text x=\"%.1f\" y=\"%.1f\" text-anchor=\"%s\">%s</text>",
        x,
        y,
        anchor,
        words);
  }
}
