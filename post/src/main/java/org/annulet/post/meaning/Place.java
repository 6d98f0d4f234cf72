package org.annulet.post.meaning;

import java.util.Locale;
import java.util.Set;
import java.util.TreeSet;
import org.annulet.mesher.mesh.Mesh;

/** A node of the mesh in words: edge or zone it lies on, and where. */
public final class Place {
  private Place() {}

  /**
   * For example "edge shroud at x = 312 mm, r = 205 mm" or "zone chamber at x = 312 mm, 26°".
   *
   * @param node of the chamber's mesh
   * @param map values at the nodes the place was chosen by: a ring on which they are the same all
   *     round gets no angle
   */
  public static String words(Chamber chamber, int node, double[] map) {
    Mesh mesh = chamber.mesh();
    Set<String> edges = new TreeSet<>();
    for (int e = 0; e < mesh.segmentCount(); e++) {
      if (mesh.segmentRight(e) < 0
          && (mesh.segmentStart(e) == node || mesh.segmentEnd(e) == node)) {
        edges.add(mesh.edgeNames().get(mesh.segmentEdge(e)));
      }
    }
    Set<String> zones = new TreeSet<>();
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        if (mesh.corner(t, k) == node) {
          zones.add(mesh.zoneNames().get(mesh.zone(t)));
        }
      }
    }
    boolean onEdge = !edges.isEmpty();
    return (onEdge ? "edge " : "zone ")
        + String.join(" and ", onEdge ? edges : zones)
        + " at "
        + (chamber.kind() == GeometryKind.RING && sameAllRound(mesh, node, map)
            ? String.format(Locale.ROOT, "x = %.0f mm, all round", 1000 * mesh.x(node))
            : coordinates(chamber, mesh.x(node), mesh.y(node)));
  }

  private static boolean sameAllRound(Mesh mesh, int node, double[] map) {
    double tolerance = 1e-9 * mesh.period();
    for (int v = 0; v < map.length; v++) {
      if (Math.abs(mesh.x(v) - mesh.x(node)) < tolerance
          && Math.abs(map[v] - map[node]) > 0.01 * Math.abs(map[node])) {
        return false;
      }
    }
    return true;
  }

  private static String coordinates(Chamber chamber, double x, double y) {
    return switch (chamber.kind()) {
      case RING ->
          String.format(
              Locale.ROOT, "x = %.0f mm, %.0f°", 1000 * x, 360 * y / chamber.mesh().period());
      case SECTION -> String.format(Locale.ROOT, "x = %.0f mm, r = %.0f mm", 1000 * x, 1000 * y);
      case CROSS_SECTION ->
          String.format(
              Locale.ROOT,
              "r = %.0f mm, %.0f°",
              1000 * Math.hypot(x, y),
              Math.toDegrees(Math.atan2(y, x)));
      case PLANE -> String.format(Locale.ROOT, "x = %.0f mm, y = %.0f mm", 1000 * x, 1000 * y);
    };
  }
}
