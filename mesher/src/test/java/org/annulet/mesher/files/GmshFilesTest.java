package org.annulet.mesher.files;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Map;
import java.util.Set;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.mesher.mesh.MeshCheck;
import org.annulet.mesher.mesh.MeshMeasures;
import org.annulet.mesher.mesh.Quality;
import org.annulet.mesher.mesh.RingReplication;
import org.annulet.mesher.mesh.TestMeshes;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

class GmshFilesTest {
  /** Two rectangles and a round hole; the right one of quadrilaterals; invented. */
  static final String DRAWING =
      """
      SetFactory("Built-in");
      h = 0.02;
      Point(1) = {0, 0, 0, h}; Point(2) = {0.3, 0, 0, h}; Point(3) = {0.3, 0.2, 0, h};
      Point(4) = {0, 0.2, 0, h}; Point(5) = {0.5, 0, 0, h}; Point(6) = {0.5, 0.2, 0, h};
      Point(10) = {0.15, 0.1, 0, h}; Point(11) = {0.19, 0.1, 0, h};
      Point(12) = {0.11, 0.1, 0, h};
      Line(1) = {1, 2}; Line(2) = {2, 3}; Line(3) = {3, 4}; Line(4) = {4, 1};
      Line(5) = {2, 5}; Line(6) = {5, 6}; Line(7) = {6, 3};
      Circle(8) = {11, 10, 12}; Circle(9) = {12, 10, 11};
      Curve Loop(1) = {1, 2, 3, 4}; Curve Loop(2) = {8, 9}; Curve Loop(3) = {5, 6, 7, -2};
      Plane Surface(1) = {1, 2}; Plane Surface(2) = {3};
      Recombine Surface {2};
      Physical Surface("plenum") = {1}; Physical Surface("flame tube") = {2};
      Physical Curve("inlet") = {4}; Physical Curve("exit") = {6};
      Physical Curve("wall") = {1, 3, 5, 7}; Physical Curve("strut") = {8, 9};
      Physical Curve("sheet") = {2};
      """;

  @TempDir Path dir;

  @ParameterizedTest
  @CsvSource({"msh22,0", "msh22,1", "msh41,0", "msh41,1"})
  void fileOfGmsh_hasTheDrawingsAreasAndNames(String format, int binary) throws Exception {
    Path file = gmsh(DRAWING, format, binary);
    Mesh mesh = GmshReader.read(file, ImportOptions.standard());
    assertThat(MeshCheck.of(mesh)).isEmpty();
    int around = (int) count(mesh, "strut");
    double polygon = 0.5 * around * 0.0016 * Math.sin(2 * Math.PI / around);
    double chords = around * 0.08 * Math.sin(Math.PI / around);
    MeshCheck.Expected drawing =
        new MeshCheck.Expected(
            Map.of("plenum", 0.06 - polygon, "flame tube", 0.04),
            Map.of("inlet", 0.2, "exit", 0.2, "wall", 1.0, "strut", chords, "sheet", 0.2),
            1e-9);
    assertThat(MeshCheck.against(mesh, drawing)).isEmpty();
  }

  @Test
  void allFourEncodings_giveTheSameMesh() throws Exception {
    Mesh first = null;
    for (String format : new String[] {"msh22", "msh41"}) {
      for (int binary = 0; binary < 2; binary++) {
        Mesh mesh = GmshReader.read(gmsh(DRAWING, format, binary), ImportOptions.standard());
        first = first == null ? mesh : first;
        assertThat(mesh.nodeCount()).isEqualTo(first.nodeCount());
        assertThat(mesh.triangleCount()).isEqualTo(first.triangleCount());
        assertThat(mesh.segmentCount()).isEqualTo(first.segmentCount());
        double worst = Quality.of(first).smallestAngle();
        assertThat(Quality.of(mesh).smallestAngle()).isCloseTo(worst, within(1e-9));
      }
    }
  }

  @ParameterizedTest
  @MethodSource("org.annulet.mesher.mesh.TestMeshes#seeds")
  void ownFile_readsBackToTheSameMesh(long seed) throws IOException {
    Mesh mesh = TestMeshes.randomDuct(seed);
    Path file = dir.resolve("own.msh");
    GmshWriter.write(mesh, file);
    MeshComparison.assertSame(GmshReader.read(file, ImportOptions.standard()), mesh);
  }

  @Test
  void closedRing_readsBackClosed() throws IOException {
    Mesh ring = RingReplication.of(TestMeshes.halfCell(0.1, 2), 5, 0.1).whole();
    Path file = dir.resolve("ring.msh");
    GmshWriter.write(ring, file);
    MeshComparison.assertSame(GmshReader.read(file, ImportOptions.standard()), ring);
  }

