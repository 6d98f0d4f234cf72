package org.annulet.post.chart;

import static org.annulet.post.chart.Svg.at;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/**
 * Lines over an input that varies: growth rates with the unstable half marked, or frequencies.
 * Where a mode grows its line is thick and in the colour of growth. Colours are CSS variables with
 * fallbacks.
 */
public final class LinesChart {
  private static final double LEFT = 64;
  private static final double RIGHT = 44;
  private static final double TOP = 18;
  private static final double BOTTOM = 46;

  private final Axis across;
  private final Axis up;
  private final double width;
  private final double height;

  /**
   * An axis.
   *
   * @param name with its unit
   * @param from number at its beginning
   * @param to number at its end; may be the smaller one
   */
  public record Axis(String name, double from, double to) {}

  /**
   * One line.
   *
   * @param label at its end
   * @param x on the axis across, shape [n]
   * @param y on the axis upward, shape [n]
   * @param growth growth rate in 1/s at each place, shape [n]
   */
  public record Line(String label, double[] x, double[] y, double[] growth) {}

  private LinesChart(Axis across, Axis up, double width, double height) {
    this.across = across;
    this.up = up;
    this.width = width;
    this.height = height;
  }

  /**
   * Growth rates: the axis upward has zero as a line and what lies above it tinted.
   *
   * @param size width and height in px
   */
  public static String growth(Axis across, Axis up, List<Line> lines, double... size) {
    return new LinesChart(across, up, size[0], size[1]).draw(lines, "Growth rates over ", true);
  }

  /**
   * Frequencies.
   *
   * @param size width and height in px
   */
  public static String frequencies(Axis across, Axis up, List<Line> lines, double... size) {
    return new LinesChart(across, up, size[0], size[1]).draw(lines, "Frequencies over ", false);
  }

  private String draw(List<Line> lines, String what, boolean zero) {
    StringBuilder b = new StringBuilder(1 << 14);
    b.append("<svg xmlns=\"http://www.w3.org/2000/svg\" viewBox=\"0 0 ")
        .append(at(width))
        .append(' ')
        .append(at(height))
        .append("\" role=\"img\" aria-label=\"")
        .append(what)
        .append(Svg.escape(across.name()))
        .append("\" font-family=\"system-ui,sans-serif\" font-size=\"12\"")
        .append(" fill=\"var(--ink,#222)\">\n");
    double level = Math.min(Math.max(y(0), TOP), height - BOTTOM);
    if (zero && level > TOP) {
      rect(b, new double[] {LEFT, TOP, width - RIGHT, level}, "var(--grow-tint,#f6e3d8)", "none");
    }
    double low = Math.min(across.from(), across.to());
    double high = Math.max(across.from(), across.to());
    double xs = Svg.step(high - low, width < 500 ? 5 : 9);
    for (double v = Math.ceil(low / xs - 1e-9) * xs; v <= high + 1e-9 * xs; v += xs) {
      rule(b, x(v), TOP, x(v), height - BOTTOM, "var(--rule,#ddd)");
      text(b, x(v), height - BOTTOM + 17, "middle", Svg.tick(v, xs));
    }
    double ys = Svg.step(up.to() - up.from(), 7);
    for (double v = Math.ceil(up.from() / ys - 1e-9) * ys; v <= up.to() + 1e-9 * ys; v += ys) {
      rule(b, LEFT, y(v), width - RIGHT, y(v), "var(--rule,#ddd)");
      text(b, LEFT - 8, y(v) + 4, "end", Svg.tick(v, ys));
    }
    if (zero && up.from() < 0 && up.to() > 0) {
      rule(b, LEFT, y(0), width - RIGHT, y(0), "var(--ink,#222)");
    }
    rect(b, new double[] {LEFT, TOP, width - RIGHT, height - BOTTOM}, "none", "var(--soft,#777)");
    lines.forEach(l -> line(b, l));
    labels(b, lines);
    text(b, (LEFT + width - RIGHT) / 2, height - 8, "middle", across.name());
    b.append("<text transform=\"translate(14 ")
        .append(at((TOP + height - BOTTOM) / 2))
        .append(") rotate(-90)\" text-anchor=\"middle\">")
        .append(Svg.escape(up.name()))
        .append("</text>\n");
    return b.append("</svg>\n").toString();
  }

