package org.annulet.solver.eigen;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.channels.FileChannel;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.Analytic;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.operator.LowRankTerm;
import org.annulet.solver.operator.SparseTerm;
import org.annulet.solver.operator.SparseVector;
import org.annulet.solver.sparse.SymmetricPattern;

/**
 * The plane ring with twelve burners of the reference scripts, from the file their export writes:
 * wall impedance 100, n–τ flames answering to a radial gradient, the first two with a longer delay.
 */
record ReferenceRing(
    SymmetricPattern pattern,
    double[] stiffness,
    double[] mass,
    double[] wall,
    double[][] coordinates,
    double strength,
    List<SparseVector> heat,
    List<SparseVector> reference) {
  /** The file's wall has the impedance 20, the active problem 100. */
  private static final double WALL_SHARE = 20.0 / 100;

  /**
   * The operator.
   *
   * @param n interaction index
   * @param tau delay in s
   * @param split share by which the first two delays are longer
   */
  AcousticOperator operator(double n, double tau, double split) {
    double[] b = Arrays.stream(wall).map(v -> WALL_SHARE * v).toArray();
    List<LowRankTerm> flames = new ArrayList<>();
    for (int j = 0; j < heat.size(); j++) {
      AnalyticFunction[][] phi = {
        {new Gallery.Delay(strength * n, 0, j < 2 ? tau * (1 + split) : tau)}
      };
      flames.add(
          new LowRankTerm("flame " + j, List.of(heat.get(j)), List.of(reference.get(j)), phi));
    }
    return new AcousticOperator(
        pattern,
        stiffness,
        mass,
        List.of(new SparseTerm("wall outer", b, Analytic.power(1, 1))),
        flames,
        coordinates);
  }

  static ReferenceRing read(Path file) throws IOException {
    try (FileChannel channel = FileChannel.open(file)) {
      ByteBuffer in = channel.map(FileChannel.MapMode.READ_ONLY, 0, channel.size());
      in.order(ByteOrder.LITTLE_ENDIAN);
      int n = (int) in.getLong();
      int entries = (int) in.getLong();
      int[] start = new int[n + 1];
      Arrays.setAll(start, i -> in.getInt());
      int[] column = new int[entries];
      Arrays.setAll(column, i -> in.getInt());
      int[] rowStart = new int[n + 1];
      int[] lower = new int[entries];
      int[] source = new int[entries];
      int count = 0;
      for (int i = 0; i < n; i++) {
        for (int q = start[i]; q < start[i + 1]; q++) {
          if (column[q] <= i) {
            source[count] = q;
            lower[count++] = column[q];
          }
        }
        rowStart[i + 1] = count;
      }
      source = Arrays.copyOf(source, count);
      SymmetricPattern pattern = new SymmetricPattern(rowStart, Arrays.copyOf(lower, count));
      double[] k = take(in, entries, source);
      double[] m = take(in, entries, source);
      double[] b = take(in, entries, source);
      double[][] at = new double[2][n];
      for (int i = 0; i < n; i++) {
        at[0][i] = in.getDouble();
        at[1][i] = in.getDouble();
      }
      int flames = (int) in.getLong();
      double strength = in.getDouble();
      List<SparseVector> heat = new ArrayList<>();
      List<SparseVector> reference = new ArrayList<>();
      for (int j = 0; j < flames; j++) {
        heat.add(sparse(in, n));
        reference.add(sparse(in, n));
      }
      return new ReferenceRing(pattern, k, m, b, at, strength, heat, reference);
    }
  }

  private static double[] take(ByteBuffer in, int entries, int[] source) {
    int base = in.position();
    double[] v = new double[source.length];
    Arrays.setAll(v, q -> in.getDouble(base + 8 * source[q]));
    in.position(base + 8 * entries);
    return v;
  }

  private static SparseVector sparse(ByteBuffer in, int n) {
    double[] dense = new double[n];
    Arrays.setAll(dense, i -> in.getDouble());
    int[] index = java.util.stream.IntStream.range(0, n).filter(i -> dense[i] != 0).toArray();
    return new SparseVector(index, Arrays.stream(index).mapToDouble(i -> dense[i]).toArray());
  }
}
