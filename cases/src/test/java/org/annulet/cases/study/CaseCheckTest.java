package org.annulet.cases.study;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.CaseReader;
import org.annulet.cases.read.Problem;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** What {@code annulet check} says, and that it is silent where nothing is wrong. */
class CaseCheckTest {
  private static final String RING =
      """
      annulet: 1
      title: ring
      geometry:
        kind: ring
        burner_count: 10
        mesh_size: 25 mm
        zones:
          - {name: plenum,  shape: annulus, mean_radius: 360 mm, gap: 60 mm, length: 200 mm}
          - {name: burners, shape: ducts,   mean_radius: 360 mm, bore: 50 mm, length: 100 mm}
          - {name: chamber, shape: annulus, mean_radius: 360 mm, gap: 80 mm, length: 300 mm}
      gas:
        mean_pressure: 10 bar
        zones:
          plenum:  {temperature: 600 K, mixture: air}
          burners: {as: plenum}
          chamber: {temperature: {adiabatic_from: 600 K}, mixture: {fuel: methane, equivalence_ratio: 0.5}}
      walls:
        chamber.downstream: {impedance: 20}
      two_ports:
        burners.inlet: {loss_coefficient: 0.9, velocity: 30 m/s}
      flames:
        main:
          heat_release: 10 MW
          place: {sheet: burners.outlet}
          reference_velocity: 30 m/s
          response: {gain: 0.7, delay: 2 ms}
      window: {frequency: [60 Hz, 800 Hz], growth_rate: [-600 1/s, 600 1/s]}
      """;

  @TempDir private Path folder;

  private CaseFile read(String text) throws Exception {
    return CaseReader.read(Files.writeString(folder.resolve("case.yaml"), text)).orThrow();
  }

  private List<Problem> cautions(String text) throws Exception {
    return Understood.of(read(text)).cautions();
  }

  @Test
  void soundCase_hasNothingToLookAt() throws Exception {
    assertThat(cautions(RING)).isEmpty();
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      textBlock =
          """
          mesh_size: 25 mm | mesh_size: 120 mm | case.yaml:6:3 | sides per wavelength at 800 Hz in zone
          gap: 80 mm | gap: 150 mm | case.yaml:10: | come out too low by about 0.72 %
          reference_velocity: 30 m/s | reference_velocity: 80 m/s | case.yaml:25: | Mach number 0.16 at the reference
          velocity: 30 m/s}| velocity: 70 m/s} | case.yaml:20: | Mach number 0.14 in the loss
          {impedance: 20} | {choked_nozzle: {mach: 0.2}} | case.yaml:18: | plane-wave result
          {impedance: 20} | {impedance_table: wall.csv} | case.yaml:18: | the table ends at 400 Hz
          {impedance: 20} | {reflection_table: active.csv} | case.yaml:18: | it feeds energy into the gas
          heat_release: 10 MW | {heat_release: 10 MW, fuel_flow: 0.1 kg/s | case.yaml:2 | gives 5.0
          equivalence_ratio: 0.5 | equivalence_ratio: 1 | case.yaml:16: | dissociation is left out
          {adiabatic_from: 600 K} | {file: half.csv} | case.yaml:16: | lie outside the data, by up to
          """)
  void everyCaution_saysWhere_whatAndHowMuch(
      String written, String instead, String place, String said) throws Exception {
    table("wall.csv", "real [1], imaginary [1]", "20, 0");
    table("active.csv", "real [1], imaginary [1]", "1.3, 0");
    Files.writeString(
        folder.resolve("half.csv"),
        "x [mm], theta [°], temperature [K]\n300, 0, 1500\n300, 90, 1500\n300, 180, 1500\n"
            + "300, 270, 1500\n400, 0, 1600\n400, 90, 1600\n400, 180, 1600\n400, 270, 1600\n");
    String text =
        RING.replace(
            written.strip(),
            instead
                .strip()
                .replace("{heat_release", "heat_release")
                .replace("MW, fuel", "MW\n    fuel"));
    assertThat(text).isNotEqualTo(RING);
    assertThat(cautions(text))
        .anySatisfy(
            p -> assertThat(p.toString()).contains(said).contains(place).contains("mend: "));
  }

  private void table(String name, String columns, String row) throws Exception {
    StringBuilder b = new StringBuilder("frequency [Hz], " + columns + "\n");
    for (int f = 0; f <= 400; f += 50) {
      b.append(String.format(Locale.ROOT, "%d, %s%n", f, row));
    }
    Files.writeString(folder.resolve(name), b.toString());
  }

  /** Volumes and areas by hand: 2π R h L of an annulus, 10 ducts of 50 mm. */
  @Test
  void lines_giveVolumesAreasAndDelays() throws Exception {
    String lines = String.join("\n", Understood.of(read(RING)).lines());
    double plenum = 1e3 * 2 * Math.PI * 0.36 * 0.06 * 0.2;
    double ducts = 1e4 * 10 * Math.PI / 4 * 0.05 * 0.05;
    assertThat(lines)
        .containsPattern("plenum .* " + String.format(Locale.ROOT, "%.4g", plenum))
        .containsPattern("burners.inlet .* " + String.format(Locale.ROOT, "%.5g", ducts))
        .contains("ωτ = 10.1 at 800.0 Hz, 1.6 periods")
        .contains("flame main: 10.000 MW, reference velocity 30.000 m/s, answers to velocity");
  }

  @Test
  void picturesOfFieldsAndFits_areDrawn() throws Exception {
    table("wall.csv", "real [1], imaginary [1]", "20, 0");
    CaseFile caseFile =
        read(
            RING.replace("{impedance: 20}", "{impedance_table: wall.csv}")
                .replace(
                    "{adiabatic_from: 600 K}",
                    "{profile: {x: [300, 600, mm], temperature: [1500, 1800, K]}}"));
    assertThat(Understood.of(caseFile).draw(folder.resolve("out")))
        .containsExactly("temperature.svg", "sound-speed.svg", "fit-wall-chamber.downstream.svg");
    assertThat(Files.readString(folder.resolve("out/temperature.svg")))
        .contains("temperature [K]")
        .contains(">600.0<")
        .containsPattern(">179\\d<");
  }
}
