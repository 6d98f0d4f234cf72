package org.annulet.solver.network;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import org.annulet.solver.boundary.Admittance;
import org.annulet.solver.boundary.EdgeGas;
import org.annulet.solver.boundary.FlowLoss;
import org.annulet.solver.boundary.Impedance;
import org.annulet.solver.boundary.OpenEnd;
import org.annulet.solver.boundary.Rigid;
import org.annulet.solver.boundary.Wall;
import org.annulet.solver.flame.NTau;
import org.annulet.solver.modes.Window;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.api.Test;

/** Chains of ducts against closed forms; ids are rows of the reference values. */
class DuctChainTest {
  private static final double GAMMA = 1.4;
  private static final double PRESSURE = 1e5;

  private static EdgeGas gas(double c) {
    return new EdgeGas(GAMMA * PRESSURE / (c * c), c, GAMMA);
  }

  private static Piece.Duct duct(double length, double area, double c) {
    return new Piece.Duct(length, area, Double.POSITIVE_INFINITY, gas(c), List.of());
  }

  private static DuctEnd end(Wall wall, double c, double area) {
    return new DuctEnd(wall, gas(c), area);
  }

  private static DuctChain tube(Wall left, Wall right) {
    return new DuctChain(end(left, 340, 1), List.of(duct(1, 1, 340)), end(right, 340, 1));
  }

  /** Frequencies and growth rates in turn; the reference prints 5 to 6 decimals. */
  private static void roots(DuctChain chain, Window window, int order, double... expected) {
    DuctChain.Roots roots = chain.roots(window, order);
    assertThat(roots.complete()).isTrue();
    assertThat(roots.s()).hasSize(expected.length / 2);
    for (int k = 0; k < roots.s().size(); k++) {
      Complex s = roots.s().get(k);
      assertThat(s.getImaginary() / (2 * Math.PI)).isCloseTo(expected[2 * k], within(1.1e-5));
      assertThat(s.getReal()).isCloseTo(expected[2 * k + 1], within(1.1e-4));
    }
  }

  private static final Window PASSIVE = new Window(20, 360, -300, 300);

  @Test
  void closedTube_hasHalfWaves_rowC1() {
    roots(tube(new Rigid(), new Rigid()), PASSIVE, 0, 170, 0, 340, 0);
    roots(tube(new OpenEnd(), new OpenEnd()), PASSIVE, 0, 170, 0, 340, 0);
    roots(tube(new Rigid(), new OpenEnd()), PASSIVE, 0, 85, 0, 255, 0);
  }

  @Test
  void impedanceEnds_damp_rowsC10() {
    roots(
        tube(new Rigid(), new Impedance(new Complex(2))),
        PASSIVE,
        0,
        170,
        -186.764089,
        340,
        -186.764089);
    roots(
        tube(new Rigid(), new Impedance(new Complex(3, 2))),
        new Window(100, 360, -300, 300),
        0,
        178.705392,
        -77.884712,
        348.705392,
        -77.884712);
  }

  @Test
  void areaStep_rowC13() {
    DuctChain closed =
        new DuctChain(
            end(new Rigid(), 340, 1),
            List.of(duct(0.6, 1, 340), duct(0.4, 4, 340)),
            end(new Rigid(), 340, 4));
    roots(closed, new Window(20, 500, -50, 60), 0, 152.357243, 0, 374.109270, 0, 475.890730, 0);
  }

  /** A duct with flame sheet at b; N is the relative rise of û across it. */
  private static DuctChain flame(
      double[] c, double b, double n, double tau, Wall left, Wall right) {
    Piece.Sheet sheet = new Piece.Sheet(new Heard.Velocity(1, 1), n, new NTau(1, tau));
    return new DuctChain(
        end(left, c[0], 1),
        List.of(duct(b, 1, c[0]), sheet, duct(1 - b, 1, c[1])),
        end(right, c[1], 1));
  }

  @Test
  void rijkeTube_growsAsRowD1() {
    roots(
        flame(new double[] {340, 340}, 0.25, 0.1, 1.5e-3, new OpenEnd(), new OpenEnd()),
        new Window(15.9, 800, -300, 310),
        0,
        170.04473,
        16.5843,
        340,
        0,
        509.63594,
        16.3352,
        680,
        0);
  }

  @Test
  void flameBornModesAreFoundToo_rowsD3andD5() {
    double[] c = {347, 850};
    Window window = new Window(4.8, 700, -1500, 1500);
    roots(
        flame(c, 0.3, 5, 3e-3, new Rigid(), new OpenEnd()),
        window,
        0,
        70.60976,
        -280.1037,
        206.51919,
        435.5250,
        426.70531,
        363.3854,
        551.74653,
        -395.8363,
        689.95275,
        -95.9007);
    roots(
        flame(c, 0.3, 2.5, 3e-3, new Rigid(), new Impedance(new Complex(1.5))),
        window,
        0,
        203.35450,
        56.4852,
        298.90255,
        -940.7728,
        447.31198,
        -99.0628,
        613.61707,
        -206.4146);
  }

