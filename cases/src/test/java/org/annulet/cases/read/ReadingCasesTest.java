package org.annulet.cases.read;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import org.annulet.mesher.files.GmshWriter;
import org.annulet.mesher.mesh.Mesh;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What the less common keys are read as. */
class ReadingCasesTest {
  private static final String PLANE =
      """
      annulet: 1
      title: plane
      geometry:
        kind: plane
        depth: 5 cm
        mesh_size: 10 mm
        mesh_size_at: {flame: 4 mm, back: 5 mm}
        points: {a: [0 mm, 0 mm], b: [0.5, 0, m], c: [500 mm, 10 cm], d: [0, 100, mm],
                 p: [200, 40, mm], q: [230, 55, mm], r: [200, 60, mm], s: [300, 0, mm], t: [300, 100, mm]}
        edges:
          floor: {line: [a, s]}
          floor2: {line: [s, b]}
          back: {line: [b, c]}
          roof2: {line: [c, t]}
          roof: {line: [t, d]}
          front: {line: [d, a]}
          flame: {line: [s, t]}
          pin: {curve: [p, q, r, p]}
        zones:
          cold: {boundary: [floor, flame, roof, front], holes: [[pin]]}
          hot: {boundary: [back, roof2, flame, floor2]}
      gas:
        mean_pressure: 101325 Pa
        zones:
          cold: {temperature: {profile: {x: [0, 300, mm], temperature: [20 °C, 313.15 K]}}, mixture: air}
          hot: {temperature: 1500 K, mixture: {fuel: hydrogen, equivalence_ratio: 40 %}}
      walls: {pin: {impedance: [2, -1]}, front: open}
      flames:
        a:
          heat_release: 10 kW
          place: {zone: hot, from: 310 mm, to: 340 mm}
          reference: {zone: cold, from: 250 mm, direction: [3, -4]}
          reference_velocity: 5 m/s
          response: {gain: -1, delay: 0 s}
        b:
          heat_release: 1 kW
          place: {sheet: flame}
          reference: {edge: flame, flow_from: cold}
          reference_velocity: 5 m/s
          response: {gain: 1, delay: 1 ms}
      window: {frequency: 1 kHz}
      outputs: {field_files: 6, cycles: growing}
      """;

  private static final String CROSS =
      """
      annulet: 1
      title: cross
      geometry:
        kind: cross_section
        axial_wavenumber: 4.5 1/m
        mesh_size: 20 mm
        points: {a: [200, 0, mm], b: [0, 200, mm], c: [-200, 0, mm], d: [0, -200, mm]}
        edges: {upper: {arc: [a, b, c]}, lower: {arc: [c, d, a]}}
        zones: {disc: {boundary: [upper, lower]}}
      gas: {mean_pressure: 1 bar, zones: {disc: {sound_speed: 340 m/s, density: 1.2 kg/m3}}}
      window: {frequency: [100, 3000, Hz]}
      """;

  static List<String> accepted() {
    return List.of(PLANE, CROSS);
  }

  @TempDir Path folder;

  private CaseFile read(String text) throws IOException {
    return CaseReader.read(Files.writeString(folder.resolve("case.yaml"), text)).orThrow();
  }

  @Test
  void plane_isRead() throws IOException {
    CaseFile c = read(PLANE);
    Geometry.Plane plane = (Geometry.Plane) c.geometry();
    assertThat(plane.depth()).isEqualTo(0.05);
    assertThat(plane.outline().points().get("c")).isEqualTo(new Outline.Point(0.5, 0.1));
    assertThat(plane.outline().zonesAt("flame")).containsExactly("cold", "hot");
    assertThat(plane.outline().zones().get("cold").holes()).containsExactly(List.of("pin"));
    assertThat(plane.meshSize().local()).isEqualTo(Map.of("flame", 0.004, "back", 0.005));
    assertThat(c.outputs().fieldFiles()).isEqualTo(6);
    assertThat(c.outputs().cycles()).isEmpty();
    assertThat(c.azimuthalOrders()).isEmpty();
    assertThat(c.window().lowestFrequency()).isCloseTo(20, within(1e-12));
    assertThat(c.window().lowestGrowth()).isEqualTo(-1000);
    assertThat(c.wall("pin")).isEqualTo(new Wall.Impedance(2, -1));
  }

  @Test
  void gas_isRead() throws IOException {
    CaseFile c = read(PLANE);
    assertThat(c.gas().zones().get("cold"))
        .isEqualTo(
            new Gas.Mixed(
                new Gas.AlongAxis(List.of(0.0, 0.3), List.of(293.15, 313.15)), new Gas.Air()));
    assertThat(c.gas().zones().get("hot"))
        .isEqualTo(
            new Gas.Mixed(new Gas.Uniform(1500), new Gas.BurntFuel(Map.of("hydrogen", 1.0), 0.4)));
  }

  @Test
  void flames_areRead_withUnitDirection() throws IOException {
    CaseFile c = read(PLANE);
    double all = Double.POSITIVE_INFINITY;
    Flame a = c.flames().get(0);
    assertThat(a.place()).isEqualTo(new Flame.Spread("hot", 0.31, 0.34, all));
    assertThat(a.reference()).isEqualTo(new Flame.Patch("cold", 0.25, all, all, 0.6, -0.8));
    assertThat(a.responseAt(1)).isEqualTo(new Flame.GainDelay(-1, 0));
    Flame b = c.flames().get(1);
    assertThat(b.place()).isEqualTo(new Flame.Sheet("flame", Flame.Answer.UNIFORM));
    assertThat(b.reference()).isEqualTo(new Flame.EdgeFlux("flame", "cold"));
  }

