package org.annulet.cases.read;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.annulet.cases.units.QuantityKind;

/** Reads {@code geometry}. */
final class GeometryReader {
  static final List<String> KINDS =
      List.of("ring", "section", "cross_section", "plane", "mesh_file");
  static final List<String> SHAPES = List.of("annulus", "ducts");
  static final int MOST_BURNERS = 1000;

  private GeometryReader() {}

  /** The geometry; empty when even its kind cannot be told. */
  static Optional<Geometry> read(Entry entry) {
    if (!entry.isMapping()) {
      Mapping.named(entry); // reports itself
      return Optional.empty();
    }
    Optional<Entry> kind = Mapping.named(entry).get("kind");
    if (kind.isEmpty()) {
      entry.fault("the key 'kind' is missing", "add 'kind: …', one of " + String.join(", ", KINDS));
      return Optional.empty();
    }
    return kind.get().choice(KINDS).map(k -> ofKind(k, entry));
  }

  private static Geometry ofKind(String kind, Entry entry) {
    return switch (kind) {
      case "ring" -> ring(Mapping.of(entry, CaseKeys.RING));
      case "section" -> {
        Mapping m = Mapping.of(entry, CaseKeys.SECTION);
        Outline outline = OutlineReader.read(m);
        axis(m, outline);
        yield new Geometry.Section(outline, sizes(m, OutlineReader.sizedNames(outline)));
      }
      case "cross_section" -> {
        Mapping m = Mapping.of(entry, CaseKeys.CROSS_SECTION);
        Outline outline = OutlineReader.read(m);
        noDucts(m, outline);
        double k = m.number("axial_wavenumber", QuantityKind.WAVENUMBER, Range.NOT_NEGATIVE, 0);
        yield new Geometry.CrossSection(outline, sizes(m, OutlineReader.sizedNames(outline)), k);
      }
      case "plane" -> {
        Mapping m = Mapping.of(entry, CaseKeys.PLANE);
        Outline outline = OutlineReader.read(m);
        noDucts(m, outline);
        double depth = m.number("depth", QuantityKind.LENGTH, Range.POSITIVE);
        yield new Geometry.Plane(outline, sizes(m, OutlineReader.sizedNames(outline)), depth);
      }
      default -> MeshFileReader.read(Mapping.of(entry, CaseKeys.MESH_FILE));
    };
  }

  private static void axis(Mapping m, Outline outline) {
    outline
        .points()
        .forEach(
            (name, p) -> {
              if (p.y() < 0) {
                m.get("points")
                    .flatMap(e -> Mapping.named(e).get(name))
                    .ifPresent(
                        e ->
                            e.fault(
                                "point '" + name + "' lies below the axis, at r = " + p.y() + " m",
                                "points of a section are [x, r] with r not negative"));
              }
            });
  }

  private static void noDucts(Mapping m, Outline outline) {
    for (Outline.Zone zone : outline.zones().values()) {
      if (zone.separateDucts().isPresent()) {
        m.get("zones")
            .flatMap(e -> Mapping.named(e).get(zone.name()))
            .ifPresent(
                e ->
                    e.fault(
                        "separate_ducts in a geometry that is no section",
                        "leave it out, or use 'kind: section'"));
      }
    }
  }

  private static Geometry.MeshSize sizes(Mapping m, List<String> names) {
    double largest = m.number("mesh_size", QuantityKind.LENGTH, Range.POSITIVE);
    Map<String, Double> local = new LinkedHashMap<>();
    m.get("mesh_size_at")
        .ifPresent(
            e -> {
              Mapping at = Mapping.named(e);
              at.entries()
                  .forEach(
                      (name, size) -> {
                        if (!names.isEmpty() && !names.contains(name)) {
                          at.at(name)
                              .fault("no edge or zone '" + name + "'", Nearest.advice(name, names));
                        }
                        local.put(name, size.number(QuantityKind.LENGTH, Range.POSITIVE));
                      });
            });
    double sides = m.number("sides_per_wavelength", QuantityKind.FRACTION, Range.POSITIVE, 0);
    return new Geometry.MeshSize(largest, local, sides);
  }

