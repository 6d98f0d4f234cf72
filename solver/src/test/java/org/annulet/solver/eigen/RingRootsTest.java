package org.annulet.solver.eigen;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Arrays;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.modes.ModeSet;
import org.annulet.solver.modes.Window;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Rings with point dampers and staged flames against the once-around transfer matrix (reference
 * values E1–E4): split and exact pairs, both members of each.
 */
class RingRootsTest {
  record Row(String id, double[] g, double tau, double[][] roots) {
    @Override
    public String toString() {
      return id;
    }
  }

  static Stream<Row> rows() {
    return Stream.of(
        new Row(
            "E1 m=1..3",
            new double[0],
            0,
            new double[][] {
              {254.647909, 0},
              {254.647909, 0},
              {509.295818, 0},
              {509.295818, 0},
              {763.943727, 0},
              {763.943727, 0}
            }),
        new Row(
            "E2.3",
            dampers(3),
            0,
            new double[][] {
              {255.00185, -76.6506},
              {255.00185, -76.6506},
              {508.94188, -76.6506},
              {508.94188, -76.6506},
              {763.94373, 0},
              {763.94373, -153.3011}
            }),
        new Row(
            "E2.4",
            dampers(4),
            0,
            new double[][] {
              {254.64791, -102.2007},
              {254.64791, -102.2007},
              {509.29582, 0},
              {509.29582, -204.4015},
              {763.94373, -102.2007},
              {763.94373, -102.2007}
            }),
        new Row(
            "E3.1 and E3.2",
            staged(t -> 1.0),
            3.5e-3,
            new double[][] {
              {259.96605, 54.3301}, {259.96605, 54.3301}, {519.35321, 28.8398}, {519.35321, 28.8398}
            }),
        new Row(
            "E4a.1 and E4a.2",
            staged(t -> 1 + 0.5 * Math.cos(2 * t)),
            3.5e-3,
            new double[][] {
              {260.81406, 66.0992}, {258.97932, 41.7815}, {519.37110, 29.0409}, {519.34722, 28.7727}
            }),
        new Row(
            "E4c.1 and E4c.2",
            staged(t -> 1 + 0.5 * Math.cos(4 * t)),
            3.5e-3,
            new double[][] {
              {259.97149, 54.2793}, {259.97149, 54.2793}, {521.22780, 38.0405}, {517.22770, 19.9430}
            }),
        new Row(
            "E4d.3",
            staged(t -> Math.cos(6 * t) > 0 ? 1.5 : 0.5),
            3.5e-3,
            new double[][] {{782.64355, -7.9385}, {769.93978, -13.6184}}));
  }

  @ParameterizedTest
  @MethodSource("rows")
  void bothMembersOfEveryPairAreFound_andTheCountSaysSo(Row row) {
    ModeSet modes =
        ModeSearch.find(
            Gallery.ring(720, row.g(), row.tau()),
            new Window(100, 900, -500, 200),
            SearchSettings.standard());

    assertThat(modes.complete()).as("%s", modes.notes()).isTrue();
    for (double[] root : row.roots()) {
      long wanted = Arrays.stream(row.roots()).filter(r -> Arrays.equals(r, root)).count();
      // (kh)²/24 with kh = 0.026 at 764 Hz: 3e-5 of |s|
      double scale = Math.hypot(2 * Math.PI * root[0], root[1]);
      var near = modes.modes().stream().filter(m -> distance(m, root) < 6e-5 * scale).toList();
      assertThat(near).as("%s Hz", root[0]).hasSizeGreaterThanOrEqualTo((int) wanted);
      if (wanted == 2) {
        assertThat(near).hasSize(2).allMatch(m -> m.multiplicity() == 2);
        assertThat(sine(near.get(0), near.get(1))).isGreaterThan(0.1);
      }
    }
    assertThat(modes.modes()).allMatch(m -> m.backwardError() <= 1e-10);
  }

  private static double[] dampers(int k) {
    double[] g = new double[k];
    Arrays.fill(g, -0.2);
    return g;
  }

  private static double[] staged(java.util.function.DoubleUnaryOperator share) {
    return IntStream.range(0, 12)
        .mapToDouble(j -> 0.05 * share.applyAsDouble(2 * Math.PI * j / 12))
        .toArray();
  }

  /** Sine of the angle between two fields: zero when both are the same. */
  private static double sine(Mode a, Mode b) {
    double aa = 0;
    double bb = 0;
    double re = 0;
    double im = 0;
    for (int i = 0; i < a.re().length; i++) {
      aa += a.re()[i] * a.re()[i] + a.im()[i] * a.im()[i];
      bb += b.re()[i] * b.re()[i] + b.im()[i] * b.im()[i];
      re += a.re()[i] * b.re()[i] + a.im()[i] * b.im()[i];
      im += a.re()[i] * b.im()[i] - a.im()[i] * b.re()[i];
    }
    return Math.sqrt(Math.max(0, 1 - (re * re + im * im) / (aa * bb)));
  }

  private static double distance(Mode m, double[] root) {
    return Math.hypot(2 * Math.PI * (m.frequency() - root[0]), m.growthRate() - root[1]);
  }
}
