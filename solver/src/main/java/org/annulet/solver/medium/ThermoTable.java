package org.annulet.solver.medium;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.Reader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * A table of species with NASA 7-coefficient polynomials, read from comma-separated text;
 * immutable.
 *
 * <p>Each row is {@code species,composition,T_low_K,T_high_K,a1,…,a7}, one row per temperature
 * range, ranges ascending and touching; lines that begin with # are comments. The table that ships
 * with the solver, {@link #nasa7()}, names its source in its own header.
 */
public final class ThermoTable {
  private static final String RESOURCE = "thermo_nasa7.csv";
  private static final String HEADER = "species,composition,T_low_K,T_high_K";
  private static final int COLUMNS = 11;

  private final Map<String, NasaSpecies> species;

  private ThermoTable(Map<String, NasaSpecies> species) {
    this.species = species;
  }

  /** The shipped table: N2, O2, Ar, CO2, H2O, CO, H2, CH4, C2H6, C3H8, NH3, Jet-A(g), NO, OH. */
  public static ThermoTable nasa7() {
    return Shipped.TABLE;
  }

  /**
   * Reads a table.
   *
   * @param source the text; not closed here
   * @param name of the source, for messages
   * @throws IOException if reading fails
   * @throws IllegalArgumentException if a row is malformed or ranges do not touch
   */
  public static ThermoTable read(Reader source, String name) throws IOException {
    BufferedReader lines = new BufferedReader(source);
    Map<String, List<double[]>> rows = new LinkedHashMap<>();
    Map<String, String> compositions = new LinkedHashMap<>();
    int number = 0;
    for (String line = lines.readLine(); line != null; line = lines.readLine()) {
      number++;
      if (line.isBlank() || line.startsWith("#") || line.startsWith(HEADER)) {
        continue;
      }
      String where = name + ":" + number;
      String[] cell = line.split(",", -1);
      if (cell.length != COLUMNS) {
        throw new IllegalArgumentException(
            where
                + ": "
                + cell.length
                + " columns, expected "
                + COLUMNS
                + ": "
                + HEADER
                + ",a1..a7");
      }
      double[] values = new double[COLUMNS - 2];
      for (int k = 0; k < values.length; k++) {
        values[k] = number(cell[k + 2], where);
      }
      rows.computeIfAbsent(cell[0].trim(), s -> new ArrayList<>()).add(values);
      compositions.put(cell[0].trim(), cell[1]);
    }
    Map<String, NasaSpecies> species = new LinkedHashMap<>();
    rows.forEach((s, r) -> species.put(s, build(s, compositions.get(s), r)));
    return new ThermoTable(species);
  }

  /**
   * The species of that name.
   *
   * @throws IllegalArgumentException if the table has none, with the names it has
   */
  public NasaSpecies species(String name) {
    NasaSpecies found = species.get(name);
    if (found == null) {
      throw new IllegalArgumentException(
          "no gas data for species '" + name + "'; the table has " + String.join(", ", names()));
    }
    return found;
  }

  /** Names of all species in the order of the table. */
  public List<String> names() {
    return List.copyOf(species.keySet());
  }

  private static NasaSpecies build(String name, String composition, List<double[]> rows) {
    Map<String, Integer> atoms = new LinkedHashMap<>();
    for (String part : composition.trim().split(" +")) {
      int letters = 0;
      while (letters < part.length() && Character.isLetter(part.charAt(letters))) {
        letters++;
      }
      atoms.put(part.substring(0, letters), Integer.parseInt(part.substring(letters)));
    }
    double[] bounds = new double[rows.size() + 1];
    double[][] coefficients = new double[rows.size()][7];
    bounds[0] = rows.get(0)[0];
    for (int r = 0; r < rows.size(); r++) {
      double[] row = rows.get(r);
      if (row[0] != bounds[r] || !(row[1] > row[0])) {
        throw new IllegalArgumentException(
            "species '"
                + name
                + "': temperature ranges must ascend and touch, got "
                + row[0]
                + " K");
      }
      bounds[r + 1] = row[1];
      System.arraycopy(row, 2, coefficients[r], 0, 7);
    }
    return new NasaSpecies(name, atoms, bounds, coefficients);
  }

  private static double number(String text, String where) {
    try {
      double value = Double.parseDouble(text.trim());
      if (Double.isFinite(value)) {
        return value;
      }
    } catch (NumberFormatException e) {
      // reported below together with infinite values
    }
    throw new IllegalArgumentException(where + ": '" + text + "' is not a finite number");
  }

  /** Loads the shipped table once, on first use. */
  private static final class Shipped {
    static final ThermoTable TABLE = load();

    private static ThermoTable load() {
      try (InputStream in = ThermoTable.class.getResourceAsStream(RESOURCE)) {
        if (in == null) {
          throw new IllegalStateException(
              "gas data " + RESOURCE + " are missing from the solver's jar; build it again");
        }
        return read(new InputStreamReader(in, StandardCharsets.UTF_8), RESOURCE);
      } catch (IOException e) {
        throw new UncheckedIOException(e);
      }
    }
  }
}