  @Test
  void ringOfADuct_hasAzimuthalModes_rowE1() {
    DuctChain ring =
        new DuctChain(
            end(new Rigid(), 800, 1),
            List.of(new Piece.Duct(0.1, 1, 0.5, gas(800), List.of())),
            end(new Rigid(), 800, 1));
    for (int m = 1; m <= 3; m++) {
      roots(ring, new Window(20, 900, -100, 110), m, m * 254.647909, 0);
    }
  }

  @Test
  void annulusWithFlame_hasItsAzimuthalModes_rowsD10() {
    // k of the first azimuthal wave of the hard annulus 0.4 m to 0.5 m, row A2.1.25.1: as 1/R.
    double k = 0.89069307 / 0.4;
    for (int row = 0; row < 2; row++) {
      Wall outlet = row == 0 ? new Rigid() : new Admittance(new Complex(0.015));
      DuctChain can =
          new DuctChain(
              end(new Rigid(), 500, 1),
              List.of(
                  new Piece.Duct(0.1, 1, 1 / k, gas(500), List.of()),
                  new Piece.Sheet(new Heard.Velocity(1, 1), 1, new NTau(1, 2.5e-3)),
                  new Piece.Duct(0.2, 1, 1 / k, gas(850), List.of())),
              end(outlet, 850, 1));
      double[] expected =
          row == 0
              ? new double[] {
                162.51837, -647.3712, 270.50530, 122.1043, 597.10577, -396.5831, 985.07932,
                -528.6009
              }
              : new double[] {
                162.02534, -642.9346, 271.23373, 106.1009, 598.47089, -396.7698, 987.30634,
                -541.0866
              };
      roots(can, new Window(16, 1100, -900, 900), 1, expected);
    }
  }

  @Test
  void sideWall_dampsAsTheSameAdmittanceSpreadOverTheVolume() {
    // Uniform along the duct: s² + s y P c/A + k² c² = 0, derived from κ² = −k².
    double y = 0.05;
    double perimeter = 3;
    DuctChain lined =
        new DuctChain(
            end(new Rigid(), 340, 1),
            List.of(
                new Piece.Duct(
                    1,
                    1,
                    Double.POSITIVE_INFINITY,
                    gas(340),
                    List.of(new SideWall(new Admittance(new Complex(y)), perimeter)))),
            end(new Rigid(), 340, 1));
    double growth = -0.5 * y * perimeter * 340;
    double first = Math.sqrt(Math.pow(Math.PI * 340, 2) - growth * growth) / (2 * Math.PI);
    double second = Math.sqrt(Math.pow(2 * Math.PI * 340, 2) - growth * growth) / (2 * Math.PI);
    roots(lined, PASSIVE, 0, first, growth, second, growth);
  }

  @Test
  void loss_isTheSameAsItsImpedanceAtAnOpenEnd() {
    // A loss before an open end is an end of impedance ζū/c: row C10b with ζū = 0.5 c.
    DuctChain chain =
        new DuctChain(
            end(new Rigid(), 340, 1),
            List.of(
                duct(1, 1, 340),
                new Piece.Coupling(new FlowLoss(17, 10, 0), gas(340), gas(340), 1)),
            end(new OpenEnd(), 340, 1));
    roots(chain, PASSIVE, 0, 85, -186.764089, 255, -186.764089);
  }

  @Test
  void meanVelocityOverAShortStretch_isTheVelocityThere() {
    double n = 0.5;
    double l = 1e-5;
    List<Piece> pieces = new ArrayList<>();
    pieces.add(duct(0.3 - l, 1, 347));
    pieces.add(duct(l, 1, 347));
    pieces.add(
        new Piece.Sheet(
            new Heard.MeanVelocity(1, 2, gas(347).density() * l), n, new NTau(1, 3e-3)));
    pieces.add(duct(0.7, 1, 850));
    DuctChain chain = new DuctChain(end(new Rigid(), 347, 1), pieces, end(new OpenEnd(), 850, 1));
    // Row D2, to the first order in the length of the stretch.
    DuctChain.Roots roots = chain.roots(new Window(4.8, 700, -1500, 1500), 0);
    assertThat(roots.complete()).isTrue();
    assertThat(roots.s().get(1).getImaginary() / (2 * Math.PI)).isCloseTo(202.19168, within(0.01));
    assertThat(roots.s().get(1).getReal()).isCloseTo(83.4808, within(0.01));
  }

  @Test
  void shapeOfAClosedTube_isACosine() {
    DuctChain tube = tube(new Rigid(), new Rigid());
    Complex[] p = tube.shape(new Complex(0, 2 * Math.PI * 170), 0, new double[] {0, 0.25, 0.5, 1});
    assertThat(p[1].divide(p[0]).getReal()).isCloseTo(Math.sqrt(0.5), within(1e-12));
    assertThat(p[2].divide(p[0]).getReal()).isCloseTo(0, within(1e-12));
    assertThat(p[3].divide(p[0]).getReal()).isCloseTo(-1, within(1e-12));
  }
}
