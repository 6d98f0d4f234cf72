package org.annulet.solver.medium;

import java.util.LinkedHashMap;
import java.util.Map;

/**
 * What the neglect of dissociation costs: chemical equilibrium of the products among CO2, CO, H2O,
 * H2, OH, O2, N2, NO and Ar, compared with complete combustion.
 *
 * <pre>
 *   CO2 ⇌ CO + ½O2,  H2O ⇌ H2 + ½O2,  ½H2O + ¼O2 ⇌ OH,  ½N2 + ½O2 ⇌ NO,   ln K = −ΔG/(R T), 1 bar
 * </pre>
 *
 * The atoms H and O are left out, so the temperature drop is a little too small: by about 10 K at φ
 * = 1 and 1 bar, far less for lean flames or at pressure.
 *
 * @param completeTemperature adiabatic flame temperature of complete combustion, K
 * @param equilibriumTemperature adiabatic flame temperature with dissociation, K
 * @param completeSoundSpeed of the products of complete combustion at their temperature, m/s
 * @param equilibriumSoundSpeed of the dissociated products at theirs, composition frozen, m/s
 */
public record Dissociation(
    double completeTemperature,
    double equilibriumTemperature,
    double completeSoundSpeed,
    double equilibriumSoundSpeed) {

  /** Relative change of the sound speed when dissociation is counted; negative, slower. */
  public double soundSpeedChange() {
    return equilibriumSoundSpeed / completeSoundSpeed - 1;
  }

  /**
   * The estimate for one flame.
   *
   * @param combustion the flame
   * @param fuelTemperature in K
   * @param oxidiserTemperature in K
   * @param pressure in Pa
   */
  public static Dissociation estimate(
      Combustion combustion, double fuelTemperature, double oxidiserTemperature, double pressure) {
    if (!(pressure > 0) || Double.isInfinite(pressure)) {
      throw new IllegalArgumentException("pressure must be positive, got " + pressure + " Pa");
    }
    double enthalpy = combustion.inletEnthalpy(fuelTemperature, oxidiserTemperature);
    Mixture products = combustion.products();
    double complete = Combustion.temperatureOf(products, enthalpy);
    double low = 0.5 * complete;
    double high = complete + 1;
    while (high - low > 1e-8 * high) {
      double middle = 0.5 * (low + high);
      if (equilibrium(products, middle, pressure).enthalpy(middle) < enthalpy) {
        low = middle;
      } else {
        high = middle;
      }
    }
    double temperature = 0.5 * (low + high);
    return new Dissociation(
        complete,
        temperature,
        products.soundSpeed(complete, pressure),
        equilibrium(products, temperature, pressure).soundSpeed(temperature, pressure));
  }

  /**
   * Equilibrium composition of products of complete combustion.
   *
   * @param products of CO2, H2O, O2, N2 and Ar
   * @param temperature in K
   * @param pressure in Pa
   */
  public static Mixture equilibrium(Mixture products, double temperature, double pressure) {
    return new Balance(products, temperature, pressure / 1e5).solve();
  }

  /** Element balances with the partial pressure of O2 as the one unknown. */
  private static final class Balance {
    private static final int CAP = 200;
    private final double carbon;
    private final double hydrogen;
    private final double nitrogen;
    private final double oxygen;
    private final double argon;
    private final double bar;
    private final double kCo;
    private final double kH2;
    private final double kOh;
    private final double kNo;
    private Map<String, Double> moles = new LinkedHashMap<>();

    Balance(Mixture products, double temperature, double bar) {
      double co2 = products.moleFraction("CO2");
      double h2o = products.moleFraction("H2O");
      this.carbon = co2;
      this.hydrogen = 2 * h2o;
      this.nitrogen = 2 * products.moleFraction("N2");
      this.oxygen = 2 * co2 + h2o + 2 * products.moleFraction("O2");
      this.argon = products.moleFraction("Ar");
      this.bar = bar;
      double o2 = gibbs("O2", temperature);
      this.kCo = Math.exp(gibbs("CO2", temperature) - gibbs("CO", temperature) - o2 / 2);
      this.kH2 = Math.exp(gibbs("H2O", temperature) - gibbs("H2", temperature) - o2 / 2);
      this.kOh = Math.exp(gibbs("H2O", temperature) / 2 + o2 / 4 - gibbs("OH", temperature));
      this.kNo = Math.exp(gibbs("N2", temperature) / 2 + o2 / 2 - gibbs("NO", temperature));
    }

    /** G/(R T) at 1 bar. */
    private static double gibbs(String name, double temperature) {
      NasaSpecies s = ThermoTable.nasa7().species(name);
      return (s.enthalpy(temperature) / temperature - s.entropy(temperature))
          / NasaSpecies.FIT_GAS_CONSTANT;
    }

    Mixture solve() {
      double total = 1;
      for (int round = 0; round < CAP; round++) {
        double perMole = bar / total;
        double low = Math.log(1e-30);
        double high = Math.log(perMole * oxygen);
        while (high - low > 1e-13 * Math.abs(low)) {
          double middle = 0.5 * (low + high);
          if (oxygenOf(Math.exp(middle), perMole) < oxygen) {
            low = middle;
          } else {
            high = middle;
          }
        }
        oxygenOf(Math.exp(0.5 * (low + high)), perMole);
        double sum = moles.values().stream().mapToDouble(d -> d).sum();
        boolean settled = Math.abs(sum - total) < 1e-13;
        total = sum;
        if (settled) {
          break;
        }
      }
      return Mixture.ofMoles(moles);
    }

    /** Fills the amounts for a partial pressure of O2 in bar; returns the oxygen they hold. */
    private double oxygenOf(double u, double perMole) {
      double root = Math.sqrt(u);
      double co2 = carbon / (1 + kCo / root);
      // 2 w² (1 + kH2/√u) + w kOh u^¼/√P = hydrogen, w = √(moles of H2O)
      double w = positiveRoot(2 * (1 + kH2 / root), kOh * Math.sqrt(root / perMole), hydrogen);
      double v = positiveRoot(2, kNo * root / Math.sqrt(perMole), nitrogen);
      double oh = kOh * Math.sqrt(root / perMole) * w;
      double no = kNo * root / Math.sqrt(perMole) * v;
      Map<String, Double> n = new LinkedHashMap<>();
      n.put("CO2", co2);
      n.put("CO", carbon - co2);
      n.put("H2O", w * w);
      n.put("H2", w * w * kH2 / root);
      n.put("OH", oh);
      n.put("N2", v * v);
      n.put("NO", no);
      n.put("O2", u / perMole);
      n.put("Ar", argon);
      moles = n;
      return co2 + carbon + w * w + oh + no + 2 * u / perMole;
    }

    private static double positiveRoot(double a, double b, double c) {
      return c == 0 ? 0 : 2 * c / (b + Math.sqrt(b * b + 4 * a * c));
    }
  }
}
