package org.annulet.cases.study;

import org.annulet.cases.read.CaseFaultException;
import org.annulet.cases.read.CaseFile;

/**
 * Solves a case again and again with some of its inputs changed: a point of a sweep or one sample
 * of its tolerances. Thread-safe, and deterministic: a point does not depend on those solved before
 * it.
 */
@FunctionalInterface
public interface PointSolver {
  /**
   * All modes of a changed case in the window of the case the solver was made for, and those found
   * in a margin around it.
   *
   * @throws CaseFaultException if the changed case cannot be set up
   */
  PointModes at(CaseFile changed);
}
