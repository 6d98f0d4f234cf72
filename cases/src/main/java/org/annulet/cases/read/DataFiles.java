package org.annulet.cases.read;

import java.util.Map;
import java.util.Optional;
import java.util.concurrent.ConcurrentHashMap;
import java.util.function.Supplier;

/**
 * What was made of the data files of one case, so that a case read again with another number in it
 * does not read and average them again. Thread-safe.
 */
public final class DataFiles {
  private final Map<Object, Object> known = new ConcurrentHashMap<>();

  /**
   * The value under a key; computed when there is none yet, and kept when it was without fault.
   *
   * @param key everything the value depends on; compared by value
   * @param type of the value
   */
  public <T> Optional<T> once(Object key, Class<T> type, Supplier<Optional<? extends T>> compute) {
    Object before = known.get(key);
    if (before != null) {
      return Optional.of(type.cast(before));
    }
    Optional<? extends T> made = compute.get();
    made.ifPresent(v -> known.put(key, v));
    return made.map(type::cast);
  }
}
