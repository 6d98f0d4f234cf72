package org.annulet.post.chart;

import static org.annulet.post.chart.Svg.at;

import java.util.List;

/**
 * Errors over the number of triangles on two logarithmic axes, one line for each chamber, beside a
 * slope of second order: the error falls by four where the triangles' sides halve.
 */
public final class ConvergenceChart {
  private static final double LEFT = 70;
  private static final double RIGHT = 20;
  private static final double TOP = 16;
  private static final double BOTTOM = 48;

  private final double width;
  private final double height;
  private double[] x;
  private double[] y;

  private ConvergenceChart(double width, double height) {
    this.width = width;
    this.height = height;
  }

  /**
   * One line of the chart.
   *
   * @param name shown when the pointer rests on it
   * @param triangles of each mesh, ascending
   * @param errors relative errors, shape as {@code triangles}; not positive values are left out
   */
  public record Line(String name, int[] triangles, double[] errors) {}

  /**
   * The chart as an SVG element.
   *
   * @param width in px
   * @param height in px
   */
  public static String svg(List<Line> lines, double width, double height) {
    return new ConvergenceChart(width, height).draw(lines);
  }

  private String draw(List<Line> lines) {
    x = new double[] {Double.MAX_VALUE, 0};
    y = new double[] {Double.MAX_VALUE, 0};
    for (Line line : lines) {
      for (int k = 0; k < line.triangles.length; k++) {
        if (line.errors[k] > 0) {
          widen(x, line.triangles[k]);
          widen(y, line.errors[k]);
        }
      }
    }
    decades(x);
    decades(y);
    StringBuilder b = new StringBuilder(8000);
    b.append("<svg xmlns=\"http://www.w3.org/2000/svg\" viewBox=\"0 0 ")
        .append(at(width))
        .append(' ')
        .append(at(height))
        .append("\" role=\"img\" aria-label=\"Error over number of triangles of ")
        .append(lines.size())
        .append(" chambers\" font-family=\"system-ui,sans-serif\" font-size=\"12\">\n");
    grid(b);
    for (Line line : lines) {
      polyline(b, line);
    }
    slope(b);
    return b.append("</svg>\n").toString();
  }

  private static void widen(double[] range, double value) {
    range[0] = Math.min(range[0], value);
    range[1] = Math.max(range[1], value);
  }

  private static void decades(double[] range) {
    range[0] = Math.floor(Math.log10(range[0]));
    range[1] = Math.max(range[0] + 1, Math.ceil(Math.log10(range[1])));
  }

  private void grid(StringBuilder b) {
    for (int d = (int) x[0]; d <= x[1]; d++) {
      double u = across(Math.pow(10, d));
      stroke(b, new double[] {u, TOP, u, height - BOTTOM}, "#ddd");
      label(b, new double[] {u, height - BOTTOM + 17}, "middle", power(d));
    }
    for (int d = (int) y[0]; d <= y[1]; d++) {
      double v = up(Math.pow(10, d));
      stroke(b, new double[] {LEFT, v, width - RIGHT, v}, "#ddd");
      label(b, new double[] {LEFT - 8, v + 4}, "end", power(d));
    }
    label(
        b,
        new double[] {(LEFT + width - RIGHT) / 2, height - 10},
        "middle",
        "triangles of the mesh");
    b.append("<text transform=\"translate(16 ")
        .append(at((TOP + height - BOTTOM) / 2))
        .append(") rotate(-90)\" text-anchor=\"middle\" fill=\"#222\">")
        .append("largest error |Δs|/|s| of the chamber</text>\n");
  }

  private void polyline(StringBuilder b, Line line) {
    StringBuilder points = new StringBuilder();
    StringBuilder dots = new StringBuilder();
    for (int k = 0; k < line.triangles.length; k++) {
      if (line.errors[k] > 0) {
        String u = at(across(line.triangles[k]));
        String v = at(up(line.errors[k]));
        points.append(points.length() == 0 ? "" : " ").append(u).append(',').append(v);
        dots.append("<circle cx=\"").append(u).append("\" cy=\"").append(v).append("\" r=\"2\"/>");
      }
    }
    b.append("<g fill=\"#2a5d84\"><title>")
        .append(Svg.escape(line.name))
        .append("</title><polyline points=\"")
        .append(points)
        .append("\" fill=\"none\" stroke=\"#2a5d84\" stroke-opacity=\"0.55\"/>")
        .append(dots)
        .append("</g>\n");
  }

  /** Second order: four times the triangles, a quarter of the error. */
  private void slope(StringBuilder b) {
    double n = Math.pow(10, x[1]) / 12;
    double e = Math.pow(10, y[1]) / 2;
    b.append("<path d=\"M")
        .append(at(across(n)) + " " + at(up(e)))
        .append('L')
        .append(at(across(8 * n)) + " " + at(up(e / 8)))
        .append("\" stroke=\"#b3541e\" stroke-width=\"2\" stroke-dasharray=\"6 4\"/>\n");
    label(b, new double[] {across(n) - 6, up(e) + 4}, "end", "second order");
  }

  private double across(double triangles) {
    return LEFT + (Math.log10(triangles) - x[0]) / (x[1] - x[0]) * (width - LEFT - RIGHT);
  }

  private double up(double error) {
    return TOP + (y[1] - Math.log10(error)) / (y[1] - y[0]) * (height - TOP - BOTTOM);
  }

  private static String power(int exponent) {
    String digits = "⁰¹²³⁴⁵⁶⁷⁸⁹";
    StringBuilder up = new StringBuilder(exponent < 0 ? "⁻" : "");
    for (char c : Integer.toString(Math.abs(exponent)).toCharArray()) {
      up.append(digits.charAt(c - '0'));
    }
    return "10" + up;
  }

  private static void stroke(StringBuilder b, double[] p, String colour) {
    b.append("<path d=\"M")
        .append(at(p[0]) + " " + at(p[1]) + "L" + at(p[2]) + " " + at(p[3]))
        .append("\" stroke=\"")
        .append(colour)
        .append("\"/>\n");
  }

  private static void label(StringBuilder b, double[] p, String anchor, String what) {
    b.append("<text x=\"")
        .append(at(p[0]))
        .append("\" y=\"")
        .append(at(p[1]))
        .append("\" text-anchor=\"")
        .append(anchor)
        .append("\" fill=\"#222\">")
        .append(Svg.escape(what))
        .append("</text>\n");
  }
}
