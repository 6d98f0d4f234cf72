package org.annulet.cases.sweep;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.stream.IntStream;
import org.annulet.cases.points.CaseFingerprint;
import org.annulet.cases.points.PointRun;
import org.annulet.cases.points.Slice;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.study.PointMode;
import org.annulet.cases.study.PointModes;
import org.annulet.cases.study.Progress;
import org.annulet.cases.study.ReducedPoints;
import org.annulet.solver.modes.Window;

/** The modes of a case while some of its inputs vary. */
public final class SweepStudy {
  /** The verb, and first word of the files of points. */
  public static final String NAME = "sweep";

  /** Largest difference to the full search in 1/s, over |s|, of a sound answer. */
  static final double SOUND = 1e-5;

  private static final double DIFFERENT = 0.02;

  private final SweepGrid grid;
  private final CaseFile caseFile;
  private final Progress progress;
  private final PointRun<PointModes> run;
  private ReducedPoints points;

  /**
   * A study of one case that says how far it is.
   *
   * @param version of the program
   * @throws IOException if the case's files cannot be read again
   */
  public SweepStudy(CaseFile caseFile, String version, Progress progress) throws IOException {
    this.grid = new SweepGrid(caseFile);
    this.caseFile = caseFile;
    this.progress = progress;
    this.run =
        new PointRun<>(
            NAME, CaseFingerprint.of(caseFile, version), grid.count(), new PointModesText());
  }

  /**
   * Some points solved again on the full operators.
   *
   * @param points how many
   * @param difference largest |Δs|/|s| of the modes in the window
   * @param sameNumber whether reduced and full search found as many modes at each, and the full
   *     count confirms them
   */
  record Check(int points, double difference, boolean sameNumber) {
    boolean sound() {
      return sameNumber && difference < SOUND;
    }
  }

  /**
   * The answer.
   *
   * @param points of the grid, those along the first axis in a row
   * @param line tracks of a sweep along one axis; null of a map
   * @param stretches of growth, along one axis
   * @param map of two axes; null along one
   * @param sizes columns of the reduced model, one for each operator; empty without one
   */
  record Answer(
      SweepGrid grid,
      List<PointModes> points,
      SweepLine line,
      List<SweepLine.Stretch> stretches,
      SweepMap map,
      Check check,
      List<Integer> sizes) {
    /** Points at which some mode is not confirmed. */
    long incomplete() {
      return points.stream().filter(p -> !p.complete()).count();
    }

    double worstBackwardError() {
      return points.stream()
          .flatMap(p -> p.modes().stream())
          .mapToDouble(PointMode::backwardError)
          .max()
          .orElse(0);
    }

    boolean certified() {
      return incomplete() == 0 && check.sound();
    }
  }

  /** The finished study, for the files. */
  public static final class Result {
    private final Answer answer;

    Result(Answer answer) {
      this.answer = answer;
    }

    Answer answer() {
      return answer;
    }

    /** Whether every point is counted and the checks on the full operators agree. */
    public boolean certified() {
      return answer.certified();
    }
  }

  /** Computes the points of a part that are not yet there. */
  public void compute(Path folder, Slice slice) throws IOException {
    check(grid);
    run.compute(folder, slice, this::point, progress);
  }

  /** Every knot of the axes must make a case. */
  private static void check(SweepGrid grid) {
    grid.training();
  }

  /** What the folder holds of the points. */
  public PointRun.Collected<PointModes> collect(Path folder) throws IOException {
    return run.collect(folder);
  }

  private synchronized ReducedPoints points() {
    if (points == null) {
      points = ReducedPoints.trainedOn(caseFile, grid.training(), progress);
    }
    return points;
  }

  private PointModes point(int i) {
    return solve(grid.shares(i));
  }

  private PointModes solve(double... share) {
    return points().at(grid.at(share), grid.nearest(share));
  }

  /**
   * Joins the points.
   *
   * @param collected all points
   */
  public Result finish(PointRun.Collected<PointModes> collected) {
    List<PointModes> all = collected.results();
    Window window = caseFile.window();
    Check check = check(all);
    progress.step("joining the points", 0, 1);
    if (grid.isMap()) {
      SweepMap map = new SweepMap(window, grid, all, (a, b) -> solve(a, b));
      return new Result(new Answer(grid, all, null, List.of(), map, check, points().sizes()));
    }
    double[] at = IntStream.range(0, grid.count()).mapToDouble(i -> grid.shares(i)[0]).toArray();
    SweepLine line = new SweepLine(window, at, all, share -> solve(share, 0));
    List<SweepLine.Stretch> stretches = new ArrayList<>();
    line.tracks().parallelStream().map(line::stretches).toList().forEach(stretches::addAll);
    stretches.sort(
        Comparator.comparingDouble(SweepLine.Stretch::from).thenComparing(s -> s.track().number()));
    return new Result(new Answer(grid, all, line, stretches, null, check, points().sizes()));
  }

  private Check check(List<PointModes> all) {
    int n = all.size();
    List<Integer> chosen = IntStream.of(0, n / 3, 2 * n / 3, n - 1).distinct().boxed().toList();
    if (!points().reduced()) {
      return new Check(0, 0, true);
    }
    progress.step("points solved again in full", 0, chosen.size());
    double largest = 0;
    boolean same = true;
    for (int k = 0; k < chosen.size(); k++) {
      int i = chosen.get(k);
      PointModes full = points().full().at(grid.at(grid.shares(i)));
      same &= full.complete();
      List<PointMode> a = inside(all.get(i));
      List<PointMode> b = inside(full);
      same &= a.size() == b.size();
      for (PointMode m : b) {
        double nearest =
            all.get(i).modes().stream()
                .filter(o -> o.part().equals(m.part()))
                .mapToDouble(o -> o.s().subtract(m.s()).abs() / m.s().abs())
                .min()
                .orElse(1);
        same &= nearest < DIFFERENT;
        largest = Math.max(largest, nearest);
      }
      progress.step("points solved again in full", k + 1, chosen.size());
    }
    return new Check(chosen.size(), largest, same);
  }

  private List<PointMode> inside(PointModes modes) {
    Window w = caseFile.window();
    return modes.modes().stream().filter(m -> w.contains(m.growthRate(), m.frequency())).toList();
  }
}
