package org.annulet.cases.study;

import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.annulet.cases.read.CaseFaultException;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.Gas.Adiabatic;
import org.annulet.cases.read.Gas.AlongAxis;
import org.annulet.cases.read.Gas.AlongPath;
import org.annulet.cases.read.Gas.BurntFuel;
import org.annulet.cases.read.Gas.FromFile;
import org.annulet.cases.read.Gas.Given;
import org.annulet.cases.read.Gas.Mixed;
import org.annulet.cases.read.Gas.Perfect;
import org.annulet.cases.read.Gas.Temperature;
import org.annulet.cases.read.Gas.Uniform;
import org.annulet.cases.read.Gas.ZoneGas;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.medium.Air;
import org.annulet.solver.medium.AxialProfile;
import org.annulet.solver.medium.Combustion;
import org.annulet.solver.medium.FuelBlend;
import org.annulet.solver.medium.FuelComponent;
import org.annulet.solver.medium.Gas;
import org.annulet.solver.medium.MappedMedium;
import org.annulet.solver.medium.Medium;
import org.annulet.solver.medium.Mixture;
import org.annulet.solver.medium.PathProfile;
import org.annulet.solver.medium.PerfectGas;
import org.annulet.solver.medium.TemperatureField;
import org.annulet.solver.medium.UniformGas;
import org.annulet.solver.medium.UniformTemperature;

/** The gas of a case on the triangles of a mesh. */
final class CaseGas {
  /** Stands for the temperature of a gas whose sound speed and density are given. */
  private static final double ANY = 300;

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
    return mapped(mesh).medium();
  }

  /**
   * The same with temperatures and how well fields from files cover the zones.
   *
   * @throws CaseFaultException if the gas of a zone cannot be as stated
   */
  MappedMedium mapped(Mesh mesh) {
    Map<String, org.annulet.solver.medium.ZoneGas> zones = new LinkedHashMap<>();
    for (String name : mesh.zoneNames()) {
      ZoneGas stated = caseFile.gas().zones().get(name);
      try {
        zones.put(name, new org.annulet.solver.medium.ZoneGas(gas(stated), temperature(stated)));
      } catch (IllegalArgumentException e) {
        throw fault(name, e);
      }
    }
    try {
      return MappedMedium.of(mesh, caseFile.gas().meanPressure(), zones);
    } catch (IllegalArgumentException e) {
      String named =
          mesh.zoneNames().stream()
              .filter(z -> String.valueOf(e.getMessage()).contains("'" + z + "'"))
              .findFirst()
              .orElse(mesh.zoneNames().get(0));
      throw fault(named, e);
    }
  }

  private CaseFaultException fault(String zone, IllegalArgumentException e) {
    return new CaseFaultException(
        List.of(
            caseFile
                .source()
                .problem(
                    "gas.zones." + zone,
                    e.getMessage(),
                    "check temperature, composition and mean pressure")));
  }

  private static Gas gas(ZoneGas stated) {
    if (stated instanceof Perfect g) {
      return new PerfectGas(g.gasConstant(), g.gamma());
    }
    if (stated instanceof Given g) {
      return new UniformGas(g.density(), g.soundSpeed());
    }
    return ((Mixed) stated).mixture() instanceof BurntFuel burnt
        ? combustion(burnt).partlyBurnt(burnt.progress())
        : air((org.annulet.cases.read.Gas.Air) ((Mixed) stated).mixture());
  }

  /** The combustion a mixture comes from. */
  static Combustion combustion(BurntFuel burnt) {
    return new Combustion(blend(burnt), air(burnt.air()), burnt.equivalenceRatio());
  }

  /** The fuel of a mixture. */
  static FuelBlend blend(BurntFuel burnt) {
    Map<FuelComponent, Double> moles = new EnumMap<>(FuelComponent.class);
    burnt.fuel().forEach((name, share) -> moles.put(FuelComponent.named(name), share));
    return FuelBlend.ofMoles(moles);
  }

  private static Mixture air(org.annulet.cases.read.Gas.Air air) {
    return air.humidity()
        .map(h -> Air.humid(h.relative(), h.temperature(), h.pressure()))
        .orElseGet(Air::dry);
  }

  private static TemperatureField temperature(ZoneGas stated) {
    if (stated instanceof Given) {
      return new UniformTemperature(ANY);
    }
    Temperature t = stated instanceof Perfect g ? g.temperature() : ((Mixed) stated).temperature();
    if (t instanceof Uniform u) {
      return new UniformTemperature(u.kelvin());
    }
    if (t instanceof AlongAxis a) {
      return new AxialProfile(array(a.x()), array(a.kelvin()));
    }
    if (t instanceof AlongPath p) {
      return new PathProfile(array(p.x()), array(p.y()), array(p.distance()), array(p.kelvin()));
    }
    if (t instanceof Adiabatic a) {
      BurntFuel burnt = (BurntFuel) ((Mixed) stated).mixture();
      return new UniformTemperature(
          combustion(burnt)
              .adiabaticTemperature(burnt.progress(), a.fuelTemperature(), a.airTemperature()));
    }
    return ((FromFile) t).field();
  }

  private static double[] array(List<Double> values) {
    return values.stream().mapToDouble(Double::doubleValue).toArray();
  }
}
