package org.annulet.solver.sparse;

class MultifrontalWithoutCoordinatesTest extends SymmetricAnalysisContract {
  @Override
  SymmetricAnalysis analyse(SymmetricPattern pattern, double[][] coordinates) {
    return new MultifrontalAnalysis(pattern, null);
  }
}
