package org.annulet.solver.assembly;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Map;
import java.util.function.UnaryOperator;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.mesher.mesh.RingCells;
import org.annulet.solver.boundary.ChokedNozzle;
import org.annulet.solver.boundary.Damper;
import org.annulet.solver.boundary.FlowLoss;
import org.annulet.solver.boundary.ResonatorChain;
import org.annulet.solver.flame.Flame;
import org.annulet.solver.flame.Place;
import org.annulet.solver.flame.Reference;
import org.annulet.solver.flame.Side;
import org.annulet.solver.operator.AcousticOperator;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Two-ports and dampers against closed dispersion relations. */
class PortTest {
  private static final double C = 340;
  private static final double RHO = Gases.GAMMA * Gases.PRESSURE / (C * C);

  private static Complex rootOf(UnaryOperator<Complex> f, double frequency, double growth) {
    Complex s = new Complex(growth, 2 * Math.PI * frequency);
    for (int k = 0; k < 50; k++) {
      Complex h = s.multiply(1e-6);
      Complex slope = f.apply(s.add(h)).subtract(f.apply(s.subtract(h))).divide(h.multiply(2));
      s = s.subtract(f.apply(s).divide(slope));
    }
    return s;
  }

  private static double error(NearRoot root, Complex exact) {
    return root.s.subtract(exact).abs();
  }

  /** sinh(sL/c) + z sinh(sb/c) sinh(s(L−b)/c) = 0, z = (ζū + sℓ)/c; derived for this test. */
  @ParameterizedTest
  @CsvSource({"2, 30, 0, 170", "2, 30, 0.05, 340", "0, 0, 0.1, 170"})
  void ductWithLossAcrossAnInnerEdge(double zeta, double u, double l, double f) {
    Complex exact =
        rootOf(
            s -> {
              Complex z = s.multiply(l).add(zeta * u).divide(C);
              return s.divide(C)
                  .sinh()
                  .add(z.multiply(s.multiply(0.3 / C).sinh()).multiply(s.multiply(0.7 / C).sinh()));
            },
            f,
            -20);
    double[] error = new double[2];
    for (int k = 0; k < 2; k++) {
      Mesh mesh =
          Strips.flat(
              new double[] {0, 0.3, 1},
              new int[] {12 << k, 28 << k},
              new double[] {0, 0.01},
              1 << k);
      AcousticOperator op =
          new ProblemBuilder(mesh, new Plane(0.05), Gases.of(mesh, C))
              .twoPort("joint1", new Side.InZone("0"), new FlowLoss(zeta, u, l))
              .build()
              .operator();
      error[k] = error(NearRoot.of(op, exact.getImaginary() / 2 / Math.PI, exact.getReal()), exact);
    }
    assertThat(error[1]).isLessThan(2e-3 * exact.abs());
    assertThat(error[0] / error[1]).isCloseTo(4, within(0.2));
  }

  /** A loop closed by the port: tanh(sL/2c) = −z/2; derived for this test. */
  @Test
  void portBetweenTwoEdges_closesALoop() {
    Complex exact =
        rootOf(
            s -> s.divide(2 * C).tanh().add(s.multiply(0.05).add(1.5 * 40).divide(2 * C)),
            330,
            -50);
    Mesh mesh = Strips.flat(new double[] {0, 1}, new int[] {80}, new double[] {0, 0.01}, 2);
    AcousticOperator op =
        new ProblemBuilder(mesh, new Plane(0.05), Gases.of(mesh, C))
            .twoPort("outlet", "inlet", new FlowLoss(1.5, 40, 0.05))
            .build()
            .operator();
    NearRoot root = NearRoot.of(op, exact.getImaginary() / 2 / Math.PI, exact.getReal());
    assertThat(error(root, exact)).isLessThan(2e-3 * exact.abs()); // 80 cells, order two
    assertThat(root.growth()).isLessThan(-10);
  }

  /** The limit of a short mass without loss is no port at all. */
  @Test
  void tinyLength_joinsTheGasAgain() {
    Mesh mesh = Strips.flat(new double[] {0, 0.3, 1}, new int[] {6, 14}, new double[] {0, 0.01}, 1);
    ProblemBuilder plain = new ProblemBuilder(mesh, new Plane(0.05), Gases.of(mesh, C));
    double f0 = NearRoot.of(plain.build().operator(), 170, 0).frequency();
    double f1 =
        NearRoot.of(
                plain
                    .twoPort("joint1", new Side.Upstream(1, 0), new FlowLoss(0, 0, 1e-5))
                    .build()
                    .operator(),
                170,
                0)
            .frequency();
    assertThat(f1).isCloseTo(f0, within(1e-4 * f0));
  }

