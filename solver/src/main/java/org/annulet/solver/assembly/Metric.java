package org.annulet.solver.assembly;

import java.util.List;
import org.annulet.mesher.mesh.Mesh;

/**
 * Weights of a geometry on a mesh: how much area and length of the mesh count, and how steep its y
 * is.
 */
final class Metric {
  private final Mesh mesh;
  private final Geometry geometry;
  private final double[] weight;
  private final double[] arcScale;
  private final double[] crossTerm;
  private final double[][] faceWeight;
  private final double axisTolerance;

  /**
   * @throws IllegalArgumentException if geometry and mesh do not belong together
   */
  Metric(Mesh mesh, Geometry geometry) {
    this.mesh = mesh;
    this.geometry = geometry;
    List<String> names = mesh.zoneNames();
    weight = new double[names.size()];
    arcScale = new double[names.size()];
    crossTerm = new double[names.size()];
    faceWeight = new double[2][names.size()];
    for (int z = 0; z < names.size(); z++) {
      arcScale[z] = 1;
      if (geometry instanceof Section section) {
        Section.Ducts ducts = section.ducts().get(names.get(z));
        weight[z] = 2 * Math.PI * (ducts == null ? 1 : ducts.openShare());
        crossTerm[z] = ducts == null ? 1 : 0;
      } else if (geometry instanceof Ring ring) {
        Ring.Annulus zone = ring.zones().get(names.get(z));
        if (zone == null) {
          throw new IllegalArgumentException(
              "zone '" + names.get(z) + "' of the ring has no mean radius and gap");
        }
        arcScale[z] = zone.meanRadius() / ring.unrolledRadius();
        weight[z] = zone.gap() * arcScale[z];
        for (Face face : Face.values()) {
          faceWeight[face.ordinal()][z] = face.radius(zone) / ring.unrolledRadius();
        }
      } else if (geometry instanceof CrossSection) {
        weight[z] = 1;
        crossTerm[z] = 1;
      } else if (geometry instanceof Plane plane) {
        weight[z] = plane.depth();
      }
    }
    double largest = 0;
    for (int v = 0; v < mesh.nodeCount(); v++) {
      largest = Math.max(largest, mesh.y(v));
    }
    axisTolerance = 1e-9 * largest; // far below any mesh size, far above rounding
    check();
  }

  private void check() {
    if (geometry instanceof Section section) {
      for (String name : section.ducts().keySet()) {
        if (!mesh.zoneNames().contains(name)) {
          throw new IllegalArgumentException(
              "separate ducts in zone '"
                  + name
                  + "', which the mesh has not; zones are "
                  + mesh.zoneNames());
        }
      }
      for (int v = 0; v < mesh.nodeCount(); v++) {
        if (mesh.y(v) < -axisTolerance) {
          throw new IllegalArgumentException(
              "a section lies in r ≥ 0, but there is a node at r = " + mesh.y(v) + " m");
        }
      }
    }
    if (geometry instanceof Ring ring && mesh.period() > 0) {
      double round = 2 * Math.PI * ring.unrolledRadius();
      if (Math.abs(mesh.period() - round) > 1e-9 * round) {
        throw new IllegalArgumentException(
            "the mesh closes after "
                + mesh.period()
                + " m, but 2π times the unrolled radius is "
                + round
                + " m");
      }
    }
  }

  Mesh mesh() {
    return mesh;
  }

  Geometry geometry() {
    return geometry;
  }

  boolean isSection() {
    return geometry instanceof Section;
  }

  /** Weight of an area element dx dy of triangle t at height y. */
  double area(int t, double y) {
    double w = weight[mesh.zone(t)];
    return isSection() ? w * y : w;
  }

  /** True length over mesh length in the y direction on triangle t. */
  double arcScale(int t) {
    return arcScale[mesh.zone(t)];
  }

  /** Coefficient of (order)² φφ in the stiffness at height y of triangle t, before the weight. */
  double crossTerm(int t, double y) {
    double factor = crossTerm[mesh.zone(t)];
    return isSection() && factor != 0 ? factor / (y * y) : factor;
  }

  /** Weight of a true length element of a segment on triangle t at height y. */
  double length(int t, double y) {
    return area(t, y) / arcScale(t);
  }

  /** True length of segment e seen from triangle t in m. */
  double segmentLength(int e, int t) {
    double dx = mesh.x(mesh.segmentEnd(e)) - mesh.x(mesh.segmentStart(e));
    double flat = mesh.segmentLength(e);
    double dy2 = Math.max(0, flat * flat - dx * dx);
    double scale = arcScale(t);
    return Math.sqrt(dx * dx + scale * scale * dy2);
  }

  /** Weight of an area element dx dy of triangle t on a face of a ring. */
  double face(int t, Face face) {
    return faceWeight[face.ordinal()][mesh.zone(t)];
  }

  /** The squared order or wavenumber that multiplies the cross stiffness. */
  double crossFactor() {
    if (geometry instanceof Section section) {
      return (double) section.order() * section.order();
    }
    if (geometry instanceof CrossSection cross) {
      return cross.axialWavenumber() * cross.axialWavenumber();
    }
    return 0;
  }

  /** Whether node v lies on the axis of a section. */
  boolean onAxis(int v) {
    return isSection() && mesh.y(v) <= axisTolerance;
  }

  /** Whether the section reaches the axis. */
  boolean reachesAxis() {
    for (int v = 0; v < mesh.nodeCount(); v++) {
      if (onAxis(v)) {
        return true;
      }
    }
    return false;
  }
}
