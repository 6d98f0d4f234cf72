package org.annulet.post.chart;

import static org.annulet.post.chart.Svg.at;

import java.util.List;
import java.util.Locale;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.ModeEntry.Stability;
import org.annulet.post.meaning.Results;
import org.annulet.solver.modes.Window;

/**
 * Growth rate over frequency: the window as a frame, the unstable half marked, every mode with its
 * error bars and number. The frame shows the span of the modes when the window is much larger; the
 * caption then says so. Colours are CSS variables with fallbacks, so it stands alone or in a page.
 */
public final class SpectrumChart {
  private static final double LEFT = 64;
  private static final double RIGHT = 16;
  private static final double TOP = 18;
  private static final double BOTTOM = 46;

  private final Results results;
  private final double width;
  private final double height;
  private double low;
  private double high;

  private SpectrumChart(Results results, double width, double height) {
    this.results = results;
    this.width = width;
    this.height = height;
  }

  /**
   * The chart as an SVG element.
   *
   * @param width in px
   * @param height in px
   */
  public static String svg(Results results, double width, double height) {
    return new SpectrumChart(results, width, height).draw();
  }

  private String draw() {
    fitGrowth();
    StringBuilder b = new StringBuilder(4000);
    Window w = results.window();
    b.append("<svg xmlns=\"http://www.w3.org/2000/svg\" viewBox=\"0 0 ")
        .append(at(width))
        .append(' ')
        .append(at(height))
        .append("\" role=\"img\" aria-label=\"Growth rate over frequency of ")
        .append(results.modes().size())
        .append(" modes\" font-family=\"system-ui,sans-serif\" font-size=\"12\"")
        .append(" fill=\"var(--ink,#222)\">\n");
    double zero = Math.min(Math.max(y(0), TOP), height - BOTTOM);
    if (zero > TOP) {
      rect(b, new double[] {LEFT, TOP, width - RIGHT, zero}, "var(--grow-tint,#f6e3d8)", "none");
    }
    double fs = Svg.step(w.highestFrequency() - w.lowestFrequency(), width < 500 ? 5 : 9);
    for (double f = Math.ceil(w.lowestFrequency() / fs) * fs; f <= w.highestFrequency(); f += fs) {
      line(b, new double[] {x(f), TOP, x(f), height - BOTTOM}, "var(--rule,#ddd)");
      text(b, x(f), height - BOTTOM + 17, "middle", Svg.tick(f, fs));
    }
    double gs = Svg.step(high - low, 7);
    for (double g = Math.ceil(low / gs) * gs; g <= high + 1e-9 * gs; g += gs) {
      line(b, new double[] {LEFT, y(g), width - RIGHT, y(g)}, "var(--rule,#ddd)");
      text(b, LEFT - 8, y(g) + 4, "end", Svg.tick(g, gs));
    }
    if (low < 0 && high > 0) {
      line(b, new double[] {LEFT, y(0), width - RIGHT, y(0)}, "var(--ink,#222)");
    }
    rect(b, new double[] {LEFT, TOP, width - RIGHT, height - BOTTOM}, "none", "var(--soft,#777)");
    if (zero > TOP + 18) {
      text(b, width - RIGHT - 8, TOP + 15, "end", "grows");
    }
    if (zero < height - BOTTOM - 18) {
      text(b, width - RIGHT - 8, height - BOTTOM - 8, "end", "decays");
    }
    text(b, (LEFT + width - RIGHT) / 2, height - 8, "middle", "frequency [Hz]");
    b.append("<text transform=\"translate(14 ")
        .append(at((TOP + height - BOTTOM) / 2))
        .append(") rotate(-90)\" text-anchor=\"middle\">growth rate [1/s]</text>\n");
    List<ModeEntry> modes = results.modes();
    for (int i = 0; i < modes.size(); i++) {
      mode(b, i + 1, modes.get(i));
    }
    return b.append("</svg>\n").toString();
  }

  /** The window's growth range, or the modes' with room when they fill less than half of it. */
  private void fitGrowth() {
    low = results.window().lowestGrowth();
    high = results.window().highestGrowth();
    double bottom = 0;
    double top = 0;
    for (ModeEntry e : results.modes()) {
      double g = e.view().mode().growthRate();
      double bar = Double.isNaN(e.view().growthError()) ? 0 : e.view().growthError();
      bottom = Math.min(bottom, g - bar);
      top = Math.max(top, g + bar);
    }
    double least = 0.02 * (high - low); // rounding about zero is not blown up
    bottom = Math.min(bottom, -least);
    top = Math.max(top, least);
    double room = 0.15 * (top - bottom);
    if (top - bottom + 2 * room < high - low) {
      low = Math.max(low, bottom - room);
      high = Math.min(high, top + room);
    }
  }

