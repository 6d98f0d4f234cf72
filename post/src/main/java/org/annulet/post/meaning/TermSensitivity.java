package org.annulet.post.meaning;

import java.util.ArrayList;
import java.util.List;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.LowRankTerm;
import org.annulet.solver.operator.SparseTerm;
import org.apache.commons.math3.complex.Complex;

/**
 * How a simple mode moves when one term of the operator is made stronger: with the left eigenvector
 * q, qᵀL(s) = 0,
 *
 * <pre>
 *   ds/dε = − qᵀT_j p / ( qᵀL′(s) p ),   T_j → (1 + ε) T_j
 * </pre>
 *
 * <p>Exact to first order in ε. It differs from the share of the growth budget, which says what the
 * term does now, not what more of it would do: more of it also changes s and the shape.
 *
 * @param name of the term
 * @param growthPerPercent change of growth rate in 1/s for one percent more of it
 * @param frequencyPerPercent change of frequency in Hz for one percent more of it
 */
public record TermSensitivity(String name, double growthPerPercent, double frequencyPerPercent) {

  /**
   * Sensitivities to all terms, sparse ones first, in the operator's order.
   *
   * @param operator operator of the mode
   * @param mode simple (not one of a pair)
   * @param leftRe real part of the left eigenvector, shape [n]; the mode itself where every term is
   *     symmetric
   * @param leftIm imaginary part
   */
  public static List<TermSensitivity> of(
      AcousticOperator operator, Mode mode, double[] leftRe, double[] leftIm) {
    Forms forms = new Forms(operator);
    Forms.Vec p = new Forms.Vec(mode.re(), mode.im());
    Forms.Vec q = new Forms.Vec(leftRe, leftIm);
    Complex s = GrowthBudget.rate(mode);
    Complex slope = forms.symmetric(operator.mass(), q, p).multiply(s).multiply(2);
    List<String> names = new ArrayList<>();
    List<Complex> values = new ArrayList<>();
    for (SparseTerm term : operator.sparseTerms()) {
      slope = slope.add(forms.sparse(term, f -> f.derivative(s), q, p));
      values.add(forms.sparse(term, f -> f.value(s), q, p));
      names.add(term.name());
    }
    for (LowRankTerm term : operator.lowRankTerms()) {
      slope = slope.add(forms.lowRank(term, f -> f.derivative(s), q, p));
      values.add(forms.lowRank(term, f -> f.value(s), q, p));
      names.add(term.name());
    }
    List<TermSensitivity> out = new ArrayList<>();
    for (int j = 0; j < names.size(); j++) {
      Complex d = values.get(j).divide(slope).divide(-100);
      out.add(new TermSensitivity(names.get(j), d.getReal(), d.getImaginary() / (2 * Math.PI)));
    }
    return List.copyOf(out);
  }
}
