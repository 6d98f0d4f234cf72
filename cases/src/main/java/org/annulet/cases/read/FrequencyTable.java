package org.annulet.cases.read;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.annulet.cases.units.QuantityKind;

/**
 * Complex values over frequency, from a CSV file with columns {@code frequency} and either {@code
 * real} and {@code imaginary} or {@code magnitude} (or {@code gain}) and {@code phase}.
 *
 * @param file name of the file
 * @param frequency in Hz, ascending
 * @param re real parts
 * @param im imaginary parts
 */
public record FrequencyTable(String file, double[] frequency, double[] re, double[] im) {
  private static final Map<String, QuantityKind> COLUMNS = new LinkedHashMap<>();

  static {
    COLUMNS.put("frequency", QuantityKind.FREQUENCY);
    COLUMNS.put("real", QuantityKind.FRACTION);
    COLUMNS.put("imaginary", QuantityKind.FRACTION);
    COLUMNS.put("magnitude", QuantityKind.FRACTION);
    COLUMNS.put("gain", QuantityKind.FRACTION);
    COLUMNS.put("phase", QuantityKind.ANGLE);
  }

  /** Two tables are equal when their values are. */
  @Override
  public boolean equals(Object other) {
    return other instanceof FrequencyTable t
        && Arrays.equals(frequency, t.frequency)
        && Arrays.equals(re, t.re)
        && Arrays.equals(im, t.im);
  }

  @Override
  public int hashCode() {
    return Arrays.hashCode(re) + 31 * Arrays.hashCode(im);
  }

  /** Highest frequency in Hz. */
  public double highestFrequency() {
    return frequency[frequency.length - 1];
  }

  /** Reads the table an entry names. */
  static Optional<FrequencyTable> read(Entry entry) {
    return entry
        .binder()
        .dataFiles()
        .once("table|" + entry.text().orElse(""), FrequencyTable.class, () -> readFile(entry));
  }

  private static Optional<FrequencyTable> readFile(Entry entry) {
    Optional<CsvTable> table = CsvTable.read(entry, COLUMNS);
    if (table.isEmpty()) {
      return Optional.empty();
    }
    CsvTable t = table.get();
    Optional<double[]> f = t.column("frequency");
    boolean polar = t.has("phase");
    String size = t.has("gain") ? "gain" : "magnitude";
    Optional<double[]> a = t.column(polar ? size : "real");
    Optional<double[]> b = t.column(polar ? "phase" : "imaginary");
    if (f.isEmpty() || a.isEmpty() || b.isEmpty()) {
      return Optional.empty();
    }
    double[] hz = f.get();
    if (!ascending(entry, hz)) {
      return Optional.empty();
    }
    double[] re = a.get();
    double[] im = b.get();
    for (int k = 0; polar && k < re.length; k++) {
      double size0 = re[k];
      re[k] = size0 * Math.cos(im[k]);
      im[k] = size0 * Math.sin(im[k]);
    }
    return Optional.of(new FrequencyTable(entry.text().orElse(""), hz, re, im));
  }

  /**
   * Reads a matrix: columns {@code frequency} and {@code t11_real}, {@code t11_imaginary} to {@code
   * t22_imaginary}.
   */
  static Optional<List<FrequencyTable>> matrix(Entry entry) {
    List<String> names = List.of("t11", "t12", "t21", "t22");
    Map<String, QuantityKind> columns = new LinkedHashMap<>();
    columns.put("frequency", QuantityKind.FREQUENCY);
    for (String n : names) {
      columns.put(n + "_real", QuantityKind.FRACTION);
      columns.put(n + "_imaginary", QuantityKind.FRACTION);
    }
    Optional<CsvTable> table = CsvTable.read(entry, columns);
    List<FrequencyTable> matrix = new ArrayList<>();
    for (String n : names) {
      Optional<double[]> f = table.flatMap(t -> t.column("frequency"));
      Optional<double[]> re = table.flatMap(t -> t.column(n + "_real"));
      Optional<double[]> im = table.flatMap(t -> t.column(n + "_imaginary"));
      if (f.isEmpty() || re.isEmpty() || im.isEmpty() || !ascending(entry, f.get())) {
        return Optional.empty();
      }
      matrix.add(new FrequencyTable(entry.text().orElse(""), f.get(), re.get(), im.get()));
    }
    return Optional.of(matrix);
  }

  private static boolean ascending(Entry entry, double[] hz) {
    for (int k = 0; k < hz.length; k++) {
      if (hz[k] < 0 || k > 0 && hz[k] <= hz[k - 1]) {
        entry.fault(
            "frequencies must ascend from zero or above; row " + (k + 1) + " has " + hz[k] + " Hz",
            "sort the table, and leave doubled rows out");
        return false;
      }
    }
    if (hz.length < 3) {
      entry.fault("the table has " + hz.length + " rows", "give at least 3");
      return false;
    }
    return true;
  }
}
