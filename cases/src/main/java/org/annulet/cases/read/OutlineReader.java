package org.annulet.cases.read;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.annulet.cases.units.Quantity;
import org.annulet.cases.units.QuantityKind;
import org.annulet.cases.units.UnitFault;

/** Reads {@code points}, {@code edges} and {@code zones} of a section, cross-section or plane. */
final class OutlineReader {
  private static final List<String> SHAPES = List.of("line", "arc", "curve");

  private final Map<String, Outline.Point> points = new LinkedHashMap<>();
  private final Map<String, Outline.Edge> edges = new LinkedHashMap<>();
  private final Map<String, Outline.Zone> zones = new LinkedHashMap<>();

  private OutlineReader() {}

  static Outline read(Mapping geometry) {
    OutlineReader r = new OutlineReader();
    Optional<Entry> unit = geometry.get("points_in");
    geometry.get("points").ifPresent(e -> r.points(e, unit));
    geometry.get("edges").ifPresent(e -> r.edges(e));
    geometry.get("zones").ifPresent(e -> r.zones(e));
    geometry.get("edges").ifPresent(e -> r.uses(Mapping.named(e)));
    geometry.get("points").ifPresent(e -> r.spare(Mapping.named(e)));
    return new Outline(r.points, r.edges, r.zones);
  }

  /** Names that may carry a local mesh size. */
  static List<String> sizedNames(Outline outline) {
    List<String> names = new ArrayList<>(outline.edges().keySet());
    names.addAll(outline.zones().keySet());
    return names;
  }

  private void points(Entry entry, Optional<Entry> unitEntry) {
    Optional<String> unit = unitEntry.flatMap(Entry::text);
    if (unit.isPresent()) {
      try {
        Quantity.requireUnit(unit.get(), QuantityKind.LENGTH);
      } catch (UnitFault f) {
        unitEntry.get().fault(f.what(), f.mend());
        unit = Optional.of("m");
      }
    }
    if (unit.isEmpty() && bare(entry)) {
      entry.fault("the points carry no unit", "add 'points_in: mm' above them");
      unit = Optional.of("m");
    }
    Optional<String> stated = unit;
    Mapping.named(entry)
        .checkNames()
        .entries()
        .forEach(
            (name, e) -> {
              List<Double> xy = e.numbers(QuantityKind.LENGTH, Range.ANY, 2, stated.orElse(""));
              points.put(name, new Outline.Point(xy.get(0), xy.get(1)));
            });
  }

  /** Whether every coordinate of every point is a number without a unit. */
  private static boolean bare(Entry entry) {
    Mapping points = Mapping.named(entry);
    return !points.entries().isEmpty()
        && points.values().stream()
            .allMatch(p -> p.isList() && p.items().stream().allMatch(Entry::isBareNumber));
  }

  private void edges(Entry entry) {
    Mapping.named(entry).checkNames().entries().forEach(this::edge);
  }

  private void edge(String name, Entry entry) {
    Mapping m = Mapping.of(entry, CaseKeys.EDGE);
    Optional<String> shape = m.exactlyOne(SHAPES);
    if (shape.isEmpty()) {
      edges.put(name, new Outline.Edge(name, Outline.Shape.LINE, List.of()));
      return;
    }
    Entry list = m.get(shape.get()).orElseThrow();
    List<String> through = new ArrayList<>();
    for (Entry item : list.items()) {
      item.nameOf("point", List.copyOf(points.keySet())).ifPresent(through::add);
    }
    int written = list.isList() ? list.items().size() : 0;
    boolean arc = shape.get().equals("arc");
    if (list.isList() && (arc ? written != 3 : written < 2)) {
      list.fault(
          "an edge of kind '" + shape.get() + "' through " + written + " points",
          arc
              ? "an arc runs through three points: [start, between, end]"
              : "name at least two points");
    }
    for (int i = 1; i < through.size(); i++) {
      if (through.get(i).equals(through.get(i - 1))) {
        list.fault("the point '" + through.get(i) + "' stands twice in a row", "leave one out");
      }
    }
    edges.put(
        name,
        new Outline.Edge(
            name,
            Outline.Shape.valueOf(shape.get().toUpperCase(Locale.ROOT)),
            List.copyOf(through)));
  }

