package org.annulet.post.table;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import org.annulet.post.files.WholeFile;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.PointSensitivity;
import org.annulet.post.meaning.Results;

/**
 * {@code points.csv}: one row for each mode and coordinate of a point of the outline, the strongest
 * effect on the growth rate first. Per millimetre, where {@link SensitivitiesCsv} is per percent.
 */
public final class PointsCsv {
  private PointsCsv() {}

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
    b.append("mode,frequency_hz,growth_rate_per_s,rank,key,point,coordinate,value,")
        .append("growth_rate_change_per_s_per_mm,frequency_change_hz_per_mm,")
        .append("linear_range_mm\n");
    for (int i = 0; i < results.modes().size(); i++) {
      ModeEntry e = results.modes().get(i);
      for (int k = 0; k < e.points().size(); k++) {
        PointSensitivity s = e.points().get(k);
        List<String> row =
            List.of(
                Integer.toString(i + 1),
                ModesCsv.number(e.view().mode().frequency()),
                ModesCsv.number(e.view().mode().growthRate()),
                Integer.toString(k + 1),
                ModesCsv.cell(s.key()),
                ModesCsv.cell(s.point()),
                ModesCsv.cell(s.coordinate()),
                ModesCsv.cell(s.value()),
                ModesCsv.number(s.growthPerMillimetre()),
                ModesCsv.number(s.frequencyPerMillimetre()),
                ModesCsv.number(s.linearRange()));
        b.append(String.join(",", row)).append('\n');
      }
    }
    return b.toString();
  }
}
