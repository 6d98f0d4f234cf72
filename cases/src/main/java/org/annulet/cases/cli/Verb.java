package org.annulet.cases.cli;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import org.annulet.cases.read.CaseFaultException;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.CaseReader;
import org.annulet.cases.read.Problem;
import org.annulet.cases.read.Reading;
import org.annulet.post.files.WholeFile;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** What all verbs on a case share. */
@Command
abstract class Verb extends Speaker {
  @Parameters(
      index = "0",
      paramLabel = "CASE",
      description = "case folder (with case.yaml) or case file")
  private Path casePath;

  @Option(
      names = "--out",
      paramLabel = "DIR",
      description = "folder for the results; default: 'out' beside the case file")
  private Path out;

  @Override
  public Integer call() throws IOException {
    try {
      Reading reading = CaseReader.read(casePath);
      CaseFile caseFile = reading.orThrow();
      reading.cautions().forEach(c -> console().fault("note: " + c));
      return run(caseFile, folder()).code();
    } catch (CaseFaultException fault) {
      drawSpots(fault.problems());
      throw fault;
    }
  }

  private Path folder() {
    if (out != null) {
      return out;
    }
    Path absolute = casePath.toAbsolutePath().normalize();
    Path parent = Files.isDirectory(absolute) ? absolute : absolute.getParent();
    return (parent == null ? absolute : parent).resolve("out");
  }

  /** Writes a picture of every spot at which the drawing is at fault, and says where it is. */
  private void drawSpots(List<Problem> problems) throws IOException {
    int number = 0;
    for (Problem p : problems) {
      if (!p.picture().isEmpty()) {
        Files.createDirectories(folder());
        Path file = folder().resolve(String.format(Locale.ROOT, "fault-%02d.svg", ++number));
        WholeFile.write(file, p.picture());
        console().fault("picture of the spot: " + file);
      }
    }
  }

  /**
   * Does the work of the verb.
   *
   * @param folder for the results
   */
  abstract ExitStatus run(CaseFile caseFile, Path folder) throws IOException;
}
