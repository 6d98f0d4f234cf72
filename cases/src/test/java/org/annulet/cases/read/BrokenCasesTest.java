package org.annulet.cases.read;

import static org.annulet.cases.read.Spoilt.RING;
import static org.annulet.cases.read.Spoilt.SECTION;
import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Random;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Case files spoilt in one place each: the fault names its line, what was read, and the remedy. */
class BrokenCasesTest {
  static Stream<Spoilt> spoilt() {
    return Stream.concat(SpoiltKeys.all(), SpoiltValues.all());
  }

  @TempDir Path folder;

  private Reading read(String text) throws IOException {
    return CaseReader.read(Files.writeString(folder.resolve("case.yaml"), text));
  }

  @Test
  void unspoilt_haveNoFault() throws IOException {
    assertThat(read(RING).problems()).isEmpty();
    assertThat(read(SECTION).problems()).isEmpty();
  }

  @ParameterizedTest
  @MethodSource("spoilt")
  void spoiltPlace_isReportedWithItsLine(Spoilt s) throws IOException {
    assertThat(s.base()).as("the fragment stands once").containsOnlyOnce(s.old());
    Reading reading = read(s.base().replace(s.old(), s.by()));
    assertThat(reading.caseFile()).isEmpty();
    assertThat(reading.problems())
        .anySatisfy(
            p -> {
              assertThat(p.file()).isEqualTo("case.yaml");
              assertThat(p.line()).as(p.toString()).isEqualTo(s.line());
              assertThat(p.what()).contains(s.what());
              assertThat(p.mend()).isNotBlank().contains(s.mend());
            });
    assertThat(reading.problems()).as("no flood of consequences").hasSizeLessThanOrEqualTo(3);
  }

  @Test
  void allFaults_comeAtOnce_inTheOrderOfTheFile() throws IOException {
    Reading r =
        read(
            RING.replace("12 bar", "12")
                .replace("every_second", "every_third")
                .replace("gap: 80 mm", "gap: 80")
                .replace("[60 Hz, 1200 Hz]", "[1200 Hz, 60 Hz]")
                .replace("plenum.upstream", "plenum.upstraem"));
    assertThat(r.problems()).extracting(Problem::line).containsExactly(9, 13, 19, 30, 32);
  }

  @Test
  void crossingEdges_areReportedAtAnEdge() throws IOException {
    Reading r = read(SECTION.replace("e: [200, 400]", "e: [200, 200]"));
    assertThat(r.problems())
        .anySatisfy(
            p -> {
              assertThat(p.key()).startsWith("geometry.edges.");
              assertThat(p.line()).isBetween(16, 22);
              assertThat(p.what()).contains("cross").contains(" m");
            });
  }

  @Test
  void unusedPoint_isACaution() throws IOException {
    Reading r = read(SECTION.replace("f: [0, 400]", "f: [0, 400]\n    spare: [1, 1]"));
    assertThat(r.problems()).isEmpty();
    assertThat(r.cautions())
        .singleElement()
        .satisfies(
            p -> {
              assertThat(p.line()).isEqualTo(14);
              assertThat(p.what()).contains("point 'spare'");
            });
  }

  @Test
  void wallThatFeedsEnergy_andHotGas_areCautions() throws IOException {
    Reading r = read(RING.replace("[12, 0]", "[-12, 0]").replace("650 K", "6500 K"));
    assertThat(r.problems()).isEmpty();
    assertThat(r.cautions()).extracting(Problem::line).containsExactly(15, 20);
  }

  private void onlyFault(byte[] bytes, int line, String what, String mend) throws IOException {
    Reading r = CaseReader.read(Files.write(folder.resolve("case.yaml"), bytes));
    assertThat(r.problems()).hasSize(1);
    Problem p = r.problems().get(0);
    assertThat(p.line()).as(p.toString()).isEqualTo(line);
    assertThat(p.what()).contains(what);
    assertThat(p.mend()).contains(mend);
  }

  private void onlyFault(String text, int line, String what, String mend) throws IOException {
    onlyFault(text.getBytes(StandardCharsets.UTF_8), line, what, mend);
  }

  @Test
  void emptyFile_isAFault() throws IOException {
    onlyFault("", 0, "the file is empty", "annulet: 1");
    onlyFault("# nothing\n", 0, "the file is empty", "annulet: 1");
  }

  @Test
  void tab_isNamedAsSuch() throws IOException {
    onlyFault("annulet: 1\ngeometry:\n\tkind: ring\n", 3, "a tab in the indentation", "spaces");
  }

  @Test
  void brokenNotation_hasItsLine() throws IOException {
    onlyFault("annulet: 1\ntitle: [a, b\ngas: {}\n", 3, "not YAML", "brackets");
    onlyFault("annulet: 1\ntitle: *nobody\n", 2, "alias", "anchor");
    onlyFault("annulet: 1\ntitle: 'open\n", 3, "not YAML", "");
  }

  @Test
  void secondDocument_isAFault() throws IOException {
    onlyFault("annulet: 1\n---\nannulet: 1\n", 2, "a second document", "one case");
  }

