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
import org.annulet.post.meaning.Chamber;
import org.annulet.post.meaning.ModeMaps;
import org.annulet.post.meaning.ModeView;
import org.apache.commons.math3.complex.Complex;
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
    new ModeFiles(folder, chamber(mesh), surface)
        .modes("mode", List.of(ModeFiles.Numbered.of(1, view)));
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
      assertThat(magnitude[p]).isEqualTo((float) Math.hypot(re[p], im[p]));
      assertThat(phase[p]).isEqualTo((float) Math.toDegrees(Math.atan2(im[p], re[p])));
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

  private static final double RHO = 1.7;
  private static final double SOUND = 420;

  /** Plane or section of uniform gas. */
  private static Chamber chamber(Mesh mesh) {
    return withGas(Chamber.section(mesh));
  }

  private static Chamber withGas(Chamber chamber) {
    double[] density = new double[chamber.mesh().triangleCount()];
    double[] modulus = new double[density.length];
    java.util.Arrays.fill(density, RHO);
    java.util.Arrays.fill(modulus, RHO * SOUND * SOUND);
    return chamber.withGas(density, modulus);
  }

  /** ∇(y + iz) = (0, 1, i), so û = −(0, 1, i)/(sρ) everywhere and exactly. */
  @Test
  void velocityOfASweptSection_isTheGradientInSpace() throws Exception {
    Mesh mesh = Meshes.rectangle(new double[] {1, 0, 0.5}, 6, 4, "gas");
    ModeView view = Meshes.mode(mesh, new double[] {100, 30}, 1, (x, r) -> r, (x, r) -> 0);
    new ModeFiles(folder, chamber(mesh), Surface.swept(mesh, 1.5 * Math.PI, 12))
        .modes("turned", List.of(ModeFiles.Numbered.of(7, view)));
    Map<String, String> got = read(folder.resolve("turned-07.vtu"));
    double[] re = numbers(got.get("velocity_real_m_per_s"));
    double[] im = numbers(got.get("velocity_imag_m_per_s"));
    Complex s = new Complex(30, 2 * Math.PI * 100);
    Complex u = s.multiply(-RHO).reciprocal();
    double bound = 1e-6 * u.abs(); // single precision
    for (int t = 0; t < re.length / 3; t++) {
      assertThat(re[3 * t]).isCloseTo(0, within(bound));
      assertThat(re[3 * t + 1]).isCloseTo(u.getReal(), within(bound));
      assertThat(im[3 * t + 1]).isCloseTo(u.getImaginary(), within(bound));
      assertThat(re[3 * t + 2]).isCloseTo(-u.getImaginary(), within(bound));
      assertThat(im[3 * t + 2]).isCloseTo(u.getReal(), within(bound));
    }
    assertThat(Files.readString(folder.resolve("turned.pvd"))).contains("timestep=\"7.0\"");
  }

  /** A wave e^{i(kx + lθR)} on a ring runs with the phase velocity against both wavenumbers. */
  @Test
  void intensityOfAWaveOnAWrappedRing_isTangentialAndOfTheClosedForm() throws Exception {
    double radius = 0.4;
    Mesh mesh = Meshes.ring(0.5, 2 * Math.PI * 0.5, 40, 240, "chamber"); // unrolled at 0.5 m
    double k = 2;
    int order = 3;
    ModeView view =
        Meshes.mode(
            mesh,
            new double[] {150, 0},
            null,
            (x, y) -> Math.cos(k * x + order * y / 0.5),
            (x, y) -> Math.sin(k * x + order * y / 0.5));
    Chamber ring = withGas(Chamber.ring(mesh, new double[] {radius}));
    Surface surface = Surface.wrapped(mesh, new double[] {radius});
    new ModeFiles(folder, ring, surface).modes("ring", List.of(ModeFiles.Numbered.of(1, view)));
    double[] intensity = numbers(read(folder.resolve("ring-01.vtu")).get("intensity_w_per_m2"));
    double unit = -0.5 / (2 * Math.PI * 150 * RHO); // I = −½ (wavenumber)/(ωρ)
    double bound = 6e-3 * Math.abs(unit) * order / radius; // a facet's middle is 2π/240/6 off
    for (int t = 0; t < surface.triangleCount(); t++) {
      double a = surface.angle(t);
      assertThat(intensity[3 * t]).isCloseTo(unit * k, within(bound));
      double round = unit * order / radius;
      assertThat(intensity[3 * t + 1]).isCloseTo(-Math.sin(a) * round, within(bound));
      assertThat(intensity[3 * t + 2]).isCloseTo(Math.cos(a) * round, within(bound));
    }
  }

  /** p = cos kx: û = k sin kx/(iωρ), no mean flow of energy. A wave to the right: I = 1/(2ρc). */
  @Test
  void standingAndTravellingWaveInADuct_haveTheirVelocityAndIntensity() throws Exception {
    Mesh mesh = Meshes.rectangle(new double[] {1, 0, 0.1}, 200, 3, "gas");
    double f = SOUND; // k = 2π/m
    Chamber duct = withGas(Chamber.plane(mesh));
    ModeView standing =
        Meshes.mode(
            mesh, new double[] {f, 0}, null, (x, y) -> Math.cos(2 * Math.PI * x), (x, y) -> 0);
    ModeView running =
        Meshes.mode(
            mesh,
            new double[] {f, 0},
            null,
            (x, y) -> Math.cos(2 * Math.PI * x),
            (x, y) -> -Math.sin(2 * Math.PI * x));
    Surface flat = Surface.flat(mesh);
    new ModeFiles(folder, duct, flat)
        .modes(
            "duct", List.of(ModeFiles.Numbered.of(1, standing), ModeFiles.Numbered.of(2, running)));
    Map<String, String> one = read(folder.resolve("duct-01.vtu"));
    Map<String, String> two = read(folder.resolve("duct-02.vtu"));
    double[] im = numbers(one.get("velocity_imag_m_per_s"));
    double[] still = numbers(one.get("intensity_w_per_m2"));
    double[] moving = numbers(two.get("intensity_w_per_m2"));
    double u = 1 / (RHO * SOUND);
    for (int t = 0; t < mesh.triangleCount(); t++) {
      double middle = 0;
      for (int c = 0; c < 3; c++) {
        middle += mesh.cornerX(t, c) / 3;
      }
      // the slope of a linear element is that of the side's middle: h/6 from the triangle's
      assertThat(im[3 * t]).isCloseTo(-u * Math.sin(2 * Math.PI * middle), within(6e-3 * u));
      assertThat(still[3 * t]).isCloseTo(0, within(1e-9 * u));
      assertThat(moving[3 * t]).isCloseTo(0.5 * u, within(1e-3 * u));
      assertThat(moving[3 * t + 1]).isCloseTo(0, within(1e-3 * u));
    }
  }

  @Test
  void mapsOfAMode_readBackAtThePoints() throws Exception {
    Mesh mesh = Meshes.rectangle(new double[] {1, 0, 0.1}, 6, 3, "gas");
    ModeView view = Meshes.mode(mesh, new double[] {100, 0}, null, (x, y) -> x, (x, y) -> 0);
    double[] damper = new double[mesh.nodeCount()];
    double[] drive = new double[mesh.nodeCount()];
    for (int v = 0; v < damper.length; v++) {
      damper[v] = v % 5 == 0 ? Double.NaN : -0.5 * v;
      drive[v] = 3 + v;
    }
    Surface flat = Surface.flat(mesh);
    new ModeFiles(folder, chamber(mesh), flat)
        .modes(
            "maps",
            List.of(
                new ModeFiles.Numbered(
                    1, view, java.util.Optional.of(new ModeMaps(damper, drive)))));
    Map<String, String> got = read(folder.resolve("maps-01.vtu"));
    double[] a = numbers(got.get("damper_growth_per_s_per_m2").replace("nan", "NaN"));
    double[] b = numbers(got.get("drive_per_s_per_m3"));
    for (int p = 0; p < a.length; p++) {
      assertThat(Double.compare(a[p], damper[flat.node(p)])).isZero(); // NaN included
      assertThat(b[p]).isEqualTo(drive[flat.node(p)]);
    }
  }

  @Test
  void cycle_isTheRealPartTurnedByThePhase() throws Exception {
    Mesh mesh = Meshes.rectangle(new double[] {1, 0, 1}, 3, 3, "gas");
    ModeView view = Meshes.mode(mesh, new double[] {100, 0}, null, (x, y) -> x, (x, y) -> 2 * y);
    Surface surface = Surface.flat(mesh);
    new ModeFiles(folder, chamber(mesh), surface).cycle("turn", view, 4);
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
    new ModeFiles(folder, chamber(mesh), open)
        .modes("swept", List.of(ModeFiles.Numbered.of(1, view)));
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
