package org.annulet.post.meaning;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.Meshes;
import org.annulet.post.meaning.ModeLabel.Pairing;
import org.annulet.solver.modes.Mode;
import org.apache.commons.math3.special.BesselJ;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Shapes known in closed form; labels must say what the formula says. */
class LabelsTest {
  private static final double[] RATE = {500, 10};

  private static ModeLabel label(Chamber chamber, ModeView view) {
    return Labels.of(chamber, List.of(view)).get(0);
  }

  @ParameterizedTest
  @CsvSource({"0,1", "1,0", "1,2", "3,1", "7,0", "12,3"})
  void closedRing_orderAndAxialNodesAreThoseOfTheCosines(int order, int axial) {
    Mesh mesh = Meshes.ring(0.4, 2, 24, 96, "chamber");
    ModeView view =
        Meshes.mode(
            mesh,
            RATE,
            null,
            (x, y) -> Math.cos(axial * Math.PI * x / 0.4) * Math.cos(order * Math.PI * y + 0.3));
    ModeLabel label = label(Chamber.ring(mesh, new double[] {1 / Math.PI}), view);
    assertThat(label.azimuthalOrder()).isEqualTo(order);
    assertThat(label.axialNodes()).isEqualTo(axial);
    assertThat(label.radialNodes()).isZero();
    assertThat(label.bulk()).isFalse();
    assertThat(label.orderShare()).isGreaterThan(0.99);
  }

  @ParameterizedTest
  @CsvSource({"2,smaller", "-2,larger"})
  void travellingWave_runsAgainstTheSignOfItsOrder(int order, String way) {
    // p' = Re(e^{i(mθ + ωt)}): a crest keeps mθ + ωt, so θ falls with time for m > 0
    Mesh mesh = Meshes.ring(0.4, 2, 8, 64, "chamber");
    ModeView view =
        Meshes.mode(
            mesh,
            RATE,
            null,
            (x, y) -> Math.cos(order * Math.PI * y),
            (x, y) -> Math.sin(order * Math.PI * y));
    ModeLabel label = label(Chamber.ring(mesh, new double[] {1 / Math.PI}), view);
    assertThat(label.pattern()).isEqualTo("spins towards " + way + " angles");
  }

  @Test
  void standingWave_nodalLinesAreWhereTheCosineVanishes() {
    Mesh mesh = Meshes.ring(0.4, 2, 8, 144, "chamber");
    double turn = Math.toRadians(17); // cos 2(θ − 17°) vanishes at 62° and every 90° from there
    ModeView view = Meshes.mode(mesh, RATE, null, (x, y) -> Math.cos(2 * (Math.PI * y - turn)));
    assertThat(label(Chamber.ring(mesh, new double[] {1 / Math.PI}), view).pattern())
        .isEqualTo("stands, nodal lines at 62.0° + k·90.0°");
  }

  @Test
  void cylinder_firstRadialModeHasOneRadialNode() {
    // J0(3.8317 r/R): first zero of J1 (Abramowitz & Stegun table 9.5, from memory)
    Mesh mesh = Meshes.rectangle(new double[] {1, 0, 0.5}, 20, 20, "gas");
    ModeView view =
        Meshes.mode(
            mesh,
            RATE,
            0,
            (x, r) -> Math.cos(2 * Math.PI * x) * BesselJ.value(0, 3.8317 * r / 0.5));
    ModeLabel label = label(Chamber.section(mesh), view);
    assertThat(label.radialNodes()).isEqualTo(1);
    assertThat(label.axialNodes()).isEqualTo(2);
    assertThat(label.azimuthalOrder()).isZero();
    assertThat(label.pairing()).isEqualTo(Pairing.SINGLE);
  }

  @Test
  void crossSection_orderAndRadialNodesOfAnAnnularMode() {
    Mesh mesh = Meshes.annulus(0.1, 1, 24, 96);
    ModeView view =
        Meshes.mode(
            mesh,
            RATE,
            null,
            (x, y) ->
                Math.cos(2 * Math.PI * (Math.hypot(x, y) - 0.1) / 0.9)
                    * Math.sin(5 * Math.atan2(y, x)));
    ModeLabel label = label(Chamber.crossSection(mesh), view);
    assertThat(label.azimuthalOrder()).isEqualTo(5);
    assertThat(label.radialNodes()).isEqualTo(2);
  }

