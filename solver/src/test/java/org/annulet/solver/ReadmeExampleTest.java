package org.annulet.solver;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import org.annulet.mesher.geometry.Outline;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.mesher.triangulate.OutlineMesher;
import org.annulet.mesher.triangulate.Sizing;
import org.annulet.solver.assembly.AssembledProblem;
import org.annulet.solver.assembly.Plane;
import org.annulet.solver.assembly.ProblemBuilder;
import org.annulet.solver.boundary.OpenEnd;
import org.annulet.solver.eigen.ModeSearch;
import org.annulet.solver.eigen.SearchSettings;
import org.annulet.solver.flame.Firing;
import org.annulet.solver.flame.Flame;
import org.annulet.solver.flame.NTau;
import org.annulet.solver.flame.Place;
import org.annulet.solver.flame.Reference;
import org.annulet.solver.flame.Side;
import org.annulet.solver.medium.Medium;
import org.annulet.solver.medium.UniformGas;
import org.annulet.solver.modes.ModeSet;
import org.annulet.solver.modes.Window;
import org.junit.jupiter.api.Test;

/** The Java example of the solver's README: it compiles, it is the one printed, it is right. */
class ReadmeExampleTest {
  private static ModeSet example() {
    // README begins
    Outline outline =
        Outline.builder()
            .point("a", 0, 0)
            .point("b", 0.3, 0)
            .point("c", 1, 0)
            .point("d", 1, 0.01)
            .point("e", 0.3, 0.01)
            .point("f", 0, 0.01)
            .line("cold wall", "e", "f", "a", "b")
            .line("flame", "b", "e")
            .line("hot wall below", "b", "c")
            .line("outlet", "c", "d")
            .line("hot wall above", "d", "e")
            .zone("duct", "cold wall", "flame")
            .zone("tube", "hot wall below", "outlet", "hot wall above", "flame")
            .build();
    Mesh mesh = OutlineMesher.mesh(outline, Sizing.of(5e-3)); // m
    double pressure = 1e5; // Pa
    double depth = 0.05; // m
    Medium gas =
        Medium.zonewise(
            mesh,
            pressure,
            Map.of(
                "duct", new UniformGas(1.4 * pressure / (347 * 347), 347),
                "tube", new UniformGas(1.4 * pressure / (850 * 850), 850)));
    Flame flame =
        new Flame(
            "pilot",
            new Place.Sheet("flame"),
            new Reference.EdgeFlux("flame", new Side.InZone("duct"), 10), // m/s
            new Firing(1750, new NTau(0.5, 3e-3))); // W, -, s
    AssembledProblem problem =
        new ProblemBuilder(mesh, new Plane(depth), gas)
            .wall("outlet", new OpenEnd()) // every edge not named is rigid
            .flame(flame)
            .build();
    ModeSet modes =
        ModeSearch.find(
            problem.operator(), new Window(60, 600, -1000, 1000), SearchSettings.standard());
    boolean noneMissing = modes.complete();
    long growing = modes.modes().stream().filter(mode -> mode.growthRate() > 0).count();
    // README ends
    assertThat(noneMissing).isTrue();
    assertThat(growing).isEqualTo(2);
    return modes;
  }

  /**
   * Row D2 of the reference values, roots of the dispersion relation of a closed and open duct with
   * a compact flame at 0.3 of its length; 5 mm sides are 60 to a wave at 600 Hz.
   */
  @Test
  void example_findsTheFourRootsOfTheDuct() {
    ModeSet modes = example();
    double[][] known = {
      {117.76789, -695.5768}, {202.19168, 83.4808}, {408.20228, 92.9935}, {528.38460, -829.1369}
    };
    assertThat(modes.modes()).hasSize(known.length);
    for (double[] root : known) {
      assertThat(modes.modes())
          .anySatisfy(
              m -> {
                assertThat(m.frequency()).isCloseTo(root[0], within(0.5));
                assertThat(m.growthRate()).isCloseTo(root[1], within(2.0));
              });
    }
  }

  @Test
  void example_isTheOnePrinted() throws IOException {
    Path source = Path.of("src/test/java/org/annulet/solver/ReadmeExampleTest.java");
    String code = between(Files.readString(source), "// README begins\n", "    // README ends");
    String printed = between(Files.readString(Path.of("README.md")), "```java\n", "```");
    assertThat(printed).isEqualTo(code.indent(-4));
  }

  private static String between(String text, String start, String end) {
    int from = text.indexOf(start) + start.length();
    return text.substring(from, text.indexOf(end, from));
  }
}
