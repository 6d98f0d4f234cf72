package org.annulet.cases.compare;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.ModeComparison;
import org.annulet.cases.read.ModeTable;
import org.annulet.cases.study.ChainOfCase;
import org.annulet.cases.study.ModesStudy;
import org.annulet.cases.study.Progress;
import org.annulet.post.meaning.Certificate;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.ParameterSensitivity;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.network.DuctChain;
import org.apache.commons.math3.complex.Complex;

/** The modes of a case against the tables it names and against its own chain of ducts. */
public final class CompareStudy {
  private static final int SHAPE = 121;

  private final CaseFile caseFile;
  private final Progress progress;

  /** A study of one case that says how far it is. */
  public CompareStudy(CaseFile caseFile, Progress progress) {
    this.caseFile = caseFile;
    this.progress = progress;
  }

  /** Where the other side of a comparison comes from. */
  enum Side {
    NETWORK_MODEL("network model"),
    MEASURED("measured"),
    CHAIN("chain of ducts");

    private final String words;

    Side(String words) {
      this.words = words;
    }

    String words() {
      return words;
    }
  }

  /**
   * One comparison.
   *
   * @param name of the table; {@code ducts} for the chain
   * @param about free text; may be empty
   * @param side where the other side comes from
   * @param lines by frequency
   */
  record Compared(String name, String about, Side side, List<Line> lines) {}

  /**
   * The answer.
   *
   * @param modes our modes
   * @param compared one for each table, the chain last
   * @param chain the chain of ducts, or why there is none
   * @param chainComplete whether as many modes of the chain were found as counted
   */
  record Answer(
      ModesStudy.Answer modes,
      List<Compared> compared,
      ChainOfCase.Outcome chain,
      boolean chainComplete) {}

  /** An answer for those who write it. */
  public static final class Result {
    private final Answer answer;

    private Result(Answer answer) {
      this.answer = answer;
    }

    Answer answer() {
      return answer;
    }

    /** Whether our modes are certified complete and the chain's were all found. */
    public boolean certified() {
      return answer.modes().results().complete() && answer.chainComplete();
    }
  }

  /**
   * Solves, matches and judges.
   *
   * @param version of the program
   */
  public Result run(String version) {
    ModeComparison wanted = caseFile.studies().compare().orElse(ModeComparison.NO_TABLES);
    boolean levers =
        wanted.tables().stream().anyMatch(t -> t.origin() == ModeTable.Origin.MEASURED);
    ModesStudy study = new ModesStudy(caseFile, progress);
    ModesStudy.Answer modes = (levers ? study : study.modesOnly()).run(version);
    List<OurMode> ours = ours(modes);
    List<ModeEntry> entries = new ArrayList<>(modes.results().modes());
    entries.addAll(modes.results().outside());
    Judge judge = new Judge(caseFile.window());
    List<Compared> compared = new ArrayList<>();
    for (ModeTable t : wanted.tables()) {
      boolean measured = t.origin() == ModeTable.Origin.MEASURED;
      List<Line> lines =
          Matching.of(ours, t.rows(), wanted.matchWithin()).stream()
              .map(m -> judge.of(m, measured ? inputs(m, entries) : List.of()))
              .toList();
      compared.add(
          new Compared(t.name(), t.about(), measured ? Side.MEASURED : Side.NETWORK_MODEL, lines));
    }
    progress.step("chain of ducts", 0, 1);
    ChainOfCase.Outcome chain = ChainOfCase.of(caseFile, modes.problem());
    boolean complete = true;
    if (chain.chain().isPresent()) {
      Found found = rows(chain.chain().get());
      complete = found.complete;
      List<Line> lines = new ArrayList<>();
      for (Match m : Matching.of(ours, found.rows, wanted.matchWithin())) {
        Line line = judge.of(m, List.of());
        lines.add(m.row() == 0 ? line : near(line, found.near.get(m.row() - 1)));
      }
      compared.add(new Compared("ducts", "", Side.CHAIN, List.copyOf(lines)));
    }
    return new Result(new Answer(modes, compared, chain, complete));
  }

  private static List<ParameterSensitivity> inputs(Match m, List<ModeEntry> entries) {
    return m.ours().map(o -> entries.get(o.number() - 1).sensitivities()).orElse(List.of());
  }

  private static Line near(Line l, Optional<double[]> shift) {
    return new Line(
        l.match(),
        l.verdict(),
        l.frequencyDifference(),
        l.growthDifference(),
        l.frequencyBars(),
        l.growthBars(),
        l.words(),
        shift,
        l.levers());
  }

