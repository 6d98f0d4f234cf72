package org.annulet.mesher.geometry;

import java.util.Collection;
import java.util.Comparator;
import java.util.List;

/** Lists known names for a fault report, the one most like the wrong name first. */
final class Nearest {
  private Nearest() {}

  private static final int SHOWN = 12;

  static String list(String wrong, Collection<String> known) {
    List<String> sorted =
        known.stream().sorted(Comparator.comparingInt(k -> distance(wrong, k))).toList();
    String shown = String.join(", ", sorted.subList(0, Math.min(SHOWN, sorted.size())));
    return sorted.size() > SHOWN ? shown + " and " + (sorted.size() - SHOWN) + " more" : shown;
  }

  /** Levenshtein's distance. */
  private static int distance(String a, String b) {
    int[] row = new int[b.length() + 1];
    for (int k = 0; k <= b.length(); k++) {
      row[k] = k;
    }
    for (int i = 1; i <= a.length(); i++) {
      int diagonal = row[0];
      row[0] = i;
      for (int k = 1; k <= b.length(); k++) {
        int above = row[k];
        int change = diagonal + (a.charAt(i - 1) == b.charAt(k - 1) ? 0 : 1);
        row[k] = Math.min(change, 1 + Math.min(above, row[k - 1]));
        diagonal = above;
      }
    }
    return row[b.length()];
  }
}
