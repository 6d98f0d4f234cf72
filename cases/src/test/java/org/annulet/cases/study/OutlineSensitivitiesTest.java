package org.annulet.cases.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Comparator;
import java.util.List;
import java.util.function.ToDoubleFunction;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.CaseReader;
import org.annulet.cases.read.CaseSource;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.PointSensitivity;
import org.annulet.post.meaning.Results;
import org.annulet.solver.eigen.ModeSearch;
import org.annulet.solver.eigen.SearchSettings;
import org.annulet.solver.modes.Mode;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInstance;
import org.junit.jupiter.api.io.TempDir;

/** Sensitivities to the points of an outline, whose mesh is moved for them. */
@TestInstance(TestInstance.Lifecycle.PER_CLASS)
class OutlineSensitivitiesTest {
  /** A burner into a bowed chamber: straight edges, an arc, a curve, an inner edge, a flame. */
  private static final String BOWED =
      """
      annulet: 1
      title: Bowed rig
      geometry:
        kind: plane
        depth: 80 mm
        mesh_size: 25 mm
        points_in: mm
        points:
          a: [0, 0]
          b: [200, 0]
          c: [260, -60]
          d: [600, -80]
          e: [690, 40]
          f: [600, 160]
          g: [400, 175]
          h: [240, 150]
          i: [200, 60]
          j: [0, 60]
        edges:
          floor: {line: [a, b]}
          step: {line: [b, c, d]}
          bow: {arc: [d, e, f]}
          roof: {curve: [f, g, h, i]}
          top: {line: [i, j]}
          inlet: {line: [j, a]}
          sheet: {line: [b, i]}
        zones:
          cold: {boundary: [floor, sheet, top, inlet]}
          hot: {boundary: [step, bow, roof, sheet]}
      gas:
        mean_pressure: 2 bar
        zones:
          cold: {temperature: 400 K, gamma: 1.4, gas_constant: 287 J/(kg K)}
          hot: {temperature: 1500 K, gamma: 1.3, gas_constant: 290 J/(kg K)}
      walls: {bow: {admittance: 0.1}}
      FLAMES
      window: {frequency: [150 Hz, 1100 Hz], growth_rate: [-500 1/s, 500 1/s]}
      outputs: {field_files: none}
      """;

  private static final String FLAME =
      """
      flames:
        main:
          heat_release: 30 kW
          place: {sheet: sheet}
          reference: {edge: sheet, flow_from: cold}
          reference_velocity: 10 m/s
          response: {gain: 0.9, delay: 2 ms}
      """;

  private CaseFile silent;
  private Results silentResults;
  private CaseFile burning;
  private Results burningResults;

  @BeforeAll
  void solve(@TempDir Path folder) throws IOException {
    silent = read(folder, BOWED.replace("FLAMES\n", ""));
    silentResults = run(silent);
    burning = read(folder, BOWED.replace("FLAMES\n", FLAME));
    burningResults = run(burning);
  }

  private static CaseFile read(Path folder, String text) throws IOException {
    Path file = folder.resolve("case.yaml");
    Files.writeString(file, text);
    return CaseReader.read(file).caseFile().orElseThrow();
  }

  private static Results run(CaseFile caseFile) {
    return new ModesStudy(caseFile, Progress.SILENT).run("test").results();
  }

  private static Complex s(Mode m) {
    return new Complex(m.growthRate(), 2 * Math.PI * m.frequency());
  }

  /** Σ weight · ∂s/∂coordinate over all rows, per metre. */
  private static Complex sum(ModeEntry e, ToDoubleFunction<PointSensitivity> weight) {
    Complex sum = Complex.ZERO;
    for (PointSensitivity p : e.points()) {
      Complex slope =
          new Complex(p.growthPerMillimetre(), 2 * Math.PI * p.frequencyPerMillimetre());
      sum = sum.add(slope.multiply(1000 * weight.applyAsDouble(p)));
    }
    return sum;
  }

  private double metres(CaseFile c, String point, String coordinate) {
    String key = "geometry.points." + point + "." + (coordinate.equals("x") ? 1 : 2);
    return value(c, key).si();
  }

  private static CaseSource.Value value(CaseFile c, String key) {
    return c.source().values().stream().filter(v -> v.key().equals(key)).findFirst().orElseThrow();
  }

  private static double along(PointSensitivity p, String coordinate) {
    return p.coordinate().equals(coordinate) ? 1 : 0;
  }

