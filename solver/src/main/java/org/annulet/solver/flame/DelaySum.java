package org.annulet.solver.flame;

import java.util.List;
import org.apache.commons.math3.complex.Complex;

/**
 * Several delayed responses side by side: F = Σ n_k e^{−sτ_k}.
 *
 * @param parts at least one, copied
 */
public record DelaySum(List<NTau> parts) implements Response {
  /** Checks that there is a part and copies them. */
  public DelaySum {
    if (parts.isEmpty()) {
      throw new IllegalArgumentException("a sum of delays needs at least one part");
    }
    parts = List.copyOf(parts);
  }

  @Override
  public Complex value(Complex s) {
    return parts.stream().map(p -> p.value(s)).reduce(Complex.ZERO, Complex::add);
  }

  @Override
  public Complex derivative(Complex s) {
    return parts.stream().map(p -> p.derivative(s)).reduce(Complex.ZERO, Complex::add);
  }

  @Override
  public double longestDelay() {
    return parts.stream().mapToDouble(NTau::delay).max().orElse(0);
  }
}
