package org.annulet.cases.study;

import java.util.List;
import java.util.Optional;
import org.annulet.cases.read.CaseFaultException;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.FrequencyTable;
import org.annulet.cases.read.Wall;
import org.annulet.solver.assembly.Face;
import org.annulet.solver.assembly.ProblemBuilder;
import org.annulet.solver.boundary.Admittance;
import org.annulet.solver.boundary.ChokedNozzle;
import org.annulet.solver.boundary.FittedWall;
import org.annulet.solver.boundary.Impedance;
import org.annulet.solver.boundary.OpenEnd;
import org.annulet.solver.boundary.PerforatedLiner;
import org.annulet.solver.boundary.RadiatingEnd;
import org.annulet.solver.boundary.Rigid;
import org.annulet.solver.rational.Table;
import org.apache.commons.math3.complex.Complex;

/** The walls of a case on a problem. */
final class CaseWalls {
  /** Wanted error of the fit of a table, in reflection coefficient. */
  static final double FIT = 0.01;

  private static final String INNER = ".inner_face";
  private static final String OUTER = ".outer_face";

  private CaseWalls() {}

  /**
   * Puts every wall of the case on its edge or face.
   *
   * @throws CaseFaultException if an edge cannot carry the wall
   */
  static void put(CaseFile caseFile, ProblemBuilder builder) {
    caseFile
        .walls()
        .forEach(
            (name, wall) -> {
              try {
                if (name.endsWith(INNER)) {
                  builder.face(stem(name, INNER), Face.INNER, solverWall(caseFile, wall));
                } else if (name.endsWith(OUTER)) {
                  builder.face(stem(name, OUTER), Face.OUTER, solverWall(caseFile, wall));
                } else {
                  builder.wall(name, solverWall(caseFile, wall));
                }
              } catch (IllegalArgumentException e) {
                throw new CaseFaultException(
                    List.of(
                        caseFile
                            .source()
                            .problem("walls." + name, e.getMessage(), "name a boundary edge")));
              }
            });
  }

  private static String stem(String name, String ending) {
    return name.substring(0, name.length() - ending.length());
  }

  static org.annulet.solver.boundary.Wall solverWall(CaseFile caseFile, Wall wall) {
    if (wall instanceof Wall.Open) {
      return new OpenEnd();
    }
    if (wall instanceof Wall.Impedance z) {
      return new Impedance(new Complex(z.re(), z.im()));
    }
    if (wall instanceof Wall.Admittance y) {
      return new Admittance(new Complex(y.re(), y.im()));
    }
    if (wall instanceof Wall.ChokedNozzle nozzle) {
      return new ChokedNozzle(nozzle.mach());
    }
    if (wall instanceof Wall.Tabulated t) {
      return caseFile
          .source()
          .dataFiles()
          .once(t, FittedWall.class, () -> Optional.of(fitted(t)))
          .orElseThrow();
    }
    if (wall instanceof Wall.Perforated p) {
      return new PerforatedLiner(
          new PerforatedLiner.Plate(p.holeBore() / 2, p.pitch(), p.thickness()),
          p.biasVelocity(),
          p.cavityDepth());
    }
    if (wall instanceof Wall.RadiatingEnd e) {
      return e.rim() == Wall.Rim.FLANGED
          ? RadiatingEnd.flanged(e.radius())
          : RadiatingEnd.unflanged(e.radius());
    }
    return new Rigid();
  }

  /** The wall a table describes, as a fit of its reflection coefficient. */
  static FittedWall fitted(Wall.Tabulated wall) {
    Table table = table(wall.table());
    return switch (wall.quantity()) {
      case IMPEDANCE -> FittedWall.ofImpedance(table, FIT);
      case ADMITTANCE -> FittedWall.ofAdmittance(table, FIT);
      case REFLECTION -> FittedWall.ofReflection(table, FIT);
    };
  }

  /** A table of a case as the solver's. */
  static Table table(FrequencyTable t) {
    Complex[] values = new Complex[t.frequency().length];
    for (int k = 0; k < values.length; k++) {
      values[k] = new Complex(t.re()[k], t.im()[k]);
    }
    return new Table(t.frequency(), values);
  }
}
