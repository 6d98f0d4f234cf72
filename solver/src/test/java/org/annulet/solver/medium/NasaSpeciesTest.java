package org.annulet.solver.medium;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;
import static org.assertj.core.api.Assertions.withinPercentage;

import java.io.IOException;
import java.io.StringReader;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

class NasaSpeciesTest {
  private static final double[] TEMPERATURES = {300, 500, 1000, 1500, 2000, 2500};

  static List<String> names() {
    return ThermoTable.nasa7().names();
  }

  // NIST-JANAF 4th ed. (Chase 1998), rows B2. The fits err by up to 0.5 %; for H2O the two data
  // sets
  // differ by 1.6 % at 2500 K (remark in section 2 of the reference values).
  @ParameterizedTest
  @CsvSource(
      textBlock =
          """
          N2, 29.125, 29.580, 32.697, 34.843, 35.971, 36.616
          O2, 29.385, 31.091, 34.870, 36.544, 37.741, 38.856
          CO2, 37.221, 44.627, 54.308, 58.379, 60.350, 61.471
          H2O, 33.596, 35.226, 41.268, 47.090, 51.180, 53.904
          Ar, 20.786, 20.786, 20.786, 20.786, 20.786, 20.786
          """)
  void heatCapacity_isThatOfTheJanafTables(
      String name, double a, double b, double c, double d, double e, double f) {
    double[] expected = {a, b, c, d, e, f};
    for (int k = 0; k < expected.length; k++) {
      assertThat(ThermoTable.nasa7().species(name).heatCapacity(TEMPERATURES[k]))
          .as("cp of %s at %s K", name, TEMPERATURES[k])
          .isCloseTo(expected[k], withinPercentage(name.equals("H2O") ? 1.7 : 0.5));
    }
  }

  // Last block of thermo_nasa7.csv, evaluated by its keeper, printed to 0.001.
  @ParameterizedTest
  @CsvSource(
      textBlock =
          """
          Ar, 20.786, 20.786, 20.786, 20.786, 20.786, 20.786
          CH4, 35.761, 46.494, 73.617, 90.022, 100.624, 107.384
          CO, 29.143, 29.811, 33.163, 35.132, 36.288, 36.918
          CO2, 37.218, 44.621, 54.321, 58.225, 60.466, 61.643
          C2H6, 52.720, 77.741, 122.686, 145.229, 158.461, 165.574
          C3H8, 73.947, 112.298, 174.838, 204.977, 222.612, 232.043
          Jet-A(g), 294.906, 429.370, 639.959, 738.191, 790.769, 816.399
          H2, 28.851, 29.298, 30.163, 32.359, 34.195, 35.738
          H2O, 33.597, 35.214, 41.295, 47.334, 51.679, 54.732
          NH3, 35.678, 41.943, 56.280, 65.811, 72.118, 76.202
          NO, 29.859, 30.494, 33.990, 35.716, 36.728, 37.281
          N2, 29.126, 29.598, 32.683, 34.767, 36.010, 36.701
          OH, 29.878, 29.483, 30.694, 32.991, 34.714, 36.021
          O2, 29.388, 31.084, 34.883, 36.507, 37.856, 38.999
          """)
  void heatCapacity_isWhatTheSourcePrints(
      String name, double a, double b, double c, double d, double e, double f) {
    double[] expected = {a, b, c, d, e, f};
    for (int k = 0; k < expected.length; k++) {
      assertThat(ThermoTable.nasa7().species(name).heatCapacity(TEMPERATURES[k]))
          .isCloseTo(expected[k], within(6e-4));
    }
  }

  // Same block, printed to 0.001 kJ/mol.
  @ParameterizedTest
  @CsvSource(
      textBlock =
          """
          Ar, 0.000
          CH4, -74.600
          CO, -110.530
          CO2, -393.510
          C2H6, -83.852
          C3H8, -104.680
          Jet-A(g), -249.722
          H2, 0.000
          H2O, -241.826
          NH3, -45.940
          NO, 91.269
          N2, 0.000
          OH, 39.347
          O2, 0.000
          """)
  void enthalpyOfFormation_isWhatTheSourcePrints(String name, double kilojoulePerMole) {
    assertThat(ThermoTable.nasa7().species(name).enthalpy(298.15) / 1e3)
        .isCloseTo(kilojoulePerMole, within(6e-4));
  }

