package org.annulet.cases.cli;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.Problem;
import org.annulet.cases.study.Understood;
import picocli.CommandLine.Command;

/** {@code annulet check CASE}. */
@Command(
    name = "check",
    description = "Says what was understood of a case, in SI, and what looks wrong.")
final class CheckVerb extends Verb {
  @Override
  ExitStatus run(CaseFile caseFile, Path folder) throws IOException {
    caseFile.echo().forEach(console()::result);
    Understood understood = Understood.of(caseFile);
    console().result("");
    understood.lines().forEach(console()::result);
    List<String> pictures = understood.draw(folder);
    if (!pictures.isEmpty()) {
      console().result("drawn in " + folder + ": " + String.join(", ", pictures));
    }
    List<Problem> cautions = understood.cautions();
    console().result("");
    for (Problem p : cautions) {
      console().result("note: " + p);
    }
    console()
        .result(
            cautions.isEmpty()
                ? "Nothing looks wrong."
                : cautions.size() == 1
                    ? "1 thing to look at."
                    : cautions.size() + " things to look at.");
    return ExitStatus.DONE;
  }
}
