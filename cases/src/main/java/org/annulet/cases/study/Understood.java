package org.annulet.cases.study;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.Flame;
import org.annulet.cases.read.FrequencyTable;
import org.annulet.cases.read.Problem;
import org.annulet.cases.read.Wall;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.chart.FieldPicture;
import org.annulet.post.chart.FitChart;
import org.annulet.post.chart.PlaneView;
import org.annulet.post.files.WholeFile;
import org.annulet.post.meaning.Chamber;
import org.annulet.solver.boundary.FittedWall;
import org.annulet.solver.flame.FittedResponse;
import org.annulet.solver.flame.Response;
import org.annulet.solver.medium.Coverage;
import org.annulet.solver.medium.MappedMedium;
import org.annulet.solver.operator.AnalyticFunction;
import org.apache.commons.math3.complex.Complex;

/**
 * A case as it was understood: what is in each zone and on each edge, how the flames answer, and
 * what looks wrong.
 */
public final class Understood {
  private final CaseFile caseFile;
  private final ChamberShape shape;
  private final MappedMedium gas;
  private final Chamber chamber;

  private Understood(CaseFile caseFile, ChamberShape shape) {
    this.caseFile = caseFile;
    this.shape = shape;
    this.gas = new CaseGas(caseFile).mapped(shape.mesh());
    this.chamber = GasVolume.of(CaseProblem.on(caseFile, shape));
  }

  /**
   * Meshes a case and looks at it.
   *
   * @throws org.annulet.cases.read.CaseFaultException if it cannot be set up
   */
  public static Understood of(CaseFile caseFile) {
    return new Understood(caseFile, ChamberShape.of(caseFile));
  }

  /** What looks wrong; the place of each in the case file. */
  public List<Problem> cautions() {
    return CaseCheck.of(caseFile, shape.mesh(), gas);
  }

  /** Zones, edges, flames and window in words. */
  public List<String> lines() {
    List<String> lines = new ArrayList<>();
    zones(lines);
    edges(lines);
    flames(lines);
    lines.add("");
    lines.add(
        text(
            "window %.6g to %.6g Hz, %.6g to %.6g 1/s%s",
            caseFile.window().lowestFrequency(),
            caseFile.window().highestFrequency(),
            caseFile.window().lowestGrowth(),
            caseFile.window().highestGrowth(),
            caseFile.azimuthalOrders().isEmpty()
                ? ""
                : ", azimuthal orders " + caseFile.azimuthalOrders()));
    lines.add(
        text(
            "mesh of %d nodes and %d triangles",
            shape.mesh().nodeCount(), shape.mesh().triangleCount()));
    return lines;
  }

  private static String text(String format, Object... values) {
    return String.format(Locale.ROOT, format, values);
  }

  private void zones(List<String> lines) {
    lines.add(
        text(
            "%-16s %24s %7s %24s %10s %10s %10s",
            "zone", "T [K]", "γ", "c [m/s]", "ρ [kg/m³]", "volume [l]", "mass [kg]"));
    Mesh mesh = shape.mesh();
    for (Coverage c : gas.coverage()) {
      int z = mesh.zoneNames().indexOf(c.zone());
      double volume = 0;
      double mass = 0;
      double bulk = 0;
      for (int t = 0; t < mesh.triangleCount(); t++) {
        if (mesh.zone(t) == z) {
          double v = mesh.area(t) * chamber.thickness(t) * chamber.arcScale(z);
          volume += v;
          mass += v * gas.medium().density(t);
          bulk += v * gas.medium().bulkModulus(t);
        }
      }
      boolean given =
          caseFile.gas().zones().get(c.zone()) instanceof org.annulet.cases.read.Gas.Given;
      lines.add(
          text(
              "%-16s %24s %7.4f %24s %10.4g %10.4g %10.4g",
              c.zone(),
              given ? "(c and ρ given)" : range(c.temperature()),
              bulk / volume / caseFile.gas().meanPressure(),
              range(c.soundSpeed()),
              mass / volume,
              1e3 * volume,
              mass));
    }
  }

