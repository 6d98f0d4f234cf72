package org.annulet.post.vtk;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import org.annulet.post.files.WholeFile;

/** A collection of VTU files over one running number. */
public final class PvdFile {
  private PvdFile() {}

  /**
   * One member.
   *
   * @param value running number (index of a mode; time in s)
   * @param file name of the VTU file, relative to the collection
   */
  public record Member(double value, String file) {}

  /**
   * Writes the collection.
   *
   * @throws IOException if the folder cannot be written
   */
  public static void write(Path file, List<Member> members) throws IOException {
    StringBuilder text = new StringBuilder();
    text.append("<?xml version=\"1.0\"?>\n")
        .append("<VTKFile type=\"Collection\" version=\"1.0\" byte_order=\"LittleEndian\">\n")
        .append("<Collection>\n");
    for (Member m : members) {
      text.append("<DataSet timestep=\"")
          .append(m.value())
          .append("\" group=\"\" part=\"0\" file=\"")
          .append(VtuFile.escape(m.file()))
          .append("\"/>\n");
    }
    text.append("</Collection>\n</VTKFile>\n");
    WholeFile.write(file, text.toString());
  }
}
