package org.annulet.solver.medium;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.assertj.core.api.Assertions.withinPercentage;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Map;
import java.util.concurrent.TimeUnit;
import javax.xml.parsers.DocumentBuilderFactory;
import org.annulet.mesher.mesh.Mesh;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.w3c.dom.Element;
import org.w3c.dom.Node;
import org.w3c.dom.NodeList;

/**
 * A field like that of a flow computation, in a file that VTK itself wrote: a 30° sector with a
 * cold film on the outer wall, cells stretched towards it, and a dilution jet in the middle of the
 * sector. The data are invented. Skipped where Debian's VTK for Python is absent.
 */
class FlowResultTest {
  private static final String WRITER =
      """
      import sys, math, vtk
      nx, nr, nt = 25, 21, 25
      grid = vtk.vtkUnstructuredGrid()
      points = vtk.vtkPoints()
      points.SetDataTypeToDouble()
      temperature = vtk.vtkDoubleArray()
      temperature.SetName("T")
      for i in range(nx):
          for j in range(nr):
              for k in range(nt):
                  x = 0.3 * i / (nx - 1)
                  u = j / (nr - 1)
                  r = 0.2 + 0.1 * (1 - (1 - u) ** 2)
                  t = math.radians(30) * k / (nt - 1)
                  points.InsertNextPoint(x, r * math.cos(t), r * math.sin(t))
                  film = 1 + 0.6 * math.exp(-((0.3 - r) / 0.01) ** 2)
                  jet = 1 + 0.3 * math.cos(2 * math.pi * k / (nt - 1))
                  temperature.InsertNextValue(1800 / (film * jet) ** 2)
      grid.SetPoints(points)
      grid.GetPointData().AddArray(temperature)
      at = lambda i, j, k: (i * nr + j) * nt + k
      for i in range(nx - 1):
          for j in range(nr - 1):
              for k in range(nt - 1):
                  ids = vtk.vtkIdList()
                  for d in ((0,0,0),(1,0,0),(1,1,0),(0,1,0),(0,0,1),(1,0,1),(1,1,1),(0,1,1)):
                      ids.InsertNextId(at(i + d[0], j + d[1], k + d[2]))
                  grid.InsertNextCell(vtk.VTK_HEXAHEDRON, ids)
      writer = vtk.vtkXMLUnstructuredGridWriter()
      writer.SetFileName(sys.argv[1])
      writer.SetInputData(grid)
      writer.SetDataModeToAscii()
      writer.Write()
      """;

  private static PointCloud written(Path directory) throws Exception {
    Path python = Path.of("/usr/bin/python3");
    assumeTrue(Files.isExecutable(python), "no Python here");
    assumeTrue(run(python.toString(), "-c", "import vtk") == 0, "no VTK for Python here");
    Path script = Files.writeString(directory.resolve("write.py"), WRITER);
    Path file = directory.resolve("sector.vtu");
    assertThat(run(python.toString(), script.toString(), file.toString())).isZero();
    Element root =
        DocumentBuilderFactory.newInstance()
            .newDocumentBuilder()
            .parse(file.toFile())
            .getDocumentElement();
    double[] xyz = numbers((Element) root.getElementsByTagName("Points").item(0));
    double[] kelvin = numbers((Element) root.getElementsByTagName("PointData").item(0));
    int n = kelvin.length;
    double[][] p = new double[3][n];
    for (int i = 0; i < 3 * n; i++) {
      p[i % 3][i / 3] = xyz[i];
    }
    return new PointCloud(p[0], p[1], p[2], kelvin);
  }

  private static double[] numbers(Element parent) {
    NodeList arrays = parent.getElementsByTagName("DataArray");
    StringBuilder text = new StringBuilder();
    NodeList parts = arrays.item(0).getChildNodes();
    for (int k = 0; k < parts.getLength(); k++) {
      if (parts.item(k).getNodeType() == Node.TEXT_NODE) {
        text.append(parts.item(k).getNodeValue());
      }
    }
    String[] words = text.toString().trim().split("\\s+");
    return Arrays.stream(words).mapToDouble(Double::parseDouble).toArray();
  }

  private static int run(String... command) throws IOException, InterruptedException {
    Process process =
        new ProcessBuilder(command)
            .redirectErrorStream(true)
            .redirectOutput(ProcessBuilder.Redirect.DISCARD)
            .start();
    assertThat(process.waitFor(60, TimeUnit.SECONDS)).isTrue();
    return process.exitValue();
  }

  @Test
  void sectorWithFilmAndJet_keepsItsTravelTimeOnTheSection(@TempDir Path directory)
      throws Exception {
    PointCloud cloud = written(directory);
    CloudAverage mean = CloudAverage.overAngle(cloud);
    // 1/√T = film(r)·jet(θ)/√1800, and jet has mean 1 over the sector.
    for (double r : new double[] {0.22, 0.25, 0.28, 0.29, 0.298}) {
      // 2 % of T, 1 % of c: linear between the layers of a film of Gaussian shape.
      double film = 1 + 0.6 * Math.exp(-Math.pow((0.3 - r) / 0.01, 2));
      assertThat(mean.field().temperature(0.15, r))
          .as("r = %s", r)
          .isCloseTo(1800 / (film * film), withinPercentage(2));
    }
    // The jet makes what a mode sees depend on its direction: for u = 1 + a cos the arithmetic mean
    // of
    // u⁻² is (1 − a²)^(−3/2), the mean of u² is 1 + a²/2.
    double spread = Math.sqrt(1.045 * Math.pow(0.91, -1.5)) - 1;
    assertThat(mean.meanSpread()).isCloseTo(spread, withinPercentage(5));

    Mesh mesh = section();
    MappedMedium mapped =
        MappedMedium.of(
            mesh, 1e6, Map.of("chamber", new ZoneGas(new PerfectGas(287.05, 1.4), mean.field())));
    double time = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      time += mesh.area(t) / mapped.medium().soundSpeed(t) / 0.3;
    }
    // ∫ film dr over 0.2…0.3 = 0.1 + 0.6 · 0.01 · √π/2
    double exact = (0.1 + 0.006 * Math.sqrt(Math.PI) / 2) / Math.sqrt(1.4 * 287.05 * 1800);
    assertThat(time).isCloseTo(exact, withinPercentage(0.5));
    Coverage coverage = mapped.coverage().get(0);
    assertThat(coverage.extrapolatedNodes()).isZero();
    assertThat(coverage.temperature().least()).isCloseTo(1800 / 2.56, within(15.0));
  }

  /** 0 ≤ x ≤ 0.3, 0.2 ≤ r ≤ 0.3 in cells of 20 mm, far coarser than the film. */
  private static Mesh section() {
    Mesh.Builder b = Mesh.builder();
    int nx = 15;
    int ny = 5;
    for (int i = 0; i <= nx; i++) {
      for (int j = 0; j <= ny; j++) {
        b.node(0.3 * i / nx, 0.2 + 0.1 * j / ny);
      }
    }
    int n = ny + 1;
    for (int i = 0; i < nx; i++) {
      for (int j = 0; j < ny; j++) {
        int a = i * n + j;
        b.triangle(a, a + n, a + n + 1, "chamber");
        b.triangle(a, a + n + 1, a + 1, "chamber");
      }
      b.segment(i * n, (i + 1) * n, "hub");
      b.segment(i * n + ny, (i + 1) * n + ny, "shroud");
    }
    for (int j = 0; j < ny; j++) {
      b.segment(j, j + 1, "inlet");
      b.segment(nx * n + j, nx * n + j + 1, "exit");
    }
    return b.build();
  }
}
