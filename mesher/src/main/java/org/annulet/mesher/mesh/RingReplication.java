package org.annulet.mesher.mesh;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;

/**
 * Lays a half burner cell round a ring: mirrored about its centre line, then repeated N times.
 *
 * <p>All y are first rounded to multiples of 2q, q = ulp(2 N pitch): about 1e-15 of the ring's
 * length. From there on j·pitch ± y, differences of y and unwrapping about the seam are exact in
 * double arithmetic, so every cell has the same triangles to the last bit, and mirrored triangles
 * are mirrored to the last bit: what an operator computes from coordinate differences is the same
 * in each cell, and one cell can be solved for the ring.
 *
 * <p>Nodes and triangles of the whole come cell by cell, in the order of the half cell, the
 * unmirrored half first.
 */
public final class RingReplication {
  private static final double TOLERANCE = 1e-9;

  private final Mesh half;
  private final int count;
  private final double pitch;
  private final Map<Integer, CellException> exceptions = new HashMap<>();
  private final Mesh.Builder builder;
  private final int[] onLine;
  private final List<int[]> nodes = new ArrayList<>();
  private final Map<Long, Integer> wholeNode = new HashMap<>();

  private RingReplication(Mesh half, int count, double pitch) {
    this.half = half;
    this.count = count;
    this.pitch = pitch;
    this.builder = Mesh.periodicBuilder(count * pitch);
    this.onLine = lines(half, pitch);
  }

  /**
   * The ring of N equal cells.
   *
   * @param half the half cell, 0 ≤ y ≤ pitch/2, with edges {@value RingCells#MIRROR} on y = 0 and
   *     {@value RingCells#SEAM} on y = pitch/2; both lines may be hit or missed piecewise
   * @param count number of cells N, positive
   * @param pitch length of a cell in m
   * @throws IllegalArgumentException if the half cell does not lie so
   */
  public static RingCells of(Mesh half, int count, double pitch) {
    return of(half, count, pitch, List.of());
  }

  /**
   * The ring of N cells of which some carry exceptions.
   *
   * @param exceptions at most one for each cell
   * @throws IllegalArgumentException if the half cell does not lie as it must, an exception names
   *     something the half cell does not have, or leaving a zone out lays a side bare that has no
   *     name
   */
  public static RingCells of(Mesh half, int count, double pitch, List<CellException> exceptions) {
    if (half.period() != 0 || count < 1 || !(pitch > 0) || Double.isInfinite(count * pitch)) {
      throw new IllegalArgumentException(
          "a ring is laid from an open half cell, a positive count and pitch; got period "
              + half.period()
              + " m, "
              + count
              + " cells of "
              + pitch
              + " m");
    }
    double quantum = 2 * Math.ulp(2 * count * pitch);
    double exactPitch = 2 * quantum * Math.rint(pitch / (2 * quantum));
    Mesh exact = rounded(half, quantum, exactPitch);
    RingReplication ring = new RingReplication(exact, count, exactPitch);
    ring.take(exceptions);
    return ring.lay();
  }

  private void take(List<CellException> list) {
    for (CellException e : list) {
      if (e.cell() < 0 || e.cell() >= count || exceptions.put(e.cell(), e) != null) {
        throw new IllegalArgumentException(
            "cell " + e.cell() + " of " + count + " does not exist or has two exceptions");
      }
      known("zone", e.zonesLeftOut(), half.zoneNames());
      known("zone", e.zoneNames().keySet(), half.zoneNames());
      known("edge", e.edgeNames().keySet(), half.edgeNames());
    }
  }

  private static void known(String kind, Set<String> names, List<String> present) {
    for (String name : new TreeSet<>(names)) {
      if (!present.contains(name)) {
        throw new IllegalArgumentException(
            "an exception names " + kind + " '" + name + "'; the half cell has " + present);
      }
    }
  }

  private RingCells lay() {
    for (int j = 0; j < count; j++) {
      for (int side = 0; side < 2; side++) {
        layTriangles(j, side);
      }
    }
    for (int j = 0; j < count; j++) {
      for (int side = 0; side < 2; side++) {
        layEdges(j, side);
      }
    }
    int[] cell = new int[nodes.size()];
    int[] halfNode = new int[nodes.size()];
    boolean[] mirrored = new boolean[nodes.size()];
    for (int v = 0; v < cell.length; v++) {
      int[] image = nodes.get(v);
      cell[v] = image[0];
      halfNode[v] = image[1];
      mirrored[v] = image[2] == 1;
    }
    try {
      return new RingCells(half, builder.build(), count, cell, halfNode, mirrored);
    } catch (IllegalStateException e) {
      throw new IllegalArgumentException(
          "the half cell does not close to a ring: "
              + e.getMessage()
              + "\n    mend: name the border of a zone that an exception leaves out; one cell alone"
              + " needs at least two triangles from its centre line to its seam",
          e);
    }
  }

  private void layTriangles(int j, int side) {
    CellException exception = exceptions.get(j);
    for (int t = 0; t < half.triangleCount(); t++) {
      String zone = half.zoneNames().get(half.zone(t));
      if (leftOut(exception, t)) {
        continue;
      }
      String name = exception == null ? zone : exception.zoneNames().getOrDefault(zone, zone);
      // corner 0 stays corner 0, so that area and gradients round alike in the mirrored triangle
      int second = side == 0 ? 1 : 2;
      builder.triangle(
          node(j, side, half.corner(t, 0)),
          node(j, side, half.corner(t, second)),
          node(j, side, half.corner(t, 3 - second)),
          name);
    }
  }

