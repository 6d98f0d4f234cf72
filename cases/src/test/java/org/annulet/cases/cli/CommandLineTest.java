package org.annulet.cases.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/**
 * The program as a user meets it: what it prints, where it writes, what it answers to the shell.
 */
class CommandLineTest {
  private static final String DUCT =
      """
      annulet: 1
      title: closed duct
      geometry:
        kind: plane
        depth: 10 mm
        mesh_size: 20 mm
        points: {a: [0 m, 0 m], b: [1 m, 0 m], c: [1 m, 40 mm], d: [0 m, 40 mm]}
        edges: {floor: {line: [a, b]}, right: {line: [b, c]}, roof: {line: [c, d]}, left: {line: [d, a]}}
        zones: {duct: {boundary: [floor, right, roof, left]}}
      gas:
        mean_pressure: 1 bar
        zones: {duct: {sound_speed: 340 m/s, density: 1.2 kg/m3}}
      window: {frequency: [50 Hz, 400 Hz], growth_rate: [-100 1/s, 100 1/s]}
      """;

  @TempDir private Path folder;
  private final ByteArrayOutputStream out = new ByteArrayOutputStream();
  private final ByteArrayOutputStream err = new ByteArrayOutputStream();

  private ExitStatus run(String... args) {
    Console console = new Console(stream(out), stream(err), false);
    return Main.run(console, args);
  }

  private static PrintStream stream(ByteArrayOutputStream to) {
    return new PrintStream(to, true, StandardCharsets.UTF_8);
  }

  private String printed() {
    return out.toString(StandardCharsets.UTF_8);
  }

  private String complained() {
    return err.toString(StandardCharsets.UTF_8);
  }

  private Path duct(String text) throws IOException {
    Files.writeString(folder.resolve("case.yaml"), text);
    return folder;
  }

  @Test
  void closedDuct_writesEveryFileOfTheContract_andTheHalfWave() throws IOException {
    // f = c/2L = 170 Hz and its double: closed form, REFERENCE_VALUES row C1.
    Path results = folder.resolve("results");
    ExitStatus status = run("modes", duct(DUCT).toString(), "--out", results.toString());

    assertThat(complained()).isEmpty();
    assertThat(status).isEqualTo(ExitStatus.DONE);
    assertThat(names(results))
        .contains(
            "modes.json", "modes.csv", "mode-01.vtu", "mode-02.vtu", "mode.pvd", "report.html");
    assertThat(Files.readString(results.resolve("modes.json")))
        .contains("\"modes_by_argument_principle\": 2")
        .contains("\"complete\": true");
    String[] first = Files.readAllLines(results.resolve("modes.csv")).get(1).split(",");
    assertThat(printed()).contains("2 modes in the window, certified complete");
    assertThat(Stream.of(first).anyMatch(c -> c.startsWith("170.0")))
        .as("%s", (Object) first)
        .isTrue();
    assertThat(printed()).contains("does not clear an engine to run");
  }

  /** Of no mode, of one, of two: and nothing of an earlier run is left. */
  @Test
  void cycles_areWrittenOfAsManyModesAsAsked() throws IOException {
    Path results = folder.resolve("results");
    run("modes", duct(DUCT + "outputs: {cycles: 2}\n").toString(), "--out", results.toString());
    assertThat(names(results))
        .contains("cycle.pvd", "cycle-011.vtu")
        .filteredOn(n -> n.matches("cycle-of-mode-0[12]\\.pvd"))
        .hasSize(1);
    run("modes", duct(DUCT).toString(), "--out", results.toString());
    assertThat(names(results)).contains("cycle.pvd").noneMatch(n -> n.contains("of-mode"));
    // nothing grows in a closed duct without a flame
    run("modes", duct(DUCT + "outputs: {cycles: growing}\n").toString(), "--out", results + "");
    assertThat(names(results)).noneMatch(n -> n.contains("cycle")).contains("mode.pvd");
    assertThat(complained()).isEmpty();
  }

  @Test
  void sameCaseTwice_sameBytes() throws IOException {
    duct(DUCT);
    run("modes", folder.toString(), "--out", folder.resolve("a").toString());
    run("modes", folder.toString(), "--out", folder.resolve("b").toString());
    for (String name : List.of("modes.json", "modes.csv", "mode-01.vtu", "report.html")) {
      assertThat(folder.resolve("b").resolve(name))
          .hasSameBinaryContentAs(folder.resolve("a").resolve(name));
    }
  }

  private static final String SWEPT =
      DUCT
          + "walls: {right: {admittance: 0.1}}\n"
          + "studies: {sweep: {along: {points: 4, set: {gas.zones.duct.sound_speed: [330 m/s, 350"
          + " m/s]}}}}\n";

