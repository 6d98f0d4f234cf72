package org.annulet.cases.study;

import java.util.ArrayList;
import java.util.Collections;
import java.util.Comparator;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.stream.IntStream;
import org.annulet.cases.read.CaseFile;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.meaning.Certificate;
import org.annulet.post.meaning.Chamber;
import org.annulet.post.meaning.GrowthBudget;
import org.annulet.post.meaning.Labels;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.ModeLabel;
import org.annulet.post.meaning.ModeLabel.Origin;
import org.annulet.post.meaning.ModeMaps;
import org.annulet.post.meaning.ModeView;
import org.annulet.post.meaning.ParameterSensitivity;
import org.annulet.post.meaning.PointSensitivity;
import org.annulet.post.meaning.Results;
import org.annulet.solver.assembly.AssembledProblem;
import org.annulet.solver.assembly.NodalField;
import org.annulet.solver.assembly.Ring;
import org.annulet.solver.derivative.ModeDerivative;
import org.annulet.solver.eigen.ModeSearch;
import org.annulet.solver.eigen.PreparedOperator;
import org.annulet.solver.eigen.SearchSettings;
import org.annulet.solver.modes.MeshError;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.modes.ModeSet;
import org.annulet.solver.modes.Window;
import org.annulet.solver.operator.AcousticOperator;

/** Every mode of a case in its window, labelled and certified. */
public final class ModesStudy {
  /** Nested meshes: three show the order of convergence of each mode. */
  static final int LEVELS = 3;

  /** How much is asked of each mode. */
  private enum Depth {
    MODES,
    WITH_DERIVATIVES
  }

  private final CaseFile caseFile;
  private final Progress progress;
  private final Depth depth;

  /** A study of one case that says how far it is. */
  public ModesStudy(CaseFile caseFile, Progress progress) {
    this(caseFile, progress, Depth.WITH_DERIVATIVES);
  }

  private ModesStudy(CaseFile caseFile, Progress progress, Depth depth) {
    this.caseFile = caseFile;
    this.progress = progress;
    this.depth = depth;
  }

  /** The same without sensitivities and maps, for those who want the modes alone. */
  public ModesStudy modesOnly() {
    return new ModesStudy(caseFile, progress, Depth.MODES);
  }

  /**
   * The answer.
   *
   * @param caseFile the case
   * @param problem operators, mesh and gas
   * @param chamber the gas volume the modes live in
   * @param results modes with labels and certificates
   */
  public record Answer(CaseFile caseFile, CaseProblem problem, Chamber chamber, Results results) {}

  /**
   * Meshes, assembles, searches and labels.
   *
   * @param version of the program, for the results
   */
  public Answer run(String version) {
    progress.step("meshing and assembling", 0, 1);
    List<CaseProblem> ladder =
        ChamberShape.ladder(caseFile, LEVELS, 1).stream()
            .map(shape -> CaseProblem.on(caseFile, shape))
            .toList();
    CaseProblem problem = ladder.get(LEVELS - 1);
    Found found = search(ladder);
    Chamber chamber = GasVolume.of(problem);
    List<String> notes = new ArrayList<>();
    notes.add(problem.method());
    List<ModeEntry> labelled = label(chamber, found.inside);
    List<ModeEntry> inside =
        depth == Depth.MODES ? labelled : withDerivatives(labelled, found, chamber, notes);
    List<ModeEntry> outside = label(chamber, found.outside);
    CaseCheck.of(
            caseFile, problem.shape().mesh(), new CaseGas(caseFile).mapped(problem.shape().mesh()))
        .forEach(p -> notes.add(p.what() + "."));
    if (problem.shape().geometry() instanceof Ring ring) {
      ThinGap.sentence(ring, inside, chamber.mesh().zoneNames()).ifPresent(notes::add);
    }
    Results results =
        new Results(
            caseFile.title(),
            version,
            caseFile.window(),
            found.certificates,
            inside,
            outside,
            notes);
    return new Answer(caseFile, problem, chamber, results);
  }

  /** An entry of the results, and the mode of the operator behind it. */
  private record Listed(ModeView view, CaseProblem.Part part, Mode own, Origin origin) {}

