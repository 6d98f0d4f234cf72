package org.annulet.post.chart;

import static org.annulet.post.chart.Svg.at;

import java.util.List;

/**
 * A map of the largest growth rate over two inputs: a field of squares, the fuller in colour the
 * further from zero, with the boundary between quiet and loud as a line. Loud squares are hatched
 * too, so that the map reads without colour.
 */
public final class QuietMap {
  private static final double LEFT = 64;
  private static final double RIGHT = 18;
  private static final double TOP = 18;
  private static final double BOTTOM = 46;

  private final LinesChart.Axis along;
  private final LinesChart.Axis across;
  private final double width;
  private final double height;

  private QuietMap(LinesChart.Axis along, LinesChart.Axis across, double width, double height) {
    this.along = along;
    this.across = across;
    this.width = width;
    this.height = height;
  }

  /**
   * The map as an SVG element.
   *
   * @param along the axis to the right
   * @param across the axis upward
   * @param worst largest growth rate in 1/s, shape [points across][points along]
   * @param boundary pieces x₁, y₁, x₂, y₂ as shares of the axes
   * @param size width and height in px
   */
  public static String svg(
      LinesChart.Axis along,
      LinesChart.Axis across,
      double[][] worst,
      List<double[]> boundary,
      double... size) {
    return new QuietMap(along, across, size[0], size[1]).draw(worst, boundary);
  }

  private String draw(double[][] worst, List<double[]> boundary) {
    StringBuilder b = new StringBuilder(1 << 14);
    b.append("<svg xmlns=\"http://www.w3.org/2000/svg\" viewBox=\"0 0 ")
        .append(at(width))
        .append(' ')
        .append(at(height))
        .append("\" role=\"img\" aria-label=\"Largest growth rate over ")
        .append(Svg.escape(along.name()))
        .append(" and ")
        .append(Svg.escape(across.name()))
        .append("\" font-family=\"system-ui,sans-serif\" font-size=\"12\"")
        .append(" fill=\"var(--ink,#222)\">\n<defs><pattern id=\"loud\" width=\"6\" height=\"6\"")
        .append(" patternUnits=\"userSpaceOnUse\" patternTransform=\"rotate(45)\">")
        .append("<line x1=\"0\" y1=\"0\" x2=\"0\" y2=\"6\" stroke=\"var(--paper,#fff)\"")
        .append(" stroke-width=\"1.2\"/></pattern></defs>\n");
    double largest = 0;
    double smallest = 0;
    for (double[] row : worst) {
      for (double v : row) {
        largest = Math.max(largest, v);
        smallest = Math.min(smallest, v);
      }
    }
    int ny = worst.length;
    int nx = worst[0].length;
    for (int j = 0; j < ny; j++) {
      for (int i = 0; i < nx; i++) {
        double v = worst[j][i];
        double share = v > 0 ? v / largest : smallest < 0 ? v / smallest : 0;
        double[] box = {
          x(Math.max(0, (i - 0.5) / (nx - 1))),
          y(Math.min(1, (j + 0.5) / (ny - 1))),
          x(Math.min(1, (i + 0.5) / (nx - 1))),
          y(Math.max(0, (j - 0.5) / (ny - 1)))
        };
        rect(b, box, v > 0 ? "var(--grow,#b4431a)" : "var(--decay,#1f6f78)", 0.15 + 0.75 * share);
        if (v > 0) {
          rect(b, box, "url(#loud)", 1);
        }
      }
    }
    for (double[] p : boundary) {
      b.append("<line x1=\"")
          .append(at(x(p[0])))
          .append("\" y1=\"")
          .append(at(y(p[1])))
          .append("\" x2=\"")
          .append(at(x(p[2])))
          .append("\" y2=\"")
          .append(at(y(p[3])))
          .append(
              "\" stroke=\"var(--ink,#222)\" stroke-width=\"2.4\" stroke-linecap=\"round\"/>\n");
    }
    ticks(b);
    return b.append("</svg>\n").toString();
  }

  private void ticks(StringBuilder b) {
    double xs = Svg.step(Math.abs(along.to() - along.from()), 8);
    double low = Math.min(along.from(), along.to());
    double high = Math.max(along.from(), along.to());
    for (double v = Math.ceil(low / xs - 1e-9) * xs; v <= high + 1e-9 * xs; v += xs) {
      double share = (v - along.from()) / (along.to() - along.from());
      text(b, new double[] {x(share), height - BOTTOM + 17}, "middle", Svg.tick(v, xs));
    }
    double ys = Svg.step(Math.abs(across.to() - across.from()), 8);
    low = Math.min(across.from(), across.to());
    high = Math.max(across.from(), across.to());
    for (double v = Math.ceil(low / ys - 1e-9) * ys; v <= high + 1e-9 * ys; v += ys) {
      double share = (v - across.from()) / (across.to() - across.from());
      text(b, new double[] {LEFT - 8, y(share) + 4}, "end", Svg.tick(v, ys));
    }
    text(b, new double[] {(LEFT + width - RIGHT) / 2, height - 8}, "middle", along.name());
    b.append("<text transform=\"translate(14 ")
        .append(at((TOP + height - BOTTOM) / 2))
        .append(") rotate(-90)\" text-anchor=\"middle\">")
        .append(Svg.escape(across.name()))
        .append("</text>\n");
  }

  private double x(double share) {
    return LEFT + share * (width - LEFT - RIGHT);
  }

  private double y(double share) {
    return height - BOTTOM - share * (height - TOP - BOTTOM);
  }

  private static void rect(StringBuilder b, double[] box, String fill, double opacity) {
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
        .append("\" fill-opacity=\"")
        .append(at(opacity))
        .append("\"/>\n");
  }

  private static void text(StringBuilder b, double[] at, String anchor, String words) {
    b.append("<text x=\"")
        .append(at(at[0]))
        .append("\" y=\"")
        .append(at(at[1]))
        .append("\" text-anchor=\"")
        .append(anchor)
        .append("\">")
        .append(Svg.escape(words))
        .append("</text>\n");
  }
}
