package org.annulet.mesher.mesh;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class RingReplicationTest {
  private static final double PITCH = 2 * Math.PI * 0.437 / 14; // no dyadic fraction

  @ParameterizedTest
  @ValueSource(ints = {1, 2, 3, 14, 24})
  void ring_hasTwoNTimesTheHalfCell(int count) {
    Mesh half = TestMeshes.halfCell(PITCH, 2);
    RingCells ring = RingReplication.of(half, count, PITCH);
    assertThat(MeshCheck.of(ring.whole())).isEmpty();
    assertThat(ring.whole().triangleCount()).isEqualTo(2 * count * half.triangleCount());
    double relative = MeshMeasures.area(ring.whole()) / (2 * count * MeshMeasures.area(half)) - 1;
    assertThat(Math.abs(relative)).isLessThan(1e-14);
    assertThat(ring.whole().edgeNames()).doesNotContain(RingCells.MIRROR, RingCells.SEAM);
    assertThat(Math.abs(ring.whole().period() / (count * PITCH) - 1)).isLessThan(1e-14);
  }

  @Test
  void everyCell_isTheSameToTheLastBit() {
    RingCells ring = RingReplication.of(TestMeshes.halfCell(PITCH, 2), 14, PITCH);
    Mesh whole = ring.whole();
    int perCell = whole.triangleCount() / 14;
    for (int t = 0; t < whole.triangleCount(); t++) {
      int first = t % perCell;
      assertThat(whole.area(t)).isEqualTo(whole.area(first));
      for (int k = 1; k < 3; k++) {
        assertThat(whole.cornerX(t, k)).isEqualTo(whole.cornerX(first, k));
        assertThat(whole.cornerY(t, k) - whole.cornerY(t, 0))
            .isEqualTo(whole.cornerY(first, k) - whole.cornerY(first, 0));
      }
    }
  }

  @Test
  void mirroredHalf_isMirroredToTheLastBit() {
    RingCells ring = RingReplication.of(TestMeshes.halfCell(PITCH, 2), 14, PITCH);
    Mesh whole = ring.whole();
    Map<List<Double>, Integer> at = new HashMap<>();
    for (int v = 0; v < whole.nodeCount(); v++) {
      at.put(List.of(whole.x(v), whole.y(v)), v);
    }
    for (int v = 0; v < whole.nodeCount(); v++) {
      double mirrored = whole.y(v) == 0 ? 0 : whole.period() - whole.y(v);
      assertThat(at).containsKey(List.of(whole.x(v), mirrored));
    }
    int perHalf = ring.half().triangleCount();
    for (int t = 0; t < perHalf; t++) {
      assertThat(whole.area(t)).isEqualTo(ring.half().area(t));
      assertThat(whole.area(t + perHalf)).isEqualTo(ring.half().area(t));
    }
  }

  @Test
  void everyNode_knowsItsCellAndItsNodeOfTheHalf() {
    RingCells ring = RingReplication.of(TestMeshes.halfCell(PITCH, 2), 14, PITCH);
    Mesh whole = ring.whole();
    double pitch = whole.period() / 14;
    for (int v = 0; v < whole.nodeCount(); v++) {
      int w = ring.halfNode()[v];
      double up = ring.mirrored()[v] ? -ring.half().y(w) : ring.half().y(w);
      double y = ring.cell()[v] * pitch + up;
      assertThat(whole.x(v)).isEqualTo(ring.half().x(w));
      assertThat(whole.y(v)).isEqualTo(y < 0 ? y + whole.period() : y);
    }
  }

  @Test
  void refinedHalf_laidRoundAgain_isTheRingAgain() {
    Mesh half = RingReplication.of(TestMeshes.halfCell(PITCH, 1), 14, PITCH).half();
    Mesh finer = Bisection.of(UniformRefinement.of(half).mesh(), t -> t % 5 == 0).mesh();
    RingCells ring = RingReplication.of(finer, 14, PITCH);
    assertThat(MeshCheck.of(ring.whole())).isEmpty();
    assertThat(ring.whole().triangleCount()).isEqualTo(28 * finer.triangleCount());
  }

  @Test
  void burnerLeftOut_closesItsMouths_andDisturbsNoOtherCell() {
    Mesh half = TestMeshes.halfCell(PITCH, 2);
    List<CellException> exceptions =
        List.of(
            new CellException(
                3, Set.of("burner"), Map.of(), Map.of("burner-in", "blank", "burner-out", "blank")),
            CellException.withEdges(5, Map.of("port", "damper")));
    RingCells ring = RingReplication.of(half, 14, PITCH, exceptions);
    Mesh plain = RingReplication.of(half, 14, PITCH).whole();
    Mesh whole = ring.whole();
    assertThat(MeshCheck.of(whole)).isEmpty();
    assertThat(triangles(plain)).containsAll(triangles(whole));
    int burner = whole.zoneNames().indexOf("burner");
    assertThat(MeshMeasures.zoneAreas(whole)[burner] / MeshMeasures.zoneAreas(plain)[burner])
        .isCloseTo(13 / 14.0, within(1e-13));
    assertThat(length(whole, "blank") / PITCH).isCloseTo(1, within(1e-13));
    assertThat(length(whole, "damper") / length(plain, "port")).isCloseTo(1 / 14.0, within(1e-13));
  }

  @Test
  void chamberLeftOut_needsANameForTheSeamItLaysBare() {
    Mesh half = TestMeshes.halfCell(PITCH, 2);
    assertThatThrownBy(
            () ->
                RingReplication.of(
                    half, 14, PITCH, List.of(CellException.without(0, Set.of("plenum")))))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("cell 0 leaves out a zone that reaches its seam")
        .hasMessageContaining("mend: name the wall");
    CellException named =
        new CellException(0, Set.of("plenum"), Map.of(), Map.of(RingCells.SEAM, "bulkhead"));
    Mesh whole = RingReplication.of(half, 14, PITCH, List.of(named)).whole();
    assertThat(MeshCheck.of(whole)).isEmpty();
    assertThat(whole.edgeNames()).contains("bulkhead");
  }

  @Test
  void unknownNamesAndWrongHalves_areRefused() {
    Mesh half = TestMeshes.halfCell(PITCH, 1);
    assertThatThrownBy(
            () ->
                RingReplication.of(
                    half, 14, PITCH, List.of(CellException.without(0, Set.of("burnr")))))
        .hasMessageContaining("zone 'burnr'")
        .hasMessageContaining("[plenum, burner, chamber]");
    assertThatThrownBy(() -> RingReplication.of(half, 14, 0.9 * PITCH))
        .hasMessageContaining("outside the half cell");
    assertThatThrownBy(() -> RingReplication.of(half, 14, 1.1 * PITCH))
        .hasMessageContaining("edge 'seam' and nothing else on y =");
    assertThatThrownBy(() -> RingReplication.of(half, 0, PITCH)).hasMessageContaining("positive");
  }

  private static double length(Mesh mesh, String edge) {
    return MeshMeasures.edgeLengths(mesh)[mesh.edgeNames().indexOf(edge)];
  }

  private static Set<List<Double>> triangles(Mesh mesh) {
    Set<List<Double>> all = new HashSet<>();
    for (int t = 0; t < mesh.triangleCount(); t++) {
      List<Double> corners = new ArrayList<>();
      for (int k = 0; k < 3; k++) {
        corners.add(mesh.cornerX(t, k));
        corners.add(mesh.cornerY(t, k));
      }
      all.add(corners);
    }
    return all;
  }
}
