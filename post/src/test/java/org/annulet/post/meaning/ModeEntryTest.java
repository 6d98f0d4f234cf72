package org.annulet.post.meaning;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Optional;
import org.annulet.post.meaning.ModeEntry.Stability;
import org.annulet.solver.modes.Mode;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** A growth rate against zero. */
class ModeEntryTest {
  @ParameterizedTest
  @CsvSource({
    "3, 1, 1e-13, GROWS",
    "-3, 1, 1e-13, DECAYS",
    "0.5, 1, 1e-13, UNDECIDED",
    "-0.5, 1, 1e-13, UNDECIDED",
    "1, 1, 1e-13, UNDECIDED",
    // without an error bar: rounding of sums over the mesh at |s| = 628 1/s
    "1e-3, NaN, 1e-13, GROWS",
    "1e-7, NaN, 1e-13, UNDECIDED",
    "-1e-3, NaN, 1e-13, DECAYS",
    // a poorly converged mode: 1e-4 of |s|
    "0.05, 0, 1e-4, UNDECIDED",
    "0.07, 0, 1e-4, GROWS"
  })
  void growthInsideItsErrorBar_isUndecided(
      double growth, double bar, double backwardError, Stability expected) {
    double[] field = {1};
    Mode mode = new Mode(growth, 100, field, field, 1, backwardError, 3, Mode.Verdict.CONVERGED);
    ModeView view = new ModeView(mode, field, field, null, "", 0, bar);
    assertThat(new ModeEntry(view, null, Optional.empty()).stability()).isEqualTo(expected);
  }
}