  @Test
  void gmshReadsOurFile_andKeepsNamesAndAreas() throws Exception {
    Programs.assume("gmsh");
    Mesh mesh = TestMeshes.randomDuct(4);
    Path file = dir.resolve("own.msh");
    Path back = dir.resolve("back.msh");
    GmshWriter.write(mesh, file);
    String said =
        Programs.run(
            "gmsh", file.toString(), "-save", "-format", "msh22", "-bin", "-o", back.toString());
    assertThat(said).doesNotContain("Error").doesNotContain("Warning");
    Mesh read = GmshReader.read(back, ImportOptions.standard());
    assertThat(MeshCheck.namesKept(mesh, read)).isEmpty();
    assertThat(read.triangleCount()).isEqualTo(mesh.triangleCount());
    assertThat(MeshMeasures.area(read) / MeshMeasures.area(mesh)).isCloseTo(1, within(1e-14));
  }

  @Test
  void lostBoundaryName_isAnErrorThatListsTheOthers() throws Exception {
    String drawing = DRAWING.replace("Physical Curve(\"exit\") = {6};", "");
    for (String format : new String[] {"msh22", "msh41"}) {
      Path file = gmsh(drawing, format, 0);
      assertThatThrownBy(() -> GmshReader.read(file, ImportOptions.standard()))
          .isInstanceOf(MeshFileException.class)
          .hasMessageContaining("boundary sides have no name, the first from (0.5,")
          .hasMessageContaining("edges are 'inlet', 'sheet', 'strut', 'wall'")
          .hasMessageContaining("mend: put every boundary curve into a named group");
    }
  }

  @Test
  void neededNameThatIsNotThere_isAnErrorThatListsWhatIs() throws Exception {
    Path file = gmsh(DRAWING, "msh41", 1);
    ImportOptions needing =
        ImportOptions.standard().needing(Set.of("plenum", "chamber"), Set.of("inlet"));
    assertThatThrownBy(() -> GmshReader.read(file, needing))
        .hasMessageContaining("no cell has the zone name 'chamber'")
        .hasMessageContaining("zones are 'flame tube', 'plenum'");
  }

  @Test
  void surfaceInTwoGroups_isRefused() throws Exception {
    Path file = gmsh(DRAWING + "Physical Surface(\"hot\") = {2};", "msh41", 0);
    assertThatThrownBy(() -> GmshReader.read(file, ImportOptions.standard()))
        .hasMessageContaining("surface 2 is in several groups: 'flame tube', 'hot'");
  }

  @Test
  void numberedGroups_takeTheCallersNames() throws Exception {
    String drawing =
        DRAWING.replace("(\"flame tube\")", "(500)").replace("Curve(\"exit\")", "Curve(1000)");
    Path file = gmsh(drawing, "msh22", 0);
    assertThatThrownBy(() -> GmshReader.read(file, ImportOptions.standard()))
        .hasMessageContaining("has no name; names in the file are");
    ImportOptions named =
        ImportOptions.standard().naming(Map.of(500, "flame tube"), Map.of(1000, "exit"));
    assertThat(GmshReader.read(file, named).zoneNames()).contains("flame tube");
  }

  @Test
  void uprightDrawingInMillimetres_needsItsPlane() throws Exception {
    // no round hole: three points of a half circle do not span the upright plane for Gmsh
    String upright =
        DRAWING
            .replaceAll("\\{(\\S+), (\\S+), 0, h}", "{$1, 0, $2, h}")
            .replaceAll("Circle.*\\n|Physical Curve\\(\"wall\".*\\n", "")
            .replace("Curve Loop(2) = {8, 9};", "")
            .replace("{1, 2};", "{1};")
            .replace("Line(1) = {1};", "Line(1) = {1, 2};");
    upright += "Physical Curve(\"wall\") = {1, 3, 5, 7};\n";
    Path file = gmsh(upright, "msh41", 1);
    assertThatThrownBy(() -> GmshReader.read(file, ImportOptions.standard()))
        .hasMessageContaining("the mesh is not flat: z runs from");
    ImportOptions right = ImportOptions.standard().inPlane(ImportOptions.Plane.XZ).inUnitsOf(0.001);
    Mesh mesh = GmshReader.read(file, right);
    assertThat(MeshMeasures.area(mesh)).isCloseTo(1e-7, within(1e-16));
  }

  @ParameterizedTest
  @CsvSource({"msh22,0", "msh22,1", "msh41,0", "msh41,1"})
  void fileCutShortAnywhere_isAnErrorOrStillWhole(String format, int binary) throws Exception {
    byte[] whole = Files.readAllBytes(gmsh(DRAWING, format, binary));
    Path cut = dir.resolve("cut.msh");
    for (int i = 0; i < 60; i++) {
      Files.write(cut, Arrays.copyOf(whole, (int) ((long) (whole.length - 12) * i / 60)));
      assertThatThrownBy(() -> GmshReader.read(cut, ImportOptions.standard()))
          .isInstanceOf(MeshFileException.class)
          .hasMessageContaining("mend:");
    }
  }

