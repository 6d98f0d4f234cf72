package org.annulet.cases.cli;

import java.io.IOException;
import java.nio.file.Path;
import org.annulet.cases.book.Book;
import org.annulet.cases.book.BookFiles;
import org.annulet.cases.book.Solved;
import org.annulet.post.files.WholeFile;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;

/** {@code annulet verify}. */
@Command(
    name = "verify",
    description =
        "Solves chambers whose modes are known from outside, and compares. Needs no case.")
final class VerifyVerb extends Speaker {
  @Option(
      names = "--out",
      paramLabel = "DIR",
      description = "folder for the page, its table and its chart; default: nothing is written")
  private Path out;

  @Override
  public Integer call() throws IOException {
    if (out != null) {
      WholeFile.prepare(out);
    }
    Solved book = Solved.of(Book.shipped(), console().progress(), Version.text());
    console().result(BookFiles.terminal(book));
    if (out != null) {
      BookFiles.write(out, book);
      console().result("Written to " + out);
    }
    return (book.passes() ? ExitStatus.DONE : ExitStatus.NOT_CERTIFIED).code();
  }
}