  private static List<OurMode> ours(ModesStudy.Answer modes) {
    AxialShapes shapes = new AxialShapes(modes.chamber());
    List<OurMode> all = new ArrayList<>();
    List<ModeEntry> inside = modes.results().modes();
    List<ModeEntry> outside = modes.results().outside();
    for (int k = 0; k < inside.size() + outside.size(); k++) {
      boolean in = k < inside.size();
      ModeEntry e = in ? inside.get(k) : outside.get(k - inside.size());
      int offset = in ? 1 : 1 + inside.size();
      Mode mode = e.view().mode();
      Integer order = e.label().azimuthalOrder();
      all.add(
          new OurMode(
              k + 1,
              mode.frequency(),
              e.view().frequencyError(),
              mode.growthRate(),
              e.view().growthError(),
              order == null ? -1 : order,
              partner(in ? inside : outside, e) < 0
                  ? 0
                  : partner(in ? inside : outside, e) + offset,
              e.label().text(),
              in,
              shapes.of(e)));
    }
    return all;
  }

  /**
   * Index of the other member of a pair; on a section that is the wave that turns the other way.
   */
  private static int partner(List<ModeEntry> all, ModeEntry e) {
    if (e.label().partner() >= 0 || e.view().order() == null || e.view().order() == 0) {
      return e.label().partner();
    }
    for (int k = 0; k < all.size(); k++) {
      ModeEntry o = all.get(k);
      if (o != e
          && o.view().order() != null
          && o.view().order() == -e.view().order()
          && o.view().mode().frequency() == e.view().mode().frequency()
          && o.view().mode().growthRate() == e.view().mode().growthRate()) {
        return k;
      }
    }
    return -1;
  }

  /** Modes of the chain, and what near fields move each of them by. */
  private record Found(List<ModeTable.Row> rows, List<Optional<double[]>> near, boolean complete) {}

  private Found rows(ChainOfCase.Chain chain) {
    List<ModeTable.Row> rows = new ArrayList<>();
    List<Optional<double[]>> near = new ArrayList<>();
    double[] distance = new double[SHAPE];
    double[] x = new double[SHAPE];
    double length =
        chain.plain().pieces().stream()
            .filter(p -> p instanceof org.annulet.solver.network.Piece.Duct)
            .mapToDouble(p -> ((org.annulet.solver.network.Piece.Duct) p).length())
            .sum();
    for (int k = 0; k < SHAPE; k++) {
      distance[k] = length * (k + 0.5) / SHAPE; // off the joints, where p̂ may jump
      x[k] = chain.start() + distance[k];
    }
    boolean complete = true;
    boolean plane = chain.orders().equals(List.of(0)) && caseFile.azimuthalOrders().isEmpty();
    for (int m : chain.orders()) {
      DuctChain.Roots roots = chain.plain().roots(caseFile.window(), m);
      complete &= roots.complete();
      for (Complex s : roots.s()) {
        Complex[] p = chain.plain().shape(s, m, distance);
        double[] re = new double[SHAPE];
        double[] im = new double[SHAPE];
        for (int k = 0; k < SHAPE; k++) {
          re[k] = p[k].getReal();
          im[k] = p[k].getImaginary();
        }
        rows.add(
            new ModeTable.Row(
                rows.size() + 1,
                s.getImaginary() / (2 * Math.PI),
                0,
                s.getReal(),
                0,
                plane ? -1 : m,
                Optional.of(new ModeTable.Shape(x, re, im))));
        near.add(chain.withNearField().flatMap(with -> shift(with, s, m)));
      }
    }
    return new Found(rows, near, complete);
  }

  /** By how much the chain with near fields moves an eigenvalue, followed by Newton's method. */
  private static Optional<double[]> shift(DuctChain with, Complex from, int order) {
    Complex s = from;
    for (int k = 0; k < 40; k++) {
      double h = 1e-6 * from.abs();
      Complex slope =
          with.determinant(s.add(h), order)
              .subtract(with.determinant(s.subtract(h), order))
              .divide(2 * h);
      Complex step = with.determinant(s, order).divide(slope);
      if (step.isNaN()) {
        return Optional.empty();
      }
      s = s.subtract(step);
      if (step.abs() < 1e-10 * from.abs()) {
        Complex moved = s.subtract(from);
        return moved.abs() < 0.2 * from.abs()
            ? Optional.of(new double[] {moved.getImaginary() / (2 * Math.PI), moved.getReal()})
            : Optional.empty();
      }
    }
    return Optional.empty();
  }

  /** Certificates that failed, in words. */
  static List<String> failures(Answer answer) {
    List<String> out = new ArrayList<>();
    answer.modes().results().certificates().stream()
        .filter(c -> !c.complete())
        .sorted(Comparator.comparing(Certificate::operatorName))
        .forEach(c -> out.add(c.sentence()));
    if (!answer.chainComplete()) {
      out.add("Not every mode of the chain of ducts that the argument principle counts was found.");
    }
    return out;
  }
}
