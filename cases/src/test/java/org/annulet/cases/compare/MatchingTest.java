package org.annulet.cases.compare;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.annulet.cases.read.ModeTable;
import org.junit.jupiter.api.Test;

class MatchingTest {
  private static OurMode mode(int number, double f, double g, int order, int partner) {
    return new OurMode(number, f, 0.1, g, 0.2, order, partner, "mode", true, null);
  }

  private static ModeTable.Row row(double f, double g, int order) {
    return new ModeTable.Row(1, f, 0, g, 0, order, Optional.empty());
  }

  /** Number of our mode of each row, 0 where there is none. */
  private static int[] matched(List<OurMode> ours, List<ModeTable.Row> theirs) {
    int[] out = new int[theirs.size()];
    for (Match m : Matching.of(ours, theirs, 0.15)) {
      if (m.row() > 0) {
        out[m.row() - 1] = m.ours().map(OurMode::number).orElse(0);
      }
    }
    return out;
  }

  @Test
  void rowsInAnotherOrder_findTheirModes() {
    List<OurMode> ours =
        List.of(mode(1, 200, -10, 0, 0), mode(2, 300, 5, 1, 0), mode(3, 400, 0, 0, 0));
    assertThat(matched(ours, List.of(row(410, 1, 0), row(205, -12, 0), row(297, 4, 1))))
        .containsExactly(3, 1, 2);
  }

  @Test
  void wholeTableShifted_isMatchedTogether_notRowByRowToTheNearest() {
    // Each row lies nearer to the next mode than half the spacing, yet the sum decides.
    List<OurMode> ours = List.of(mode(1, 300, 0, -1, 0), mode(2, 330, 0, -1, 0));
    assertThat(matched(ours, List.of(row(318, 0, -1), row(350, 0, -1)))).containsExactly(1, 2);
  }

  @Test
  void missingAndSpuriousModes_stayAlone() {
    List<OurMode> ours = List.of(mode(1, 200, -10, 0, 0), mode(2, 300, 5, 1, 0));
    List<Match> all = Matching.of(ours, List.of(row(202, -9, 0), row(700, 20, 1)), 0.15);
    assertThat(all).hasSize(3);
    assertThat(all.get(0).both()).isTrue();
    assertThat(all.get(1).theirs()).isEmpty();
    assertThat(all.get(2).ours()).isEmpty();
  }

  @Test
  void differentAzimuthalOrders_neverMatch() {
    assertThat(matched(List.of(mode(1, 300, 0, 1, 0)), List.of(row(300, 0, 2)))).containsExactly(0);
    assertThat(matched(List.of(mode(1, 300, 0, 1, 0)), List.of(row(300, 0, -1))))
        .containsExactly(1);
  }

  @Test
  void oneRowForAPair_isOneMatchToBothMembers() {
    List<OurMode> pair = List.of(mode(1, 300, 5, 1, 2), mode(2, 300, 5, 1, 1));
    List<Match> one = Matching.of(pair, List.of(row(305, 6, 1)), 0.15);
    assertThat(one).hasSize(1);
    assertThat(one.get(0).second()).isPresent();
    assertThat(one.get(0).rival()).isEmpty();
    List<Match> two = Matching.of(pair, List.of(row(305, 6, 1), row(306, 6, 1)), 0.15);
    assertThat(two).hasSize(2).allSatisfy(m -> assertThat(m.both()).isTrue());
    assertThat(two).allSatisfy(m -> assertThat(m.second()).isEmpty());
  }

  @Test
  void rowMidwayBetweenTwoModes_isAmbiguous_untilItsShapeTells() {
    ModeTable.Shape flat = shape(x -> 1);
    ModeTable.Shape wave = shape(x -> Math.cos(Math.PI * x));
    OurMode bulk = new OurMode(1, 295, 0, 0, 0, 0, 0, "bulk", true, flat);
    OurMode half = new OurMode(2, 305, 0, 0, 0, 0, 0, "half wave", true, wave);
    Match blind = Matching.of(List.of(bulk, half), List.of(row(300.2, 0, 0)), 0.15).get(1);
    assertThat(blind.rival()).hasValueSatisfying(r -> assertThat(r).contains("mode 1"));
    ModeTable.Row seeing = new ModeTable.Row(1, 300.2, 0, 0, 0, 0, Optional.of(flat));
    Match told = Matching.of(List.of(bulk, half), List.of(seeing), 0.15).get(0);
    assertThat(told.ours().orElseThrow().number()).isEqualTo(1);
    assertThat(told.rival()).isEmpty();
    assertThat(told.correlation()).isCloseTo(1, within(1e-12));
  }

  @Test
  void shapesThatAreOrthogonal_areNoMatch_howeverNearTheyAre() {
    OurMode half = new OurMode(1, 300, 0, 0, 0, 0, 0, "h", true, shape(x -> Math.cos(Math.PI * x)));
    ModeTable.Row whole =
        new ModeTable.Row(1, 300, 0, 0, 0, 0, Optional.of(shape(x -> Math.cos(2 * Math.PI * x))));
    assertThat(matched(List.of(half), List.of(whole))).containsExactly(0);
  }

  private static ModeTable.Shape shape(java.util.function.DoubleUnaryOperator p) {
    double[] x = new double[41];
    double[] re = new double[41];
    for (int k = 0; k < 41; k++) {
      x[k] = k / 40.0;
      re[k] = p.applyAsDouble(x[k]);
    }
    return new ModeTable.Shape(x, re, new double[41]);
  }

  @Test
  void growthRatesThatWereNotMeasured_doNotCount() {
    assertThat(
            matched(
                List.of(mode(1, 300, -200, 0, 0), mode(2, 340, 0, 0, 0)),
                List.of(row(302, Double.NaN, 0))))
        .containsExactly(1);
  }

  @Test
  void assignment_isTheBestOfAllPermutations() {
    Random random = new Random(7);
    for (int n = 1; n <= 6; n++) {
      for (int run = 0; run < 20; run++) {
        double[][] cost = new double[n][n + 1];
        for (double[] r : cost) {
          for (int j = 0; j <= n; j++) {
            r[j] = random.nextDouble();
          }
        }
        double best = brute(cost, 0, new boolean[n + 1]);
        assertThat(Assignment.total(cost, Assignment.cheapest(cost)))
            .as("n %d run %d", n, run)
            .isCloseTo(best, within(1e-12));
      }
    }
  }

  private static double brute(double[][] cost, int row, boolean[] taken) {
    if (row == cost.length) {
      return 0;
    }
    double best = Double.POSITIVE_INFINITY;
    for (int j = 0; j < taken.length; j++) {
      if (!taken[j]) {
        taken[j] = true;
        best = Math.min(best, cost[row][j] + brute(cost, row + 1, taken));
        taken[j] = false;
      }
    }
    return best;
  }
}
