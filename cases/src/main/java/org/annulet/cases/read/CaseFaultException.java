package org.annulet.cases.read;

import java.util.List;
import java.util.stream.Collectors;

/** A case file that cannot be used; carries every fault found. */
public final class CaseFaultException extends IllegalArgumentException {
  private static final long serialVersionUID = 1L;

  private final transient List<Problem> problems;

  /**
   * Faults of one case.
   *
   * @param problems at least one
   */
  public CaseFaultException(List<Problem> problems) {
    super(problems.stream().map(Problem::toString).collect(Collectors.joining("\n")));
    this.problems = List.copyOf(problems);
  }

  /** The faults, in the order of the file. */
  public List<Problem> problems() {
    return problems;
  }
}