  private boolean leftOut(CellException exception, int t) {
    return exception != null
        && exception.zonesLeftOut().contains(half.zoneNames().get(half.zone(t)));
  }

  private void layEdges(int j, int side) {
    CellException exception = exceptions.get(j);
    for (int e = 0; e < half.segmentCount(); e++) {
      String edge = half.edgeNames().get(half.segmentEdge(e));
      int a = half.segmentStart(e);
      int b = half.segmentEnd(e);
      if (edge.equals(RingCells.MIRROR) || edge.equals(RingCells.SEAM)) {
        layBareSeam(j, side, e);
        continue;
      }
      boolean left = leftOut(exception, half.segmentLeft(e));
      boolean right = half.segmentRight(e) < 0 || leftOut(exception, half.segmentRight(e));
      if (left && right) {
        continue;
      }
      String name = exception == null ? edge : exception.edgeNames().getOrDefault(edge, edge);
      builder.segment(node(j, side, a), node(j, side, b), name);
    }
  }

  /** The seam is no edge of the whole, unless one of the two cells leaves its zone out there. */
  private void layBareSeam(int j, int side, int e) {
    int a = half.segmentStart(e);
    if (onLine[a] != 2 || leftOut(exceptions.get(j), half.segmentLeft(e))) {
      return;
    }
    int neighbour = Math.floorMod(side == 0 ? j + 1 : j - 1, count);
    if (leftOut(exceptions.get(neighbour), half.segmentLeft(e))) {
      Map<String, String> names = exceptions.get(neighbour).edgeNames();
      String name = names.get(RingCells.SEAM);
      if (name == null) {
        throw new IllegalArgumentException(
            "cell "
                + neighbour
                + " leaves out a zone that reaches its seam\n    mend: name the wall this lays bare,"
                + " by an entry for '"
                + RingCells.SEAM
                + "' in the edge names of the exception");
      }
      builder.segment(node(j, side, a), node(j, side, half.segmentEnd(e)), name);
    }
  }

  /** Image of a node of the half cell, made on first use. */
  private int node(int j, int side, int v) {
    int cell = j;
    int image = side;
    if (onLine[v] == 1) {
      image = 0;
    } else if (onLine[v] == 2 && side == 1) {
      image = 0;
      cell = Math.floorMod(j - 1, count);
    }
    long key = (2L * cell + image) * half.nodeCount() + v;
    Integer known = wholeNode.get(key);
    if (known != null) {
      return known;
    }
    double y = image == 0 ? cell * pitch + half.y(v) : cell * pitch - half.y(v);
    int made = builder.node(half.x(v), y < 0 ? y + count * pitch : y);
    nodes.add(new int[] {cell, v, image});
    wholeNode.put(key, made);
    return made;
  }

  private static Mesh rounded(Mesh half, double quantum, double pitch) {
    Mesh.Builder builder = Mesh.builder();
    for (int v = 0; v < half.nodeCount(); v++) {
      double y = half.y(v);
      if (!(y >= -TOLERANCE * pitch && y <= (0.5 + TOLERANCE) * pitch)) {
        throw new IllegalArgumentException(
            "node ("
                + half.x(v)
                + ", "
                + y
                + ") m lies outside the half cell, 0 ≤ y ≤ "
                + 0.5 * pitch
                + " m");
      }
      boolean low = y < TOLERANCE * pitch;
      boolean high = y > (0.5 - TOLERANCE) * pitch;
      builder.node(half.x(v), low ? 0 : high ? 0.5 * pitch : quantum * Math.rint(y / quantum));
    }
    for (int t = 0; t < half.triangleCount(); t++) {
      String zone = half.zoneNames().get(half.zone(t));
      builder.triangle(half.corner(t, 0), half.corner(t, 1), half.corner(t, 2), zone);
    }
    for (int e = 0; e < half.segmentCount(); e++) {
      String edge = half.edgeNames().get(half.segmentEdge(e));
      builder.segment(half.segmentStart(e), half.segmentEnd(e), edge);
    }
    return builder.build();
  }

  /** 1 for nodes on the centre line, 2 on the seam, 0 elsewhere; checks the edges on them. */
  private static int[] lines(Mesh half, double pitch) {
    int[] line = new int[half.nodeCount()];
    Arrays.setAll(line, v -> half.y(v) == 0 ? 1 : half.y(v) == 0.5 * pitch ? 2 : 0);
    for (int e = 0; e < half.segmentCount(); e++) {
      String edge = half.edgeNames().get(half.segmentEdge(e));
      int a = line[half.segmentStart(e)];
      int on = a == line[half.segmentEnd(e)] ? a : 0;
      int wanted = edge.equals(RingCells.MIRROR) ? 1 : edge.equals(RingCells.SEAM) ? 2 : 0;
      if (on != wanted && (wanted != 0 || half.segmentRight(e) < 0)) {
        throw new IllegalArgumentException(
            "a segment of edge '"
                + edge
                + "' at ("
                + half.x(half.segmentStart(e))
                + ", "
                + half.y(half.segmentStart(e))
                + ") m: edge '"
                + RingCells.MIRROR
                + "' and nothing else lies on y = 0, edge '"
                + RingCells.SEAM
                + "' and nothing else on y = "
                + 0.5 * pitch
                + " m");
      }
    }
    return line;
  }
}
