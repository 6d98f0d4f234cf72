package org.annulet.solver.medium;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;
import static org.assertj.core.api.Assertions.withinPercentage;

import java.io.IOException;
import java.io.StringReader;
import java.util.EnumMap;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;

class CombustionTest {
  private static final FuelBlend METHANE = FuelBlend.pure(FuelComponent.METHANE);

  // GRI-Mech 3.0 coefficients as listed in section 2 of the reference values; a7 is not needed.
  private static final String GRI =
      """
          N2,N2,300,1000,3.298677,0.0014082404,-3.963222e-06,5.641515e-09,-2.444854e-12,-1020.8999,0
          N2,N2,1000,5000,2.92664,0.0014879768,-5.68476e-07,1.0097038e-10,-6.753351e-15,-922.7977,0
          O2,O2,200,1000,3.78245636,-0.00299673416,9.84730201e-06,-9.68129509e-09,3.24372837e-12,-1063.94356,0
          O2,O2,1000,3500,3.28253784,0.00148308754,-7.57966669e-07,2.09470555e-10,-2.16717794e-14,-1088.45772,0
          H2O,H2 O1,200,1000,4.19864056,-0.0020364341,6.52040211e-06,-5.48797062e-09,1.77197817e-12,-30293.7267,0
          H2O,H2 O1,1000,3500,3.03399249,0.00217691804,-1.64072518e-07,-9.7041987e-11,1.68200992e-14,-30004.2971,0
          CO2,C1 O2,200,1000,2.35677352,0.00898459677,-7.12356269e-06,2.45919022e-09,-1.43699548e-13,-48371.9697,0
          CO2,C1 O2,1000,3500,3.85746029,0.00441437026,-2.21481404e-06,5.23490188e-10,-4.72084164e-14,-48759.166,0
          CH4,C1 H4,200,1000,5.14987613,-0.0136709788,4.91800599e-05,-4.84743026e-08,1.66693956e-11,-10246.6476,0
          CH4,C1 H4,1000,3500,0.074851495,0.0133909467,-5.73285809e-06,1.22292535e-09,-1.0181523e-13,-9468.34459,0
      """;

  // Rows B6: NASA 9-coefficient data. Ours are the 7-coefficient fits of 1993, "0.5 % other data";
  // cp differs by up to 0.2 %, c by up to 0.03 %.
  @ParameterizedTest
  @CsvSource(
      textBlock =
          """
          0.5, 1500, 28.21154, 294.7185, 1326.829, 1.285549, 753.865
          0.5, 1800, 28.21154, 294.7185, 1362.054, 1.276126, 822.786
          0.5, 2000, 28.21154, 294.7185, 1380.359, 1.271470, 865.709
          0.6, 1500, 28.09129, 295.9801, 1347.449, 1.281492, 754.284
          0.6, 1800, 28.09129, 295.9801, 1384.422, 1.271930, 823.188
          0.6, 2000, 28.09129, 295.9801, 1403.622, 1.267216, 866.107
          0.7, 1500, 27.97339, 297.2275, 1367.837, 1.277625, 754.730
          0.7, 1800, 27.97339, 297.2275, 1406.539, 1.267939, 823.626
          0.7, 2000, 27.97339, 297.2275, 1426.624, 1.263174, 866.545
          0.8, 1500, 27.85778, 298.4610, 1387.998, 1.273934, 755.202
          0.8, 1800, 27.85778, 298.4610, 1428.410, 1.264137, 824.095
          0.8, 2000, 27.85778, 298.4610, 1449.370, 1.259326, 867.018
          """)
  void methaneProducts_haveTheReferenceGasConstantAndSoundSpeed(
      double phi, double t, double molarMass, double r, double cp, double gamma, double c) {
    Mixture products = new Combustion(METHANE, Air.oxygenNitrogen(), phi).products();
    expectComposition(products, molarMass, r);
    expectHeat(products, t, cp, gamma, c);
  }

