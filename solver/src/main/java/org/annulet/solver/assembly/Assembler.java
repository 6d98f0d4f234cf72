package org.annulet.solver.assembly;

import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.concurrent.ConcurrentHashMap;
import java.util.function.Supplier;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.boundary.EdgeGas;
import org.annulet.solver.medium.Medium;
import org.annulet.solver.operator.SparseVector;
import org.annulet.solver.sparse.PatternBuilder;
import org.annulet.solver.sparse.SymmetricPattern;

/**
 * Adds element matrices up on one pattern. The unknowns are seen through one copy of the mesh (a
 * whole problem) or two (even and odd part of a Bloch cell, each counted twice, for the half cell
 * and its mirror image).
 */
final class Assembler {
  private final CutMesh nodes;
  private final Metric metric;
  private final Medium medium;
  private final UnknownMap[] copies;
  private final double scale;
  private final SymmetricPattern pattern;
  private final Element element;
  private final Map<Object, Object> made = new ConcurrentHashMap<>();

  /**
   * @param size number of unknowns
   * @param copies the first one is the even part
   */
  Assembler(CutMesh nodes, Metric metric, Medium medium, int size, UnknownMap... copies) {
    this(nodes, metric, medium, buildPattern(nodes, size, copies), copies);
  }

  /**
   * @param pattern that holds all couplings of the unknowns
   * @param copies the first one is the even part
   */
  Assembler(
      CutMesh nodes, Metric metric, Medium medium, SymmetricPattern pattern, UnknownMap... copies) {
    if (medium.triangleCount() != nodes.mesh().triangleCount()) {
      throw new IllegalArgumentException(
          "the gas is given on "
              + medium.triangleCount()
              + " triangles, the mesh has "
              + nodes.mesh().triangleCount());
    }
    this.nodes = nodes;
    this.metric = metric;
    this.medium = medium;
    this.copies = copies;
    this.scale = copies.length;
    this.element = new Element(metric, medium);
    this.pattern = pattern;
  }

  private static SymmetricPattern buildPattern(CutMesh nodes, int size, UnknownMap... copies) {
    PatternBuilder builder = new PatternBuilder(size);
    int[] unknowns = new int[3];
    for (UnknownMap copy : copies) {
      for (int t = 0; t < nodes.mesh().triangleCount(); t++) {
        int n = 0;
        for (int k = 0; k < 3; k++) {
          int u = copy.unknown()[nodes.corner(t, k)];
          if (u >= 0) {
            unknowns[n++] = u;
          }
        }
        for (int a = 1; a < n; a++) {
          for (int b = 0; b < a; b++) {
            builder.pair(unknowns[a], unknowns[b]);
          }
        }
      }
    }
    return builder.build();
  }

  Mesh mesh() {
    return nodes.mesh();
  }

  CutMesh nodes() {
    return nodes;
  }

  Metric metric() {
    return metric;
  }

  Medium medium() {
    return medium;
  }

  SymmetricPattern pattern() {
    return pattern;
  }

  UnknownMap even() {
    return copies[0];
  }

  double[][] coordinates() {
    return once("coordinates", () -> UnknownMap.coordinates(nodes, pattern.size(), copies));
  }

  /**
   * What depends on mesh, gas and the key alone: made at the first call, and the same object, not
   * to be modified, at every later one. So operators that differ in their coefficients only share
   * their arrays, and whoever projects them can tell.
   *
   * @param key of one kind of thing; compared by value
   */
  @SuppressWarnings("unchecked")
  <T> T once(Object key, Supplier<T> make) {
    Object before = made.get(key);
    if (before == null) {
      T now = make.get();
      Object other = made.putIfAbsent(key, now);
      before = other == null ? now : other;
    }
    return (T) before;
  }

  /** Fills in the matrix of one triangle, lower triangle row by row, shape [6]. */
  @FunctionalInterface
  interface ElementMatrix {
    void of(int t, double[] out);
  }

  double[] stiffness() {
    return once("stiffness", () -> sum(element::stiffness));
  }

  /**
   * With m² or k² times its cross part.
   *
   * @param crossFactor m² or k²
   */
  double[] stiffness(double crossFactor) {
    return crossFactor == 0
        ? stiffness()
        : once(
            List.of("stiffness", crossFactor),
            () -> {
              double[] sum = stiffness().clone();
              double[] cross = crossStiffness();
              for (int q = 0; q < sum.length; q++) {
                sum[q] += crossFactor * cross[q];
              }
              return sum;
            });
  }

  double[] crossStiffness() {
    return once("cross stiffness", () -> sum(element::crossStiffness));
  }

  double[] mass() {
    return once("mass", () -> sum(element::mass));
  }

  Element element() {
    return element;
  }

  private double[] sum(ElementMatrix matrix) {
    double[] values = new double[pattern.entryCount()];
    double[] local = new double[6];
    for (int t = 0; t < mesh().triangleCount(); t++) {
      matrix.of(t, local);
      add(values, t, local);
    }
    return values;
  }