  /** A sheet behind a loss on the same edge, u₂ = G u₁ after p₁ − p₂ = z ρc u₁. */
  @Test
  void flameBehindALoss_onTheSameEdge() {
    double zeta = 3;
    double u = 10;
    double jump = 0.8;
    double tau = 2e-3;
    Complex exact =
        rootOf(
            s -> {
              Complex g = s.multiply(-tau).exp().multiply(jump).add(1);
              Complex s1 = s.multiply(0.3 / C);
              Complex s2 = s.multiply(0.7 / C);
              return s1.cosh()
                  .multiply(s2.sinh())
                  .add(g.multiply(s1.sinh()).multiply(s2.cosh()))
                  .add(s1.sinh().multiply(s2.sinh()).multiply(zeta * u / C));
            },
            175,
            20);
    Mesh mesh =
        Strips.flat(new double[] {0, 0.3, 1}, new int[] {24, 56}, new double[] {0, 0.01}, 2);
    Flame flame =
        new Flame(
            "main",
            new Place.Sheet("joint1"),
            new Reference.EdgeFlux("joint1", new Side.InZone("0"), u),
            Gases.firing(jump, tau, 0.05 * 0.01 * u));
    AcousticOperator op =
        new ProblemBuilder(mesh, new Plane(0.05), Gases.of(mesh, C))
            .twoPort("joint1", new Side.InZone("0"), new FlowLoss(zeta, u, 0))
            .flame(flame)
            .build()
            .operator();
    NearRoot root = NearRoot.of(op, exact.getImaginary() / 2 / Math.PI, exact.getReal());
    assertThat(error(root, exact)).isLessThan(2e-3 * exact.abs());
  }

  /** Row F8: s = (c/L)(−artanh A + iπn). */
  @Test
  void chokedNozzle_dampsTheDuct() {
    Mesh mesh = Strips.flat(new double[] {0, 0.5}, new int[] {60}, new double[] {0, 0.01}, 1);
    AcousticOperator op =
        new ProblemBuilder(mesh, new Plane(0.05), Gases.of(mesh, 850))
            .wall("outlet", new ChokedNozzle(0.075))
            .build()
            .operator();
    NearRoot root = NearRoot.of(op, 850, -25);
    assertThat(root.growth()).isCloseTo(-25.501913, within(2e-3 * 25.5));
    assertThat(root.frequency()).isCloseTo(850, within(2e-3 * 850));
  }

  private static AcousticOperator resonatorAtTheEnd(int cells, int rows) {
    double area = 0.01 * 0.05;
    double w0 = 2 * Math.PI * 180;
    Damper damper =
        new ResonatorChain(
            RHO,
            C,
            List.of(new ResonatorChain.Stage(area, 0.02, 0.3, C * C * area / (w0 * w0 * 0.02))));
    Mesh mesh = Strips.flat(new double[] {0, 1}, new int[] {cells}, new double[] {0, 0.01}, rows);
    return new ProblemBuilder(mesh, new Plane(0.05), Gases.of(mesh, C))
        .damper("end", damper, new DamperPlace.OnEdge("outlet", 1, 0.005, 0.01, 1))
        .build()
        .operator();
  }

  /** Row C12: duct closed by a resonator, all three roots. */
  @ParameterizedTest
  @CsvSource({"90.545900, -94.304872", "252.285033, -101.631573", "417.616315, -100.771057"})
  void resonatorAtTheEndOfADuct(double f, double growth) {
    double[] error = new double[2];
    for (int k = 0; k < 2; k++) {
      NearRoot root = NearRoot.of(resonatorAtTheEnd(40 << k, 1 << k), f, growth);
      error[k] = error(root, new Complex(growth, 2 * Math.PI * f));
    }
    assertThat(error[1]).isLessThan(2e-3 * 2 * Math.PI * f);
    assertThat(error[0] / error[1]).isCloseTo(4, within(0.2));
  }

  /** Row C12 lists three roots from 5 to 420 Hz, whatever the number of nodes on the edge. */
  @ParameterizedTest
  @ValueSource(ints = {1, 3, 6})
  void resonatorAddsNoModesAsTheEdgeIsRefined(int rows) {
    AcousticOperator op = resonatorAtTheEnd(16, rows);
    assertThat(NearRoot.winding(op, new double[] {5, 430, -400, 100})).isEqualTo(3);
  }

