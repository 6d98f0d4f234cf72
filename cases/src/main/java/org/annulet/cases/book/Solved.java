package org.annulet.cases.book;

import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import org.annulet.cases.study.Progress;

/**
 * The whole book, solved.
 *
 * @param chambers in the order of the book
 * @param convergence of each chamber, in the same order
 * @param laws gas, dampers and nozzle
 * @param version of the program
 */
public record Solved(
    List<SolvedChamber> chambers,
    List<Convergence> convergence,
    List<LawCheck> laws,
    String version) {
  /** Copies the lists. */
  public Solved {
    chambers = List.copyOf(chambers);
    convergence = List.copyOf(convergence);
    laws = List.copyOf(laws);
  }

  /**
   * Solves every chamber of a book, and each again on nested meshes.
   *
   * @throws IOException if no temporary file can be written
   */
  public static Solved of(Book book, Progress progress, String version) throws IOException {
    List<SolvedChamber> chambers = new ArrayList<>();
    List<Convergence> convergence = new ArrayList<>();
    for (String name : book.chambers()) {
      chambers.add(book.solve(name, version));
      convergence.add(book.convergence(name));
      progress.step("solving the chambers of the book", chambers.size(), book.chambers().size());
    }
    return new Solved(chambers, convergence, Laws.all(), version);
  }

  /** Known values of modes and laws. */
  public int valueCount() {
    return chambers.stream().mapToInt(c -> c.comparisons().size()).sum() + laws.size();
  }

  /** Known values that ours meet. */
  public int passCount() {
    return (int)
        (chambers.stream().flatMap(c -> c.comparisons().stream()).filter(Comparison::passes).count()
            + laws.stream().filter(LawCheck::passes).count());
  }

  /** Whether every value is met, every certificate holds and no mode is missing or too many. */
  public boolean passes() {
    return chambers.stream().allMatch(SolvedChamber::passes)
        && laws.stream().allMatch(LawCheck::passes);
  }
}
