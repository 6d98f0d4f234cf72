package org.annulet.solver.eigen;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.function.DoubleFunction;
import org.annulet.solver.dense.ComplexMatrix;
import org.annulet.solver.eigen.Gallery.Duct;
import org.annulet.solver.eigen.Gallery.End;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.modes.Window;
import org.annulet.solver.operator.AcousticOperator;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.api.Test;

/**
 * Three paths that share nothing but the polishing give the same roots: the reduced search, contour
 * integrals of the full operator, and continuation in the strength of the flame.
 */
class IndependentPathsTest {
  private static final Window WINDOW = new Window(40, 700, -900, 900);

  private static final DoubleFunction<AcousticOperator> FLAME_OF_STRENGTH =
      n -> new Duct(End.CLOSED, End.OPEN, 347, 850, 0.3).withFlame(200, n, 3e-3, null);

  private static List<Complex> searched(AcousticOperator op) {
    return ModeSearch.find(op, WINDOW, SearchSettings.standard()).modes().stream()
        .map(IndependentPathsTest::s)
        .toList();
  }

  private static Complex s(Mode m) {
    return new Complex(m.growthRate(), 2 * Math.PI * m.frequency());
  }

  @Test
  void contourIntegralsOfTheFullOperator_giveTheSameRoots() {
    PreparedOperator prepared = new PreparedOperator(FLAME_OF_STRENGTH.apply(5));
    Rectangle window = Rectangle.of(WINDOW);
    Polish polish = new Polish(prepared, 1e-10);
    List<Complex> roots = new ArrayList<>();
    for (ContourIntegral.Candidate c :
        ContourIntegral.around(ContourIntegral.of(prepared), window, 96, 14).candidates()) {
      if (window.grown(50, 50, 1).contains(c.s())) {
        Polish.Polished p = polish.run(new Complex[] {c.s()}, c.vector());
        Complex root = p.values()[0];
        if (p.converged(0)
            && window.contains(root)
            && roots.stream().noneMatch(r -> close(r, root))) {
          roots.add(root);
        }
      }
    }
    roots.sort(Comparator.comparingDouble(Complex::getImaginary));

    List<Complex> searched = searched(FLAME_OF_STRENGTH.apply(5));

    assertThat(searched).hasSize(5);
    assertThat(roots).hasSameSizeAs(searched);
    for (int i = 0; i < roots.size(); i++) {
      assertThat(close(roots.get(i), searched.get(i))).as("%s", roots.get(i)).isTrue();
    }
  }

  @Test
  void continuationInFlameStrength_endsOnRootsOfTheSearch_andNoTwoOnTheSame() {
    // upwards from the four roots at n = 0.5 (D2), each step started from the root before
    AcousticOperator weak = FLAME_OF_STRENGTH.apply(0.5);
    List<Mode> start = ModeSearch.find(weak, WINDOW, SearchSettings.standard()).modes();
    List<Complex> ends = new ArrayList<>();
    for (Mode m : start) {
      Complex root = s(m);
      ComplexMatrix p =
          ComplexMatrix.onColumns(new double[][] {m.re().clone()}, new double[][] {m.im().clone()});
      for (int k = 1; k <= 45; k++) {
        PreparedOperator step = new PreparedOperator(FLAME_OF_STRENGTH.apply(0.5 + 0.1 * k));
        Polish.Polished next = new Polish(step, 1e-10).run(new Complex[] {root}, p);
        assertThat(next.converged(0)).isTrue();
        root = next.values()[0];
        p = next.vectors();
      }
      ends.add(root);
    }

    List<Complex> searched = searched(FLAME_OF_STRENGTH.apply(5));

    assertThat(ends).hasSize(4);
    for (Complex end : ends) {
      if (Rectangle.of(WINDOW).contains(end)) {
        assertThat(searched).as("%s", end).anyMatch(r -> close(r, end));
      }
      assertThat(ends.stream().filter(e -> close(e, end))).hasSize(1);
    }
    assertThat(ends.stream().filter(Rectangle.of(WINDOW)::contains).count())
        .isGreaterThanOrEqualTo(3);
  }

  /** Both polished to a backward error of 1e-10; the roots are well conditioned. */
  private static boolean close(Complex a, Complex b) {
    return a.subtract(b).abs() <= 1e-8 * a.abs();
  }
}