  private void add(double[] values, int t, double[] local) {
    for (UnknownMap copy : copies) {
      int q = 0;
      for (int i = 0; i < 3; i++) {
        for (int k = 0; k <= i; k++) {
          add(values, copy, nodes.corner(t, i), nodes.corner(t, k), local[q++]);
        }
      }
    }
  }

  private void add(double[] values, UnknownMap copy, int v, int w, double x) {
    int a = copy.unknown()[v];
    int b = copy.unknown()[w];
    if (a >= 0 && b >= 0) {
      values[pattern.entry(a, b)] += scale * copy.factor()[v] * copy.factor()[w] * x;
    }
  }

  /** ∮ w/(ρc) φ_i φ_k over one side of an edge. */
  double[] wall(EdgeSegments edge) {
    double[] values = new double[pattern.entryCount()];
    for (EdgeSegments.Segment s : edge.segments()) {
      double[] local = wallElement(s);
      for (UnknownMap copy : copies) {
        add(values, copy, s.first(), s.first(), local[0]);
        add(values, copy, s.last(), s.first(), local[1]);
        add(values, copy, s.last(), s.last(), local[2]);
      }
    }
    return values;
  }

  double[] wallElement(EdgeSegments.Segment s) {
    double rc = medium.density(s.triangle()) * medium.soundSpeed(s.triangle());
    double[] local = s.product();
    for (int q = 0; q < 3; q++) {
      local[q] /= rc;
    }
    return local;
  }

  /** ∫ w_face/(ρc) φ_i φ_k over a face of a zone. */
  double[] face(int zone, Face face) {
    double[] values = new double[pattern.entryCount()];
    double[] local = new double[6];
    for (int t = 0; t < mesh().triangleCount(); t++) {
      if (mesh().zone(t) == zone) {
        element.face(t, face, local);
        add(values, t, local);
      }
    }
    return values;
  }

  /** The gas along an edge, averaged over its area. */
  EdgeGas gas(EdgeSegments edge) {
    double[] sum = new double[4];
    for (EdgeSegments.Segment s : edge.segments()) {
      addGas(sum, s.triangle(), s.load()[0] + s.load()[1]);
    }
    return new EdgeGas(sum[0] / sum[3], sum[1] / sum[3], sum[2] / sum[3]);
  }

  /** The gas of a zone, averaged over its area in the mesh. */
  EdgeGas gas(int zone) {
    double[] sum = new double[4];
    for (int t = 0; t < mesh().triangleCount(); t++) {
      if (mesh().zone(t) == zone) {
        addGas(sum, t, mesh().area(t));
      }
    }
    return new EdgeGas(sum[0] / sum[3], sum[1] / sum[3], sum[2] / sum[3]);
  }

  private void addGas(double[] sum, int t, double weight) {
    sum[0] += weight * medium.density(t);
    sum[1] += weight * medium.soundSpeed(t);
    sum[2] += weight * medium.gamma(t);
    sum[3] += weight;
  }

  /**
   * A functional that is alike on the half cell and its mirror image, as a vector of unknowns.
   *
   * @param nodal value per node after cutting
   */
  SparseVector evenVector(Map<Integer, Double> nodal) {
    Map<Integer, Double> x = new TreeMap<>();
    nodal.forEach(
        (v, value) -> {
          int u = even().unknown()[v];
          if (u >= 0) {
            x.merge(u, even().factor()[v] * value, Double::sum);
          }
        });
    return vector(x);
  }

  static SparseVector vector(Map<Integer, Double> entries) {
    int[] index = new int[entries.size()];
    double[] value = new double[index.length];
    int q = 0;
    for (Map.Entry<Integer, Double> entry : new TreeMap<>(entries).entrySet()) {
      index[q] = entry.getKey();
      value[q++] = entry.getValue();
    }
    return new SparseVector(index, value);
  }

  /**
   * Adds vᵀA for the matrix A of one triangle (or one segment) to a vector of unknowns.
   *
   * @param local lower triangle row by row
   * @param at nodes after cutting
   * @param v test vector by unknown
   * @param out added to
   */
  void addRow(double[] local, int[] at, Map<Integer, Double> v, Map<Integer, Double> out) {
    for (UnknownMap copy : copies) {
      for (int i = 0; i < at.length; i++) {
        int row = copy.unknown()[at[i]];
        Double test = row < 0 ? null : v.get(row);
        if (test == null) {
          continue;
        }
        for (int k = 0; k < at.length; k++) {
          int column = copy.unknown()[at[k]];
          if (column >= 0) {
            double a = local[i >= k ? i * (i + 1) / 2 + k : k * (k + 1) / 2 + i];
            double value = scale * copy.factor()[at[i]] * copy.factor()[at[k]] * test * a;
            out.merge(column, value, Double::sum);
          }
        }
      }
    }
  }

  /** Counts an area of the half cell twice on a Bloch cell. */
  double cellArea(double area) {
    return scale * area;
  }
}
