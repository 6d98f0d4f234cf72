package org.annulet.cases.study;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.CaseSource;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.chart.SpectrumChart;
import org.annulet.post.chart.Svg;
import org.annulet.post.files.WholeFile;
import org.annulet.post.meaning.Chamber;
import org.annulet.post.meaning.GeometryKind;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.NodeLine;
import org.annulet.post.meaning.Results;
import org.annulet.post.report.Fact;
import org.annulet.post.report.HtmlReport;
import org.annulet.post.report.ReportInput;
import org.annulet.post.table.ModesCsv;
import org.annulet.post.table.ModesJson;
import org.annulet.post.table.PointsCsv;
import org.annulet.post.table.SensitivitiesCsv;
import org.annulet.post.table.ShapesCsv;
import org.annulet.post.table.TextTables;
import org.annulet.post.vtk.ModeFiles;
import org.annulet.post.vtk.Surface;

/** Writes the answer of a {@link ModesStudy} into a folder. */
public final class ModesFiles {
  private static final double CHART_WIDTH = 900;
  private static final double CHART_HEIGHT = 520;
  private static final int SWEPT_FACETS = 72;
  private static final int MOST_SWEPT_POINTS = 400_000;

  private static final int CYCLE_FRAMES = 12;
  private static final int MOST_CYCLE_NODES = 100_000;

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
    SensitivitiesCsv.write(folder.resolve("sensitivities.csv"), answer.results());
    points(folder.resolve("points.csv"), answer.results());
    WholeFile.write(folder.resolve("modes.md"), TextTables.markdown(answer.results()));
    WholeFile.write(
        folder.resolve("spectrum.svg"),
        Svg.standalone(SpectrumChart.svg(answer.results(), CHART_WIDTH, CHART_HEIGHT)));
    HtmlReport.write(
        folder.resolve("report.html"),
        new ReportInput(
            answer.results(),
            answer.chamber(),
            facts(answer.caseFile()),
            CaseConditions.markers(answer.caseFile(), answer.problem().shape().mesh())));
    int most = answer.caseFile().outputs().fieldFiles();
    ShapesCsv.write(
        folder.resolve("shapes.csv"),
        answer.results(),
        answer.chamber(),
        lines(answer.chamber(), answer.caseFile().outputs().shapesAlong()));
    List<ModeFiles.Numbered> views = views(answer.results().modes(), most);
    Chamber chamber = answer.chamber();
    Mesh mesh = chamber.mesh();
    boolean ring = chamber.kind() == GeometryKind.RING;
    Surface surface = ring ? Surface.wrapped(mesh, chamber.zoneRadii()) : Surface.flat(mesh);
    new ModeFiles(folder, chamber, surface).modes("mode", views);
    if (most > 0 && mesh.nodeCount() <= MOST_CYCLE_NODES) {
      cycles(new ModeFiles(folder, chamber, surface), answer);
    }
    if (chamber.kind() == GeometryKind.SECTION
        && (long) mesh.nodeCount() * SWEPT_FACETS < MOST_SWEPT_POINTS) {
      new ModeFiles(folder, chamber, Surface.swept(mesh, 2 * Math.PI, SWEPT_FACETS))
          .modes("swept", views);
    }
  }

  /** The motion over one cycle of the modes that grow fastest. */
  private static void cycles(ModeFiles files, ModesStudy.Answer answer) throws IOException {
    List<ModeEntry> modes = answer.results().modes();
    long growing = modes.stream().filter(e -> e.stability() == ModeEntry.Stability.GROWS).count();
    List<Integer> chosen =
        IntStream.range(0, modes.size())
            .boxed()
            .sorted(Comparator.comparingDouble(i -> -modes.get(i).view().mode().growthRate()))
            .limit(answer.caseFile().outputs().cycles().orElse((int) growing))
            .toList();
    for (int i : chosen) {
      boolean first = i == chosen.get(0);
      String stem = first ? "cycle" : String.format(Locale.ROOT, "cycle-of-mode-%02d", i + 1);
      files.cycle(stem, modes.get(i).view(), CYCLE_FRAMES);
    }
  }

  /** What the points of an outline do; no file where there is none to move. */
  private static void points(Path file, Results results) throws IOException {
    if (results.modes().stream().allMatch(e -> e.points().isEmpty())) {
      Files.deleteIfExists(file);
    } else {
      PointsCsv.write(file, results);
    }
  }

  private static List<NodeLine> lines(Chamber chamber, List<String> named) {
    return named.isEmpty()
        ? NodeLine.usual(chamber)
        : named.stream().map(edge -> NodeLine.ofEdge(chamber, edge)).toList();
  }

  /** The modes to be written as fields: all, or those that grow fastest; by their number. */
  private static List<ModeFiles.Numbered> views(List<ModeEntry> all, int most) {
    return IntStream.range(0, all.size())
        .boxed()
        .sorted(Comparator.comparingDouble(i -> -all.get(i).view().mode().growthRate()))
        .limit(most)
        .sorted()
        .map(i -> new ModeFiles.Numbered(i + 1, all.get(i).view(), all.get(i).maps()))
        .toList();
  }

  private static List<Fact> facts(CaseFile caseFile) {
    List<Fact> facts = new ArrayList<>();
    if (!caseFile.about().isBlank()) {
      facts.add(new Fact("case", "about", caseFile.about().strip()));
    }
    for (CaseSource.Value v : caseFile.source().values()) {
      if (v.key().startsWith("geometry.points.")) {
        continue; // the picture shows them better
      }
      int dot = v.key().indexOf('.');
      facts.add(
          new Fact(
              dot < 0 ? "case" : v.key().substring(0, dot),
              dot < 0 ? v.key() : v.key().substring(dot + 1),
              v.text()));
    }
    return facts;
  }

  /** Fields of an earlier run with more modes would stand beside the new ones. */
  private static void removeOldFields(Path folder) throws IOException {
    List<Path> old;
    try (Stream<Path> files = Files.list(folder)) {
      old =
          files
              .filter(
                  f ->
                      f.getFileName()
                          .toString()
                          .matches(
                              "(mode|swept|cycle(-of-mode-\\d+)?)-\\d+\\.vtu|cycle(-of-mode-\\d+)?\\.pvd"))
              .toList();
    }
    for (Path f : old) {
      Files.delete(f);
    }
  }
}
