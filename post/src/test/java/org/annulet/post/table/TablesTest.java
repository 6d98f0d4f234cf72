package org.annulet.post.table;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.annulet.post.Demo;
import org.annulet.post.meaning.Certificate;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.ModeView;
import org.annulet.post.meaning.Results;
import org.annulet.solver.modes.Mode;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.openqa.selenium.json.Json;

/** Tables parsed back, field by field; JSON by Selenium's reader, which is not ours. */
class TablesTest {
  private final Results results = new Demo(4, 24).results;

  @TempDir Path folder;

  private static Map<String, Object> json(Results results) {
    return new Json().toType(ModesJson.text(results), Json.MAP_TYPE);
  }

  @Test
  @SuppressWarnings("unchecked")
  void json_holdsEveryFieldAndTheSameNumbers() {
    Map<String, Object> top = json(results);
    assertThat(top.get("case")).isEqualTo("invented ring, \"A\" & <B>");
    assertThat(top.get("complete")).isEqualTo(true);
    assertThat(((Number) top.get("modes_by_argument_principle")).intValue()).isEqualTo(6);
    Map<String, Object> window = (Map<String, Object>) top.get("window");
    assertThat(((List<Number>) window.get("frequency_hz")).stream().map(Number::doubleValue))
        .containsExactly(10.0, 500.0);
    assertThat(((List<Number>) window.get("growth_rate_per_s")).stream().map(Number::doubleValue))
        .containsExactly(-200.0, 200.0);
    assertThat((String) top.get("sign_convention")).contains("positive grows");
    List<Map<String, Object>> modes = (List<Map<String, Object>>) top.get("modes");
    assertThat(modes).hasSize(6);
    for (int i = 0; i < 6; i++) {
      ModeEntry e = results.modes().get(i);
      Map<String, Object> m = modes.get(i);
      assertThat(((Number) m.get("frequency_hz")).doubleValue())
          .isEqualTo(e.view().mode().frequency());
      assertThat(((Number) m.get("growth_rate_per_s")).doubleValue())
          .isEqualTo(e.view().mode().growthRate());
      assertThat(((Number) m.get("azimuthal_order")).intValue())
          .isEqualTo(e.label().azimuthalOrder());
      assertThat(m.get("label")).isEqualTo(e.label().text());
      assertThat(((Number) m.get("multiplicity")).intValue())
          .isEqualTo(e.view().mode().multiplicity());
      assertThat(((Number) m.get("backward_error")).doubleValue()).isEqualTo(1e-12);
    }
    assertThat(((Number) modes.get(0).get("growth_rate_error_per_s")).doubleValue()).isEqualTo(12);
    assertThat(modes.get(5)).containsEntry("growth_rate_error_per_s", null);
    assertThat(modes.get(5)).containsEntry("frequency_error_hz", null);
    List<Map<String, Object>> items = (List<Map<String, Object>>) modes.get(0).get("growth_budget");
    assertThat(items.get(1).get("item")).isEqualTo("two-port <burners>");
    assertThat(((Number) items.get(1).get("growth_share_per_s")).doubleValue()).isEqualTo(-60);
  }

  @Test
  void disagreeingCounts_areNullAndNotComplete() {
    Results bad =
        new Results(
            "x",
            "0",
            results.window(),
            List.of(
                new Certificate("order 0", 0, 3, 3, true, List.of()),
                new Certificate("order 1", 1, -1, 2, false, List.of())),
            List.of(),
            List.of(),
            List.of());
    Map<String, Object> top = json(bad);
    assertThat(top).containsEntry("modes_by_argument_principle", null);
    assertThat(top).containsEntry("complete", false);
    assertThat(TextTables.terminal(bad)).contains("0 modes in the window, NOT certified complete");
  }

