package org.annulet.cases.study;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.IntStream;
import org.annulet.cases.read.CaseFile;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.meaning.Certificate;
import org.annulet.post.meaning.Chamber;
import org.annulet.post.meaning.Labels;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.ModeLabel;
import org.annulet.post.meaning.ModeView;
import org.annulet.post.meaning.Results;
import org.annulet.solver.assembly.NodalField;
import org.annulet.solver.assembly.Ring;
import org.annulet.solver.assembly.Section;
import org.annulet.solver.eigen.ModeSearch;
import org.annulet.solver.eigen.SearchSettings;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.modes.ModeSet;

/** Every mode of a case in its window, labelled and certified. */
public final class ModesStudy {
  private final CaseFile caseFile;
  private final Progress progress;

  /** A study of one case that says how far it is. */
  public ModesStudy(CaseFile caseFile, Progress progress) {
    this.caseFile = caseFile;
    this.progress = progress;
  }

  /**
   * The answer.
   *
   * @param problem operators, mesh and gas
   * @param chamber the gas volume the modes live in
   * @param results modes with labels and certificates
   */
  public record Answer(CaseProblem problem, Chamber chamber, Results results) {}

  /**
   * Meshes, assembles, searches and labels.
   *
   * @param version of the program, for the results
   */
  public Answer run(String version) {
    progress.step("meshing and assembling", 0, 1);
    CaseProblem problem = CaseProblem.of(caseFile, 1);
    Found found = search(problem);
    Chamber chamber = chamber(problem);
    List<ModeEntry> inside = label(chamber, found.inside);
    List<ModeEntry> outside = label(chamber, found.outside);
    List<String> notes = new ArrayList<>();
    notes.add(problem.method());
    Results results =
        new Results(
            caseFile.title(),
            version,
            caseFile.window(),
            found.certificates,
            inside,
            outside,
            notes);
    return new Answer(problem, chamber, results);
  }

  private static final class Found {
    final List<Certificate> certificates = new ArrayList<>();
    final List<ModeView> inside = new ArrayList<>();
    final List<ModeView> outside = new ArrayList<>();
  }

  private Found search(CaseProblem problem) {
    int n = problem.parts().size();
    int[] done = {0};
    // Parts are independent; the results are put together in their order, so the number of cores changes nothing.
    List<ModeSet> sets =
        IntStream.range(0, n)
            .parallel()
            .mapToObj(
                i -> {
                  ModeSet set =
                      ModeSearch.find(
                          problem.parts().get(i).assembled().operator(),
                          caseFile.window(),
                          SearchSettings.standard());
                  synchronized (done) {
                    progress.step("searching and counting modes", ++done[0], n);
                  }
                  return set;
                })
            .toList();
    Optional<MirrorImage> mirror = problem.shape().cells().map(MirrorImage::new);
    Found found = new Found();
    for (int i = 0; i < n; i++) {
      CaseProblem.Part part = problem.parts().get(i);
      ModeSet set = sets.get(i);
      Certificate c = Certificate.of(part.name(), part.order(), set);
      found.certificates.add(
          new Certificate(
              c.operatorName(),
              c.order(),
              c.count() < 0 ? -1 : c.count() * part.copies(),
              c.found() * part.copies(),
              c.complete(),
              c.notes()));
      set.modes().forEach(m -> add(found.inside, part, m, mirror));
      set.outside().forEach(m -> add(found.outside, part, m, mirror));
    }
    Comparator<ModeView> order =
        Comparator.<ModeView>comparingDouble(v -> v.mode().frequency())
            .thenComparingDouble(v -> v.mode().growthRate());
    found.inside.sort(order);
    found.outside.sort(order);
    return found;
  }

  /** A mode as one entry, or as two where the operator stands for both turning directions. */
  private static void add(
      List<ModeView> views, CaseProblem.Part part, Mode mode, Optional<MirrorImage> mirror) {
    NodalField p = part.assembled().expand(mode.re(), mode.im());
    Mode counted =
        part.copies() == 1
            ? mode
            : new Mode(
                mode.growthRate(),
                mode.frequency(),
                mode.re(),
                mode.im(),
                mode.multiplicity() * part.copies(),
                mode.backwardError(),
                mode.iterations(),
                mode.verdict());
    views.add(
        new ModeView(counted, p.re(), p.im(), part.order(), part.name(), Double.NaN, Double.NaN));
    if (part.copies() == 2) {
      boolean section = part.order() != null;
      views.add(
          new ModeView(
              counted,
              section ? p.re() : mirror.orElseThrow().of(p.re()),
              section ? p.im() : mirror.orElseThrow().of(p.im()),
              section ? Integer.valueOf(-part.order()) : null,
              part.name(),
              Double.NaN,
              Double.NaN));
    }
  }

  private static List<ModeEntry> label(Chamber chamber, List<ModeView> views) {
    List<ModeLabel> labels = Labels.of(chamber, views);
    List<ModeEntry> entries = new ArrayList<>();
    for (int i = 0; i < views.size(); i++) {
      entries.add(new ModeEntry(views.get(i), labels.get(i), Optional.empty()));
    }
    return entries;
  }

  private static Chamber chamber(CaseProblem problem) {
    Mesh mesh = problem.shape().mesh();
    int triangles = mesh.triangleCount();
    double[] density = new double[triangles];
    double[] bulk = new double[triangles];
    double[] thickness = new double[triangles];
    for (int t = 0; t < triangles; t++) {
      density[t] = problem.medium().density(t);
      bulk[t] = problem.medium().bulkModulus(t);
    }
    if (problem.shape().geometry() instanceof Ring ring) {
      double[] radius = new double[mesh.zoneNames().size()];
      for (int z = 0; z < radius.length; z++) {
        radius[z] = ring.zones().get(mesh.zoneNames().get(z)).meanRadius();
      }
      for (int t = 0; t < triangles; t++) {
        thickness[t] = ring.zones().get(mesh.zoneNames().get(mesh.zone(t))).gap();
      }
      return Chamber.ring(mesh, radius).withThickness(thickness).withGas(density, bulk);
    }
    if (problem.shape().geometry() instanceof Section section) {
      Map<String, Section.Ducts> ducts = section.ducts();
      for (int t = 0; t < triangles; t++) {
        Section.Ducts d = ducts.get(mesh.zoneNames().get(mesh.zone(t)));
        double r = (mesh.cornerY(t, 0) + mesh.cornerY(t, 1) + mesh.cornerY(t, 2)) / 3;
        thickness[t] = 2 * Math.PI * r * (d == null ? 1 : d.openShare());
      }
      return Chamber.section(mesh)
          .withThickness(thickness)
          .withSeparateDucts(ducts.keySet())
          .withGas(density, bulk);
    }
    Chamber flat =
        problem.shape().geometry() instanceof org.annulet.solver.assembly.CrossSection
            ? Chamber.crossSection(mesh)
            : Chamber.plane(mesh);
    return flat.withGas(density, bulk);
  }
}