  // Rows B7, same data as B6.
  @ParameterizedTest
  @CsvSource(
      textBlock =
          """
          0.4, 1500, 28.85721, 288.1243, 1282.674, 1.289703, 746.587
          0.4, 2000, 28.85721, 288.1243, 1329.878, 1.276576, 857.686
          0.6, 1500, 28.86036, 288.0929, 1312.716, 1.281170, 744.072
          0.6, 2000, 28.86036, 288.0929, 1363.451, 1.267904, 854.721
          0.8, 1500, 28.86342, 288.0623, 1341.976, 1.273326, 741.752
          0.8, 2000, 28.86342, 288.0623, 1396.150, 1.259963, 851.995
          """)
  void keroseneProducts_haveTheReferenceGasConstantAndSoundSpeed(
      double phi, double t, double molarMass, double r, double cp, double gamma, double c) {
    FuelBlend kerosene = FuelBlend.pure(FuelComponent.KEROSENE);
    Mixture products = new Combustion(kerosene, Air.oxygenNitrogen(), phi).products();
    expectComposition(products, molarMass, r);
    expectHeat(products, t, cp, gamma, c);
  }

  private static void expectComposition(Mixture m, double molarMass, double r) {
    assertThat(m.molarMass() * 1e3).isCloseTo(molarMass, withinPercentage(1e-4));
    assertThat(m.gasConstant()).isCloseTo(r, withinPercentage(1e-4));
  }

  private static void expectHeat(Mixture m, double t, double cp, double gamma, double c) {
    assertThat(m.heatCapacity(t)).isCloseTo(cp, withinPercentage(0.25));
    assertThat(m.gamma(t)).isCloseTo(gamma, withinPercentage(0.06));
    assertThat(m.soundSpeed(t, 1e5)).isCloseTo(c, withinPercentage(0.03));
  }

  // Rows B8, computed with GRI-Mech 3.0 data: with the same data the printed figures must be met.
  @ParameterizedTest
  @CsvSource(
      textBlock =
          """
          0.5, 300, 1482.272
          0.6, 300, 1670.751
          0.7, 300, 1848.379
          0.8, 300, 2016.332
          0.5, 700, 1807.651
          0.6, 700, 1988.999
          0.7, 700, 2160.539
          0.8, 700, 2323.208
          """)
  void methaneFlameTemperature_isTheReference(double phi, double inlet, double expected)
      throws IOException {
    ThermoTable gri = ThermoTable.read(new StringReader(GRI), "GRI");
    FuelBlend methane = FuelBlend.ofMoles(gri, Map.of(FuelComponent.METHANE, 1.0));
    Mixture air = Mixture.ofMoles(gri, Map.of("O2", 1.0, "N2", 3.76));
    assertThat(new Combustion(methane, air, phi).adiabaticFlameTemperature(inlet, inlet))
        .isCloseTo(expected, within(0.01));
    // The shipped data of 1993 differ from GRI-Mech's by about 1 K.
    Combustion shipped = new Combustion(METHANE, Air.oxygenNitrogen(), phi);
    assertThat(shipped.adiabaticFlameTemperature(inlet, inlet)).isCloseTo(expected, within(1.2));
  }

  // Lower heating values at 25 °C in MJ/kg as in engineering handbooks, from memory: they differ in
  // the third digit with the enthalpies of formation used.
  @ParameterizedTest
  @CsvSource({
    "hydrogen, 119.96",
    "methane, 50.02",
    "ethane, 47.5",
    "propane, 46.35",
    "ammonia, 18.6",
    "carbon monoxide, 10.1",
    "kerosene, 43.4"
  })
  void lowerHeatingValue_isThatOfTheHandbooks(String name, double expected) {
    assertThat(FuelBlend.pure(FuelComponent.named(name)).lowerHeatingValue() / 1e6)
        .isCloseTo(expected, withinPercentage(0.2));
  }

  // Air per fuel by mass at φ = 1, handbook figures, from memory.
  @ParameterizedTest
  @CsvSource({
    "hydrogen, 34.3",
    "methane, 17.2",
    "ethane, 16.1",
    "propane, 15.7",
    "ammonia, 6.08",
    "carbon_monoxide, 2.47",
    "kerosene, 14.7"
  })
  void stoichiometricAir_isThatOfTheHandbooks(String name, double expected) {
    Combustion c = new Combustion(FuelBlend.pure(FuelComponent.named(name)), Air.dry(), 1);
    assertThat(1 / c.fuelOxidiserRatio()).isCloseTo(expected, withinPercentage(0.5));
  }

  // Equilibrium flame temperatures at φ = 1, 25 °C, 1 atm, air, as published in textbooks, from
  // memory. Ours lack the atoms H and O, which makes them a few kelvin hot.
  @ParameterizedTest
  @CsvSource({"methane, 2226", "propane, 2267", "hydrogen, 2386", "ammonia, 2073"})
  void equilibriumFlameTemperature_isThatOfTheTextbooks(String name, double expected) {
    Combustion c = new Combustion(FuelBlend.pure(FuelComponent.named(name)), Air.dry(), 1);
    Dissociation d = Dissociation.estimate(c, 298.15, 298.15, 101325);
    assertThat(d.equilibriumTemperature()).isCloseTo(expected, within(12.0));
    assertThat(d.soundSpeedChange()).isBetween(-0.03, 0.0);
  }