  /**
   * A passive chamber with every length larger by ε has every s smaller by ε, whatever the mesh;
   * moved or turned as a whole it sounds the same. The morph carries all three exactly, so that
   * only the step's square, 1e-7 or so of each row, is left.
   */
  @Test
  void chamberScaledMovedTurned_keepsItsLaws() {
    assertThat(silentResults.modes()).hasSizeGreaterThanOrEqualTo(2);
    for (ModeEntry e : silentResults.modes()) {
      Complex s = s(e.view().mode());
      double size = s.abs();
      Complex scaled = sum(e, p -> metres(silent, p.point(), p.coordinate()));
      assertThat(scaled.add(s).abs()).isLessThan(1e-6 * size);
      for (String axis : List.of("x", "y")) {
        assertThat(sum(e, p -> along(p, axis)).abs()).isLessThan(1e-5 * size);
      }
      Complex turned =
          sum(
              e,
              p ->
                  p.coordinate().equals("y")
                      ? metres(silent, p.point(), "x")
                      : -metres(silent, p.point(), "y"));
      assertThat(turned.abs()).isLessThan(1e-6 * size);
    }
  }

  /** Against modes solved on the moved mesh, both ways, two step widths extrapolated. */
  @Test
  void everyKindOfEdge_movesAsSolvedOnTheMovedMesh() {
    for (String key : List.of("a.1", "e.1", "g.2", "h.1", "i.2")) {
      for (ModeEntry e : burningResults.modes()) {
        Complex wide = difference(burning, "geometry.points." + key, 2e-4, e.view().mode());
        Complex narrow = difference(burning, "geometry.points." + key, 1e-4, e.view().mode());
        Complex slope = narrow.multiply(4).subtract(wide).divide(3);
        PointSensitivity row =
            e.points().stream().filter(p -> p.key().endsWith("." + key)).findFirst().orElseThrow();
        Complex got =
            new Complex(row.growthPerMillimetre(), 2 * Math.PI * row.frequencyPerMillimetre())
                .multiply(1000);
        // 1e-6 of the slope, and what modes solved to 1e-12 or so of |s| leave over 1e-4 m
        assertThat(got.subtract(slope).abs())
            .as("%s, %s", key, e.label().text())
            .isLessThan(1e-6 * slope.abs() + 1e-7 * s(e.view().mode()).abs());
      }
    }
  }

  private static Complex difference(CaseFile c, String key, double by, Mode own) {
    ChamberShape shape = finest(c);
    OutlineMorph morph = new OutlineMorph(shape, ChamberShape.outline(c.geometry()).orElseThrow());
    Complex[] s = new Complex[2];
    for (int k = 0; k < 2; k++) {
      CaseFile moved =
          InputChange.to(c, value(c, key), value(c, key).si() + (k == 0 ? by : -by)).orElseThrow();
      s[k] = near(moved, morph.to(ChamberShape.outline(moved.geometry()).orElseThrow()), own);
    }
    return s[0].subtract(s[1]).divide(2 * by);
  }

  private static ChamberShape finest(CaseFile c) {
    List<ChamberShape> ladder = ChamberShape.ladder(c, ModesStudy.LEVELS, 1);
    return ladder.get(ladder.size() - 1);
  }

  private static Complex near(CaseFile c, ChamberShape shape, Mode own) {
    return CaseProblem.on(c, shape).parts().stream()
        .map(p -> ModeSearch.find(p.assembled().operator(), c.window(), SearchSettings.standard()))
        .flatMap(set -> set.modes().stream())
        .map(OutlineSensitivitiesTest::s)
        .min(Comparator.comparingDouble(z -> z.subtract(s(own)).abs()))
        .orElseThrow();
  }

  /** Another mesh for each position: errors of the meshes differ by a few 1e-4 of s. */
  @Test
  void pointMovedByAFewMillimetres_movesAsWhenMeshedAnew() {
    String key = "geometry.points.e.1";
    double by = 0.02;
    for (ModeEntry e : burningResults.modes()) {
      Complex[] s = new Complex[2];
      for (int k = 0; k < 2; k++) {
        CaseFile moved =
            InputChange.to(burning, value(burning, key), 0.69 + (k == 0 ? by : -by)).orElseThrow();
        s[k] = near(moved, ChamberShape.of(moved), e.view().mode());
      }
      Complex slope = s[0].subtract(s[1]).divide(2 * by);
      PointSensitivity row =
          e.points().stream().filter(p -> p.key().equals(key)).findFirst().orElseThrow();
      Complex got =
          new Complex(row.growthPerMillimetre(), 2 * Math.PI * row.frequencyPerMillimetre())
              .multiply(1000);
      double size = s(e.view().mode()).abs();
      assertThat(got.subtract(slope).abs())
          .as("%s: %s, meshed anew %s", e.label().text(), got, slope)
          .isLessThan(0.05 * slope.abs() + 3e-4 * size / by);
    }
  }

