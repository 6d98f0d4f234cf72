package org.annulet.solver.assembly;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Map;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.mesher.mesh.RingCells;
import org.annulet.solver.boundary.Impedance;
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
import org.junit.jupiter.params.provider.ValueSource;

/** Whole rings, staging, faces, and Bloch cells against the whole ring. */
class RingTest {

  /** Rows E: a thin ring with pressure flames on lines x, twelve of them. */
  private static AcousticOperator pointFlames(int perCell, double[] strength) {
    double radius = 0.5;
    double height = 0.01;
    double length = 0.05;
    int rows = 12 * perCell;
    Mesh plain = Strips.closed(new double[] {0, length}, new int[] {1}, 2 * Math.PI * radius, rows);
    Mesh.Builder b = Mesh.periodicBuilder(2 * Math.PI * radius);
    for (int v = 0; v < plain.nodeCount(); v++) {
      b.node(plain.x(v), plain.y(v));
    }
    for (int t = 0; t < plain.triangleCount(); t++) {
      b.triangle(plain.corner(t, 0), plain.corner(t, 1), plain.corner(t, 2), "0");
    }
    for (int e = 0; e < plain.segmentCount(); e++) {
      b.segment(
          plain.segmentStart(e), plain.segmentEnd(e), plain.edgeNames().get(plain.segmentEdge(e)));
    }
    for (int j = 0; j < 12; j++) {
      b.segment(j * perCell, rows + j * perCell, "flames");
    }
    Mesh mesh = b.build();
    double c = 800;
    double rc = Gases.GAMMA * Gases.PRESSURE / c;
    double area = height * length;
    // S (u₊ − u₋) = (γ−1)/(γp̄) Q̂ = G p, g = ρcG/S: Q̄ = 12 γ p̄² S/((γ−1) ρc) with gain g
    double heat =
        12 * Gases.GAMMA * Gases.PRESSURE * Gases.PRESSURE * area / ((Gases.GAMMA - 1) * rc);
    Flame flame =
        new Flame(
            "points",
            new Place.Sheet("flames"),
            new Reference.EdgePressure("flames"),
            new org.annulet.solver.flame.Firing(
                heat, new org.annulet.solver.flame.NTau(0.05, 3.5e-3)));
    for (int j = 0; j < 12; j++) {
      flame =
          flame.staged(
              j + 1,
              new org.annulet.solver.flame.Firing(
                  heat, new org.annulet.solver.flame.NTau(0.05 * strength[j], 3.5e-3)));
    }
    return new ProblemBuilder(
            mesh,
            new Ring(12, radius, Map.of("0", new Ring.Annulus(radius, height))),
            Gases.of(mesh, c))
        .flame(flame)
        .build()
        .operator();
  }

  /** Rows E3.1 and E4a.1, E4d.3: uniform and staged pressure flames. */
  @ParameterizedTest
  @CsvSource({
    "uniform, 259.96605, 54.3301",
    "cos2, 260.81406, 66.0992",
    "cos2, 258.97932, 41.7815",
    "alternating, 782.64355, -7.9385",
    "alternating, 769.93978, -13.6184"
  })
  void pressureFlamesOnARing_rootsWithStaging(String pattern, double f, double growth) {
    double[] strength = new double[12];
    for (int j = 0; j < 12; j++) {
      strength[j] =
          switch (pattern) {
            case "cos2" -> 1 + 0.5 * Math.cos(2 * 2 * Math.PI * j / 12);
            case "alternating" -> j % 2 == 0 ? 1.5 : 0.5;
            default -> 1;
          };
    }
    double[] error = new double[2];
    for (int k = 0; k < 2; k++) {
      NearRoot root = NearRoot.of(pointFlames(5 << k, strength), f, growth);
      error[k] = new Complex(root.growth() - growth, 2 * Math.PI * (root.frequency() - f)).abs();
    }
    assertThat(error[1]).isLessThan(0.01 * 2 * Math.PI * f);
    assertThat(error[0] / error[1]).isBetween(3.4, 4.6);
  }

  private static ProblemBuilder chamber(Mesh mesh, int count, String kind) {
    Place place =
        kind.equals("sheet")
            ? new Place.Sheet("burners.outlet")
            : new Place.Spread(new Patch("2", 0.3, 0.37, 0.04));
    Reference reference =
        kind.equals("sheet")
            ? new Reference.EdgeFlux("burners.outlet", new Side.InZone("1"), 50)
            : new Reference.PatchVelocity(Patch.between("1", 0.21, 0.28), 1, 0, 50);
    return new ProblemBuilder(mesh, SmallRings.geometry(count), SmallRings.gas(mesh))
        .wall("outlet", new Impedance(new Complex(15)))
        .face("2", Face.OUTER, new Impedance(new Complex(60)))
        .flame(new Flame("main", place, reference, Gases.firing(1.2, 1.5e-3, 0.02 * 50)));
  }

