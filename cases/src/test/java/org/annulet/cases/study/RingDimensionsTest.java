package org.annulet.cases.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.CaseReader;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.ParameterSensitivity;
import org.annulet.post.meaning.Results;
import org.annulet.solver.eigen.ModeSearch;
import org.annulet.solver.eigen.SearchSettings;
import org.annulet.solver.modes.Mode;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Sensitivities to lengths, radii, gaps and bores of a ring, whose mesh is drawn out for them. */
class RingDimensionsTest {
  private static CaseFile read(Path folder, String text) throws IOException {
    Path file = folder.resolve("case.yaml");
    Files.writeString(file, text);
    return CaseReader.read(file).caseFile().orElseThrow();
  }

  private static Results run(CaseFile caseFile) {
    return new ModesStudy(caseFile, Progress.SILENT).run("test").results();
  }

  private static ParameterSensitivity row(ModeEntry e, String key) {
    return e.sensitivities().stream()
        .filter(p -> p.key().equals(key))
        .findFirst()
        .orElse(new ParameterSensitivity(key, "", 0, 0, 0));
  }

  private static final String ANNULUS =
      """
      annulet: 1
      title: Closed thin annulus
      geometry:
        kind: ring
        burner_count: 6
        mesh_size: 60 mm
        zones:
          - {name: gas, shape: annulus, mean_radius: 300 mm, gap: 20 mm, length: 700 mm}
      gas:
        mean_pressure: 1 bar
        zones: {gas: {sound_speed: 340 m/s, density: 1.2 kg/m3}}
      window: {frequency: [100 Hz, 330 Hz], growth_rate: [-50 1/s, 50 1/s]}
      outputs: {field_files: none}
      """;

  /**
   * f² = (c m/2πR)² + (c n/2L)², so ∂f/∂ln R = −(c m/2πR)²/f and ∂f/∂ln L = −(c n/2L)²/f; the gap
   * drops out.
   */
  @Test
  void closedAnnulus_movesAsItsFormulaSays(@TempDir Path folder) throws IOException {
    Results results = run(read(folder, ANNULUS));
    assertThat(results.modes()).hasSizeGreaterThanOrEqualTo(3);
    for (ModeEntry e : results.modes()) {
      int m = e.label().azimuthalOrder();
      int n = e.label().axialNodes();
      double round = 340 * m / (2 * Math.PI * 0.3);
      double along = 340 * n / (2 * 0.7);
      double f = Math.hypot(round, along);
      assertThat(e.view().mode().frequency()).isCloseTo(f, within(0.01 * f));
      // one percent in the unit of the table; 2 % for the mesh
      assertThat(row(e, "geometry.zones.gas.mean_radius").frequencyPerPercent())
          .as(e.label().text())
          .isCloseTo(-round * round / f / 100, within(2e-4 * f));
      assertThat(row(e, "geometry.zones.gas.length").frequencyPerPercent())
          .as(e.label().text())
          .isCloseTo(-along * along / f / 100, within(2e-4 * f));
      assertThat(row(e, "geometry.zones.gas.gap").frequencyPerPercent())
          .isCloseTo(0, within(1e-8 * f));
    }
  }

  /** A ring with burners, meshed anew with each dimension 1 % larger and smaller. */
  @Test
  void ringWithBurners_movesAsWhenMeshedAnew(@TempDir Path folder) throws IOException {
    CaseFile base =
        read(
            folder,
            """
            annulet: 1
            title: Small ring
            geometry:
              kind: ring
              burner_count: 4
              mesh_size: 30 mm
              zones:
                - {name: plenum,  shape: annulus, mean_radius: 160 mm, gap: 60 mm, length: 120 mm}
                - {name: burners, shape: ducts,   mean_radius: 155 mm, bore: 50 mm, length: 60 mm}
                - {name: chamber, shape: annulus, mean_radius: 150 mm, gap: 80 mm, length: 200 mm}
            gas:
              mean_pressure: 6 bar
              zones:
                plenum:  {temperature: 600 K, gamma: 1.37, gas_constant: 287 J/(kg K)}
                burners: {as: plenum}
                chamber: {temperature: 1700 K, gamma: 1.29, gas_constant: 290 J/(kg K)}
            walls: {chamber.downstream: {admittance: 0.08}}
            flames:
              main:
                heat_release: 1.5 MW
                place: {sheet: burners.outlet}
                reference_velocity: 50 m/s
                response: {gain: 0.8, delay: 1.6 ms}
            window: {frequency: [250 Hz, 500 Hz], growth_rate: [-500 1/s, 500 1/s]}
            outputs: {field_files: none}
            """);
    Results results = run(base);
    Map<String, Double> millimetres =
        Map.of("plenum.length", 120.0, "burners.bore", 50.0, "chamber.mean_radius", 150.0);
    millimetres.forEach(
        (name, value) -> {
          String key = "geometry.zones." + name;
          List<Mode> up = alone(with(base, key, 1.01 * value));
          List<Mode> down = alone(with(base, key, 0.99 * value));
          for (ModeEntry e : results.modes()) {
            ParameterSensitivity row = row(e, key);
            Mode own = e.view().mode();
            double f = (near(up, own).frequency() - near(down, own).frequency()) / 2;
            double g = (near(up, own).growthRate() - near(down, own).growthRate()) / 2;
            double size = Math.hypot(2 * Math.PI * f, g);
            double miss =
                Math.hypot(
                    2 * Math.PI * (row.frequencyPerPercent() - f), row.growthPerPercent() - g);
            // other triangles: their error differs by a few 1e-4 of s, an effect is about 1e-2 of
            // it
            assertThat(miss)
                .as("%s, %s", name, e.label().text())
                .isLessThan(0.05 * size + 3e-4 * own.frequency());
          }
        });
  }

  /** The modes on the mesh of the case alone, without anything else of a study. */
  private static List<Mode> alone(CaseFile c) {
    return CaseProblem.on(c, ChamberShape.of(c)).parts().stream()
        .map(p -> ModeSearch.find(p.assembled().operator(), c.window(), SearchSettings.standard()))
        .flatMap(s -> s.modes().stream())
        .toList();
  }

  private static Mode near(List<Mode> modes, Mode own) {
    return modes.stream()
        .min(
            Comparator.comparingDouble(
                m ->
                    Math.hypot(
                        m.growthRate() - own.growthRate(),
                        2 * Math.PI * (m.frequency() - own.frequency()))))
        .orElseThrow();
  }

  private static CaseFile with(CaseFile base, String key, double millimetres) {
    return base.with(Map.of(key, String.format(Locale.ROOT, "%.4f mm", millimetres)))
        .caseFile()
        .orElseThrow();
  }
}
