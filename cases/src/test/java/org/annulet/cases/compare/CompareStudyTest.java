package org.annulet.cases.compare;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import org.annulet.cases.compare.CompareStudy.Answer;
import org.annulet.cases.compare.CompareStudy.Compared;
import org.annulet.cases.read.CaseReader;
import org.annulet.cases.read.Problem;
import org.annulet.cases.read.Reading;
import org.annulet.cases.study.Progress;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Whole comparisons from a case file. */
class CompareStudyTest {
  private static final String DUCT =
      """
      annulet: 1
      title: duct with a flame
      geometry:
        kind: plane
        depth: 100 mm
        mesh_size: 15 mm
        points: {a: [0, 0, mm], b: [300, 0, mm], c: [1000, 0, mm], d: [1000, 30, mm], e: [300, 30, mm], f: [0, 30, mm]}
        edges:
          roof: {line: [e, f]}
          inlet: {line: [f, a]}
          floor: {line: [a, b]}
          sheet: {line: [b, e]}
          below: {line: [b, c]}
          outlet: {line: [c, d]}
          above: {line: [d, e]}
        zones:
          up: {boundary: [roof, inlet, floor, sheet]}
          down: {boundary: [below, outlet, above, sheet]}
      gas:
        mean_pressure: 1 bar
        zones:
          up: {sound_speed: 347 m/s, density: 1.163 kg/m3}
          down: {sound_speed: 850 m/s, density: 0.194 kg/m3}
      walls: {inlet: {admittance: 0.02}, outlet: {impedance: [0.2, -0.1]}}
      two_ports: {sheet: {loss_coefficient: 1.5, velocity: 8 m/s, flow_from: up}}
      flames:
        main:
          heat_release: 2 kW
          place: {sheet: sheet}
          reference: {edge: sheet, flow_from: up}
          reference_velocity: 4 m/s
          response: {gain: 0.8, delay: 3 ms}
      window: {frequency: [20 Hz, 700 Hz], growth_rate: [-1500, 1500, 1/s]}
      """;

  @TempDir private Path folder;

  private Path write(String text) throws IOException {
    return Files.writeString(folder.resolve("case.yaml"), text);
  }

  private Answer run(String text) throws Exception {
    return new CompareStudy(CaseReader.read(write(text)).orThrow(), Progress.SILENT)
        .run("test")
        .answer();
  }

  @Test
  void straightDuct_isItsChain_withinTheErrorBars() throws Exception {
    Answer answer = run(DUCT);
    assertThat(answer.chain().whyNot()).isEmpty();
    assertThat(answer.chainComplete()).isTrue();
    List<Line> lines = answer.compared().get(0).lines();
    assertThat(lines).hasSizeGreaterThanOrEqualTo(3);
    assertThat(lines)
        .allSatisfy(
            l -> {
              assertThat(l.words()).isEqualTo("agrees within the bars");
              assertThat(l.match().correlation()).isCloseTo(1, within(1e-3));
            });
  }

  @Test
  void stretchReferenceAndSpreadFlame_areInTheChainToo() throws Exception {
    Answer answer =
        run(
            DUCT.replace("{sheet: sheet}", "{zone: down, from: 320 mm, to: 380 mm}")
                .replace("{edge: sheet, flow_from: up}", "{zone: up, from: 200 mm, to: 260 mm}"));
    assertThat(answer.chain().whyNot()).isEmpty();
    // Twelve sheets for an even spread leave a part of (ωl/c)²/(24 · 144), far below the bars.
    assertThat(answer.compared().get(0).lines())
        .allSatisfy(l -> assertThat(l.verdict()).isEqualTo(Line.Verdict.AGREES));
  }

