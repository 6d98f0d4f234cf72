package org.annulet.cases.study;

import java.util.Comparator;
import java.util.stream.IntStream;
import org.annulet.cases.read.CaseFile;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.boundary.EdgeGas;
import org.annulet.solver.medium.Medium;

/** Mean gas of the ducts of a chain. */
final class ChainGas {
  private static final double EVEN = 1e-3;

  private final CaseFile c;
  private final CaseProblem problem;
  private final ChainLinks links;

  ChainGas(CaseFile c, CaseProblem problem, ChainLinks links) {
    this.c = c;
    this.problem = problem;
    this.links = links;
  }

  /** Mean gas of a zone. */
  EdgeGas whole(int z) {
    return mean(z, Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY);
  }

  /** (γ−1)/(γp̄) of a zone. */
  double expansion(int z) {
    double gamma = whole(z).gamma();
    return (gamma - 1) / (gamma * c.gas().meanPressure());
  }

  /** First coordinate of a triangle's centroid. */
  static double centre(Mesh mesh, int t) {
    return (mesh.cornerX(t, 0) + mesh.cornerX(t, 1) + mesh.cornerX(t, 2)) / 3;
  }

  /** Whether the gas of a zone is the same everywhere. */
  boolean even(int z) {
    Mesh mesh = problem.shape().mesh();
    Medium medium = problem.medium();
    int zone = mesh.zoneNames().indexOf(links.links().get(z).zone());
    double[] speeds =
        IntStream.range(0, mesh.triangleCount())
            .filter(t -> mesh.zone(t) == zone)
            .mapToDouble(medium::soundSpeed)
            .toArray();
    double low = java.util.Arrays.stream(speeds).min().orElse(1);
    double high = java.util.Arrays.stream(speeds).max().orElse(1);
    return high - low < EVEN * low;
  }

  /** Mean gas of a zone between two places: travel time and compressibility are kept. */
  EdgeGas mean(int z, double from, double to) {
    Mesh mesh = problem.shape().mesh();
    Medium medium = problem.medium();
    int zone = mesh.zoneNames().indexOf(links.links().get(z).zone());
    double area = 0;
    double time = 0;
    double soft = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      if (mesh.zone(t) == zone && centre(mesh, t) >= from && centre(mesh, t) <= to) {
        area += mesh.area(t);
        time += mesh.area(t) / medium.soundSpeed(t);
        soft += mesh.area(t) / medium.bulkModulus(t);
      }
    }
    if (area == 0) { // a slice thinner than the triangles
      double middle = 0.5 * (from + to);
      int t =
          IntStream.range(0, mesh.triangleCount())
              .filter(i -> mesh.zone(i) == zone)
              .boxed()
              .min(Comparator.comparingDouble(i -> Math.abs(centre(mesh, i) - middle)))
              .orElseThrow();
      area = 1;
      time = 1 / medium.soundSpeed(t);
      soft = 1 / medium.bulkModulus(t);
    }
    double speed = area / time;
    double bulk = area / soft;
    return new EdgeGas(bulk / (speed * speed), speed, bulk / c.gas().meanPressure());
  }
}
