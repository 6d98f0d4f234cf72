package org.annulet.solver.medium;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;
import static org.assertj.core.api.Assertions.withinPercentage;

import java.util.Arrays;
import java.util.Map;
import org.annulet.mesher.mesh.Mesh;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.CholeskyDecomposition;
import org.apache.commons.math3.linear.EigenDecomposition;
import org.apache.commons.math3.linear.LUDecomposition;
import org.apache.commons.math3.linear.RealMatrix;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class MappedMediumTest {
  private static final double PRESSURE = 12e5;
  private static final double GAMMA_R = 1.4 * 287.05;
  private static final Gas PERFECT = new PerfectGas(287.05, 1.4);

  /**
   * A rectangle of nx by ny cells, two triangles each; zone "cold" left of the middle, "hot" right.
   */
  private static Mesh rectangle(double length, double height, int nx, int ny) {
    Mesh.Builder b = Mesh.builder();
    for (int i = 0; i <= nx; i++) {
      for (int j = 0; j <= ny; j++) {
        b.node(length * i / nx, height * j / ny);
      }
    }
    int n = ny + 1;
    for (int i = 0; i < nx; i++) {
      for (int j = 0; j < ny; j++) {
        String zone = 2 * i < nx ? "cold" : "hot";
        int a = i * n + j;
        b.triangle(a, a + n, a + n + 1, zone);
        b.triangle(a, a + n + 1, a + 1, zone);
      }
      b.segment(i * n, (i + 1) * n, "low");
      b.segment(i * n + ny, (i + 1) * n + ny, "high");
    }
    for (int j = 0; j < ny; j++) {
      b.segment(j, j + 1, "left");
      b.segment(nx * n + j, nx * n + j + 1, "right");
    }
    return b.build();
  }

  private static MappedMedium both(Mesh mesh, Gas gas, TemperatureField field) {
    ZoneGas zone = new ZoneGas(gas, field);
    return MappedMedium.of(mesh, PRESSURE, Map.of("cold", zone, "hot", zone));
  }

  private static double travel(Mesh mesh, Medium medium) {
    double sum = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      sum += mesh.area(t) / medium.soundSpeed(t);
    }
    return sum;
  }

  @Test
  void linearTemperature_keepsTheExactTravelTimeOnACoarseMesh() {
    double l = 0.3;
    Mesh mesh = rectangle(l, 0.1, 2, 1);
    AxialProfile profile = new AxialProfile(new double[] {0, l}, new double[] {600, 2100});
    MappedMedium mapped = both(mesh, PERFECT, profile);
    // ∫ dx/√(γRT) = 2 L (√T₂ − √T₁) / (√(γR) (T₂ − T₁))
    double exact = 2 * l * (Math.sqrt(2100) - Math.sqrt(600)) / (Math.sqrt(GAMMA_R) * 1500);
    assertThat(travel(mesh, mapped.medium()) / 0.1).isCloseTo(exact, withinPercentage(1e-4));
    // The temperature at the centroids alone would be 0.5 % off: the rule is what keeps it.
    double centroids = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      double x = (mesh.cornerX(t, 0) + mesh.cornerX(t, 1) + mesh.cornerX(t, 2)) / 3;
      centroids += mesh.area(t) / Math.sqrt(GAMMA_R * profile.temperature(x, 0)) / 0.1;
    }
    assertThat(Math.abs(centroids / exact - 1)).isGreaterThan(2e-3);
  }

  @Test
  void coolingFilm_thinnerThanTheElement_isCounted() {
    // 800 K within 1 mm of the wall y = 0, linear to 1800 K at 1.5 mm; elements of 20 mm.
    Mesh mesh = rectangle(0.1, 0.02, 4, 1);
    TemperatureTable film =
        TemperatureTable.onSection(
            new double[] {0, 0.1},
            new double[] {0, 0.001, 0.0015, 0.02},
            new double[][] {{800, 800, 1800, 1800}, {800, 800, 1800, 1800}});
    double root = Math.sqrt(GAMMA_R);
    double exact =
        (0.001 / Math.sqrt(800)
                + 2 * 0.0005 * (Math.sqrt(1800) - Math.sqrt(800)) / 1000
                + 0.0185 / Math.sqrt(1800))
            / root;
    MappedMedium mapped = both(mesh, PERFECT, film);
    assertThat(travel(mesh, mapped.medium()) / 0.1).isCloseTo(exact, withinPercentage(0.1));
    // Without the film it would be 2.9 % less.
    assertThat(0.02 / Math.sqrt(1800) / root / exact).isLessThan(0.975);
  }

  @Test
  void bulkModulus_isGammaTimesMeanPressureAndMixtureFollowsTemperature() {
    Mesh mesh = rectangle(0.3, 0.1, 8, 2);
    Mixture burnt =
        new Combustion(FuelBlend.pure(FuelComponent.METHANE), Air.dry(), 0.6).products();
    MappedMedium mapped =
        both(mesh, burnt, new AxialProfile(new double[] {0, 0.3}, new double[] {900, 1900}));
    for (int t = 0; t < mesh.triangleCount(); t++) {
      double kelvin = mapped.temperature(t);
      assertThat(mapped.medium().gamma(t)).isCloseTo(burnt.gamma(kelvin), withinPercentage(0.01));
      assertThat(mapped.medium().soundSpeed(t))
          .isCloseTo(burnt.soundSpeed(kelvin, PRESSURE), withinPercentage(0.05));
      assertThat(mapped.medium().density(t))
          .isCloseTo(burnt.density(kelvin, PRESSURE), withinPercentage(0.1));
    }
  }

  @Test
  void coverage_countsNodesOutsideAndGivesRanges() {
    Mesh mesh = rectangle(0.4, 0.1, 8, 2);
    ZoneGas cold = new ZoneGas(Air.dry(), new UniformTemperature(700));
    ZoneGas hot =
        new ZoneGas(PERFECT, new AxialProfile(new double[] {0.2, 0.32}, new double[] {1000, 1600}));
    MappedMedium mapped = MappedMedium.of(mesh, PRESSURE, Map.of("cold", cold, "hot", hot));
    Coverage first = mapped.coverage().get(0);
    assertThat(first.zone()).isEqualTo("cold");
    assertThat(first.extrapolatedNodes()).isZero();
    assertThat(first.temperature().mean()).isCloseTo(700, withinPercentage(1e-9));
    assertThat(first.soundSpeed().mean())
        .isCloseTo(Air.dry().soundSpeed(700, PRESSURE), withinPercentage(1e-9));
    Coverage second = mapped.coverage().get(1);
    assertThat(second.nodes()).isEqualTo(15);
    // x = 0.35 and 0.4, three nodes each.
    assertThat(second.extrapolatedNodes()).isEqualTo(6);
    assertThat(second.farthestOutside()).isCloseTo(0.08, within(1e-12));
    assertThat(second.temperature().least()).isEqualTo(1000);
    assertThat(second.temperature().largest()).isEqualTo(1600);
    // (0.12 · 1300 + 0.08 · 1600)/0.2
    assertThat(second.temperature().mean()).isCloseTo(1420, withinPercentage(0.01));
    assertThat(second.soundSpeed().least()).isLessThan(second.soundSpeed().mean());
  }

  @Test
  void misuse_isAnErrorWithZoneAndPlace() {
    Mesh mesh = rectangle(0.4, 0.1, 2, 1);
    ZoneGas air = new ZoneGas(Air.dry(), new UniformTemperature(700));
    assertThatThrownBy(() -> MappedMedium.of(mesh, PRESSURE, Map.of("cold", air)))
        .hasMessageContaining("zone 'hot' has no gas");
    assertThatThrownBy(() -> MappedMedium.of(mesh, PRESSURE, Map.of("dome", air)))
        .hasMessageContaining("'dome'")
        .hasMessageContaining("[cold, hot]");
    ZoneGas frozen = new ZoneGas(Air.dry(), new UniformTemperature(120));
    assertThatThrownBy(() -> MappedMedium.of(mesh, PRESSURE, Map.of("cold", frozen, "hot", air)))
        .hasMessageContaining("zone 'cold' has 120 K at (0, 0) m")
        .hasMessageContaining("200 to 6000 K");
    assertThatThrownBy(() -> MappedMedium.of(mesh, 0, Map.of("cold", air, "hot", air)))
        .hasMessageContaining("mean pressure");
  }

  // Rows C8 (order 0) and C9 (order m, R = 0.45 m): linear temperature, hard ends, γR = 1.4·287.05.
  // Triangles here, exact solutions in Bessel and Kummer functions there; two meshes and order 2
  // leave the fourth-order term, up to 4e-5 at 20 elements.
  @ParameterizedTest
  @CsvSource({
    "0, 1.0, 300, 1500, 287.436540, 565.343539",
    "0, 0.5, 1800, 600, 678.265014, 1345.439470",
    "0, 0.3, 800, 1900, 1209.079271, 2405.666524",
    "1, 0.3, 800, 1900, 260.176774, 1235.850435",
    "2, 0.3, 800, 1900, 518.367711, 1313.511715"
  })
  void linearTemperatureDuctAndAnnulus_haveTheExactFrequencies(
      int order, double length, double from, double to, double first, double second) {
    AxialProfile profile = new AxialProfile(new double[] {0, length}, new double[] {from, to});
    double[] coarse = frequencies(order / 0.45, length, 20, profile);
    double[] fine = frequencies(order / 0.45, length, 40, profile);
    double[] exact = {first, second};
    int skip = order == 0 ? 1 : 0; // s = 0 is a mode of a closed duct
    for (int k = 0; k < 2; k++) {
      double c = coarse[k + skip];
      double f = fine[k + skip];
      assertThat(f + (f - c) / 3).isCloseTo(exact[k], withinPercentage(6e-3));
      assertThat((c - exact[k]) / (f - exact[k])).isBetween(3.6, 4.4);
    }
  }

  /** Dense P1 eigenfrequencies of a strip with wavenumber κ across it, ascending, in Hz. */
  private static double[] frequencies(double kappa, double length, int n, AxialProfile profile) {
    Mesh mesh = rectangle(length, length / n, n, 1);
    Medium medium = both(mesh, PERFECT, profile).medium();
    int size = mesh.nodeCount();
    RealMatrix k = new Array2DRowRealMatrix(size, size);
    RealMatrix m = new Array2DRowRealMatrix(size, size);
    for (int t = 0; t < mesh.triangleCount(); t++) {
      double a = mesh.area(t);
      for (int i = 0; i < 3; i++) {
        for (int j = 0; j < 3; j++) {
          double bi = mesh.cornerY(t, (i + 1) % 3) - mesh.cornerY(t, (i + 2) % 3);
          double ci = mesh.cornerX(t, (i + 2) % 3) - mesh.cornerX(t, (i + 1) % 3);
          double bj = mesh.cornerY(t, (j + 1) % 3) - mesh.cornerY(t, (j + 2) % 3);
          double cj = mesh.cornerX(t, (j + 2) % 3) - mesh.cornerX(t, (j + 1) % 3);
          double phi = a / 12 * (i == j ? 2 : 1);
          double grad = (bi * bj + ci * cj) / (4 * a) + kappa * kappa * phi;
          k.addToEntry(mesh.corner(t, i), mesh.corner(t, j), grad / medium.density(t));
          m.addToEntry(mesh.corner(t, i), mesh.corner(t, j), phi / medium.bulkModulus(t));
        }
      }
    }
    RealMatrix l = new CholeskyDecomposition(m.scalarMultiply(1e9)).getL();
    RealMatrix inverse = new LUDecomposition(l).getSolver().getInverse();
    RealMatrix a = inverse.multiply(k.scalarMultiply(1e9)).multiply(inverse.transpose());
    RealMatrix symmetric = a.add(a.transpose()).scalarMultiply(0.5);
    double[] squares = new EigenDecomposition(symmetric).getRealEigenvalues();
    Arrays.sort(squares);
    double[] f = new double[6];
    for (int q = 0; q < 6; q++) {
      f[q] = Math.sqrt(Math.max(0, squares[q])) / (2 * Math.PI);
    }
    return f;
  }
}
