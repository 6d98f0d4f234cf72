package org.annulet.cases.study;

import java.math.BigInteger;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.function.Consumer;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.Damper;
import org.annulet.cases.read.DamperSearch;
import org.annulet.cases.read.Flame;
import org.annulet.cases.read.Geometry;

/**
 * Ways to put dampers on positions, of each set of ways that turn or mirror into one another one.
 *
 * <p>A pattern holds for each position the number of its design, counted from 1, or 0. A symmetry
 * is a turn by whole burners, with or without a mirror image, that leaves the chamber (staging and
 * dampers it has already included) as it is. It need not keep the set of positions: two patterns
 * are alike when it takes the dampers of one to those of the other.
 */
final class DamperPatterns {
  private static final double SAME = 1e-7;

  private final int[] counts;
  private final int positions;
  private final List<int[]> symmetries;

  DamperPatterns(CaseFile caseFile, DamperSearch search) {
    counts = search.candidates().stream().mapToInt(DamperSearch.Candidate::count).toArray();
    positions = search.positions().size();
    symmetries = symmetries(caseFile, (Geometry.Ring) caseFile.geometry(), search.positions());
  }

  /** Where each symmetry takes each position; −1 where there is none. */
  List<int[]> symmetries() {
    return symmetries;
  }

  /** How many patterns there are, turned and mirrored ones counted as different. */
  BigInteger all() {
    BigInteger number = BigInteger.ONE;
    int free = positions;
    for (int count : counts) {
      for (int k = 0; k < count; k++) {
        number = number.multiply(BigInteger.valueOf(free - k));
      }
      for (int k = 2; k <= count; k++) {
        number = number.divide(BigInteger.valueOf(k));
      }
      free -= count;
    }
    return number;
  }

  /** Hands over one pattern of each set; the array is the receiver's. */
  void forEachDistinct(Consumer<int[]> receiver) {
    place(0, new int[positions], counts.clone(), receiver);
  }

  private void place(int at, int[] pattern, int[] left, Consumer<int[]> receiver) {
    int wanted = Arrays.stream(left).sum();
    if (wanted == 0) {
      if (first(pattern)) {
        receiver.accept(pattern.clone());
      }
      return;
    }
    if (positions - at < wanted) {
      return;
    }
    for (int d = 0; d < left.length; d++) {
      if (left[d] > 0) {
        left[d]--;
        pattern[at] = d + 1;
        place(at + 1, pattern, left, receiver);
        pattern[at] = 0;
        left[d]++;
      }
    }
    place(at + 1, pattern, left, receiver);
  }

  /** Whether no image of the pattern comes before it. */
  private boolean first(int[] pattern) {
    int[] image = new int[positions];
    for (int[] g : symmetries) {
      if (moved(pattern, g, image) && Arrays.compare(image, pattern) > 0) {
        return false;
      }
    }
    return true;
  }

  /** The image of a pattern that stands for its set. */
  int[] representative(int[] pattern) {
    int[] best = pattern.clone();
    int[] image = new int[positions];
    for (int[] g : symmetries) {
      if (moved(pattern, g, image) && Arrays.compare(image, best) > 0) {
        best = image.clone();
      }
    }
    return best;
  }

  /** Fills in the image; false when a damper would come where it cannot sit. */
  private boolean moved(int[] pattern, int[] g, int[] image) {
    Arrays.fill(image, 0);
    for (int p = 0; p < positions; p++) {
      if (pattern[p] > 0) {
        if (g[p] < 0) {
          return false;
        }
        image[g[p]] = pattern[p];
      }
    }
    return true;
  }

  private static List<int[]> symmetries(
      CaseFile caseFile, Geometry.Ring ring, List<Damper.OnFace> positions) {
    List<int[]> found = new ArrayList<>();
    int n = ring.burnerCount();
    for (int mirror = 1; mirror >= -1; mirror -= 2) {
      for (int turn = 0; turn < n; turn++) {
        Motion g = new Motion(mirror, turn, n);
        if (g.keeps(caseFile)) {
          found.add(positions.stream().mapToInt(f -> index(positions, g.of(f))).toArray());
        }
      }
    }
    return found;
  }

  private static int index(List<? extends Damper.Place> places, Damper.OnFace wanted) {
    for (int p = 0; p < places.size(); p++) {
      if (places.get(p) instanceof Damper.OnFace f
          && f.face().equals(wanted.face())
          && Math.abs(f.x() - wanted.x()) < SAME
          && Math.abs(Math.IEEEremainder(f.angle() - wanted.angle(), 2 * Math.PI)) < SAME) {
        return p;
      }
    }
    return -1;
  }

  /** θ → ±θ + 2π turn/N. */
  private record Motion(int mirror, int turn, int burners) {
    Damper.OnFace of(Damper.OnFace f) {
      return new Damper.OnFace(f.face(), f.x(), mirror * f.angle() + 2 * Math.PI * turn / burners);
    }

    boolean keeps(CaseFile caseFile) {
      if (!caseFile.gas().even()) {
        return mirror == 1 && turn == 0;
      }
      for (Flame flame : caseFile.flames()) {
        for (int b = 1; b <= burners; b++) {
          int image = 1 + Math.floorMod(mirror * (b - 1) + turn, burners);
          if (flame.heatShareAt(b) != flame.heatShareAt(image)
              || !flame.responseAt(b).equals(flame.responseAt(image))) {
            return false;
          }
        }
      }
      return caseFile.dampers().stream()
          .allMatch(
              d ->
                  d.places().stream()
                      .allMatch(
                          p -> p instanceof Damper.OnFace f && index(d.places(), of(f)) >= 0));
    }
  }
}
