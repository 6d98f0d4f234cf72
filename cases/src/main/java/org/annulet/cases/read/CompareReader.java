package org.annulet.cases.read;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.annulet.cases.units.QuantityKind;

/** Reads {@code studies.compare} and the tables it names. */
final class CompareReader {
  private static final int MOST_ROWS = 300;
  private static final int MOST_ORDER = 200;
  private static final Map<String, QuantityKind> MODES = new LinkedHashMap<>();
  private static final Map<String, QuantityKind> SHAPES = new LinkedHashMap<>();

  static {
    MODES.put("frequency", QuantityKind.FREQUENCY);
    MODES.put("growth_rate", QuantityKind.GROWTH_RATE);
    MODES.put("damping_rate", QuantityKind.GROWTH_RATE);
    MODES.put("azimuthal_order", QuantityKind.FRACTION);
    MODES.put("frequency_tolerance", QuantityKind.FREQUENCY);
    MODES.put("growth_tolerance", QuantityKind.GROWTH_RATE);
    SHAPES.put("mode", QuantityKind.FRACTION);
    SHAPES.put("x", QuantityKind.LENGTH);
    SHAPES.put("real", QuantityKind.FRACTION);
    SHAPES.put("imaginary", QuantityKind.FRACTION);
    SHAPES.put("magnitude", QuantityKind.FRACTION);
    SHAPES.put("phase", QuantityKind.ANGLE);
  }

  private CompareReader() {}

  static Optional<ModeComparison> read(Entry entry) {
    Mapping m = Mapping.of(entry, CaseKeys.COMPARE);
    List<ModeTable> tables = new ArrayList<>();
    m.get("tables")
        .map(e -> Mapping.named(e).checkNames())
        .ifPresent(
            all -> all.entries().forEach((name, e) -> table(name, e).ifPresent(tables::add)));
    double within =
        m.get("match_within")
            .map(e -> e.number(QuantityKind.FRACTION, Range.SHARE))
            .orElse(ModeComparison.MATCH_WITHIN);
    return Optional.of(new ModeComparison(tables, within));
  }

  private static Optional<ModeTable> table(String name, Entry entry) {
    Mapping m = Mapping.of(entry, CaseKeys.COMPARED_TABLE);
    String about = m.get("about").flatMap(Entry::text).orElse("");
    Optional<String> kind = m.exactlyOne(List.of("network_model", "measured"));
    if (kind.isEmpty()) {
      return Optional.empty();
    }
    Entry file = m.get(kind.get()).orElseThrow();
    Optional<Entry> shapes = m.get("shapes");
    String key = file.text().orElse("") + "|" + shapes.flatMap(Entry::text).orElse("");
    ModeTable.Origin origin =
        kind.get().equals("measured") ? ModeTable.Origin.MEASURED : ModeTable.Origin.NETWORK_MODEL;
    return entry
        .binder()
        .dataFiles()
        .once("modes|" + key, ModeTable.class, () -> rows(name, origin, file, shapes))
        .map(t -> new ModeTable(name, about, origin, t.file(), t.rows()));
  }

