package org.annulet.mesher.triangulate;

import java.util.Arrays;
import java.util.List;
import org.annulet.mesher.geometry.GeometryFault;
import org.annulet.mesher.geometry.Outline;

/**
 * The constrained Delaunay triangulation of the boundary nodes and their segments, with the zone of
 * every triangle. Where chords of curved edges cross or leave a node on the wrong side, though the
 * true curves do not, the curved segments concerned are halved and it starts again.
 */
final class FirstTriangulation {
  private static final int ROUNDS = 24;

  private final Outline outline;
  private final BoundaryNodes nodes;
  private final Segments segments;
  private Triangulation mesh;
  private boolean[] halve;
  private int troubles;

  FirstTriangulation(Outline outline, BoundaryNodes nodes) {
    this.outline = outline;
    this.nodes = nodes;
    this.segments = nodes.segments;
  }

  /** The triangulation; nodes 0 … 3 are the frame, node i + 4 is boundary node i. */
  Triangulation build() {
    for (int round = 0; ; round++) {
      troubles = 0;
      halve = new boolean[segments.count];
      insertNodes();
      for (int s = 0; s < segments.count; s++) {
        recover(s);
      }
      if (troubles == 0) {
        zones();
      }
      if (troubles == 0) {
        return mesh;
      }
      int count = segments.count;
      boolean any = false;
      for (int s = 0; s < count; s++) {
        if (halve[s] && !segments.curve(s).isStraight()) {
          nodes.halve(s);
          any = true;
        }
      }
      if (!any || round == ROUNDS) {
        int s = firstTrouble();
        int a = segments.from[s];
        throw new GeometryFault(
            List.of(
                new GeometryFault.Fault(
                    GeometryFault.Kind.TOUCHING,
                    "edge '"
                        + outline.edges().get(segments.edgeOf[segments.piece[s]]).name()
                        + "' crosses or touches another",
                    nodes.x[a],
                    nodes.y[a],
                    "move them apart, or end both at a common point there")));
      }
    }
  }

  private int firstTrouble() {
    for (int s = 0; s < halve.length; s++) {
      if (halve[s]) {
        return s;
      }
    }
    return 0;
  }

  private void insertNodes() {
    mesh = new Triangulation(segments);
    double[] box = outline.box();
    double half = Math.max(box[2] - box[0], box[3] - box[1]);
    mesh.frame(0.5 * (box[0] + box[2]), 0.5 * (box[1] + box[3]), 8 * half);
    int n = nodes.count;
    for (int i = 0; i < n; i++) {
      mesh.addNode(nodes.x[i], nodes.y[i]);
    }
    int[] order = SpatialOrder.of(nodes.x, nodes.y, n);
    int t = 0;
    for (int i : order) {
      double px = nodes.x[i];
      double py = nodes.y[i];
      t = mesh.walk(t, px, py, true);
      if (t < 0 || !mesh.cavityFrom(t, px, py)) {
        throw new GeometryFault(
            List.of(
                new GeometryFault.Fault(
                    GeometryFault.Kind.TOUCHING,
                    "two nodes of the outline's edges fall on one place",
                    px,
                    py,
                    "move the edges apart there, or end them at a common point")));
      }
      mesh.star(4 + i, mesh.rimCount, Integer.MIN_VALUE, Integer.MIN_VALUE);
      t = mesh.out[4 + i] >> 2;
    }
  }

  private void recover(int s) {
    int a = segments.from[s] + 4;
    int b = segments.to[s] + 4;
    int e = mesh.find(a, b);
    if (e < 0) {
      e = new SegmentRecovery(mesh).force(a, b);
    }
    if (e == SegmentRecovery.MEETS_NODE) {
      trouble(s);
    } else if (e < 0) {
      trouble(s);
      trouble(-2 - e);
    } else if (mesh.seg[e] >= 0) {
      trouble(s);
      trouble(mesh.seg[e]);
    } else {
      mesh.link(e, mesh.twin[e], s);
    }
  }

  private void trouble(int s) {
    halve[s] = true;
    troubles++;
  }

  private void zones() {
    int unknown = Integer.MIN_VALUE;
    Arrays.fill(mesh.zone, 0, mesh.triangleCount, unknown);
    int[] queue = new int[mesh.triangleCount];
    int n = 0;
    for (int s = 0; s < segments.count; s++) {
      int e = segments.half[s];
      boolean along = mesh.start[e] == segments.from[s] + 4;
      int l = (along ? e : mesh.twin[e]) >> 2;
      int r = (along ? mesh.twin[e] : e) >> 2;
      for (int k = 0; k < 2; k++) {
        int t = k == 0 ? l : r;
        int z = k == 0 ? segments.leftZone(s) : segments.rightZone(s);
        if (mesh.zone[t] == unknown) {
          mesh.zone[t] = z;
          queue[n++] = t;
        } else if (mesh.zone[t] != z) {
          trouble(s);
        }
      }
    }
    while (n > 0) {
      int t = queue[--n];
      for (int e = 4 * t; e < 4 * t + 3; e++) {
        int f = mesh.twin[e];
        if (f < 0 || mesh.seg[e] >= 0) {
          continue;
        }
        if (mesh.zone[f >> 2] == unknown) {
          mesh.zone[f >> 2] = mesh.zone[t];
          queue[n++] = f >> 2;
        } else if (mesh.zone[f >> 2] != mesh.zone[t]) {
          // A node lies between a chord and its curve: which curve is not known here.
          for (int s = 0; s < segments.count; s++) {
            halve[s] = true;
          }
          troubles++;
          return;
        }
      }
    }
  }
}
