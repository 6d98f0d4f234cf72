package org.annulet.solver.medium;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.stream.IntStream;
import org.annulet.mesher.mesh.Mesh;

/**
 * Gases and temperature fields mapped onto a mesh: the medium, the temperature of each triangle and
 * the coverage of each zone. Immutable.
 *
 * <p>Each triangle takes c = 1/mean(1/c), γ = 1/mean(1/γ) and ρ = γp̄/c² ({@code TravelTimeMean}),
 * so that Σ area/c over the mesh is ∫ dA/c of the field, the mean acoustic travel time. A triangle
 * belongs to one zone; nothing is mixed across zones.
 */
public final class MappedMedium {
  private final Medium medium;
  private final double[] temperature;
  private final List<Coverage> coverage;

  private MappedMedium(Medium medium, double[] temperature, List<Coverage> coverage) {
    this.medium = medium;
    this.temperature = temperature;
    this.coverage = List.copyOf(coverage);
  }

  /**
   * Maps fields onto a mesh.
   *
   * @param mesh whose zones are filled
   * @param meanPressure p̄ in Pa, positive
   * @param zones gas and temperature by zone name; every zone of the mesh must be there
   * @throws IllegalArgumentException if a zone has no gas, a name is no zone of the mesh, or a
   *     temperature lies outside the gas data, with zone and place
   */
  public static MappedMedium of(Mesh mesh, double meanPressure, Map<String, ZoneGas> zones) {
    Medium.requirePositive("mean pressure", meanPressure, "Pa");
    for (String name : zones.keySet()) {
      if (!mesh.zoneNames().contains(name)) {
        throw new IllegalArgumentException(
            "gas for zone '" + name + "', which the mesh has not; zones are " + mesh.zoneNames());
      }
    }
    List<ZoneGas> gases = new ArrayList<>();
    for (String name : mesh.zoneNames()) {
      ZoneGas gas = zones.get(name);
      if (gas == null) {
        throw new IllegalArgumentException("zone '" + name + "' has no gas; give it one");
      }
      gases.add(gas);
    }
    Survey[] surveys = new Survey[gases.size()];
    for (int z = 0; z < surveys.length; z++) {
      surveys[z] = Survey.of(mesh, z, gases.get(z));
    }
    int n = mesh.triangleCount();
    double[] density = new double[n];
    double[] soundSpeed = new double[n];
    double[] temperature = new double[n];
    List<TravelTimeMean> means =
        gases.stream().map(g -> new TravelTimeMean(g, meanPressure)).toList();
    // Each triangle writes its own entries, so the order of the threads does not show.
    IntStream.range(0, n)
        .parallel()
        .forEach(
            t -> {
              double[] x = new double[3];
              double[] y = new double[3];
              for (int k = 0; k < 3; k++) {
                x[k] = mesh.cornerX(t, k);
                y[k] = mesh.cornerY(t, k);
              }
              double[] m = means.get(mesh.zone(t)).over(x, y);
              soundSpeed[t] = m[0];
              density[t] = m[1] * meanPressure / (m[0] * m[0]);
              temperature[t] = m[2];
            });
    List<Coverage> coverage = new ArrayList<>();
    for (int z = 0; z < surveys.length; z++) {
      coverage.add(surveys[z].coverage(mesh, z, temperature, soundSpeed));
    }
    return new MappedMedium(Medium.of(meanPressure, density, soundSpeed), temperature, coverage);
  }

  /** The medium the operator is built on. */
  public Medium medium() {
    return medium;
  }

  /** Mean temperature of triangle {@code t} in K. */
  public double temperature(int t) {
    return temperature[t];
  }

  /** Coverage of each zone, in the order of the mesh's zones. */
  public List<Coverage> coverage() {
    return coverage;
  }

  /** What the nodes of one zone see of its field. */
  private record Survey(int nodes, int outside, double farthest, double least, double largest) {
    static Survey of(Mesh mesh, int zone, ZoneGas gas) {
      boolean[] seen = new boolean[mesh.nodeCount()];
      int nodes = 0;
      int outside = 0;
      double farthest = 0;
      double least = Double.POSITIVE_INFINITY;
      double largest = Double.NEGATIVE_INFINITY;
      for (int t = 0; t < mesh.triangleCount(); t++) {
        for (int k = 0; k < 3; k++) {
          int v = mesh.corner(t, k);
          if (mesh.zone(t) != zone || seen[v]) {
            continue;
          }
          seen[v] = true;
          nodes++;
          double x = mesh.x(v);
          double y = mesh.y(v);
          double kelvin = gas.temperature().temperature(x, y);
          if (kelvin < gas.gas().lowestTemperature() || kelvin > gas.gas().highestTemperature()) {
            throw outOfRange(mesh.zoneNames().get(zone), gas.gas(), new double[] {x, y, kelvin});
          }
          least = Math.min(least, kelvin);
          largest = Math.max(largest, kelvin);
          double distance = gas.temperature().distanceOutside(x, y);
          if (distance > 0) {
            outside++;
            farthest = Math.max(farthest, distance);
          }
        }
      }
      return new Survey(nodes, outside, farthest, least, largest);
    }

    Coverage coverage(Mesh mesh, int zone, double[] temperature, double[] soundSpeed) {
      double area = 0;
      double heat = 0;
      double time = 0;
      double slowest = Double.POSITIVE_INFINITY;
      double fastest = 0;
      for (int t = 0; t < temperature.length; t++) {
        if (mesh.zone(t) == zone) {
          double a = mesh.area(t);
          area += a;
          heat += a * temperature[t];
          time += a / soundSpeed[t];
          slowest = Math.min(slowest, soundSpeed[t]);
          fastest = Math.max(fastest, soundSpeed[t]);
        }
      }
      return new Coverage(
          mesh.zoneNames().get(zone),
          nodes,
          outside,
          farthest,
          new Coverage.Range(least, heat / area, largest),
          new Coverage.Range(slowest, area / time, fastest));
    }

    private static IllegalArgumentException outOfRange(String zone, Gas gas, double[] at) {
      return new IllegalArgumentException(
          "zone '"
              + zone
              + "' has "
              + NasaSpecies.text(at[2])
              + " K at ("
              + NasaSpecies.text(at[0])
              + ", "
              + NasaSpecies.text(at[1])
              + ") m, its gas data hold from "
              + NasaSpecies.text(gas.lowestTemperature())
              + " to "
              + NasaSpecies.text(gas.highestTemperature())
              + " K; mend the temperature field, or give R and γ");
    }
  }
}
