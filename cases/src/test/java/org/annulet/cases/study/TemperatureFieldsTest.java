package org.annulet.cases.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.assertj.core.api.Assertions.withinPercentage;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.function.DoubleBinaryOperator;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.CaseReader;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.Results;
import org.annulet.solver.medium.MappedMedium;
import org.annulet.solver.modes.Mode;
import org.junit.jupiter.api.Assumptions;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Temperatures from profiles and files, through the case file. Fields are invented. */
class TemperatureFieldsTest {
  private static final String SECTION =
      """
      annulet: 1
      title: annular duct
      geometry:
        kind: section
        mesh_size: 12 mm
        points: {a: [0 m, 0.2 m], b: [0.3 m, 0.2 m], c: [0.3 m, 0.3 m], d: [0 m, 0.3 m]}
        edges: {near: {line: [d, a]}, hub: {line: [a, b]}, far: {line: [b, c]}, shell: {line: [c, d]}}
        zones: {gas: {boundary: [near, hub, far, shell]}}
      gas:
        mean_pressure: 10 bar
        zones: {gas: {temperature: TEMPERATURE, gamma: 1.4, gas_constant: 287.05 J/(kg K)}}
      window: {frequency: [100 Hz, 2600 Hz], growth_rate: [-50 1/s, 50 1/s], azimuthal_orders: [0, 1]}
      """;

  @TempDir private Path folder;

  private CaseFile section(String temperature) throws Exception {
    return CaseReader.read(write(temperature)).orThrow();
  }

  private Path write(String temperature) throws Exception {
    return Files.writeString(
        folder.resolve("case.yaml"), SECTION.replace("TEMPERATURE", temperature));
  }

  private static List<Mode> modes(CaseFile caseFile) {
    return new ModesStudy(caseFile, Progress.SILENT)
        .modesOnly().run("test").results().modes().stream()
            .map(ModeEntry::view)
            .map(v -> v.mode())
            .toList();
  }

  private static void same(List<Mode> a, List<Mode> b, double relative) {
    assertThat(a).hasSameSizeAs(b).isNotEmpty();
    for (int k = 0; k < a.size(); k++) {
      assertThat(a.get(k).frequency())
          .isCloseTo(b.get(k).frequency(), within(relative * b.get(k).frequency()));
    }
  }

  private void points(String name, DoubleBinaryOperator kelvin) throws Exception {
    StringBuilder table = new StringBuilder("x [mm], r [mm], temperature [K]\n");
    for (int i = 0; i <= 60; i++) {
      for (int j = 0; j <= 20; j++) {
        double x = 0.3 * i / 60;
        double r = 0.2 + 0.1 * j / 20;
        table.append(
            String.format(
                Locale.ROOT, "%.3f, %.3f, %.4f%n", 1e3 * x, 1e3 * r, kelvin.applyAsDouble(x, r)));
      }
    }
    Files.writeString(folder.resolve(name), table.toString());
  }

  @Test
  void tableOfALinearProfile_isTheProfile_andSoIsTheGasPathAlongTheAxis() throws Exception {
    points("flow.csv", (x, r) -> 800 + 1100 * x / 0.3);
    List<Mode> profile =
        modes(section("{profile: {x: [0, 300, mm], temperature: [800, 1900, K]}}"));
    same(modes(section("{file: flow.csv}")), profile, 1e-5);
    same(
        modes(
            section(
                "{gas_path: {corners: [[0, 250, mm], [300, 250, mm]], distance: [0, 300, mm],"
                    + " temperature: [800, 1900, K]}}")),
        profile,
        1e-9);
    // Row C8c.cc: 1209.079 and 2405.667 Hz of the plane waves, Sujith, Waldherr and Zinn 1995.
    assertThat(profile.stream().map(Mode::frequency))
        .anySatisfy(f -> assertThat(f).isCloseTo(1209.079, within(1.0)))
        .anySatisfy(f -> assertThat(f).isCloseTo(2405.667, within(8.0)));
  }

