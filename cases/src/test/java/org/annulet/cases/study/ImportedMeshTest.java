package org.annulet.cases.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import org.annulet.cases.read.CaseFaultException;
import org.annulet.cases.read.CaseReader;
import org.annulet.mesher.files.GmshWriter;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.solver.modes.Mode;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** A case on a mesh made elsewhere is the case on the outline it was made from. */
class ImportedMeshTest {
  /** Everything but the geometry: names, losses and flame are found on the imported mesh. */
  private static final String REST =
      """
      gas:
        mean_pressure: 12 bar
        zones:
          cold: {sound_speed: 500 m/s, density: 6.4 kg/m3}
          hot: {sound_speed: 810 m/s, density: 2.3 kg/m3}
      walls: {outlet: {impedance: [9, 2]}}
      two_ports: {sheet: {loss_coefficient: 0.5, velocity: 40 m/s, flow_from: cold}}
      flames:
        main:
          heat_release: 1 MW
          place: {sheet: sheet}
          reference: {edge: sheet, flow_from: cold}
          reference_velocity: 40 m/s
          response: {gain: 0.6, delay: 2 ms}
      window: {frequency: [60 Hz, 700 Hz], growth_rate: [-600 1/s, 600 1/s], azimuthal_orders: [0, 1]}
      """;

  private static final String OUTLINE =
      """
      annulet: 1
      title: drawn
      geometry:
        kind: section
        mesh_size: 10 mm
        points: {a: [0 m, 0.25 m], b: [0.2 m, 0.25 m], c: [0.5 m, 0.2 m], d: [0.5 m, 0.42 m], e: [0.2 m, 0.4 m], f: [0 m, 0.4 m]}
        edges:
          inlet: {line: [f, a]}
          cold_hub: {line: [a, b]}
          sheet: {line: [b, e]}
          cold_shell: {line: [e, f]}
          hot_hub: {line: [b, c]}
          outlet: {line: [c, d]}
          hot_shell: {line: [d, e]}
        zones:
          cold: {boundary: [inlet, cold_hub, sheet, cold_shell]}
          hot: {boundary: [hot_hub, outlet, hot_shell, sheet]}
      """;

  @TempDir private Path folder;

  private List<Mode> modes(Path file) {
    return new ModesStudy(CaseReader.read(file).orThrow(), Progress.SILENT)
        .modesOnly().run("test").results().modes().stream()
            .map(ModeEntry::view)
            .map(v -> v.mode())
            .toList();
  }

  /** Straight edges: the mesh of 40 mm, refined twice, is the one of 10 mm. */
  @ParameterizedTest
  @ValueSource(strings = {"mesh.msh", "mesh.vtu"})
  void modes_areThoseOfTheOutline(String file) throws Exception {
    Path drawn = Files.writeString(folder.resolve("drawn.yaml"), OUTLINE + REST);
    MeshFiles.write(
        CaseReader.read(drawn, Map.of("geometry.mesh_size", "40 mm")).orThrow(), folder);
    Path imported =
        Files.writeString(
            folder.resolve("imported.yaml"),
            "annulet: 1\ntitle: imported\ngeometry: {kind: mesh_file, file: "
                + file
                + ", plane: section, length_unit: m}\n"
                + REST);
    List<Mode> ours = modes(imported);
    List<Mode> theirs = modes(drawn);
    assertThat(ours).hasSameSizeAs(theirs).hasSizeGreaterThan(2);
    for (int k = 0; k < ours.size(); k++) {
      double size = theirs.get(k).frequency();
      assertThat(ours.get(k).frequency()).isCloseTo(size, within(1e-8 * size));
      assertThat(ours.get(k).growthRate())
          .isCloseTo(theirs.get(k).growthRate(), within(1e-7 * size));
    }
  }

  @Test
  void tooFineAMesh_isRefusedWithTheNumberOfNodes() throws Exception {
    Path drawn =
        Files.writeString(
            folder.resolve("drawn.yaml"),
            (OUTLINE + REST).replace("mesh_size: 10 mm", "mesh_size: 0.6 mm"));
    GmshWriter.write(
        ChamberShape.of(CaseReader.read(drawn).orThrow()).mesh(), folder.resolve("mesh.msh"));
    Path imported =
        Files.writeString(
            folder.resolve("imported.yaml"),
            "annulet: 1\ntitle: imported\ngeometry: {kind: mesh_file, file: mesh.msh, plane:"
                + " section, length_unit: m}\n"
                + REST);
    assertThatThrownBy(() -> modes(imported))
        .isInstanceOf(CaseFaultException.class)
        .hasMessageContaining("where it is refined for the error bars")
        .hasMessageContaining("write a coarser mesh");
  }
}