  @ParameterizedTest
  @CsvSource({"msh22,0", "msh22,1", "msh41,0", "msh41,1"})
  void damagedBytes_neverDoWorseThanAMeshFileError(String format, int binary) throws Exception {
    byte[] whole = Files.readAllBytes(gmsh(DRAWING, format, binary));
    java.util.Random random = new java.util.Random(11);
    Path damaged = dir.resolve("damaged.msh");
    int refused = 0;
    for (int i = 0; i < 200; i++) {
      byte[] bytes = whole.clone();
      for (int k = 0; k < 4; k++) {
        bytes[random.nextInt(bytes.length)] = (byte) random.nextInt(256);
      }
      Files.write(damaged, bytes);
      try {
        GmshReader.read(damaged, ImportOptions.standard());
      } catch (MeshFileException e) {
        refused++;
      }
    }
    assertThat(refused).isGreaterThan(20);
  }

  @Test
  void reentrantQuadrilateral_isSplitWithinItself() throws IOException {
    String dart =
        """
        $MeshFormat
        2.2 0 8
        $EndMeshFormat
        $PhysicalNames
        2
        1 1 "wall"
        2 2 "gas"
        $EndPhysicalNames
        $Nodes
        5
        1 1 0 0
        2 0.2 0.2 0
        3 0 1 0
        4 0 0 0
        9 7 7 0
        $EndNodes
        $Elements
        5
        1 1 2 1 1 1 2
        2 1 2 1 1 2 3
        3 1 2 1 1 3 4
        4 1 2 1 1 4 1
        5 3 2 2 1 1 2 3 4
        $EndElements
        """;
    Path file = dir.resolve("dart.msh");
    Files.writeString(file, dart, StandardCharsets.UTF_8);
    Mesh mesh = GmshReader.read(file, ImportOptions.standard());
    assertThat(MeshCheck.of(mesh)).isEmpty();
    assertThat(mesh.nodeCount()).isEqualTo(4);
    assertThat(MeshMeasures.area(mesh)).isCloseTo(0.2, within(1e-15)); // by the shoelace formula
  }

  /** Four triangles about an inner node that was moved out of the square, or onto its side. */
  @Test
  void foldedAndFlatTriangles_areRefused() throws IOException {
    String square =
        """
        $MeshFormat
        2.2 0 8
        $EndMeshFormat
        $PhysicalNames
        2
        1 1 "wall"
        2 2 "gas"
        $EndPhysicalNames
        $Nodes
        5
        1 0 0 0
        2 1 0 0
        3 1 1 0
        4 0 1 0
        5 %s 0.5 0
        $EndNodes
        $Elements
        8
        1 1 2 1 1 1 2
        2 1 2 1 1 2 3
        3 1 2 1 1 3 4
        4 1 2 1 1 4 1
        5 2 2 2 1 1 2 5
        6 2 2 2 1 2 3 5
        7 2 2 2 1 3 4 5
        8 2 2 2 1 4 1 5
        $EndElements
        """;
    assertRefused(
        String.format(square, "1.5"), "do not fit together", "two triangles on the same hand");
    assertRefused(
        String.format(square, "0.9999999999999"),
        "do not cover the gas once",
        "triangle 1 encloses",
        "mesh the drawing again");
    Files.writeString(dir.resolve("good.msh"), String.format(square, "0.7"));
    assertThat(
            MeshMeasures.area(GmshReader.read(dir.resolve("good.msh"), ImportOptions.standard())))
        .isCloseTo(1, within(1e-15));
  }

  @Test
  void hugeCountsAndNaN_areRefusedWithLine() throws IOException {
    String head = "$MeshFormat\n2.2 0 8\n$EndMeshFormat\n$Nodes\n";
    assertRefused(head + "2000000000\n1 0 0 0\n", "line 5", "says 2000000000 nodes");
    assertRefused(head + "1\n1 NaN 0 0\n$EndNodes\n", "line 6", "node 1 has the coordinate NaN");
    assertRefused(head + "1\n1 0 0 zero\n", "line 6", "'zero' stands where a number should");
    assertRefused("$MeshFormat\n3 0 8\n", "line 2", "MSH version 3.0; 2.2 and 4.1 are read");
    assertRefused("<VTKFile/>", "line 1", "no MSH file");
  }

  private void assertRefused(String text, String... says) throws IOException {
    Path file = dir.resolve("bad.msh");
    Files.writeString(file, text, StandardCharsets.UTF_8);
    assertThatThrownBy(() -> GmshReader.read(file, ImportOptions.standard()))
        .isInstanceOf(MeshFileException.class)
        .hasMessageContainingAll(says);
  }

  private static long count(Mesh mesh, String edge) {
    return java.util.stream.IntStream.range(0, mesh.segmentCount())
        .filter(e -> mesh.edgeNames().get(mesh.segmentEdge(e)).equals(edge))
        .count();
  }

  private Path gmsh(String drawing, String format, int binary) throws Exception {
    Programs.assume("gmsh");
    Path geo = dir.resolve("drawing.geo");
    Path file = dir.resolve("drawing-" + format + binary + ".msh");
    Files.writeString(geo, drawing, StandardCharsets.UTF_8);
    String bin = "Mesh.Binary=" + binary + ";";
    Programs.run(
        "gmsh",
        "-2",
        "-v",
        "1",
        geo.toString(),
        "-format",
        format,
        "-setnumber",
        "Mesh.Binary",
        Integer.toString(binary),
        "-o",
        file.toString());
    assertThat(file).as(bin).exists();
    return file;
  }
}