  @Test
  void thinAnnularSection_isItsChain_forEveryOrder() throws Exception {
    // Gap over radius 0.025: curvature costs (h/R)²/24, 3e-5 of the frequency.
    Answer answer =
        run(
            """
            annulet: 1
            title: thin annulus
            geometry:
              kind: section
              mesh_size: 10 mm
              points_in: mm
              points: {a: [0, 395], b: [200, 395], c: [500, 395], d: [500, 405], e: [200, 405], f: [0, 405]}
              edges:
                inlet: {line: [f, a]}
                hub: {line: [a, b]}
                sheet: {line: [b, e]}
                shroud: {line: [e, f]}
                liner: {line: [b, c]}
                outlet: {line: [c, d]}
                casing: {line: [d, e]}
              zones:
                front: {boundary: [inlet, hub, sheet, shroud]}
                back: {boundary: [liner, outlet, casing, sheet]}
            gas:
              mean_pressure: 1 bar
              zones:
                front: {sound_speed: 500 m/s, density: 0.56 kg/m3}
                back: {sound_speed: 850 m/s, density: 0.194 kg/m3}
            walls: {outlet: {impedance: [8, 2]}, liner: {admittance: 0.001}}
            flames:
              main:
                heat_release: 30 kW
                place: {sheet: sheet}
                reference: {edge: sheet, flow_from: front}
                reference_velocity: 6 m/s
                response: {gain: 0.6, delay: 2 ms}
            window: {frequency: [30 Hz, 800 Hz], growth_rate: [-800, 800, 1/s], azimuthal_orders: [0, 1, 2]}
            """);
    assertThat(answer.chain().whyNot()).isEmpty();
    List<Line> lines = answer.compared().get(0).lines();
    assertThat(lines).hasSize(5);
    for (Line l : lines) {
      assertThat(l.match().both()).as(l.words()).isTrue();
      OurMode ours = l.match().ours().orElseThrow();
      double curved = 4e-5 * 2 * Math.PI * ours.frequency();
      // Beside a liner the field is not quite even across the gap: (ωh/c) y/3 of its share.
      assertThat(Math.abs(l.frequencyDifference()))
          .as("frequency of %s", ours.label())
          .isLessThan(ours.frequencyError() + curved / 6 + 0.01);
      assertThat(Math.abs(l.growthDifference()))
          .as("growth rate of %s", ours.label())
          .isLessThan(ours.growthError() + curved + 0.02);
    }
    assertThat(lines).anySatisfy(l -> assertThat(l.match().second()).isPresent());
  }

  @Test
  void bentSection_hasNoChain_andSaysWhy() throws Exception {
    String bent = DUCT.replace("d: [1000, 30, mm]", "d: [1000, 50, mm]");
    Answer answer = run(bent);
    assertThat(answer.chain().whyNot()).isEqualTo("zone down is no straight duct along x");
    assertThat(answer.compared()).isEmpty();
    assertThat(CompareSentences.all(answer)).anyMatch(s -> s.contains("no straight duct"));
  }

  @Test
  void ringOfBurners_differsFromItsChainByTheNearFieldAtTheSteps() throws Exception {
    String ring =
        Files.readString(Path.of("quiet-loud-quiet/case.yaml"))
            .replace("mesh_size: 12 mm", "mesh_size: 30 mm")
            .replace("burners: 6 mm", "burners: 15 mm")
            .replaceAll("(?s)\\n  compare:.*", "\n");
    Answer answer = run(ring);
    List<Line> lines = answer.compared().get(0).lines();
    double plain = 0;
    double corrected = 0;
    for (Line l : lines) {
      assertThat(l.match().both()).as(l.words()).isTrue();
      int order = l.match().ours().orElseThrow().order();
      assertThat(l.match().second().isPresent()).isEqualTo(order > 0);
      plain += Math.abs(l.frequencyDifference());
      corrected += Math.abs(l.frequencyDifference() + l.nearField().orElseThrow()[0]);
    }
    // The estimate explains most of the difference in frequency.
    assertThat(corrected).isLessThan(0.35 * plain);
    assertThat(answer.chain().chain().orElseThrow().leftOut())
        .anyMatch(s -> s.contains("near field"))
        .anyMatch(s -> s.contains("orders from 7 on"));
  }

