package org.annulet.solver.assembly;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.function.DoubleFunction;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.boundary.Admittance;
import org.annulet.solver.boundary.FlowLoss;
import org.annulet.solver.boundary.Impedance;
import org.annulet.solver.boundary.OpenEnd;
import org.annulet.solver.derivative.ChangeOfTerm;
import org.annulet.solver.derivative.DifferenceOfOperators;
import org.annulet.solver.derivative.ModeDerivative;
import org.annulet.solver.derivative.Slope;
import org.annulet.solver.eigen.ModeSearch;
import org.annulet.solver.eigen.PreparedOperator;
import org.annulet.solver.eigen.SearchSettings;
import org.annulet.solver.flame.Firing;
import org.annulet.solver.flame.Flame;
import org.annulet.solver.flame.NTau;
import org.annulet.solver.flame.Patch;
import org.annulet.solver.flame.Place;
import org.annulet.solver.flame.Reference;
import org.annulet.solver.flame.Side;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.modes.Window;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.LowRankTerm;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Derivatives of eigenvalues against modes solved anew, and against closed forms. */
class ModeDerivativeTest {
  /** A step of the operator's difference, relative. */
  private static final double STEP = 2e-4;

  private static final double AREA = 0.01 * 0.05;

  /** Everything a duct can have, each number a parameter. */
  private record Duct(
      double n, double tau, double heat, double velocity, double c2, double zeta, double y) {
    AcousticOperator operator(int cells) {
      Mesh mesh =
          Strips.flat(
              new double[] {0, 0.3, 0.5, 1},
              new int[] {3 * cells / 10, cells / 5, cells / 2},
              new double[] {0, 0.01},
              1);
      Firing f = Gases.firing(n, tau, AREA * 10);
      Place place = new Place.Sheet("joint1");
      Reference reference = new Reference.EdgeFlux("joint1", new Side.InZone("0"), velocity);
      return new ProblemBuilder(mesh, new Plane(0.05), Gases.of(mesh, 347, c2, c2))
          .wall("outlet", new Admittance(new Complex(y, 0.2)))
          .twoPort("joint2", new Side.InZone("1"), new FlowLoss(zeta, 40, 0.01))
          .flame(
              new Flame("main", place, reference, new Firing(heat * f.heatRelease(), f.response())))
          .build()
          .operator();
    }

    static Duct with(String name, double x) {
      return new Duct(
          name.equals("gain") ? 0.6 * x : 0.6,
          name.equals("delay") ? 3e-3 * x : 3e-3,
          name.equals("heat release") ? x : 1,
          name.equals("velocity") ? 10 * x : 10,
          name.equals("temperature") ? 850 * Math.sqrt(x) : 850,
          name.equals("loss") ? 1.5 * x : 1.5,
          name.equals("admittance") ? 0.4 * x : 0.4);
    }
  }

  private static Mode mode(NearRoot r) {
    return new Mode(r.growth(), r.frequency(), r.re, r.im, 1, 1e-12, 1, Mode.Verdict.CONVERGED);
  }

  /** d/dx and d²/dx² at x = 1 by Richardson on re-solved roots: error of order h⁴. */
  private static Complex[] resolved(DoubleFunction<AcousticOperator> at, Complex start) {
    double h = 2e-3;
    Complex[] s = new Complex[5];
    for (int k = -2; k <= 2; k++) {
      s[k + 2] =
          NearRoot.of(at.apply(1 + k * h), start.getImaginary() / (2 * Math.PI), start.getReal()).s;
    }
    Complex first = s[3].subtract(s[1]).multiply(8).subtract(s[4].subtract(s[0])).divide(12 * h);
    Complex second =
        s[3].add(s[1])
            .multiply(16)
            .subtract(s[4].add(s[0]))
            .subtract(s[2].multiply(30))
            .divide(12 * h * h);
    return new Complex[] {first, second};
  }

  private static Slope slope(DoubleFunction<AcousticOperator> at, ModeDerivative d) {
    PreparedOperator here = new PreparedOperator(at.apply(1));
    return d.slopes(new DifferenceOfOperators(here, at.apply(1 - STEP), at.apply(1 + STEP), STEP))
        .get(0);
  }

