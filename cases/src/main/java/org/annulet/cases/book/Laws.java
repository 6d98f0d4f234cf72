package org.annulet.cases.book;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.annulet.solver.boundary.ChokedNozzle;
import org.annulet.solver.boundary.EdgeGas;
import org.annulet.solver.boundary.EndCorrection;
import org.annulet.solver.boundary.QuarterWaveTube;
import org.annulet.solver.boundary.ResonatorChain;
import org.annulet.solver.medium.Air;
import org.annulet.solver.medium.Combustion;
import org.annulet.solver.medium.FuelBlend;
import org.annulet.solver.medium.FuelComponent;
import org.annulet.solver.medium.PerfectGas;
import org.apache.commons.math3.complex.Complex;

/** The laws of gas, dampers and nozzle against known values. */
final class Laws {
  private static final double RHO = 2;
  private static final double C = 800;

  private final List<LawCheck> checks = new ArrayList<>();

  private Laws() {}

  static List<LawCheck> all() {
    Laws laws = new Laws();
    laws.soundSpeedOfAir();
    laws.burntMethane();
    laws.flameTemperature();
    laws.resonator();
    laws.quarterWaveTube();
    laws.nozzle();
    return List.copyOf(laws.checks);
  }

  private void add(String row, String quantity, double ours, double theirs, double tolerance) {
    add(row, quantity, ours, theirs, tolerance, "closed form");
  }

  private void add(
      String row, String quantity, double ours, double theirs, double tolerance, String source) {
    checks.add(new LawCheck(row, quantity, ours, theirs, tolerance, source));
  }

  private void soundSpeedOfAir() {
    double[][] standard = {
      {0, 288.150, 340.294},
      {1000, 281.651, 336.435},
      {5000, 255.676, 320.546},
      {11000, 216.774, 295.154},
      {20000, 216.650, 295.070}
    };
    for (double[] s : standard) {
      add(
          name("B1.%.0f", s[0]),
          name("sound speed at %.3f K [m/s]", s[1]),
          new PerfectGas(8314.32 / 28.9644, 1.4).soundSpeed(s[1], 101325),
          s[2],
          1e-3,
          "US Standard Atmosphere 1976");
    }
    double[][] real = {
      {288.15, 340.320},
      {500, 446.110},
      {800, 557.543},
      {1000, 619.306},
      {1500, 751.233},
      {2000, 863.240}
    };
    for (double[] s : real) {
      add(
          "B5." + (s[0] == 288.15 ? "288.15" : name("%.0f", s[0])),
          name("sound speed of dry air at %.2f K [m/s]", s[0]),
          Air.dry().soundSpeed(s[0], 101325),
          s[1],
          3.5e-4 * s[1],
          "NASA/TP-2002-211556, 9-coefficient data; ours has the 7-coefficient fits of 1993");
    }
  }

  private void burntMethane() {
    double[][] burnt = {
      {0.5, 1500, 753.865}, {0.5, 1800, 822.786}, {0.6, 1800, 823.188}, {0.7, 2000, 866.545}
    };
    for (double[] s : burnt) {
      add(
          name("B6.%.1f.%.0f", s[0], s[1]),
          name("sound speed of burnt methane, φ = %.1f, %.0f K [m/s]", s[0], s[1]),
          methane(s[0]).products().soundSpeed(s[1], 1e5),
          s[2],
          5e-4 * s[2],
          "NASA 9-coefficient data, complete combustion");
    }
  }

  private void flameTemperature() {
    double[][] hot = {{0.5, 300, 1482.272}, {0.7, 300, 1848.379}, {0.6, 700, 1988.999}};
    for (double[] s : hot) {
      add(
          name("B8.%.1f.%.0f", s[0], s[1]),
          name("adiabatic flame temperature of methane, φ = %.1f from %.0f K [K]", s[0], s[1]),
          methane(s[0]).adiabaticFlameTemperature(s[1], s[1]),
          s[2],
          1.5,
          "GRI-Mech 3.0 data, no dissociation; ours has other fits of the same species");
    }
  }

  private static Combustion methane(double phi) {
    return new Combustion(FuelBlend.pure(FuelComponent.METHANE), Air.oxygenNitrogen(), phi);
  }

  private void resonator() {
    double[][] corrections = {{0, 1128.37917}, {0.85, 1024.74117}, {1.7, 945.25205}};
    for (int k = 0; k < corrections.length; k++) {
      add(
          "F1." + k,
          "Helmholtz resonator, neck 20 mm with corrections of "
              + corrections[k][0]
              + " a, frequency [Hz]",
          neck(0.02 + corrections[k][0] * 0.005, 0).firstStageFrequency(),
          corrections[k][1],
          1e-4);
    }
    add(
        "F1.3",
        "Helmholtz resonator, piston correction outside, reduced inside, frequency [Hz]",
        neck(0.02 + (EndCorrection.PISTON + EndCorrection.intoVolume(0.25)) * 0.005, 0)
            .firstStageFrequency(),
        968.25423,
        1e-4);
    for (double[] s : new double[][] {{150, -1.299758}, {500, -0.288081}}) {
      Complex at = new Complex(0, 2 * Math.PI * s[0]);
      ResonatorChain resonator = neck(0.0285, 0.05);
      Complex z = at.divide(resonator.flow().value(at)).multiply(resonator.mouthArea() / (RHO * C));
      add(
          name("F2.%.0f", s[0]),
          name("resonator, Im Z/(ρc) at %.0f Hz", s[0]),
          z.getImaginary(),
          s[1],
          1e-6);
    }
  }

  private static ResonatorChain neck(double length, double resistance) {
    double area = Math.PI * 0.005 * 0.005;
    return new ResonatorChain(
        RHO, C, List.of(new ResonatorChain.Stage(area, length, resistance, 50e-6)));
  }

  private void quarterWaveTube() {
    for (double[] s : new double[][] {{500, -0.66817864}, {700, -0.19891237}, {900, 0.19891237}}) {
      Complex at = new Complex(0, 2 * Math.PI * s[0]);
      QuarterWaveTube tube =
          new QuarterWaveTube(RHO, C, new QuarterWaveTube.Mouth(Math.PI * 1e-4, 0.25, 0));
      Complex z = at.divide(tube.flow().value(at)).multiply(tube.mouthArea() / (RHO * C));
      add(
          name("F4.%.0f", s[0]),
          name("quarter-wave tube, Im Z/(ρc) at %.0f Hz", s[0]),
          z.getImaginary(),
          s[1],
          1e-7);
    }
  }

  private void nozzle() {
    for (double[] s : new double[][] {{1.4, 0.1, 0.02}, {1.3, 0.05, 0.0075}, {1.25, 0.2, 0.025}}) {
      add(
          "F7." + s[0] + "." + s[1],
          name("choked nozzle, admittance, γ = %.2f, Mach %.2f", s[0], s[1]),
          new ChokedNozzle(s[1])
              .admittance(new EdgeGas(1, 1, s[0]))
              .value(new Complex(0, 1000))
              .getReal(),
          s[2],
          1e-12,
          "Marble & Candel 1977, J. Sound Vib. 55, 225 (from memory)");
    }
  }

  private static String name(String format, Object... values) {
    return String.format(Locale.ROOT, format, values);
  }
}
