package org.annulet.cases.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import org.annulet.cases.read.CaseReader;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.ModeLabel.Origin;
import org.annulet.post.meaning.Results;
import org.annulet.post.table.ModesCsv;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The duct of row D2: two acoustic modes and two that its flame brings with it. */
class OriginsTest {
  /** γp̄ = ρc² = 1.4e5 Pa on both sides; N = (γ−1)Q̄/(γp̄Aū) with A = 20 cm², ū = 10 m/s. */
  private static String text(double jump) {
    return String.format(
        Locale.ROOT,
        """
        annulet: 1
        title: Duct of row D2
        geometry:
          kind: plane
          depth: 50 mm
          mesh_size: 20 mm
          points_in: mm
          points: {a: [0, 0], b: [300, 0], c: [1000, 0], d: [1000, 40], e: [300, 40], f: [0, 40]}
          edges:
            low1: {line: [a, b]}
            low2: {line: [b, c]}
            outlet: {line: [c, d]}
            up2: {line: [d, e]}
            up1: {line: [e, f]}
            inlet: {line: [f, a]}
            sheet: {line: [b, e]}
          zones:
            cold: {boundary: [low1, sheet, up1, inlet]}
            hot: {boundary: [low2, outlet, up2, sheet]}
        gas:
          mean_pressure: 1 bar
          zones:
            cold: {sound_speed: 347 m/s, density: %.10f kg/m3}
            hot: {sound_speed: 850 m/s, density: %.10f kg/m3}
        walls: {outlet: open}
        flames:
          main:
            heat_release: %.6f W
            place: {sheet: sheet}
            reference: {edge: sheet, flow_from: cold}
            reference_velocity: 10 m/s
            response: {gain: 1, delay: 3 ms}
        window: {frequency: [60 Hz, 600 Hz], growth_rate: [-1000 1/s, 400 1/s]}
        outputs: {field_files: none}
        """,
        1.4e5 / (347 * 347),
        1.4e5 / (850 * 850),
        jump * 1.4e5 * 0.002 * 10 / 0.4);
  }

  @Test
  void ductOfRowD2_labelsSayWhichModesTheFlameBrings(@TempDir Path folder) throws IOException {
    Path file = folder.resolve("case.yaml");
    Files.writeString(file, text(0.5));
    Results results =
        new ModesStudy(CaseReader.read(file).caseFile().orElseThrow(), Progress.SILENT)
            .run("test")
            .results();
    List<ModeEntry> modes = results.modes();
    double[] hertz = {117.76789, 202.19168, 408.20228, 528.38460};
    Origin[] origin = {Origin.INTRINSIC, Origin.ACOUSTIC, Origin.ACOUSTIC, Origin.INTRINSIC};
    assertThat(modes).hasSize(4);
    for (int i = 0; i < 4; i++) {
      assertThat(modes.get(i).view().mode().frequency()).isCloseTo(hertz[i], within(2.0)); // mesh
      assertThat(modes.get(i).label().origin()).as("%s Hz", hertz[i]).isEqualTo(origin[i]);
    }
    assertThat(modes.get(0).label().text()).endsWith("flame-born (intrinsic)");
    assertThat(ModesCsv.text(results)).contains(",intrinsic,decays,").contains(",acoustic,grows,");
  }
}
