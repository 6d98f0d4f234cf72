package org.annulet.cases.study;

import java.util.ArrayList;
import java.util.List;
import org.annulet.post.meaning.ModeLabel.Origin;
import org.annulet.solver.derivative.FlameFading;
import org.annulet.solver.eigen.PreparedOperator;

/**
 * Where each mode of an operator comes from when the flames fade out, told by its partner on the
 * coarsest mesh, where following it costs next to nothing.
 */
final class Origins {
  private Origins() {}

  /**
   * One origin for each of the finest modes, in their order; not traced where there is no flame or
   * no partner.
   *
   * @param coarsest operator of the first level
   * @param levels from coarse to fine, three
   * @param count how many of the finest modes are wanted, the first ones
   */
  static List<Origin> of(PreparedOperator coarsest, List<ErrorBars.Level> levels, int count) {
    FlameFading fading = new FlameFading(coarsest, t -> t.name().startsWith("flame "));
    int[] partner = ErrorBars.partners(levels.get(0), levels.get(1), levels.get(2));
    List<Origin> origins = new ArrayList<>();
    for (int k = 0; k < partner.length; k++) {
      boolean traced = fading.hasFlames() && partner[k] >= 0 && k < count;
      origins.add(
          traced ? origin(fading.trace(levels.get(0).modes().get(partner[k]))) : Origin.NOT_TRACED);
    }
    return origins;
  }

  private static Origin origin(FlameFading.Trace trace) {
    return switch (trace.origin()) {
      case ACOUSTIC -> Origin.ACOUSTIC;
      case INTRINSIC -> Origin.INTRINSIC;
      case AMBIGUOUS -> Origin.AMBIGUOUS;
    };
  }
}
