package org.annulet.cases.read;

import java.util.Optional;

/**
 * The what-ifs of a case.
 *
 * @param dampers the dampers to be placed; empty when none are asked for
 * @param sweep what is to be varied; empty when nothing is
 * @param uncertainty inputs that are not known exactly; empty when none is named
 * @param compare what the modes are compared with; empty when nothing is named
 */
public record Studies(
    Optional<DamperSearch> dampers,
    Optional<Sweep> sweep,
    Optional<Uncertainty> uncertainty,
    Optional<ModeComparison> compare) {
  /** No study. */
  static final Studies NONE =
      new Studies(Optional.empty(), Optional.empty(), Optional.empty(), Optional.empty());
}
