package org.annulet.solver.sparse;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.offset;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.apache.commons.math3.complex.Complex;
import org.apache.commons.math3.complex.ComplexField;
import org.apache.commons.math3.linear.Array2DRowFieldMatrix;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.EigenDecomposition;
import org.apache.commons.math3.linear.FieldLUDecomposition;
import org.apache.commons.math3.linear.LUDecomposition;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * What every factorisation must do. The yardsticks are dense LU with pivoting and dense eigenvalues
 * of Apache Commons Math, which shares no code with ours.
 */
abstract class SymmetricAnalysisContract {
  abstract SymmetricAnalysis analyse(SymmetricPattern pattern, double[][] coordinates);

  static Stream<TestMatrix> small() {
    List<TestMatrix> all = new ArrayList<>();
    for (long seed = 1; seed <= 12; seed++) {
      all.add(TestMatrix.random(seed, 5 * (int) seed));
    }
    all.add(TestMatrix.random(20, 1));
    all.add(TestMatrix.diagonal(17));
    all.add(TestMatrix.grid(9, 7, 0.61, 0.2));
    all.add(TestMatrix.grid(2, 40, 1.13, 0));
    all.add(TestMatrix.ring(4, 15, 0.37, 0.4));
    all.add(TestMatrix.ring(3, 3, -1, 3));
    return all.stream();
  }

  static Stream<TestMatrix> large() {
    return Stream.of(
        TestMatrix.grid(60, 55, 0.0613, 0.02),
        TestMatrix.ring(12, 300, 0.0317, 0.01),
        TestMatrix.random(5, 2500));
  }

  static Stream<TestMatrix> all() {
    return Stream.concat(small(), large());
  }

  private SymmetricAnalysis analyse(TestMatrix a) {
    return analyse(a.pattern(), a.coordinates());
  }

  @ParameterizedTest
  @MethodSource("all")
  void realSystem_isSolvedToRoundingError(TestMatrix a) {
    double[][] x = TestMatrix.rightHandSides(7, 3, a.size());
    double[][] b = product(a, a.re(), x);
    double[][] solved = copy(b);
    double stated = analyse(a).factorReal(a.re()).solve(solved);
    // Random matrices are ill-conditioned without pivoting: 1e-13 leaves room for a growth of 1e3.
    assertThat(stated).isLessThan(1e-13);
    double[][] back = product(a, a.re(), solved);
    for (int c = 0; c < b.length; c++) {
      assertThat(distance(back[c], b[c])).isLessThan(2e-13 * norm(b[c]));
    }
  }

  @ParameterizedTest
  @MethodSource("all")
  void complexSystem_isSolvedToRoundingError(TestMatrix a) {
    double[][] re = TestMatrix.rightHandSides(1, 3, a.size());
    double[][] im = TestMatrix.rightHandSides(2, 3, a.size());
    double[][] xRe = copy(re);
    double[][] xIm = copy(im);
    double stated = analyse(a).factorComplex(a.re(), a.im()).solve(xRe, xIm);
    assertThat(stated).isLessThan(1e-13);
    double[][] rr = product(a, a.re(), xRe);
    double[][] ii = product(a, a.im(), xIm);
    double[][] ri = product(a, a.re(), xIm);
    double[][] ir = product(a, a.im(), xRe);
    for (int c = 0; c < re.length; c++) {
      for (int i = 0; i < a.size(); i++) {
        rr[c][i] -= ii[c][i];
        ri[c][i] += ir[c][i];
      }
      assertThat(distance(rr[c], re[c])).isLessThan(2e-13 * norm(re[c]));
      assertThat(distance(ri[c], im[c])).isLessThan(2e-13 * norm(im[c]));
    }
  }

