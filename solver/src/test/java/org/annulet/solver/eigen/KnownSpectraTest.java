package org.annulet.solver.eigen;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Random;
import java.util.stream.LongStream;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.modes.ModeSet;
import org.annulet.solver.modes.Window;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.Analytic;
import org.annulet.solver.operator.SparseTerm;
import org.annulet.solver.sparse.PatternBuilder;
import org.annulet.solver.sparse.SymmetricPattern;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Random operators built from their spectrum: XᵀΛX + s XᵀDX + s² XᵀX with diagonal Λ and D has the
 * roots of λ_i + s d_i + s², every fourth of them double.
 */
class KnownSpectraTest {
  private static final Window WINDOW = new Window(40, 500, -300, 300);

  static LongStream seeds() {
    return LongStream.rangeClosed(1, 8);
  }

  @ParameterizedTest
  @MethodSource("seeds")
  void everyRootOfARandomOperatorIsFound_doublesTwice(long seed) {
    Random random = new Random(seed);
    int n = seed % 2 == 0 ? 40 : 75;
    double[] lambda = new double[n];
    double[] d = new double[n];
    List<Complex> roots = new ArrayList<>();
    for (int i = 0; i < n; i++) {
      boolean twin = i % 4 == 3;
      double f = 20 + 40.0 * i + 15 * random.nextDouble();
      lambda[i] = twin ? lambda[i - 1] : Math.pow(2 * Math.PI * f, 2);
      d[i] = twin ? d[i - 1] : 700 * (random.nextDouble() - 0.5);
      Complex s = new Complex(-d[i] / 2, Math.sqrt(lambda[i] - d[i] * d[i] / 4));
      if (WINDOW.contains(s.getReal(), s.getImaginary() / (2 * Math.PI))) {
        roots.add(s);
      }
    }
    double[][] x = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        x[i][j] = (i == j ? 1 : 0) + 0.3 * random.nextGaussian() / Math.sqrt(n);
      }
    }
    double[] ones = new double[n];
    java.util.Arrays.fill(ones, 1);
    PatternBuilder builder = new PatternBuilder(n);
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < i; j++) {
        builder.pair(i, j);
      }
    }
    SymmetricPattern pattern = builder.build();
    AcousticOperator op =
        new AcousticOperator(
            pattern,
            form(pattern, x, lambda),
            form(pattern, x, ones),
            List.of(new SparseTerm("wall", form(pattern, x, d), Analytic.power(1, 1))),
            List.of(),
            null);

    ModeSet set = ModeSearch.find(op, WINDOW, SearchSettings.standard());

    assertThat(set.complete()).as("seed %d: %s", seed, set.notes()).isTrue();
    assertThat(set.modes()).as("seed %d", seed).hasSameSizeAs(roots);
    roots.sort(Comparator.comparingDouble(Complex::getImaginary));
    for (int i = 0; i < roots.size(); i++) {
      Mode m = set.modes().get(i);
      Complex s = new Complex(m.growthRate(), 2 * Math.PI * m.frequency());
      // backward error 1e-10 times the condition of X squared, a few tens
      assertThat(s.subtract(roots.get(i)).abs())
          .as("seed %d, root %s", seed, roots.get(i))
          .isLessThan(1e-8 * roots.get(i).abs());
    }
  }

  private static double[] form(SymmetricPattern pattern, double[][] x, double[] diagonal) {
    double[] v = new double[pattern.entryCount()];
    for (int i = 0; i < x.length; i++) {
      for (int j = 0; j <= i; j++) {
        double sum = 0;
        for (int k = 0; k < x.length; k++) {
          sum += x[k][i] * diagonal[k] * x[k][j];
        }
        v[pattern.entry(i, j)] = sum;
      }
    }
    return v;
  }
}
