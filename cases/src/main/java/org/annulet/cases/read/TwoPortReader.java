package org.annulet.cases.read;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.annulet.cases.units.QuantityKind;

/** Reads {@code two_ports}: by inner edge. */
final class TwoPortReader {
  private final Geometry geometry;
  private final EdgeNames names;

  TwoPortReader(Geometry geometry) {
    this.geometry = geometry;
    this.names = EdgeNames.of(geometry);
  }

  List<TwoPort> read(Entry entry) {
    List<TwoPort> ports = new ArrayList<>();
    Mapping all = Mapping.named(entry);
    all.entries()
        .forEach(
            (edge, value) -> {
              if (names.known() && !names.inner().containsKey(edge)) {
                all.at(edge)
                    .fault(
                        names.walls().contains(edge)
                            ? "edge '" + edge + "' is a wall: a two-port has gas on both sides"
                            : "no inner edge '" + edge + "'",
                        Nearest.advice(edge, names.inner().keySet()));
              } else {
                port(edge, Mapping.of(value, CaseKeys.TWO_PORT)).ifPresent(ports::add);
              }
            });
    return ports;
  }

  private Optional<TwoPort> port(String edge, Mapping m) {
    if (m.has("perforated") || m.has("transfer_table")) {
      return special(edge, m);
    }
    OptionalDouble loss = optional(m, "loss_coefficient", QuantityKind.FRACTION);
    OptionalDouble drop = optional(m, "pressure_drop", QuantityKind.PRESSURE);
    double length = optional(m, "effective_length", QuantityKind.LENGTH).orElse(0);
    boolean lossy = loss.isPresent() || drop.isPresent();
    if (loss.isPresent() && drop.isPresent()) {
      m.at("pressure_drop")
          .fault("both 'loss_coefficient' and 'pressure_drop'", "give one of the two");
      return Optional.empty();
    }
    if (!lossy && length == 0) {
      m.entry()
          .fault(
              "a two-port without loss and length joins nothing",
              "give 'loss_coefficient' or 'pressure_drop' with 'velocity', or 'effective_length'");
      return Optional.empty();
    }
    double velocity = 0;
    if (lossy) {
      if (!m.has("velocity")) {
        m.entry()
            .fault("a loss needs the mean velocity it refers to", "give 'velocity', as in 57 m/s");
        return Optional.empty();
      }
      velocity = m.number("velocity", QuantityKind.SPEED, Range.POSITIVE);
    }
    double speed = velocity;
    return upstream(edge, m).map(zone -> new TwoPort(edge, zone, loss, drop, speed, length));
  }

  private Optional<TwoPort> special(String edge, Mapping m) {
    for (String key :
        List.of("loss_coefficient", "pressure_drop", "velocity", "effective_length")) {
      if (m.has(key)) {
        m.at(key).fault("'" + key + "' beside a plate or a matrix, which hold all", "leave it out");
      }
    }
    Optional<String> kind = m.exactlyOne(List.of("perforated", "transfer_table"));
    Optional<TwoPort.Special> special = Optional.empty();
    if (kind.equals(Optional.of("perforated"))) {
      Wall.Perforated plate =
          WallReader.perforated(Mapping.of(m.get("perforated").orElseThrow(), CaseKeys.SCREEN));
      special = Optional.of(new TwoPort.Screen(plate));
    } else if (kind.isPresent()) {
      special =
          FrequencyTable.matrix(m.get("transfer_table").orElseThrow()).map(TwoPort.Transfer::new);
    }
    Optional<String> from = upstream(edge, m);
    Optional<TwoPort.Special> found = special;
    return found.isEmpty()
        ? Optional.empty()
        : from.map(
            zone ->
                new TwoPort(
                    edge, zone, OptionalDouble.empty(), OptionalDouble.empty(), 0, 0, found));
  }

  private static OptionalDouble optional(Mapping m, String key, QuantityKind kind) {
    return m.has(key)
        ? OptionalDouble.of(m.number(key, kind, Range.NOT_NEGATIVE))
        : OptionalDouble.empty();
  }

  /** The zone the flow comes from: stated, or on a ring the first of the two. */
  private Optional<String> upstream(String edge, Mapping m) {
    List<String> sides = names.inner().getOrDefault(edge, List.of());
    Optional<Entry> stated = m.get("flow_from");
    if (stated.isPresent()) {
      return sides.isEmpty()
          ? stated.get().text()
          : stated.get().nameOf("zone at edge '" + edge + "' called", sides);
    }
    if (geometry instanceof Geometry.Ring && !sides.isEmpty()) {
      return Optional.of(sides.get(0));
    }
    m.entry()
        .fault(
            "it is not clear on which side of edge '" + edge + "' the flow comes",
            "give 'flow_from', one of: " + String.join(", ", sides));
    return Optional.empty();
  }
}
