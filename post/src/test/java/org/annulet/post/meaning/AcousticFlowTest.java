package org.annulet.post.meaning;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.Meshes;
import org.junit.jupiter.api.Test;

/** Velocity and intensity of plane and spinning waves in closed form. */
class AcousticFlowTest {
  private static final double DENSITY = 1.2; // kg/m³
  private static final double SPEED = 340; // m/s
  private static final double[] HERTZ = {170, 0}; // half a wave to the metre

  private static Chamber gas(Chamber chamber) {
    double[] density = new double[chamber.mesh().triangleCount()];
    double[] modulus = new double[density.length];
    Arrays.fill(density, DENSITY);
    Arrays.fill(modulus, DENSITY * SPEED * SPEED);
    return chamber.withGas(density, modulus);
  }

  private static double middleX(Mesh mesh, int t) {
    return (mesh.cornerX(t, 0) + mesh.cornerX(t, 1) + mesh.cornerX(t, 2)) / 3;
  }

  /** p' = Re(e^{i(ωt − kx)}) runs downstream: û = p̂/(ρc), I = 1/(2ρc) along x. */
  @Test
  void planeWaveRunningDownstream_carriesHalfPSquaredOverRhoC() {
    Mesh mesh = Meshes.rectangle(new double[] {1, 0, 0.02}, 200, 4, "duct");
    AcousticFlow flow =
        AcousticFlow.of(
            gas(Chamber.plane(mesh)),
            Meshes.mode(
                mesh,
                HERTZ,
                null,
                (x, y) -> Math.cos(Math.PI * x),
                (x, y) -> -Math.sin(Math.PI * x)));
    double impedance = DENSITY * SPEED;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      double phase = Math.PI * middleX(mesh, t);
      // a side is 1/400 of a wave: the slope of the chord is off by less than kh/2 = 0.8 %
      assertThat(flow.re()[3 * t]).isCloseTo(Math.cos(phase) / impedance, within(8e-3 / impedance));
      assertThat(flow.im()[3 * t])
          .isCloseTo(-Math.sin(phase) / impedance, within(8e-3 / impedance));
      assertThat(flow.intensity()[3 * t]).isCloseTo(0.5 / impedance, within(4e-3 / impedance));
      assertThat(flow.intensity()[3 * t + 1]).isCloseTo(0, within(1e-12));
      assertThat(flow.intensity()[3 * t + 2]).isZero();
    }
  }

  /** Standing: û = −i sin(kx)/(ρc) is a quarter of a cycle behind, and nothing is carried. */
  @Test
  void standingWave_carriesNothing() {
    Mesh mesh = Meshes.rectangle(new double[] {1, 0, 0.02}, 200, 4, "duct");
    AcousticFlow flow =
        AcousticFlow.of(
            gas(Chamber.plane(mesh)),
            Meshes.mode(mesh, HERTZ, null, (x, y) -> Math.cos(Math.PI * x)));
    double impedance = DENSITY * SPEED;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      assertThat(flow.im()[3 * t])
          .isCloseTo(-Math.sin(Math.PI * middleX(mesh, t)) / impedance, within(8e-3 / impedance));
      assertThat(flow.re()[3 * t]).isCloseTo(0, within(1e-15));
      assertThat(flow.intensity()[3 * t]).isCloseTo(0, within(1e-15));
    }
  }

  /**
   * p̂ e^{imθ} runs towards smaller θ: û_θ = −m p̂/(ωρr), and so the intensity; on the ring m/r by
   * the arc of the zone and not of the unrolled radius, once by zone radius and once by formula.
   */
  @Test
  void spinningWave_carriesAgainstTheSignOfItsOrder() {
    int m = 2;
    double omega = 2 * Math.PI * HERTZ[0];
    Mesh half = Meshes.rectangle(new double[] {0.1, 0.4, 0.2}, 4, 8, "gap");
    AcousticFlow section =
        AcousticFlow.of(gas(Chamber.section(half)), Meshes.mode(half, HERTZ, m, (x, r) -> 1));
    for (int t = 0; t < half.triangleCount(); t++) {
      double r = (half.cornerY(t, 0) + half.cornerY(t, 1) + half.cornerY(t, 2)) / 3;
      double u = -m / (omega * DENSITY * r);
      assertThat(section.re()[3 * t + 2]).isCloseTo(u, within(1e-14));
      assertThat(section.im()[3 * t + 2]).isCloseTo(0, within(1e-14));
      assertThat(section.intensity()[3 * t + 2]).isCloseTo(u / 2, within(1e-14));
    }
    double reference = 1 / Math.PI; // period 2 m
    double radius = 0.25; // of the zone
    Mesh mesh = Meshes.ring(0.1, 2, 2, 400, "gap");
    AcousticFlow ring =
        AcousticFlow.of(
            gas(Chamber.ring(mesh, new double[] {radius})),
            Meshes.mode(
                mesh,
                HERTZ,
                null,
                (x, y) -> Math.cos(m * y / reference),
                (x, y) -> Math.sin(m * y / reference)));
    double u = -m / (omega * DENSITY * radius);
    for (int t = 0; t < mesh.triangleCount(); t++) {
      // a cell is 1/200 of a wave: chord against arc 1e-4, mean of three corners likewise
      assertThat(ring.intensity()[3 * t + 1]).isCloseTo(u / 2, within(1e-3 * Math.abs(u)));
    }
  }
}
