package org.annulet.solver.eigen;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.stream.Stream;
import org.annulet.solver.eigen.Gallery.Duct;
import org.annulet.solver.eigen.Gallery.End;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.modes.ModeSet;
import org.annulet.solver.modes.Window;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.AnalyticFunction;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Ducts with a flame sheet or an end impedance against the dispersion relation (reference values
 * D1–D6, C10, C12): every root of the window, and their number.
 */
class DuctRootsTest {
  record Row(
      String id,
      Duct duct,
      double gain,
      double tau,
      AnalyticFunction outlet,
      Window window,
      double[][] roots) {
    @Override
    public String toString() {
      return id;
    }
  }

  static Stream<Row> rows() {
    Window wide = new Window(4.8, 700, -1500, 1500);
    Duct closedOpen = new Duct(End.CLOSED, End.OPEN, 347, 850, 0.3);
    Duct closedClosed = new Duct(End.CLOSED, End.CLOSED, 347, 850, 0.3);
    Duct uniform = new Duct(End.CLOSED, End.CLOSED, 340, 340, 0.5);
    return Stream.of(
        new Row(
            "D1",
            new Duct(End.OPEN, End.OPEN, 340, 340, 0.25),
            0.1,
            1.5e-3,
            null,
            new Window(15.9, 800, -300, 300),
            new double[][] {{170.04473, 16.5843}, {340, 0}, {509.63594, 16.3352}, {680, 0}}),
        new Row(
            "D2.passive",
            closedOpen,
            0,
            0,
            null,
            wide,
            new double[][] {{188.93368, 0}, {403.63855, 0}}),
        new Row(
            "D2",
            closedOpen,
            0.5,
            3e-3,
            null,
            wide,
            new double[][] {
              {117.76789, -695.5768},
              {202.19168, 83.4808},
              {408.20228, 92.9935},
              {528.38460, -829.1369}
            }),
        new Row(
            "D3",
            closedOpen,
            5,
            3e-3,
            null,
            wide,
            new double[][] {
              {70.60976, -280.1037},
              {206.51919, 435.5250},
              {426.70531, 363.3854},
              {551.74653, -395.8363},
              {689.95275, -95.9007}
            }),
        new Row(
            "D4",
            closedClosed,
            1,
            3e-3,
            null,
            wide,
            new double[][] {
              {167.97605, -396.9137},
              {295.24421, -8.1135},
              {495.76155, -457.4077},
              {596.11310, 28.0024}
            }),
        new Row(
            "D5",
            closedClosed,
            2.5,
            3e-3,
            new Gallery.Constant(new Complex(1.5)),
            wide,
            new double[][] {
              {203.35450, 56.4852},
              {298.90255, -940.7728},
              {447.31198, -99.0628},
              {613.61707, -206.4146}
            }),
        new Row(
            "C10a",
            uniform,
            0,
            0,
            new Gallery.Constant(new Complex(2)),
            new Window(10, 600, -1000, 1000),
            new double[][] {{170, -186.764089}, {340, -186.764089}, {510, -186.764089}}),
        new Row(
            "C10c",
            uniform,
            0,
            0,
            new Gallery.Constant(new Complex(3, 2)),
            new Window(5, 420, -1000, 1000),
            new double[][] {
              {8.705392, -77.884712}, {178.705392, -77.884712}, {348.705392, -77.884712}
            }),
        new Row(
            "C10d",
            uniform,
            0,
            0,
            new Gallery.Constant(new Complex(0.2, -0.5)),
            new Window(5, 520, -1000, 1000),
            new double[][] {
              {110.795256, -54.507299}, {280.795256, -54.507299}, {450.795256, -54.507299}
            }),
        new Row(
            "C12",
            uniform,
            0,
            0,
            new Gallery.Resonant(0.3, 0.02 / 340, 2 * Math.PI * 180),
            new Window(5, 420, -1000, 1000),
            new double[][] {
              {90.545900, -94.304872}, {252.285033, -101.631573}, {417.616315, -100.771057}
            }));
  }

