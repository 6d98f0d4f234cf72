package org.annulet.mesher.triangulate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.math.BigDecimal;
import java.util.Random;
import org.annulet.mesher.geometry.GeometryFault;
import org.annulet.mesher.geometry.Outline;
import org.annulet.mesher.mesh.Mesh;
import org.junit.jupiter.api.Test;

class OutlineMesherTest {
  private static Outline disc(double radius) {
    return Outline.builder()
        .point("e", radius, 0)
        .point("n", 0, radius)
        .point("w", -radius, 0)
        .point("s", 0, -radius)
        .arc("upper", "e", "n", "w")
        .arc("lower", "w", "s", "e")
        .zone("gas", "upper", "lower")
        .build();
  }

  @Test
  void nodeCap_stopsWithPlaceAndRemedy() {
    assertThatThrownBy(
            () -> OutlineMesher.mesh(disc(1), Sizing.builder(0.01).nodeCap(2000).build()))
        .isInstanceOf(MeshingLimitException.class)
        .hasMessageContaining("more than 2000 nodes")
        .hasMessageContaining(") m")
        .hasMessageContaining("mend:");
    assertThatThrownBy(
            () -> OutlineMesher.mesh(disc(1), Sizing.builder(0.0001).nodeCap(2000).build()))
        .isInstanceOf(MeshingLimitException.class)
        .hasMessageContaining("edge 'upper'");
  }

  @Test
  void sizeForAnUnknownName_listsTheNames() {
    assertThatThrownBy(
            () ->
                OutlineMesher.mesh(
                    disc(1), Sizing.builder(0.1).edge("uper", 0.01).zone("air", 0.1).build()))
        .isInstanceOf(GeometryFault.class)
        .hasMessageContaining("'uper'")
        .hasMessageContaining("upper, lower")
        .hasMessageContaining("'air'")
        .hasMessageContaining("gas");
  }

  @Test
  void boundaryNodes_lieOnTheTrueCircle_andSoDoTheMiddlesOfItsSegments() {
    Outline o = disc(0.3);
    Mesh m = OutlineMesher.mesh(o, Sizing.of(0.05));
    OutlineCurves curves = new OutlineCurves(o);
    for (int e = 0; e < m.segmentCount(); e++) {
      int a = m.segmentStart(e);
      int b = m.segmentEnd(e);
      assertThat(Math.hypot(m.x(a), m.y(a))).isCloseTo(0.3, within(1e-15));
      String edge = m.edgeNames().get(m.segmentEdge(e));
      double[] p = {m.x(a), m.y(a)};
      double[] q = {m.x(b), m.y(b)};
      double[] mid = curves.midpoint(edge, p, q);
      assertThat(Math.hypot(mid[0], mid[1])).isCloseTo(0.3, within(1e-15));
      assertThat(curves.midpoint(edge, q, p)).isEqualTo(mid);
    }
  }

  @Test
  void reentrantCorner_isGradedInto_unlessToldOtherwise() {
    Outline l = Gallery.polygon(0, 0, 1, 0, 1, 0.5, 0.5, 0.5, 0.5, 1, 0, 1);
    double graded = shortestSideAt(OutlineMesher.mesh(l, Sizing.of(0.1)), 0.5, 0.5);
    double plain =
        shortestSideAt(OutlineMesher.mesh(l, Sizing.builder(0.1).cornerShare(1).build()), 0.5, 0.5);
    assertThat(graded).isLessThan(0.026);
    assertThat(plain).isGreaterThan(0.05);
  }

  private static double shortestSideAt(Mesh m, double x, double y) {
    double least = Double.POSITIVE_INFINITY;
    for (int t = 0; t < m.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        if (m.cornerX(t, k) == x && m.cornerY(t, k) == y) {
          for (int i = 1; i < 3; i++) {
            least =
                Math.min(
                    least,
                    Math.hypot(m.cornerX(t, (k + i) % 3) - x, m.cornerY(t, (k + i) % 3) - y));
          }
        }
      }
    }
    return least;
  }

  @Test
  void inCircle_agreesWithExactArithmetic_nearTheCircle() {
    Random r = new Random(7);
    int close = 0;
    for (int i = 0; i < 3000; i++) {
      double[] p = new double[8];
      for (int k = 0; k < 4; k++) {
        double a = (k + 0.9 * r.nextDouble()) * Math.PI / 2;
        // The fourth node within a few rounding errors of the circle of the first three.
        p[2 * k] = 3 + Math.cos(a);
        p[2 * k + 1] = -2 + Math.sin(a);
      }
      int exact = exactInCircle(p);
      boolean ours = Predicates.inCircle(p[0], p[1], p[2], p[3], p[4], p[5], p[6], p[7]);
      if (exact != 0) {
        assertThat(ours).isEqualTo(exact > 0);
        close++;
      }
    }
    assertThat(close).isGreaterThan(2000);
  }

  private static int exactInCircle(double[] p) {
    BigDecimal[] d = new BigDecimal[6];
    BigDecimal[] s = new BigDecimal[3];
    for (int k = 0; k < 3; k++) {
      d[2 * k] = new BigDecimal(p[2 * k]).subtract(new BigDecimal(p[6]));
      d[2 * k + 1] = new BigDecimal(p[2 * k + 1]).subtract(new BigDecimal(p[7]));
      s[k] = d[2 * k].multiply(d[2 * k]).add(d[2 * k + 1].multiply(d[2 * k + 1]));
    }
    BigDecimal sum = BigDecimal.ZERO;
    for (int k = 0; k < 3; k++) {
      int i = (k + 1) % 3;
      int j = (k + 2) % 3;
      sum =
          sum.add(
              s[k].multiply(
                  d[2 * i].multiply(d[2 * j + 1]).subtract(d[2 * j].multiply(d[2 * i + 1]))));
    }
    return sum.signum();
  }
}
