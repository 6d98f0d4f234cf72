package org.annulet.solver.medium;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;
import static org.assertj.core.api.Assertions.withinPercentage;

import java.util.Random;
import org.junit.jupiter.api.Test;

class CloudAverageTest {
  /** 1/√T = (1 + a cos 3θ)/√1600 · (1 + b x): its mean over θ is known. */
  private static final double LOBE = 0.2;

  private interface Field {
    double at(double x, double r, double theta);
  }

  /** Random points of a sector 0.2 ≤ r ≤ 0.3, 0 ≤ x ≤ 0.2, crowded towards its first angle. */
  private static PointCloud cloud(int n, double width, Field field) {
    Random random = new Random(21);
    double[][] p = new double[4][n];
    for (int i = 0; i < n; i++) {
      double x = 0.2 * random.nextDouble();
      double r = 0.2 + 0.1 * random.nextDouble();
      double theta = width * Math.pow(random.nextDouble(), 1.5);
      p[0][i] = x;
      p[1][i] = r * Math.cos(theta);
      p[2][i] = r * Math.sin(theta);
      p[3][i] = field.at(x, r, theta);
    }
    return new PointCloud(p[0], p[1], p[2], p[3]);
  }

  @Test
  void meanOverTheAngle_keepsTheTravelTimeDespiteCrowdedPoints() {
    PointCloud c =
        cloud(
            15000,
            2 * Math.PI,
            (x, r, t) -> 1600 / Math.pow((1 + LOBE * Math.cos(3 * t)) * (1 + x), 2));
    CloudAverage mean = CloudAverage.overAngle(c);
    for (double x : new double[] {0.04, 0.1, 0.16}) {
      for (double r : new double[] {0.22, 0.25, 0.28}) {
        // 2 % of T: noise of one cell of random points.
        assertThat(mean.field().temperature(x, r))
            .isCloseTo(1600 / Math.pow(1 + x, 2), withinPercentage(2));
      }
    }
    // For u = 1 + a cos: mean u = 1, mean u² = 1 + a²/2, mean u⁻² = (1 − a²)^(−3/2).
    double spread = Math.sqrt((1 + LOBE * LOBE / 2) * Math.pow(1 - LOBE * LOBE, -1.5)) - 1;
    assertThat(mean.meanSpread()).isCloseTo(spread, withinPercentage(5));
    assertThat(mean.largestSpread()).isGreaterThan(mean.meanSpread());
  }

  @Test
  void sector_isAveragedOverItsOwnAnglesOnly() {
    double width = Math.PI / 6;
    PointCloud c = cloud(15000, width, (x, r, t) -> 1600 / Math.pow(1 + t / width, 2));
    // 1/√T rises linearly from 1/40 to 2/40 over the sector: mean 1.5/40.
    assertThat(CloudAverage.overAngle(c).field().temperature(0.1, 0.25))
        .isCloseTo(1600 / 2.25, withinPercentage(1));
  }

  @Test
  void meanOverTheGap_weighsWithTheRadius() {
    double width = 2 * Math.PI / 12;
    PointCloud c =
        cloud(
            12000,
            width,
            (x, r, t) -> 1600 / Math.pow((1 + 5 * (r - 0.2)) * (1 + 0.2 * Math.cos(12 * t)), 2));
    CloudAverage mean = CloudAverage.overGap(c, new RingShell(0.2, 0.3, 0.25, 12));
    // ∫ (1 + 5(r − 0.2)) r dr / ∫ r dr over 0.2…0.3: ∫ r² = 0.019/3, ∫ r = 0.025, so 5·0.25333 =
    // 1.26667.
    for (double share : new double[] {0.2, 0.5, 0.8}) {
      double y = share * width * 0.25;
      double u = 1.266667 * (1 + 0.2 * Math.cos(2 * Math.PI * share));
      assertThat(mean.field().temperature(0.1, y)).isCloseTo(1600 / (u * u), withinPercentage(1.5));
      // The other eleven sectors are alike.
      assertThat(mean.field().temperature(0.1, y + 7 * width * 0.25))
          .isCloseTo(mean.field().temperature(0.1, y), within(1e-6));
    }
  }

  @Test
  void uniformField_staysAsItIs() {
    PointCloud c = cloud(3000, 2 * Math.PI, (x, r, t) -> 1234);
    CloudAverage angle = CloudAverage.overAngle(c);
    assertThat(angle.field().temperature(0.1, 0.25)).isCloseTo(1234, within(1e-8));
    assertThat(angle.largestSpread()).isCloseTo(0, within(1e-12));
    assertThat(
            CloudAverage.overGap(c, new RingShell(0.2, 0.3, 0.25, 1)).field().temperature(0.1, 1))
        .isCloseTo(1234, within(1e-8));
  }

  @Test
  void misuse_isAnErrorThatSaysWhat() {
    PointCloud c = cloud(30, 1, (x, r, t) -> 1234);
    assertThatThrownBy(() -> CloudAverage.overGap(c, new RingShell(20, 30, 25, 1)))
        .hasMessageContaining("no point of the cloud");
    assertThatThrownBy(() -> new RingShell(0.3, 0.2, 0.25, 1))
        .hasMessageContaining("inner < outer");
    assertThatThrownBy(() -> new RingShell(0.2, 0.3, 0.25, 0)).hasMessageContaining("sector count");
    PointCloud twice =
        new PointCloud(new double[2], new double[2], new double[2], new double[] {500, 600});
    assertThatThrownBy(() -> CloudAverage.overAngle(twice)).hasMessageContaining("coincide");
  }
}
