package org.annulet.mesher.mesh;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import org.junit.jupiter.api.Test;

class QualityTest {
  @Test
  void halfSquares_have45DegreesAndTheDiagonalAsSize() {
    Mesh.Builder b = Mesh.builder();
    b.node(0, 0);
    b.node(0.1, 0);
    b.node(0.1, 0.1);
    b.node(0, 0.1);
    b.triangle(0, 1, 2, "cold");
    b.triangle(0, 2, 3, "hot");
    b.segment(0, 1, "w").segment(1, 2, "w").segment(2, 3, "w").segment(3, 0, "w");
    Quality q = Quality.of(b.build());
    assertThat(q.smallestAngle()).isCloseTo(45, within(1e-12));
    assertThat(q.largestAngle()).isCloseTo(90, within(1e-12));
    double diagonal = 0.1 * Math.sqrt(2);
    assertThat(q.largestSize()).isCloseTo(diagonal, within(1e-16));
    // λ = c/f = 340/340 = 1 m
    assertThat(q.pointsPerWavelength("hot", 340, 340)).isCloseTo(1 / diagonal, within(1e-12));
    assertThat(q.angleHistogram()).containsExactly(0, 0, 0, 0, 2, 0);
    assertThat(q.sizeHistogram()[0]).isEqualTo(2);
    assertThatThrownBy(() -> q.pointsPerWavelength("warm", 340, 340))
        .hasMessageContaining("zones are cold, hot");
    assertThatThrownBy(() -> q.pointsPerWavelength(340, 0)).hasMessageContaining("positive");
  }

  @Test
  void worstTriangles_comeWorstFirst_andHistogramsCountEveryTriangle() {
    Mesh mesh = TestMeshes.randomDuct(7);
    Quality q = Quality.of(mesh);
    assertThat(q.worst()).hasSize(5);
    assertThat(q.worst().get(0).smallestAngle()).isEqualTo(q.smallestAngle());
    assertThat(q.worst())
        .isSortedAccordingTo(java.util.Comparator.comparingDouble(Quality.Triangle::smallestAngle));
    assertThat(Arrays.stream(q.angleHistogram()).sum()).isEqualTo(mesh.triangleCount());
    assertThat(Arrays.stream(q.sizeHistogram()).sum()).isEqualTo(mesh.triangleCount());
    assertThat(q.lines()).contains("worst triangles:").hasSize(3 + 1 + 6 + 1 + 12 + 1 + 5);
  }
}
