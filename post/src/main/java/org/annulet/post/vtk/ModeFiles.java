package org.annulet.post.vtk;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.meaning.AcousticFlow;
import org.annulet.post.meaning.Chamber;
import org.annulet.post.meaning.ModeMaps;
import org.annulet.post.meaning.ModeView;

/**
 * The files of the modes of one mesh on one surface. All files of a collection have the same
 * arrays. At the points p_real, p_imag, p_magnitude and p_phase_deg, p̂ scaled so that its largest
 * value is about 1 Pa, and where they were made damper_growth_per_s_per_m2 and drive_per_s_per_m3
 * ({@link ModeMaps}); on the triangles zone, and for that p̂ velocity_real_m_per_s,
 * velocity_imag_m_per_s and intensity_w_per_m2 in space, in single precision.
 */
public final class ModeFiles {
  private final Path folder;
  private final Surface surface;
  private final Chamber chamber;
  private final Mesh mesh;

  /**
   * A mode to be written.
   *
   * @param number of the mode in the tables, from 1
   * @param view its field
   * @param maps its maps; all modes of a collection have them, or none
   */
  public record Numbered(int number, ModeView view, Optional<ModeMaps> maps) {
    /** Without maps. */
    public static Numbered of(int number, ModeView view) {
      return new Numbered(number, view, Optional.empty());
    }
  }

  /**
   * Files in a folder.
   *
   * @param folder made if absent
   * @param chamber mesh of the fields, with its gas
   * @param surface what to show them on, made from that mesh
   */
  public ModeFiles(Path folder, Chamber chamber, Surface surface) {
    this.folder = folder;
    this.chamber = chamber;
    this.mesh = chamber.mesh();
    this.surface = surface;
  }

  /**
   * Writes one VTU file for each mode and a collection over them.
   *
   * @param stem start of the names: stem-01.vtu …, stem.pvd, the running number being that of the
   *     mode, from 1
   * @throws IOException if the folder cannot be written
   */
  public void modes(String stem, List<Numbered> modes) throws IOException {
    List<PvdFile.Member> members = new ArrayList<>();
    for (Numbered mode : modes) {
      String name = String.format(Locale.ROOT, "%s-%02d.vtu", stem, mode.number());
      double[][] p = field(mode.view());
      float[] magnitude = new float[p[0].length];
      float[] phase = new float[p[0].length];
      for (int q = 0; q < phase.length; q++) {
        magnitude[q] = (float) Math.hypot(p[0][q], p[1][q]);
        phase[q] = (float) Math.toDegrees(Math.atan2(p[1][q], p[0][q]));
      }
      VtuFile file =
          file(mode.view())
              .points("p_real", p[0])
              .points("p_imag", p[1])
              .points("p_magnitude", magnitude)
              .points("p_phase_deg", phase);
      mode.maps()
          .ifPresent(
              maps ->
                  file.points("damper_growth_per_s_per_m2", atPoints(maps.damper()))
                      .points("drive_per_s_per_m3", atPoints(maps.drive())));
      flow(file, mode.view());
      file.write(folder.resolve(name));
      members.add(new PvdFile.Member(mode.number(), name));
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

  private float[] atPoints(double[] atNodes) {
    float[] out = new float[surface.pointCount()];
    for (int q = 0; q < out.length; q++) {
      out[q] = (float) atNodes[surface.node(q)];
    }
    return out;
  }

  private void flow(VtuFile file, ModeView view) {
    AcousticFlow flow = AcousticFlow.of(chamber, view);
    Directions directions = new Directions(mesh, surface);
    int n = surface.triangleCount();
    float[] re = new float[3 * n];
    float[] im = new float[3 * n];
    float[] intensity = new float[3 * n];
    int m = surface.isSwept() && view.order() != null ? view.order() : 0;
    for (int t = 0; t < n; t++) {
      double[][] frame = directions.of(t);
      int from = 3 * surface.sourceTriangle(t);
      double c = m == 0 ? 1 : Math.cos(m * surface.angle(t));
      double s = m == 0 ? 0 : Math.sin(m * surface.angle(t));
      for (int k = 0; k < 3; k++) {
        for (int axis = 0; axis < 3; axis++) {
          double x = flow.re()[from + k];
          double y = flow.im()[from + k];
          re[3 * t + axis] += (float) ((c * x - s * y) * frame[k][axis]);
          im[3 * t + axis] += (float) ((s * x + c * y) * frame[k][axis]);
          intensity[3 * t + axis] += (float) (flow.intensity()[from + k] * frame[k][axis]);
        }
      }
    }
    file.cells("velocity_real_m_per_s", re, 3)
        .cells("velocity_imag_m_per_s", im, 3)
        .cells("intensity_w_per_m2", intensity, 3);
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
