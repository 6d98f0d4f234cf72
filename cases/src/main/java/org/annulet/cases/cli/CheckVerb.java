package org.annulet.cases.cli;

import java.nio.file.Path;
import org.annulet.cases.read.CaseFile;
import picocli.CommandLine.Command;

/** {@code annulet check CASE}. */
@Command(
    name = "check",
    description = "Says what was understood of a case, in SI, and what looks wrong.")
final class CheckVerb extends Verb {
  @Override
  ExitStatus run(CaseFile caseFile, Path folder) {
    caseFile.echo().forEach(console()::result);
    return ExitStatus.DONE;
  }
}