  @Test
  void sweepInParts_isMergedIntoTheFilesOfTheWhole() throws IOException {
    String whole = folder.resolve("whole").toString();
    String parts = folder.resolve("parts").toString();
    assertThat(run("sweep", duct(SWEPT).toString(), "--out", whole)).isEqualTo(ExitStatus.DONE);
    assertThat(printed())
        .contains("2 modes followed over gas.zones.duct.sound_speed in m/s; none grows anywhere.");
    assertThat(run("sweep", folder.toString(), "--out", parts, "--part", "2/2"))
        .isEqualTo(ExitStatus.DONE);
    assertThat(run("merge", folder.toString(), "--out", parts)).isEqualTo(ExitStatus.NOT_CERTIFIED);
    assertThat(complained()).contains("annulet sweep CASE --part 1/2");
    assertThat(run("sweep", folder.toString(), "--out", parts, "--part", "1/2"))
        .isEqualTo(ExitStatus.DONE);
    assertThat(run("merge", folder.toString(), "--out", parts)).isEqualTo(ExitStatus.DONE);
    for (String name : List.of("sweep.csv", "sweep.html", "sweep.json")) {
      assertThat(Path.of(parts, name)).hasSameBinaryContentAs(Path.of(whole, name));
    }
  }

  @Test
  void sweepOfAChangedCase_doesNotMixWithOldPoints() throws IOException {
    String results = folder.resolve("results").toString();
    run("sweep", duct(SWEPT).toString(), "--out", results);
    ExitStatus status =
        run("sweep", duct(SWEPT.replace("0.1}", "0.2}")).toString(), "--out", results);
    assertThat(status).isEqualTo(ExitStatus.OUT_OF_RESOURCES);
    assertThat(complained()).contains("points of another case, study or version; delete it");
  }

  @Test
  void sweepThatLeavesWhatIsAllowed_isStatus2_atTheSweptInput() throws IOException {
    ExitStatus status =
        run("sweep", duct(SWEPT.replace("350 m/s", "900 m/s")).toString(), "--out", "x");
    assertThat(status).isEqualTo(ExitStatus.INPUT_FAULT);
    assertThat(complained()).contains("studies.sweep.along.set.gas.zones.duct.sound_speed");
  }

  @Test
  void mergeWithoutParts_andPartsThatCannotBe_areMisuse() throws IOException {
    duct(SWEPT);
    assertThat(run("merge", folder.toString(), "--out", folder.resolve("none").toString()))
        .isEqualTo(ExitStatus.INPUT_FAULT);
    assertThat(run("sweep", folder.toString(), "--part", "3/2")).isEqualTo(ExitStatus.INPUT_FAULT);
    assertThat(run("sweep", duct(DUCT).toString())).isEqualTo(ExitStatus.INPUT_FAULT);
    assertThat(complained()).contains("the case asks for no sweep").contains("part 3/2");
  }

  @Test
  void quiet_printsNothing_butStillWrites() throws IOException {
    ExitStatus status =
        run("modes", duct(DUCT).toString(), "--quiet", "--out", folder.resolve("q").toString());
    assertThat(status).isEqualTo(ExitStatus.DONE);
    assertThat(printed()).isEmpty();
    assertThat(complained()).isEmpty();
    assertThat(folder.resolve("q/modes.json")).exists();
  }

  @Test
  void withoutOut_resultsStandBesideTheCaseFile() throws IOException {
    run("modes", duct(DUCT).resolve("case.yaml").toString(), "--quiet");
    assertThat(folder.resolve("out/modes.json")).exists();
  }

  @Test
  void faultyCase_isStatus2_withEveryFault_lineAndRemedy_andNoFiles() throws IOException {
    String broken = DUCT.replace("340 m/s", "340").replace("[50 Hz, 400 Hz]", "[400 Hz, 50 Hz]");
    ExitStatus status = run("modes", duct(broken).toString());
    assertThat(status).isEqualTo(ExitStatus.INPUT_FAULT);
    assertThat(complained())
        .contains("case.yaml:12:")
        .contains("case.yaml:13:")
        .contains("mend: ")
        .contains("2 faults in the case")
        .doesNotContain("Exception")
        .doesNotContain("\tat ");
    assertThat(folder.resolve("out")).doesNotExist();
  }

  @Test
  void outlineThatCrossesItself_isDrawnAtTheSpot() throws IOException {
    String crossed =
        DUCT.replace("{line: [b, c]}", "{line: [b, d]}")
            .replace("{line: [c, d]}", "{line: [d, c]}")
            .replace("{line: [d, a]}", "{line: [c, a]}");
    ExitStatus status = run("mesh", duct(crossed).toString());
    assertThat(status).isEqualTo(ExitStatus.INPUT_FAULT);
    assertThat(complained())
        .contains("case.yaml:")
        .contains("cross")
        .contains("picture of the spot");
    assertThat(Files.readString(folder.resolve("out/fault-01.svg")))
        .startsWith("<svg")
        .contains(">right<")
        .contains(">left<")
        .contains("(0.500000, 0.0200000) m");
  }

