package org.annulet.mesher.files;

import java.util.Arrays;
import java.util.HashMap;
import java.util.Map;
import org.annulet.mesher.mesh.Mesh;

/** A mesh laid flat: on a ring, nodes across the seam get a second point one period away. */
final class Unrolled {
  final int[] corners;
  final int[] ends;
  double[] xy;
  int points;

  private Unrolled(Mesh mesh) {
    points = mesh.nodeCount();
    xy = new double[2 * points];
    for (int v = 0; v < points; v++) {
      xy[2 * v] = mesh.x(v);
      xy[2 * v + 1] = mesh.y(v);
    }
    corners = new int[3 * mesh.triangleCount()];
    Map<Long, Integer> second = new HashMap<>();
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        corners[3 * t + k] = point(mesh, t, k, second);
      }
    }
    ends = new int[2 * mesh.segmentCount()];
    for (int e = 0; e < mesh.segmentCount(); e++) {
      int t = mesh.segmentLeft(e);
      for (int k = 0; k < 3; k++) {
        if (mesh.corner(t, k) == mesh.segmentStart(e)) {
          ends[2 * e] = corners[3 * t + k];
          ends[2 * e + 1] = corners[3 * t + (k + 1) % 3];
        }
      }
    }
  }

  static Unrolled of(Mesh mesh) {
    return new Unrolled(mesh);
  }

  private int point(Mesh mesh, int t, int k, Map<Long, Integer> second) {
    int v = mesh.corner(t, k);
    double y = mesh.cornerY(t, k);
    if (y == mesh.y(v)) {
      return v;
    }
    Integer known = second.get(2L * v + (y > mesh.y(v) ? 1 : 0));
    if (known != null) {
      return known;
    }
    if (2 * points == xy.length) {
      xy = Arrays.copyOf(xy, 2 * xy.length);
    }
    xy[2 * points] = mesh.x(v);
    xy[2 * points + 1] = y;
    second.put(2L * v + (y > mesh.y(v) ? 1 : 0), points);
    return points++;
  }
}
