package org.annulet.post.meaning;

import java.util.List;
import org.annulet.solver.modes.Window;

/**
 * Everything the writers of tables and reports need of one run.
 *
 * @param caseName name of the case
 * @param programVersion version of the program
 * @param window asked for
 * @param certificates one for each operator
 * @param modes modes in the window, in the order they are to be listed
 * @param outside modes found in the margin between window and contour
 * @param notes plain sentences on anything a reader should know
 */
public record Results(
    String caseName,
    String programVersion,
    Window window,
    List<Certificate> certificates,
    List<ModeEntry> modes,
    List<ModeEntry> outside,
    List<String> notes) {
  /** The sign convention, to stand wherever a number is shown. */
  public static final String SIGN_CONVENTION =
      "p'(x,t) = Re(p(x) e^{st}); growth rate = Re s in 1/s, positive grows; frequency = Im s/2π in"
          + " Hz";

  /** Makes the lists unmodifiable. */
  public Results {
    certificates = List.copyOf(certificates);
    modes = List.copyOf(modes);
    outside = List.copyOf(outside);
    notes = List.copyOf(notes);
  }

  /** Whether every operator is certified. */
  public boolean complete() {
    return !certificates.isEmpty() && certificates.stream().allMatch(Certificate::complete);
  }

  /** Sum of the counts by the argument principle; −1 when one of them failed. */
  public int count() {
    return certificates.stream().anyMatch(c -> c.count() < 0)
        ? -1
        : certificates.stream().mapToInt(Certificate::count).sum();
  }
}