  @ParameterizedTest
  @MethodSource("small")
  void negativePivots_countNegativeEigenvalues(TestMatrix a) {
    double[] eigenvalues =
        new EigenDecomposition(new Array2DRowRealMatrix(a.dense(a.re()))).getRealEigenvalues();
    long negative = IntStream.range(0, a.size()).filter(i -> eigenvalues[i] < 0).count();
    assertThat(analyse(a).factorReal(a.re()).negativePivots()).isEqualTo((int) negative);
  }

  @ParameterizedTest
  @MethodSource("small")
  void realDeterminant_isThatOfDenseLu(TestMatrix a) {
    double expected =
        new LUDecomposition(new Array2DRowRealMatrix(a.dense(a.re()))).getDeterminant();
    LogDeterminant det = analyse(a).factorReal(a.re()).logDeterminant();
    // Absolute in the logarithm is relative in the determinant; 1e-10: condition up to 1e5.
    assertThat(det.logModulus()).isCloseTo(Math.log(Math.abs(expected)), offset(1e-10));
    assertThat(det.phase()).isEqualTo(expected < 0 ? Math.PI : 0);
  }

  @ParameterizedTest
  @MethodSource("small")
  void complexDeterminant_isThatOfDenseLu(TestMatrix a) {
    double[][] re = a.dense(a.re());
    double[][] im = a.dense(a.im());
    Complex[][] dense = new Complex[a.size()][a.size()];
    for (int i = 0; i < a.size(); i++) {
      for (int j = 0; j < a.size(); j++) {
        dense[i][j] = new Complex(re[i][j], im[i][j]);
      }
    }
    Complex expected =
        new FieldLUDecomposition<>(new Array2DRowFieldMatrix<>(ComplexField.getInstance(), dense))
            .getDeterminant();
    LogDeterminant det = analyse(a).factorComplex(a.re(), a.im()).logDeterminant();
    assertThat(det.logModulus()).isCloseTo(Math.log(expected.abs()), offset(1e-9));
    assertThat(Math.cos(det.phase() - expected.getArgument())).isCloseTo(1, offset(1e-12));
    assertThat(Math.sin(det.phase() - expected.getArgument())).isCloseTo(0, offset(1e-9));
    assertThat(det.phase()).isBetween(-Math.PI, Math.PI);
  }

  @ParameterizedTest
  @MethodSource("all")
  void severalRightHandSides_giveWhatEachGivesAlone(TestMatrix a) {
    RealFactor real = analyse(a).factorReal(a.re());
    ComplexFactor complex = analyse(a).factorComplex(a.re(), a.im());
    double[][] re = TestMatrix.rightHandSides(3, 11, a.size());
    double[][] im = TestMatrix.rightHandSides(4, 11, a.size());
    double[][] together = copy(re);
    real.solve(together);
    double[][] bothRe = copy(re);
    double[][] bothIm = copy(im);
    complex.solve(bothRe, bothIm);
    for (int c = 0; c < re.length; c++) {
      double[] alone = re[c].clone();
      real.solve(alone);
      assertThat(distance(alone, together[c])).isLessThan(1e-9 * norm(alone));
      double[][] oneRe = {re[c].clone()};
      double[][] oneIm = {im[c].clone()};
      complex.solve(oneRe, oneIm);
      assertThat(distance(oneRe[0], bothRe[c])).isLessThan(1e-9 * norm(oneRe[0]));
      assertThat(distance(oneIm[0], bothIm[c])).isLessThan(1e-9 * norm(oneIm[0]));
    }
  }

