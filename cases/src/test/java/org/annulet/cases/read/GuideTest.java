package org.annulet.cases.read;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.MethodSource;

/** The user's guide keeps its promises. */
class GuideTest {
  private static final Path GUIDE = ShippedCasesTest.CASES.resolve("README.md");

  @TempDir Path folder;

  @Test
  void wholeCaseOfTheGuide_readsWithoutFault() throws IOException {
    Matcher m =
        Pattern.compile("```yaml\\R(annulet: 1.*?)```", Pattern.DOTALL)
            .matcher(Files.readString(GUIDE));
    assertThat(m.find()).isTrue();
    Reading r = CaseReader.read(Files.writeString(folder.resolve("case.yaml"), m.group(1)));
    assertThat(r.problems()).isEmpty();
    assertThat(r.cautions()).isEmpty();
  }

  /** Every other snippet of the guide; zones of the gas line by line. */
  static Stream<String> snippets() throws IOException {
    return Pattern.compile("```yaml\\R(.*?)```", Pattern.DOTALL)
        .matcher(Files.readString(GUIDE))
        .results()
        .map(m -> m.group(1))
        .filter(s -> !s.startsWith("annulet:"))
        .flatMap(s -> s.startsWith("    ") ? s.lines() : Stream.of(s));
  }

  @ParameterizedTest
  @MethodSource("snippets")
  void everySnippet_readsWithoutFault_whereItBelongs(String snippet) throws IOException {
    Reading r = CaseReader.read(Files.writeString(folder.resolve("case.yaml"), placed(snippet)));
    // data files are not there; a geometry has other zones and edges than the rest of the case
    String about = snippet.startsWith("geometry:") ? "geometry" : "";
    assertThat(
            r.problems().stream()
                .filter(p -> p.key().startsWith(about))
                .filter(p -> !p.what().contains("does not exist in the case folder"))
                .toList())
        .as(placed(snippet))
        .isEmpty();
  }

  /** A case with the snippet in it: sections whole, zones of the gas and outlines where they go. */
  private static String placed(String snippet) {
    String ring =
        """
        annulet: 1
        title: around a snippet
        geometry:
          kind: ring
          burner_count: 14
          mesh_size: 40 mm
          zones:
            - {name: plenum,  shape: annulus, mean_radius: 320 mm, gap: 80 mm,  length: 200 mm}
            - {name: burners, shape: ducts,   mean_radius: 310 mm, bore: 50 mm, length: 100 mm}
            - {name: chamber, shape: annulus, mean_radius: 300 mm, gap: 110 mm, length: 310 mm}
        gas:
          mean_pressure: 12 bar
          zones:
            plenum: {temperature: 650 K, mixture: air}
            burners: {as: plenum}
            chamber: {temperature: 1700 K, gamma: 1.29, gas_constant: 297 J/(kg K)}
        walls: {chamber.downstream: {admittance: 0.06}}
        two_ports: {burners.inlet: {loss_coefficient: 0.9, velocity: 57 m/s}}
        flames:
          main:
            heat_release: 15 MW
            place: {sheet: burners.outlet}
            reference_velocity: 57 m/s
            response: {gain: 0.7, delay: 2 ms}
        window: {frequency: [60 Hz, 900 Hz]}
        """;
    String key = snippet.replaceFirst("(?s)^(\\w+):.*", "$1");
    if (!snippet.startsWith(" ")) {
      return ring.replaceFirst("(?m)^" + key + ":.*\\R( .*\\R)*", "") + snippet;
    }
    return ring.replaceFirst(
        "(?m)^    chamber: .*$",
        Matcher.quoteReplacement(snippet.replaceFirst("^    \\w+:", "    chamber:")));
  }

  @ParameterizedTest
  @EnumSource(CaseKeys.class)
  void everyKey_standsInTheGuide(CaseKeys keys) throws IOException {
    String guide = Files.readString(GUIDE);
    assertThat(keys.all()).allSatisfy(k -> assertThat(guide).containsPattern("\\b" + k + "\\b"));
  }
}
