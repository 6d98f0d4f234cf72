package org.annulet.post;

import java.util.function.DoubleBinaryOperator;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.meaning.ModeView;
import org.annulet.solver.modes.Mode;

/** Structured meshes and modes of given shape. */
public final class Meshes {
  private Meshes() {}

  /** Ring of length lx in x, n cells round; zone names by position along x, equal lengths. */
  public static Mesh ring(double lx, double period, int nx, int ny, String... zones) {
    Mesh.Builder b = Mesh.periodicBuilder(period);
    for (int i = 0; i <= nx; i++) {
      for (int j = 0; j < ny; j++) {
        b.node(lx * i / nx, period * j / ny);
      }
    }
    for (int i = 0; i < nx; i++) {
      String zone = zones[i * zones.length / nx];
      for (int j = 0; j < ny; j++) {
        int a = i * ny + j;
        int c = i * ny + (j + 1) % ny;
        quad(b, new int[] {a, a + ny, c + ny, c}, (i + j) % 2, zone);
      }
    }
    for (int j = 0; j < ny; j++) {
      b.segment(j, (j + 1) % ny, "left");
      b.segment(nx * ny + j, nx * ny + (j + 1) % ny, "right");
    }
    return b.build();
  }

  /** Rectangle [0, lx] × [y0, y0 + ly]; zones as above; edges left, right, low, high. */
  public static Mesh rectangle(double[] xy, int nx, int ny, String... zones) {
    Mesh.Builder b = Mesh.builder();
    for (int i = 0; i <= nx; i++) {
      for (int j = 0; j <= ny; j++) {
        b.node(xy[0] * i / nx, xy[1] + xy[2] * j / ny);
      }
    }
    int w = ny + 1;
    for (int i = 0; i < nx; i++) {
      String zone = zones[i * zones.length / nx];
      for (int j = 0; j < ny; j++) {
        int a = i * w + j;
        quad(b, new int[] {a, a + w, a + w + 1, a + 1}, (i + j) % 2, zone);
      }
    }
    for (int j = 0; j < ny; j++) {
      b.segment(j, j + 1, "left");
      b.segment(nx * w + j, nx * w + j + 1, "right");
    }
    for (int i = 0; i < nx; i++) {
      b.segment(i * w, (i + 1) * w, "low");
      b.segment(i * w + ny, (i + 1) * w + ny, "high");
    }
    return b.build();
  }

  /** Annulus across the axis in Cartesian coordinates. */
  public static Mesh annulus(double inner, double outer, int nr, int na) {
    Mesh.Builder b = Mesh.builder();
    for (int i = 0; i <= nr; i++) {
      double r = inner + (outer - inner) * i / nr;
      for (int j = 0; j < na; j++) {
        double a = 2 * Math.PI * j / na;
        b.node(r * Math.cos(a), r * Math.sin(a));
      }
    }
    for (int i = 0; i < nr; i++) {
      for (int j = 0; j < na; j++) {
        int a = i * na + j;
        int c = i * na + (j + 1) % na;
        quad(b, new int[] {a, a + na, c + na, c}, (i + j) % 2, "gas");
      }
    }
    for (int j = 0; j < na; j++) {
      b.segment(j, (j + 1) % na, "hub");
      b.segment(nr * na + j, nr * na + (j + 1) % na, "shroud");
    }
    return b.build();
  }

  private static void quad(Mesh.Builder b, int[] q, int way, String zone) {
    if (way == 0) {
      b.triangle(q[0], q[1], q[2], zone);
      b.triangle(q[0], q[2], q[3], zone);
    } else {
      b.triangle(q[0], q[1], q[3], zone);
      b.triangle(q[1], q[2], q[3], zone);
    }
  }

  /** A mode with the given field of (x, y), frequency in Hz, growth rate in 1/s. */
  public static ModeView mode(
      Mesh mesh, double[] rate, Integer order, DoubleBinaryOperator... field) {
    double[] re = new double[mesh.nodeCount()];
    double[] im = new double[mesh.nodeCount()];
    for (int v = 0; v < re.length; v++) {
      re[v] = field[0].applyAsDouble(mesh.x(v), mesh.y(v));
      im[v] = field.length > 1 ? field[1].applyAsDouble(mesh.x(v), mesh.y(v)) : 0;
    }
    Mode mode = new Mode(rate[1], rate[0], re, im, 1, 1e-13, 3, Mode.Verdict.CONVERGED);
    return new ModeView(
        mode, re, im, order, order == null ? "ring" : "order " + order, Double.NaN, Double.NaN);
  }
}
