package org.annulet.solver.ports;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import org.annulet.solver.assembly.DampedRing;
import org.annulet.solver.eigen.ModeSearch;
import org.annulet.solver.eigen.PreparedOperator;
import org.annulet.solver.eigen.SearchSettings;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.modes.ModeSet;
import org.annulet.solver.modes.Window;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.Analytic;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.operator.LowRankTerm;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Modes of a damped chamber from its ports against the full operator and closed forms. */
class DampedRootsTest {
  private static final Window WINDOW = new Window(150, 900, -400, 60);

  /** A ring with flames of unequal strength: left and right vectors differ, pairs are split. */
  private static AcousticOperator withFlames(AcousticOperator ring) {
    List<LowRankTerm> terms = new ArrayList<>();
    for (int j = 0; j < 3; j++) {
      terms.add(
          new LowRankTerm(
              "flame " + j,
              List.of(DampedRing.at(ring, 0.3 + 2 * j)),
              List.of(DampedRing.at(ring, 0.35 + 2 * j)),
              new AnalyticFunction[][] {
                {new Delayed(DampedRing.SECTION / DampedRing.RHO_C * (0.05 + 0.02 * j), 3.5e-3)}
              }));
    }
    return DampedRing.with(ring, terms);
  }

  /** factor · s e^{−sτ}. */
  private record Delayed(double factor, double tau) implements AnalyticFunction {
    @Override
    public Complex value(Complex s) {
      return s.multiply(-tau).exp().multiply(s).multiply(factor);
    }

    @Override
    public Complex derivative(Complex s) {
      return s.multiply(-tau).exp().multiply(s.multiply(-tau).add(1)).multiply(factor);
    }

    @Override
    public double longestDelay() {
      return tau;
    }
  }

  private static List<PortPole> poles(AcousticOperator operator) {
    ModeSet set =
        ModeSearch.find(operator, new Window(60, 1300, -1500, 160), SearchSettings.standard());
    assertThat(set.complete()).isTrue();
    List<Mode> modes = new ArrayList<>(set.modes());
    modes.addAll(set.outside());
    return PortPoles.grouped(
        modes.stream().map(m -> new Complex(m.growthRate(), 2 * Math.PI * m.frequency())).toList());
  }

  private static PortTransfer transfer(AcousticOperator operator, double... angles) {
    return PortSampling.of(
        new PreparedOperator(operator),
        IntStream.range(0, angles.length)
            .mapToObj(k -> DampedRing.at(operator, angles[k]))
            .toList(),
        poles(operator),
        new Window(145, 915, -410, 70));
  }

  @Test
  void transferAgreesWithFullSolves() {
    PortTransfer h = transfer(withFlames(DampedRing.plain()), 0.1, 1.7, 3.3);
    assertThat(h.error()).isLessThan(1e-7);
    assertThat(h.poles()).allSatisfy(p -> assertThat(p.multiplicity()).isEqualTo(1));
  }

  @Test
  void slopeOfTheTransfer_isItsDerivative() {
    PortTransfer h = transfer(withFlames(DampedRing.plain()), 0.1, 1.7);
    double[][] v = new double[4][4];
    double[][] up = new double[4][4];
    double[][] down = new double[4][4];
    PortTransfer.Selection some = h.select(0, 1);
    double step = 0.05;
    some.at(-90, 3000, v);
    some.at(-90 + step, 3000, up);
    some.at(-90 - step, 3000, down);
    for (int q = 0; q < 4; q++) {
      double size = Math.hypot(v[2][q], v[3][q]);
      assertThat((up[0][q] - down[0][q]) / (2 * step)).isCloseTo(v[2][q], within(1e-5 * size));
      assertThat((up[1][q] - down[1][q]) / (2 * step)).isCloseTo(v[3][q], within(1e-5 * size));
    }
  }

  @ParameterizedTest
  @CsvSource({"true, 0.3", "false, 0.02", "false, 0.3"})
  void rootsOfThePorts_areTheModesOfTheFullOperator(boolean flames, double resistance) {
    AcousticOperator ring = flames ? withFlames(DampedRing.plain()) : DampedRing.plain();
    double[] angles = {0.1, 1.7, 3.3};
    AnalyticFunction[] flows = new AnalyticFunction[2];
    List<LowRankTerm> dampers = new ArrayList<>();
    for (int k = 0; k < 2; k++) {
      flows[k] = DampedRing.resonator(254.6 * (1 + k), resistance).flow();
      dampers.add(DampedRing.damper(ring, angles[2 * k], flows[k]));
    }
    ModeSet full =
        ModeSearch.find(DampedRing.with(ring, dampers), WINDOW, SearchSettings.standard());
    assertThat(full.complete()).isTrue();
    DampedRoots.Found found =
        new DampedRoots(transfer(ring, angles), new int[] {0, 2}, flows, WINDOW).all();
    assertThat(found.complete()).isTrue();
    assertThat(found.roots()).hasSameSizeAs(full.modes());
    for (Mode m : full.modes()) {
      Complex s = new Complex(m.growthRate(), 2 * Math.PI * m.frequency());
      double nearest =
          found.roots().stream().mapToDouble(r -> r.subtract(s).abs()).min().orElseThrow();
      assertThat(nearest).as("%s", s).isLessThan(1e-6 * s.abs());
    }
  }

