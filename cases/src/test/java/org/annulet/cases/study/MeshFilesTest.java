package org.annulet.cases.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import java.util.TreeMap;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.CaseReader;
import org.annulet.mesher.files.GmshReader;
import org.annulet.mesher.files.ImportOptions;
import org.annulet.mesher.files.VtuMeshReader;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.mesher.mesh.MeshCheck;
import org.annulet.mesher.mesh.MeshMeasures;
import org.junit.jupiter.api.Assumptions;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** What {@code annulet mesh} writes, read back by ourselves, by VTK and by meshio. */
class MeshFilesTest {
  @TempDir private Path folder;

  private Mesh write(String name) throws Exception {
    CaseFile caseFile =
        CaseReader.read(Path.of(name), Map.of("geometry.mesh_size", "30 mm")).orThrow();
    MeshFiles.write(caseFile, folder);
    return ChamberShape.of(caseFile).mesh();
  }

  @ParameterizedTest
  @ValueSource(strings = {"hydrogen-ring", "reverse-flow"})
  void bothFiles_readBackToTheSameMesh(String name) throws Exception {
    Mesh mesh = write(name);
    Mesh gmsh = GmshReader.read(folder.resolve("mesh.msh"), ImportOptions.standard());
    Mesh vtu = VtuMeshReader.read(folder.resolve("mesh.vtu"), ImportOptions.standard());
    for (Mesh back : new Mesh[] {gmsh, vtu}) {
      assertThat(MeshCheck.namesKept(mesh, back)).isEmpty();
      assertThat(MeshCheck.of(back)).isEmpty();
      assertThat(back.period()).isEqualTo(mesh.period());
      assertThat(back.nodeCount()).isEqualTo(mesh.nodeCount());
      assertThat(back.triangleCount()).isEqualTo(mesh.triangleCount());
      assertThat(back.segmentCount()).isEqualTo(mesh.segmentCount());
      assertThat(MeshMeasures.area(back)).isCloseTo(MeshMeasures.area(mesh), within(1e-12));
    }
  }

  /** Counts and sums by zone and edge as a foreign reader sees them. */
  @Test
  void vtkAndMeshio_seeOurZonesAndEdges() throws Exception {
    Path python = Path.of("/usr/bin/python3");
    Assumptions.assumeTrue(Files.isExecutable(python), "python3 is not installed");
    Mesh mesh = write("reverse-flow");
    Map<String, Double> wanted = new TreeMap<>();
    for (int t = 0; t < mesh.triangleCount(); t++) {
      wanted.merge(mesh.zoneNames().get(mesh.zone(t)), mesh.area(t), Double::sum);
    }
    for (int e = 0; e < mesh.segmentCount(); e++) {
      wanted.merge(mesh.edgeNames().get(mesh.segmentEdge(e)), mesh.segmentLength(e), Double::sum);
    }
    for (String reader : new String[] {VTK, MESHIO}) {
      String module = reader.equals(VTK) ? "vtk" : "meshio";
      Process probe = new ProcessBuilder(python.toString(), "-c", "import " + module).start();
      Assumptions.assumeTrue(probe.waitFor() == 0, module + " is not installed");
      Map<String, Double> seen = new TreeMap<>();
      Path script = folder.resolve("read.py");
      Files.writeString(script, reader);
      Process p =
          new ProcessBuilder(python.toString(), script.toString())
              .directory(folder.toFile())
              .redirectErrorStream(true)
              .start();
      String said = new String(p.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
      assertThat(p.waitFor()).as(said).isZero();
      said.lines()
          .map(line -> line.split("\t"))
          .filter(w -> w.length == 2)
          .forEach(w -> seen.put(w[0], Double.parseDouble(w[1])));
      assertThat(seen.keySet()).as(said).isEqualTo(wanted.keySet());
      wanted.forEach((k, v) -> assertThat(seen.get(k)).as(k).isCloseTo(v, within(1e-9)));
    }
  }

  private static final String VTK =
      """
      import vtk
      r = vtk.vtkXMLUnstructuredGridReader(); r.SetFileName('mesh.vtu'); r.Update()
      g = r.GetOutput(); sums = {}
      names = {}
      for kind in ('zone', 'edge'):
          a = g.GetFieldData().GetAbstractArray(kind + '_names')
          names[kind] = [a.GetValue(k) for k in range(a.GetNumberOfValues())]
      for c in range(g.GetNumberOfCells()):
          cell = g.GetCell(c)
          kind = 'edge' if cell.GetCellType() == vtk.VTK_LINE else 'zone'
          number = g.GetCellData().GetArray(kind).GetValue(c)
          size = cell.GetLength2() ** 0.5 if kind == 'edge' else cell.ComputeArea()
          sums[names[kind][number]] = sums.get(names[kind][number], 0) + size
      for k, v in sums.items(): print(k, repr(v), sep='\\t')
      """;

  private static final String MESHIO =
      """
      import meshio, numpy as np
      m = meshio.read('mesh.msh'); sums = {}
      name = {(d, n): k for k, (n, d) in m.field_data.items()}
      for block, numbers in zip(m.cells, m.cell_data['gmsh:physical']):
          p = m.points[block.data]
          if block.type == 'line':
              d, size = 1, np.linalg.norm(p[:, 1] - p[:, 0], axis=1)
          else:
              a, b = p[:, 1] - p[:, 0], p[:, 2] - p[:, 0]
              d, size = 2, abs(a[:, 0] * b[:, 1] - a[:, 1] * b[:, 0]) / 2
          for n, s in zip(numbers, size):
              sums[name[d, n]] = sums.get(name[d, n], 0) + s
      for k, v in sums.items(): print(k, repr(float(v)), sep='\\t')
      """;
}
