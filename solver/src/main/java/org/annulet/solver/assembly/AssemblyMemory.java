package org.annulet.solver.assembly;

import java.util.Map;
import java.util.concurrent.ConcurrentHashMap;
import java.util.function.Supplier;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.medium.Medium;

/**
 * What problems on one mesh with one gas have in common: matrices, edges, load vectors. Builders
 * made with it assemble each of them once, and operators that differ in coefficients only (gains,
 * delays, admittances, losses) hold the very same arrays, by which they can be told to be alike.
 * Thread-safe.
 */
public final class AssemblyMemory {
  private final Metric metric;
  private final Medium medium;
  private final Map<Object, Object> made = new ConcurrentHashMap<>();

  /**
   * An empty memory.
   *
   * @throws IllegalArgumentException if mesh and geometry do not belong together
   */
  public AssemblyMemory(Mesh mesh, Geometry geometry, Medium medium) {
    this.metric = new Metric(mesh, geometry);
    this.medium = medium;
  }

  Metric metric() {
    return metric;
  }

  /** The gas on the triangles of the mesh. */
  public Medium medium() {
    return medium;
  }

  /**
   * Makes what is wanted at the first call with this key and returns the same object ever after.
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
}