  /** Rows E2: K equal dampers split the pair of order m exactly when K divides 2m. */
  @ParameterizedTest
  @CsvSource({
    "2, 1, 254.64791, -102.2007, 254.64791, 0",
    "3, 1, 255.00185, -76.6506, 255.00185, -76.6506",
    "3, 3, 763.94373, -153.3011, 763.94373, 0",
    "4, 1, 254.64791, -102.2007, 254.64791, -102.2007",
    "4, 2, 509.29582, -204.4015, 509.29582, 0",
    "5, 2, 510.70771, -127.7509, 510.70771, -127.7509",
    "6, 3, 763.94373, -306.6022, 763.94373, 0"
  })
  void equalDampersSplitAPair_whenTheirNumberDividesTwiceItsOrder(
      int count, int order, double f1, double g1, double f2, double g2) {
    AcousticOperator ring = DampedRing.plain();
    double[] angles = new double[count];
    AnalyticFunction[] flows = new AnalyticFunction[count];
    for (int k = 0; k < count; k++) {
      angles[k] = 2 * Math.PI * k / count;
      flows[k] = Analytic.power(0.2 * DampedRing.SECTION / DampedRing.RHO_C, 1);
    }
    DampedRoots.Found found =
        new DampedRoots(transfer(ring, angles), IntStream.range(0, count).toArray(), flows, WINDOW)
            .all();
    assertThat(found.complete()).isTrue();
    double middle = 254.64791 * order;
    List<Complex> pair =
        found.roots().stream()
            .filter(s -> Math.abs(s.getImaginary() / 2 / Math.PI - middle) < 30)
            .toList();
    assertThat(pair).hasSize(2);
    // 120 linear cells: frequencies (kh)²/24 = 1.03e-3 too high at order 3, growth rates (kh)²/6
    // = 4.1e-3 too large through the mass of the mode; a ninth of that at order 1
    assertThat(pair.get(0).getImaginary() / 2 / Math.PI).isCloseTo(f2, within(1.2e-3 * f2));
    assertThat(pair.get(1).getImaginary() / 2 / Math.PI).isCloseTo(f1, within(1.2e-3 * f1));
    assertThat(pair.get(0).getReal()).isCloseTo(g2, within(1e-6 + 5e-3 * Math.abs(g2)));
    assertThat(pair.get(1).getReal()).isCloseTo(g1, within(5e-3 * Math.abs(g1)));
  }

  /** Rows E5.1 and E5.4: tuned resonators at their true strength. */
  @ParameterizedTest
  @CsvSource({
    "1, 226.15949, -69.8871, 1",
    "1, 283.88148, -81.4531, 1",
    "1, 254.64791, 0, 1",
    "4, 212.99721, -67.9697, 2",
    "4, 298.98510, -86.6824, 2"
  })
  void tunedResonators_shiftTheModes(int count, double f, double growth, int times) {
    AcousticOperator ring = DampedRing.plain();
    double[] angles = new double[count];
    AnalyticFunction[] flows = new AnalyticFunction[count];
    for (int k = 0; k < count; k++) {
      angles[k] = 2 * Math.PI * k / count;
      flows[k] = DampedRing.resonator(800 / (2 * Math.PI * 0.5), 0.02).flow();
    }
    DampedRoots damped =
        new DampedRoots(transfer(ring, angles), IntStream.range(0, count).toArray(), flows, WINDOW);
    Complex s = new Complex(growth, 2 * Math.PI * f);
    assertThat(damped.all().roots())
        .filteredOn(r -> r.subtract(s).abs() < 1e-3 * s.abs())
        .hasSize(times);
    assertThat(damped.someRootBeyond(damped.all().worst() - 1)).isTrue();
    assertThat(damped.someRootBeyond(damped.all().worst() + 1)).isFalse();
  }

  @Test
  void rootLeftOut_isMissedByTheCount() {
    AcousticOperator ring = DampedRing.plain();
    AnalyticFunction[] flows = {DampedRing.resonator(300, 0.1).flow()};
    DampedRoots damped = new DampedRoots(transfer(ring, 0.1), new int[] {0}, flows, WINDOW);
    List<Complex> roots = damped.all().roots();
    assertThat(damped.missing(roots)).isZero();
    assertThat(damped.missing(roots.subList(1, roots.size()))).isEqualTo(1);
    assertThat(damped.missing(roots.subList(0, roots.size() - 2))).isEqualTo(2);
  }

  /** With strength growing from nothing each mode keeps its way to one of the roots. */
  @Test
  void modesGrownFromTheUndampedOnes_areRootsAllDifferent() {
    AcousticOperator ring = withFlames(DampedRing.plain());
    AnalyticFunction[] flows = {DampedRing.resonator(300, 0.5).flow()};
    DampedRoots damped = new DampedRoots(transfer(ring, 0.1), new int[] {0}, flows, WINDOW);
    List<Complex> roots = damped.all().roots();
    List<Complex> grown = new ArrayList<>();
    for (Complex[] group : damped.grownFromPoles()) {
      for (Complex s : group) {
        if (WINDOW.contains(s.getReal(), s.getImaginary() / 2 / Math.PI)) {
          grown.add(s);
        }
      }
    }
    assertThat(grown).hasSizeGreaterThanOrEqualTo(roots.size() - 2);
    for (int i = 0; i < grown.size(); i++) {
      Complex s = grown.get(i);
      assertThat(roots).anyMatch(r -> r.subtract(s).abs() < 1e-7 * s.abs());
      for (int j = 0; j < i; j++) {
        assertThat(grown.get(j).subtract(s).abs()).isGreaterThan(1e-6 * s.abs());
      }
    }
  }

  @Test
  void modesWithheld_spoilTheTransfer_andItSaysSo() {
    AcousticOperator ring = DampedRing.plain();
    PortTransfer h =
        PortSampling.of(
            new PreparedOperator(ring),
            List.of(DampedRing.at(ring, 0.1)),
            poles(ring).stream().filter(p -> p.s().getImaginary() < 2 * Math.PI * 600).toList(),
            new Window(145, 915, -410, 70));
    assertThat(h.error()).isGreaterThan(1e-4);
  }
}
