package org.annulet.solver.assembly;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Map;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.boundary.Admittance;
import org.annulet.solver.boundary.ChokedNozzle;
import org.annulet.solver.boundary.Impedance;
import org.annulet.solver.boundary.OpenEnd;
import org.annulet.solver.flame.Flame;
import org.annulet.solver.flame.Place;
import org.annulet.solver.flame.Reference;
import org.annulet.solver.flame.Side;
import org.annulet.solver.operator.AcousticOperator;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Axisymmetric sections and cross-sections: REFERENCE_VALUES rows A and D10. */
class SectionTest {
  private static final double C = 800;

  private static Mesh can(int axial, int radial) {
    return Strips.flat(new double[] {0, 0.3}, new int[] {axial}, new double[] {0.4, 0.5}, radial);
  }

  private static double error(SectionAssembly section, int m, double f) {
    return NearRoot.of(section.order(m).operator(), f, 0).frequency() - f;
  }

  /** Rows A5: separable modes of an annular can, from Bessel functions. */
  @ParameterizedTest
  @CsvSource({
    "closed, 1, 283.51641", "closed, 1, 1363.14318", "closed, 2, 566.96300",
    "closed, 4, 1133.36838", "closed, 0, 1333.33333", "closed, 1, 4017.76140",
    "open, 1, 724.44876", "open, 3, 1080.46458", "open, 0, 666.66667"
  })
  void annularCan_frequencies(String outlet, int m, double f) {
    double[] error = new double[2];
    for (int k = 0; k < 2; k++) {
      Mesh mesh = can(6 << k, 4 << k);
      ProblemBuilder builder = new ProblemBuilder(mesh, new Section(0), Gases.of(mesh, C));
      if (outlet.equals("open")) {
        builder.wall("outlet", new OpenEnd());
      }
      error[k] = error(builder.section(), m, f);
    }
    assertThat(error[1]).isBetween(0.0, 0.02 * f);
    assertThat(error[0] / error[1]).isBetween(3.4, 4.4); // order two; the radial mode is coarse
  }

  /** Rows A7: outer wall of impedance 10 ρc. */
  @ParameterizedTest
  @CsvSource({"1, 274.99567, -446.8391", "2, 563.50449, -449.0773"})
  void linedOuterWall_dampsAtTheExactRate(int m, double f, double growth) {
    double[] error = new double[2];
    for (int k = 0; k < 2; k++) {
      Mesh mesh =
          Strips.flat(new double[] {0, 0.02}, new int[] {1}, new double[] {0.4, 0.5}, 6 << k);
      AcousticOperator op =
          new ProblemBuilder(mesh, new Section(m), Gases.of(mesh, C))
              .wall("upper", new Impedance(new Complex(10)))
              .build()
              .operator();
      NearRoot root = NearRoot.of(op, f, growth);
      error[k] = new Complex(root.growth() - growth, 2 * Math.PI * (root.frequency() - f)).abs();
    }
    assertThat(error[1]).isLessThan(1e-3 * 2 * Math.PI * f);
    assertThat(error[0] / error[1]).isBetween(3.3, 4.7);
  }

  /** Rows A1: zeros of J_m'; the section reaches the axis. */
  @ParameterizedTest
  @CsvSource({"0, 3.83170597", "1, 1.84118378", "1, 5.33144277", "2, 3.05423693", "3, 4.20118894"})
  void circularCan_withAxis_transverseModes(int m, double root) {
    double f = root * C / (2 * Math.PI * 0.5);
    double[] error = new double[2];
    for (int k = 0; k < 2; k++) {
      int rows = 8 << k;
      double h = 0.5 / rows;
      Mesh mesh = Strips.flat(new double[] {0, h}, new int[] {1}, new double[] {0, 0.5}, rows);
      error[k] = error(new ProblemBuilder(mesh, new Section(0), Gases.of(mesh, C)).section(), m, f);
    }
    assertThat(error[1]).isBetween(-1e-9, 0.01 * f);
    assertThat(error[0] / error[1]).isBetween(3.3, 4.5);
  }

  /** Rows A2.2: the same annulus as a section at order m and as a cross-section in (y, z). */
  @ParameterizedTest
  @CsvSource({"1, 0.67733601", "2, 1.34060214", "3, 1.97887709"})
  void annulus_asCrossSection_hasTheSameModes(int m, double root) {
    double ri = 0.25;
    double f = root * C / (2 * Math.PI * ri);
    double[] error = new double[2];
    for (int k = 0; k < 2; k++) {
      // a half ring with hard straight sides carries cos(mθ), m = 0, 1, 2 …
      Mesh polar =
          Strips.flat(
              new double[] {0, Math.PI}, new int[] {10 << k}, new double[] {ri, 2 * ri}, 4 << k);
      Mesh mesh = Strips.bent(polar);
      AcousticOperator op =
          new ProblemBuilder(mesh, new CrossSection(0), Gases.of(mesh, C)).build().operator();
      error[k] = NearRoot.of(op, f, 0).frequency() - f;
    }
    assertThat(Math.abs(error[1])).isLessThan(0.02 * f);
    assertThat(error[0] / error[1]).isBetween(3.2, 4.8);
  }