  private static String range(Coverage.Range r) {
    return r.largest() - r.least() < 1e-6 * r.largest()
        ? text("%.5g", r.mean())
        : text("%.5g … %.5g … %.5g", r.least(), r.mean(), r.largest());
  }

  private void edges(List<String> lines) {
    Mesh mesh = shape.mesh();
    double[] length = new double[mesh.edgeNames().size()];
    double[] area = new double[length.length];
    for (int e = 0; e < mesh.segmentCount(); e++) {
      double[] left = size(mesh, e, mesh.segmentLeft(e));
      double[] own =
          mesh.segmentRight(e) < 0 ? left : smaller(left, size(mesh, e, mesh.segmentRight(e)));
      length[mesh.segmentEdge(e)] += own[0];
      area[mesh.segmentEdge(e)] += own[1];
    }
    List<String> conditions = CaseConditions.of(caseFile, mesh);
    lines.add("");
    lines.add(text("%-20s %12s %12s  %s", "edge", "length [mm]", "area [cm²]", "condition"));
    for (int e = 0; e < length.length; e++) {
      lines.add(
          text(
              "%-20s %12.5g %12.5g  %s",
              mesh.edgeNames().get(e), 1e3 * length[e], 1e4 * area[e], conditions.get(e)));
    }
    caseFile
        .walls()
        .forEach(
            (name, wall) -> {
              if (name.endsWith("_face")) {
                lines.add(text("%-20s %12s %12s  %s", name, "", "", CaseConditions.words(wall)));
              }
            });
    caseFile
        .dampers()
        .forEach(
            d ->
                lines.add(
                    text(
                        "damper %s: %d of mouth area %.4g cm²",
                        d.name(), d.places().size(), 1e4 * d.design().mouthArea())));
  }

  /** True length and area of a segment as triangle {@code t} beside it has them. */
  private double[] size(Mesh mesh, int e, int t) {
    double dx = mesh.x(mesh.segmentEnd(e)) - mesh.x(mesh.segmentStart(e));
    double dy = mesh.y(mesh.segmentEnd(e)) - mesh.y(mesh.segmentStart(e));
    if (mesh.period() > 0) {
      dy -= mesh.period() * Math.rint(dy / mesh.period());
    }
    double length = Math.hypot(dx, chamber.arcScale(mesh.zone(t)) * dy);
    return new double[] {length, length * chamber.thickness(t)};
  }

  /** Between two zones the opening is that of the narrower one. */
  private static double[] smaller(double[] a, double[] b) {
    return a[1] <= b[1] ? a : b;
  }

  private void flames(List<String> lines) {
    double top = caseFile.window().highestFrequency();
    for (Flame f : caseFile.flames()) {
      Response response = CaseFlames.response(f.response());
      double delay = response.longestDelay();
      lines.add("");
      lines.add(
          text(
              "flame %s: %.5g MW%s, answers to %s",
              f.name(),
              1e-6 * f.heatRelease(),
              Double.isNaN(f.referenceVelocity())
                  ? ""
                  : text(", reference velocity %.5g m/s", f.referenceVelocity()),
              f.reference() instanceof Flame.EdgePressure
                      || f.reference() instanceof Flame.PatchPressure
                  ? "pressure"
                  : "velocity"));
      lines.add(
          text(
              "  longest delay %.4g ms: ωτ = %.3g at %.4g Hz, %.2g periods",
              1e3 * delay, 2 * Math.PI * top * delay, top, top * delay));
      if (response instanceof FittedResponse fit) {
        lines.add(
            text(
                "  table fitted with %d poles and a delay of %.4g ms, error %.2g %% of the largest"
                    + " gain",
                fit.rational().poleList().size(), 1e3 * fit.delay(), 100 * fit.fitError()));
      }
    }
    caseFile
        .walls()
        .forEach(
            (name, wall) -> {
              if (wall instanceof Wall.Tabulated t) {
                FittedWall fit = CaseWalls.fitted(t);
                lines.add(
                    text(
                        "wall %s: table fitted with %d poles, error %.2g in reflection, largest"
                            + " reflection %.4g",
                        name,
                        fit.reflection().poleList().size(),
                        fit.fitError(),
                        fit.largestReflection()));
              }
            });
  }

