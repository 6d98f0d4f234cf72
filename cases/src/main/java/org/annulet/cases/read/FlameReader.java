package org.annulet.cases.read;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.annulet.cases.units.QuantityKind;

/** Reads {@code flames}. */
final class FlameReader {
  private static final List<String> ANSWERS = List.of("uniform", "pointwise");

  private final Geometry geometry;
  private final EdgeNames names;

  FlameReader(Geometry geometry) {
    this.geometry = geometry;
    this.names = EdgeNames.of(geometry);
  }

  List<Flame> read(Entry entry) {
    List<Flame> flames = new ArrayList<>();
    Mapping all = Mapping.named(entry).checkNames();
    if (geometry instanceof Geometry.CrossSection && !all.entries().isEmpty()) {
      entry.fault(
          "flames on a cross-section, which the mean flow crosses",
          "use 'kind: ring', 'section' or 'plane'");
    }
    all.entries().forEach((name, e) -> flame(name, Mapping.of(e, CaseKeys.FLAME), flames));
    return flames;
  }

  private void flame(String name, Mapping m, List<Flame> flames) {
    double heat = m.number("heat_release", QuantityKind.POWER, Range.POSITIVE);
    Optional<Flame.Place> place = m.get("place").flatMap(this::place);
    Optional<Flame.Reference> reference =
        m.get("reference").map(this::reference).orElseGet(() -> presetReference(m, place));
    boolean pressure =
        reference.isPresent()
            && (reference.get() instanceof Flame.EdgePressure
                || reference.get() instanceof Flame.PatchPressure);
    double velocity = velocity(m, pressure);
    Optional<Flame.Response> response = m.get("response").flatMap(ResponseReader::read);
    List<Flame.StagedBurners> staging =
        m.get("staging").map(e -> staging(e, response)).orElse(List.of());
    if (place.isPresent() && reference.isPresent()) {
      pointwise(m, place.get(), reference.get());
      if (response.isPresent()) {
        flames.add(
            new Flame(
                name,
                heat,
                optional(m, "fuel_flow", QuantityKind.MASS_FLOW, Range.POSITIVE),
                place.get(),
                reference.get(),
                velocity,
                response.get(),
                staging));
      }
    }
  }

  private static double velocity(Mapping m, boolean pressure) {
    if (pressure && m.has("reference_velocity")) {
      m.at("reference_velocity")
          .fault("a flame that answers to pressure has no reference velocity", "leave it out");
    }
    if (!pressure && !m.has("reference_velocity")) {
      m.entry()
          .fault(
              "the key 'reference_velocity' is missing",
              "add the mean velocity the response refers to, as in 57 m/s");
    }
    return m.number("reference_velocity", QuantityKind.SPEED, Range.POSITIVE, Double.NaN);
  }

  private void pointwise(Mapping m, Flame.Place place, Flame.Reference reference) {
    if (place instanceof Flame.Sheet s
        && s.answer() == Flame.Answer.POINTWISE
        && !(reference instanceof Flame.EdgeFlux f && f.edge().equals(s.edge()))) {
      m.at("reference")
          .fault(
              "a sheet that answers pointwise refers to its own edge",
              "leave 'reference' out, or write 'edge: " + s.edge() + "'");
    }
  }

  private Optional<Flame.Place> place(Entry entry) {
    Mapping m = Mapping.of(entry, CaseKeys.PLACE);
    Optional<String> way = m.exactlyOne(List.of("sheet", "zone"));
    if (way.isEmpty()) {
      return Optional.empty();
    }
    if (way.get().equals("zone") && (m.has("brush") || m.has("heat_file"))) {
      only(m, List.of("zone", "width", "brush", "heat_file"));
      return stretch(m)
          .flatMap(
              s ->
                  HeatDensityReader.read(m, geometry, s.zone)
                      .map(d -> new Flame.Brush(s.zone, s.width, d)));
    }
    if (way.get().equals("zone")) {
      only(m, List.of("zone", "from", "to", "distance", "width"));
      return stretch(m).map(s -> new Flame.Spread(s.zone, s.from, s.to, s.width));
    }
    only(m, List.of("sheet", "answer"));
    Optional<String> edge = innerEdge(m.get("sheet").orElseThrow());
    Optional<String> answer = m.get("answer").flatMap(e -> e.choice(ANSWERS));
    if (answer.equals(Optional.of("pointwise")) && !(geometry instanceof Geometry.Section)) {
      m.get("answer")
          .orElseThrow()
          .fault("a pointwise answer outside a section", "write 'answer: uniform'");
    }
    Flame.Answer how = Flame.Answer.valueOf(answer.orElse("uniform").toUpperCase(Locale.ROOT));
    return edge.map(e -> new Flame.Sheet(e, how));
  }

  private static void only(Mapping m, List<String> keys) {
    for (String key : m.names()) {
      if (!keys.contains(key)) {
        m.at(key)
            .fault(
                "'" + key + "' does not go with '" + keys.get(0) + "'",
                "keys that do: " + String.join(", ", keys));
      }
    }
  }