  @Test
  void axialWavenumber_addsToTheSquare() {
    Mesh mesh = Strips.flat(new double[] {0, 1}, new int[] {10}, new double[] {0, 0.1}, 1);
    double f0 =
        NearRoot.of(
                new ProblemBuilder(mesh, new CrossSection(0), Gases.of(mesh, C)).build().operator(),
                400,
                0)
            .frequency();
    double k = 3;
    double f1 =
        NearRoot.of(
                new ProblemBuilder(mesh, new CrossSection(k), Gases.of(mesh, C)).build().operator(),
                550,
                0)
            .frequency();
    double cut = k * C / (2 * Math.PI);
    assertThat(f1 * f1 - f0 * f0).isCloseTo(cut * cut, within(1e-8 * cut * cut)); // exact
  }

  /** Rows D10: annular can with a sheet that answers pointwise, hard and choked outlet. */
  @ParameterizedTest
  @CsvSource({
    "hard, 0, 199.74333, -441.3495", "hard, 1, 162.51837, -647.3712",
    "hard, 1, 270.50530, 122.1043", "hard, 1, 597.10577, -396.5831",
    "hard, 2, 185.70860, -727.5879", "hard, 2, 600.59643, 6.4463",
    "nozzle, 0, 201.80505, -437.7177", "nozzle, 1, 271.23373, 106.1009",
    "nozzle, 2, 464.59449, -284.8515", "nozzle, 2, 602.73226, -1.3036"
  })
  void annularCan_pointwiseSheet_orderByOrder(String outlet, int m, double f, double growth) {
    double[] error = new double[2];
    for (int k = 0; k < 2; k++) {
      NearRoot root = NearRoot.of(flameCan(outlet, 2 << k, true).order(m).operator(), f, growth);
      error[k] = new Complex(root.growth() - growth, 2 * Math.PI * (root.frequency() - f)).abs();
    }
    assertThat(error[1]).isLessThan(0.01 * 2 * Math.PI * f);
    assertThat(error[0] / error[1]).isBetween(3.2, 4.8);
  }

  private static SectionAssembly flameCan(String outlet, int n, boolean pointwise) {
    Mesh mesh =
        Strips.flat(
            new double[] {0, 0.1, 0.3}, new int[] {3 * n, 6 * n}, new double[] {0.4, 0.5}, n);
    double area = Math.PI * (0.25 - 0.16);
    Flame flame =
        new Flame(
            "ring",
            pointwise ? new Place.PointwiseSheet("joint1") : new Place.Sheet("joint1"),
            new Reference.EdgeFlux("joint1", new Side.Upstream(1, 0), 20),
            Gases.firing(1, 2.5e-3, area * 20));
    ProblemBuilder builder =
        new ProblemBuilder(mesh, new Section(0), Gases.of(mesh, 500, 850)).flame(flame);
    if (outlet.equals("nozzle")) {
      builder.wall("outlet", new ChokedNozzle(0.075)); // (γ − 1) M/2 = 0.015 with γ = 1.4
    }
    return builder.section();
  }

  /** For m = 0 and plane waves, a sheet that answers as a whole is the same as a pointwise one. */
  @Test
  void uniformSheet_equalsPointwise_forPlaneWaves() {
    double f1 = NearRoot.of(flameCan("hard", 3, false).order(0).operator(), 199.7, -441).growth();
    double f2 = NearRoot.of(flameCan("hard", 3, true).order(0).operator(), 199.7, -441).growth();
    assertThat(f1).isCloseTo(f2, within(1e-3 * Math.abs(f2))); // the mesh has diagonals
  }

  @Test
  void allOrders_shareOnePattern_offTheAxis() {
    SectionAssembly section = flameCan("hard", 2, true);
    assertThat(section.order(3).operator().pattern())
        .isSameAs(section.order(0).operator().pattern());
    assertThat(section.order(2).operator().mass()).isSameAs(section.order(1).operator().mass());
  }

  /** Separate ducts do not feel the order: an open share scales area only. */
  @Test
  void separateDucts_areTubes_atAnyOrder() {
    Mesh mesh = can(20, 2);
    Section section = new Section(0, Map.of("0", new Section.Ducts(12, 0.3)));
    SectionAssembly assembly =
        new ProblemBuilder(mesh, section, Gases.of(mesh, C))
            .wall("outlet", new Admittance(new Complex(0.1)))
            .section();
    NearRoot m0 = NearRoot.of(assembly.order(0).operator(), 1333, -50);
    NearRoot m3 = NearRoot.of(assembly.order(3).operator(), 1333, -50);
    assertThat(m3.frequency()).isCloseTo(m0.frequency(), within(1e-9 * 1333));
    assertThat(m3.growth()).isCloseTo(m0.growth(), within(1e-7 * 267));
    // tanh(sL/c) = −y, common practice for a duct with an admittance at one end
    double growth = -C / 0.3 * 0.5 * Math.log((1 + 0.1) / (1 - 0.1));
    assertThat(m0.growth()).isCloseTo(growth, within(0.005 * 267));
    assertThatThrownBy(() -> assembly.order(6))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("2m < 12");
  }
}
