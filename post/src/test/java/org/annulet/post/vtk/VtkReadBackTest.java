package org.annulet.post.vtk;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.concurrent.TimeUnit;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.Meshes;
import org.annulet.post.meaning.ModeView;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Every file is read back by VTK's own reader and compared field by field. */
class VtkReadBackTest {
  private static final String READER =
      """
      import sys, vtk
      r = vtk.vtkXMLUnstructuredGridReader()
      r.SetFileName(sys.argv[1]); r.Update(); g = r.GetOutput()
      def show(name, values): print(name + '\\t' + ' '.join(repr(float(v)) for v in values))
      show('points', [c for i in range(g.GetNumberOfPoints()) for c in g.GetPoint(i)])
      show('cells', [g.GetCell(i).GetPointId(k) for i in range(g.GetNumberOfCells())
                     for k in range(g.GetCell(i).GetNumberOfPoints())])
      show('types', [g.GetCellType(i) for i in range(g.GetNumberOfCells())])
      for d in (g.GetPointData(), g.GetCellData()):
        for a in range(d.GetNumberOfArrays()):
          x = d.GetArray(a)
          show(x.GetName(), [x.GetComponent(i, k) for i in range(x.GetNumberOfTuples())
                             for k in range(x.GetNumberOfComponents())])
      f = g.GetFieldData()
      for a in range(f.GetNumberOfArrays()):
        x = f.GetAbstractArray(a)
        if x.GetDataTypeAsString() == 'string':
          print(x.GetName() + '\\t' + '|'.join(x.GetValue(i) for i in range(x.GetNumberOfValues())))
        else: show(x.GetName(), [x.GetComponent(0, 0)])
      """;

  @TempDir Path folder;

  private static Map<String, String> read(Path file) throws Exception {
    Path python = Path.of("/usr/bin/python3");
    assumeTrue(Files.isExecutable(python) && hasVtk(python), "python3 with vtk is not installed");
    Process p =
        new ProcessBuilder(python.toString(), "-c", READER, file.toString())
            .redirectErrorStream(true)
            .start();
    String out = new String(p.getInputStream().readAllBytes());
    assertThat(p.waitFor(60, TimeUnit.SECONDS)).isTrue();
    assertThat(p.exitValue()).as(out).isZero();
    Map<String, String> fields = new HashMap<>();
    out.lines()
        .filter(l -> l.contains("\t"))
        .forEach(l -> fields.put(l.split("\t")[0], l.substring(l.indexOf('\t') + 1)));
    assertThat(out).doesNotContain("ERR|");
    return fields;
  }

  private static boolean hasVtk(Path python) throws IOException, InterruptedException {
    Process p =
        new ProcessBuilder(python.toString(), "-c", "import vtk").redirectErrorStream(true).start();
    p.getInputStream().readAllBytes();
    return p.waitFor() == 0;
  }

  private static double[] numbers(String text) {
    return java.util.Arrays.stream(text.trim().split(" "))
        .mapToDouble(Double::parseDouble)
        .toArray();
  }

  @Test
  void everyArrayOfAMode_readsBackToTheSameBits() throws Exception {
    // 40,000 points: the coordinates fill 960,000 bytes, connectivity more than one block of 1 MiB
    Mesh mesh = Meshes.rectangle(new double[] {1, 0.2, 0.1}, 400, 120, "plenum <A>", "chamber");
    ModeView view =
        Meshes.mode(
            mesh,
            new double[] {321.5, -7.25},
            null,
            (x, y) -> Math.cos(3 * x) * y,
            (x, y) -> Math.sin(x + y));
    Surface surface = Surface.flat(mesh);
    new ModeFiles(folder, mesh, surface).modes("mode", List.of(view));
    Map<String, String> got = read(folder.resolve("mode-01.vtu"));
    double[] xyz = numbers(got.get("points"));
    double[] re = numbers(got.get("p_real"));
    double[] im = numbers(got.get("p_imag"));
    double[] magnitude = numbers(got.get("p_magnitude"));
    double[] phase = numbers(got.get("p_phase_deg"));
    assertThat(re).hasSize(mesh.nodeCount());
    for (int p = 0; p < re.length; p++) {
      int v = surface.node(p);
      assertThat(xyz[3 * p]).isEqualTo(mesh.x(v));
      assertThat(xyz[3 * p + 1]).isEqualTo(mesh.y(v));
      assertThat(re[p]).isEqualTo(view.re()[v]);
      assertThat(im[p]).isEqualTo(view.im()[v]);
      assertThat(magnitude[p]).isEqualTo(Math.hypot(re[p], im[p]));
      assertThat(phase[p]).isEqualTo(Math.toDegrees(Math.atan2(im[p], re[p])));
    }
    double[] cells = numbers(got.get("cells"));
    double[] zone = numbers(got.get("zone"));
    double[] types = numbers(got.get("types"));
    for (int t = 0; t < mesh.triangleCount(); t++) {
      assertThat(types[t]).isEqualTo(5);
      assertThat(zone[t]).isEqualTo(mesh.zone(t));
      for (int k = 0; k < 3; k++) {
        assertThat(surface.node((int) cells[3 * t + k])).isEqualTo(mesh.corner(t, k));
      }
    }
    assertThat(got.get("zone_names")).isEqualTo("plenum <A>|chamber");
    assertThat(numbers(got.get("frequency_hz"))).containsExactly(321.5);
    assertThat(numbers(got.get("growth_rate_per_s"))).containsExactly(-7.25);
  }

