package org.annulet.solver.sparse;

/**
 * The fast way: nested dissection, fronts of merged columns, multifrontal L D Lᵀ on dense blocks.
 *
 * <p>Without pivoting; several factorisations may run on one analysis at the same time, each with
 * its own work space.
 */
public final class MultifrontalAnalysis implements SymmetricAnalysis {
  private final SymmetricPattern pattern;
  private final FrontTree tree;

  /**
   * Orders and plans.
   *
   * @param coordinates shape [2][n], or null
   */
  MultifrontalAnalysis(SymmetricPattern pattern, double[][] coordinates) {
    this.pattern = pattern;
    tree = new FrontTree(pattern, order(pattern, coordinates));
  }

  /** Ordering and elimination tree, found in a numbering that keeps neighbours close in memory. */
  static EliminationTree order(SymmetricPattern pattern, double[][] coordinates) {
    Adjacency graph = Adjacency.of(pattern);
    int[] walk = graph.breadthFirst();
    Adjacency near = graph.renumbered(walk);
    double[][] at = coordinates == null ? null : new double[2][walk.length];
    if (coordinates != null) {
      for (int k = 0; k < walk.length; k++) {
        at[0][k] = coordinates[0][walk[k]];
        at[1][k] = coordinates[1][walk[k]];
      }
    }
    EliminationTree tree = EliminationTree.of(near, Dissection.order(near, at));
    int[] order = tree.order();
    for (int k = 0; k < order.length; k++) {
      order[k] = walk[order[k]];
    }
    return tree;
  }

  @Override
  public SymmetricPattern pattern() {
    return pattern;
  }

  @Override
  public long factorEntries() {
    return tree.factorEntries;
  }

  @Override
  public long complexFactorBytes() {
    long front = (long) tree.largestFront * tree.largestFront;
    return 16 * (tree.factorEntries + tree.stackEntries + front) + (1 << 16);
  }

  @Override
  public RealFactor factorReal(double[] values) {
    return new MultifrontalRealFactor(pattern, tree, values);
  }

  @Override
  public ComplexFactor factorComplex(double[] re, double[] im) {
    return new MultifrontalComplexFactor(pattern, tree, re, im);
  }

  FrontTree tree() {
    return tree;
  }
}
