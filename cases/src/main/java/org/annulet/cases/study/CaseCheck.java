package org.annulet.cases.study;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.Damper;
import org.annulet.cases.read.Flame;
import org.annulet.cases.read.Gas;
import org.annulet.cases.read.Geometry;
import org.annulet.cases.read.Problem;
import org.annulet.cases.read.TwoPort;
import org.annulet.cases.read.Wall;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.boundary.FittedWall;
import org.annulet.solver.flame.FittedResponse;
import org.annulet.solver.medium.Combustion;
import org.annulet.solver.medium.Coverage;
import org.annulet.solver.medium.Dissociation;
import org.annulet.solver.medium.HeatReleaseCheck;
import org.annulet.solver.medium.MappedMedium;

/**
 * What looks wrong with a case, each with its reason and, where there is one, an estimate of the
 * size of what is neglected.
 */
final class CaseCheck {
  /** Linear triangles: relative error of a frequency about (kh)²/24. */
  private static final double FEWEST_SIDES = 12;

  private static final double LARGE_MACH = 0.1;
  private static final double WIDE_GAP = 0.25;
  private static final double HEAT = 0.03;
  private static final double SPREAD = 0.02;

  private final CaseFile caseFile;
  private final Mesh mesh;
  private final MappedMedium gas;
  private final List<Problem> cautions = new ArrayList<>();

  private CaseCheck(CaseFile caseFile, Mesh mesh, MappedMedium gas) {
    this.caseFile = caseFile;
    this.mesh = mesh;
    this.gas = gas;
  }

  /**
   * The cautions of a case.
   *
   * @param mesh of the whole chamber
   * @param gas on that mesh
   */
  static List<Problem> of(CaseFile caseFile, Mesh mesh, MappedMedium gas) {
    CaseCheck check = new CaseCheck(caseFile, mesh, gas);
    check.wavelengths();
    check.gaps();
    check.coverage();
    check.mixtures();
    check.flames();
    check.walls();
    check.twoPorts();
    check.dampers();
    return List.copyOf(check.cautions);
  }

  private void caution(String key, String what, String mend) {
    cautions.add(caseFile.source().problem(key, what, mend));
  }

  /** A sentence; zeros at the end of decimals are dropped. */
  private static String text(String format, Object... values) {
    return String.format(Locale.ROOT, format, values)
        .replaceAll("(\\.\\d*?)0+(?![\\d.])", "$1")
        .replaceAll("(\\d)\\.(?=\\s)", "$1");
  }

