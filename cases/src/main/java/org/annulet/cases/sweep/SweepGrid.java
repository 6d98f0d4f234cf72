package org.annulet.cases.sweep;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.annulet.cases.read.CaseFaultException;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.Problem;
import org.annulet.cases.read.Reading;
import org.annulet.cases.read.Sweep;

/** The points of a sweep as shares of its axes and as cases. */
public final class SweepGrid {
  /** Training points on each axis, of a line and of a map. */
  private static final int ON_A_LINE = 5;

  private static final int ON_A_MAP = 3;

  private final CaseFile caseFile;
  private final Sweep sweep;

  /** The grid of a case that asks for a sweep. */
  public SweepGrid(CaseFile caseFile) {
    this.caseFile = caseFile;
    this.sweep =
        caseFile
            .studies()
            .sweep()
            .orElseThrow(
                () ->
                    new CaseFaultException(
                        List.of(
                            caseFile
                                .source()
                                .problem(
                                    "title",
                                    "the case asks for no sweep",
                                    "add 'studies: {sweep: {along: {set: {KEY: [FIRST, LAST]}}}}'"))));
  }

  Sweep sweep() {
    return sweep;
  }

  CaseFile caseFile() {
    return caseFile;
  }

  boolean isMap() {
    return sweep.across().isPresent();
  }

  int along() {
    return sweep.along().points();
  }

  int across() {
    return sweep.across().map(Sweep.Axis::points).orElse(1);
  }

  /** Number of points, those along the first axis in a row. */
  int count() {
    return along() * across();
  }

  /** Shares of the two axes at a point. */
  double[] shares(int point) {
    return new double[] {
      (point % along()) / (along() - 1.0), across() == 1 ? 0 : (point / along()) / (across() - 1.0)
    };
  }

  /**
   * The case at shares of the axes.
   *
   * @throws CaseFaultException if it cannot be so, at the input's place in the sweep
   */
  CaseFile at(double... share) {
    Map<String, String> set = new LinkedHashMap<>(sweep.along().at(share[0]));
    sweep.across().ifPresent(a -> set.putAll(a.at(share[1])));
    Reading reading = caseFile.with(set);
    if (reading.caseFile().isPresent()) {
      return reading.caseFile().get();
    }
    List<Problem> problems = new ArrayList<>();
    for (Problem p : reading.problems()) {
      String input =
          set.keySet().stream()
              .filter(k -> k.startsWith(p.key()) || p.key().startsWith(k))
              .findFirst()
              .orElse(set.keySet().iterator().next());
      String axis = sweep.along().inputs().containsKey(input) ? "along" : "across";
      problems.add(
          caseFile
              .source()
              .problem(
                  "studies.sweep." + axis + ".set." + input,
                  "set to " + set.get(input) + ": " + p.key() + ": " + p.what(),
                  p.mend()));
    }
    throw new CaseFaultException(problems);
  }

  /** Cases over the whole range, for the training of a reduced model; ends and corners first. */
  List<CaseFile> training() {
    return trainingShares().stream().map(this::at).toList();
  }

  /** Some of the grid's own points, ends and corners first, each once. */
  private List<double[]> trainingShares() {
    Set<List<Integer>> chosen = new LinkedHashSet<>();
    int n = isMap() ? ON_A_MAP : ON_A_LINE;
    int[] order = isMap() ? new int[] {0, 2, 1} : new int[] {0, 4, 2, 1, 3};
    for (int j : isMap() ? order : new int[] {0}) {
      for (int i : order) {
        chosen.add(
            List.of(
                Math.round(i * (along() - 1) / (n - 1f)),
                Math.round(j * (across() - 1) / (n - 1f))));
      }
    }
    return chosen.stream().map(c -> shares(c.get(0) + along() * c.get(1))).toList();
  }

  /** Position of the nearest training case. */
  int nearest(double... share) {
    List<double[]> all = trainingShares();
    int best = 0;
    double least = Double.POSITIVE_INFINITY;
    for (int i = 0; i < all.size(); i++) {
      double d = Math.hypot(all.get(i)[0] - share[0], all.get(i)[1] - share[1]);
      if (d < least) {
        least = d;
        best = i;
      }
    }
    return best;
  }
}
