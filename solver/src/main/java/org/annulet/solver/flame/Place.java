package org.annulet.solver.flame;

/** Where the heat of a flame is released. */
public sealed interface Place {
  /**
   * Spread evenly over a patch.
   *
   * @param patch of one zone
   */
  record Spread(Patch patch) implements Place {}

  /**
   * A thin sheet on an inner edge that answers as a whole: the heat release per area is the same
   * everywhere on it. On a ring one sheet per burner: the segments nearest to its centre line.
   *
   * @param edge name of the inner edge
   */
  record Sheet(String edge) implements Place {}

  /**
   * A thin sheet on an inner edge of a section, each point of which answers to the velocity just
   * upstream of itself. Its reference must be the {@link Reference.EdgeFlux} of the same edge.
   *
   * @param edge name of the inner edge
   */
  record PointwiseSheet(String edge) implements Place {}

  /**
   * Spread over a patch by a given density.
   *
   * @param patch of one zone
   * @param density of the heat release, up to a factor
   */
  record Weighted(Patch patch, HeatDensity density) implements Place {}
}
