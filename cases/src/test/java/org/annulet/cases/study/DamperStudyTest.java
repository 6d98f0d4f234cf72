package org.annulet.cases.study;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.CaseReader;
import org.annulet.solver.eigen.ModeSearch;
import org.annulet.solver.eigen.SearchSettings;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.modes.ModeSet;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.ObjectMapper;

/** The search for places against solving every pattern in full. */
class DamperStudyTest {
  static final String RING =
      """
      annulet: 1
      title: small ring with flames
      geometry:
        kind: ring
        burner_count: 6
        mesh_size: 80 mm
        mesh_size_at: {burners: 40 mm}
        zones:
          - {name: burners, shape: ducts,   mean_radius: 300 mm, bore: 60 mm, length: 100 mm}
          - {name: chamber, shape: annulus, mean_radius: 300 mm, gap: 110 mm, length: 250 mm}
      gas:
        mean_pressure: 10 bar
        zones:
          burners: {temperature: 650 K, gamma: 1.37, gas_constant: 287 J/(kg K)}
          chamber: {temperature: 1700 K, gamma: 1.29, gas_constant: 297 J/(kg K)}
      walls: {chamber.downstream: {admittance: 0.04}, burners.upstream: {impedance: 0.4}}
      flames:
        main:
          heat_release: 6 MW
          place: {sheet: burners.outlet}
          reference_velocity: 50 m/s
          response: {gain: 0.7, delay: 2.2 ms}
          %s
      window: {frequency: [250 Hz, 600 Hz], growth_rate: [-500, 400, 1/s]}
      studies:
        dampers:
          designs:
            low: {count: 2, resonator: {neck_bore: 24 mm, neck_length: 25 mm, volume: 1400 cm3, resistance: 0.1}, mouth_width: 110 mm}
          positions: {face: chamber.outer_face, x: 180 mm, burners: all}
      """;

  @TempDir private Path folder;

  private CaseFile read(String text) throws Exception {
    return CaseReader.read(Files.writeString(folder.resolve("case.yaml"), text)).orThrow();
  }

  private static double fullWorst(DamperPorts ports, int[] pattern) {
    ModeSet set =
        ModeSearch.find(
            CaseProblem.on(ports.with(pattern), ports.shape())
                .parts()
                .get(0)
                .assembled()
                .operator(),
            ports.window(),
            SearchSettings.standard());
    assertThat(set.complete()).isTrue();
    return set.modes().stream().mapToDouble(Mode::growthRate).max().orElseThrow();
  }

  /** Every pair of positions, solved on the full operator by the ordinary search with its count. */
  @ParameterizedTest
  @ValueSource(strings = {"", "staging: [{burners: [1, 2], gain: 0.4}]"})
  void bestPattern_isTheBestOfAllSolvedInFull(String staging) throws Exception {
    CaseFile caseFile = read(String.format(RING, staging));
    DamperStudy.Answer answer = new DamperStudy(caseFile, Progress.SILENT).run().answer();
    DamperPorts ports = answer.ports();
    assertThat(ports.transfer().error()).isLessThan(1e-6);
    Map<String, Double> ranked = new TreeMap<>();
    DamperPatterns patterns = new DamperPatterns(caseFile, ports.search());
    double best = Double.POSITIVE_INFINITY;
    for (int a = 0; a < 6; a++) {
      for (int b = 0; b < a; b++) {
        int[] pattern = new int[6];
        pattern[a] = 1;
        pattern[b] = 1;
        String own = Arrays.toString(patterns.representative(pattern));
        if (!ranked.containsKey(own) || a + b == 3) { // some images too: they must give the same
          double worst = fullWorst(ports, pattern);
          assertThat(worst).isCloseTo(ranked.getOrDefault(own, worst), within(1e-5));
          ranked.put(own, worst);
          best = Math.min(best, worst);
        }
      }
    }
    List<DamperRanking.Ranked> found = answer.outcome().best();
    assertThat(found.get(0).worst()).isCloseTo(best, within(1e-4));
    assertThat(answer.outcome().distinct()).isEqualTo(ranked.size());
    assertThat(ranked).hasSize(staging.isEmpty() ? 3 : 9);
    for (DamperRanking.Ranked r : found) {
      assertThat(r.complete()).isTrue();
      assertThat(r.worst()).isCloseTo(ranked.get(Arrays.toString(r.pattern())), within(1e-4));
    }
    assertThat(answer.certified()).isTrue();
    assertThat(DamperFiles.terminal(new DamperStudy.Result(answer))).contains("argument principle");
    if (staging.isEmpty()) {
      twoOppositeDampersLeaveAMemberOfOrderOne(answer);
      filesSayTheSame(answer);
    }
    assertThat(answer.check().worst()).isCloseTo(best, within(1e-6));
    assertThat(answer.check().difference()).isLessThan(1e-3);
  }

