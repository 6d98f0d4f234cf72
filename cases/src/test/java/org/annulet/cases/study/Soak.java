package org.annulet.cases.study;

import com.sun.management.UnixOperatingSystemMXBean;
import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.annulet.cases.read.CaseFile;
import org.annulet.post.table.ModesCsv;

/**
 * Full solves of a small duct with a flame, each with another delay, in one Java machine: meshes,
 * search, certificate, error bars, labels, sensitivities, maps; every hundredth is written to files
 * as well. Prints the heap after a collection, threads and open files as it goes, and fails if the
 * heap has grown over the last three quarters, or if a delay met again gives other modes. Not a
 * test: run by hand. Argument: number of solves (2000 unless given).
 */
final class Soak {
  /**
   * Growth of the heap allowed between the quarter and the end, in MB: what a collection leaves.
   */
  private static final double ALLOWED = 2;

  private static final int DELAYS = 50;

  private Soak() {}

  /**
   * Runs.
   *
   * @throws IOException if the folder cannot be written
   */
  public static void main(String[] arguments) throws IOException {
    int solves = arguments.length > 0 ? Integer.parseInt(arguments[0]) : 2000;
    Path folder = Files.createTempDirectory("annulet-soak");
    CaseFile base = SmallCases.duct(folder);
    List<String> first = new ArrayList<>();
    double quarter = 0;
    long start = System.nanoTime();
    for (int k = 1; k <= solves; k++) {
      int which = (k - 1) % DELAYS;
      CaseFile one =
          base.with(Map.of("flames.main.response.delay", (2.5 + 0.02 * which) + " ms"))
              .caseFile()
              .orElseThrow();
      ModesStudy.Answer answer = new ModesStudy(one, Progress.SILENT).run("soak");
      String modes = ModesCsv.text(answer.results());
      if (k <= DELAYS) {
        first.add(modes);
      } else if (!first.get(which).equals(modes)) {
        throw new IllegalStateException("solve " + k + " differs from solve " + (which + 1));
      }
      if (k % 100 == 0) {
        ModesFiles.write(folder.resolve("out"), answer);
      }
      if (k % (solves / 8) == 0) {
        double heap = heap();
        quarter = k == solves / 4 ? heap : quarter;
        System.out.println(
            String.format(
                Locale.ROOT,
                "{\"solves\": %d, \"seconds\": %.0f, \"heap_mb\": %.2f, \"threads\": %d,"
                    + " \"open_files\": %d}",
                k,
                1e-9 * (System.nanoTime() - start),
                heap,
                ManagementFactory.getThreadMXBean().getThreadCount(),
                openFiles()));
        if (k == solves && heap > quarter + ALLOWED) {
          throw new IllegalStateException(
              "the heap grew from " + quarter + " MB at a quarter to " + heap + " MB at the end");
        }
      }
    }
  }

  private static double heap() {
    for (int i = 0; i < 3; i++) {
      System.gc();
    }
    return ManagementFactory.getMemoryMXBean().getHeapMemoryUsage().getUsed() / 1e6;
  }

  private static long openFiles() {
    return ManagementFactory.getOperatingSystemMXBean() instanceof UnixOperatingSystemMXBean unix
        ? unix.getOpenFileDescriptorCount()
        : -1;
  }
}
