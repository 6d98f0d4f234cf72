package org.annulet.solver.eigen;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.stream.DoubleStream;
import org.annulet.solver.eigen.Gallery.Duct;
import org.annulet.solver.eigen.Gallery.End;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.modes.ModeSet;
import org.annulet.solver.modes.Window;
import org.annulet.solver.operator.AcousticOperator;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Points on the basis of a family against the search on the full operator. */
class ReducedFamilyTest {
  private static final Window WINDOW = new Window(5, 700, -800, 800);
  private static ReducedFamily family;

  private static AcousticOperator duct(double gain, double delay, double hot) {
    return new Duct(End.CLOSED, End.OPEN, 347, hot, 0.3).withFlame(200, gain, delay, null);
  }

  @BeforeAll
  static void train() {
    List<AcousticOperator> points =
        DoubleStream.of(850, 750, 950)
            .boxed()
            .flatMap(
                hot ->
                    DoubleStream.of(2e-3, 3e-3, 4e-3, 5e-3)
                        .mapToObj(delay -> duct(1.5, delay, hot)))
            .toList();
    family = ReducedFamily.trainedOn(points, 1, WINDOW, 1e-8);
  }

  @ParameterizedTest
  @CsvSource({"1.5, 2.45e-3, 850", "0.4, 4.3e-3, 800", "2.2, 3.7e-3, 915", "1.5, 3e-3, 850"})
  void everyModeOfTheFullOperator_isFoundAndNoOther(double gain, double delay, double hot) {
    AcousticOperator op = duct(gain, delay, hot);
    ModeSet full = ModeSearch.find(op, WINDOW, SearchSettings.standard());
    assertThat(full.complete()).isTrue();

    ReducedFamily.Answer answer = family.at(op);

    assertThat(answer.counted()).isTrue();
    List<Complex> inside =
        answer.roots().stream()
            .map(ReducedFamily.Root::s)
            .filter(s -> WINDOW.contains(s.getReal(), s.getImaginary() / (2 * Math.PI)))
            .toList();
    assertThat(inside).hasSameSizeAs(full.modes()).hasSizeGreaterThan(2);
    for (int i = 0; i < inside.size(); i++) {
      Mode m = full.modes().get(i);
      Complex s = new Complex(m.growthRate(), 2 * Math.PI * m.frequency());
      // a backward error of 1e-8 on a mesh of 200 sides
      assertThat(inside.get(i).subtract(s).abs()).isLessThan(1e-6 * s.abs());
    }
    assertThat(answer.roots()).allMatch(r -> r.backwardError() <= 1e-8);
  }

  @Test
  void startsFromPointsCloseBy_changeNothing() {
    AcousticOperator op = duct(1.2, 3.4e-3, 850);

    List<ReducedFamily.Root> alone = family.at(op).roots();
    List<ReducedFamily.Root> helped = family.at(op, 1, 2).roots();

    assertThat(helped).hasSameSizeAs(alone);
    for (int i = 0; i < alone.size(); i++) {
      // Newton ends a step after 1e-11
      assertThat(helped.get(i).s().subtract(alone.get(i).s()).abs())
          .isLessThan(1e-9 * alone.get(i).s().abs());
    }
  }

  @Test
  void startsFromFarAway_stillEndInACompleteAnswer() {
    AcousticOperator op = duct(3, 5e-3, 950);

    ReducedFamily.Answer answer = family.at(op, 0);

    assertThat(answer.counted()).isTrue();
    assertThat(answer.roots()).hasSameSizeAs(family.at(op).roots());
  }

  @Test
  void pointFarFromTheTraining_isPolishedWhereTheBasisFallsShort() {
    ReducedFamily one = ReducedFamily.trainedOn(List.of(duct(1.5, 3e-3, 850)), 1, WINDOW, 1e-9);
    AcousticOperator op = duct(1.5, 3e-3, 350);

    ReducedFamily.Answer answer = one.at(op);

    assertThat(answer.roots()).anyMatch(ReducedFamily.Root::polished);
    assertThat(answer.roots()).allMatch(r -> r.backwardError() <= 1e-9);
  }
}