  @Test
  void csv_hasUnitsInTheNamesAndOneRowAMode() throws IOException {
    ModesCsv.write(folder.resolve("deep/modes.csv"), results);
    List<String> lines = Files.readAllLines(folder.resolve("deep/modes.csv"));
    assertThat(lines).hasSize(7);
    assertThat(lines.get(0)).contains("frequency_hz", "growth_rate_error_per_s");
    // label with quotes and a comma is one quoted cell; error bars not estimated are empty
    assertThat(lines.get(1)).startsWith("1,ring,0,\"bulk, plenum\",150.0,0.4,40.0,12.0,1,plenum,");
    assertThat(ModesCsv.cell("chamber <b>&\"x\"")).isEqualTo("\"chamber <b>&\"\"x\"\"\"");
    assertThat(ModesCsv.cell("=1+1")).isEqualTo("'=1+1");
    assertThat(ModesCsv.cell("-1.5E-3")).isEqualTo("-1.5E-3");
    assertThat(lines.get(6)).contains(",460.0,,-115.0,,1,");
    try (var files = Files.list(folder.resolve("deep"))) {
      assertThat(files.map(f -> f.getFileName().toString())).containsExactly("modes.csv");
    }
  }

  @Test
  void terminal_saysErrorBarsStabilityAndWhatDrivesTheWorst() {
    String text = TextTables.terminal(results);
    assertThat(text)
        .contains("150.00 ± 0.40", "40 ± 12", "GROWS", "not estimated")
        .contains("9 ± 12") // zero inside the bar
        .contains("6 modes in the window, certified complete; 1 mode grows, 1 undecided")
        .contains("Least stable is mode 1")
        .contains("driven by flame burner 1 (+110.0 1/s)")
        .contains("damped by two-port <burners> (-60.0 1/s) and 1 more (-10.0 1/s)")
        .contains("complete: the argument principle counts 6 and 6 were found.")
        .contains("does not clear an engine to run");
  }

  @Test
  void markdown_escapesNamesAndCarriesTheCautions() {
    String text = TextTables.markdown(results);
    assertThat(text).contains("# Modes of invented ring, \"A\" & \\<B\\>");
    Summary.CAUTIONS.forEach(c -> assertThat(text).contains(c));
  }

  @Test
  void numbers_showNoMoreDigitsThanTheBarAllows() {
    assertThat(Numbers.withError(523.4567, 0.0123)).isEqualTo("523.457 ± 0.012");
    assertThat(Numbers.withError(-61.7, 140)).isEqualTo("-62 ± 140");
    assertThat(Numbers.withError(1, Double.NaN)).isEqualTo("1.00 ± not estimated");
    assertThat(Numbers.fixed(-0.001, 1)).isEqualTo("0.0");
    assertThat(Numbers.signed(-0.25)).isEqualTo("-0.250");
  }

  @Test
  void undampedPassiveMode_isNotSaidToGrowForItsRounding() {
    ModeEntry e = results.modes().get(0);
    Mode m = e.view().mode();
    Mode passive = new Mode(1e-8, 500, m.re(), m.im(), 1, 1e-13, 3, m.verdict());
    ModeView view = new ModeView(passive, m.re(), m.im(), null, "ring", Double.NaN, Double.NaN);
    assertThat(new ModeEntry(view, e.label(), Optional.empty()).stability())
        .isEqualTo(ModeEntry.Stability.UNDECIDED);
  }

  @Test
  void modeWithinItsErrorBar_isLeftOpen() {
    ModeEntry first = results.modes().get(0);
    assertThat(first.stability()).isEqualTo(ModeEntry.Stability.GROWS);
    assertThat(results.modes().get(1).stability()).isEqualTo(ModeEntry.Stability.UNDECIDED);
    assertThat(new ModeEntry(first.view(), first.label(), Optional.empty()).stability())
        .isEqualTo(ModeEntry.Stability.GROWS);
  }

  /** Percent and millimetre are never in one table: each has its own file and its own columns. */
  @Test
  void pointsOfAnOutline_standPerMillimetreInATableOfTheirOwn() {
    String points = PointsCsv.text(results);
    assertThat(points.lines().findFirst().orElseThrow())
        .isEqualTo(
            "mode,frequency_hz,growth_rate_per_s,rank,key,point,coordinate,value,"
                + "growth_rate_change_per_s_per_mm,frequency_change_hz_per_mm,linear_range_mm");
    assertThat(points.lines().skip(1))
        .hasSize(results.modes().size())
        .allMatch(l -> l.endsWith(",1,geometry.points.corner.2,corner,r,180 mm,-0.4,-0.3,12.0"));
    assertThat(SensitivitiesCsv.text(results)).doesNotContain("geometry.points");
    assertThat(ModesJson.text(results))
        .contains("\"point_sensitivities\"", "\"growth_rate_change_per_s_per_mm\": -0.4");
  }
}
