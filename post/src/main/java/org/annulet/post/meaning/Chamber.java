package org.annulet.post.meaning;

import java.util.Arrays;
import java.util.Set;
import org.annulet.mesher.mesh.Mesh;

/**
 * The gas volume the modes live in, as far as their meaning needs it: mesh, kind of geometry, and
 * thickness, density and bulk modulus of each triangle. Immutable.
 *
 * <p>A fresh one has uniform gas; shares of energy need only ratios, velocities need the true
 * density ({@link #withGas}).
 */
public final class Chamber {
  private final GeometryKind kind;
  private final Mesh mesh;
  private final double[] zoneRadius;
  private final double[] thickness;
  private final double[] density;
  private final double[] bulkModulus;
  private final boolean[] separate;

  private Chamber(
      GeometryKind kind, Mesh mesh, double[] zoneRadius, double[][] perTriangle, boolean[] sep) {
    this.kind = kind;
    this.mesh = mesh;
    this.zoneRadius = zoneRadius;
    this.thickness = perTriangle[0];
    this.density = perTriangle[1];
    this.bulkModulus = perTriangle[2];
    this.separate = sep;
    for (double[] a : perTriangle) {
      if (a.length != mesh.triangleCount()) {
        throw new IllegalArgumentException(
            "expected one value for each of "
                + mesh.triangleCount()
                + " triangles, got "
                + a.length);
      }
    }
  }

  private static Chamber of(GeometryKind kind, Mesh mesh, double[] zoneRadius) {
    double[] thickness = new double[mesh.triangleCount()];
    for (int t = 0; t < thickness.length; t++) {
      thickness[t] =
          kind == GeometryKind.SECTION
              ? 2 * Math.PI * (mesh.cornerY(t, 0) + mesh.cornerY(t, 1) + mesh.cornerY(t, 2)) / 3
              : 1;
    }
    double[] ones = new double[thickness.length];
    Arrays.fill(ones, 1);
    return new Chamber(
        kind,
        mesh,
        zoneRadius,
        new double[][] {thickness, ones, ones},
        new boolean[mesh.zoneNames().size()]);
  }

  /** An axisymmetric section, y being the radius in m. */
  public static Chamber section(Mesh mesh) {
    return of(GeometryKind.SECTION, mesh, new double[mesh.zoneNames().size()]);
  }

  /** A plane rig. */
  public static Chamber plane(Mesh mesh) {
    return of(GeometryKind.PLANE, mesh, new double[mesh.zoneNames().size()]);
  }

  /** A plane across the axis, the axis at the origin. */
  public static Chamber crossSection(Mesh mesh) {
    return of(GeometryKind.CROSS_SECTION, mesh, new double[mesh.zoneNames().size()]);
  }

  /**
   * A ring.
   *
   * @param mesh periodic; its period is 2π times the reference radius
   * @param zoneRadius mean radius of each zone in m, in the order of {@link Mesh#zoneNames()}
   */
  public static Chamber ring(Mesh mesh, double[] zoneRadius) {
    if (!(mesh.period() > 0)) {
      throw new IllegalArgumentException("a ring needs a periodic mesh; build it periodic");
    }
    if (zoneRadius.length != mesh.zoneNames().size()) {
      throw new IllegalArgumentException(
          "expected a radius for each zone of " + mesh.zoneNames() + ", got " + zoneRadius.length);
    }
    return of(GeometryKind.RING, mesh, zoneRadius.clone());
  }

  /**
   * The same with the true gas.
   *
   * @param density ρ of each triangle in kg/m³
   * @param bulkModulus γp̄ of each triangle in Pa
   */
  public Chamber withGas(double[] density, double[] bulkModulus) {
    return new Chamber(
        kind,
        mesh,
        zoneRadius,
        new double[][] {thickness, density.clone(), bulkModulus.clone()},
        separate);
  }

  /**
   * The same with the true thickness across the plane of the mesh: 2πr times the open share on a
   * section, the gap height on a ring, the depth of a rig.
   *
   * @param thickness of each triangle in m
   */
  public Chamber withThickness(double[] thickness) {
    return new Chamber(
        kind, mesh, zoneRadius, new double[][] {thickness.clone(), density, bulkModulus}, separate);
  }

  /** The same with zones that are separate ducts: no motion in azimuthal direction there. */
  public Chamber withSeparateDucts(Set<String> zones) {
    boolean[] sep = new boolean[separate.length];
    for (int z = 0; z < sep.length; z++) {
      sep[z] = zones.contains(mesh.zoneNames().get(z));
    }
    return new Chamber(
        kind, mesh, zoneRadius, new double[][] {thickness, density, bulkModulus}, sep);
  }

  /** What the coordinates mean. */
  public GeometryKind kind() {
    return kind;
  }

  /** The mesh. */
  public Mesh mesh() {
    return mesh;
  }

  /** Mean radius of zone {@code z} in m; 0 where the kind has none. */
  public double zoneRadius(int z) {
    return zoneRadius[z];
  }

  /** Mean radius of every zone in m, a copy. */
  public double[] zoneRadii() {
    return zoneRadius.clone();
  }

  /** ρ of triangle {@code t} in kg/m³. */
  public double density(int t) {
    return density[t];
  }

  /** γp̄ of triangle {@code t} in Pa. */
  public double bulkModulus(int t) {
    return bulkModulus[t];
  }

  /** Thickness of triangle {@code t} in m. */
  public double thickness(int t) {
    return thickness[t];
  }

  /** Whether zone {@code z} consists of separate ducts. */
  public boolean separateDucts(int z) {
    return separate[z];
  }

  /** True length of arc per unit of y in zone {@code z}: R_z/R₀ on a ring, else 1. */
  public double arcScale(int z) {
    return kind == GeometryKind.RING ? zoneRadius[z] * 2 * Math.PI / mesh.period() : 1;
  }
}
