package org.annulet.solver.eigen;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.annulet.solver.eigen.Gallery.Duct;
import org.annulet.solver.eigen.Gallery.End;
import org.annulet.solver.modes.Window;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.sparse.LogDeterminant;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** The argument principle on functions whose roots and poles are known in closed form. */
class RootCountTest {
  private static final RootCount.Known NOTHING = new RootCount.Known(List.of(), List.of());

  @Test
  void ductWithStrongFlame_hasFiveRoots_countedWithoutKnowingAny() {
    // reference value D3
    AcousticOperator op =
        new Duct(End.CLOSED, End.OPEN, 347, 850, 0.3).withFlame(200, 5, 3e-3, null);
    RootCount.Result count =
        RootCount.inside(
            Rectangle.of(new Window(4.8, 700, -1500, 1500)),
            RootCount.determinant(new PreparedOperator(op)),
            NOTHING,
            new RootCount.Fineness(1 / 3e-3, 4000));

    assertThat(count.certain()).isTrue();
    assertThat(count.value()).isEqualTo(5);
  }

  /** e^{−sτ} − a has the roots (2πik − ln a)/τ: one every 1/τ in Hz. */
  private static RootCount.Sampled delay(double tau, double a) {
    return s -> {
      Complex e = s.multiply(-tau).exp();
      Complex v = e.subtract(a);
      return new RootCount.Sample(
          new LogDeterminant(Math.log(v.abs()), v.getArgument()), e.multiply(-tau).divide(v));
    };
  }

  @ParameterizedTest
  @ValueSource(doubles = {5e-4, 3e-3, 2e-2, 0.1})
  void everyRootOfADelayIsCounted_whenTheStartIsAsFineAsTheDelay(double tau) {
    Rectangle window = Rectangle.of(new Window(20, 1510, -1000, 1000));
    int roots = (int) (Math.floor(1510 * tau) - Math.floor(20 * tau));

    RootCount.Result count =
        RootCount.inside(
            window, delay(tau, 0.8), NOTHING, new RootCount.Fineness(1 / tau, 100_000));

    assertThat(count.certain()).isTrue();
    assertThat(count.value()).isEqualTo(roots);
  }

  @ParameterizedTest
  @CsvSource({"0.02, 2", "0.02, 5", "0.02, 20", "0.1, 3", "0.1, 17", "0.1, 63", "0.5, 20"})
  void aStartTooCoarseForTheDelay_neverYieldsACertainWrongCount(double tau, double coarser) {
    // a start at `coarser` times the step asked for sees the phase turn several times between
    // points: the change alone, reduced to (−π, π], would look small; its rate does not
    Rectangle window = Rectangle.of(new Window(20, 1510, -1000, 1000));
    int roots = (int) (Math.floor(1510 * tau) - Math.floor(20 * tau));

    RootCount.Result count =
        RootCount.inside(
            window, delay(tau, 0.8), NOTHING, new RootCount.Fineness(coarser / tau, 100_000));

    assertThat(count.certain() && count.value() != roots).as("%s", count).isFalse();
  }

  @Test
  void tooFewPointsAllowed_isNotCertain() {
    RootCount.Result count =
        RootCount.inside(
            Rectangle.of(new Window(20, 1510, -1000, 1000)),
            delay(0.1, 0.8),
            NOTHING,
            new RootCount.Fineness(1 / 0.1, 100));

    assertThat(count.certain()).isFalse();
  }

  @ParameterizedTest
  @ValueSource(ints = {-2, -1, 0, 1})
  void knownRootsChangeTheCostAndNotTheCount(int wrong) {
    // right ones, one left out, one too many inside and outside
    double tau = 5e-3;
    Rectangle window = Rectangle.of(new Window(20, 1110, -1000, 1000));
    List<Complex> known = new java.util.ArrayList<>();
    for (int k = 1; k <= 5 + wrong; k++) {
      known.add(new Complex(-Math.log(0.8) / tau, 2 * Math.PI * k / tau));
    }
    if (wrong > 0) {
      known.add(new Complex(100, 3000));
      known.add(new Complex(2000, 3000));
    }

    RootCount.Result count =
        RootCount.inside(
            window,
            delay(tau, 0.8),
            new RootCount.Known(known, List.of()),
            new RootCount.Fineness(1 / tau, 10_000));

    assertThat(count.certain()).isTrue();
    assertThat(count.value()).isEqualTo(5);
  }

  @Test
  void resonantWall_itsPoleCountsMinusItsRank() {
    // as reference value C12, the resonance less damped (r = 0.05) so that the pole of s/z at
    // −425 1/s lies inside. Closed duct: z sinh(sL/c) + cosh(sL/c) = 0; times s it is entire, and
    // its roots are those of the operator.
    double l = 0.02 / 340;
    double omega0 = 2 * Math.PI * 180;
    Gallery.Resonant wall = new Gallery.Resonant(0.05, l, omega0);
    AcousticOperator op =
        new Duct(End.CLOSED, End.CLOSED, 340, 340, 0.5).withFlame(200, 0, 0, wall);
    PreparedOperator prepared = new PreparedOperator(op);
    Rectangle window = Rectangle.of(new Window(5, 420, -1000, 1000));
    RootCount.Sampled exact =
        s -> {
          Complex sz = s.multiply(s).add(omega0 * omega0).multiply(l).add(s.multiply(0.05));
          Complex x = s.divide(340);
          Complex v = sz.multiply(x.sinh()).add(s.multiply(x.cosh()));
          return new RootCount.Sample(new LogDeterminant(Math.log(v.abs()), v.getArgument()), null);
        };
    RootCount.Fineness fine = new RootCount.Fineness(50, 10_000);

    List<Complex> poles = CoefficientPoles.in(prepared, window);
    RootCount.Result zeros = RootCount.inside(window, exact, NOTHING, fine);
    RootCount.Result count =
        RootCount.inside(window, RootCount.determinant(prepared), NOTHING, fine);

    assertThat(poles).hasSize(1);
    assertThat(zeros.certain()).isTrue();
    assertThat(count.certain()).isTrue();
    assertThat(count.value()).isEqualTo(zeros.value() - 1);
  }
}
