package org.annulet.mesher.mesh;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class RefinementTest {
  /** Sums of a few hundred areas round to a few ulp. */
  private static final double ROUNDING = 1e-14;

  @ParameterizedTest
  @MethodSource("org.annulet.mesher.mesh.TestMeshes#seeds")
  void uniformRefinement_keepsAreasLengthsAndNames_andHalvesTheSize(long seed) {
    Mesh coarse = TestMeshes.randomDuct(seed);
    Refinement step = UniformRefinement.of(coarse);
    Mesh fine = step.mesh();
    assertThat(MeshCheck.of(fine)).as("seed %d", seed).isEmpty();
    assertThat(MeshCheck.namesKept(coarse, fine)).isEmpty();
    assertThat(fine.zoneNames()).isEqualTo(coarse.zoneNames());
    assertThat(fine.edgeNames()).isEqualTo(coarse.edgeNames());
    assertThat(fine.triangleCount()).isEqualTo(4 * coarse.triangleCount());
    assertThat(fine.segmentCount()).isEqualTo(2 * coarse.segmentCount());
    assertClose(MeshMeasures.zoneAreas(fine), MeshMeasures.zoneAreas(coarse));
    assertClose(MeshMeasures.edgeLengths(fine), MeshMeasures.edgeLengths(coarse));
    Quality before = Quality.of(coarse);
    Quality after = Quality.of(fine);
    assertThat(2 * after.largestSize() / before.largestSize()).isCloseTo(1, within(1e-13));
    assertThat(2 * after.smallestSize() / before.smallestSize()).isCloseTo(1, within(1e-13));
    assertThat(after.smallestAngle()).isCloseTo(before.smallestAngle(), within(1e-10));
    for (int t = 0; t < fine.triangleCount(); t++) {
      assertThat(fine.zone(t)).isEqualTo(coarse.zone(step.parentTriangle(t)));
    }
  }

  @ParameterizedTest
  @MethodSource("org.annulet.mesher.mesh.TestMeshes#seeds")
  void repeatedBisectionAtACorner_conformsAndKeepsHalfTheSmallestAngle(long seed) {
    Mesh first = TestMeshes.randomDuct(seed);
    Mesh mesh = first;
    for (int i = 0; i < 10; i++) {
      Mesh now = mesh;
      Refinement step = Bisection.of(now, t -> hasNodeNear(now, t, 0.3, 0.2));
      for (int t = 0; t < step.mesh().triangleCount(); t++) {
        int parent = step.parentTriangle(t);
        if (hasNodeNear(now, parent, 0.3, 0.2)) {
          // a bisected triangle leaves at most half of it
          assertThat(step.mesh().area(t)).isLessThan(0.51 * now.area(parent));
        }
      }
      mesh = step.mesh();
    }
    assertThat(MeshCheck.of(mesh)).as("seed %d", seed).isEmpty();
    assertThat(MeshCheck.namesKept(first, mesh)).isEmpty();
    assertClose(MeshMeasures.zoneAreas(mesh), MeshMeasures.zoneAreas(first));
    Quality quality = Quality.of(mesh);
    // Rosenberg and Stenger 1975: never below half the smallest angle at the start
    assertThat(quality.smallestAngle())
        .isGreaterThan(0.5 * Quality.of(first).smallestAngle() * (1 - 1e-9));
    assertThat(quality.smallestSize()).isLessThan(0.1 * Quality.of(first).smallestSize());
    assertThat(mesh.triangleCount()).isLessThan(first.triangleCount() + 400);
  }

  @Test
  void markingNothing_changesNothing() {
    Mesh mesh = TestMeshes.randomDuct(3);
    Mesh same = Bisection.of(mesh, t -> false).mesh();
    assertThat(same.nodeCount()).isEqualTo(mesh.nodeCount());
    assertThat(same.triangleCount()).isEqualTo(mesh.triangleCount());
  }

  @Test
  void closedRing_isRefinedAcrossItsSeam() {
    Mesh ring = RingReplication.of(TestMeshes.halfCell(0.1, 1), 3, 0.1).whole();
    Mesh uniform = UniformRefinement.of(ring).mesh();
    Mesh local = Bisection.of(ring, t -> ring.cornerY(t, 0) > 0.25).mesh();
    for (Mesh mesh : new Mesh[] {uniform, local}) {
      assertThat(mesh.period()).isEqualTo(ring.period());
      assertThat(MeshCheck.of(mesh)).isEmpty();
      assertThat(MeshCheck.namesKept(ring, mesh)).isEmpty();
      assertClose(MeshMeasures.zoneAreas(mesh), MeshMeasures.zoneAreas(ring));
      assertThat(mesh.triangleCount()).isGreaterThan(ring.triangleCount());
      for (int v = 0; v < mesh.nodeCount(); v++) {
        assertThat(mesh.y(v)).isBetween(0.0, Math.nextDown(ring.period()));
      }
    }
  }

  @Test
  void newBoundaryNodes_lieOnTheCircle_soTheAreaErrorFallsFourfold() {
    EdgeCurves circles = TestMeshes.circles(0.3, 0.4);
    Mesh mesh = TestMeshes.annulus(0.3, 0.4, 2, 24);
    double exact = Math.PI * (0.16 - 0.09);
    double error = exact - MeshMeasures.area(mesh);
    for (int i = 0; i < 3; i++) {
      Refinement step = UniformRefinement.of(mesh, circles);
      assertThat(step.straightened()).isZero();
      mesh = step.mesh();
      double next = exact - MeshMeasures.area(mesh);
      assertThat(error / next).isCloseTo(4, within(0.03)); // chord error ∝ h²
      error = next;
    }
    assertThat(MeshCheck.of(mesh)).isEmpty();
    for (int e = 0; e < mesh.segmentCount(); e++) {
      int v = mesh.segmentStart(e);
      double r = mesh.edgeNames().get(mesh.segmentEdge(e)).equals("inner") ? 0.3 : 0.4;
      assertThat(Math.hypot(mesh.x(v), mesh.y(v)) / r).isCloseTo(1, within(1e-15));
    }
  }

  @Test
  void bisectionOnACircle_putsNewNodesOnIt() {
    Mesh coarse = TestMeshes.annulus(0.3, 0.4, 1, 12);
    Refinement step = Bisection.of(coarse, t -> true, TestMeshes.circles(0.3, 0.4));
    assertThat(MeshCheck.of(step.mesh())).isEmpty();
    assertThat(MeshMeasures.edgeLengths(step.mesh())[1])
        .isGreaterThan(MeshMeasures.edgeLengths(coarse)[1]);
  }

  @Test
  void curveThatWouldTurnATriangleOver_isLeftStraight_andCounted() {
    // one layer, six chords: the inner arc bulges by 0.3(1 − cos 30°) = 40 mm into a 5 mm gap
    Mesh coarse = TestMeshes.annulus(0.3, 0.305, 1, 6);
    EdgeCurves into =
        (edge, p, q) ->
            edge.equals("inner")
                ? TestMeshes.circles(0.3, 0.305).midpoint(edge, p, q)
                : EdgeCurves.STRAIGHT.midpoint(edge, p, q);
    Refinement step = UniformRefinement.of(coarse, into);
    assertThat(step.straightened()).isEqualTo(6);
    assertThat(MeshCheck.of(step.mesh())).isEmpty();
  }

  @Test
  void curveThatLeadsAstray_isRefused() {
    Mesh coarse = TestMeshes.annulus(0.3, 0.4, 1, 12);
    assertThatThrownBy(() -> UniformRefinement.of(coarse, (e, p, q) -> new double[] {9, 9}))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("further off than the segment is long");
  }

  @Test
  void prolongation_isExactForLinearFields() {
    Mesh coarse = TestMeshes.randomDuct(5);
    Refinement step = Bisection.of(coarse, t -> t % 3 == 0);
    double[] field = new double[coarse.nodeCount()];
    Arrays.setAll(field, v -> 2 * coarse.x(v) - 3 * coarse.y(v));
    double[] fine = step.prolong(field);
    for (int v = 0; v < fine.length; v++) {
      double want = 2 * step.mesh().x(v) - 3 * step.mesh().y(v);
      assertThat(fine[v]).isCloseTo(want, within(1e-15));
    }
  }

  private static boolean hasNodeNear(Mesh mesh, int t, double x, double y) {
    for (int k = 0; k < 3; k++) {
      if (Math.hypot(mesh.cornerX(t, k) - x, mesh.cornerY(t, k) - y) < 1e-9) {
        return true;
      }
    }
    return false;
  }

  private static void assertClose(double[] found, double[] wanted) {
    assertThat(found).hasSameSizeAs(wanted);
    for (int i = 0; i < wanted.length; i++) {
      assertThat(found[i] / wanted[i]).isCloseTo(1, within(ROUNDING));
    }
  }
}
