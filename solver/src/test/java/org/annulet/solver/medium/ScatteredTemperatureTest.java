package org.annulet.solver.medium;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.Random;
import java.util.function.DoubleBinaryOperator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class ScatteredTemperatureTest {
  private static ScatteredTemperature sampled(int n, long seed, DoubleBinaryOperator t) {
    Random random = new Random(seed);
    double[] x = new double[n + 4];
    double[] y = new double[n + 4];
    double[] k = new double[n + 4];
    for (int i = 0; i < n + 4; i++) {
      x[i] = i < 4 ? i % 2 : random.nextDouble();
      y[i] = i < 4 ? i / 2 : random.nextDouble();
      k[i] = t.applyAsDouble(x[i], y[i]);
    }
    return ScatteredTemperature.onSection(x, y, k);
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4, 5})
  void linearField_comesBackExactlyInsideTheData(long seed) {
    ScatteredTemperature f = sampled(500, seed, (x, y) -> 900 + 700 * x - 300 * y);
    Random random = new Random(-seed);
    int exact = 0;
    for (int q = 0; q < 200; q++) {
      double x = 0.15 + 0.7 * random.nextDouble();
      double y = 0.15 + 0.7 * random.nextDouble();
      double error = Math.abs(f.temperature(x, y) - (900 + 700 * x - 300 * y));
      // The ridge of the fit, 1e-10, is all that is left, save where a gap in random points leaves
      // every neighbour warmer (or colder) than the place: there the fit is held at their range;
      // half a spacing of 1/√500 times the slope of 762 K/m is 17 K.
      exact += error < 1e-4 ? 1 : 0;
      assertThat(error).as("seed %d at (%s, %s)", seed, x, y).isLessThan(17);
    }
    assertThat(exact).as("seed %d", seed).isGreaterThanOrEqualTo(197);
  }

  @Test
  void smoothField_convergesWithTheSquareOfTheSpacing() {
    DoubleBinaryOperator t = (x, y) -> 1400 + 300 * Math.sin(3 * x) * Math.cos(4 * y);
    double coarse = rms(sampled(1000, 7, t), t);
    double fine = rms(sampled(16000, 7, t), t);
    // A quarter of the spacing: order 2 would give 16.
    assertThat(coarse / fine).isBetween(9.0, 30.0);
  }

  private static double rms(ScatteredTemperature f, DoubleBinaryOperator t) {
    Random random = new Random(99);
    double sum = 0;
    for (int q = 0; q < 2000; q++) {
      double x = 0.1 + 0.8 * random.nextDouble();
      double y = 0.1 + 0.8 * random.nextDouble();
      sum += Math.pow(f.temperature(x, y) - t.applyAsDouble(x, y), 2);
    }
    return Math.sqrt(sum / 2000);
  }

  @Test
  void coldJet_keepsItsPeakAndNothingOvershoots() {
    DoubleBinaryOperator jet = (x, y) -> 1900 - 1200 * Math.exp(-Math.pow((x - 0.5) / 0.03, 2));
    ScatteredTemperature f = sampled(4000, 3, jet);
    Random random = new Random(5);
    double least = Double.POSITIVE_INFINITY;
    for (int q = 0; q < 4000; q++) {
      double t = f.temperature(0.4 + 0.2 * random.nextDouble(), random.nextDouble());
      assertThat(t).isBetween(700.0, 1900.0);
      least = Math.min(least, t);
    }
    assertThat(least).isLessThan(720);
  }

  @Test
  void answer_isTheDataAtAPointAndContinuousNearIt() {
    double[] x = {0, 1, 0, 1, 0.5};
    double[] y = {0, 0, 1, 1, 0.5};
    double[] t = {500, 600, 700, 800, 1500};
    ScatteredTemperature f = ScatteredTemperature.onSection(x, y, t);
    for (int i = 0; i < 5; i++) {
      assertThat(f.temperature(x[i], y[i])).isEqualTo(t[i]);
      assertThat(f.temperature(x[i] + 1e-7, y[i])).isCloseTo(t[i], within(1e-2));
    }
  }

  @Test
  void pointsOnOneLine_areInterpolatedAlongIt() {
    double[] x = {0, 0.1, 0.2, 0.3, 0.4, 0.5};
    double[] t = {500, 600, 700, 800, 900, 1000};
    ScatteredTemperature f = ScatteredTemperature.onSection(x, new double[6], t);
    assertThat(f.temperature(0.25, 0.02)).isCloseTo(750, within(1e-3));
    assertThat(f.distanceOutside(0.25, 0.02)).isCloseTo(0.02, within(1e-12));
    ScatteredTemperature one =
        ScatteredTemperature.onSection(new double[1], new double[1], new double[] {650});
    assertThat(one.temperature(3, 4)).isEqualTo(650);
    assertThat(one.distanceOutside(3, 4)).isCloseTo(5, within(1e-12));
  }

  @Test
  void distanceOutside_isThatFromTheHullOrIntoAHole() {
    ScatteredTemperature f = sampled(4000, 11, (x, y) -> 1000);
    assertThat(f.distanceOutside(0.3, 0.6)).isZero();
    assertThat(f.distanceOutside(1.3, 1.4)).isCloseTo(0.5, within(1e-12));
    assertThat(f.distanceOutside(0.5, -0.2)).isCloseTo(0.2, within(1e-12));
    // Points on a circle of radius 1 only: its centre is 1 away from all of them.
    int n = 400;
    double[] x = new double[n];
    double[] y = new double[n];
    double[] t = new double[n];
    for (int i = 0; i < n; i++) {
      x[i] = Math.cos(2 * Math.PI * i / n);
      y[i] = Math.sin(2 * Math.PI * i / n);
      t[i] = 900;
    }
    assertThat(ScatteredTemperature.onSection(x, y, t).distanceOutside(0, 0)).isBetween(0.85, 1.0);
  }

  @Test
  void ring_repeatsWithItsPeriodWithoutASeam() {
    Random random = new Random(4);
    int n = 3000;
    double period = 0.5;
    double[] x = new double[n];
    double[] y = new double[n];
    double[] t = new double[n];
    DoubleBinaryOperator exact = (a, b) -> 1500 + 400 * Math.cos(2 * Math.PI * b / 0.5);
    for (int i = 0; i < n; i++) {
      x[i] = random.nextDouble() * 0.3;
      y[i] = (random.nextDouble() + random.nextInt(5) - 2) * period;
      t[i] = exact.applyAsDouble(x[i], y[i]);
    }
    ScatteredTemperature f = ScatteredTemperature.onRing(x, y, t, period);
    for (double q : new double[] {0, 0.003, 0.497, 0.5, 1.2, -0.4}) {
      assertThat(f.temperature(0.15, q)).isCloseTo(exact.applyAsDouble(0, q), within(4.0));
      assertThat(f.temperature(0.15, q + 3 * period))
          .isCloseTo(f.temperature(0.15, q), within(1e-6));
    }
    assertThat(f.distanceOutside(0.15, 17.3)).isZero();
    assertThatThrownBy(() -> ScatteredTemperature.onRing(x, y, t, 0))
        .hasMessageContaining("period");
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3})
  void nearestPoints_areThoseOfACompleteSearch(long seed) {
    Random random = new Random(seed);
    int n = 700;
    double[][] p = new double[3][n];
    for (double[] axis : p) {
      for (int i = 0; i < n; i++) {
        // Rounded, so that many coordinates coincide as on structured meshes.
        axis[i] = Math.round(random.nextDouble() * 12) / 12.0;
      }
    }
    PointTree tree = new PointTree(p);
    for (int q = 0; q < 100; q++) {
      double[] at = {random.nextDouble(), random.nextDouble(), random.nextDouble()};
      double[] all = new double[n];
      for (int i = 0; i < n; i++) {
        all[i] =
            Math.pow(p[0][i] - at[0], 2)
                + Math.pow(p[1][i] - at[1], 2)
                + Math.pow(p[2][i] - at[2], 2);
      }
      Arrays.sort(all);
      double[] squared = new double[15];
      assertThat(tree.nearest(at, new int[15], squared)).isEqualTo(15);
      for (int k = 0; k < 15; k++) {
        assertThat(squared[k]).as("seed %d", seed).isCloseTo(all[k], within(1e-12));
      }
    }
  }

  @Test
  void malformedCloud_isAnErrorThatSaysWhere() {
    assertThatThrownBy(
            () -> new PointCloud(new double[2], new double[2], new double[1], new double[2]))
        .hasMessageContaining("got 2, 2, 1, 2");
    assertThatThrownBy(
            () -> new PointCloud(new double[2], new double[2], new double[2], new double[] {5, 0}))
        .hasMessageContaining("point 2");
    assertThatThrownBy(
            () ->
                new PointCloud(
                    new double[] {Double.NaN}, new double[1], new double[1], new double[] {5}))
        .hasMessageContaining("point 1 of the cloud is not finite");
  }
}
