package org.annulet.cases.read;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.annulet.cases.units.Quantity;
import org.annulet.cases.units.QuantityKind;
import org.annulet.cases.units.UnitFault;
import org.annulet.mesher.files.MeshFileException;
import org.annulet.mesher.files.VtuGrid;
import org.annulet.solver.medium.CloudAverage;
import org.annulet.solver.medium.PointCloud;
import org.annulet.solver.medium.RingShell;
import org.annulet.solver.medium.ScatteredTemperature;

/** Reads the {@code temperature} of a zone: a value, a profile, or a field from a file. */
final class TemperatureReader {
  /** Above this a temperature is more likely a slip than a flame. */
  private static final double HOT = 3500;

  private static final List<String> WAYS = List.of("profile", "gas_path", "file", "adiabatic_from");
  private static final Map<String, QuantityKind> COLUMNS = new LinkedHashMap<>();

  static {
    COLUMNS.put("x", QuantityKind.LENGTH);
    COLUMNS.put("y", QuantityKind.LENGTH);
    COLUMNS.put("z", QuantityKind.LENGTH);
    COLUMNS.put("r", QuantityKind.LENGTH);
    COLUMNS.put("theta", QuantityKind.ANGLE);
    COLUMNS.put("temperature", QuantityKind.TEMPERATURE);
  }

  private final Optional<Geometry> geometry;
  private final String zone;

  TemperatureReader(Optional<Geometry> geometry, String zone) {
    this.geometry = geometry;
    this.zone = zone;
  }

  Optional<Gas.Temperature> read(Entry entry) {
    if (entry.isText()) {
      double kelvin = entry.number(QuantityKind.TEMPERATURE, Range.POSITIVE);
      if (kelvin > HOT) {
        entry.caution(
            "a temperature of " + entry.shown() + " is above any flame in air",
            "check the value and its unit");
      }
      return Optional.of(new Gas.Uniform(kelvin));
    }
    Mapping m = Mapping.of(entry, CaseKeys.TEMPERATURE);
    Optional<String> way = m.exactlyOne(WAYS);
    if (way.isEmpty()) {
      return Optional.of(new Gas.Uniform(Double.NaN));
    }
    return switch (way.get()) {
      case "profile" ->
          Optional.of(profile(Mapping.of(m.get("profile").orElseThrow(), CaseKeys.PROFILE)));
      case "gas_path" -> path(Mapping.of(m.get("gas_path").orElseThrow(), CaseKeys.GAS_PATH));
      case "adiabatic_from" -> {
        double air = m.number("adiabatic_from", QuantityKind.TEMPERATURE, Range.POSITIVE);
        double fuel = m.number("fuel_temperature", QuantityKind.TEMPERATURE, Range.POSITIVE, air);
        yield Optional.of(new Gas.Adiabatic(air, fuel));
      }
      default -> file(m);
    };
  }

  private static Gas.Temperature profile(Mapping p) {
    List<Double> x = list(p, "x", QuantityKind.LENGTH, Range.ANY);
    List<Double> t = list(p, "temperature", QuantityKind.TEMPERATURE, Range.POSITIVE);
    stations(p, "x", x, t);
    return new Gas.AlongAxis(List.copyOf(x), List.copyOf(t));
  }

  private static Optional<Gas.Temperature> path(Mapping p) {
    List<Double> x = new ArrayList<>();
    List<Double> y = new ArrayList<>();
    for (Entry corner : p.get("corners").map(Entry::items).orElse(List.of())) {
      List<Double> c = corner.numbers(QuantityKind.LENGTH, Range.ANY);
      if (c.size() != 2) {
        corner.fault("a corner has two coordinates", "write [x, r, mm]");
        return Optional.empty();
      }
      x.add(c.get(0));
      y.add(c.get(1));
    }
    if (p.has("corners") && x.size() < 2) {
      p.at("corners").fault("a path of " + x.size() + " corners", "give at least two");
      return Optional.empty();
    }
    List<Double> s = list(p, "distance", QuantityKind.LENGTH, Range.NOT_NEGATIVE);
    List<Double> t = list(p, "temperature", QuantityKind.TEMPERATURE, Range.POSITIVE);
    stations(p, "distance", s, t);
    return Optional.of(
        new Gas.AlongPath(List.copyOf(x), List.copyOf(y), List.copyOf(s), List.copyOf(t)));
  }

  private static List<Double> list(Mapping p, String key, QuantityKind kind, Range range) {
    return p.get(key).map(e -> e.numbers(kind, range)).orElse(List.of());
  }

