package org.annulet.post.meaning;

import java.util.Arrays;
import java.util.List;
import org.annulet.mesher.mesh.Mesh;
import org.apache.commons.math3.complex.Complex;

/**
 * Where something could be done about a mode, and where it is driven; at the nodes of the mesh.
 *
 * <pre>
 *   damper:  dσ/dA = Re( − s y l p / (ρc Λ) )      y = 1,  Λ = qᵀL′(s)p over the whole chamber
 *   drive:   σ_flames = ∫ r dV
 * </pre>
 *
 * <p>The damper is small, its specific admittance y = ρc/Z is 1 (all sound that falls on it is
 * taken), its area is spread over the places that are alike: round a section, over all burner cells
 * of a ring; of a pair it is the mean of both members (a damper at one place acts on one member
 * with twice that and leaves the other alone). First order in the area: for another y multiply by
 * its real part, as long as the damper's own reactance is tuned away.
 *
 * @param damper dσ/dA in 1/(s m²), negative where a damper damps; NaN where there is no wall
 * @param drive r, share of the growth rate per volume of gas in 1/(s m³), of all flames together
 *     (local Rayleigh index over the stored energy); a thin flame is smeared over the triangles it
 *     touches
 */
public record ModeMaps(double[] damper, double[] drive) {
  /**
   * Where a damper acts.
   *
   * @param chamber mesh and gas
   * @param s eigenvalue in 1/s
   * @param product l·p of left and right vector at the nodes, over Λ: real parts, imaginary parts,
   *     shape [2][nodes]
   * @return dσ/dA, shape [nodes], NaN where there is no wall
   */
  public static double[] damper(Chamber chamber, Complex s, double[][] product) {
    Mesh mesh = chamber.mesh();
    double[] area = new double[mesh.nodeCount()];
    double[] impedance = new double[mesh.nodeCount()];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      double rc = Math.sqrt(chamber.density(t) * chamber.bulkModulus(t));
      for (int k = 0; k < 3; k++) {
        area[mesh.corner(t, k)] += mesh.area(t);
        impedance[mesh.corner(t, k)] += mesh.area(t) * rc;
      }
    }
    boolean[] wall = walls(chamber);
    double[] out = new double[mesh.nodeCount()];
    for (int v = 0; v < out.length; v++) {
      Complex lp = new Complex(product[0][v], product[1][v]);
      out[v] = wall[v] ? -s.multiply(lp).getReal() * area[v] / impedance[v] : Double.NaN;
    }
    return out;
  }

  /**
   * Whether a node lies at a wall: on the boundary of the mesh, and everywhere on a ring's faces.
   */
  static boolean[] walls(Chamber chamber) {
    Mesh mesh = chamber.mesh();
    boolean[] wall = new boolean[mesh.nodeCount()];
    Arrays.fill(wall, chamber.kind() == GeometryKind.RING);
    for (int e = 0; e < mesh.segmentCount(); e++) {
      if (mesh.segmentRight(e) < 0) {
        wall[mesh.segmentStart(e)] = true;
        wall[mesh.segmentEnd(e)] = true;
      }
    }
    return wall;
  }

  /**
   * Where the flames drive.
   *
   * @param chamber mesh, gas and thickness
   * @param share Re(p̂* (load density)) share of the growth rate per unit of ∫dV/(γp̄), at the
   *     nodes
   * @return r, shape [nodes]
   */
  public static double[] drive(Chamber chamber, double[] share) {
    Mesh mesh = chamber.mesh();
    double[] volume = new double[share.length];
    double[] compliance = new double[share.length];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      double v = nodeVolume(chamber, t);
      for (int k = 0; k < 3; k++) {
        volume[mesh.corner(t, k)] += v;
        compliance[mesh.corner(t, k)] += v / chamber.bulkModulus(t);
      }
    }
    double[] out = new double[share.length];
    for (int v = 0; v < out.length; v++) {
      out[v] = share[v] * compliance[v] / volume[v];
    }
    return out;
  }

  /** ∫ r dV over the chamber, in 1/s. */
  public double totalDrive(Chamber chamber) {
    Mesh mesh = chamber.mesh();
    double sum = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      for (int k = 0; k < 3; k++) {
        sum += nodeVolume(chamber, t) * drive[mesh.corner(t, k)];
      }
    }
    return sum;
  }

  private static double nodeVolume(Chamber chamber, int t) {
    Mesh mesh = chamber.mesh();
    return mesh.area(t) * chamber.thickness(t) * chamber.arcScale(mesh.zone(t)) / 3;
  }

  /** Node where a damper damps most, the first of equals; −1 where there is no wall. */
  public static int best(double[] damper) {
    int best = -1;
    for (int v = 0; v < damper.length; v++) {
      if (!Double.isNaN(damper[v])
          && (best < 0 || damper[v] < damper[best] - 1e-6 * Math.abs(damper[best]))) {
        best = v;
      }
    }
    return best;
  }

  /**
   * The worst of several modes at each node: the largest dσ/dA, so that where it is lowest a damper
   * serves all of them at least that well.
   *
   * @param all at least one
   */
  public static double[] worst(List<ModeMaps> all) {
    double[] out = all.get(0).damper.clone();
    for (ModeMaps m : all) {
      for (int v = 0; v < out.length; v++) {
        out[v] = Math.max(out[v], m.damper[v]); // NaN stays
      }
    }
    return out;
  }
}
