package org.annulet.solver.assembly;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Map;
import java.util.function.DoubleUnaryOperator;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.boundary.ChokedNozzle;
import org.annulet.solver.boundary.Damper;
import org.annulet.solver.boundary.EdgeGas;
import org.annulet.solver.boundary.PerforatedLiner;
import org.annulet.solver.boundary.ReactingWall;
import org.annulet.solver.boundary.ResonatorChain;
import org.annulet.solver.medium.Medium;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.SparseVector;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * What the mouth of a damper sees of the pressure, and which gas a wall sees: means over patches
 * and edges, against plain sums over many points that know nothing of the assembly.
 */
class MouthsAndGasTest {
  private static final int POINTS = 200_000;

  private static final Damper DAMPER =
      new ResonatorChain(1.2, 340, List.of(new ResonatorChain.Stage(1e-4, 0.02, 0.3, 1e-5)));

  private static SparseVector mouth(Mesh mesh, Geometry geometry, DamperPlace place) {
    AcousticOperator op =
        new ProblemBuilder(mesh, geometry, Gases.of(mesh, 340))
            .damper("d", DAMPER, place)
            .build()
            .operator();
    assertThat(op.size()).isEqualTo(mesh.nodeCount()); // unknowns are nodes: nothing is eliminated
    return op.lowRankTerms().get(0).left().get(0);
  }

  /** Σ w f over the mouth ÷ Σ w, f being linear between equidistant nodes of a line. */
  private static double mean(
      double from, double to, double spacing, DoubleUnaryOperator f, DoubleUnaryOperator w) {
    double sum = 0;
    double weight = 0;
    for (int i = 0; i < POINTS; i++) {
      double at = from + (to - from) * (i + 0.5) / POINTS;
      double left = spacing * Math.floor(at / spacing);
      double part = (at - left) / spacing;
      double value = (1 - part) * f.applyAsDouble(left) + part * f.applyAsDouble(left + spacing);
      sum += w.applyAsDouble(at) * value;
      weight += w.applyAsDouble(at);
    }
    return sum / weight;
  }

  private static double[] nodal(Mesh mesh, DoubleUnaryOperator f, boolean alongX) {
    double[] values = new double[mesh.nodeCount()];
    for (int v = 0; v < values.length; v++) {
      values[v] = f.applyAsDouble(alongX ? mesh.x(v) : mesh.y(v));
    }
    return values;
  }

  /** Centre inside, at a node, and where the mouth hangs over the end of the edge. */
  @ParameterizedTest
  @CsvSource({"0.37, 0.052, 0.344, 0.396", "0.5, 0.1, 0.45, 0.55", "0.99, 0.06, 0.96, 1"})
  void mouthOnAStraightWall_seesTheMeanOverItsWidth(
      double x, double width, double from, double to) {
    Mesh mesh = Strips.flat(new double[] {0, 1}, new int[] {40}, new double[] {0, 0.1}, 2);
    SparseVector b =
        mouth(mesh, new Plane(0.05), new DamperPlace.OnEdge("upper", x, 0.7, width, 1));
    DoubleUnaryOperator f = z -> Math.cos(7 * z) + z * z;
    assertThat(b.dot(nodal(mesh, z -> 1, true))).isCloseTo(1, within(1e-13));
    // 200,000 points: what a kink between two of them costs is below 1e-8
    assertThat(b.dot(nodal(mesh, f, true)))
        .isCloseTo(mean(from, to, 0.025, f, z -> 1), within(1e-7));
    for (int i = 0; i < b.index().length; i++) {
      assertThat(mesh.y(b.index()[i])).isEqualTo(0.1);
    }
  }

  /** On an end plate of a section the mean is over area: weight r. */
  @Test
  void mouthOnTheEndOfASection_seesTheMeanOverArea() {
    Mesh mesh = Strips.flat(new double[] {0, 1}, new int[] {10}, new double[] {0.1, 0.5}, 8);
    SparseVector b =
        mouth(mesh, new Section(0, Map.of()), new DamperPlace.OnEdge("outlet", 1, 0.22, 0.13, 6));
    DoubleUnaryOperator f = r -> Math.sin(9 * r);
    assertThat(b.dot(nodal(mesh, f, false)))
        .isCloseTo(mean(0.155, 0.285, 0.05, f, r -> r), within(1e-7));
  }

  /** N alike round a section take N times the flow, and stand for one term while 2|m| < N. */
  @Test
  void dampersRoundASection_countByTheirNumber_belowHalfOfIt() {
    Mesh mesh = Strips.flat(new double[] {0, 1}, new int[] {10}, new double[] {0.1, 0.5}, 8);
    Complex s = new Complex(20, 1500);
    Complex one = flow(mesh, 1, 0, s);
    assertThat(flow(mesh, 7, 0, s).divide(one).subtract(7).abs()).isLessThan(1e-14);
    assertThat(flow(mesh, 7, 3, s).divide(one).subtract(7).abs()).isLessThan(1e-14);
    assertThatThrownBy(() -> flow(mesh, 6, 3, s))
        .hasMessageContaining(
            "6 round the section cannot be one term at order 3; more than 6 are needed");
    assertThatThrownBy(() -> flow(mesh, 1, 1, s)).hasMessageContaining("more than 2 are needed");
    assertThatThrownBy(
            () -> mouth(mesh, new Plane(0.05), new DamperPlace.OnEdge("outlet", 1, 0.2, 0.1, 2)))
        .hasMessageContaining("several at once are for a section only");
  }

