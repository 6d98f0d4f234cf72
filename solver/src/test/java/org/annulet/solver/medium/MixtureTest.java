package org.annulet.solver.medium;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;
import static org.assertj.core.api.Assertions.withinPercentage;

import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class MixtureTest {
  // Rows B5: dry air from NASA 9-coefficient data. Ours are the 7-coefficient fits of 1993: cp
  // differs by up to 0.2 %, c by up to 0.035 %.
  @ParameterizedTest
  @CsvSource(
      textBlock =
          """
          288.15, 1004.274, 1.400225, 340.320
          300, 1004.811, 1.399926, 347.210
          500, 1029.531, 1.386611, 446.110
          800, 1098.725, 1.353653, 557.543
          1000, 1141.012, 1.336140, 619.306
          1500, 1210.974, 1.310687, 751.233
          2000, 1250.310, 1.298000, 863.240
          """)
  void dryAir_hasTheReferenceHeatCapacityAndSoundSpeed(
      double t, double cp, double gamma, double c) {
    Mixture air = Air.dry();
    assertThat(air.molarMass() * 1e3).isCloseTo(28.9651, within(1e-4));
    assertThat(air.heatCapacity(t)).isCloseTo(cp, withinPercentage(0.2));
    assertThat(air.gamma(t)).isCloseTo(gamma, withinPercentage(0.07));
    assertThat(air.soundSpeed(t, 1e5)).isCloseTo(c, withinPercentage(0.035));
  }

  // Rows B1: US Standard Atmosphere 1976 (γ = 1.4, R* = 8314.32 J/(kmol K), M = 28.9644); real air
  // has γ = 1.4003 to 1.4011 there, hence up to 0.15 m/s.
  @ParameterizedTest
  @CsvSource({
    "288.150, 340.294",
    "281.651, 336.435",
    "255.676, 320.546",
    "216.774, 295.154",
    "216.650, 295.070"
  })
  void soundSpeed_isThatOfTheStandardAtmosphere(double t, double c) {
    assertThat(Air.dry().soundSpeed(t, 5e4)).isCloseTo(c, within(0.15));
    assertThat(new PerfectGas(8314.32 / 28.9644, 1.4).soundSpeed(t, 5e4))
        .isCloseTo(c, within(0.001));
  }

  @Test
  void density_makesBulkModulusGammaTimesMeanPressure() {
    Mixture air = Air.dry();
    double p = 12e5;
    for (double t : new double[] {300, 700, 1900}) {
      double c = air.soundSpeed(t, p);
      assertThat(air.density(t, p) * c * c).isCloseTo(air.gamma(t, p) * p, withinPercentage(1e-10));
      assertThat(air.density(t, p)).isCloseTo(p / (air.gasConstant() * t), withinPercentage(1e-10));
    }
    // US Standard Atmosphere 1976 at sea level: 1.2250 kg/m³.
    assertThat(air.density(288.15, 101325)).isCloseTo(1.2250, withinPercentage(0.01));
  }

  // IAPWS-IF97 verification values of the saturation line, from memory: 300, 500, 600 K; and the
  // normal boiling point 373.124 K. Two formulations of the same data, alike to 0.02 %.
  @ParameterizedTest
  @CsvSource({"300, 3536.58941", "500, 2638897.76", "600, 12344314.6", "373.124, 101325"})
  void vapourPressureOfWater_isThatOfTheSteamTables(double t, double pascal) {
    assertThat(Air.saturationPressure(t)).isCloseTo(pascal, withinPercentage(0.02));
  }

  @Test
  void humidity_raisesSoundSpeedAndStaysWithTheAir() {
    Mixture damp = Air.humid(0.6, 303.15, 101325);
    // 0.6 × 4247 Pa (steam tables, 30 °C, from memory) over 101325 Pa
    assertThat(damp.moleFraction("H2O")).isCloseTo(0.02515, within(5e-5));
    // By hand: M falls by x (1 − 18.015/28.965) = 0.951 %, cp/R rises by x (4.04 − 3.51) = 0.38 %
    // of
    // 3.51, so γ falls by 0.15 %: c rises by (0.951 − 0.15)/2 = 0.40 %.
    double ratio = damp.soundSpeed(303.15, 101325) / Air.dry().soundSpeed(303.15, 101325);
    assertThat(ratio).isCloseTo(1.0040, within(2e-4));
    assertThat(Air.humid(0.0).soundSpeed(400, 1e5))
        .isCloseTo(Air.dry().soundSpeed(400, 1e5), within(1e-9));
    assertThat(damp.moleFraction("N2") / damp.moleFraction("O2"))
        .isCloseTo(78.084 / 20.9476, within(1e-12));
  }

  @Test
  void givenSoundSpeedAndDensity_giveGammaFromMeanPressure() {
    UniformGas gas = new UniformGas(2.4, 820);
    assertThat(gas.gamma(0, 12e5)).isCloseTo(2.4 * 820 * 820 / 12e5, within(1e-12));
    assertThat(gas.soundSpeed(1, 12e5)).isEqualTo(820);
    assertThat(gas.density(1, 12e5)).isEqualTo(2.4);
    assertThatThrownBy(() -> gas.gamma(0, 1.2e5)).hasMessageContaining("does not fit");
  }

  @Test
  void misuse_isAnErrorThatSaysWhat() {
    assertThatThrownBy(() -> Mixture.ofMoles(Map.of("N2", -0.1)))
        .hasMessageContaining("amount of N2");
    assertThatThrownBy(() -> Mixture.ofMoles(Map.of("N2", 0.0)))
        .hasMessageContaining("at least one");
    assertThatThrownBy(() -> new PerfectGas(287, 1.9)).hasMessageContaining("1.9");
    assertThatThrownBy(() -> new PerfectGas(-287, 1.4)).hasMessageContaining("gas constant");
    assertThatThrownBy(() -> new PerfectGas(287, 1.4).soundSpeed(-3, 1e5))
        .hasMessageContaining("temperature must be positive");
    assertThatThrownBy(() -> Air.humid(1.2)).hasMessageContaining("mole fraction of water");
    assertThatThrownBy(() -> Air.humid(1.2, 300, 1e5)).hasMessageContaining("relative humidity");
    assertThatThrownBy(() -> Air.humid(1, 400, 1e5)).hasMessageContaining("ambient");
    assertThatThrownBy(() -> Air.humid(1, 250, 1e5)).hasMessageContaining("mole fraction");
    assertThatThrownBy(() -> Air.humid(1, 300, -1)).hasMessageContaining("ambient pressure");
    assertThatThrownBy(() -> Air.dry().soundSpeed(150, 1e5)).hasMessageContaining("150 K");
  }
}