  /**
   * Draws temperature and sound speed where they vary, and every fit.
   *
   * @param folder made if absent
   * @return names of the files written
   * @throws IOException if the folder cannot be written
   */
  public List<String> draw(Path folder) throws IOException {
    List<String> names = new ArrayList<>();
    Mesh mesh = shape.mesh();
    PlaneView view = PlaneView.of(chamber.kind());
    boolean varies =
        gas.coverage().stream()
            .anyMatch(c -> c.temperature().largest() > 1.0001 * c.temperature().least());
    if (varies) {
      double[] kelvin = new double[mesh.triangleCount()];
      double[] speed = new double[kelvin.length];
      for (int t = 0; t < kelvin.length; t++) {
        kelvin[t] = gas.temperature(t);
        speed[t] = gas.medium().soundSpeed(t);
      }
      write(
          folder,
          "temperature.svg",
          FieldPicture.svg(mesh, view, kelvin, "temperature [K]"),
          names);
      write(
          folder,
          "sound-speed.svg",
          FieldPicture.svg(mesh, view, speed, "sound speed [m/s]"),
          names);
    }
    for (Flame f : caseFile.flames()) {
      if (f.response() instanceof Flame.Measured m) {
        write(
            folder,
            "fit-flame-" + f.name() + ".svg",
            fit("response of flame " + f.name(), m.table(), CaseFlames.response(m)),
            names);
      }
    }
    for (var wall : caseFile.walls().entrySet()) {
      if (wall.getValue() instanceof Wall.Tabulated t) {
        FittedWall fitted = CaseWalls.fitted(t);
        FrequencyTable table = reflection(t);
        write(
            folder,
            "fit-wall-" + wall.getKey() + ".svg",
            fit("reflection of wall " + wall.getKey(), table, fitted.reflection()),
            names);
      }
    }
    return names;
  }

  private static void write(Path folder, String name, String svg, List<String> names)
      throws IOException {
    Files.createDirectories(folder);
    WholeFile.write(folder.resolve(name), svg);
    names.add(name);
  }

  private static FrequencyTable reflection(Wall.Tabulated t) {
    double[] f = t.table().frequency();
    double[] re = new double[f.length];
    double[] im = new double[f.length];
    for (int k = 0; k < f.length; k++) {
      Complex v = new Complex(t.table().re()[k], t.table().im()[k]);
      Complex r =
          switch (t.quantity()) {
            case IMPEDANCE -> v.subtract(1).divide(v.add(1));
            case ADMITTANCE -> Complex.ONE.subtract(v).divide(v.add(1));
            case REFLECTION -> v;
          };
      re[k] = r.getReal();
      im[k] = r.getImaginary();
    }
    return new FrequencyTable(t.table().file(), f, re, im);
  }

  private String fit(String title, FrequencyTable table, AnalyticFunction function) {
    double top = Math.max(table.highestFrequency(), caseFile.window().highestFrequency());
    int n = 300;
    double[] f = new double[n];
    double[] re = new double[n];
    double[] im = new double[n];
    for (int k = 0; k < n; k++) {
      f[k] = top * k / (n - 1);
      Complex v = function.value(new Complex(0, 2 * Math.PI * f[k]));
      re[k] = v.getReal();
      im[k] = v.getImaginary();
    }
    return FitChart.svg(
        title,
        new FitChart.Series(table.frequency(), table.re(), table.im()),
        new FitChart.Series(f, re, im));
  }
}