  private Optional<String> innerEdge(Entry entry) {
    if (!names.known()) {
      return entry.text();
    }
    Optional<String> name = entry.text();
    if (name.isPresent() && names.walls().contains(name.get())) {
      entry.fault(
          "edge '" + name.get() + "' is a wall: a flame sheet has gas on both sides",
          Nearest.advice(name.get(), names.inner().keySet()));
      return Optional.empty();
    }
    return entry.nameOf("inner edge", List.copyOf(names.inner().keySet()));
  }

  private Optional<Flame.Reference> reference(Entry entry) {
    Mapping m = Mapping.of(entry, CaseKeys.REFERENCE);
    Optional<String> way = m.exactlyOne(List.of("edge", "zone"));
    if (way.isEmpty()) {
      return Optional.empty();
    }
    boolean pressure =
        m.get("quantity")
            .flatMap(e -> e.choice(List.of("velocity", "pressure")))
            .equals(Optional.of("pressure"));
    if (way.get().equals("edge") && pressure) {
      only(m, List.of("edge", "quantity"));
      Entry edge = m.get("edge").orElseThrow();
      return (names.known() ? edge.nameOf("edge", names.all()) : edge.text())
          .map(Flame.EdgePressure::new);
    }
    if (way.get().equals("edge")) {
      only(m, List.of("edge", "flow_from", "quantity"));
      return innerEdge(m.get("edge").orElseThrow())
          .flatMap(e -> upstream(e, m).map(z -> new Flame.EdgeFlux(e, z)));
    }
    if (pressure) {
      only(m, List.of("zone", "from", "to", "distance", "width", "quantity"));
      return stretch(m).map(s -> new Flame.PatchPressure(s.zone, s.from, s.to, s.width));
    }
    only(m, List.of("zone", "from", "to", "distance", "width", "direction", "quantity"));
    double[] direction = {1, 0};
    Optional<Entry> given = m.get("direction");
    if (given.isPresent()) {
      List<Double> d = given.get().numbers(QuantityKind.FRACTION, Range.ANY, 2);
      double length = Math.hypot(d.get(0), d.get(1));
      if (length == 0) {
        given.get().fault("a direction without length", "write for example [1, 0]");
      }
      direction = new double[] {d.get(0) / length, d.get(1) / length};
    }
    double[] n = direction;
    return stretch(m).map(s -> new Flame.Patch(s.zone, s.from, s.to, s.width, n[0], n[1]));
  }

  private Optional<Flame.Reference> presetReference(Mapping flame, Optional<Flame.Place> place) {
    if (place.isPresent() && place.get() instanceof Flame.Sheet s) {
      return upstream(s.edge(), flame).map(z -> new Flame.EdgeFlux(s.edge(), z));
    }
    if (place.isPresent()) {
      flame
          .entry()
          .fault(
              "the key 'reference' is missing",
              "a flame spread over a zone needs one: 'reference: {edge: …}' or {zone: …}");
    }
    return Optional.empty();
  }

  /** The zone the flow comes from at an inner edge: stated, or the ring's order, or the ducts. */
  private Optional<String> upstream(String edge, Mapping m) {
    Optional<Entry> stated = m.get("flow_from");
    List<String> sides = names.inner().getOrDefault(edge, List.of());
    if (stated.isPresent()) {
      return sides.isEmpty()
          ? stated.get().text()
          : stated.get().nameOf("zone at edge '" + edge + "' called", sides);
    }
    if (geometry instanceof Geometry.Ring) {
      return Optional.of(sides.isEmpty() ? "" : sides.get(0));
    }
    Optional<Outline> outline = outline();
    List<String> ducts =
        sides.stream()
            .filter(
                z ->
                    outline.isPresent() && outline.get().zones().get(z).separateDucts().isPresent())
            .toList();
    if (ducts.size() == 1) {
      return Optional.of(ducts.get(0));
    }
    m.entry()
        .fault(
            "it is not clear on which side of edge '" + edge + "' the flow comes",
            "write 'reference: {edge: "
                + edge
                + ", flow_from: "
                + (sides.isEmpty() ? "…" : String.join("}' or '", sides.get(0)))
                + "}', zones there: "
                + String.join(", ", sides));
    return Optional.empty();
  }

  private Optional<Outline> outline() {
    if (geometry instanceof Geometry.Section s) {
      return Optional.of(s.outline());
    }
    return geometry instanceof Geometry.Plane p ? Optional.of(p.outline()) : Optional.empty();
  }

  private record Stretch(String zone, double from, double to, double width) {}