  @Test
  void cycle_isTheRealPartTurnedByThePhase() throws Exception {
    Mesh mesh = Meshes.rectangle(new double[] {1, 0, 1}, 3, 3, "gas");
    ModeView view = Meshes.mode(mesh, new double[] {100, 0}, null, (x, y) -> x, (x, y) -> 2 * y);
    Surface surface = Surface.flat(mesh);
    new ModeFiles(folder, mesh, surface).cycle("turn", view, 4);
    double[] quarter = numbers(read(folder.resolve("turn-001.vtu")).get("p"));
    for (int p = 0; p < quarter.length; p++) {
      // Re((a + ib)·i) = −b
      assertThat(quarter[p]).isCloseTo(-view.im()[surface.node(p)], within(1e-15));
    }
    assertThat(Files.readString(folder.resolve("turn.pvd")))
        .contains("timestep=\"90.0\"")
        .contains("file=\"turn-003.vtu\"");
  }

  @Test
  void flatRing_drawsNoTriangleAcrossTheWholeSheet() {
    Mesh mesh = Meshes.ring(0.4, 2, 4, 12, "chamber");
    Surface surface = Surface.flat(mesh);
    double area = 0;
    for (int t = 0; t < surface.triangleCount(); t++) {
      area += area(surface, t);
      for (int k = 0; k < 3; k++) {
        int p = surface.corner(t, k);
        int q = surface.corner(t, (k + 1) % 3);
        assertThat(Math.abs(surface.coordinate(p, 1) - surface.coordinate(q, 1))).isLessThan(0.5);
      }
    }
    assertThat(area).isCloseTo(0.8, within(1e-12));
    assertThat(surface.pointCount()).isEqualTo(mesh.nodeCount() + 5); // one more row at the seam
  }

  @Test
  void wrappedRing_putsEachZoneOnItsCylinderAndCopiesTheJoint() {
    Mesh mesh = Meshes.ring(0.4, 2, 4, 360, "plenum", "chamber");
    Surface surface = Surface.wrapped(mesh, new double[] {0.5, 0.3});
    assertThat(surface.pointCount()).isEqualTo(mesh.nodeCount() + 360);
    double[] area = new double[2];
    for (int t = 0; t < surface.triangleCount(); t++) {
      int z = mesh.zone(surface.sourceTriangle(t));
      area[z] += area(surface, t);
      for (int k = 0; k < 3; k++) {
        int p = surface.corner(t, k);
        assertThat(Math.hypot(surface.coordinate(p, 1), surface.coordinate(p, 2)))
            .isCloseTo(z == 0 ? 0.5 : 0.3, within(1e-12));
      }
    }
    // lateral surface 2πR·L; 360 facets fall short by π²/(6·360²) ≈ 1.3e-5
    assertThat(area[0]).isCloseTo(2 * Math.PI * 0.5 * 0.2, within(2e-5));
    assertThat(area[1]).isCloseTo(2 * Math.PI * 0.3 * 0.2, within(2e-5));
  }

  @Test
  void sweptSection_hasTheSurfaceOfTheSolidAndTurnsTheField() throws Exception {
    Mesh mesh = Meshes.rectangle(new double[] {1, 0, 0.5}, 6, 4, "gas");
    Surface full = Surface.swept(mesh, 2 * Math.PI, 360);
    double area = 0;
    for (int t = 0; t < full.triangleCount(); t++) {
      area += area(full, t);
    }
    // cylinder: lateral 2πRL and two discs πR² (the axis sweeps nothing)
    assertThat(area).isCloseTo(2 * Math.PI * 0.5 + 2 * Math.PI * 0.25, within(2e-4));
    Surface open = Surface.swept(mesh, 1.5 * Math.PI, 54);
    ModeView view =
        Meshes.mode(mesh, new double[] {100, 0}, 2, (x, r) -> r * r, (x, r) -> r * r / 2);
    new ModeFiles(folder, mesh, open).modes("swept", List.of(view));
    Map<String, String> got = read(folder.resolve("swept-01.vtu"));
    double[] xyz = numbers(got.get("points"));
    double[] re = numbers(got.get("p_real"));
    double[] im = numbers(got.get("p_imag"));
    for (int p = 0; p < re.length; p++) {
      double y = xyz[3 * p + 1];
      double z = xyz[3 * p + 2];
      // (1 + i/2) r² e^{2iθ} = (1 + i/2)(y + iz)²
      assertThat(re[p]).isCloseTo(y * y - z * z - y * z, within(1e-14));
      assertThat(im[p]).isCloseTo(2 * y * z + (y * y - z * z) / 2, within(1e-14));
    }
  }

  private static double area(Surface s, int t) {
    double[] u = new double[3];
    double[] v = new double[3];
    for (int a = 0; a < 3; a++) {
      u[a] = s.coordinate(s.corner(t, 1), a) - s.coordinate(s.corner(t, 0), a);
      v[a] = s.coordinate(s.corner(t, 2), a) - s.coordinate(s.corner(t, 0), a);
    }
    double x = u[1] * v[2] - u[2] * v[1];
    double y = u[2] * v[0] - u[0] * v[2];
    double z = u[0] * v[1] - u[1] * v[0];
    return 0.5 * Math.sqrt(x * x + y * y + z * z);
  }
}
