package org.annulet.mesher.mesh;

/**
 * The true curves behind the named edges of a mesh. A refinement asks it where to put a new node
 * halfway along a named segment, so that curved edges stay curved.
 *
 * <p>Must be a pure function, and symmetric: exchanging the two ends gives the same point, to the
 * last bit.
 */
@FunctionalInterface
public interface EdgeCurves {
  /** Every edge is as straight as the mesh has it: the middle of the chord. */
  EdgeCurves STRAIGHT =
      (edge, start, end) -> new double[] {0.5 * (start[0] + end[0]), 0.5 * (start[1] + end[1])};

  /**
   * The point of a named edge halfway between two of its points.
   *
   * @param edge name of the edge
   * @param start x and y in m of one end of the segment; not modified
   * @param end x and y in m of the other; on a closed ring y is unwrapped next to start; not
   *     modified
   * @return new array, x and y in m; the middle of the chord where the edge is straight there
   */
  double[] midpoint(String edge, double[] start, double[] end);
}
