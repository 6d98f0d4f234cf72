package org.annulet.mesher.triangulate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import java.util.TreeMap;
import org.annulet.mesher.geometry.CurvePiece;
import org.annulet.mesher.geometry.Edge;
import org.annulet.mesher.geometry.Outline;
import org.annulet.mesher.geometry.Point;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.mesher.mesh.MeshCheck;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Every law on every outline of the gallery. */
class GalleryTest {
  static List<String> names() {
    return new ArrayList<>(Gallery.all().keySet());
  }

  @ParameterizedTest
  @MethodSource("names")
  void everyLawHolds(String name) {
    Gallery.Piece piece = Gallery.all().get(name);
    Mesh m = OutlineMesher.mesh(piece.outline(), piece.sizing());
    assertThat(MeshCheck.of(m)).isEmpty();
    assertThat(MeshCheck.delaunay(m)).isEmpty();
    checkAreasAndLengths(piece.outline(), m);
    checkNodesOnCurves(piece.outline(), m);
    checkAngles(name, piece, m);
    checkSizes(piece, m);
  }

  @ParameterizedTest
  @MethodSource("names")
  void sameInput_sameBytes(String name) {
    Gallery.Piece piece = Gallery.all().get(name);
    Mesh a = OutlineMesher.mesh(piece.outline(), piece.sizing());
    Mesh b = OutlineMesher.mesh(piece.outline(), piece.sizing());
    assertThat(a.nodeCount()).isEqualTo(b.nodeCount());
    assertThat(a.triangleCount()).isEqualTo(b.triangleCount());
    for (int v = 0; v < a.nodeCount(); v++) {
      assertThat(a.x(v) == b.x(v) && a.y(v) == b.y(v)).isTrue();
    }
    for (int t = 0; t < a.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        assertThat(a.corner(t, k)).isEqualTo(b.corner(t, k));
      }
    }
  }

  static void checkAreasAndLengths(Outline o, Mesh m) {
    // The sum over chords of the area between chord and curve: at most 2/3 deviation × length.
    double[] areas = new double[o.zones().size()];
    for (int t = 0; t < m.triangleCount(); t++) {
      areas[zone(o, m.zoneNames().get(m.zone(t)))] += m.area(t);
    }
    TreeMap<String, Double> lengths = new TreeMap<>();
    TreeMap<String, Double> slivers = new TreeMap<>();
    OutlineCurves curves = new OutlineCurves(o);
    for (int e = 0; e < m.segmentCount(); e++) {
      String edge = m.edgeNames().get(m.segmentEdge(e));
      lengths.merge(edge, m.segmentLength(e), Double::sum);
      double[] mid =
          curves.midpoint(
              edge,
              new double[] {m.x(m.segmentStart(e)), m.y(m.segmentStart(e))},
              new double[] {m.x(m.segmentEnd(e)), m.y(m.segmentEnd(e))});
      double rise =
          Math.hypot(
              mid[0] - 0.5 * (m.x(m.segmentStart(e)) + m.x(m.segmentEnd(e))),
              mid[1] - 0.5 * (m.y(m.segmentStart(e)) + m.y(m.segmentEnd(e))));
      slivers.merge(edge, rise * m.segmentLength(e), Double::sum);
    }
    double[] box = o.box();
    double reach = Math.max(Math.abs(box[2]), Math.abs(box[3]));
    for (int z = 0; z < areas.length; z++) {
      double slack = 1e-13 * reach * reach + 1e-11 * o.area(z);
      for (int e = 0; e < o.edges().size(); e++) {
        if (o.leftZone(e) == z || o.rightZone(e) == z) {
          slack += 0.75 * slivers.get(o.edges().get(e).name());
        }
      }
      assertThat(areas[z]).as(o.zones().get(z).name()).isCloseTo(o.area(z), within(slack));
    }
    for (Edge e : o.edges()) {
      boolean straight = e.pieces().stream().allMatch(CurvePiece::isStraight);
      // A chord over 15° is short by (π/12)²/24 = 0.29 %.
      assertThat(lengths.get(e.name()))
          .as(e.name())
          .isBetween(e.length() * (straight ? 1 - 1e-9 : 0.995), e.length() * (1 + 1e-9));
    }
  }

  private static int zone(Outline o, String name) {
    for (int z = 0; z < o.zones().size(); z++) {
      if (o.zones().get(z).name().equals(name)) {
        return z;
      }
    }
    throw new AssertionError("zone " + name + " is not in the outline");
  }

  private static void checkNodesOnCurves(Outline o, Mesh m) {
    double[] box = o.box();
    double reach = Math.max(Math.abs(box[2]), Math.abs(box[3]));
    for (int e = 0; e < m.segmentCount(); e += 1 + m.segmentCount() / 400) {
      int v = m.segmentStart(e);
      double[] at = o.edge(m.edgeNames().get(m.segmentEdge(e))).closest(m.x(v), m.y(v));
      // the search for the closest point of a cubic is good to the root of rounding, squared
      assertThat(Math.hypot(at[0] - m.x(v), at[1] - m.y(v))).isLessThan(1e-8 * reach);
    }
  }

  /** Points of the outline with two directions below 60° apart, taken at a 300th of the box. */
  static List<Point> sharpCorners(Outline o) {
    double[] box = o.box();
    List<Point> sharp = new ArrayList<>();
    List<List<double[]>> ways = new ArrayList<>();
    o.points().forEach(p -> ways.add(new ArrayList<>()));
    double step = Math.max(box[2] - box[0], box[3] - box[1]) / 300;
    for (Edge e : o.edges()) {
      for (int k = 0; k < e.pieces().size(); k++) {
        CurvePiece c = e.pieces().get(k);
        double t = Math.min(0.5, step / c.length(0, 1));
        ways.get(e.points().get(k)).add(new double[] {c.x(t) - c.x(0), c.y(t) - c.y(0)});
        ways.get(e.points().get(k + 1))
            .add(new double[] {c.x(1 - t) - c.x(1), c.y(1 - t) - c.y(1)});
      }
    }
    for (int p = 0; p < ways.size(); p++) {
      for (int i = 0; i < ways.get(p).size(); i++) {
        for (int k = 0; k < i; k++) {
          double[] u = ways.get(p).get(i);
          double[] v = ways.get(p).get(k);
          double cos =
              (u[0] * v[0] + u[1] * v[1]) / Math.hypot(u[0], u[1]) / Math.hypot(v[0], v[1]);
          if (cos > 0.499) {
            sharp.add(o.points().get(p));
          }
        }
      }
    }
    return sharp;
  }

  private static void checkAngles(String name, Gallery.Piece piece, Mesh m) {
    List<Point> sharp = sharpCorners(piece.outline());
    int thin = 0;
    for (int t = 0; t < m.triangleCount(); t++) {
      if (leastAngle(m, t) > 28 - 1e-9) {
        continue;
      }
      thin++;
      double x = m.cornerX(t, 0);
      double y = m.cornerY(t, 0);
      assertThat(sharp)
          .as("%s: angle %s° at (%s, %s)", name, leastAngle(m, t), x, y)
          .anyMatch(p -> Math.hypot(p.x() - x, p.y() - y) < 2.2 * piece.sizing().largestSide());
    }
    assertThat(thin).as("thin triangles").isLessThanOrEqualTo(12 * sharp.size());
  }

  static double leastAngle(Mesh m, int t) {
    double least = 180;
    for (int k = 0; k < 3; k++) {
      double x = m.cornerX(t, k);
      double y = m.cornerY(t, k);
      double ux = m.cornerX(t, (k + 1) % 3) - x;
      double uy = m.cornerY(t, (k + 1) % 3) - y;
      double vx = m.cornerX(t, (k + 2) % 3) - x;
      double vy = m.cornerY(t, (k + 2) % 3) - y;
      least = Math.min(least, Math.toDegrees(Math.atan2(ux * vy - uy * vx, ux * vx + uy * vy)));
    }
    return least;
  }

  private static void checkSizes(Gallery.Piece piece, Mesh m) {
    for (int t = 0; t < m.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        double d =
            Math.hypot(
                m.cornerX(t, k) - m.cornerX(t, (k + 1) % 3),
                m.cornerY(t, k) - m.cornerY(t, (k + 1) % 3));
        assertThat(d).isLessThanOrEqualTo(1.0001 * piece.sizing().largestSide());
      }
    }
  }
}