  @ParameterizedTest
  @EnumSource(names = {"HYDROGEN", "METHANE", "AMMONIA", "CARBON_MONOXIDE", "KEROSENE"})
  void equilibrium_conservesElementsAndObeysMassAction(FuelComponent component) {
    Mixture p = new Combustion(FuelBlend.pure(component), Air.dry(), 0.9).products();
    double t = 2400;
    Mixture e = Dissociation.equilibrium(p, t, 3e5);
    for (String element : new String[] {"C", "H", "O"}) {
      assertThat(atoms(e, element) / atoms(e, "N"))
          .isCloseTo(atoms(p, element) / atoms(p, "N"), within(1e-9));
    }
    // Reactions that are sums of the ones solved, free of pressure: N2 + O2 ⇌ 2 NO, 2 OH ⇌ H2 + O2,
    // CO + H2O ⇌ CO2 + H2.
    expectMassAction(e, t, new String[] {"N2", "O2"}, new String[] {"NO", "NO"});
    if (e.moleFraction("OH") > 0) {
      expectMassAction(e, t, new String[] {"OH", "OH"}, new String[] {"H2", "O2"});
    }
    if (e.moleFraction("OH") > 0 && e.moleFraction("CO") > 1e-4) {
      expectMassAction(e, t, new String[] {"CO", "H2O"}, new String[] {"CO2", "H2"});
    }
  }

  private static void expectMassAction(Mixture e, double t, String[] from, String[] to) {
    double lhs = 0;
    double rhs = 0;
    for (int k = 0; k < from.length; k++) {
      lhs += Math.log(e.moleFraction(to[k]) / e.moleFraction(from[k]));
      rhs -= (gibbs(to[k], t) - gibbs(from[k], t)) / (NasaSpecies.FIT_GAS_CONSTANT * t);
    }
    assertThat(lhs).isCloseTo(rhs, within(1e-6));
  }

  private static double gibbs(String name, double t) {
    NasaSpecies s = ThermoTable.nasa7().species(name);
    return s.enthalpy(t) - t * s.entropy(t);
  }

  private static double atoms(Mixture m, String element) {
    return m.moleFractions().entrySet().stream()
        .mapToDouble(x -> x.getValue() * ThermoTable.nasa7().species(x.getKey()).atoms(element))
        .sum();
  }

  @Test
  void dissociation_growsWithTemperatureAndShrinksWithPressure() {
    double lean = drop(0.5, 1e5);
    double full = drop(1, 1e5);
    assertThat(lean).isBetween(1.0, 15.0);
    assertThat(full).isGreaterThan(10 * lean);
    assertThat(drop(1, 3e6)).isLessThan(0.6 * full);
  }

  private static double drop(double phi, double pressure) {
    Dissociation d =
        Dissociation.estimate(new Combustion(METHANE, Air.dry(), phi), 300, 700, pressure);
    return d.completeTemperature() - d.equilibriumTemperature();
  }

  @ParameterizedTest
  @EnumSource(FuelComponent.class)
  void burning_conservesEveryElement(FuelComponent component) {
    Map<FuelComponent, Double> moles = new EnumMap<>(FuelComponent.class);
    moles.put(FuelComponent.METHANE, 0.5);
    moles.merge(component, 0.3, Double::sum);
    Combustion c = new Combustion(FuelBlend.ofMoles(moles), Air.humid(0.02), 0.73);
    Mixture u = c.unburnt();
    Mixture b = c.products();
    // Per kilogram of mixture the number of atoms of each element is the same before and after.
    for (String element : new String[] {"C", "H", "N", "O", "Ar"}) {
      assertThat(atoms(b, element) / b.molarMass() * u.molarMass())
          .as(element)
          .isCloseTo(atoms(u, element), within(1e-10));
    }
    assertThat(b.moleFraction("O2")).isPositive();
  }

