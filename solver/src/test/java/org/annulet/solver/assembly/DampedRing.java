package org.annulet.solver.assembly;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.boundary.ResonatorChain;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.operator.LowRankTerm;
import org.annulet.solver.operator.SparseVector;

/** The thin ring of rows E of the reference values: R = 0.5 m, c = 800 m/s; point ports. */
public final class DampedRing {
  private static final double C = 800;
  private static final double RADIUS = 0.5;
  private static final double GAP = 0.01;
  private static final double WIDTH = 0.02;

  /** Cross-section in m². */
  public static final double SECTION = GAP * WIDTH;

  /** ρc in kg/(m²s). */
  public static final double RHO_C = Gases.GAMMA * Gases.PRESSURE / C;

  private static final int CELLS = 120;

  private DampedRing() {}

  /** Without anything on it. */
  public static AcousticOperator plain() {
    Mesh mesh = Strips.closed(new double[] {0, WIDTH}, new int[] {1}, 2 * Math.PI * RADIUS, CELLS);
    return new ProblemBuilder(
            mesh,
            new Ring(1, RADIUS, Map.of("0", new Ring.Annulus(RADIUS, GAP))),
            Gases.of(mesh, C))
        .build()
        .operator();
  }

  /** p̂ at the nodes nearest to an angle in rad, one on each side of the ring, averaged. */
  public static SparseVector at(AcousticOperator ring, double angle) {
    Map<Integer, Double> b = new TreeMap<>();
    long cell = Math.floorMod(Math.round(angle / (2 * Math.PI) * CELLS), CELLS);
    double arc = 2 * Math.PI * RADIUS * cell / CELLS;
    for (int u = 0; u < ring.size(); u++) {
      if (Math.abs(ring.coordinates()[1][u] - arc) < 1e-9) {
        b.put(u, 0.5);
      }
    }
    return Assembler.vector(b);
  }

  /** The damper of rows E5 with another tuning. */
  public static ResonatorChain resonator(double frequency, double resistance) {
    double area = 0.02 * SECTION;
    double w0 = 2 * Math.PI * frequency;
    return new ResonatorChain(
        RHO_C / C,
        C,
        List.of(new ResonatorChain.Stage(area, 0.05, resistance, C * C * area / (w0 * w0 * 0.05))));
  }

  /** The term of a damper. */
  public static LowRankTerm damper(AcousticOperator ring, double angle, AnalyticFunction flow) {
    SparseVector b = at(ring, angle);
    return new LowRankTerm("damper", List.of(b), List.of(b), new AnalyticFunction[][] {{flow}});
  }

  /** The ring with more terms. */
  public static AcousticOperator with(AcousticOperator ring, List<LowRankTerm> more) {
    List<LowRankTerm> terms = new ArrayList<>(ring.lowRankTerms());
    terms.addAll(more);
    return new AcousticOperator(
        ring.pattern(),
        ring.stiffness(),
        ring.mass(),
        ring.sparseTerms(),
        terms,
        ring.coordinates());
  }
}
