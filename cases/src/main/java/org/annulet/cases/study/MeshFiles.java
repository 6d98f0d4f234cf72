package org.annulet.cases.study;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import org.annulet.cases.read.CaseFile;
import org.annulet.mesher.files.GmshWriter;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.mesher.mesh.MeshCheck;
import org.annulet.mesher.mesh.Quality;
import org.annulet.post.chart.ChamberPicture;
import org.annulet.post.chart.MeshPicture;
import org.annulet.post.chart.PlaneView;
import org.annulet.post.chart.Svg;
import org.annulet.post.files.WholeFile;
import org.annulet.post.vtk.Surface;
import org.annulet.post.vtk.VtuFile;
import org.annulet.solver.medium.Medium;

/** The mesh of a case as files: MSH 4.1, VTU, pictures and a quality report. */
public final class MeshFiles {
  private MeshFiles() {}

  /**
   * Meshes a case and writes mesh.msh, mesh.vtu, mesh.svg, chamber.svg and quality.txt.
   *
   * @param folder made if absent
   * @return the quality report
   * @throws IOException if the folder cannot be written
   */
  public static String write(CaseFile caseFile, Path folder) throws IOException {
    ChamberShape shape = ChamberShape.of(caseFile);
    Mesh mesh = shape.mesh();
    StringBuilder report = new StringBuilder();
    Quality quality = Quality.of(mesh);
    quality.lines().forEach(line -> report.append(line).append('\n'));
    Medium gas = new CaseGas(caseFile).on(mesh);
    double top = caseFile.window().highestFrequency();
    for (int z = 0; z < mesh.zoneNames().size(); z++) {
      double slowest = Double.POSITIVE_INFINITY;
      for (int t = 0; t < mesh.triangleCount(); t++) {
        if (mesh.zone(t) == z) {
          slowest = Math.min(slowest, gas.soundSpeed(t));
        }
      }
      report.append(
          String.format(
              Locale.ROOT,
              "zone %s: sides per wavelength at %.6g Hz: at least %.1f%n",
              mesh.zoneNames().get(z),
              top,
              quality.pointsPerWavelength(mesh.zoneNames().get(z), slowest, top)));
    }
    MeshCheck.of(mesh).forEach(f -> report.append("check: ").append(f).append('\n'));
    PlaneView view = PlaneView.of(GasVolume.kind(shape.geometry()));
    WholeFile.write(folder.resolve("mesh.msh"), part -> GmshWriter.write(mesh, part));
    vtu(mesh).write(folder.resolve("mesh.vtu"));
    WholeFile.write(folder.resolve("mesh.svg"), MeshPicture.svg(mesh, view));
    WholeFile.write(
        folder.resolve("chamber.svg"),
        Svg.standalone(
            ChamberPicture.of(mesh, view, CaseConditions.markers(caseFile, mesh))
                .withKey(mesh.zoneNames(), CaseConditions.of(caseFile, mesh))));
    WholeFile.write(folder.resolve("quality.txt"), report.toString());
    return report.toString().stripTrailing();
  }

  /** Triangles with the number of their zone, and lines with the number of their edge. */
  private static VtuFile vtu(Mesh mesh) {
    Surface flat = Surface.flat(mesh);
    int[] corners = flat.triangles();
    int triangles = mesh.triangleCount();
    int[] lines = new int[2 * mesh.segmentCount()];
    int[] zone = new int[triangles + mesh.segmentCount()];
    int[] edge = new int[zone.length];
    for (int t = 0; t < triangles; t++) {
      zone[t] = mesh.zone(t);
      edge[t] = -1;
    }
    for (int e = 0; e < mesh.segmentCount(); e++) {
      int t = mesh.segmentLeft(e);
      for (int k = 0; k < 3; k++) {
        if (mesh.corner(t, k) == mesh.segmentStart(e)) {
          lines[2 * e] = corners[3 * t + k];
          lines[2 * e + 1] = corners[3 * t + (k + 1) % 3];
        }
      }
      zone[triangles + e] = -1;
      edge[triangles + e] = mesh.segmentEdge(e);
    }
    VtuFile file =
        new VtuFile(flat, lines)
            .field("zone_names", mesh.zoneNames())
            .field("edge_names", mesh.edgeNames());
    if (mesh.period() > 0) {
      file.field("period", List.of(Double.toString(mesh.period())));
    }
    return file.cells("zone", zone).cells("edge", edge);
  }
}