  /** A zone, or the part of it between two axial coordinates. */
  private Optional<Stretch> stretch(Mapping m) {
    Entry zoneEntry = m.get("zone").orElseThrow();
    Optional<String> zone =
        geometry instanceof Geometry.MeshFile && geometry.zoneNames().isEmpty()
            ? zoneEntry.text()
            : zoneEntry.nameOf("zone", geometry.zoneNames());
    boolean ring = geometry instanceof Geometry.Ring;
    for (String key : List.of("distance", "width")) {
      if (!ring && m.has(key)) {
        m.at(key).fault("'" + key + "' outside a ring", "use 'from' and 'to', coordinates x");
      }
    }
    double width =
        m.get("width")
            .map(e -> e.number(QuantityKind.LENGTH, Range.POSITIVE))
            .orElse(Double.POSITIVE_INFINITY);
    double[] x = bounds(m, zone);
    if (x[0] >= x[1]) {
      m.entry().fault("the stretch ends before it begins", "'from' must lie below 'to'");
    }
    if (ring && zone.isPresent()) {
      Geometry.Ring r = (Geometry.Ring) geometry;
      double start = r.start(zone.get());
      double end = start + r.zone(zone.get()).length();
      double slack = 1e-9 * end;
      if (Double.isFinite(x[0]) && x[0] < start - slack
          || Double.isFinite(x[1]) && x[1] > end + slack) {
        m.entry()
            .fault(
                "the stretch x = "
                    + Shown.millimetres(x[0])
                    + " to "
                    + Shown.millimetres(x[1])
                    + " leaves zone '"
                    + zone.get()
                    + "'",
                "the zone spans x = "
                    + Shown.millimetres(start)
                    + " to "
                    + Shown.millimetres(end)
                    + "; 'distance: [a, b]' counts from its upstream end");
      }
      Geometry.RingZone z = r.zone(zone.get());
      double most =
          z instanceof Geometry.Ducts d ? d.bore() : 2 * Math.PI * z.meanRadius() / r.burnerCount();
      if (Double.isFinite(width) && width > most * (1 + 1e-9)) {
        m.get("width")
            .orElseThrow()
            .fault(
                "wider than a burner's share of zone '" + zone.get() + "'",
                "at most " + Shown.millimetres(most));
      }
    }
    return zone.map(z -> new Stretch(z, x[0], x[1], width));
  }

  private double[] bounds(Mapping m, Optional<String> zone) {
    if (m.has("distance")) {
      for (String key : List.of("from", "to")) {
        if (m.has(key)) {
          m.at(key).fault("'" + key + "' does not go with 'distance'", "keep one of them");
        }
      }
      List<Double> d =
          m.get("distance").orElseThrow().numbers(QuantityKind.LENGTH, Range.NOT_NEGATIVE, 2);
      double start =
          geometry instanceof Geometry.Ring r && zone.isPresent()
              ? r.start(zone.get())
              : Double.NaN;
      return new double[] {start + d.get(0), start + d.get(1)};
    }
    return new double[] {
      m.get("from")
          .map(e -> e.number(QuantityKind.LENGTH, Range.ANY))
          .orElse(Double.NEGATIVE_INFINITY),
      m.get("to")
          .map(e -> e.number(QuantityKind.LENGTH, Range.ANY))
          .orElse(Double.POSITIVE_INFINITY)
    };
  }

  private List<Flame.StagedBurners> staging(Entry entry, Optional<Flame.Response> response) {
    List<Flame.StagedBurners> all = new ArrayList<>();
    if (!(geometry instanceof Geometry.Ring ring)) {
      entry.fault("staging outside a ring", "burners differ only on 'kind: ring'");
      return all;
    }
    for (Entry item : entry.items()) {
      Mapping m = Mapping.of(item, CaseKeys.STAGING);
      List<Integer> burners =
          m.get("burners").map(e -> Burners.read(e, ring.burnerCount())).orElse(List.of());
      if (item.isMapping() && !m.has("gain") && !m.has("delay") && !m.has("heat_share")) {
        item.fault("an exception that changes nothing", "add gain, delay or heat_share");
      }
      if (m.has("gain") || m.has("delay")) {
        oneGain(m, response);
      }
      all.add(
          new Flame.StagedBurners(
              burners,
              optional(m, "gain", QuantityKind.FRACTION, Range.ANY),
              optional(m, "delay", QuantityKind.TIME, Range.NOT_NEGATIVE),
              optional(m, "heat_share", QuantityKind.FRACTION, Range.NOT_NEGATIVE)));
    }
    return all;
  }

  private static OptionalDouble optional(Mapping m, String key, QuantityKind kind, Range range) {
    Map<String, Entry> entries = m.entries();
    return entries.containsKey(key)
        ? OptionalDouble.of(entries.get(key).number(kind, range))
        : OptionalDouble.empty();
  }

  private static void oneGain(Mapping m, Optional<Flame.Response> response) {
    if (response.isPresent()
        && (response.get() instanceof Flame.DelaySum || response.get() instanceof Flame.Measured)) {
      m.entry()
          .fault(
              "gain or delay of some burners, but the response is a sum or a table",
              "let these burners differ by 'heat_share'");
    }
  }
}