  /** The same eigenvalues to rounding, for each Bloch number, even and odd N. */
  @ParameterizedTest
  @CsvSource({
    "4, 0, sheet",
    "4, 1, sheet",
    "4, 2, sheet",
    "4, 1, patch",
    "5, 0, patch",
    "5, 1, sheet",
    "5, 2, patch"
  })
  void blochCell_hasTheEigenvaluesOfTheRing(int count, int q, String kind) {
    RingCells cells = SmallRings.of(count);
    AcousticOperator whole = chamber(cells.whole(), count, kind).build().operator();
    AssembledProblem cell = chamber(cells.half(), count, kind).bloch(cells).number(q);
    for (double f : new double[] {260, 400, 600}) {
      NearRoot ofCell = NearRoot.of(cell.operator(), f, 0);
      NodalField field = cell.expand(ofCell.re, ofCell.im);
      double[][] residual = NearRoot.product(whole, ofCell.s, false, field.re(), field.im());
      double[] kp = new double[whole.size()];
      whole.pattern().addProduct(whole.stiffness(), field.re(), 1, kp);
      double[] kpi = new double[whole.size()];
      whole.pattern().addProduct(whole.stiffness(), field.im(), 1, kpi);
      double r = 0;
      double k = 0;
      for (int v = 0; v < kp.length; v++) {
        r += residual[0][v] * residual[0][v] + residual[1][v] * residual[1][v];
        k += kp[v] * kp[v] + kpi[v] * kpi[v];
      }
      assertThat(Math.sqrt(r / k)).as("near %s Hz, root %s", f, ofCell.s).isLessThan(1e-9);
    }
  }

  /** All unknowns of the ring are there, once or twice. */
  @ParameterizedTest
  @ValueSource(ints = {3, 4, 5, 6})
  void blochNumbers_haveAsManyUnknownsAsTheRing(int count) {
    RingCells cells = SmallRings.of(count);
    BlochAssembly bloch = chamber(cells.half(), count, "sheet").bloch(cells);
    int sum = 0;
    for (int q = 0; q <= bloch.largestNumber(); q++) {
      sum += bloch.multiplicity(q) * bloch.number(q).operator().size();
    }
    assertThat(sum).isEqualTo(cells.whole().nodeCount());
  }

  @Test
  void stagedFlame_onAHalfCell_isRefused() {
    RingCells cells = SmallRings.of(4);
    Flame flame =
        new Flame(
                "main",
                new Place.Sheet("burners.outlet"),
                new Reference.EdgeFlux("burners.outlet", new Side.InZone("1"), 50),
                Gases.firing(1, 1e-3, 1))
            .staged(2, Gases.firing(0.5, 1e-3, 1));
    BlochAssembly bloch =
        new ProblemBuilder(cells.half(), SmallRings.geometry(4), SmallRings.gas(cells.half()))
            .flame(flame)
            .bloch(cells);
    assertThatThrownBy(() -> bloch.number(1)).hasMessageContaining("whole ring");
  }

  /**
   * A face lined with 1/y = z damps an annulus without axial variation like dV/dt: for small y,
   * growth = −c y A/(2 V); common practice, first order in y.
   */
  @Test
  void linedFace_dampsByAreaOverVolume() {
    double radius = 0.5;
    Mesh mesh = Strips.closed(new double[] {0, 0.2}, new int[] {2}, 2 * Math.PI * 0.4, 24);
    Ring ring = new Ring(6, 0.4, Map.of("0", new Ring.Annulus(radius, 0.1)));
    double y = 1e-4;
    NearRoot root =
        NearRoot.of(
            new ProblemBuilder(mesh, ring, Gases.of(mesh, 800))
                .face("0", Face.OUTER, new Impedance(new Complex(1 / y)))
                .build()
                .operator(),
            255,
            0);
    double expected = -800 * y * (0.55 / 0.5) / (2 * 0.1);
    assertThat(root.growth()).isCloseTo(expected, within(1e-3 * Math.abs(expected)));
    // R_z, not R₀, sets the frequency: m c/(2πR_z), 24 cells round
    double f = 800 / (2 * Math.PI * radius);
    assertThat(root.frequency()).isBetween(f, 1.01 * f);
  }
}