  @Test
  void unrefinedSolution_isThatOfTheRefinedOneToTheConditionOfTheMatrix() {
    TestMatrix a = TestMatrix.ring(8, 40, 0.37, 0.4);
    double[][] re = TestMatrix.rightHandSides(3, 9, a.size());
    double[][] im = TestMatrix.rightHandSides(4, 9, a.size());
    double[][] oneRe = copy(re);
    double[][] oneIm = copy(im);
    ComplexFactor complex = analyse(a).factorComplex(a.re(), a.im());
    complex.solveUnrefined(oneRe, oneIm);
    double[][] real = copy(re);
    double[][] oneReal = copy(re);
    analyse(a).factorReal(a.re()).solve(real);
    analyse(a).factorReal(a.re()).solveUnrefined(oneReal);
    complex.solve(re, im);
    for (int c = 0; c < re.length; c++) {
      // Damping bounds the complex inverse by 1/0.4; the real one is indefinite, condition 1e4.
      assertThat(distance(oneRe[c], re[c])).isLessThan(1e-13 * norm(re[c]));
      assertThat(distance(oneIm[c], im[c])).isLessThan(1e-13 * norm(im[c]));
      assertThat(distance(oneReal[c], real[c])).isLessThan(1e-11 * norm(real[c]));
    }
  }

  @Test
  void rightHandSideOfAnotherLength_isRefused() {
    TestMatrix a = TestMatrix.grid(8, 8, 0.1, 0.1);
    RealFactor real = analyse(a).factorReal(a.re());
    ComplexFactor complex = analyse(a).factorComplex(a.re(), a.im());
    assertThatThrownBy(() -> real.solve(new double[64], new double[63]))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessage("right-hand side 1 has 63 entries, the matrix 64 rows");
    assertThatThrownBy(() -> complex.solve(new double[1][64], new double[1][63]))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("63 imaginary entries");
    assertThatThrownBy(() -> complex.solveUnrefined(new double[2][64], new double[1][64]))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("2 real and 1 imaginary columns");
  }

  @Test
  void matrixWithoutUnknowns_hasDeterminantOne() {
    SymmetricPattern none = new PatternBuilder(0).build();
    assertThat(analyse(none, null).factorReal(new double[0]).logDeterminant())
        .isEqualTo(new LogDeterminant(0, 0));
  }

  @Test
  void shiftOnAnEigenvalue_stillLeavesASmallResidual() {
    TestMatrix a = TestMatrix.ring(5, 30, 0, 0);
    double[] eigenvalues =
        new EigenDecomposition(new Array2DRowRealMatrix(a.dense(a.re()))).getRealEigenvalues();
    double shift = eigenvalues[a.size() / 2] * (1 + 1e-14);
    double[] shifted = a.re().clone();
    for (int i = 0; i < a.size(); i++) {
      shifted[a.pattern().entry(i, i)] -= shift;
    }
    double[][] b = TestMatrix.rightHandSides(9, 2, a.size());
    RealFactor factor = analyse(a).factorReal(shifted);
    factor.solve(b);
    // ‖x‖ is up to 1e14 times the right-hand side, so x must be an eigenvector to about that.
    double[][] product = product(a, shifted, b);
    for (int c = 0; c < b.length; c++) {
      assertThat(norm(product[c])).isLessThan(1e-11 * norm(b[c]));
    }
  }

  @Test
  void indefiniteHelmholtzOnTheImaginaryAxis_isSolvedWithBoundedGrowth() {
    TestMatrix a = TestMatrix.ring(8, 80, 0.9, 0);
    ComplexFactor factor = analyse(a).factorComplex(a.re(), a.im());
    double[][] re = TestMatrix.rightHandSides(9, 1, a.size());
    double[][] im = TestMatrix.rightHandSides(8, 1, a.size());
    assertThat(factor.solve(re, im)).isLessThan(1e-13);
    assertThat(factor.pivotGrowth()).isBetween(1.0, 1e8);
  }

  @Test
  void smallLeadingBlock_showsAsPivotGrowth() {
    SymmetricPattern pattern = new PatternBuilder(2).pair(0, 1).build();
    double[] values = {1e-9, 1, 1e-9};
    assertThat(analyse(pattern, null).factorReal(values).pivotGrowth()).isCloseTo(1e9, within(1.0));
    assertThat(analyse(pattern, null).factorComplex(values, new double[3]).pivotGrowth())
        .isCloseTo(1e9, within(1.0));
  }

