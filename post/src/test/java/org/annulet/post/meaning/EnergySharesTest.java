package org.annulet.post.meaning;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.Set;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.Meshes;
import org.junit.jupiter.api.Test;

/** Energies of fields whose integrals are elementary. Linear triangles, hence errors of h². */
class EnergySharesTest {
  private static final double TURN = 2 * Math.PI;

  /** A standing wave: cos² and sin² over the first quarter and half of the duct. */
  @Test
  void standingWave_potentialIsCosineSquared_kineticSineSquared() {
    Mesh mesh = Meshes.rectangle(new double[] {1, 0, 0.1}, 400, 4, "a", "b", "c", "d");
    double k = Math.PI / 1; // c = 1 m/s
    ModeView view = Meshes.mode(mesh, new double[] {k / TURN, 0}, null, (x, y) -> Math.cos(k * x));
    EnergyShares e = EnergyShares.of(Chamber.plane(mesh), view);
    double first = 0.25 / 2 + Math.sin(2 * k * 0.25) / (4 * k);
    double second = 0.25 / 2 - Math.sin(2 * k * 0.25) / (4 * k);
    assertThat(e.potential()[0]).isCloseTo(first, within(2e-5));
    assertThat(e.kinetic()[0]).isCloseTo(second, within(2e-5));
    assertThat(e.potential()[1]).isCloseTo(second, within(2e-5));
    assertThat(e.kinetic()[1]).isCloseTo(first, within(2e-5));
    assertThat(Arrays.stream(e.potential()).sum()).isCloseTo(0.5, within(1e-5));
    assertThat(Arrays.stream(e.kinetic()).sum()).isCloseTo(0.5, within(1e-5));
    assertThat(e.total(0)).isCloseTo(0.25, within(1e-5));
  }

  /** A wave that travels: real and imaginary part count alike, everywhere the same energy. */
  @Test
  void travellingWave_hasTheSameEnergyEverywhere() {
    Mesh mesh = Meshes.rectangle(new double[] {1, 0, 0.1}, 400, 4, "a", "b");
    double k = 3;
    ModeView view =
        Meshes.mode(
            mesh,
            new double[] {k / TURN, 0},
            null,
            (x, y) -> Math.cos(k * x),
            (x, y) -> Math.sin(k * x));
    EnergyShares e = EnergyShares.of(Chamber.plane(mesh), view);
    for (int z = 0; z < 2; z++) {
      assertThat(e.potential()[z]).isCloseTo(0.25, within(1e-5));
      assertThat(e.kinetic()[z]).isCloseTo(0.25, within(1e-5));
    }
  }

  /** p̂ = y across the plane: the slope in the second coordinate alone, oblique triangles. */
  @Test
  void slopeInEitherCoordinate_counts() {
    Mesh mesh = Meshes.rectangle(new double[] {1, 0, 1}, 7, 5, "gas");
    double rate = 2;
    ModeView view = Meshes.mode(mesh, new double[] {rate / TURN, 0}, null, (x, y) -> 3 * x - 5 * y);
    EnergyShares e = EnergyShares.of(Chamber.plane(mesh), view);
    double kinetic = (9 + 25) / (rate * rate);
    double potential = 9 / 3.0 + 25 / 3.0 - 30 / 4.0;
    assertThat(e.kinetic()[0]).isCloseTo(kinetic / (kinetic + potential), within(1e-12));
    double[] g = EnergyShares.gradient(mesh, 3, view.re());
    assertThat(g[0]).isCloseTo(3, within(1e-12));
    assertThat(g[1]).isCloseTo(-5, within(1e-12));
  }

  /** p̂ = 1 of order 2 in an annulus: ∫ r dr against m² ∫ dr/r; none of it in separate ducts. */
  @Test
  void sectionOfOrderTwo_hasAzimuthalMotion_exceptInSeparateDucts() {
    Mesh mesh = Meshes.rectangle(new double[] {0.2, 0.5, 0.5}, 2, 200, "gas");
    double rate = 3;
    ModeView view = Meshes.mode(mesh, new double[] {rate / TURN, 0}, 2, (x, r) -> 1);
    EnergyShares e = EnergyShares.of(Chamber.section(mesh), view);
    double potential = (1 - 0.25) / 2;
    double kinetic = 4 * Math.log(2) / (rate * rate);
    assertThat(e.kinetic()[0]).isCloseTo(kinetic / (kinetic + potential), within(1e-5));
    EnergyShares ducts =
        EnergyShares.of(Chamber.section(mesh).withSeparateDucts(Set.of("gas")), view);
    assertThat(ducts.kinetic()[0]).isZero();
  }

  /** On a ring the arc is shorter where the zone's radius is: slopes steeper, volume smaller. */
  @Test
  void ringZoneOfHalfTheRadius_hasHalfTheVolumeAndTwiceTheSlope() {
    Mesh mesh = Meshes.ring(0.2, TURN, 4, 360, "wide", "narrow");
    double rate = 2;
    ModeView view = Meshes.mode(mesh, new double[] {rate / TURN, 0}, null, (x, y) -> Math.cos(y));
    EnergyShares e = EnergyShares.of(Chamber.ring(mesh, new double[] {1, 0.5}), view);
    // wide: potential 1, kinetic 1/4; narrow: potential 1/2, kinetic (1/2)(4)/4
    double sum = 1 + 0.25 + 0.5 + 0.5;
    assertThat(e.potential()[0]).isCloseTo(1 / sum, within(1e-4));
    assertThat(e.kinetic()[0]).isCloseTo(0.25 / sum, within(1e-4));
    assertThat(e.potential()[1]).isCloseTo(0.5 / sum, within(1e-4));
    assertThat(e.kinetic()[1]).isCloseTo(0.5 / sum, within(1e-4));
    assertThat(e.largest()).isZero();
  }

  @Test
  void stifferGasHoldsLessPotential_denserGasLessKinetic_thickerMoreOfBoth() {
    Mesh mesh = Meshes.rectangle(new double[] {1, 0, 0.1}, 40, 2, "a", "b");
    double rate = 2;
    ModeView view = Meshes.mode(mesh, new double[] {rate / TURN, 0}, null, (x, y) -> 1 + x);
    int n = mesh.triangleCount();
    double[] density = new double[n];
    double[] modulus = new double[n];
    double[] thickness = new double[n];
    for (int t = 0; t < n; t++) {
      density[t] = mesh.zone(t) == 0 ? 4 : 1;
      modulus[t] = mesh.zone(t) == 0 ? 1 : 5;
      thickness[t] = mesh.zone(t) == 0 ? 1 : 3;
    }
    EnergyShares e =
        EnergyShares.of(
            Chamber.plane(mesh).withGas(density, modulus).withThickness(thickness), view);
    double[] potential = {(Math.pow(1.5, 3) - 1) / 3, 3 * (8 - Math.pow(1.5, 3)) / 3 / 5};
    double[] kinetic = {0.5 / 4 / 4, 3 * 0.5 / 4};
    double sum = potential[0] + potential[1] + kinetic[0] + kinetic[1];
    for (int z = 0; z < 2; z++) {
      assertThat(e.potential()[z]).isCloseTo(potential[z] / sum, within(1e-3 / sum));
      assertThat(e.kinetic()[z]).isCloseTo(kinetic[z] / sum, within(1e-9));
    }
    assertThat(e.largest()).isEqualTo(1);
  }
}
