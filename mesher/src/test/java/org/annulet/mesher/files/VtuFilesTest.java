package org.annulet.mesher.files;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import java.util.Random;
import java.util.Set;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.mesher.mesh.MeshCheck;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Grids written by Debian's VTK itself (python3-vtk9), in every way it can write them. */
class VtuFilesTest {
  /**
   * A step: rectangle 0.4 × 0.2 of quadrilaterals ('cold'), rectangle 0.2 × 0.1 of triangles
   * ('hot'), lines round it and between; fields on points and cells.
   */
  private static final String SCRIPT =
      """
      import sys, vtk
      mode, zlib, order, header, names, path = sys.argv[1:7]
      g = vtk.vtkUnstructuredGrid()
      pts = vtk.vtkPoints(); pts.SetDataTypeToDouble(); ids = {}
      def p(i, j):
          if (i, j) not in ids:
              ids[i, j] = pts.InsertNextPoint(0.05 * i, 0.05 * j, 0)
          return ids[i, j]
      cells = []
      for i in range(12):
          for j in range(4 if i < 8 else 2):
              a, b, c, d = p(i, j), p(i + 1, j), p(i + 1, j + 1), p(i, j + 1)
              if i < 8:
                  cells.append((vtk.VTK_QUAD, [a, b, c, d], 0, -1))
              else:
                  cells.append((vtk.VTK_TRIANGLE, [a, b, c], 1, -1))
                  cells.append((vtk.VTK_TRIANGLE, [a, c, d], 1, -1))
      line = lambda a, b, e: cells.append((vtk.VTK_LINE, [p(*a), p(*b)], -1, e))
      for i in range(12): line((i, 0), (i + 1, 0), 0)
      for i in range(8): line((i, 4), (i + 1, 4), 0)
      for i in range(8, 12): line((i, 2), (i + 1, 2), 0)
      for j in range(2, 4): line((8, j), (8, j + 1), 0)
      for j in range(4): line((0, j), (0, j + 1), 1)
      for j in range(2): line((12, j), (12, j + 1), 2)
      for j in range(2): line((8, j), (8, j + 1), 3)
      cells.append((vtk.VTK_VERTEX, [p(0, 0)], -1, -1))
      g.SetPoints(pts)
      zone, edge = vtk.vtkIntArray(), vtk.vtkIntArray()
      zone.SetName('zone'); edge.SetName('edge')
      for kind, corners, z, e in cells:
          l = vtk.vtkIdList()
          for c in corners: l.InsertNextId(c)
          g.InsertNextCell(kind, l); zone.InsertNextValue(z); edge.InsertNextValue(e)
      g.GetCellData().AddArray(zone); g.GetCellData().AddArray(edge)
      t = vtk.vtkFloatArray(); t.SetName('T'); u = vtk.vtkDoubleArray(); u.SetName('U')
      u.SetNumberOfComponents(3)
      for k in range(pts.GetNumberOfPoints()):
          x, y, z = pts.GetPoint(k)
          t.InsertNextValue(300 + 1000 * x); u.InsertNextTuple3(x, 2 * y, -1)
      g.GetPointData().AddArray(t); g.GetPointData().AddArray(u)
      if names == 'names':
          for n, words in (('zone_names', ['cold', 'hot gas']), ('edge_names', ['wall', 'inlet', 'exit', 'step'])):
              s = vtk.vtkStringArray(); s.SetName(n)
              for w in words: s.InsertNextValue(w)
              g.GetFieldData().AddArray(s)
      w = vtk.vtkXMLUnstructuredGridWriter(); w.SetFileName(path); w.SetInputData(g)
      {'ascii': w.SetDataModeToAscii, 'inline': w.SetDataModeToBinary,
       'raw': w.SetDataModeToAppended, 'base64': w.SetDataModeToAppended}[mode]()
      w.SetEncodeAppendedData(mode == 'base64')
      {'none': w.SetCompressorTypeToNone, 'zlib': w.SetCompressorTypeToZLib,
       'lz4': w.SetCompressorTypeToLZ4}[zlib]()
      w.SetBlockSize(1024)
      {'little': w.SetByteOrderToLittleEndian, 'big': w.SetByteOrderToBigEndian}[order]()
      {'32': w.SetHeaderTypeToUInt32, '64': w.SetHeaderTypeToUInt64}[header]()
      w.Write()
      """;

  @TempDir private Path folder;

  private Path grid(String... how) throws Exception {
    Programs.assumePython("vtk");
    Path script = folder.resolve("write.py");
    Files.writeString(script, SCRIPT);
    Path file = folder.resolve("grid.vtu");
    String[] command = new String[how.length + 3];
    command[0] = "/usr/bin/python3";
    command[1] = script.toString();
    System.arraycopy(how, 0, command, 2, how.length);
    command[how.length + 2] = file.toString();
    Programs.run(command);
    return file;
  }

