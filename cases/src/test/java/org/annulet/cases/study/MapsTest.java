package org.annulet.cases.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.annulet.cases.read.CaseReader;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.meaning.Chamber;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.ModeMaps;
import org.annulet.post.meaning.ParameterSensitivity;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Damper maps and drive maps: closed forms, and the sum over a wall against its sensitivity. */
class MapsTest {
  private static ModesStudy.Answer solve(Path folder, String text) throws IOException {
    Path file = folder.resolve("case.yaml");
    Files.writeString(file, text);
    return new ModesStudy(CaseReader.read(file).caseFile().orElseThrow(), Progress.SILENT)
        .run("test");
  }

  /** p = cos(πx/L): dσ/dA = −c cos²(πx/L)/V, derived from L(s) with one more port; V = 2 l. */
  @Test
  void halfWaveInADuct_mapIsTheSquareOfThePressure(@TempDir Path folder) throws IOException {
    ModesStudy.Answer answer =
        solve(
            folder,
            """
            annulet: 1
            title: Closed duct
            geometry:
              kind: plane
              depth: 50 mm
              mesh_size: 15 mm
              points_in: mm
              points: {a: [0, 0], b: [1000, 0], c: [1000, 40], d: [0, 40]}
              edges: {low: {line: [a, b]}, right: {line: [b, c]}, up: {line: [c, d]}, left: {line: [d, a]}}
              zones: {gas: {boundary: [low, right, up, left]}}
            gas:
              mean_pressure: 1 bar
              zones: {gas: {sound_speed: 340 m/s, density: 1.2 kg/m3}}
            window: {frequency: [100 Hz, 250 Hz], growth_rate: [-100 1/s, 100 1/s]}
            outputs: {field_files: none}
            """);
    assertThat(answer.results().modes()).hasSize(1);
    double[] map = answer.results().modes().get(0).maps().orElseThrow().damper();
    Mesh mesh = answer.chamber().mesh();
    double unit = 340 / 2e-3;
    int walls = 0;
    for (int v = 0; v < map.length; v++) {
      boolean wall =
          mesh.x(v) < 1e-9 || mesh.x(v) > 1 - 1e-9 || mesh.y(v) < 1e-9 || mesh.y(v) > 0.04 - 1e-9;
      assertThat(Double.isNaN(map[v])).isEqualTo(!wall);
      if (wall) {
        walls++;
        double p = Math.cos(Math.PI * mesh.x(v));
        assertThat(map[v]).isCloseTo(-unit * p * p, within(2e-3 * unit)); // mesh, h² k²
      }
    }
    assertThat(walls).isGreaterThan(50);
    int best = ModeMaps.best(map);
    assertThat(Math.min(mesh.x(best), 1 - mesh.x(best))).isCloseTo(0, within(1e-9));
  }

  private static String ring(String staging) {
    return """
        annulet: 1
        title: Small ring
        geometry:
          kind: ring
          burner_count: 6
          unrolled_radius: 150 mm
          mesh_size: 45 mm
          zones:
            - {name: plenum,  shape: annulus, mean_radius: 160 mm, gap: 60 mm, length: 120 mm}
            - {name: burners, shape: ducts,   mean_radius: 155 mm, bore: 45 mm, length: 60 mm}
            - {name: chamber, shape: annulus, mean_radius: 150 mm, gap: 80 mm, length: 200 mm}
        gas:
          mean_pressure: 6 bar
          zones:
            plenum:  {temperature: 600 K, gamma: 1.37, gas_constant: 287 J/(kg K)}
            burners: {as: plenum}
            chamber: {temperature: 1700 K, gamma: 1.29, gas_constant: 290 J/(kg K)}
        walls:
          chamber.outer_face: {admittance: 0.04}
          chamber.downstream: {admittance: 0.08}
        two_ports: {burners.inlet: {loss_coefficient: 0.8, velocity: 50 m/s}}
        flames:
          main:
            heat_release: 1.5 MW
            place: {zone: chamber, distance: [0 mm, 50 mm]}
            reference: {edge: burners.outlet}
            reference_velocity: 50 m/s
            response: {gain: 0.8, delay: 1.6 ms}
            STAGING
        window: {frequency: [500 Hz, 600 Hz], growth_rate: [-150 1/s, 150 1/s]}
        outputs: {field_files: none}
        """
        .replace("STAGING", staging);
  }

  /** One run each for burner cells and whole ring; both laws on every mode. */
  @ParameterizedTest
  @ValueSource(strings = {"", "staging: [{burners: every_second, delay: 2 ms}]"})
  void mapsOfARing_sumUpToLinerAndFlames(String staging, @TempDir Path folder) throws IOException {
    ModesStudy.Answer answer = solve(folder, ring(staging));
    assertThat(answer.results().modes()).hasSizeGreaterThan(1);
    assertThat(answer.results().modes()) // burners alternate: still threefold, so pairs stay exact
        .anyMatch(e -> e.view().mode().multiplicity() == 2);
    for (ModeEntry e : answer.results().modes()) {
      damperMapSummedOverALinedFaceIsTheSensitivityToItsAdmittance(answer.chamber(), e);
      driveMapAddsUpToTheFlamesShareOfTheGrowthRate(answer.chamber(), e);
    }
  }

  /** Dampers with the admittance of the liner all over its face are the liner. */
  private static void damperMapSummedOverALinedFaceIsTheSensitivityToItsAdmittance(
      Chamber chamber, ModeEntry e) {
    Mesh mesh = chamber.mesh();
    int zone = mesh.zoneNames().indexOf("chamber");
    double[] map = e.maps().orElseThrow().damper();
    double sum = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      if (mesh.zone(t) == zone) {
        double area = mesh.area(t) * (0.150 + 0.040) / 0.150; // of the outer face
        for (int k = 0; k < 3; k++) {
          sum += map[mesh.corner(t, k)] * area / 3;
        }
      }
    }
    ParameterSensitivity row =
        e.sensitivities().stream()
            .filter(p -> p.key().equals("walls.chamber.outer_face.admittance"))
            .findFirst()
            .orElseThrow();
    double expected = 100 * row.growthPerPercent();
    // ρc of a node at the joint of two gases is a mean; the rest is lumping, h² k²
    assertThat(0.04 * sum)
        .as(e.label().text())
        .isCloseTo(expected, within(0.04 * Math.abs(expected)));
  }

  private static void driveMapAddsUpToTheFlamesShareOfTheGrowthRate(Chamber chamber, ModeEntry e) {
    double flames =
        e.budget().orElseThrow().items().stream()
            .filter(i -> i.name().startsWith("flame "))
            .mapToDouble(i -> i.growthShare())
            .sum();
    double drive = e.maps().orElseThrow().totalDrive(chamber);
    assertThat(drive).as(e.label().text()).isCloseTo(flames, within(1e-6 * Math.abs(flames)));
  }
}
