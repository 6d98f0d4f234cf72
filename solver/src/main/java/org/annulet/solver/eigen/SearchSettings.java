package org.annulet.solver.eigen;

/**
 * How hard to search and to count.
 *
 * @param backwardError largest ‖L(s)p‖₂/‖K p‖₂ of a converged mode
 * @param rounds how often the search may be repeated with more tiles and a larger basis while count
 *     and modes disagree, at least 1
 * @param contourPoints points on the longest edge of the contour to start a count from, at least 4;
 *     more are taken where delays or roots ask for them
 * @param largestContour points after which a count gives up
 */
public record SearchSettings(
    double backwardError, int rounds, int contourPoints, int largestContour) {
  /** Checks the ranges. */
  public SearchSettings {
    if (!(backwardError > 0) || rounds < 1 || contourPoints < 4 || largestContour < 8) {
      throw new IllegalArgumentException(
          "need backwardError > 0, rounds ≥ 1, contourPoints ≥ 4, largestContour ≥ 8; got "
              + backwardError
              + ", "
              + rounds
              + ", "
              + contourPoints
              + ", "
              + largestContour);
    }
  }

  /** The settings of every ordinary run: backward error 1e-10, three rounds. */
  public static SearchSettings standard() {
    return new SearchSettings(1e-10, 3, 20, 4000);
  }
}
