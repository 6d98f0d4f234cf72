package org.annulet.cases.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.Random;
import org.annulet.cases.read.CaseReader;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.Results;
import org.annulet.solver.modes.Mode;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Two-ports and flame brushes through the case file, each against another way to say the same. */
class PortsAndBrushesTest {
  private static final String DUCT =
      """
      annulet: 1
      title: duct
      geometry:
        kind: plane
        depth: 10 mm
        mesh_size: MESH
        points: {a: [0 m, 0 m], b: [0.3 m, 0 m], c: [1 m, 0 m], d: [1 m, 50 mm], e: [0.3 m, 50 mm], f: [0 m, 50 mm]}
        edges:
          near: {line: [f, a]}
          cold_floor: {line: [a, b]}
          sheet: {line: [b, e]}
          cold_roof: {line: [e, f]}
          hot_floor: {line: [b, c]}
          far: {line: [c, d]}
          hot_roof: {line: [d, e]}
        zones:
          cold: {boundary: [near, cold_floor, sheet, cold_roof]}
          hot: {boundary: [hot_floor, far, hot_roof, sheet]}
      gas:
        mean_pressure: 1 bar
        zones:
          cold: {sound_speed: 347 m/s, density: 1.16270 kg/m3}
          hot: {sound_speed: 850 m/s, density: 0.193772 kg/m3}
      REST
      window: {frequency: [20 Hz, 700 Hz], growth_rate: [-900 1/s, 400 1/s]}
      """;

  @TempDir private Path folder;

  private Results solve(String rest, String mesh, String top) throws Exception {
    Path file =
        Files.writeString(
            folder.resolve("case.yaml"),
            DUCT.replace("REST", rest.strip()).replace("MESH", mesh).replace("700 Hz", top));
    Results results =
        new ModesStudy(CaseReader.read(file).orThrow(), Progress.SILENT)
            .modesOnly()
            .run("test")
            .results();
    assertThat(results.complete()).isTrue();
    return results;
  }

  private List<Mode> modes(String rest) throws Exception {
    return solve(rest, "25 mm", "700 Hz").modes().stream()
        .map(ModeEntry::view)
        .map(v -> v.mode())
        .toList();
  }

  private static void same(List<Mode> a, List<Mode> b, double relative) {
    assertThat(a).hasSameSizeAs(b).isNotEmpty();
    for (int k = 0; k < a.size(); k++) {
      double room = relative * b.get(k).frequency();
      assertThat(a.get(k).frequency()).isCloseTo(b.get(k).frequency(), within(room));
      assertThat(a.get(k).growthRate()).isCloseTo(b.get(k).growthRate(), within(6 * room));
    }
  }

  private static String port(String what) {
    return "walls: {far: open}\ntwo_ports: {sheet: {" + what + ", flow_from: cold}}";
  }

  @Test
  void measuredMatrixOfALoss_isTheLoss() throws Exception {
    StringBuilder table =
        new StringBuilder(
            "frequency [Hz], t11_real [1], t11_imaginary [1], t12_real [1], t12_imaginary [1],"
                + " t21_real [1], t21_imaginary [1], t22_real [1], t22_imaginary [1]\n");
    for (int f = 10; f <= 800; f += 30) {
      // p₁ − p₂ = (ζū + sℓ) ρ û over ρc, ζ = 3, ū = 20 m/s, ℓ = 30 mm
      table.append(
          String.format(
              Locale.ROOT,
              "%d, 1, 0, %.10f, %.10f, 0, 0, 1, 0%n",
              f,
              -3 * 20 / 347.0,
              -2 * Math.PI * f * 0.03 / 347));
    }
    Files.writeString(folder.resolve("matrix.csv"), table.toString());
    same(
        modes(port("transfer_table: matrix.csv")),
        modes(port("loss_coefficient: 3, velocity: 20 m/s, effective_length: 30 mm")),
        1e-4);
  }

  /** Slow against the flow, Howe's plate is a loss: Δp̂ = 2ρU/σ û, σ the porosity. */
  @Test
  void screenOfTinyHoles_isALoss() throws Exception {
    double bore = 0.02;
    double pitch = bore * Math.sqrt(Math.PI / 4 / 0.2); // 20 % open
    same(
        modes(
            port(
                String.format(
                    Locale.ROOT,
                    "perforated: {hole_bore: %.6f mm, pitch: %.6f mm, thickness: 0 mm,"
                        + " bias_velocity: 15 m/s}",
                    bore,
                    pitch))),
        modes(port("loss_coefficient: 10, velocity: 15 m/s")),
        2e-3);
  }

