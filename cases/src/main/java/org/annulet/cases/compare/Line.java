package org.annulet.cases.compare;

import java.util.List;
import java.util.Optional;

/**
 * One line of a comparison.
 *
 * @param match who is compared with whom
 * @param verdict in one word
 * @param frequencyDifference theirs less ours in Hz; NaN without a match
 * @param growthDifference theirs less ours in 1/s; NaN where not known
 * @param frequencyBars size of the difference over our error bar and their tolerance together; NaN
 *     where not known
 * @param growthBars the same for the growth rate
 * @param words the verdict in a sentence
 * @param nearField of a chain of ducts what near fields at its steps would move it by, {Hz, 1/s}
 * @param levers which inputs would close the difference, in sentences
 */
record Line(
    Match match,
    Verdict verdict,
    double frequencyDifference,
    double growthDifference,
    double frequencyBars,
    double growthBars,
    String words,
    Optional<double[]> nearField,
    List<String> levers) {
  /** How the two sides stand to each other. */
  enum Verdict {
    /** Within error bar and tolerance. */
    AGREES,
    /** Apart by more. */
    DIFFERS,
    /** It could be another one. */
    AMBIGUOUS,
    /** They do not have it. */
    ONLY_HERE,
    /** We do not have it. */
    ONLY_THERE,
    /** They have it where we did not look. */
    NOT_LOOKED_FOR
  }
}
