package org.annulet.cases.read;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.annulet.cases.units.QuantityKind;
import org.annulet.solver.boundary.EndCorrection;

/** Reads {@code dampers}: designs and the places they sit at. */
final class DamperReader {
  private static final int MOST = 1000;
  private static final List<String> DESIGNS = List.of("resonator", "quarter_wave");

  private final Geometry geometry;
  private final EdgeNames names;

  DamperReader(Geometry geometry) {
    this.geometry = geometry;
    this.names = EdgeNames.of(geometry);
  }

  List<Damper> read(Entry entry) {
    List<Damper> dampers = new ArrayList<>();
    Mapping all = Mapping.named(entry).checkNames();
    all.entries()
        .forEach(
            (name, value) ->
                damper(name, Mapping.of(value, CaseKeys.DAMPER)).ifPresent(dampers::add));
    return List.copyOf(dampers);
  }

  private Optional<Damper> damper(String name, Mapping m) {
    Optional<Damper.Design> design = design(m);
    String gas =
        m.get("gas_of")
            .flatMap(
                e ->
                    geometry.zoneNames().isEmpty()
                        ? e.text()
                        : e.nameOf("zone", geometry.zoneNames()))
            .orElse("");
    double width = m.number("mouth_width", QuantityKind.LENGTH, Range.POSITIVE, Double.NaN);
    List<Damper.Place> places =
        m.get("at").map(e -> places(Mapping.of(e, CaseKeys.DAMPER_PLACE))).orElse(List.of());
    return design.isPresent() && !places.isEmpty()
        ? Optional.of(new Damper(name, design.get(), gas, places, width))
        : Optional.empty();
  }

  /** The design of a damper: one of its kinds. */
  static Optional<Damper.Design> design(Mapping m) {
    Optional<String> kind = m.exactlyOne(DESIGNS);
    if (kind.isEmpty()) {
      return Optional.empty();
    }
    Entry value = m.get(kind.get()).orElseThrow();
    if (kind.get().equals("resonator")) {
      Mapping r = Mapping.of(value, CaseKeys.RESONATOR);
      return Optional.of(
          new Damper.Resonator(
              r.number("neck_bore", QuantityKind.LENGTH, Range.POSITIVE),
              r.get("necks").map(e -> e.whole(1, MOST)).orElse(1),
              r.number("neck_length", QuantityKind.LENGTH, Range.POSITIVE),
              r.number(
                  "end_correction",
                  QuantityKind.FRACTION,
                  Range.NOT_NEGATIVE,
                  EndCorrection.FLANGED),
              r.number("volume", QuantityKind.VOLUME, Range.POSITIVE),
              r.number("resistance", QuantityKind.FRACTION, Range.NOT_NEGATIVE),
              lossVelocity(r)));
    }
    Mapping t = Mapping.of(value, CaseKeys.QUARTER_WAVE);
    double resistance = t.number("resistance", QuantityKind.FRACTION, Range.NOT_NEGATIVE);
    if (resistance == 1) {
      t.at("resistance")
          .fault(
              "a tube with a resistance of exactly 1 has no resonance to describe it by",
              "write 0.999 or 1.001");
    }
    return Optional.of(
        new Damper.QuarterWave(
            t.number("bore", QuantityKind.LENGTH, Range.POSITIVE),
            t.number("length", QuantityKind.LENGTH, Range.POSITIVE),
            t.number("end_correction", QuantityKind.FRACTION, Range.NOT_NEGATIVE, 0),
            resistance,
            lossVelocity(t)));
  }

  /** ζū of a bias flow: both of its keys, or none. */
  private static double lossVelocity(Mapping m) {
    if (m.has("loss_coefficient") != m.has("bias_velocity")) {
      m.entry()
          .fault(
              "a bias flow needs 'loss_coefficient' and 'bias_velocity'",
              "give both, as in 'loss_coefficient: 1.5, bias_velocity: 12 m/s', or neither");
      return 0;
    }
    return m.has("bias_velocity")
        ? m.number("loss_coefficient", QuantityKind.FRACTION, Range.NOT_NEGATIVE)
            * m.number("bias_velocity", QuantityKind.SPEED, Range.NOT_NEGATIVE)
        : 0;
  }