  /** A film that is cold at the shell: mean travel time along r against its integral. */
  @Test
  void coldFilm_keepsItsTravelTime() throws Exception {
    DoubleBinaryOperator kelvin =
        (x, r) -> 1800 / Math.pow(1 + 0.6 * Math.exp(-Math.pow((0.3 - r) / 0.02, 2)), 2);
    points("film.csv", kelvin);
    CaseFile caseFile = section("{file: film.csv}");
    Mesh mesh = ChamberShape.of(caseFile).mesh();
    MappedMedium mapped = new CaseGas(caseFile).mapped(mesh);
    double time = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      time += mesh.area(t) / mapped.medium().soundSpeed(t) / 0.3;
    }
    double exact = (0.1 + 0.6 * 0.02 * Math.sqrt(Math.PI) / 2) / Math.sqrt(1.4 * 287.05 * 1800);
    assertThat(time).isCloseTo(exact, withinPercentage(0.3));
    assertThat(mapped.coverage().get(0).extrapolatedNodes()).isZero();
  }

  /** The same film as a sector in space, written by VTK with its axis along z in millimetres. */
  @Test
  void sectorWrittenByVtk_isAveragedOntoTheSection() throws Exception {
    Path python = Path.of("/usr/bin/python3");
    Assumptions.assumeTrue(Files.isExecutable(python), "python3 is not installed");
    Path script =
        Files.writeString(
            folder.resolve("write.py"),
            """
            import math, sys, vtk
            g = vtk.vtkUnstructuredGrid(); p = vtk.vtkPoints(); t = vtk.vtkFloatArray(); t.SetName('Temperature')
            n = (31, 41, 7)
            for i in range(n[0]):
                for j in range(n[1]):
                    for k in range(n[2]):
                        x, r, a = 300 * i / 30, 200 + 100 * j / 40, math.radians(20) * k / 6
                        p.InsertNextPoint(r * math.cos(a), r * math.sin(a), x)
                        t.InsertNextValue(1800 / (1 + 0.6 * math.exp(-((300 - r) / 20) ** 2)) ** 2 - 273.15)
            g.SetPoints(p); g.GetPointData().AddArray(t)
            at = lambda i, j, k: (i * n[1] + j) * n[2] + k
            for i in range(n[0] - 1):
                for j in range(n[1] - 1):
                    for k in range(n[2] - 1):
                        l = vtk.vtkIdList()
                        for d in ((0,0,0),(1,0,0),(1,1,0),(0,1,0),(0,0,1),(1,0,1),(1,1,1),(0,1,1)):
                            l.InsertNextId(at(i + d[0], j + d[1], k + d[2]))
                        g.InsertNextCell(vtk.VTK_HEXAHEDRON, l)
            w = vtk.vtkXMLUnstructuredGridWriter(); w.SetFileName(sys.argv[1]); w.SetInputData(g); w.Write()
            """);
    Process process =
        new ProcessBuilder(
                python.toString(), script.toString(), folder.resolve("cfd.vtu").toString())
            .redirectErrorStream(true)
            .start();
    String said = new String(process.getInputStream().readAllBytes());
    Assumptions.assumeFalse(said.contains("No module named 'vtk'"), "VTK is not installed");
    assertThat(process.waitFor()).as(said).isZero();
    points(
        "film.csv",
        (x, r) -> 1800 / Math.pow(1 + 0.6 * Math.exp(-Math.pow((0.3 - r) / 0.02, 2)), 2));
    same(
        modes(
            section(
                "{file: cfd.vtu, array: Temperature, length_unit: mm, temperature_unit: °C, axis:"
                    + " z}")),
        modes(section("{file: film.csv}")),
        // cells of the average blur the film within half a cell of the wall
        5e-3);
    assertThat(CaseReader.read(write("{file: cfd.vtu}")).problems().toString())
        .contains("has no array 'T' of single numbers")
        .contains("it has Temperature");
  }

  @Test
  void temperatureThatChangesRoundARing_takesTheWholeRing_andSplitsThePairItMatches()
      throws Exception {
    StringBuilder table = new StringBuilder("x [mm], theta [°], temperature [K]\n");
    for (int i = 0; i <= 4; i++) {
      for (int k = 0; k < 72; k++) {
        table.append(
            String.format(
                Locale.ROOT,
                "%d, %d, %.4f%n",
                25 * i,
                5 * k,
                1500 * (1 + 0.1 * Math.cos(2 * Math.toRadians(5 * k)))));
      }
    }
    Files.writeString(folder.resolve("round.csv"), table.toString());
    Path file =
        Files.writeString(
            folder.resolve("ring.yaml"),
            """
            annulet: 1
            title: ring
            geometry:
              kind: ring
              burner_count: 12
              mesh_size: 25 mm
              zones: [{name: ring, shape: annulus, mean_radius: 0.5 m, gap: 20 mm, length: 100 mm}]
            gas:
              mean_pressure: 10 bar
              zones: {ring: {temperature: {file: round.csv}, gamma: 1.4, gas_constant: 287.05 J/(kg K)}}
            window: {frequency: [150 Hz, 600 Hz], growth_rate: [-50 1/s, 50 1/s]}
            """);
    Results results =
        new ModesStudy(CaseReader.read(file).orThrow(), Progress.SILENT)
            .modesOnly()
            .run("test")
            .results();
    assertThat(results.notes().toString()).contains("temperature changes round the ring");
    List<Double> f = results.modes().stream().map(m -> m.view().mode().frequency()).toList();
    assertThat(f).hasSize(4);
    // First order: c² = c₀²(1 + ε cos 2θ) splits order 1 by ε f/2 and leaves order 2 whole.
    assertThat(f.get(1) - f.get(0)).isCloseTo(0.1 / 2 * f.get(0), withinPercentage(5));
    assertThat(f.get(3) - f.get(2)).isLessThan(0.02 * f.get(2));
  }

  /** Row B8: methane, φ = 0.5, air of 700 K: 1807.65 K with GRI data; ours within 1.5 K. */
  @Test
  void adiabaticTemperature_isThatOfCompleteCombustion() throws Exception {
    Path file =
        Files.writeString(
            folder.resolve("case.yaml"),
            SECTION.replace(
                "temperature: TEMPERATURE, gamma: 1.4, gas_constant: 287.05 J/(kg K)",
                "temperature: {adiabatic_from: 700 K}, mixture: {fuel: methane, equivalence_ratio:"
                    + " 0.5}"));
    CaseFile caseFile = CaseReader.read(file).orThrow();
    Mesh mesh = ChamberShape.of(caseFile).mesh();
    assertThat(new CaseGas(caseFile).mapped(mesh).temperature(0)).isCloseTo(1807.65, within(1.5));
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      textBlock =
          """
          {file: gone.csv} | does not exist
          {file: odd.csv} | no column 'y'
          {file: odd.csv, axis: z} | 'axis' goes with a VTU file
          {profile: {x: [0, 100, mm], temperature: [800, K]}} | 2 stations but 1 temperatures
          {gas_path: {corners: [[0, 250, mm]], distance: [0, 1, m], temperature: [1, 2, K]}} | a path of 1 corners
          {adiabatic_from: 700 K} | an adiabatic temperature without a fuel
          {file: notes.vtu} | notes.vtu line 1: no XML
          """)
  void faults_areSaidAtTheirKey(String temperature, String said) throws Exception {
    Files.writeString(folder.resolve("odd.csv"), "x [m], temperature [K]\n1, 300\n");
    Files.writeString(folder.resolve("notes.vtu"), "hello");
    assertThat(CaseReader.read(write(temperature)).problems())
        .anySatisfy(p -> assertThat(p.toString()).contains(said).contains("case.yaml:11:"));
  }
}
