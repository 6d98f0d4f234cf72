package org.annulet.cases.points;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.nio.file.FileSystemException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Set;
import java.util.concurrent.ConcurrentHashMap;
import java.util.stream.IntStream;
import org.annulet.cases.study.Progress;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Points kept in files: stopped, gone on with, shared out, mixed up. */
class PointRunTest {
  private static final int COUNT = 60;

  @TempDir private Path folder;
  private final Set<Integer> computed = ConcurrentHashMap.newKeySet();

  /** The square root of a point, exact in text. */
  static final PointText<Double> ROOT =
      new PointText<>() {
        @Override
        public String line(Double result) {
          return result.toString();
        }

        @Override
        public Double parse(String line) {
          return Double.valueOf(line);
        }
      };

  private double root(int point) {
    computed.add(point);
    return Math.sqrt(point);
  }

  private static PointRun<Double> run(String fingerprint) {
    return new PointRun<>("roots", fingerprint, COUNT, ROOT);
  }

  private static List<Double> truth() {
    return IntStream.range(0, COUNT).mapToObj(Math::sqrt).toList();
  }

  @Test
  void wholeRun_isReadBackToTheLastBit() throws IOException {
    run("a").compute(folder, Slice.WHOLE, this::root, Progress.SILENT);

    assertThat(run("a").collect(folder).results()).isEqualTo(truth());
  }

  @Test
  void secondRun_computesNothingAgain() throws IOException {
    run("a").compute(folder, Slice.WHOLE, this::root, Progress.SILENT);
    computed.clear();
    run("a").compute(folder, Slice.WHOLE, this::root, Progress.SILENT);

    assertThat(computed).isEmpty();
  }

  @Test
  void damagedLine_andAllAfterIt_areComputedAgain() throws IOException {
    run("a").compute(folder, Slice.WHOLE, this::root, Progress.SILENT);
    Path file = folder.resolve("roots.part-1-of-1.points");
    List<String> lines = Files.readAllLines(file);
    lines.set(41, lines.get(41).replaceFirst(".$", "x"));
    Files.write(file, lines);
    computed.clear();

    assertThat(run("a").collect(folder).complete()).isFalse();
    run("a").compute(folder, Slice.WHOLE, this::root, Progress.SILENT);

    assertThat(computed).hasSize(COUNT - 40);
    assertThat(run("a").collect(folder).results()).isEqualTo(truth());
  }

  @Test
  void missingParts_areNamed() throws IOException {
    run("a").compute(folder, new Slice(2, 4), this::root, Progress.SILENT);
    run("a").compute(folder, new Slice(4, 4), this::root, Progress.SILENT);

    PointRun.Collected<Double> collected = run("a").collect(folder);

    assertThat(collected.missing()).containsExactly("1/4", "3/4");
    assertThat(computed).hasSize(30);
  }

  @Test
  void pointsOfAnotherCase_areRefused_andLeftOutOfAMerge() throws IOException {
    run("a").compute(folder, Slice.WHOLE, this::root, Progress.SILENT);

    assertThatThrownBy(() -> run("b").compute(folder, Slice.WHOLE, this::root, Progress.SILENT))
        .isInstanceOf(FileSystemException.class)
        .hasMessageContaining("delete it, or choose another --out");
    assertThat(run("b").collect(folder).strange()).hasSize(1);
    assertThat(run("b").collect(folder).complete()).isFalse();
  }

  @Test
  void twoRunsAtOnce_theSecondIsRefused() throws IOException {
    Path file = folder.resolve("roots.part-1-of-1.points");
    try (Journal first = Journal.open(file, "head")) {
      assertThatThrownBy(() -> Journal.open(file, "head"))
          .isInstanceOf(FileSystemException.class)
          .hasMessageContaining("another run is writing");
      first.add(0, "1.0");
    }
    Journal.open(file, "head").close();
    assertThat(Journal.read(file).lines()).containsEntry(0, "1.0");
  }

  /** A slow run in a Java machine of its own, for the test below. */
  public static void main(String[] args) throws IOException {
    run("a")
        .compute(
            Path.of(args[0]),
            Slice.WHOLE,
            i -> {
              try {
                Thread.sleep(40);
              } catch (InterruptedException e) {
                throw new IllegalStateException(e);
              }
              return Math.sqrt(i);
            },
            Progress.SILENT);
  }

  @Test
  void killedInTheMiddle_losesNothingFinished_andGoesOn() throws Exception {
    Process process =
        new ProcessBuilder(
                Path.of(System.getProperty("java.home"), "bin", "java").toString(),
                "-cp",
                System.getProperty("java.class.path"),
                PointRunTest.class.getName(),
                folder.toString())
            .start();
    Path file = folder.resolve("roots.part-1-of-1.points");
    long end = System.nanoTime() + 20_000_000_000L;
    while (Journal.read(file).lines().size() < 8 && System.nanoTime() < end) {
      Thread.sleep(5);
    }
    process.destroyForcibly().waitFor(); // SIGKILL where there is one
    int before = Journal.read(file).lines().size();
    assertThat(before).isBetween(8, COUNT - 1);

    run("a").compute(folder, Slice.WHOLE, this::root, Progress.SILENT);

    assertThat(computed).hasSize(COUNT - before);
    assertThat(run("a").collect(folder).results()).isEqualTo(truth());
  }
}