  @Test
  void zeroPivot_isNamedWithTheRemedy() {
    SymmetricPattern pattern = new PatternBuilder(3).build();
    double[] values = {1, 0, 2};
    SymmetricAnalysis analysis = analyse(pattern, null);
    assertThatThrownBy(() -> analysis.factorReal(values))
        .isInstanceOf(ArithmeticException.class)
        .hasMessageContaining("unknown 1 is zero")
        .hasMessageContaining("move the shift");
    assertThatThrownBy(() -> analysis.factorComplex(values, new double[3]))
        .isInstanceOf(ArithmeticException.class)
        .hasMessageContaining("unknown 1 is zero");
  }

  @Test
  void valueThatIsNoNumber_isRefused() {
    TestMatrix a = TestMatrix.grid(8, 8, 0.1, 0.1);
    double[] re = a.re().clone();
    re[40] = Double.NaN;
    SymmetricAnalysis analysis = analyse(a);
    assertThatThrownBy(() -> analysis.factorReal(re)).isInstanceOf(ArithmeticException.class);
    assertThatThrownBy(() -> analysis.factorComplex(re, a.im()))
        .isInstanceOf(ArithmeticException.class)
        .hasMessageContaining("not finite");
  }

  @Test
  void zeroRightHandSide_hasZeroSolutionAndResidual() {
    TestMatrix a = TestMatrix.grid(8, 8, 0.1, 0.1);
    double[] b = new double[a.size()];
    assertThat(analyse(a).factorReal(a.re()).solve(b)).isZero();
    assertThat(norm(b)).isZero();
  }

  @Test
  void factorisationsSideBySide_agreeWithOneByOne() {
    TestMatrix a = TestMatrix.grid(30, 30, 0.3, 0.1);
    SymmetricAnalysis analysis = analyse(a);
    List<LogDeterminant> alone = new ArrayList<>();
    for (int k = 0; k < 8; k++) {
      alone.add(analysis.factorComplex(a.re(), scaled(a.im(), k)).logDeterminant());
    }
    List<LogDeterminant> together =
        IntStream.range(0, 8)
            .parallel()
            .mapToObj(k -> analysis.factorComplex(a.re(), scaled(a.im(), k)).logDeterminant())
            .toList();
    assertThat(together).isEqualTo(alone);
  }

  @Test
  void statedSizes_coverTheMatrixItself() {
    TestMatrix a = TestMatrix.grid(30, 30, 0.3, 0.1);
    SymmetricAnalysis analysis = analyse(a);
    assertThat(analysis.pattern()).isSameAs(a.pattern());
    // A factor holds its matrix, and a band of 30 x 30² is more than any of our orderings needs.
    assertThat(analysis.factorEntries()).isBetween((long) a.pattern().entryCount(), 31L * 900);
    assertThat(analysis.complexFactorBytes()).isGreaterThan(16 * analysis.factorEntries());
  }

  private static double[] scaled(double[] x, double a) {
    double[] y = x.clone();
    for (int i = 0; i < y.length; i++) {
      y[i] *= a;
    }
    return y;
  }

  private static double[][] product(TestMatrix a, double[] values, double[][] x) {
    double[][] y = new double[x.length][a.size()];
    for (int c = 0; c < x.length; c++) {
      a.pattern().addProduct(values, x[c], 1, y[c]);
    }
    return y;
  }

  private static double[][] copy(double[][] x) {
    return Stream.of(x).map(double[]::clone).toArray(double[][]::new);
  }

  private static double norm(double[] x) {
    return distance(x, new double[x.length]);
  }

  private static double distance(double[] x, double[] y) {
    double sum = 0;
    for (int i = 0; i < x.length; i++) {
      sum += (x[i] - y[i]) * (x[i] - y[i]);
    }
    return Math.sqrt(sum);
  }
}