  @Test
  void bulk_isUniformPressureAndNotAQuarterWave() {
    Mesh mesh = Meshes.rectangle(new double[] {1, 0.2, 0.1}, 16, 4, "plenum", "chamber");
    Chamber chamber = Chamber.section(mesh);
    ModeLabel bulk =
        label(chamber, Meshes.mode(mesh, RATE, 0, (x, r) -> x <= 0.5 ? 1 : 1 - 2 * (x - 0.5)));
    assertThat(bulk.bulk()).isTrue();
    assertThat(bulk.zone()).isEqualTo("plenum");
    ModeLabel quarter =
        label(
            Chamber.section(Meshes.rectangle(new double[] {1, 0.2, 0.1}, 16, 4, "tube")),
            Meshes.mode(mesh, RATE, 0, (x, r) -> Math.cos(Math.PI * x / 2)));
    assertThat(quarter.bulk()).isFalse();
    assertThat(quarter.text()).isEqualTo("axial, no node, tube");
  }

  @Test
  void energy_ofAHalfWaveIsHalfPotentialAndHalfKinetic() {
    // cos(πx/L) with ρ = c = 1, s = iπ/L: both integrals are equal (energy theorem)
    Mesh mesh = Meshes.rectangle(new double[] {1, 0, 0.1}, 200, 2, "a", "b", "c", "d");
    ModeView view = Meshes.mode(mesh, new double[] {0.5, 0}, null, (x, y) -> Math.cos(Math.PI * x));
    EnergyShares energy = EnergyShares.of(Chamber.plane(mesh), view);
    double potential = 0;
    for (int z = 0; z < 4; z++) {
      potential += energy.potential()[z];
    }
    // second-order quadrature of 200 cells a half wave: (π/200)²/12
    assertThat(potential).isCloseTo(0.5, within(1e-4));
    // share of the first quarter: ∫₀^{1/4} cos² / (2·½) = 1/8 + 1/(4π)
    assertThat(energy.potential()[0]).isCloseTo(0.125 + 0.25 / Math.PI, within(1e-4));
  }

  @Test
  void ring_zoneOfLargerRadiusStoresMoreOfTheSameField() {
    Mesh mesh = Meshes.ring(0.4, 2, 8, 32, "inner", "outer");
    ModeView view = Meshes.mode(mesh, RATE, null, (x, y) -> 1);
    EnergyShares energy = EnergyShares.of(Chamber.ring(mesh, new double[] {0.2, 0.6}), view);
    assertThat(energy.total(1)).isCloseTo(0.75, within(1e-12));
  }

  @Test
  void turnedCopiesCloseInFrequency_areASplitPair() {
    Mesh mesh = Meshes.ring(0.4, 2, 8, 48, "chamber");
    Chamber chamber = Chamber.ring(mesh, new double[] {1 / Math.PI});
    ModeView cos = Meshes.mode(mesh, new double[] {500, 4}, null, (x, y) -> Math.cos(Math.PI * y));
    ModeView sin = Meshes.mode(mesh, new double[] {503, 1}, null, (x, y) -> Math.sin(Math.PI * y));
    ModeView far = Meshes.mode(mesh, new double[] {900, 1}, null, (x, y) -> Math.sin(Math.PI * y));
    List<ModeLabel> labels = Labels.of(chamber, List.of(cos, sin, far));
    assertThat(labels)
        .extracting(ModeLabel::pairing)
        .containsExactly(Pairing.SPLIT, Pairing.SPLIT, Pairing.SINGLE);
    assertThat(labels).extracting(ModeLabel::partner).containsExactly(1, 0, -1);
    assertThat(labels.get(0).text())
        .isEqualTo(
            "azimuthal 1, chamber, split pair (3.00 Hz and 3.00 1/s apart), stands, nodal lines at"
                + " 90.0° + k·180.0°");
  }

  @Test
  void doubleEigenvalue_isAPairWithOpenOrientation() {
    Mesh mesh = Meshes.ring(0.4, 2, 8, 48, "chamber");
    ModeView v = Meshes.mode(mesh, RATE, null, (x, y) -> Math.cos(Math.PI * y));
    Mode twice = new Mode(10, 500, v.re(), v.im(), 2, 1e-13, 3, Mode.Verdict.CONVERGED);
    ModeLabel label =
        label(
            Chamber.ring(mesh, new double[] {1}),
            new ModeView(twice, v.re(), v.im(), null, "ring", 1, 1));
    assertThat(label.text()).isEqualTo("azimuthal 1, chamber, pair, orientation open");
    assertThat(label.pattern()).isEmpty();
  }
}