  private static Geometry ring(Mapping m) {
    int count = m.get("burner_count").map(e -> e.whole(1, MOST_BURNERS)).orElse(0);
    List<Geometry.RingZone> zones = new ArrayList<>();
    List<Entry> items = m.get("zones").map(Entry::items).orElse(List.of());
    if (items.isEmpty()) {
      m.get("zones").filter(Entry::isList).ifPresent(e -> e.fault("no zones", "add at least one"));
    }
    for (Entry item : items) {
      ringZone(item, count)
          .ifPresent(
              z -> {
                if (zones.stream().anyMatch(o -> o.name().equals(z.name()))) {
                  item.fault("two zones are called '" + z.name() + "'", "rename one of them");
                }
                zones.add(z);
              });
    }
    double last = zones.isEmpty() ? Double.NaN : zones.get(zones.size() - 1).meanRadius();
    double radius = m.number("unrolled_radius", QuantityKind.LENGTH, Range.POSITIVE, last);
    Geometry.Ring bare =
        new Geometry.Ring(
            count, radius, List.copyOf(zones), new Geometry.MeshSize(Double.NaN, Map.of(), 0));
    List<String> names = new ArrayList<>(bare.zoneNames());
    EdgeNames edges = EdgeNames.of(bare);
    names.addAll(edges.all());
    return new Geometry.Ring(
        count, radius, bare.zones(), sizes(m, edges.known() ? names : List.of()));
  }

  private static Optional<Geometry.RingZone> ringZone(Entry item, int count) {
    if (!item.isMapping()) {
      Mapping.named(item);
      return Optional.empty();
    }
    Mapping any = Mapping.named(item);
    Optional<String> shape = any.get("shape").flatMap(e -> e.choice(SHAPES));
    if (shape.isEmpty()) {
      if (!any.has("shape")) {
        item.fault("the key 'shape' is missing", "add 'shape: annulus' or 'shape: ducts'");
      }
      return any.get("name").flatMap(Entry::text).map(EdgeNames::shapeless);
    }
    boolean annulus = shape.get().equals("annulus");
    Mapping z = Mapping.of(item, annulus ? CaseKeys.ANNULUS : CaseKeys.DUCTS);
    Optional<String> name = z.get("name").flatMap(Entry::text);
    name.ifPresent(n -> Mapping.checkName(z.get("name").orElseThrow(), n));
    double radius = z.number("mean_radius", QuantityKind.LENGTH, Range.POSITIVE);
    double length = z.number("length", QuantityKind.LENGTH, Range.POSITIVE);
    if (annulus) {
      double gap = z.number("gap", QuantityKind.LENGTH, Range.POSITIVE);
      if (gap >= 2 * radius) {
        z.get("gap")
            .ifPresent(
                e ->
                    e.fault(
                        "the gap " + e.shown() + " reaches across the axis",
                        "the gap must be below twice the mean radius"));
      }
      return name.map(n -> new Geometry.Annulus(n, radius, gap, length));
    }
    double bore = bore(z);
    if (count >= 1 && count * bore >= 2 * Math.PI * radius) {
      item.fault(
          count + " ducts do not fit side by side on the mean radius",
          "the bore must be below 2π × mean radius / burner_count = "
              + Shown.millimetres(2 * Math.PI * radius / count));
    }
    return name.map(n -> new Geometry.Ducts(n, radius, bore, length));
  }

  private static double bore(Mapping z) {
    Optional<String> one = z.exactlyOne(List.of("bore", "area"));
    if (one.isEmpty()) {
      return Double.NaN;
    }
    return one.get().equals("bore")
        ? z.number("bore", QuantityKind.LENGTH, Range.POSITIVE)
        : Math.sqrt(4 / Math.PI * z.number("area", QuantityKind.AREA, Range.POSITIVE));
  }

  /** Number of tubes and open share of a zone of separate ducts. */
  static Geometry.SeparateDucts ducts(Mapping z, String countKey) {
    int n = z.get(countKey).map(e -> e.whole(1, MOST_BURNERS)).orElse(0);
    return new Geometry.SeparateDucts(
        n, z.number("open_share", QuantityKind.FRACTION, Range.SHARE));
  }
}
