package org.annulet.post.report;

import static org.annulet.post.chart.Svg.escape;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.ModeEntry.Stability;
import org.annulet.post.meaning.ModeMaps;
import org.annulet.post.meaning.Place;
import org.annulet.post.meaning.Results;
import org.annulet.post.table.Numbers;

/** The part of the report that says where on the walls a damper helps, mode by mode and in all. */
final class DamperPlaces {
  /** From 1/(s m²) to 1/s per cm². */
  static final double PER_CM2 = 1e-4;

  /** How many of the least stable modes are looked at when none grows. */
  private static final int LEAST_STABLE = 3;

  private DamperPlaces() {}

  /** The modes a damper is wanted for: those that grow or may grow, else the least stable ones. */
  private static List<ModeEntry> wanted(Results results) {
    List<ModeEntry> mapped =
        results.modes().stream()
            .filter(e -> e.maps().isPresent() && ModeMaps.best(e.maps().get().damper()) >= 0)
            .toList();
    List<ModeEntry> grow = mapped.stream().filter(e -> e.stability() != Stability.DECAYS).toList();
    if (!grow.isEmpty()) {
      return grow;
    }
    return mapped.stream()
        .sorted(Comparator.comparingDouble(e -> -e.view().mode().growthRate()))
        .limit(LEAST_STABLE)
        .toList();
  }

  /** Their maps; empty when no mode has maps. */
  static List<ModeMaps> targets(Results results) {
    return wanted(results).stream().map(e -> e.maps().orElseThrow()).toList();
  }

  static void append(StringBuilder b, ReportInput input) {
    List<ModeEntry> wanted = wanted(input.results());
    if (wanted.isEmpty()) {
      return;
    }
    boolean grow = wanted.get(0).stability() != Stability.DECAYS;
    double[] worst = ModeMaps.worst(targets(input.results()));
    int best = ModeMaps.best(worst);
    b.append("<section id=\"dampers\"><h2>Where a damper helps</h2>\n<p>")
        .append(
            grow
                ? "For the modes that grow or may grow"
                : "No mode grows; for the least stable ones")
        .append(": change of the growth rate for each cm² of a small tuned damper whose impedance")
        .append(" is that of the gas, ρc, in first order. ");
    if (worst[best] < 0) {
      b.append("The place that serves the worst served of them best is ")
          .append(escape(Place.words(input.chamber(), best, worst)))
          .append(": at least ")
          .append(value(worst[best]))
          .append(" 1/s per cm² for each.");
    } else {
      b.append("No single place damps all of them.");
    }
    b.append("</p>\n<figure class=\"worst\"><canvas width=\"600\" height=\"200\" role=\"img\"")
        .append(" aria-label=\"Damping at the worst of the modes, over the walls\"></canvas>\n")
        .append("<div class=\"legend\"><span>damps</span><span class=\"ramp\"></span>")
        .append("<span>drives</span></div><figcaption>The worst of these modes at each place.")
        .append(" Area spread over the places that are alike; of a pair the mean, since one damper")
        .append(" alone acts on one member with twice that and leaves the other as it is.")
        .append("</figcaption></figure>\n<div class=\"scroll\" tabindex=\"0\" role=\"region\"")
        .append(
            " aria-label=\"Best place for each mode\"><table class=\"modes places\"><thead><tr><th>mode</th>")
        .append("<th>best place</th><th class=\"num\">there [1/s per cm²]</th>")
        .append("<th class=\"num\">at the common place</th></tr></thead><tbody>\n");
    List<ModeMaps> seen = new ArrayList<>();
    for (ModeEntry e : wanted) {
      ModeMaps maps = e.maps().orElseThrow();
      if (seen.stream().anyMatch(m -> m.damper() == maps.damper())) {
        continue; // the other member of a pair
      }
      seen.add(maps);
      int own = ModeMaps.best(maps.damper());
      int number = input.results().modes().indexOf(e) + 1;
      b.append("<tr><td><a href=\"#mode-")
          .append(number)
          .append("\">Mode ")
          .append(number)
          .append("</a>, ")
          .append(String.format(Locale.ROOT, "%.0f Hz", e.view().mode().frequency()))
          .append("</td><td data-name=\"best place\">")
          .append(escape(Place.words(input.chamber(), own, maps.damper())))
          .append("</td><td class=\"num\" data-name=\"there [1/s per cm²]\">")
          .append(value(maps.damper()[own]))
          .append("</td><td class=\"num\" data-name=\"at the common place\">")
          .append(value(maps.damper()[best]))
          .append("</td></tr>\n");
    }
    b.append("</tbody></table></div></section>\n");
  }

  private static String value(double perSquareMetre) {
    return Numbers.signed(perSquareMetre * PER_CM2).replace('-', '−');
  }
}
