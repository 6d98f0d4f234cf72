package org.annulet.post.report;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.vtk.Surface;

/**
 * A coarser triangulation on a subset of the nodes of a mesh, for the page only: nodes are drawn
 * into a neighbour, pass by pass over independent nodes, as long as no triangle turns over or gets
 * too thin. Corners and outlines of zones stay; on their straight (within 3°) parts nodes go too.
 */
final class ThinMesh {
  private static final double THINNEST = 0.12; // 4√3·area/Σ side², 1 for an equilateral triangle
  private static final double STRAIGHT = 0.05; // rad
  private static final int PASSES = 60;

  private final double[] x;
  private final double[] y;
  private final int[] corner;
  private final int[] zone;
  private final boolean[] gone;
  private int left;

  private ThinMesh(Mesh mesh, Surface flat) {
    int n = flat.pointCount();
    x = new double[n];
    y = new double[n];
    for (int p = 0; p < n; p++) {
      x[p] = flat.coordinate(p, 0);
      y[p] = flat.coordinate(p, 1);
    }
    corner = new int[3 * flat.triangleCount()];
    zone = new int[flat.triangleCount()];
    for (int t = 0; t < zone.length; t++) {
      zone[t] = mesh.zone(flat.sourceTriangle(t));
      for (int k = 0; k < 3; k++) {
        corner[3 * t + k] = flat.corner(t, k);
      }
    }
    gone = new boolean[n];
    left = n;
  }

  /**
   * The thinned mesh.
   *
   * @param points points of the surface that were kept, ascending
   * @param triangles three positions into {@code points} each
   */
  record Thinned(int[] points, int[] triangles) {}

  /** Thins to about the given number of points, or as far as it goes. */
  static Thinned of(Mesh mesh, Surface flat, int target) {
    ThinMesh thin = new ThinMesh(mesh, flat);
    for (int pass = 0; pass < PASSES && thin.left > target; pass++) {
      if (!thin.pass(target)) {
        break;
      }
    }
    return thin.result();
  }

  private Thinned result() {
    int[] place = new int[x.length];
    int[] points = new int[left];
    int count = 0;
    for (int p = 0; p < x.length; p++) {
      if (!gone[p]) {
        points[count] = p;
        place[p] = count++;
      }
    }
    int[] triangles = new int[corner.length];
    int used = 0;
    for (int t = 0; t < zone.length; t++) {
      if (corner[3 * t] >= 0) {
        for (int k = 0; k < 3; k++) {
          triangles[used++] = place[corner[3 * t + k]];
        }
      }
    }
    return new Thinned(points, Arrays.copyOf(triangles, used));
  }

  private boolean pass(int target) {
    int[] start = new int[x.length + 1];
    for (int c : corner) {
      if (c >= 0) {
        start[c + 1]++;
      }
    }
    for (int p = 0; p < x.length; p++) {
      start[p + 1] += start[p];
    }
    int[] around = new int[start[x.length]];
    int[] fill = start.clone();
    for (int q = 0; q < corner.length; q++) {
      if (corner[q] >= 0) {
        around[fill[corner[q]]++] = q / 3;
      }
    }
    boolean[] locked = new boolean[x.length];
    boolean any = false;
    for (int v = 0; v < x.length && left > target; v++) {
      if (!gone[v] && !locked[v]) {
        int[] fan = Arrays.copyOfRange(around, start[v], start[v + 1]);
        if (remove(v, fan, locked)) {
          any = true;
        }
      }
    }
    return any;
  }

  private boolean remove(int v, int[] fan, boolean[] locked) {
    List<Integer> ring = new ArrayList<>();
    List<Integer> feature = new ArrayList<>();
    for (int t : fan) {
      for (int k = 0; k < 3; k++) {
        int u = corner[3 * t + k];
        if (u != v) {
          if (locked[u]) {
            return false;
          }
          if (!ring.contains(u)) {
            ring.add(u);
          }
        }
      }
    }
    for (int u : ring) {
      int first = -1;
      boolean border = true;
      for (int t : fan) {
        if (has(t, u)) {
          border = first < 0 || zone[first] != zone[t];
          first = t;
        }
      }
      if (border) {
        feature.add(u);
      }
    }
    List<Integer> goals = ring;
    if (!feature.isEmpty()) {
      if (feature.size() != 2 || !straight(feature.get(0), v, feature.get(1))) {
        return false;
      }
      goals = feature;
    }
    goals = new ArrayList<>(goals);
    goals.sort(Comparator.comparingDouble(u -> Math.hypot(x[u] - x[v], y[u] - y[v])));
    for (int u : goals) {
      if (fits(v, u, fan)) {
        for (int t : fan) {
          boolean collapses = has(t, u);
          for (int k = 0; k < 3; k++) {
            if (collapses) {
              corner[3 * t + k] = -1;
            } else if (corner[3 * t + k] == v) {
              corner[3 * t + k] = u;
            }
          }
        }
        ring.forEach(r -> locked[r] = true);
        gone[v] = true;
        left--;
        return true;
      }
    }
    return false;
  }

  private boolean straight(int a, int v, int c) {
    double cross = (x[v] - x[a]) * (y[c] - y[v]) - (y[v] - y[a]) * (x[c] - x[v]);
    double dot = (x[v] - x[a]) * (x[c] - x[v]) + (y[v] - y[a]) * (y[c] - y[v]);
    return Math.abs(Math.atan2(cross, dot)) < STRAIGHT;
  }

  private boolean fits(int v, int u, int[] fan) {
    for (int t : fan) {
      if (!has(t, u)) {
        int[] p = new int[3];
        for (int k = 0; k < 3; k++) {
          p[k] = corner[3 * t + k] == v ? u : corner[3 * t + k];
        }
        double x1 = x[p[1]] - x[p[0]];
        double y1 = y[p[1]] - y[p[0]];
        double x2 = x[p[2]] - x[p[0]];
        double y2 = y[p[2]] - y[p[0]];
        double twice = x1 * y2 - x2 * y1;
        double sides =
            x1 * x1 + y1 * y1 + x2 * x2 + y2 * y2 + (x2 - x1) * (x2 - x1) + (y2 - y1) * (y2 - y1);
        if (2 * Math.sqrt(3) * twice < THINNEST * sides) {
          return false;
        }
      }
    }
    return true;
  }

  private boolean has(int t, int v) {
    return corner[3 * t] == v || corner[3 * t + 1] == v || corner[3 * t + 2] == v;
  }
}
