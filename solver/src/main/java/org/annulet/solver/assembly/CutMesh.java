package org.annulet.solver.assembly;

import java.util.Arrays;
import java.util.HashMap;
import java.util.HashSet;
import java.util.Map;
import java.util.Set;
import org.annulet.mesher.mesh.Mesh;

/**
 * A mesh whose nodes are doubled along some inner edges, so that the pressure may differ on the two
 * sides. A cut that ends inside the gas leaves its last node whole.
 */
final class CutMesh {
  private final Mesh mesh;
  private final int[] corners;
  private int[] origin;
  private int count;

  CutMesh(Mesh mesh, Set<String> cutEdges) {
    this.mesh = mesh;
    this.count = mesh.nodeCount();
    this.origin = new int[count];
    for (int v = 0; v < count; v++) {
      origin[v] = v;
    }
    this.corners = new int[3 * mesh.triangleCount()];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        corners[3 * t + k] = mesh.corner(t, k);
      }
    }
    if (!cutEdges.isEmpty()) {
      cut(cutEdges);
    }
  }

  private void cut(Set<String> cutEdges) {
    Set<Long> cutSides = new HashSet<>();
    Set<Integer> cutNodes = new HashSet<>();
    for (int e = 0; e < mesh.segmentCount(); e++) {
      if (mesh.segmentRight(e) >= 0
          && cutEdges.contains(mesh.edgeNames().get(mesh.segmentEdge(e)))) {
        cutSides.add(side(mesh.segmentStart(e), mesh.segmentEnd(e)));
        cutNodes.add(mesh.segmentStart(e));
        cutNodes.add(mesh.segmentEnd(e));
      }
    }
    // Corners round a cut node that share an uncut side through that node stay together.
    int[] parent = new int[corners.length];
    Arrays.setAll(parent, i -> i);
    Map<Long, int[]> waiting = new HashMap<>();
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        int a = mesh.corner(t, k);
        int next = (k + 1) % 3;
        int b = mesh.corner(t, next);
        boolean touches = cutNodes.contains(a) || cutNodes.contains(b);
        if (!touches || cutSides.contains(side(a, b))) {
          continue;
        }
        int[] here = {3 * t + (a < b ? k : next), 3 * t + (a < b ? next : k)};
        int[] other = waiting.remove(side(a, b));
        if (other == null) {
          waiting.put(side(a, b), here);
        } else {
          join(parent, here[0], other[0]);
          join(parent, here[1], other[1]);
        }
      }
    }
    Map<Integer, Integer> idOfRoot = new HashMap<>();
    Set<Integer> used = new HashSet<>();
    for (int c = 0; c < corners.length; c++) {
      int v = corners[c];
      if (!cutNodes.contains(v)) {
        continue;
      }
      Integer id = idOfRoot.get(root(parent, c));
      if (id == null) {
        id = used.add(v) ? v : newNode(v);
        idOfRoot.put(root(parent, c), id);
      }
      corners[c] = id;
    }
  }

  private int newNode(int v) {
    if (count == origin.length) {
      origin = Arrays.copyOf(origin, count + count / 8 + 16);
    }
    origin[count] = v;
    return count++;
  }

  private static void join(int[] parent, int a, int b) {
    parent[root(parent, a)] = root(parent, b);
  }

  private static int root(int[] parent, int a) {
    int r = a;
    while (parent[r] != r) {
      parent[r] = parent[parent[r]];
      r = parent[r];
    }
    return r;
  }

  private static long side(int a, int b) {
    return a < b ? ((long) a << 32) | b : ((long) b << 32) | a;
  }

  Mesh mesh() {
    return mesh;
  }

  /** Number of nodes after cutting; the first ones are those of the mesh. */
  int nodeCount() {
    return count;
  }

  /** Node of the mesh that node v is or doubles. */
  int origin(int v) {
    return origin[v];
  }

  /** Node at corner k of triangle t. */
  int corner(int t, int k) {
    return corners[3 * t + k];
  }

  /** The node that mesh node v is on triangle t. */
  int nodeOn(int t, int v) {
    for (int k = 0; k < 3; k++) {
      if (mesh.corner(t, k) == v) {
        return corners[3 * t + k];
      }
    }
    throw new IllegalStateException("node " + v + " is no corner of triangle " + t);
  }
}