  /**
   * 1e-6: the Richardson difference errs by h⁴/30 times the fifth derivative, (ωτ)⁵ for a delay.
   */
  @ParameterizedTest
  @CsvSource({"gain", "delay", "heat release", "velocity", "temperature", "loss", "admittance"})
  void ductWithFlameLossAndWall_slopesAreThoseOfModesSolvedAnew(String name) {
    AcousticOperator op = Duct.with("", 1).operator(20);
    for (double[] start : new double[][] {{200, 0}, {420, 0}}) {
      NearRoot root = NearRoot.of(op, start[0], start[1]);
      ModeDerivative d = ModeDerivative.of(new PreparedOperator(op), mode(root));
      assertThat(d.leftError()).isLessThan(1e-10);
      Slope slope = slope(x -> Duct.with(name, x).operator(20), d);
      Complex[] expected = resolved(x -> Duct.with(name, x).operator(20), root.s);
      assertThat(slope.first().subtract(expected[0]).abs()).isLessThan(1e-6 * expected[0].abs());
      assertThat(slope.second().subtract(expected[1]).abs())
          .isLessThan(1e-4 * expected[1].abs() + 1e-4 * expected[0].abs());
    }
  }

  @Test
  void exactChangesOfATerm_agreeWithDifferencesOfOperators() {
    AcousticOperator op = Duct.with("", 1).operator(20);
    NearRoot root = NearRoot.of(op, 200, 0);
    PreparedOperator here = new PreparedOperator(op);
    ModeDerivative d = ModeDerivative.of(here, mode(root));
    LowRankTerm flame = op.lowRankTerms().get(0);
    Slope gain = d.slopes(ChangeOfTerm.strength(flame)).get(0);
    Slope delay = d.slopes(ChangeOfTerm.delay(flame)).get(0);
    Slope wall = d.slopes(ChangeOfTerm.strength(op, op.sparseTerms().get(0))).get(0);
    Slope gain2 = slope(x -> Duct.with("gain", x).operator(20), d);
    Slope delay2 = slope(x -> Duct.with("delay", x).operator(20), d);
    assertClose(gain.first(), gain2.first(), 1e-8);
    assertClose(gain.second(), gain2.second(), 1e-3);
    assertClose(delay.first().multiply(3e-3), delay2.first(), 1e-6); // (ωτh)²/6
    assertClose(delay.second().multiply(9e-6), delay2.second(), 1e-4);
    // The imaginary part of the admittance is scaled with it here, so another parameter.
    assertThat(wall.first().abs()).isGreaterThan(1);
  }

  private static void assertClose(Complex got, Complex expected, double relative) {
    assertThat(got.subtract(expected).abs()).isLessThan(relative * expected.abs());
  }

  /** Row D9: D1 with N = 1e-4, first mode: growth 0.01699123 1/s, shift −0.00008485 Hz. */
  @Test
  void weakFlameInAnOpenDuct_movesTheFirstModeByTheDispersionRelation() {
    double[] growth = new double[2];
    double shift = 0;
    for (int k = 0; k < 2; k++) {
      Mesh mesh =
          Strips.flat(
              new double[] {0, 0.25, 1}, new int[] {10 << k, 30 << k}, new double[] {0, 0.01}, 1);
      AcousticOperator op =
          new ProblemBuilder(mesh, new Plane(0.05), Gases.of(mesh, 340))
              .wall("inlet", new OpenEnd())
              .wall("outlet", new OpenEnd())
              .flame(
                  new Flame(
                      "main",
                      new Place.Sheet("joint1"),
                      new Reference.EdgeFlux("joint1", new Side.InZone("0"), 10),
                      Gases.firing(1e-4, 1.5e-3, AREA * 10)))
              .build()
              .operator();
      ModeDerivative d = ModeDerivative.of(new PreparedOperator(op), mode(NearRoot.of(op, 170, 0)));
      Complex ds = d.firstOrder(ChangeOfTerm.strength(op.lowRankTerms().get(0))).get(0);
      growth[k] = ds.getReal();
      shift = ds.getImaginary() / (2 * Math.PI);
    }
    double extrapolated = growth[1] + (growth[1] - growth[0]) / 3; // order two
    assertThat(extrapolated).isCloseTo(0.01699123, within(1e-4 * 0.017)); // last printed digits
    assertThat(shift).isCloseTo(-0.00008485, within(2e-2 * 0.000085)); // of 80 cells, h² alone
  }

  private static AcousticOperator ring(double[] strength) {
    Mesh mesh = Strips.closed(new double[] {0, 0.1}, new int[] {1}, 2 * Math.PI * 0.3, 8 * 3);
    Ring geometry = new Ring(8, 0.3, Map.of("0", new Ring.Annulus(0.3, 0.02)));
    Firing rule = new Firing(1e5, new NTau(0.4, 2e-3));
    Flame flame =
        new Flame(
            "main",
            new Place.Spread(new Patch("0", 0, 0.1, 0.08)),
            new Reference.PatchPressure(new Patch("0", 0, 0.1, 0.08)),
            rule);
    for (int k = 0; k < strength.length; k++) {
      flame = flame.staged(k + 1, new Firing(1e5 * strength[k], rule.response()));
    }
    return new ProblemBuilder(mesh, geometry, Gases.of(mesh, 600))
        .flame(flame)
        .wall("outlet", new Impedance(new Complex(40)))
        .build()
        .operator();
  }

