package org.annulet.solver.assembly;

import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.flame.Patch;

/**
 * Quadrature over the part of a zone that a patch covers: each triangle is clipped to the patch, so
 * the patch need not follow mesh lines. Degree five on each piece.
 */
final class PatchQuadrature {
  private final Metric metric;
  private final Mesh mesh;
  private final Sectors sectors;

  PatchQuadrature(Metric metric, Sectors sectors) {
    this.metric = metric;
    this.mesh = metric.mesh();
    this.sectors = sectors;
  }

  /** What is done at each quadrature point. */
  @FunctionalInterface
  interface Point {
    /**
     * @param t triangle
     * @param x first coordinate in m
     * @param shape values of the three shape functions; not to be kept
     * @param weight of the point, with the weight w of the geometry, in m³ (or per metre)
     */
    void at(int t, double x, double[] shape, double weight);
  }

  /** Visits all points of the part that belongs to a burner; burner 1 where there is one only. */
  void visit(Patch patch, int burner, Point point) {
    boolean narrow = !Double.isInfinite(patch.width());
    if (narrow && !(metric.geometry() instanceof Ring)) {
      throw new IllegalArgumentException(
          "patch in zone '" + patch.zone() + "' has a width, which only a ring knows");
    }
    double centre = sectors.centre(burner);
    double all = sectors.count() > 1 ? sectors.pitch() / 2 : Double.POSITIVE_INFINITY;
    double half = all;
    if (narrow) {
      Ring ring = (Ring) metric.geometry();
      double scale = ring.zones().get(patch.zone()).meanRadius() / ring.unrolledRadius();
      half = Math.min(all, patch.width() / 2 / scale);
    }
    visit(patch.zone(), new double[] {patch.fromX(), patch.toX(), centre, half}, point);
  }

  /**
   * Visits all points of a box in a zone.
   *
   * @param box lower and upper x, middle and half height in y, in m
   */
  void visit(String zoneName, double[] box, Point point) {
    int zone = Names.zone(mesh, zoneName, "patch");
    double[][] polygon = new double[2][16];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      if (mesh.zone(t) != zone) {
        continue;
      }
      double middle = (mesh.cornerY(t, 0) + mesh.cornerY(t, 1) + mesh.cornerY(t, 2)) / 3;
      double shift =
          mesh.period() == 0 ? 0 : mesh.period() * Math.rint((middle - box[2]) / mesh.period());
      for (int k = 0; k < 3; k++) {
        polygon[0][k] = mesh.cornerX(t, k);
        polygon[1][k] = mesh.cornerY(t, k) - shift;
      }
      int n = clip(polygon, 3, 0, 1, box[0]);
      n = clip(polygon, n, 0, -1, -box[1]);
      if (!Double.isInfinite(box[3])) {
        n = clip(polygon, n, 1, 1, box[2] - box[3]);
        n = clip(polygon, n, 1, -1, -box[2] - box[3]);
      }
      for (int k = 2; k < n; k++) {
        piece(t, shift, polygon, k, point);
      }
    }
  }

  /** Keeps the part of a polygon with sign · coordinate ≥ bound; returns the number of corners. */
  private static int clip(double[][] p, int n, int axis, int sign, double bound) {
    double[][] in = {p[0].clone(), p[1].clone()};
    int m = 0;
    for (int a = 0; a < n; a++) {
      int b = (a + 1) % n;
      double da = sign * in[axis][a] - bound;
      double db = sign * in[axis][b] - bound;
      if (da >= 0) {
        p[0][m] = in[0][a];
        p[1][m++] = in[1][a];
      }
      if ((da > 0 && db < 0) || (da < 0 && db > 0)) {
        double f = da / (da - db);
        p[0][m] = in[0][a] + f * (in[0][b] - in[0][a]);
        p[1][m++] = in[1][a] + f * (in[1][b] - in[1][a]);
      }
    }
    return m;
  }

  private void piece(int t, double shift, double[][] p, int k, Point point) {
    double area =
        0.5
            * ((p[0][k - 1] - p[0][0]) * (p[1][k] - p[1][0])
                - (p[0][k] - p[0][0]) * (p[1][k - 1] - p[1][0]));
    double x0 = mesh.cornerX(t, 0);
    double y0 = mesh.cornerY(t, 0) - shift;
    double x1 = mesh.cornerX(t, 1) - x0;
    double y1 = mesh.cornerY(t, 1) - shift - y0;
    double x2 = mesh.cornerX(t, 2) - x0;
    double y2 = mesh.cornerY(t, 2) - shift - y0;
    double twice = x1 * y2 - x2 * y1;
    double[] shape = new double[3];
    for (double[] q : Element.quadrature()) {
      double x = q[0] * p[0][0] + q[1] * p[0][k - 1] + q[2] * p[0][k];
      double y = q[0] * p[1][0] + q[1] * p[1][k - 1] + q[2] * p[1][k];
      shape[1] = ((x - x0) * y2 - x2 * (y - y0)) / twice;
      shape[2] = (x1 * (y - y0) - (x - x0) * y1) / twice;
      shape[0] = 1 - shape[1] - shape[2];
      point.at(t, x, shape, q[3] * area * metric.area(t, y));
    }
  }
}
