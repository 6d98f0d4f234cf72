package org.annulet.solver.sparse;

class UpLookingAnalysisTest extends SymmetricAnalysisContract {
  @Override
  SymmetricAnalysis analyse(SymmetricPattern pattern, double[][] coordinates) {
    return new UpLookingAnalysis(pattern);
  }
}