  private static List<Mode> firstPair(AcousticOperator op) {
    Window window = new Window(150, 480, -400, 400);
    return ModeSearch.find(op, window, SearchSettings.standard()).modes();
  }

  /** Scaling one burner, or two opposite, splits the pair; the 2×2 problem knows both members. */
  @ParameterizedTest
  @CsvSource({"1", "2"})
  void stagingSplitsAnExactPair_asTheTwoByTwoProblemSays(int kind) {
    AcousticOperator op = ring(new double[] {1, 1, 1, 1, 1, 1, 1, 1});
    List<Mode> pair = firstPair(op);
    assertThat(pair).hasSize(2);
    assertThat(pair.get(0).multiplicity()).isEqualTo(2);
    PreparedOperator here = new PreparedOperator(op);
    ModeDerivative d = ModeDerivative.of(here, pair);
    List<Slope> slopes =
        d.slopes(
            new DifferenceOfOperators(here, staged(1 - STEP, kind), staged(1 + STEP, kind), STEP));
    double h = 1e-3;
    List<Complex> expected = new ArrayList<>();
    List<Mode> up = firstPair(staged(1 + h, kind));
    List<Mode> down = firstPair(staged(1 - h, kind));
    // For a step down the order of the members turns round.
    for (int k = 0; k < 2; k++) {
      Complex a = s(sorted(up, 1).get(k));
      Complex b = s(sorted(down, -1).get(k));
      expected.add(a.subtract(b).divide(2 * h));
    }
    for (int k = 0; k < 2; k++) {
      assertThat(slopes.get(k).first().subtract(expected.get(k)).abs())
          .isLessThan(2e-5 * slopes.get(0).first().abs() + 2e-5 * slopes.get(1).first().abs());
    }
    assertThat(slopes.get(0).first().subtract(slopes.get(1).first()).abs()).isGreaterThan(1);
  }

  private static AcousticOperator staged(double x, int kind) {
    double[] strength = {x, 1, 1, 1, kind == 2 ? x : 1, 1, 1, 1};
    return ring(strength);
  }

  private static List<Mode> sorted(List<Mode> modes, int sign) {
    return modes.stream()
        .sorted((a, b) -> Double.compare(sign * b.growthRate(), sign * a.growthRate()))
        .toList();
  }

  private static Complex s(Mode m) {
    return new Complex(m.growthRate(), 2 * Math.PI * m.frequency());
  }

  /** What changes all burners alike keeps the pair together. */
  @Test
  void commonGain_movesBothMembersOfAPairAlike() {
    AcousticOperator op = ring(new double[] {1, 1, 1, 1, 1, 1, 1, 1});
    PreparedOperator here = new PreparedOperator(op);
    ModeDerivative d = ModeDerivative.of(here, firstPair(op));
    DoubleFunction<AcousticOperator> all = x -> ring(new double[] {x, x, x, x, x, x, x, x});
    List<Slope> slopes =
        d.slopes(new DifferenceOfOperators(here, all.apply(1 - STEP), all.apply(1 + STEP), STEP));
    assertClose(slopes.get(0).first(), slopes.get(1).first(), 1e-7);
    double h = 1e-3;
    Complex up = s(firstPair(all.apply(1 + h)).get(0));
    Complex down = s(firstPair(all.apply(1 - h)).get(0));
    assertClose(slopes.get(0).first(), up.subtract(down).divide(2 * h), 1e-6);
  }

  @Test
  void linearRange_isWhereTheSecondOrderIsATenth() {
    Slope slope = new Slope(new Complex(3, 4), new Complex(0, 2));
    double x = slope.linearRange();
    assertThat(0.5 * 2 * x * x).isCloseTo(0.1 * 5 * x, within(1e-12));
  }

  @Test
  void otherUnknowns_areRefused() {
    AcousticOperator op = Duct.with("", 1).operator(20);
    AcousticOperator other = Duct.with("", 1).operator(40);
    PreparedOperator here = new PreparedOperator(op);
    assertThatThrownBy(() -> new DifferenceOfOperators(here, other, other, 1))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("assemble them on one mesh");
    assertThatThrownBy(() -> new DifferenceOfOperators(here, op, op, 0))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("step");
    Mode wrong = mode(NearRoot.of(other, 200, 0));
    assertThatThrownBy(() -> ModeDerivative.of(here, wrong))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("vector of unknowns");
  }
}
