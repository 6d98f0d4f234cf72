package org.annulet.solver.eigen;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import org.annulet.solver.dense.ComplexEigen;
import org.annulet.solver.dense.ComplexLu;
import org.annulet.solver.dense.ComplexMatrix;
import org.annulet.solver.dense.ComplexSvd;
import org.annulet.solver.dense.OrthonormalColumns;
import org.apache.commons.math3.complex.Complex;

/**
 * Approximate roots inside an ellipse from two moments of the resolvent (Beyn 2012).
 *
 * <pre>
 *   A₀ = 1/2πi ∮ L⁻¹R ds,  A₁ = 1/2πi ∮ (s − c) L⁻¹R ds,   A₀ = U Σ Wᴴ,   roots − c = eig(Uᴴ A₁ W Σ⁻¹)
 * </pre>
 *
 * <p>R is a fixed probe with more columns than there are roots. The ellipse circumscribes the tile,
 * corners included, so it also finds roots outside the tile: the caller sorts.
 */
final class ContourIntegral {
  private ContourIntegral() {}

  /** L(s)⁻¹ applied to columns. */
  interface Resolvent {
    int size();

    /** A new matrix with the solutions. */
    ComplexMatrix solve(Complex s, ComplexMatrix rightHandSides);
  }

  /** A rough root and its vector. */
  record Candidate(Complex s, ComplexMatrix vector) {}

  /**
   * What one ellipse gave.
   *
   * @param full whether the probe was too narrow for the number of roots
   */
  record Found(List<Candidate> candidates, boolean full) {}

  static Resolvent of(MatrixFunction f) {
    return new Resolvent() {
      @Override
      public int size() {
        return f.size();
      }

      @Override
      public ComplexMatrix solve(Complex s, ComplexMatrix b) {
        ComplexMatrix x = b.copy();
        new ComplexLu(f.value(s)).solve(x);
        return x;
      }
    };
  }

  static Resolvent of(PreparedOperator prepared) {
    return new Resolvent() {
      @Override
      public int size() {
        return prepared.size();
      }

      @Override
      public ComplexMatrix solve(Complex s, ComplexMatrix b) {
        ComplexMatrix x = b.copy();
        prepared.at(s).solve(x);
        return x;
      }
    };
  }

  /**
   * Rough roots in the ellipse around a tile.
   *
   * @param points on the ellipse, 32 to 96
   * @param columns of the probe
   */
  static Found around(Resolvent l, Rectangle tile, int points, int columns) {
    int width = Math.min(columns, l.size());
    ComplexMatrix probe = probe(l.size(), width);
    Complex centre = tile.centre();
    double a = tile.width() / Math.sqrt(2);
    double b = tile.height() / Math.sqrt(2);
    double unit = Math.max(a, b);
    List<ComplexMatrix> solutions =
        IntStream.range(0, points)
            .parallel()
            .mapToObj(k -> l.solve(centre.add(onEllipse(k, points, a, b)), probe))
            .toList();
    ComplexMatrix zeroth = new ComplexMatrix(l.size(), width);
    ComplexMatrix first = new ComplexMatrix(l.size(), width);
    for (int k = 0; k < points; k++) {
      Complex z = onEllipse(k, points, a, b);
      double t = 2 * Math.PI * (k + 0.5) / points;
      // ds/(2πi) = z′(t) dt/(2πi)
      Complex weight =
          new Complex(-a * Math.sin(t), b * Math.cos(t)).divide(new Complex(0, points));
      zeroth.add(weight, solutions.get(k));
      first.add(weight.multiply(z).divide(unit), solutions.get(k));
    }
    return extract(zeroth, first, centre, unit);
  }

  private static Complex onEllipse(int k, int points, double a, double b) {
    double t = 2 * Math.PI * (k + 0.5) / points;
    return new Complex(a * Math.cos(t), b * Math.sin(t));
  }

  private static Found extract(
      ComplexMatrix zeroth, ComplexMatrix first, Complex centre, double unit) {
    ComplexMatrix q = OrthonormalColumns.of(zeroth, 1e-13);
    if (q == null) {
      return new Found(List.of(), false);
    }
    // zeroth = Q (Qᴴ zeroth): the singular values of the small factor
    ComplexMatrix small = q.adjointTimes(zeroth);
    ComplexSvd svd = new ComplexSvd(adjoint(small)); // smallᴴ = U' Σ W'ᴴ, so small = W' Σ U'ᴴ
    int rank = svd.rank(1e-9);
    if (rank == 0) {
      return new Found(List.of(), false);
    }
    ComplexMatrix left = q.times(svd.right().columnsFrom(0, rank));
    ComplexMatrix right = svd.left().columnsFrom(0, rank);
    for (int j = 0; j < rank; j++) {
      right.scaleColumn(j, 1 / svd.values()[j]);
    }
    ComplexEigen eigen = new ComplexEigen(left.adjointTimes(first.times(right)));
    ComplexMatrix vectors = left.times(eigen.vectors());
    List<Candidate> candidates = new ArrayList<>();
    for (int j = 0; j < rank; j++) {
      Complex s = centre.add(eigen.values()[j].multiply(unit));
      candidates.add(new Candidate(s, vectors.columnsFrom(j, 1)));
    }
    return new Found(candidates, rank == zeroth.columns() && rank < zeroth.rows());
  }

  static ComplexMatrix adjoint(ComplexMatrix a) {
    ComplexMatrix b = new ComplexMatrix(a.columns(), a.rows());
    for (int i = 0; i < a.rows(); i++) {
      for (int j = 0; j < a.columns(); j++) {
        b.set(j, i, a.get(i, j).conjugate());
      }
    }
    return b;
  }

  /** Fixed, without structure: a multiplicative congruential sequence in (−1, 1). */
  static ComplexMatrix probe(int rows, int columns) {
    ComplexMatrix r = new ComplexMatrix(rows, columns);
    long x = 20_240_229L;
    for (int j = 0; j < columns; j++) {
      for (int i = 0; i < rows; i++) {
        x = x * 48_271L % 2_147_483_647L;
        r.re()[j][i] = 2.0 * x / 2_147_483_647L - 1;
        x = x * 48_271L % 2_147_483_647L;
        r.im()[j][i] = 2.0 * x / 2_147_483_647L - 1;
      }
    }
    return r;
  }
}
