package org.annulet.post.report;

import static org.annulet.post.chart.Svg.escape;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.annulet.post.meaning.GeometryKind;
import org.annulet.post.meaning.GrowthBudget;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.ModeLabel;
import org.annulet.post.table.Numbers;

/** What stands beside the moving field of a mode: facts, growth budget, sensitivities. */
final class ModeDetails {
  private static final int ITEMS = 10;

  private ModeDetails() {}

  static void append(StringBuilder b, ReportInput input, int i) {
    ModeEntry e = input.results().modes().get(i);
    facts(b, input, e);
    e.budget().ifPresent(budget -> budget(b, budget));
  }

  private static void facts(StringBuilder b, ReportInput input, ModeEntry e) {
    ModeLabel label = e.label();
    b.append("<dl>");
    fact(b, "found in", e.view().operatorName());
    fact(
        b,
        "energy",
        String.format(Locale.ROOT, "%.0f %% in %s", 100 * label.zoneShare(), label.zone()));
    fact(b, "nodes there", label.axialNodes() + " axial, " + label.radialNodes() + " radial");
    if (!label.pattern().isEmpty()) {
      fact(b, "on the ring", label.pattern());
    }
    if (label.pairing() != ModeLabel.Pairing.SINGLE) {
      fact(
          b,
          "pair",
          label.pairing() == ModeLabel.Pairing.EXACT
              ? "one eigenvalue, orientation open"
              : "split, with mode " + (label.partner() + 1));
    }
    if (input.chamber().kind() == GeometryKind.SECTION
        && label.azimuthalOrder() != null
        && label.azimuthalOrder() > 0) {
      fact(b, "round the axis", "the picture is one cut; the field turns with e^{imθ}");
    }
    origin(label).ifPresent(text -> fact(b, "without flames", text));
    fact(b, "verdict", e.view().mode().verdict().name().toLowerCase(Locale.ROOT).replace('_', ' '));
    b.append("</dl>\n");
  }

  private static Optional<String> origin(ModeLabel label) {
    return switch (label.origin()) {
      case NOT_TRACED -> Optional.empty();
      case ACOUSTIC -> Optional.of("stays as an acoustic mode of the chamber");
      case INTRINSIC -> Optional.of("vanishes: born by the flame's delay");
      case AMBIGUOUS -> Optional.of("cannot be told: it passes a place where two modes exchange");
    };
  }

  private static void fact(StringBuilder b, String name, String value) {
    b.append("<dt>").append(name).append("</dt><dd>").append(escape(value)).append("</dd>");
  }

  private static void budget(StringBuilder b, GrowthBudget budget) {
    List<GrowthBudget.Item> items = new ArrayList<>(budget.items());
    if (items.size() > ITEMS + 1) {
      List<GrowthBudget.Item> rest = items.subList(ITEMS, items.size());
      GrowthBudget.Item sum =
          new GrowthBudget.Item(
              rest.size() + " smaller items",
              rest.stream().mapToDouble(GrowthBudget.Item::growthShare).sum(),
              rest.stream().mapToDouble(GrowthBudget.Item::frequencyShift).sum());
      items = new ArrayList<>(items.subList(0, ITEMS));
      items.add(sum);
    }
    double largest =
        Math.max(
            Math.abs(budget.growthRate()),
            items.stream().mapToDouble(x -> Math.abs(x.growthShare())).max().orElse(0));
    b.append("<div class=\"bars\"><h4>What drives, what damps [1/s]</h4>\n");
    for (GrowthBudget.Item item : items) {
      bar(
          b,
          new String[] {
            "bar",
            item.name(),
            Numbers.signed(item.growthShare())
                + " (first order "
                + Numbers.signed(item.frequencyShift())
                + " Hz)"
          },
          largest > 0 ? item.growthShare() / largest : 0);
    }
    bar(
        b,
        new String[] {"bar sum", "growth rate", Numbers.signed(budget.growthRate())},
        largest > 0 ? budget.growthRate() / largest : 0);
    double remainder = Math.abs(budget.remainder());
    if (remainder > 1e-6 * Math.max(largest, 1e-3)) {
      b.append("<p class=\"sign\">The shares leave ")
          .append(escape(String.format(Locale.ROOT, "%.2g", budget.remainder())))
          .append(" 1/s unexplained: the mode is not converged that far.</p>");
    }
    b.append("</div>\n");
  }

