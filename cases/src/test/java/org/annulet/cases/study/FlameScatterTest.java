package org.annulet.cases.study;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.CaseReader;
import org.annulet.solver.eigen.ModeSearch;
import org.annulet.solver.eigen.PreparedOperator;
import org.annulet.solver.eigen.SearchSettings;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.modes.ModeSet;
import org.annulet.solver.modes.Window;
import org.annulet.solver.ports.FlameScatter;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * Burners that differ, condensed onto themselves, against the whole ring staged and solved in full.
 */
class FlameScatterTest {
  private static final double[] GAIN = {1.05, 0.93, 1.0, 1.12, 0.97, 0.9};
  private static final double[] LATER = {0, 6e-5, -4e-5, 2e-5, 9e-5, -7e-5};

  @TempDir private Path folder;

  private CaseFile ring(String staging) throws Exception {
    String text = String.format(DamperStudyTest.RING, staging);
    Path file = folder.resolve("case.yaml");
    Files.writeString(file, text);
    return CaseReader.read(file).orThrow();
  }

  @Test
  void scatteredBurners_haveTheModesOfTheWholeStagedRing() throws Exception {
    CaseFile alike = ring("");
    StringBuilder staging = new StringBuilder("staging:\n");
    for (int j = 0; j < 6; j++) {
      staging.append(
          String.format(
              java.util.Locale.ROOT,
              "            - {burners: [%d], gain: %.6f, delay: %.6f ms}%n",
              j + 1,
              0.7 * GAIN[j],
              2.2 + 1e3 * LATER[j]));
    }
    CaseFile staged = ring(staging.toString());
    Window window = new Window(250, 1000, -500, 400);
    Window wide = new Window(150, 1200, -700, 500);
    ChamberShape shape = ChamberShape.of(alike);
    List<FlameScatter.Cell> cells = new ArrayList<>();
    for (CaseProblem.Part part : CaseProblem.on(alike, shape).parts()) {
      PreparedOperator op = new PreparedOperator(part.assembled().operator());
      ModeSet set = ModeSearch.find(op, wide, SearchSettings.standard());
      List<Complex> modes = new ArrayList<>();
      set.modes().forEach(m -> modes.add(s(m)));
      set.outside().forEach(m -> modes.add(s(m)));
      cells.add(
          new FlameScatter.Cell(
              Integer.parseInt(part.name().replaceAll("\\D", "")), part.copies(), op, modes));
    }
    FlameScatter scatter = FlameScatter.of(cells, "flame main", 6, wide);
    List<FlameScatter.Ratio> ratios = new ArrayList<>();
    for (int j = 0; j < 6; j++) {
      int burner = j;
      ratios.add(
          s -> {
            Complex rho = s.multiply(-LATER[burner]).exp().multiply(GAIN[burner]);
            return new Complex[] {rho, rho.multiply(-LATER[burner])};
          });
    }

    List<Complex> found = new ArrayList<>();
    for (Complex[] members : scatter.roots(window, ratios)) {
      found.addAll(List.of(members));
    }

    assertThat(scatter.error()).isLessThan(1e-7);
    ModeSet truth =
        ModeSearch.find(
            CaseProblem.whole(staged, shape).parts().get(0).assembled().operator(),
            window,
            SearchSettings.standard());
    assertThat(truth.complete()).isTrue();
    assertThat(truth.modes()).hasSizeGreaterThan(2);
    for (Mode m : truth.modes()) {
      double nearest = found.stream().mapToDouble(z -> z.subtract(s(m)).abs()).min().orElseThrow();
      assertThat(nearest).isLessThan(1e-9 * s(m).abs());
    }
    long inside =
        found.stream()
            .filter(z -> window.contains(z.getReal(), z.getImaginary() / (2 * Math.PI)))
            .count();
    assertThat(inside).isEqualTo(truth.modes().size());
  }

  private static Complex s(Mode m) {
    return new Complex(m.growthRate(), 2 * Math.PI * m.frequency());
  }
}