  private static Optional<ModeTable> rows(
      String name, ModeTable.Origin origin, Entry entry, Optional<Entry> shapes) {
    Optional<CsvTable> table = CsvTable.read(entry, MODES);
    Optional<double[]> hertz = table.flatMap(t -> t.column("frequency"));
    if (hertz.isEmpty()) {
      return Optional.empty();
    }
    CsvTable t = table.get();
    if (t.has("growth_rate") && t.has("damping_rate")) {
      entry.fault(
          t.place(t.line(0)) + ": both a growth rate and a damping rate",
          "keep one: the damping rate is the growth rate with the other sign");
      return Optional.empty();
    }
    if (hertz.get().length > MOST_ROWS) {
      entry.fault(
          hertz.get().length + " modes, at most " + MOST_ROWS + " can be compared",
          "keep those near the window");
      return Optional.empty();
    }
    double sign = t.has("damping_rate") ? -1 : 1;
    double[] growth = column(t, t.has("damping_rate") ? "damping_rate" : "growth_rate", Double.NaN);
    double[] order = column(t, "azimuthal_order", -1);
    double[] aboutHertz = column(t, "frequency_tolerance", 0);
    double[] aboutGrowth = column(t, "growth_tolerance", 0);
    Map<Integer, ModeTable.Shape> forms = new LinkedHashMap<>();
    if (shapes.isPresent() && !shapes(shapes.get(), hertz.get().length, forms)) {
      return Optional.empty();
    }
    List<ModeTable.Row> rows = new ArrayList<>();
    for (int k = 0; k < hertz.get().length; k++) {
      String place = t.place(t.line(k));
      if (!(hertz.get()[k] > 0)) {
        entry.fault(
            place + ": a frequency of " + hertz.get()[k] + " Hz", "modes have a positive one");
        return Optional.empty();
      }
      if (order[k] != Math.rint(order[k]) || Math.abs(order[k]) > MOST_ORDER) {
        entry.fault(
            place + ": the azimuthal order " + order[k] + " is no whole number",
            "write 0, 1, 2, …");
        return Optional.empty();
      }
      if (aboutHertz[k] < 0 || aboutGrowth[k] < 0) {
        entry.fault(place + ": a tolerance below zero", "write how far the value may be off");
        return Optional.empty();
      }
      rows.add(
          new ModeTable.Row(
              t.line(k),
              hertz.get()[k],
              aboutHertz[k],
              sign * growth[k],
              aboutGrowth[k],
              t.has("azimuthal_order") ? (int) Math.abs(order[k]) : -1,
              Optional.ofNullable(forms.get(k + 1))));
    }
    return Optional.of(new ModeTable(name, "", origin, entry.text().orElse(""), rows));
  }

  private static double[] column(CsvTable t, String name, double preset) {
    if (t.has(name)) {
      return t.column(name).orElseThrow();
    }
    double[] all = new double[t.rows()];
    java.util.Arrays.fill(all, preset);
    return all;
  }

  /** Fills shapes by the number of their mode; false after a fault. */
  private static boolean shapes(Entry entry, int modes, Map<Integer, ModeTable.Shape> out) {
    Optional<CsvTable> table = CsvTable.read(entry, SHAPES);
    Optional<double[]> mode = table.flatMap(t -> t.column("mode"));
    Optional<double[]> x = table.flatMap(t -> t.column("x"));
    boolean polar = table.map(t -> t.has("magnitude")).orElse(false);
    Optional<double[]> a = table.flatMap(t -> t.column(polar ? "magnitude" : "real"));
    if (mode.isEmpty() || x.isEmpty() || a.isEmpty()) {
      return false;
    }
    CsvTable t = table.get();
    double[] b = column(t, polar ? "phase" : "imaginary", 0);
    int begin = 0;
    for (int k = 0; k < t.rows(); k++) {
      double number = mode.get()[k];
      if (number != Math.rint(number) || number < 1 || number > modes) {
        entry.fault(
            t.place(t.line(k)) + ": there is no mode " + number + " in the table of modes",
            "count its rows from 1 to " + modes);
        return false;
      }
      boolean first = k == 0 || number != mode.get()[k - 1];
      begin = first ? k : begin;
      if (first && out.containsKey((int) number) || !first && x.get()[k] <= x.get()[k - 1]) {
        entry.fault(
            t.place(t.line(k)) + ": x does not increase along mode " + (int) number,
            "sort the rows of each mode by x, each place once, one mode after the other");
        return false;
      }
      if (k + 1 == t.rows() || mode.get()[k + 1] != number) {
        int n = k + 1 - begin;
        if (n < 3) {
          entry.fault(
              t.place(t.line(k)) + ": mode " + (int) number + " has " + n + " places",
              "give at least 3 along the axis");
          return false;
        }
        double[] xs = new double[n];
        double[] re = new double[n];
        double[] im = new double[n];
        for (int i = 0; i < n; i++) {
          double u = a.get()[begin + i];
          double v = b[begin + i];
          xs[i] = x.get()[begin + i];
          re[i] = polar ? u * Math.cos(v) : u;
          im[i] = polar ? u * Math.sin(v) : v;
        }
        out.put((int) number, new ModeTable.Shape(xs, re, im));
      }
    }
    return true;
  }
}
