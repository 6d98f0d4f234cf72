package org.annulet.post.meaning;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.List;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.Meshes;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.api.Test;

/** Maps at nodes: units, worst of several, places in words. */
class ModeMapsTest {
  private static final Mesh BOX = Meshes.rectangle(new double[] {1, 0, 0.5}, 4, 2, "gas");

  @Test
  void bestPlace_isTheStrongestDamping_andTheWorstOfSeveralTheLargestGrowth() {
    double nan = Double.NaN;
    ModeMaps a = new ModeMaps(new double[] {nan, -1, -5, -3}, new double[4]);
    ModeMaps b = new ModeMaps(new double[] {nan, -4, 2, -2}, new double[4]);
    assertThat(ModeMaps.best(a.damper())).isEqualTo(2);
    double[] worst = ModeMaps.worst(List.of(a, b));
    assertThat(worst).containsExactly(nan, -1, 2, -2);
    assertThat(ModeMaps.best(worst)).isEqualTo(3);
    assertThat(ModeMaps.best(new double[] {nan, nan})).isEqualTo(-1);
  }

  /** −Re(s · lp/Λ)/(ρc) at walls; ρc = √(2 · 8) = 4. */
  @Test
  void damperMap_dividesByTheImpedanceOfTheGas() {
    double[] density = new double[BOX.triangleCount()];
    double[] modulus = new double[BOX.triangleCount()];
    Arrays.fill(density, 2);
    Arrays.fill(modulus, 8);
    Chamber chamber = Chamber.plane(BOX).withGas(density, modulus);
    double[][] product = new double[2][BOX.nodeCount()];
    Arrays.fill(product[0], 0.1);
    Arrays.fill(product[1], 0.3);
    double[] map = ModeMaps.damper(chamber, new Complex(-3, 100), product);
    int inner = 0;
    for (int v = 0; v < map.length; v++) {
      boolean wall =
          BOX.x(v) == 0 || BOX.x(v) == 1 || BOX.y(v) == 0 || BOX.y(v) == 0.5; // exact in binary
      if (wall) {
        assertThat(map[v]).isCloseTo(-(-0.3 - 30) / 4, within(1e-12));
      } else {
        assertThat(map[v]).isNaN();
        inner++;
      }
    }
    assertThat(inner).isEqualTo(3);
  }

  @Test
  void placesInWords_nameEdgeOrZone_andLeaveTheAngleOutWhereAllAreAlike() {
    double[] flat = new double[BOX.nodeCount()];
    assertThat(Place.words(Chamber.section(BOX), 0, flat))
        .isEqualTo("edge left and low at x = 0 mm, r = 0 mm");
    Mesh mesh = Meshes.ring(0.4, 2, 4, 12, "chamber");
    Chamber ring = Chamber.ring(mesh, new double[] {0.3});
    int node = 12 + 3; // second row, a quarter round
    double[] map = new double[mesh.nodeCount()];
    assertThat(Place.words(ring, node, map)).isEqualTo("zone chamber at x = 100 mm, all round");
    map[node] = -1;
    assertThat(Place.words(ring, node, map)).isEqualTo("zone chamber at x = 100 mm, 90°");
  }
}
