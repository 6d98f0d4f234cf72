package org.annulet.cases.read;

import java.io.IOException;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.annulet.cases.units.Quantity;
import org.annulet.cases.units.QuantityKind;
import org.annulet.cases.units.UnitFault;

/**
 * A table from a CSV file: the first line names the columns and states their units, as in {@code
 * frequency [Hz], gain [1], phase [°]}; lines that begin with # are remarks. Numbers have a decimal
 * point, columns are separated by commas.
 */
final class CsvTable {
  private static final int MOST_ROWS = 2_000_000;
  private static final Pattern HEAD =
      Pattern.compile("([A-Za-z][A-Za-z0-9_ ]*?)\\s*\\[([^\\]]*)\\]");

  private final Map<String, double[]> columns = new TreeMap<>();
  private final List<Integer> lineNumbers = new ArrayList<>();
  private final Entry entry;
  private final String name;

  private CsvTable(Entry entry, Path file) {
    this.entry = entry;
    this.name = file.getFileName().toString();
  }

  /**
   * Reads the columns a caller knows; others are ignored.
   *
   * @param entry the entry of the case that names the file; faults are reported there
   * @param known kinds by column name
   * @return the table; empty when a fault was reported
   */
  static Optional<CsvTable> read(Entry entry, Map<String, QuantityKind> known) {
    return CaseFolder.existing(entry).flatMap(file -> new CsvTable(entry, file).load(file, known));
  }

  /** Whether the file has a column. */
  boolean has(String column) {
    return columns.containsKey(column);
  }

  /**
   * A column in SI; a fault and nothing when it is not there.
   *
   * @param column one of the known names
   */
  Optional<double[]> column(String column) {
    if (!has(column)) {
      entry.fault(
          name + ": no column '" + column + "'",
          "its columns are "
              + String.join(", ", columns.keySet())
              + "; add '"
              + column
              + " [unit]'");
      return Optional.empty();
    }
    return Optional.of(columns.get(column).clone());
  }

  /** Number of rows. */
  int rows() {
    return columns.values().stream().findFirst().map(c -> c.length).orElse(0);
  }

  private Optional<CsvTable> load(Path file, Map<String, QuantityKind> known) {
    List<String> lines;
    try {
      lines = Files.readAllLines(file, StandardCharsets.UTF_8);
    } catch (CharacterCodingException e) {
      entry.fault(name + " is no UTF-8 text", "save it as UTF-8");
      return Optional.empty();
    } catch (IOException e) {
      entry.fault(name + " cannot be read: " + e.getMessage(), "look at its permissions");
      return Optional.empty();
    }
    if (lines.size() > MOST_ROWS) {
      entry.fault(
          name + " has " + lines.size() + " lines, " + MOST_ROWS + " can be read", "thin it out");
      return Optional.empty();
    }
    int first = 0;
    while (first < lines.size() && idle(clean(lines.get(first)))) {
      first++;
    }
    int head = first;
    if (head == lines.size()) {
      entry.fault(name + " is empty", "begin with a line such as 'frequency [Hz], gain [1]'");
      return Optional.empty();
    }
    Optional<Column[]> heads = heads(clean(lines.get(head)), head + 1, known);
    return heads.flatMap(h -> rows(h, lines, head + 1));
  }

  private static String clean(String line) {
    return line.startsWith("\uFEFF") ? line.substring(1) : line;
  }

  private static boolean idle(String line) {
    return line.isBlank() || line.stripLeading().startsWith("#");
  }

  private record Column(String name, String unit, QuantityKind kind) {}

  private Optional<Column[]> heads(String line, int number, Map<String, QuantityKind> known) {
    if (line.contains(";") || line.contains("\t")) {
      entry.fault(
          place(number) + ": columns separated by semicolons or tabs",
          "separate them by commas, and write decimals with a point");
      return Optional.empty();
    }
    String[] cells = line.split(",", -1);
    Column[] heads = new Column[cells.length];
    for (int c = 0; c < cells.length; c++) {
      String cell = cells[c].strip().replaceAll("^\"|\"$", "");
      Matcher m = HEAD.matcher(cell);
      if (!m.matches()) {
        entry.fault(
            place(number) + ": column '" + cell + "' states no unit",
            "write 'name [unit]', for plain numbers 'gain [1]'; known columns are "
                + String.join(", ", known.keySet()));
        return Optional.empty();
      }
      String column = m.group(1).strip().replace(' ', '_');
      QuantityKind kind = known.get(column);
      String unit = m.group(2).strip();
      if (kind == QuantityKind.FRACTION && (unit.equals("1") || unit.equals("-"))) {
        unit = ""; // plain numbers
      }
      if (kind == null) {
        continue;
      }
      try {
        Quantity.requireUnit(unit, kind);
      } catch (UnitFault f) {
        entry.fault(place(number) + ": column '" + column + "': " + f.what(), f.mend());
        return Optional.empty();
      }
      heads[c] = new Column(column, unit, kind);
    }
    return Optional.of(heads);
  }

  private Optional<CsvTable> rows(Column[] heads, List<String> lines, int first) {
    List<double[]> rows = new ArrayList<>();
    for (int k = first; k < lines.size(); k++) {
      String line = lines.get(k);
      if (idle(line)) {
        continue;
      }
      String[] cells = line.split(",", -1);
      if (cells.length != heads.length) {
        entry.fault(
            place(k + 1) + ": " + cells.length + " values under " + heads.length + " columns",
            "decimals are written with a point; every line has all columns");
        return Optional.empty();
      }
      double[] row = new double[heads.length];
      for (int c = 0; c < heads.length; c++) {
        if (heads[c] == null) {
          continue;
        }
        try {
          row[c] = Quantity.parse(cells[c], heads[c].unit(), heads[c].kind()).si();
        } catch (UnitFault f) {
          entry.fault(place(k + 1) + ": column '" + heads[c].name() + "': " + f.what(), f.mend());
          return Optional.empty();
        }
      }
      rows.add(row);
      lineNumbers.add(k + 1);
    }
    if (rows.isEmpty()) {
      entry.fault(name + " has no rows below its head", "add the values");
      return Optional.empty();
    }
    for (int c = 0; c < heads.length; c++) {
      if (heads[c] != null) {
        double[] column = new double[rows.size()];
        for (int k = 0; k < column.length; k++) {
          column[k] = rows.get(k)[c];
        }
        columns.put(heads[c].name(), column);
      }
    }
    return Optional.of(this);
  }

  /** Line of the file, counted from 1, on which a row stands, counted from 0. */
  int line(int row) {
    return lineNumbers.get(row);
  }

  /** File and line in words. */
  String place(int line) {
    return name + " line " + line;
  }
}
