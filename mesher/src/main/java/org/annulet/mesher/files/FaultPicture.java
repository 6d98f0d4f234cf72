package org.annulet.mesher.files;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.annulet.mesher.geometry.GeometryFault;
import org.annulet.mesher.geometry.GeometryFault.Line;

/**
 * A small SVG of the spot where an outline is at fault: the edges near it with their names, and a
 * ring round the place.
 */
public final class FaultPicture {
  private static final double SIDE = 420;

  /** Part of the outline's larger side that the picture shows. */
  private static final double PART = 0.3;

  private FaultPicture() {}

  /**
   * The spot of one fault.
   *
   * @param fault what the outline's check found
   * @param index which of its faults
   * @return an SVG file's text; empty if the fault has no place or nothing could be drawn
   */
  public static Optional<String> svg(GeometryFault fault, int index) {
    GeometryFault.Fault at = fault.faults().get(index);
    if (Double.isNaN(at.x()) || fault.drawing().isEmpty()) {
      return Optional.empty();
    }
    double span = span(fault.drawing()) * PART;
    double scale = SIDE / span;
    StringBuilder b = new StringBuilder();
    b.append(
        String.format(
            Locale.ROOT,
            "<svg xmlns=\"http://www.w3.org/2000/svg\" viewBox=\"0 0 %1$.0f %1$.0f\" width=\"%1$.0f\" height=\"%1$.0f\""
                + " font-family=\"system-ui,sans-serif\" font-size=\"13\">%n<rect width=\"100%%\" height=\"100%%\" fill=\"#fff\"/>%n",
            SIDE));
    for (Line line : fault.drawing()) {
      draw(b, line, new double[] {at.x() - span / 2, at.y() + span / 2, scale});
    }
    b.append(
        String.format(
            Locale.ROOT,
            "<circle cx=\"%1$.1f\" cy=\"%1$.1f\" r=\"14\" fill=\"none\" stroke=\"#a93c12\" stroke-width=\"2.5\"/>%n"
                + "<text x=\"8\" y=\"%2$.0f\">(%3$.6g, %4$.6g) m; the picture is %5$.3g m wide</text>%n</svg>%n",
            SIDE / 2,
            SIDE - 10,
            at.x(),
            at.y(),
            span));
    return Optional.of(b.toString());
  }

  /** Draws a line and its name beside the point of it that is nearest to the middle. */
  private static void draw(StringBuilder b, Line line, double[] frame) {
    b.append("<polyline fill=\"none\" stroke=\"#23252a\" stroke-width=\"1.6\" points=\"");
    int nearest = 0;
    double best = Double.POSITIVE_INFINITY;
    for (int i = 0; i < line.x().length; i++) {
      double px = (line.x()[i] - frame[0]) * frame[2];
      double py = (frame[1] - line.y()[i]) * frame[2];
      b.append(String.format(Locale.ROOT, "%.1f,%.1f ", clip(px), clip(py)));
      // A name stands a little away from the spot, so that it does not cover it.
      double away = Math.abs(Math.hypot(px - SIDE / 2, py - SIDE / 2) - SIDE / 4);
      if (away < best) {
        best = away;
        nearest = i;
      }
    }
    b.append("\"/>\n");
    if (best < SIDE / 8) {
      b.append(
          String.format(
              Locale.ROOT,
              "<text x=\"%.1f\" y=\"%.1f\" fill=\"#17656f\">%s</text>%n",
              (line.x()[nearest] - frame[0]) * frame[2] + 5,
              (frame[1] - line.y()[nearest]) * frame[2] - 5,
              escape(line.edge())));
    }
  }

  /** Keeps what lies far outside the picture from overflowing a viewer's numbers. */
  private static double clip(double v) {
    return Math.max(-1e5, Math.min(1e5, v));
  }

  private static double span(List<Line> drawing) {
    double[] box = {
      Double.POSITIVE_INFINITY,
      Double.POSITIVE_INFINITY,
      Double.NEGATIVE_INFINITY,
      Double.NEGATIVE_INFINITY
    };
    for (Line line : drawing) {
      for (int i = 0; i < line.x().length; i++) {
        box[0] = Math.min(box[0], line.x()[i]);
        box[1] = Math.min(box[1], line.y()[i]);
        box[2] = Math.max(box[2], line.x()[i]);
        box[3] = Math.max(box[3], line.y()[i]);
      }
    }
    return Math.max(box[2] - box[0], box[3] - box[1]);
  }

  private static String escape(String text) {
    return text.replace("&", "&amp;").replace("<", "&lt;").replace(">", "&gt;");
  }
}
