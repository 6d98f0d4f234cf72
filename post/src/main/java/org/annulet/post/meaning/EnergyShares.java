package org.annulet.post.meaning;

import org.annulet.mesher.mesh.Mesh;

/**
 * Where the acoustic energy of a mode is: potential ∫ w |p̂|²/(γp̄) and kinetic ∫ w |∇p̂|²/(ρ|s|²)
 * of each zone, as shares of the sum of all. For a mode without losses both are equal in total.
 *
 * @param potential share of each zone, shape [zones]
 * @param kinetic share of each zone, shape [zones]; all entries of both add up to 1
 */
public record EnergyShares(double[] potential, double[] kinetic) {

  /** The shares of one mode. */
  static EnergyShares of(Chamber chamber, ModeView view) {
    Mesh mesh = chamber.mesh();
    int zones = mesh.zoneNames().size();
    double[] potential = new double[zones];
    double[] kinetic = new double[zones];
    double rate = Math.max(view.squaredRate(), Double.MIN_NORMAL);
    double order =
        chamber.kind() == GeometryKind.SECTION && view.order() != null ? view.order() : 0;
    double total = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      int z = mesh.zone(t);
      double scale = chamber.arcScale(z);
      double volume = mesh.area(t) * chamber.thickness(t) * scale;
      double square = squareMean(mesh, t, view.re()) + squareMean(mesh, t, view.im());
      double[] a = gradient(mesh, t, view.re());
      double[] b = gradient(mesh, t, view.im());
      double slope = a[0] * a[0] + b[0] * b[0] + (a[1] * a[1] + b[1] * b[1]) / (scale * scale);
      if (order != 0 && !chamber.separateDucts(z)) {
        double r = (mesh.cornerY(t, 0) + mesh.cornerY(t, 1) + mesh.cornerY(t, 2)) / 3;
        slope += order * order / (r * r) * square;
      }
      double e = volume * square / chamber.bulkModulus(t);
      double k = volume * slope / chamber.density(t) / rate;
      potential[z] += e;
      kinetic[z] += k;
      total += e + k;
    }
    for (int z = 0; z < zones && total > 0; z++) {
      potential[z] /= total;
      kinetic[z] /= total;
    }
    return new EnergyShares(potential, kinetic);
  }

  /** Zone with the largest share. */
  int largest() {
    int best = 0;
    for (int z = 1; z < potential.length; z++) {
      if (total(z) > total(best)) {
        best = z;
      }
    }
    return best;
  }

  /** Potential and kinetic share of zone {@code z} together. */
  public double total(int z) {
    return potential[z] + kinetic[z];
  }

  /** Mean of f² over a triangle, f linear. */
  private static double squareMean(Mesh mesh, int t, double[] f) {
    double a = f[mesh.corner(t, 0)];
    double b = f[mesh.corner(t, 1)];
    double c = f[mesh.corner(t, 2)];
    return (a * a + b * b + c * c + a * b + b * c + c * a) / 6;
  }

  /** Gradient of a linear field on a triangle, per m in both coordinates. */
  static double[] gradient(Mesh mesh, int t, double[] f) {
    double x0 = mesh.cornerX(t, 0);
    double y0 = mesh.cornerY(t, 0);
    double x1 = mesh.cornerX(t, 1) - x0;
    double y1 = mesh.cornerY(t, 1) - y0;
    double x2 = mesh.cornerX(t, 2) - x0;
    double y2 = mesh.cornerY(t, 2) - y0;
    double f0 = f[mesh.corner(t, 0)];
    double f1 = f[mesh.corner(t, 1)] - f0;
    double f2 = f[mesh.corner(t, 2)] - f0;
    double twice = x1 * y2 - x2 * y1;
    return new double[] {(f1 * y2 - f2 * y1) / twice, (x1 * f2 - x2 * f1) / twice};
  }
}