  /** Rows E5: Helmholtz dampers on a thin ring, through patches on its face. */
  @ParameterizedTest
  @CsvSource({
    "1, 226.15949, -69.8871",
    "1, 283.88148, -81.4531",
    "1, 254.64791, 0",
    "4, 212.99721, -67.9697",
    "4, 298.98510, -86.6824"
  })
  void dampersOnARing(int count, double f, double growth) {
    double radius = 0.5;
    double length = 0.02;
    double gap = 0.01;
    double c = 800;
    double w0 = c / radius;
    double area = 0.02 * gap * length;
    Damper damper =
        new ResonatorChain(
            Gases.GAMMA * Gases.PRESSURE / (c * c),
            c,
            List.of(new ResonatorChain.Stage(area, 0.05, 0.02, c * c * area / (w0 * w0 * 0.05))));
    Mesh mesh = Strips.closed(new double[] {0, length}, new int[] {1}, 2 * Math.PI * radius, 96);
    ProblemBuilder builder =
        new ProblemBuilder(
            mesh,
            new Ring(1, radius, Map.of("0", new Ring.Annulus(radius, gap))),
            Gases.of(mesh, c));
    for (int k = 0; k < count; k++) {
      double angle = 0.013 + 2 * Math.PI * k / count; // off the mesh lines
      builder.damper(
          "damper " + k,
          damper,
          new DamperPlace.OnFace("0", Face.OUTER, length / 2, angle, length));
    }
    NearRoot root = NearRoot.of(builder.build().operator(), f, growth);
    assertThat(root.frequency()).isCloseTo(f, within(2e-3 * f)); // 96 cells, patch of 0.02 m
    assertThat(root.growth()).isCloseTo(growth, within(0.5));
  }

  @Test
  void twoPorts_onABlochCell_asOnTheRing() {
    int count = 4;
    RingCells cells = SmallRings.of(count);
    AcousticOperator whole = withLoss(cells.whole(), count).build().operator();
    AcousticOperator cell = withLoss(cells.half(), count).bloch(cells).number(1).operator();
    assertThat(whole.lowRankTerms()).hasSize(count);
    NearRoot a = NearRoot.of(cell, 290, -20);
    NearRoot b = NearRoot.of(whole, a.frequency(), a.growth());
    assertThat(b.s.subtract(a.s).abs()).isLessThan(1e-6 * a.s.abs()); // double root of the ring
  }

  private static ProblemBuilder withLoss(Mesh mesh, int count) {
    return new ProblemBuilder(mesh, SmallRings.geometry(count), SmallRings.gas(mesh))
        .twoPort("burners.outlet", new Side.InZone("1"), new FlowLoss(1.2, 50, 0.01));
  }

  private static ProblemBuilder withDampers(Mesh mesh, int number) {
    ProblemBuilder builder = new ProblemBuilder(mesh, SmallRings.geometry(4), SmallRings.gas(mesh));
    Damper damper =
        new ResonatorChain(2, 500, List.of(new ResonatorChain.Stage(5e-4, 0.03, 0.1, 8e-4)));
    for (int k = 0; k < number; k++) {
      builder.damper(
          "d" + k, damper, new DamperPlace.OnFace("2", Face.OUTER, 0.4, 2 * Math.PI * k / 4, 0.05));
    }
    return builder;
  }

  @ParameterizedTest
  @ValueSource(ints = {0, 1, 2})
  void damperAtEveryBurner_onABlochCell_asOnTheRing(int q) {
    RingCells cells = SmallRings.of(4);
    AcousticOperator whole = withDampers(cells.whole(), 4).build().operator();
    AcousticOperator cell = withDampers(cells.half(), 1).bloch(cells).number(q).operator();
    NearRoot a = NearRoot.of(cell, 290 + 150 * q, -5);
    NearRoot b = NearRoot.of(whole, a.frequency() + 1e-3, a.growth());
    assertThat(b.s.subtract(a.s).abs()).isLessThan(1e-6 * a.s.abs());
    AcousticOperator without = withDampers(cells.half(), 0).bloch(cells).number(q).operator();
    NearRoot c = NearRoot.of(without, a.frequency(), 0);
    assertThat(c.s.subtract(a.s).abs()).isGreaterThan(1e-4 * a.s.abs()); // the dampers matter
  }

  @Test
  void damperBesideTheBurnerOfAHalfCell_isRefused() {
    RingCells cells = SmallRings.of(4);
    Damper damper =
        new ResonatorChain(2, 500, List.of(new ResonatorChain.Stage(1e-4, 0.02, 0.1, 1e-4)));
    BlochAssembly bloch =
        new ProblemBuilder(cells.half(), SmallRings.geometry(4), SmallRings.gas(cells.half()))
            .damper("d", damper, new DamperPlace.OnFace("2", Face.OUTER, 0.4, 0.1, 0.01))
            .bloch(cells);
    assertThatThrownBy(() -> bloch.number(0)).hasMessageContaining("whole ring");
  }
}
