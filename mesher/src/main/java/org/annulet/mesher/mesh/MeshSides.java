package org.annulet.mesher.mesh;

import java.util.Arrays;

/**
 * The sides of a mesh, each stored once: its two nodes, the triangles on it and the named segment
 * it carries. Immutable; numbered in the order in which the triangles meet them. O(N) time and
 * memory as long as no node has unboundedly many neighbours.
 */
public final class MeshSides {
  private final int[] sideOfTriangle;
  private final int[] ends;
  private final int[] triangles;
  private final int[] segment;

  private MeshSides(int[] sideOfTriangle, int[] ends, int[] triangles, int[] segment) {
    this.sideOfTriangle = sideOfTriangle;
    this.ends = ends;
    this.triangles = triangles;
    this.segment = segment;
  }

  /** The sides of {@code mesh}. */
  public static MeshSides of(Mesh mesh) {
    int triangleCount = mesh.triangleCount();
    int[] first = new int[mesh.nodeCount()];
    Arrays.fill(first, -1);
    int[] sideOfTriangle = new int[3 * triangleCount];
    int[] ends = new int[6 * triangleCount];
    int[] triangles = new int[6 * triangleCount];
    int[] next = new int[3 * triangleCount];
    int count = 0;
    for (int t = 0; t < triangleCount; t++) {
      for (int k = 0; k < 3; k++) {
        int a = mesh.corner(t, k);
        int b = mesh.corner(t, (k + 1) % 3);
        int low = Math.min(a, b);
        int high = Math.max(a, b);
        int s = first[low];
        while (s >= 0 && ends[2 * s + 1] != high) {
          s = next[s];
        }
        if (s < 0) {
          s = count++;
          ends[2 * s] = low;
          ends[2 * s + 1] = high;
          triangles[2 * s] = t;
          triangles[2 * s + 1] = -1;
          next[s] = first[low];
          first[low] = s;
        } else {
          triangles[2 * s + 1] = t;
        }
        sideOfTriangle[3 * t + k] = s;
      }
    }
    int[] segment = new int[count];
    Arrays.fill(segment, -1);
    for (int e = 0; e < mesh.segmentCount(); e++) {
      int low = Math.min(mesh.segmentStart(e), mesh.segmentEnd(e));
      int high = Math.max(mesh.segmentStart(e), mesh.segmentEnd(e));
      int s = first[low];
      while (ends[2 * s + 1] != high) {
        s = next[s];
      }
      segment[s] = e;
    }
    return new MeshSides(
        sideOfTriangle,
        Arrays.copyOf(ends, 2 * count),
        Arrays.copyOf(triangles, 2 * count),
        segment);
  }

  /** Number of sides. */
  public int count() {
    return segment.length;
  }

  /** Side between corners {@code k} and k + 1 (modulo 3) of triangle {@code t}. */
  public int side(int t, int k) {
    return sideOfTriangle[3 * t + k];
  }

  /** The end node of side {@code s} with the smaller number. */
  public int lowNode(int s) {
    return ends[2 * s];
  }

  /** The end node of side {@code s} with the larger number. */
  public int highNode(int s) {
    return ends[2 * s + 1];
  }

  /** The triangle with the smallest number on side {@code s}. */
  public int firstTriangle(int s) {
    return triangles[2 * s];
  }

  /** The other triangle on side {@code s}; −1 on the boundary. */
  public int secondTriangle(int s) {
    return triangles[2 * s + 1];
  }

  /** The named segment on side {@code s}; −1 where the side has no name. */
  public int segment(int s) {
    return segment[s];
  }
}