  private void zones(Entry entry) {
    Mapping all = Mapping.named(entry).checkNames();
    all.entries().forEach(this::zone);
    if (entry.isMapping() && all.entries().isEmpty()) {
      entry.fault("no zones", "add at least one");
    }
  }

  private void zone(String name, Entry entry) {
    Mapping m = Mapping.of(entry, CaseKeys.OUTLINE_ZONE);
    List<String> boundary = m.get("boundary").map(this::loop).orElse(List.of());
    List<List<String>> holes = new ArrayList<>();
    m.get("holes").ifPresent(h -> h.items().forEach(item -> holes.add(loop(item))));
    Optional<Geometry.SeparateDucts> ducts = Optional.empty();
    if (m.has("separate_ducts") && m.has("open_share")) {
      ducts = Optional.of(GeometryReader.ducts(m, "separate_ducts"));
    } else if (m.has("separate_ducts") || m.has("open_share")) {
      entry.fault(
          "separate_ducts and open_share belong together",
          "write both, as in 'separate_ducts: 14, open_share: 0.24'");
    }
    zones.put(name, new Outline.Zone(name, boundary, List.copyOf(holes), ducts));
  }

  /** Names of a closed loop of edges; says where it does not close. */
  private List<String> loop(Entry list) {
    List<String> names = new ArrayList<>();
    boolean whole = true;
    for (Entry item : list.items()) {
      Optional<String> name = item.nameOf("edge", List.copyOf(edges.keySet()));
      whole &= name.isPresent() && edges.get(name.get()).points().size() > 1;
      if (name.isPresent() && names.contains(name.get())) {
        item.fault("edge '" + name.get() + "' stands twice in one loop", "leave one out");
        whole = false;
      }
      name.ifPresent(names::add);
    }
    if (whole && !names.isEmpty()) {
      close(list, names);
    } else if (list.isList() && list.items().isEmpty()) {
      list.fault("a loop without edges", "name the edges in order");
    }
    return List.copyOf(names);
  }

  private void close(Entry list, List<String> names) {
    Outline.Edge first = edges.get(names.get(0));
    if (names.size() == 1) {
      if (!first.closed()) {
        gap(list, first, first);
      }
      return;
    }
    Outline.Edge second = edges.get(names.get(1));
    boolean forward = end(first).equals(start(second)) || end(first).equals(end(second));
    String begin = forward ? start(first) : end(first);
    String at = forward ? end(first) : start(first);
    for (int i = 1; i < names.size(); i++) {
      Outline.Edge e = edges.get(names.get(i));
      if (start(e).equals(at)) {
        at = end(e);
      } else if (end(e).equals(at)) {
        at = start(e);
      } else {
        gap(list, edges.get(names.get(i - 1)), e);
        return;
      }
    }
    if (!at.equals(begin)) {
      gap(list, edges.get(names.get(names.size() - 1)), first);
    }
  }

  private static void gap(Entry list, Outline.Edge before, Outline.Edge after) {
    list.fault(
        "the loop is open: edge '"
            + before.name()
            + "' ("
            + start(before)
            + "–"
            + end(before)
            + ") does not lead on to edge '"
            + after.name()
            + "' ("
            + start(after)
            + "–"
            + end(after)
            + ")",
        "name the edges in order round the zone; each may run either way");
  }

  private static String start(Outline.Edge e) {
    return e.points().get(0);
  }

  private static String end(Outline.Edge e) {
    return e.points().get(e.points().size() - 1);
  }

  private void spare(Mapping pointKeys) {
    for (String point : points.keySet()) {
      if (edges.values().stream().noneMatch(e -> e.points().contains(point))) {
        pointKeys
            .at(point)
            .caution("point '" + point + "' is on no edge", "use it or leave it out");
      }
    }
  }

  private void uses(Mapping edgeKeys) {
    Outline outline = new Outline(points, edges, zones);
    for (String edge : edges.keySet()) {
      List<String> at = outline.zonesAt(edge);
      if (at.isEmpty()) {
        edgeKeys.at(edge).fault("edge '" + edge + "' bounds no zone", "use it or leave it out");
      } else if (at.size() > 2) {
        edgeKeys
            .at(edge)
            .fault(
                "edge '" + edge + "' bounds " + at.size() + " zones: " + String.join(", ", at),
                "an edge has two sides: split it or correct the loops");
      }
    }
  }
}
