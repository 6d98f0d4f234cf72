package org.annulet.cases.study;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Random;
import org.annulet.cases.read.CaseReader;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.ModeView;
import org.annulet.post.meaning.Results;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * The error bars against families of chambers whose modes are known: the truth must lie inside
 * nearly always, and the bars must not be much wider than the true errors.
 */
class ErrorBarsTest {
  private static final double C = 340;

  @TempDir private Path folder;

  /** True error over error bar, for every frequency and (where it is not zero) growth rate. */
  private final List<Double> used = new ArrayList<>();

  @Test
  void truthLiesInsideTheBars_andTheBarsAreNotWasteful() throws IOException {
    rectangles();
    reentrantCorner();
    activeRings();

    double[] sorted = used.stream().mapToDouble(Double::doubleValue).sorted().toArray();
    long inside = Arrays.stream(sorted).filter(q -> q <= 1).count();
    assertThat(sorted.length).isGreaterThan(150);
    assertThat(inside / (double) sorted.length)
        .as(
            "part of %d values inside their bars; worst %s",
            sorted.length, sorted[sorted.length - 1])
        .isGreaterThanOrEqualTo(0.99);
    assertThat(1 / sorted[sorted.length / 2]).as("bar over true error, median").isLessThan(4);
  }

  /** Rigid rectangles: f = c/2 √((i/a)² + (j/b)²), closed form; smooth fields, order 2. */
  private void rectangles() throws IOException {
    Random random = new Random(20260101);
    for (int k = 0; k < 12; k++) {
      double a = 0.8 + 0.4 * random.nextDouble();
      double b = 0.31 + 0.2 * random.nextDouble();
      List<Double> exact = new ArrayList<>();
      for (int i = 0; i < 8; i++) {
        for (int j = 0; j < 5; j++) {
          double f = C / 2 * Math.hypot(i / a, j / b);
          if (f > 60 && f < 900) {
            exact.add(f);
          }
        }
      }
      exact.sort(null);
      Results results =
          solve(
              String.format(
                  Locale.ROOT,
                  """
                  geometry:
                    kind: plane
                    depth: 10 mm
                    mesh_size: 40 mm
                    points: {a: [0 m, 0 m], b: [%1$.9g m, 0 m], c: [%1$.9g m, %2$.9g m], d: [0 m, %2$.9g m]}
                    edges: {wall: {line: [a, b, c, d, a]}}
                    zones: {gas: {boundary: [wall]}}
                  gas:
                    mean_pressure: 1 bar
                    zones: {gas: {sound_speed: 340 m/s, density: 1.2 kg/m3}}
                  window: {frequency: [60 Hz, 900 Hz], growth_rate: [-50 1/s, 50 1/s]}
                  """,
                  a,
                  b));
      // A frequency just below the window's top may be computed just above it: compare what lies
      // well inside.
      List<ModeView> modes = views(results);
      assertThat(modes.size()).isBetween(exact.size() - 2, exact.size());
      for (int i = 0; i < modes.size(); i++) {
        judge(modes.get(i).mode().frequency() - exact.get(i), modes.get(i).frequencyError());
      }
    }
  }

  /**
   * The rigid L: squares of 1 m, re-entrant corner, whose first field is singular (order 4/3).
   * Eigenvalues of −Δ from Dauge's benchmark page for the L-shaped domain, from memory.
   */
  private void reentrantCorner() throws IOException {
    double[] lambda = {1.47562182408, 3.53403136678, 9.86960440109, 9.86960440109, 11.3894793979};
    Results results =
        solve(
            """
            geometry:
              kind: plane
              depth: 10 mm
              mesh_size: 50 mm
              points: {a: [-1 m, -1 m], b: [0 m, -1 m], c: [0 m, 0 m], d: [1 m, 0 m], e: [1 m, 1 m], f: [-1 m, 1 m]}
              edges: {wall: {line: [a, b, c, d, e, f, a]}}
              zones: {gas: {boundary: [wall]}}
            gas:
              mean_pressure: 1 bar
              zones: {gas: {sound_speed: 340 m/s, density: 1.2 kg/m3}}
            window: {frequency: [20 Hz, 190 Hz], growth_rate: [-50 1/s, 50 1/s]}
            """);
    List<ModeView> modes = views(results);
    assertThat(modes).hasSize(lambda.length);
    for (int i = 0; i < lambda.length; i++) {
      double exact = C * Math.sqrt(lambda[i]) / (2 * Math.PI);
      judge(modes.get(i).mode().frequency() - exact, modes.get(i).frequencyError());
    }
  }