  private static Complex flow(Mesh mesh, int count, int order, Complex s) {
    return new ProblemBuilder(mesh, new Section(0, Map.of()), Gases.of(mesh, 340))
        .damper("d", DAMPER, new DamperPlace.OnEdge("outlet", 1, 0.22, 0.13, count))
        .section()
        .order(order)
        .operator()
        .lowRankTerms()
        .get(0)
        .coefficient()[0][0]
        .value(s);
  }

  /**
   * On a ring the arc is unrolled at R₀: on a zone of radius R a mouth of true width b covers b
   * R₀/R of it; and it may lie across the seam.
   */
  @ParameterizedTest
  @CsvSource({"0.31", "0.004", "1.997"})
  void mouthOnTheEndOfARing_isAsWideAsOnItsOwnRadius(double arc) {
    double unrolled = 1 / Math.PI; // circumference 2
    double own = 0.8 * unrolled;
    Mesh mesh = Strips.closed(new double[] {0, 0.5}, new int[] {5}, 2, 40);
    Ring ring = new Ring(4, unrolled, Map.of("0", new Ring.Annulus(own, 0.05)));
    SparseVector b = mouth(mesh, ring, new DamperPlace.OnEdge("outlet", 0.5, arc, 0.08, 1));
    DoubleUnaryOperator f = y -> Math.cos(Math.PI * (y - 0.3));
    assertThat(b.dot(nodal(mesh, y -> 1, false))).isCloseTo(1, within(1e-13));
    assertThat(b.dot(nodal(mesh, f, false)))
        .isCloseTo(mean(arc - 0.05, arc + 0.05, 0.05, f, y -> 1), within(1e-7));
  }

  /** γ = ρc²/p̄ grows with r, ρ with x and r: no two triangles have the same gas. */
  private static Medium uneven(Mesh mesh) {
    double[] density = new double[mesh.triangleCount()];
    double[] speed = new double[mesh.triangleCount()];
    for (int t = 0; t < density.length; t++) {
      double gamma = 1.25 + 0.2 * mesh.cornerY(t, 0) + 0.01 * (t % 5);
      density[t] = 0.5 + 0.3 * mesh.cornerX(t, 0) + 0.02 * (t % 7);
      speed[t] = Math.sqrt(gamma * 1e5 / density[t]);
    }
    return Medium.of(1e5, density, speed);
  }

  private static void assertSees(AcousticOperator op, ReactingWall wall, double[] gas) {
    Complex s = new Complex(30, 1900);
    Complex wanted = wall.admittance(new EdgeGas(gas[0], gas[1], gas[2])).value(s);
    Complex per = op.sparseTerms().get(0).coefficient().value(s).divide(s);
    assertThat(per.subtract(wanted).abs()).isLessThan(1e-12 * wanted.abs());
  }

  private static double[] mean(Mesh mesh, Medium medium, double[] weight) {
    double[] sum = new double[4];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      sum[0] += weight[t] * medium.density(t);
      sum[1] += weight[t] * medium.soundSpeed(t);
      sum[2] += weight[t] * medium.gamma(t);
      sum[3] += weight[t];
    }
    return new double[] {sum[0] / sum[3], sum[1] / sum[3], sum[2] / sum[3]};
  }

  private static final ReactingWall LINER =
      new PerforatedLiner(new PerforatedLiner.Plate(0.5e-3, 5e-3, 1e-3), 8, 0.05);

  /** On a section the outlet's segments count by their area, 2πr dr. */
  @Test
  void wallOnAnEdge_seesTheGasAlongIt_byArea() {
    Mesh mesh = Strips.flat(new double[] {0, 1}, new int[] {4}, new double[] {0.1, 0.7}, 3);
    Medium medium = uneven(mesh);
    double[] weight = new double[mesh.triangleCount()];
    for (int e = 0; e < mesh.segmentCount(); e++) {
      if (mesh.edgeNames().get(mesh.segmentEdge(e)).equals("outlet")) {
        weight[mesh.segmentLeft(e)] =
            0.5 * (mesh.y(mesh.segmentStart(e)) + mesh.y(mesh.segmentEnd(e)));
      }
    }
    double[] gas = mean(mesh, medium, weight);
    for (ReactingWall wall : new ReactingWall[] {LINER, new ChokedNozzle(0.2)}) {
      AcousticOperator op =
          new ProblemBuilder(mesh, new Section(0, Map.of()), medium)
              .wall("outlet", wall)
              .build()
              .operator();
      assertSees(op, wall, gas);
    }
  }

  /**
   * A liner on the face of a ring's zone sees the gas of the whole zone, and of that zone alone.
   */
  @Test
  void linerOnAFace_seesTheGasOfItsZone_byArea() {
    Mesh mesh = Strips.closed(new double[] {0, 0.3, 0.8}, new int[] {3, 4}, 2, 6);
    Medium medium = uneven(mesh);
    double[] weight = new double[mesh.triangleCount()];
    for (int t = 0; t < weight.length; t++) {
      weight[t] = mesh.zoneNames().get(mesh.zone(t)).equals("1") ? mesh.area(t) : 0;
    }
    Ring.Annulus annulus = new Ring.Annulus(1 / Math.PI, 0.05);
    for (ReactingWall wall : new ReactingWall[] {LINER, new ChokedNozzle(0.2)}) {
      AcousticOperator op =
          new ProblemBuilder(
                  mesh, new Ring(4, 1 / Math.PI, Map.of("0", annulus, "1", annulus)), medium)
              .face("1", Face.OUTER, wall)
              .build()
              .operator();
      assertSees(op, wall, mean(mesh, medium, weight));
    }
  }
}
