package org.annulet.post.vtk;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.meaning.ModeView;

/**
 * The files of the modes of one mesh on one surface. All files of a collection have the same
 * arrays: p_real, p_imag, p_magnitude and p_phase_deg at the points, zone on the triangles; p̂ is
 * scaled so that its largest value is 1.
 */
public final class ModeFiles {
  private final Path folder;
  private final Surface surface;
  private final Mesh mesh;

  /**
   * Files in a folder.
   *
   * @param folder made if absent
   * @param mesh mesh of the fields
   * @param surface what to show them on, made from that mesh
   */
  public ModeFiles(Path folder, Mesh mesh, Surface surface) {
    this.folder = folder;
    this.mesh = mesh;
    this.surface = surface;
  }

  /**
   * Writes one VTU file for each mode and a collection over them.
   *
   * @param stem start of the names: stem-01.vtu …, stem.pvd, the running number being that of the
   *     mode, from 1
   * @throws IOException if the folder cannot be written
   */
  public void modes(String stem, List<ModeView> modes) throws IOException {
    List<PvdFile.Member> members = new ArrayList<>();
    for (int i = 0; i < modes.size(); i++) {
      String name = String.format(Locale.ROOT, "%s-%02d.vtu", stem, i + 1);
      double[][] p = field(modes.get(i));
      double[] magnitude = new double[p[0].length];
      double[] phase = new double[p[0].length];
      for (int q = 0; q < phase.length; q++) {
        magnitude[q] = Math.hypot(p[0][q], p[1][q]);
        phase[q] = Math.toDegrees(Math.atan2(p[1][q], p[0][q]));
      }
      file(modes.get(i))
          .points("p_real", p[0])
          .points("p_imag", p[1])
          .points("p_magnitude", magnitude)
          .points("p_phase_deg", phase)
          .write(folder.resolve(name));
      members.add(new PvdFile.Member(i + 1, name));
    }
    PvdFile.write(folder.resolve(stem + ".pvd"), members);
  }

  /**
   * Writes the pressure of one mode over one cycle, without growth, for animation: p(φ) = Re(p̂
   * e^{iφ}).
   *
   * @param stem start of the names: stem-000.vtu …, stem.pvd, the running number being the phase in
   *     degrees
   * @param frames number of phases, at least 2
   * @throws IOException if the folder cannot be written
   */
  public void cycle(String stem, ModeView mode, int frames) throws IOException {
    if (frames < 2) {
      throw new IllegalArgumentException("a cycle needs at least 2 frames, got " + frames);
    }
    double[][] p = field(mode);
    List<PvdFile.Member> members = new ArrayList<>();
    for (int k = 0; k < frames; k++) {
      double degrees = 360.0 * k / frames;
      double c = Math.cos(Math.toRadians(degrees));
      double s = Math.sin(Math.toRadians(degrees));
      double[] now = new double[p[0].length];
      for (int q = 0; q < now.length; q++) {
        now[q] = c * p[0][q] - s * p[1][q];
      }
      String name = String.format(Locale.ROOT, "%s-%03d.vtu", stem, k);
      file(mode).field("phase_deg", degrees).points("p", now).write(folder.resolve(name));
      members.add(new PvdFile.Member(degrees, name));
    }
    PvdFile.write(folder.resolve(stem + ".pvd"), members);
  }

  private VtuFile file(ModeView view) {
    int[] zone = new int[surface.triangleCount()];
    for (int t = 0; t < zone.length; t++) {
      zone[t] = mesh.zone(surface.sourceTriangle(t));
    }
    return new VtuFile(surface)
        .field("frequency_hz", view.mode().frequency())
        .field("growth_rate_per_s", view.mode().growthRate())
        .field("zone_names", mesh.zoneNames())
        .cells("zone", zone);
  }

  /** p̂ at the points of the surface, turned with e^{imθ}: shape [2][points]. */
  private double[][] field(ModeView view) {
    if (view.re().length != mesh.nodeCount()) {
      throw new IllegalArgumentException(
          "the field has "
              + view.re().length
              + " values, the mesh "
              + mesh.nodeCount()
              + " nodes; give the field on the nodes");
    }
    int m = view.order() == null ? 0 : view.order();
    double[][] p = new double[2][surface.pointCount()];
    for (int q = 0; q < surface.pointCount(); q++) {
      double re = view.re()[surface.node(q)];
      double im = view.im()[surface.node(q)];
      double c = Math.cos(m * surface.turn(q));
      double s = Math.sin(m * surface.turn(q));
      p[0][q] = re * c - im * s;
      p[1][q] = re * s + im * c;
    }
    return p;
  }
}
