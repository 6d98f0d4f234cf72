package org.annulet.mesher.mesh;

/** Areas and lengths of a mesh, by name; sums are compensated, so they are good to a few ulp. */
public final class MeshMeasures {
  private MeshMeasures() {}

  /** Area of the whole mesh in m². */
  public static double area(Mesh mesh) {
    Sum sum = new Sum();
    for (int t = 0; t < mesh.triangleCount(); t++) {
      sum.add(mesh.area(t));
    }
    return sum.value();
  }

  /**
   * Area of each zone in m².
   *
   * @return new array, in the order of {@link Mesh#zoneNames()}
   */
  public static double[] zoneAreas(Mesh mesh) {
    Sum[] sums = sums(mesh.zoneNames().size());
    for (int t = 0; t < mesh.triangleCount(); t++) {
      sums[mesh.zone(t)].add(mesh.area(t));
    }
    return values(sums);
  }

  /**
   * Length of each named edge in m.
   *
   * @return new array, in the order of {@link Mesh#edgeNames()}
   */
  public static double[] edgeLengths(Mesh mesh) {
    Sum[] sums = sums(mesh.edgeNames().size());
    for (int e = 0; e < mesh.segmentCount(); e++) {
      sums[mesh.segmentEdge(e)].add(mesh.segmentLength(e));
    }
    return values(sums);
  }

  private static Sum[] sums(int count) {
    Sum[] sums = new Sum[count];
    for (int i = 0; i < count; i++) {
      sums[i] = new Sum();
    }
    return sums;
  }

  private static double[] values(Sum[] sums) {
    double[] values = new double[sums.length];
    for (int i = 0; i < values.length; i++) {
      values[i] = sums[i].value();
    }
    return values;
  }

  /** Neumaier's compensated sum (Neumaier 1974). */
  static final class Sum {
    private double total;
    private double lost;

    void add(double term) {
      double next = total + term;
      lost += Math.abs(total) >= Math.abs(term) ? (total - next) + term : (term - next) + total;
      total = next;
    }

    double value() {
      return total + lost;
    }
  }
}
