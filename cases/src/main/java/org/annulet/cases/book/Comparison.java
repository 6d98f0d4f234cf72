package org.annulet.cases.book;

import java.util.Optional;
import org.annulet.post.meaning.ModeView;

/**
 * A known value beside ours.
 *
 * @param known from outside
 * @param ours the mode taken for it; empty when there is none left
 */
public record Comparison(KnownValue known, Optional<ModeView> ours) {
  /** Relative rounding of a known value, which is given to 8 or 9 digits. */
  private static final double ROUNDING = 2e-8;

  /** Ours minus theirs in Hz. */
  public double frequencyDifference() {
    return ours.map(v -> v.mode().frequency() - known.frequency()).orElse(Double.NaN);
  }

  /** Ours minus theirs in 1/s. */
  public double growthDifference() {
    return ours.map(v -> v.mode().growthRate() - known.growthRate()).orElse(Double.NaN);
  }

  /** |Δs|/|s|, the error of frequency and growth rate as one number. */
  public double relativeError() {
    return Math.hypot(growthDifference(), 2 * Math.PI * frequencyDifference())
        / Math.hypot(known.growthRate(), 2 * Math.PI * known.frequency());
  }

  /** Whether both differences lie inside our own error bars and the rounding of the known value. */
  public boolean passes() {
    if (ours.isEmpty()) {
      return false;
    }
    double f = known.frequency();
    double s = Math.hypot(known.growthRate(), 2 * Math.PI * f);
    return Math.abs(frequencyDifference()) <= ours.get().frequencyError() + ROUNDING * f + 5e-6
        && Math.abs(growthDifference()) <= ours.get().growthError() + ROUNDING * s + 5e-5;
  }
}
