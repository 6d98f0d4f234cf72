package org.annulet.solver.eigen;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Arrays;
import java.util.List;
import java.util.function.UnaryOperator;
import org.annulet.solver.eigen.Gallery.Duct;
import org.annulet.solver.eigen.Gallery.End;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.modes.ModeSet;
import org.annulet.solver.modes.Window;
import org.annulet.solver.operator.AcousticOperator;
import org.junit.jupiter.api.Test;

/** What is damaged must come out as incomplete; what lies on the edge must be said to. */
class CertificateTest {
  private static final Window WINDOW = new Window(4.8, 700, -1500, 1500);

  private static PreparedOperator strongFlame() {
    return new PreparedOperator(
        new Duct(End.CLOSED, End.OPEN, 347, 850, 0.3).withFlame(200, 5, 3e-3, null));
  }

  private static ModeSet spoiled(SearchSettings settings, ModeSearch.Spoilers spoilers) {
    return new ModeSearch(strongFlame(), WINDOW, settings, spoilers).run();
  }

  @Test
  void halfTheBasisRemoved_isNotComplete() {
    ModeSet set =
        spoiled(
            SearchSettings.standard(),
            new ModeSearch.Spoilers(CertificateTest::half, m -> m, q -> q));

    assertThat(set.complete()).isFalse();
    assertThat(set.countByArgumentPrinciple()).isEqualTo(5);
  }

  @Test
  void aModeDeletedFromTheResult_isNotComplete() {
    ModeSet set =
        spoiled(
            SearchSettings.standard(),
            new ModeSearch.Spoilers(q -> q, m -> m.subList(1, m.size()), q -> q));

    assertThat(set.complete()).isFalse();
    assertThat(set.countByArgumentPrinciple()).isEqualTo(5);
    assertThat(set.notes()).anyMatch(n -> n.contains("argument principle gives 5"));
  }

  @Test
  void aCountWithTooFewPoints_isNotComplete() {
    ModeSet set = spoiled(new SearchSettings(1e-10, 1, 4, 8), ModeSearch.Spoilers.none());

    assertThat(set.complete()).isFalse();
    assertThat(set.countByArgumentPrinciple()).isEqualTo(-1);
    assertThat(set.notes()).anyMatch(n -> n.contains("did not settle"));
  }

  @Test
  void unspoiled_isComplete() {
    assertThat(spoiled(SearchSettings.standard(), ModeSearch.Spoilers.none()).complete()).isTrue();
  }

  /** Counted on a reduced operator although the duct is small. */
  private static ModeSet reduced(UnaryOperator<double[][]> damage) {
    return new ModeSearch(
            strongFlame(),
            WINDOW,
            SearchSettings.standard(),
            new ModeSearch.Spoilers(q -> q, m -> m, damage),
            100)
        .run();
  }

  @Test
  void soundCountingBasis_isUsed() {
    ModeSet set = reduced(q -> q);

    assertThat(set.complete()).isTrue();
    assertThat(set.countByArgumentPrinciple()).isEqualTo(5);
    assertThat(set.notes()).anyMatch(n -> n.startsWith("counted on a reduced operator"));
  }

  @Test
  void halfTheCountingBasisRemoved_theFullOperatorIsCounted() {
    ModeSet set = reduced(CertificateTest::half);

    assertThat(set.notes()).contains("counted on the full operator");
    assertThat(set.complete()).isTrue();
    assertThat(set.countByArgumentPrinciple()).isEqualTo(5);
  }

  @Test
  void halfTheCountingBasis_departsByMoreThanItsSizeOnTheContour() {
    PreparedOperator duct = strongFlame();
    double[][] basis =
        new SearchPlan(duct, WINDOW, SearchSettings.standard())
            .basis(Rectangle.of(WINDOW).top(), 3)
            .columns();
    RootCount.Known nothing = new RootCount.Known(List.of(), List.of());
    RootCount.Fineness fine = new RootCount.Fineness(200, 4000);
    Rectangle contour = Rectangle.of(WINDOW);

    ReducedCount.Result sound = new ReducedCount(duct, basis).inside(contour, nothing, fine);
    ReducedCount.Result damaged =
        new ReducedCount(duct, half(basis)).inside(contour, nothing, fine);

    assertThat(sound.departure()).isLessThan(0.05);
    assertThat(sound.certain()).isTrue();
    assertThat(damaged.departure()).isGreaterThan(1);
    assertThat(damaged.certain()).isFalse();
  }

  @Test
  void rootJustInsideTheContour_leavesNoAnswer() {
    PreparedOperator duct = strongFlame();
    double[][] basis =
        new SearchPlan(duct, WINDOW, SearchSettings.standard())
            .basis(Rectangle.of(WINDOW).top(), 3)
            .columns();
    ModeSet modes = ModeSearch.find(duct, WINDOW, SearchSettings.standard());
    double second = 2 * Math.PI * modes.modes().get(1).frequency();
    RootCount.Fineness fine = new RootCount.Fineness(200, 4000);
    Rectangle all = Rectangle.of(WINDOW);
    // a thousandth of its height above the second mode, within the band that must be free
    double top = second + 0.001 * (second - all.bottom());
    Rectangle contour = new Rectangle(all.left(), all.right(), all.bottom(), top);

    ReducedCount.Result result =
        new ReducedCount(duct, basis)
            .inside(contour, new RootCount.Known(List.of(), List.of()), fine);

    assertThat(result.certain()).isFalse();
  }

  private static double[][] half(double[][] q) {
    double[][] half = new double[q.length / 2][];
    Arrays.setAll(half, i -> q[2 * i + 1]);
    return half;
  }

  @Test
  void aModeOnTheWindowsEdge_isSaidToBeSo() {
    AcousticOperator op =
        new Duct(End.CLOSED, End.OPEN, 347, 850, 0.3).withFlame(200, 5, 3e-3, null);
    Mode second = ModeSearch.find(op, WINDOW, SearchSettings.standard()).modes().get(1);

    ModeSet set =
        ModeSearch.find(
            op, new Window(100, second.frequency(), -1000, 1000), SearchSettings.standard());

    assertThat(set.complete()).as("%s", set.notes()).isTrue();
    assertThat(set.modes()).hasSize(1);
    assertThat(set.modes().get(0).verdict()).isEqualTo(Mode.Verdict.ON_THE_EDGE);
    assertThat(set.contour().highestFrequency()).isGreaterThan(second.frequency());
  }

  @Test
  void passiveModesOfARing_areCompleteByInertia_bothMembersOfEveryPair() {
    // reference value E1: m c/(2πR); 800 m/s, R = 0.5 m; 0 Hz, then pairs up to m = 6
    PassiveModes.Spectrum passive =
        PassiveModes.below(Gallery.ring(480, new double[0], 0), 6.5 * 254.647909);

    assertThat(passive.complete()).isTrue();
    assertThat(passive.omegaSquared()).hasSize(13);
    for (int m = 1; m <= 6; m++) {
      for (int i : List.of(2 * m - 1, 2 * m)) {
        // (kh)²/24 with kh = 0.079 at m = 6
        assertThat(passive.frequency(i))
            .isCloseTo(m * 254.647909, org.assertj.core.data.Percentage.withPercentage(0.03));
      }
    }
  }
}
