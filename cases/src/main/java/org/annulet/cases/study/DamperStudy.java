package org.annulet.cases.study;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import org.annulet.cases.read.CaseFaultException;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.Damper;
import org.annulet.cases.read.DamperSearch;
import org.annulet.solver.eigen.PreparedOperator;
import org.annulet.solver.modes.Window;
import org.annulet.solver.ports.DampedRoots;
import org.annulet.solver.ports.FullModes;
import org.annulet.solver.ports.PortPole;
import org.apache.commons.math3.complex.Complex;

/** Where the dampers of a case go. */
public final class DamperStudy {
  /**
   * Largest relative error of the transfer at which the count on the ports stands for the chamber.
   */
  static final double WORST_TRANSFER = 1e-4;

  private static final double WORST_RESIDUAL = 1e-8;

  /** In 1/s; what a specialist would still call the same growth rate. */
  private static final double WORST_DIFFERENCE = 0.05;

  private final CaseFile caseFile;
  private final Progress progress;

  /** A study of one case that says how far it is. */
  public DamperStudy(CaseFile caseFile, Progress progress) {
    this.caseFile = caseFile;
    this.progress = progress;
  }

  /**
   * A mode without dampers and what becomes of its members.
   *
   * @param s without dampers, in 1/s
   * @param order azimuthal order, or Bloch number; −1 where the chamber has none
   * @param factorBest |Σ e^{2imθ}| over the best pattern's dampers, over their number; NaN where
   *     there is no pair or no order: 1 splits a pair most, 0 not at all to first order
   * @param factorEven the same of the even pattern
   * @param best members with the best pattern, in 1/s; NaN where one was lost on its way
   * @param even members with the even pattern
   */
  record Fate(
      Complex s, int order, double factorBest, double factorEven, Complex[] best, Complex[] even) {}

  /**
   * The best pattern on the full operator: every eigenvalue of the ports solved again there.
   *
   * @param modes in the window, the fastest growing first
   * @param difference largest |Δs| in 1/s between full operator and ports
   * @param residual largest backward error
   * @param counted whether the argument principle confirms that there are no others
   */
  record Check(
      List<FullModes.FullMode> modes, double difference, double residual, boolean counted) {
    /** Largest growth rate in 1/s; −∞ without modes. */
    double worst() {
      return modes.isEmpty() ? Double.NEGATIVE_INFINITY : modes.get(0).s().getReal();
    }
  }

