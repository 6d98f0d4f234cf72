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
    Adjacency graph = Adjacency.of(pattern);
    tree = new FrontTree(pattern, graph, Dissection.order(graph, coordinates));
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
