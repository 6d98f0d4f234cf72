package org.annulet.mesher.files;

import java.util.Map;
import java.util.Set;

/**
 * What a mesh file does not say by itself. Start from {@link #standard()} and change what differs.
 *
 * @param plane which two coordinates of the file are x and y of the mesh; the third must be
 *     constant
 * @param metresPerUnit length of the file's unit in m: 1 for metres, 0.001 for millimetres
 * @param period length in the file's unit after which y repeats; 0 for a mesh that is not closed,
 *     or where the file says so itself
 * @param names names by number, and names that must be there
 */
public record ImportOptions(Plane plane, double metresPerUnit, double period, Names names) {
  /** First and second coordinate of the mesh. */
  public enum Plane {
    /** x and y of the file. */
    XY(0, 1),
    /** x and z of the file. */
    XZ(0, 2),
    /** y and z of the file. */
    YZ(1, 2),
    /** z as the first, y as the second: the machine's axis along z, the radius along y. */
    ZY(2, 1),
    /** z as the first, x as the second: the machine's axis along z, the radius along x. */
    ZX(2, 0),
    /** y as the first, x as the second. */
    YX(1, 0);

    final int first;
    final int second;

    Plane(int first, int second) {
      this.first = first;
      this.second = second;
    }

    int third() {
      return 3 - first - second;
    }
  }

  /**
   * Names the caller knows.
   *
   * @param zones names of zones by their number in the file, where the file has only the number
   * @param edges names of edges by their number in the file, where the file has only the number
   * @param neededZones zones that must be in the file
   * @param neededEdges edges that must be in the file
   */
  public record Names(
      Map<Integer, String> zones,
      Map<Integer, String> edges,
      Set<String> neededZones,
      Set<String> neededEdges) {
    public Names {
      zones = Map.copyOf(zones);
      edges = Map.copyOf(edges);
      neededZones = Set.copyOf(neededZones);
      neededEdges = Set.copyOf(neededEdges);
    }
  }

  public ImportOptions {
    if (!(metresPerUnit > 0) || Double.isInfinite(metresPerUnit)) {
      throw new IllegalArgumentException(
          "the unit of length must be positive, got " + metresPerUnit + " m");
    }
    if (!(period >= 0) || Double.isInfinite(period)) {
      throw new IllegalArgumentException("the period must not be negative, got " + period);
    }
  }

  /** The plane x, y in metres, all names from the file, none demanded. */
  public static ImportOptions standard() {
    return new ImportOptions(Plane.XY, 1, 0, new Names(Map.of(), Map.of(), Set.of(), Set.of()));
  }

  /** These options with another plane. */
  public ImportOptions inPlane(Plane other) {
    return new ImportOptions(other, metresPerUnit, period, names);
  }

  /** These options with another unit of length, in m. */
  public ImportOptions inUnitsOf(double metres) {
    return new ImportOptions(plane, metres, period, names);
  }

  /** These options for a mesh whose y repeats after {@code length}, in the file's unit. */
  public ImportOptions repeatingAfter(double length) {
    return new ImportOptions(plane, metresPerUnit, length, names);
  }

  /** These options with names for numbers that have none in the file. */
  public ImportOptions naming(Map<Integer, String> zones, Map<Integer, String> edges) {
    Names more = new Names(zones, edges, names.neededZones(), names.neededEdges());
    return new ImportOptions(plane, metresPerUnit, period, more);
  }

  /** These options with names that must be there. */
  public ImportOptions needing(Set<String> zones, Set<String> edges) {
    Names more = new Names(names.zones(), names.edges(), zones, edges);
    return new ImportOptions(plane, metresPerUnit, period, more);
  }
}
