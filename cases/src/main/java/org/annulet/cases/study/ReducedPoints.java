package org.annulet.cases.study;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import org.annulet.cases.read.CaseFile;
import org.annulet.solver.assembly.NodalField;
import org.annulet.solver.eigen.ReducedFamily;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.LowRankTerm;

/**
 * Points solved on a basis trained for their family, every mode's backward error measured on the
 * full operator. Where a point has another mesh than the family, or a whole ring of burners that
 * differ, it is solved in full.
 */
public final class ReducedPoints implements PointSolver {
  /** Backward error beyond which a mode is polished on the full operator. */
  public static final double BACKWARD_ERROR = 1e-8;

  /** With more columns of low rank than this the basis would be as dear as the full operator. */
  private static final int MOST_COLUMNS = 40;

  private final CaseFile caseFile;
  private final CaseMemory memory;
  private final ShapePlaces places;
  private final FullPoints full;
  private final List<CaseProblem.Part> parts;
  private final List<ReducedFamily> families;

  private ReducedPoints(
      CaseFile caseFile,
      CaseMemory memory,
      List<CaseProblem.Part> parts,
      List<ReducedFamily> families) {
    this.caseFile = caseFile;
    this.memory = memory;
    this.places = ShapePlaces.on(memory.shape().mesh());
    this.full = new FullPoints(caseFile, memory.shape());
    this.parts = parts;
    this.families = families;
  }

  /**
   * Trains.
   *
   * @param caseFile whose window is searched, and whose mesh serves where it can
   * @param training cases spread over what will be asked for; those that cannot share the mesh are
   *     left out
   */
  public static ReducedPoints trainedOn(
      CaseFile caseFile, List<CaseFile> training, Progress progress) {
    CaseMemory memory = new CaseMemory(caseFile, ChamberShape.of(caseFile));
    List<CaseProblem> problems = new ArrayList<>();
    List<Integer> at = new ArrayList<>();
    for (int i = 0; i < training.size(); i++) {
      Optional<CaseProblem> p = problem(caseFile, memory, training.get(i));
      if (p.isPresent() && (problems.isEmpty() || alike(p.get(), problems.get(0)))) {
        problems.add(p.get());
        at.add(i);
      }
    }
    List<CaseProblem.Part> parts = problems.isEmpty() ? List.of() : problems.get(0).parts();
    if (parts.isEmpty() || at.size() < training.size() || !cheap(parts)) {
      return new ReducedPoints(caseFile, memory, List.of(), List.of());
    }
    int[] done = {0};
    progress.step("training the reduced model", 0, parts.size());
    List<ReducedFamily> families =
        IntStream.range(0, parts.size())
            .parallel()
            .mapToObj(
                i -> {
                  ReducedFamily family =
                      ReducedFamily.trainedOn(
                          problems.stream()
                              .map(p -> p.parts().get(i).assembled().operator())
                              .toList(),
                          1,
                          caseFile.window(),
                          BACKWARD_ERROR);
                  synchronized (done) {
                    progress.step("training the reduced model", ++done[0], parts.size());
                  }
                  return family;
                })
            .toList();
    return new ReducedPoints(caseFile, memory, parts, families);
  }

  private static boolean cheap(List<CaseProblem.Part> parts) {
    return parts.stream()
        .allMatch(
            p ->
                p.assembled().operator().lowRankTerms().stream()
                        .mapToInt((LowRankTerm t) -> t.left().size())
                        .sum()
                    <= MOST_COLUMNS);
  }

  private static boolean alike(CaseProblem a, CaseProblem b) {
    return a.parts().size() == b.parts().size()
        && IntStream.range(0, a.parts().size())
            .allMatch(
                i ->
                    a.parts().get(i).name().equals(b.parts().get(i).name())
                        && operator(a, i).size() == operator(b, i).size());
  }

  private static AcousticOperator operator(CaseProblem p, int part) {
    return p.parts().get(part).assembled().operator();
  }

  private static Optional<CaseProblem> problem(
      CaseFile caseFile, CaseMemory memory, CaseFile changed) {
    return FullPoints.drawn(caseFile, memory.shape(), changed)
        .map(
            shape ->
                shape == memory.shape()
                    ? CaseProblem.on(changed, memory)
                    : CaseProblem.on(changed, shape));
  }

  /** Whether points are solved on a trained basis at all. */
  public boolean reduced() {
    return !families.isEmpty();
  }

  /** Numbers of columns, one for each operator; empty where points are solved in full. */
  public List<Integer> sizes() {
    return families.stream().map(ReducedFamily::size).toList();
  }

  @Override
  public PointModes at(CaseFile changed) {
    return at(changed, new int[0]);
  }

  /**
   * The same with a hint.
   *
   * @param near positions in the training list of cases close by, from whose modes to start
   */
  public PointModes at(CaseFile changed, int... near) {
    Optional<CaseProblem> problem =
        families.isEmpty() ? Optional.empty() : problem(caseFile, memory, changed);
    if (problem.isEmpty() || !fits(problem.get())) {
      return full.at(changed);
    }
    List<PointMode> modes = new ArrayList<>();
    boolean complete = true;
    for (int i = 0; i < parts.size(); i++) {
      CaseProblem.Part part = problem.get().parts().get(i);
      ReducedFamily.Answer answer = families.get(i).at(part.assembled().operator(), near);
      complete &= answer.counted();
      for (ReducedFamily.Root r : answer.roots()) {
        complete &= r.backwardError() <= BACKWARD_ERROR;
        NodalField field = part.assembled().expand(r.re(), r.im());
        double[][] shape = ShapePlaces.unit(places.of(field));
        modes.add(
            new PointMode(
                r.s(),
                part.name(),
                part.order(),
                part.copies(),
                r.backwardError(),
                shape[0],
                shape[1]));
      }
    }
    return new PointModes(modes, complete);
  }

  private boolean fits(CaseProblem problem) {
    return problem.parts().size() == parts.size()
        && IntStream.range(0, parts.size())
            .allMatch(
                i ->
                    problem.parts().get(i).name().equals(parts.get(i).name())
                        && families.get(i).holds(operator(problem, i)));
  }

  /** The same points without the reduced model, for checks. */
  public FullPoints full() {
    return full;
  }
}
