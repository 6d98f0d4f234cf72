package org.annulet.post.table;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import org.annulet.post.files.WholeFile;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.Results;

/**
 * {@code modes.csv}: one row for each mode, commas, dots as decimal sign, units in the names of the
 * columns; an error bar that was not estimated is left empty.
 */
public final class ModesCsv {
  private ModesCsv() {}

  /**
   * Writes the file, whole or not at all.
   *
   * @throws IOException if the folder cannot be written
   */
  public static void write(Path file, Results results) throws IOException {
    WholeFile.write(file, text(results));
  }

  /** The text of the file. */
  public static String text(Results results) {
    StringBuilder b = new StringBuilder();
    b.append("number,problem,azimuthal_order,label,frequency_hz,frequency_error_hz,")
        .append("growth_rate_per_s,growth_rate_error_per_s,multiplicity,zone,zone_energy_share,")
        .append("axial_nodes,radial_nodes,origin,stability,verdict,backward_error\n");
    for (int i = 0; i < results.modes().size(); i++) {
      ModeEntry e = results.modes().get(i);
      List<String> row =
          List.of(
              Integer.toString(i + 1),
              e.view().operatorName(),
              e.label().azimuthalOrder() == null ? "" : e.label().azimuthalOrder().toString(),
              e.label().text(),
              number(e.view().mode().frequency()),
              number(e.view().frequencyError()),
              number(e.view().mode().growthRate()),
              number(e.view().growthError()),
              Integer.toString(e.view().mode().multiplicity()),
              e.label().zone(),
              number(e.label().zoneShare()),
              Integer.toString(e.label().axialNodes()),
              Integer.toString(e.label().radialNodes()),
              e.label().origin().name().toLowerCase(Locale.ROOT),
              e.stability().name().toLowerCase(Locale.ROOT),
              e.view().mode().verdict().name().toLowerCase(Locale.ROOT),
              number(e.view().mode().backwardError()));
      for (int k = 0; k < row.size(); k++) {
        b.append(k == 0 ? "" : ",").append(cell(row.get(k)));
      }
      b.append('\n');
    }
    return b.toString();
  }

  static String number(double v) {
    return Double.isNaN(v) || Double.isInfinite(v) ? "" : Double.toString(v);
  }

  /**
   * One cell, quoted where it must be. A text that a spreadsheet would run as a formula is tamed.
   */
  static String cell(String text) {
    boolean formula =
        !text.isEmpty() && "=+-@\t".indexOf(text.charAt(0)) >= 0 && !text.matches("[-+0-9.eE]+");
    String safe = formula ? "'" + text : text;
    return safe.matches("(?s).*[,\"\n\r].*") ? '"' + safe.replace("\"", "\"\"") + '"' : safe;
  }
}
