package org.annulet.cases.study;

import java.util.ArrayList;
import java.util.Collection;
import java.util.Comparator;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeSet;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.CaseSource;
import org.annulet.cases.read.Flame;
import org.annulet.cases.read.Geometry;
import org.annulet.post.meaning.ParameterSensitivity;
import org.annulet.solver.derivative.ChangeOfTerm;
import org.annulet.solver.derivative.DifferenceOfOperators;
import org.annulet.solver.derivative.OperatorChange;
import org.annulet.solver.derivative.Slope;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.operator.AcousticOperator;

/**
 * How every mode moves with every number of the case: the case is read again with one number a
 * little smaller and a little larger, its operators are assembled on the same mesh, and the
 * difference stands between left and right vector. No mode is solved anew.
 */
final class Sensitivities {
  /** Effects below this, in 1/s and 2π Hz per percent and relative to |s|, are rounding. */
  private static final double NOTHING = 1e-10;

  private final CaseFile caseFile;
  private final CaseProblem problem;
  private final List<DerivedModes> groups;
  private final List<String> leftOut = new ArrayList<>();

  /** One row of a mode's table while it is being filled. */
  private record Effect(Mode mode, ParameterSensitivity row) {}

  /**
   * Of some modes.
   *
   * @param problem the case on its finest mesh
   * @param groups modes of that problem
   */
  Sensitivities(CaseFile caseFile, CaseProblem problem, List<DerivedModes> groups) {
    this.caseFile = caseFile;
    this.problem = problem;
    this.groups = List.copyOf(groups);
  }

  /** Numbers that enter the operators but could not be varied by themselves; after the run. */
  List<String> leftOut() {
    return List.copyOf(new TreeSet<>(leftOut));
  }

  /** The table of every mode, the strongest effect on the growth rate first. */
  Map<Mode, List<ParameterSensitivity>> run() {
    List<Optional<List<Effect>>> all =
        InputChange.candidates(caseFile).parallelStream().map(this::effects).toList();
    List<Effect> later =
        caseFile.flames().stream()
            .filter(f -> f.response() instanceof Flame.Measured)
            .flatMap(f -> later(f).stream())
            .toList();
    Map<Mode, List<ParameterSensitivity>> tables = new IdentityHashMap<>();
    groups.forEach(g -> g.members().forEach(m -> tables.put(m, new ArrayList<>())));
    all.stream()
        .flatMap(Optional::stream)
        .flatMap(Collection::stream)
        .forEach(e -> tables.get(e.mode).add(e.row));
    later.forEach(e -> tables.get(e.mode).add(e.row));
    Comparator<ParameterSensitivity> strongest =
        Comparator.comparingDouble((ParameterSensitivity p) -> -Math.abs(p.growthPerPercent()));
    tables.values().forEach(t -> t.sort(strongest));
    return tables;
  }

  private Optional<List<Effect>> effects(CaseSource.Value value) {
    Optional<InputChange> change = InputChange.of(caseFile, value);
    if (change.isEmpty()) {
      note(value);
      return Optional.empty();
    }
    Optional<CaseProblem> less = problem(change.get().smaller());
    Optional<CaseProblem> more = problem(change.get().larger());
    if (less.isEmpty() || more.isEmpty()) {
      note(value);
      return Optional.empty();
    }
    CaseProblem smaller = less.get();
    CaseProblem larger = more.get();
    List<Effect> effects = new ArrayList<>();
    for (DerivedModes g : groups) {
      if (!comparable(problem, smaller, g) || !comparable(problem, larger, g)) {
        note(value);
        return Optional.empty();
      }
      DifferenceOfOperators difference =
          new DifferenceOfOperators(
              g.derivative().prepared(),
              operator(smaller, g.part()),
              operator(larger, g.part()),
              InputChange.STEP);
      List<Slope> slopes = g.derivative().slopes(difference);
      for (int j = 0; j < slopes.size(); j++) {
        effect(g.members().get(j), value, slopes.get(j)).ifPresent(effects::add);
      }
    }
    return Optional.of(effects);
  }

  /**
   * What a measured response does that comes later by one percent of the mode's cycle: exact, since
   * e^{−sδ} multiplies whatever the response is.
   */
  private List<Effect> later(Flame flame) {
    List<Effect> effects = new ArrayList<>();
    String name = "flame " + flame.name();
    for (DerivedModes g : groups) {
      List<ChangeOfTerm> terms =
          g.derivative().prepared().operator().lowRankTerms().stream()
              .filter(t -> t.name().equals(name) || t.name().startsWith(name + " burner "))
              .map(ChangeOfTerm::delay)
              .toList();
      List<Slope> slopes = g.derivative().slopes(OperatorChange.together(terms));
      for (int j = 0; j < slopes.size(); j++) {
        Mode mode = g.members().get(j);
        double cycle = 1 / mode.frequency();
        Slope s = slopes.get(j);
        effects.add(
            new Effect(
                mode,
                new ParameterSensitivity(
                    "flames." + flame.name() + ".response",
                    "later by 1 % of a cycle",
                    0.01 * cycle * s.first().getReal(),
                    0.01 * cycle * s.first().getImaginary() / (2 * Math.PI),
                    100 * s.linearRange() / cycle)));
      }
    }
    return effects;
  }

  /** A changed case on the mesh at hand, drawn out where the dimensions of a ring differ. */
  private Optional<CaseProblem> problem(CaseFile changed) {
    try {
      Optional<ChamberShape> shape = Optional.of(problem.shape());
      if (caseFile.geometry() instanceof Geometry.Ring from
          && changed.geometry() instanceof Geometry.Ring to
          && !from.equals(to)) {
        shape = RingMorph.of(problem.shape(), from, to);
      }
      return shape.map(s -> CaseProblem.on(changed, s));
    } catch (IllegalArgumentException e) { // a value at the end of what is allowed
      return Optional.empty();
    }
  }

  private void note(CaseSource.Value value) {
    synchronized (leftOut) {
      leftOut.add(value.key());
    }
  }

  /** Whether a changed case has the unknowns of the case at hand. */
  static boolean comparable(CaseProblem problem, CaseProblem changed, DerivedModes g) {
    return changed.parts().size() == problem.parts().size()
        && DifferenceOfOperators.comparable(
            g.derivative().prepared().operator(), operator(changed, g.part()));
  }

  static AcousticOperator operator(CaseProblem problem, int part) {
    return problem.parts().get(part).assembled().operator();
  }

  private static Optional<Effect> effect(Mode mode, CaseSource.Value value, Slope slope) {
    double size = Math.hypot(mode.growthRate(), 2 * Math.PI * mode.frequency());
    if (slope.first().abs() < 100 * NOTHING * size) {
      return Optional.empty();
    }
    return Optional.of(
        new Effect(
            mode,
            new ParameterSensitivity(
                value.key(),
                value.text(),
                slope.first().getReal() / 100,
                slope.first().getImaginary() / (200 * Math.PI),
                100 * slope.linearRange())));
  }
}
