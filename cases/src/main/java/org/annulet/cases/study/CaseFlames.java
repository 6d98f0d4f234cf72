package org.annulet.cases.study;

import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.Flame;
import org.annulet.cases.read.Geometry;
import org.annulet.solver.flame.Firing;
import org.annulet.solver.flame.NTau;
import org.annulet.solver.flame.Patch;
import org.annulet.solver.flame.Place;
import org.annulet.solver.flame.Reference;
import org.annulet.solver.flame.Side;

/** The flames of a case as the solver's. */
final class CaseFlames {
  private final CaseFile caseFile;

  CaseFlames(CaseFile caseFile) {
    this.caseFile = caseFile;
  }

  /** Whether every burner of a ring is fired alike, so that one burner cell serves for all. */
  boolean allBurnersAlike() {
    return caseFile.flames().stream().allMatch(f -> solverFlame(f).staging().isEmpty());
  }

  List<org.annulet.solver.flame.Flame> all() {
    return caseFile.flames().stream().map(this::solverFlame).toList();
  }

  private org.annulet.solver.flame.Flame solverFlame(Flame f) {
    Firing rule = new Firing(f.heatRelease(), response(f.response()));
    Map<Integer, Firing> staging = new TreeMap<>();
    if (caseFile.geometry() instanceof Geometry.Ring ring && !f.staging().isEmpty()) {
      for (int burner = 1; burner <= ring.burnerCount(); burner++) {
        Firing here =
            new Firing(f.heatRelease() * f.heatShareAt(burner), response(f.responseAt(burner)));
        if (!here.equals(rule)) {
          staging.put(burner, here);
        }
      }
    }
    return new org.annulet.solver.flame.Flame(
        f.name(), place(f.place()), reference(f), rule, staging);
  }

  private static NTau response(Flame.Response response) {
    Flame.GainDelay n = (Flame.GainDelay) response;
    return new NTau(n.gain(), n.delay());
  }

  private Place place(Flame.Place place) {
    if (place instanceof Flame.Sheet sheet) {
      return sheet.answer() == Flame.Answer.POINTWISE
          ? new Place.PointwiseSheet(sheet.edge())
          : new Place.Sheet(sheet.edge());
    }
    Flame.Spread spread = (Flame.Spread) place;
    return new Place.Spread(new Patch(spread.zone(), spread.from(), spread.to(), spread.width()));
  }

  private Reference reference(Flame f) {
    if (f.reference() instanceof Flame.EdgeFlux edge) {
      return new Reference.EdgeFlux(
          edge.edge(), new Side.InZone(edge.flowFrom()), f.referenceVelocity());
    }
    Flame.Patch patch = (Flame.Patch) f.reference();
    return new Reference.PatchVelocity(
        Patch.between(patch.zone(), patch.from(), patch.to()),
        patch.directionX(),
        patch.directionY(),
        f.referenceVelocity());
  }
}
