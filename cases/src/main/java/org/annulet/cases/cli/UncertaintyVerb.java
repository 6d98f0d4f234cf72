package org.annulet.cases.cli;

import java.io.IOException;
import java.nio.file.Path;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.uncertainty.UncertaintyFiles;
import org.annulet.cases.uncertainty.UncertaintyStudy;
import org.annulet.post.files.WholeFile;
import picocli.CommandLine.Command;

/** {@code annulet uncertainty CASE}. */
@Command(
    name = "uncertainty",
    description = "Says how likely modes grow when inputs are not known exactly.")
final class UncertaintyVerb extends PointsVerb {
  @Override
  ExitStatus run(CaseFile caseFile, Path folder) throws IOException {
    WholeFile.prepare(folder);
    UncertaintyStudy study = new UncertaintyStudy(caseFile, Version.text(), console().progress());
    study.compute(folder, part());
    return part().isWhole() ? finish(study, folder, console()) : partDone(folder);
  }

  static ExitStatus finish(UncertaintyStudy study, Path folder, Console console)
      throws IOException {
    UncertaintyStudy.Result result = study.finish(folder);
    UncertaintyFiles.write(folder, result, Version.number());
    console.result(UncertaintyFiles.terminal(result));
    console.result("Written to " + folder);
    return result.certified() ? ExitStatus.DONE : ExitStatus.NOT_CERTIFIED;
  }
}
