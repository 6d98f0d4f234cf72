package org.annulet.cases.study;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.meaning.Chamber;
import org.annulet.post.meaning.GeometryKind;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.ModeView;
import org.annulet.post.table.ModesCsv;
import org.annulet.post.table.ModesJson;
import org.annulet.post.vtk.ModeFiles;
import org.annulet.post.vtk.Surface;

/** Writes the answer of a {@link ModesStudy} into a folder. */
public final class ModesFiles {
  private static final int SWEPT_FACETS = 72;
  private static final int MOST_SWEPT_POINTS = 400_000;

  private ModesFiles() {}

  /**
   * Writes tables and fields.
   *
   * @param folder made if absent; files of an earlier run are replaced
   * @throws IOException if the folder cannot be written
   */
  public static void write(Path folder, ModesStudy.Answer answer) throws IOException {
    Files.createDirectories(folder);
    removeOldFields(folder);
    ModesJson.write(folder.resolve("modes.json"), answer.results());
    ModesCsv.write(folder.resolve("modes.csv"), answer.results());
    List<ModeView> views = answer.results().modes().stream().map(ModeEntry::view).toList();
    Mesh mesh = answer.problem().shape().mesh();
    new ModeFiles(folder, mesh, Surface.flat(mesh)).modes("mode", views);
    Chamber chamber = answer.chamber();
    if (chamber.kind() == GeometryKind.RING) {
      new ModeFiles(folder, mesh, Surface.wrapped(mesh, chamber.zoneRadii())).modes("ring", views);
    } else if (chamber.kind() == GeometryKind.SECTION
        && (long) mesh.nodeCount() * SWEPT_FACETS < MOST_SWEPT_POINTS) {
      new ModeFiles(folder, mesh, Surface.swept(mesh, 2 * Math.PI, SWEPT_FACETS))
          .modes("swept", views);
    }
  }

  /** Fields of an earlier run with more modes would stand beside the new ones. */
  private static void removeOldFields(Path folder) throws IOException {
    List<Path> old;
    try (Stream<Path> files = Files.list(folder)) {
      old =
          files
              .filter(f -> f.getFileName().toString().matches("(mode|ring|swept)-\\d+\\.vtu"))
              .toList();
    }
    for (Path f : old) {
      Files.delete(f);
    }
  }
}
