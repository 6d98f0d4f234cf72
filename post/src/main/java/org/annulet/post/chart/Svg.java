package org.annulet.post.chart;

import java.util.Locale;

/** Text for SVG and HTML. */
public final class Svg {
  private Svg() {}

  /** A text with every character that markup could take for its own replaced. */
  public static String escape(String text) {
    StringBuilder b = new StringBuilder(text.length() + 8);
    for (int i = 0; i < text.length(); i++) {
      char c = text.charAt(i);
      switch (c) {
        case '&' -> b.append("&amp;");
        case '<' -> b.append("&lt;");
        case '>' -> b.append("&gt;");
        case '"' -> b.append("&quot;");
        case '\'' -> b.append("&#39;");
        default -> b.append(c < 0x20 && c != '\n' && c != '\t' ? ' ' : c);
      }
    }
    return b.toString();
  }

  /**
   * A drawing for a file of its own: on white, and with the fallback of every CSS variable in its
   * place, since few viewers outside a browser know variables.
   *
   * @param svg one SVG element
   */
  public static String standalone(String svg) {
    String plain = svg.replaceAll("var\\(--[a-z0-9-]+,\\s*([^)]*)\\)", "$1");
    int inside = plain.indexOf('>') + 1;
    return plain.substring(0, inside)
        + "\n<rect width=\"100%\" height=\"100%\" fill=\"#fff\"/>"
        + plain.substring(inside);
  }

  /** A coordinate with two decimals. */
  static String at(double v) {
    String s = String.format(Locale.ROOT, "%.2f", v);
    return s.equals("-0.00") ? "0.00" : s;
  }

  /** A round step that divides a span into at most {@code most} parts: 1, 2 or 5 times a power. */
  public static double step(double span, int most) {
    double raw = span / most;
    double power = Math.pow(10, Math.floor(Math.log10(raw)));
    double f = raw / power;
    return (f <= 1 ? 1 : f <= 2 ? 2 : f <= 5 ? 5 : 10) * power;
  }

  /** A tick's number without needless decimals. */
  public static String tick(double v, double step) {
    int decimals = (int) Math.max(0, -Math.floor(Math.log10(step) + 1e-9));
    String s = String.format(Locale.ROOT, "%." + decimals + "f", v);
    return (s.matches("-0(\\.0*)?") ? s.substring(1) : s).replace('-', '−');
  }
}
