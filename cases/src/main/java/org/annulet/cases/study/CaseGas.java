package org.annulet.cases.study;

import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import org.annulet.cases.read.CaseFaultException;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.Gas.AlongAxis;
import org.annulet.cases.read.Gas.BurntFuel;
import org.annulet.cases.read.Gas.Given;
import org.annulet.cases.read.Gas.Mixed;
import org.annulet.cases.read.Gas.Perfect;
import org.annulet.cases.read.Gas.Temperature;
import org.annulet.cases.read.Gas.Uniform;
import org.annulet.cases.read.Gas.ZoneGas;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.medium.Air;
import org.annulet.solver.medium.Combustion;
import org.annulet.solver.medium.FuelBlend;
import org.annulet.solver.medium.FuelComponent;
import org.annulet.solver.medium.Gas;
import org.annulet.solver.medium.Medium;
import org.annulet.solver.medium.PerfectGas;
import org.annulet.solver.medium.UniformGas;

/** The gas of a case on the triangles of a mesh. */
final class CaseGas {
  private final CaseFile caseFile;

  CaseGas(CaseFile caseFile) {
    this.caseFile = caseFile;
  }

  /**
   * Density and sound speed of each triangle of {@code mesh}.
   *
   * @throws CaseFaultException if the gas of a zone cannot be as stated
   */
  Medium on(Mesh mesh) {
    double[] density = new double[mesh.triangleCount()];
    double[] soundSpeed = new double[mesh.triangleCount()];
    double p = caseFile.gas().meanPressure();
    for (int z = 0; z < mesh.zoneNames().size(); z++) {
      String name = mesh.zoneNames().get(z);
      ZoneGas stated = caseFile.gas().zones().get(name);
      try {
        Gas gas = gas(stated);
        for (int t = 0; t < density.length; t++) {
          if (mesh.zone(t) == z) {
            double x = (mesh.cornerX(t, 0) + mesh.cornerX(t, 1) + mesh.cornerX(t, 2)) / 3;
            double kelvin = temperature(name, stated, x);
            density[t] = gas.density(kelvin, p);
            soundSpeed[t] = gas.soundSpeed(kelvin, p);
          }
        }
      } catch (IllegalArgumentException e) {
        if (e instanceof CaseFaultException fault) {
          throw fault;
        }
        throw fault(name, e.getMessage(), "check temperature, composition and mean pressure");
      }
    }
    return Medium.of(p, density, soundSpeed);
  }

  private CaseFaultException fault(String zone, String what, String mend) {
    return new CaseFaultException(
        List.of(caseFile.source().problem("gas.zones." + zone, what, mend)));
  }

  private static Gas gas(ZoneGas stated) {
    if (stated instanceof Perfect g) {
      return new PerfectGas(g.gasConstant(), g.gamma());
    }
    if (stated instanceof Given g) {
      return new UniformGas(g.density(), g.soundSpeed());
    }
    if (((Mixed) stated).mixture() instanceof BurntFuel burnt) {
      Map<FuelComponent, Double> moles = new EnumMap<>(FuelComponent.class);
      burnt.fuel().forEach((name, share) -> moles.put(FuelComponent.named(name), share));
      return new Combustion(FuelBlend.ofMoles(moles), Air.dry(), burnt.equivalenceRatio())
          .products();
    }
    return Air.dry();
  }

  private double temperature(String zone, ZoneGas stated, double x) {
    if (stated instanceof Given) {
      return Double.NaN;
    }
    Temperature t = stated instanceof Perfect g ? g.temperature() : ((Mixed) stated).temperature();
    if (t instanceof Uniform u) {
      return u.kelvin();
    }
    if (t instanceof AlongAxis a) {
      return interpolate(a.x(), a.kelvin(), x);
    }
    throw fault(
        zone,
        "a temperature field from a file cannot be used in this version",
        "give one temperature or a profile along x");
  }

  private static double interpolate(List<Double> x, List<Double> y, double at) {
    int last = x.size() - 1;
    if (at <= x.get(0)) {
      return y.get(0);
    }
    for (int i = 1; i <= last; i++) {
      if (at <= x.get(i)) {
        double part = (at - x.get(i - 1)) / (x.get(i) - x.get(i - 1));
        return y.get(i - 1) + part * (y.get(i) - y.get(i - 1));
      }
    }
    return y.get(last);
  }
}
