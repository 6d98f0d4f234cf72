package org.annulet.cases.study;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.annulet.cases.read.CaseReader;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.Results;
import org.annulet.solver.modes.Mode;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * A whole plenum–burner–chamber ring, from its case file, against its one-dimensional transfer
 * matrix for order 0.
 */
class RingAgainstTransferMatrixTest {
  private static final double HEAT = 15.5e6;
  private static final double VELOCITY = 57;
  private static final double GAIN = 0.6;
  private static final double DELAY = 2.1e-3;
  private static final int BURNERS = 14;

  @TempDir private Path folder;

  @Test
  void annuliInARow_orderZero_isTheTransferMatrix_withinTheErrorBars() throws IOException {
    // Three annuli joined over the full circumference: order 0 is exactly one-dimensional, areas
    // step with the gaps.
    double radius = 0.33;
    double[] gap = {0.08, 0.012, 0.115};
    double[] area = new double[3];
    for (int z = 0; z < 3; z++) {
      area[z] = 2 * Math.PI * radius * gap[z];
    }
    RingTransferMatrix exact = exact(area, HEAT);
    Results results =
        solve(
            String.format(
                Locale.ROOT,
                """
                - {name: plenum, shape: annulus, mean_radius: 330 mm, gap: 80 mm, length: 200 mm}
                    - {name: burners, shape: annulus, mean_radius: 330 mm, gap: 12 mm, length: 100 mm}
                    - {name: chamber, shape: annulus, mean_radius: 330 mm, gap: 115 mm, length: 310 mm}"""),
            "chamber.inlet",
            330,
            12);

    List<Mode> longitudinal = orderZero(results);
    assertThat(results.complete()).isTrue();
    assertThat(longitudinal).hasSize(exact.count(-900, 900, 60, 1000));
    for (ModeEntry e : results.modes()) {
      if (e.label().azimuthalOrder() == 0) {
        Mode m = e.view().mode();
        Complex root = exact.rootNear(s(m));
        assertThat(Math.abs(m.frequency() - root.getImaginary() / (2 * Math.PI)))
            .as("frequency of %s", e.label().text())
            .isLessThan(e.view().frequencyError());
        assertThat(Math.abs(m.growthRate() - root.getReal()))
            .as("growth rate of %s", e.label().text())
            .isLessThan(e.view().growthError());
        assertThat(e.view().frequencyError()).isLessThan(2e-3 * m.frequency());
      }
    }
  }

  @Test
  void burnerDucts_orderZero_tendsToTheTransferMatrix_inProportionToThePitch() throws IOException {
    // The flow around the burner openings adds a length of the order of the pitch, which the
    // one-dimensional model lacks: halving
    // all transverse sizes must halve the difference.
    double[] difference = new double[2];
    for (int k = 0; k < 2; k++) {
      double shrink = k == 0 ? 20 : 40;
      double radius = 0.33 / shrink;
      double bore = 0.09 / shrink;
      double gap = 0.1 / shrink;
      double annulus = 2 * Math.PI * radius * gap / BURNERS;
      double duct = Math.PI / 4 * bore * bore;
      double heat = HEAT / (shrink * shrink);
      RingTransferMatrix exact = exact(new double[] {annulus, duct, annulus}, heat / BURNERS);
      Results results =
          solve(
              String.format(
                  Locale.ROOT,
                  """
                  - {name: plenum, shape: annulus, mean_radius: %1$.9g m, gap: %2$.9g m, length: 200 mm}
                      - {name: burners, shape: ducts, mean_radius: %1$.9g m, bore: %3$.9g m, length: 100 mm}
                      - {name: chamber, shape: annulus, mean_radius: %1$.9g m, gap: %2$.9g m, length: 310 mm}""",
                  radius,
                  gap,
                  bore),
              "burners.outlet",
              1000 * radius,
              heat / HEAT,
              40 / shrink);
      List<Mode> longitudinal = orderZero(results);
      assertThat(longitudinal).hasSize(exact.count(-900, 900, 60, 1000));
      for (Mode m : longitudinal) {
        difference[k] = Math.max(difference[k], s(m).subtract(exact.rootNear(s(m))).abs());
      }
    }
    assertThat(difference[0] / difference[1]).isBetween(1.7, 2.3);
  }

  private static RingTransferMatrix exact(double[] area, double heat) {
    double p = 12e5;
    double cold = Math.sqrt(1.371 * 287 * 650);
    double hot = Math.sqrt(1.288 * 297 * 1740);
    double dense = p / (287 * 650);
    // A thin flame between two gases: (γ − 1)/γ is the mean of its two sides.
    double expansion = 0.5 * (0.371 / 1.371 + 0.288 / 1.288);
    double strength = expansion * heat / (p * area[1] * VELOCITY) * GAIN;
    return new RingTransferMatrix(
        area,
        new double[] {0.2, 0.1, 0.31},
        new double[] {dense, dense, p / (297 * 1740)},
        new double[] {cold, cold, hot},
        0.05,
        0.02,
        strength,
        DELAY);
  }

  private Results solve(String zones, String sheet, double radiusMm, double size)
      throws IOException {
    return solve(zones, sheet, radiusMm, 1, size);
  }

  private Results solve(String zones, String sheet, double radiusMm, double heatShare, double size)
      throws IOException {
    String text =
        String.format(
            Locale.ROOT,
            """
            annulet: 1
            title: ring against its transfer matrix
            geometry:
              kind: ring
              burner_count: %d
              unrolled_radius: %.9g mm
              mesh_size: %.9g mm
              zones:
                %s
            gas:
              mean_pressure: 12 bar
              zones:
                plenum: {temperature: 650 K, gamma: 1.371, gas_constant: 287 J/(kg K)}
                burners: {as: plenum}
                chamber: {temperature: 1740 K, gamma: 1.288, gas_constant: 297 J/(kg K)}
            walls:
              plenum.upstream: {impedance: 20}
              chamber.downstream: {admittance: 0.02}
            flames:
              main:
                heat_release: %.12g MW
                place: {sheet: %s}
                reference_velocity: %.6g m/s
                response: {gain: %.6g, delay: %.6g s}
            window:
              frequency: [60 Hz, 1000 Hz]
              growth_rate: [-900 1/s, 900 1/s]
            """,
            BURNERS,
            radiusMm,
            size,
            zones,
            15.5 * heatShare,
            sheet,
            VELOCITY,
            GAIN,
            DELAY);
    Path file = folder.resolve("case.yaml");
    Files.writeString(file, text);
    return new ModesStudy(CaseReader.read(file).orThrow(), Progress.SILENT)
        .modesOnly()
        .run("test")
        .results();
  }

  private static List<Mode> orderZero(Results results) {
    List<Mode> modes = new ArrayList<>();
    for (ModeEntry e : results.modes()) {
      if (e.label().azimuthalOrder() == 0) {
        modes.add(e.view().mode());
      }
    }
    return modes;
  }

  private static Complex s(Mode m) {
    return new Complex(m.growthRate(), 2 * Math.PI * m.frequency());
  }
}
