package org.annulet.solver.sparse;

import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.MappedByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.Locale;

/**
 * Times the sparse kernel on a matrix file of the reference side (see solver/benchmark) and prints
 * one line of JSON. Times are CPU seconds of the whole process, compiler and collector included.
 * Not a test: run by hand.
 */
final class SparseKernelBenchmark {
  private static final com.sun.management.OperatingSystemMXBean SYSTEM =
      (com.sun.management.OperatingSystemMXBean) ManagementFactory.getOperatingSystemMXBean();

  private SparseKernelBenchmark() {}

  /**
   * Arguments: matrix file, number of warm repetitions.
   *
   * @throws IOException if the file cannot be read
   */
  public static void main(String[] arguments) throws IOException {
    Matrices m = Matrices.read(Path.of(arguments[0]));
    int repetitions = Integer.parseInt(arguments[1]);
    int n = m.pattern.size();
    double[] re = m.combine(1, 20 * 20 - 4 * Math.PI * Math.PI * 360000, 20);
    double[] im = m.combine(0, 2 * 20 * 2 * Math.PI * 600, 2 * Math.PI * 600);
    double[] real = m.combine(1, -4 * Math.PI * Math.PI * 360000, 0);
    StringBuilder line = new StringBuilder();
    line.append("{\"n\": ").append(n);
    double coldAnalysis = 0;
    double coldComplex = 0;
    double[] analysis = new double[repetitions + 1];
    double[] complex = new double[repetitions + 1];
    double[] reals = new double[repetitions + 1];
    double[] one = new double[repetitions + 1];
    double[] oneReal = new double[repetitions + 1];
    double[] unrefined = new double[repetitions + 1];
    double[] eight = new double[repetitions + 1];
    double residual = 0;
    long entries = 0;
    long bytes = 0;
    double growth = 0;
    for (int r = 0; r <= repetitions; r++) {
      double t = cpu();
      SymmetricAnalysis a = SparseSolver.analyse(m.pattern, m.at);
      analysis[r] = cpu() - t;
      entries = a.factorEntries();
      bytes = a.complexFactorBytes();
      t = cpu();
      ComplexFactor z = a.factorComplex(re, im);
      complex[r] = cpu() - t;
      growth = z.pivotGrowth();
      if (r == 0) {
        coldAnalysis = analysis[0];
        coldComplex = complex[0];
      }
      t = cpu();
      residual = Math.max(residual, z.solve(ones(1, n), new double[1][n]));
      one[r] = cpu() - t;
      t = cpu();
      z.solveUnrefined(ones(1, n), new double[1][n]);
      unrefined[r] = cpu() - t;
      t = cpu();
      residual = Math.max(residual, z.solve(ones(8, n), new double[8][n]));
      eight[r] = cpu() - t;
      z = null;
      t = cpu();
      RealFactor x = a.factorReal(real);
      reals[r] = cpu() - t;
      t = cpu();
      residual = Math.max(residual, x.solve(ones(1, n)));
      oneReal[r] = cpu() - t;
    }
    line.append(figure("analysis_cold", coldAnalysis)).append(figure("complex_cold", coldComplex));
    line.append(figure("analysis", warm(analysis))).append(figure("complex", warm(complex)));
    line.append(figure("real", warm(reals))).append(figure("solve_complex", warm(one)));
    line.append(figure("solve_once_complex", warm(unrefined)));
    line.append(figure("solve_complex_8", warm(eight)));
    line.append(figure("solve_real", warm(oneReal)));
    line.append(String.format(Locale.ROOT, ", \"residual\": %.3e", residual));
    line.append(String.format(Locale.ROOT, ", \"growth\": %.3e", growth));
    line.append(", \"entries\": ").append(entries).append(", \"bytes\": ").append(bytes);
    System.out.println(line.append('}'));
  }

  private static String figure(String name, double value) {
    return String.format(Locale.ROOT, ", \"%s\": %.4f", name, value);
  }

  /** The mean of the later half of the repetitions: the clock ticks in hundredths of a second. */
  private static double warm(double[] times) {
    return Arrays.stream(times).skip(times.length / 2).average().orElseThrow();
  }

  private static double cpu() {
    return SYSTEM.getProcessCpuTime() * 1e-9;
  }

  private static double[][] ones(int columns, int n) {
    double[][] b = new double[columns][n];
    for (double[] column : b) {
      Arrays.fill(column, 1);
    }
    return b;
  }

  /** Stiffness, mass and boundary matrix on one pattern, with the coordinates. */
  private record Matrices(
      SymmetricPattern pattern, double[] k, double[] m, double[] b, double[][] at) {

    double[] combine(double a, double c, double d) {
      double[] v = new double[k.length];
      for (int q = 0; q < v.length; q++) {
        v[q] = a * k[q] + c * m[q] + d * b[q];
      }
      return v;
    }

    static Matrices read(Path file) throws IOException {
      try (FileChannel channel = FileChannel.open(file)) {
        long length = Math.min(channel.size(), Integer.MAX_VALUE);
        MappedByteBuffer in = channel.map(FileChannel.MapMode.READ_ONLY, 0, length);
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
        return new Matrices(pattern, k, m, b, at);
      }
    }

    private static double[] take(ByteBuffer in, int entries, int[] source) {
      int base = in.position();
      double[] v = new double[source.length];
      Arrays.setAll(v, q -> in.getDouble(base + 8 * source[q]));
      in.position(base + 8 * entries);
      return v;
    }
  }
}
