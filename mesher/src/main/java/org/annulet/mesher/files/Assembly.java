package org.annulet.mesher.files;

import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.mesher.mesh.MeshCheck;
import org.locationtech.jts.geom.Coordinate;
import org.locationtech.jts.geom.Envelope;
import org.locationtech.jts.index.kdtree.KdNode;
import org.locationtech.jts.index.kdtree.KdTree;

/** Makes a mesh of the cells of a file, or says what is wrong with them. */
final class Assembly {
  /** Coordinates closer than this, relative to the extent, are the same. */
  private static final double SAME = 1e-9;

  private final Cells cells;
  private final ImportOptions options;
  private final ByteCursor file;
  private final double[] xy;
  private final TreeSet<String> zones = new TreeSet<>();
  private final TreeSet<String> edges = new TreeSet<>();
  private double period;
  private int[] image;

  private Assembly(Cells cells, ImportOptions options, ByteCursor file) {
    this.cells = cells;
    this.options = options;
    this.file = file;
    this.xy = new double[2 * cells.points];
  }

  static Mesh mesh(Cells cells, ImportOptions options, ByteCursor file) throws MeshFileException {
    return new Assembly(cells, options, file).run();
  }

  private Mesh run() throws MeshFileException {
    names();
    flatten();
    join();
    Mesh.Builder builder = period == 0 ? Mesh.builder() : Mesh.periodicBuilder(period);
    int[] number = numberNodes(builder);
    long[] sides = new long[16];
    int sideCount = 0;
    Map<Long, String> named = new HashMap<>();
    for (int c = 0; c < cells.count(); c++) {
      if (cells.size(c) == 2) {
        line(c, named);
        continue;
      }
      for (int[] t : cells.size(c) == 3 ? List.of(new int[] {0, 1, 2}) : split(c)) {
        int[] v = new int[3];
        for (int k = 0; k < 3; k++) {
          v[k] = image[cells.corner(c, t[k])];
        }
        try {
          builder.triangle(number[v[0]], number[v[1]], number[v[2]], cells.name(c));
        } catch (IllegalArgumentException e) {
          throw file.faultAt(
              cells.where(c),
              "the triangle at " + place(v[0]) + " encloses no area",
              "remove it: merge nodes that lie on one another, or mesh again");
        }
        if (sideCount + 3 > sides.length) {
          sides = Arrays.copyOf(sides, 2 * sides.length);
        }
        for (int k = 0; k < 3; k++) {
          sides[sideCount++] = key(v[k], v[(k + 1) % 3]);
        }
      }
    }
    checkSides(Arrays.copyOf(sides, sideCount), named);
    for (int c = 0; c < cells.count(); c++) {
      if (cells.size(c) == 2 && cells.name(c) != null) {
        int a = image[cells.corner(c, 0)];
        int b = image[cells.corner(c, 1)];
        if (named.remove(key(a, b)) != null) {
          builder.segment(number[a], number[b], cells.name(c));
        }
      }
    }
    try {
      Mesh mesh = builder.build();
      List<MeshCheck.Finding> findings = MeshCheck.tiling(mesh);
      if (findings.isEmpty()) {
        return mesh;
      }
      throw file.fault(
          "the triangles do not cover the gas once: "
              + findings.get(0)
              + (findings.size() > 1 ? " and " + (findings.size() - 1) + " more" : ""),
          "remove folded, flat or overlapping triangles: mesh the drawing again");
    } catch (IllegalStateException e) {
      throw file.fault(
          "the triangles do not fit together: " + e.getMessage(),
          "remove overlapping or doubled surfaces and mesh again");
    }
  }

  private void names() throws MeshFileException {
    int nameless = 0;
    int first = -1;
    int polygons = 0;
    for (int c = 0; c < cells.count(); c++) {
      String name = cells.name(c);
      if (cells.size(c) > 2) {
        polygons++;
        if (name == null) {
          first = nameless++ == 0 ? c : first;
        } else {
          zones.add(name);
        }
      } else if (name != null) {
        edges.add(name);
      }
    }
    if (polygons == 0) {
      throw file.fault(
          "no triangles or quadrilaterals in the file",
          "write the 2-D mesh, and put its surfaces into named groups");
    }
    if (nameless > 0) {
      throw file.faultAt(
          cells.where(first),
          nameless
              + " of "
              + polygons
              + " surface cells belong to no zone; zones are "
              + list(zones),
          "put every surface into one named group (Physical Surface)");
    }
    lost("zone", cells.declaredZones, zones);
    lost("edge", cells.declaredEdges, edges);
    lost("zone", options.names().neededZones(), zones);
    lost("edge", options.names().neededEdges(), edges);
  }

