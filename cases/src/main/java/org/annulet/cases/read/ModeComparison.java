package org.annulet.cases.read;

import java.util.List;

/**
 * What the modes are compared with.
 *
 * @param tables modes known from elsewhere, in the order of the file; may be empty
 * @param matchWithin largest distance |Δs|/|s| at which two modes can be the same
 */
public record ModeComparison(List<ModeTable> tables, double matchWithin) {
  /** Distance at which two modes can be the same unless stated. */
  static final double MATCH_WITHIN = 0.15;

  /** No table: the chamber's own chain of ducts alone is compared. */
  public static final ModeComparison NO_TABLES = new ModeComparison(List.of(), MATCH_WITHIN);

  /** Copies the list. */
  public ModeComparison {
    tables = List.copyOf(tables);
  }
}
