package org.annulet.cases.cli;

import java.io.IOException;
import java.nio.file.Path;
import org.annulet.cases.compare.CompareFiles;
import org.annulet.cases.compare.CompareStudy;
import org.annulet.cases.read.CaseFile;
import org.annulet.post.files.WholeFile;
import picocli.CommandLine.Command;

/** {@code annulet compare CASE}. */
@Command(
    name = "compare",
    description =
        "Compares the modes with the tables under 'studies.compare' and with a chain of ducts.")
final class CompareVerb extends Verb {
  @Override
  ExitStatus run(CaseFile caseFile, Path folder) throws IOException {
    WholeFile.prepare(folder);
    CompareStudy.Result result =
        new CompareStudy(caseFile, console().progress()).run(Version.number());
    CompareFiles.write(folder, result, Version.number());
    console().result(CompareFiles.terminal(result));
    console().result("Written to " + folder);
    return result.certified() ? ExitStatus.DONE : ExitStatus.NOT_CERTIFIED;
  }
}