  @ParameterizedTest
  @MethodSource("rows")
  void everyRootOfTheWindowIsFound_andTheCountSaysSo(Row row) {
    AcousticOperator op = row.duct().withFlame(400, row.gain(), row.tau(), row.outlet());

    ModeSet modes = ModeSearch.find(op, row.window(), SearchSettings.standard());

    assertThat(modes.notes()).noneMatch(n -> n.contains("disagree"));
    assertThat(modes.complete()).as("%s", modes.notes()).isTrue();
    assertThat(modes.modes()).hasSize(row.roots().length);
    for (int i = 0; i < row.roots().length; i++) {
      Mode m = modes.modes().get(i);
      // 2e-10 only for the mode at 8.7 Hz, where rounding alone leaves that on 400 elements
      assertThat(m.backwardError()).isLessThanOrEqualTo(m.frequency() < 10 ? 2e-10 : 1e-10);
      // linear elements, kh ≤ 0.032 at 700 Hz in the cold gas: (kh)²/24 = 4e-5 for the wave number,
      // a few times that for a root moved by the flame's phase
      double scale = Math.hypot(2 * Math.PI * row.roots()[i][0], row.roots()[i][1]);
      assertThat(distance(m, row.roots()[i])).isLessThan(2e-4 * scale);
    }
  }

  @Test
  void intrinsicModes_betweenNonReflectingEnds() {
    // D6: both ends z = 1; the inlet's admittance acts on the cold gas
    AcousticOperator half =
        new Duct(End.CLOSED, End.CLOSED, 347, 850, 0.3)
            .withFlame(400, 5, 3e-3, new Gallery.Constant(Complex.ONE));
    double[] inlet = new double[half.pattern().entryCount()];
    inlet[half.pattern().entry(0, 0)] = 347;
    AcousticOperator op =
        new AcousticOperator(
            half.pattern(),
            half.stiffness(),
            half.mass(),
            Stream.concat(
                    half.sparseTerms().stream(),
                    Stream.of(
                        new org.annulet.solver.operator.SparseTerm(
                            "wall inlet", inlet, new Gallery.Constant(Complex.ONE))))
                .toList(),
            half.lowRankTerms(),
            half.coordinates());

    ModeSet modes = ModeSearch.find(op, new Window(50, 900, -400, 400), SearchSettings.standard());

    assertThat(modes.complete()).as("%s", modes.notes()).isTrue();
    assertThat(modes.modes()).hasSize(3);
    for (int k = 0; k < 3; k++) {
      // (kh)²/24 with h = 1/400 m at 833 Hz: 6e-5 of |s|
      double[] exact = {(2 * k + 1) / 6e-3, 123.7297};
      assertThat(distance(modes.modes().get(k), exact)).isLessThan(3e-4 * 2 * Math.PI * exact[0]);
    }
  }

  @Test
  void twoMeshes_extrapolateToTheExactRoots() {
    // D3 at second order: (4 s(h/2) − s(h))/3 leaves the fourth power of kh
    Duct duct = new Duct(End.CLOSED, End.OPEN, 347, 850, 0.3);
    Window window = new Window(150, 600, -600, 600);
    var coarse =
        ModeSearch.find(duct.withFlame(200, 5, 3e-3, null), window, SearchSettings.standard());
    var fine =
        ModeSearch.find(duct.withFlame(400, 5, 3e-3, null), window, SearchSettings.standard());
    double[][] exact = {{206.51919, 435.5250}, {426.70531, 363.3854}, {551.74653, -395.8363}};
    for (int i = 0; i < 3; i++) {
      Mode a = coarse.modes().get(i);
      Mode b = fine.modes().get(i);
      // the table's last digit is 1e-5 Hz and 1e-4 1/s
      assertThat((4 * b.frequency() - a.frequency()) / 3).isCloseTo(exact[i][0], within(1e-3));
      assertThat((4 * b.growthRate() - a.growthRate()) / 3).isCloseTo(exact[i][1], within(1e-2));
    }
  }

  private static org.assertj.core.data.Offset<Double> within(double x) {
    return org.assertj.core.data.Offset.offset(x);
  }

  private static double distance(Mode m, double[] root) {
    return Math.hypot(2 * Math.PI * (m.frequency() - root[0]), m.growthRate() - root[1]);
  }
}
