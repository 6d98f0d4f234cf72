package org.annulet.cases.read;

import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.annulet.cases.units.QuantityKind;

/** Reads {@code gas}. */
final class GasReader {
  /** Above this a temperature is more likely a slip than a flame. */
  private static final double HOT = 3500;

  private static final List<String> WAYS = List.of("temperature", "sound_speed", "as");

  private final double pressure;
  private final Mapping zones;
  private final Map<String, Gas.ZoneGas> known = new LinkedHashMap<>();

  private GasReader(double pressure, Mapping zones) {
    this.pressure = pressure;
    this.zones = zones;
  }

  /**
   * The gas.
   *
   * @param zoneNames zones of the geometry; empty when they are not known yet
   */
  static Gas read(Entry entry, List<String> zoneNames) {
    Mapping m = Mapping.of(entry, CaseKeys.GAS);
    double pressure = m.number("mean_pressure", QuantityKind.PRESSURE, Range.POSITIVE);
    Optional<Entry> zones = m.get("zones");
    if (zones.isEmpty()) {
      return new Gas(pressure, Map.of());
    }
    GasReader r = new GasReader(pressure, Mapping.named(zones.get()));
    for (String name : r.zones.names()) {
      if (!zoneNames.isEmpty() && !zoneNames.contains(name)) {
        r.zones.at(name).fault("no zone '" + name + "'", Nearest.advice(name, zoneNames));
      }
      r.zone(name);
    }
    List<String> without = zoneNames.stream().filter(z -> !r.zones.has(z)).toList();
    if (!without.isEmpty() && zones.get().isMapping()) {
      zones
          .get()
          .fault(
              "no gas in zone '" + String.join("', '", without) + "'",
              "add '" + without.get(0) + ": {temperature: …, gamma: …, gas_constant: …}'");
    }
    r.resolve();
    return new Gas(pressure, r.known);
  }

  private void zone(String name) {
    Entry entry = zones.get(name).orElseThrow();
    Mapping z = Mapping.of(entry, CaseKeys.GAS_ZONE);
    Optional<String> way = z.exactlyOne(WAYS);
    if (way.isEmpty()) {
      return;
    }
    switch (way.get()) {
      case "as" -> only(z, List.of("as"));
      case "sound_speed" -> given(z).ifPresent(g -> known.put(name, g));
      default -> withTemperature(z).ifPresent(g -> known.put(name, g));
    }
  }

  private static void only(Mapping z, List<String> keys) {
    for (String key : z.names()) {
      if (!keys.contains(key)) {
        z.at(key)
            .fault(
                "'" + key + "' does not go with '" + keys.get(0) + "'",
                "give a temperature with gamma and gas_constant or with a mixture; or sound_speed"
                    + " and density; or 'as: <zone>'");
      }
    }
  }

  private static boolean missing(Mapping z, String key, String beside) {
    if (z.has(key)) {
      return false;
    }
    z.entry().fault("'" + key + "' is missing beside '" + beside + "'", "add '" + key + ": …'");
    return true;
  }

  private Optional<Gas.ZoneGas> given(Mapping z) {
    only(z, List.of("sound_speed", "density"));
    double c = z.number("sound_speed", QuantityKind.SPEED, Range.POSITIVE);
    double rho = z.number("density", QuantityKind.DENSITY, Range.POSITIVE);
    if (missing(z, "density", "sound_speed")) {
      return Optional.empty();
    }
    double gamma = rho * c * c / pressure;
    if (Range.GAMMA.excludes(gamma)) {
      z.entry()
          .fault(
              "gamma = density × sound_speed² / mean_pressure = " + Shown.number(gamma),
              "gamma must be " + Range.GAMMA.words() + ": check all three, pressure is absolute");
    }
    return Optional.of(new Gas.Given(c, rho));
  }

  private static Optional<Gas.ZoneGas> withTemperature(Mapping z) {
    Gas.Temperature temperature = temperature(z.get("temperature").orElseThrow());
    if (z.has("mixture")) {
      only(z, List.of("temperature", "mixture"));
      return mixture(z.get("mixture").orElseThrow()).map(x -> new Gas.Mixed(temperature, x));
    }
    only(z, List.of("temperature", "gamma", "gas_constant"));
    if (!z.has("gamma") && !z.has("gas_constant")) {
      z.entry()
          .fault(
              "a temperature alone does not make a gas",
              "add 'mixture: air', or 'gamma: …' and 'gas_constant: …'");
      return Optional.empty();
    }
    if (missing(z, "gamma", "temperature") | missing(z, "gas_constant", "temperature")) {
      return Optional.empty();
    }
    return Optional.of(
        new Gas.Perfect(
            temperature,
            z.number("gamma", QuantityKind.FRACTION, Range.GAMMA),
            z.number("gas_constant", QuantityKind.GAS_CONSTANT, Range.POSITIVE)));
  }

