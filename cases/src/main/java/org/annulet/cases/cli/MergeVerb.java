package org.annulet.cases.cli;

import java.io.IOException;
import java.nio.file.Path;
import org.annulet.cases.points.PointRun;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.study.PointModes;
import org.annulet.cases.sweep.SweepStudy;
import picocli.CommandLine.Command;

/** {@code annulet merge CASE}. */
@Command(
    name = "merge",
    description = "Puts the parts of a study together that were computed with --part.")
final class MergeVerb extends Verb {
  @Override
  ExitStatus run(CaseFile caseFile, Path folder) throws IOException {
    if (caseFile.studies().sweep().isEmpty() || !PointRun.present(folder, SweepStudy.NAME)) {
      console()
          .fault(
              "annulet: no part of a study in "
                  + folder
                  + "\n    mend: run 'annulet sweep CASE --part 1/2' and so on first, with the same"
                  + " --out");
      return ExitStatus.INPUT_FAULT;
    }
    SweepStudy study = new SweepStudy(caseFile, Version.text(), console().progress());
    PointRun.Collected<PointModes> collected = study.collect(folder);
    collected
        .strange()
        .forEach(
            f -> console().fault("note: " + f + " belongs to another state of the case; left out"));
    if (!collected.complete()) {
      for (String part : collected.missing()) {
        console()
            .fault(
                "annulet: points of part "
                    + part
                    + " are missing"
                    + "\n    mend: annulet sweep CASE --part "
                    + part);
      }
      return ExitStatus.NOT_CERTIFIED;
    }
    return SweepVerb.finish(study, folder, console());
  }
}
