package org.annulet.mesher.mesh;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import org.annulet.mesher.mesh.MeshCheck.Finding;
import org.annulet.mesher.mesh.MeshCheck.Law;

/**
 * One loop per boundary. The boundary is followed round the fan of triangles at each node, so it
 * may pass a node twice, as where two circles touch: the gas does not lead from one fan to the
 * other there. With a node counted once for each of its fans, Euler's formula gives the number of
 * loops: 2 − (nodes − sides + triangles) in each part of the mesh. Parts that meet in nodes alone
 * are a fault: the gas does not connect them, equal pressure in the node would.
 */
final class BoundaryLoops {
  private final Mesh mesh;
  private final MeshSides sides;
  private final List<Finding> findings;
  private final int[] part;
  private int parts;

  BoundaryLoops(Mesh mesh, MeshSides sides, List<Finding> findings) {
    this.mesh = mesh;
    this.sides = sides;
    this.findings = findings;
    this.part = parts();
  }

  void check() {
    int[] euler = new int[parts];
    boolean[] onBoundary = new boolean[mesh.nodeCount()];
    for (int s = 0; s < sides.count(); s++) {
      euler[part[sides.firstTriangle(s)]]--;
      if (sides.secondTriangle(s) < 0) {
        // One fan of the side's first node begins here.
        euler[part[sides.firstTriangle(s)]]++;
        onBoundary[sides.lowNode(s)] = true;
        onBoundary[sides.highNode(s)] = true;
      }
    }
    int[] partOfNode = new int[mesh.nodeCount()];
    Arrays.fill(partOfNode, -1);
    for (int t = 0; t < mesh.triangleCount(); t++) {
      euler[part[t]]++;
      for (int k = 0; k < 3; k++) {
        int v = mesh.corner(t, k);
        if (partOfNode[v] < 0) {
          partOfNode[v] = part[t];
          euler[part[t]] += onBoundary[v] ? 0 : 1;
        } else if (partOfNode[v] != part[t]) {
          String what = "two parts of the mesh meet in node " + v + " and in no side there";
          findings.add(new Finding(Law.CLOSED_LOOPS, what, mesh.x(v), mesh.y(v)));
          partOfNode[v] = part[t];
        }
      }
    }
    count(euler);
  }

  private void count(int[] euler) {
    int[] loops = new int[parts];
    int[] outer = new int[parts];
    int[] winding = new int[parts];
    for (int[] loop : follow()) {
      int c = part[mesh.segmentLeft(loop[0])];
      loops[c]++;
      double area = 0;
      double climb = 0;
      double x0 = mesh.x(mesh.segmentStart(loop[0]));
      for (int e : loop) {
        double mean = 0.5 * (mesh.x(mesh.segmentStart(e)) + mesh.x(mesh.segmentEnd(e)));
        area += (mean - x0) * rise(e);
        climb += rise(e);
      }
      if (mesh.period() != 0 && Math.abs(climb) > 0.5 * mesh.period()) {
        winding[c]++;
      } else if (area > 0) {
        outer[c]++;
      }
    }
    for (int c = 0; c < parts; c++) {
      boolean one = winding[c] == 0 ? outer[c] == 1 : winding[c] == 2 && outer[c] == 0;
      if (loops[c] != 2 - euler[c] || !one) {
        String what =
            String.format(
                Locale.ROOT,
                "part %d of the mesh has %d boundary loops where Euler's formula wants %d; %d of"
                    + " them enclose it, %d go round the ring",
                c,
                loops[c],
                2 - euler[c],
                outer[c],
                winding[c]);
        findings.add(Finding.ofWhole(Law.CLOSED_LOOPS, what));
      }
    }
  }

  /** Segments of the boundary, loop by loop, the gas on the left. */
  private List<int[]> follow() {
    boolean[] done = new boolean[mesh.segmentCount()];
    List<int[]> loops = new ArrayList<>();
    int[] path = new int[mesh.segmentCount()];
    for (int first = 0; first < done.length; first++) {
      int length = 0;
      for (int e = first; !done[e] && mesh.segmentRight(e) < 0; e = next(e)) {
        done[e] = true;
        path[length++] = e;
      }
      if (length > 0) {
        loops.add(Arrays.copyOf(path, length));
      }
    }
    return loops;
  }

  /** The boundary segment after {@code e}, found by turning about its end through the gas. */
  private int next(int e) {
    int v = mesh.segmentEnd(e);
    int t = mesh.segmentLeft(e);
    while (true) {
      int k = 0;
      while (mesh.corner(t, k) != v) {
        k++;
      }
      int s = sides.side(t, k);
      if (sides.secondTriangle(s) < 0) {
        return sides.segment(s);
      }
      t = sides.firstTriangle(s) == t ? sides.secondTriangle(s) : sides.firstTriangle(s);
    }
  }

  private double rise(int e) {
    double dy = mesh.y(mesh.segmentEnd(e)) - mesh.y(mesh.segmentStart(e));
    double period = mesh.period();
    return period == 0 ? dy : dy - period * Math.rint(dy / period);
  }

  /** Part of each triangle: what is connected through sides. */
  private int[] parts() {
    int[] root = new int[mesh.triangleCount()];
    for (int t = 0; t < root.length; t++) {
      root[t] = t;
    }
    for (int s = 0; s < sides.count(); s++) {
      if (sides.secondTriangle(s) >= 0) {
        int a = find(root, sides.firstTriangle(s));
        int b = find(root, sides.secondTriangle(s));
        root[Math.max(a, b)] = Math.min(a, b);
      }
    }
    int[] number = new int[root.length];
    for (int t = 0; t < root.length; t++) {
      int r = find(root, t);
      number[t] = r == t ? parts++ : number[r];
    }
    return number;
  }

  private static int find(int[] root, int t) {
    int r = t;
    while (root[r] != r) {
      root[r] = root[root[r]];
      r = root[r];
    }
    return r;
  }
}