  private static final String TUBE =
      """
      annulet: 1
      title: Closed tube
      geometry:
        kind: KIND
        mesh_size: 20 mm
        points_in: mm
        points: {a: [0, LOW], b: [500, LOW], c: [500, HIGH], d: [0, HIGH]}
        edges: {low: {line: [a, b]}, far: {line: [b, c]}, top: {line: [c, d]}, near: {line: [d, a]}}
        zones: {gas: {boundary: [low, far, top, near]}}
      gas:
        mean_pressure: 1 bar
        zones: {gas: {sound_speed: 340 m/s, density: 1.2 kg/m3}}
      MORE
      outputs: {field_files: none}
      """;

  /** f = c/2L, so df/dL = −f/L: both far points moved together; 0.1 %: the mesh of 20 mm. */
  @Test
  void closedTube_lengthenedByOneMillimetre_fallsByFOverL(@TempDir Path folder) throws IOException {
    CaseFile tube =
        read(
            folder,
            TUBE.replace("KIND", "plane\n  depth: 10 mm")
                .replace("LOW", "0")
                .replace("HIGH", "40")
                .replace(
                    "MORE", "window: {frequency: [300 Hz, 400 Hz], growth_rate: [-9 1/s, 9 1/s]}"));
    ModeEntry e = run(tube).modes().get(0);
    double f = e.view().mode().frequency();
    assertThat(f).isCloseTo(340, within(0.34));
    double fall =
        e.points().stream()
            .filter(p -> p.coordinate().equals("x") && "bc".contains(p.point()))
            .mapToDouble(PointSensitivity::frequencyPerMillimetre)
            .sum();
    assertThat(fall).isCloseTo(-f / 500, within(1e-3 * f / 500));
    PointSensitivity one =
        e.points().stream().filter(p -> p.key().endsWith("b.1")).findFirst().orElseThrow();
    assertThat(one.value()).isEqualTo("500 mm");
    assertThat(one.growthPerMillimetre()).isCloseTo(0, within(1e-6));
    // f(L) bends by 2f/L², so that a tenth is reached where 2δ/L·½ = 0.1, had both points moved
    assertThat(one.linearRange()).isBetween(20.0, 200.0);
  }

  /**
   * A thin annulus as a section, order 1: f = c/2πR up to (gap/R)²/12, 1e-4 here, so df/dR = −f/R.
   */
  @Test
  void thinAnnulus_widened_fallsByFOverR(@TempDir Path folder) throws IOException {
    CaseFile annulus =
        read(
            folder,
            TUBE.replace("KIND", "section")
                .replace("LOW", "295")
                .replace("HIGH", "305")
                .replace(
                    "MORE",
                    "window: {frequency: [150 Hz, 200 Hz], growth_rate: [-9 1/s, 9 1/s],"
                        + " azimuthal_orders: [1]}"));
    ModeEntry e = run(annulus).modes().get(0);
    double f = e.view().mode().frequency();
    assertThat(f).isCloseTo(340 / (2 * Math.PI * 0.3), within(1e-3 * f));
    double fall =
        e.points().stream()
            .filter(p -> p.coordinate().equals("r"))
            .mapToDouble(PointSensitivity::frequencyPerMillimetre)
            .sum();
    assertThat(fall).isCloseTo(-f / 300, within(1e-3 * f / 300));
  }

  /** On the axis r cannot be negative: the row is left out, and the notes say so. */
  @Test
  void pointsOnTheAxis_moveAlongItOnly(@TempDir Path folder) throws IOException {
    CaseFile can =
        read(
            folder,
            TUBE.replace("KIND", "section")
                .replace("LOW", "0")
                .replace("HIGH", "40")
                .replace(
                    "MORE",
                    "window: {frequency: [300 Hz, 400 Hz], growth_rate: [-9 1/s, 9 1/s],"
                        + " azimuthal_orders: [0]}"));
    Results results = run(can);
    assertThat(results.modes().get(0).points())
        .noneMatch(p -> p.key().endsWith("a.2") || p.key().endsWith("b.2"))
        .anyMatch(p -> p.key().endsWith("b.1"));
    assertThat(results.notes())
        .anyMatch(n -> n.contains("geometry.points.a.2, geometry.points.b.2"));
  }
}