  /** Whether the chart shows less than the window's whole range of growth rates. */
  public static boolean isCut(Results results) {
    SpectrumChart c = new SpectrumChart(results, 100, 100);
    c.fitGrowth();
    return c.low > results.window().lowestGrowth() || c.high < results.window().highestGrowth();
  }

  private void mode(StringBuilder b, int number, ModeEntry e) {
    double f = e.view().mode().frequency();
    double g = e.view().mode().growthRate();
    String colour =
        switch (e.stability()) {
          case GROWS -> "var(--grow,#b4431a)";
          case DECAYS -> "var(--decay,#1f6f78)";
          case UNDECIDED -> "var(--open,#8a6d1d)";
        };
    b.append("<a href=\"#mode-").append(number).append("\"><g><title>");
    b.append(
        Svg.escape(
            String.format(
                Locale.ROOT, "mode %d: %.2f Hz, %.2f 1/s, %s", number, f, g, e.label().text())));
    b.append("</title>\n");
    if (!Double.isNaN(e.view().growthError())) {
      double d = e.view().growthError();
      double up = Math.max(y(g + d), TOP);
      double down = Math.min(y(g - d), height - BOTTOM);
      line(b, new double[] {x(f), up, x(f), down}, colour);
      line(b, new double[] {x(f) - 3, up, x(f) + 3, up}, colour);
      line(b, new double[] {x(f) - 3, down, x(f) + 3, down}, colour);
    }
    if (!Double.isNaN(e.view().frequencyError())) {
      double d = e.view().frequencyError();
      double left = Math.max(x(f - d), LEFT);
      double right = Math.min(x(f + d), width - RIGHT);
      line(b, new double[] {left, y(g), right, y(g)}, colour);
    }
    boolean grows = e.stability() == Stability.GROWS;
    b.append("<path d=\"")
        .append(
            grows
                ? String.format(Locale.ROOT, "M%.2f %.2fl6 10h-12z", x(f), y(g) - 6.5)
                : String.format(
                    Locale.ROOT,
                    "M%.2f %.2fa4.5 4.5 0 1 0 9 0a4.5 4.5 0 1 0 -9 0z",
                    x(f) - 4.5,
                    y(g)))
        .append("\" fill=\"")
        .append(e.stability() == Stability.UNDECIDED ? "var(--paper,#fff)" : colour)
        .append("\" stroke=\"")
        .append(colour)
        .append("\" stroke-width=\"1.5\"/>\n");
    boolean second = number % 2 == 0;
    text(b, x(f) + (second ? -9 : 9), y(g) - 7, second ? "end" : "start", Integer.toString(number));
    b.append("</g></a>\n");
  }

  private double x(double f) {
    Window w = results.window();
    return LEFT
        + (f - w.lowestFrequency())
            / (w.highestFrequency() - w.lowestFrequency())
            * (width - LEFT - RIGHT);
  }

  private double y(double g) {
    return TOP + (high - g) / (high - low) * (height - TOP - BOTTOM);
  }

  private static void line(StringBuilder b, double[] p, String colour) {
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
        .append("\"/>\n");
  }

  private static void rect(StringBuilder b, double[] p, String fill, String stroke) {
    b.append("<rect x=\"")
        .append(at(p[0]))
        .append("\" y=\"")
        .append(at(p[1]))
        .append("\" width=\"")
        .append(at(p[2] - p[0]))
        .append("\" height=\"")
        .append(at(p[3] - p[1]))
        .append("\" fill=\"")
        .append(fill)
        .append("\" stroke=\"")
        .append(stroke)
        .append("\"/>\n");
  }

  private static void text(StringBuilder b, double x, double y, String anchor, String what) {
    b.append("<text x=\"")
        .append(at(x))
        .append("\" y=\"")
        .append(at(y))
        .append("\" text-anchor=\"")
        .append(anchor)
        .append("\">")
        .append(Svg.escape(what))
        .append("</text>\n");
  }
}
