package org.annulet.cases.cli;

import java.io.IOException;
import java.nio.file.Path;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.study.DamperFiles;
import org.annulet.cases.study.DamperStudy;
import org.annulet.post.files.WholeFile;
import picocli.CommandLine.Command;

/** {@code annulet dampers CASE}. */
@Command(
    name = "dampers",
    description = "Finds where the dampers under 'studies' are placed best on the ring.")
final class DampersVerb extends Verb {
  @Override
  ExitStatus run(CaseFile caseFile, Path folder) throws IOException {
    WholeFile.prepare(folder);
    DamperStudy.Result result = new DamperStudy(caseFile, console().progress()).run();
    DamperFiles.write(folder, result, Version.text());
    console().result(DamperFiles.terminal(result));
    console().result("Written to " + folder);
    return result.certified() ? ExitStatus.DONE : ExitStatus.NOT_CERTIFIED;
  }
}