  /**
   * The answer.
   *
   * @param ports the condensed chamber
   * @param outcome ranking of the patterns
   * @param undamped largest growth rate without the dampers in 1/s
   * @param fates what becomes of each mode
   * @param check the best pattern on the full operator
   * @param tuning best tuning and resistance of each design
   * @param robustness of the best pattern
   */
  record Answer(
      DamperPorts ports,
      DamperRanking.Outcome outcome,
      double undamped,
      List<Fate> fates,
      Check check,
      List<DamperTuning.OfDesign> tuning,
      DamperTuning.Robustness robustness) {
    DamperSearch search() {
      return ports.search();
    }

    int[] pattern() {
      return outcome.best().get(0).pattern();
    }

    /** Whether count and full operator confirm the best pattern. */
    boolean certified() {
      return ports.complete()
          && ports.transfer().error() < WORST_TRANSFER
          && outcome.unsure() == 0
          && check.counted()
          && check.residual() < WORST_RESIDUAL
          && check.difference() < WORST_DIFFERENCE;
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

    /** Whether modes, count and full operator agree. */
    public boolean certified() {
      return answer.certified();
    }
  }

  /**
   * Searches.
   *
   * @throws CaseFaultException if the case asks for no dampers to be placed
   */
  public Result run() {
    DamperSearch search =
        caseFile
            .studies()
            .dampers()
            .orElseThrow(
                () ->
                    new CaseFaultException(
                        List.of(
                            caseFile
                                .source()
                                .problem(
                                    "title",
                                    "the case asks for no dampers to be placed",
                                    "add 'studies: {dampers: …}' with designs and positions"))));
    progress.step("meshing and assembling", 0, 1);
    DamperPorts ports = new DamperPorts(caseFile, search, progress);
    DamperRanking.Outcome outcome = new DamperRanking(ports, progress).run();
    int[] pattern = outcome.best().get(0).pattern();
    List<Fate> fates = fates(ports, pattern, outcome.even());
    progress.step("tuning and robustness", 0, 2);
    DamperTuning tuning = new DamperTuning(ports, pattern);
    DamperTuning.Robustness robustness = tuning.robustness();
    progress.step("tuning and robustness", 1, 2);
    List<DamperTuning.OfDesign> optima = tuning.optima();
    progress.step("solving the best pattern in full", 0, 1);
    Check check = check(ports, pattern);
    return new Result(
        new Answer(ports, outcome, undamped(ports), fates, check, optima, robustness));
  }

  private static double undamped(DamperPorts ports) {
    Window w = ports.window();
    return ports.transfer().poles().stream()
        .filter(p -> w.contains(p.s().getReal(), p.s().getImaginary() / (2 * Math.PI)))
        .mapToDouble(p -> p.s().getReal())
        .max()
        .orElse(Double.NEGATIVE_INFINITY);
  }

  static Check check(DamperPorts ports, int[] pattern) {
    DampedRoots.Found found = ports.damped(pattern).all();
    List<FullModes.FullMode> modes =
        new ArrayList<>(
            FullModes.of(
                new PreparedOperator(
                    CaseProblem.whole(ports.with(pattern), ports.shape())
                        .parts()
                        .get(0)
                        .assembled()
                        .operator()),
                found.roots()));
    modes.sort(Comparator.comparingDouble(m -> -m.s().getReal()));
    return new Check(
        List.copyOf(modes),
        modes.stream().mapToDouble(m -> m.s().subtract(m.fromPorts()).abs()).max().orElse(0),
        modes.stream().mapToDouble(FullModes.FullMode::backwardError).max().orElse(0),
        found.complete());
  }

  private static List<Fate> fates(DamperPorts ports, int[] best, DamperRanking.Ranked even) {
    DampedRoots damped = ports.damped(best);
    Complex[][] after = damped.grownFromPoles();
    Complex[][] afterEven =
        even == null ? new Complex[after.length][0] : ports.damped(even.pattern()).grownFromPoles();
    List<Fate> fates = new ArrayList<>();
    for (int i = 0; i < after.length; i++) {
      PortPole pole = ports.transfer().poles().get(i);
      if (!ports.window().contains(pole.s().getReal(), pole.s().getImaginary() / (2 * Math.PI))) {
        continue;
      }
      int order = order(ports.at(pole).part().name());
      boolean pair = pole.multiplicity() == 2;
      fates.add(
          new Fate(
              pole.s(),
              order,
              pair ? factor(ports, best, order) : Double.NaN,
              even == null || !pair ? Double.NaN : factor(ports, even.pattern(), order),
              after[i],
              afterEven[i]));
    }
    return fates;
  }

  private static int order(String part) {
    String digits = part.replaceAll("^Bloch number (\\d+)$", "$1");
    return digits.matches("\\d+") ? Integer.parseInt(digits) : -1;
  }

  private static double factor(DamperPorts ports, int[] pattern, int order) {
    if (order < 0) {
      return Double.NaN;
    }
    double re = 0;
    double im = 0;
    int n = 0;
    for (int p = 0; p < pattern.length; p++) {
      if (pattern[p] > 0) {
        Damper.OnFace f = ports.search().positions().get(p);
        re += Math.cos(2 * order * f.angle());
        im += Math.sin(2 * order * f.angle());
        n++;
      }
    }
    return Math.hypot(re, im) / n;
  }
}