  private void line(StringBuilder b, Line l) {
    for (int k = 0; k + 1 < l.x().length; k++) {
      double[] p = {l.x()[k], l.y()[k], l.growth()[k]};
      double[] q = {l.x()[k + 1], l.y()[k + 1], l.growth()[k + 1]};
      if (p[2] > 0 == q[2] > 0) {
        segment(b, p, q, p[2] > 0);
      } else {
        double t = p[2] / (p[2] - q[2]);
        double[] m = {p[0] + t * (q[0] - p[0]), p[1] + t * (q[1] - p[1]), 0};
        segment(b, p, m, p[2] > 0);
        segment(b, m, q, q[2] > 0);
      }
    }
  }

  /** Labels at the ends of the lines, pushed apart where they would cover each other. */
  private void labels(StringBuilder b, List<Line> lines) {
    List<double[]> ends = new ArrayList<>(); // x, y in px, number of the line
    for (int i = 0; i < lines.size(); i++) {
      Line l = lines.get(i);
      int last = l.x().length - 1;
      while (last >= 0 && !visible(l.y()[last])) {
        last--;
      }
      if (last >= 0) {
        ends.add(new double[] {x(l.x()[last]) + 5, y(l.y()[last]) + 4, i});
      }
    }
    ends.sort(Comparator.comparingDouble(e -> e[1]));
    for (int k = 1; k < ends.size(); k++) {
      if (Math.abs(ends.get(k)[0] - ends.get(k - 1)[0]) < 20) {
        ends.get(k)[1] = Math.max(ends.get(k)[1], ends.get(k - 1)[1] + 11);
      }
    }
    ends.forEach(e -> text(b, e[0], e[1], "start", lines.get((int) e[2]).label()));
  }

  private boolean visible(double v) {
    return v >= up.from() && v <= up.to();
  }

  private void segment(StringBuilder b, double[] p, double[] q, boolean grows) {
    double[] a = p;
    double[] c = q;
    if (!visible(a[1]) && !visible(c[1])) {
      return;
    }
    a = visible(a[1]) ? a : clipped(c, a);
    c = visible(c[1]) ? c : clipped(a, c);
    b.append("<line x1=\"")
        .append(at(x(a[0])))
        .append("\" y1=\"")
        .append(at(y(a[1])))
        .append("\" x2=\"")
        .append(at(x(c[0])))
        .append("\" y2=\"")
        .append(at(y(c[1])))
        .append("\" stroke=\"")
        .append(grows ? "var(--grow,#b4431a)" : "var(--decay,#1f6f78)")
        .append("\" stroke-linecap=\"round\" stroke-width=\"")
        .append(grows ? "3" : "1.4")
        .append("\"/>\n");
  }

  /** Where the way from a visible place to one out of sight leaves the frame. */
  private double[] clipped(double[] seen, double[] out) {
    double edge = out[1] > up.to() ? up.to() : up.from();
    double t = (edge - seen[1]) / (out[1] - seen[1]);
    return new double[] {seen[0] + t * (out[0] - seen[0]), edge};
  }

  private double x(double v) {
    return LEFT + (v - across.from()) / (across.to() - across.from()) * (width - LEFT - RIGHT);
  }

  private double y(double v) {
    return height - BOTTOM - (v - up.from()) / (up.to() - up.from()) * (height - TOP - BOTTOM);
  }

  private static void rect(StringBuilder b, double[] box, String fill, String stroke) {
    b.append("<rect x=\"")
        .append(at(box[0]))
        .append("\" y=\"")
        .append(at(box[1]))
        .append("\" width=\"")
        .append(at(box[2] - box[0]))
        .append("\" height=\"")
        .append(at(box[3] - box[1]))
        .append("\" fill=\"")
        .append(fill)
        .append("\" stroke=\"")
        .append(stroke)
        .append("\"/>\n");
  }

  private static void rule(
      StringBuilder b, double x1, double y1, double x2, double y2, String colour) {
    b.append("<line x1=\"")
        .append(at(x1))
        .append("\" y1=\"")
        .append(at(y1))
        .append("\" x2=\"")
        .append(at(x2))
        .append("\" y2=\"")
        .append(at(y2))
        .append("\" stroke=\"")
        .append(colour)
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
