package org.annulet.mesher.triangulate;

import java.util.Arrays;

/** Flips of diagonals (Lawson 1977): they force segments in and restore the Delaunay property. */
final class Flips {
  private final Triangulation mesh;

  Flips(Triangulation mesh) {
    this.mesh = mesh;
  }

  /** Turns the diagonal of the two triangles beside half-edge {@code e}. */
  void flip(int e) {
    int f = mesh.twin[e];
    int ne = Triangulation.next(e);
    int pe = Triangulation.prev(e);
    int nf = Triangulation.next(f);
    int pf = Triangulation.prev(f);
    int a = mesh.start[e];
    int b = mesh.start[f];
    int c = mesh.start[pe];
    int d = mesh.start[pf];
    int twinNe = mesh.twin[ne];
    int segNe = mesh.seg[ne];
    int twinNf = mesh.twin[nf];
    int segNf = mesh.seg[nf];
    mesh.start[ne] = d;
    mesh.start[nf] = c;
    mesh.link(e, twinNf, segNf);
    mesh.link(f, twinNe, segNe);
    mesh.link(ne, nf, -1);
    mesh.out[a] = e;
    mesh.out[b] = f;
    mesh.out[c] = pe;
    mesh.out[d] = pf;
  }

  /** Whether the two triangles beside {@code e} form a strictly convex quadrilateral. */
  boolean convex(int e) {
    int f = mesh.twin[e];
    int a = mesh.start[e];
    int b = mesh.start[f];
    int c = mesh.start[Triangulation.prev(e)];
    int d = mesh.start[Triangulation.prev(f)];
    return mesh.orient(c, d, mesh.x[a], mesh.y[a]) < 0
        && mesh.orient(c, d, mesh.x[b], mesh.y[b]) > 0;
  }

  /** Flips until every side reached from the given ones is Delaunay or a segment. */
  void legalise(int[] sides, int count) {
    int[] work = Arrays.copyOf(sides, Math.max(count, 16));
    int n = count;
    long cap = 100L * mesh.triangleCount + 1000;
    while (n > 0 && cap-- > 0) {
      int e = work[--n];
      int f = mesh.twin[e];
      if (f < 0 || mesh.seg[e] >= 0) {
        continue;
      }
      int d = mesh.start[Triangulation.prev(f)];
      if (!mesh.inCircle(e >> 2, mesh.x[d], mesh.y[d]) || !convex(e)) {
        continue;
      }
      flip(e);
      if (n + 4 > work.length) {
        work = Arrays.copyOf(work, 2 * work.length);
      }
      work[n++] = e;
      work[n++] = Triangulation.prev(e);
      work[n++] = f;
      work[n++] = Triangulation.prev(f);
      mesh.note(e >> 2);
      mesh.note(f >> 2);
    }
  }
}
