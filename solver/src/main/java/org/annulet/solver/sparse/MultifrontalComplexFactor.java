package org.annulet.solver.sparse;

/** Complex symmetric L D Lᵀ on fronts. */
final class MultifrontalComplexFactor extends RefinedComplexFactor {
  private final double[] pivotRe;
  private final double[] pivotIm;
  private final double growth;
  private final ComplexSweeps sweeps;

  MultifrontalComplexFactor(SymmetricPattern pattern, FrontTree tree, double[] re, double[] im) {
    super(pattern, re, im);
    ComplexFront front = new ComplexFront(tree);
    front.factorise(re, im);
    pivotRe = front.pivotRe;
    pivotIm = front.pivotIm;
    growth = Math.sqrt(front.growthSquared);
    sweeps = new ComplexSweeps(tree, front);
  }

  @Override
  void solveOnce(double[][] re, double[][] im) {
    sweeps.solve(re, im);
  }

  @Override
  public LogDeterminant logDeterminant() {
    return logDeterminant(pivotRe, pivotIm);
  }

  @Override
  public double pivotGrowth() {
    return growth;
  }
}
