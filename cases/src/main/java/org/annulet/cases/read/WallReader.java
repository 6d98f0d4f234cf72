package org.annulet.cases.read;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.annulet.cases.units.QuantityKind;

/** Reads {@code walls}. */
final class WallReader {
  private static final List<String> WORDS = List.of("rigid", "open");
  private static final List<String> KINDS =
      List.of(
          "impedance",
          "admittance",
          "choked_nozzle",
          "impedance_table",
          "admittance_table",
          "reflection_table",
          "perforated",
          "radiating_end");

  private WallReader() {}

  /**
   * Walls by edge name.
   *
   * @param names edges of the geometry; empty when they are not known yet
   */
  static Map<String, Wall> read(Entry entry, EdgeNames names) {
    Map<String, Wall> walls = new LinkedHashMap<>();
    Mapping m = Mapping.named(entry);
    m.entries()
        .forEach(
            (edge, value) -> {
              if (names.inner().containsKey(edge)) {
                m.at(edge)
                    .fault(
                        "edge '" + edge + "' has gas on both sides: it is no wall",
                        Nearest.advice(edge, names.walls()));
              } else if (!names.walls().isEmpty() && !names.walls().contains(edge)) {
                m.at(edge).fault("no edge '" + edge + "'", Nearest.advice(edge, names.walls()));
              }
              wall(value).ifPresent(w -> walls.put(edge, w));
            });
    return walls;
  }

  private static Optional<Wall> wall(Entry entry) {
    if (entry.isText()) {
      return entry
          .choice(WORDS)
          .map(word -> word.equals("open") ? new Wall.Open() : new Wall.Rigid());
    }
    Mapping m = Mapping.of(entry, CaseKeys.WALL);
    Optional<String> kind = m.exactlyOne(KINDS);
    if (kind.isEmpty()) {
      return Optional.empty();
    }
    Entry value = m.get(kind.get()).orElseThrow();
    if (kind.get().equals("choked_nozzle")) {
      Mapping nozzle = Mapping.of(value, CaseKeys.CHOKED_NOZZLE);
      return Optional.of(
          new Wall.ChokedNozzle(nozzle.number("mach", QuantityKind.FRACTION, Range.MACH)));
    }
    if (kind.get().endsWith("_table")) {
      Wall.Quantity quantity =
          Wall.Quantity.valueOf(kind.get().replace("_table", "").toUpperCase(Locale.ROOT));
      return FrequencyTable.read(value).map(t -> new Wall.Tabulated(quantity, t));
    }
    if (kind.get().equals("perforated")) {
      return Optional.of(perforated(Mapping.of(value, CaseKeys.PERFORATED)));
    }
    if (kind.get().equals("radiating_end")) {
      Mapping end = Mapping.of(value, CaseKeys.RADIATING_END);
      Wall.Rim rim =
          end.get("rim")
              .flatMap(e -> e.choice(List.of("flanged", "unflanged")))
              .map(w -> Wall.Rim.valueOf(w.toUpperCase(Locale.ROOT)))
              .orElse(Wall.Rim.FLANGED);
      return Optional.of(
          new Wall.RadiatingEnd(end.number("radius", QuantityKind.LENGTH, Range.POSITIVE), rim));
    }
    double[] z = complex(value);
    if (z[0] < 0) {
      value.caution(
          kind.get() + " with a negative real part: this wall feeds energy into the gas",
          "check the sign; the normal points out of the gas");
    }
    if (kind.get().equals("admittance")) {
      return Optional.of(new Wall.Admittance(z[0], z[1]));
    }
    if (z[0] == 0 && z[1] == 0) {
      value.fault("impedance 0", "write 'open'");
    }
    return Optional.of(new Wall.Impedance(z[0], z[1]));
  }

  /** A perforated plate; the depth of its cavity is infinite where the keys know none. */
  static Wall.Perforated perforated(Mapping m) {
    double bore = m.number("hole_bore", QuantityKind.LENGTH, Range.POSITIVE);
    double pitch = m.number("pitch", QuantityKind.LENGTH, Range.POSITIVE);
    if (pitch <= bore) {
      m.at("pitch")
          .fault(
              "holes of " + Shown.millimetres(bore) + " do not fit into this pitch",
              "the pitch must exceed the bore");
    }
    return new Wall.Perforated(
        bore,
        pitch,
        m.number("thickness", QuantityKind.LENGTH, Range.NOT_NEGATIVE),
        m.number("bias_velocity", QuantityKind.SPEED, Range.POSITIVE),
        m.number("cavity_depth", QuantityKind.LENGTH, Range.POSITIVE, Double.POSITIVE_INFINITY));
  }

  private static double[] complex(Entry value) {
    if (value.isText()) {
      return new double[] {value.number(QuantityKind.FRACTION, Range.ANY), 0};
    }
    List<Double> parts = value.numbers(QuantityKind.FRACTION, Range.ANY, 2);
    return new double[] {parts.get(0), parts.get(1)};
  }
}
