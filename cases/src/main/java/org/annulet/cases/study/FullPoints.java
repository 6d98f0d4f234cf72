package org.annulet.cases.study;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.Geometry;
import org.annulet.solver.eigen.ModeSearch;
import org.annulet.solver.eigen.SearchSettings;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.modes.ModeSet;
import org.apache.commons.math3.complex.Complex;

/**
 * Every point searched and certified on the full operators: slow, and the measure of what is
 * faster.
 */
public final class FullPoints implements PointSolver {
  private final CaseFile caseFile;
  private final ChamberShape shape;
  private final ShapePlaces places;

  /** Points near a case, whose mesh serves wherever the changed case can be drawn on it. */
  public FullPoints(CaseFile caseFile) {
    this(caseFile, ChamberShape.of(caseFile));
  }

  FullPoints(CaseFile caseFile, ChamberShape shape) {
    this.caseFile = caseFile;
    this.shape = shape;
    this.places = ShapePlaces.on(shape.mesh());
  }

  @Override
  public PointModes at(CaseFile changed) {
    Optional<ChamberShape> drawn = drawn(caseFile, shape, changed);
    CaseProblem problem = CaseProblem.on(changed, drawn.orElseGet(() -> ChamberShape.of(changed)));
    ShapePlaces here = drawn.isPresent() ? places : places.onto(problem.shape().mesh());
    List<PointMode> modes = new ArrayList<>();
    boolean complete = true;
    for (CaseProblem.Part part : problem.parts()) {
      ModeSet set =
          ModeSearch.find(
              part.assembled().operator(), caseFile.window(), SearchSettings.standard());
      complete &= set.complete();
      List<Mode> all = new ArrayList<>(set.modes());
      all.addAll(set.outside());
      all.sort(Comparator.comparingDouble(Mode::frequency));
      for (Mode m : all) {
        double[][] at = ShapePlaces.unit(here.of(part.assembled().expand(m.re(), m.im())));
        modes.add(
            new PointMode(
                new Complex(m.growthRate(), 2 * Math.PI * m.frequency()),
                part.name(),
                part.order(),
                part.copies(),
                m.backwardError(),
                at[0],
                at[1]));
      }
    }
    return new PointModes(modes, complete);
  }

  /**
   * The mesh of a case for a changed one: the same, or that of a ring drawn out; empty where the
   * changed case needs a mesh of its own.
   */
  static Optional<ChamberShape> drawn(CaseFile from, ChamberShape shape, CaseFile to) {
    if (from.geometry().equals(to.geometry())) {
      return Optional.of(shape);
    }
    if (from.geometry() instanceof Geometry.Ring a
        && to.geometry() instanceof Geometry.Ring b
        && a.burnerCount() == b.burnerCount()
        && a.meshSize().equals(b.meshSize())
        && a.zones().size() == b.zones().size()) {
      return RingMorph.of(shape, a, b);
    }
    return Optional.empty();
  }
}
