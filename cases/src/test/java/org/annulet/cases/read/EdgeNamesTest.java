package org.annulet.cases.read;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Stream;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.mesher.triangulate.RingMesher;
import org.annulet.mesher.triangulate.Sizing;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Names the reader knows beforehand are those the mesher gives. */
class EdgeNamesTest {
  private static final Geometry.RingZone ANNULUS = new Geometry.Annulus("a", 0.3, 0.1, 0.1);
  private static final Geometry.RingZone OTHER = new Geometry.Annulus("b", 0.35, 0.1, 0.1);
  private static final Geometry.RingZone DUCTS = new Geometry.Ducts("d", 0.3, 0.05, 0.1);
  private static final Geometry.RingZone WIDE = new Geometry.Ducts("w", 0.3, 0.08, 0.1);

  static Stream<List<Geometry.RingZone>> rings() {
    return Stream.of(
        List.of(ANNULUS),
        List.of(ANNULUS, OTHER),
        List.of(ANNULUS, DUCTS, OTHER),
        List.of(DUCTS, ANNULUS),
        List.of(ANNULUS, DUCTS),
        List.of(ANNULUS, DUCTS, WIDE, OTHER),
        List.of(ANNULUS, WIDE, DUCTS, OTHER));
  }

  @ParameterizedTest
  @MethodSource("rings")
  void namesOfReaderAndMesher_agree(List<Geometry.RingZone> zones) {
    Geometry.Ring ring =
        new Geometry.Ring(10, 0.3, zones, new Geometry.MeshSize(0.05, Map.of(), 0));
    EdgeNames names = EdgeNames.of(ring);
    Mesh mesh = RingMesher.mesh(DrawnShape.ring(ring), Sizing.builder(0.05).build()).whole();
    Set<String> read = new TreeSet<>(names.all());
    read.removeIf(n -> n.endsWith("_face")); // faces lie in the plane of the mesh
    assertThat(read).isEqualTo(new TreeSet<>(mesh.edgeNames()));
    for (int e = 0; e < mesh.segmentCount(); e++) {
      String edge = mesh.edgeNames().get(mesh.segmentEdge(e));
      assertThat(names.inner().containsKey(edge)).as(edge).isEqualTo(mesh.segmentRight(e) >= 0);
      if (mesh.segmentRight(e) >= 0) {
        assertThat(names.inner().get(edge))
            .containsExactlyInAnyOrder(
                mesh.zoneNames().get(mesh.zone(mesh.segmentLeft(e))),
                mesh.zoneNames().get(mesh.zone(mesh.segmentRight(e))));
      }
    }
  }
}