  /** Three annuli with a flame sheet, order 0: transfer matrix, frequencies and growth rates. */
  private void activeRings() throws IOException {
    Random random = new Random(7);
    for (int k = 0; k < 8; k++) {
      double[] length = {
        0.15 + 0.1 * random.nextDouble(),
        0.08 + 0.05 * random.nextDouble(),
        0.25 + 0.1 * random.nextDouble()
      };
      double hot = 1500 + 400 * random.nextDouble();
      double gain = 0.2 + 0.6 * random.nextDouble();
      double delay = (1.5 + 2 * random.nextDouble()) * 1e-3;
      double[] gap = {0.08, 0.02, 0.1};
      double[] area = new double[3];
      for (int z = 0; z < 3; z++) {
        area[z] = 2 * Math.PI * 0.3 * gap[z];
      }
      double p = 1e6;
      double cold = p / (287 * 700.0);
      double heat = 8e6;
      RingTransferMatrix exact =
          new RingTransferMatrix(
              area,
              length,
              new double[] {cold, cold, p / (287 * hot)},
              new double[] {
                Math.sqrt(1.33 * 287 * 700),
                Math.sqrt(1.33 * 287 * 700),
                Math.sqrt(1.33 * 287 * hot)
              },
              0.05,
              0.03,
              0.33 / 1.33 * heat / (p * area[1] * 50) * gain,
              delay);
      Results results =
          solve(
              String.format(
                  Locale.ROOT,
                  """
                  geometry:
                    kind: ring
                    burner_count: 8
                    mesh_size: 20 mm
                    zones:
                      - {name: plenum, shape: annulus, mean_radius: 300 mm, gap: 80 mm, length: %.9g m}
                      - {name: burners, shape: annulus, mean_radius: 300 mm, gap: 20 mm, length: %.9g m}
                      - {name: chamber, shape: annulus, mean_radius: 300 mm, gap: 100 mm, length: %.9g m}
                  gas:
                    mean_pressure: 10 bar
                    zones:
                      plenum: {temperature: 700 K, gamma: 1.33, gas_constant: 287 J/(kg K)}
                      burners: {as: plenum}
                      chamber: {temperature: %.9g K, gamma: 1.33, gas_constant: 287 J/(kg K)}
                  walls:
                    plenum.upstream: {impedance: 20}
                    chamber.downstream: {admittance: 0.03}
                  flames:
                    main:
                      heat_release: 8 MW
                      place: {sheet: chamber.inlet}
                      reference_velocity: 50 m/s
                      response: {gain: %.9g, delay: %.9g s}
                  window: {frequency: [80 Hz, 900 Hz], growth_rate: [-800 1/s, 800 1/s]}
                  """,
                  length[0],
                  length[1],
                  length[2],
                  hot,
                  gain,
                  delay));
      assertThat(results.complete()).isTrue();
      for (ModeEntry e : results.modes()) {
        if (e.label().azimuthalOrder() == 0) {
          ModeView v = e.view();
          Complex root =
              exact.rootNear(
                  new Complex(v.mode().growthRate(), 2 * Math.PI * v.mode().frequency()));
          judge(v.mode().frequency() - root.getImaginary() / (2 * Math.PI), v.frequencyError());
          judge(v.mode().growthRate() - root.getReal(), v.growthError());
        }
      }
    }
  }

  private void judge(double error, double bar) {
    assertThat(bar).as("an error bar").isGreaterThan(0).isFinite();
    used.add(Math.abs(error) / bar);
  }

  private Results solve(String body) throws IOException {
    Path file = folder.resolve("case.yaml");
    Files.writeString(file, "annulet: 1\ntitle: a family with a known answer\n" + body);
    return new ModesStudy(CaseReader.read(file).orThrow(), Progress.SILENT)
        .modesOnly()
        .run("test")
        .results();
  }

  private static List<ModeView> views(Results results) {
    return results.modes().stream().map(ModeEntry::view).toList();
  }
}
