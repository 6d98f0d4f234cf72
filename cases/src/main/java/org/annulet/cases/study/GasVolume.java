package org.annulet.cases.study;

import java.util.Map;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.meaning.Chamber;
import org.annulet.post.meaning.GeometryKind;
import org.annulet.solver.assembly.CrossSection;
import org.annulet.solver.assembly.Geometry;
import org.annulet.solver.assembly.Ring;
import org.annulet.solver.assembly.Section;

/** The gas volume of a problem, handed on to labels, files and report. */
final class GasVolume {
  private GasVolume() {}

  /** What the coordinates of a geometry mean. */
  static GeometryKind kind(Geometry geometry) {
    if (geometry instanceof Ring) {
      return GeometryKind.RING;
    }
    if (geometry instanceof Section) {
      return GeometryKind.SECTION;
    }
    return geometry instanceof CrossSection ? GeometryKind.CROSS_SECTION : GeometryKind.PLANE;
  }

  /** Mesh, gas and thickness of a problem, as labels and pictures need them. */
  static Chamber of(CaseProblem problem) {
    Mesh mesh = problem.shape().mesh();
    int triangles = mesh.triangleCount();
    double[] density = new double[triangles];
    double[] bulk = new double[triangles];
    double[] thickness = new double[triangles];
    for (int t = 0; t < triangles; t++) {
      density[t] = problem.medium().density(t);
      bulk[t] = problem.medium().bulkModulus(t);
    }
    if (problem.shape().geometry() instanceof Ring ring) {
      double[] radius = new double[mesh.zoneNames().size()];
      for (int z = 0; z < radius.length; z++) {
        radius[z] = ring.zones().get(mesh.zoneNames().get(z)).meanRadius();
      }
      for (int t = 0; t < triangles; t++) {
        thickness[t] = ring.zones().get(mesh.zoneNames().get(mesh.zone(t))).gap();
      }
      return Chamber.ring(mesh, radius).withThickness(thickness).withGas(density, bulk);
    }
    if (problem.shape().geometry() instanceof Section section) {
      Map<String, Section.Ducts> ducts = section.ducts();
      for (int t = 0; t < triangles; t++) {
        Section.Ducts d = ducts.get(mesh.zoneNames().get(mesh.zone(t)));
        double r = (mesh.cornerY(t, 0) + mesh.cornerY(t, 1) + mesh.cornerY(t, 2)) / 3;
        thickness[t] = 2 * Math.PI * r * (d == null ? 1 : d.openShare());
      }
      return Chamber.section(mesh)
          .withThickness(thickness)
          .withSeparateDucts(ducts.keySet())
          .withGas(density, bulk);
    }
    Chamber flat =
        problem.shape().geometry() instanceof CrossSection
            ? Chamber.crossSection(mesh)
            : Chamber.plane(mesh);
    return flat.withGas(density, bulk);
  }
}