  /** The entries with what moves them and where something can be done about them. */
  private List<ModeEntry> withDerivatives(
      List<ModeEntry> entries, Found found, Chamber chamber, List<String> notes) {
    progress.step("sensitivities and maps", 0, 1);
    List<DerivedModes> groups = derived(found);
    Sensitivities study = new Sensitivities(caseFile, found.problem, groups);
    Map<Mode, List<ParameterSensitivity>> tables = study.run();
    Map<Mode, ModeMaps> maps = new Maps(found.problem, chamber).of(groups);
    if (!study.leftOut().isEmpty()) {
      notes.add(
          "Sensitivities leave out what cannot be varied by itself on the same mesh: "
              + String.join(", ", study.leftOut())
              + ".");
    }
    OutlineSensitivities outline = new OutlineSensitivities(caseFile, found.problem, groups);
    Map<Mode, List<PointSensitivity>> points = outline.run();
    outline.sentence().ifPresent(notes::add);
    List<ModeEntry> out = new ArrayList<>();
    for (int i = 0; i < entries.size(); i++) {
      Mode own = found.inside.get(i).own;
      out.add(entries.get(i).with(tables.get(own)).withPoints(points.get(own)).with(maps.get(own)));
    }
    Maps.sentence(chamber, out).ifPresent(notes::add);
    return out;
  }

  private static List<DerivedModes> derived(Found found) {
    Set<Mode> seen = Collections.newSetFromMap(new IdentityHashMap<>());
    List<Listed> first = new ArrayList<>();
    for (Listed l : found.inside) {
      if (!seen.contains(l.own)) {
        first.add(l);
        seen.addAll(members(l, found.inside));
      }
    }
    return first.parallelStream()
        .map(
            l -> {
              int part = found.problem.parts().indexOf(l.part);
              List<Mode> members = members(l, found.inside);
              return new DerivedModes(
                  part, members, ModeDerivative.of(found.prepared.get(part), members));
            })
        .toList();
  }

  /** The modes of one eigenvalue of one operator. */
  private static List<Mode> members(Listed mode, List<Listed> all) {
    List<Mode> members = new ArrayList<>();
    for (Listed o : all) {
      if (o.part == mode.part
          && !members.contains(o.own)
          && (o.own == mode.own
              || mode.own.multiplicity() > 1
                  && o.own.multiplicity() > 1
                  && together(o.own, mode.own))) {
        members.add(o.own);
      }
    }
    return members;
  }

  private static final class Found {
    final CaseProblem problem;
    final List<Certificate> certificates = new ArrayList<>();
    final List<Listed> inside = new ArrayList<>();
    final List<Listed> outside = new ArrayList<>();
    final List<PreparedOperator> prepared = new ArrayList<>();

    Found(CaseProblem problem) {
      this.problem = problem;
    }
  }

  /**
   * Modes of one operator, those in the margin after those in the window, with their error bars.
   */
  private record Solved(
      ModeSet set,
      List<Optional<MeshError>> bars,
      List<Origin> origins,
      PreparedOperator prepared) {}

  private Found search(List<CaseProblem> ladder) {
    CaseProblem problem = ladder.get(ladder.size() - 1);
    int n = problem.parts().size();
    int[] done = {0};
    // Parts are independent; the results are put together in their order, so the number of cores
    // changes nothing.
    List<Solved> all =
        IntStream.range(0, n)
            .parallel()
            .mapToObj(
                i -> {
                  Solved solved = solve(ladder, i);
                  synchronized (done) {
                    progress.step("searching and counting modes", ++done[0], n);
                  }
                  return solved;
                })
            .toList();
    Optional<MirrorImage> mirror = problem.shape().cells().map(MirrorImage::new);
    Found found = new Found(problem);
    for (int i = 0; i < n; i++) {
      CaseProblem.Part part = problem.parts().get(i);
      ModeSet set = all.get(i).set;
      found.prepared.add(all.get(i).prepared);
      Certificate c = Certificate.of(part.name(), part.order(), set);
      found.certificates.add(
          new Certificate(
              c.operatorName(),
              c.order(),
              c.count() < 0 ? -1 : c.count() * part.copies(),
              c.found() * part.copies(),
              c.complete(),
              c.notes()));
      List<Mode> modes = all(set);
      for (int k = 0; k < modes.size(); k++) {
        List<Listed> list = k < set.modes().size() ? found.inside : found.outside;
        Mode own = modes.get(k);
        Origin origin = all.get(i).origins.get(k);
        views(part, own, all.get(i).bars.get(k), mirror)
            .forEach(view -> list.add(new Listed(view, part, own, origin)));
      }
    }
    Comparator<Listed> order =
        Comparator.<Listed>comparingDouble(l -> l.own.frequency())
            .thenComparingDouble(l -> l.own.growthRate());
    found.inside.sort(order);
    found.outside.sort(order);
    return found;
  }

