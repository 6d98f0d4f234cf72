package org.annulet.solver.assembly;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Map;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.boundary.Impedance;
import org.annulet.solver.boundary.OpenEnd;
import org.annulet.solver.flame.Flame;
import org.annulet.solver.flame.Patch;
import org.annulet.solver.flame.Place;
import org.annulet.solver.flame.Reference;
import org.annulet.solver.flame.Side;
import org.annulet.solver.operator.AcousticOperator;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Ducts in which only plane waves are looked for: REFERENCE_VALUES rows C and D. */
class DuctTest {
  private static final double AREA = 0.01 * 0.05; // strip height times depth, m²

  private static Mesh duct(double joint, double length, int cells) {
    int first = (int) Math.round(cells * joint / length);
    return Strips.flat(
        new double[] {0, joint, length},
        new int[] {first, cells - first},
        new double[] {0, 0.01},
        Math.min(2, Math.max(1, cells / 40))); // same shape of cells at 40 and 80
  }

  private static ProblemBuilder plane(Mesh mesh, double... soundSpeed) {
    return new ProblemBuilder(mesh, new Plane(0.05), Gases.of(mesh, soundSpeed));
  }

  /** Row C2: closed form of the uniform one-dimensional linear element, consistent mass. */
  @ParameterizedTest
  @CsvSource({"10, 170.69993260", "20, 170.17482773", "40, 170.04369692"})
  void closedTube_firstMode_hasTheExactDiscreteFrequency(int cells, double expected) {
    double radius = 0.05;
    Mesh mesh = Strips.closed(new double[] {0, 1}, new int[] {cells}, 2 * Math.PI * radius, 3);
    Ring ring = new Ring(1, radius, Map.of("0", new Ring.Annulus(radius, 0.01)));
    AcousticOperator op = new ProblemBuilder(mesh, ring, Gases.of(mesh, 340)).build().operator();
    NearRoot root = NearRoot.of(op, 171, 0);
    assertThat(root.frequency()).isCloseTo(expected, within(1e-10 * 1700)); // ten printed digits
    assertThat(root.growth()).isCloseTo(0, within(1e-7));
  }

  /** Rows C7: closed form; discretisation error of order h², checked at two meshes. */
  @ParameterizedTest
  @CsvSource({
    "closed, 0.3, 347, 850, 293.202139", "closed, 0.3, 347, 850, 598.479820",
    "open, 0.3, 347, 850, 188.933685", "open, 0.7, 347, 850, 342.598148",
    "closed, 0.7, 347, 850, 397.402181", "open, 0.5, 500, 800, 450.494284"
  })
  void temperatureJump_frequencies(String end, double b, double c1, double c2, double f) {
    double[] error = new double[2];
    for (int k = 0; k < 2; k++) {
      ProblemBuilder builder = plane(duct(b, 1, 40 << k), c1, c2);
      if (end.equals("open")) {
        builder.wall("outlet", new OpenEnd());
      }
      error[k] = NearRoot.of(builder.build().operator(), f, 0).frequency() - f;
    }
    assertThat(error[1]).isBetween(0.0, 2e-3 * f); // Galerkin: never below
    assertThat(error[0] / error[1]).isCloseTo(4, within(0.1));
  }

  /** Rows C10: coth(sL/c) = −z. */
  @ParameterizedTest
  @CsvSource({
    "2, 0, 170, -186.764089", "0.5, 0, 255, -186.764089",
    "3, 2, 178.705392, -77.884712", "0.2, -0.5, 110.795256, -54.507299"
  })
  void impedanceEnd_dampsAtTheExactRate(double zr, double zi, double f, double growth) {
    double[] error = new double[2];
    for (int k = 0; k < 2; k++) {
      AcousticOperator op =
          plane(duct(0.5, 1, 40 << k), 340)
              .wall("outlet", new Impedance(new Complex(zr, zi)))
              .build()
              .operator();
      NearRoot root = NearRoot.of(op, f, growth);
      error[k] = new Complex(root.growth() - growth, 2 * Math.PI * (root.frequency() - f)).abs();
    }
    assertThat(error[1]).isLessThan(2e-3 * f);
    assertThat(error[0] / error[1]).isCloseTo(4, within(0.2));
  }

