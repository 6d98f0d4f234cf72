package org.annulet.post.chart;

import static org.annulet.post.chart.Svg.at;

import java.util.ArrayList;
import java.util.List;

/**
 * A ring seen along its axis, looking downstream: burners by number, and places on it. Places at
 * several axial positions lie on several circles, the most upstream one innermost.
 */
public final class RingPlan {
  private static final double SIZE = 560;
  private static final double BURNERS = 120;
  private static final double FIRST = 165;
  private static final double LAST = 250;
  private static final String[] COLOURS = {
    "var(--decay,#17656f)", "var(--grow,#a93c12)", "var(--open,#7d6110)", "var(--ink,#23252a)"
  };

  private RingPlan() {}

  /**
   * A place.
   *
   * @param name shown when pointed at
   * @param angle in rad, from burner 1 in the direction of rising numbers
   * @param circle number of its circle from 0, the innermost
   * @param kind 0 for a free place, else the number of the design there, from 1
   * @param label short text inside the mark; may be empty
   */
  public record Place(String name, double angle, int circle, int kind, String label) {}

  /**
   * Draws.
   *
   * @param burners number of burners
   * @param circles number of circles, at least 1
   * @param designs names of the designs, for the key
   * @param places free and taken ones
   * @return one SVG element
   */
  public static String svg(int burners, int circles, List<String> designs, List<Place> places) {
    StringBuilder b = new StringBuilder();
    double high = SIZE + 24.0 * designs.size() + 8;
    b.append("<svg xmlns=\"http://www.w3.org/2000/svg\" viewBox=\"0 0 ")
        .append(at(SIZE))
        .append(' ')
        .append(at(high))
        .append("\" role=\"img\" aria-label=\"Ring with its burners and dampers\"")
        .append(" font-family=\"system-ui,sans-serif\" font-size=\"13\">\n");
    circle(b, new double[] {SIZE / 2, SIZE / 2, 80}, "none", "var(--rule,#dedad0)");
    circle(b, new double[] {SIZE / 2, SIZE / 2, 272}, "none", "var(--rule,#dedad0)");
    for (int k = 0; k < circles; k++) {
      circle(
          b, new double[] {SIZE / 2, SIZE / 2, radius(k, circles)}, "none", "var(--rule,#dedad0)");
    }
    for (int j = 0; j < burners; j++) {
      double[] p = point(2 * Math.PI * j / burners, BURNERS);
      circle(b, new double[] {p[0], p[1], 13}, "var(--zone-0,#e9e1cf)", "var(--soft,#5d6068)");
      text(b, p, Integer.toString(j + 1), "var(--ink,#23252a)");
    }
    text(b, new double[] {SIZE / 2, SIZE / 2}, "looking downstream", "var(--soft,#5d6068)");
    List<Place> order = new ArrayList<>(places);
    order.sort((x, y) -> Integer.compare(x.kind(), y.kind())); // free places below
    for (Place place : order) {
      double[] p = point(place.angle(), radius(place.circle(), circles));
      b.append("<g><title>").append(Svg.escape(place.name())).append("</title>");
      if (place.kind() == 0) {
        circle(b, new double[] {p[0], p[1], 4}, "var(--paper,#fff)", "var(--soft,#5d6068)");
      } else {
        circle(b, new double[] {p[0], p[1], 11}, colour(place.kind()), "var(--paper,#fff)");
        text(b, p, place.label(), "var(--paper,#fff)");
      }
      b.append("</g>\n");
    }
    for (int d = 0; d < designs.size(); d++) {
      double y = SIZE + 16 + 24 * d;
      circle(b, new double[] {30, y, 9}, colour(d + 1), "none");
      b.append("<text x=\"48\" y=\"")
          .append(at(y + 4.5))
          .append("\" fill=\"var(--ink,#23252a)\">")
          .append(Svg.escape(designs.get(d)))
          .append("</text>\n");
    }
    return b.append("</svg>\n").toString();
  }

  private static double radius(int circle, int circles) {
    return circles == 1 ? LAST - 30 : FIRST + (LAST - FIRST) * circle / (circles - 1);
  }

  private static String colour(int kind) {
    return COLOURS[(kind - 1) % COLOURS.length];
  }

  /** Angle 0 on top, rising clockwise. */
  private static double[] point(double angle, double radius) {
    return new double[] {SIZE / 2 + radius * Math.sin(angle), SIZE / 2 - radius * Math.cos(angle)};
  }

  private static void circle(StringBuilder b, double[] xyr, String fill, String stroke) {
    b.append("<circle cx=\"")
        .append(at(xyr[0]))
        .append("\" cy=\"")
        .append(at(xyr[1]))
        .append("\" r=\"")
        .append(at(xyr[2]))
        .append("\" fill=\"")
        .append(fill)
        .append("\" stroke=\"")
        .append(stroke)
        .append("\"/>");
  }

  private static void text(StringBuilder b, double[] p, String text, String fill) {
    b.append("<text x=\"")
        .append(at(p[0]))
        .append("\" y=\"")
        .append(at(p[1] + 4.5))
        .append("\" text-anchor=\"middle\" fill=\"")
        .append(fill)
        .append("\">")
        .append(Svg.escape(text))
        .append("</text>\n");
  }
}