  private Solved solve(List<CaseProblem> ladder, int part) {
    Mesh coarsest = ladder.get(0).shape().mesh();
    List<ErrorBars.Level> levels = new ArrayList<>();
    ModeSet set = null;
    PreparedOperator prepared = null;
    PreparedOperator small = null;
    for (CaseProblem level : ladder) {
      AssembledProblem assembled = level.parts().get(part).assembled();
      boolean finest = level == ladder.get(ladder.size() - 1);
      prepared = new PreparedOperator(assembled.operator());
      small = small == null ? prepared : small;
      set =
          ModeSearch.find(
              prepared,
              finest ? caseFile.window() : wider(caseFile.window()),
              SearchSettings.standard());
      CommonPlaces places = new CommonPlaces(coarsest, level.shape().mesh());
      List<Mode> modes = all(set);
      levels.add(
          new ErrorBars.Level(
              modes,
              modes.stream().map(m -> places.of(assembled.expand(m.re(), m.im()))).toList()));
    }
    return new Solved(
        set,
        ErrorBars.of(levels.get(0), levels.get(1), levels.get(2)),
        Origins.of(small, levels, set.modes().size()),
        prepared);
  }

  /** A coarse mesh moves modes over the window's edge, upwards above all. */
  private static Window wider(Window w) {
    double growth = 0.1 * (w.highestGrowth() - w.lowestGrowth());
    return new Window(
        0.9 * w.lowestFrequency(),
        1.15 * w.highestFrequency(),
        w.lowestGrowth() - growth,
        w.highestGrowth() + growth);
  }

  private static List<Mode> all(ModeSet set) {
    List<Mode> modes = new ArrayList<>(set.modes());
    modes.addAll(set.outside());
    return modes;
  }

  /** A mode as one entry, or as two where the operator stands for both turning directions. */
  private static List<ModeView> views(
      CaseProblem.Part part, Mode mode, Optional<MeshError> bar, Optional<MirrorImage> mirror) {
    NodalField p = part.assembled().expand(mode.re(), mode.im());
    double f = bar.map(MeshError::frequency).orElse(Double.NaN);
    double g = bar.map(MeshError::growthRate).orElse(Double.NaN);
    if (part.copies() == 1) {
      return List.of(new ModeView(mode, p.re(), p.im(), part.order(), part.name(), f, g));
    }
    Mode twice =
        new Mode(
            mode.growthRate(),
            mode.frequency(),
            mode.re(),
            mode.im(),
            mode.multiplicity() * part.copies(),
            mode.backwardError(),
            mode.iterations(),
            mode.verdict());
    ModeView one = new ModeView(twice, p.re(), p.im(), part.order(), part.name(), f, g);
    ModeView other =
        part.order() != null
            ? new ModeView(twice, p.re(), p.im(), -part.order(), part.name(), f, g)
            : new ModeView(
                twice,
                mirror.orElseThrow().of(p.re()),
                mirror.orElseThrow().of(p.im()),
                null,
                part.name(),
                f,
                g);
    return List.of(one, other);
  }

  private static List<ModeEntry> label(Chamber chamber, List<Listed> listed) {
    List<ModeLabel> labels = Labels.of(chamber, listed.stream().map(Listed::view).toList());
    List<ModeEntry> entries = new ArrayList<>();
    for (int i = 0; i < listed.size(); i++) {
      entries.add(
          new ModeEntry(
              listed.get(i).view,
              labels.get(i).withOrigin(listed.get(i).origin),
              Optional.of(budget(listed.get(i), listed))));
    }
    return entries;
  }

  /** What drives and damps a mode; summed over an exact pair, whose members are not unique. */
  private static GrowthBudget budget(Listed mode, List<Listed> all) {
    AcousticOperator operator = mode.part.assembled().operator();
    if (mode.own.multiplicity() == 2) {
      Optional<Listed> partner =
          all.stream()
              .filter(o -> o.part == mode.part && o.own != mode.own)
              .filter(o -> o.own.multiplicity() == 2)
              .filter(o -> together(o.own, mode.own))
              .findFirst();
      if (partner.isPresent()) {
        return GrowthBudget.ofPair(operator, mode.own, partner.get().own);
      }
    }
    return GrowthBudget.of(operator, mode.own);
  }

  private static boolean together(Mode a, Mode b) {
    double distance =
        Math.hypot(a.growthRate() - b.growthRate(), 2 * Math.PI * (a.frequency() - b.frequency()));
    return distance < 1e-7 * 2 * Math.PI * a.frequency();
  }
}
