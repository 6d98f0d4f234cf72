package org.annulet.solver.sparse;

/** Real L D Lᵀ on fronts. */
final class MultifrontalRealFactor extends RefinedRealFactor {
  private final double[] pivot;
  private final double growth;
  private final RealSweeps sweeps;

  MultifrontalRealFactor(SymmetricPattern pattern, FrontTree tree, double[] values) {
    super(pattern, values);
    RealFront front = new RealFront(tree);
    front.factorise(values);
    pivot = front.pivot;
    growth = front.growth;
    sweeps = new RealSweeps(tree, front);
  }

  @Override
  void solveOnce(double[][] b) {
    sweeps.solve(b);
  }

  @Override
  public int negativePivots() {
    return negative(pivot);
  }

  @Override
  public LogDeterminant logDeterminant() {
    return logDeterminant(pivot);
  }

  @Override
  public double pivotGrowth() {
    return growth;
  }
}
