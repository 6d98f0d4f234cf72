package org.annulet.cases.study;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.TreeMap;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.Flame;
import org.annulet.cases.read.Geometry;
import org.annulet.solver.flame.DelaySpread;
import org.annulet.solver.flame.DelaySum;
import org.annulet.solver.flame.Firing;
import org.annulet.solver.flame.FittedResponse;
import org.annulet.solver.flame.LowPass;
import org.annulet.solver.flame.NTau;
import org.annulet.solver.flame.Patch;
import org.annulet.solver.flame.Place;
import org.annulet.solver.flame.Reference;
import org.annulet.solver.flame.Response;
import org.annulet.solver.flame.Side;

/** The flames of a case as the solver's. */
final class CaseFlames {
  /** Wanted error of the fit of a table, over its largest value. */
  static final double FIT = 0.01;

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
    Firing rule = new Firing(f.heatRelease(), once(f.response()));
    Map<Integer, Firing> staging = new TreeMap<>();
    if (caseFile.geometry() instanceof Geometry.Ring ring && !f.staging().isEmpty()) {
      for (int burner = 1; burner <= ring.burnerCount(); burner++) {
        Firing here =
            new Firing(f.heatRelease() * f.heatShareAt(burner), once(f.responseAt(burner)));
        if (!here.equals(rule)) {
          staging.put(burner, here);
        }
      }
    }
    return new org.annulet.solver.flame.Flame(
        f.name(), place(f.place()), reference(f), rule, staging);
  }

  /** The solver's response; a table is fitted once for the case and all its changes. */
  private Response once(Flame.Response response) {
    return caseFile
        .source()
        .dataFiles()
        .once(response, Response.class, () -> Optional.of(response(response)))
        .orElseThrow();
  }

  /** The solver's response; a table is fitted, see {@link FittedResponse}. */
  static Response response(Flame.Response response) {
    if (response instanceof Flame.GainDelay n) {
      return new NTau(n.gain(), n.delay());
    }
    if (response instanceof Flame.SpreadDelay n) {
      return new DelaySpread(n.gain(), n.delay(), n.deviation());
    }
    if (response instanceof Flame.LowPass n) {
      return new LowPass(n.gain(), n.delay(), n.cutoff());
    }
    if (response instanceof Flame.DelaySum sum) {
      return new DelaySum(sum.parts().stream().map(n -> new NTau(n.gain(), n.delay())).toList());
    }
    Flame.Measured measured = (Flame.Measured) response;
    OptionalDouble limit =
        switch (measured.limit()) {
          case PREMIXED -> OptionalDouble.of(1);
          case TECHNICALLY_PREMIXED -> OptionalDouble.of(0);
          case AS_MEASURED -> OptionalDouble.empty();
        };
    return FittedResponse.of(CaseWalls.table(measured.table()), FIT, limit);
  }

  private Place place(Flame.Place place) {
    if (place instanceof Flame.Sheet sheet) {
      return sheet.answer() == Flame.Answer.POINTWISE
          ? new Place.PointwiseSheet(sheet.edge())
          : new Place.Sheet(sheet.edge());
    }
    if (place instanceof Flame.Brush brush) {
      return new Place.Weighted(
          new Patch(
              brush.zone(), Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY, brush.width()),
          brush.density());
    }
    Flame.Spread spread = (Flame.Spread) place;
    return new Place.Spread(new Patch(spread.zone(), spread.from(), spread.to(), spread.width()));
  }

  private Reference reference(Flame f) {
    if (f.reference() instanceof Flame.EdgePressure edge) {
      return new Reference.EdgePressure(edge.edge());
    }
    if (f.reference() instanceof Flame.PatchPressure p) {
      return new Reference.PatchPressure(new Patch(p.zone(), p.from(), p.to(), p.width()));
    }
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
