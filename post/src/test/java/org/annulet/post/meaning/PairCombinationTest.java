package org.annulet.post.meaning;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.Meshes;
import org.junit.jupiter.api.Test;

class PairCombinationTest {
  @Test
  void skewBasisOfAPair_givesTheTwoTravellingAndTheTwoStandingWaves() {
    Mesh mesh = Meshes.ring(0.4, 2, 8, 72, "chamber");
    Chamber chamber = Chamber.ring(mesh, new double[] {1 / Math.PI});
    double[] rate = {300, 0};
    ModeView a = Meshes.mode(mesh, rate, null, (x, y) -> Math.cos(2 * Math.PI * y - 0.4) * (1 + x));
    ModeView b =
        Meshes.mode(
            mesh,
            rate,
            null,
            (x, y) -> 0.3 * Math.cos(2 * Math.PI * y) * (1 + x),
            (x, y) -> Math.sin(2 * Math.PI * y + 1) * (1 + x));
    List<PairCombination> all = PairCombination.of(chamber, a, b, 2);
    assertThat(all).hasSize(4);
    double[][] expected = new double[4][4];
    for (int v = 0; v < mesh.nodeCount(); v += 7) {
      double angle = 2 * Math.PI * mesh.y(v);
      double[][] shape = {
        {Math.cos(angle), Math.sin(angle)},
        {Math.cos(angle), -Math.sin(angle)},
        {Math.cos(angle), 0},
        {Math.sin(angle), 0}
      };
      for (int k = 0; k < 4; k++) {
        PairCombination c = all.get(k);
        double re =
            c.first().getReal() * a.re()[v]
                - c.first().getImaginary() * a.im()[v]
                + c.second().getReal() * b.re()[v]
                - c.second().getImaginary() * b.im()[v];
        double im =
            c.first().getReal() * a.im()[v]
                + c.first().getImaginary() * a.re()[v]
                + c.second().getReal() * b.im()[v]
                + c.second().getImaginary() * b.re()[v];
        double amplitude = 1 + mesh.x(v);
        if (expected[k][2] == 0) { // the common scale, from the first node
          double square = shape[k][0] * shape[k][0] + shape[k][1] * shape[k][1];
          if (square < 0.2) {
            continue;
          }
          expected[k][0] = (re * shape[k][0] + im * shape[k][1]) / square / amplitude;
          expected[k][1] = (im * shape[k][0] - re * shape[k][1]) / square / amplitude;
          expected[k][2] = 1;
        }
        double gr = expected[k][0];
        double gi = expected[k][1];
        double size = Math.hypot(gr, gi);
        // strips average a linear interpolant of the wave: relative error (mh)² ≈ 0.03/12
        assertThat(re)
            .isCloseTo((gr * shape[k][0] - gi * shape[k][1]) * amplitude, within(0.01 * size));
        assertThat(im)
            .isCloseTo((gr * shape[k][1] + gi * shape[k][0]) * amplitude, within(0.01 * size));
      }
    }
  }

  @Test
  void parallelFields_areNoPair() {
    Mesh mesh = Meshes.ring(0.4, 2, 4, 48, "chamber");
    ModeView a = Meshes.mode(mesh, new double[] {300, 0}, null, (x, y) -> Math.cos(Math.PI * y));
    assertThat(PairCombination.of(Chamber.ring(mesh, new double[] {1}), a, a, 1)).isEmpty();
  }
}
