package org.annulet.mesher.mesh;

import java.util.ArrayDeque;
import java.util.BitSet;
import java.util.function.IntPredicate;

/**
 * Local refinement by longest-edge bisection (M.-C. Rivara, Int. J. Numer. Methods Eng. 20, 1984,
 * 745–756, from memory): the longest side of each marked triangle is halved, and of each triangle
 * whose sides that touches, until the mesh conforms.
 *
 * <p>Terminates because the closure only ever marks sides, each once, going to longer sides (equal
 * lengths are ordered by node numbers). However often it is repeated on straight edges, no angle
 * falls below half the smallest of the first mesh (Rosenberg and Stenger 1975). Zone and edge names
 * stay. The rule needs no memory of earlier refinements, so any mesh may be handed in, closed rings
 * included.
 */
public final class Bisection {
  private Bisection() {}

  /** {@code mesh} with each triangle that {@code marked} accepts bisected, edges straight. */
  public static Refinement of(Mesh mesh, IntPredicate marked) {
    return of(mesh, marked, EdgeCurves.STRAIGHT);
  }

  /**
   * {@code mesh} with each marked triangle bisected; new nodes of named edges go where {@code
   * curves} says.
   *
   * <p>For a ring, refine the half cell and lay it round again with {@link RingReplication}.
   *
   * @param marked asked once for each triangle index of {@code mesh}
   */
  public static Refinement of(Mesh mesh, IntPredicate marked, EdgeCurves curves) {
    MeshSides sides = MeshSides.of(mesh);
    BitSet split = new BitSet(sides.count());
    ArrayDeque<Integer> open = new ArrayDeque<>();
    for (int t = 0; t < mesh.triangleCount(); t++) {
      if (marked.test(t)) {
        open.add(t);
      }
    }
    while (!open.isEmpty()) {
      int t = open.poll();
      int s = sides.side(t, longestSide(mesh, sides, t));
      if (split.get(s)) {
        continue;
      }
      split.set(s);
      int other = sides.firstTriangle(s) == t ? sides.secondTriangle(s) : sides.firstTriangle(s);
      if (other >= 0) {
        open.add(other);
      }
    }
    SideSplit.SplitRule rule = new SideSplit.SplitRule(SideSplit.Pattern.BISECTED, curves);
    return SideSplit.split(mesh, sides, split, rule);
  }

  /** Which side of triangle {@code t} (k to k + 1) is the longest; ties go by node numbers. */
  static int longestSide(Mesh mesh, MeshSides sides, int t) {
    int best = 0;
    double length = squared(mesh, sides, sides.side(t, 0));
    for (int k = 1; k < 3; k++) {
      int s = sides.side(t, k);
      double l = squared(mesh, sides, s);
      if (l > length || (l == length && comesAfter(sides, s, sides.side(t, best)))) {
        best = k;
        length = l;
      }
    }
    return best;
  }

  private static boolean comesAfter(MeshSides sides, int s, int than) {
    int byHigh = Integer.compare(sides.highNode(s), sides.highNode(than));
    return byHigh > 0 || (byHigh == 0 && sides.lowNode(s) > sides.lowNode(than));
  }

  /** Squared length; the same bits from both triangles, since it starts at the lower node. */
  private static double squared(Mesh mesh, MeshSides sides, int s) {
    int a = sides.lowNode(s);
    int b = sides.highNode(s);
    double dx = mesh.x(b) - mesh.x(a);
    double dy = mesh.y(b) - mesh.y(a);
    if (mesh.period() != 0) {
      dy -= mesh.period() * Math.rint(dy / mesh.period());
    }
    return dx * dx + dy * dy;
  }
}
