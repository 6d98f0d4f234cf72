package org.annulet.cases.cli;

import java.io.IOException;
import java.nio.file.Path;
import org.annulet.cases.points.PointRun;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.sweep.SweepStudy;
import org.annulet.cases.uncertainty.UncertaintyStudy;
import picocli.CommandLine.Command;

/** {@code annulet merge CASE}. */
@Command(
    name = "merge",
    description = "Puts the parts of a study together that were computed with --part.")
final class MergeVerb extends Verb {
  @Override
  ExitStatus run(CaseFile caseFile, Path folder) throws IOException {
    ExitStatus worst = null;
    if (caseFile.studies().sweep().isPresent() && PointRun.present(folder, SweepStudy.NAME)) {
      SweepStudy study = new SweepStudy(caseFile, Version.text(), console().progress());
      worst =
          allThere(SweepStudy.NAME, study.collect(folder))
              ? SweepVerb.finish(study, folder, console())
              : ExitStatus.NOT_CERTIFIED;
    }
    if (caseFile.studies().uncertainty().isPresent()
        && PointRun.present(folder, UncertaintyStudy.NAME)) {
      UncertaintyStudy study = new UncertaintyStudy(caseFile, Version.text(), console().progress());
      ExitStatus own =
          allThere(UncertaintyStudy.NAME, study.missing(folder))
              ? UncertaintyVerb.finish(study, folder, console())
              : ExitStatus.NOT_CERTIFIED;
      worst = worst == null || own.code() > worst.code() ? own : worst;
    }
    if (worst == null) {
      console()
          .fault(
              "annulet: no part of a study in "
                  + folder
                  + "\n    mend: run 'annulet sweep CASE --part 1/2' and so on first, with the same"
                  + " --out");
      return ExitStatus.INPUT_FAULT;
    }
    return worst;
  }

  private boolean allThere(String verb, PointRun.Collected<?> collected) {
    collected
        .strange()
        .forEach(
            f -> console().fault("note: " + f + " belongs to another state of the case; left out"));
    for (String part : collected.missing()) {
      console()
          .fault(
              "annulet: points of part "
                  + part
                  + " are missing\n    mend: annulet "
                  + verb
                  + " CASE --part "
                  + part);
    }
    return collected.complete();
  }
}