  @Test
  void crossSection_isRead() throws IOException {
    CaseFile c = read(CROSS);
    assertThat(((Geometry.CrossSection) c.geometry()).axialWavenumber()).isEqualTo(4.5);
    assertThat(c.window().highestFrequency()).isEqualTo(3000);
  }

  @Test
  void staging_laterExceptionsWin() throws IOException {
    CaseFile c = read(Spoilt.RING);
    Flame f = c.flames().get(0);
    assertThat(f.responseAt(1)).isEqualTo(new Flame.GainDelay(0.5, 2.1e-3));
    assertThat(f.responseAt(2)).isEqualTo(new Flame.GainDelay(0.7, 2.4e-3));
    assertThat(f.responseAt(8)).isEqualTo(new Flame.GainDelay(0.5, 2.4e-3));
    assertThat(f.heatShareAt(8)).isEqualTo(1);
    assertThat(f.reference())
        .isInstanceOfSatisfying(
            Flame.Patch.class,
            p -> {
              assertThat(p.from())
                  .isCloseTo(0.22, within(1e-15)); // counted from the zone's upstream end
              assertThat(p.to()).isCloseTo(0.26, within(1e-15));
            });
  }

  @Test
  void meshFile_isRead_andMustExist() throws IOException {
    String text =
        """
        annulet: 1
        title: mesh
        geometry: {kind: mesh_file, file: mesh.msh, plane: section, length_unit: mm,
                   separate_ducts: {burners: {count: 14, open_share: 0.25}}}
        gas: {mean_pressure: 1 bar, zones: {air: {temperature: 300 K, mixture: air}}}
        window: {frequency: 500 Hz}
        """;
    Path file = Files.writeString(folder.resolve("case.yaml"), text);
    assertThat(CaseReader.read(file).problems())
        .singleElement()
        .satisfies(p -> assertThat(p.what()).contains("'mesh.msh' does not exist"));
    Files.writeString(folder.resolve("mesh.msh"), "");
    assertThat(CaseReader.read(file).problems().get(0).toString())
        .contains("case.yaml:3:")
        .contains("mesh.msh: no MSH file: it does not begin with $MeshFormat")
        .contains("mend: name an MSH file");
    Mesh.Builder b = Mesh.builder();
    b.node(0, 300);
    b.node(100, 300);
    b.node(0, 400);
    b.triangle(0, 1, 2, "burners");
    b.segment(0, 1, "hub").segment(1, 2, "shell").segment(2, 0, "head");
    GmshWriter.write(b.build(), folder.resolve("mesh.msh"));
    assertThat(CaseReader.read(file).problems().toString())
        .contains("case.yaml:5:")
        .contains("no zone 'air'")
        .contains("no gas in zone 'burners'");
    Files.writeString(file, text.replace("air: {temp", "burners: {temp"));
    Geometry.MeshFile mesh = (Geometry.MeshFile) CaseReader.read(folder).orThrow().geometry();
    assertThat(mesh.zoneNames()).containsExactly("burners");
    assertThat(mesh.mesh().y(2)).isEqualTo(0.4);
    assertThat(mesh.metresPerUnit()).isEqualTo(0.001);
    assertThat(mesh.file()).isEqualTo(folder.toAbsolutePath().resolve("mesh.msh"));
    assertThat(mesh.separateDucts().get("burners")).isEqualTo(new Geometry.SeparateDucts(14, 0.25));
  }

  @Test
  void changes_replaceValuesByPath() throws IOException {
    Path file = Files.writeString(folder.resolve("case.yaml"), Spoilt.RING);
    CaseFile c =
        CaseReader.read(
                file,
                Map.of(
                    "flames.main.response.delay", "1 ms",
                    "geometry.zones.chamber.length", "0.5 m",
                    "geometry.unrolled_radius", "340 mm",
                    "walls.chamber.downstream.impedance", "[3, 1]"))
            .orThrow();
    assertThat(((Flame.GainDelay) c.flames().get(0).responseAt(1)).delay()).isEqualTo(0.001);
    assertThat(((Geometry.Ring) c.geometry()).zone("chamber").length()).isEqualTo(0.5);
    assertThat(((Geometry.Ring) c.geometry()).unrolledRadius()).isEqualTo(0.34);
    assertThat(c.wall("chamber.downstream")).isEqualTo(new Wall.Impedance(3, 1));
    assertThat(CaseReader.read(file, Map.of("flames.main.response.delay", "1 mm")).problems())
        .singleElement()
        .satisfies(p -> assertThat(p.key()).isEqualTo("flames.main.response.delay"));
  }

  @Test
  void echo_showsEveryDimensionalValueInSiBesideItsText() throws IOException {
    CaseFile c = read(Spoilt.SECTION);
    assertThat(c.echo())
        .anySatisfy(l -> assertThat(l).matches("  gas.zones.tubes.temperature +20 °C += 293.15 K"))
        .anySatisfy(l -> assertThat(l).matches("  geometry.points.g.1 +350 mm += 0.35 m"))
        .anySatisfy(l -> assertThat(l).matches("  window.frequency.lowest +\\(default\\) += 18 Hz"))
        .anySatisfy(l -> assertThat(l).matches("  flames.main.heat_release +1 MW += 1000000 W"))
        .contains("  azimuthal orders [0, 1, 5]");
  }

  @Test
  void echoOfVariants_showsWhatDiffers() {
    CaseFile c = CaseReader.read(ShippedCasesTest.CASES.resolve("quiet-loud-quiet")).orThrow();
    assertThat(String.join("\n", c.echo()))
        .containsPattern("variant hydrogen_60\\R +flames.main.response.gain +0.8 +");
  }
}
