package org.annulet.solver.sparse;

class MultifrontalAnalysisTest extends SymmetricAnalysisContract {
  @Override
  SymmetricAnalysis analyse(SymmetricPattern pattern, double[][] coordinates) {
    return new MultifrontalAnalysis(pattern, coordinates);
  }
}
