package org.annulet.post.table;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import org.annulet.post.files.WholeFile;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.ParameterSensitivity;
import org.annulet.post.meaning.Results;

/**
 * {@code sensitivities.csv}: one row for each mode and input, the strongest effect on the growth
 * rate first.
 */
public final class SensitivitiesCsv {
  private SensitivitiesCsv() {}

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
    b.append("mode,frequency_hz,growth_rate_per_s,rank,key,value,")
        .append("growth_rate_change_per_s_per_percent,frequency_change_hz_per_percent,")
        .append("linear_range_percent\n");
    for (int i = 0; i < results.modes().size(); i++) {
      ModeEntry e = results.modes().get(i);
      for (int k = 0; k < e.sensitivities().size(); k++) {
        ParameterSensitivity s = e.sensitivities().get(k);
        List<String> row =
            List.of(
                Integer.toString(i + 1),
                ModesCsv.number(e.view().mode().frequency()),
                ModesCsv.number(e.view().mode().growthRate()),
                Integer.toString(k + 1),
                ModesCsv.cell(s.key()),
                ModesCsv.cell(s.value()),
                ModesCsv.number(s.growthPerPercent()),
                ModesCsv.number(s.frequencyPerPercent()),
                ModesCsv.number(s.linearRange()));
        b.append(String.join(",", row)).append('\n');
      }
    }
    return b.toString();
  }
}
