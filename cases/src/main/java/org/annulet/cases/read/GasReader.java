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
  private static final List<String> WAYS = List.of("temperature", "sound_speed", "as");

  private final Optional<Geometry> geometry;
  private final double pressure;
  private final Mapping zones;
  private final Map<String, Gas.ZoneGas> known = new LinkedHashMap<>();

  private GasReader(double pressure, Mapping zones, Optional<Geometry> geometry) {
    this.geometry = geometry;
    this.pressure = pressure;
    this.zones = zones;
  }

  /**
   * The gas.
   *
   * @param geometry whose zones are filled; empty when it could not be read
   */
  static Gas read(Entry entry, Optional<Geometry> geometry) {
    List<String> zoneNames = geometry.map(Geometry::zoneNames).orElse(List.of());
    Mapping m = Mapping.of(entry, CaseKeys.GAS);
    double pressure = m.number("mean_pressure", QuantityKind.PRESSURE, Range.POSITIVE);
    Optional<Entry> zones = m.get("zones");
    if (zones.isEmpty()) {
      return new Gas(pressure, Map.of());
    }
    GasReader r = new GasReader(pressure, Mapping.named(zones.get()), geometry);
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
    if (!z.has("temperature") && z.has("mixture")) {
      z.entry()
          .fault(
              "a mixture without a temperature",
              "add 'temperature: …'; for burnt gas 'temperature: {adiabatic_from: 650 K}' takes the"
                  + " adiabatic flame temperature of air of 650 K");
      return;
    }
    Optional<String> way = z.exactlyOne(WAYS);
    if (way.isEmpty()) {
      return;
    }
    switch (way.get()) {
      case "as" -> only(z, List.of("as"));
      case "sound_speed" -> given(z).ifPresent(g -> known.put(name, g));
      default -> withTemperature(name, z).ifPresent(g -> known.put(name, g));
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

  private Optional<Gas.ZoneGas> withTemperature(String zone, Mapping z) {
    Optional<Gas.Temperature> read =
        new TemperatureReader(geometry, zone).read(z.get("temperature").orElseThrow());
    if (read.isEmpty()) {
      return Optional.empty();
    }
    Gas.Temperature temperature = read.get();
    if (temperature instanceof Gas.Adiabatic && !z.has("mixture")) {
      z.at("temperature")
          .fault("an adiabatic temperature without a fuel", "add 'mixture: {fuel: …}'");
    }
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

  private static Optional<Gas.Mixture> mixture(Entry entry) {
    if (entry.isText()) {
      return entry.choice(List.of("air")).map(w -> new Gas.Air());
    }
    Mapping m = Mapping.of(entry, CaseKeys.MIXTURE);
    Gas.Air air = new Gas.Air(m.get("humid_air").map(GasReader::humidity));
    if (!m.has("fuel")) {
      if (m.has("equivalence_ratio") || m.has("progress") || !m.has("humid_air")) {
        entry.fault("the key 'fuel' is missing", "name a fuel, or write 'mixture: air'");
      }
      return Optional.of(air);
    }
    if (!m.has("equivalence_ratio")) {
      entry.fault("the key 'equivalence_ratio' is missing", "add 'equivalence_ratio: 0.5'");
    }
    double ratio = m.number("equivalence_ratio", QuantityKind.FRACTION, Range.SHARE, Double.NaN);
    double progress = m.number("progress", QuantityKind.FRACTION, Range.PART, 1);
    Map<String, Double> fuel = new LinkedHashMap<>();
    Optional<Entry> parts = m.get("fuel");
    if (parts.isPresent() && parts.get().isText()) {
      parts.get().nameOf("fuel", Gas.BurntFuel.FUELS).ifPresent(f -> fuel.put(f, 1.0));
    } else {
      parts.ifPresent(e -> blend(Mapping.named(e), fuel));
    }
    return Optional.of(new Gas.BurntFuel(fuel, ratio, progress, air));
  }

  private static Gas.Humidity humidity(Entry entry) {
    Mapping m = Mapping.of(entry, CaseKeys.HUMID_AIR);
    return new Gas.Humidity(
        m.number("relative_humidity", QuantityKind.FRACTION, Range.PART),
        m.number("temperature", QuantityKind.TEMPERATURE, Range.POSITIVE),
        m.number("pressure", QuantityKind.PRESSURE, Range.POSITIVE));
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
