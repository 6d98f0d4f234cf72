package org.annulet.mesher.triangulate;

import java.util.Arrays;
import org.annulet.mesher.geometry.CurvePiece;

/** The segments the outline's edges are cut into: arrays that grow, indexed by segment. */
final class Segments {
  int count;

  /** First and last node, in the direction of the edge. */
  int[] from = new int[64];

  int[] to = new int[64];

  /** Index into {@link #curves}. */
  int[] piece = new int[64];

  double[] t0 = new double[64];
  double[] t1 = new double[64];

  /** Half-edge of the triangulation that runs from first to last node, or its twin. */
  int[] half = new int[64];

  final CurvePiece[] curves;

  /** Index of the outline's edge each piece belongs to. */
  final int[] edgeOf;

  /** Points of the outline a piece starts and ends at. */
  final int[] firstPoint;

  final int[] lastPoint;
  final int[] left;
  final int[] right;

  Segments(CurvePiece[] curves, int[] edgeOf, int[] left, int[] right) {
    this.curves = curves;
    this.edgeOf = edgeOf;
    firstPoint = new int[curves.length];
    lastPoint = new int[curves.length];
    this.left = left;
    this.right = right;
  }

  int add(int a, int b, int p, double start, double end) {
    if (count == from.length) {
      int n = 2 * count;
      from = Arrays.copyOf(from, n);
      to = Arrays.copyOf(to, n);
      piece = Arrays.copyOf(piece, n);
      t0 = Arrays.copyOf(t0, n);
      t1 = Arrays.copyOf(t1, n);
      half = Arrays.copyOf(half, n);
    }
    from[count] = a;
    to[count] = b;
    piece[count] = p;
    t0[count] = start;
    t1[count] = end;
    half[count] = -1;
    return count++;
  }

  int leftZone(int s) {
    return left[edgeOf[piece[s]]];
  }

  int rightZone(int s) {
    return right[edgeOf[piece[s]]];
  }

  CurvePiece curve(int s) {
    return curves[piece[s]];
  }
}