  private static void stations(Mapping p, String key, List<Double> at, List<Double> t) {
    if (p.has(key) && p.has("temperature") && at.size() != t.size()) {
      p.entry()
          .fault(
              at.size() + " stations but " + t.size() + " temperatures",
              "give one temperature for each station");
    }
    if (p.has(key) && at.size() == 1) {
      p.at(key).fault("a profile with one station", "give at least two");
    }
    for (int i = 1; i < at.size(); i++) {
      if (at.get(i) <= at.get(i - 1)) {
        p.get(key)
            .orElseThrow()
            .fault("station " + (i + 1) + " is not behind the one before", "sort by rising " + key);
        break;
      }
    }
  }

  private Optional<Gas.Temperature> file(Mapping m) {
    Entry entry = m.get("file").orElseThrow();
    Optional<Path> file = CaseFolder.existing(entry);
    if (file.isEmpty() || geometry.isEmpty()) {
      return Optional.empty();
    }
    int sectors = m.get("sectors").map(e -> e.whole(1, GeometryReader.MOST_BURNERS)).orElse(1);
    boolean vtu = file.get().toString().toLowerCase(Locale.ROOT).endsWith(".vtu");
    if (!vtu) {
      for (String key : List.of("array", "length_unit", "temperature_unit", "axis")) {
        if (m.has(key)) {
          m.at(key).fault("'" + key + "' goes with a VTU file", "a CSV states all in its head");
        }
      }
    }
    try {
      return entry
          .binder()
          .dataFiles()
          .once(
              key(m, file.get()),
              Gas.Temperature.class,
              () -> (vtu ? vtu(m, file.get()) : csv(entry)).flatMap(p -> field(entry, p, sectors)));
    } catch (IllegalArgumentException e) {
      entry.fault(file.get().getFileName() + ": " + e.getMessage(), "look at its points");
      return Optional.empty();
    }
  }

  /** Everything a field depends on: the file, how it is read, and where it is averaged. */
  private String key(Mapping m, Path file) {
    StringBuilder key = new StringBuilder(file.toString());
    for (String k : List.of("array", "length_unit", "temperature_unit", "axis", "sectors")) {
      key.append('|').append(m.get(k).flatMap(Entry::text).orElse(""));
    }
    if (geometry.orElseThrow() instanceof Geometry.Ring ring) {
      key.append('|').append(ring.unrolledRadius());
      if (ring.zoneNames().contains(zone)) {
        key.append('|').append(ring.zone(zone));
      }
    }
    return key.append('|').append(geometry.get().getClass()).toString();
  }

  /** Points of a file: in the plane (z null), at angles (theta), or in space. */
  private record Points(double[] x, double[] y, double[] z, double[] theta, double[] kelvin) {}

  private static Optional<Points> csv(Entry entry) {
    Optional<CsvTable> read = CsvTable.read(entry, COLUMNS);
    if (read.isEmpty()) {
      return Optional.empty();
    }
    CsvTable t = read.get();
    Optional<double[]> x = t.column("x");
    Optional<double[]> kelvin = t.column("temperature");
    if (x.isEmpty() || kelvin.isEmpty()) {
      return Optional.empty();
    }
    if (t.has("theta")) {
      return Optional.of(
          new Points(x.get(), null, null, t.column("theta").orElseThrow(), kelvin.get()));
    }
    if (t.has("r")) {
      return Optional.of(
          new Points(x.get(), t.column("r").orElseThrow(), null, null, kelvin.get()));
    }
    Optional<double[]> y = t.column("y");
    double[] z = t.has("z") ? t.column("z").orElseThrow() : null;
    return y.map(v -> new Points(x.get(), v, z, null, kelvin.get()));
  }

