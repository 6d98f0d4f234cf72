package org.annulet.cases.study;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.CaseReader;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.LowRankTerm;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Assembly that remembers against assembly anew. */
class CaseMemoryTest {
  private static final Complex S = new Complex(-40, 2300);

  @TempDir static Path folder;
  private static CaseFile base;
  private static CaseMemory memory;

  @BeforeAll
  static void assembleOnce() throws Exception {
    String text =
        Files.readString(Path.of("hydrogen-ring/case.yaml"))
            .replace("mesh_size: 12 mm", "mesh_size: 40 mm")
            .replace("mesh_size_at: {burners: 6 mm}", "mesh_size_at: {burners: 20 mm}");
    Path file = folder.resolve("case.yaml");
    Files.writeString(file, text);
    base = CaseReader.read(file).orThrow();
    memory = new CaseMemory(base, ChamberShape.of(base));
    CaseProblem.on(base, memory);
    CaseProblem.whole(base, memory);
  }

  @ParameterizedTest
  @CsvSource({
    "flames.main.response.delay, 2.4 ms",
    "flames.main.heat_release, 9 MW",
    "flames.main.reference_velocity, 44 m/s",
    "walls.chamber.downstream.admittance, 0.4",
    "walls.plenum.upstream, open",
    "two_ports.burners.inlet.loss_coefficient, 2.5",
    "two_ports.burners.inlet.velocity, 20 m/s",
    "gas.zones.chamber.temperature, 1500 K",
    "gas.mean_pressure, 3 bar",
  })
  void changedCase_assembledOnMemory_isTheCaseAssembledAnew(String key, String value) {
    CaseFile changed = base.with(Map.of(key, value)).orThrow();
    equal(CaseProblem.on(changed, memory), CaseProblem.on(changed, memory.shape()));
    equal(CaseProblem.whole(changed, memory), CaseProblem.whole(changed, memory.shape()));
  }

  @Test
  void changeOfDelay_leavesTheArraysWhereTheyAre() {
    CaseFile changed = base.with(Map.of("flames.main.response.delay", "3 ms")).orThrow();
    AcousticOperator before = CaseProblem.on(base, memory).parts().get(2).assembled().operator();
    AcousticOperator after = CaseProblem.on(changed, memory).parts().get(2).assembled().operator();
    assertThat(after.stiffness()).isSameAs(before.stiffness());
    assertThat(after.mass()).isSameAs(before.mass());
    for (int i = 0; i < before.lowRankTerms().size(); i++) {
      LowRankTerm term = before.lowRankTerms().get(i);
      for (int j = 0; j < term.left().size(); j++) {
        assertThat(after.lowRankTerms().get(i).left().get(j)).isSameAs(term.left().get(j));
      }
    }
  }

  private static void equal(CaseProblem a, CaseProblem b) {
    assertThat(a.parts()).hasSameSizeAs(b.parts());
    for (int p = 0; p < a.parts().size(); p++) {
      AcousticOperator x = a.parts().get(p).assembled().operator();
      AcousticOperator y = b.parts().get(p).assembled().operator();
      assertThat(x.stiffness()).isEqualTo(y.stiffness());
      assertThat(x.mass()).isEqualTo(y.mass());
      assertThat(x.sparseTerms()).hasSameSizeAs(y.sparseTerms());
      for (int i = 0; i < x.sparseTerms().size(); i++) {
        assertThat(x.sparseTerms().get(i).name()).isEqualTo(y.sparseTerms().get(i).name());
        assertThat(x.sparseTerms().get(i).values()).isEqualTo(y.sparseTerms().get(i).values());
        assertThat(x.sparseTerms().get(i).coefficient().value(S))
            .isEqualTo(y.sparseTerms().get(i).coefficient().value(S));
      }
      assertThat(x.lowRankTerms()).hasSameSizeAs(y.lowRankTerms());
      for (int i = 0; i < x.lowRankTerms().size(); i++) {
        equal(x.lowRankTerms().get(i), y.lowRankTerms().get(i));
      }
    }
  }

  private static void equal(LowRankTerm x, LowRankTerm y) {
    assertThat(x.name()).isEqualTo(y.name());
    for (int j = 0; j < x.left().size(); j++) {
      assertThat(x.left().get(j).value()).isEqualTo(y.left().get(j).value());
      assertThat(x.left().get(j).index()).isEqualTo(y.left().get(j).index());
    }
    for (int j = 0; j < x.right().size(); j++) {
      assertThat(x.right().get(j).value()).isEqualTo(y.right().get(j).value());
      assertThat(x.right().get(j).index()).isEqualTo(y.right().get(j).index());
    }
    for (int i = 0; i < x.left().size(); i++) {
      for (int j = 0; j < x.right().size(); j++) {
        if (x.coefficient()[i][j] != null) {
          assertThat(x.coefficient()[i][j].value(S)).isEqualTo(y.coefficient()[i][j].value(S));
        }
      }
    }
  }
}