  @ParameterizedTest
  @CsvSource({
    "ascii, none, little, 64",
    "inline, none, little, 32",
    "inline, none, big, 64",
    "inline, zlib, little, 64",
    "inline, zlib, big, 32",
    "raw, none, little, 64",
    "raw, none, big, 32",
    "raw, zlib, little, 32",
    "raw, zlib, little, 64",
    "base64, none, little, 64",
    "base64, zlib, big, 64",
    "base64, zlib, little, 32"
  })
  void everyEncoding_givesTheSameMeshAndFields(
      String mode, String compressor, String order, String header) throws Exception {
    Path file = grid(mode, compressor, order, header, "names");
    Mesh mesh = VtuMeshReader.read(file, ImportOptions.standard());
    assertThat(MeshCheck.of(mesh)).isEmpty();
    MeshCheck.Expected drawing =
        new MeshCheck.Expected(
            Map.of("cold", 0.08, "hot gas", 0.02),
            Map.of("wall", 1.3, "inlet", 0.2, "exit", 0.1, "step", 0.1),
            1e-12);
    assertThat(MeshCheck.against(mesh, drawing)).isEmpty();
    assertThat(mesh.triangleCount()).isEqualTo(64 + 16);
    VtuGrid grid = VtuGrid.read(file);
    VtuGrid.Field t = grid.pointData().get("T");
    VtuGrid.Field u = grid.pointData().get("U");
    assertThat(t.components()).isEqualTo(1);
    assertThat(u.components()).isEqualTo(3);
    for (int k = 0; k < grid.pointCount(); k++) {
      double x = grid.points()[3 * k];
      double y = grid.points()[3 * k + 1];
      // float32, and six digits where it is text
      assertThat(t.values()[k]).isCloseTo(300 + 1000 * x, within(1e-3));
      assertThat(u.values()[3 * k]).isCloseTo(x, within(1e-12));
      assertThat(u.values()[3 * k + 1]).isCloseTo(2 * y, within(1e-12));
      assertThat(u.values()[3 * k + 2]).isEqualTo(-1);
    }
  }

  @Test
  void numbersWithoutNames_takeThoseOfTheCaller_orAreAnErrorThatSaysWhichNumber() throws Exception {
    Path file = grid("raw", "zlib", "little", "64", "bare");
    assertThatThrownBy(() -> VtuMeshReader.read(file, ImportOptions.standard()))
        .isInstanceOf(MeshFileException.class)
        .hasMessageContaining("zone number 0 of cell 0 has no name; names are none")
        .hasMessageContaining("zone_names");
    ImportOptions named =
        ImportOptions.standard()
            .naming(Map.of(0, "cold", 1, "hot"), Map.of(0, "wall", 1, "in", 2, "out", 3, "step"));
    assertThat(VtuMeshReader.read(file, named).zoneNames())
        .containsExactlyInAnyOrder("cold", "hot");
    ImportOptions needing = named.needing(Set.of("cold", "flame"), Set.of());
    assertThatThrownBy(() -> VtuMeshReader.read(file, needing))
        .hasMessageContaining("no cell has the zone name 'flame'")
        .hasMessageContaining("zones are 'cold', 'hot'");
  }

  @Test
  void anotherCompressor_isAClearError() throws Exception {
    Path file = grid("raw", "lz4", "little", "64", "names");
    assertThatThrownBy(() -> VtuGrid.read(file))
        .hasMessageContaining("data compressed by vtkLZ4DataCompressor")
        .hasMessageContaining("zlib");
  }

  @Test
  void notAGrid_externalEntities_andBombs_areRefused() throws IOException {
    Path file = folder.resolve("bad.vtu");
    Files.writeString(file, "no xml at all");
    assertThatThrownBy(() -> VtuGrid.read(file)).hasMessageContaining("no XML");
    Files.writeString(file, "<VTKFile type=\"PolyData\"></VTKFile>");
    assertThatThrownBy(() -> VtuGrid.read(file)).hasMessageContaining("no unstructured grid");
    Files.writeString(
        file, "<!DOCTYPE a [<!ENTITY x SYSTEM \"file:///etc/hostname\">]><VTKFile>&x;</VTKFile>");
    assertThatThrownBy(() -> VtuGrid.read(file)).hasMessageContaining("DOCTYPE is disallowed");
    Files.writeString(
        file,
        "<VTKFile type=\"UnstructuredGrid\"><UnstructuredGrid><Piece NumberOfPoints=\"999999999\""
            + " NumberOfCells=\"1\"/></UnstructuredGrid></VTKFile>");
    assertThatThrownBy(() -> VtuGrid.read(file))
        .hasMessageContaining("NumberOfPoints is '999999999'");
  }

  /** Bytes changed, cut off and doubled at random: an error with words, or a grid; never more. */
  @ParameterizedTest
  @ValueSource(strings = {"raw", "inline", "ascii"})
  @Timeout(60)
  void damagedFile_isAnErrorWithWords(String mode) throws Exception {
    byte[] good = Files.readAllBytes(grid(mode, "zlib", "little", "32", "names"));
    Random random = new Random(7);
    Path file = folder.resolve("damaged.vtu");
    int refused = 0;
    for (int k = 0; k < 400; k++) {
      byte[] bad = good.clone();
      int changes = 1 + random.nextInt(6);
      for (int c = 0; c < changes; c++) {
        bad[random.nextInt(bad.length)] = (byte) random.nextInt(256);
      }
      if (k % 4 == 0) {
        bad = java.util.Arrays.copyOf(bad, random.nextInt(bad.length));
      }
      Files.write(file, bad);
      try {
        VtuMeshReader.read(file, ImportOptions.standard());
      } catch (MeshFileException e) {
        refused++;
        assertThat(e.getMessage()).contains("mend: ");
      }
    }
    assertThat(refused).isGreaterThan(200);
    assertThat(new String(good, StandardCharsets.ISO_8859_1)).contains("VTKFile");
  }
}
