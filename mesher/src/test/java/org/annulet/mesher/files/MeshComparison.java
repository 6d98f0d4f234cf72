package org.annulet.mesher.files;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.HashSet;
import java.util.List;
import java.util.Set;
import org.annulet.mesher.mesh.Mesh;

/** Field-by-field comparison of two meshes; triangles and segments may come in another order. */
final class MeshComparison {
  private MeshComparison() {}

  static void assertSame(Mesh found, Mesh wanted) {
    assertThat(found.period()).isEqualTo(wanted.period());
    assertThat(found.nodeCount()).isEqualTo(wanted.nodeCount());
    for (int v = 0; v < wanted.nodeCount(); v++) {
      assertThat(found.x(v)).isEqualTo(wanted.x(v));
      assertThat(found.y(v)).isEqualTo(wanted.y(v));
    }
    assertThat(triangles(found)).isEqualTo(triangles(wanted)).hasSize(wanted.triangleCount());
    assertThat(segments(found)).isEqualTo(segments(wanted)).hasSize(wanted.segmentCount());
  }

  private static Set<List<Object>> triangles(Mesh m) {
    Set<List<Object>> set = new HashSet<>();
    for (int t = 0; t < m.triangleCount(); t++) {
      String zone = m.zoneNames().get(m.zone(t));
      set.add(List.of(zone, m.corner(t, 0), m.corner(t, 1), m.corner(t, 2)));
    }
    return set;
  }

  private static Set<List<Object>> segments(Mesh m) {
    Set<List<Object>> set = new HashSet<>();
    for (int e = 0; e < m.segmentCount(); e++) {
      String edge = m.edgeNames().get(m.segmentEdge(e));
      set.add(List.of(edge, m.segmentStart(e), m.segmentEnd(e)));
    }
    return set;
  }
}
