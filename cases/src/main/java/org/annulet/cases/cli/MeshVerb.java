package org.annulet.cases.cli;

import java.io.IOException;
import java.nio.file.Path;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.study.MeshFiles;
import org.annulet.post.files.WholeFile;
import picocli.CommandLine.Command;

/** {@code annulet mesh CASE}. */
@Command(name = "mesh", description = "Writes the mesh, a picture of it and its quality.")
final class MeshVerb extends Verb {
  @Override
  ExitStatus run(CaseFile caseFile, Path folder) throws IOException {
    WholeFile.prepare(folder);
    console().result(MeshFiles.write(caseFile, folder));
    console().result("Written to " + folder);
    return ExitStatus.DONE;
  }
}
