package org.annulet.cases.read;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.annulet.cases.units.QuantityKind;

/** Reads {@code studies}. */
final class StudiesReader {
  private static final int MOST_DAMPERS = 200;
  private static final int MOST_POSITIONS = 400;

  private final Geometry geometry;
  private final List<Damper> dampers;
  private final List<String> flames;
  private final Optional<WindowReader> window;

  StudiesReader(
      Geometry geometry, List<Damper> dampers, List<String> flames, Optional<WindowReader> window) {
    this.flames = flames;
    this.geometry = geometry;
    this.dampers = dampers;
    this.window = window;
  }

  Studies read(Entry entry) {
    Mapping m = Mapping.of(entry, CaseKeys.STUDIES);
    return new Studies(
        m.get("dampers").flatMap(this::dampers),
        m.get("sweep").flatMap(SweepReader::read),
        m.get("uncertainty").flatMap(new UncertaintyReader(geometry, flames)::read),
        m.get("compare").flatMap(CompareReader::read));
  }

  private Optional<DamperSearch> dampers(Entry entry) {
    Mapping m = Mapping.of(entry, CaseKeys.DAMPER_STUDY);
    if (!(geometry instanceof Geometry.Ring ring)) {
      entry.fault(
          "dampers can be placed on a ring only",
          "use 'kind: ring'; elsewhere give each damper under 'dampers' and compare variants");
      return Optional.empty();
    }
    List<DamperSearch.Candidate> designs = new ArrayList<>();
    m.get("designs")
        .map(e -> Mapping.named(e).checkNames())
        .ifPresent(
            all -> all.entries().forEach((name, e) -> design(name, e).ifPresent(designs::add)));
    List<Damper.OnFace> positions = new ArrayList<>();
    m.get("positions").ifPresent(e -> positions(e, ring, positions));
    double low = window.map(w -> w.frequency()[0]).orElse(Double.NaN);
    double high = window.map(w -> w.frequency()[1]).orElse(Double.NaN);
    if (m.has("frequency")) {
      Entry f = m.get("frequency").orElseThrow();
      List<Double> range = f.numbers(QuantityKind.FREQUENCY, Range.POSITIVE, 2);
      if (range.get(0) >= range.get(1) || range.get(0) < low || range.get(1) > high) {
        f.fault(
            "the range of the modes to be tamed is empty or leaves the window",
            "lowest first, within 'window.frequency'");
      }
      low = range.get(0);
      high = range.get(1);
    }
    if (designs.isEmpty() || positions.isEmpty()) {
      return Optional.empty();
    }
    DamperSearch search = new DamperSearch(designs, free(positions, ring, designs), low, high);
    if (search.count() > search.positions().size()) {
      entry.fault(
          search.count() + " dampers for " + search.positions().size() + " free positions",
          "allow more angles or axial positions, or use fewer dampers");
    }
    apart(m.at("positions"), ring, search);
    return Optional.of(search);
  }

  private Optional<DamperSearch.Candidate> design(String name, Entry entry) {
    Mapping m = Mapping.of(entry, CaseKeys.DAMPER_DESIGN);
    int count = m.get("count").map(e -> e.whole(1, MOST_DAMPERS)).orElse(1);
    String gas = m.get("gas_of").flatMap(e -> e.nameOf("zone", geometry.zoneNames())).orElse("");
    double width =
        m.get("mouth_width")
            .map(e -> e.number(QuantityKind.LENGTH, Range.POSITIVE))
            .orElse(Double.NaN);
    return DamperReader.design(m).map(d -> new DamperSearch.Candidate(name, count, d, gas, width));
  }

