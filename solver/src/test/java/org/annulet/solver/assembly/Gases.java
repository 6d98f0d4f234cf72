package org.annulet.solver.assembly;

import java.util.LinkedHashMap;
import java.util.Map;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.flame.Firing;
import org.annulet.solver.flame.NTau;
import org.annulet.solver.medium.Medium;
import org.annulet.solver.medium.UniformGas;

/** Gas with γ = 1.4 at one bar throughout, so ρc² is uniform; sound speed by zone. */
final class Gases {
  static final double PRESSURE = 1e5;
  static final double GAMMA = 1.4;

  private Gases() {}

  /** Zone "0" with the first sound speed, "1" with the second … */
  static Medium of(Mesh mesh, double... soundSpeed) {
    Map<String, UniformGas> zones = new LinkedHashMap<>();
    for (String name : mesh.zoneNames()) {
      double c = soundSpeed[Math.min(Integer.parseInt(name), soundSpeed.length - 1)];
      zones.put(name, new UniformGas(GAMMA * PRESSURE / (c * c), c));
    }
    return Medium.zonewise(mesh, PRESSURE, zones);
  }

  /**
   * A firing with u₂ = (1 + N e^{−sτ}) u₁ across a compact flame.
   *
   * @param jump N
   * @param areaTimesVelocity A ū in m³/s
   */
  static Firing firing(double jump, double delay, double areaTimesVelocity) {
    double heat = GAMMA * PRESSURE / (GAMMA - 1) * areaTimesVelocity;
    return new Firing(heat, new NTau(jump, delay));
  }
}
