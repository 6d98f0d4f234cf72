package org.annulet.cases.cli;

import java.io.IOException;
import java.nio.file.Path;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.sweep.SweepFiles;
import org.annulet.cases.sweep.SweepStudy;
import org.annulet.post.files.WholeFile;
import picocli.CommandLine.Command;

/** {@code annulet sweep CASE}. */
@Command(
    name = "sweep",
    description = "Follows every mode while the inputs under 'studies.sweep' vary.")
final class SweepVerb extends PointsVerb {
  @Override
  ExitStatus run(CaseFile caseFile, Path folder) throws IOException {
    WholeFile.prepare(folder);
    SweepStudy study = new SweepStudy(caseFile, Version.text(), console().progress());
    study.compute(folder, part());
    return part().isWhole() ? finish(study, folder, console()) : partDone(folder);
  }

  static ExitStatus finish(SweepStudy study, Path folder, Console console) throws IOException {
    SweepStudy.Result result = study.finish(study.collect(folder));
    SweepFiles.write(folder, result, Version.number());
    console.result(SweepFiles.terminal(result));
    console.result("Written to " + folder);
    return result.certified() ? ExitStatus.DONE : ExitStatus.NOT_CERTIFIED;
  }
}
