package org.annulet.mesher.mesh;

import java.util.BitSet;

/**
 * Each triangle into four by the middles of its sides: the mesh size halves, angles stay, zone and
 * edge names stay. Area is kept to rounding where the edges are straight.
 */
public final class UniformRefinement {
  private UniformRefinement() {}

  /** {@code mesh} refined once with every edge straight. */
  public static Refinement of(Mesh mesh) {
    return of(mesh, EdgeCurves.STRAIGHT);
  }

  /**
   * {@code mesh} refined once; new nodes of named edges go where {@code curves} says.
   *
   * <p>For a ring, refine the half cell and lay it round again with {@link RingReplication}.
   */
  public static Refinement of(Mesh mesh, EdgeCurves curves) {
    MeshSides sides = MeshSides.of(mesh);
    BitSet all = new BitSet();
    all.set(0, sides.count());
    SideSplit.SplitRule rule = new SideSplit.SplitRule(SideSplit.Pattern.SIMILAR, curves);
    return SideSplit.split(mesh, sides, all, rule);
  }
}
