package org.annulet.mesher.mesh;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.Map;
import java.util.Set;
import java.util.stream.Collectors;
import org.annulet.mesher.mesh.MeshCheck.Finding;
import org.annulet.mesher.mesh.MeshCheck.Law;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class MeshCheckTest {
  @ParameterizedTest
  @MethodSource("org.annulet.mesher.mesh.TestMeshes#seeds")
  void randomDucts_obeyEveryLaw(long seed) {
    assertThat(MeshCheck.of(TestMeshes.randomDuct(seed))).as("seed %d", seed).isEmpty();
  }

  @Test
  void annulusAndRing_obeyEveryLaw() {
    assertThat(MeshCheck.of(TestMeshes.annulus(0.3, 0.4, 2, 24))).isEmpty();
    RingCells ring = RingReplication.of(TestMeshes.halfCell(0.1, 2), 6, 0.1);
    assertThat(MeshCheck.of(ring.whole())).isEmpty();
    assertThat(MeshCheck.of(ring.half())).isEmpty();
  }

  @Test
  void fanThatGoesRoundTwice_isFoundAtItsHub() {
    // a pentagram: every area is positive and every side has one triangle on each hand
    assertThat(MeshCheck.of(fan(2)))
        .anySatisfy(f -> assertThat(f.what()).contains("add up to 720"))
        .anySatisfy(f -> assertThat(f.what()).contains("touch or cross"));
    assertThat(MeshCheck.of(fan(1))).isEmpty();
  }

  @Test
  void hangingNode_isFound() {
    Mesh.Builder b = Mesh.builder();
    int[] v = {b.node(0, 0), b.node(1, 0), b.node(1, 1), b.node(0, 1), b.node(2, 0), b.node(2, 1)};
    int hanging = b.node(1, 0.5);
    b.triangle(v[0], v[1], v[2], "z");
    b.triangle(v[0], v[2], v[3], "z");
    b.triangle(v[1], v[4], hanging, "z");
    b.triangle(v[4], v[5], hanging, "z");
    b.triangle(v[5], v[2], hanging, "z");
    b.segment(v[0], v[1], "w").segment(v[1], v[4], "w").segment(v[4], v[5], "w");
    b.segment(v[5], v[2], "w").segment(v[2], v[3], "w").segment(v[3], v[0], "w");
    b.segment(v[1], v[2], "w").segment(v[1], hanging, "w").segment(hanging, v[2], "w");
    assertThat(laws(b.build())).contains(Law.CLOSED_LOOPS);
  }

  @Test
  void doubledNodes_areFound() {
    Mesh.Builder b = Mesh.builder();
    b.node(0, 0);
    b.node(1, 0);
    b.node(0, 1);
    b.node(1, 0);
    b.node(1, 1);
    b.node(0, 1);
    b.triangle(0, 1, 2, "z");
    b.triangle(3, 4, 5, "z");
    b.segment(0, 1, "w").segment(1, 2, "w").segment(2, 0, "w");
    b.segment(3, 4, "w").segment(4, 5, "w").segment(5, 3, "w");
    assertThat(laws(b.build())).contains(Law.CONFORMING);
  }

  @Test
  void unusedNode_isFound() {
    Mesh.Builder b = Mesh.builder();
    b.node(0, 0);
    b.node(1, 0);
    b.node(0, 1);
    b.node(0.2, 0.2);
    b.triangle(0, 1, 2, "z");
    b.segment(0, 1, "w").segment(1, 2, "w").segment(2, 0, "w");
    assertThat(MeshCheck.of(b.build()))
        .anySatisfy(f -> assertThat(f.what()).contains("node 3 belongs to no triangle"));
  }

  @Test
  void partsThatMeetInANodeAlone_areFound() {
    Mesh.Builder b = Mesh.builder();
    b.node(0, 0);
    b.node(1, 0);
    b.node(0, 1);
    b.node(-1, 0);
    b.node(0, -1);
    b.triangle(0, 1, 2, "z");
    b.triangle(0, 3, 4, "z");
    b.segment(0, 1, "w").segment(1, 2, "w").segment(2, 0, "w");
    b.segment(0, 3, "w").segment(3, 4, "w").segment(4, 0, "w");
    assertThat(laws(b.build())).contains(Law.CLOSED_LOOPS);
  }

  /** A frame of eight squares round a hole that touches the outer boundary in a corner: sound. */
  @Test
  void boundaryThatPassesANodeTwice_isSound_butAMissingLoopIsNot() {
    Mesh.Builder b = Mesh.builder();
    // two triangles that share node 0 and are joined round it by the triangles of the other side
    int[] v = new int[8];
    double[][] p = {{0, 0}, {2, -1}, {2, 1}, {0, 2}, {-2, 1}, {-2, -1}, {-1, 3}, {1, 3}};
    for (int k = 0; k < v.length; k++) {
      v[k] = b.node(p[k][0], p[k][1]);
    }
    // right fan at 0: (0,1,2); left fan: (0,4,5); joined over the top, a hole between 0, 2, 3, 4
    b.triangle(v[0], v[1], v[2], "z");
    b.triangle(v[0], v[4], v[5], "z");
    b.triangle(v[2], v[7], v[3], "z");
    b.triangle(v[3], v[7], v[6], "z");
    b.triangle(v[3], v[6], v[4], "z");
    int far = b.node(3, 2);
    int wide = b.node(-3, 2);
    b.triangle(v[1], far, v[2], "z");
    b.triangle(v[2], far, v[7], "z");
    b.triangle(v[4], wide, v[5], "z");
    b.triangle(v[6], wide, v[4], "z");
    b.segment(v[0], v[1], "out").segment(v[1], far, "out").segment(far, v[7], "out");
    b.segment(v[7], v[6], "out").segment(v[6], wide, "out").segment(wide, v[5], "out");
    b.segment(v[5], v[0], "out");
    b.segment(v[0], v[4], "in").segment(v[4], v[3], "in").segment(v[3], v[2], "in");
    b.segment(v[2], v[0], "in");
    assertThat(MeshCheck.of(b.build())).isEmpty();
  }

  @Test
  void sliver_isFound() {
    Mesh.Builder b = Mesh.builder();
    b.node(0, 0);
    b.node(1, 0);
    b.node(0.5, 1e-12);
    b.triangle(0, 1, 2, "z");
    b.segment(0, 1, "w").segment(1, 2, "w").segment(2, 0, "w");
    assertThat(laws(b.build())).contains(Law.POSITIVE_AREA);
  }

  @Test
  void flatDiagonal_isNotDelaunay_shortOneIs() {
    assertThat(MeshCheck.delaunay(kite("long"))).hasSize(1);
    assertThat(MeshCheck.delaunay(kite("short"))).isEmpty();
  }

  @Test
  void namedDiagonal_isExemptFromDelaunay() {
    assertThat(MeshCheck.delaunay(kite("named"))).isEmpty();
  }

  @Test
  void areasAndLengths_areComparedWithTheOutline() {
    Mesh mesh = TestMeshes.annulus(0.3, 0.4, 2, 24);
    double polygon = 24 * Math.sin(Math.PI / 12) / 2 * (0.16 - 0.09);
    double chord = 48 * Math.sin(Math.PI / 24);
    Map<String, Double> lengths = Map.of("inner", 0.3 * chord, "outer", 0.4 * chord);
    MeshCheck.Expected right = new MeshCheck.Expected(Map.of("gap", polygon), lengths, 1e-13);
    assertThat(MeshCheck.against(mesh, right)).isEmpty();
    MeshCheck.Expected wrong =
        new MeshCheck.Expected(
            Map.of("gap", polygon * 1.001), Map.of("inner", 0.3 * chord, "exit", 1.0), 1e-6);
    assertThat(MeshCheck.against(mesh, wrong))
        .extracting(Finding::law)
        .containsExactly(Law.NAMES, Law.NAMES, Law.AREA);
    assertThat(MeshCheck.against(mesh, wrong))
        .anySatisfy(
            f -> assertThat(f).hasToString("names: edge 'exit' is lost; present are inner, outer"));
  }

  @Test
  void strictVariant_namesLawAndPlace() {
    assertThatThrownBy(() -> MeshCheck.requireSound(fan(2)))
        .isInstanceOf(UnsoundMeshException.class)
        .hasMessageContaining("conforming: the angles about node")
        .hasMessageContaining("at (1.2, 0.5) m")
        .hasMessageContaining("mend:");
    Mesh sound = fan(1);
    assertThat(MeshCheck.requireSound(sound)).isSameAs(sound);
  }

  private static Mesh fan(int turns) {
    Mesh.Builder b = Mesh.builder();
    for (int i = 0; i < 5; i++) {
      double angle = 2 * Math.PI * turns * i / 5;
      b.node(1.2 + Math.cos(angle), 0.5 + Math.sin(angle));
    }
    b.node(1.2, 0.5);
    for (int i = 0; i < 5; i++) {
      b.triangle(i, (i + 1) % 5, 5, "z");
      b.segment(i, (i + 1) % 5, "w");
    }
    return b.build();
  }

  private static Mesh kite(String kind) {
    Mesh.Builder b = Mesh.builder();
    b.node(-1, 0);
    b.node(0, -0.3);
    b.node(1, 0);
    b.node(0, 0.3);
    if (kind.equals("short")) {
      b.triangle(0, 1, 3, "z");
      b.triangle(2, 3, 1, "z");
    } else {
      b.triangle(0, 1, 2, "z");
      b.triangle(0, 2, 3, "z");
    }
    for (int i = 0; i < 4; i++) {
      b.segment(i, (i + 1) % 4, "w");
    }
    if (kind.equals("named")) {
      b.segment(0, 2, "sheet");
    }
    return b.build();
  }

  private static Set<Law> laws(Mesh mesh) {
    return MeshCheck.of(mesh).stream().map(Finding::law).collect(Collectors.toSet());
  }
}