  private static Optional<Points> vtu(Mapping m, Path file) {
    Entry entry = m.get("file").orElseThrow();
    VtuGrid grid;
    try {
      grid = VtuGrid.read(file);
    } catch (MeshFileException e) {
      entry.fault(file.getFileName() + e.place() + ": " + e.what(), e.mend());
      return Optional.empty();
    } catch (IOException e) {
      entry.fault("the file cannot be read: " + e.getMessage(), "look at its permissions");
      return Optional.empty();
    }
    String array = m.get("array").flatMap(Entry::text).orElse("T");
    boolean onPoints = grid.pointData().containsKey(array);
    VtuGrid.Field field = onPoints ? grid.pointData().get(array) : grid.cellData().get(array);
    if (field == null || field.components() != 1) {
      List<String> there = new ArrayList<>(grid.pointData().keySet());
      there.addAll(grid.cellData().keySet());
      entry.fault(
          file.getFileName() + " has no array '" + array + "' of single numbers",
          "say 'array: …'; it has " + String.join(", ", there));
      return Optional.empty();
    }
    double metres = unit(m, "length_unit", "m", QuantityKind.LENGTH);
    int axis =
        List.of("x", "y", "z")
            .indexOf(m.get("axis").flatMap(e -> e.choice(List.of("x", "y", "z"))).orElse("x"));
    int n = onPoints ? grid.pointCount() : grid.cellCount();
    double[][] xyz = new double[3][n];
    double[] kelvin = new double[n];
    String degrees = m.get("temperature_unit").flatMap(Entry::text).orElse("K");
    for (int k = 0; k < n; k++) {
      double[] c = onPoints ? point(grid, k) : centre(grid, k);
      for (int d = 0; d < 3; d++) {
        xyz[d][k] = metres * c[(axis + d) % 3];
      }
      try {
        kelvin[k] =
            degrees.equals("K")
                ? field.values()[k]
                : Quantity.parse(
                        Double.toString(field.values()[k]), degrees, QuantityKind.TEMPERATURE)
                    .si();
      } catch (UnitFault f) {
        m.at("temperature_unit").fault(f.what(), f.mend());
        return Optional.empty();
      }
    }
    boolean flat = java.util.Arrays.stream(xyz[2]).allMatch(z -> z == 0);
    return Optional.of(new Points(xyz[0], xyz[1], flat ? null : xyz[2], null, kelvin));
  }

  private static double unit(Mapping m, String key, String preset, QuantityKind kind) {
    String text = m.get(key).flatMap(Entry::text).orElse(preset);
    try {
      return Quantity.parse("1", text, kind).si();
    } catch (UnitFault f) {
      m.at(key).fault(f.what(), f.mend());
      return Double.NaN;
    }
  }

  private static double[] point(VtuGrid grid, int p) {
    return new double[] {grid.points()[3 * p], grid.points()[3 * p + 1], grid.points()[3 * p + 2]};
  }

  private static double[] centre(VtuGrid grid, int c) {
    double[] sum = new double[3];
    int from = grid.begin(c);
    int to = grid.offsets()[c];
    for (int q = from; q < to; q++) {
      for (int d = 0; d < 3; d++) {
        sum[d] += grid.points()[3 * grid.corners()[q] + d] / (to - from);
      }
    }
    return sum;
  }

  private Optional<Gas.Temperature> field(Entry entry, Points p, int sectors) {
    String file = entry.text().orElse("");
    if (geometry.orElseThrow() instanceof Geometry.Ring ring) {
      return onRing(entry, ring, p, sectors);
    }
    if (p.theta != null) {
      entry.fault("a table over theta on a geometry that is no ring", "give columns x and r, or y");
      return Optional.empty();
    }
    if (p.z != null && !section()) {
      entry.fault("points in space on a plane", "give columns x and y alone");
      return Optional.empty();
    }
    if (p.z != null) {
      CloudAverage mean = CloudAverage.overAngle(new PointCloud(p.x, p.y, p.z, p.kelvin));
      return Optional.of(new Gas.FromFile(file, mean.field(), Gas.Round.EVEN, mean.meanSpread()));
    }
    return Optional.of(
        new Gas.FromFile(
            file, ScatteredTemperature.onSection(p.x, p.y, p.kelvin), Gas.Round.EVEN, 0));
  }

  private boolean section() {
    Geometry g = geometry.orElseThrow();
    return g instanceof Geometry.Section
        || g instanceof Geometry.MeshFile f && f.plane() == Geometry.MeshPlane.SECTION;
  }

  private Optional<Gas.Temperature> onRing(Entry entry, Geometry.Ring ring, Points p, int sectors) {
    String file = entry.text().orElse("");
    double radius = ring.unrolledRadius();
    if (p.theta != null) {
      double[] arc = p.theta.clone();
      for (int k = 0; k < arc.length; k++) {
        arc[k] *= radius;
      }
      return Optional.of(
          new Gas.FromFile(
              file,
              ScatteredTemperature.onRing(p.x, arc, p.kelvin, 2 * Math.PI * radius / sectors),
              Gas.Round.UNEVEN,
              0));
    }
    if (p.z == null) {
      entry.fault(
          "a field in one plane on a ring",
          "give columns x, theta and temperature, or points in space x, y, z");
      return Optional.empty();
    }
    Geometry.RingZone z = ring.zone(zone);
    double half = 0.5 * (z instanceof Geometry.Annulus a ? a.gap() : ((Geometry.Ducts) z).bore());
    CloudAverage mean =
        CloudAverage.overGap(
            new PointCloud(p.x, p.y, p.z, p.kelvin),
            new RingShell(z.meanRadius() - half, z.meanRadius() + half, radius, sectors));
    return Optional.of(new Gas.FromFile(file, mean.field(), Gas.Round.UNEVEN, mean.meanSpread()));
  }
}
