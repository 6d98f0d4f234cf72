package org.annulet.cases.cli;

import java.io.IOException;
import java.nio.file.Path;
import java.util.concurrent.Callable;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.CaseReader;
import org.annulet.cases.read.Reading;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** What all verbs on a case share. */
@Command(mixinStandardHelpOptions = true, versionProvider = Version.class)
abstract class Verb implements Callable<Integer> {
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

  @Option(names = "--quiet", description = "print faults only")
  private boolean quiet;

  private Console console;

  void useConsole(Console console) {
    this.console = console;
  }

  Console console() {
    return console;
  }

  @Override
  public Integer call() throws IOException {
    if (quiet) {
      console.beQuiet();
    }
    Reading reading = CaseReader.read(casePath);
    CaseFile caseFile = reading.orThrow();
    reading.cautions().forEach(c -> console.fault("note: " + c));
    Path parent = caseFile.file().toAbsolutePath().getParent();
    return run(caseFile, out == null ? parent.resolve("out") : out).code();
  }

  /**
   * Does the work of the verb.
   *
   * @param folder for the results
   */
  abstract ExitStatus run(CaseFile caseFile, Path folder) throws IOException;
}
