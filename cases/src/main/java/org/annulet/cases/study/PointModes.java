package org.annulet.cases.study;

import java.util.List;

/**
 * The modes of a changed case.
 *
 * @param modes by part, then by frequency; those outside the window are among them as far as they
 *     were found
 * @param complete whether the argument principle confirms for every part that none in the window is
 *     missing, and all of them converged
 */
public record PointModes(List<PointMode> modes, boolean complete) {
  /** Copies the list. */
  public PointModes {
    modes = List.copyOf(modes);
  }
}