  private void lost(String kind, Set<String> wanted, TreeSet<String> present)
      throws MeshFileException {
    TreeSet<String> lost = new TreeSet<>(wanted);
    lost.removeAll(present);
    if (!lost.isEmpty()) {
      throw file.fault(
          "no cell has the "
              + kind
              + " name "
              + list(lost)
              + "; "
              + kind
              + "s are "
              + list(present),
          "write the cells of this name too, or take the name away");
    }
  }

  /** Takes the plane's two coordinates, in metres, and looks that the third is constant. */
  private void flatten() throws MeshFileException {
    ImportOptions.Plane plane = options.plane();
    double[] low = new double[3];
    double[] high = new double[3];
    Arrays.fill(low, Double.POSITIVE_INFINITY);
    Arrays.fill(high, Double.NEGATIVE_INFINITY);
    for (int c = 0; c < cells.count(); c++) {
      for (int k = 0; k < cells.size(c); k++) {
        int v = cells.corner(c, k);
        for (int i = 0; i < 3; i++) {
          double value = cells.xyz[3 * v + i];
          if (!Double.isFinite(value)) {
            throw file.faultAt(
                cells.where(c), "a node has the coordinate " + value, ByteCursor.WRITE_AGAIN);
          }
          low[i] = Math.min(low[i], value);
          high[i] = Math.max(high[i], value);
        }
      }
    }
    int third = plane.third();
    double extent = Math.max(high[0] - low[0], Math.max(high[1] - low[1], high[2] - low[2]));
    if (!(high[third] - low[third] <= SAME * extent)) {
      throw file.fault(
          "the mesh is not flat: "
              + "xyz".charAt(third)
              + " runs from "
              + low[third]
              + " to "
              + high[third],
          "name the plane the mesh lies in (now " + plane + "), or write a flat mesh");
    }
    double unit = options.metresPerUnit();
    for (int v = 0; v < cells.points; v++) {
      xy[2 * v] = unit * cells.xyz[3 * v + plane.first];
      xy[2 * v + 1] = unit * cells.xyz[3 * v + plane.second];
    }
    period = unit * (options.period() > 0 ? options.period() : cells.period);
  }

  /** On a ring, nodes one period apart are one node. */
  private void join() throws MeshFileException {
    image = new int[cells.points];
    Arrays.setAll(image, v -> v);
    if (period == 0) {
      return;
    }
    if (!(period > 0) || Double.isInfinite(period)) {
      throw file.fault("the period is " + period + " m", "a period is positive");
    }
    KdTree tree = new KdTree();
    for (int pass = 0; pass < 2; pass++) {
      for (int v = 0; v < cells.points; v++) {
        double turns = Math.floor(xy[2 * v + 1] / period + SAME);
        if ((turns == 0) != (pass == 0)) {
          continue;
        }
        double y = xy[2 * v + 1] - turns * period;
        Envelope near = new Envelope(new Coordinate(xy[2 * v], y));
        near.expandBy(SAME * period);
        List<?> found = turns == 0 ? List.of() : tree.query(near);
        if (found.isEmpty()) {
          xy[2 * v + 1] = Math.max(0, y);
          tree.insert(new Coordinate(xy[2 * v], xy[2 * v + 1]), v);
        } else {
          image[v] = (Integer) ((KdNode) found.get(0)).getData();
        }
      }
    }
  }

  private int[] numberNodes(Mesh.Builder builder) {
    boolean[] used = new boolean[cells.points];
    for (int c = 0; c < cells.count(); c++) {
      for (int k = 0; cells.size(c) > 2 && k < cells.size(c); k++) {
        used[image[cells.corner(c, k)]] = true;
      }
    }
    int[] number = new int[cells.points];
    for (int v = 0; v < number.length; v++) {
      number[v] = used[v] ? builder.node(xy[2 * v], xy[2 * v + 1]) : -1;
    }
    return number;
  }

