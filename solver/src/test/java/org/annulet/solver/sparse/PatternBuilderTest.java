package org.annulet.solver.sparse;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import org.junit.jupiter.api.Test;

class PatternBuilderTest {
  @Test
  void elementsAndPairs_giveEachEntryOnce() {
    SymmetricPattern pattern =
        new PatternBuilder(4).element(2, 0, 1).element(0, 1, 2).pair(0, 3).pair(3, 3).build();
    assertThat(pattern.size()).isEqualTo(4);
    assertThat(pattern.entryCount()).isEqualTo(8);
    assertThat(pattern.entry(3, 0)).isEqualTo(6);
    assertThat(pattern.entry(0, 3)).isEqualTo(6);
    assertThat(pattern.entry(1, 3)).isEqualTo(-1);
  }

  @Test
  void entriesOfAnElement_followItsLowerTriangle() {
    SymmetricPattern pattern = new PatternBuilder(4).element(2, 0, 1).build();
    int[] entry = PatternBuilder.entries(pattern, 2, 0, 1);
    assertThat(entry)
        .containsExactly(
            pattern.entry(2, 2),
            pattern.entry(0, 2),
            pattern.entry(0, 0),
            pattern.entry(1, 2),
            pattern.entry(1, 0),
            pattern.entry(1, 1))
        .doesNotContain(-1);
  }

  @Test
  void entryOutsideTheMatrix_isRefused() {
    assertThatThrownBy(() -> new PatternBuilder(3).pair(0, 3))
        .isInstanceOf(IndexOutOfBoundsException.class)
        .hasMessage("entry (0, 3) lies outside a matrix of 3 unknowns");
  }

  @Test
  void coordinatesOfAnotherLength_areRefused() {
    SymmetricPattern pattern = new PatternBuilder(4).build();
    assertThatThrownBy(() -> SparseSolver.analyse(pattern, new double[2][3]))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("[2][4]");
  }
}
