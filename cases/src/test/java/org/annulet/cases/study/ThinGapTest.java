package org.annulet.cases.study;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.annulet.cases.read.CaseReader;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.solver.assembly.Ring;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The estimate of what unrolling costs, against the true annular can. */
class ThinGapTest {
  @TempDir private Path folder;

  @Test
  void ringPlusEstimate_isTheTrueAnnularCan() throws IOException {
    // REFERENCE_VALUES rows A5.10, A5.20, A5.30: r_i = 0.40 m, r_o = 0.50 m, L = 0.30 m, c = 800
    // m/s, axially uniform modes.
    double[] can = {283.51641, 566.96300, 850.27011};
    Path file = folder.resolve("case.yaml");
    Files.writeString(
        file,
        """
        annulet: 1
        title: annular can as a ring
        geometry:
          kind: ring
          burner_count: 16
          mesh_size: 20 mm
          zones:
            - {name: can, shape: annulus, mean_radius: 450 mm, gap: 100 mm, length: 300 mm}
        gas:
          mean_pressure: 10 bar
          zones: {can: {sound_speed: 800 m/s, density: 2 kg/m3}}
        window: {frequency: [100 Hz, 900 Hz], growth_rate: [-50 1/s, 50 1/s]}
        """);
    ModesStudy.Answer answer =
        new ModesStudy(CaseReader.read(file).orThrow(), Progress.SILENT).modesOnly().run("test");
    Ring ring = (Ring) answer.problem().shape().geometry();
    assertThat(answer.results().modes()).hasSize(6);
    for (ModeEntry e : answer.results().modes()) {
      double f = e.view().mode().frequency();
      double exact = can[e.label().azimuthalOrder() - 1];
      double estimate = ThinGap.hertz(ring, e, answer.chamber().mesh().zoneNames());
      assertThat(exact - f - estimate)
          .as("order %d", e.label().azimuthalOrder())
          .isBetween(-0.2 * estimate - e.view().frequencyError(), e.view().frequencyError());
    }
    assertThat(answer.results().notes()).anyMatch(n -> n.startsWith("Thin-gap model"));
  }
}
