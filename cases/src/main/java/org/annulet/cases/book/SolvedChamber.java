package org.annulet.cases.book;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import org.annulet.post.meaning.ModeView;
import org.annulet.post.meaning.Results;

/**
 * One chamber of the book, solved.
 *
 * @param name of its case file
 * @param results ours
 * @param comparisons known values beside ours, in the order of the book
 * @param unknown modes of ours that the book does not know; empty when all is well
 */
public record SolvedChamber(
    String name, Results results, List<Comparison> comparisons, List<ModeView> unknown) {
  /** Whether everything the book says of this chamber was found, and nothing else. */
  public boolean passes() {
    return results.complete()
        && unknown.isEmpty()
        && comparisons.stream().allMatch(Comparison::passes);
  }

  /** The largest relative error |Δs|/|s|; NaN when a mode is missing. */
  public double worstError() {
    return comparisons.stream().mapToDouble(Comparison::relativeError).max().orElse(Double.NaN);
  }

  /** Ours against the known values: each takes the nearest mode of its order that is left. */
  static SolvedChamber of(String name, Results results, List<KnownValue> known) {
    List<ModeView> left = new ArrayList<>();
    results.modes().stream()
        .map(e -> e.view())
        // The mirror image of a turning wave is the same eigenvalue once more.
        .filter(v -> v.order() == null || v.order() >= 0)
        .forEach(left::add);
    List<Comparison> comparisons = new ArrayList<>();
    for (KnownValue value : known) {
      Optional<ModeView> nearest =
          left.stream()
              .filter(v -> value.order().isEmpty() || hasOrder(v, value.order()))
              .min(Comparator.comparingDouble(v -> distance(v, value)));
      nearest.ifPresent(left::remove);
      comparisons.add(new Comparison(value, nearest));
    }
    return new SolvedChamber(name, results, List.copyOf(comparisons), List.copyOf(left));
  }

  private static boolean hasOrder(ModeView view, OptionalInt order) {
    return view.order() != null && view.order() == order.getAsInt();
  }

  private static double distance(ModeView view, KnownValue value) {
    return Math.hypot(
        view.mode().growthRate() - value.growthRate(),
        2 * Math.PI * (view.mode().frequency() - value.frequency()));
  }
}
