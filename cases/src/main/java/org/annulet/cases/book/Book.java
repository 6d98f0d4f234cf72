package org.annulet.cases.book;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.CaseReader;
import org.annulet.cases.study.ModesStudy;
import org.annulet.cases.study.Progress;

/** The chambers of the validation book and the values known of them. Immutable. */
public final class Book {
  private static final String VALUES = "known_values.csv";

  private final List<KnownValue> values;

  private Book(List<KnownValue> values) {
    this.values = List.copyOf(values);
  }

  /** The book that ships with the program. */
  public static Book shipped() {
    return new Book(text(VALUES).lines().skip(1).map(KnownValue::parse).toList());
  }

  /** Names of the chambers, in the order of the book. */
  public List<String> chambers() {
    return values.stream().map(KnownValue::chamber).distinct().toList();
  }

  /** What is known of a chamber. */
  public List<KnownValue> known(String chamber) {
    return values.stream().filter(v -> v.chamber().equals(chamber)).toList();
  }

  /** The case file of a chamber, to read or to start a case of one's own from. */
  public String caseText(String chamber) {
    return text(chamber + ".yaml");
  }

  /**
   * Solves a chamber from its case file, as a user's case is solved.
   *
   * @param chamber one of {@link #chambers()}
   * @param version of the program, for the results
   * @throws IOException if no temporary file can be written
   */
  public SolvedChamber solve(String chamber, String version) throws IOException {
    CaseFile caseFile = caseFile(chamber);
    return SolvedChamber.of(
        chamber,
        new ModesStudy(caseFile, Progress.SILENT).modesOnly().run(version).results(),
        known(chamber));
  }

  /**
   * Solves a chamber on nested meshes and looks at the true errors.
   *
   * @param chamber one of {@link #chambers()}
   * @throws IOException if no temporary file can be written
   */
  public Convergence convergence(String chamber) throws IOException {
    return Convergence.of(chamber, caseFile(chamber), known(chamber));
  }

  private CaseFile caseFile(String chamber) throws IOException {
    Path file = Files.createTempFile("annulet-book-", ".yaml");
    try {
      Files.writeString(file, caseText(chamber));
      return CaseReader.read(file).orThrow();
    } finally {
      Files.deleteIfExists(file);
    }
  }

  private static String text(String name) {
    try (InputStream in = Book.class.getResourceAsStream(name)) {
      if (in == null) {
        throw new IllegalArgumentException("the book holds no " + name);
      }
      return new String(in.readAllBytes(), StandardCharsets.UTF_8);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
