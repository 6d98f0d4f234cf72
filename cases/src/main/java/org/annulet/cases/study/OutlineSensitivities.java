package org.annulet.cases.study;

import java.util.ArrayList;
import java.util.Collection;
import java.util.Comparator;
import java.util.HashMap;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeSet;
import java.util.stream.IntStream;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.CaseSource;
import org.annulet.cases.read.Geometry;
import org.annulet.cases.read.Outline;
import org.annulet.post.meaning.PointSensitivity;
import org.annulet.solver.derivative.DifferenceOfOperators;
import org.annulet.solver.derivative.Slope;
import org.annulet.solver.modes.Mode;

/**
 * How every mode moves with every coordinate of every named point of an outline: the mesh is moved
 * with the outline both ways, and the difference of the operators stands between left and right
 * vector. No mode is solved anew. Gas that is stated over a coordinate stays where it is; dampers
 * and open shares keep their values.
 */
final class OutlineSensitivities {
  /**
   * Step in parts of the shortest piece of an edge at the point; the difference errs by about its
   * square, the second difference by rounding over that.
   */
  private static final double STEP = 2e-4;

  /** Effects of less than this part of |s| per length of that piece are rounding. */
  private static final double NOTHING = 1e-8;

  private final CaseFile caseFile;
  private final CaseProblem problem;
  private final List<DerivedModes> groups;
  private final Optional<Outline> outline;
  private final List<String> leftOut = new ArrayList<>();

  /** One row of a mode's table while it is being filled. */
  private record Effect(Mode mode, PointSensitivity row) {}

  /** One coordinate: 1 or 2 of a point. */
  private record Coordinate(String point, int number, CaseSource.Value value) {}

  /**
   * Of some modes.
   *
   * @param problem the case on its finest mesh
   * @param groups modes of that problem
   */
  OutlineSensitivities(CaseFile caseFile, CaseProblem problem, List<DerivedModes> groups) {
    this.caseFile = caseFile;
    this.problem = problem;
    this.groups = List.copyOf(groups);
    this.outline = ChamberShape.outline(caseFile.geometry());
  }

  /** Which coordinates had to be left out, and why; empty where none was; after the run. */
  Optional<String> sentence() {
    if (caseFile.geometry() instanceof Geometry.MeshFile) {
      return Optional.of(
          "Sensitivities to the shape are not computed: a mesh made elsewhere has no outline.");
    }
    return leftOut.isEmpty()
        ? Optional.empty()
        : Optional.of(
            "Sensitivities to points leave out what cannot be moved both ways by itself, as a"
                + " point off the axis: "
                + String.join(", ", new TreeSet<>(leftOut))
                + ".");
  }

  /** The table of every mode, the strongest effect on the growth rate first. */
  Map<Mode, List<PointSensitivity>> run() {
    Map<Mode, List<PointSensitivity>> tables = new IdentityHashMap<>();
    groups.forEach(g -> g.members().forEach(m -> tables.put(m, new ArrayList<>())));
    if (outline.isEmpty()) {
      return tables;
    }
    OutlineMorph morph = new OutlineMorph(problem.shape(), outline.get());
    List<List<Effect>> all =
        coordinates().parallelStream().map(c -> effects(c, morph).orElse(List.of())).toList();
    all.stream().flatMap(Collection::stream).forEach(e -> tables.get(e.mode).add(e.row));
    Comparator<PointSensitivity> strongest =
        Comparator.<PointSensitivity>comparingDouble(p -> -Math.abs(p.growthPerMillimetre()))
            .thenComparingDouble(p -> -Math.abs(p.frequencyPerMillimetre()));
    tables.values().forEach(t -> t.sort(strongest));
    return tables;
  }

  /** Both coordinates of every point an edge runs through. */
  private List<Coordinate> coordinates() {
    Map<String, CaseSource.Value> values = new HashMap<>();
    caseFile.source().values().forEach(v -> values.put(v.key(), v));
    return outline.orElseThrow().points().keySet().stream()
        .filter(p -> shortestPiece(p) < Double.POSITIVE_INFINITY)
        .flatMap(
            p ->
                IntStream.of(1, 2)
                    .mapToObj(
                        k -> new Coordinate(p, k, values.get("geometry.points." + p + "." + k))))
        .filter(c -> c.value != null)
        .toList();
  }

  /** Distance in m to the nearest point next to it on an edge; infinite off all edges. */
  private double shortestPiece(String point) {
    Outline o = outline.orElseThrow();
    Outline.Point at = o.points().get(point);
    double shortest = Double.POSITIVE_INFINITY;
    for (Outline.Edge e : o.edges().values()) {
      for (int i = 1; i < e.points().size(); i++) {
        String a = e.points().get(i - 1);
        String b = e.points().get(i);
        if (a.equals(point) || b.equals(point)) {
          Outline.Point other = o.points().get(a.equals(point) ? b : a);
          shortest = Math.min(shortest, Math.hypot(other.x() - at.x(), other.y() - at.y()));
        }
      }
    }
    return shortest;
  }

  private Optional<List<Effect>> effects(Coordinate c, OutlineMorph morph) {
    double piece = shortestPiece(c.point);
    double step = STEP * piece;
    Optional<CaseProblem> less = moved(c, -step, morph);
    Optional<CaseProblem> more = moved(c, step, morph);
    if (less.isEmpty()
        || more.isEmpty()
        || groups.stream()
            .anyMatch(
                g ->
                    !Sensitivities.comparable(problem, less.get(), g)
                        || !Sensitivities.comparable(problem, more.get(), g))) {
      synchronized (leftOut) {
        leftOut.add(c.value.key());
      }
      return Optional.empty();
    }
    List<Effect> effects = new ArrayList<>();
    for (DerivedModes g : groups) {
      List<Slope> slopes =
          g.derivative()
              .slopes(
                  new DifferenceOfOperators(
                      g.derivative().prepared(),
                      Sensitivities.operator(less.get(), g.part()),
                      Sensitivities.operator(more.get(), g.part()),
                      step));
      for (int j = 0; j < slopes.size(); j++) {
        Mode mode = g.members().get(j);
        Slope s = slopes.get(j);
        double size = Math.hypot(mode.growthRate(), 2 * Math.PI * mode.frequency());
        if (s.first().abs() * piece > NOTHING * size) {
          effects.add(new Effect(mode, row(c, s)));
        }
      }
    }
    return Optional.of(effects);
  }

  private PointSensitivity row(Coordinate c, Slope s) {
    return new PointSensitivity(
        c.value.key(),
        c.point,
        axis(c.number),
        c.value.text(),
        1e-3 * s.first().getReal(),
        1e-3 * s.first().getImaginary() / (2 * Math.PI),
        1e3 * s.linearRange());
  }

  /** What the coordinate is called on this kind of geometry. */
  private String axis(int number) {
    if (caseFile.geometry() instanceof Geometry.CrossSection) {
      return number == 1 ? "y" : "z";
    }
    return number == 1 ? "x" : caseFile.geometry() instanceof Geometry.Section ? "r" : "y";
  }

  /** The case with the coordinate moved, on the mesh moved with it. */
  private Optional<CaseProblem> moved(Coordinate c, double by, OutlineMorph morph) {
    try {
      return InputChange.to(caseFile, c.value, c.value.si() + by)
          .map(m -> CaseProblem.on(m, morph.to(ChamberShape.outline(m.geometry()).orElseThrow())));
    } catch (IllegalArgumentException e) {
      return Optional.empty(); // cannot be drawn or set up
    }
  }
}
