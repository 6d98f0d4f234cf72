package org.annulet.post.chart;

import static org.annulet.post.chart.Svg.at;

import java.util.List;

/** Shares from 0 to 100 % as bars with intervals, one under the other. */
public final class ShareChart {
  private static final double LEFT = 280;
  private static final double RIGHT = 20;
  private static final double ROW = 26;
  private static final double BOTTOM = 44;

  private ShareChart() {}

  /**
   * One share.
   *
   * @param label before the bar
   * @param share 0 to 1
   * @param low end of its interval
   * @param high end of its interval
   */
  public record Bar(String label, double share, double low, double high) {}

  /**
   * The chart as an SVG element.
   *
   * @param name of the axis
   * @param width in px
   */
  public static String svg(String name, List<Bar> bars, double width) {
    double height = 12 + ROW * bars.size() + BOTTOM;
    StringBuilder b = new StringBuilder(4000);
    b.append("<svg xmlns=\"http://www.w3.org/2000/svg\" viewBox=\"0 0 ")
        .append(at(width))
        .append(' ')
        .append(at(height))
        .append("\" role=\"img\" aria-label=\"")
        .append(Svg.escape(name))
        .append("\" font-family=\"system-ui,sans-serif\" font-size=\"12\"")
        .append(" fill=\"var(--ink,#222)\">\n");
    double span = width - LEFT - RIGHT;
    for (int p = 0; p <= 100; p += 20) {
      double x = LEFT + span * p / 100;
      line(b, new double[] {x, 8, x, height - BOTTOM}, "var(--rule,#ddd)", 1);
      text(b, x, height - BOTTOM + 17, "middle", Integer.toString(p));
    }
    for (int i = 0; i < bars.size(); i++) {
      Bar bar = bars.get(i);
      double y = 12 + ROW * i;
      text(b, LEFT - 8, y + 15, "end", bar.label());
      if (Double.isNaN(bar.share())) {
        continue;
      }
      b.append("<rect x=\"")
          .append(at(LEFT))
          .append("\" y=\"")
          .append(at(y + 3))
          .append("\" width=\"")
          .append(at(span * bar.share()))
          .append("\" height=\"16\" fill=\"var(--grow,#b4431a)\" fill-opacity=\"0.75\"/>\n");
      double middle = y + 11;
      double from = LEFT + span * bar.low();
      double to = LEFT + span * bar.high();
      line(b, new double[] {from, middle, to, middle}, "var(--ink,#222)", 1.6);
      line(b, new double[] {from, middle - 4, from, middle + 4}, "var(--ink,#222)", 1.6);
      line(b, new double[] {to, middle - 4, to, middle + 4}, "var(--ink,#222)", 1.6);
    }
    text(b, LEFT + span / 2, height - 8, "middle", name);
    return b.append("</svg>\n").toString();
  }

  private static void line(StringBuilder b, double[] p, String colour, double width) {
    b.append("<line x1=\"")
        .append(at(p[0]))
        .append("\" y1=\"")
        .append(at(p[1]))
        .append("\" x2=\"")
        .append(at(p[2]))
        .append("\" y2=\"")
        .append(at(p[3]))
        .append("\" stroke=\"")
        .append(colour)
        .append("\" stroke-width=\"")
        .append(at(width))
        .append("\"/>\n");
  }

  private static void text(StringBuilder b, double x, double y, String anchor, String words) {
    b.append("<text x=\"")
        .append(at(x))
        .append("\" y=\"")
        .append(at(y))
        .append("\" text-anchor=\"")
        .append(anchor)
        .append("\">")
        .append(Svg.escape(words))
        .append("</text>\n");
  }
}
