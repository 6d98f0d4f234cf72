package org.annulet.solver.dense;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import org.annulet.solver.sparse.LogDeterminant;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Laws every decomposition obeys, on random matrices; spectra built to be known. */
class DenseKitTest {
  private static ComplexMatrix random(int rows, int columns, long seed) {
    Random r = new Random(seed);
    ComplexMatrix a = new ComplexMatrix(rows, columns);
    for (int j = 0; j < columns; j++) {
      for (int i = 0; i < rows; i++) {
        a.set(i, j, new Complex(r.nextGaussian(), r.nextGaussian()));
      }
    }
    return a;
  }

  private static double norm(ComplexMatrix a) {
    double sum = 0;
    for (int j = 0; j < a.columns(); j++) {
      sum += Math.pow(a.columnNorm(j), 2);
    }
    return Math.sqrt(sum);
  }

  private static double difference(ComplexMatrix a, ComplexMatrix b) {
    ComplexMatrix d = a.copy();
    d.add(Complex.ONE.negate(), b);
    return norm(d) / norm(b);
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 2, 5, 40})
  void luSolvesAndItsDeterminantIsTheProductOfTheEigenvalues(int n) {
    ComplexMatrix a = random(n, n, n);
    ComplexMatrix x = random(n, 3, 7);
    ComplexMatrix b = a.times(x);
    ComplexLu lu = new ComplexLu(a.copy());
    lu.solve(b);
    // 1e-10: rounding times the condition of a random matrix of this size
    assertThat(difference(b, x)).isLessThan(1e-10);
    LogDeterminant product = new LogDeterminant(0, 0);
    for (Complex w : new ComplexEigen(a).values()) {
      product = product.times(new LogDeterminant(Math.log(w.abs()), w.getArgument()));
    }
    assertThat(lu.logDeterminant().logModulus()).isCloseTo(product.logModulus(), within(1e-10));
    double turn = lu.logDeterminant().phase() - product.phase();
    assertThat(Math.cos(turn)).isCloseTo(1, within(1e-12));
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3, 10, 60})
  void eigenpairsSatisfyTheirEquation(int n) {
    ComplexMatrix a = random(n, n, 100 + n);
    ComplexEigen eigen = new ComplexEigen(a);
    ComplexMatrix v = eigen.vectors();
    ComplexMatrix av = a.times(v);
    ComplexMatrix vw = v.copy();
    for (int j = 0; j < n; j++) {
      for (int i = 0; i < n; i++) {
        vw.set(i, j, v.get(i, j).multiply(eigen.values()[j]));
      }
    }
    av.add(Complex.ONE.negate(), vw);
    assertThat(norm(av)).isLessThan(1e-12 * norm(a) * Math.sqrt(n));
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3})
  void aBuiltSpectrumIsFoundAgain_doublesIncluded(long seed) {
    int n = 12;
    ComplexMatrix t = random(n, n, seed);
    ComplexMatrix d = new ComplexMatrix(n, n);
    for (int i = 0; i < n; i++) {
      d.set(i, i, new Complex(i / 2, 1 - i / 2));
    }
    ComplexMatrix inverse = ComplexMatrix.identity(n);
    new ComplexLu(t.copy()).solve(inverse);
    Complex[] w = new ComplexEigen(t.times(d).times(inverse)).values();
    for (int i = 0; i < n; i++) {
      Complex exact = d.get(i, i);
      long near = java.util.Arrays.stream(w).filter(x -> x.subtract(exact).abs() < 1e-9).count();
      assertThat(near).as("eigenvalue %s, seed %d", exact, seed).isEqualTo(2);
    }
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 4, 15})
  void singularVectorsRebuildTheMatrix_andTheRankIsSeen(int n) {
    ComplexMatrix a = random(30, n, n);
    ComplexSvd svd = new ComplexSvd(a);
    ComplexMatrix us = svd.left().copy();
    for (int j = 0; j < n; j++) {
      us.scaleColumn(j, svd.values()[j]);
    }
    assertThat(difference(us.times(adjoint(svd.right())), a)).isLessThan(1e-13);
    assertThat(difference(svd.left().adjointTimes(svd.left()), ComplexMatrix.identity(n)))
        .isLessThan(1e-13);
    ComplexMatrix low = a.times(random(n, 2, 5)).times(random(2, 10, 6));
    assertThat(new ComplexSvd(low).rank(1e-10)).isEqualTo(Math.min(2, n));
    assertThat(OrthonormalColumns.of(low, 1e-10).columns()).isEqualTo(Math.min(2, n));
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4})
  void realMatrices_haveTheEigenvaluesThatLapackFinds(long seed) throws Exception {
    // LAPACK dgeev in MTJ
    PureJavaNetlib.select();
    int n = 25;
    Random r = new Random(seed);
    ComplexMatrix a = new ComplexMatrix(n, n);
    var same = new no.uib.cipr.matrix.DenseMatrix(n, n);
    for (int j = 0; j < n; j++) {
      for (int i = 0; i < n; i++) {
        a.re()[j][i] = r.nextGaussian();
        same.set(i, j, a.re()[j][i]);
      }
    }
    var lapack = no.uib.cipr.matrix.EVD.factorize(same);
    Complex[] ours = new ComplexEigen(a).values();
    for (int k = 0; k < n; k++) {
      Complex exact =
          new Complex(lapack.getRealEigenvalues()[k], lapack.getImaginaryEigenvalues()[k]);
      // rounding times the condition of an eigenvalue of a random matrix of this size
      assertThat(java.util.Arrays.stream(ours).filter(w -> w.subtract(exact).abs() < 1e-10))
          .as("eigenvalue %s, seed %d", exact, seed)
          .hasSize(1);
    }
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3})
  void determinantAndSingularValues_areThoseOfCommonsMath(long seed) {
    int n = 9;
    Random r = new Random(seed);
    ComplexMatrix a = new ComplexMatrix(n, n);
    double[][] rows = new double[n][n];
    for (int j = 0; j < n; j++) {
      for (int i = 0; i < n; i++) {
        rows[i][j] = a.re()[j][i] = r.nextGaussian();
      }
    }
    var real = new org.apache.commons.math3.linear.Array2DRowRealMatrix(rows);
    double det = new org.apache.commons.math3.linear.LUDecomposition(real).getDeterminant();
    LogDeterminant ours = new ComplexLu(a.copy()).logDeterminant();
    assertThat(Math.exp(ours.logModulus()) * Math.cos(ours.phase()))
        .isCloseTo(det, within(1e-11 * Math.abs(det)));
    assertThat(Math.abs(Math.sin(ours.phase()))).isLessThan(1e-12);
    double[] sigma =
        new org.apache.commons.math3.linear.SingularValueDecomposition(real).getSingularValues();
    double[] values = new ComplexSvd(a).values();
    for (int k = 0; k < n; k++) {
      assertThat(values[k]).isCloseTo(sigma[k], within(1e-12 * sigma[0]));
    }
  }

  private static ComplexMatrix adjoint(ComplexMatrix a) {
    ComplexMatrix b = new ComplexMatrix(a.columns(), a.rows());
    for (int i = 0; i < a.rows(); i++) {
      for (int j = 0; j < a.columns(); j++) {
        b.set(j, i, a.get(i, j).conjugate());
      }
    }
    return b;
  }
}