  private List<Damper.Place> places(Mapping m) {
    Optional<String> what = m.exactlyOne(List.of("edge", "face"));
    if (what.isEmpty()) {
      return List.of();
    }
    return what.get().equals("edge") ? onEdge(m) : onFace(m);
  }

  private List<Damper.Place> onEdge(Mapping m) {
    boolean section =
        geometry instanceof Geometry.Section
            || geometry instanceof Geometry.MeshFile f && f.plane() == Geometry.MeshPlane.SECTION;
    absent(m, List.of("angles", "burners"), "is for a face of a ring");
    if (geometry instanceof Geometry.Ring) {
      m.at("edge")
          .fault(
              "dampers of a ring sit on the faces of its annuli",
              "write 'face: <zone>.outer_face' or '<zone>.inner_face'");
      return List.of();
    }
    Optional<String> edge =
        m.get("edge").flatMap(e -> names.known() ? e.nameOf("wall", names.walls()) : e.text());
    double x = m.number("x", QuantityKind.LENGTH, Range.ANY);
    double y;
    if (section) {
      absent(m, List.of("y"), "is for a plane; a section has 'r'");
      y = m.number("r", QuantityKind.LENGTH, Range.NOT_NEGATIVE);
    } else {
      absent(m, List.of("r", "count"), "is for a section");
      y = m.number("y", QuantityKind.LENGTH, Range.ANY);
    }
    int count = m.get("count").map(e -> e.whole(1, MOST)).orElse(1);
    if (section && !m.has("count")) {
      m.entry()
          .fault(
              "a section needs the number of equal dampers round it",
              "add 'count: 14'; it must exceed twice the largest azimuthal order");
    }
    return edge.<List<Damper.Place>>map(e -> List.of(new Damper.OnEdge(e, x, y, count)))
        .orElse(List.of());
  }

  private List<Damper.Place> onFace(Mapping m) {
    absent(m, List.of("r", "y", "count"), "is for dampers on an edge");
    if (!(geometry instanceof Geometry.Ring ring)) {
      m.at("face").fault("only the zones of a ring have faces", "name an edge: 'edge: …'");
      return List.of();
    }
    List<String> faces = names.walls().stream().filter(w -> w.endsWith("_face")).toList();
    Optional<String> face = m.get("face").flatMap(e -> e.nameOf("face", faces));
    double x = m.number("x", QuantityKind.LENGTH, Range.NOT_NEGATIVE);
    face.ifPresent(f -> inside(m, ring, f.substring(0, f.lastIndexOf('.')), x));
    List<Double> angles = new ArrayList<>();
    Optional<String> how = m.exactlyOne(List.of("angles", "burners"));
    if (how.equals(Optional.of("angles"))) {
      angles.addAll(m.get("angles").orElseThrow().numbers(QuantityKind.ANGLE, Range.ANY));
    } else if (how.isPresent()) {
      for (int burner : Burners.read(m.get("burners").orElseThrow(), ring.burnerCount())) {
        angles.add(2 * Math.PI * (burner - 1) / ring.burnerCount());
      }
    }
    return face.<List<Damper.Place>>map(
            f -> angles.stream().<Damper.Place>map(a -> new Damper.OnFace(f, x, a)).toList())
        .orElse(List.of());
  }

  static void inside(Mapping m, Geometry.Ring ring, String zone, double x) {
    double start = ring.start(zone);
    double end = start + ring.zone(zone).length();
    if (x <= start || x >= end) {
      m.at("x")
          .fault(
              "x lies outside zone '" + zone + "'",
              "it runs from " + Shown.millimetres(start) + " to " + Shown.millimetres(end));
    }
  }

  private static void absent(Mapping m, List<String> keys, String why) {
    for (String key : keys) {
      if (m.has(key)) {
        m.at(key).fault("'" + key + "' " + why, "leave it out");
      }
    }
  }
}
