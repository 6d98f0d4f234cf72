package org.annulet.cases.read;

import java.util.Collection;
import java.util.Comparator;
import java.util.Locale;
import java.util.Optional;

/** The known name a wrong one was probably meant to be. */
final class Nearest {
  private Nearest() {}

  /** The nearest of {@code known}, if near enough to be worth offering. */
  static Optional<String> of(String name, Collection<String> known) {
    String n = name.toLowerCase(Locale.ROOT);
    return known.stream()
        .min(
            Comparator.<String>comparingInt(k -> distance(n, k.toLowerCase(Locale.ROOT)))
                .thenComparing(Comparator.naturalOrder()))
        .filter(k -> distance(n, k.toLowerCase(Locale.ROOT)) <= Math.max(1, n.length() / 2));
  }

  /** "write 'x'? known: …", or only the list. */
  static String advice(String name, Collection<String> known) {
    String all = known.isEmpty() ? "there are none" : "known: " + String.join(", ", known);
    return of(name, known).map(k -> "write '" + k + "'? " + all).orElse(all);
  }

  /** Insertions, deletions, changes and swaps of neighbours that turn one text into the other. */
  static int distance(String a, String b) {
    int[][] d = new int[a.length() + 1][b.length() + 1];
    for (int i = 0; i <= a.length(); i++) {
      for (int j = 0; j <= b.length(); j++) {
        if (i == 0 || j == 0) {
          d[i][j] = i + j;
          continue;
        }
        int change = a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1;
        d[i][j] = Math.min(d[i - 1][j - 1] + change, 1 + Math.min(d[i - 1][j], d[i][j - 1]));
        if (i > 1
            && j > 1
            && a.charAt(i - 1) == b.charAt(j - 2)
            && a.charAt(i - 2) == b.charAt(j - 1)) {
          d[i][j] = Math.min(d[i][j], d[i - 2][j - 2] + 1);
        }
      }
    }
    return d[a.length()][b.length()];
  }
}
