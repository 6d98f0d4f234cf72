package org.annulet.mesher.mesh;

/**
 * A refined mesh and where its nodes and triangles come from. Nodes of the parent mesh keep their
 * numbers; each new node sits halfway between two of them. Immutable.
 */
public final class Refinement {
  private final Mesh mesh;
  private final int[] parentTriangle;
  private final int[] nodeParents;
  private final int straightened;

  Refinement(Mesh mesh, int[] parentTriangle, int[] nodeParents, int straightened) {
    this.mesh = mesh;
    this.parentTriangle = parentTriangle;
    this.nodeParents = nodeParents;
    this.straightened = straightened;
  }

  /** The refined mesh. */
  public Mesh mesh() {
    return mesh;
  }

  /** Triangle of the parent mesh in which triangle {@code t} of the refined mesh lies. */
  public int parentTriangle(int t) {
    return parentTriangle[t];
  }

  /** First parent of node {@code v}, a node of the parent mesh; {@code v} itself if it is old. */
  public int firstParent(int v) {
    return nodeParents[2 * v];
  }

  /** Second parent of node {@code v}; equal to the first if {@code v} is old. */
  public int secondParent(int v) {
    return nodeParents[2 * v + 1];
  }

  /**
   * Number of new nodes that were left on the chord because the true curve would have turned a
   * triangle over; zero where the mesh resolves its curves. More than zero means: mesh finer along
   * that edge.
   */
  public int straightened() {
    return straightened;
  }

  /**
   * A nodal field of the parent mesh carried to the refined mesh by linear interpolation.
   *
   * @param field shape [nodes of the parent mesh]; not modified
   * @return new array, shape [nodes of the refined mesh]
   */
  public double[] prolong(double[] field) {
    double[] fine = new double[mesh.nodeCount()];
    for (int v = 0; v < fine.length; v++) {
      fine[v] = 0.5 * (field[nodeParents[2 * v]] + field[nodeParents[2 * v + 1]]);
    }
    return fine;
  }
}