  private void line(int c, Map<Long, String> named) throws MeshFileException {
    String name = cells.name(c);
    int a = image[cells.corner(c, 0)];
    if (name == null) {
      return;
    }
    String before = named.put(key(a, image[cells.corner(c, 1)]), name);
    if (before != null && !before.equals(name)) {
      throw file.faultAt(
          cells.where(c),
          "the segment at " + place(a) + " is named '" + before + "' and '" + name + "'",
          "put every curve into one named group only");
    }
  }

  private void checkSides(long[] sides, Map<Long, String> named) throws MeshFileException {
    Arrays.sort(sides);
    int bare = 0;
    long firstBare = 0;
    int matched = 0;
    for (int i = 0; i < sides.length; ) {
      int n = 1;
      while (i + n < sides.length && sides[i + n] == sides[i]) {
        n++;
      }
      boolean hasName = named.containsKey(sides[i]);
      matched += hasName ? 1 : 0;
      if (n > 2) {
        throw file.fault(
            n + " triangles share the side at " + place((int) (sides[i] >>> 32)),
            "remove overlapping or doubled surfaces and mesh again");
      }
      if (n == 1 && !hasName) {
        firstBare = bare++ == 0 ? sides[i] : firstBare;
      }
      i += n;
    }
    if (bare > 0) {
      throw file.fault(
          bare
              + " boundary sides have no name, the first from "
              + place((int) (firstBare >>> 32))
              + " to "
              + place((int) firstBare)
              + "; edges are "
              + list(edges),
          "put every boundary curve into a named group (Physical Curve, or the cell array 'edge' on"
              + " line cells); if the sides lie inside, merge the doubled nodes there");
    }
    if (matched < named.size()) {
      Arrays.sort(sides);
      for (Map.Entry<Long, String> entry : new java.util.TreeMap<>(named).entrySet()) {
        if (Arrays.binarySearch(sides, entry.getKey()) < 0) {
          throw file.fault(
              "edge '"
                  + entry.getValue()
                  + "' has a segment at "
                  + place((int) (entry.getKey() >>> 32))
                  + " that is no side of a triangle",
              "take construction lines out of the named groups");
        }
      }
    }
  }

  /** The two triangles of a quadrilateral, by the diagonal that leaves the larger angles. */
  private List<int[]> split(int c) throws MeshFileException {
    List<int[]> one = List.of(new int[] {0, 1, 2}, new int[] {0, 2, 3});
    List<int[]> other = List.of(new int[] {0, 1, 3}, new int[] {1, 2, 3});
    double first = worstShape(c, one);
    double second = worstShape(c, other);
    if (!(Math.max(first, second) > 0)) {
      throw file.faultAt(
          cells.where(c),
          "the quadrilateral at " + place(image[cells.corner(c, 0)]) + " crosses itself or is flat",
          "mesh again");
    }
    return first >= second ? one : other;
  }

  /** Smaller of 2·area/longest² of two triangles; negative if they do not turn the same way. */
  private double worstShape(int c, List<int[]> pair) {
    double[] shape = new double[2];
    for (int i = 0; i < 2; i++) {
      double[] x = new double[3];
      double[] y = new double[3];
      for (int k = 0; k < 3; k++) {
        int v = image[cells.corner(c, pair.get(i)[k])];
        x[k] = xy[2 * v];
        y[k] = xy[2 * v + 1];
        y[k] -= period == 0 ? 0 : period * Math.rint((y[k] - y[0]) / period);
      }
      double longest = 0;
      for (int k = 0; k < 3; k++) {
        longest = Math.max(longest, Math.hypot(x[(k + 1) % 3] - x[k], y[(k + 1) % 3] - y[k]));
      }
      double twice = (x[1] - x[0]) * (y[2] - y[0]) - (x[2] - x[0]) * (y[1] - y[0]);
      shape[i] = twice / (longest * longest);
    }
    return shape[0] * shape[1] > 0 ? Math.min(Math.abs(shape[0]), Math.abs(shape[1])) : -1;
  }

  private String place(int v) {
    return "(" + xy[2 * v] + ", " + xy[2 * v + 1] + ") m";
  }

  private static String list(Set<String> names) {
    return names.isEmpty() ? "none" : "'" + String.join("', '", names) + "'";
  }

  private static long key(int a, int b) {
    return ((long) Math.min(a, b) << 32) | Math.max(a, b);
  }
}
