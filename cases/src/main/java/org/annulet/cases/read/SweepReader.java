package org.annulet.cases.read;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Reads {@code studies.sweep}. */
final class SweepReader {
  private static final int MOST_POINTS = 2000;
  private static final int MOST_KNOTS = 100;
  private static final Pattern VALUE =
      Pattern.compile("([+-]?(?:[0-9]+\\.?[0-9]*|\\.[0-9]+)(?:[eE][+-]?[0-9]+)?)\\s*(\\S.*)?");

  /** Parts of a case that a sweep leaves alone. */
  private static final List<String> NOT_SWEPT =
      List.of("annulet", "title", "about", "window", "studies", "outputs", "variants");

  private SweepReader() {}

  static Optional<Sweep> read(Entry entry) {
    Mapping m = Mapping.of(entry, CaseKeys.SWEEP);
    boolean map = m.has("across");
    Optional<Sweep.Axis> along = m.get("along").flatMap(e -> axis(e, map ? 21 : 41));
    Optional<Sweep.Axis> across = m.get("across").flatMap(e -> axis(e, 21));
    if (along.isEmpty() || map && across.isEmpty()) {
      return Optional.empty();
    }
    if (map) {
      Set<String> both = new LinkedHashSet<>(along.get().inputs().keySet());
      both.retainAll(across.get().inputs().keySet());
      if (!both.isEmpty()) {
        m.at("across")
            .fault(
                "'" + both.iterator().next() + "' is set along and across",
                "leave it to one of the two axes");
        return Optional.empty();
      }
    }
    return Optional.of(new Sweep(along.get(), across));
  }

  private static Optional<Sweep.Axis> axis(Entry entry, int preset) {
    Mapping m = Mapping.of(entry, CaseKeys.SWEEP_AXIS);
    int points = m.get("points").map(e -> e.whole(2, MOST_POINTS)).orElse(preset);
    Map<String, Sweep.Knots> inputs = new LinkedHashMap<>();
    m.get("set")
        .map(Mapping::named)
        .ifPresent(
            set ->
                set.entries()
                    .forEach(
                        (key, e) -> {
                          String part = key.replaceFirst("\\..*", "");
                          if (NOT_SWEPT.contains(part)) {
                            set.at(key)
                                .fault(
                                    "'" + part + "' cannot be swept",
                                    "name a value of geometry, gas, walls, two_ports, dampers or"
                                        + " flames");
                          } else {
                            knots(e).ifPresent(k -> inputs.put(key, k));
                          }
                        }));
    if (inputs.isEmpty()) {
      if (m.get("set").map(Entry::isMapping).orElse(false)
          && Mapping.named(m.get("set").orElseThrow()).names().isEmpty()) {
        m.at("set").fault("nothing is set on this axis", "add 'key path: [first, last]'");
      }
      return Optional.empty();
    }
    Map.Entry<String, Sweep.Knots> first = inputs.entrySet().iterator().next();
    List<Double> values = first.getValue().values();
    double[] shown = {values.get(0), values.get(values.size() - 1)};
    String name = first.getKey();
    if (!first.getValue().unit().isEmpty()) {
      name += " in " + first.getValue().unit();
    }
    Optional<Sweep.Knots> scale = m.get("shown").flatMap(SweepReader::knots);
    if (scale.isPresent()) {
      shown = new double[] {scale.get().values().get(0), last(scale.get().values())};
    }
    return Optional.of(
        new Sweep.Axis(
            m.get("name").flatMap(Entry::text).orElse(name), shown[0], shown[1], points, inputs));
  }

  private static double last(List<Double> values) {
    return values.get(values.size() - 1);
  }

  private static Optional<Sweep.Knots> knots(Entry entry) {
    if (!entry.isList()) {
      entry.fault(
          "a list of values is wanted, got " + entry.shown(), "write for example [1.5 ms, 3 ms]");
      return Optional.empty();
    }
    List<Double> values = new ArrayList<>();
    String unit = null;
    for (Entry item : entry.items()) {
      Optional<String> text = item.text();
      Matcher match = VALUE.matcher(text.orElse(""));
      if (!match.matches()) {
        text.ifPresent(
            t ->
                item.fault(
                    "'" + t + "' is not a number with a unit",
                    "only numbers can be swept; words belong into variants"));
        return Optional.empty();
      }
      String own = match.group(2) == null ? "" : match.group(2);
      if (unit != null && !unit.equals(own)) {
        item.fault(
            "the unit is '" + own + "', that of the values before '" + unit + "'",
            "write all values of a list in one unit");
        return Optional.empty();
      }
      unit = own;
      double value = Double.parseDouble(match.group(1));
      if (!Double.isFinite(value)) {
        item.fault("'" + match.group(1) + "' is out of range", "write a smaller number");
        return Optional.empty();
      }
      values.add(value);
    }
    if (values.size() < 2 || values.size() > MOST_KNOTS) {
      entry.fault(values.size() + " values", "write 2 to " + MOST_KNOTS + " values, first to last");
      return Optional.empty();
    }
    return Optional.of(new Sweep.Knots(values, unit));
  }
}
