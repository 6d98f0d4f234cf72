package org.annulet.cases.uncertainty;

import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.nio.file.Path;
import java.util.Collections;
import java.util.List;
import java.util.Locale;
import java.util.stream.IntStream;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.CaseReader;
import org.annulet.cases.read.Uncertainty;
import org.annulet.cases.read.Uncertainty.Shape;
import org.annulet.cases.read.Uncertainty.Spread;
import org.annulet.cases.study.CaseProblem;
import org.annulet.cases.study.ChamberShape;
import org.annulet.cases.study.Progress;
import org.annulet.solver.eigen.ModeSearch;
import org.annulet.solver.eigen.SearchSettings;
import org.annulet.solver.modes.ModeSet;

/**
 * Times samples of a ring whose burners scatter in gain and delay, and one search of the whole ring
 * in full in the same minute. Lines of JSON, CPU seconds of the whole process. Not a test: run by
 * hand.
 */
final class ScatterBenchmark {
  private ScatterBenchmark() {}

  /**
   * Arguments: case folder, name of its flame, samples.
   *
   * @throws IOException if the case cannot be read
   */
  public static void main(String[] arguments) throws IOException {
    CaseFile ring = CaseReader.read(Path.of(arguments[0])).orThrow();
    int samples = Integer.parseInt(arguments[2]);
    Spread five = new Spread(Shape.NORMAL, "5 %");
    Uncertainty study =
        new Uncertainty(
            samples,
            1,
            List.of(),
            List.of(),
            java.util.Optional.of(
                new Uncertainty.Scatter(
                    arguments[1], java.util.Optional.of(five), java.util.Optional.of(five))));
    double cpu = cpu();
    long wall = System.nanoTime();
    Engine engine = new ScatterEngine(ring, study, Progress.SILENT);
    double prepared = cpu() - cpu;
    int values = engine.groups().stream().mapToInt(Engine.Group::count).sum();
    Draws draws = new Draws(1, Collections.nCopies(values, Shape.NORMAL), List.of());
    cpu = cpu();
    long confirmed =
        IntStream.range(0, samples)
            .parallel()
            .filter(i -> engine.at(draws.sample(i)).complete())
            .count();
    double sampled = cpu() - cpu;
    double elapsed = 1e-9 * (System.nanoTime() - wall);
    System.out.println(
        String.format(
            Locale.ROOT,
            "{\"samples\": %d, \"values\": %d, \"confirmed\": %d, \"cpu_prepared\": %.2f,"
                + " \"cpu_samples\": %.2f, \"elapsed\": %.2f}",
            samples,
            values,
            confirmed,
            prepared,
            sampled,
            elapsed));
    cpu = cpu();
    ModeSet full =
        ModeSearch.find(
            CaseProblem.whole(ring, ChamberShape.of(ring)).parts().get(0).assembled().operator(),
            ring.window(),
            SearchSettings.standard());
    double solved = cpu() - cpu;
    System.out.println(
        String.format(
            Locale.ROOT,
            "{\"cpu_one_full_search\": %.2f, \"modes\": %d, \"ratio_per_sample\": %.2e}",
            solved,
            full.modes().size(),
            sampled / samples / solved));
  }

  private static double cpu() {
    return 1e-9
        * ((com.sun.management.OperatingSystemMXBean) ManagementFactory.getOperatingSystemMXBean())
            .getProcessCpuTime();
  }
}
