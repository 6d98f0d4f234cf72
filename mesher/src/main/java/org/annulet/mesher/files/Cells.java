package org.annulet.mesher.files;

import java.util.Arrays;
import java.util.TreeSet;

/** Points, polygons and lines as they come out of a file, before they are a mesh. */
final class Cells {
  double[] xyz = new double[192];
  int points;
  private int[] nodes = new int[256];
  private int nodeCount;
  private int[] start = new int[64];
  private int[] where = new int[64];
  private String[] name = new String[64];
  private int count;

  /** Names the file declares, whether or not anything has them. */
  final TreeSet<String> declaredZones = new TreeSet<>();

  /** Names the file declares, whether or not anything has them. */
  final TreeSet<String> declaredEdges = new TreeSet<>();

  /** Length after which y repeats, in the file's unit; 0 for none. */
  double period;

  int point(double x, double y, double z) {
    if (3 * points == xyz.length) {
      xyz = Arrays.copyOf(xyz, 2 * xyz.length);
    }
    xyz[3 * points] = x;
    xyz[3 * points + 1] = y;
    xyz[3 * points + 2] = z;
    return points++;
  }

  /**
   * Adds a cell: two corners make a line, three or four a polygon.
   *
   * @param position of the cell in the file
   * @param name null if it has none
   */
  void cell(int position, String name, int... corners) {
    if (count + 1 >= start.length) {
      start = Arrays.copyOf(start, 2 * start.length);
      where = Arrays.copyOf(where, 2 * where.length);
      this.name = Arrays.copyOf(this.name, 2 * this.name.length);
    }
    if (nodeCount + corners.length > nodes.length) {
      nodes = Arrays.copyOf(nodes, 2 * nodes.length);
    }
    for (int corner : corners) {
      nodes[nodeCount++] = corner;
    }
    this.name[count] = name;
    where[count] = position;
    start[++count] = nodeCount;
  }

  int count() {
    return count;
  }

  int size(int cell) {
    return start[cell + 1] - start[cell];
  }

  int corner(int cell, int k) {
    return nodes[start[cell] + k];
  }

  String name(int cell) {
    return name[cell];
  }

  int where(int cell) {
    return where[cell];
  }
}
