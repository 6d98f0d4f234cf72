package org.annulet.cases.points;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.FileSystemException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.function.IntFunction;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.annulet.cases.study.Progress;

/**
 * The points of one study in the files of its folder.
 *
 * @param <R> result of a point
 */
public final class PointRun<R> {
  private final String study;
  private final String fingerprint;
  private final int count;
  private final PointText<R> text;

  /**
   * A study.
   *
   * @param study its verb, the first word of its files' names
   * @param fingerprint of everything the points depend on, one word
   * @param count of its points
   * @param text form of their results
   */
  public PointRun(String study, String fingerprint, int count, PointText<R> text) {
    this.study = study;
    this.fingerprint = fingerprint;
    this.count = count;
    this.text = text;
  }

  private Path file(Path folder, Slice slice) {
    return folder.resolve(study + ".part-" + slice.number() + "-of-" + slice.of() + ".points");
  }

  private String head() {
    return "annulet " + study + " of " + count + " points, " + fingerprint;
  }

  /** Whether a folder holds files of this study. */
  public static boolean present(Path folder, String study) throws IOException {
    return !files(folder, study).isEmpty();
  }

  private static Map<Path, Slice> files(Path folder, String study) throws IOException {
    Map<Path, Slice> found = new TreeMap<>();
    if (!Files.isDirectory(folder)) {
      return found;
    }
    Pattern name =
        Pattern.compile(Pattern.quote(study) + "\\.part-(\\d{1,6})-of-(\\d{1,6})\\.points");
    try (Stream<Path> all = Files.list(folder)) {
      for (Path p : all.toList()) {
        Matcher m = name.matcher(p.getFileName().toString());
        if (m.matches()) {
          int number = Integer.parseInt(m.group(1));
          int of = Integer.parseInt(m.group(2));
          if (number >= 1 && number <= of) {
            found.put(p, new Slice(number, of));
          }
        }
      }
    }
    return found;
  }

  /**
   * Computes what a part still lacks, side by side, and writes each point down as it is finished.
   *
   * @param compute a point's result; the same whatever was computed before
   * @throws FileSystemException if the file of the part belongs to another state of the case
   */
  public void compute(Path folder, Slice slice, IntFunction<R> compute, Progress progress)
      throws IOException {
    Files.createDirectories(folder);
    Path file = file(folder, slice);
    Journal.Content before = Journal.read(file);
    if (before.sound() > 0 && !before.head().equals(head())) {
      throw new FileSystemException(
          file.toString(),
          null,
          "it holds points of another case, study or version; delete it, or choose another --out");
    }
    List<Integer> lacking =
        IntStream.range(0, count)
            .filter(slice::holds)
            .filter(i -> !before.lines().containsKey(i))
            .boxed()
            .toList();
    int all = (int) IntStream.range(0, count).filter(slice::holds).count();
    int[] done = {all - lacking.size()};
    try (Journal journal = Journal.open(file, head())) {
      progress.step("points", done[0], all);
      lacking.parallelStream()
          .forEach(
              i -> {
                String line = text.line(compute.apply(i));
                try {
                  journal.add(i, line);
                } catch (IOException e) {
                  throw new UncheckedIOException(e);
                }
                synchronized (done) {
                  progress.step("points", ++done[0], all);
                }
              });
    } catch (UncheckedIOException e) {
      throw e.getCause();
    }
  }

  /**
   * All points found in the folder's files.
   *
   * @param results of the points; null where one is missing
   * @param missing parts to run, as {@code i/n}; empty when all points are there
   * @param strange files that belong to another state of the case
   */
  public record Collected<R>(List<R> results, List<String> missing, List<Path> strange) {
    /** Whether nothing is missing. */
    public boolean complete() {
      return missing.isEmpty();
    }
  }

  /** Reads the files of all parts. */
  public Collected<R> collect(Path folder) throws IOException {
    Map<Integer, String> lines = new TreeMap<>();
    List<Path> strange = new ArrayList<>();
    int of = 1;
    for (Map.Entry<Path, Slice> e : files(folder, study).entrySet()) {
      Journal.Content content = Journal.read(e.getKey());
      if (!content.head().equals(head())) {
        strange.add(e.getKey());
        continue;
      }
      of = Math.max(of, e.getValue().of());
      lines.putAll(content.lines());
    }
    List<R> results = new ArrayList<>();
    List<String> missing = new ArrayList<>();
    boolean[] lacks = new boolean[of];
    for (int i = 0; i < count; i++) {
      String line = lines.get(i);
      results.add(line == null ? null : text.parse(line));
      lacks[i % of] |= line == null;
    }
    for (int k = 0; k < of; k++) {
      if (lacks[k]) {
        missing.add((k + 1) + "/" + of);
      }
    }
    return new Collected<>(results, missing, strange);
  }
}
