package org.annulet.cases.read;

import java.util.ArrayList;
import java.util.List;
import java.util.TreeSet;

/** Burners by number, counted from 1, or by a word for a pattern. */
final class Burners {
  private static final List<String> PATTERNS =
      List.of("all", "every_second", "first_half", "second_half");

  private Burners() {}

  /** The numbers, increasing; faults are reported. */
  static List<Integer> read(Entry entry, int count) {
    List<Integer> burners = new ArrayList<>();
    if (entry.isText()) {
      String pattern = entry.choice(PATTERNS).orElse("");
      for (int b = 1; b <= count; b++) {
        boolean taken =
            switch (pattern) {
              case "all" -> true;
              case "every_second" -> b % 2 == 0;
              case "first_half" -> 2 * b <= count;
              case "second_half" -> 2 * b > count;
              default -> false;
            };
        if (taken) {
          burners.add(b);
        }
      }
      if (pattern.equals("every_second") && count % 2 != 0) {
        entry.caution(
            "every second of " + count + " burners: two neighbours stay alike",
            "name the burners one by one if that is not meant");
      }
      return burners;
    }
    for (Entry item : entry.items()) {
      int b = item.whole(1, count >= 1 ? count : GeometryReader.MOST_BURNERS);
      if (b >= 1 && burners.contains(b)) {
        item.fault("burner " + b + " stands here twice", "leave one out");
      }
      burners.add(b);
    }
    return List.copyOf(new TreeSet<>(burners));
  }
}