  private static void bar(StringBuilder b, String[] texts, double fraction) {
    b.append("<div class=\"")
        .append(texts[0])
        .append("\"><span>")
        .append(escape(texts[1]))
        .append("</span><span>")
        .append(escape(texts[2].replace('-', '−')))
        .append("</span>");
    track(b, fraction);
    b.append("</div>\n");
  }

  private static void track(StringBuilder b, double fraction) {
    b.append("<span class=\"track\"><i class=\"")
        .append(fraction >= 0 ? "drives" : "damps")
        .append("\" style=\"width:")
        .append(String.format(Locale.ROOT, "%.2f", 50 * Math.min(1, Math.abs(fraction))))
        .append("%\"></i></span>");
  }

  /** One bar of a table of levers. */
  private record Lever(String name, String value, double growth, double frequency, String range) {}

  /** Ranked bars of what one percent more of each input does; nothing where it was not computed. */
  static void levers(StringBuilder b, ModeEntry e) {
    levers(
        b,
        "What one percent more does",
        e.sensitivities().stream()
            .map(
                s ->
                    new Lever(
                        s.key(),
                        s.value(),
                        s.growthPerPercent(),
                        s.frequencyPerPercent(),
                        range(s.linearRange())))
            .toList(),
        "First order, all other inputs held; it holds to a tenth within the range given. Weaker"
            + " inputs, in sensitivities.csv: ");
    levers(
        b,
        "What one millimetre more does",
        e.points().stream()
            .map(
                s ->
                    new Lever(
                        s.coordinate() + " of " + s.point(),
                        s.value(),
                        s.growthPerMillimetre(),
                        s.frequencyPerMillimetre(),
                        millimetres(s.linearRange())))
            .toList(),
        "First order, all other points held, edges follow; effects of points moved together add."
            + " Weaker points, in points.csv: ");
  }

  private static void levers(StringBuilder b, String title, List<Lever> all, String foot) {
    if (all.isEmpty()) {
      return;
    }
    List<Lever> top = all.subList(0, Math.min(ITEMS, all.size()));
    double largest = top.stream().mapToDouble(s -> Math.abs(s.growth)).max().orElse(0);
    b.append("<div class=\"bars levers\"><h4>")
        .append(title)
        .append("</h4>\n")
        .append("<div class=\"bar head\"><span></span><span></span><span>growth [1/s]</span>")
        .append("<span>frequency [Hz]</span><span>holds within</span></div>\n");
    for (Lever s : top) {
      b.append("<div class=\"bar\"><span>")
          .append(escape(s.name))
          .append(" <small>")
          .append(escape(s.value))
          .append("</small></span>");
      track(b, largest > 0 ? s.growth / largest : 0);
      b.append("<span>")
          .append(Numbers.signed(s.growth).replace('-', '−'))
          .append("</span><span>")
          .append(Numbers.signed(s.frequency).replace('-', '−'))
          .append("</span><span>")
          .append(s.range)
          .append("</span></div>\n");
    }
    b.append("<p class=\"sign\">")
        .append(foot)
        .append(all.size() - top.size())
        .append(".</p></div>\n");
  }

  /** How far a straight line serves, in percent of the input. */
  private static String range(double percent) {
    if (!(percent < 100)) {
      return "±100 %";
    }
    return String.format(Locale.ROOT, percent < 1 ? "±%.1g %%" : "±%.0f %%", percent);
  }

  /** How far a straight line serves, in mm. */
  private static String millimetres(double range) {
    if (!(range < 1000)) {
      return "±1 m";
    }
    return String.format(Locale.ROOT, range < 1 ? "±%.1g mm" : "±%.0f mm", range);
  }
}
