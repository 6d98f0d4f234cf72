package org.annulet.solver.medium;

/**
 * How well a temperature field covers a zone, and what it gives there.
 *
 * @param zone name
 * @param nodes of the mesh in the zone
 * @param extrapolatedNodes nodes outside the field's data; they took the nearest values
 * @param farthestOutside largest distance of such a node from the data in m; 0 without any
 * @param temperature K; range over the nodes, mean over the area
 * @param soundSpeed m/s; range over the triangles, mean such that area over mean is the sum of area
 *     over sound speed
 */
public record Coverage(
    String zone,
    int nodes,
    int extrapolatedNodes,
    double farthestOutside,
    Range temperature,
    Range soundSpeed) {
  /**
   * Least, mean and largest value.
   *
   * @param least smallest
   * @param mean as stated where it is used
   * @param largest greatest
   */
  public record Range(double least, double mean, double largest) {}
}