  @Test
  void oldEncoding_isNamedWithItsLine() throws IOException {
    onlyFault(
        "annulet: 1\ntitle: 15 °\n".getBytes(StandardCharsets.ISO_8859_1),
        2,
        "byte 0xB0 is not UTF-8",
        "save the file as UTF-8");
    onlyFault("annulet: 1\n".getBytes(StandardCharsets.UTF_16), 1, "UTF-16", "UTF-8");
  }

  @Test
  void byteOrderMark_isAccepted() throws IOException {
    assertThat(read("\uFEFF" + RING).problems()).isEmpty();
  }

  @Test
  void windowsLineEnds_areAccepted() throws IOException {
    assertThat(read(RING.replace("\n", "\r\n")).problems()).isEmpty();
  }

  @Test
  void deepNesting_isRefused() throws IOException {
    onlyFault("annulet: 1\ntitle: " + "[".repeat(100_000) + "\n", 2, "nested more than", "close");
  }

  @Test
  void aliasBomb_isRefused() throws IOException {
    StringBuilder bomb = new StringBuilder("annulet: 1\na0: &a0 [x, x, x, x, x, x, x, x, x, x]\n");
    for (int i = 1; i < 20; i++) {
      String before = "*a" + (i - 1);
      bomb.append("a" + i + ": &a" + i + " [");
      bomb.append(String.join(", ", List.of(before, before, before, before, before, before)));
      bomb.append("]\n");
    }
    onlyFault(bomb.toString(), 0, "aliases (*name) unfold", "write the values out");
    onlyFault("annulet: 1\ntitle: &me [*me]\n", 0, "hold themselves", "write the values out");
  }

  @Test
  void alias_repeatsAValue() throws IOException {
    Reading r =
        read(
            RING.replace("gamma: 1.37, gas", "gamma: &g 1.37, gas")
                .replace(
                    "{as: plenum}", "{temperature: 650 K, gamma: *g, gas_constant: 287 J/(kg K)}"));
    assertThat(r.problems()).isEmpty();
    assertThat(r.orThrow().gas().zones().get("burners"))
        .isEqualTo(r.orThrow().gas().zones().get("plenum"));
  }

  @Test
  void hugeFile_isRefused() throws IOException {
    onlyFault("# " + "x".repeat(2_000_000) + "\n", 0, "has 2000003 bytes", "tables in files");
  }

  @Test
  void missingFileOrFolder_isAFault() {
    assertThat(CaseReader.read(folder).problems())
        .singleElement()
        .satisfies(p -> assertThat(p.what()).contains("holds no file 'case.yaml'"));
    assertThat(CaseReader.read(folder.resolve("nowhere")).problems())
        .singleElement()
        .satisfies(p -> assertThat(p.what()).contains("no such file"));
  }

  @Test
  void topLevelList_isAFault() throws IOException {
    onlyFault("- annulet\n", 1, "pairs are wanted, got a list", "");
  }

  @Test
  void variantFaults_standAtTheVariant() throws IOException {
    Reading r =
        read(
            RING
                + """
                variants:
                  - {name: a, set: {flames.main.response.dealy: 2 ms}}
                  - {name: a, set: {flames.mian.response.delay: 2 ms}}
                  - {name: b, set: {flames.main.response.delay: 2 mm}}
                  - {name: c, set: {geometry.zones.chamer.length: 2 m}}
                """);
    assertThat(r.problems()).extracting(Problem::line).containsExactly(35, 36, 36, 37, 38);
    assertThat(r.problems().get(0).mend()).contains("'delay'");
    assertThat(r.problems()).anySatisfy(p -> assertThat(p.mend()).contains("'main'"));
    assertThat(r.problems()).anySatisfy(p -> assertThat(p.mend()).contains("'chamber'"));
  }

  /** Any spoilt text gives faults with places and remedies, never an exception. */
  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4})
  void randomDamage_givesFaultsNotExceptions(long seed) throws IOException {
    Random random = new Random(seed);
    String signs = "{}[]:,-&*!|>'\"%@`#\n\t 0a.°é";
    for (int i = 0; i < 150; i++) {
      StringBuilder text = new StringBuilder(random.nextBoolean() ? RING : SECTION);
      for (int k = 1 + random.nextInt(3); k > 0; k--) {
        int at = random.nextInt(text.length());
        int end = Math.min(text.length(), at + random.nextInt(8));
        String by = String.valueOf(signs.charAt(random.nextInt(signs.length())));
        text.replace(at, end, random.nextBoolean() ? by : "");
      }
      Reading r = read(text.toString());
      assertThat(r.caseFile().isPresent())
          .as("seed %s: %s", seed, text)
          .isEqualTo(r.problems().isEmpty());
      for (Problem p : r.problems()) {
        assertThat(p.what()).as("seed %s: %s", seed, text).isNotBlank();
        assertThat(p.mend()).as("seed %s: %s", seed, p).isNotBlank();
      }
    }
  }
}
