package org.annulet.cases.study;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.Map;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.CaseReader;
import org.annulet.cases.read.Flame;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.Results;
import org.junit.jupiter.api.Test;

/**
 * The trap of the trade in the shipped case (common practice, no source): tests at both ends of a
 * change pass, and between them the chamber is loud.
 */
class QuietLoudQuietTest {
  private static final Path CASE = Path.of("quiet-loud-quiet");

  @Test
  void bothEndsAreQuiet_andTheBlendBetweenThemIsLoud() {
    assertThat(largestGrowth("2.6 ms", "0.6")).isBetween(-20.0, -1.0);
    assertThat(largestGrowth("2.15 ms", "0.7")).isBetween(2.0, 20.0);
    assertThat(largestGrowth("1.7 ms", "0.8")).isBetween(-20.0, -1.0);
  }

  @Test
  void variantsHoldTheSameNumbers() {
    CaseFile trap = CaseReader.read(CASE).orThrow();
    assertThat(trap.variants())
        .extracting(v -> v.caseFile().flames().get(0).responseAt(1))
        .containsExactly(
            new Flame.GainDelay(0.6, 2.6e-3),
            new Flame.GainDelay(0.7, 2.15e-3),
            new Flame.GainDelay(0.8, 1.7e-3));
  }

  private static double largestGrowth(String delay, String gain) {
    CaseFile blend =
        CaseReader.read(
                CASE,
                Map.of(
                    "geometry.mesh_size", "40 mm",
                    "flames.main.response.delay", delay,
                    "flames.main.response.gain", gain))
            .orThrow();
    Results results = new ModesStudy(blend, Progress.SILENT).modesOnly().run("test").results();
    assertThat(results.complete()).isTrue();
    return results.modes().stream()
        .map(ModeEntry::view)
        .mapToDouble(v -> v.mode().growthRate())
        .max()
        .orElseThrow();
  }
}
