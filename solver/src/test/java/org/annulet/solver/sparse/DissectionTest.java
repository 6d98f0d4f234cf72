package org.annulet.solver.sparse;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Arrays;
import java.util.Random;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

class DissectionTest {
  @Test
  void everyUnknown_isEliminatedOnce() {
    for (TestMatrix a :
        new TestMatrix[] {TestMatrix.ring(9, 200, 0, 0), TestMatrix.random(3, 900)}) {
      int[] order = Dissection.order(Adjacency.of(a.pattern()), a.coordinates());
      Arrays.sort(order);
      assertThat(order).isEqualTo(IntStream.range(0, a.size()).toArray());
    }
  }

  @Test
  void square_fillsNoMoreThanTheClassicalBound() {
    // George 1973: nested dissection of an n × n grid of nine-point cells leaves about
    // 31/4 n² log₂ n entries in L (from memory); ours has seven-point cells and minimum degree
    // leaves.
    int n = 128;
    TestMatrix a = TestMatrix.grid(n, n, 0, 0);
    double bound = 31.0 / 4 * n * n * Math.log(n) / Math.log(2);
    long entries = new MultifrontalAnalysis(a.pattern(), a.coordinates()).factorEntries();
    assertThat((double) entries).isBetween(0.3 * bound, 0.7 * bound);
    // Without coordinates the walks over the graph must do nearly as well.
    long blind = new MultifrontalAnalysis(a.pattern(), null).factorEntries();
    assertThat((double) blind).isLessThan(1.25 * entries);
  }

  @Test
  void misleadingCoordinates_costLittle() {
    TestMatrix a = TestMatrix.grid(60, 60, 0, 0);
    Random random = new Random(1);
    double[][] noise = new double[2][a.size()];
    Arrays.setAll(noise[0], i -> random.nextDouble());
    Arrays.setAll(noise[1], i -> random.nextDouble());
    double good = new MultifrontalAnalysis(a.pattern(), a.coordinates()).factorEntries();
    assertThat((double) new MultifrontalAnalysis(a.pattern(), noise).factorEntries())
        .isLessThan(1.3 * good);
    assertThat(
            (double) new MultifrontalAnalysis(a.pattern(), new double[2][a.size()]).factorEntries())
        .isLessThan(1.3 * good);
  }

  @Test
  void narrowDuct_isWhereTheDumbbellIsCut() {
    // Two squares of 30 × 30 joined by a duct 3 wide and 12 long; the cut there needs 3 unknowns.
    int[][] number = new int[72][30];
    int n = 0;
    for (int i = 0; i < 72; i++) {
      for (int j = 0; j < 30; j++) {
        boolean duct = i >= 30 && i < 42;
        number[i][j] = duct && (j < 13 || j > 15) ? -1 : n++;
      }
    }
    double[][] at = new double[2][n];
    PatternBuilder builder = new PatternBuilder(n);
    for (int i = 0; i < 72; i++) {
      for (int j = 0; j < 30; j++) {
        int v = number[i][j];
        if (v >= 0) {
          at[0][v] = i;
          at[1][v] = j;
          if (i > 0 && number[i - 1][j] >= 0) {
            builder.pair(v, number[i - 1][j]);
          }
          if (j > 0 && number[i][j - 1] >= 0) {
            builder.pair(v, number[i][j - 1]);
          }
        }
      }
    }
    int[] order = Dissection.order(Adjacency.of(builder.build()), at);
    for (int k = n - 3; k < n; k++) {
      assertThat(at[0][order[k]]).isBetween(30.0, 41.0);
    }
    assertThat(at[0][order[n - 1]]).isEqualTo(at[0][order[n - 3]]);
  }

  @Test
  void manySeparatePieces_areOrderedWithoutFill() {
    PatternBuilder builder = new PatternBuilder(20000);
    for (int i = 0; i < 10000; i++) {
      builder.pair(i, 19999 - i);
    }
    assertThat(new MultifrontalAnalysis(builder.build(), null).factorEntries()).isLessThan(40000);
  }

  @Test
  void fullMatrix_isTakenAsOneFront() {
    int n = 300;
    PatternBuilder builder = new PatternBuilder(n);
    builder.element(IntStream.range(0, n).toArray());
    assertThat(new MultifrontalAnalysis(builder.build(), null).factorEntries())
        .isEqualTo((long) n * (n + 1) / 2);
  }

  @Test
  void severalUnknownsAtEachPlace_areOrderedLikeTheirPlaces() {
    // Two unknowns a node: four times the entries of one, plus the diagonal blocks.
    TestMatrix one = TestMatrix.grid(40, 40, 0, 0);
    int n = one.size();
    PatternBuilder builder = new PatternBuilder(2 * n);
    double[][] at = new double[2][2 * n];
    for (int i = 0; i < n; i++) {
      for (int d = 0; d < 2; d++) {
        at[0][2 * i + d] = one.coordinates()[0][i];
        at[1][2 * i + d] = one.coordinates()[1][i];
      }
      for (int q = one.pattern().rowStart(i); q < one.pattern().rowStart(i + 1); q++) {
        int j = one.pattern().column(q);
        builder.element(2 * i, 2 * i + 1, 2 * j, 2 * j + 1);
      }
    }
    double single = new MultifrontalAnalysis(one.pattern(), one.coordinates()).factorEntries();
    assertThat((double) new MultifrontalAnalysis(builder.build(), at).factorEntries())
        .isBetween(3 * single, 4.6 * single);
  }
}
