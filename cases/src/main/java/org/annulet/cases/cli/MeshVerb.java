package org.annulet.cases.cli;

import java.io.IOException;
import java.nio.file.Path;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.study.ChamberShape;
import org.annulet.mesher.mesh.Quality;
import picocli.CommandLine.Command;

/** {@code annulet mesh CASE}. */
@Command(name = "mesh", description = "Writes the mesh, a picture of it and its quality.")
final class MeshVerb extends Verb {
  @Override
  ExitStatus run(CaseFile caseFile, Path folder) throws IOException {
    ChamberShape shape = ChamberShape.of(caseFile);
    console().result(Quality.of(shape.mesh()).toString());
    return ExitStatus.DONE;
  }
}
