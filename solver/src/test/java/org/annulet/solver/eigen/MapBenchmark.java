package org.annulet.solver.eigen;

import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.annulet.solver.modes.Window;
import org.annulet.solver.operator.AcousticOperator;

/**
 * Times a map over interaction index and delay on the ring of the reference scripts: training, then
 * at every point all modes round the first azimuthal pair, found, counted and held against the full
 * operator. One line of JSON, CPU seconds of the whole process. Not a test: run by hand.
 */
final class MapBenchmark {
  private MapBenchmark() {}

  /**
   * Arguments: matrix file, points on each axis.
   *
   * @throws IOException if the file cannot be read
   */
  public static void main(String[] arguments) throws IOException {
    ReferenceRing ring = ReferenceRing.read(Path.of(arguments[0]));
    int points = Integer.parseInt(arguments[1]);
    AcousticOperator first = ring.operator(0.1, 1e-3, 0.25);
    Window window = new Window(250, 420, -300, 300);
    double cpu = cpu();
    List<AcousticOperator> training = new ArrayList<>();
    for (double n : new double[] {0.01, 0.2, 0.105}) {
      for (double tau : new double[] {0.2e-3, 3e-3, 1.6e-3, 0.9e-3, 2.3e-3}) {
        training.add(at(ring, first, n, tau));
      }
    }
    ReducedFamily family = ReducedFamily.trainedOn(training, 1, window, 1e-8);
    double trained = cpu() - cpu;
    for (int round = 0; round < 3; round++) { // the first warms the compiler up
      cpu = cpu();
      double worst = 0;
      int modes = 0;
      int counted = 0;
      int polished = 0;
      int unstable = 0;
      for (int i = 0; i < points; i++) {
        for (int j = 0; j < points; j++) {
          double n = 0.01 + 0.19 * i / (points - 1);
          double tau = 0.2e-3 + 2.8e-3 * j / (points - 1);
          int near = 5 * (i < points / 4 ? 0 : i > 3 * points / 4 ? 1 : 2);
          int row = new int[] {0, 3, 2, 4, 1}[(int) Math.round(4.0 * j / (points - 1))];
          ReducedFamily.Answer answer = family.at(at(ring, first, n, tau), near + row);
          counted += answer.counted() ? 1 : 0;
          boolean grows = false;
          for (ReducedFamily.Root root : answer.roots()) {
            worst = Math.max(worst, root.backwardError());
            polished += root.polished() ? 1 : 0;
            modes++;
            grows |= root.s().getReal() > 0;
          }
          unstable += grows ? 1 : 0;
        }
      }
      int all = points * points;
      System.out.println(
          String.format(
              Locale.ROOT,
              "{\"n\": %d, \"columns\": %d, \"points\": %d, \"cpu_training\": %.2f,"
                  + " \"cpu_per_point\": %.6f, \"modes_per_point\": %.2f, \"counted\": %d,"
                  + " \"polished\": %d, \"worst_backward_error\": %.1e, \"unstable\": %d}",
              first.size(),
              family.size(),
              all,
              trained,
              (cpu() - cpu + (round == 0 ? trained : 0)) / all,
              (double) modes / all,
              counted,
              polished,
              worst,
              unstable));
    }
  }

  /** The ring with other flames, on the arrays of one operator. */
  private static AcousticOperator at(
      ReferenceRing ring, AcousticOperator first, double n, double tau) {
    AcousticOperator own = ring.operator(n, tau, 0.25);
    return new AcousticOperator(
        first.pattern(),
        first.stiffness(),
        first.mass(),
        first.sparseTerms(),
        own.lowRankTerms(),
        first.coordinates());
  }

  private static double cpu() {
    return 1e-9
        * ((com.sun.management.OperatingSystemMXBean) ManagementFactory.getOperatingSystemMXBean())
            .getProcessCpuTime();
  }
}
