package org.annulet.solver.eigen;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatCode;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import org.annulet.solver.eigen.Gallery.Duct;
import org.annulet.solver.eigen.Gallery.End;
import org.annulet.solver.sparse.SymmetricAnalysis;
import org.junit.jupiter.api.Test;

/** What will not fit is refused with the figure and the remedy. */
class MemoryLimitTest {
  private static final SymmetricAnalysis DUCT =
      new PreparedOperator(
              new Duct(End.CLOSED, End.OPEN, 347, 850, 0.3).withFlame(2000, 1, 3e-3, null))
          .analysis();

  @Test
  void factorLargerThanItsShare_isRefused_withItsSize() {
    assertThatThrownBy(() -> MemoryLimitException.check(DUCT, DUCT.complexFactorBytes()))
        .isInstanceOf(MemoryLimitException.class)
        .hasMessageContaining("a factor of 2000 unknowns takes")
        .hasMessageContaining("choose larger triangles")
        .hasMessageContaining("-Xmx1g");
  }

  @Test
  void factorThatFits_isNot() {
    assertThat(DUCT.complexFactorBytes()).isPositive();
    assertThatCode(() -> MemoryLimitException.check(DUCT, 2 * DUCT.complexFactorBytes()))
        .doesNotThrowAnyException();
  }
}
