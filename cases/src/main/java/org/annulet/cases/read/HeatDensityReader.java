package org.annulet.cases.read;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.annulet.cases.units.QuantityKind;
import org.annulet.solver.flame.GaussianBrush;
import org.annulet.solver.flame.HeatDensity;
import org.annulet.solver.medium.ScatteredTemperature;

/** Reads how the heat of a flame is spread: a brush along the gas path, or points of a file. */
final class HeatDensityReader {
  private static final Map<String, QuantityKind> COLUMNS = new LinkedHashMap<>();

  static {
    COLUMNS.put("x", QuantityKind.LENGTH);
    COLUMNS.put("y", QuantityKind.LENGTH);
    COLUMNS.put("r", QuantityKind.LENGTH);
    COLUMNS.put("theta", QuantityKind.ANGLE);
    COLUMNS.put("heat", QuantityKind.FRACTION);
  }

  private HeatDensityReader() {}

  static Optional<HeatDensity> read(Mapping place, Geometry geometry, String zone) {
    Optional<String> way = place.exactlyOne(List.of("brush", "heat_file"));
    if (way.isEmpty()) {
      return Optional.empty();
    }
    Entry entry = place.get(way.get()).orElseThrow();
    return way.get().equals("brush")
        ? brush(Mapping.of(entry, CaseKeys.BRUSH), geometry, zone)
        : file(entry, geometry);
  }

  private static Optional<HeatDensity> brush(Mapping m, Geometry geometry, String zone) {
    double deviation = m.number("deviation", QuantityKind.LENGTH, Range.POSITIVE);
    double centre = m.number("centre", QuantityKind.LENGTH, Range.ANY);
    if (Double.isNaN(deviation) || Double.isNaN(centre)) {
      return Optional.empty();
    }
    if (!m.has("corners")) {
      return Optional.of(GaussianBrush.alongAxis(centre, deviation));
    }
    List<Double> x = new ArrayList<>();
    List<Double> y = new ArrayList<>();
    for (Entry corner : m.get("corners").orElseThrow().items()) {
      List<Double> c = corner.numbers(QuantityKind.LENGTH, Range.ANY);
      if (c.size() != 2) {
        corner.fault("a corner has two coordinates", "write [x, r, mm]");
        return Optional.empty();
      }
      x.add(c.get(0));
      y.add(c.get(1));
    }
    if (x.size() < 2) {
      m.at("corners").fault("a path of " + x.size() + " corners", "give at least two");
      return Optional.empty();
    }
    return Optional.of(new GaussianBrush(x, y, centre, deviation));
  }

  private static Optional<HeatDensity> file(Entry entry, Geometry geometry) {
    return entry
        .binder()
        .dataFiles()
        .once(
            "heat|" + entry.text().orElse("") + "|" + geometry,
            HeatDensity.class,
            () -> readFile(entry, geometry));
  }

  private static Optional<HeatDensity> readFile(Entry entry, Geometry geometry) {
    Optional<CsvTable> read = CsvTable.read(entry, COLUMNS);
    if (read.isEmpty()) {
      return Optional.empty();
    }
    CsvTable t = read.get();
    boolean ring = geometry instanceof Geometry.Ring;
    String across = ring ? "theta" : t.has("r") ? "r" : "y";
    Optional<double[]> x = t.column("x");
    Optional<double[]> y = t.column(across);
    Optional<double[]> heat = t.column("heat");
    if (x.isEmpty() || y.isEmpty() || heat.isEmpty()) {
      return Optional.empty();
    }
    double most = Arrays.stream(heat.get()).max().orElse(0);
    if (!(most > 0) || Arrays.stream(heat.get()).anyMatch(h -> h < 0)) {
      entry.fault(
          "the heat release is nowhere positive, or somewhere negative", "check the column");
      return Optional.empty();
    }
    // The interpolation wants positive values: one is added, and taken away again.
    double[] one = Arrays.stream(heat.get()).map(h -> 1 + h / most).toArray();
    double[] second = y.get();
    ScatteredTemperature field;
    if (geometry instanceof Geometry.Ring r) {
      double[] arc = Arrays.stream(second).map(a -> a * r.unrolledRadius()).toArray();
      field =
          ScatteredTemperature.onRing(
              x.get(), arc, one, 2 * Math.PI * r.unrolledRadius() / r.burnerCount());
    } else {
      field = ScatteredTemperature.onSection(x.get(), second, one);
    }
    return Optional.of(new Points(field));
  }

  /** Density from points of a file; nothing outside them. */
  private record Points(ScatteredTemperature field) implements HeatDensity {
    @Override
    public double at(double x, double y) {
      return field.distanceOutside(x, y) > 0 ? 0 : Math.max(0, field.temperature(x, y) - 1);
    }
  }
}
