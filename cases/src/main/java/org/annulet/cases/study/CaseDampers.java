package org.annulet.cases.study;

import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import org.annulet.cases.read.CaseFaultException;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.Damper;
import org.annulet.cases.read.Geometry;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.assembly.DamperPlace;
import org.annulet.solver.assembly.Face;
import org.annulet.solver.assembly.ProblemBuilder;
import org.annulet.solver.boundary.QuarterWaveTube;
import org.annulet.solver.boundary.ResonatorChain;
import org.annulet.solver.medium.Medium;

/** The dampers of a case, one port for each place. */
final class CaseDampers {
  /** Distance from a burner's middle, over the pitch, that counts as none. */
  private static final double CENTRED = 1e-9;

  private CaseDampers() {}

  /**
   * Puts every damper at its places.
   *
   * @throws CaseFaultException if one lies nowhere on its wall
   */
  static void put(CaseFile caseFile, Mesh mesh, Medium medium, ProblemBuilder builder) {
    boolean cell = caseFile.geometry() instanceof Geometry.Ring && mesh.period() == 0;
    for (Damper damper : caseFile.dampers()) {
      int number = 0;
      List<Damper.Place> places = cell ? List.of(inCell(damper)) : damper.places();
      for (Damper.Place place : places) {
        String name = places.size() == 1 ? damper.name() : damper.name() + " " + ++number;
        try {
          builder.damper(
              name,
              solved(damper.design(), gas(damper, place, mesh, medium)),
              placed(damper, place));
        } catch (IllegalArgumentException e) {
          throw new CaseFaultException(
              List.of(
                  caseFile
                      .source()
                      .problem(
                          "dampers." + damper.name() + ".at",
                          e.getMessage(),
                          "move it onto the wall, or make its mouth narrower")));
        }
      }
    }
  }

  /**
   * Whether every burner of a ring has the same dampers, centred on it, so that one burner cell
   * serves for all.
   */
  static boolean allBurnersAlike(CaseFile caseFile) {
    return caseFile.dampers().stream()
        .allMatch(
            d ->
                caseFile.geometry() instanceof Geometry.Ring ring
                    && atEveryBurner(d, ring.burnerCount()));
  }

  private static boolean atEveryBurner(Damper damper, int burners) {
    Set<Long> cells = new TreeSet<>();
    for (Damper.Place place : damper.places()) {
      if (!(place instanceof Damper.OnFace f)) {
        return false;
      }
      double cell = f.angle() * burners / (2 * Math.PI);
      cells.add(Math.floorMod(Math.round(cell), (long) burners));
      if (Math.abs(cell - Math.rint(cell)) > CENTRED || !inCell(damper).equals(moved(f))) {
        return false;
      }
    }
    return cells.size() == burners && damper.places().size() == burners;
  }

  private static Damper.OnFace inCell(Damper damper) {
    return moved((Damper.OnFace) damper.places().get(0));
  }

  private static Damper.OnFace moved(Damper.OnFace f) {
    return new Damper.OnFace(f.face(), f.x(), 0);
  }

  /** Width of the patch of wall a damper sees, in m. */
  static double mouthWidth(Damper damper) {
    return Double.isNaN(damper.mouthWidth())
        ? Math.sqrt(damper.design().mouthArea())
        : damper.mouthWidth();
  }

  /**
   * The damper of the solver.
   *
   * @param gas density in kg/m³ and sound speed in m/s of what fills it
   */
  static org.annulet.solver.boundary.Damper solved(Damper.Design design, double[] gas) {
    if (design instanceof Damper.Resonator r) {
      return new ResonatorChain(
          gas[0],
          gas[1],
          List.of(
              new ResonatorChain.Stage(
                  r.mouthArea(), r.effectiveLength(), r.resistance(gas[1]), r.volume())));
    }
    Damper.QuarterWave t = (Damper.QuarterWave) design;
    return new QuarterWaveTube(
        gas[0],
        gas[1],
        new QuarterWaveTube.Mouth(t.mouthArea(), t.effectiveLength(), t.resistance(gas[1])));
  }

  private static DamperPlace placed(Damper damper, Damper.Place place) {
    double width = mouthWidth(damper);
    if (place instanceof Damper.OnEdge e) {
      return new DamperPlace.OnEdge(e.edge(), e.x(), e.y(), width, e.count());
    }
    Damper.OnFace f = (Damper.OnFace) place;
    Face face = f.face().endsWith(".inner_face") ? Face.INNER : Face.OUTER;
    return new DamperPlace.OnFace(f.zone(), face, f.x(), f.angle(), width);
  }

  /** Density and sound speed in the damper: of the zone it names, or at its mouth. */
  static double[] gas(Damper damper, Damper.Place place, Mesh mesh, Medium medium) {
    List<Integer> triangles = new ArrayList<>();
    String zone = damper.gasOf();
    if (zone.isEmpty() && place instanceof Damper.OnEdge e) {
      triangles.add(nearest(mesh, e));
    } else {
      String of = zone.isEmpty() ? ((Damper.OnFace) place).zone() : zone;
      for (int t = 0; t < mesh.triangleCount(); t++) {
        if (mesh.zoneNames().get(mesh.zone(t)).equals(of)) {
          triangles.add(t);
        }
      }
    }
    double area = 0;
    double mass = 0;
    double speed = 0;
    for (int t : triangles) {
      area += mesh.area(t);
      mass += mesh.area(t) * medium.density(t);
      speed += mesh.area(t) * medium.soundSpeed(t);
    }
    return new double[] {mass / area, speed / area};
  }

  /** The triangle on the damper's edge nearest to its place. */
  private static int nearest(Mesh mesh, Damper.OnEdge place) {
    int best = 0;
    double least = Double.POSITIVE_INFINITY;
    for (int e = 0; e < mesh.segmentCount(); e++) {
      if (mesh.edgeNames().get(mesh.segmentEdge(e)).equals(place.edge())) {
        int a = mesh.segmentStart(e);
        int b = mesh.segmentEnd(e);
        double x = 0.5 * (mesh.x(a) + mesh.x(b)) - place.x();
        double y = 0.5 * (mesh.y(a) + mesh.y(b)) - place.y();
        if (Math.hypot(x, y) < least) {
          least = Math.hypot(x, y);
          best = mesh.segmentLeft(e);
        }
      }
    }
    return best;
  }
}
