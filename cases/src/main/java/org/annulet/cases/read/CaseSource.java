package org.annulet.cases.read;

import java.util.List;
import java.util.Map;
import java.util.function.Function;
import org.annulet.cases.units.QuantityKind;

/**
 * Where the values of a case were read.
 *
 * @param file file name as the user knows it
 * @param places line and column by key path, as in {@code walls.chamber.downstream}
 * @param values every dimensional value read, in the order of reading
 * @param dataFiles what was made of its data files, shared with all changes of the case
 * @param again reads the same text once more with some values replaced: new text by key path
 */
public record CaseSource(
    String file,
    Map<String, Place> places,
    List<Value> values,
    DataFiles dataFiles,
    Function<Map<String, String>, Reading> again) {
  /** Copies the collections. */
  public CaseSource {
    places = Map.copyOf(places);
    values = List.copyOf(values);
  }

  /**
   * A place in the file.
   *
   * @param line counted from 1
   * @param column counted from 1
   */
  public record Place(int line, int column) {}

  /**
   * A value and the text it was read from.
   *
   * @param key path of the key
   * @param text as written; {@value #DEFAULT} when the file is silent
   * @param si in {@link QuantityKind#siUnit()}
   * @param kind what it measures
   */
  public record Value(String key, String text, double si, QuantityKind kind) {
    /** Stands for the text of a value the file does not give. */
    public static final String DEFAULT = "(default)";
  }

  /**
   * A problem at a key, for faults found after reading; the nearest key above serves when the file
   * does not hold the key itself.
   *
   * @param key path of the key
   * @param what what is wrong, with the value read
   * @param mend what to write
   */
  public Problem problem(String key, String what, String mend) {
    for (String k = key; !k.isEmpty(); k = k.substring(0, Math.max(0, k.lastIndexOf('.')))) {
      Place place = places.get(k);
      if (place != null) {
        return new Problem(file, place.line(), place.column(), key, what, mend);
      }
    }
    return new Problem(file, 0, 0, key, what, mend);
  }
}
