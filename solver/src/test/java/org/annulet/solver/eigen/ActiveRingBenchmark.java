package org.annulet.solver.eigen;

import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.nio.file.Path;
import java.util.Locale;
import java.util.stream.Collectors;
import org.annulet.solver.modes.ModeSet;
import org.annulet.solver.modes.Window;
import org.annulet.solver.operator.AcousticOperator;

/**
 * Times the whole active job on the ring of the reference scripts (see solver/benchmark): analysis,
 * passive modes, search, polishing and certificate for every mode in 150–1450 Hz × ±1000 1/s. One
 * line of JSON for each repetition, CPU seconds of the whole process with compiler and collector;
 * the first is cold. Not a test: run by hand.
 */
final class ActiveRingBenchmark {
  private ActiveRingBenchmark() {}

  /**
   * Arguments: matrix file, repetitions, interaction index, delay in ms.
   *
   * @throws IOException if the file cannot be read
   */
  public static void main(String[] arguments) throws IOException {
    ReferenceRing ring = ReferenceRing.read(Path.of(arguments[0]));
    AcousticOperator operator =
        ring.operator(
            Double.parseDouble(arguments[2]), 1e-3 * Double.parseDouble(arguments[3]), 0.25);
    for (int r = 0; r < Integer.parseInt(arguments[1]); r++) {
      double cpu = cpu();
      long wall = System.nanoTime();
      ModeSet set =
          ModeSearch.find(operator, new Window(150, 1450, -1000, 1000), SearchSettings.standard());
      cpu = cpu() - cpu;
      double elapsed = 1e-9 * (System.nanoTime() - wall);
      System.out.println(
          String.format(
              Locale.ROOT,
              "{\"n\": %d, \"cpu\": %.2f, \"elapsed\": %.2f, \"process_cpu\": %.2f, \"modes\": %d,"
                  + " \"count\": %d, \"complete\": %b, \"worst_backward_error\": %.2e,"
                  + " \"factorisations\": %d, \"list\": [%s], \"notes\": [%s]}",
              operator.size(),
              cpu,
              elapsed,
              cpu(),
              set.modes().size(),
              set.countByArgumentPrinciple(),
              set.complete(),
              set.modes().stream().mapToDouble(m -> m.backwardError()).max().orElse(0),
              set.modes().stream().mapToInt(m -> m.iterations()).sum(),
              set.modes().stream()
                  .map(
                      m ->
                          String.format(
                              Locale.ROOT, "\"%.3f%+.3f\"", m.frequency(), m.growthRate()))
                  .collect(Collectors.joining(", ")),
              set.notes().stream().map(n -> '"' + n + '"').collect(Collectors.joining(", "))));
    }
  }

  private static double cpu() {
    return 1e-9
        * ((com.sun.management.OperatingSystemMXBean) ManagementFactory.getOperatingSystemMXBean())
            .getProcessCpuTime();
  }
}