  @Test
  void tables_areMatched_andEveryFileSaysSo() throws Exception {
    Answer first = run(DUCT);
    OurMode ours = first.compared().get(0).lines().get(1).match().ours().orElseThrow();
    Files.writeString(
        folder.resolve("net.csv"),
        String.format(
            Locale.ROOT,
            "frequency [Hz],growth rate [1/s]%n%.4f,%.4f%n%.1f,0%n900,5%n",
            ours.frequency(),
            ours.growthRate(),
            ours.frequency() * 1.6));
    Files.writeString(
        folder.resolve("rig.csv"),
        String.format(
            Locale.ROOT,
            "frequency [Hz],frequency_tolerance [Hz],damping_rate [1/s],growth_tolerance [1/s]%n"
                + "%.4f,0.5,%.4f,0.5%n",
            1.02 * ours.frequency(),
            -ours.growthRate() - 20));
    CompareStudy.Result result =
        new CompareStudy(
                CaseReader.read(
                        write(
                            DUCT
                                + "studies: {compare: {tables: {<b>net: {network_model: net.csv},"
                                    .replace("<b>", "")
                                + " rig: {measured: rig.csv, about: '<b>invented</b>'}}}}\n"))
                    .orThrow(),
                Progress.SILENT)
            .run("test");
    Compared net = result.answer().compared().get(0);
    assertThat(net.lines())
        .anySatisfy(
            l -> {
              assertThat(l.match().row()).isEqualTo(1);
              assertThat(l.verdict()).isEqualTo(Line.Verdict.AGREES);
            })
        .anySatisfy(l -> assertThat(l.verdict()).isEqualTo(Line.Verdict.ONLY_HERE))
        .anySatisfy(
            l -> {
              assertThat(l.match().row()).isEqualTo(3);
              assertThat(l.verdict()).isEqualTo(Line.Verdict.NOT_LOOKED_FOR);
            });
    Line rig =
        result.answer().compared().get(1).lines().stream()
            .filter(l -> l.match().row() == 1)
            .findFirst()
            .orElseThrow();
    assertThat(rig.frequencyDifference()).isCloseTo(0.02 * ours.frequency(), within(1e-3));
    assertThat(rig.growthDifference()).isCloseTo(20, within(1e-3));
    assertThat(rig.frequencyBars())
        .isCloseTo(0.02 * ours.frequency() / (0.5 + ours.frequencyError()), within(0.01));
    assertThat(rig.levers())
        .anySatisfy(l -> assertThat(l).startsWith("frequency: ").contains("sound_speed"))
        .anySatisfy(l -> assertThat(l).startsWith("growth rate: ").contains("linear"));
    CompareFiles.write(folder.resolve("out"), result, "test");
    String csv = Files.readString(folder.resolve("out/compare.csv"));
    assertThat(csv.lines().count())
        .isEqualTo(1 + result.answer().compared().stream().mapToLong(c -> c.lines().size()).sum());
    assertThat(csv).contains("rig,measured,differs");
    String page = Files.readString(folder.resolve("out/compare.html"));
    assertThat(page).contains("&lt;b&gt;invented").doesNotContain("<b>invented");
    assertThat(Files.readString(folder.resolve("out/compare.json"))).contains("\"would_close_it\"");
    assertThat(CompareFiles.terminal(result)).contains("Measured: rig").contains("only here");
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "frequency [Hz],growth_rate [1/s]#100,1#-5,1|net.csv line 3: a frequency of -5.0 Hz",
        "frequency [Hz],azimuthal_order [1]#100,1.5|net.csv line 2: the azimuthal order 1.5",
        "frequency [m]#100|net.csv line 1: column 'frequency'",
        "frequency#100|net.csv line 1: column 'frequency' states no unit",
        "growth_rate [1/s]#100|net.csv: no column 'frequency'",
        "frequency [Hz],growth_rate [1/s],damping_rate [1/s]#100,1,1|both a growth rate and a damping rate",
        "frequency [Hz],frequency_tolerance [Hz]#100,-1|net.csv line 2: a tolerance below zero",
        "frequency [Hz];growth_rate [1/s]#100;1|net.csv line 1: columns separated by semicolons",
        "frequency [Hz]#1e999|net.csv line 2",
        "frequency [Hz]#abc|net.csv line 2",
        "frequency [Hz]|net.csv has no rows",
        "frequency [Hz],growth_rate [1/s]#100|net.csv line 2: 1 values under 2 columns",
      })
  void spoiltTable_isRefusedAtItsLine(String table, String fault) throws Exception {
    Files.writeString(folder.resolve("net.csv"), table.replace('#', '\n'));
    Reading reading =
        CaseReader.read(
            write(DUCT + "studies: {compare: {tables: {net: {network_model: net.csv}}}}\n"));
    assertThat(reading.problems())
        .singleElement()
        .satisfies(
            p -> {
              assertThat(p.what()).contains(fault);
              assertThat(p.mend()).isNotBlank();
            });
    assertThat(reading.problems()).extracting(Problem::line).containsExactly(34);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      value = {
        "mode [1],x [mm],real [1]#2,0,1#2,1,1#2,2,1|there is no mode 2.0",
        "mode [1],x [mm],real [1]#1,0,1#1,0,1#1,2,1|x does not increase along mode 1",
        "mode [1],x [mm],real [1]#1,0,1#1,1,1|mode 1 has 2 places",
        "mode [1],x [mm]#1,0|no column 'real'",
      })
  void spoiltShapes_areRefused(String shapes, String fault) throws Exception {
    Files.writeString(folder.resolve("net.csv"), "frequency [Hz]\n100\n");
    Files.writeString(folder.resolve("shapes.csv"), shapes.replace('#', '\n'));
    Reading reading =
        CaseReader.read(
            write(
                DUCT
                    + "studies: {compare: {tables: {net: {network_model: net.csv, shapes:"
                    + " shapes.csv}}}}\n"));
    assertThat(reading.problems())
        .singleElement()
        .satisfies(p -> assertThat(p.what()).contains(fault));
  }
}
