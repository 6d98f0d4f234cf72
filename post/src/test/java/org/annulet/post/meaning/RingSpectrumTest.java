package org.annulet.post.meaning;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.Meshes;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Azimuthal content of waves whose two running parts are known. */
class RingSpectrumTest {
  private static RingSpectrum of(int order, double plus, double minus, double turn) {
    Mesh mesh = Meshes.ring(0.4, 2, 8, 144, "left", "right");
    return new RingSpectrum(
        Chamber.ring(mesh, new double[] {1 / Math.PI, 1 / Math.PI}),
        Meshes.mode(
            mesh,
            new double[] {500, 0},
            null,
            (x, y) -> (plus + minus) * Math.cos(order * (Math.PI * y - turn)),
            (x, y) -> (plus - minus) * Math.sin(order * (Math.PI * y - turn))));
  }

  /** A e^{im(θ−φ)} + B e^{−im(θ−φ)}: spin (A² − B²)/(A² + B²), largest pressure at φ. */
  @ParameterizedTest
  @CsvSource({"1, 2, 1, 0.6", "1, 1, 2, -0.6", "3, 1, 3, -0.8", "4, 1, 1, 0", "6, 1, 0, 1"})
  void spin_isTheDifferenceOfTheEnergiesOfBothWays(
      int order, double plus, double minus, double spin) {
    double turn = Math.toRadians(11);
    RingSpectrum spectrum = of(order, plus, minus, turn);
    assertThat(spectrum.order()).isEqualTo(order);
    assertThat(spectrum.spin(order)).isCloseTo(spin, within(1e-3));
    assertThat(spectrum.share(order)).isCloseTo(1, within(2e-3)); // linear between the nodes
    if (minus > 0) {
      assertThat(spectrum.antinode(order)).isCloseTo(turn, within(1e-3));
    }
  }

  /** Integrals of one strip: p̂ = A e^{imθ} + B e^{−imθ} has A to B as its coefficients. */
  @Test
  void coefficients_areInTheRatioOfTheAmplitudes() {
    RingSpectrum spectrum = of(2, 3, 1, 0);
    int strip = spectrum.strongestStrip(2);
    double[] plus = spectrum.coefficient(strip, 2);
    double[] minus = spectrum.coefficient(strip, -2);
    assertThat(plus[0] / minus[0]).isCloseTo(3, within(1e-2));
    assertThat(plus[1] / plus[0]).isCloseTo(0, within(1e-3));
  }

  /** A wave twice as strong on the right is read from a strip there. */
  @Test
  void strongestStrip_liesWhereTheOrderIsStrong() {
    Mesh mesh = Meshes.ring(0.4, 2, 32, 96, "left", "right");
    RingSpectrum spectrum =
        new RingSpectrum(
            Chamber.ring(mesh, new double[] {1 / Math.PI, 1 / Math.PI}),
            Meshes.mode(
                mesh,
                new double[] {500, 0},
                null,
                (x, y) -> x * Math.cos(Math.PI * y) + (0.4 - x) * Math.cos(2 * Math.PI * y)));
    assertThat(spectrum.strongestStrip(1)).isEqualTo(31); // two zones of 16 strips
    assertThat(spectrum.strongestStrip(2)).isZero();
  }
}