  /** Rows C13: S1 tan(kL1) + S2 tan(kL2) = 0; on a ring the area is the gap height, m = 0. */
  @ParameterizedTest
  @CsvSource({
    "closed, 152.357243", "closed, 374.109270", "closed, 475.890730",
    "open, 116.221649", "open, 233.295170", "open, 425"
  })
  void areaStep_asGapsOneToFour(String end, double f) {
    double radius = 0.5;
    Ring ring =
        new Ring(
            1,
            radius,
            Map.of("0", new Ring.Annulus(radius, 0.01), "1", new Ring.Annulus(radius, 0.04)));
    double[] error = new double[2];
    for (int k = 0; k < 2; k++) {
      Mesh mesh =
          Strips.closed(
              new double[] {0, 0.6, 1}, new int[] {24 << k, 16 << k}, 2 * Math.PI * radius, 3);
      ProblemBuilder builder = new ProblemBuilder(mesh, ring, Gases.of(mesh, 340));
      if (end.equals("open")) {
        builder.wall("outlet", new OpenEnd());
      }
      error[k] = NearRoot.of(builder.build().operator(), f, 0).frequency() - f;
    }
    assertThat(error[1]).isBetween(0.0, 1e-3 * f);
    assertThat(error[0] / error[1]).isCloseTo(4, within(0.05));
  }

  private static AcousticOperator withFlame(
      Place place, Reference reference, double[] cNtau, String ends, int cells) {
    ProblemBuilder builder = plane(duct(cNtau[0], 1, cells), cNtau[1], cNtau[2]);
    for (String end : ends.split("-")) {
      if (end.equals("open")) {
        builder.wall(ends.startsWith("open") ? "inlet" : "outlet", new OpenEnd());
      }
    }
    if (ends.equals("open-open")) {
      builder.wall("outlet", new OpenEnd());
    }
    if (ends.endsWith("weak")) {
      builder.wall("outlet", new Impedance(new Complex(1.5)));
    }
    return builder
        .flame(new Flame("main", place, reference, Gases.firing(cNtau[3], cNtau[4], AREA * 10)))
        .build()
        .operator();
  }

  /** Rows D1 to D5, all roots of each; observed order two. */
  @ParameterizedTest
  @CsvSource({
    "D1, 170.04473, 16.5843",
    "D1, 509.63594, 16.3352",
    "D1, 340, 0",
    "D2, 117.76789, -695.5768",
    "D2, 202.19168, 83.4808",
    "D2, 408.20228, 92.9935",
    "D2, 528.38460, -829.1369",
    "D3, 70.60976, -280.1037",
    "D3, 206.51919, 435.5250",
    "D3, 426.70531, 363.3854",
    "D3, 551.74653, -395.8363",
    "D3, 689.95275, -95.9007",
    "D4, 167.97605, -396.9137",
    "D4, 295.24421, -8.1135",
    "D4, 495.76155, -457.4077",
    "D4, 596.11310, 28.0024",
    "D5, 203.35450, 56.4852",
    "D5, 298.90255, -940.7728",
    "D5, 447.31198, -99.0628",
    "D5, 613.61707, -206.4146"
  })
  void flameSheet_rootsOfTheDispersionRelation_withOrderTwo(String row, double f, double growth) {
    double[] error = new double[2];
    for (int k = 0; k < 2; k++) {
      NearRoot root = NearRoot.of(sheet(row, 40 << k), f, growth);
      error[k] = new Complex(root.growth() - growth, 2 * Math.PI * (root.frequency() - f)).abs();
    }
    assertThat(error[1]).isLessThan(4e-3 * 2 * Math.PI * f); // 80 cells, up to two waves
    assertThat(error[0] / error[1]).isBetween(3.6, 4.4); // h²: 4
  }

