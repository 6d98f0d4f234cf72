package org.annulet.cases.uncertainty;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import org.annulet.cases.points.CaseFingerprint;
import org.annulet.cases.points.PointRun;
import org.annulet.cases.points.Slice;
import org.annulet.cases.read.CaseFaultException;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.Uncertainty;
import org.annulet.cases.study.Progress;

/** How likely it is that modes grow when inputs are not known exactly. */
public final class UncertaintyStudy {
  /** The verb, and first word of the files of points. */
  public static final String NAME = "uncertainty";

  /** Largest |Δs|/|s| between samples and full operators of a sound answer. */
  static final double SOUND = 1e-5;

  private static final int CHECKS = 4;

  private final CaseFile caseFile;
  private final Uncertainty asked;
  private final Progress progress;
  private final PointRun<Sample> run;
  private final Draws draws;
  private Engine engine;

  /**
   * A study of one case that says how far it is.
   *
   * @param version of the program
   * @throws CaseFaultException if the case names no uncertain input
   * @throws IOException if the case's files cannot be read again
   */
  public UncertaintyStudy(CaseFile caseFile, String version, Progress progress) throws IOException {
    this.caseFile = caseFile;
    this.progress = progress;
    this.asked =
        caseFile
            .studies()
            .uncertainty()
            .orElseThrow(
                () ->
                    fault(
                        "title",
                        "the case names no uncertain input",
                        "add 'studies: {uncertainty: {inputs: {KEY: {normal: 3 %}}}}'"));
    this.run =
        new PointRun<>(NAME, CaseFingerprint.of(caseFile, version), asked.samples(), Sample.TEXT);
    try {
      this.draws = new Draws(asked.seed(), shapes(), asked.correlations());
    } catch (IllegalArgumentException e) {
      throw fault(
          "studies.uncertainty.correlated",
          e.getMessage(),
          "bring the coefficients nearer to zero");
    }
  }

  private CaseFaultException fault(String key, String what, String mend) {
    return new CaseFaultException(List.of(caseFile.source().problem(key, what, mend)));
  }

  private List<Uncertainty.Shape> shapes() {
    List<Uncertainty.Shape> shapes = new ArrayList<>();
    asked.inputs().forEach(i -> shapes.add(i.spread().shape()));
    asked
        .scatter()
        .ifPresent(
            s -> {
              int n = ((org.annulet.cases.read.Geometry.Ring) caseFile.geometry()).burnerCount();
              s.gain().ifPresent(g -> IntStream.range(0, n).forEach(j -> shapes.add(g.shape())));
              s.delay().ifPresent(g -> IntStream.range(0, n).forEach(j -> shapes.add(g.shape())));
            });
    return shapes;
  }

  /**
   * The answer.
   *
   * @param modes in the order of the nominal modes
   * @param samples all of them
   * @param quiet samples in which no mode grows
   * @param incomplete samples whose modes are not confirmed
   * @param strangers samples in which a mode grows that comes from no nominal mode
   * @param difference largest |Δs|/|s| of some samples solved again on the full operators
   */
  record Answer(
      CaseFile caseFile,
      Uncertainty asked,
      Engine engine,
      List<ModeStatistics> modes,
      List<Sample> samples,
      int quiet,
      int incomplete,
      int strangers,
      double difference) {
    boolean certified() {
      return incomplete == 0 && difference < SOUND;
    }

    int checks() {
      return Math.min(CHECKS, samples.size());
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

    /** Whether every sample is confirmed and the full operators agree. */
    public boolean certified() {
      return answer.certified();
    }
  }

  private synchronized Engine engine() {
    if (engine == null) {
      engine =
          asked.scatter().isPresent()
              ? new ScatterEngine(caseFile, asked, progress)
              : new InputEngine(caseFile, asked, progress);
    }
    return engine;
  }

  /** Computes the samples of a part that are not yet there. */
  public void compute(Path folder, Slice slice) throws IOException {
    engine();
    run.compute(folder, slice, i -> engine().at(draws.sample(i)), progress);
  }

  /** What the folder holds of the samples. */
  public PointRun.Collected<?> missing(Path folder) throws IOException {
    return run.collect(folder);
  }

  /** Draws the conclusions from all samples in a folder. */
  public Result finish(Path folder) throws IOException {
    List<Sample> samples = run.collect(folder).results();
    List<double[]> x = IntStream.range(0, samples.size()).mapToObj(draws::sample).toList();
    progress.step("conclusions", 0, 1);
    List<ModeStatistics> modes = ModeStatistics.of(engine(), new ModeStatistics.Drawn(x, samples));
    progress.step("samples solved again in full", 0, CHECKS);
    double difference = 0;
    for (int k = 0; k < Math.min(CHECKS, samples.size()); k++) {
      int i = (int) ((k + 0.5) * samples.size() / CHECKS) % samples.size();
      difference = Math.max(difference, engine().difference(x.get(i)));
      progress.step("samples solved again in full", k + 1, CHECKS);
    }
    int quiet =
        (int)
            samples.stream()
                .filter(s -> s.strangers() == 0)
                .filter(s -> s.members().stream().noneMatch(m -> m.getReal() > 0))
                .count();
    return new Result(
        new Answer(
            caseFile,
            asked,
            engine(),
            modes,
            samples,
            quiet,
            (int) samples.stream().filter(s -> !s.complete()).count(),
            (int) samples.stream().filter(s -> s.strangers() > 0).count(),
            difference));
  }
}
