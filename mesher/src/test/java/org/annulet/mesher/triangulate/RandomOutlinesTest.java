package org.annulet.mesher.triangulate;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.stream.LongStream;
import org.annulet.mesher.geometry.GeometryFault;
import org.annulet.mesher.geometry.Outline;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.mesher.mesh.MeshCheck;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.tinfour.common.IConstraint;
import org.tinfour.common.LinearConstraint;
import org.tinfour.common.Vertex;
import org.tinfour.standard.IncrementalTin;
import org.tinfour.utils.TriangleCollector;

class RandomOutlinesTest {
  static LongStream fewSeeds() {
    return LongStream.range(0, 40);
  }

  @Test
  void fiveHundredOutlines_meshWithinTheLaws() {
    int refused = 0;
    for (long seed = 0; seed < 500; seed++) {
      Outline o;
      try {
        o = RandomOutlines.of(seed);
      } catch (GeometryFault f) {
        // Two flat arcs beside a thin spike may truly cross.
        assertThat(f.faults())
            .as("seed %d", seed)
            .allMatch(
                x ->
                    x.kind() == GeometryFault.Kind.CROSSING
                        || x.kind() == GeometryFault.Kind.TOUCHING);
        refused++;
        continue;
      }
      Mesh m = OutlineMesher.mesh(o, Sizing.of(0.12 * RandomOutlines.scale(o)));
      assertThat(MeshCheck.of(m)).as("seed %d", seed).isEmpty();
      assertThat(MeshCheck.delaunay(m)).as("seed %d", seed).isEmpty();
      GalleryTest.checkAreasAndLengths(o, m);
      int thin = 0;
      for (int t = 0; t < m.triangleCount(); t++) {
        thin += GalleryTest.leastAngle(m, t) < 28 - 1e-9 ? 1 : 0;
      }
      assertThat(thin)
          .as("thin triangles of seed %d", seed)
          .isLessThanOrEqualTo(12 * GalleryTest.sharpCorners(o).size());
    }
    assertThat(refused).isLessThan(25);
  }

  /** Tinfour triangulates the same nodes under the same segments: the result must be ours. */
  @ParameterizedTest
  @MethodSource("fewSeeds")
  void triangles_areThoseOfAnIndependentConstrainedDelaunayTriangulation(long seed) {
    Outline o;
    try {
      o = RandomOutlines.of(seed);
    } catch (GeometryFault f) {
      return;
    }
    Mesh m = OutlineMesher.mesh(o, Sizing.of(0.2 * RandomOutlines.scale(o)));
    List<Vertex> nodes = new ArrayList<>();
    for (int v = 0; v < m.nodeCount(); v++) {
      nodes.add(new Vertex(m.x(v), m.y(v), 0, v));
    }
    IncrementalTin tin = new IncrementalTin(0.05 * RandomOutlines.scale(o));
    tin.add(nodes, null);
    List<IConstraint> constraints = new ArrayList<>();
    for (int e = 0; e < m.segmentCount(); e++) {
      LinearConstraint c =
          new LinearConstraint(List.of(nodes.get(m.segmentStart(e)), nodes.get(m.segmentEnd(e))));
      c.complete();
      constraints.add(c);
    }
    tin.addConstraints(constraints, false);
    Set<List<Integer>> theirs = new HashSet<>();
    TriangleCollector.visitTriangles(
        tin, v -> theirs.add(sorted(v[0].getIndex(), v[1].getIndex(), v[2].getIndex())));
    for (int t = 0; t < m.triangleCount(); t++) {
      assertThat(theirs)
          .as("seed %d, triangle %d", seed, t)
          .contains(sorted(m.corner(t, 0), m.corner(t, 1), m.corner(t, 2)));
    }
  }

  private static List<Integer> sorted(int... v) {
    return Arrays.stream(v).sorted().boxed().toList();
  }
}
