package org.annulet.cases.study;

import java.util.List;
import org.annulet.cases.read.CaseFaultException;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.TwoPort;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.assembly.ProblemBuilder;
import org.annulet.solver.boundary.FlowLoss;
import org.annulet.solver.boundary.MeasuredTwoPort;
import org.annulet.solver.boundary.PerforatedLiner;
import org.annulet.solver.boundary.PerforatedScreen;
import org.annulet.solver.flame.Side;
import org.annulet.solver.medium.Medium;

/** The losses of a case across its inner edges. */
final class CaseTwoPorts {
  private CaseTwoPorts() {}

  /**
   * Puts every loss on its edge.
   *
   * @throws CaseFaultException if an edge cannot carry it
   */
  static void put(CaseFile caseFile, Mesh mesh, Medium medium, ProblemBuilder builder) {
    for (TwoPort port : caseFile.twoPorts()) {
      try {
        builder.twoPort(port.edge(), new Side.InZone(port.flowFrom()), solved(port, mesh, medium));
      } catch (IllegalArgumentException e) {
        throw new CaseFaultException(
            List.of(
                caseFile
                    .source()
                    .problem("two_ports." + port.edge(), e.getMessage(), "name an inner edge")));
      }
    }
  }

  static org.annulet.solver.boundary.TwoPort solved(TwoPort port, Mesh mesh, Medium medium) {
    if (port.special().isEmpty()) {
      return loss(port, density(port, mesh, medium));
    }
    if (port.special().get() instanceof TwoPort.Screen screen) {
      return new PerforatedScreen(
          new PerforatedLiner.Plate(
              screen.plate().holeBore() / 2, screen.plate().pitch(), screen.plate().thickness()),
          screen.plate().biasVelocity());
    }
    return measured((TwoPort.Transfer) port.special().get());
  }

  /** The fitted port of a measured matrix. */
  static MeasuredTwoPort measured(TwoPort.Transfer transfer) {
    return MeasuredTwoPort.ofTransferMatrix(
        transfer.entries().stream().map(CaseWalls::table).toList(), CaseWalls.FIT);
  }

  private static FlowLoss loss(TwoPort port, double density) {
    if (port.pressureDrop().isPresent()) {
      return FlowLoss.ofPressureDrop(
          port.pressureDrop().getAsDouble(), density, port.velocity(), port.effectiveLength());
    }
    return new FlowLoss(port.lossCoefficient().orElse(0), port.velocity(), port.effectiveLength());
  }

  /** Mean density of the zone the flow comes from, by area. */
  private static double density(TwoPort port, Mesh mesh, Medium medium) {
    int zone = mesh.zoneNames().indexOf(port.flowFrom());
    double area = 0;
    double mass = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      if (mesh.zone(t) == zone) {
        area += mesh.area(t);
        mass += mesh.area(t) * medium.density(t);
      }
    }
    return mass / area;
  }
}