  @Test
  void missingCase_isStatus2() {
    assertThat(run("modes", folder.resolve("nowhere").toString()))
        .isEqualTo(ExitStatus.INPUT_FAULT);
    assertThat(complained()).contains("no such file or folder");
  }

  @Test
  void misspeltVerb_isStatus2_andNamesTheNearest() {
    assertThat(run("mods", "somewhere")).isEqualTo(ExitStatus.INPUT_FAULT);
    assertThat(complained()).contains("modes");
  }

  @Test
  void noVerb_unknownOption_missingCase_areStatus2() {
    assertThat(run()).isEqualTo(ExitStatus.INPUT_FAULT);
    assertThat(run("modes")).isEqualTo(ExitStatus.INPUT_FAULT);
    assertThat(run("modes", "x", "--wrong")).isEqualTo(ExitStatus.INPUT_FAULT);
    assertThat(complained()).doesNotContain("\tat ");
  }

  @Test
  void folderThatCannotBeMade_isStatus3_inPlainWords() throws IOException {
    Path file = Files.writeString(folder.resolve("taken"), "a file, not a folder");
    ExitStatus status = run("modes", duct(DUCT).toString(), "--out", file.toString());
    assertThat(status).isEqualTo(ExitStatus.OUT_OF_RESOURCES);
    assertThat(complained()).contains("taken").contains("--out").doesNotContain("\tat ");
  }

  @Test
  void helpAndVersion_areStatus0() {
    assertThat(run("--help")).isEqualTo(ExitStatus.DONE);
    assertThat(run("modes", "--help")).isEqualTo(ExitStatus.DONE);
    assertThat(run("--version")).isEqualTo(ExitStatus.DONE);
    assertThat(printed())
        .contains("Exit status")
        .containsPattern("annulet \\d+\\.\\d+\\.\\d+ \\(commit ");
  }

  @Test
  void check_printsEveryValueInSi() throws IOException {
    assertThat(run("check", duct(DUCT).toString())).isEqualTo(ExitStatus.DONE);
    assertThat(printed()).contains("geometry.depth").contains("0.01 m");
  }

  @Test
  void mesh_writesMeshPicturesAndQuality() throws IOException {
    Path results = folder.resolve("m");
    assertThat(run("mesh", duct(DUCT).toString(), "--out", results.toString()))
        .isEqualTo(ExitStatus.DONE);
    assertThat(names(results))
        .containsExactlyInAnyOrder(
            "mesh.msh", "mesh.vtu", "mesh.svg", "chamber.svg", "quality.txt");
    assertThat(printed()).contains("sides per wavelength");
  }

  @Test
  void variants_areSolvedEachInItsFolder_andCompared() throws IOException {
    String variants =
        DUCT
            + """
            variants:
              - {name: cool, set: {gas.zones.duct.sound_speed: 320 m/s}}
              - {name: warm, set: {gas.zones.duct.sound_speed: 360 m/s}}
            """;
    Path results = folder.resolve("v");
    assertThat(run("modes", duct(variants).toString(), "--out", results.toString()))
        .isEqualTo(ExitStatus.DONE);
    assertThat(results.resolve("cool/modes.json")).exists();
    assertThat(results.resolve("warm/modes.json")).exists();
    assertThat(printed())
        .contains("Least stable mode of each variant")
        .contains("cool")
        .contains("warm");
  }

  private static List<String> names(Path folder) throws IOException {
    try (Stream<Path> files = Files.list(folder)) {
      return files.map(f -> f.getFileName().toString()).toList();
    }
  }

  @Test
  void compare_writesItsFiles_andSaysWhatAgrees() throws IOException {
    Path at = duct(DUCT + "studies: {compare: {tables: {net: {network_model: net.csv}}}}\n");
    Files.writeString(folder.resolve("net.csv"), "frequency [Hz]\n341\n700\n171\n");

    ExitStatus status = run("compare", at.toString());

    assertThat(status).isEqualTo(ExitStatus.DONE);
    // Half waves at 170 and 340 Hz (row C1), here and in the chain of ducts.
    assertThat(printed())
        .contains("Network model: net: 2 matches, 0 within the bars")
        .contains("outside the window")
        .contains(
            "One-dimensional chain of ducts made from the case: 2 matches, 2 within the bars");
    assertThat(folder.resolve("out/compare.csv")).exists();
    assertThat(folder.resolve("out/compare.json")).exists();
    assertThat(folder.resolve("out/compare.html")).exists();
    Files.writeString(folder.resolve("net.csv"), "frequency [Hz]\n-1\n");
    assertThat(run("compare", at.toString())).isEqualTo(ExitStatus.INPUT_FAULT);
    assertThat(complained()).contains("case.yaml:").contains("net.csv line 2");
  }
}
