package org.annulet.solver.assembly;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Map;
import java.util.Random;
import java.util.stream.LongStream;
import java.util.stream.Stream;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.boundary.OpenEnd;
import org.annulet.solver.boundary.Rigid;
import org.annulet.solver.operator.AcousticOperator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Laws each element obeys, on random triangles and in all geometries. */
class ElementTest {
  static Stream<Long> seeds() {
    return LongStream.range(0, 20).boxed();
  }

  private static Mesh triangle(long seed) {
    Random random = new Random(seed);
    Mesh.Builder b = Mesh.builder();
    for (int k = 0; k < 3; k++) {
      b.node(random.nextDouble(), 0.1 + random.nextDouble());
    }
    b.triangle(0, 1, 2, "0");
    return b.segment(0, 1, "wall").segment(1, 2, "wall").segment(2, 0, "wall").build();
  }

  private static Stream<Geometry> geometries() {
    return Stream.of(
        new Plane(0.3),
        new Section(0),
        new Section(0, Map.of("0", new Section.Ducts(7, 0.4))),
        new CrossSection(0),
        new Ring(5, 0.7, Map.of("0", new Ring.Annulus(0.5, 0.1))));
  }

  private static Element element(Mesh mesh, Geometry geometry) {
    return new Element(new Metric(mesh, geometry), Gases.of(mesh, 500));
  }

  private static double at(double[] local, int i, int k) {
    return local[i >= k ? i * (i + 1) / 2 + k : k * (k + 1) / 2 + i];
  }

  @ParameterizedTest
  @MethodSource("seeds")
  void constantPressure_hasNoStiffness(long seed) {
    Mesh mesh = triangle(seed);
    geometries()
        .forEach(
            g -> {
              double[] k = new double[6];
              element(mesh, g).stiffness(0, k);
              for (int i = 0; i < 3; i++) {
                assertThat(at(k, i, 0) + at(k, i, 1) + at(k, i, 2))
                    .as("seed %d, %s, row %d", seed, g, i)
                    .isCloseTo(0, within(1e-13 * (k[0] + k[2] + k[5])));
              }
            });
  }

  @ParameterizedTest
  @MethodSource("seeds")
  void massOfConstantPressure_isVolumeOverBulkModulus(long seed) {
    Mesh mesh = triangle(seed);
    double area = mesh.area(0);
    double centroid = (mesh.y(0) + mesh.y(1) + mesh.y(2)) / 3;
    double round = 2 * Math.PI * centroid * area; // Pappus
    double[] volumes = {0.3 * area, round, 0.4 * round, area, 0.1 * area * 0.5 / 0.7};
    int q = 0;
    for (Geometry g : geometries().toList()) {
      double[] m = new double[6];
      element(mesh, g).mass(0, m);
      double sum = m[0] + m[2] + m[5] + 2 * (m[1] + m[3] + m[4]);
      double expected = volumes[q++] / (Gases.GAMMA * Gases.PRESSURE);
      assertThat(sum).as("seed %d, %s", seed, g).isCloseTo(expected, within(1e-13 * expected));
    }
  }

  /** ∫ |∇p|² for linear p: exact, with the arc of a ring stretched by R_z/R₀. */
  @ParameterizedTest
  @MethodSource("seeds")
  void linearPressure_hasTheExactEnergy(long seed) {
    Mesh mesh = triangle(seed);
    double gx = 1.3;
    double gy = -0.7;
    double rho = Gases.GAMMA * Gases.PRESSURE / (500.0 * 500.0);
    for (Geometry g : geometries().toList()) {
      double[] k = new double[6];
      double[] m = new double[6];
      Element element = element(mesh, g);
      element.stiffness(0, k);
      element.mass(0, m);
      double energy = 0;
      for (int i = 0; i < 3; i++) {
        for (int j = 0; j < 3; j++) {
          double pi = gx * mesh.x(i) + gy * mesh.y(i);
          double pj = gx * mesh.x(j) + gy * mesh.y(j);
          energy += pi * pj * at(k, corner(mesh, i), corner(mesh, j));
        }
      }
      double volume = (m[0] + m[2] + m[5] + 2 * (m[1] + m[3] + m[4])) * Gases.GAMMA;
      volume *= Gases.PRESSURE;
      double turn = g instanceof Ring ? 0.7 / 0.5 : 1;
      double expected = volume / rho * (gx * gx + turn * turn * gy * gy);
      assertThat(energy).as("seed %d, %s", seed, g).isCloseTo(expected, within(1e-11 * expected));
    }
  }

  private static int corner(Mesh mesh, int node) {
    for (int k = 0; k < 3; k++) {
      if (mesh.corner(0, k) == node) {
        return k;
      }
    }
    throw new AssertionError();
  }

  /** ∫ 2πr · 1/r² over an annulus of length L = 2πL ln(r_o/r_i): seven points, order h⁶. */
  @Test
  void crossStiffness_ofConstantPressure_isTheLogarithm() {
    Mesh mesh = Strips.flat(new double[] {0, 0.2}, new int[] {2}, new double[] {0.4, 0.5}, 2);
    Section section = new Section(1);
    Element element = element(mesh, section);
    double sum = 0;
    double[] k = new double[6];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      element.crossStiffness(t, k);
      sum += k[0] + k[2] + k[5] + 2 * (k[1] + k[3] + k[4]);
    }
    double rho = Gases.GAMMA * Gases.PRESSURE / (500.0 * 500.0);
    double expected = 2 * Math.PI * 0.2 * Math.log(0.5 / 0.4) / rho;
    assertThat(sum).isCloseTo(expected, within(1e-8 * expected));
  }

  @Test
  void wholeOperator_constantPressureHasNoStiffness() {
    Mesh mesh = Strips.closed(new double[] {0, 0.4, 1}, new int[] {3, 4}, Math.PI, 8);
    Ring ring =
        new Ring(4, 0.5, Map.of("0", new Ring.Annulus(0.6, 0.1), "1", new Ring.Annulus(0.45, 0.2)));
    AcousticOperator op =
        new ProblemBuilder(mesh, ring, Gases.of(mesh, 400, 800)).build().operator();
    double[] ones = new double[op.size()];
    double[] y = new double[op.size()];
    java.util.Arrays.fill(ones, 1);
    op.pattern().addProduct(op.stiffness(), ones, 1, y);
    double scale = op.stiffness()[0];
    assertThat(java.util.Arrays.stream(y).map(Math::abs).max().orElseThrow())
        .isLessThan(1e-12 * scale);
  }

  @Test
  void misuse_saysWhatAndHowToMend() {
    Mesh mesh = Strips.flat(new double[] {0, 0.5, 1}, new int[] {2, 2}, new double[] {0.1, 0.2}, 1);
    ProblemBuilder builder = new ProblemBuilder(mesh, new Plane(0.1), Gases.of(mesh, 500));
    assertThatThrownBy(() -> builder.wall("outlett", new Rigid()))
        .hasMessageContaining("no such edge")
        .hasMessageContaining("outlet");
    assertThatThrownBy(() -> builder.wall("joint1", new OpenEnd()))
        .hasMessageContaining("inside the gas");
    assertThatThrownBy(builder::section).hasMessageContaining("need a section");
    assertThatThrownBy(
            () -> new ProblemBuilder(mesh, new Ring(3, 1, Map.of()), Gases.of(mesh, 500)))
        .hasMessageContaining("no mean radius");
  }
}