  /** The splitting rule: 2 divides 2m, so one member has its nodes at both. */
  private static void twoOppositeDampersLeaveAMemberOfOrderOne(DamperStudy.Answer answer) {
    assertThat(answer.outcome().even().pattern()).containsExactly(1, 0, 0, 1, 0, 0);
    DamperStudy.Fate pair =
        answer.fates().stream().filter(f -> f.order() == 1).findFirst().orElseThrow();
    assertThat(pair.factorEven()).isCloseTo(1, within(1e-12));
    assertThat(pair.even())
        .hasSize(2)
        .anySatisfy(s -> assertThat(s.subtract(pair.s()).abs()).isLessThan(1e-5))
        .anySatisfy(s -> assertThat(s.subtract(pair.s()).abs()).isGreaterThan(5));
    assertThat(pair.factorBest()).isLessThan(0.51);
  }

  private void filesSayTheSame(DamperStudy.Answer answer) throws Exception {
    DamperFiles.write(folder.resolve("out"), new DamperStudy.Result(answer), "test");
    JsonNode json =
        new ObjectMapper().readTree(Files.readString(folder.resolve("out/dampers.json")));
    assertThat(json.path("certified").asBoolean()).isTrue();
    assertThat(json.path("worst_growth_rate_per_s").asDouble())
        .isEqualTo(answer.outcome().best().get(0).worst());
    assertThat(json.path("modes").size()).isEqualTo(answer.check().modes().size());
    List<String> table = Files.readAllLines(folder.resolve("out/dampers.csv"));
    assertThat(table).hasSize(3);
    assertThat(table.get(1)).startsWith("1,low,chamber.outer_face,180.00,0.000,1,");
    String page = Files.readString(folder.resolve("out/dampers.html"));
    assertThat(page).contains("confirmed on the full operator").doesNotContain("<script");
    assertThat(Files.readString(folder.resolve("out/dampers.svg"))).startsWith("<svg");
  }

  /** Two designs on two rows of six places: 660 patterns; and the same whatever the threads. */
  @Test
  void exchangeSearch_findsTheBestOfAll_andBothRepeatThemselves() throws Exception {
    String text =
        String.format(RING, "")
            .replace("x: 180 mm", "x: [170 mm, 300 mm]")
            .replace(
                "designs:\n",
                "designs:\n      high: {count: 1, quarter_wave: {bore: 30 mm, length: 350 mm,"
                    + " resistance: 0.05}, mouth_width: 110 mm}\n");
    CaseFile caseFile = read(text);
    DamperPorts ports =
        new DamperPorts(caseFile, caseFile.studies().dampers().orElseThrow(), Progress.SILENT);
    DamperRanking.Outcome every = new DamperRanking(ports, Progress.SILENT).run();
    DamperRanking.Outcome exchanged = new DamperRanking(ports, Progress.SILENT).byExchange();
    assertThat(every.everyOne()).isTrue();
    assertThat(every.all().intValue()).isEqualTo(660); // 12 · (11 over 2)
    assertThat(every.unsure()).isZero();
    assertThat(exchanged.everyOne()).isFalse();
    assertThat(exchanged.best().get(0).worst())
        .isCloseTo(every.best().get(0).worst(), within(1e-6));
    assertThat(every.even().worst()).isGreaterThanOrEqualTo(every.best().get(0).worst());
    DamperRanking.Outcome again = new DamperRanking(ports, Progress.SILENT).run();
    for (int k = 0; k < every.best().size(); k++) {
      assertThat(again.best().get(k).pattern()).isEqualTo(every.best().get(k).pattern());
      assertThat(again.best().get(k).worst()).isEqualTo(every.best().get(k).worst());
    }
    assertThat(again.dropped()).isEqualTo(every.dropped());
  }