  private static String flame(String place) {
    return """
        walls: {far: open}
        flames:
          main:
            heat_release: 875 W
            place: {zone: hot, PLACE}
            reference: {edge: sheet, flow_from: cold}
            reference_velocity: 10 m/s
            response: {gain: 1, delay: 3 ms}
        """
        .replace("PLACE", place);
  }

  @Test
  void brushAlongAStraightPath_isTheBrushAlongTheAxis_andThatOfAFile() throws Exception {
    StringBuilder table = new StringBuilder("x [mm], y [mm], heat [1]\n");
    for (int i = 0; i <= 120; i++) {
      for (int j = 0; j <= 10; j++) {
        double x = 300 + 2.0 * i;
        double u = (x - 400) / 25;
        table.append(
            String.format(Locale.ROOT, "%.1f, %d, %.6f%n", x, 5 * j, Math.exp(-0.5 * u * u)));
      }
    }
    Files.writeString(folder.resolve("heat.csv"), table.toString());
    List<Mode> axis = modes(flame("brush: {centre: 400 mm, deviation: 25 mm}"));
    same(
        modes(
            flame(
                "brush: {centre: 100 mm, deviation: 25 mm, corners: [[300, 25, mm], [1000, 25,"
                    + " mm]]}")),
        axis,
        1e-9);
    same(modes(flame("heat_file: heat.csv")), axis, 1e-3);
    // and it is not the even spread
    assertThat(
            modes(flame("from: 300 mm, to: 1000 mm")).get(0).frequency() - axis.get(0).frequency())
        .isNotCloseTo(0, within(0.5));
  }

  /** As a pointwise wall a resonator would bring as many modes as nodes; as a port it does not. */
  @ParameterizedTest
  @ValueSource(strings = {"50 mm", "25 mm", "12 mm"})
  void resonatorOnAnEdge_bringsOneMode_howeverFineTheMesh(String mesh) throws Exception {
    String damper =
        """
        dampers:
          d:
            resonator: {neck_bore: 12 mm, neck_length: 25 mm, volume: 300 cm3, resistance: 0.01}
            at: {edge: far, x: 1 m, y: 25 mm}
        """;
    int without = solve("walls: {near: {impedance: 30}}", mesh, "1000 Hz").modes().size();
    assertThat(solve("walls: {near: {impedance: 30}}\n" + damper, mesh, "1000 Hz").modes())
        .hasSize(without + 1);
  }

  /** Passive walls, ports and dampers drawn by lot: without a flame nothing grows. */
  @Test
  void passiveEverything_growsNowhere() throws Exception {
    Random random = new Random(11);
    for (int k = 0; k < 12; k++) {
      String far =
          switch (k % 4) {
            case 0 ->
                "{impedance: [" + random.nextDouble() * 5 + ", " + 4 * random.nextGaussian() + "]}";
            case 1 ->
                "{perforated: {hole_bore: 2 mm, pitch: 9 mm, thickness: 1 mm, bias_velocity: "
                    + (2 + 20 * random.nextDouble())
                    + " m/s, cavity_depth: "
                    + (20 + 60 * random.nextDouble())
                    + " mm}}";
            case 2 -> "{radiating_end: {radius: " + (10 + 40 * random.nextDouble()) + " mm}}";
            default -> "{choked_nozzle: {mach: " + (0.05 + 0.3 * random.nextDouble()) + "}}";
          };
      String rest =
          "walls: {far: "
              + far
              + "}\ntwo_ports: {sheet: {loss_coefficient: "
              + 3 * random.nextDouble()
              + ", velocity: 15 m/s, effective_length: "
              + 40 * random.nextDouble()
              + " mm, flow_from: cold}}\n"
              + "dampers: {d: {quarter_wave: {bore: 20 mm, length: "
              + (100 + 300 * random.nextDouble())
              + " mm, resistance: "
              + 0.4 * random.nextDouble()
              + "}, at: {edge: near, x: 0 m, y: 25 mm}}}";
      for (ModeEntry mode : solve(rest, "25 mm", "700 Hz").modes()) {
        assertThat(mode.view().mode().growthRate()).as(rest).isLessThan(1e-5);
      }
    }
  }
}
