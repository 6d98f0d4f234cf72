package org.annulet.cases.cli;

import java.io.IOException;
import java.nio.file.Path;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.study.ModesFiles;
import org.annulet.cases.study.ModesStudy;
import org.annulet.post.table.Summary;
import org.annulet.post.table.TextTables;
import picocli.CommandLine.Command;

/** {@code annulet modes CASE}. */
@Command(
    name = "modes",
    description = "Finds every mode in the window, with growth rate and certificate.")
final class ModesVerb extends Verb {
  @Override
  ExitStatus run(CaseFile caseFile, Path folder) throws IOException {
    ModesStudy.Answer answer = new ModesStudy(caseFile, console().progress()).run(Version.text());
    ModesFiles.write(folder, answer);
    console().result(TextTables.terminal(answer.results()));
    Summary.sentences(answer.results()).forEach(console()::result);
    Summary.CAUTIONS.forEach(console()::result);
    console().result("Written to " + folder);
    return answer.results().complete() ? ExitStatus.DONE : ExitStatus.NOT_CERTIFIED;
  }
}
