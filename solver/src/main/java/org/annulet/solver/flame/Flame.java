package org.annulet.solver.flame;

import java.util.Map;
import java.util.TreeMap;

/**
 * A flame of one burner, or of all burners of a ring or section with one rule and exceptions.
 *
 * <p>On a section one flame stands for N identical burners, as one term of each azimuthal order; on
 * a ring it stands for the flame of each of the N burners, fired alike but for the exceptions.
 *
 * @param name for the growth budget and messages
 * @param place where the heat is released
 * @param reference what it listens to
 * @param firing heat release and response
 * @param staging exceptions by burner number, counted from 1; ring only; not modified, copied
 */
public record Flame(
    String name, Place place, Reference reference, Firing firing, Map<Integer, Firing> staging) {
  /** Copies the exceptions. */
  public Flame {
    staging = Map.copyOf(staging);
    for (int burner : staging.keySet()) {
      if (burner < 1) {
        throw new IllegalArgumentException(
            "flame '" + name + "': burners are counted from 1, got " + burner);
      }
    }
  }

  /** A flame without exceptions. */
  public Flame(String name, Place place, Reference reference, Firing firing) {
    this(name, place, reference, firing, Map.of());
  }

  /**
   * The same flame with burner {@code burner} fired differently.
   *
   * @param burner counted from 1
   */
  public Flame staged(int burner, Firing exception) {
    Map<Integer, Firing> all = new TreeMap<>(staging);
    all.put(burner, exception);
    return new Flame(name, place, reference, firing, all);
  }

  /**
   * How a burner is fired.
   *
   * @param burner counted from 1
   */
  public Firing firing(int burner) {
    return staging.getOrDefault(burner, firing);
  }
}