  /** A mapping, or a list of them. */
  private void positions(Entry entry, Geometry.Ring ring, List<Damper.OnFace> out) {
    for (Entry item : entry.isList() ? entry.items() : List.of(entry)) {
      Mapping m = Mapping.of(item, CaseKeys.DAMPER_POSITIONS);
      List<String> faces =
          EdgeNames.of(geometry).walls().stream().filter(w -> w.endsWith("_face")).toList();
      Optional<String> face = m.get("face").flatMap(e -> e.nameOf("face", faces));
      List<Double> slots =
          m.get("x")
              .map(
                  e ->
                      e.isList()
                          ? e.numbers(QuantityKind.LENGTH, Range.NOT_NEGATIVE)
                          : List.of(e.number(QuantityKind.LENGTH, Range.NOT_NEGATIVE)))
              .orElse(List.of());
      if (face.isPresent()) {
        String zone = face.get().substring(0, face.get().lastIndexOf('.'));
        slots.forEach(x -> DamperReader.inside(m, ring, zone, x));
      }
      List<Double> angles = new ArrayList<>();
      List<Double> taken = new ArrayList<>();
      Optional<String> how = m.exactlyOne(List.of("angles", "burners"));
      if (how.equals(Optional.of("angles"))) {
        angles.addAll(m.get("angles").orElseThrow().numbers(QuantityKind.ANGLE, Range.ANY));
        m.get("taken").ifPresent(e -> taken.addAll(e.numbers(QuantityKind.ANGLE, Range.ANY)));
      } else if (how.isPresent()) {
        angles.addAll(ofBurners(m.get("burners").orElseThrow(), ring));
        m.get("taken").ifPresent(e -> taken.addAll(ofBurners(e, ring)));
      }
      for (double t : taken) {
        if (angles.stream().noneMatch(a -> turn(a, t) < 1e-6)) {
          m.at("taken").fault("a place is taken that is not among the positions", "leave it out");
        }
      }
      for (double x : slots) {
        for (double a : angles) {
          if (face.isPresent() && taken.stream().noneMatch(t -> turn(a, t) < 1e-6)) {
            out.add(new Damper.OnFace(face.get(), x, a));
          }
        }
      }
    }
    if (out.size() > MOST_POSITIONS) {
      entry.fault(out.size() + " positions", "at most " + MOST_POSITIONS + " can be compared");
    }
  }

  private static List<Double> ofBurners(Entry entry, Geometry.Ring ring) {
    return Burners.read(entry, ring.burnerCount()).stream()
        .map(b -> 2 * Math.PI * (b - 1) / ring.burnerCount())
        .toList();
  }

  private static double turn(double a, double b) {
    return Math.abs(Math.IEEEremainder(a - b, 2 * Math.PI));
  }

  private static double width(DamperSearch.Candidate c) {
    return Double.isNaN(c.mouthWidth()) ? Math.sqrt(c.design().mouthArea()) : c.mouthWidth();
  }

  /** Distance of two places on one face in m, taken at the mean radius. */
  private static double distance(Damper.OnFace a, Damper.OnFace b, Geometry.Ring ring) {
    return a.face().equals(b.face())
        ? Math.hypot(a.x() - b.x(), turn(a.angle(), b.angle()) * ring.zone(a.zone()).meanRadius())
        : Double.POSITIVE_INFINITY;
  }

  /** Those at which no damper of the case sits already. */
  private List<Damper.OnFace> free(
      List<Damper.OnFace> all, Geometry.Ring ring, List<DamperSearch.Candidate> designs) {
    double own = designs.stream().mapToDouble(StudiesReader::width).max().orElse(0);
    return all.stream()
        .filter(
            p ->
                dampers.stream()
                    .noneMatch(
                        d -> {
                          double width =
                              Double.isNaN(d.mouthWidth())
                                  ? Math.sqrt(d.design().mouthArea())
                                  : d.mouthWidth();
                          return d.places().stream()
                              .anyMatch(
                                  q ->
                                      q instanceof Damper.OnFace f
                                          && distance(p, f, ring) < 0.5 * (own + width));
                        }))
        .toList();
  }

  private static void apart(Entry at, Geometry.Ring ring, DamperSearch search) {
    double width = search.candidates().stream().mapToDouble(StudiesReader::width).max().orElse(0);
    List<Damper.OnFace> p = search.positions();
    for (int i = 0; i < p.size(); i++) {
      for (int j = 0; j < i; j++) {
        double d = distance(p.get(i), p.get(j), ring);
        if (d < width) {
          at.fault(
              "two positions are "
                  + Shown.millimetres(d)
                  + " apart, the mouths "
                  + Shown.millimetres(width)
                  + " wide",
              "move the positions apart, or give the designs a narrower 'mouth_width'");
          return;
        }
      }
    }
  }
}