  /** A damper of the case takes its place and leaves one mirror plane; both stay in the answer. */
  @Test
  void dampersOfTheCase_takeTheirPlaces_andStay() throws Exception {
    String text =
        String.format(RING, "")
            .replace(
                "window:",
                "dampers: {own: {resonator: {neck_bore: 20 mm, neck_length: 25 mm, volume: 900 cm3,"
                    + " resistance: 0.1}, at: {face: chamber.outer_face, x: 180 mm, burners: [2]},"
                    + " mouth_width: 110 mm}}\nwindow:");
    CaseFile caseFile = read(text);
    DamperStudy.Answer answer = new DamperStudy(caseFile, Progress.SILENT).run().answer();
    assertThat(answer.search().positions()).hasSize(5);
    assertThat(answer.outcome().distinct()).isEqualTo(6); // 10 pairs, 2 of them their own image
    assertThat(answer.certified()).isTrue();
    assertThat(answer.ports().with(answer.pattern()).dampers().stream().map(d -> d.name()))
        .containsExactly("own", "low");
    assertThat(answer.check().worst())
        .isCloseTo(fullWorst(answer.ports(), answer.pattern()), within(1e-6));
  }

  /** 14 places, 4 alike dampers: 1001 ways, turned and mirrored ones once. */
  @Test
  void distinctPatterns_areBracelets() throws Exception {
    String text =
        String.format(RING, "")
            .replace("burner_count: 6", "burner_count: 14")
            .replace("bore: 60 mm", "bore: 40 mm")
            .replace("count: 2", "count: 4")
            .replace("mouth_width: 110 mm", "mouth_width: 40 mm");
    CaseFile caseFile = read(text);
    DamperPatterns patterns =
        new DamperPatterns(caseFile, caseFile.studies().dampers().orElseThrow());
    int[] number = new int[1];
    patterns.forEachDistinct(p -> number[0]++);
    assertThat(patterns.all().intValue()).isEqualTo(1001);
    assertThat(number[0]).isEqualTo(bracelets(14, 4));
    // Taken places spoil the symmetry of the places, not that of the ring: patterns that turn into
    // each other are still one.
    CaseFile taken = read(text.replace("burners: all", "burners: all, taken: [1]"));
    DamperPatterns fewer = new DamperPatterns(taken, taken.studies().dampers().orElseThrow());
    int[] left = new int[1];
    fewer.forEachDistinct(p -> left[0]++);
    assertThat(fewer.all().intValue()).isEqualTo(715);
    assertThat(left[0]).isEqualTo(number[0]); // ten free places: each can be turned out of the way
  }

  /** Orbits of sets of k among n places on a circle, by brute force over bit patterns. */
  private static int bracelets(int n, int k) {
    int count = 0;
    for (int set = 0; set < 1 << n; set++) {
      if (Integer.bitCount(set) != k) {
        continue;
      }
      boolean least = true;
      for (int turn = 0; turn < n; turn++) {
        int turned = 0;
        int mirrored = 0;
        for (int b = 0; b < n; b++) {
          if ((set >> b & 1) == 1) {
            turned |= 1 << (b + turn) % n;
            mirrored |= 1 << (2 * n - b + turn) % n;
          }
        }
        least &= set <= turned && set <= mirrored;
      }
      count += least ? 1 : 0;
    }
    return count;
  }
}
