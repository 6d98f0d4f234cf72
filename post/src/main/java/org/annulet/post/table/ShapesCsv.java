package org.annulet.post.table;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.files.WholeFile;
import org.annulet.post.meaning.Chamber;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.NodeLine;
import org.annulet.post.meaning.Results;

/**
 * {@code shapes.csv}: the pressure of every mode along lines, one row for each line, mode and node,
 * for whoever places dampers or feeds a network model. p̂ is scaled as in the field files; on a
 * section it is the amplitude of e^{imθ}.
 */
public final class ShapesCsv {
  private ShapesCsv() {}

  /**
   * Writes the file, whole or not at all.
   *
   * @throws IOException if the folder cannot be written
   */
  public static void write(Path file, Results results, Chamber chamber, List<NodeLine> lines)
      throws IOException {
    WholeFile.write(file, text(results, chamber, lines));
  }

  /** The text of the file. */
  public static String text(Results results, Chamber chamber, List<NodeLine> lines) {
    Mesh mesh = chamber.mesh();
    StringBuilder b = new StringBuilder();
    b.append("line,piece,distance_m,")
        .append(
            switch (chamber.kind()) {
              case RING -> "x_m,angle_deg";
              case SECTION -> "x_m,r_m";
              case CROSS_SECTION -> "y_m,z_m";
              case PLANE -> "x_m,y_m";
            })
        .append(",mode,frequency_hz,p_magnitude,p_phase_deg,p_real,p_imag\n");
    double unit = mesh.period() > 0 ? 360 / mesh.period() : 1;
    for (NodeLine line : lines) {
      String name = ModesCsv.cell(line.name());
      for (int i = 0; i < results.modes().size(); i++) {
        ModeEntry e = results.modes().get(i);
        String mode = "," + (i + 1) + "," + ModesCsv.number(e.view().mode().frequency()) + ",";
        for (NodeLine.Stop s : line.stops()) {
          double re = e.view().re()[s.node()];
          double im = e.view().im()[s.node()];
          b.append(name).append(',').append(s.piece()).append(',');
          b.append((float) s.distance()).append(',');
          b.append((float) mesh.x(s.node())).append(',');
          b.append((float) (mesh.y(s.node()) * unit)).append(mode);
          b.append((float) Math.hypot(re, im)).append(',');
          b.append((float) Math.toDegrees(Math.atan2(im, re))).append(',');
          b.append((float) re).append(',').append((float) im).append('\n');
        }
      }
    }
    return b.toString();
  }
}
