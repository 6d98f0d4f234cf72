package org.annulet.cases.read;

import java.util.Optional;

/**
 * The what-ifs of a case.
 *
 * @param dampers the dampers to be placed; empty when none are asked for
 */
public record Studies(Optional<DamperSearch> dampers) {
  /** No study. */
  static final Studies NONE = new Studies(Optional.empty());
}
