package org.annulet.cases.read;

import java.util.List;
import java.util.Optional;

/**
 * What came of reading a case file.
 *
 * @param caseFile the case; empty when there are problems
 * @param problems every fault, in the order of the file
 * @param cautions what was accepted but deserves a look, in the order of the file
 */
public record Reading(Optional<CaseFile> caseFile, List<Problem> problems, List<Problem> cautions) {
  /** Copies the lists. */
  public Reading {
    problems = List.copyOf(problems);
    cautions = List.copyOf(cautions);
  }

  /**
   * The case.
   *
   * @throws CaseFaultException if there are problems
   */
  public CaseFile orThrow() {
    return caseFile.orElseThrow(() -> new CaseFaultException(problems));
  }
}