  private static AcousticOperator sheet(String row, int cells) {
    String ends =
        Map.of(
                "D1",
                "open-open",
                "D2",
                "closed-open",
                "D3",
                "closed-open",
                "D4",
                "closed-closed",
                "D5",
                "closed-weak")
            .get(row);
    double jump = Map.of("D1", 0.1, "D2", 0.5, "D3", 5.0, "D4", 1.0, "D5", 2.5).get(row);
    double[] numbers =
        row.equals("D1")
            ? new double[] {0.25, 340, 340, jump, 1.5e-3}
            : new double[] {0.3, 347, 850, jump, 3e-3};
    Place place = new Place.Sheet("joint1");
    Reference reference = new Reference.EdgeFlux("joint1", new Side.InZone("0"), 10);
    return withFlame(place, reference, numbers, ends, cells);
  }

  /**
   * Not a mesh error but another model: as the patch gets thinner its root tends to the sheet's.
   */
  @Test
  void spreadPatch_tendsToTheSheet_asItGetsThin() {
    double[] numbers = {0.3, 347, 850, 0.5, 3e-3};
    Reference reference = new Reference.EdgeFlux("joint1", new Side.InZone("0"), 10);
    double[] error = new double[2];
    for (int k = 0; k < 2; k++) {
      double width = 0.04 / (1 << k);
      Place place = new Place.Spread(Patch.between("1", 0.3, 0.3 + width));
      NearRoot root =
          NearRoot.of(withFlame(place, reference, numbers, "closed-open", 160), 202.19, 83.5);
      error[k] = Math.abs(root.growth() - 83.4808);
    }
    assertThat(error[0]).isBetween(0.1, 20.0);
    assertThat(error[0] / error[1]).isBetween(1.6, 2.5); // centre of heat moves with the width
  }

  /** A patch mean of the velocity in front of the sheet, moved onto it, gives the sheet's root. */
  @Test
  void patchReference_tendsToTheEdgeFlux_asItGetsThin() {
    double[] numbers = {0.3, 347, 850, 0.5, 3e-3};
    double[] error = new double[2];
    for (int k = 0; k < 2; k++) {
      double width = 0.05 / (1 << k);
      Reference reference =
          new Reference.PatchVelocity(Patch.between("0", 0.3 - width, 0.3), 1, 0, 10);
      NearRoot root =
          NearRoot.of(
              withFlame(new Place.Sheet("joint1"), reference, numbers, "closed-open", 160),
              202.19,
              83.5);
      error[k] = Math.abs(root.frequency() - 202.19168);
    }
    assertThat(error[0]).isBetween(0.05, 10.0);
    assertThat(error[0] / error[1]).isBetween(1.5, 3.0);
  }

  @Test
  void allLengthsTwice_frequenciesHalf() {
    Mesh small = duct(0.3, 1, 20);
    Mesh large = Strips.mapped(small, x -> 2 * x, y -> 2 * y);
    double f1 = NearRoot.of(plane(small, 347, 850).build().operator(), 293, 0).frequency();
    double f2 = NearRoot.of(plane(large, 347, 850).build().operator(), 146, 0).frequency();
    assertThat(2 * f2).isCloseTo(f1, within(1e-10 * f1)); // rounding
  }

  @Test
  void expandedField_isZeroAtTheOpenEnd_andCosineElsewhere() {
    Mesh mesh = duct(0.5, 1, 40);
    AssembledProblem problem = plane(mesh, 340).wall("outlet", new OpenEnd()).build();
    NearRoot root = NearRoot.of(problem.operator(), 85, 0);
    NodalField field = problem.expand(root.re, root.im);
    int inlet = 0;
    Complex p0 = new Complex(field.re()[inlet], field.im()[inlet]);
    for (int v = 0; v < mesh.nodeCount(); v++) {
      Complex p = new Complex(field.re()[v], field.im()[v]).divide(p0);
      assertThat(p.getReal()).isCloseTo(Math.cos(Math.PI * mesh.x(v) / 2), within(1e-3));
      assertThat(p.getImaginary()).isCloseTo(0, within(1e-8));
    }
  }
}
