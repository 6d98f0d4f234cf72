package org.annulet.cases.cli;

import java.io.IOException;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.Map;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.study.ModesFiles;
import org.annulet.cases.study.ModesStudy;
import org.annulet.post.files.WholeFile;
import org.annulet.post.meaning.Results;
import org.annulet.post.table.TextTables;
import org.annulet.post.table.VariantTable;
import picocli.CommandLine.Command;

/** {@code annulet modes CASE}. */
@Command(
    name = "modes",
    description = "Finds every mode in the window, with growth rate and certificate.")
final class ModesVerb extends Verb {
  @Override
  ExitStatus run(CaseFile caseFile, Path folder) throws IOException {
    WholeFile.prepare(folder);
    if (caseFile.variants().isEmpty()) {
      return one(caseFile, folder).results().complete()
          ? ExitStatus.DONE
          : ExitStatus.NOT_CERTIFIED;
    }
    Map<String, Results> byVariant = new LinkedHashMap<>();
    for (CaseFile.Variant variant : caseFile.variants()) {
      console()
          .result(
              "── " + variant.name() + (variant.about().isEmpty() ? "" : ": " + variant.about()));
      byVariant.put(
          variant.name(), one(variant.caseFile(), folder.resolve(variant.name())).results());
      console().result("");
    }
    console().result(VariantTable.terminal(byVariant));
    return byVariant.values().stream().allMatch(Results::complete)
        ? ExitStatus.DONE
        : ExitStatus.NOT_CERTIFIED;
  }

  private ModesStudy.Answer one(CaseFile caseFile, Path folder) throws IOException {
    ModesStudy.Answer answer = new ModesStudy(caseFile, console().progress()).run(Version.number());
    ModesFiles.write(folder, answer);
    console().result(TextTables.terminal(answer.results()));
    console().result("Written to " + folder);
    return answer;
  }
}