  private static Gas.Temperature temperature(Entry entry) {
    if (entry.isText()) {
      double kelvin = entry.number(QuantityKind.TEMPERATURE, Range.POSITIVE);
      if (kelvin > HOT) {
        entry.caution(
            "a temperature of " + entry.shown() + " is above any flame in air",
            "check the value and its unit");
      }
      return new Gas.Uniform(kelvin);
    }
    Mapping m = Mapping.of(entry, CaseKeys.TEMPERATURE);
    Optional<String> way = m.exactlyOne(List.of("profile", "file"));
    if (way.equals(Optional.of("file"))) {
      return new Gas.FromFile(CaseFolder.existing(m.get("file").orElseThrow()).orElse(null));
    }
    return way.map(w -> profile(Mapping.of(m.get(w).orElseThrow(), CaseKeys.PROFILE)))
        .orElse(new Gas.Uniform(Double.NaN));
  }

  private static Gas.Temperature profile(Mapping p) {
    List<Double> x =
        p.get("x").map(e -> e.numbers(QuantityKind.LENGTH, Range.ANY)).orElse(List.of());
    List<Double> t =
        p.get("temperature")
            .map(e -> e.numbers(QuantityKind.TEMPERATURE, Range.POSITIVE))
            .orElse(List.of());
    if (p.has("x") && p.has("temperature") && x.size() != t.size()) {
      p.entry()
          .fault(
              x.size() + " stations but " + t.size() + " temperatures",
              "give one temperature for each station");
    }
    for (int i = 1; i < x.size(); i++) {
      if (x.get(i) <= x.get(i - 1)) {
        p.get("x")
            .orElseThrow()
            .fault("station " + (i + 1) + " is not behind the one before", "sort by rising x");
        break;
      }
    }
    return new Gas.AlongAxis(List.copyOf(x), List.copyOf(t));
  }

  private static Optional<Gas.Mixture> mixture(Entry entry) {
    if (entry.isText()) {
      return entry.choice(List.of("air")).map(w -> new Gas.Air());
    }
    Mapping m = Mapping.of(entry, CaseKeys.MIXTURE);
    double ratio = m.number("equivalence_ratio", QuantityKind.FRACTION, Range.SHARE);
    Map<String, Double> fuel = new LinkedHashMap<>();
    Optional<Entry> parts = m.get("fuel");
    if (parts.isPresent() && parts.get().isText()) {
      parts.get().nameOf("fuel", Gas.BurntFuel.FUELS).ifPresent(f -> fuel.put(f, 1.0));
    } else {
      parts.ifPresent(e -> blend(Mapping.named(e), fuel));
    }
    return Optional.of(new Gas.BurntFuel(fuel, ratio));
  }

  private static void blend(Mapping parts, Map<String, Double> fuel) {
    double sum = 0;
    for (String name : parts.names()) {
      if (!Gas.BurntFuel.FUELS.contains(name)) {
        parts.at(name).fault("no fuel '" + name + "'", Nearest.advice(name, Gas.BurntFuel.FUELS));
      }
      double part = parts.number(name, QuantityKind.FRACTION, Range.PART);
      fuel.put(name, part);
      sum += part;
    }
    if (Math.abs(sum - 1) > 1e-6 && parts.entry().isMapping()) {
      parts
          .entry()
          .fault(
              "the parts of the fuel add up to " + Shown.number(100 * sum) + " %",
              "parts by volume add up to 100 %");
    }
  }

  /** Replaces {@code as: zone} by the gas of that zone. */
  private void resolve() {
    for (String name : zones.names()) {
      Set<String> seen = new LinkedHashSet<>();
      String at = name;
      while (reference(at) != null && seen.add(at)) {
        at = reference(at);
      }
      if (reference(at) != null) {
        zones
            .get(name)
            .orElseThrow()
            .fault(
                "'as' goes in a circle: " + String.join(" → ", seen) + " → " + at,
                "give one of these zones a gas of its own");
      } else if (!zones.has(at)) {
        Mapping before = Mapping.named(zones.get(name).orElseThrow());
        if (seen.size() == 1) {
          before
              .get("as")
              .orElseThrow()
              .fault("no gas of a zone '" + at + "'", Nearest.advice(at, zones.names()));
        }
      } else if (known.containsKey(at)) {
        known.put(name, known.get(at));
      }
    }
  }

  /** The zone that {@code name} borrows its gas from, or null. */
  private String reference(String name) {
    return zones
        .get(name)
        .filter(Entry::isMapping)
        .flatMap(e -> Mapping.named(e).get("as"))
        .flatMap(Entry::text)
        .orElse(null);
  }
}
