package org.annulet.cases.points;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.function.DoubleFunction;
import org.annulet.cases.study.PointMode;
import org.annulet.cases.study.PointModes;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.api.Test;

/** Joining modes from point to point on families known in closed form. */
class ModeLinksTest {
  private static PointMode mode(String part, double growth, double hertz, double... shape) {
    double norm = 0;
    for (double v : shape) {
      norm += v * v;
    }
    double[] re = shape.clone();
    for (int i = 0; i < re.length; i++) {
      re[i] /= Math.sqrt(norm);
    }
    return new PointMode(
        new Complex(growth, 2 * Math.PI * hertz), part, null, 1, 1e-12, re, new double[re.length]);
  }

  private static int[] follow(DoubleFunction<PointModes> family, double from, double to) {
    return ModeLinks.follow(
            new ModeLinks.Place(from, family.apply(from)),
            new ModeLinks.Place(to, family.apply(to)),
            family)
        .to();
  }

  /**
   * Two modes whose frequencies cross while their fields stay what they are; listed by frequency.
   */
  private static PointModes crossing(double t) {
    PointMode a = mode("m", 1, 300 + 40 * t, 1, 0.2, 0);
    PointMode b = mode("m", -1, 320, 0, 0.1, 1);
    return new PointModes(a.frequency() < b.frequency() ? List.of(a, b) : List.of(b, a), true);
  }

  @Test
  void modesThatCross_areFollowedByTheirFields() {
    assertThat(follow(ModeLinksTest::crossing, 0, 1)).containsExactly(1, 0);
  }

  /**
   * λ = ±√(t² + g²) about 300 Hz with fields that turn: modes that veer, exact for a 2 × 2 matrix.
   */
  private static PointModes veering(double t) {
    double g = 0.05;
    double root = Math.hypot(t, g);
    double angle = 0.5 * Math.atan2(g, t);
    return new PointModes(
        List.of(
            mode("m", 0, 300 - 20 * root, -Math.sin(angle), Math.cos(angle)),
            mode("m", 0, 300 + 20 * root, Math.cos(angle), Math.sin(angle))),
        true);
  }

  @Test
  void modesThatVeer_keepTheirOrderHoweverLongTheStep() {
    assertThat(follow(ModeLinksTest::veering, -1, 1)).containsExactly(0, 1);
  }

  @Test
  void modesOfOtherOperators_neverChangePlaces() {
    DoubleFunction<PointModes> f =
        t ->
            new PointModes(
                List.of(
                    mode("order 1", 0, 300 + 30 * t, 1, 0), mode("order 2", 0, 320 - 30 * t, 1, 0)),
                true);

    assertThat(follow(f, 0, 1)).containsExactly(0, 1);
  }

  @Test
  void aModeThatAppears_isNoContinuationOfAnother() {
    DoubleFunction<PointModes> f =
        t -> {
          List<PointMode> modes = new ArrayList<>(List.of(mode("m", 0, 300, 1, 0, 0)));
          if (t > 0.4) {
            modes.add(0, mode("m", 0, 80, 0, 0, 1));
          }
          return new PointModes(modes, true);
        };

    assertThat(follow(f, 0, 1)).containsExactly(1);
  }
}