  private void wavelengths() {
    double top = caseFile.window().highestFrequency();
    double worst = Double.POSITIVE_INFINITY;
    int at = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      double side = 0;
      for (int k = 0; k < 3; k++) {
        side =
            Math.max(
                side,
                Math.hypot(
                    mesh.cornerX(t, (k + 1) % 3) - mesh.cornerX(t, k),
                    mesh.cornerY(t, (k + 1) % 3) - mesh.cornerY(t, k)));
      }
      double sides = gas.medium().soundSpeed(t) / top / side;
      if (sides < worst) {
        worst = sides;
        at = t;
      }
    }
    if (worst < FEWEST_SIDES) {
      double error = Math.pow(2 * Math.PI / worst, 2) / 24;
      caution(
          "geometry.mesh_size",
          text(
              "%.1f sides per wavelength at %.4g Hz in zone '%s': frequencies there come out too high"
                  + " by about %.2g %%",
              worst, top, mesh.zoneNames().get(mesh.zone(at)), 100 * error),
          "make the triangles smaller, or add 'sides_per_wavelength: 20'");
    }
  }

  private void gaps() {
    if (!(caseFile.geometry() instanceof Geometry.Ring ring)) {
      return;
    }
    for (Geometry.RingZone zone : ring.zones()) {
      if (zone instanceof Geometry.Annulus a && a.gap() / a.meanRadius() > WIDE_GAP) {
        double ratio = a.gap() / a.meanRadius();
        caution(
            "geometry.zones." + a.name() + ".gap",
            text(
                "the gap of zone '%s' is %.2g of its mean radius: azimuthal modes that live in it come"
                    + " out too low by about %.2g %% (h²/24R²)",
                a.name(), ratio, 100 * ratio * ratio / 24),
            "draw it as a section where that matters");
      }
    }
  }

  private void coverage() {
    for (Coverage c : gas.coverage()) {
      if (c.extrapolatedNodes() > 0) {
        caution(
            "gas.zones." + c.zone() + ".temperature",
            text(
                "%d of %d nodes of zone '%s' lie outside the data, by up to %.3g mm; they take the"
                    + " nearest value",
                c.extrapolatedNodes(), c.nodes(), c.zone(), 1e3 * c.farthestOutside()),
            "look whether the data cover the zone, and whether axis and unit are right");
      }
    }
    caseFile
        .gas()
        .zones()
        .forEach(
            (name, zone) -> {
              if (Gas.temperature(zone) instanceof Gas.FromFile f && f.meanSpread() > SPREAD) {
                caution(
                    "gas.zones." + name + ".temperature",
                    text(
                        "averaged over the angle or the gap: sound speeds of waves along and across"
                            + " it differ by %.2g %% on the mean",
                        100 * f.meanSpread()),
                    "frequencies of this zone are uncertain by up to that much");
              }
            });
  }

  private void mixtures() {
    caseFile
        .gas()
        .zones()
        .forEach(
            (name, zone) -> {
              if (zone instanceof Gas.Mixed m
                  && m.temperature() instanceof Gas.Adiabatic a
                  && m.mixture() instanceof Gas.BurntFuel burnt
                  && burnt.progress() == 1) {
                Combustion c = CaseGas.combustion(burnt);
                Dissociation d =
                    Dissociation.estimate(
                        c, a.fuelTemperature(), a.airTemperature(), caseFile.gas().meanPressure());
                if (Math.abs(d.soundSpeedChange()) > 2e-3) {
                  caution(
                      "gas.zones." + name + ".mixture",
                      text(
                          "dissociation is left out: with it the sound speed of zone '%s' would be"
                              + " %.2g %% lower",
                          name, -100 * d.soundSpeedChange()),
                      "give the temperature yourself where that matters");
                }
              }
            });
  }

  private void flames() {
    for (Flame flame : caseFile.flames()) {
      String key = "flames." + flame.name();
      if (flame.response() instanceof Flame.Measured m) {
        FittedResponse fit = (FittedResponse) CaseFlames.response(m);
        table(key + ".response", m.table().highestFrequency());
        if (fit.fitError() > CaseFlames.FIT) {
          caution(
              key + ".response",
              text(
                  "the fit of the table misses it by up to %.2g %% of its largest gain",
                  100 * fit.fitError()),
              "look at the drawn fit and leave outliers out; gain and phase that do not belong together"
                  + " (an answer before its cause) cannot be fitted");
        }
      }
      flame
          .fuelFlow()
          .ifPresent(
              flow -> {
                for (Gas.ZoneGas zone : caseFile.gas().zones().values()) {
                  if (zone instanceof Gas.Mixed g && g.mixture() instanceof Gas.BurntFuel burnt) {
                    heat(
                        key,
                        flame,
                        HeatReleaseCheck.of(flame.heatRelease(), flow, CaseGas.blend(burnt)));
                    return;
                  }
                }
                caution(
                    key + ".fuel_flow",
                    "no zone says which fuel it is: the heat release cannot be checked",
                    "give the burnt zone a 'mixture'");
              });
      double mach = flame.referenceVelocity() / soundSpeed(flame);
      if (mach > LARGE_MACH) {
        caution(
            key + ".reference_velocity",
            text(
                "Mach number %.2g at the reference, and the gas is taken at rest: frequencies are off"
                    + " by about %.2g %% (M²)",
                mach, 100 * mach * mach),
            "bear it in mind; convected waves are not in the model");
      }
    }
  }

  private void heat(String key, Flame flame, HeatReleaseCheck check) {
    if (Math.abs(check.relativeDifference()) > HEAT) {
      caution(
          key + ".heat_release",
          text(
              "%.4g MW, but the fuel flow of %.4g kg/s gives %.4g MW (lower heating value)",
              1e-6 * check.stated(), flame.fuelFlow().orElse(0), 1e-6 * check.fromFuel()),
          "heat release and fuel flow are those of all burners together");
    }
  }

  /** Sound speed where the flame listens, or of the slowest zone. */
  private double soundSpeed(Flame flame) {
    String zone =
        flame.reference() instanceof Flame.EdgeFlux e
            ? e.flowFrom()
            : flame.reference() instanceof Flame.Patch p ? p.zone() : "";
    return gas.coverage().stream()
        .filter(c -> c.zone().equals(zone))
        .mapToDouble(c -> c.soundSpeed().mean())
        .findFirst()
        .orElse(Double.POSITIVE_INFINITY);
  }

  private void table(String key, double end) {
    double top = caseFile.window().highestFrequency();
    if (end < top) {
      caution(
          key,
          text(
              "the table ends at %.4g Hz, inside the window (to %.4g Hz); beyond it the fit is"
                  + " extrapolated",
              end, top),
          "measure further, or lower the window");
    }
  }

  private void walls() {
    caseFile
        .walls()
        .forEach(
            (name, wall) -> {
              if (wall instanceof Wall.Tabulated t) {
                table("walls." + name, t.table().highestFrequency());
                fit(name, CaseWalls.fitted(t));
              }
              if (wall instanceof Wall.ChokedNozzle n && azimuthal()) {
                caution(
                    "walls." + name,
                    text(
                        "the choked nozzle is a plane-wave result; for azimuthal modes it is an"
                            + " approximation (Mach %.2g)",
                        n.mach()),
                    "compare with an impedance measured or computed for these modes");
              }
            });
  }

  private boolean azimuthal() {
    return caseFile.geometry() instanceof Geometry.Ring
        || caseFile.azimuthalOrders().stream().anyMatch(m -> m > 0);
  }

  private void fit(String name, FittedWall wall) {
    if (wall.fitError() > CaseWalls.FIT) {
      caution(
          "walls." + name,
          text("the fit of the table misses it by up to %.2g in reflection", wall.fitError()),
          "look at the drawn fit and leave outliers out; gain and phase that do not belong together"
              + " (an answer before its cause) cannot be fitted");
    }
    if (!wall.passive()) {
      caution(
          "walls." + name,
          text(
              "the fitted wall reflects %.4g times what it gets at %.4g Hz: it feeds energy into the"
                  + " gas",
              wall.largestReflection(), wall.frequencyOfLargest()),
          "check the table; the normal points out of the gas");
    }
  }

  private void twoPorts() {
    for (TwoPort port : caseFile.twoPorts()) {
      double c =
          gas.coverage().stream()
              .filter(z -> z.zone().equals(port.flowFrom()))
              .mapToDouble(z -> z.soundSpeed().mean())
              .findFirst()
              .orElse(Double.POSITIVE_INFINITY);
      if (port.special().isPresent()
          && port.special().get() instanceof TwoPort.Transfer t
          && CaseTwoPorts.measured(t).passivity(caseFile.window().highestFrequency()) < -0.01) {
        caution(
            "two_ports." + port.edge(),
            "the fitted matrix feeds energy into the gas at some frequency of the window",
            "check the table, and which side is side 1");
      }
      double mach = port.velocity() / c;
      if (mach > LARGE_MACH) {
        caution(
            "two_ports." + port.edge() + ".velocity",
            text(
                "Mach number %.2g in the loss: a compact loss without convection is off by about that"
                    + " part",
                mach),
            "bear it in mind");
      }
    }
  }

  private void dampers() {
    double top = caseFile.window().highestFrequency();
    for (Damper damper : caseFile.dampers()) {
      double c = gas.coverage().stream().mapToDouble(z -> z.soundSpeed().least()).min().orElse(1);
      double size = CaseDampers.mouthWidth(damper);
      double kw = 2 * Math.PI * top / c * size;
      if (kw > 1) {
        caution(
            "dampers." + damper.name(),
            text(
                "a mouth %.3g mm wide is not small against the wavelength at %.4g Hz (kw = %.2g)",
                1e3 * size, top, kw),
            "give it as a wall, or as several dampers");
      }
    }
  }
}
