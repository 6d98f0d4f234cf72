package org.annulet.mesher.mesh;

import java.util.Random;
import java.util.stream.LongStream;

/** Structured meshes with seeded disorder, for tests of everything behind the triangulator. */
public final class TestMeshes {
  private TestMeshes() {}

  /** Seeds of the property tests. */
  public static LongStream seeds() {
    return LongStream.range(0, 12);
  }

  /**
   * A duct 0.6 m × 0.2 m, zones 'plenum' and 'chamber' with the inner edge 'sheet' between them,
   * edges inlet, exit, hub, shroud; isolated holes with edge 'hole'; inner nodes moved at random
   * and diagonals at random.
   */
  public static Mesh randomDuct(long seed) {
    Random random = new Random(seed);
    int nx = 6 + 2 * random.nextInt(8);
    int ny = 4 + random.nextInt(6);
    double hx = 0.6 / nx;
    double hy = 0.2 / ny;
    boolean[][] hole = new boolean[nx][ny];
    for (int i = 1; i < nx - 1; i += 2) {
      for (int j = 1; j < ny - 1; j += 2) {
        hole[i][j] = i != nx / 2 && i != nx / 2 - 1 && random.nextInt(3) == 0;
      }
    }
    Mesh.Builder b = Mesh.builder();
    for (int i = 0; i <= nx; i++) {
      for (int j = 0; j <= ny; j++) {
        boolean fixed = i == 0 || i == nx || j == 0 || j == ny || i == nx / 2;
        double move = fixed ? 0 : 0.25;
        b.node(
            hx * (i + move * (2 * random.nextDouble() - 1)),
            hy * (j + move * (2 * random.nextDouble() - 1)));
      }
    }
    for (int i = 0; i < nx; i++) {
      for (int j = 0; j < ny; j++) {
        if (!hole[i][j]) {
          int a = i * (ny + 1) + j;
          String zone = i < nx / 2 ? "plenum" : "chamber";
          if (random.nextBoolean()) {
            b.triangle(a, a + ny + 1, a + 1, zone);
            b.triangle(a + ny + 2, a + ny + 1, a + 1, zone);
          } else {
            b.triangle(a, a + ny + 1, a + ny + 2, zone);
            b.triangle(a, a + 1, a + ny + 2, zone);
          }
        }
      }
    }
    for (int j = 0; j < ny; j++) {
      b.segment(j, j + 1, "inlet");
      b.segment(nx * (ny + 1) + j, nx * (ny + 1) + j + 1, "exit");
      b.segment(nx / 2 * (ny + 1) + j, nx / 2 * (ny + 1) + j + 1, "sheet");
    }
    for (int i = 0; i < nx; i++) {
      b.segment(i * (ny + 1), (i + 1) * (ny + 1), "hub");
      b.segment((i + 1) * (ny + 1) + ny, i * (ny + 1) + ny, "shroud");
      for (int j = 0; j < ny; j++) {
        if (hole[i][j]) {
          int a = i * (ny + 1) + j;
          b.segment(a, a + 1, "hole").segment(a + ny + 1, a + ny + 2, "hole");
          b.segment(a, a + ny + 1, "hole").segment(a + 1, a + ny + 2, "hole");
        }
      }
    }
    return b.build();
  }

  /** A circular annulus about the origin, edges 'inner' and 'outer', layers × around × 2. */
  public static Mesh annulus(double inner, double outer, int layers, int around) {
    Mesh.Builder b = Mesh.builder();
    for (int i = 0; i <= layers; i++) {
      double r = inner + (outer - inner) * i / layers;
      for (int j = 0; j < around; j++) {
        double angle = 2 * Math.PI * j / around;
        b.node(r * Math.cos(angle), r * Math.sin(angle));
      }
    }
    for (int j = 0; j < around; j++) {
      int k = (j + 1) % around;
      for (int i = 0; i < layers; i++) {
        int a = i * around;
        b.triangle(a + j, a + around + j, a + around + k, "gap");
        b.triangle(a + j, a + around + k, a + k, "gap");
      }
      b.segment(j, k, "inner").segment(layers * around + j, layers * around + k, "outer");
    }
    return b.build();
  }

  /** The circles behind {@link #annulus}. */
  public static EdgeCurves circles(double inner, double outer) {
    return (edge, p, q) -> {
      double r = edge.equals("inner") ? inner : outer;
      double x = p[0] + q[0];
      double y = p[1] + q[1];
      double length = Math.hypot(x, y);
      return new double[] {r * x / length, r * y / length};
    };
  }

  /**
   * Half a burner cell: a plenum, a burner of half the width, a chamber; edges inlet, exit, wall,
   * port (part of the chamber's face), inner edges burner-in and burner-out; mirror and seam.
   */
  public static Mesh halfCell(double pitch, int n) {
    Mesh.Builder b = Mesh.builder();
    double h = 0.5 * pitch / (2 * n);
    int across = 2 * n + 1;
    for (int i = 0; i <= 6 * n; i++) {
      for (int j = 0; j < across; j++) {
        double bump = i % (2 * n) == 0 || j == 0 || j == n || j == 2 * n ? 0 : 0.2;
        b.node(h * (i + bump * Math.sin(7 * i + 3 * j)), h * (j + bump * Math.cos(5 * i + j)));
      }
    }
    for (int i = 0; i < 6 * n; i++) {
      String zone = i < 2 * n ? "plenum" : i < 4 * n ? "burner" : "chamber";
      for (int j = 0; j < (zone.equals("burner") ? n : 2 * n); j++) {
        int a = i * across + j;
        b.triangle(a, a + across, a + 1, zone);
        b.triangle(a + across + 1, a + across, a + 1, zone);
      }
      boolean burner = zone.equals("burner");
      b.segment(i * across, (i + 1) * across, RingCells.MIRROR);
      int top = burner ? n : 2 * n;
      b.segment(i * across + top, (i + 1) * across + top, burner ? "wall" : RingCells.SEAM);
    }
    for (int j = 0; j < 2 * n; j++) {
      b.segment(j, j + 1, "inlet");
      b.segment(6 * n * across + j, 6 * n * across + j + 1, "exit");
      int in = 2 * n * across + j;
      int out = 4 * n * across + j;
      b.segment(in, in + 1, j < n ? "burner-in" : "wall");
      b.segment(out, out + 1, j < n ? "burner-out" : j == n ? "port" : "wall");
    }
    return dropUnused(b.build());
  }

  private static Mesh dropUnused(Mesh mesh) {
    int[] number = new int[mesh.nodeCount()];
    Mesh.Builder b = Mesh.builder();
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        int v = mesh.corner(t, k);
        if (number[v] == 0) {
          number[v] = 1 + b.node(mesh.x(v), mesh.y(v));
        }
      }
      b.triangle(
          number[mesh.corner(t, 0)] - 1,
          number[mesh.corner(t, 1)] - 1,
          number[mesh.corner(t, 2)] - 1,
          mesh.zoneNames().get(mesh.zone(t)));
    }
    for (int e = 0; e < mesh.segmentCount(); e++) {
      b.segment(
          number[mesh.segmentStart(e)] - 1,
          number[mesh.segmentEnd(e)] - 1,
          mesh.edgeNames().get(mesh.segmentEdge(e)));
    }
    return b.build();
  }
}
