package org.annulet.post.chart;

import static org.annulet.post.chart.Svg.at;

import java.util.List;

/**
 * A complex table over frequency and the function fitted to it: real parts above, imaginary parts
 * below; dots for the table, lines for the fit.
 */
public final class FitChart {
  private static final double WIDTH = 640;
  private static final double PANEL = 190;
  private static final double LEFT = 64;
  private static final double GAP = 34;

  private FitChart() {}

  /**
   * Values over frequency.
   *
   * @param frequency in Hz, ascending
   * @param re real parts
   * @param im imaginary parts
   */
  public record Series(double[] frequency, double[] re, double[] im) {}

  /**
   * The chart as a file of its own.
   *
   * @param title of the chart
   * @param table measured
   * @param fit fitted, as finely as it is to be drawn
   */
  public static String svg(String title, Series table, Series fit) {
    StringBuilder b = new StringBuilder();
    b.append("<svg xmlns=\"http://www.w3.org/2000/svg\" viewBox=\"0 0 ")
        .append(at(WIDTH))
        .append(' ')
        .append(at(2 * PANEL + 3 * GAP + 20))
        .append("\" font-family=\"system-ui,sans-serif\" font-size=\"12\">\n")
        .append("<rect width=\"100%\" height=\"100%\" fill=\"#fff\"/>\n");
    text(b, LEFT, 18, "start", title);
    double top = fit.frequency[fit.frequency.length - 1];
    panel(b, 30, "real part", top, List.of(table.re, fit.re), table.frequency, fit.frequency);
    panel(
        b,
        30 + PANEL + GAP,
        "imaginary part",
        top,
        List.of(table.im, fit.im),
        table.frequency,
        fit.frequency);
    text(b, (LEFT + WIDTH) / 2, 2 * PANEL + 3 * GAP + 10, "middle", "frequency [Hz]");
    return b.append("</svg>\n").toString();
  }

  private static void panel(
      StringBuilder b,
      double y0,
      String what,
      double top,
      List<double[]> values,
      double[]... frequencies) {
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    for (double[] v : values) {
      for (double x : v) {
        low = Math.min(low, x);
        high = Math.max(high, x);
      }
    }
    double room = Math.max(0.05 * (high - low), 1e-3);
    double bottom = low - room;
    double ceiling = high + room;
    double across = (WIDTH - LEFT - 16) / top;
    double up = PANEL / (ceiling - bottom);
    double step = Svg.step(ceiling - bottom, 5);
    for (double g = Math.ceil(bottom / step) * step; g <= ceiling; g += step) {
      double y = y0 + up * (ceiling - g);
      line(b, new double[] {LEFT, y, WIDTH - 16, y});
      text(b, LEFT - 8, y + 4, "end", Svg.tick(g, step));
    }
    double fs = Svg.step(top, 8);
    for (double f = 0; f <= top; f += fs) {
      double x = LEFT + across * f;
      line(b, new double[] {x, y0, x, y0 + PANEL});
      text(b, x, y0 + PANEL + 15, "middle", Svg.tick(f, fs));
    }
    text(b, WIDTH - 20, y0 + 14, "end", what);
    StringBuilder path = new StringBuilder();
    for (int k = 0; k < frequencies[1].length; k++) {
      path.append(k == 0 ? 'M' : 'L')
          .append(at(LEFT + across * frequencies[1][k]))
          .append(' ')
          .append(at(y0 + up * (ceiling - values.get(1)[k])));
    }
    b.append("<path d=\"").append(path).append("\" fill=\"none\" stroke=\"#2a5d84\"/>\n");
    for (int k = 0; k < frequencies[0].length; k++) {
      b.append("<circle cx=\"")
          .append(at(LEFT + across * frequencies[0][k]))
          .append("\" cy=\"")
          .append(at(y0 + up * (ceiling - values.get(0)[k])))
          .append("\" r=\"2.6\" fill=\"#b3541e\"/>\n");
    }
  }

  private static void line(StringBuilder b, double[] p) {
    b.append("<path d=\"M" + at(p[0]) + " " + at(p[1]) + "L" + at(p[2]) + " " + at(p[3]));
    b.append("\" stroke=\"#ddd\"/>\n");
  }

  private static void text(StringBuilder b, double x, double y, String anchor, String what) {
    b.append("<text x=\"" + at(x) + "\" y=\"" + at(y) + "\" text-anchor=\"" + anchor + "\">");
    b.append(Svg.escape(what)).append("</text>\n");
  }
}
