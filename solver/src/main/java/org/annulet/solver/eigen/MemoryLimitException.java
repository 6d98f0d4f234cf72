package org.annulet.solver.eigen;

import java.util.Locale;
import org.annulet.solver.sparse.SymmetricAnalysis;

/** A factor would not fit into memory; the message gives its size and the remedy. */
public final class MemoryLimitException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  /** Share of the memory that one factor may take: solutions and other data need the rest. */
  private static final double SHARE = 0.6;

  private static final double GIGA = 1e9;

  private MemoryLimitException(String message) {
    super(message);
  }

  /**
   * Refuses what will not fit, before it is tried.
   *
   * @param analysis knows the size of a factor
   * @param available bytes the Java machine may use
   * @throws MemoryLimitException if a factor takes more than its share of them
   */
  static void check(SymmetricAnalysis analysis, long available) {
    if (analysis.complexFactorBytes() > SHARE * available) {
      throw new MemoryLimitException(
          String.format(
              Locale.ROOT,
              "a factor of %d unknowns takes %.2f GB, and the Java machine may use %.2f GB in all:"
                  + " choose larger triangles, or give it more memory, as in"
                  + " ANNULET_JAVA_OPTIONS=-Xmx%dg",
              analysis.pattern().size(),
              analysis.complexFactorBytes() / GIGA,
              available / GIGA,
              (long) Math.ceil(analysis.complexFactorBytes() / (SHARE * GIGA))));
    }
  }
}
