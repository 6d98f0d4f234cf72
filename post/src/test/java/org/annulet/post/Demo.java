package org.annulet.post;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.meaning.Certificate;
import org.annulet.post.meaning.Chamber;
import org.annulet.post.meaning.GrowthBudget;
import org.annulet.post.meaning.Labels;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.ModeLabel;
import org.annulet.post.meaning.ModeMaps;
import org.annulet.post.meaning.ModeView;
import org.annulet.post.meaning.ParameterSensitivity;
import org.annulet.post.meaning.PointSensitivity;
import org.annulet.post.meaning.Results;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.modes.Window;

/** An invented ring and invented modes on it, for tests of the writers. */
public final class Demo {
  /** The ring. */
  public final Mesh mesh;

  /** With zone radii. */
  public final Chamber chamber;

  /** Modes. */
  public final Results results;

  /** Of the given fineness. */
  public Demo(int nx, int ny) {
    double period = 2 * Math.PI * 0.4;
    mesh = Meshes.ring(0.6, period, nx, ny, "plenum", "chamber <b>&\"x\"");
    chamber = Chamber.ring(mesh, new double[] {0.45, 0.35});
    List<ModeView> views = new ArrayList<>();
    double[][] rates = {{150, 40}, {250, 9}, {252, -22}, {350, -53}, {350, -53}, {460, -115}};
    for (int i = 0; i < 6; i++) {
      int order = (i + 1) / 2;
      int axial = i / 5;
      double turn = i == 2 || i == 4 ? 0.5 * Math.PI : 0;
      ModeView v =
          Meshes.mode(
              mesh,
              rates[i],
              null,
              (x, y) -> Math.cos(order * y / 0.4 + turn) * Math.cos(axial * Math.PI * x / 0.6),
              (x, y) -> 0.2 * Math.cos(order * y / 0.4 + turn) * x);
      Mode mode =
          new Mode(
              v.mode().growthRate(),
              v.mode().frequency(),
              v.re(),
              v.im(),
              i == 3 || i == 4 ? 2 : 1,
              1e-12,
              3,
              Mode.Verdict.CONVERGED);
      views.add(
          new ModeView(
              mode,
              v.re(),
              v.im(),
              null,
              "ring",
              i == 5 ? Double.NaN : 0.4,
              i == 5 ? Double.NaN : 12));
    }
    List<ModeLabel> labels = Labels.of(chamber, views);
    List<ModeEntry> modes = new ArrayList<>();
    for (int i = 0; i < views.size(); i++) {
      double g = views.get(i).mode().growthRate();
      GrowthBudget budget =
          new GrowthBudget(
              List.of(
                  new GrowthBudget.Item("flame burner 1", g + 70, -2.5),
                  new GrowthBudget.Item("two-port <burners>", -60, 1.25),
                  new GrowthBudget.Item("wall chamber.nozzle", -10, 0)),
              g,
              0);
      modes.add(
          new ModeEntry(views.get(i), labels.get(i), Optional.of(budget))
              .with(
                  List.of(
                      new ParameterSensitivity(
                          "flames.<1>.response.delay", "2.1 ms", 0.1 * (i + 1), -0.02, 3.5),
                      new ParameterSensitivity(
                          "gas.zones.chamber.temperature", "1850 K", -0.05, 1.2, 250)))
              .withPoints(
                  List.of(
                      new PointSensitivity(
                          "geometry.points.corner.2", "corner", "r", "180 mm", -0.4, -0.3, 12)))
              .with(maps(views.get(i))));
    }
    results =
        new Results(
            "invented ring, \"A\" & <B>",
            "0.1.0",
            new Window(10, 500, -200, 200),
            List.of(new Certificate("ring", null, 6, 6, true, List.of("contour as asked"))),
            modes,
            List.of(),
            List.of("All data of this case are invented."));
  }

  /** −2000 |p|² and Re p: invented, for the pictures. */
  private static ModeMaps maps(ModeView view) {
    double[] damper = new double[view.re().length];
    for (int v = 0; v < damper.length; v++) {
      damper[v] = -2000 * (view.re()[v] * view.re()[v] + view.im()[v] * view.im()[v]);
    }
    return new ModeMaps(damper, view.re());
  }
}
