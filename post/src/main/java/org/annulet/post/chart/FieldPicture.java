package org.annulet.post.chart;

import static org.annulet.post.chart.Svg.at;

import java.util.Locale;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.vtk.Surface;

/**
 * A quantity on the triangles of a mesh as SVG, in {@value #STEPS} steps from light to dark, with a
 * scale. The lightness falls evenly, so that it reads in grey too.
 */
public final class FieldPicture {
  private static final int STEPS = 16;
  private static final double WIDTH = 900;
  private static final double MARGIN = 14;

  private FieldPicture() {}

  /**
   * The picture as a file of its own.
   *
   * @param values one per triangle
   * @param title what is shown, with its unit
   */
  public static String svg(Mesh mesh, PlaneView view, double[] values, String title) {
    Surface flat = Surface.flat(mesh);
    double[] box = {
      Double.POSITIVE_INFINITY,
      Double.POSITIVE_INFINITY,
      Double.NEGATIVE_INFINITY,
      Double.NEGATIVE_INFINITY
    };
    int n = flat.pointCount();
    double[] right = new double[n];
    double[] down = new double[n];
    for (int p = 0; p < n; p++) {
      right[p] = view.right(flat.coordinate(p, 0), flat.coordinate(p, 1));
      down[p] = view.down(flat.coordinate(p, 0), flat.coordinate(p, 1));
      box[0] = Math.min(box[0], right[p]);
      box[1] = Math.min(box[1], down[p]);
      box[2] = Math.max(box[2], right[p]);
      box[3] = Math.max(box[3], down[p]);
    }
    double scale = (WIDTH - 2 * MARGIN) / (box[2] - box[0]);
    double height = scale * (box[3] - box[1]) + 2 * MARGIN;
    double low = Double.POSITIVE_INFINITY;
    double high = Double.NEGATIVE_INFINITY;
    for (double v : values) {
      low = Math.min(low, v);
      high = Math.max(high, v);
    }
    StringBuilder[] step = new StringBuilder[STEPS];
    for (int k = 0; k < STEPS; k++) {
      step[k] = new StringBuilder();
    }
    for (int t = 0; t < flat.triangleCount(); t++) {
      double v = values[flat.sourceTriangle(t)];
      int k = high > low ? (int) Math.min(STEPS - 1, STEPS * (v - low) / (high - low)) : 0;
      for (int c = 0; c < 3; c++) {
        int p = flat.corner(t, c);
        step[k]
            .append(c == 0 ? 'M' : 'L')
            .append(at(MARGIN + scale * (right[p] - box[0])))
            .append(' ')
            .append(at(MARGIN + scale * (down[p] - box[1])));
      }
      step[k].append('Z');
    }
    StringBuilder b = new StringBuilder();
    b.append("<svg xmlns=\"http://www.w3.org/2000/svg\" viewBox=\"0 0 ")
        .append(at(WIDTH))
        .append(' ')
        .append(at(height + 56))
        .append("\" font-family=\"system-ui,sans-serif\" font-size=\"13\">\n")
        .append("<rect width=\"100%\" height=\"100%\" fill=\"#fff\"/>\n");
    for (int k = 0; k < STEPS; k++) {
      if (step[k].length() > 0) {
        b.append("<path fill=\"").append(colour(k)).append("\" stroke=\"").append(colour(k));
        b.append("\" stroke-width=\"0.3\" d=\"").append(step[k]).append("\"/>\n");
      }
    }
    double bar = 24;
    for (int k = 0; k < STEPS; k++) {
      b.append("<rect x=\"").append(at(MARGIN + bar * k)).append("\" y=\"").append(at(height));
      b.append("\" width=\"24\" height=\"12\" fill=\"").append(colour(k)).append("\"/>\n");
    }
    text(b, MARGIN, height + 30, number(low));
    text(b, MARGIN + bar * STEPS - 40, height + 30, number(high));
    text(b, MARGIN + bar * STEPS + 16, height + 11, title);
    return b.append("</svg>\n").toString();
  }

  private static String number(double v) {
    return String.format(Locale.ROOT, "%.4g", v);
  }

  private static void text(StringBuilder b, double x, double y, String what) {
    b.append("<text x=\"").append(at(x)).append("\" y=\"").append(at(y)).append("\">");
    b.append(Svg.escape(what)).append("</text>\n");
  }

  /** From pale straw over rust to near black. */
  private static String colour(int k) {
    double u = (double) k / (STEPS - 1);
    int r = (int) Math.round(247 - 190 * u * u);
    int g = (int) Math.round(238 - 214 * Math.pow(u, 0.8));
    int c = (int) Math.round(214 - 180 * Math.pow(u, 0.55));
    return String.format(Locale.ROOT, "#%02x%02x%02x", r, g, c);
  }
}
