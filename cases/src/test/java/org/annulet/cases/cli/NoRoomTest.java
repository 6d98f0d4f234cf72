package org.annulet.cases.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.PosixFilePermissions;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Results that cannot be kept: exit status 3, one message that names the place, and every file
 * whole or as it was. A full disk is /dev/full, to which the temporary neighbour of one file is
 * linked.
 */
class NoRoomTest {
  private static final String DUCT =
      """
      annulet: 1
      title: closed duct
      geometry:
        kind: plane
        depth: 10 mm
        mesh_size: 40 mm
        points: {a: [0 m, 0 m], b: [1 m, 0 m], c: [1 m, 80 mm], d: [0 m, 80 mm]}
        edges: {floor: {line: [a, b]}, right: {line: [b, c]}, roof: {line: [c, d]}, left: {line: [d, a]}}
        zones: {duct: {boundary: [floor, right, roof, left]}}
      gas:
        mean_pressure: 1 bar
        zones: {duct: {sound_speed: 340 m/s, density: 1.2 kg/m3}}
      window: {frequency: [100 Hz, 250 Hz], growth_rate: [-100 1/s, 100 1/s]}
      """;

  @TempDir private Path folder;
  private final ByteArrayOutputStream out = new ByteArrayOutputStream();
  private final ByteArrayOutputStream err = new ByteArrayOutputStream();

  private ExitStatus run(String verb, Path results) throws IOException {
    Files.writeString(folder.resolve("case.yaml"), DUCT);
    Console console = new Console(stream(out), stream(err), false);
    return Main.run(console, verb, folder.toString(), "--out", results.toString());
  }

  private static PrintStream stream(ByteArrayOutputStream to) {
    return new PrintStream(to, true, StandardCharsets.UTF_8);
  }

  private String complained() {
    return err.toString(StandardCharsets.UTF_8);
  }

  private static List<String> hidden(Path results) throws IOException {
    try (Stream<Path> files = Files.list(results)) {
      return files.map(f -> f.getFileName().toString()).filter(n -> n.startsWith(".")).toList();
    }
  }

  @ParameterizedTest
  @ValueSource(strings = {"modes", "mesh"})
  void aFileInThePlaceOfTheFolder_isNamed_andKept(String verb) throws IOException {
    Path file = Files.writeString(folder.resolve("results"), "mine");
    assertThat(run(verb, file)).isEqualTo(ExitStatus.OUT_OF_RESOURCES);
    assertThat(complained())
        .contains(file + ": is a file, not a folder")
        .contains("mend: make room, or give a folder that can be written with --out");
    assertThat(out.toString(StandardCharsets.UTF_8)).isEmpty(); // said before anything was computed
    assertThat(file).hasContent("mine");
  }

  @Test
  void aFileAboveTheFolder_isNamed() throws IOException {
    Path file = Files.writeString(folder.resolve("results"), "mine");
    assertThat(run("modes", file.resolve("below"))).isEqualTo(ExitStatus.OUT_OF_RESOURCES);
    assertThat(complained()).contains(file.toString()).doesNotContain("Exception");
  }

  /** Where permission binds; an administrator writes everywhere but in /proc. */
  @Test
  void aFolderThatCannotBeWritten_isNamedBeforeAnythingIsComputed() throws IOException {
    Path locked =
        Files.createDirectory(
            folder.resolve("locked"),
            PosixFilePermissions.asFileAttribute(PosixFilePermissions.fromString("r-xr-xr-x")));
    Path results = Files.isWritable(locked) ? Path.of("/proc/annulet") : locked;
    assumeTrue(!Files.isWritable(locked) || Files.isDirectory(Path.of("/proc")));
    assertThat(run("modes", results)).isEqualTo(ExitStatus.OUT_OF_RESOURCES);
    assertThat(complained()).contains(results + ": cannot be written");
    assertThat(out.toString(StandardCharsets.UTF_8)).isEmpty();
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "modes.json",
        "points.csv",
        "report.html",
        "spectrum.svg",
        "mode-01.vtu",
        "mode.pvd"
      })
  void fullDisk_leavesTheOldFile_andNamesIt(String name) throws IOException {
    Path results = fullFor(name);
    assertThat(run("modes", results)).isEqualTo(ExitStatus.OUT_OF_RESOURCES);
    assertThat(complained())
        .contains(results.resolve(name) + ": cannot be written: No space left on device")
        .doesNotContain("Exception");
    if (!name.startsWith("mode-")) { // fields of an earlier run are taken away first
      assertThat(results.resolve(name)).hasContent("old");
    } else {
      assertThat(results.resolve(name)).doesNotExist();
    }
    assertThat(hidden(results)).isEmpty();
  }

  @Test
  void fullDisk_meshFileStaysWhole() throws IOException {
    Path results = fullFor("mesh.msh");
    assertThat(run("mesh", results)).isEqualTo(ExitStatus.OUT_OF_RESOURCES);
    assertThat(complained()).contains("mesh.msh: cannot be written: No space left on device");
    assertThat(results.resolve("mesh.msh")).hasContent("old");
    assertThat(hidden(results)).isEmpty();
  }

  private Path fullFor(String name) throws IOException {
    Path full = Path.of("/dev/full");
    assumeTrue(Files.exists(full) && Files.isWritable(full), "no /dev/full here");
    Path results = Files.createDirectory(folder.resolve("results"));
    Files.writeString(results.resolve(name), "old");
    Files.createSymbolicLink(results.resolve("." + name + ".part"), full);
    return results;
  }
}
