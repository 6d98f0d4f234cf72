package org.annulet.cases.book;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.concurrent.TimeUnit;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.CaseReader;
import org.annulet.cases.study.MeshFiles;
import org.annulet.cases.study.ModesStudy;
import org.annulet.cases.study.Progress;
import org.annulet.post.meaning.ModeView;
import org.junit.jupiter.api.Assumptions;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.snakeyaml.engine.v2.api.Load;
import org.snakeyaml.engine.v2.api.LoadSettings;

/**
 * Three odd chambers against answers of a general-purpose library on our mesh: DOLFINx 0.5.2,
 * second-order elements, SLEPc 3.18 for rigid walls and SciPy 1.10 for walls of complex impedance.
 * The answers and the script that gives them are in {@code solver/independent}.
 */
class IndependentSolverTest {
  private static final Path FOLDER = Path.of("..", "solver", "independent");

  /** Second-order elements on the same mesh: their own error, by halving it once. */
  private static final double THEIR_ERROR = 5e-5;

  /** An eigenvalue of theirs. */
  private record Theirs(int order, double frequency, double growthRate) {
    double distance(ModeView v) {
      return Math.hypot(
          growthRate - v.mode().growthRate(), 2 * Math.PI * (frequency - v.mode().frequency()));
    }
  }

  @ParameterizedTest
  @CsvSource({
    "reverse-flow, air_inlet, turbine_inlet",
    "ring, chamber.downstream, chamber.downstream",
    "cross-section, shell_top, shell_top"
  })
  void modes_areThoseOfTheIndependentSolver(String chamber, String one, String other)
      throws Exception {
    Map<?, ?> answer = stored(chamber);
    compare(chamber, Map.of(), theirs(answer, "walls_hz_and_per_s"));
    Map<String, String> rigid = new LinkedHashMap<>();
    rigid.put("walls." + one, "rigid");
    rigid.put("walls." + other, "rigid");
    compare(chamber, rigid, theirs(answer, "rigid_hz"));
  }

  private static void compare(String chamber, Map<String, String> changes, List<Theirs> theirs) {
    List<ModeView> ours = ours(chamber, changes);
    assertThat(ours).as(chamber).hasSameSizeAs(theirs);
    for (Theirs their : theirs) {
      ModeView nearest =
          ours.stream()
              .filter(v -> v.order() == null || v.order() == their.order)
              .min(Comparator.comparingDouble(their::distance))
              .orElseThrow();
      ours.remove(nearest);
      double room = THEIR_ERROR * their.frequency;
      assertThat(nearest.mode().frequency() - their.frequency)
          .as(chamber + " " + their)
          .isBetween(-nearest.frequencyError() - room, nearest.frequencyError() + room);
      assertThat(nearest.mode().growthRate() - their.growthRate)
          .as(chamber + " " + their)
          .isBetween(-nearest.growthError() - 6 * room, nearest.growthError() + 6 * room);
    }
  }

  /** On the coarser mesh the distance is larger by what the order of convergence says. */
  @Test
  void distance_fallsWithTheMesh() throws Exception {
    List<Theirs> theirs = theirs(stored("ring"), "walls_hz_and_per_s");
    double[] worst = new double[2];
    for (int level = 0; level < 2; level++) {
      List<ModeView> ours =
          ours("ring", Map.of("geometry.mesh_size", level == 0 ? "24 mm" : "12 mm"));
      for (Theirs their : theirs) {
        ModeView nearest =
            ours.stream().min(Comparator.comparingDouble(their::distance)).orElseThrow();
        ours.remove(nearest);
        worst[level] = Math.max(worst[level], their.distance(nearest));
      }
    }
    double order = Math.log(worst[0] / worst[1]) / Math.log(2);
    // Re-entrant corners at the mouths of the burners bring 2 down to 4/3.
    assertThat(order).as("%s and %s 1/s", worst[0], worst[1]).isBetween(1.2, 2.4);
  }

  /** The stored answer is what the script gives on the mesh of today. */
  @Test
  void storedAnswer_isWhatTheScriptGives(@TempDir Path folder) throws Exception {
    assumeLibrary();
    MeshFiles.write(caseFile("cross-section", Map.of()), folder);
    Path said = folder.resolve("answer.json");
    Process process =
        new ProcessBuilder(
                "/usr/bin/python3",
                FOLDER.resolve("solve.py").toString(),
                "cross-section",
                folder.resolve("mesh.msh").toString())
            .redirectOutput(said.toFile())
            .redirectError(folder.resolve("error.txt").toFile())
            .start();
    assertThat(process.waitFor(120, TimeUnit.SECONDS)).isTrue();
    assertThat(process.exitValue())
        .as(Files.readString(folder.resolve("error.txt"), StandardCharsets.UTF_8))
        .isZero();
    List<Theirs> now = theirs(parse(Files.readString(said)), "walls_hz_and_per_s");
    List<Theirs> then = theirs(stored("cross-section"), "walls_hz_and_per_s");
    assertThat(now).hasSameSizeAs(then);
    for (int k = 0; k < now.size(); k++) {
      assertThat(now.get(k).frequency)
          .isCloseTo(
              then.get(k).frequency,
              org.assertj.core.api.Assertions.within(2e-5 * then.get(k).frequency));
    }
  }

  private static void assumeLibrary() throws Exception {
    Path python = Path.of("/usr/bin/python3");
    Assumptions.assumeTrue(Files.isExecutable(python), "python3 is not installed");
    Process p =
        new ProcessBuilder(python.toString(), "-c", "import dolfinx, slepc4py, scipy, meshio")
            .redirectErrorStream(true)
            .start();
    p.getInputStream().readAllBytes();
    Assumptions.assumeTrue(p.waitFor() == 0, "python3-dolfinx is not installed");
  }

  private static List<ModeView> ours(String chamber, Map<String, String> changes) {
    List<ModeView> views = new ArrayList<>();
    new ModesStudy(caseFile(chamber, changes), Progress.SILENT)
        .modesOnly().run("test").results().modes().stream()
            .map(e -> e.view())
            .filter(v -> v.order() == null || v.order() >= 0)
            .forEach(views::add);
    return views;
  }

  private static CaseFile caseFile(String chamber, Map<String, String> changes) {
    return CaseReader.read(FOLDER.resolve(chamber + ".yaml"), changes).orThrow();
  }

  private static Map<?, ?> stored(String chamber) throws Exception {
    return parse(Files.readString(FOLDER.resolve(chamber + ".json")));
  }

  /** JSON is YAML. */
  private static Map<?, ?> parse(String json) {
    return (Map<?, ?>) new Load(LoadSettings.builder().build()).loadFromString(json);
  }

  private static List<Theirs> theirs(Map<?, ?> answer, String key) {
    List<Theirs> all = new ArrayList<>();
    for (Object problem : (List<?>) answer.get("problems")) {
      Map<?, ?> p = (Map<?, ?>) problem;
      int order = ((Number) p.get("azimuthal_order")).intValue();
      for (Object value : (List<?>) p.get(key)) {
        if (value instanceof List<?> pair) {
          all.add(new Theirs(order, number(pair.get(0)), number(pair.get(1))));
        } else {
          all.add(new Theirs(order, number(value), 0));
        }
      }
    }
    return all;
  }

  private static double number(Object value) {
    return ((Number) value).doubleValue();
  }
}
