package org.annulet.mesher.triangulate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import org.annulet.mesher.geometry.GeometryFault;
import org.annulet.mesher.geometry.RingShape;
import org.annulet.mesher.geometry.RingShape.RingZone;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.mesher.mesh.RingCells;
import org.junit.jupiter.api.Test;

class RingMesherTest {
  private static final RingShape RING =
      new RingShape(
          14,
          0.33,
          List.of(
              RingZone.annulus("plenum", 0.36, 0.08, 0.2),
              RingZone.ducts("burners", 0.345, 0.052, 0.1),
              RingZone.annulus("chamber", 0.33, 0.115, 0.31)));

  private static Map<String, Double> edgeLengths(Mesh m) {
    Map<String, Double> sum = new TreeMap<>();
    for (int e = 0; e < m.segmentCount(); e++) {
      sum.merge(m.edgeNames().get(m.segmentEdge(e)), m.segmentLength(e), Double::sum);
    }
    return sum;
  }

  private static Map<String, Double> zoneAreas(Mesh m) {
    Map<String, Double> sum = new TreeMap<>();
    for (int t = 0; t < m.triangleCount(); t++) {
      sum.merge(m.zoneNames().get(m.zone(t)), m.area(t), Double::sum);
    }
    return sum;
  }

  @Test
  void wholeRing_hasTheAreasAndEdgeLengthsOfItsDrawing() {
    Mesh m = RingMesher.mesh(RING, Sizing.of(0.02)).whole();
    double width = 0.052 * 0.33 / 0.345;
    double round = 2 * Math.PI * 0.33;
    assertThat(zoneAreas(m).get("plenum")).isCloseTo(0.2 * round, within(1e-12));
    assertThat(zoneAreas(m).get("burners")).isCloseTo(14 * 0.1 * width, within(1e-12));
    assertThat(zoneAreas(m).get("chamber")).isCloseTo(0.31 * round, within(1e-12));
    Map<String, Double> lengths = edgeLengths(m);
    assertThat(lengths.keySet())
        .containsExactlyInAnyOrder(
            "plenum.upstream",
            "plenum.downstream",
            "burners.inlet",
            "burners.side",
            "burners.outlet",
            "chamber.upstream",
            "chamber.downstream");
    assertThat(lengths.get("plenum.upstream")).isCloseTo(round, within(1e-12));
    assertThat(lengths.get("burners.inlet")).isCloseTo(14 * width, within(1e-12));
    assertThat(lengths.get("burners.side")).isCloseTo(28 * 0.1, within(1e-12));
    assertThat(lengths.get("chamber.upstream")).isCloseTo(round - 14 * width, within(1e-12));
  }

  @Test
  void everyCell_isTheHalfCellToTheLastBit() {
    RingCells cells = RingMesher.mesh(RING, Sizing.of(0.02));
    Mesh m = cells.whole();
    Mesh half = cells.half();
    double pitch = m.period() / 14;
    for (int v = 0; v < m.nodeCount(); v++) {
      int h = cells.halfNode()[v];
      double centre = cells.cell()[v] * pitch;
      double y = cells.mirrored()[v] ? centre - half.y(h) : centre + half.y(h);
      y = y < 0 ? y + m.period() : y >= m.period() ? y - m.period() : y;
      assertThat(m.x(v)).isEqualTo(half.x(h));
      assertThat(m.y(v)).isEqualTo(y);
    }
    Map<Long, Integer> areas = new HashMap<>();
    for (int t = 0; t < m.triangleCount(); t++) {
      areas.merge(Double.doubleToLongBits(m.area(t)), 1, Integer::sum);
    }
    // 14 cells of two halves: each bit pattern of an area turns up a multiple of 28 times.
    assertThat(areas.values()).allMatch(n -> n % 28 == 0);
    assertThat(m.triangleCount()).isEqualTo(28 * half.triangleCount());
  }

  @Test
  void missingBurner_leavesOutItsDuctAndClosesTheOpenings() {
    Mesh all = RingMesher.mesh(RING, Sizing.of(0.02)).whole();
    Mesh some = RingMesher.mesh(RING.without(Set.of(3, 4)), Sizing.of(0.02)).whole();
    double width = 0.052 * 0.33 / 0.345;
    assertThat(zoneAreas(some).get("burners"))
        .isCloseTo(zoneAreas(all).get("burners") * 12 / 14, within(1e-12));
    assertThat(edgeLengths(some).get("plenum.downstream"))
        .isCloseTo(edgeLengths(all).get("plenum.downstream") + 2 * width, within(1e-12));
    assertThat(edgeLengths(some).get("chamber.upstream"))
        .isCloseTo(edgeLengths(all).get("chamber.upstream") + 2 * width, within(1e-12));
    assertThat(edgeLengths(some).get("burners.side")).isCloseTo(24 * 0.1, within(1e-12));
  }

  @Test
  void everyOrderOfZones_meshes() {
    RingZone a = RingZone.annulus("a", 0.3, 0.05, 0.1);
    RingZone b = RingZone.annulus("b", 0.33, 0.08, 0.05);
    RingZone d = RingZone.ducts("d", 0.32, 0.04, 0.06);
    RingZone e = RingZone.ducts("e", 0.32, 0.03, 0.06);
    for (List<RingZone> zones :
        List.of(
            List.of(a),
            List.of(a, b),
            List.of(d, a),
            List.of(a, d),
            List.of(d, a, e),
            List.of(a, d, e, b),
            List.of(a, e, d, b),
            List.of(d))) {
      for (int n : new int[] {1, 2, 16}) {
        RingShape shape = new RingShape(n, 0.33, zones);
        Mesh m = RingMesher.mesh(shape, Sizing.of(0.03)).whole();
        double area = 0;
        for (int z = 0; z < zones.size(); z++) {
          area += n * shape.arcWidth(z) * zones.get(z).length();
        }
        assertThat(zoneAreas(m).values().stream().mapToDouble(x -> x).sum())
            .isCloseTo(area, within(1e-12));
      }
    }
    Mesh joint = RingMesher.mesh(new RingShape(4, 0.33, List.of(a, b)), Sizing.of(0.05)).whole();
    assertThat(joint.edgeNames())
        .containsExactlyInAnyOrder("a.upstream", "b.inlet", "b.downstream");
  }

  @Test
  void ductsTooWideForTheirPitch_areRefusedWithTheNumbers() {
    assertThatThrownBy(
            () -> new RingShape(14, 0.33, List.of(RingZone.ducts("burners", 0.1, 0.052, 0.1))))
        .isInstanceOf(GeometryFault.class)
        .hasMessageContaining("burners")
        .hasMessageContaining("0.052")
        .hasMessageContaining("mend:");
  }

  @Test
  void sizes_areLargestSides() {
    RingCells cells = RingMesher.mesh(RING, Sizing.builder(0.02).zone("burners", 0.008).build());
    Mesh m = cells.half();
    List<Double> sides = new ArrayList<>();
    for (int t = 0; t < m.triangleCount(); t++) {
      boolean duct = m.zoneNames().get(m.zone(t)).equals("burners");
      for (int k = 0; k < 3; k++) {
        double d =
            Math.hypot(
                m.cornerX(t, k) - m.cornerX(t, (k + 1) % 3),
                m.cornerY(t, k) - m.cornerY(t, (k + 1) % 3));
        assertThat(d).isLessThanOrEqualTo(duct ? 0.008001 : 0.02001);
        sides.add(d);
      }
    }
    // and not wastefully below: the middle side of the coarse zones is above half of the largest
    sides.sort(null);
    assertThat(sides.get(sides.size() - 1)).isGreaterThan(0.015);
  }
}
