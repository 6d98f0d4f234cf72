package org.annulet.cases.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import org.annulet.cases.read.CaseReader;
import org.annulet.cases.read.Damper;
import org.annulet.post.meaning.GrowthBudget;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.Results;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Dampers from the case file to the budget. */
class CaseDampersTest {
  private static final String RING =
      """
      annulet: 1
      title: thin ring with tuned dampers
      geometry:
        kind: ring
        burner_count: 12
        mesh_size: 20 mm
        zones:
          - {name: ring, shape: annulus, mean_radius: 0.5 m, gap: 20 mm, length: 20 mm}
      gas:
        mean_pressure: 1 bar
        zones: {ring: {sound_speed: 800 m/s, density: 0.21875 kg/m3}}
      dampers:
        tuned:
          resonator: {neck_bore: 3.19153824321 mm, neck_length: 50 mm, end_correction: 0, volume: 40 cm3, resistance: 0.02}
          at: {face: ring.outer_face, x: 10 mm, angles: %s}
          mouth_width: 20 mm
      window: {frequency: [150 Hz, 620 Hz], growth_rate: [-200 1/s, 50 1/s]}
      """;

  @TempDir private Path folder;

  private Results solve(String angles) throws Exception {
    Path file =
        Files.writeString(folder.resolve("case.yaml"), String.format(Locale.ROOT, RING, angles));
    return new ModesStudy(CaseReader.read(file).orThrow(), Progress.SILENT)
        .modesOnly()
        .run("test")
        .results();
  }

  private static List<ModeEntry> near(Results results, double frequency) {
    return results.modes().stream()
        .filter(m -> Math.abs(m.view().mode().frequency() - frequency) < 6)
        .toList();
  }

  /**
   * Row E5.4: four equal dampers leave the pairs of order 1 whole (K = 4 does not divide 2), at
   * 212.997 Hz, −67.970 1/s and 298.985 Hz, −86.682 1/s for dampers that are points; ours have
   * mouths of 20 mm, which moves E5.1 by 4e-4. They split order 2 (4 divides 4).
   */
  @Test
  void fourEqualDampers_leaveOrderOneWhole_andSplitOrderTwo() throws Exception {
    Results results = solve("[0 °, 90 °, 180 °, 270 °]");
    assertThat(results.complete()).isTrue();
    double[][] expected = {{212.99721, -67.9697}, {298.98510, -86.6824}};
    for (double[] e : expected) {
      List<ModeEntry> pair = near(results, e[0]);
      assertThat(pair).as("%s Hz", e[0]).hasSize(2);
      for (ModeEntry m : pair) {
        assertThat(m.view().mode().frequency()).isCloseTo(e[0], within(1.5e-3 * e[0]));
        assertThat(m.view().mode().growthRate()).isCloseTo(e[1], within(0.012 * -e[1]));
      }
      assertThat(pair.get(0).view().mode().growthRate())
          .isCloseTo(pair.get(1).view().mode().growthRate(), within(1e-4));
    }
    // Order 2: one member has its nodes at the dampers and stays at 2c/(2πR), undamped.
    assertThat(near(results, 509.296))
        .anySatisfy(m -> assertThat(m.view().mode().growthRate()).isCloseTo(0, within(1e-6)));
    assertThat(results.notes().toString()).contains("Dampers break the symmetry");
  }

  @Test
  void budget_namesEachDamper_andNothingElseDamps() throws Exception {
    Results results = solve("[20 °, 80 °]");
    for (ModeEntry m : results.modes()) {
      GrowthBudget budget = m.budget().orElseThrow();
      assertThat(budget.items().stream().map(GrowthBudget.Item::name))
          .containsExactlyInAnyOrder("damper tuned 1", "damper tuned 2");
      double sum = budget.items().stream().mapToDouble(GrowthBudget.Item::growthShare).sum();
      assertThat(sum).isCloseTo(m.view().mode().growthRate(), within(1e-6));
    }
  }

  /** One burner cell for each Bloch number gives the modes of the whole ring. */
  @Test
  void sameDamperAtEveryBurner_isSolvedInOneCell() throws Exception {
    Results cell =
        solve("[0 °, 30 °, 60 °, 90 °, 120 °, 150 °, 180 °, 210 °, 240 °, 270 °, 300 °, 330 °]");
    assertThat(cell.complete()).isTrue();
    assertThat(cell.notes().toString()).contains("All 12 burners are alike");
    Results ring =
        solve(
            "[0.0001 °, 30 °, 60 °, 90 °, 120 °, 150 °, 180 °, 210 °, 240 °, 270 °, 300 °, 330 °]");
    assertThat(ring.notes().toString()).contains("Dampers break the symmetry");
    assertThat(ring.modes()).hasSameSizeAs(cell.modes());
    for (int k = 0; k < ring.modes().size(); k++) {
      double f = cell.modes().get(k).view().mode().frequency();
      double g = cell.modes().get(k).view().mode().growthRate();
      // pairs are split by the shift of 0.0001 °, so their members may change places
      assertThat(ring.modes())
          .anySatisfy(
              m -> {
                assertThat(m.view().mode().frequency()).isCloseTo(f, within(1e-6 * f));
                assertThat(m.view().mode().growthRate()).isCloseTo(g, within(1e-3));
              });
      assertThat(
              cell.modes().get(k).budget().orElseThrow().items().stream()
                  .map(GrowthBudget.Item::name))
          .contains("damper tuned");
    }
  }

  /** Δp = ζρu²/2 about a mean velocity ū: dp/du over ρc is ζū/c. */
  @Test
  void biasFlow_addsItsLossToTheResistance() {
    Damper.QuarterWave tube = new Damper.QuarterWave(0.02, 0.2, 0, 0.1, 1.5 * 12);
    double c = 500;
    double rho = 3;
    double step = 1e-3;
    double slope =
        (1.5 * rho * Math.pow(12 + step, 2) / 2 - 1.5 * rho * Math.pow(12 - step, 2) / 2)
            / (2 * step);
    assertThat(tube.resistance(c)).isCloseTo(0.1 + slope / (rho * c), within(1e-9));
    Damper.QuarterWave still = new Damper.QuarterWave(0.02, 0.2, 0, tube.resistance(c), 0);
    double[] gas = {rho, c};
    assertThat(CaseDampers.solved(tube, gas)).isEqualTo(CaseDampers.solved(still, gas));
  }
}
