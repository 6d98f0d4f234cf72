package org.annulet.cases.book;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalInt;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/** The validation book: values from outside, solved as a user's case is. */
class BookTest {
  private static final Book BOOK = Book.shipped();

  static List<String> chambers() {
    return BOOK.chambers();
  }

  @ParameterizedTest
  @MethodSource("chambers")
  void knownModes_lieInsideOurErrorBars_andNoneIsMissingOrTooMany(String name) throws Exception {
    SolvedChamber c = BOOK.solve(name, "test");
    assertThat(c.comparisons()).as(name).isNotEmpty().allMatch(Comparison::passes);
    assertThat(c.passes()).as("certified, nothing the book does not know").isTrue();
  }

  /** Linear triangles: the error of an eigenvalue falls with h², flames at sheets included. */
  @ParameterizedTest
  @ValueSource(strings = {"disc", "can-open", "jump-a-closed", "impedance-d", "flame-strong"})
  void errors_fallWithTheSquareOfTheMeshSize(String name) throws Exception {
    assertThat(BOOK.convergence(name).observedOrder().orElseThrow()).isBetween(1.9, 2.1);
  }

  @Test
  void aKnownValueElsewhere_fails_andSoDoesAModeThatTheBookDoesNotKnow() throws Exception {
    SolvedChamber solved = BOOK.solve("tube-half-open", "test");
    List<KnownValue> known = new ArrayList<>(BOOK.known("tube-half-open"));
    KnownValue first = known.remove(0);
    double bar = solved.comparisons().get(0).ours().orElseThrow().frequencyError();
    known.add(
        new KnownValue(
            first.row(),
            first.chamber(),
            OptionalInt.empty(),
            first.frequency() + 4 * bar,
            0,
            first.source()));
    assertThat(SolvedChamber.of("moved", solved.results(), known).passes()).isFalse();
    known.remove(1);
    SolvedChamber less = SolvedChamber.of("less", solved.results(), known);
    assertThat(less.comparisons()).allMatch(Comparison::passes);
    assertThat(less.unknown()).hasSize(1);
    assertThat(less.passes()).isFalse();
  }

  @Test
  void laws_areMet() {
    assertThat(Laws.all()).hasSizeGreaterThan(25).allMatch(LawCheck::passes);
  }

  @Test
  void files_holdEveryValue_andSayWhatFails(@TempDir Path folder) throws Exception {
    List<SolvedChamber> chambers = List.of(BOOK.solve("tube-closed", "test"));
    List<Convergence> convergence = List.of(BOOK.convergence("tube-closed"));
    LawCheck wrong = new LawCheck("X", "nothing", 1, 2, 0.5, "made up for this test");
    Solved book = new Solved(chambers, convergence, List.of(wrong), "annulet test");
    BookFiles.write(folder, book);
    assertThat(Files.readString(folder.resolve("validation.md")))
        .contains(
            "2 of 3 known values are met",
            "| X | nothing | 2.0000000 | 1.0000000 | ±0.50 | FAIL |");
    assertThat(Files.readString(folder.resolve("validation.csv")).lines()).hasSize(3);
    assertThat(Files.readString(folder.resolve("convergence.svg"))).startsWith("<svg");
    assertThat(BookFiles.terminal(book)).contains("FAIL X");
    assertThat(book.passes()).isFalse();
  }
}