  @Test
  void progress_leadsFromUnburntToBurntAlongTheHeatReleased() {
    Combustion c = new Combustion(METHANE, Air.dry(), 0.6);
    assertThat(c.partlyBurnt(0).moleFractions()).isEqualTo(c.unburnt().moleFractions());
    assertThat(c.partlyBurnt(1).moleFractions()).isEqualTo(c.products().moleFractions());
    assertThat(c.adiabaticTemperature(0, 300, 700)).isBetween(650.0, 700.0);
    assertThat(c.adiabaticTemperature(1, 300, 700))
        .isEqualTo(c.adiabaticFlameTemperature(300, 700));
    // Heat released per kg is progress × fuel share × heating value, at the standard temperature.
    double share = c.fuelOxidiserRatio() / (1 + c.fuelOxidiserRatio());
    double released = c.unburnt().enthalpy(298.15) - c.partlyBurnt(0.25).enthalpy(298.15);
    assertThat(released)
        .isCloseTo(0.25 * share * METHANE.lowerHeatingValue(), withinPercentage(1e-6));
  }

  @Test
  void equivalenceRatio_comesBackFromTheMassFlows() {
    FuelBlend blend =
        FuelBlend.ofMass(Map.of(FuelComponent.HYDROGEN, 0.1, FuelComponent.METHANE, 0.9));
    Combustion c = new Combustion(blend, Air.dry(), 0.47);
    assertThat(Combustion.equivalenceRatio(blend, Air.dry(), c.fuelOxidiserRatio()))
        .isCloseTo(0.47, within(1e-12));
    // By hand: 0.1/2.01588 over 0.1/2.01588 + 0.9/16.04246 = 0.46927 by moles.
    assertThat(blend.moleFractions().get(FuelComponent.HYDROGEN)).isCloseTo(0.4693, within(1e-4));
    assertThat(blend.lowerHeatingValue())
        .isCloseTo(0.1 * 119.96e6 + 0.9 * 50.03e6, withinPercentage(0.02));
  }

  @Test
  void heatRelease_isCheckedAgainstMassFlowTimesHeatingValue() {
    HeatReleaseCheck check = HeatReleaseCheck.of(15e6, 0.28, METHANE);
    assertThat(check.fromFuel()).isCloseTo(0.28 * 50.03e6, withinPercentage(0.05));
    assertThat(check.relativeDifference()).isCloseTo(0.0708, within(1e-3));
    assertThatThrownBy(() -> HeatReleaseCheck.of(1e6, 0, METHANE))
        .hasMessageContaining("mass flow");
  }

  @Test
  void secondStage_burnsInTheProductsOfTheFirst() {
    Mixture first = new Combustion(METHANE, Air.dry(), 0.4).products();
    Mixture second = new Combustion(METHANE, first, 0.5).products();
    // The first stage leaves 0.6 of the oxygen, the second takes half of that.
    Mixture whole = new Combustion(METHANE, Air.dry(), 0.7).products();
    second
        .moleFractions()
        .forEach((s, x) -> assertThat(whole.moleFraction(s)).isCloseTo(x, within(1e-12)));
  }

  @Test
  void misuse_isAnErrorThatSaysHowToMend() {
    assertThatThrownBy(() -> new Combustion(METHANE, Air.dry(), 1.1))
        .hasMessageContaining("at most at 1, got 1.1");
    assertThatThrownBy(() -> new Combustion(METHANE, Air.dry(), 0)).hasMessageContaining("above 0");
    assertThatThrownBy(() -> new Combustion(METHANE, Mixture.ofMoles(Map.of("N2", 1.0)), 0.5))
        .hasMessageContaining("no O2");
    assertThatThrownBy(
            () -> new Combustion(METHANE, Mixture.ofMoles(Map.of("O2", 1.0, "H2", 1.0)), 0.5))
        .hasMessageContaining("H2");
    assertThatThrownBy(() -> FuelBlend.pure(FuelComponent.STEAM))
        .hasMessageContaining("nothing in the fuel blend burns");
    assertThatThrownBy(() -> FuelComponent.named("butane"))
        .hasMessageContaining("'butane'")
        .hasMessageContaining("ammonia, carbon dioxide, carbon monoxide, ethane");
    assertThatThrownBy(() -> new Combustion(METHANE, Air.dry(), 0.5).partlyBurnt(1.01))
        .hasMessageContaining("progress");
    assertThatThrownBy(
            () -> new Combustion(METHANE, Air.dry(), 0.5).adiabaticFlameTemperature(300, 150))
        .hasMessageContaining("150 K");
    assertThatThrownBy(
            () -> Dissociation.estimate(new Combustion(METHANE, Air.dry(), 0.5), 300, 300, -1))
        .hasMessageContaining("pressure");
  }
}