  // CODATA key values (Cox, Wagman, Medvedev 1989), from memory: standard entropies at 1 bar.
  @ParameterizedTest
  @CsvSource({
    "N2, 191.609",
    "O2, 205.152",
    "CO2, 213.785",
    "H2O, 188.835",
    "H2, 130.680",
    "CO, 197.660",
    "Ar, 154.846",
    "NH3, 192.77"
  })
  void entropy_isThatOfTheKeyValues(String name, double expected) {
    assertThat(ThermoTable.nasa7().species(name).entropy(298.15)).isCloseTo(expected, within(0.02));
  }

  @ParameterizedTest
  @MethodSource("names")
  void bothPolynomials_meetAtThousandKelvin(String name) {
    NasaSpecies s = ThermoTable.nasa7().species(name);
    double above = Math.nextUp(1000.0);
    // The report pins its fits at 1000 K; what is left is the rounding of nine digits.
    assertThat(s.heatCapacity(above)).isCloseTo(s.heatCapacity(1000), withinPercentage(2e-4));
    assertThat(s.enthalpy(above)).isCloseTo(s.enthalpy(1000), within(0.5));
    assertThat(s.entropy(above)).isCloseTo(s.entropy(1000), within(1e-3));
  }

  @ParameterizedTest
  @MethodSource("names")
  void enthalpyAndEntropy_areIntegralsOfHeatCapacity(String name) {
    NasaSpecies s = ThermoTable.nasa7().species(name);
    for (double t : new double[] {350, 900, 1400, 2600}) {
      double d = 1e-3 * t;
      assertThat((s.enthalpy(t + d) - s.enthalpy(t - d)) / (2 * d))
          .isCloseTo(s.heatCapacity(t), withinPercentage(1e-3));
      assertThat((s.entropy(t + d) - s.entropy(t - d)) / (2 * d) * t)
          .isCloseTo(s.heatCapacity(t), withinPercentage(1e-3));
    }
  }

  // Molar masses of section 2 of the reference values, g/mol.
  @ParameterizedTest
  @CsvSource({
    "N2, 28.0134",
    "O2, 31.9988",
    "CO2, 44.0095",
    "H2O, 18.01528",
    "Ar, 39.948",
    "CH4, 16.04246"
  })
  void molarMass_isTheSumOfItsAtoms(String name, double gramPerMole) {
    assertThat(ThermoTable.nasa7().species(name).molarMass() * 1e3)
        .isCloseTo(gramPerMole, within(1e-9));
  }

  @Test
  void outsideTheRange_isAnErrorThatNamesSpeciesAndRange() {
    NasaSpecies kerosene = ThermoTable.nasa7().species("Jet-A(g)");
    assertThatThrownBy(() -> kerosene.heatCapacity(250))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("Jet-A(g) at 250 K")
        .hasMessageContaining("from 273.15 to 5000 K");
    assertThatThrownBy(() -> kerosene.enthalpy(Double.NaN))
        .isInstanceOf(IllegalArgumentException.class);
    assertThatThrownBy(() -> ThermoTable.nasa7().species("N2").entropy(6000.1))
        .isInstanceOf(IllegalArgumentException.class);
  }

  @Test
  void unknownSpecies_isAnErrorThatListsTheKnownOnes() {
    assertThatThrownBy(() -> ThermoTable.nasa7().species("C2H4"))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("'C2H4'")
        .hasMessageContaining("CO2, C2H6, C3H8");
  }

  @Test
  void malformedTable_isAnErrorWithItsLine() {
    assertThatThrownBy(() -> read("# c\nN2,N2,200,1000,1\n")).hasMessageContaining("my.csv:2");
    assertThatThrownBy(() -> read("N2,N2,200,1000,1,2,3,x,5,6,7\n"))
        .hasMessageContaining("'x' is not a finite number");
    assertThatThrownBy(() -> read("N2,N2,200,1000,1,2,3,4,5,6,7\nN2,N2,1100,6000,1,2,3,4,5,6,7\n"))
        .hasMessageContaining("touch");
    assertThatThrownBy(() -> read("Xe,Xe1,200,1000,1,2,3,4,5,6,7\n"))
        .hasMessageContaining("no atomic mass for element 'Xe'");
  }

  private static ThermoTable read(String text) throws IOException {
    return ThermoTable.read(new StringReader(text), "my.csv");
  }
}
