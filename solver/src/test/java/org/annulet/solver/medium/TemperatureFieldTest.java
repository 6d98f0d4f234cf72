package org.annulet.solver.medium;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

class TemperatureFieldTest {
  private static final double[] X = {0, 0.1, 0.4};
  private static final double[] KELVIN = {700, 1900, 1600};

  @Test
  void axialProfile_isLinearBetweenItsPointsAndHeldBeyond() {
    AxialProfile profile = new AxialProfile(X, KELVIN);
    assertThat(profile.temperature(0.05, 9)).isCloseTo(1300, within(1e-9));
    assertThat(profile.temperature(0.1, 0)).isCloseTo(1900, within(1e-9));
    assertThat(profile.temperature(0.3, 0)).isCloseTo(1700, within(1e-9));
    assertThat(profile.temperature(-1, 0)).isEqualTo(700);
    assertThat(profile.temperature(1, 0)).isEqualTo(1600);
    assertThat(profile.distanceOutside(0.2, 5)).isZero();
    assertThat(profile.distanceOutside(-0.02, 5)).isCloseTo(0.02, within(1e-15));
    assertThat(profile.distanceOutside(0.5, 5)).isCloseTo(0.1, within(1e-15));
  }

  @Test
  void pathProfile_followsTheGasRoundABend() {
    // Upstream along y = 0.4 towards −x, turned at x = 0, back along y = 0.2: a reverse-flow
    // chamber.
    PathProfile path =
        new PathProfile(
            new double[] {0.3, 0, 0, 0.5},
            new double[] {0.4, 0.4, 0.2, 0.2},
            new double[] {0, 0.3, 0.5, 1.0},
            new double[] {600, 700, 1100, 1900});
    assertThat(path.length()).isCloseTo(1.0, within(1e-15));
    assertThat(path.temperature(0.15, 0.45)).isCloseTo(650, within(1e-9));
    assertThat(path.temperature(-0.05, 0.3)).isCloseTo(900, within(1e-9));
    // The same x on the way back is hot.
    assertThat(path.temperature(0.15, 0.18)).isCloseTo(1340, within(1e-9));
    assertThat(path.distanceOutside(0.15, 0.18)).isZero();
  }

  @Test
  void table_isBilinearOnASectionAndClosedOnARing() {
    double[] y = {0.1, 0.3};
    double[][] t = {{600, 800}, {1000, 1400}, {1200, 2000}};
    TemperatureTable section = TemperatureTable.onSection(X, y, t);
    assertThat(section.temperature(0.05, 0.2)).isCloseTo(950, within(1e-9));
    assertThat(section.temperature(0.25, 0.3)).isCloseTo(1700, within(1e-9));
    assertThat(section.temperature(9, 9)).isEqualTo(2000);
    assertThat(section.distanceOutside(0.4 + 0.03, 0.3 + 0.04)).isCloseTo(0.05, within(1e-12));
    TemperatureTable ring = TemperatureTable.onRing(X, y, t, 0.5);
    assertThat(ring.temperature(0, 0.2)).isCloseTo(700, within(1e-9));
    // From 0.3 (800 K) on to 0.6, which is 0.1 again (600 K).
    assertThat(ring.temperature(0, 0.45)).isCloseTo(700, within(1e-9));
    assertThat(ring.temperature(0, 0.45 + 3 * 0.5)).isCloseTo(700, within(1e-9));
    assertThat(ring.temperature(0, -0.05)).isCloseTo(700, within(1e-9));
    assertThat(ring.distanceOutside(0, 7.7)).isZero();
  }

  @Test
  void misuse_isAnErrorThatSaysWhere() {
    assertThatThrownBy(() -> new AxialProfile(new double[] {0, 0.2, 0.2}, KELVIN))
        .hasMessageContaining("strictly ascending, got 0.2 m as value 3");
    assertThatThrownBy(() -> new AxialProfile(X, new double[] {600, -1, 3}))
        .hasMessageContaining("got -1 K at x = 0.1 m");
    assertThatThrownBy(() -> new AxialProfile(X, new double[] {600}))
        .hasMessageContaining("as many temperatures");
    assertThatThrownBy(() -> new AxialProfile(new double[] {1}, new double[] {600}))
        .hasMessageContaining("at least two");
    assertThatThrownBy(() -> new PathProfile(new double[] {0, 0}, new double[] {1, 1}, X, KELVIN))
        .hasMessageContaining("coincide");
    assertThatThrownBy(
            () ->
                TemperatureTable.onSection(
                    X, new double[] {0, 1}, new double[][] {{1, 2}, {1, 2}, {1}}))
        .hasMessageContaining("row 3");
    assertThatThrownBy(() -> TemperatureTable.onRing(X, new double[] {0, 1}, new double[3][2], 0.5))
        .hasMessageContaining("cannot repeat");
    assertThatThrownBy(() -> new UniformTemperature(Double.NaN)).hasMessageContaining("kelvin");
  }
}
